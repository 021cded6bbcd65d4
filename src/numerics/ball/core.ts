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
/** Smallest positive radius kept; smaller ones are rounded up to it, so that a product of two never underflows to 0. */
const TINY = 2 ** -500;

export const ZERO: Ball = { mid: 0n, exp: 0, rad: 0 };
export const ONE: Ball = { mid: 1n, exp: 0, rad: 0 };
/** The ball of all reals: the answer where nothing can be said. */
export const INDETERMINATE: Ball = { mid: 0n, exp: 0, rad: Infinity };

/** x·2^k for x >= 0, never rounded down to 0: the result serves as an upper bound (within the factor UP). */
export function scaleUp(x: number, k: number): number {
  if (x === 0 || k === 0) return x;
  if (k > 2200) return Infinity;
  if (k < -2200) return Number.MIN_VALUE;
  const half = Math.trunc(k / 2);
  const y = x * 2 ** half * 2 ** (k - half);
  return y < 2 ** -1000 ? y + Number.MIN_VALUE : y;
}

/** x·2^k for a value, without losing the range to an intermediate overflow. */
export function scale2(x: number, k: number): number {
  if (k > 2200) return x === 0 ? 0 : x * Infinity;
  if (k < -2200) return 0;
  const half = Math.trunc(k / 2);
  return x * 2 ** half * 2 ** (k - half);
}

/** m >> k, rounded to the nearest integer (k > 0). */
export function shiftRound(m: bigint, k: number): bigint {
  return ((m >> BigInt(k - 1)) + 1n) >> 1n;
}

/**
 * Rounds (mid ± rad·2^radExp)·2^exp to at most `prec` bits, dropping bits that the radius makes meaningless.
 * The radius may sit on a power of two of its own, so that it can never overflow.
 */
export function rounded(mid: bigint, exp: number, rad: number, prec: number, radExp = 0): Ball {
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

/** |m|·2^e as a double, rounded up (may be Infinity). */
export function absUp(m: bigint, e: number): number {
  if (m === 0n) return 0;
  const drop = bitLength(m) - 60;
  if (drop <= 0) return scaleUp(Math.abs(Number(m)) * UP, e);
  return scaleUp((Math.abs(Number(m >> BigInt(drop))) + 1) * UP, e + drop);
}
