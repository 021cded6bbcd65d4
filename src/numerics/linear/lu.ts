/**
 * @module LU factorisation with row pivoting over any number field.
 *
 * Purpose    small dense systems: Padé denominators, fits, Hermite–Padé null vectors; the same code for exact numbers,
 *            balls and doubles.
 * Method     Gaussian elimination; the pivot is the largest entry of its column among those that are certainly not
 *            zero, by `toNumber`. A column without such an entry ends the factorisation: `singular` when every entry is
 *            certainly zero, `undecided` when balls hold zero.
 * Bound      that of the field: exact, enclosed, or rounded (backward error <= about n³·2^-53·growth in doubles).
 * Reference  G. H. Golub, C. F. Van Loan, "Matrix Computations", section 3.4; N. J. Higham, "Accuracy and Stability of
 *            Numerical Algorithms", chapter 9.
 */
import type { Field } from '../field.js';

export type Matrix<T> = readonly (readonly T[])[];

export interface Factorisation<T> {
  readonly kind: 'regular';
  /** Unit lower and upper factor in one array, rows in pivot order. */
  readonly rows: T[][];
  /** rows[i] was row order[i] of the matrix. */
  readonly order: number[];
  readonly oddPermutation: boolean;
}

export type LuResult<T> = Factorisation<T> | { readonly kind: 'singular' | 'undecided'; readonly column: number };

/** Factors a square matrix. Throws RangeError when it is not square. */
export function lu<T>(field: Field<T>, a: Matrix<T>): LuResult<T> {
  const n = a.length;
  const rows = a.map((row) => {
    if (row.length !== n) throw new RangeError(`lu: a row of ${row.length} entries in a matrix of ${n} rows`);
    return row.slice();
  });
  const order = Array.from({ length: n }, (_, i) => i);
  let oddPermutation = false;
  for (let k = 0; k < n; k++) {
    const best = pivotRow(field, rows, k);
    if (best < 0) {
      const certain = rows.slice(k).every((row) => field.isZero(row[k]!));
      return { kind: certain ? 'singular' : 'undecided', column: k };
    }
    if (best !== k) {
      [rows[k], rows[best]] = [rows[best]!, rows[k]!];
      [order[k], order[best]] = [order[best]!, order[k]!];
      oddPermutation = !oddPermutation;
    }
    const top = rows[k]!;
    const pivot = top[k]!;
    for (let i = k + 1; i < n; i++) {
      const row = rows[i]!;
      if (field.isZero(row[k]!)) continue;
      const factor = field.div(row[k]!, pivot);
      row[k] = factor;
      for (let j = k + 1; j < n; j++) row[j] = field.sub(row[j]!, field.mul(factor, top[j]!));
    }
  }
  return { kind: 'regular', rows, order, oddPermutation };
}

/** Row of the largest certainly non-zero entry in column k from row k on; −1 when there is none. */
function pivotRow<T>(field: Field<T>, rows: readonly T[][], k: number): number {
  let best = -1;
  let size = -1;
  for (let i = k; i < rows.length; i++) {
    const entry = rows[i]![k]!;
    if (!field.isNonZero(entry)) continue;
    const s = Math.abs(field.toNumber(entry));
    if (s > size) [best, size] = [i, s];
  }
  return best;
}

/** Solution of A x = b from the factors of A. */
export function solveFactored<T>(field: Field<T>, f: Factorisation<T>, b: readonly T[]): T[] {
  const n = f.rows.length;
  const x: T[] = f.order.map((i) => b[i]!);
  for (let i = 0; i < n; i++) {
    for (let j = 0; j < i; j++) x[i] = field.sub(x[i]!, field.mul(f.rows[i]![j]!, x[j]!));
  }
  for (let i = n - 1; i >= 0; i--) {
    for (let j = i + 1; j < n; j++) x[i] = field.sub(x[i]!, field.mul(f.rows[i]![j]!, x[j]!));
    x[i] = field.div(x[i]!, f.rows[i]![i]!);
  }
  return x;
}

/** x with A x = b; undefined when no pivot is certainly non-zero somewhere. */
export function solveField<T>(field: Field<T>, a: Matrix<T>, b: readonly T[]): T[] | undefined {
  const f = lu(field, a);
  return f.kind === 'regular' ? solveFactored(field, f, b) : undefined;
}

/** Determinant: exact or enclosed; undefined when elimination cannot decide on a pivot. */
export function determinantField<T>(field: Field<T>, a: Matrix<T>): T | undefined {
  const f = lu(field, a);
  if (f.kind !== 'regular') return f.kind === 'singular' ? field.zero : undefined;
  const product = f.rows.reduce((acc, row, i) => field.mul(acc, row[i]!), field.one);
  return f.oddPermutation ? field.neg(product) : product;
}
