/**
 * @module Real balls: midpoint–radius intervals on BigInt mantissas.
 *
 * Purpose    every operation returns a ball that contains the exact result for every choice of points in its arguments.
 * Method     a ball is (mid ± rad)·2^exp; mid is a BigInt, rad a non-negative double in units of 2^exp.
 *            Results are rounded to `prec` bits; the rounding error (half a unit) is added to the radius.
 * Bound      every radius is a sum of at most eight rounded-to-nearest double operations on upper bounds, each off by
 *            a relative 2^-53 at most; the factor UP = 1 + 2^-48 covers them all.
 * Reference  F. Johansson, "Arb: efficient arbitrary-precision midpoint-radius interval arithmetic",
 *            IEEE Trans. Comput. 66 (2017) 1281 (the idea of a low-precision radius beside a long midpoint).
 */
import { bitLength, isqrt, shift } from '../bits.js';
import { Rational } from '../rational.js';

export interface Ball {
  readonly mid: bigint;
  readonly exp: number;
  /** Radius in units of 2^exp; Infinity means "any real number". */
  readonly rad: number;
}

const UP = 1 + 2 ** -48;
/** A radius beyond this many units says that the low bits of mid mean nothing: they are dropped. */
const COARSE_BITS = 40;
/** Smallest positive radius kept; smaller ones are rounded up to it so that no product of radii underflows to 0. */
const TINY = 2 ** -900;

export const ZERO: Ball = { mid: 0n, exp: 0, rad: 0 };
export const ONE: Ball = { mid: 1n, exp: 0, rad: 0 };
/** The ball of all reals: the answer where nothing can be said. */
export const INDETERMINATE: Ball = { mid: 0n, exp: 0, rad: Infinity };

/** Rounds (mid ± rad)·2^exp to at most `prec` bits, dropping bits that the radius makes meaningless. */
function rounded(mid: bigint, exp: number, rad: number, prec: number): Ball {
  if (!(rad < Infinity)) return INDETERMINATE;
  let drop = bitLength(mid) - prec;
  if (rad > 2 ** COARSE_BITS) drop = Math.max(drop, Math.ceil(Math.log2(rad)) - COARSE_BITS + 8);
  if (drop > 0) {
    mid = (mid + (1n << BigInt(drop - 1))) >> BigInt(drop);
    exp += drop;
    rad = rad * 2 ** -drop + 0.5;
  }
  if (rad > 0) rad = rad < TINY ? TINY : rad * UP;
  return { mid, exp, rad };
}

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
  const half = Math.trunc(e / 2);
  return { mid: BigInt(x * 2 ** -half * 2 ** -(e - half)), exp: e, rad: 0 };
}

/** The rational q to `prec` bits (exact when its denominator is a power of two and it fits). */
export function fromRational(q: Rational, prec: number): Ball {
  if (q.den === 1n) return rounded(q.num, 0, 0, prec);
  const k = Math.max(0, prec + 2 - bitLength(q.num) + bitLength(q.den));
  const n = q.num << BigInt(k);
  const mid = n / q.den;
  return rounded(mid, -k, mid * q.den === n ? 0 : 1, prec);
}

/** Ball with the given midpoint and an added absolute radius |r| (upper bound taken). */
export function widen(a: Ball, r: Ball): Ball {
  const up = upperBits(r);
  if (up === -Infinity) return a;
  if (!(r.rad < Infinity)) return INDETERMINATE;
  // |r| <= (|mid| + rad)·2^exp, turned into units of 2^a.exp with a long enough mantissa.
  const target = Math.min(a.exp, up - 30);
  const m = a.exp === target ? a.mid : shift(a.mid, a.exp - target);
  const rr = toNumberAbs(r.mid, r.exp - target) * UP + r.rad * 2 ** (r.exp - target);
  return rounded(m, target, a.rad * 2 ** (a.exp - target) + rr, Infinity);
}

/** |m|·2^e as a double, rounded up (may be Infinity). */
function toNumberAbs(m: bigint, e: number): number {
  if (m === 0n) return 0;
  const bits = bitLength(m);
  const drop = Math.max(0, bits - 60);
  const top = Math.abs(Number(drop > 0 ? m >> BigInt(drop) : m)) + (drop > 0 ? 1 : 0);
  return scale2(top * UP, e + drop);
}

/** x·2^k without losing the range to an intermediate overflow. */
function scale2(x: number, k: number): number {
  if (k > 1000) return scale2(x * 2 ** 1000, k - 1000);
  if (k < -1000) return x === 0 ? 0 : scale2(x * 2 ** -1000, k + 1000);
  return x * 2 ** k;
}

/** Exponent E with |x| < 2^E for every x in the ball; -Infinity for exact zero, Infinity for INDETERMINATE. */
export function upperBits(a: Ball): number {
  if (a.rad === 0) return a.mid === 0n ? -Infinity : a.exp + bitLength(a.mid);
  if (a.rad === Infinity) return Infinity;
  const b = bitLength(a.mid);
  const r = Math.ceil(Math.log2(a.rad)) + 1;
  return a.exp + Math.max(b, r) + 1;
}

/** Number of correct leading bits: log2 of |mid|/rad, Infinity when exact, negative when the ball is wider than its midpoint. */
export function accuracyBits(a: Ball): number {
  if (a.rad === 0) return Infinity;
  if (a.rad === Infinity) return -Infinity;
  if (a.mid === 0n) return -Math.max(0, Math.log2(a.rad));
  return bitLength(a.mid) - 1 - Math.log2(a.rad);
}

export function add(a: Ball, b: Ball, prec: number): Ball {
  if (a.rad === Infinity || b.rad === Infinity) return INDETERMINATE;
  if (a.mid === 0n && a.rad === 0) return rounded(b.mid, b.exp, b.rad, prec);
  if (b.mid === 0n && b.rad === 0) return rounded(a.mid, a.exp, a.rad, prec);
  if (a.exp < b.exp) [a, b] = [b, a];
  const gap = a.exp - b.exp; // a has the coarser unit
  if (gap === 0) return rounded(a.mid + b.mid, a.exp, a.rad + b.rad, prec);
  if (gap > prec + 64 && bitLength(b.mid) < gap - 1 && a.mid !== 0n && Number.isFinite(prec)) {
    // b is below a's last bit and beyond the precision: it only widens.
    const fine = Math.max(0, prec + 4 - bitLength(a.mid));
    if (bitLength(b.mid) < gap - fine - 1) {
      const rb = scale2(b.rad + 1, -(gap - fine)) + toNumberAbs(b.mid, -(gap - fine));
      return rounded(a.mid << BigInt(fine), a.exp - fine, a.rad * 2 ** fine + rb, prec);
    }
  }
  return rounded((a.mid << BigInt(gap)) + b.mid, b.exp, scale2(a.rad, gap) + b.rad, prec);
}

export function neg(a: Ball): Ball {
  return { mid: -a.mid, exp: a.exp, rad: a.rad };
}

export function sub(a: Ball, b: Ball, prec: number): Ball {
  return add(a, neg(b), prec);
}

export function mul(a: Ball, b: Ball, prec: number): Ball {
  const mid = a.mid * b.mid;
  const exp = a.exp + b.exp;
  if (a.rad === 0 && b.rad === 0) return rounded(mid, exp, 0, prec);
  if (a.rad === Infinity || b.rad === Infinity) {
    return isExactZero(a) || isExactZero(b) ? ZERO : INDETERMINATE;
  }
  const la = Math.abs(Number(a.mid));
  const lb = Math.abs(Number(b.mid));
  if (la < Infinity && lb < Infinity) {
    const rad = la * b.rad + lb * a.rad + a.rad * b.rad;
    if (rad < Infinity) return rounded(mid, exp, rad, prec);
  }
  // Long mantissas: express the radius in units of 2^(exp+drop), where it is of moderate size.
  const drop = Math.max(0, bitLength(mid) - Math.min(prec, 1 << 30) - 8);
  const rad =
    toNumberAbs(a.mid, -drop) * b.rad + toNumberAbs(b.mid, -drop) * a.rad + scale2(a.rad * b.rad, -drop) + (drop > 0 ? 1 : 0);
  return rounded(drop > 0 ? mid >> BigInt(drop) : mid, exp + drop, rad, prec);
}

/** a·2^k, exact. */
export function mul2exp(a: Ball, k: number): Ball {
  return a.mid === 0n && a.rad === 0 ? a : { mid: a.mid, exp: a.exp + k, rad: a.rad };
}

/** Quotient; INDETERMINATE when b may be zero. Bound: |a/b − q| <= (ra + |q| rb)/(|b| − rb) + truncation. */
export function div(a: Ball, b: Ball, prec: number): Ball {
  const la = bitLength(a.mid);
  const lb = bitLength(b.mid);
  if (containsZero(b) || a.rad === Infinity) return INDETERMINATE;
  const k = Math.max(0, prec + 2 - la + lb);
  const n = k > 0 ? a.mid << BigInt(k) : a.mid;
  const q = n / b.mid;
  const exp = a.exp - b.exp - k;
  if (a.rad === 0 && b.rad === 0) return rounded(q, exp, q * b.mid === n ? 0 : 1, prec);
  // Everything in units of the quotient, 2^exp: dividing by |b| − rb, a lower bound of the divisor.
  const low = (toNumberAbs(b.mid, -lb) * (1 - 2 ** -40) - scale2(b.rad, -lb) * UP) * (1 - 2 ** -48);
  if (!(low > 0)) return INDETERMINATE;
  const rad = (scale2(a.rad, k - lb) + (toNumberAbs(q, 0) + 1) * scale2(b.rad, -lb)) / low + 1;
  if (rad < Infinity) return rounded(q, exp, rad, prec);
  const drop = Math.max(0, bitLength(q) - prec - 8) + 64;
  const rad2 = (scale2(a.rad, k - lb - drop) + (toNumberAbs(q, -drop) + 1) * scale2(b.rad, -lb)) / low + 2;
  return rounded(q >> BigInt(drop), exp + drop, rad2, prec);
}

/** Square root; INDETERMINATE when the ball reaches below zero, exact zero stays exact. */
export function sqrt(a: Ball, prec: number): Ball {
  if (isExactZero(a)) return ZERO;
  if (!isPositive(a)) return INDETERMINATE;
  let k = Math.max(0, 2 * prec + 4 - bitLength(a.mid));
  if ((a.exp - k) & 1) k++;
  const n = a.mid << BigInt(k);
  const r = isqrt(n);
  const exp = (a.exp - k) / 2;
  if (a.rad === 0) return rounded(r, exp, r * r === n ? 0 : 1, prec);
  // |sqrt(x) − sqrt(m)| <= rad/sqrt(m) since sqrt(x) + sqrt(m) >= sqrt(m); halved when the ball is narrow.
  const lr = bitLength(r);
  const root = toNumberAbs(r, -lr) * (1 - 2 ** -40);
  const rad = scale2(a.rad, k - lr) / root;
  return rounded(r, exp, rad + 1, prec);
}

export function abs(a: Ball): Ball {
  if (isPositive(a) || a.rad === 0) return a.mid < 0n ? neg(a) : a;
  if (isNegative(a)) return neg(a);
  // straddles zero: [0, |mid| + rad]
  const top = shift(a.mid < 0n ? -a.mid : a.mid, 1);
  return top === 0n ? { ...a } : { mid: top >> 1n, exp: a.exp, rad: a.rad };
}

/** Non-negative integer power by repeated squaring. */
export function powInt(a: Ball, n: number, prec: number): Ball {
  if (n < 0) return div(ONE, powInt(a, -n, prec + 4), prec);
  const work = prec + 2 * Math.ceil(Math.log2(n + 2));
  let result: Ball = ONE;
  let base = a;
  for (let k = n; k > 0; k = Math.floor(k / 2)) {
    if (k % 2 === 1) result = mul(result, base, work);
    if (k > 1) base = mul(base, base, work);
  }
  return rounded(result.mid, result.exp, result.rad, prec);
}

/** Certain-truth predicates: each returns true only when it holds for every point of the ball. */
export function isExactZero(a: Ball): boolean {
  return a.mid === 0n && a.rad === 0;
}
export function isPositive(a: Ball): boolean {
  return a.mid > 0n && exceedsRadius(a);
}
export function isNegative(a: Ball): boolean {
  return a.mid < 0n && exceedsRadius(a);
}
export function containsZero(a: Ball): boolean {
  return !exceedsRadius(a) || a.mid === 0n;
}
function exceedsRadius(a: Ball): boolean {
  if (a.rad === 0) return a.mid !== 0n;
  if (a.rad === Infinity) return false;
  const m = Math.abs(Number(a.mid));
  return m * (1 - 2 ** -50) > a.rad * UP;
}

/** Does the ball contain the exact rational q? */
export function containsRational(a: Ball, q: Rational): boolean {
  if (a.rad === Infinity) return true;
  // |mid·2^exp − q| <= rad·2^exp, compared exactly.
  const unit = a.exp >= 0 ? Rational.of(1n << BigInt(a.exp)) : Rational.of(1n, 1n << BigInt(-a.exp));
  const diff = q.div(unit).sub(Rational.of(a.mid)).abs();
  return diff.cmp(Rational.fromNumber(a.rad)) <= 0;
}

/** Do the two balls share a point? (true also when the double comparison cannot exclude it) */
export function overlaps(a: Ball, b: Ball): boolean {
  return containsZero(sub(a, b, 1e9));
}

/** -1 or 1 when certain, 0 when the balls overlap. */
export function compare(a: Ball, b: Ball, prec: number): -1 | 0 | 1 {
  const d = sub(a, b, prec);
  return isPositive(d) ? 1 : isNegative(d) ? -1 : 0;
}

/** Midpoint as a double (nearest within an ulp or two; ±Infinity or 0 outside the range). */
export function toNumber(a: Ball): number {
  const bits = bitLength(a.mid);
  const drop = Math.max(0, bits - 64);
  return scale2(Number(drop > 0 ? a.mid >> BigInt(drop) : a.mid), a.exp + drop);
}

/** Radius as a double, rounded up. */
export function radiusToNumber(a: Ball): number {
  return scale2(a.rad * UP, a.exp);
}

/** The midpoint as an exact rational. */
export function midpoint(a: Ball): Rational {
  return a.exp >= 0 ? Rational.of(a.mid << BigInt(a.exp)) : Rational.of(a.mid, 1n << BigInt(-a.exp));
}

/** The ball with its radius set to zero: a starting value for iterations that are verified afterwards. */
export function exactMid(a: Ball): Ball {
  return { mid: a.mid, exp: a.exp, rad: 0 };
}

/** Rounds a ball to prec bits. */
export function round(a: Ball, prec: number): Ball {
  return rounded(a.mid, a.exp, a.rad, prec);
}
