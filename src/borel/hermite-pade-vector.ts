/**
 * @module The linear algebra of quadratic Hermite–Padé approximants: degrees, matrix, null vectors.
 *
 * Method     the rows t^{p+1} … t^{N−1} hold the coefficients of Q and R alone (columns t^k f, t^k f²): a null vector of these
 *            by exact elimination, or in balls with one component set to 1. The first rows then give P.
 * Bound      exact, or enclosed.
 * Reference  G. A. Baker, P. Graves-Morris (1996) ch. 8 (from memory).
 */
import { ballField, R, Rational, solveField } from '../numerics/index.js';
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

/** Polynomials P, Q, R by ascending coefficients. */
export type Parts<T> = readonly [p: readonly T[], q: readonly T[], r: readonly T[]];

/** The columns of Q and R in the rows t^{p+1} … t^{rows−1}. */
export function columns<T>(field: Field<T>, f: readonly T[], [p, q, r]: Degrees, rows: number): T[][] {
  const square = multiplySeries(field, f, f, rows);
  const shifted = (s: readonly T[], by: number): T[] =>
    Array.from({ length: rows - p - 1 }, (_, i) => {
      const n = i + p + 1;
      return n < by ? field.zero : (s[n - by] ?? field.zero);
    });
  const block = (s: readonly T[], degree: number): T[][] => Array.from({ length: degree + 1 }, (_, k) => shifted(s, k));
  return [...block(f, q), ...block(square, r)];
}

/** P, Q, R from a null vector of the columns: P = −(Q f + R f²) through t^p. */
export function partsOf<T>(field: Field<T>, f: readonly T[], [p, q]: Degrees, vector: readonly T[]): Parts<T> {
  const middle = vector.slice(0, q + 1);
  const last = vector.slice(q + 1);
  const inner = multiplySeries(field, f, last, p + 1).map((c, n) => field.add(c, middle[n] ?? field.zero));
  return [multiplySeries(field, f, inner, p + 1).map((c) => field.neg(c)), middle, last];
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
  // Plain elimination: the caller's spare bits pay for what it loses, which is less than a proved inverse costs.
  const field = ballField(prec);
  // One component is set to 1; the first choice that leaves a regular system serves.
  for (let one = cols.length - 1; one >= 0; one--) {
    const others = cols.filter((_, j) => j !== one);
    const matrix = Array.from({ length: rows }, (_, i) => others.map((c) => c[i]!));
    const solved = solveField(field, matrix, cols[one]!.map(R.neg));
    if (solved !== undefined) return [...solved.slice(0, one), R.ONE, ...solved.slice(one)];
  }
  return undefined;
}
