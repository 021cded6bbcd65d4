/**
 * @module A series at another renormalisation scale: what FAC, PMS and BLM share.
 *
 * The coefficients are re-expanded exactly, the coupling is run by the closed form of the truncated beta function, and the
 * truncated series is evaluated there.
 */
import { exact, exp, log, mulExact, R } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import { changeScale } from '../qcd/index.js';
import type { Expansion, Running } from '../series/index.js';
import { betaFunction, runCoupling } from './running-coupling.js';
import type { Refusal } from './prescription.js';
import { dressed, refusal } from './prescription.js';

export interface AtScale {
  readonly coefficients: readonly Exact[];
  readonly x: Ball;
  /** R of the truncated series, and without its last term. */
  readonly value: Ball;
  readonly shorter: Ball;
}

/** Refusal of a series without a running coupling. */
export function runningObjection(e: Expansion, variant: string): Refusal | undefined {
  if (e.running !== undefined) return undefined;
  return refusal(
    variant,
    'the expansion variable does not run, or its beta function is not known',
    'state a coupling, its scheme (MSbar, or another known one) and a number of flavours in the series file',
  );
}

/** Refusal of a series without a running coupling, with a power that is none, or with too few terms. */
export function scaleObjection(e: Expansion, variant: string, fewest: number): Refusal | undefined {
  const still = runningObjection(e, variant);
  if (still !== undefined) return still;
  if (e.power < 1)
    return refusal(
      variant,
      'the series starts with a constant: there is no charge to optimise',
      'state the constant as the additive part',
    );
  if (e.coefficients.length < fewest)
    return refusal(
      variant,
      `${e.coefficients.length} coefficient${e.coefficients.length === 1 ? '' : 's'}: ${fewest} are needed`,
      'give more coefficients',
    );
  return undefined;
}

/** The truncated series at ln μ² larger by `shift`; undefined at and below the Landau pole. */
export function atScale(e: Expansion, running: Running, shift: Exact, prec: number): AtScale | undefined {
  const work = prec + 16;
  const beta = betaFunction(
    running.beta.map((b) => b.ball(work)),
    work,
  );
  const x = runCoupling(beta, e.x.ball(work), shift.ball(work), work);
  if (x === undefined) return undefined;
  const coefficients = changeScale({ coefficients: e.coefficients, firstPower: e.power }, running.beta, shift);
  const moved: Expansion = { ...e, x: { ball: () => x }, coefficients };
  const sum = (count: number): Ball =>
    dressed(
      moved,
      coefficients
        .slice(0, count)
        .reduceRight<Ball>((acc, c) => R.add(R.mul(acc, x, work), c.ball(work), work), R.ZERO),
      work,
    );
  return { coefficients, x, value: sum(coefficients.length), shorter: sum(coefficients.length - 1) };
}

/** μ/Q after the shift, as a double. */
export function ratioAt(running: Running, shift: Exact): number {
  const half = R.mul2exp(shift.ball(80), -1);
  return R.toNumber(R.mul(running.scaleRatio.ball(80), exp(half, 80), 80));
}

/** ln(μ²/Q²) of the series as it stands. */
export function currentLog(running: Running, prec: number): Ball {
  return R.mul2exp(log(running.scaleRatio.ball(prec), prec), 1);
}

/** −c, exact where c is. */
export const negative = (c: Exact): Exact => mulExact(c, exact(-1));
