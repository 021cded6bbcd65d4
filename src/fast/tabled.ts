/**
 * @module Sums Σ_i w_i f_i(x) of fixed functions with weights that a coefficient list decides: tabled once, contracted for each list.
 *
 * Method     Chebyshev coefficients of all f_i on [FROM, TO] times the central x, of one degree: the first at which the last two of each
 *            fall below TAIL of its size. A list contracts the table to one row; a value is then one Clenshaw sum.
 * Bound      about TAIL of the largest w_i f_i; see the tests of the kernels. Outside of the range there is no value.
 * Reference  L. N. Trefethen, Approximation Theory and Approximation Practice (2013), ch. 3 (memory).
 */

/** Range in units of the central x, and the degrees tried; heuristics. */
export const TABLED = { from: 0.5, to: 1.7 } as const;
const DEGREES = [16, 24, 32, 40];
const TAIL = 1e-15;

/** Chebyshev points on [from, to], and the matrix that turns values there into coefficients. */
export class ChebyshevLine {
  readonly degree: number;
  readonly points: Float64Array;
  /** Row k: weights of the values in coefficient k. */
  readonly rows: readonly Float64Array[];
  private readonly from: number;
  private readonly to: number;

  constructor(degree: number, from: number, to: number) {
    this.degree = degree;
    this.from = from;
    this.to = to;
    const cos = (i: number): number => Math.cos((Math.PI * (i % (2 * degree))) / degree);
    this.points = Float64Array.from({ length: degree + 1 }, (_, j) => from + ((to - from) * (cos(j) + 1)) / 2);
    const isEnd = (j: number): boolean => j === 0 || j === degree;
    this.rows = Array.from({ length: degree + 1 }, (_, k) =>
      Float64Array.from(
        { length: degree + 1 },
        (_value, j) => (cos(j * k) * (isEnd(j) ? 0.5 : 1) * (isEnd(k) ? 1 : 2)) / degree,
      ),
    );
  }

  /** Σ_k c_k T_k at x; NaN outside the range. */
  at(c: Float64Array, x: number): number {
    const s = (2 * x - this.from - this.to) / (this.to - this.from);
    if (!(Math.abs(s) <= 1)) return NaN;
    let b1 = 0;
    let b2 = 0;
    for (let k = c.length - 1; k >= 1; k--) {
      const b = 2 * s * b1 - b2 + c[k]!;
      b2 = b1;
      b1 = b;
    }
    return s * b1 - b2 + c[0]!;
  }
}

export class TabledSums {
  private readonly line: ChebyshevLine | undefined;
  /** Row i: the coefficients of f_i. */
  private readonly table: readonly Float64Array[];
  private readonly contracted: Float64Array;

  /** @param values all f_i at x, into `out` */
  constructor(count: number, values: (x: number, out: Float64Array) => void, X: number) {
    const found = tableOf(count, values, X);
    this.line = found?.line;
    this.table = found?.table ?? [];
    this.contracted = new Float64Array((found?.line.degree ?? 0) + 1);
  }

  /** Takes the weights w_i. */
  contract(weights: Float64Array): void {
    const { contracted, table } = this;
    contracted.fill(0);
    for (let i = 0; i < table.length; i++) {
      const row = table[i]!;
      const w = weights[i]!;
      for (let k = 0; k < row.length; k++) contracted[k]! += w * row[k]!;
    }
  }

  /** Σ_i w_i f_i(x); NaN outside the range, or where the functions could not be tabled. */
  at(x: number): number {
    return this.line === undefined ? NaN : this.line.at(this.contracted, x);
  }
}

function tableOf(
  count: number,
  values: (x: number, out: Float64Array) => void,
  X: number,
): { readonly line: ChebyshevLine; readonly table: readonly Float64Array[] } | undefined {
  for (const degree of DEGREES) {
    const line = new ChebyshevLine(degree, TABLED.from * X, TABLED.to * X);
    const samples = Array.from(line.points, (x) => {
      const out = new Float64Array(count);
      values(x, out);
      return out;
    });
    const table = Array.from({ length: count }, (_, i) =>
      Float64Array.from(line.rows, (row) => row.reduce((sum, weight, j) => sum + weight * samples[j]![i]!, 0)),
    );
    const settled = table.every((row, i) => {
      const size = samples.reduce((most, out) => Math.max(most, Math.abs(out[i]!)), 0);
      return Math.max(Math.abs(row[degree]!), Math.abs(row[degree - 1]!)) <= TAIL * size;
    });
    if (settled) return { line, table };
  }
  return undefined;
}
