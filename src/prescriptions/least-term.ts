/**
 * @module Least-term (superasymptotic) truncation.
 *
 * Cut at the smallest term T_k. Alternating: S_< + T_k/2. Same sign: the same half-term rule, unless the position t* and
 * exponent γ of the leading singularity are known: then the partial sum with the number of terms nearest to
 * x − b − 1/3, x = t* / α, b = γ − 1, where the principal-value remainder vanishes.
 * Truncation error: |T_k|; where singularities compete, not less than its neighbours.
 * Reference: F. W. J. Olver, Asymptotics and Special Functions (1974) ch. 14; R. B. Dingle, Asymptotic Expansions (1973)
 * (both from memory); the constant 1/3 follows from the terminant expansion, checked numerically.
 */
import { R, toNumberExact } from '../numerics/index.js';
import type { Expansion } from '../series/index.js';
import { mayCancel, inputObjection } from './eligibility.js';
import type { Prescription } from './prescription.js';
import { leastTerm, partialSums, refusal, terms, toDigits } from './prescription.js';

/** x = |t*| divided by α, and b = γ − 1, of the nearest stated singularity with an exponent. */
export function stateOfLeading(e: Expansion): { x: number; b: number; positive: boolean } | undefined {
  const s = e.stated[0];
  if (s?.exponent === undefined) return undefined;
  const t = toNumberExact(s.t);
  return { x: Math.abs(t) / toNumberExact(e.x), b: toNumberExact(s.exponent) - 1, positive: t > 0 };
}

export const leastTermSum: Prescription = {
  name: 'least-term',
  title: 'least term',
  summary: 'cut at the smallest term and add half of it; error: that term',
  family: 'truncation',
  apply(e, growth, request) {
    const N = e.coefficients.length;
    const variant = 'cut at the least term';
    if (N < 2) return [refusal(variant, `${N} term${N === 1 ? '' : 's'}: no least term`, 'give more coefficients')];
    if (growth.verdict === 'terminating' || growth.verdict === 'geometric' || growth.verdict === 'convergent')
      return [
        refusal(variant, `the growth is ${growth.verdict}: there is no divergence to cut`, 'use the fixed-order sum'),
      ];
    const no = inputObjection(e, growth, variant, 2);
    if (no !== undefined) return [no];
    if (growth.verdict === 'superfactorial' && growth.order !== 2)
      return [
        refusal(
          variant,
          'growth faster than any (kn)!: the least term measures nothing',
          'none of the methods here sums it; the sum may not be unique',
        ),
      ];
    const t = terms(e, 160);
    const least = leastTerm(t);
    if (least === undefined)
      return [
        refusal(
          variant,
          'every term is zero or not told from zero',
          'give coefficients with errors below their values',
        ),
      ];
    const k = least.index;
    const lastNonZero = t.reduce((m, b, n) => (R.isExactZero(b) ? m : n), -1);
    if (k === lastNonZero && least.tiedWith === undefined)
      return [
        refusal(
          variant,
          'the least term is not reached: the terms still fall at the last order',
          'use the fixed-order sum, or a larger coupling',
        ),
      ];
    const leading = stateOfLeading(e);
    const count = leading?.positive === true ? Math.round(leading.x - leading.b - 1 / 3) : undefined;
    const useCount = growth.signPattern === 'same' && count !== undefined && count >= 1 && count <= N;
    const half = toDigits(
      request.digits,
      (prec) => {
        const sums = partialSums(e, prec);
        if (useCount) return sums[count]!;
        return R.mul2exp(R.add(sums[k]!, sums[k + 1]!, prec), -1);
      },
      (v) => v,
    );
    const size = (n: number): number => (t[n] === undefined ? 0 : Math.abs(R.toNumber(t[n])));
    return [
      {
        kind: 'sum',
        variant: useCount ? `${count} terms` : `half of the term of order ${k + e.power}`,
        value: half,
        truncation: mayCancel(growth) ? Math.max(size(k - 1), size(k), size(k + 1)) : size(k),
        termsUsed: useCount ? count : k + 1,
        trust: 'indicative',
        notes: useCount ? ['number of terms nearest to x − b − 1/3, where the principal-value remainder vanishes'] : [],
        central: true,
      },
    ];
  },
};
