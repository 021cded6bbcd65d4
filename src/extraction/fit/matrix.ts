/**
 * @module Small symmetric matrices in doubles: Cholesky factor, solution, inverse.
 *
 * Method     A = L Lᵀ row by row; a pivot not above `FLAT` times its diagonal element: A is not positive definite.
 * Reference  G. H. Golub, C. F. Van Loan, Matrix Computations, ch. 4 (from memory).
 */

export type Matrix = readonly (readonly number[])[];

/** A pivot below this share of its diagonal element is zero to rounding. */
const FLAT = 1e-12;

/** Lower triangular L with A = L Lᵀ; undefined when A is not positive definite. */
export function cholesky(a: Matrix): number[][] | undefined {
  const l: number[][] = [];
  for (let i = 0; i < a.length; i++) {
    const row: number[] = [];
    for (let j = 0; j <= i; j++) {
      const other = j === i ? row : (l[j] ?? []);
      let sum = a[i]?.[j] ?? 0;
      for (let k = 0; k < j; k++) sum -= (row[k] ?? 0) * (other[k] ?? 0);
      if (i === j) {
        if (!(sum > FLAT * Math.abs(a[i]?.[i] ?? 0))) return undefined;
        row.push(Math.sqrt(sum));
      } else row.push(sum / (l[j]?.[j] ?? NaN));
    }
    l.push(row);
  }
  return l;
}

/** L⁻¹ b. */
export function forward(l: Matrix, b: readonly number[]): number[] {
  const x: number[] = [];
  b.forEach((value, i) => {
    let sum = value;
    for (let k = 0; k < i; k++) sum -= (l[i]?.[k] ?? 0) * (x[k] ?? 0);
    x.push(sum / (l[i]?.[i] ?? NaN));
  });
  return x;
}

/** L⁻ᵀ b. */
function backward(l: Matrix, b: readonly number[]): number[] {
  const x = b.map(() => 0);
  for (let i = b.length - 1; i >= 0; i--) {
    let sum = b[i] ?? 0;
    for (let k = i + 1; k < b.length; k++) sum -= (l[k]?.[i] ?? 0) * (x[k] ?? 0);
    x[i] = sum / (l[i]?.[i] ?? NaN);
  }
  return x;
}

/** A⁻¹ b from the factor of A. */
export const solveWith = (l: Matrix, b: readonly number[]): number[] => backward(l, forward(l, b));

/** A⁻¹ from the factor of A. */
export function inverseOf(l: Matrix): number[][] {
  const columns = l.map((_, j) =>
    solveWith(
      l,
      l.map((__, i) => (i === j ? 1 : 0)),
    ),
  );
  return l.map((_, i) => columns.map((c) => c[i] ?? NaN));
}

/** Jᵀ J. */
export function gram(j: Matrix): number[][] {
  const n = j[0]?.length ?? 0;
  return Array.from({ length: n }, (_, a) =>
    Array.from({ length: n }, (__, b) => j.reduce((sum, row) => sum + (row[a] ?? 0) * (row[b] ?? 0), 0)),
  );
}

/** The correlation matrix of a covariance; entries of a vanishing variance are 0. */
export function correlationOf(c: Matrix): number[][] {
  return c.map((row, i) =>
    row.map((value, j) => {
      const size = Math.sqrt((c[i]?.[i] ?? 0) * (c[j]?.[j] ?? 0));
      return i === j ? 1 : size > 0 ? value / size : 0;
    }),
  );
}
