/**
 * @module The solution of the truncated renormalisation-group equation in closed form, ready for evaluation in doubles.
 *
 * Method     With y = 1/α, S(α) = 1 + (b_1/b_0)α + … = Π(1 − α/z_i), w_i = 1/z_i, q = b_1/b_0, b_k = β_k/(4π)^(k+1),
 *            partial fractions of the exact definition of Λ_MSbar collapse to
 *            ln(μ²/Λ²) = (1/b_0) [y + q ln b_0 − Σ_i A_i ln(y − w_i)],  A_i = 1/(z_i² S′(z_i)),  Σ A_i = q.
 *            The quark mass with d ln m/d ln μ² = −Σ g_k α^(k+1) follows the same way, G(α) = Σ g_k α^k:
 *            ln m = const + (1/b_0) [Σ_i B_i ln((y − w_i)/y) − g_0 ln y],  B_i = G(z_i)/(z_i S′(z_i)).
 *            No expansion anywhere.
 * Bound      a few units of 2^-53 of ln(μ²/Λ²).
 * Reference  definition of Λ: FLAG Review 2024, arXiv:2411.04268, Eq. (285); Bardeen, Buras, Duke, Muta 1978.
 */
import { C, R } from '../../numerics/index.js';
import type { Loops } from '../beta-function.js';
import type { ComplexNumber } from './complex-number.js';
import { ballFlow } from './flow-ball.js';

export interface FlowPole {
  /** w = 1/z, z a zero of S. */
  readonly w: ComplexNumber;
  /** A: weight of ln(y − w) in the coupling. */
  readonly coupling: ComplexNumber;
  /** B: weight of ln((y − w)/y) in the mass. */
  readonly mass: ComplexNumber;
}

export interface Flow {
  readonly flavours: number;
  readonly loops: Loops;
  /** b_0 in dα/d ln μ² = −b_0 α² S(α). */
  readonly b0: number;
  /** Coefficients of S, ascending, s_0 = 1. */
  readonly s: readonly number[];
  /** g_0 of the mass anomalous dimension. */
  readonly g0: number;
  readonly poles: readonly FlowPole[];
  /** q ln b_0. */
  readonly constant: number;
  /** Smallest positive zero of S (an infrared fixed point that α never passes), Infinity when there is none. */
  readonly fixedPoint: number;
  /** ln(μ²/Λ²) at which α becomes infinite; -Infinity with a fixed point, where α exists at every scale. */
  readonly landauLog: number;
}

/** Precision at which the constants of the flow are enclosed before they are rounded to doubles. */
const DOUBLE_BITS = 80;

const flows = new Map<number, Flow>();

/** The flow for n_f flavours (an integer from 0 to 16) and 1–5 loops; computed once. */
export function flowOf(flavours: number, loops: Loops): Flow {
  const key = flavours * 8 + loops;
  let flow = flows.get(key);
  if (flow === undefined) {
    flow = createFlow(flavours, loops);
    flows.set(key, flow);
  }
  return flow;
}

function createFlow(flavours: number, loops: Loops): Flow {
  const flowBalls = ballFlow(flavours, loops, DOUBLE_BITS);
  if (flowBalls === undefined) throw new RangeError(`the zeros of the ${loops}-loop beta function do not separate`);
  const b0 = R.toNumber(flowBalls.b0);
  const s = flowBalls.s.map(R.toNumber);
  const poles = flowBalls.poles.map(({ w, coupling, mass }): FlowPole => ({
    w: C.toNumbers(w),
    coupling: C.toNumbers(coupling),
    mass: C.toNumbers(mass),
  }));
  const positive = poles.filter(({ w }) => w.im === 0 && w.re > 0).map(({ w }) => w.re);
  const fixedPoint = positive.length > 0 ? 1 / Math.max(...positive) : Infinity;
  const constant = (s[1] ?? 0) * Math.log(b0);
  const flow = {
    flavours,
    loops,
    b0,
    s,
    g0: R.toNumber(flowBalls.g0),
    poles,
    constant,
    fixedPoint,
    landauLog: -Infinity,
  };
  return fixedPoint < Infinity ? flow : { ...flow, landauLog: logOfInverse(flow, 0) };
}

/** S(α) on the real axis. */
export function bracketAt(flow: Flow, alpha: number): number {
  let sum = 0;
  for (let k = flow.s.length - 1; k >= 0; k--) sum = sum * alpha + (flow.s[k] ?? 0);
  return sum;
}

/** ln(μ²/Λ²) as a function of y = 1/α > 1/fixedPoint. */
export function logOfInverse(flow: Flow, y: number): number {
  let sum = y + flow.constant;
  for (const { w, coupling } of flow.poles) {
    const d = y - w.re;
    if (w.im === 0) sum -= coupling.re * Math.log(d);
    // The pair w, w̄ contributes twice the real part of A ln(y − w).
    else if (w.im > 0) sum -= coupling.re * Math.log(d * d + w.im * w.im) - 2 * coupling.im * Math.atan2(-w.im, d);
  }
  return sum / flow.b0;
}

/** ln(μ²/Λ²) for 0 < α < fixedPoint: the exact definition of Λ_MSbar at the loop order of the flow. */
export const logOverLambda = (flow: Flow, alpha: number): number => logOfInverse(flow, 1 / alpha);

/** Σ_i B_i ln((y − w_i)/y)/b_0 = Σ_i B_i ln(1 − α/z_i)/b_0: the mass beyond its one-loop power of α. */
export function massLogBeyondOneLoop(flow: Flow, alpha: number): number {
  let sum = 0;
  for (const { w, mass } of flow.poles) {
    const re = -alpha * w.re;
    const im = -alpha * w.im;
    if (w.im === 0) sum += mass.re * Math.log1p(re);
    else if (w.im > 0) sum += mass.re * Math.log1p(re * (2 + re) + im * im) - 2 * mass.im * Math.atan2(im, 1 + re);
  }
  return sum / flow.b0;
}
