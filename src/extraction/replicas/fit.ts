/**
 * @module Least χ² of one replica: Gauss–Newton steps from a start that is nearly right.
 *
 * Method     χ² = |L⁻¹ (X − X(p))|², derivatives by forward differences at every step, one or two parameters in closed form.
 * Bound      ends where a step changes every parameter by less than SETTLED of itself.
 */

/** X(p) into `out`; false where the theory has no value. */
export type TheoryVector = (p: Float64Array, out: Float64Array) => boolean;

const STEPS = 30;
const SETTLED = 1e-10;
const DIFFERENCE = 2 ** -22;

export class FitWork {
  private readonly whitening: readonly (readonly number[])[];
  private readonly here: Float64Array;
  private readonly there: Float64Array;
  private readonly residual: Float64Array;
  private readonly columns: readonly Float64Array[];

  constructor(data: number, parameters: number, whitening: readonly (readonly number[])[]) {
    this.whitening = whitening;
    this.here = new Float64Array(data);
    this.there = new Float64Array(data);
    this.residual = new Float64Array(data);
    this.columns = Array.from({ length: parameters }, () => new Float64Array(data));
  }

  /** L⁻¹ v, in place from the last row up. */
  private whiten(v: Float64Array): void {
    for (let i = v.length - 1; i >= 0; i--) {
      const row = this.whitening[i]!;
      let sum = 0;
      for (let j = 0; j <= i; j++) sum += row[j]! * v[j]!;
      v[i] = sum;
    }
  }

  /** Moves p to the minimum for the measured values; false when it does not settle inside the ranges. */
  minimise(
    theory: TheoryVector,
    measured: Float64Array,
    p: Float64Array,
    from: readonly number[],
    to: readonly number[],
  ): boolean {
    const { here, there, residual, columns } = this;
    for (let step = 0; step < STEPS; step++) {
      if (!theory(p, here)) return false;
      for (let i = 0; i < here.length; i++) residual[i] = measured[i]! - here[i]!;
      this.whiten(residual);
      for (let k = 0; k < p.length; k++) {
        const central = p[k]!;
        const h = Math.abs(central) * DIFFERENCE;
        p[k] = central + h;
        const stands = theory(p, there);
        p[k] = central;
        if (!stands) return false;
        const column = columns[k]!;
        for (let i = 0; i < here.length; i++) column[i] = (there[i]! - here[i]!) / h;
        this.whiten(column);
      }
      const moved = this.move(p);
      if (!p.every((value, k) => value >= from[k]! && value <= to[k]!)) return false;
      if (moved <= SETTLED) return true;
    }
    return false;
  }

  /** Adds (JᵀJ)⁻¹ Jᵀ r to p; the largest relative change. */
  private move(p: Float64Array): number {
    const [a, b] = this.columns;
    const r = this.residual;
    if (a === undefined) return NaN;
    const aa = dot(a, a);
    const ar = dot(a, r);
    if (b === undefined) {
      const step = ar / aa;
      p[0]! += step;
      return Math.abs(step / p[0]!);
    }
    const [ab, bb, br] = [dot(a, b), dot(b, b), dot(b, r)];
    const determinant = aa * bb - ab * ab;
    const first = (ar * bb - br * ab) / determinant;
    const second = (aa * br - ab * ar) / determinant;
    p[0]! += first;
    p[1]! += second;
    return Math.max(Math.abs(first / p[0]!), Math.abs(second / p[1]!));
  }
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += a[i]! * b[i]!;
  return sum;
}
