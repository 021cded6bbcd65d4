/**
 * @module Double-exponential quadrature: finite segments with singular ends, and rays.
 *
 * Purpose    integrands that are analytic inside and may be singular at the ends; exponential decay along a ray.
 * Method     trapezoidal sums after x = tanh(π/2 sinh t) on a segment, x = exp(t − e^−t) on a ray with exponential decay. The step is halved until
 *            the estimate meets the goal; old nodes are kept.
 * Bound      none proved: halving the step squares the error, so with d the last difference and I the value the newest level is off by about
 *            d²/|I|; the radius is 2^SAFETY times that, or d itself where the difference no longer falls. Converged.
 * Reference  H. Takahasi, M. Mori, Publ. RIMS 9 (1974) 721; M. Mori, M. Sugihara, J. Comput. Appl. Math. 127 (2001) 287 (both from memory).
 */
import { pi } from '../ball/constants.js';
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import { exp } from '../ball/elementary.js';
import { divMag, magBits, mulMag, widenMag } from '../ball/mag.js';
import type { Mag } from '../ball/mag.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import { modulusLower, modulusUpper } from '../special/spread.js';
import type { Integral } from './types.js';

/** The integrand at z; `left` and `right` are z − a and b − z to full relative accuracy (on a ray `left` is z, `right` unused). */
export type EndIntegrand = (z: Complex, prec: number, left: Complex, right: Complex) => Complex;

const SAFETY = 10;
const LEVELS = 12;
/** Terms in a row below the goal that end a side. */
const QUIET = 4;
/** No node beyond |t| = 8: e^(−e^8) is below 2^-4000. */
const REACH = 8;

/** ∫_a^b f over the segment from a to b. */
export function tanhSinh(f: EndIntegrand, a: Complex, b: Complex, prec: number): Integral {
  const work = prec + 24;
  const length = C.sub(b, a, work);
  const half = R.mul2exp(pi(work), -1);
  return levels(prec, (t) => {
    const et = exp(R.abs(t), work);
    const inverse = R.div(R.ONE, et, work);
    const u = R.mul(half, R.sub(et, inverse, work), work); // 2·(π/2) sinh|t|
    const e = exp(R.neg(u), work);
    const below = R.add(R.ONE, e, work);
    const near = C.mulReal(length, R.div(e, below, work), work); // distance from the nearer end
    const far = C.mulReal(length, R.div(R.ONE, below, work), work);
    const [left, right] = t.mid < 0n ? [near, far] : [far, near];
    const z = t.mid < 0n ? C.add(a, left, work) : C.sub(b, right, work);
    // dz/dt = length·(π/2) cosh t·2e/(1+e)²
    const slope = R.div(R.mul(R.mul(half, R.add(et, inverse, work), work), e, work), R.sqr(below, work), work);
    return C.mul(f(z, work, left, right), C.mulReal(length, slope, work), work);
  });
}

/** ∫_0^{∞·direction} f for integrands that decay like an exponential along the ray. */
export function expRay(f: EndIntegrand, direction: Complex, prec: number): Integral {
  const work = prec + 24;
  return levels(prec, (t) => {
    const e = exp(R.neg(t), work);
    const x = exp(R.sub(t, e, work), work);
    const z = C.mulReal(direction, x, work);
    const weight = C.mulReal(z, R.add(R.ONE, e, work), work);
    return C.mul(f(z, work, z, z), weight, work);
  });
}

/** Trapezoidal sums with steps 1/2, 1/4, … */
function levels(prec: number, node: (t: Ball) => Complex): Integral {
  const work = prec + 24;
  let evaluations = 0;
  let sum: Complex = C.ZERO;
  let value: Complex = C.ZERO;
  let last: Mag = { m: Infinity, e: 0 };
  for (let level = 1; level <= LEVELS; level++) {
    for (const side of [1, -1]) {
      let quiet = 0;
      for (
        let k = level === 1 ? (side > 0 ? 0 : 1) : 1;
        k <= REACH << level && quiet < QUIET;
        k += level === 1 ? 1 : 2
      ) {
        const term = node(R.ball(BigInt(side * k), -level));
        evaluations++;
        if (!(modulusUpper(term).m < Infinity)) return { value: C.INDETERMINATE, standing: 'converged', evaluations };
        sum = C.add(sum, term, work);
        quiet = C.upperBits(term) < C.upperBits(sum) - prec - 16 ? quiet + 1 : 0;
      }
    }
    const next = C.mul2exp(sum, -level);
    const difference = modulusUpper(C.exactMid(C.sub(next, value, work)));
    value = next;
    if (level >= 3) {
      const size = modulusLower(C.exactMid(value));
      const falling = magBits(difference) < magBits(last) - 2;
      const error = falling && size.m > 0 ? scaled(divMag(mulMag(difference, difference), size)) : difference;
      if (error.m === 0 || magBits(error) < C.upperBits(value) - prec || level === LEVELS) {
        const wide: Complex = { re: widenMag(value.re, error), im: widenMag(value.im, error) };
        return { value: C.round(wide, prec), standing: 'converged', evaluations };
      }
    }
    last = difference;
  }
  return { value: C.INDETERMINATE, standing: 'converged', evaluations };
}

const scaled = (x: Mag): Mag => ({ m: x.m, e: x.e + SAFETY });
