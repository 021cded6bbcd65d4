/**
 * @module The linear algebra of quadratic Hermite–Padé approximants: degrees, matrix, null vectors.
 *
 * Method     columns t^k, t^k f, t^k f² for the coefficients of P, Q, R; a null vector by exact elimination, or in balls with one
 *            component set to 1.
 * Bound      exact, or enclosed.
 * Reference  G. A. Baker, P. Graves-Morris (1996) ch. 8 (from memory).
 */
import { R, Rational, solveBall } from '../numerics/index.js';
import type { Ball, Field } from '../numerics/index.js';
import { multiplySeries } from './power-series.js';

export type Degrees = readonly [p: number, q: number, r: number];

/** Degrees that use `count` coefficients, nearest to equal ones first. */
export function quadraticDegrees(count: number): Degrees[] {
  const total = count - 2;
  const k = Math.floor(total / 3);
  switch (total - 3 * k) {
    case 0:
      return [[k, k, k]];
    case 1:
      return [
        [k + 1, k, k],
        [k, k + 1, k],
        [k, k, k + 1],
      ];
    default:
      return [
        [k + 1, k + 1, k],
        [k + 1, k, k + 1],
        [k, k + 1, k + 1],
      ];
  }
}

/** One column of the matrix for every coefficient of P, Q and R: rows t^0 … t^{rows−1}. */
export function columns<T>(field: Field<T>, f: readonly T[], [p, q, r]: Degrees, rows: number): T[][] {
  const square = multiplySeries(field, f, f, rows);
  const shifted = (s: readonly T[], by: number): T[] =>
    Array.from({ length: rows }, (_, n) => (n < by ? field.zero : (s[n - by] ?? field.zero)));
  const block = (s: readonly T[], degree: number): T[][] => Array.from({ length: degree + 1 }, (_, k) => shifted(s, k));
  return [...block([field.one], p), ...block(f, q), ...block(square, r)];
}

/** A non-zero exact null vector with as few trailing coefficients as possible, and the dimension of the null space. */
export function nullVectorExact(cols: readonly (readonly Rational[])[]): { vector: Rational[]; dimension: number } {
  const rows = cols[0]!.length;
  const m = Array.from({ length: rows }, (_, i) => cols.map((c) => c[i]!));
  const pivots: number[] = [];
  for (let j = 0; j < cols.length && pivots.length < rows; j++) {
    const at = pivots.length;
    const found = m.findIndex((row, i) => i >= at && !row[j]!.isZero());
    if (found < 0) continue;
    const chosen = m[found]!;
    m[found] = m[at]!;
    const inverse = chosen[j]!.inv();
    const pivotRow = chosen.map((x) => x.mul(inverse));
    m[at] = pivotRow;
    for (let i = 0; i < rows; i++) {
      const factor = m[i]![j]!;
      if (i !== at && !factor.isZero()) m[i] = m[i]!.map((x, k) => x.sub(factor.mul(pivotRow[k]!)));
    }
    pivots.push(j);
  }
  // The first free column gives the vector whose entries end there.
  const free = cols.findIndex((_, j) => !pivots.includes(j));
  const vector = cols.map((_, j) => {
    if (j === free) return Rational.ONE;
    const row = pivots.indexOf(j);
    return row < 0 || j > free ? Rational.ZERO : m[row]![free]!.neg();
  });
  return { vector, dimension: cols.length - pivots.length };
}

export function nullVectorBalls(cols: readonly (readonly Ball[])[], prec: number): Ball[] | undefined {
  const rows = cols[0]!.length;
  // One component is set to 1; the first choice that leaves a regular system serves.
  for (let one = cols.length - 1; one >= 0; one--) {
    const others = cols.filter((_, j) => j !== one);
    const matrix = Array.from({ length: rows }, (_, i) => others.map((c) => c[i]!));
    const solved = solveBall(matrix, cols[one]!.map(R.neg), prec);
    if (solved !== undefined) return [...solved.slice(0, one), R.ONE, ...solved.slice(one)];
  }
  return undefined;
}
