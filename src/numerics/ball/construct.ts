/**
 * @module Making real balls, and giving them errors.
 *
 * Purpose    from integers, doubles, rationals and fixed-point numbers; radii grown by absolute or relative bounds.
 */
import { bitLength } from '../bits.js';
import type { Rational } from '../rational.js';
import { absUp, INDETERMINATE, rounded, scale2, scaleUp } from './core.js';
import type { Ball } from './core.js';

/** A tiny error on an exact midpoint is kept sharp by lengthening the midpoint, up to this many bits. */
const LENGTHEN_LIMIT = 1 << 17;

/** (mid ± rad)·2^exp rounded to prec bits; rad in units of 2^exp. */
export function ball(mid: bigint, exp: number, rad = 0, prec = Infinity): Ball {
  return rounded(mid, exp, rad, prec);
}

/** Exact ball of an integer, or of a double (exactly the double's value). Throws RangeError on NaN and infinities. */
export function fromNumber(x: number | bigint): Ball {
  if (typeof x === 'bigint') return { mid: x, exp: 0, rad: 0 };
  if (Number.isInteger(x) && Math.abs(x) <= Number.MAX_SAFE_INTEGER) return { mid: BigInt(x), exp: 0, rad: 0 };
  if (!Number.isFinite(x)) throw new RangeError(`ball.fromNumber: ${x} is not finite`);
  const e = Math.floor(Math.log2(Math.abs(x))) - 54;
  return { mid: BigInt(scale2(x, -e)), exp: e, rad: 0 };
}

/** The rational q to `prec` bits (exact when its denominator is a power of two and it fits). */
export function fromRational(q: Rational, prec: number): Ball {
  if (q.den === 1n) return rounded(q.num, 0, 0, prec);
  const k = Math.max(0, prec + 2 - bitLength(q.num) + bitLength(q.den));
  const n = q.num << BigInt(k);
  const mid = n / q.den;
  return rounded(mid, -k, mid * q.den === n ? 0 : 1, prec);
}

/** a with the absolute error r·2^e added to its radius (r >= 0). */
export function addError(a: Ball, r: number, e = 0): Ball {
  if (r === 0) return a;
  const d = e - a.exp;
  if (a.rad === 0 && d < -400 && a.mid !== 0n) {
    // An exact midpoint: lengthen it so that the tiny radius can be written in its units.
    const k = Math.min(-d, LENGTHEN_LIMIT);
    return rounded(a.mid << BigInt(k), a.exp - k, scaleUp(r, d + k), Infinity);
  }
  if (a.mid === 0n && a.rad === 0) return rounded(0n, e, r, Infinity);
  if (d <= 0) return rounded(a.mid, a.exp, a.rad + scaleUp(r, d), Infinity);
  return rounded(a.mid, a.exp, r + scaleUp(a.rad, -d), Infinity, d);
}

/** a with its radius grown by |a|·d·2^e, for a relative error d >= 0. */
export function addRelativeError(a: Ball, d: number, e = 0): Ball {
  if (d === 0 || a.rad === Infinity) return a;
  const cut = Math.max(0, bitLength(a.mid) - 60);
  return addError(a, (absUp(a.mid, -cut) + scaleUp(a.rad, -cut)) * d, a.exp + cut + e);
}

/** Ball with the given midpoint and an added absolute radius |r| (upper bound taken). */
export function widen(a: Ball, r: Ball): Ball {
  if (a.rad === Infinity || r.rad === Infinity) return INDETERMINATE;
  const cut = Math.max(0, bitLength(r.mid) - 60);
  return addError(a, absUp(r.mid, -cut) + scaleUp(r.rad, -cut), r.exp + cut);
}
