/**
 * @module Real balls: midpoint–radius intervals on BigInt mantissas.
 *
 * Purpose    every operation returns a ball that contains the exact result for every choice of points in its arguments.
 * Method     a ball is (mid ± rad)·2^exp; mid is a BigInt, rad a non-negative double in units of 2^exp.
 *            Results are rounded to `prec` bits (a positive integer, or Infinity where the function allows it); the
 *            rounding error (half a unit) is added to the radius.
 * Bound      every radius is a sum of at most eight rounded-to-nearest double operations on upper bounds, each off by
 *            a relative 2^-53 at most; the factor UP = 1 + 2^-48 covers them all. Products that could leave the range
 *            of doubles carry a binary exponent beside them until the result's unit is known.
 * Reference  F. Johansson, "Arb: efficient arbitrary-precision midpoint-radius interval arithmetic",
 *            IEEE Trans. Comput. 66 (2017) 1281 (the idea of a low-precision radius beside a long midpoint).
 */
import { bitLength, isqrt } from '../bits.js';
import { Rational } from '../rational.js';

export interface Ball {
  readonly mid: bigint;
  readonly exp: number;
  /** Radius in units of 2^exp; Infinity means "any real number". */
  readonly rad: number;
}

const UP = 1 + 2 ** -48;
/** A radius beyond 2^COARSE_BITS units says that the low bits of mid mean nothing: they are dropped. */
const COARSE_BITS = 40;
/** Smallest positive radius kept; smaller ones are rounded up to it, so that a product of two never underflows to 0. */
const TINY = 2 ** -500;
/** A tiny error on an exact midpoint is kept sharp by lengthening the midpoint, up to this many bits. */
const LENGTHEN_LIMIT = 1 << 17;

export const ZERO: Ball = { mid: 0n, exp: 0, rad: 0 };
export const ONE: Ball = { mid: 1n, exp: 0, rad: 0 };
/** The ball of all reals: the answer where nothing can be said. */
export const INDETERMINATE: Ball = { mid: 0n, exp: 0, rad: Infinity };

/** x·2^k for x >= 0, never rounded down to 0: the result serves as an upper bound (within the factor UP). */
function scaleUp(x: number, k: number): number {
  if (x === 0 || k === 0) return x;
  if (k > 2200) return Infinity;
  if (k < -2200) return Number.MIN_VALUE;
  const half = Math.trunc(k / 2);
  const y = x * 2 ** half * 2 ** (k - half);
  return y < 2 ** -1000 ? y + Number.MIN_VALUE : y;
}

/** x·2^k for a value, without losing the range to an intermediate overflow. */
function scale2(x: number, k: number): number {
  if (k > 2200) return x === 0 ? 0 : x * Infinity;
  if (k < -2200) return x * 0;
  const half = Math.trunc(k / 2);
  return x * 2 ** half * 2 ** (k - half);
}

/** m >> k, rounded to the nearest integer (k > 0). */
function shiftRound(m: bigint, k: number): bigint {
  return ((m >> BigInt(k - 1)) + 1n) >> 1n;
}

/**
 * Rounds (mid ± rad·2^radExp)·2^exp to at most `prec` bits, dropping bits that the radius makes meaningless.
 * The radius may sit on a power of two of its own, so that it can never overflow.
 */
function rounded(mid: bigint, exp: number, rad: number, prec: number, radExp = 0): Ball {
  if (!(rad < Infinity)) return INDETERMINATE;
  let drop = bitLength(mid) - prec;
  if (rad === 0) {
    if (drop > 0) {
      const m = shiftRound(mid, drop);
      // Exact when only zero bits go; the low 30 bits settle it nearly always.
      const lost = BigInt.asUintN(Math.min(drop, 30), mid) !== 0n || m << BigInt(drop) !== mid;
      return { mid: m, exp: exp + drop, rad: lost ? 0.5 : 0 };
    }
    return { mid, exp, rad: 0 };
  }
  if (rad > 2 ** COARSE_BITS || radExp > 0) {
    drop = Math.max(drop, Math.ceil(Math.log2(rad)) + radExp - COARSE_BITS + 8);
  }
  if (drop > 0) {
    mid = shiftRound(mid, drop);
    exp += drop;
    rad = scaleUp(rad, radExp - drop) + 0.5;
  } else if (radExp !== 0) {
    rad = scaleUp(rad, radExp);
  }
  return { mid, exp, rad: rad < TINY ? TINY : rad * UP };
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

/** |m|·2^e as a double, rounded up (may be Infinity). */
function absUp(m: bigint, e: number): number {
  if (m === 0n) return 0;
  const drop = bitLength(m) - 60;
  if (drop <= 0) return scaleUp(Math.abs(Number(m)) * UP, e);
  return scaleUp((Math.abs(Number(m >> BigInt(drop))) + 1) * UP, e + drop);
}

/** Exponent E with |x| < 2^E for every x in the ball; -Infinity for exact zero, Infinity for INDETERMINATE. */
export function upperBits(a: Ball): number {
  if (a.rad === 0) return a.mid === 0n ? -Infinity : a.exp + bitLength(a.mid);
  if (a.rad === Infinity) return Infinity;
  const b = bitLength(a.mid);
  const r = Math.ceil(Math.log2(a.rad)) + 1;
  if (b === 0) return a.exp + r;
  return a.rad < 1 ? a.exp + b : a.exp + Math.max(b, r) + 1;
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
  const gap = a.exp - b.exp;
  if (gap === 0) return rounded(a.mid + b.mid, a.exp, a.rad + b.rad, prec);
  return gap > 0 ? addAligned(a, b, gap, prec) : addAligned(b, a, -gap, prec);
}

/** a + b where a's unit is the coarser one, by 2^gap. */
function addAligned(a: Ball, b: Ball, gap: number, prec: number): Ball {
  let mid = b.mid;
  let exp = b.exp;
  let rad = b.rad;
  // The lowest bit of b worth keeping: those far below a's radius mean nothing, and so do those below the
  // requested precision when b is too small to cancel a's leading bit.
  let low = -Infinity;
  if (a.rad > 0 && gap > COARSE_BITS) low = a.exp - COARSE_BITS + Math.min(0, Math.floor(Math.log2(a.rad)));
  if (gap > 64 && a.mid !== 0n && bitLength(mid) < gap - 1) {
    low = Math.max(low, Math.min(a.exp, a.exp + bitLength(a.mid) - prec - 6));
  }
  const drop = low - exp;
  if (drop > 0) {
    if (drop > bitLength(mid) + 1) {
      rad = scaleUp(rad, -drop) + absUp(mid, -drop);
      mid = 0n;
    } else {
      mid = shiftRound(mid, drop);
      rad = scaleUp(rad, -drop) + 0.5;
    }
    exp = low;
    gap = a.exp - exp;
  }
  return rounded((a.mid << BigInt(gap)) + mid, exp, scaleUp(a.rad, gap) + rad, prec);
}

export function neg(a: Ball): Ball {
  return { mid: -a.mid, exp: a.exp, rad: a.rad };
}

export function sub(a: Ball, b: Ball, prec: number): Ball {
  return add(a, neg(b), prec);
}

export function mul(a: Ball, b: Ball, prec: number): Ball {
  const exp = a.exp + b.exp;
  if (a.rad === 0 && b.rad === 0) return rounded(a.mid * b.mid, exp, 0, prec);
  if (a.rad === Infinity || b.rad === Infinity) {
    return isExactZero(a) || isExactZero(b) ? ZERO : INDETERMINATE;
  }
  const mid = a.mid * b.mid;
  const la = Math.abs(Number(a.mid));
  const lb = Math.abs(Number(b.mid));
  if (la < Infinity && lb < Infinity) {
    const rad = la * b.rad + lb * a.rad + a.rad * b.rad;
    if (rad < Infinity) return rounded(mid, exp, rad, prec);
  }
  // |ab − m| <= |a| rb + |b| ra + ra rb with the long mantissas scaled to below 2^60.
  const sa = Math.max(0, bitLength(a.mid) - 60);
  const sb = Math.max(0, bitLength(b.mid) - 60);
  const s = Math.max(b.rad > 0 ? sa : 0, a.rad > 0 ? sb : 0);
  const ta = b.rad > 0 ? absUp(a.mid, -s) * b.rad : 0;
  const tb = a.rad > 0 ? absUp(b.mid, -s) * a.rad : 0;
  const rad = ta + tb + scaleUp(a.rad * b.rad, -s);
  return rounded(mid, exp, rad, prec, s);
}

/** Square, tighter and faster than mul(a, a): |(m+d)² − m²| <= 2|m| r + r². */
export function sqr(a: Ball, prec: number): Ball {
  if (a.rad === 0) return rounded(a.mid * a.mid, 2 * a.exp, 0, prec);
  return mul(a, a, prec);
}

/** a·2^k, exact. */
export function mul2exp(a: Ball, k: number): Ball {
  return a.mid === 0n && a.rad === 0 ? a : { mid: a.mid, exp: a.exp + k, rad: a.rad };
}

/**
 * Quotient (prec finite); INDETERMINATE when b may be zero.
 * Bound: with q the truncated quotient of the midpoints, |x/y − q| <= (ra + (|q|+1) rb)/(|b| − rb) + 1.
 */
export function div(a: Ball, b: Ball, prec: number): Ball {
  if (containsZero(b) || a.rad === Infinity) return INDETERMINATE;
  if (isExactZero(a)) return ZERO;
  const lb = bitLength(b.mid);
  const k = Math.max(0, prec + 2 - bitLength(a.mid) + lb);
  const n = k > 0 ? a.mid << BigInt(k) : a.mid;
  const q = n / b.mid;
  const exp = a.exp - b.exp - k;
  if (a.rad === 0 && b.rad === 0) return rounded(q, exp, q * b.mid === n ? 0 : 1, prec);
  // Numerator and denominator of the bound in units of 2^lb; `low` is a lower bound of |b| − rb.
  const low = (absUp(b.mid, -lb) * (1 - 2 ** -40) - scaleUp(b.rad, -lb) * UP) * (1 - 2 ** -48);
  if (!(low > 0)) return INDETERMINATE;
  const lq = bitLength(q);
  const s = Math.max(0, a.rad > 0 ? k - lb : 0, b.rad > 0 ? lq - lb : 0);
  const top = scaleUp(a.rad, k - lb - s) + scaleUp((absUp(q, -lq) + 2 ** -lq) * b.rad, lq - lb - s);
  return rounded(q, exp, top / low + scaleUp(1, -s), prec, s);
}

/** Square root (prec finite); INDETERMINATE when the ball reaches below zero, exact zero stays exact. */
export function sqrt(a: Ball, prec: number): Ball {
  if (isExactZero(a)) return ZERO;
  if (!isPositive(a)) return INDETERMINATE;
  const la = bitLength(a.mid);
  let k = Math.max(0, 2 * prec + 4 - la);
  if ((a.exp - k) % 2 !== 0) k++;
  const n = a.mid << BigInt(k);
  const r = isqrt(n);
  const exp = (a.exp - k) / 2;
  if (a.rad === 0) return rounded(r, exp, r * r === n ? 0 : 1, prec);
  // |√x − √m| = |x − m|/(√x + √m) <= rad/(√m + √(m − rad)) <= rad/(√m (2 − t)) with t = rad/m < 1.
  const lr = bitLength(r);
  const t = Math.min(1, scaleUp(a.rad, -la) / (absUp(a.mid, -la) * (1 - 2 ** -40)));
  const root = absUp(r, -lr) * (1 - 2 ** -40) * (2 - t);
  const s = Math.max(0, k - lr);
  return rounded(r, exp, scaleUp(a.rad, k - lr - s) / root + scaleUp(1, -s), prec, s);
}

/** Absolute value: the ball around |mid| with the same radius (which may reach below zero). */
export function abs(a: Ball): Ball {
  return a.mid < 0n ? neg(a) : a;
}

/** Integer power by repeated squaring (prec finite). */
export function powInt(a: Ball, n: number, prec: number): Ball {
  if (n < 0) return div(ONE, powInt(a, -n, prec + 4), prec);
  const work = prec + 2 * Math.ceil(Math.log2(n + 2));
  let result: Ball = ONE;
  let base = a;
  for (let k = n; k > 0; k = Math.floor(k / 2)) {
    if (k % 2 === 1) result = mul(result, base, work);
    if (k > 1) base = sqr(base, work);
  }
  return round(result, prec);
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
/** May the ball hold zero? (false only when it certainly does not) */
export function containsZero(a: Ball): boolean {
  return !exceedsRadius(a);
}
function exceedsRadius(a: Ball): boolean {
  if (a.rad === 0) return a.mid !== 0n;
  if (a.rad === Infinity) return false;
  return Math.abs(Number(a.mid)) * (1 - 2 ** -50) > a.rad * UP;
}

/** Does the ball contain the exact rational q? */
export function containsRational(a: Ball, q: Rational): boolean {
  if (a.rad === Infinity) return true;
  // |mid·2^exp − q| <= rad·2^exp, compared exactly.
  const unit = a.exp >= 0 ? Rational.of(1n << BigInt(a.exp)) : Rational.of(1n, 1n << BigInt(-a.exp));
  const diff = q.div(unit).sub(Rational.of(a.mid)).abs();
  return diff.cmp(Rational.fromNumber(a.rad)) <= 0;
}

/** Do the two balls share a point? (true also when the comparison cannot exclude it) */
export function overlaps(a: Ball, b: Ball): boolean {
  return containsZero(sub(a, b, 64 + Math.max(bitLength(a.mid), bitLength(b.mid))));
}

/** -1 or 1 when certain, 0 when the balls overlap. */
export function compare(a: Ball, b: Ball, prec: number): -1 | 0 | 1 {
  const d = sub(a, b, prec);
  return isPositive(d) ? 1 : isNegative(d) ? -1 : 0;
}

/** Midpoint as a double (nearest within an ulp or two; ±Infinity or 0 outside the range). */
export function toNumber(a: Ball): number {
  const drop = Math.max(0, bitLength(a.mid) - 64);
  return scale2(Number(drop > 0 ? a.mid >> BigInt(drop) : a.mid), a.exp + drop);
}

/** Radius as a double, rounded up. */
export function radiusToNumber(a: Ball): number {
  return scaleUp(a.rad * UP, a.exp);
}

/** log2 of the radius: -Infinity for an exact ball, Infinity for INDETERMINATE. */
export function radiusBits(a: Ball): number {
  return a.rad === 0 ? -Infinity : a.exp + Math.log2(a.rad);
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
