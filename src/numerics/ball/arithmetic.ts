/**
 * @module Arithmetic of real balls: sum, product, quotient, square root, integer powers, rounding.
 *
 * Purpose    every operation returns a ball that contains the exact result for every choice of points in its arguments.
 * Method     midpoints in integer arithmetic, rounded to `prec` bits; the rounding error is added to the radius.
 * Bound      written at each operation; products that could leave the range of doubles carry a binary exponent beside them.
 */
import { bitLength, doubleBits, isqrt } from '../bits.js';
import {
  absUp,
  COARSE_BITS,
  cutBits,
  INDETERMINATE,
  ONE,
  power2,
  rounded,
  scaleUp,
  shiftLeft,
  shiftRound,
  SPARE,
  UP,
  ZERO,
} from './core.js';
import type { Ball } from './core.js';
import { containsZero, isExactZero, isPositive } from './predicates.js';

/** Products and quotients of midpoints below this stay in doubles, bounds included. */
const LARGE = 2 ** 1000;

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
  return rounded(shiftLeft(a.mid, gap) + mid, exp, scaleUp(a.rad, gap) + rad, prec);
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
  let la = Number(a.mid);
  let lb = Number(b.mid);
  if (la < 0) la = -la;
  if (lb < 0) lb = -lb;
  const size = la * lb;
  const rad = la * b.rad + lb * a.rad + a.rad * b.rad;
  if (size < LARGE && rad < Infinity) return cutBits(mid, exp, rad, doubleBits(size * UP) - prec - SPARE, 0);
  // |ab − m| <= |a| rb + |b| ra + ra rb with the long mantissas scaled to below 2^60.
  const sa = Math.max(0, bitLength(a.mid) - 60);
  const sb = Math.max(0, bitLength(b.mid) - 60);
  const s = Math.max(b.rad > 0 ? sa : 0, a.rad > 0 ? sb : 0);
  const ta = b.rad > 0 ? absUp(a.mid, -s) * b.rad : 0;
  const tb = a.rad > 0 ? absUp(b.mid, -s) * a.rad : 0;
  return rounded(mid, exp, ta + tb + scaleUp(a.rad * b.rad, -s), prec, s);
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
  if (a.rad === 0 && b.rad === 0) return divExact(a, b, prec);
  if (containsZero(b) || a.rad === Infinity) return INDETERMINATE;
  if (isExactZero(a)) return ZERO;
  const lb = bitLength(b.mid);
  const k = Math.max(0, prec + 2 - bitLength(a.mid) + lb);
  const q = shiftLeft(a.mid, k) / b.mid;
  const exp = a.exp - b.exp - k;
  const size = Math.abs(Number(b.mid));
  const quotient = Math.abs(Number(q));
  if (size < LARGE && quotient < LARGE && k < 1000) {
    const low = size * (1 - 2 ** -40) - b.rad * UP;
    const rad = (a.rad * power2(k) + (quotient + 1) * b.rad * UP) / low + 1;
    if (low > 0 && rad < Infinity) return rounded(q, exp, rad * UP, prec);
  }
  return divWide(a, b, prec, q, k, lb);
}

/** Exact operands: at least one bit more than `prec` is asked of the quotient, and nothing is left to round. */
function divExact(a: Ball, b: Ball, prec: number): Ball {
  if (b.mid === 0n) return INDETERMINATE;
  if (a.mid === 0n) return ZERO;
  const k = Math.max(0, prec + 2 - bitLength(a.mid) + bitLength(b.mid));
  const n = shiftLeft(a.mid, k);
  const q = n / b.mid;
  // The lowest word tells nearly always that something is left over.
  const low = BigInt.asUintN(64, BigInt.asUintN(64, q) * BigInt.asUintN(64, b.mid));
  const rad = low === BigInt.asUintN(64, n) && q * b.mid === n ? 0 : 1;
  const exp = a.exp - b.exp - k;
  return k > 0 && rad !== 0 ? { mid: q, exp, rad } : rounded(q, exp, rad, prec);
}

/** The same where the sizes leave the range of doubles. */
function divWide(a: Ball, b: Ball, prec: number, q: bigint, k: number, lb: number): Ball {
  const exp = a.exp - b.exp - k;
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

/** Rounds a ball to prec bits. */
export function round(a: Ball, prec: number): Ball {
  return rounded(a.mid, a.exp, a.rad, prec);
}
