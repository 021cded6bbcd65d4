/**
 * @module Borel sums of a contour quantity: the lateral sums of D at the couplings of the circle, under the integral.
 *
 *   δ_± = (1/2πi) ∮ dx/x W(x) S_±(x(−s));   PV = Re δ_+,   Im above = Im δ_+.
 *
 * S_+ on the lower half of the circle is the conjugate of S_− on the upper one, so that with S_− = below and
 * S_+ = below + 2i·half on the upper half
 *   PV = (1/π) Re ∫_0^π W (below + i·half),   Im = (1/π) Re ∫_0^π W half.
 * Contour-improved perturbation theory has a Borel sum of its own (Hoang and Regner): at each point along the ray of the
 * coupling there, which on the upper half is the lower lateral sum: (1/π) Re ∫_0^π W below. It is another number.
 *
 * Reference  M. Beneke, M. Jamin, JHEP 09 (2008) 044, arXiv:0806.3156 (the sum; its 0.2371 ± 0.0060 i is reproduced);
 *            A. H. Hoang, C. Regner, arXiv:2008.00578 and 2105.11222 (the sum of CIPT; from memory, re-derived).
 */
import { C, R } from '../numerics/index.js';
import type { Ball, Complex, Exact } from '../numerics/index.js';
import type { Refusal } from '../qcd/index.js';
import type { ContourOrigin } from '../series/index.js';
import { circleIntegrals } from './integrate.js';
import type { LateralSum } from './model.js';

export interface ContourBorel {
  readonly pv: Ball;
  /** Of the upper lateral sum. */
  readonly imaginary: Ball;
  /** Along the ray of the coupling at each point: what the contour-improved series tends to. */
  readonly improved: Ball;
}

/** The sums of D = x^p F(x), without factor and additive part. */
export function contourBorel(
  origin: ContourOrigin,
  x: Exact,
  lateral: LateralSum,
  digits: number,
): ContourBorel | Refusal {
  const parts = circleIntegrals(
    origin,
    x,
    (point, prec) => {
      const { below, half } = lateral(point.x, prec);
      let weight = point.weight;
      for (let k = 0; k < origin.power; k++) weight = C.mul(weight, point.x, prec);
      const middle: Complex = { re: R.sub(below.re, half.im, prec), im: R.add(below.im, half.re, prec) };
      return [middle, half, below].map((v) => C.mul(weight, v, prec));
    },
    digits,
  );
  if ('reason' in parts) return parts;
  const [pv = R.INDETERMINATE, imaginary = R.INDETERMINATE, improved = R.INDETERMINATE] = parts;
  return { pv, imaginary, improved };
}
