/**
 * @module [L/M] by the extended Euclidean algorithm, in integers.
 *
 * Purpose    the entry of the Padé table of an exact series, whatever blocks stand in the way.
 * Method     r₀ = x^(L+M+1), r₁ = Σ b_n x^n; divide until deg r <= L. Each row keeps r = t·b mod x^(L+M+1). Rows are
 *            pairs of integer polynomials made jointly primitive after every division step, which changes neither the
 *            fraction nor the degrees. gcd(r, t) divides x^(L+M+1): the entry exists exactly when t(0) is not 0.
 * Bound      exact.
 * Reference  R. P. Brent, F. G. Gustavson, D. Y. Y. Yun, J. Algorithms 1 (1980) 259; G. A. Baker, P. Graves-Morris,
 *            "Padé Approximants", sections 1.4 and 2.4.
 */
import { contentInt, trimInt, type IntPoly } from './integer.js';

/** r/t before normalisation: integers, coprime up to a power of x. */
export interface EuclidRow {
  readonly r: IntPoly;
  readonly t: IntPoly;
}

/** Row of Euclid's scheme for b modulo x^order with deg r <= degree. */
export function euclidRow(b: IntPoly, order: number, degree: number): EuclidRow {
  return euclidRows(b, order, [degree])[0]!;
}

/** The rows for several degrees, largest degree first: one run of the scheme serves a whole antidiagonal. */
export function euclidRows(b: IntPoly, order: number, degrees: readonly number[]): EuclidRow[] {
  let previous: EuclidRow = { r: [...Array.from({ length: order }, () => 0n), 1n], t: [] };
  let row: EuclidRow = { r: trimInt(b.slice(0, order)), t: [1n] };
  return degrees.map((degree) => {
    while (row.r.length - 1 > degree) [previous, row] = [row, remainderRow(previous, row)];
    return row;
  });
}

/** The pair (r₀ − q r₁, t₀ − q t₁) times a constant that keeps it integer, made primitive. */
function remainderRow(a: EuclidRow, b: EuclidRow): EuclidRow {
  const r = a.r.slice();
  const growth = Math.max(0, a.r.length - b.r.length + b.t.length - a.t.length);
  const t = [...a.t, ...Array.from({ length: growth }, () => 0n)];
  const n = b.r.length - 1;
  const lead = b.r[n]!;
  for (let k = a.r.length - 1 - n; k >= 0; k--) {
    const c = r[n + k]!;
    r.length = n + k;
    if (c === 0n) continue;
    for (let i = 0; i < r.length; i++) r[i]! *= lead;
    for (let i = 0; i < n; i++) r[k + i]! -= c * b.r[i]!;
    for (let i = 0; i < t.length; i++) t[i]! *= lead;
    for (let i = 0; i < b.t.length; i++) t[k + i]! -= c * b.t[i]!;
  }
  const g = contentInt([...t, ...r]);
  const reduced = (x: bigint[]): IntPoly => trimInt(g === 1n ? x : x.map((c) => c / g));
  return { r: reduced(r), t: reduced(t) };
}
