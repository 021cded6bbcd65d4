/**
 * @module The real ball type and its rounding: what all ball operations share.
 *
 * Purpose    one place that decides how many bits a midpoint keeps and how a radius stays in the range of doubles.
 * Method     a ball is (mid ± rad)·2^exp; mid is a BigInt, rad a non-negative double in units of 2^exp.
 * Bound      every radius is a sum of at most eight rounded-to-nearest double operations on upper bounds, each off by
 *            a relative 2^-53 at most; the factor UP = 1 + 2^-48 covers them all.
 */
import { bitLength } from '../bits.js';

export interface Ball {
  readonly mid: bigint;
  readonly exp: number;
  /** Radius in units of 2^exp; Infinity means "any real number". */
  readonly rad: number;
}

export const UP = 1 + 2 ** -48;
/** A radius beyond 2^COARSE_BITS units says that the low bits of mid mean nothing: they are dropped. */
export const COARSE_BITS = 40;
const COARSE = 2 ** COARSE_BITS;
/** Smallest positive radius kept; smaller ones are rounded up to it, so that a product of two never underflows to 0. */
const TINY = 2 ** -500;

export const ZERO: Ball = { mid: 0n, exp: 0, rad: 0 };
export const ONE: Ball = { mid: 1n, exp: 0, rad: 0 };
/** The ball of all reals: the answer where nothing can be said. */
export const INDETERMINATE: Ball = { mid: 0n, exp: 0, rad: Infinity };

/** Bits kept beyond the precision asked, see `rounded`. */
export const SPARE = 2;

/** Powers of two that are normal doubles, 2^-1022 to 2^1023: a look-up costs a tenth of `2 ** k`. */
const LEAST_POWER = -1022;
const POWERS = new Float64Array(2046);
POWERS[0] = 2 ** LEAST_POWER;
for (let i = 1; i < POWERS.length; i++) POWERS[i] = POWERS[i - 1]! * 2;

/** 2^k as a double; 0 below and Infinity above the normal range. */
export function power2(k: number): number {
  return k < LEAST_POWER ? 0 : k > 1023 ? Infinity : POWERS[k - LEAST_POWER]!;
}

/** x·2^k for x >= 0, never rounded down to 0: the result serves as an upper bound (within the factor UP). */
export function scaleUp(x: number, k: number): number {
  if (x === 0 || k === 0) return x;
  let y: number;
  if (k >= LEAST_POWER && k <= 1023) {
    y = x * POWERS[k - LEAST_POWER]!;
  } else {
    if (k > 2200) return Infinity;
    if (k < -2200) return Number.MIN_VALUE;
    const half = Math.trunc(k / 2);
    y = x * power2(half) * power2(k - half);
  }
  return y < 2 ** -1000 ? y + Number.MIN_VALUE : y;
}

/** x·2^k for a value, without losing the range to an intermediate overflow. */
export function scale2(x: number, k: number): number {
  if (k > 2200) return x === 0 ? 0 : x * Infinity;
  if (k < -2200) return 0;
  const half = Math.trunc(k / 2);
  return x * 2 ** half * 2 ** (k - half);
}

/** Shift counts as BigInt, made once. */
const COUNTS: bigint[] = [];
for (let k = 0; k < 1024; k++) COUNTS.push(BigInt(k));
function count(k: number): bigint {
  return k < 1024 ? COUNTS[k]! : BigInt(k);
}

/** m·2^k for k >= 0. */
export function shiftLeft(m: bigint, k: number): bigint {
  return m << count(k);
}

/** m >> k, rounded to the nearest integer (k > 0). */
export function shiftRound(m: bigint, k: number): bigint {
  return ((m >> count(k - 1)) + 1n) >> 1n;
}

/**
 * Rounds (mid ± rad·2^radExp)·2^exp to at most `prec` + SPARE bits, dropping bits that the radius makes meaningless. Bits are
 * cut off, not rounded: with a bit more the error of a unit is no larger than half a unit at `prec` bits, and costs half as
 * much; another bit makes up for bit lengths that are one too large. The radius may sit on a power of two of its own, so that it can never overflow.
 */
export function rounded(mid: bigint, exp: number, rad: number, prec: number, radExp = 0): Ball {
  return cutBits(mid, exp, rad, bitLength(mid) - prec - SPARE, radExp);
}

/** (mid ± rad·2^radExp)·2^exp without its `drop` lowest bits (none for drop <= 0), or without more where rad allows. */
export function cutBits(mid: bigint, exp: number, rad: number, drop: number, radExp: number): Ball {
  if (!(rad < Infinity)) return INDETERMINATE;
  if (rad === 0) {
    if (drop <= 0) return { mid, exp, rad: 0 };
    const m = mid >> count(drop);
    // Exact when only zero bits go; the lowest word settles it nearly always.
    const lost = (drop >= 64 && BigInt.asUintN(64, mid) !== 0n) || m << count(drop) !== mid;
    return { mid: m, exp: exp + drop, rad: lost ? 1 : 0 };
  }
  if (radExp > 0 || (rad > COARSE && rad > power2((drop > 0 ? drop : 0) + COARSE_BITS - 8))) {
    drop = Math.max(drop, Math.ceil(Math.log2(rad)) + radExp - COARSE_BITS + 8);
  }
  if (drop > 0) {
    mid >>= count(drop);
    exp += drop;
    rad = scaleUp(rad, radExp - drop) + 1;
  } else if (radExp !== 0) {
    rad = scaleUp(rad, radExp);
  }
  return { mid, exp, rad: rad < TINY ? TINY : rad * UP };
}

/** |m|·2^e as a double, rounded up (may be Infinity). */
export function absUp(m: bigint, e: number): number {
  if (m === 0n) return 0;
  const drop = bitLength(m) - 60;
  if (drop <= 0) return scaleUp(Math.abs(Number(m)) * UP, e);
  return scaleUp((Math.abs(Number(m >> BigInt(drop))) + 1) * UP, e + drop);
}
