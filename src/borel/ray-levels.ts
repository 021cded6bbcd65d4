/**
 * @module Trapezoidal sums over the nodes of a ray, the step halved until the digits are there.
 *
 * Purpose    what the sums in balls (ray.ts) and in double-double arithmetic (ray-quick.ts) share.
 * Method     levels of step h, h/2, h/4, …; each adds the nodes between those of the one before. The error of the trapezoidal
 *            rule is C q^{1/h}: two differences d₁, d₂ of successive levels fix C and q, and the newest level is off by about
 *            d₂³/d₁².
 * Bound      none that is proved: see ray.ts.
 */
import { C, R } from '../numerics/index.js';
import type { Complex } from '../numerics/index.js';
import { stepsFor } from './ray-nodes.js';
import type { Ray } from './ray-nodes.js';

/** Refinements of the step after the first level. */
const LEVELS = 6;
/** Bits added to the estimated error of a level. Heuristic. */
const SAFETY = 10;
/** Nodes in a row that must be negligible before a side of the sum ends. */
const QUIET = 3;
/** |v| beyond which no node is used: r = e^{−50} or e^{12}. */
const LOW = -6;
const HIGH = 12;

/**
 * Visits the nodes j/steps (j odd only when `odd`) from the middle outwards, until QUIET of them in a row are negligible;
 * false when a term cannot be had, or the sum does not end on the side of large r.
 */
export function sweep(visit: (j: number) => 'negligible' | 'counts' | 'fails', steps: number, odd: boolean): boolean {
  const first = odd ? 1 : 0;
  const stride = odd ? 2 : 1;
  for (const direction of [1, -1]) {
    const start = direction === 1 ? first : first - stride;
    let silent = 0;
    for (let j = start; silent < QUIET; j += direction * stride) {
      const v = j / steps;
      if (v > HIGH || v < LOW) {
        if (direction === 1) return false;
        break;
      }
      const outcome = visit(j);
      if (outcome === 'fails') return false;
      silent = outcome === 'negligible' ? silent + 1 : 0;
    }
  }
  return true;
}

/** Sums over the nodes of one level, one for each component. */
export type Level = (steps: number, odd: boolean) => readonly Complex[] | undefined;

/**
 * Halves the step until every component is known to `bits` bits of the larger of its two parts. Undefined when a level does
 * not converge, or the levels do not settle.
 */
export function refine(level: Level, ray: Ray, bits: number, prec: number): readonly Complex[] | undefined {
  let steps = Math.max(2, Math.ceil(stepsFor(ray, bits) / 4));
  let raw = level(steps, false);
  if (raw === undefined) return undefined;
  let current = raw.map((sum) => overSteps(sum, steps, prec));
  let before = current.map(() => Infinity);
  for (let refinement = 0; refinement < LEVELS; refinement++) {
    const between = level(2 * steps, true);
    if (between === undefined) return undefined;
    steps *= 2;
    raw = raw.map((sum, i) => C.add(sum, between[i]!, prec));
    const next = raw.map((sum) => overSteps(sum, steps, prec));
    // Rounding alone has taken the digits: smaller steps cannot bring them back.
    if (next.some((value) => C.accuracyBits(value) < bits)) return undefined;
    const differences = next.map((value, i) => C.upperBits(C.exactMid(C.sub(value, current[i]!, prec))));
    const settled = next.map((value, i) => withError(value, errorBits(value, before[i]!, differences[i]!, bits)));
    if (settled.every((value) => C.accuracyBits(value) >= bits)) return settled;
    current = next;
    before = differences;
  }
  return undefined;
}

/** Bits of `digits` digits as the quadrature counts them. */
export const quadratureBits = (digits: number): number => digits * 3.33;

const overSteps = (sum: Complex, steps: number, prec: number): Complex =>
  C.mulReal(sum, R.div(R.ONE, R.fromNumber(steps), prec), prec);

/** log2 of the error of the newest level from the last two differences (as exponents of two), see the header. */
function errorBits(value: Complex, first: number, second: number, wanted: number): number {
  const size = C.upperBits(value);
  if (second === -Infinity || size - second > wanted + 1 || !(second < first)) return second;
  return Math.min(second, SAFETY + Math.max(3 * second - 2 * first, 2 * second - size));
}

function withError(value: Complex, bits: number): Complex {
  if (bits === -Infinity) return value;
  if (!(bits < Infinity)) return C.INDETERMINATE;
  return { re: R.addError(value.re, 1, Math.ceil(bits)), im: R.addError(value.im, 1, Math.ceil(bits)) };
}
