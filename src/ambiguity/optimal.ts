/**
 * @module The optimal truncation order, seen in the terms and predicted from the leading singularity.
 *
 * For terms T_n ∝ Γ(n+1+b) ω^{−n}, ω = |t*|/x: the least term is the one of index floor(ω − b) and, for a same-sign
 * series, the principal-value remainder vanishes after ω − b − 1/3 terms.
 * Reference: re-derived from the terminant expansion x F_s = −(1/3+η) + …, s = n+b = ω+η (DLMF 2.11(iii) family).
 */

export interface PredictedOptimum {
  readonly omega: number;
  readonly b: number;
  /** Number of terms before the least one, ω − b. */
  readonly leastTermAt: number;
  /** Number of terms whose sum is nearest to the principal value, ω − b − 1/3. */
  readonly principalValueAt: number;
}

/** Prediction from |t*|, b = γ − 1 and the expansion variable x > 0. */
export function predictOptimum(t: number, b: number, x: number): PredictedOptimum {
  const omega = Math.abs(t) / x;
  return { omega, b, leastTermAt: omega - b, principalValueAt: omega - b - 1 / 3 };
}
