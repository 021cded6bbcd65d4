/**
 * @module Lateral sums of one Borel–Padé approximant, with near-axis pairs treated apart.
 *
 * A conjugate pair z = |z|e^{±iφ} with small φ that only mimics a singularity on the axis adds half-residues to the
 * straight Laplace integral that the true lateral sum does not have. Lifting the contour over such poles gives
 * S₊ = straight − 2πi Σ Res; real and imaginary part of that are the lifted values. Both are reported.
 * Reference: residue theorem; checked against a rotated contour.
 */
import { C, R } from '../numerics/index.js';
import type { Ball, Rational } from '../numerics/index.js';
import type { Approximant, RatedPole } from './approximant.js';
import type { LaplaceSum } from './laplace.js';
import { crossingJump, laplace } from './laplace.js';

/** Upper poles with a smaller argument count as near the axis (radians; default of the method, heuristic). */
export const NEAR_AXIS_ANGLE = 0.6;

export interface RationalSum {
  readonly straight: LaplaceSum;
  /** Contour lifted over the near-axis poles; absent when there are none. */
  readonly lifted?: LaplaceSum;
}

/** Poles with Re z > 0 and 0 < arg z < NEAR_AXIS_ANGLE. */
export function nearAxisPoles(poles: readonly RatedPole[]): RatedPole[] {
  return poles.filter((p) => {
    if (p.real) return false;
    const { re, im } = C.toNumbers(p.z);
    return re > 0 && Math.abs(Math.atan2(im, re)) < NEAR_AXIS_ANGLE;
  });
}

/** Sums the approximant at x; poles marked as noise doublets are left out. */
export function rationalSum(a: Approximant, x: Ball, b: Rational, prec: number): RationalSum {
  const poles = a.poles.filter((p) => p.role !== 'noise doublet');
  const straight = laplace(a.polynomialPart, poles, x, b, prec);
  const near = nearAxisPoles(poles);
  if (near.length === 0) return { straight };
  let pv = straight.pv;
  let im = straight.im;
  for (const p of near) {
    const jump = crossingJump(p, x, b, prec);
    pv = R.add(pv, jump.re, prec);
    im = R.add(im, jump.im, prec);
  }
  return { straight, lifted: { pv, im } };
}
