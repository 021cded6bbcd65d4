/**
 * @module Cholesky factor of a positive semidefinite matrix in doubles: C = L Lᵀ.
 *
 * Purpose    correlated normal deviates L z.
 * Method     row by row; a pivot between −PIVOT · tr C and +PIVOT · tr C counts as zero, and its column is left out: a semidefinite
 *            matrix (fully correlated inputs) has such pivots, and rounding gives them either sign.
 * Bound      backward stable; refused are matrices whose pivot is certainly negative, or whose left-out column is not zero.
 * Reference  G. H. Golub, C. F. Van Loan, Matrix Computations, section 4.2 (memory).
 */

/** Pivots below this fraction of the trace are zero. Heuristic. */
const PIVOT = 1e-12;

/** What is wrong with a matrix that has no factor: row (from 0) and pivot. */
export interface NotSemidefinite {
  readonly row: number;
  readonly pivot: number;
}

/** Rows of L (row i has i + 1 entries); the lower triangle of C is used. */
export function cholesky(C: readonly (readonly number[])[]): number[][] | NotSemidefinite {
  const trace = C.reduce((sum, row, i) => sum + Math.abs(row[i] ?? NaN), 0);
  const tolerance = PIVOT * trace;
  const L: number[][] = [];
  for (let i = 0; i < C.length; i++) {
    const row: number[] = [];
    for (let j = 0; j < i; j++) {
      const rest = C[i]![j]! - dot(row, L[j]!, j);
      const d = L[j]![j]!;
      // Where the pivot was left out, nothing may be left of the column either.
      if (d === 0 && Math.abs(rest) > Math.sqrt(tolerance * trace)) return { row: i, pivot: -Math.abs(rest) };
      row.push(d === 0 ? 0 : rest / d);
    }
    const pivot = C[i]![i]! - dot(row, row, i);
    if (!(pivot >= -tolerance)) return { row: i, pivot };
    row.push(pivot <= tolerance ? 0 : Math.sqrt(pivot));
    L.push(row);
  }
  return L;
}

function dot(a: readonly number[], b: readonly number[], count: number): number {
  let sum = 0;
  for (let k = 0; k < count; k++) sum += a[k]! * b[k]!;
  return sum;
}
