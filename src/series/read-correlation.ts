/** @module The correlation matrix of the coefficients' errors. */
import { Rational } from '../numerics/index.js';
import type { Entry } from './entry.js';
import type { FieldReader } from './field-reader.js';
import { LIMITS } from './limits.js';

/** Rounded entries can push a zero eigenvalue this far below zero (heuristic: four decimals). */
const ROUNDING = 1e-4;

export function readCorrelation(
  entry: Entry | undefined,
  size: number,
  reader: FieldReader,
): readonly (readonly Rational[])[] | undefined {
  if (entry === undefined) return undefined;
  const field = 'correlation';
  const { complaints } = reader;
  const rows = reader.list(entry, field, 'rows');
  if (rows === undefined) return undefined;
  if (rows.length > LIMITS.correlation)
    return complaints.add(entry.at, field, `${rows.length} rows`, `at most ${LIMITS.correlation}`);
  if (rows.length !== size)
    return complaints.add(entry.at, field, `${rows.length} rows`, `${size}, one for each coefficient`);
  const matrix: Rational[][] = [];
  for (const [i, row] of rows.entries()) {
    const items = reader.list(row, `${field}[${i}]`, 'numbers');
    if (items === undefined) return undefined;
    if (items.length !== size)
      return complaints.add(row.at, `${field}[${i}]`, `${items.length} numbers`, `${size}, one for each coefficient`);
    const numbers: Rational[] = [];
    for (const [j, item] of items.entries()) {
      const q = reader.rational(
        item,
        `${field}[${i}][${j}]`,
        'a number from -1 to 1',
        (x) => x.abs().cmp(Rational.ONE) <= 0,
      );
      if (q === undefined) return undefined;
      if (i === j && !q.equals(Rational.ONE))
        return complaints.add(item.at, `${field}[${i}][${j}]`, `${q.toNumber()} on the diagonal`, '1');
      if (j < i && !q.equals(matrix[j]![i]!)) {
        return complaints.add(
          item.at,
          `${field}[${i}][${j}]`,
          `${q.toNumber()}, but ${matrix[j]![i]!.toNumber()} across the diagonal`,
          'a symmetric matrix',
        );
      }
      numbers.push(q);
    }
    matrix.push(numbers);
  }
  if (!positiveSemidefinite(matrix.map((row) => row.map((q) => q.toNumber())))) {
    return complaints.add(
      entry.at,
      field,
      'a matrix with a negative eigenvalue',
      'correlations that can occur together',
    );
  }
  return matrix;
}

/** Cholesky decomposition with the largest remaining diagonal element as pivot, up to ROUNDING. */
function positiveSemidefinite(a: number[][]): boolean {
  const left = new Set(a.keys());
  while (left.size > 0) {
    let p = -1;
    for (const i of left) if (p < 0 || a[i]![i]! > a[p]![p]!) p = i;
    const pivot = a[p]![p]!;
    if (pivot <= ROUNDING) {
      // What is left must vanish: |a_ij|² <= a_ii a_jj.
      for (const i of left) for (const j of left) if (Math.abs(a[i]![j]!) > ROUNDING) return false;
      return true;
    }
    left.delete(p);
    for (const i of left) {
      const factor = a[i]![p]! / pivot;
      for (const j of left) a[i]![j]! -= factor * a[p]![j]!;
    }
    for (const i of left) if (a[i]![i]! < -ROUNDING) return false;
  }
  return true;
}
