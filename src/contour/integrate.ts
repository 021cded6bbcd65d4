/**
 * @module Integrals over the circle, (1/2πi) ∮ dx/x f(x) with f(x̄) = conj f(x): (1/π) Re ∫_0^π dφ f(−e^{iφ}).
 *
 * Method     Gauss–Legendre rules with n and 3n/2 nodes on the upper half, n growing until they agree.
 * Bound      none that is proved: the error of an n-point rule falls like ρ^(−2n), so the larger rule is off by about
 *            (difference)^(3/2); the radius has the exponent 7/5 instead and a factor SAFETY. Digits are converged.
 */
import { C, R, cexp } from '../numerics/index.js';
import type { Ball, Complex, Exact } from '../numerics/index.js';
import type { Refusal } from '../qcd/index.js';
import { isRefusal, refuse } from '../qcd/index.js';
import type { ContourOrigin } from '../series/index.js';
import { couplingsOnCircle } from './circle.js';
import { arcNodes } from './gauss-legendre.js';

export interface CirclePoint {
  /** e^{iφ} = −x = −s/s_0. */
  readonly phase: Complex;
  readonly angle: Ball;
  /** W(x) and the coupling there. */
  readonly weight: Complex;
  readonly x: Complex;
}

/** Integrands at a point, several at once; the weight is theirs to use. */
export type CircleIntegrand = (point: CirclePoint, prec: number) => readonly Complex[];

const SAFETY = 8;
const ERROR_POWER = 1.4;
/** Digits that one more node brings at α_s = 0.34, and nodes for a polynomial of higher degree: where the search begins. */
const DIGITS_PER_NODE = 0.85;
const NODES_PER_DEGREE = 0.4;
const SPARE_NODES = 5;
/** Rules beyond this size are not tried. */
const MOST_NODES = 800;
const SPARE_BITS = 40;
/** Fewer digits than these are worked out with the nodes of these, which are then shared. */
const LEVELS = [12, 21, 36] as const;
/** Digits of a part that is zero, or nearly, beside the others are not waited for. */
const NEGLIGIBLE = 1e-3;

/** W(x) = Σ W_m x^m at x = −e^{iφ}. */
function weightAt(origin: ContourOrigin, phase: Complex, prec: number): Complex {
  const x = C.neg(phase);
  let sum: Complex = C.ZERO;
  for (let m = origin.integral.length - 1; m >= 0; m--)
    sum = C.add(C.mul(sum, x, prec), C.fromReal(R.fromRational(origin.integral[m]!, prec)), prec);
  return sum;
}

interface Points {
  readonly x: Exact;
  readonly rules: Map<string, readonly (CirclePoint & { readonly share: Ball })[]>;
}

/** The points of a quantity at one coupling: its series, integrals and sums all stand on the same. */
const kept = new WeakMap<ContourOrigin, Points>();

/** The nodes of a rule with everything that does not depend on the integrand; `share` is the weight of ∫ dφ/π. */
function pointsOf(
  origin: ContourOrigin,
  x: Exact,
  n: number,
  prec: number,
): readonly (CirclePoint & { readonly share: Ball })[] | Refusal {
  let points = kept.get(origin);
  if (points?.x !== x) {
    points = { x, rules: new Map() };
    kept.set(origin, points);
  }
  const key = `${n} ${prec}`;
  const found = points.rules.get(key);
  if (found !== undefined) return found;
  const nodes = arcNodes(n, prec);
  const couplings = couplingsOnCircle(
    origin,
    x,
    nodes.map(({ angle }) => angle),
    prec,
  );
  if ('reason' in couplings) return couplings;
  const made = nodes.map(({ angle, weight }, k) => {
    const phase = cexp({ re: R.ZERO, im: angle }, prec);
    return { phase, angle, weight: weightAt(origin, phase, prec), x: couplings[k]!, share: weight };
  });
  points.rules.set(key, made);
  return made;
}

/** One rule: the real parts of the integrals. */
function rule(origin: ContourOrigin, x: Exact, f: CircleIntegrand, n: number, prec: number): readonly Ball[] | Refusal {
  const points = pointsOf(origin, x, n, prec);
  if ('reason' in points) return points;
  let sums: Ball[] = [];
  for (const point of points) {
    const values = f(point, prec).map((v) => R.mul(v.re, point.share, prec));
    sums = sums.length === 0 ? values : sums.map((s, i) => R.add(s, values[i]!, prec));
  }
  return sums;
}

const sizeOf = (b: Ball): number => Math.abs(R.toNumber(b)) + R.radiusToNumber(b);

/** log2 of the error of the larger of two rules, from their difference. */
function errorBits(fine: Ball, coarse: Ball, scale: number): number {
  const difference = R.abs(R.exactMid(R.sub(fine, coarse, 200)));
  const bits = R.upperBits(difference);
  if (bits === -Infinity) return -Infinity;
  const s = Math.log2(scale);
  return Math.min(bits, s + (bits - s) * ERROR_POWER + Math.log2(SAFETY));
}

/**
 * The integrals to `digits` digits of the largest of them. A refusal when the circle meets the Landau singularity, or the
 * rules do not settle.
 */
export function circleIntegrals(
  origin: ContourOrigin,
  x: Exact,
  f: CircleIntegrand,
  digits: number,
): readonly Ball[] | Refusal {
  const bits = Math.ceil(digits * 3.3219) + 4;
  const level = LEVELS.find((l) => digits <= l) ?? digits;
  const prec = 32 * Math.ceil((level * 3.3219 + 4 + SPARE_BITS) / 32);
  let n = Math.ceil(
    (level + 3) / ERROR_POWER / DIGITS_PER_NODE + SPARE_NODES + NODES_PER_DEGREE * origin.integral.length,
  );
  let coarse = rule(origin, x, f, n, prec);
  if (isRefusal(coarse)) return coarse;
  for (;;) {
    n = Math.ceil(1.5 * n);
    if (n > MOST_NODES)
      return refuse(
        `the integral over the circle does not settle to ${digits} digits`,
        'ask for fewer digits, or use a smaller coupling: the Landau singularity is close',
      );
    const fine: readonly Ball[] | Refusal = rule(origin, x, f, n, prec);
    if (isRefusal(fine)) return fine;
    const scale = Math.max(...fine.map(sizeOf), Number.MIN_VALUE);
    const before = coarse;
    const settled = fine.map((value, i) => {
      const error = errorBits(value, before[i]!, Math.max(sizeOf(value), NEGLIGIBLE * scale));
      return error === -Infinity ? value : R.addError(value, 1, Math.ceil(error));
    });
    const sharp = settled.every((b) => R.radiusToNumber(b) <= 2 ** -bits * Math.max(sizeOf(b), NEGLIGIBLE * scale));
    if (sharp) return settled;
    coarse = fine;
  }
}
