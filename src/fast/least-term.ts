/**
 * @module Least-term truncation in doubles: the cut of the central values, kept.
 * S_< + T_k/2 for the term k that is smallest there, or the whole number of terms that x − b − 1/3 gives there. A cut that moved
 * with the coupling would make R(α) jump, and a jump has no inverse.
 */
import type { Kernel } from './kernel.js';
import { partialSum } from './kernel.js';

export interface LeastTermSetting {
  readonly kind: 'least-term';
  /** Terms kept whole. */
  readonly terms: number;
  /** Half of the next term is added. */
  readonly half: boolean;
}

export function leastTermKernel({ terms, half }: LeastTermSetting): Kernel {
  let c: Float64Array = new Float64Array(terms + 1);
  return {
    prepare(coefficients) {
      c = coefficients;
      return coefficients.length >= terms + (half ? 1 : 0);
    },
    value(x) {
      const whole = partialSum(c, terms, x);
      return half ? whole + (c[terms]! * x ** terms) / 2 : whole;
    },
  };
}
