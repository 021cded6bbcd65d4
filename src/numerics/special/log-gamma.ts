/**
 * @module log Γ on the positive axis, and log Γ(1 + d) with relative accuracy next to d = 0.
 *
 * Purpose    logarithms of factorials, and the analytic part of the kernels next to integer exponents.
 * Method     X = x + n large enough for Stirling's series (DLMF 5.11.1), log Γ(x) = log Γ(X) − log x(x+1)…(x+n−1);
 *            next to the zeros at 1 and 2 more working bits, or, very close, the Taylor series
 *            log Γ(1+d) = −γ d + Σ_{k>=2} ζ(k)(−d)^k/k (DLMF 5.7.3).
 * Bound      Stirling: stirling.ts. Taylor: the tail after k = n is below 2|d|^(n+1) for |d| <= 1/2, n >= 1.
 *            A radius r: |log Γ(x) − log Γ(m)| <= r·sup|ψ|, |ψ(x)| <= |log x| + 1/x for x > 0.
 */
import { bitLength, shift } from '../bits.js';
import { eulerGamma, pi } from '../ball/constants.js';
import { log, log1p } from '../ball/elementary.js';
import { addMag, magBits, magLower, magRadius, mag, mulMag, widenMag, divMag } from '../ball/mag.js';
import type { Mag } from '../ball/mag.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import { bernoulliSum, risingProduct, SHIFT_RATIO, stirlingTerms } from './stirling.js';
import { zeta } from './zeta.js';

/** log Γ(X) at X = x + n, and the product x(x+1)…(x+n−1). */
export interface ShiftedLogGamma {
  readonly log: Ball;
  readonly product: Ball;
}

const halfLog2Pi = new Map<number, Ball>();

function halfLogTwoPi(prec: number): Ball {
  let value = halfLog2Pi.get(prec);
  if (value === undefined) {
    value = R.mul2exp(log(R.mul2exp(pi(prec + 8), 1), prec + 8), -1);
    if (halfLog2Pi.size > 64) halfLog2Pi.clear();
    halfLog2Pi.set(prec, value);
  }
  return value;
}

/** Number of unit steps that bring x into the reach of Stirling's series at wp bits. */
export function stepsToStirling(x: number, wp: number): number {
  const reach = Math.max(4, Math.ceil(SHIFT_RATIO * wp));
  return x >= reach ? 0 : reach - Math.floor(x);
}

/** For an exact x > 0: both parts with a relative (product) or absolute (log) error of about 2^-wp. */
export function shiftedLogGamma(x: Ball, wp: number): ShiftedLogGamma {
  const n = R.upperBits(x) > 40 ? 0 : stepsToStirling(R.toNumber(x), wp);
  const big = R.add(x, R.fromNumber(n), 1e9);
  const size = R.upperBits(big);
  const work = wp + size + 10; // X log X < 2^(size + log2 size): the logarithm's absolute error stays near 2^-wp
  const logX = log(big, work + 6);
  let sum = R.sub(R.mul(R.sub(big, HALF, 1e9), logX, work + 6), big, work + 6);
  sum = R.add(sum, halfLogTwoPi(work), work);
  sum = R.add(sum, stirlingTail(big, wp), work);
  if (n === 0) return { log: sum, product: R.ONE };
  if (n === 1) return { log: sum, product: x };
  const fixed = shift(x.mid, x.exp + wp + 8);
  const p = risingProduct(fixed, wp + 8, n - 1);
  // x itself enters exactly, so that a tiny x keeps its relative accuracy.
  const product = R.mul(R.ball(p.mid, p.exp, n * 2 ** 6, wp + 8), x, wp + 8);
  return { log: sum, product };
}

const HALF: Ball = { mid: 1n, exp: -1, rad: 0 };

/** Σ_{k>=1} B_2k/(2k(2k−1)X^(2k−1)) to about 2^-wp, for exact X. */
function stirlingTail(big: Ball, wp: number): Ball {
  const bits = R.upperBits(big);
  const log2x = Math.log2(R.toNumber(R.mul2exp(big, -bits))) + bits - 1e-9;
  const { terms, remainder } = stirlingTerms(log2x, wp, true);
  if (terms === 1) return R.ball(0n, Math.ceil(remainder), 1);
  // 1/X² to wp relative bits
  const y = R.div(R.ONE, R.sqr(big, wp + 16), wp + 12);
  const s = bernoulliSum(y.mid, -y.exp, terms, wp, true);
  // y's own relative error, 2^-(wp+10) or less, changes a sum that is below 1/10 by less than one ulp.
  const series = R.ball(s, -wp, 3 * terms + 6);
  const tail = R.div(series, big, wp + 8);
  return R.addError(tail, 1, Math.ceil(remainder));
}

/** Upper bound of |ψ| on a ball of positive numbers. */
export function psiBound(x: Ball): Mag {
  const low = magLower(x);
  const a = Math.abs(magBits(low));
  const b = Math.abs(R.upperBits(x));
  return addMag(mag(Math.max(a, b) * Math.LN2 * 1.0001), divMag(mag(1), low));
}

/** log Γ(x) for x > 0; INDETERMINATE when the ball reaches 0. */
export function logGamma(x: Ball, prec: number): Ball {
  if (!R.isPositive(x)) return R.INDETERMINATE;
  const y = logGammaExact(R.exactMid(x), prec);
  return x.rad === 0 ? y : widenMag(y, mulMag(psiBound(x), magRadius(x)));
}

function logGammaExact(x: Ball, prec: number): Ball {
  // distance from the zeros at 1 and 2
  const d1 = R.sub(x, R.ONE, 1e9);
  const d2 = R.sub(x, TWO, 1e9);
  if (R.isExactZero(d1) || R.isExactZero(d2)) return R.ZERO;
  const e1 = -R.upperBits(d1);
  const e2 = -R.upperBits(d2);
  if (e1 >= 2) return logGamma1p(d1, prec);
  if (e2 >= 2) return R.add(log1p(d2, prec + 8), logGamma1p(d2, prec + 8), prec);
  return direct(x, prec + 8);
}

const TWO: Ball = { mid: 2n, exp: 0, rad: 0 };

function direct(x: Ball, prec: number): Ball {
  const g = shiftedLogGamma(x, prec + 12);
  return R.sub(g.log, log(g.product, prec + 20), prec);
}

/** log Γ(1 + d) for |d| < 1, relatively accurate as d → 0. */
export function logGamma1p(d: Ball, prec: number): Ball {
  if (R.isExactZero(d)) return R.ZERO;
  const e = -R.upperBits(d);
  if (e >= 1 && e > prec / 12) return taylor(d, e, prec);
  const mid = R.exactMid(d);
  const y = R.round(direct(R.add(R.ONE, mid, 1e9), prec + Math.max(0, e) + 8), prec);
  if (d.rad === 0) return y;
  const x = R.add(R.ONE, d, 60 + bitLength(d.mid));
  return R.isPositive(x) ? widenMag(y, mulMag(psiBound(x), magRadius(d))) : R.INDETERMINATE;
}

function taylor(d: Ball, e: number, prec: number): Ball {
  const n = Math.max(2, Math.ceil(prec / e) + 1);
  const work = prec + 10;
  const minus = R.neg(d);
  let s: Ball = R.ZERO;
  for (let k = n; k >= 2; k--) {
    s = R.add(R.mul(s, minus, work), R.div(zeta(k, work), R.fromNumber(k), work), work);
  }
  // −γ d + d²·s = −d(γ − d s)
  s = R.sub(eulerGamma(work), R.mul(d, s, work), work);
  return R.mul(minus, R.addError(s, 2, -e * n), prec);
}
