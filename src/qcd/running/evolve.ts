/**
 * @module α_s(μ) on the real axis in doubles: the inverse of ln(μ²/Λ²) in closed form.
 *
 * Method     Newton's method for y = 1/α: F(y) = ln(μ²/Λ²) is nearly linear in y, F′(y) = 1/(b_0 S(1/y)), kept inside a
 *            bracket; the two-loop iterate starts it. Both ends are evaluated in closed form, so no error accumulates
 *            along the way and the distance in scale does not matter.
 * Bound      relative error a few times 2^-53 · (1 + |β(α)/α · ln(μ²/Λ²)|): below 1e-14 for α < 1.
 * Reference  a direct inversion; see flow.ts for the integral.
 */
import type { Loops } from '../beta-function.js';
import type { Refusal } from '../refusal.js';
import {
  LARGEST_COUPLING,
  belowLandau,
  checkCoupling,
  checkScale,
  checkTheory,
  isLoops,
  logOfRatio,
} from './domain.js';
import { bracketAt, flowOf, logOfInverse, logOverLambda, type Flow } from './flow.js';

const MAX_STEPS = 200;

/** α with ln(μ²/Λ²)(α) = target; start is any guess for α. */
export function invertLog(flow: Flow, target: number, start: number): number | Refusal {
  if (!(target > flow.landauLog)) return belowLandau(flow, target);
  let low = Math.max(1 / flow.fixedPoint, 0);
  let high = Infinity;
  let y = 1 / start;
  if (!(y > low)) y = low > 0 ? low * 2 : 1;
  for (let step = 0; step < MAX_STEPS; step++) {
    const alpha = 1 / y;
    const excess = logOfInverse(flow, y) - target;
    if (excess > 0) high = y;
    else low = y;
    const move = excess * flow.b0 * bracketAt(flow, alpha);
    let next = y - move;
    // The last steps wander by a rounding unit of F: stop when Newton's method has nothing left to gain.
    if (Math.abs(next - y) <= 2e-16 * y || Math.abs(excess) <= 4e-16 * Math.max(1, Math.abs(target))) {
      y = next;
      break;
    }
    if (!(next > low && next < high)) next = high === Infinity ? 2 * y : low === 0 ? y / 2 : (low + high) / 2;
    y = next;
  }
  const alpha = 1 / y;
  return alpha <= LARGEST_COUPLING ? alpha : belowLandau(flow, target);
}

/**
 * α_s after ln μ² has grown by `logRatio` = ln(μ²/μ_0²), from α_s(μ_0) = alpha, with n_f fixed.
 * Refuses couplings that cannot be run and scales at or below the Landau pole.
 */
export function evolveLog(flow: Flow, alpha: number, logRatio: number): number | Refusal {
  const bad = checkCoupling(flow, alpha);
  if (bad !== undefined) return bad;
  if (logRatio === 0) return alpha;
  const target = logOverLambda(flow, alpha) + logRatio;
  return invertLog(flow, target, twoLoopGuess(flow, alpha, logRatio));
}

/** α/[1 + b_0 α L + (b_1/b_0) α ln(1 + b_0 α L)], or α itself where that makes no sense. */
function twoLoopGuess(flow: Flow, alpha: number, logRatio: number): number {
  const u = 1 + flow.b0 * alpha * logRatio;
  if (!(u > 0.05)) return alpha;
  const guess = alpha / (u + (flow.s[1] ?? 0) * alpha * Math.log(u));
  return guess > 0 && Number.isFinite(guess) ? guess : alpha;
}

export interface Evolution {
  /** α_s at `from`. */
  readonly alpha: number;
  /** Scales in one unit (GeV); only their ratio matters. */
  readonly from: number;
  readonly to: number;
  readonly flavours: number;
  /** 1 to 5 loops of the beta function. */
  readonly loops: number;
}

/** α_s(to) from α_s(from) at fixed n_f, by exact solution of the truncated renormalisation-group equation. */
export function evolveAlpha(question: Evolution): number | Refusal {
  const { alpha, from, to, flavours, loops } = question;
  const bad = checkTheory(flavours, loops) ?? checkScale('from', from) ?? checkScale('to', to);
  if (bad !== undefined) return bad;
  const order: Loops = isLoops(loops) ? loops : 5;
  return evolveLog(flowOf(flavours, order), alpha, logOfRatio(from, to));
}
