/**
 * @module G_b(w) = e^w w^b Γ(−b, w) for complex b, at exact b and w off the cut w <= 0.
 *
 * Purpose    the incomplete Γ function of complex order; real orders have faster kernels (branch-cut.ts).
 * Method     large |w|: asymptotic series. Otherwise G_b(w) = e^w [w^b Γ(−b) − Σ_k (−w)^k/(k!(k−b))]; within 1/4 of an integer
 *            m >= 0 the pole is taken out: with b = m + ε the term k = m and the Γ term become −(−1)^m (w^m/m!)(e^A − 1)/ε,
 *            A = ε log w + log Γ(1−ε) − Σ_{j<=m} log(1 + ε/j), whose limit at ε = 0 is exact.
 * Bound      asymptotic: the remainder after N terms is (1+b)_N (−w)^−N G_(N+b)(w), and |(1+v)^(−1−β)| <= |1+v|^(−1−Re β) e^(π|Im β|)
 *            gives |G_β(w)| <= e^(π|Im β|) √(e(Re β + 2))/|w| for Re β >= −1 (asymptotic.ts for real β). Series: the tail is below
 *            2|w|^k/k! for k >= 2|w|, k >= Re b + 1. log Γ(1+d): tail 2|d|^(n+1) for |d| <= 1/2.
 * Reference  DLMF 8.7.3, 2.11.10, 5.7.3.
 */
import { eulerGamma } from '../ball/constants.js';
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import { cexp, clog } from '../ball/complex-elementary.js';
import { addMag, mag, magBits, mulMag, widenMag } from '../ball/mag.js';
import * as R from '../ball/real.js';
import { Rational } from '../rational.js';
import { gammaComplex } from './gamma-complex.js';
import { cexpm1, harmonicLimit, powerOverFactorialComplex } from './pole-part.js';
import { refine } from './refine.js';
import { modulusUpper } from './spread.js';
import { absoluteError, timesTracked, TRACKED_ONE } from './tracked.js';
import { zeta } from './zeta.js';

/** |b − m| below this takes the pole out. */
const NEAR_POLE = 0.25;
/** Orders beyond are refused: the series would cost memory and time in proportion. */
export const ORDER_LIMIT = 1 << 12;

/** G_b(w), accurate to about prec bits relative to its modulus; b, w exact, w off the cut. INDETERMINATE beyond ORDER_LIMIT. */
export function complexBranch(b: Complex, w: Complex, prec: number): Complex {
  const { re, im } = C.toNumbers(w);
  const order = C.toNumbers(b);
  if (!(Math.hypot(order.re, order.im) <= ORDER_LIMIT)) return C.INDETERMINATE;
  const size = Math.min(Math.max(Math.hypot(re, im), 1e-300), 1e300);
  const far = asymptotic(b, w, size, prec);
  if (far !== undefined) return far;
  const boost = Math.max(0, Math.ceil((size + re) * Math.LOG2E));
  const start = prec + 16 + boost + Math.ceil(Math.log2(2 + size + Math.hypot(order.re, order.im)));
  return refine(prec, start, (bits) => convergent(b, w, size, bits), C.accuracyBits);
}

/** The series Σ (−1)^n (1+b)_n/w^(n+1); undefined when it cannot reach 2^-prec relative to 1/|w|. */
function asymptotic(b: Complex, w: Complex, size: number, prec: number): Complex | undefined {
  const goal = prec + 8;
  const { re, im } = C.toNumbers(b);
  if (!(size * Math.LOG2E > goal) || Math.hypot(re, im) > size) return undefined;
  const work = prec + 24 + Math.ceil(Math.log2(size));
  const inverse = C.inv(C.neg(w), work);
  const growth = Math.PI * Math.abs(im) * Math.LOG2E + 1;
  let term = TRACKED_ONE;
  let sum: Complex = C.ONE;
  let noise = mag(0);
  for (let n = 1; n + re <= size; n++) {
    const factor: Complex = { re: R.add(b.re, R.fromNumber(n), work), im: b.im };
    term = timesTracked(term, C.mul(factor, inverse, work), work);
    const own = absoluteError(term);
    if (n + re >= -1) {
      const whole = addMag(modulusUpper(term.value), own);
      const error = magBits(whole) + growth + 0.5 * Math.log2(Math.E * (n + re + 2));
      if (error < -goal) {
        const rest = addMag(noise, mag(1, Math.ceil(Math.max(error, -1e9))));
        const wide: Complex = { re: widenMag(sum.re, rest), im: widenMag(sum.im, rest) };
        return C.mul(wide, C.neg(inverse), prec + 4);
      }
    }
    sum = C.add(sum, term.value, work);
    noise = addMag(noise, own);
  }
  return undefined;
}

function convergent(b: Complex, w: Complex, size: number, bits: number): Complex {
  const { re, im } = C.toNumbers(b);
  const nearest = Math.round(re);
  const m = nearest >= 0 && Math.hypot(re - nearest, im) < NEAR_POLE ? nearest : -1;
  const minus = C.neg(w);
  const logW = clog(w, bits + 20);
  const sum = poleFreeSum(b, minus, m, size, re, bits);
  const e = cexp(w, bits);
  if (m < 0) {
    const power = cexp(C.mul(b, logW, bits + 20), bits);
    return C.mul(e, C.sub(C.mul(power, gammaComplex(C.neg(b), bits), bits), sum, bits), bits);
  }
  const part = C.mul(powerOverFactorialComplex(minus, m, bits), poleQuotient(b, m, logW, bits), bits);
  return C.neg(C.mul(e, C.add(part, sum, bits), bits));
}

/** Σ_{k≠m} z^k/(k!(k−b)). */
function poleFreeSum(b: Complex, z: Complex, m: number, size: number, re: number, bits: number): Complex {
  let term = TRACKED_ONE;
  let sum: Complex = C.ZERO;
  let noise = mag(0);
  const from = Math.max(2 * size + 1, re + 2);
  for (let k = 0; ; k++) {
    if (k > 0) {
      const d = R.fromNumber(k);
      term = timesTracked(term, { re: R.div(z.re, d, bits), im: R.div(z.im, d, bits) }, bits);
    }
    const top = C.upperBits(term.value);
    if (k >= from && top < -bits + size * Math.LOG2E) {
      const rest = addMag(noise, mag(1, top + 2));
      return { re: widenMag(sum.re, rest), im: widenMag(sum.im, rest) };
    }
    if (k === m) continue;
    const denominator: Complex = { re: R.sub(R.fromNumber(k), b.re, bits), im: R.neg(b.im) };
    const inverse = C.inv(denominator, bits);
    sum = C.add(sum, C.mul(term.value, inverse, bits), bits);
    noise = addMag(noise, mulMag(absoluteError(term), modulusUpper(inverse)));
  }
}

/** (e^A − 1)/ε at b = m + ε. */
function poleQuotient(b: Complex, m: number, logW: Complex, bits: number): Complex {
  const eps: Complex = { re: R.sub(b.re, R.fromNumber(m), 1e9), im: b.im };
  if (R.isExactZero(eps.re) && R.isExactZero(eps.im)) return C.sub(logW, C.fromReal(harmonicLimit(m, bits)), bits);
  const work = bits + 12;
  let u: Complex = C.ZERO; // Π(1 + ε/j) − 1
  for (let j = 1; j <= m; j++) {
    const step = C.mulReal(eps, R.fromRational(Rational.of(1, j), work), work);
    u = C.add(u, C.mul(step, C.add(C.ONE, u, work), work), work);
  }
  const own = C.sub(logGammaNearOne(C.neg(eps), work), clog1p(u, work), work);
  const a = C.add(C.mul(eps, logW, work), own, work);
  return C.div(cexpm1(a, work), eps, bits);
}

/** log Γ(1 + d) = −γ d + Σ_{k>=2} ζ(k)(−d)^k/k for |d| <= 1/2, relatively accurate as d → 0. */
export function logGammaNearOne(d: Complex, prec: number): Complex {
  const e = -C.upperBits(d);
  const n = Math.ceil(prec / Math.max(1, e)) + 2;
  const minus = C.neg(d);
  let s: Complex = C.ZERO;
  for (let k = n; k >= 2; k--) {
    const coefficient = R.div(zeta(k, prec), R.fromNumber(k), prec);
    s = C.add(C.mul(s, minus, prec), C.fromReal(coefficient), prec);
  }
  const tail = 1 - Math.max(1, e) * (n - 1);
  const wide: Complex = { re: R.addError(s.re, 1, tail), im: R.addError(s.im, 1, tail) };
  // −γ d + d² s = −d (γ − d s)
  return C.mul(minus, C.sub(C.fromReal(eulerGamma(prec)), C.mul(d, wide, prec), prec), prec);
}

/** Principal log(1 + u), relatively accurate as u → 0. */
export function clog1p(u: Complex, prec: number): Complex {
  const e = -C.upperBits(u);
  if (e === Infinity) return C.ZERO;
  if (e < 4 || e < prec / 8) return clog(C.add(C.ONE, u, prec + Math.max(0, e) + 16), prec + Math.max(0, e) + 8);
  // u Σ (−u)^k/(k+1), tail below 2·2^(−en)
  const n = Math.ceil(prec / e) + 1;
  const minus = C.neg(u);
  let s: Complex = C.ZERO;
  for (let k = n; k >= 0; k--) {
    s = C.add(C.mul(s, minus, prec), C.fromReal(R.fromRational(Rational.of(1, k + 1), prec)), prec);
  }
  return C.mul(u, { re: R.addError(s.re, 2, -e * n), im: R.addError(s.im, 2, -e * n) }, prec);
}
