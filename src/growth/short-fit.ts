/**
 * @module Position from a few ratios, with priors for what they cannot fix.
 *
 * Purpose    three to ten ratios D_k do not determine limit, slope and curvature each; the linear extrapolant alone
 *            swings far, the plain last ratio is biased. The fit leans on a broad prior for γ instead.
 * Method     D_k = d (1 + u/k + v/k²) + remainder; u = γ−1 and v with normal priors, the remainder an independent error
 *            d·REMAINDER/k^1.5 on top of the propagated coefficient errors; generalised least squares (ridge).
 * Bound      heuristic: posterior standard deviation, inflated by the caller.
 * Reference  A. E. Hoerl and R. W. Kennard, Technometrics 12 (1970) 55 (ridge); C. Domb and M. F. Sykes 1957 (the form).
 */
import type { Estimate } from './growth.js';
import { leastSquares } from './least-squares.js';

/** Prior mean and width of γ−1: QCD exponents 1+b lie between 1 and 3; ε expansions reach 8. */
const SLOPE_PRIOR = { mean: 0.5, width: 3 };
/** Prior width of the 1/k² coefficient, about 0. */
const CURVATURE_WIDTH = 4;
/** Relative size of what the three terms leave out, falling like k^(−3/2). */
const REMAINDER = 0.4;

export interface ShortFit {
  readonly limit: Estimate;
  /** γ. */
  readonly exponent: Estimate;
}

/** ratios: (k, D_k, error of D_k), k >= 1, at least two of them, all of one sign. */
export function shortFit(ratios: readonly { k: number; d: number; sigma: number }[]): ShortFit | undefined {
  if (ratios.length < 2) return undefined;
  const scale = ratios[ratios.length - 1]!.d;
  const y = ratios.map((r) => r.d / scale);
  const w = ratios.map((r) => 1 / ((REMAINDER / r.k ** 1.5) ** 2 + (r.sigma / scale) ** 2));
  // Unknowns (d, d·u, d·v); two prior rows: d·u − mean·d = 0 ± width, d·v = 0 ± width.
  const columns = [
    [...ratios.map(() => 1), -SLOPE_PRIOR.mean, 0],
    [...ratios.map((r) => 1 / r.k), 1, 0],
    [...ratios.map((r) => 1 / r.k ** 2), 0, 1],
  ];
  const fit = leastSquares(columns, [...y, 0, 0], [...w, SLOPE_PRIOR.width ** -2, CURVATURE_WIDTH ** -2]);
  if (fit === undefined) return undefined;
  const [d, du] = fit.coefficients;
  const spread = Math.sqrt(Math.max(1, fit.rss / ratios.length));
  const error = spread * Math.sqrt(fit.unitVariances[0]!);
  const exponentError = Math.hypot(spread * Math.sqrt(fit.unitVariances[1]!), (du! * error) / d!) / Math.abs(d!);
  return {
    limit: { value: d! * scale, error: Math.abs(error * scale) },
    exponent: { value: 1 + du! / d!, error: exponentError },
  };
}
