/**
 * @module α_s, Λ and quark masses as exact numbers: enclosures of the exact solution to any number of digits.
 *
 * Method     F(y) = ln(μ²/Λ²), y = 1/α, is strictly increasing on its domain (F′ = 1/(b_0 S) > 0 there). Newton's method in
 *            growing precision finds y; F(y − δ) < target < F(y + δ), decided in ball arithmetic, proves the enclosure.
 * Bound      certified: the ball holds the exact solution of the truncated renormalisation-group equation.
 * Reference  closed form and definitions as in flow.ts.
 */
import { R, exactReal, exp, log, toNumberExact, type Ball, type Exact } from '../../numerics/index.js';
import type { Loops } from '../beta-function.js';
import type { Refusal } from '../refusal.js';
import { checkScale, checkTheory, isLoops } from './domain.js';
import { evolveAlpha } from './evolve.js';
import { ballFlow, ballLogOfInverse, ballMassLog, inDomain, realBracket, type BallFlow } from './flow-ball.js';

/** Where a Newton step starts to double the precision. */
const DOUBLE_BITS = 45;
/** Tries to prove the bracket, doubling its width each time. */
const WIDENINGS = 12;

/** y with F(y) = target, proved; `start` an approximation to double accuracy. INDETERMINATE when it cannot be proved. */
function solveInverse(flow: BallFlow, target: Ball, start: number, prec: number): Ball {
  const goal = R.exactMid(target);
  let y = R.fromNumber(start);
  for (let bits = DOUBLE_BITS; ; bits = Math.min(2 * bits - 4, prec)) {
    const work = bits + 30;
    const excess = R.sub(ballLogOfInverse(flow, y, work), goal, work);
    const move = R.mul(R.mul(excess, flow.b0, work), realBracket(flow, R.div(R.ONE, y, work), work), work);
    if (R.upperBits(move) === Infinity) return R.INDETERMINATE;
    y = R.exactMid(R.sub(y, move, work));
    if (bits >= prec) break;
  }
  // Radius of the residual, carried to y by dy/dF = b_0 S, with room.
  const residual = R.sub(ballLogOfInverse(flow, y, prec), target, prec);
  const slope = R.mul(flow.b0, realBracket(flow, R.div(R.ONE, y, 64), 64), 64);
  const size = R.upperBits(R.mul(residual, slope, 64));
  if (size === Infinity) return R.INDETERMINATE;
  for (let k = 1; k <= WIDENINGS; k++) {
    const delta = R.mul2exp(R.ONE, Math.max(size, -4 * prec) + k);
    const low = R.sub(y, delta, prec + 60);
    const high = R.add(y, delta, prec + 60);
    if (!inDomain(flow, low, prec + 60)) return R.INDETERMINATE;
    const below = R.sub(ballLogOfInverse(flow, low, prec), target, prec);
    const above = R.sub(ballLogOfInverse(flow, high, prec), target, prec);
    if (R.isNegative(below) && R.isPositive(above)) return R.widen(y, delta);
  }
  return R.INDETERMINATE;
}

export interface ExactEvolution {
  readonly alpha: Exact;
  readonly from: Exact;
  readonly to: Exact;
  readonly flavours: number;
  readonly loops: number;
}

/** Growing working precision until the enclosure has `prec` correct bits, or the input allows no more. */
function sharpened(evaluate: (work: number) => Ball): Exact {
  return exactReal((prec) => {
    let best: Ball = R.INDETERMINATE;
    for (let work = prec + 20; work <= 8 * prec + 400; work *= 2) {
      const value = evaluate(work);
      const gain = R.accuracyBits(value) - R.accuracyBits(best);
      if (gain > 0) best = value;
      // A full bit or nothing: what remains is the uncertainty of the input.
      if (R.accuracyBits(best) >= prec || gain < 1) break;
    }
    return best;
  });
}

const loopsOf = (n: number): Loops => (isLoops(n) ? n : 5);

/** ln(to²/from²) as a ball. */
const logRatio = (from: Exact, to: Exact, prec: number): Ball =>
  R.mul2exp(log(R.div(to.ball(prec), from.ball(prec), prec), prec), 1);

/** α_s(to) at fixed n_f as an exact number; the refusals of evolveAlpha. */
export function exactAlpha(question: ExactEvolution): Exact | Refusal {
  const { flavours, loops } = question;
  const estimate = evolveAlpha({
    alpha: toNumberExact(question.alpha),
    from: toNumberExact(question.from),
    to: toNumberExact(question.to),
    flavours,
    loops,
  });
  if (typeof estimate !== 'number') return estimate;
  return sharpened((work) => {
    const flow = ballFlow(flavours, loopsOf(loops), work);
    if (flow === undefined) return R.INDETERMINATE;
    const y = R.div(R.ONE, question.alpha.ball(work), work);
    if (!inDomain(flow, y, work)) return R.INDETERMINATE;
    const target = R.add(ballLogOfInverse(flow, y, work), logRatio(question.from, question.to, work), work);
    return R.div(R.ONE, solveInverse(flow, target, 1 / estimate, work), work);
  });
}

/** Λ_MSbar in the unit of `scale` from α_s(scale), exact definition, as an exact number. */
export function exactLambda(alpha: Exact, scale: Exact, flavours: number, loops: number): Exact | Refusal {
  const same = toNumberExact(scale);
  const bad =
    checkTheory(flavours, loops) ??
    checkScale('scale', same) ??
    evolveAlpha({ alpha: toNumberExact(alpha), from: same, to: same, flavours, loops });
  if (typeof bad !== 'number') return bad;
  return sharpened((work) => {
    const flow = ballFlow(flavours, loopsOf(loops), work);
    if (flow === undefined) return R.INDETERMINATE;
    const y = R.div(R.ONE, alpha.ball(work), work);
    if (!inDomain(flow, y, work)) return R.INDETERMINATE;
    const half = R.neg(R.mul2exp(ballLogOfInverse(flow, y, work), -1));
    return R.mul(scale.ball(work), exp(half, work), work);
  });
}

/** m(to)/m(from) at fixed n_f as an exact number. */
export function exactMassRatio(question: ExactEvolution): Exact | Refusal {
  const end = exactAlpha(question);
  if ('reason' in end) return end;
  return sharpened((work) => {
    const flow = ballFlow(question.flavours, loopsOf(question.loops), work);
    if (flow === undefined) return R.INDETERMINATE;
    const a0 = question.alpha.ball(work);
    const a1 = end.ball(work);
    const oneLoop = R.mul(R.div(flow.g0, flow.b0, work), log(R.div(a1, a0, work), work), work);
    const beyond = R.sub(ballMassLog(flow, a1, work), ballMassLog(flow, a0, work), work);
    return exp(R.add(oneLoop, beyond, work), work);
  });
}
