/**
 * @module Complex exponential, logarithm, powers and square root on balls, and the argument.
 *
 * Purpose    enclosures on the complex plane; principal branches, cut along the negative real axis.
 * Method     from the real functions of the two parts.
 * Bound      inherited. A rectangle that reaches across the cut gets the whole range of the argument, and is counted: who needs an
 *            analytic function looks whether the count has changed.
 */
import * as C from './complex.js';
import type { Complex } from './complex.js';
import { exp, log, log1p, sinCos, atan2 } from './elementary.js';
import * as R from './real.js';
import type { Ball } from './real.js';

/** e^z. */
export function cexp(z: Complex, prec: number): Complex {
  if (R.isExactZero(z.im)) return C.fromReal(exp(z.re, prec));
  const { sin, cos } = sinCos(z.im, prec + 4);
  if (R.isExactZero(z.re)) return { re: R.round(cos, prec), im: R.round(sin, prec) };
  const size = exp(z.re, prec + 4);
  return { re: R.mul(size, cos, prec), im: R.mul(size, sin, prec) };
}

/** Argument of z in (−π, π]. */
export function arg(z: Complex, prec: number): Ball {
  return atan2(z.im, z.re, prec);
}

/** log |z|, relatively accurate next to |z| = 1 too. */
function logAbs(z: Complex, prec: number): Ball {
  if (R.isExactZero(z.im)) return log(R.abs(z.re), prec);
  if (R.isExactZero(z.re)) return log(R.abs(z.im), prec);
  const n = C.norm(z, prec + 8);
  if (R.upperBits(R.sub(n, R.ONE, 20)) >= -8) return R.mul2exp(log(n, prec), -1);
  // |z|² − 1 = (|x| − 1)(|x| + 1) + y² with |x| the larger part, summed with enough bits to keep what is left.
  const work = prec + 16;
  const swap = R.upperBits(z.im) > R.upperBits(z.re);
  const x = R.abs(swap ? z.im : z.re);
  const y = swap ? z.re : z.im;
  const wide = 2 * work;
  const d = R.add(R.mul(R.sub(x, R.ONE, wide), R.add(x, R.ONE, wide), wide), R.sqr(y, wide), wide);
  return R.mul2exp(log1p(d, prec), -1);
}

let crossings = 0;

/** How often clog, csqrt and cpow have so far met a rectangle on their cut (−∞, 0], where what they enclose is not one analytic function. */
export function cutCrossings(): number {
  return crossings;
}

/** Counts a rectangle that the cut meets; points and intervals on the cut itself have their values from above, and do not count. */
function noteCut(z: Complex): void {
  if (R.isPositive(z.re) || !R.containsZero(z.im)) return;
  if (R.isExactZero(z.im) && (R.isNegative(z.re) || R.isExactZero(z.re))) return;
  crossings++;
}

/** Principal logarithm log|z| + i arg z. INDETERMINATE parts where z may be zero. */
export function clog(z: Complex, prec: number): Complex {
  noteCut(z);
  return { re: logAbs(z, prec), im: arg(z, prec) };
}

/** Principal square root. On a rectangle across the cut, and where z may be zero, only the modulus is bounded. */
export function csqrt(z: Complex, prec: number): Complex {
  noteCut(z);
  if (R.isExactZero(z.im)) {
    if (R.isExactZero(z.re)) return C.ZERO;
    if (R.isPositive(z.re)) return C.fromReal(R.sqrt(z.re, prec));
    if (R.isNegative(z.re)) return { re: R.ZERO, im: R.sqrt(R.neg(z.re), prec) };
  }
  const work = prec + 10;
  const size = C.abs(z, work);
  const right = z.re.mid >= 0n;
  const t = R.sqrt(R.mul2exp(R.add(size, right ? z.re : R.neg(z.re), work), -1), work);
  const crossing = !right && R.containsZero(z.im);
  if (t.rad === Infinity || crossing || R.containsZero(t)) {
    const up = Math.ceil(C.upperBits(z) / 2);
    if (up === Infinity) return C.INDETERMINATE;
    return { re: R.ball(0n, up, 1), im: R.ball(0n, up, 1) };
  }
  // (t + i·im/(2t)) on the right, (|im|/(2t) ± i·t) on the left.
  const other = R.div(R.mul2exp(z.im, -1), t, prec);
  if (right) return { re: R.round(t, prec), im: other };
  const up = z.im.mid >= 0n;
  return { re: R.abs(other), im: R.round(up ? t : R.neg(t), prec) };
}

/** Principal power z^w = exp(w log z); z^0 = 1, and an exactly zero z is INDETERMINATE unless w is exactly 0. */
export function cpow(z: Complex, w: Complex, prec: number): Complex {
  if (R.isExactZero(w.re) && R.isExactZero(w.im)) return C.ONE;
  if (C.containsZero(z)) return C.INDETERMINATE;
  const rough = C.upperBits(C.mul(w, clog(z, 30), 30));
  if (rough === -Infinity) return C.ONE;
  const work = prec + 8 + Math.max(0, Math.min(rough, 60));
  return cexp(C.mul(w, clog(z, work), work), prec);
}
