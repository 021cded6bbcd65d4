/**
 * @module Contour-improved perturbation theory: the coupling runs along the circle, D is cut at a fixed power of it.
 *
 *   A_n = (1/2πi) ∮ dx/x W(x) x(−s)^n,   R = additive + factor Σ c_n A_(n+p).
 *
 * Reference  A. A. Pivovarov, Z. Phys. C 53 (1992) 461; F. Le Diberder, A. Pich, Phys. Lett. B 286 (1992) 147 (both from
 *            memory); numbers of M. Beneke, M. Jamin, arXiv:0806.3156, are reproduced in the tests.
 */
import { C, R } from '../numerics/index.js';
import type { Ball, Complex, Exact } from '../numerics/index.js';
import type { Refusal } from '../qcd/index.js';
import type { ContourOrigin } from '../series/index.js';
import { circleIntegrals } from './integrate.js';

/** A_p, A_(p+1), … for as many powers as D has coefficients. */
export function contourIntegrals(origin: ContourOrigin, x: Exact, digits: number): readonly Ball[] | Refusal {
  return circleIntegrals(
    origin,
    x,
    (point, prec) => {
      const list: Complex[] = [];
      let power = point.weight;
      for (let k = 0; k < origin.power + origin.coefficients.length; k++) {
        if (k >= origin.power) list.push(power);
        power = C.mul(power, point.x, prec);
      }
      return list;
    },
    // The last integrals are small beside the first, and their coefficients large.
    digits + GUARD_DIGITS,
  );
}

/** The integrals of high powers are resolved relative to a thousandth of the first; this makes up for it at usual orders. */
const GUARD_DIGITS = 6;

/** c_n A_(n+p), without factor and additive part. */
export function improvedTerms(origin: ContourOrigin, integrals: readonly Ball[], prec: number): readonly Ball[] {
  return origin.coefficients.map((c, n) => R.mul(c.ball(prec), integrals[n]!, prec));
}
