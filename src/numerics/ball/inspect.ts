/**
 * @module Questions to a real ball: size, accuracy, certain-truth predicates, conversions.
 *
 * Purpose    predicates are true only when they hold for every point of the ball; `containsZero` and `overlaps` are the
 *            opposite kind and false only when certain.
 */
import { bitLength } from '../bits.js';
import { Rational } from '../rational.js';
import { add, neg } from './arithmetic.js';
import { isNegative, isPositive, containsZero } from './predicates.js';
import { scale2, scaleUp, UP } from './core.js';
import type { Ball } from './core.js';

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
  return containsZero(add(a, neg(b), 64 + Math.max(bitLength(a.mid), bitLength(b.mid))));
}

/** -1 or 1 when certain, 0 when the balls overlap. */
export function compare(a: Ball, b: Ball, prec: number): -1 | 0 | 1 {
  const d = add(a, neg(b), prec);
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
