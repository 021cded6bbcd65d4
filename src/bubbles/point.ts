/**
 * @module Where a bubble chain is evaluated: the coupling α at μ, flavours, μ/Q, and what follows from them.
 *
 *   β0 = (11 − 2n_f/3)/(4π),  a = β0 α,  L = 1/a − 5/3 − ln(μ²/Q²),
 * the effective coupling at virtuality k² = τQ² is 1/(β0 (L + ln τ)), its Landau pole τ_L = e^(−L), i.e. k = e^(5/6) Λ with
 * Λ = μ e^(−1/(2a)) (MSbar, one loop). The Borel integral converges for L > 0: for a Landau pole below Q.
 */
import { R, Rational, exactReal, pi, toNumberExact } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import { refuse } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import { schemeExponent } from './coefficients.js';
import type { Quantity } from './quantity.js';
import { factorBall } from './tower.js';

export interface ChainPoint {
  /** α_s(μ), positive. */
  readonly alpha: Exact;
  readonly flavours: number;
  /** μ/Q. */
  readonly ratio: Exact;
}

/** Nearer to the end of the range the sums of residues take more terms than they are given. */
const LEAST_LENGTH = 1 / 64;

export function betaNought(flavours: number, prec: number): Ball {
  return R.div(R.fromRational(Rational.of(33 - 2 * flavours, 3), prec), R.mul2exp(pi(prec), 2), prec);
}

/** a = β0 α. */
export const couplingA = ({ alpha, flavours }: ChainPoint, prec: number): Ball =>
  R.mul(betaNought(flavours, prec), alpha.ball(prec), prec);

/** L. */
export const logLength = (point: ChainPoint, prec: number): Ball =>
  R.sub(R.div(R.ONE, couplingA(point, prec), prec), schemeExponent(point.ratio, prec), prec);

/** norm/β0. */
export const overBeta = (quantity: Quantity, point: ChainPoint, prec: number): Ball =>
  R.div(factorBall(quantity.norm.factor, prec), betaNought(point.flavours, prec), prec);

/** Λ/Q, MSbar, one loop. */
export const lambdaOverQ = (point: ChainPoint): number =>
  toNumberExact(point.ratio) * Math.exp(-0.5 / R.toNumber(couplingA(point, 80)));

/** Position of the Landau pole of the effective coupling in units of Q: e^(−L/2). */
export const landauOverQ = (point: ChainPoint): number => Math.exp(-R.toNumber(logLength(point, 80)) / 2);

/** Largest coupling at these flavours and scale: 1/β0 over 5/3 + ln(μ²/Q²). */
const largestCoupling = (point: ChainPoint): number =>
  1 / (R.toNumber(betaNought(point.flavours, 80)) * R.toNumber(schemeExponent(point.ratio, 80)));

/** Why nothing can be summed there, if so. */
export function rangeObjection(quantity: Quantity, point: ChainPoint): Refusal | undefined {
  const alpha = toNumberExact(point.alpha);
  if (!(alpha > 0)) {
    return refuse(
      `the coupling ${alpha} is not positive: the chain has no Borel integral there`,
      'give a coupling above 0',
    );
  }
  const length = R.toNumber(logLength(point, 80));
  if (length > LEAST_LENGTH) return undefined;
  const landau = landauOverQ(point);
  const limit = largestCoupling(point);
  const range = limit > 0 ? ` (below about ${(limit * 0.99).toPrecision(2)} here)` : '';
  return refuse(
    `at alpha_s = ${alpha.toPrecision(6)} with ${point.flavours} flavours the Landau pole of the chain's coupling lies at ${landau.toPrecision(3)} ${quantity.hard}: the Borel integral does not converge unless it lies below ${quantity.hard}`,
    `give a smaller coupling${range}, or a larger scale`,
  );
}

/** A value that depends on the working precision, as an Exact that raises it until the digits asked are there. */
export function sharpened(evaluate: (prec: number) => Ball): Exact {
  return exactReal((prec) => {
    let reached = -Infinity;
    for (let work = prec + 24; ; work *= 2) {
      const value = evaluate(work);
      const accuracy = R.accuracyBits(value);
      // An input that is known to some digits only stops the gain.
      const stalled = accuracy > 0 && accuracy <= reached + 2;
      if (accuracy >= prec || stalled || R.isExactZero(value) || work > 4 * prec + 2048) return value;
      reached = accuracy;
    }
  });
}
