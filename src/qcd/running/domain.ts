/** @module Which questions about the running coupling have an answer, and what is said about the others. */
import { MAX_FLAVOURS, MAX_LOOPS, type Loops } from '../beta-function.js';
import { refuse, type Refusal } from '../refusal.js';
import { bracketAt, type Flow } from './flow.js';

/**
 * A heuristic limit: beyond it α_s is so close to its singularity that the truncated beta function and every digit of
 * the result depend on the last term kept. Results above are refused.
 */
export const LARGEST_COUPLING = 10;

export function isLoops(n: number): n is Loops {
  return Number.isInteger(n) && n >= 1 && n <= MAX_LOOPS;
}

/** Refusal for n_f outside 0…16 or a number of loops outside 1…5, undefined when both are fine. */
export function checkTheory(flavours: number, loops: number): Refusal | undefined {
  if (!Number.isInteger(flavours)) {
    return refuse(
      `n_f = ${flavours} is not an integer`,
      'give the number of active flavours as an integer from 0 to 16',
    );
  }
  if (flavours < 0 || flavours > MAX_FLAVOURS) {
    return refuse(
      `n_f = ${flavours} lies outside 0 to ${MAX_FLAVOURS}, where QCD is asymptotically free`,
      'give the number of active flavours as an integer from 0 to 16',
    );
  }
  if (!isLoops(loops)) {
    return refuse(
      `the beta function is known at 1 to ${MAX_LOOPS} loops, not ${loops}`,
      'ask for 1, 2, 3, 4 or 5 loops',
    );
  }
  return undefined;
}

/** Refusal for a coupling at which the flow cannot start. */
export function checkCoupling(flow: Flow, alpha: number): Refusal | undefined {
  if (!(alpha > 0 && alpha < Infinity && 1 / alpha < 1e300)) {
    return refuse(`the coupling ${alpha} is not a positive number`, 'give α_s as a positive number, such as 0.118');
  }
  if (alpha >= flow.fixedPoint) {
    return refuse(
      `α_s = ${alpha} lies beyond the zero ${flow.fixedPoint.toPrecision(6)} of the ${flow.loops}-loop beta function ` +
        `for n_f = ${flow.flavours}: no such coupling becomes weak at high scales`,
      'use a smaller coupling, fewer loops or another n_f',
    );
  }
  if (alpha > LARGEST_COUPLING || !(bracketAt(flow, alpha) > 0)) {
    return refuse(
      `α_s = ${alpha} is too close to the Landau singularity to be run`,
      `start from a higher scale, where α_s is below ${LARGEST_COUPLING}`,
    );
  }
  return undefined;
}

/** Refusal for a scale that is not a positive number. */
export function checkScale(name: string, scale: number): Refusal | undefined {
  return Number.isFinite(scale) && scale > 0
    ? undefined
    : refuse(`${name} = ${scale} is not a positive scale`, 'give the scale as a positive number in GeV');
}

/** ln(to²/from²), also where the ratio leaves the range of doubles. */
export function logOfRatio(from: number, to: number): number {
  const ratio = to / from;
  return ratio > 1e-290 && ratio < Infinity ? 2 * Math.log(ratio) : 2 * (Math.log(to) - Math.log(from));
}

export const belowLandau = (flow: Flow, logOverLambda: number): Refusal =>
  refuse(
    `the scale lies at or below the Landau pole: ln(μ²/Λ²) = ${logOverLambda.toPrecision(6)}, the pole is at ` +
      `${flow.landauLog.toPrecision(6)} (${flow.loops} loops, n_f = ${flow.flavours})`,
    'use a higher scale; perturbation theory has no coupling there',
  );
