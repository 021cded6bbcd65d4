/**
 * @module [M−1/M] of a moment series by Chebyshev's algorithm, over any number field.
 *
 * Purpose    a Padé denominator in O(M²) operations, with the continued fraction that conditions its roots well.
 * Method     μ_0, μ_1, … define monic orthogonal polynomials P_{k+1} = (s − α_k)P_k − β_k P_{k−1}; with
 *            σ_{k,l} = <P_k, s^l>, σ_{0,l} = μ_l, σ_{k,l} = σ_{k−1,l+1} − α_{k−1}σ_{k−1,l} − β_{k−1}σ_{k−2,l},
 *            α_k = σ_{k,k+1}/σ_{k,k} − σ_{k−1,k}/σ_{k−1,k−1}, β_k = σ_{k,k}/σ_{k−1,k−1}.
 *            The denominator of [M−1/M] is x^M P_M(1/x), normalised to 1 at x = 0 by P_M being monic.
 * Bound      that of the field. Every pivot σ_{k,k}, k < M, must certainly be non-zero (Hankel determinants
 *            H_1..H_M ≠ 0: the entries [k−1/k], k <= M, are normal); otherwise undefined is returned.
 * Reference  W. Gautschi, SIAM J. Sci. Stat. Comput. 3 (1982) 289; G. A. Baker, P. Graves-Morris, "Padé
 *            Approximants", chapter 4 (continued fractions of J type).
 */
import type { Field } from '../field.js';

export interface JacobiCoefficients<T> {
  /** α_0..α_{M−1} */
  readonly alpha: readonly T[];
  /** β_0 = μ_0, β_1..β_{M−1} */
  readonly beta: readonly T[];
}

/** Recurrence coefficients from μ_0..μ_{2M−1}; undefined when a pivot may vanish. */
export function jacobiFromMoments<T>(field: Field<T>, moments: readonly T[]): JacobiCoefficients<T> | undefined {
  const size = Math.floor(moments.length / 2);
  let previous: T[] = [];
  let row: T[] = moments.slice(0, 2 * size);
  const alpha: T[] = [];
  const beta: T[] = [];
  let lastRatio = field.zero;
  let lastPivot = field.one;
  for (let k = 0; k < size; k++) {
    const pivot = row[k]!;
    if (!field.isNonZero(pivot)) return undefined;
    const ratio = field.div(row[k + 1]!, pivot);
    const a = field.sub(ratio, lastRatio);
    const b = field.div(pivot, lastPivot);
    alpha.push(a);
    beta.push(b);
    if (k === size - 1) break;
    const next: T[] = new Array<T>(2 * size - k - 1);
    for (let l = k + 1; l < 2 * size - k - 1; l++) {
      let value = field.sub(row[l + 1]!, field.mul(a, row[l]!));
      if (k > 0) value = field.sub(value, field.mul(b, previous[l]!));
      next[l] = value;
    }
    [previous, row, lastRatio, lastPivot] = [row, next, ratio, pivot];
  }
  return { alpha, beta };
}

/** x^M P_M(1/x), ascending, first coefficient 1. */
export function reversedOrthogonal<T>(field: Field<T>, { alpha, beta }: JacobiCoefficients<T>): T[] {
  // R_k(x) = x^k P_k(1/x): R_{k+1} = (1 − α_k x)R_k − β_k x² R_{k−1}.
  let previous: T[] = [];
  let row: T[] = [field.one];
  for (let k = 0; k < alpha.length; k++) {
    const next: T[] = [...row, field.zero];
    for (let j = 0; j <= k; j++) next[j + 1] = field.sub(next[j + 1]!, field.mul(alpha[k]!, row[j]!));
    for (let j = 0; j < previous.length; j++) next[j + 2] = field.sub(next[j + 2]!, field.mul(beta[k]!, previous[j]!));
    [previous, row] = [row, next];
  }
  return row;
}
