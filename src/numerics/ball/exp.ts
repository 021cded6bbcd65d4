/**
 * @module Real exponential function and its relatives: exp, expm1, sinh, cosh, tanh.
 *
 * Purpose    enclosures for balls of any size, with relative accuracy where the value is small (expm1, sinh near 0).
 * Method     exp x = 2^n·exp t, t = x − n ln 2 in [0, ln 2), by tables (expFixed) or, long, by several primes (expSmooth); small arguments of expm1 and sinh by their series.
 * Bound      |e^(m+d) − e^m| <= e^m·(e^r − 1) <= e^m·r(1 + r) for |d| <= r <= 1/4; wider balls by e^m·(cosh r ± sinh r).
 */
import { ln2Fixed } from './constants.js';
import { wordPrec } from './fixed.js';
import { expFixed, FIXED_ULPS } from './fixed-tables.js';
import * as R from './real.js';
import type { Ball } from './real.js';
import { REACH, SMOOTH_FROM } from './smooth.js';
import { expSmooth, SMOOTH_ULPS } from './smooth-exp.js';
import { shift } from '../bits.js';

/** Exponents beyond 2^HUGE_BITS are not followed: the result is unbounded, or enclosed as next to nothing. */
const HUGE_BITS = 45;
const GUARD = 20;

/** exp of the midpoint mid·2^exp, |x| < 2^up, to prec bits. */
function expMid(x: Ball, up: number, prec: number): Ball {
  const wp = wordPrec(prec + GUARD);
  if (up < -wp) return R.addError(R.ONE, 1, up + 1);
  if (wp >= SMOOTH_FROM && up <= REACH) return fromSmooth(shift(x.mid, x.exp + wp), wp, 0, prec);
  const extra = Math.max(0, up) + 4;
  const t = shift(x.mid, x.exp + wp + extra);
  const ln2 = ln2Fixed(wp + extra);
  let n = t / ln2;
  if (t < 0n) n -= 1n;
  // |n| < 2^(up+1), so n·ln 2 is right to 2^(up+2−extra) < 1 ulp of 2^-wp; the three floors lose 3 more.
  const r = (t - n * ln2) >> BigInt(extra);
  if (wp >= SMOOTH_FROM) return fromSmooth(r, wp, Number(n), prec);
  return R.ball(expFixed(r, wp), Number(n) - wp, FIXED_ULPS + 16, prec);
}

/** 2^n·exp(t·2^-wp) for t off by less than 4 units, each of which changes the mantissa by less than 2. */
function fromSmooth(t: bigint, wp: number, n: number, prec: number): Ball {
  const e = expSmooth(t, wp);
  return R.ball(e.y, n + e.n - wp, SMOOTH_ULPS + 8, prec);
}

/** e^x. INDETERMINATE when x may exceed 2^45. */
export function exp(x: Ball, prec: number): Ball {
  if (x.rad === Infinity) return R.INDETERMINATE;
  if (R.isExactZero(x)) return R.ONE;
  const up = R.upperBits(x);
  if (up > HUGE_BITS) return R.isNegative(x) ? hugeNegative(x) : R.INDETERMINATE;
  const y = expMid(x, up, prec);
  if (x.rad === 0) return y;
  const r = R.radiusToNumber(x);
  if (r <= 0.25) return R.addRelativeError(y, x.rad * (1 + r), x.exp);
  if (r <= 500) return R.addRelativeError(R.mul(y, R.fromNumber(Math.cosh(r)), prec), Math.tanh(r) + 1e-10);
  // Wider still: the result lies between 0 and e^(m + r).
  const top = expMid(R.fromNumber(r), Math.ceil(Math.log2(r)) + 1, prec);
  const half = R.mul2exp(R.mul(y, top, prec), -1);
  return R.addRelativeError(half, 1);
}

/** Encloses e^x for certainly negative x with |x| of 2^45 or more. */
function hugeNegative(x: Ball): Ball {
  // e^x < 1 always; where the ball is narrow, |x| > 2^low and e^x < 2^(−2^low).
  const low = R.accuracyBits(x) > 2 ? R.upperBits(R.exactMid(x)) - 2 : 0;
  return R.ball(0n, low > 0 ? -(2 ** Math.min(low, HUGE_BITS)) : 0, 1);
}

/** e^x − 1 with relative accuracy near 0. */
export function expm1(x: Ball, prec: number): Ball {
  const e = -R.upperBits(x);
  if (R.isExactZero(x)) return R.ZERO;
  if (e < 2) return R.sub(exp(x, prec + 8), R.ONE, prec);
  if (e < prec / 8) return R.sub(exp(x, prec + e + 8), R.ONE, prec);
  // Σ_{k=1}^{n} x^k/k!, |x| < 2^-e, tail below 2|x|^(n+1)/(n+1)! <= |x|·2^(−en).
  const n = Math.ceil(prec / e) + 1;
  const work = prec + 8;
  let s: Ball = R.ONE;
  for (let k = n; k >= 2; k--) s = R.add(R.ONE, R.div(R.mul(s, x, work), R.fromNumber(k), work), work);
  return R.mul(x, R.addError(s, 1, -e * n), prec);
}

/** (e^x − e^−x)/2 with relative accuracy near 0. */
export function sinh(x: Ball, prec: number): Ball {
  const e = -R.upperBits(x);
  if (e < 2) {
    const y = exp(x, prec + 10);
    return R.mul2exp(R.sub(y, R.div(R.ONE, y, prec + 10), prec), -1);
  }
  // sinh x = (m + m/(1 + m))/2 with m = e^x − 1.
  const m = expm1(x, prec + 10);
  return R.mul2exp(R.add(m, R.div(m, R.add(R.ONE, m, prec + 10), prec + 10), prec), -1);
}

/** (e^x + e^−x)/2. */
export function cosh(x: Ball, prec: number): Ball {
  const y = exp(R.abs(x), prec + 10);
  return R.mul2exp(R.add(y, R.div(R.ONE, y, prec + 10), prec), -1);
}

/** tanh x = m/(m + 2) with m = e^2x − 1, relatively accurate near 0; |tanh′| <= min(1, 4 e^(−2|x|)). */
export function tanh(x: Ball, prec: number): Ball {
  if (R.isExactZero(x)) return R.ZERO;
  if (x.rad === Infinity) return UNIT;
  const mid = R.exactMid(x);
  // Beyond it the value is ±1 to more than 2^45 bits.
  if (R.upperBits(mid) > HUGE_BITS) return x.rad === 0 ? R.addError(signOf(mid), 1, -(2 ** HUGE_BITS)) : UNIT;
  const m = expm1(R.neg(R.mul2exp(R.abs(mid), 1)), prec + 10);
  const size = R.div(R.neg(m), R.add(m, TWO, prec + 10), prec);
  const y = mid.mid < 0n ? R.neg(size) : size;
  if (x.rad === 0) return y;
  const r = R.radiusToNumber(x);
  const decay = 4 * Math.exp(-2 * Math.min(300, Math.max(0, Math.abs(R.toNumber(mid)) * (1 - 1e-12) - r)));
  return R.addError(y, x.rad * Math.min(1, decay * 1.001), x.exp);
}

const UNIT: Ball = { mid: 0n, exp: 0, rad: 1 };
const TWO: Ball = { mid: 2n, exp: 0, rad: 0 };
const signOf = (x: Ball): Ball => (x.mid < 0n ? R.neg(R.ONE) : R.ONE);
