/**
 * @module G_b(w) = ∫_0^∞ e^{−wv} (1+v)^{−1−b} dv in double precision on the cut plane.
 *
 * Purpose    poles of Leroy–Padé replicas. Formulas as in branch-cut.ts; b = 0 is e^w E₁(w).
 * Method     |w| > 50 + b: asymptotic series to the smallest term; |w| + Re w < 2 or |w| < 1: convergent series with the pole at
 *            integer b taken out; otherwise the even part of the continued fraction, from the tail.
 * Bound      none proved; measured: below 1e-14 relative for |w| in [0.01, 200], |arg w| <= 179.5°, −0.9 <= b <= 7.
 */
import type { ComplexDouble } from './expint-double.js';
import { EULER_DOUBLE, gammaDouble, logGamma1pDouble } from './gamma-double.js';

/** Heuristics as in expint-double.ts. */
const FAR = 50;
const NEAR = 1;
const NEAR_CUT = 2;
const STOP = 1e-18;
const MAX_TERMS = 10_000;

/** G_b(w), b > −1, w = re + i·im off the cut; NaN on w <= 0 (im = 0), where the two sides differ, and for other b. */
export function branchCutDouble(b: number, re: number, im: number): ComplexDouble {
  const size = Math.hypot(re, im);
  if (!(size > 0) || (im === 0 && re < 0) || !(b > -1 && b < Infinity)) return { re: NaN, im: NaN };
  if (size > FAR + b) return asymptotic(b, re, im, size);
  if (size + re < NEAR_CUT || size < NEAR) return convergent(b, re, im, size);
  return fraction(b, re, im, size);
}

/** Σ (−1)^n (1+b)_n/w^(n+1). */
function asymptotic(b: number, re: number, im: number, size: number): ComplexDouble {
  const ir = re / size / size;
  const ii = -im / size / size;
  let tr = 1;
  let ti = 0;
  let sr = 1;
  let si = 0;
  for (let n = 1; n + b < size; n++) {
    const nr = -(n + b) * (tr * ir - ti * ii);
    ti = -(n + b) * (tr * ii + ti * ir);
    tr = nr;
    sr += tr;
    si += ti;
    if (Math.abs(tr) + Math.abs(ti) < STOP) break;
  }
  return { re: sr * ir - si * ii, im: sr * ii + si * ir };
}

/** −e^w [(−1)^m (w^m/m!) (e^A − 1)/ε + Σ_{k≠m} (−w)^k/(k!(k−b))], or with Γ(−b) w^b as it stands for m < 0. */
function convergent(b: number, re: number, im: number, size: number): ComplexDouble {
  const m = Math.floor(b + 0.5);
  // (−w)^k/k! and the sum without its m-th term.
  let tr = 1;
  let ti = 0;
  let pr = 1;
  let pi = 0;
  let sr = 0;
  let si = 0;
  for (let k = 0; k < MAX_TERMS; k++) {
    if (k === m) {
      pr = tr;
      pi = ti;
    } else {
      sr += tr / (k - b);
      si += ti / (k - b);
    }
    if (k > size && k > b && Math.abs(tr) + Math.abs(ti) < STOP * (Math.abs(sr) + Math.abs(si))) break;
    const nr = (-re * tr + im * ti) / (k + 1);
    ti = (-re * ti - im * tr) / (k + 1);
    tr = nr;
  }
  const logR = Math.log(size);
  const logI = Math.atan2(im, re);
  if (m < 0) {
    const g = gammaDouble(-b) * Math.exp(b * logR);
    sr -= g * Math.cos(b * logI);
    si -= g * Math.sin(b * logI);
  } else {
    const pole = polePart(b - m, m, logR, logI);
    sr += pr * pole.re - pi * pole.im;
    si += pr * pole.im + pi * pole.re;
  }
  const e = -Math.exp(re);
  const c = Math.cos(im);
  const s = Math.sin(im);
  return { re: e * (c * sr - s * si), im: e * (c * si + s * sr) };
}

/** (e^A − 1)/ε, A = ε log w + log Γ(1−ε) − Σ_{j<=m} log(1+ε/j). */
function polePart(eps: number, m: number, logR: number, logI: number): ComplexDouble {
  if (eps === 0) {
    let harmonic = 0;
    for (let j = m; j >= 1; j--) harmonic += 1 / j;
    return { re: logR + EULER_DOUBLE - harmonic, im: logI };
  }
  let a = eps * logR + logGamma1pDouble(-eps);
  for (let j = 1; j <= m; j++) a -= Math.log1p(eps / j);
  const turn = eps * logI;
  const half = Math.sin(turn / 2);
  const grown = Math.expm1(a);
  // e^(a + i·turn) − 1 without cancellation.
  return { re: (grown * Math.cos(turn) - 2 * half * half) / eps, im: ((1 + grown) * Math.sin(turn)) / eps };
}

/** 1/(w+1+b − 1(1+b)/(w+3+b − 2(2+b)/(w+5+b − …))) from the tail; its length as in expint-double.ts. */
function fraction(b: number, re: number, im: number, size: number): ComplexDouble {
  let sr = 0;
  let si = 0;
  for (let n = Math.ceil(180 / (size + re)) + 8; n >= 0; n--) {
    const k = (n + 1) * (n + 1 + b);
    const dr = re + 2 * n + 1 + b - k * sr;
    const di = im - k * si;
    const norm = dr * dr + di * di;
    sr = dr / norm;
    si = -di / norm;
  }
  return { re: sr, im: si };
}
