/**
 * @module G_b(x) for real x > 0: the alternating kernel and terminant (see branch-cut.ts for formulas, bounds and references).
 *
 * Purpose    the same three methods in real arithmetic, at less than half the cost.
 */
import { exp, log } from '../ball/elementary.js';
import { addMag, divMag, mag, magLower, widenMag } from '../ball/mag.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import type { Exact } from '../exact.js';
import { Rational } from '../rational.js';
import { asymptoticLength, asymptoticReal } from './asymptotic.js';
import { columnSumCost, fractionCost, productCost } from './cost.js';
import { readExponent } from './exponent.js';
import type { Exponent } from './exponent.js';
import { exponentialSum, exponentialTerms } from './exponential-sum.js';
import { gamma } from './gamma.js';
import { polePart, powerOverFactorial } from './pole-part.js';
import { refine } from './refine.js';
import { spreadCut, spreadExponent } from './spread.js';
import { fractionReal, fractionTerms, planFraction } from './stieltjes-fraction.js';

/** The logarithm and exponential beside the series, in products (heuristic). */
const ELEMENTARY_STEPS = 100;

/**
 * G_b(x) = ∫_0^∞ e^{−xv} (1+v)^{−1−b} dv for x > 0 and real b, near and at the integers too.
 * INDETERMINATE for x not certainly positive or |b| > 32768.
 */
export function branchAlternating(b: Exact | Rational | Ball, x: Ball, prec: number): Ball {
  const e = readExponent(b, prec);
  if (e === undefined || !R.isPositive(x)) return R.INDETERMINATE;
  const mid = exactAlternating(e, R.exactMid(x), prec);
  const error = addMag(spreadCut({ re: mid, im: R.ZERO }, { re: x, im: R.ZERO }, e), spreadExponent(e, magLower(x)));
  return R.round(widenMag(mid, error), prec);
}

function exactAlternating(b: Exponent, x: Ball, prec: number): Ball {
  const size = Math.min(Math.max(R.toNumber(x), 1e-300), 1e300);
  const far = asymptoticLength(size * (1 - 1e-12), true, b, prec + 10);
  if (far !== undefined) {
    const remainder = divMag(mag(1, Math.ceil(Math.max(far.error, -1e9))), magLower(x));
    return widenMag(asymptoticReal(x, b, -1, far, prec + 10), remainder);
  }
  const start = prec + 10 + Math.ceil(Math.log2(2 + size + 2 * Math.abs(b.approx)));
  return refine(prec, start, (bits) => near(b, x, size, bits), R.accuracyBits);
}

function near(b: Exponent, x: Ball, size: number, bits: number): Ball {
  const seriesBits = bits + Math.ceil(2 * size * Math.LOG2E);
  const steps = Math.max(0, Math.floor(-b.approx));
  const cost = fractionCost(fractionTerms(size, 0, bits) + 2 * steps, bits, false);
  const other = columnSumCost(exponentialTerms(size, seriesBits), seriesBits, false);
  if (cost < other + ELEMENTARY_STEPS * productCost(seriesBits)) {
    const value = byFraction(b, steps, x, size, bits);
    if (value !== undefined) return value;
  }
  return convergent(b, x, size * (1 + 1e-12), seriesBits);
}

/** Continued fraction at b + steps in (−1, 0] (or b itself), then x G_(β−1) = 1 − β G_β downward; β <= 0, so nothing cancels. */
function byFraction(b: Exponent, steps: number, x: Ball, size: number, bits: number): Ball | undefined {
  const work = bits + (steps > 0 ? 10 + Math.ceil(Math.log2(steps + 1)) : 0);
  const top = steps === 0 ? b : { ...b, value: b.value.add(Rational.of(steps)), approx: b.approx + steps };
  const plan = planFraction(size, 0, top.approx, work);
  if (plan === undefined) return undefined;
  let value = fractionReal(x, top, plan);
  for (let k = steps; k >= 1; k--) {
    const beta = R.fromRational(b.value.add(Rational.of(k)), work);
    value = R.div(R.sub(R.ONE, R.mul(beta, value, work), work), x, work);
  }
  return value;
}

function convergent(b: Exponent, x: Ball, size: number, bits: number): Ball {
  const logX = log(x, bits + 30);
  const e = exp(x, bits);
  const sum = exponentialSum(R.neg(x), size, b, bits);
  let rest: Ball;
  if (b.m < 0) {
    const minus = R.fromRational(b.value.neg(), bits + 30);
    const power = exp(R.neg(R.mul(minus, logX, bits + 30)), bits + 4);
    rest = R.neg(R.mul(gamma(minus, bits + 4), power, bits));
  } else {
    const part = R.mul(powerOverFactorial(x, logX, b.m, bits), polePart(logX, b.eps, b.m, bits).quotient, bits);
    rest = b.m % 2 === 0 ? part : R.neg(part);
  }
  return R.neg(R.mul(e, R.add(rest, sum, bits), bits));
}
