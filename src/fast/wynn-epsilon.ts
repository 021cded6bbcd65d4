/**
 * @module Wynn's ε algorithm in doubles: the last entry of the staircase of the partial sums.
 *
 *   ε_{k+1}^{(n)} = ε_{k−1}^{(n+1)} + 1/(ε_k^{(n+1)} − ε_k^{(n)}),  ε_{−1} = 0,  ε_0^{(n)} = s_n.
 * The entry is ε_{N−1}^{(0)} for an odd number N of sums, ε_{N−2}^{(1)} for an even one. Equal neighbours give NaN.
 * Refuses coefficients that do not alternate strictly from `start` on. Reference: sequences/epsilon.ts.
 */
import type { Kernel } from './kernel.js';
import { alternates } from './alternation.js';

export interface WynnEpsilonSetting {
  readonly kind: 'wynn-epsilon';
  readonly count: number;
  /** 0, or 1 when the first term stands before the alternation. */
  readonly start: number;
}

export function wynnEpsilonKernel({ count, start }: WynnEpsilonSetting): Kernel {
  let c: Float64Array = new Float64Array(count);
  // Columns k − 1 and k of the table, in place.
  const older = new Float64Array(count + 1);
  const newer = new Float64Array(count);
  const first = 1 - (count % 2);
  return {
    prepare(coefficients) {
      c = coefficients;
      return alternates(c, start, count);
    },
    value(x) {
      let sum = 0;
      let power = 1;
      for (let n = 0; n < count; n++) {
        sum += c[n]! * power;
        power *= x;
        newer[n] = sum;
        older[n] = 0;
      }
      older[count] = 0;
      for (let left = count - 1; left > first; left--) {
        for (let n = 0; n < left; n++) {
          const next = older[n + 1]! + 1 / (newer[n + 1]! - newer[n]!);
          older[n] = newer[n]!;
          newer[n] = next;
        }
        older[left] = newer[left]!;
      }
      const value = newer[first]!;
      return Number.isFinite(value) ? value : NaN;
    },
  };
}
