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

/** Applies the reflection I − 2uuᵀ/uu, u living in rows from…, to w. */
function reflect(u: Float64Array, uu: number, from: number, w: Float64Array): void {
  let dot = 0;
  for (let i = from; i < w.length; i++) dot += u[i]! * w[i]!;
  const f = (2 * dot) / uu;
  for (let i = from; i < w.length; i++) w[i]! -= f * u[i]!;
}

/** Turns the columns a into R (in place, a[l][j] for j <= l) and b into Qᵀb; false when a column depends on others. */
function triangularise(a: readonly Float64Array[], b: Float64Array): boolean {
  const m = b.length;
  for (let j = 0; j < a.length; j++) {
    const v = a[j]!;
    let norm = 0;
    for (let i = j; i < m; i++) norm += v[i]! * v[i]!;
    norm = Math.sqrt(norm);
    if (!(norm > DEPENDENT)) return false;
    const alpha = v[j]! > 0 ? -norm : norm;
    // v becomes u; uu = |u|² = 2 norm (norm + |v_j|).
    const uu = 2 * norm * (norm + Math.abs(v[j]!));
    v[j]! -= alpha;
    for (let l = j + 1; l < a.length; l++) reflect(v, uu, j, a[l]!);
    reflect(v, uu, j, b);
    v[j] = alpha;
  }
  return true;
}

/** Solves R x = rhs from the columns left by triangularise. */
function backSubstitute(a: readonly Float64Array[], rhs: ArrayLike<number>): number[] {
  const k = a.length;
  const x = Array.from({ length: k }, (_, i) => rhs[i]!);
  for (let j = k - 1; j >= 0; j--) {
    for (let l = j + 1; l < k; l++) x[j]! -= a[l]![j]! * x[l]!;
    x[j]! /= a[j]![j]!;
  }
  return x;
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
  const root = new Float64Array(m);
  for (let i = 0; i < m; i++) root[i] = weights === undefined ? 1 : Math.sqrt(weights[i]!);
  const scale = new Float64Array(k);
  const a: Float64Array[] = [];
  for (let j = 0; j < k; j++) {
    const c = columns[j]!;
    const v = new Float64Array(m);
    let sum = 0;
    for (let i = 0; i < m; i++) {
      v[i] = c[i]! * root[i]!;
      sum += v[i]! * v[i]!;
    }
    scale[j] = Math.sqrt(sum);
    if (!(sum > 0) || !Number.isFinite(sum)) return undefined;
    for (let i = 0; i < m; i++) v[i]! /= scale[j]!;
    a.push(v);
  }
  const b = new Float64Array(m);
  for (let i = 0; i < m; i++) b[i] = y[i]! * root[i]!;
  if (!triangularise(a, b)) return undefined;
  const coefficients = backSubstitute(a, b).map((v, j) => v / scale[j]!);
  const unitVariances = Array.from({ length: k }, () => 0);
  for (let c = 0; c < k; c++) {
    const unit = new Float64Array(k);
    unit[c] = 1;
    backSubstitute(a, unit).forEach((v, j) => (unitVariances[j]! += (v / scale[j]!) ** 2));
  }
  const residuals: number[] = [];
  let rss = 0;
  for (let i = 0; i < m; i++) {
    let r = y[i]!;
    for (let j = 0; j < k; j++) r -= columns[j]![i]! * coefficients[j]!;
    residuals.push(r);
    rss += (r * root[i]!) ** 2;
  }
  return { coefficients, rss, residuals, unitVariances };
}
