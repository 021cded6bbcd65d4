/**
 * @module Natural logarithm of a positive ball, and log(1 + x).
 *
 * Purpose    enclosures with relative accuracy everywhere, next to x = 1 too.
 * Method     x = f·2^k; with y the double logarithm of f cut to 24 bits and E = e^y from the tables of exp (beyond them y in full):
 *            log f = y + 2 artanh((f − E)/(f + E)), whose argument is below 2^-25; next to 1 (within 2^-30) y = 0 and E = 1 exactly.
 * Bound      d/dx log x = 1/x: a ball of relative radius t = r/m < 1 gives |log(1 ± t)| <= t/(1 − t).
 */
import { bitLength, shift } from '../bits.js';
import { ln2Fixed } from './constants.js';
import { wordPrec } from './fixed.js';
import { expFixed, expLeading, FIXED_ULPS, TABLE_ULPS } from './fixed-tables.js';
import { divMag, magLower, magRadius, widenMag } from './mag.js';
import { ODD_ULPS, oddSeries } from './odd-series.js';
import * as R from './real.js';
import type { Ball } from './real.js';
import { Rational } from '../rational.js';

const GUARD = 22;
/** |f − 1| below 2^-NEAR: the start value is 0. */
const NEAR = 30;
/** Levels of the tables that make the start value, and the working precision up to which they serve (heuristic). */
const START_LEVELS = 3;
const TABLE_START = 4096;

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
  const w = BigInt(wp);
  // The start value has as many bits as the tables of exp deliver by products alone, or all of a double.
  const levels = wp <= TABLE_START ? START_LEVELS : 0;
  const bits = levels > 0 ? 8 * levels : 52;
  const start = Math.round(Math.log(f) * 2 ** bits);
  const y = BigInt(start) << BigInt(wp - bits);
  const power = levels > 0 ? expLeading(Math.abs(start), levels, wp) : expFixed(y < 0n ? -y : y, wp);
  const ulps = levels > 0 ? TABLE_ULPS : FIXED_ULPS;
  let fx = shift(m, e + wp);
  let ex = 1n << w;
  // E = e^y for y >= 0; for y < 0 compare f·e^|y| with 1 instead.
  if (start >= 0) ex = power;
  else fx = (fx * power) >> w;
  const u = ((fx - ex) << w) / (fx + ex);
  // fx and ex are off by at most 1.5·ulps + 2 and their sum exceeds 1.4: u is right to 3·ulps + 4.
  let v = y + 2n * oddSeries(u, wp, 1);
  if (k !== 0) {
    const kb = bitLength(BigInt(k));
    v += (BigInt(k) * ln2Fixed(wp + kb)) >> BigInt(kb);
  }
  return R.ball(v, -wp, 6 * ulps + 2 * ODD_ULPS + 16, prec);
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
