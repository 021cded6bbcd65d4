/**
 * @module Magnitudes: upper (or lower) bounds m·2^e with a double mantissa and an exponent of unlimited range.
 *
 * Purpose    error bounds of long balls lie far outside the range of doubles (2^-1074 is only 323 digits).
 * Method     m >= 0 is kept within 2^±200; every operation rounds up by the factor UP, or down by DOWN where it says so.
 * Bound      each operation is at most four double roundings, relative 2^-53 each, covered by UP = 1 + 2^-48.
 * Reference  the idea of a separate magnitude type: F. Johansson, IEEE Trans. Comput. 66 (2017) 1281, section 2.
 */
import { bitLength } from '../bits.js';
import { addError } from './real.js';
import type { Ball } from './real.js';

export interface Mag {
  readonly m: number;
  readonly e: number;
}

const UP = 1 + 2 ** -48;
const DOWN = 1 - 2 ** -46;
const BIG = 2 ** 200;
const NONE: Mag = { m: 0, e: 0 };

/** m·2^e, with m brought back near 1 when it strays. */
export function mag(m: number, e = 0): Mag {
  if (m === 0) return NONE;
  if (m < BIG && m > 1 / BIG) return { m, e };
  if (!(m < Infinity)) return { m: Infinity, e: 0 };
  const k = Math.floor(Math.log2(m));
  const half = Math.trunc(k / 2);
  return { m: m * 2 ** -half * 2 ** (half - k) * UP, e: e + k };
}

/**
 * |mid| without its `cut` lowest bits; cut > 0 leaves 60 or 61, so that what is lost is below a relative 2^-58. UP and DOWN cover it, and a
 * radius that underflows beside it.
 */
const leading = (mid: bigint, cut: number): number => Math.abs(Number(cut > 0 ? mid >> BigInt(cut) : mid));

/** Upper bound of |x| over the ball. */
export function magUpper(x: Ball): Mag {
  const cut = Math.max(0, bitLength(x.mid) - 60);
  return mag((leading(x.mid, cut) + x.rad * 2 ** -cut) * UP, x.exp + cut);
}

/** Lower bound of |x| over the ball, 0 when it may hold zero. */
export function magLower(x: Ball): Mag {
  const cut = Math.max(0, bitLength(x.mid) - 60);
  const low = leading(x.mid, cut) * DOWN - x.rad * 2 ** -cut * UP;
  return low > 0 ? mag(low * DOWN, x.exp + cut) : NONE;
}

/** The radius of the ball. */
export function magRadius(x: Ball): Mag {
  return mag(x.rad, x.exp);
}

export function mulMag(a: Mag, b: Mag): Mag {
  return a.m === 0 || b.m === 0 ? NONE : mag(a.m * b.m * UP, a.e + b.e);
}

export function addMag(a: Mag, b: Mag): Mag {
  if (a.m === 0) return b;
  if (b.m === 0) return a;
  const [hi, lo] = a.e >= b.e ? [a, b] : [b, a];
  return mag((hi.m + lo.m * 2 ** Math.max(lo.e - hi.e, -500)) * UP, hi.e);
}

/** Upper bound of a/b for an upper bound a and a lower bound b; infinite when b is 0. */
export function divMag(a: Mag, b: Mag): Mag {
  if (a.m === 0 && b.m > 0) return NONE;
  return b.m === 0 || b.m === Infinity ? { m: Infinity, e: 0 } : mag((a.m / b.m) * UP, a.e - b.e);
}

/** Lower bound of a + b for lower bounds. */
export function addMagLower(a: Mag, b: Mag): Mag {
  const s = addMag(a, b);
  return s.m === 0 ? NONE : mag(s.m * DOWN, s.e);
}

/** Lower bound of a·b for lower bounds. */
export function mulMagLower(a: Mag, b: Mag): Mag {
  const s = mulMag(a, b);
  return s.m === 0 ? NONE : mag(s.m * DOWN, s.e);
}

/** The bound as a double: rounded up, never to 0, possibly Infinity. */
export function magToNumber(a: Mag): number {
  if (a.m === 0) return 0;
  if (a.e > 1200) return Infinity;
  if (a.e < -1300) return Number.MIN_VALUE; // m < 2^200
  const half = Math.trunc(a.e / 2);
  return a.m * 2 ** half * 2 ** (a.e - half) + Number.MIN_VALUE;
}

/** log2 of the bound, -Infinity for 0. */
export function magBits(a: Mag): number {
  return Math.log2(a.m) + a.e;
}

/** Is a <= b? (comparison of the stored values) */
export function leMag(a: Mag, b: Mag): boolean {
  if (a.m === 0) return true;
  if (b.m === 0) return false;
  return a.m * 2 ** Math.max(-1000, Math.min(1000, a.e - b.e)) <= b.m;
}

/** The ball x with the bound added to its radius. */
export function widenMag(x: Ball, a: Mag): Ball {
  return addError(x, a.m, a.e);
}
