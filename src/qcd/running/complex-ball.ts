/**
 * @module α_s at complex scales in enclosures: certified away from the Landau singularity.
 *
 * Method     along the straight path in ln μ², step by step. A box Y around the start y_0 with y_0 + h [0,1] b_0 S(1/Y) ⊂ Y
 *            holds the solution for the whole step (Picard). Inside this convex box no logarithm changes its branch, so
 *            D(m) = F(m) − F(y_0) is a sum of principal logarithms of ratios, and the mean-value form
 *            y_1 ∈ m − b_0 S(1/Y) (D(m) − h), m the approximate solution, encloses the end point; the radius of y_0 enters
 *            the same way, so that it is carried with its true sensitivity S(1/y_1)/S(1/y_0).
 * Bound      certified; the radius grows with the number of steps only.
 * Refused    paths on which no box can be found even for short steps: they run into the Landau singularity.
 */
import { C, R, clog, toNumberExact, type Ball, type Complex, type Exact } from '../../numerics/index.js';
import type { Loops } from '../beta-function.js';
import type { Refusal } from '../refusal.js';
import { checkCoupling, checkTheory, isLoops } from './domain.js';
import { pathBlocked } from './evolve-complex.js';
import { ballFlow, complexBracket, type BallFlow } from './flow-ball.js';
import { flowOf } from './flow.js';

/** Longest and shortest step in |ln μ²|; both heuristic, the proof does not depend on them. */
const LONGEST_STEP = 0.5;
const SHORTEST_STEP = 1e-3;
/** The box is tried with this much more room than one Euler step needs. */
const ROOM = 2;
/** Precision of the box test, where digits do not matter. */
const BOX_BITS = 64;
const NEWTON_STEPS = 60;

/** The real interval [0, 1] as a ball. */
const UNIT_INTERVAL: Ball = { mid: 1n, exp: -1, rad: 1 };

/** b_0 S(1/y). */
function slope(flow: BallFlow, y: Complex, prec: number): Complex {
  return C.mulReal(complexBracket(flow, C.inv(y, prec), prec), flow.b0, prec);
}

/** Box around y with half-widths r. */
const box = (y: Complex, r: Ball): Complex => ({ re: R.widen(y.re, r), im: R.widen(y.im, r) });

const upper = (x: Complex): Ball => {
  const bits = C.upperBits(x);
  return Number.isFinite(bits) ? R.mul2exp(R.ONE, bits) : R.INDETERMINATE;
};

/** Is the ball `inner` certainly inside `outer`? Both around nearly the same centre. */
function inside(inner: Ball, outer: Ball): boolean {
  const gap = R.abs(R.sub(R.exactMid(inner), R.exactMid(outer), BOX_BITS));
  const room = R.radiusToNumber(outer) * (1 - 1e-12);
  return R.toNumber(gap) * (1 + 1e-12) + R.radiusToNumber(inner) < room;
}

/** A box that holds the solution for the whole step, or undefined. */
function picardBox(flow: BallFlow, y: Complex, h: Complex): Complex | undefined {
  const move = upper(C.mul(slope(flow, y, BOX_BITS), h, BOX_BITS));
  if (move.rad === Infinity) return undefined;
  const y64 = C.round(y, BOX_BITS);
  const trial = box(y64, R.mul(move, R.fromNumber(ROOM), BOX_BITS));
  if (C.containsZero(trial) || flow.poles.some(({ w }) => C.containsZero(C.sub(trial, w, BOX_BITS)))) return undefined;
  const reach = C.mulReal(C.mul(slope(flow, trial, BOX_BITS), h, BOX_BITS), UNIT_INTERVAL, BOX_BITS);
  const image = C.add(y64, reach, BOX_BITS);
  return inside(image.re, trial.re) && inside(image.im, trial.im) ? trial : undefined;
}

/** b_0 (F(m) − F(y)) by principal logarithms of (m − w)/(y − w). */
function increment(flow: BallFlow, y: Complex, m: Complex, prec: number): Complex {
  let sum = C.sub(m, y, prec);
  for (const { w, coupling } of flow.poles) {
    const ratio = C.div(C.sub(m, w, prec), C.sub(y, w, prec), prec);
    sum = C.sub(sum, C.mul(coupling, clog(ratio, prec), prec), prec);
  }
  return sum;
}

/** One proved step; undefined when it must be shorter. */
function advance(flow: BallFlow, y: Complex, h: Complex, prec: number): Complex | undefined {
  const whole = picardBox(flow, y, h);
  if (whole === undefined) return undefined;
  const target = C.mulReal(h, flow.b0, prec);
  let m = C.exactMid(C.add(y, C.mul(slope(flow, y, prec), h, prec), prec));
  const centre = C.exactMid(y);
  // Newton's method, at low precision until it has converged, then with twice the bits in every step.
  for (let k = 0, bits = BOX_BITS, settled = false; k < NEWTON_STEPS; k++) {
    const excess = C.sub(increment(flow, centre, m, bits), C.exactMid(target), bits);
    // F′ = 1/(b_0 S), increment = b_0 (F − F): the factor b_0 cancels.
    const move = C.mul(complexBracket(flow, C.inv(m, bits), bits), excess, bits);
    const size = C.upperBits(move);
    if (!(size < 1e6)) return undefined;
    m = C.exactMid(C.sub(m, move, bits));
    if (settled && bits === prec) break;
    settled ||= size < C.upperBits(m) - BOX_BITS / 2;
    if (settled) bits = Math.min(2 * bits - 16, prec);
  }
  if (!inside(m.re, whole.re) || !inside(m.im, whole.im)) return undefined;
  // Both ends by the mean-value form: b_0 F′(y) = 1/S(1/y) carries the radius of y without the logarithms' help.
  const drift = C.div(C.sub(y, centre, prec), complexBracket(flow, C.inv(y, prec), prec), prec);
  const residual = C.sub(C.sub(increment(flow, centre, m, prec), target, prec), drift, prec);
  const coarse = enclose(flow, m, whole, residual, prec);
  // Once more with the small enclosure in place of the box.
  return enclose(flow, m, hull(m, coarse), residual, prec);
}

/** m − S(1/Y) · residual for a convex Y that holds m and the solution. */
function enclose(flow: BallFlow, m: Complex, where: Complex, residual: Complex, prec: number): Complex {
  return C.sub(m, C.mul(complexBracket(flow, C.inv(where, prec), prec), residual, prec), prec);
}

/** A box around both. */
function hull(m: Complex, other: Complex): Complex {
  const distance = upper(C.sub(other, m, BOX_BITS));
  return distance.rad === Infinity ? other : box(m, distance);
}

export interface ComplexEvolution {
  /** Real α_s(μ_0). */
  readonly alpha: Exact;
  /** ln(μ²/μ_0²), complex: the straight path from 0 to it is followed. */
  readonly log: { readonly re: Exact; readonly im: Exact };
  readonly flavours: number;
  readonly loops: number;
}

/** Enclosure of α_s at the end of a straight path in ln μ², about `prec` bits. */
export function complexAlpha(question: ComplexEvolution, prec: number): Complex | Refusal {
  const bad = checkTheory(question.flavours, question.loops);
  if (bad !== undefined) return bad;
  const loops: Loops = isLoops(question.loops) ? question.loops : 5;
  const wrong = checkCoupling(flowOf(question.flavours, loops), toNumberExact(question.alpha));
  if (wrong !== undefined) return wrong;
  const work = prec + 40;
  const flow = ballFlow(question.flavours, loops, work);
  if (flow === undefined) return pathBlocked;
  const goal = { re: question.log.re.ball(work), im: question.log.im.ball(work) };
  let y: Complex = C.fromReal(R.div(R.ONE, question.alpha.ball(work), work));
  // Fractions of the path are exact powers of two, so that the steps add up to it exactly.
  let done = 0;
  const { re, im } = C.toNumbers(goal);
  let size = 1;
  while (size * Math.hypot(re, im) > LONGEST_STEP) size /= 2;
  while (done < 1) {
    const next = advance(flow, y, C.mulReal(goal, R.fromNumber(size), work), work);
    if (next === undefined) {
      size /= 2;
      if (size * Math.hypot(re, im) < SHORTEST_STEP) return pathBlocked;
      continue;
    }
    y = next;
    done += size;
    while (done % (2 * size) === 0 && 2 * size * Math.hypot(re, im) <= LONGEST_STEP && done + 2 * size <= 1) size *= 2;
  }
  return C.inv(y, work);
}
