/**
 * @module The asymptotic series Σ (−1)^n (1+b)_n/w^(n+1) of G_b(w), with a proved remainder, on the whole cut plane.
 *
 * Purpose    |w| beyond about 0.7 times the working precision, also next to the cut, where F_b is its boundary value.
 * Method     Horner's rule in fixed point: s ← 1 − (n+b)/w·s.
 * Bound      after N terms the remainder is exactly (−1)^N (1+b)_N w^−N G_(N+b)(w). With s = N + b >= −1:
 *            Re w >= 0: on the ray of integration vw > 0 one has |1+v| >= 1, so |G_s(w)| <= 1/|w|.
 *            Re w < 0, up to and on both sides of the cut: choose the ray at angle φ from the negative of arg w with
 *            cos(angle to the steepest one) = 1/√(s+2); |1+v| >= sin φ >= √(1 − 1/(s+2)) there, hence
 *            |G_s(w)| <= √(s+2)·(1 − 1/(s+2))^(−(1+s)/2)/|w| <= √(e(s+2))/|w|.
 *            The same holds for F_s(x), the mean of the two boundary values −G_s(−x ± i0).
 *            Rounding: while |n+b| <= |w| every step is a contraction and loses at most 4 ulp: 4N in all.
 * Reference  DLMF 2.11.10, 2.11.11 (exact terminant); bound derived here.
 */
import { bitLength, shift } from '../bits.js';
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import type { Rational } from '../rational.js';
import type { Exponent } from './exponent.js';

interface Length {
  readonly n: number;
  /** log2 of the bound on the remainder, relative to 1/|w|. */
  readonly error: number;
}

/** Least N whose remainder is below 2^-bits relative to 1/|w|; undefined when the series cannot reach it. */
export function asymptoticLength(
  size: number,
  rightHalf: boolean,
  exponent: Exponent,
  bits: number,
): Length | undefined {
  const b = exponent.approx;
  // The least term is about e^−|w| at n + b = |w|; leave early when that is hopeless.
  if (!(size * Math.LOG2E + 4 + Math.max(0, b) > bits) || !(Math.abs(b) < size)) return undefined;
  const l = Math.log2(size);
  let term = 0;
  for (let n = 0; n + b <= size && n + Math.abs(b) <= size; n++) {
    const s = n + b;
    if (n > 0 && s >= -1) {
      const error = term + (rightHalf ? 0 : 0.5 * Math.log2(Math.E * (s + 2))) + 1e-6;
      if (error < -bits) return { n, error };
    }
    // At n + 1 = −m the factor is ε, which may be far below the rounding error of b.
    const ends = n + 1 + exponent.m === 0;
    if (ends && exponent.eps.isZero()) return { n: n + 1, error: -Infinity }; // a polynomial in 1/w
    const factor = ends ? ratioBits(exponent.eps) : Math.log2(Math.abs(n + 1 + b));
    term += factor - l + 1e-13 * Math.abs(l);
  }
  return undefined;
}

/** Upper bound of log2 |q|. */
function ratioBits(q: Rational): number {
  return bitLength(q.num) - bitLength(q.den) + 1;
}

/** Σ_{n<N} s^n (1+b)_n/x^(n+1) for exact x > 0, sign s = ±1, without the remainder; relative error below 2^-bits. */
export function asymptoticReal(x: Ball, b: Exponent, s: 1 | -1, length: Length, bits: number): Ball {
  const wp = bits + Math.ceil(Math.log2(4 * length.n + 8)) + 4;
  const w = BigInt(wp);
  const { num: p, den: q } = b.value;
  // v = 1/(x q), to wp bits relative to 1
  const v = R.div(R.ONE, R.mul(x, R.fromNumber(q), wp + 40), wp + 30);
  const guard = Math.max(0, R.upperBits(x) + bitLength(q));
  const vf = shift(v.mid, v.exp + wp + guard);
  const down = BigInt(wp + guard);
  const one = 1n << w;
  let sum = one;
  let n = BigInt(length.n - 1) * q + p;
  for (let k = length.n - 1; k >= 1; k--, n -= q) {
    const t = (n * sum * vf) >> down;
    sum = s > 0 ? one + t : one - t;
  }
  return R.div(R.ball(sum, -wp, 4 * length.n + 4), x, bits + 8);
}

/** Σ_{n<N} (−1)^n (1+b)_n/w^(n+1) for exact w off the cut, without the remainder. */
export function asymptoticComplex(z: Complex, b: Exponent, length: Length, bits: number): Complex {
  const wp = bits + Math.ceil(Math.log2(4 * length.n + 8)) + 6;
  const w = BigInt(wp);
  const { num: p, den: q } = b.value;
  const guard = Math.max(0, C.upperBits(z) + bitLength(q));
  const v = C.inv(C.mulReal(z, R.fromNumber(q), wp + 40), wp + 40);
  const vr = shift(v.re.mid, v.re.exp + wp + guard);
  const vi = shift(v.im.mid, v.im.exp + wp + guard);
  const down = BigInt(wp + guard);
  const one = 1n << w;
  let re = one;
  let im = 0n;
  let n = BigInt(length.n - 1) * q + p;
  for (let k = length.n - 1; k >= 1; k--, n -= q) {
    const a = n * re;
    const c = n * im;
    re = one - ((a * vr - c * vi) >> down);
    im = -((a * vi + c * vr) >> down);
  }
  const rad = 4 * length.n + 4;
  return C.div({ re: R.ball(re, -wp, rad), im: R.ball(im, -wp, rad) }, z, bits + 8);
}
