/**
 * @module Complex balls: a real ball for each of the two parts.
 *
 * Purpose    as for real balls: the rectangle re + i·im contains the exact result for all points of the arguments.
 * Method     products by the four-multiplication formula with exact partial products, one rounding per part;
 *            quotients through the conjugate.
 * Bound      inherited from the real operations (see real.ts).
 */
import * as R from './real.js';
import type { Ball } from './real.js';

export interface Complex {
  readonly re: Ball;
  readonly im: Ball;
}

export const ZERO: Complex = { re: R.ZERO, im: R.ZERO };
export const ONE: Complex = { re: R.ONE, im: R.ZERO };
export const I: Complex = { re: R.ZERO, im: R.ONE };
/** Any complex number: the answer where nothing can be said. */
export const INDETERMINATE: Complex = { re: R.INDETERMINATE, im: R.INDETERMINATE };

export function fromReal(x: Ball): Complex {
  return { re: x, im: R.ZERO };
}

/** Exact complex number from two doubles. Throws RangeError on NaN and infinities. */
export function fromNumbers(re: number, im: number): Complex {
  return { re: R.fromNumber(re), im: R.fromNumber(im) };
}

export function add(a: Complex, b: Complex, prec: number): Complex {
  return { re: R.add(a.re, b.re, prec), im: R.add(a.im, b.im, prec) };
}

export function sub(a: Complex, b: Complex, prec: number): Complex {
  return { re: R.sub(a.re, b.re, prec), im: R.sub(a.im, b.im, prec) };
}

export function neg(a: Complex): Complex {
  return { re: R.neg(a.re), im: R.neg(a.im) };
}

export function conj(a: Complex): Complex {
  return { re: a.re, im: R.neg(a.im) };
}

export function mul(a: Complex, b: Complex, prec: number): Complex {
  if (R.isExactZero(a.im)) return mulReal(b, a.re, prec);
  if (R.isExactZero(b.im)) return mulReal(a, b.re, prec);
  // A few spare bits in the partial products: the sum is then rounded once, cancellation or not.
  const work = prec + 20;
  return {
    re: R.sub(R.mul(a.re, b.re, work), R.mul(a.im, b.im, work), prec),
    im: R.add(R.mul(a.re, b.im, work), R.mul(a.im, b.re, work), prec),
  };
}

export function mulReal(a: Complex, x: Ball, prec: number): Complex {
  return { re: R.mul(a.re, x, prec), im: R.mul(a.im, x, prec) };
}

/** a·2^k, exact. */
export function mul2exp(a: Complex, k: number): Complex {
  return { re: R.mul2exp(a.re, k), im: R.mul2exp(a.im, k) };
}

/** Square: (x + iy)² = (x−y)(x+y) + 2ixy. */
export function sqr(a: Complex, prec: number): Complex {
  if (R.isExactZero(a.im)) return fromReal(R.sqr(a.re, prec));
  const work = prec + 20;
  return {
    re: R.sub(R.sqr(a.re, work), R.sqr(a.im, work), prec),
    im: R.mul2exp(R.mul(a.re, a.im, prec), 1),
  };
}

/** re² + im², the squared modulus. */
export function norm(a: Complex, prec: number): Ball {
  if (R.isExactZero(a.im)) return R.sqr(a.re, prec);
  if (R.isExactZero(a.re)) return R.sqr(a.im, prec);
  return R.add(R.sqr(a.re, prec + 4), R.sqr(a.im, prec + 4), prec);
}

/** 1/a; INDETERMINATE when a may be zero. */
export function inv(a: Complex, prec: number): Complex {
  return div(ONE, a, prec);
}

/** a/b; INDETERMINATE when b may be zero. */
export function div(a: Complex, b: Complex, prec: number): Complex {
  if (R.isExactZero(b.im)) return { re: R.div(a.re, b.re, prec), im: R.div(a.im, b.re, prec) };
  const work = prec + 10;
  const d = norm(b, work);
  const n = mul(a, conj(b), work);
  return { re: R.div(n.re, d, prec), im: R.div(n.im, d, prec) };
}

/** Modulus |a|. When a may be zero the enclosure is [0, bound]. */
export function abs(a: Complex, prec: number): Ball {
  if (R.isExactZero(a.im)) return R.abs(a.re);
  if (R.isExactZero(a.re)) return R.abs(a.im);
  const root = R.sqrt(norm(a, prec + 8), prec);
  if (root.rad < Infinity) return root;
  const up = upperBits(a);
  return up < Infinity ? R.ball(1n, up - 1, 1) : R.INDETERMINATE;
}

/** May a be zero? (false only when it certainly is not) */
export function containsZero(a: Complex): boolean {
  return R.containsZero(a.re) && R.containsZero(a.im);
}

export function round(a: Complex, prec: number): Complex {
  return { re: R.round(a.re, prec), im: R.round(a.im, prec) };
}

/** Exponent E with |a| < 2^E; -Infinity for exact zero, Infinity for INDETERMINATE. */
export function upperBits(a: Complex): number {
  if (R.isExactZero(a.im)) return R.upperBits(a.re);
  if (R.isExactZero(a.re)) return R.upperBits(a.im);
  return Math.max(R.upperBits(a.re), R.upperBits(a.im)) + 1;
}

/** Correct leading bits relative to the larger of the two parts: log2 of max|mid|/max rad. */
export function accuracyBits(a: Complex): number {
  const size = Math.max(R.upperBits(R.exactMid(a.re)), R.upperBits(R.exactMid(a.im)));
  const error = Math.max(R.radiusBits(a.re), R.radiusBits(a.im));
  if (error === -Infinity) return Infinity;
  if (error === Infinity) return -Infinity;
  return size === -Infinity ? -Math.max(0, error) : size - 1 - error;
}

/** Both parts with their radius set to zero. */
export function exactMid(a: Complex): Complex {
  return { re: R.exactMid(a.re), im: R.exactMid(a.im) };
}

/** Do the two rectangles share a point? (true also when it cannot be excluded) */
export function overlaps(a: Complex, b: Complex): boolean {
  return R.overlaps(a.re, b.re) && R.overlaps(a.im, b.im);
}

/** Midpoints as doubles. */
export function toNumbers(a: Complex): { re: number; im: number } {
  return { re: R.toNumber(a.re), im: R.toNumber(a.im) };
}
