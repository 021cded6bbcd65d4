/**
 * @module Natural logarithm of a positive ball, and log(1 + x).
 *
 * Purpose    enclosures with relative accuracy everywhere, next to x = 1 too.
 * Method     x = f·2^k; with y the double logarithm of f cut to 24 bits and E = e^y from the tables of exp:
 *            log f = y + 2 artanh((f − E)/(f + E)), whose argument is below 2^-25; next to 1 (within 2^-30) y = 0 and E = 1 exactly.
 *            Long precisions: E a fraction of smooth integers near f (smooth.ts), y its logarithm from those of the primes.
 * Bound      d/dx log x = 1/x: a ball of relative radius t = r/m < 1 gives |log(1 ± t)| <= t/(1 − t).
 */
import { bitLength, shift } from '../bits.js';
import { ln2Fixed } from './constants.js';
import { wordPrec } from './fixed.js';
import { expLeading, TABLE_ULPS } from './fixed-tables.js';
import { divMag, magLower, magRadius, widenMag } from './mag.js';
import { ODD_ULPS, oddSeries } from './odd-series.js';
import * as R from './real.js';
import type { Ball } from './real.js';
import { rowsFor, SMOOTH_FROM, smoothExponents, smoothFraction, smoothLog, WORD } from './smooth.js';
import { Rational } from '../rational.js';

const GUARD = 22;
/** |f − 1| below 2^-NEAR: the start value is 0. */
const NEAR = 30;
/** Levels of the tables that make the start value (heuristic). */
const START_LEVELS = 3;
/** Most rows of the smooth reduction: beyond 2^-45 a double logarithm says nothing. */
const MOST_ROWS = 22;

/** log x for x > 0; INDETERMINATE when the ball reaches zero. */
export function log(x: Ball, prec: number): Ball {
  if (!R.isPositive(x)) return R.INDETERMINATE;
  const y = logMid(x, prec);
  if (x.rad === 0) return y;
  // rad/(mid − rad) = t/(1 − t)
  return widenMag(y, divMag(magRadius(x), magLower(x)));
}

/** m·2^-bits as a double in [1/2, 1], below by at most 2^-50. */
function mantissa(m: bigint, bits: number): number {
  return Number(bits > 60 ? m >> BigInt(bits - 60) : m << BigInt(60 - bits)) * 2 ** -60;
}

function logMid(x: Ball, prec: number): Ball {
  const bits = bitLength(x.mid);
  let f = mantissa(x.mid, bits);
  let k = bits + x.exp;
  if (f < Math.SQRT1_2) {
    f *= 2;
    k--;
  }
  if (k !== 0) return logFar(x.mid, x.exp - k, f, k, prec, 0);
  // x itself lies in [0.7, 1.42]: measure the distance from 1 exactly.
  const one = 1n << BigInt(-x.exp);
  const d = x.mid - one;
  if (d === 0n) return R.ZERO;
  const lost = bits - bitLength(d);
  if (lost < NEAR) return logFar(x.mid, x.exp, f, 0, prec, Math.max(0, lost));
  const wp = wordPrec(prec + GUARD + lost);
  const u = (d << BigInt(wp)) / (x.mid + one);
  return R.ball(oddSeries(u, wp, 1), 1 - wp, ODD_ULPS + 2, prec);
}

/** log(m·2^e) + k ln 2 with m·2^e near the double f in [0.7, 1.42]; `extra` bits guard a small result. */
function logFar(m: bigint, e: number, f: number, k: number, prec: number, extra: number): Ball {
  const wp = wordPrec(prec + GUARD + extra);
  const v = wp < SMOOTH_FROM ? logByTables(shift(m, e + wp), f, wp) : logSmooth(shift(m, e + wp), f, wp);
  return R.ball(k === 0 ? v : v + timesLn2(k, wp), -wp, LOG_ULPS + 3, prec);
}

/** k ln 2 in units of 2^-wp, off by less than 3. */
function timesLn2(k: number, wp: number): bigint {
  const bits = bitLength(BigInt(k));
  return (BigInt(k) * ln2Fixed(wp + bits)) >> BigInt(bits);
}

/** Error bound of the two that follow, in units of 2^-wp. */
const LOG_ULPS = 6 * TABLE_ULPS + 2 * ODD_ULPS + 16;

/** log x for fixed-point x off by less than 1 and near the double f: the start value is a product of table entries. */
function logByTables(x: bigint, f: number, wp: number): bigint {
  const w = BigInt(wp);
  const bits = 8 * START_LEVELS;
  const start = Math.round(Math.log(f) * 2 ** bits);
  const power = expLeading(Math.abs(start), START_LEVELS, wp);
  // E = e^y for y >= 0; for y < 0 compare f·e^|y| with 1 instead.
  const fx = start >= 0 ? x : (x * power) >> w;
  const ex = start >= 0 ? power : 1n << w;
  // fx and ex are off by at most 1.5·TABLE_ULPS + 2 and their sum exceeds 1.4: u is right to 3·TABLE_ULPS + 4.
  const u = ((fx - ex) << w) / (fx + ex);
  return (BigInt(start) << BigInt(wp - bits)) + 2n * oddSeries(u, wp, 1);
}

/**
 * The same with E = 2^e₀ num/den: log x = Σ e_j log p_j + 2 artanh((x·den − 2^e₀ num)/(x·den + 2^e₀ num)). Both are brought to the size of
 * num·2^(wp − |num|) in [2^(wp−1), 2^wp), where they are off by 2.5 and 1: u is right to 5, twice that and smoothLog's 2 make less than 13.
 */
function logSmooth(x: bigint, f: number, wp: number): bigint {
  const e = smoothExponents(Math.round(Math.log(f) * 2 ** WORD), 0, Math.min(MOST_ROWS, rowsFor(wp)));
  const { num, den } = smoothFraction(e);
  const size = bitLength(num);
  const fx = shift(x * den, -size - e[0]!);
  const ex = shift(num, wp - size);
  const u = ((fx - ex) << BigInt(wp)) / (fx + ex);
  return smoothLog(e, wp) + 2n * oddSeries(u, wp, 1);
}

/** log(1 + x) for x > −1, with relative accuracy near 0. */
export function log1p(x: Ball, prec: number): Ball {
  if (R.isExactZero(x)) return R.ZERO;
  const e = -R.upperBits(x);
  if (e < 4 || e < prec / 8) {
    // The sum is exact for an exact x, and keeps x's own accuracy otherwise.
    return log(R.add(R.ONE, x, x.rad === 0 ? 1e9 : prec + Math.max(0, e) + 16), prec);
  }
  // x·Σ_{k=0}^{n-1} (−x)^k/(k+1), |x| < 2^-e: tail below 2·2^(−en).
  const n = Math.ceil(prec / e) + 1;
  const work = prec + 8;
  const minus = R.neg(x);
  const inverse = (k: number): Ball => R.fromRational(Rational.of(1n, BigInt(k)), work);
  let s = inverse(n);
  for (let k = n - 1; k >= 1; k--) s = R.add(R.mul(s, minus, work), inverse(k), work);
  return R.mul(x, R.addError(s, 2, -e * n), prec);
}
