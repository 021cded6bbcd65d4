/**
 * @module Singularity model of a Borel transform: stated branch points with free strengths, plus a polynomial.
 *
 *   B(t) = Σ_{i<J} N_i (1 − t/t_i)^{−γ_i} [1 + c_{i1}(1 − t/t_i) + …] + Σ_{k<=N−J−1} d_k t^k/k!
 *
 * The last J of the N known coefficients fix the strengths (a J×J linear system), the polynomial restores the lower ones
 * exactly. Strengths given beforehand are subtracted first.
 * Reference: M. Beneke, M. Jamin, JHEP 09 (2008) 044, arXiv:0806.3156, sec. 5–6 (method; its published numbers are
 * reproduced in the tests).
 */
import { R, solveBall } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import type { Branch } from './branch.js';
import { branchCoefficients, branchSum } from './branch.js';
import type { LaplaceSum } from './laplace.js';

export interface ModelSingularity extends Branch {
  /** Strength known beforehand: not fitted. */
  readonly strength?: Exact;
}

export interface ModelFit {
  readonly strengths: readonly Ball[];
  /** d_k in the normalisation Σ d_k x^k of the sum (that is, the remaining part of c_k). */
  readonly polynomial: readonly Ball[];
  /** Share of each singularity in the last known coefficient. */
  readonly shares: readonly number[];
}

export interface ModelSum extends LaplaceSum {
  readonly fit: ModelFit;
  /** Imaginary part of each singularity's own sum. */
  readonly imaginaryParts: readonly Ball[];
}

/**
 * Fits the strengths to the coefficients. Undefined when there are not more coefficients than unknown strengths, or the
 * linear system cannot be solved at this precision.
 */
export function fitModel(
  c: readonly Exact[],
  singularities: readonly ModelSingularity[],
  prec: number,
): ModelFit | undefined {
  const N = c.length;
  const columns = singularities.map((s) => branchCoefficients(s, N).map((e) => e.ball(prec)));
  const rest = c.map((cn, n) =>
    singularities.reduce<Ball>(
      (acc, s, i) =>
        s.strength === undefined ? acc : R.sub(acc, R.mul(s.strength.ball(prec), columns[i]![n]!, prec), prec),
      cn.ball(prec),
    ),
  );
  const free = singularities.flatMap((s, i) => (s.strength === undefined ? [i] : []));
  const J = free.length;
  if (N < J + 1) return undefined;
  // Rows are scaled by the first free column so that pivots compare like with like over many orders of magnitude.
  const rows = Array.from({ length: J }, (_, r) => N - J + r);
  const matrix = rows.map((n) => free.map((i) => columns[i]![n]!));
  const solved =
    J === 0
      ? []
      : solveBall(
          matrix,
          rows.map((n) => rest[n]!),
          prec,
        );
  if (solved === undefined || solved.some((s) => !(s.rad < Infinity))) return undefined;
  const strengths = singularities.map((s, i) => s.strength?.ball(prec) ?? solved[free.indexOf(i)]!);
  const polynomial = Array.from({ length: N - J }, (_, n) =>
    free.reduce<Ball>((acc, i) => R.sub(acc, R.mul(strengths[i]!, columns[i]![n]!, prec), prec), rest[n]!),
  );
  const last = R.toNumber(c[N - 1]!.ball(prec));
  const shares = strengths.map((s, i) => R.toNumber(R.mul(s, columns[i]![N - 1]!, prec)) / last);
  return { strengths, polynomial, shares };
}

/** Principal value and imaginary part of the model at x > 0. */
export function modelSum(
  c: readonly Exact[],
  singularities: readonly ModelSingularity[],
  x: Ball,
  prec: number,
): ModelSum | undefined {
  const fit = fitModel(c, singularities, prec);
  if (fit === undefined) return undefined;
  let pv: Ball = R.ZERO;
  let im: Ball = R.ZERO;
  const imaginaryParts = singularities.map((s, i) => {
    const part = branchSum(s, x, prec);
    const own = R.mul(fit.strengths[i]!, part.im, prec);
    pv = R.add(pv, R.mul(fit.strengths[i]!, part.pv, prec), prec);
    im = R.add(im, own, prec);
    return own;
  });
  let weight: Ball = R.ONE;
  fit.polynomial.forEach((d, k) => {
    if (k > 0) weight = R.mul(weight, x, prec);
    pv = R.add(pv, R.mul(d, weight, prec), prec);
  });
  return { pv, im, fit, imaginaryParts };
}
