/**
 * @module Lateral Laplace sums by quadrature along a rotated ray.
 *
 * Purpose    S₊ = ∫_0^{∞e^{iθ}} e^{−s} B(x s) ds for Borel transforms without a closed-form sum: the contour passes above the
 *            singularities on the positive axis and below all others.
 * Method     double-exponential rule (ray-nodes.ts) at a step h and at h/2, refined until two levels agree to the digits
 *            wanted. Where the imaginary part is small (the first singularity is far, ω = t*​/x ≫ 1) it is computed from a ray
 *            that starts at a point p < ω of the axis: ∫_0^p is real and drops out, and e^{−p} is a factor.
 * Bound      none that is proved: the radius is the difference of the last two levels plus the rounding errors. Such digits
 *            are converged, not certified.
 * Reference  M. Mori, M. Sugihara, J. Comput. Appl. Math. 127 (2001) 287 (from memory).
 */
import { C, exp, R } from '../numerics/index.js';
import type { Ball, Complex } from '../numerics/index.js';
import type { LaplaceSum } from './laplace.js';
import { AXIS, rayNodes, RAYS, stepsFor } from './ray-nodes.js';
import type { Ray } from './ray-nodes.js';

/** Values of the Borel transforms at t = x s, several at once because they share work. */
export type RayIntegrand = (s: Complex, prec: number) => readonly Complex[];

/** Digits of an imaginary part that is computed apart. */
const IMAGINARY_DIGITS = 12;
/** Refinements of the step after the first level. */
const LEVELS = 4;
/** Nodes in a row that must be negligible before a side of the sum ends. */
const QUIET = 3;
/** |v| beyond which no node is used: r = e^{−50} or e^{12}. */
const LOW = -6;
const HIGH = 12;
/** Spare bits of the working precision. */
const SPARE = 24;
/** Fraction of the smallest argument of an off-axis singularity that the ray may use. Heuristic. */
const CLEARANCE = 0.7;

/** The steepest offered ray that keeps clear of singularities with arguments >= `smallestArgument` (0 < arg < π). */
export function rayBelow(smallestArgument: number): Ray | undefined {
  return RAYS.find((ray) => ray.angle <= CLEARANCE * smallestArgument);
}

/** Number of integrals from a first probe; one level of the trapezoidal sum, nodes j/steps with j odd only when `odd`. */
function level(
  f: RayIntegrand,
  ray: Ray,
  origin: Ball,
  steps: number,
  odd: boolean,
  prec: number,
): readonly Complex[] | undefined {
  const nodes = rayNodes(ray, prec);
  let sums: Complex[] = [];
  let largest: number[] = [];
  const add = (j: number): 'negligible' | 'counts' | 'fails' => {
    const { s, weight } = nodes.at(j, steps);
    const values = f(R.isExactZero(origin) ? s : { re: R.add(s.re, origin, prec), im: s.im }, prec);
    if (sums.length === 0) {
      sums = values.map(() => C.ZERO);
      largest = values.map(() => -Infinity);
    }
    let quiet = true;
    for (let i = 0; i < values.length; i++) {
      const term = C.mul(values[i]!, weight, prec);
      const size = C.upperBits(term);
      if (!(size < Infinity)) return 'fails';
      sums[i] = C.add(sums[i]!, term, prec);
      largest[i] = Math.max(largest[i]!, size);
      if (size > largest[i]! - prec) quiet = false;
    }
    return quiet ? 'negligible' : 'counts';
  };
  const first = odd ? 1 : 0;
  const stride = odd ? 2 : 1;
  for (const direction of [1, -1]) {
    const start = direction === 1 ? first : first - stride;
    let silent = 0;
    for (let j = start; silent < QUIET; j += direction * stride) {
      const v = j / steps;
      if (v > HIGH || v < LOW) {
        if (direction === 1) return undefined;
        break;
      }
      const outcome = add(j);
      if (outcome === 'fails') return undefined;
      silent = outcome === 'negligible' ? silent + 1 : 0;
    }
  }
  return sums;
}

/**
 * ∫ e^{−s} f(s + origin) ds along the ray, to `digits` digits of the larger of the two parts, one result for each
 * component of f. Undefined when f cannot be evaluated, the integral does not converge, or the levels do not agree.
 */
export function rayIntegral(
  f: RayIntegrand,
  ray: Ray,
  digits: number,
  origin: Ball = R.ZERO,
): readonly Complex[] | undefined {
  const bits = digits * 3.33;
  const prec = 32 * Math.ceil((bits + SPARE) / 32);
  let steps = stepsFor(ray, bits);
  let raw = level(f, ray, origin, steps, false, prec);
  if (raw === undefined) return undefined;
  let current = raw.map((sum) => overSteps(sum, steps, prec));
  for (let refinement = 0; refinement < LEVELS; refinement++) {
    const between = level(f, ray, origin, 2 * steps, true, prec);
    if (between === undefined) return undefined;
    steps *= 2;
    raw = raw.map((sum, i) => C.add(sum, between[i]!, prec));
    const next = raw.map((sum) => overSteps(sum, steps, prec));
    const settled = next.map((value, i) => withDifference(value, current[i]!, prec));
    if (settled.every((value) => C.accuracyBits(value) >= bits)) return settled;
    current = next;
  }
  return undefined;
}

const overSteps = (sum: Complex, steps: number, prec: number): Complex =>
  C.mulReal(sum, R.div(R.ONE, R.fromNumber(steps), prec), prec);

/** `value` with the difference from the level before in its radius. */
function withDifference(value: Complex, before: Complex, prec: number): Complex {
  return {
    re: R.widen(value.re, R.abs(R.sub(value.re, before.re, prec))),
    im: R.widen(value.im, R.abs(R.sub(value.im, before.im, prec))),
  };
}

/** Where the integrand is singular, in units of x. */
export interface Landscape {
  /** First singularity on the positive axis; absent when there is none. */
  readonly first?: number;
  /** Smallest argument of a singularity off the real axis in the right half plane (0 < arg < π); π when there is none. */
  readonly smallestArgument: number;
}

/** Lateral sums of several Borel transforms with one landscape; undefined when no ray serves or the levels do not agree. */
export function lateralSums(f: RayIntegrand, where: Landscape, digits: number): readonly LaplaceSum[] | undefined {
  if (where.first === undefined && where.smallestArgument > Math.PI / 2) {
    return rayIntegral(f, AXIS, digits)?.map((v) => ({ pv: v.re, im: R.ZERO }));
  }
  const ray = rayBelow(where.smallestArgument);
  if (ray === undefined) return undefined;
  const direct = rayIntegral(f, ray, digits);
  if (direct === undefined) return undefined;
  if (where.first === undefined) return direct.map((v) => ({ pv: v.re, im: R.ZERO }));
  const sharp = direct.every((v) => R.accuracyBits(v.im) >= IMAGINARY_DIGITS * 3.33);
  if (sharp) return direct.map((v) => ({ pv: v.re, im: v.im }));
  const apart = imaginaryParts(f, ray, where.first);
  return direct.map((v, i) => ({ pv: v.re, im: apart?.[i] ?? v.im }));
}

/** Imaginary parts from a ray that leaves the axis shortly before the first singularity. */
function imaginaryParts(f: RayIntegrand, ray: Ray, first: number): readonly Ball[] | undefined {
  const p = R.fromNumber(Math.max(first / 2, first - 1));
  const found = rayIntegral(f, ray, IMAGINARY_DIGITS, p);
  const decay = exp(R.neg(p), 64);
  return found?.map((v) => R.mul(decay, v.im, 64));
}
