/**
 * @module G_b(w) = ∫_0^∞ e^{−wv} (1+v)^{−1−b} dv = e^w w^b Γ(−b, w) = U(1, 1−b, w) off the cut w <= 0.
 *
 * Purpose    the branch point away from the path of integration: on the negative axis (real w = x > 0, alternating series and
 *            their terminants) or in the complex plane.
 * Method     the cheapest of: asymptotic series with proved remainder (asymptotic.ts); continued fraction for Re w >= 0, b > −1
 *            (stieltjes-fraction.ts); convergent series
 *            G_b(w) = −e^w [(−1)^m (w^m/m!) (e^A − 1)/ε + Σ_{k≠m} (−w)^k/(k!(k−b))], b = m + ε (pole-part.ts), or with
 *            Γ(−b) w^b as it stands for m < 0. The series cancels by e^(|w| + Re w), which is added to the working precision.
 * Bound      inherited from these; accuracy is checked and bits are added. Radii of w and b: spread.ts.
 * Reference  DLMF 8.6.5, 8.7.3, 8.9, 8.11.2, 13.6.6; R. B. Dingle (1973), chapter 21.
 */
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import { cexp, clog } from '../ball/complex-elementary.js';
import { addMag, divMag, mag, widenMag } from '../ball/mag.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import type { Exact } from '../exact.js';
import { Rational } from '../rational.js';
import { branchAlternating } from './branch-alternating.js';
import { asymptoticComplex, asymptoticLength } from './asymptotic.js';
import { columnSumCost, fractionCost, productCost } from './cost.js';
import { ORDER_ZERO, readExponent } from './exponent.js';
import type { Exponent } from './exponent.js';
import { exponentialSumComplex, exponentialTerms } from './exponential-sum.js';
import { gamma } from './gamma.js';
import { powerOverFactorialComplex, polePartComplex } from './pole-part.js';
import { refine } from './refine.js';
import { modulusLower, spreadCut, spreadE1, spreadExponent } from './spread.js';
import { fractionComplex, fractionTerms, planFraction } from './stieltjes-fraction.js';

/** The logarithm and exponential beside the series, in products (heuristic). */
const ELEMENTARY_STEPS = 200;

/** Does the rectangle certainly avoid the cut (−∞, 0]? */
function offCut(w: Complex): boolean {
  return R.isPositive(w.re) || !R.containsZero(w.im);
}

/** G_b(w) for complex w off the cut and real b. INDETERMINATE when w may touch the cut or |b| > 32768. */
export function branchCut(b: Exact | Rational | Ball, w: Complex, prec: number): Complex {
  const e = readExponent(b, prec);
  if (e === undefined || !offCut(w)) return C.INDETERMINATE;
  if (R.isExactZero(w.im)) return C.fromReal(branchAlternating(b, w.re, prec));
  const mid = exactCut(e, C.exactMid(w), prec);
  const error = addMag(spreadCut(mid, w, e), spreadExponent(e, modulusLower(w)));
  return C.round({ re: widenMag(mid.re, error), im: widenMag(mid.im, error) }, prec);
}

/** e^w E₁(w) for complex w off the cut, accurate to about prec bits relative to its modulus. INDETERMINATE on the cut. */
export function scaledE1(w: Complex, prec: number): Complex {
  if (!offCut(w)) return C.INDETERMINATE;
  if (R.isExactZero(w.im)) return C.fromReal(branchAlternating(Rational.ZERO, w.re, prec));
  const mid = exactCut(ORDER_ZERO, C.exactMid(w), prec);
  const error = spreadE1(w);
  return C.round({ re: widenMag(mid.re, error), im: widenMag(mid.im, error) }, prec);
}

function exactCut(b: Exponent, w: Complex, prec: number): Complex {
  const { re, im } = C.toNumbers(w);
  const size = Math.min(Math.max(Math.hypot(re, im), 1e-300), 1e300);
  const spare = 10 + Math.ceil(Math.log2(2 + Math.abs(b.approx)));
  const far = asymptoticLength(size * (1 - 1e-12), re >= 0, b, prec + 10);
  if (far !== undefined) {
    const series = asymptoticComplex(w, b, far, prec + 10);
    const remainder = divMag(mag(1, Math.ceil(Math.max(far.error, -1e9))), modulusLower(w));
    return { re: widenMag(series.re, remainder), im: widenMag(series.im, remainder) };
  }
  const start = prec + spare + Math.ceil(Math.log2(1 + size + Math.abs(b.approx)));
  return refine(prec, start, (bits) => near(b, w, re, im, size, bits), C.accuracyBits);
}

function near(b: Exponent, w: Complex, re: number, im: number, size: number, bits: number): Complex {
  const boost = Math.ceil((size + re) * Math.LOG2E);
  const seriesBits = bits + Math.max(0, boost);
  if (re > 0 || (re === 0 && size > 1)) {
    const steps = Math.max(0, Math.floor(-b.approx));
    const cost = fractionCost(fractionTerms(re, im, bits) + 2 * steps, bits, true);
    if (
      cost <
      columnSumCost(exponentialTerms(size, seriesBits), seriesBits, true) + ELEMENTARY_STEPS * productCost(seriesBits)
    ) {
      const value = byFraction(b, steps, w, re, im, bits);
      if (value !== undefined) return value;
    }
  }
  return convergent(b, w, size * (1 + 1e-12), seriesBits);
}

/** Continued fraction at b + steps in (−1, 0] (or b itself), then w G_(β−1) = 1 − β G_β downward. */
function byFraction(b: Exponent, steps: number, w: Complex, re: number, im: number, bits: number): Complex | undefined {
  const work = bits + (steps > 0 ? 10 + 2 * Math.ceil(Math.log2(steps + 1)) : 0);
  const top = steps === 0 ? b : { ...b, value: b.value.add(Rational.of(steps)), approx: b.approx + steps };
  const plan = planFraction(re, im, top.approx, work);
  if (plan === undefined) return undefined;
  let value = fractionComplex(w, top, plan);
  for (let k = steps; k >= 1; k--) {
    const beta = R.fromRational(b.value.add(Rational.of(k)), work);
    value = C.div(C.sub(C.ONE, C.mulReal(value, beta, work), work), w, work);
  }
  return value;
}

function convergent(b: Exponent, w: Complex, size: number, bits: number): Complex {
  const z = C.neg(w);
  const e = cexp(w, bits);
  const sum = exponentialSumComplex(z, size, b, bits);
  const logW = clog(w, bits + 30);
  let rest: Complex;
  if (b.m < 0) {
    const minus = R.fromRational(b.value.neg(), bits + 30);
    const power = cexp(C.neg(C.mulReal(logW, minus, bits + 30)), bits + 4);
    rest = C.neg(C.mulReal(power, gamma(minus, bits + 4), bits));
  } else {
    rest = C.mul(powerOverFactorialComplex(z, b.m, bits), polePartComplex(logW, b.eps, b.m, bits), bits);
  }
  return C.neg(C.mul(e, C.add(rest, sum, bits), bits));
}
