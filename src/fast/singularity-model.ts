/**
 * @module Singularity model in doubles: strengths and polynomial linear in the coefficients, branch sums in closed form.
 *
 *   N_i = Σ_n S_in c_n + S_i,  d_k = Σ_n P_kn c_n + P_k  (the fit of borel/model.ts, made beforehand in enclosures),
 *   F = Σ_i N_i Σ_k c_ik ω F_{γ_i−1−k}(ω) + Σ_k d_k x^k,  ω = |t_i|/x  (G in place of F for t_i < 0).
 * The sums over k depend on x alone and are tabled.
 */
import { branchAlternatingDouble, branchSameDouble } from '../numerics/index.js';
import type { Kernel } from './kernel.js';
import { partialSum } from './kernel.js';
import { TabledSums } from './tabled.js';

/** A quantity linear in the coefficients, and what it is without any. */
export interface Affine {
  readonly slopes: readonly number[];
  readonly constant: number;
}

export interface SingularityModelSetting {
  readonly kind: 'singularity-model';
  readonly points: readonly {
    readonly t: number;
    readonly exponent: number;
    /** c_1, c_2, … */
    readonly corrections: readonly number[];
    readonly strength: Affine;
  }[];
  readonly polynomial: readonly Affine[];
  /** Central value of x. */
  readonly x: number;
}

function at({ slopes, constant }: Affine, c: Float64Array): number {
  let sum = constant;
  for (let n = 0; n < slopes.length; n++) sum += slopes[n]! * c[n]!;
  return sum;
}

export function singularityModelKernel({ points, polynomial, x: X }: SingularityModelSetting): Kernel {
  const strengths = new Float64Array(points.length);
  const d = new Float64Array(polynomial.length);
  const branches = points.map(({ t, exponent, corrections }) => ({
    size: Math.abs(t),
    positive: t > 0,
    first: exponent - 1,
    weights: Float64Array.of(1, ...corrections),
  }));
  /** Σ_k c_ik ω F(ω) of the i-th singularity. */
  const shape = (i: number, x: number): number => {
    const { size, positive, first, weights } = branches[i]!;
    const w = size / x;
    let sum = 0;
    for (let k = 0; k < weights.length; k++)
      sum += weights[k]! * (positive ? branchSameDouble(first - k, w).pv : branchAlternatingDouble(first - k, w));
    return w * sum;
  };
  const shapes = new TabledSums(
    points.length,
    (x, out) => {
      for (let i = 0; i < out.length; i++) out[i] = shape(i, x);
    },
    X,
  );
  const needed = Math.max(0, ...polynomial.map((p) => p.slopes.length));
  return {
    prepare(c) {
      if (c.length < needed) return false;
      points.forEach((p, i) => {
        strengths[i] = at(p.strength, c);
      });
      polynomial.forEach((p, k) => {
        d[k] = at(p, c);
      });
      shapes.contract(strengths);
      return true;
    },
    value(x) {
      let sum = shapes.at(x);
      if (Number.isNaN(sum)) {
        sum = 0;
        for (let i = 0; i < branches.length; i++) sum += strengths[i]! * shape(i, x);
      }
      return sum + partialSum(d, d.length, x);
    },
  };
}
