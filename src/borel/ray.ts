/**
 * @module Lateral Laplace sums by quadrature along a rotated ray.
 *
 * Purpose    S₊ = ∫_0^{∞e^{iθ}} e^{−s} B(x s) ds for Borel transforms without a closed-form sum: the contour passes above the
 *            singularities on the positive axis and below all others.
 * Method     double-exponential rule (ray-nodes.ts) at steps h, h/2, h/4, …. The error of the trapezoidal rule is C q^{1/h}:
 *            two differences d₁, d₂ of successive levels fix C and q, and the newest level is off by about d₂³/d₁².
 *            Where the imaginary part is small (the first singularity is far, ω = t* / x ≫ 1) it is computed from a ray that
 *            starts at a point p < ω of the axis: ∫_0^p is real and drops out, and e^{−p} is a factor.
 *            Up to 24 digits the nodes are summed in double-double arithmetic (ray-quick.ts), a tenth of the cost of balls.
 * Bound      none that is proved: the radius is SAFETY times the larger of d₂³/d₁² and d₂²/|I| (or d₂ itself, where that is
 *            small enough), plus the rounding errors. Such digits are converged, not certified.
 * Reference  M. Mori, M. Sugihara, J. Comput. Appl. Math. 127 (2001) 287 (from memory).
 */
import { C, exp, R } from '../numerics/index.js';
import type { Ball, Complex } from '../numerics/index.js';
import type { LaplaceSum } from './laplace.js';
import { quadratureBits, refine, sweep } from './ray-levels.js';
import type { Level } from './ray-levels.js';
import { AXIS, rayNodes, RAYS } from './ray-nodes.js';
import type { Ray } from './ray-nodes.js';
import { quickIntegral } from './ray-quick.js';
import type { QuickIntegrand } from './ray-quick.js';

/** Values of the Borel transforms at t = x s, several at once because they share work. */
export type RayIntegrand = (s: Complex, prec: number) => readonly Complex[];

/** Digits of an imaginary part that is computed apart. */
const IMAGINARY_DIGITS = 12;
/** Spare bits of the working precision. */
const SPARE = 24;
/** Share of the angle to the next singularity above, and multiple of the one below, that a ray must respect. Heuristic. */
const BELOW_NEXT = 0.7;
const ABOVE_LAST = 1.6;

export interface RayChoice {
  readonly ray: Ray;
  /** Complex singularities under the ray: the contour is lifted over them. */
  readonly lifted: number;
}

/**
 * The steepest offered ray that keeps clear of singularities with the given arguments (0 < arg <= π): below all of them, or,
 * with `liftUpTo`, above those with smaller arguments than that.
 */
export function chooseRay(args: readonly number[], liftUpTo = 0): RayChoice | undefined {
  const choices = RAYS.map((ray) => ({
    ray,
    under: args.filter((a) => a < ray.angle),
    over: args.filter((a) => a >= ray.angle),
  }))
    .filter(
      ({ ray, under, over }) =>
        over.every((a) => ray.angle <= BELOW_NEXT * a) &&
        under.every((a) => a < liftUpTo && ray.angle >= ABOVE_LAST * a),
    )
    .map(({ ray, under }) => ({ ray, lifted: under.length }));
  return choices.find((c) => c.lifted === 0) ?? choices[0];
}

/** One level of the trapezoidal sum in balls; undefined when it does not converge. */
function ballLevel(f: RayIntegrand, ray: Ray, origin: Ball, prec: number): Level {
  const nodes = rayNodes(ray, prec);
  return (steps, odd) => {
    let sums: Complex[] = [];
    let largest: number[] = [];
    const visit = (j: number): 'negligible' | 'counts' | 'fails' => {
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
    return sweep(visit, steps, odd) ? sums : undefined;
  };
}

/**
 * ∫ e^{−s} f(s + origin) ds along the ray, to `digits` digits of the larger of the two parts, one result for each
 * component of f. Undefined when f cannot be evaluated, the integral does not converge, or the levels do not settle.
 */
export function rayIntegral(
  f: RayIntegrand,
  ray: Ray,
  digits: number,
  origin: Ball = R.ZERO,
): readonly Complex[] | undefined {
  const bits = quadratureBits(digits);
  const prec = 32 * Math.ceil((bits + SPARE) / 32);
  return refine(ballLevel(f, ray, origin, prec), ray, bits, prec);
}

/** How the contour runs. */
export interface Contour {
  readonly ray: Ray;
  /** First singularity on (or lifted over next to) the positive axis, over x; absent when the sum is real. */
  readonly first?: number;
}

/** The positive axis, for transforms without singularities near it. */
export const STRAIGHT: Contour = { ray: AXIS };

/** What is integrated: in balls, and where it can be had in double-double arithmetic too. */
export interface Integrand {
  readonly balls: RayIntegrand;
  readonly quick?: QuickIntegrand;
}

/** By the quick way while it has the digits, else in balls. */
function integral(f: Integrand, ray: Ray, digits: number, origin: Ball = R.ZERO): readonly Complex[] | undefined {
  const quick = f.quick === undefined ? undefined : quickIntegral(f.quick, ray, digits, origin);
  return quick ?? rayIntegral(f.balls, ray, digits, origin);
}

/** Lateral sums of several Borel transforms with one contour; undefined when the levels do not settle. */
export function lateralSums(f: Integrand, contour: Contour, digits: number): readonly LaplaceSum[] | undefined {
  const direct = integral(f, contour.ray, digits);
  if (direct === undefined) return undefined;
  if (contour.first === undefined) return direct.map((v) => ({ pv: v.re, im: R.ZERO }));
  const sharp = direct.every((v) => R.accuracyBits(v.im) >= IMAGINARY_DIGITS * 3.33);
  if (sharp) return direct.map((v) => ({ pv: v.re, im: v.im }));
  const apart = imaginaryParts(f, contour.ray, contour.first);
  return direct.map((v, i) => ({ pv: v.re, im: apart?.[i] ?? v.im }));
}

/** Imaginary parts from a ray that leaves the axis shortly before the first singularity. */
function imaginaryParts(f: Integrand, ray: Ray, first: number): readonly Ball[] | undefined {
  const p = R.fromNumber(Math.max(first / 2, first - 1));
  const found = integral(f, ray, IMAGINARY_DIGITS, p);
  const decay = exp(R.neg(p), 64);
  return found?.map((v) => R.mul(decay, v.im, 64));
}
