/**
 * @module Weighted linear least squares for a handful of parameters.
 *
 * Purpose    straight-line and few-parameter fits of ln|c_n| and of ratio sequences.
 * Method     Householder triangularisation of the scaled columns: the normal equations would square the condition
 *            number, and {1, n, ln n!} are nearly dependent.
 * Bound      residuals to a few units of the last place times the condition of the scaled columns; a column that depends
 *            on the others to DEPENDENT is refused.
 * Reference  Å. Björck, "Numerical Methods for Least Squares Problems", SIAM 1996, section 2.3.
 */

/** A column whose part independent of the earlier ones is smaller than this, relative, is refused. */
const DEPENDENT = 1e-13;

export interface LinearFit {
  readonly coefficients: readonly number[];
  /** Σ w r². */
  readonly rss: number;
  readonly residuals: readonly number[];
  /** Diagonal of (AᵀWA)^(−1): multiply by σ² for variances. */
  readonly unitVariances: readonly number[];
}

/** Minimises Σ w_i (y_i − Σ_j a_j x_ij)²; columns[j][i] = x_ij, weights 1 unless given. Undefined when not solvable. */
export function leastSquares(
  columns: readonly (readonly number[])[],
  y: readonly number[],
  weights?: readonly number[],
): LinearFit | undefined {
  const m = y.length;
  const k = columns.length;
  if (m < k || k === 0) return undefined;
  const root = y.map((_, i) => Math.sqrt(weights?.[i] ?? 1));
  const scale = columns.map((c) => Math.sqrt(c.reduce((s, v, i) => s + (v * root[i]!) ** 2, 0)));
  if (scale.some((s) => !(s > 0) || !Number.isFinite(s))) return undefined;
  const a = columns.map((c, j) => c.map((v, i) => (v * root[i]!) / scale[j]!));
  const b = y.map((v, i) => v * root[i]!);
  for (let j = 0; j < k; j++) {
    const v = a[j]!;
    let norm = 0;
    for (let i = j; i < m; i++) norm += v[i]! ** 2;
    norm = Math.sqrt(norm);
    if (!(norm > DEPENDENT)) return undefined;
    const alpha = v[j]! > 0 ? -norm : norm;
    const u = v.map((x, i) => (i < j ? 0 : i === j ? x - alpha : x));
    const uu = u.reduce((s, x) => s + x * x, 0);
    const reflect = (w: number[]): void => {
      let dot = 0;
      for (let i = j; i < m; i++) dot += u[i]! * w[i]!;
      const f = (2 * dot) / uu;
      for (let i = j; i < m; i++) w[i]! -= f * u[i]!;
    };
    for (let l = j + 1; l < k; l++) reflect(a[l]!);
    reflect(b);
    for (let i = j; i < m; i++) v[i] = i === j ? alpha : 0;
  }
  // R is a[l][j], j <= l; solve R x = b and invert R for the variances.
  const solve = (rhs: readonly number[]): number[] => {
    const x = rhs.slice(0, k);
    for (let j = k - 1; j >= 0; j--) {
      for (let l = j + 1; l < k; l++) x[j]! -= a[l]![j]! * x[l]!;
      x[j]! /= a[j]![j]!;
    }
    return x;
  };
  const x = solve(b);
  const unitVariances = Array.from({ length: k }, () => 0);
  for (let c = 0; c < k; c++) {
    const e = solve(Array.from({ length: k }, (_, i) => (i === c ? 1 : 0)));
    for (let j = 0; j < k; j++) unitVariances[j]! += (e[j]! / scale[j]!) ** 2;
  }
  const coefficients = x.map((v, j) => v / scale[j]!);
  const residuals = y.map((v, i) => v - columns.reduce((s, c, j) => s + c[i]! * coefficients[j]!, 0));
  const rss = residuals.reduce((s, r, i) => s + (r * root[i]!) ** 2, 0);
  return { coefficients, rss, residuals, unitVariances };
}
