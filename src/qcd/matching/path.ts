/**
 * @module α_s and quark masses from one scale and n_f to another, over the thresholds on the way.
 *
 * Method     n-loop running between the thresholds, (n−1)-loop decoupling at them (or as asked), exact solution of the
 *            truncated equations in between. The steps are listed, for the report.
 * Bound      rounding; truncation errors are estimated by the caller (one loop less, other crossing scales).
 */
import { refuse, isRefusal, type Refusal } from '../refusal.js';
import { checkScale, checkTheory } from '../running/domain.js';
import { evolveAlpha } from '../running/evolve.js';
import { evolveMass } from '../running/evolve-mass.js';
import { massRatio, matchDown, matchUp, type Matching } from './match.js';
import {
  DEFAULT_THRESHOLDS,
  checkThresholds,
  crossingLog,
  crossingScale,
  thresholdTo,
  type Threshold,
} from './thresholds.js';

export interface ScalePoint {
  /** GeV. */
  readonly scale: number;
  readonly flavours: number;
}

export interface PathOptions {
  /** Loops of the beta function (and of γ_m), 1 to 5. Default 5. */
  readonly loops?: number;
  /** Loops of the decoupling, 0 to 4. Default loops − 1. */
  readonly matchingLoops?: number;
  readonly thresholds?: readonly Threshold[];
}

export interface PathStep {
  readonly action: 'start' | 'run' | 'match';
  readonly scale: number;
  readonly flavours: number;
  readonly alpha: number;
  /** Present when a mass is evolved along. */
  readonly mass?: number;
  /** Name of the quark crossed, for a match. */
  readonly threshold?: string;
}

export interface PathResult {
  readonly alpha: number;
  readonly mass?: number;
  /** From the start to the goal, in order. */
  readonly steps: readonly PathStep[];
}

export interface PathQuestion {
  readonly alpha: number;
  readonly from: ScalePoint;
  readonly to: ScalePoint;
  /** MSbar mass m(from) with from.flavours flavours, evolved along with α_s. */
  readonly mass?: number;
  readonly options?: PathOptions;
}

/** Highest order of the decoupling relations. */
const MAX_MATCHING = 4;

/** α_s (and a mass) at the goal, with the path; a refusal for impossible scales, flavours or couplings. */
export function evolvePath(question: PathQuestion): PathResult | Refusal {
  const { from, to, options = {} } = question;
  const loops = options.loops ?? 5;
  const matchingLoops = options.matchingLoops ?? loops - 1;
  const thresholds = options.thresholds ?? DEFAULT_THRESHOLDS;
  const bad =
    checkTheory(from.flavours, loops) ??
    checkTheory(to.flavours, loops) ??
    checkScale('from', from.scale) ??
    checkScale('to', to.scale) ??
    checkThresholds(thresholds);
  if (bad !== undefined) return bad;
  if (!Number.isInteger(matchingLoops) || matchingLoops < 0 || matchingLoops > MAX_MATCHING) {
    return refuse(`decoupling is known at 0 to ${MAX_MATCHING} loops, not ${matchingLoops}`, 'ask for 0, 1, 2, 3 or 4');
  }

  let at: PathStep = {
    action: 'start',
    scale: from.scale,
    flavours: from.flavours,
    alpha: question.alpha,
    ...(question.mass === undefined ? {} : { mass: question.mass }),
  };
  const steps: PathStep[] = [at];
  const go = (next: PathStep | Refusal): next is PathStep => {
    if (isRefusal(next)) return false;
    at = next;
    steps.push(next);
    return true;
  };
  while (at.flavours !== to.flavours) {
    const up = to.flavours > at.flavours;
    const crossing = thresholdTo(up ? at.flavours + 1 : at.flavours, thresholds);
    if (isRefusal(crossing)) return crossing;
    const there = run(at, crossingScale(crossing), loops);
    if (there !== at && !go(there)) return there;
    const matched = match(at, crossing, up, matchingLoops);
    if (!go(matched)) return matched;
  }
  const end = run(at, to.scale, loops);
  if (end !== at && !go(end)) return end;
  return { alpha: at.alpha, steps, ...(at.mass === undefined ? {} : { mass: at.mass }) };
}

/** One leg at fixed n_f; no step when the scale is the same (the coupling is checked all the same). */
function run(at: PathStep, scale: number, loops: number): PathStep | Refusal {
  const common = { alpha: at.alpha, from: at.scale, to: scale, flavours: at.flavours, loops };
  if (at.mass === undefined) {
    const alpha = evolveAlpha(common);
    if (alpha === at.alpha && scale === at.scale) return at;
    return typeof alpha === 'number' ? { action: 'run', scale, flavours: at.flavours, alpha } : alpha;
  }
  const both = evolveMass({ ...common, mass: at.mass });
  if (!isRefusal(both) && scale === at.scale) return at;
  return isRefusal(both) ? both : { action: 'run', scale, flavours: at.flavours, ...both };
}

function match(at: PathStep, crossing: Threshold, up: boolean, loops: number): PathStep | Refusal {
  const light = crossing.flavours - 1;
  const matching: Matching = {
    light,
    log: crossingLog(crossing),
    heavyMass: crossing.kind ?? 'scale-invariant',
    loops,
  };
  const alpha = up ? matchUp(at.alpha, matching) : matchDown(at.alpha, matching);
  if (typeof alpha !== 'number') return alpha;
  const ratio = massRatio(up ? alpha : at.alpha, matching);
  return {
    action: 'match',
    scale: at.scale,
    flavours: up ? light + 1 : light,
    alpha,
    threshold: crossing.name,
    ...(at.mass === undefined ? {} : { mass: up ? at.mass / ratio : at.mass * ratio }),
  };
}
