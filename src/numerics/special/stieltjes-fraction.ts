/**
 * @module The continued fraction of G_b(w) = e^w w^b Γ(−b, w) for b > −1, Re w >= 0, real and complex.
 *
 * Purpose    moderate and large w in the right half-plane, where the convergent series would cancel.
 * Method     G_b(w) = (1/Γ(1+b)) ∫ e^−t t^b/(w+t) dt is a Stieltjes function; its N-th convergent P_N/Q_N,
 *            1/(w+1+b − 1(1+b)/(w+3+b − 2(2+b)/(w+5+b − …))) (DLMF 8.9.2 contracted), is N-point Gauss–Laguerre quadrature.
 *            It is evaluated by running the recurrence backward, u_(n−1) = (w+2n+1+b) u_n − (n+1)(n+1+b) u_(n+1), in
 *            fixed point with one division at the end: G = u_0/u_(−1).
 * Bound      truncation: the Gauss remainder with Q_N = L_N^(b)(−w) is (1/Γ(1+b)) ∫ e^−t t^b L_N(t)²/(w+t) dt / Q_N², so at most
 *            ((1+b)_N/N!)/(|w| |Q_N|²) for Re w >= 0. |Q_N| comes from its forward recurrence, the dominant solution,
 *            run on doubles with a radius: ρ_(n+1) = ((2n+1+b+w) − (n+b)/ρ_n)/(n+1), ρ_n = Q_n/Q_(n−1).
 *            rounding: s_n = u_n/u_(n−1) obeys |s_n| <= σ_n = 1/(n + max(b,0) + Re w) by induction (|s_0| <= 1/|w|); an
 *            error ε_n in the bracket changes s_0 by at most ε_n σ_n² Π_{j<n} (j+1)(j+1+b) σ_j², and the floors give
 *            ε_n <= (8 + 2(n+1)(n+1+b))·2^-wp while |u_n| >= 2^wp. The sum is formed in doubles.
 * Reference  W. Gautschi, "Computational aspects of three-term recurrence relations", SIAM Rev. 9 (1967) 24;
 *            P. Henrici, "Applied and Computational Complex Analysis" vol. 2 (1977), section 12.9-12.13 (both from memory).
 */
import { bitLength, shift } from '../bits.js';
import type { Complex } from '../ball/complex.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import type { Rational } from '../rational.js';
import type { Exponent } from './exponent.js';

/** Longest fraction tried (heuristic); the caller then falls back on the series. */
const MAX_TERMS = 20_000;

/** Estimate of the number of terms for 2^-bits, from the decay e^(−4√(N|w|) cos(θ/2)). */
export function fractionTerms(re: number, im: number, bits: number): number {
  // |w| cos²(θ/2) = (|w| + Re w)/2
  const half = (Math.hypot(re, im) + re) / 2;
  return half > 0 ? (bits * Math.LN2) ** 2 / (16 * half) + 2 : Infinity;
}

/** Terms needed so that the remainder is below 2^-bits; undefined when MAX_TERMS do not reach it. */
function convergentLength(re: number, im: number, b: number, bits: number): { n: number; error: number } | undefined {
  const size = Math.hypot(re, im);
  let error = -Math.log2(size) + 0.01;
  let pr = 1 + b + re;
  let pi = im;
  let radius = (Math.abs(b) + size + 1) * 1e-15;
  for (let n = 1; n <= MAX_TERMS; n++) {
    const abs = Math.hypot(pr, pi);
    if (!(abs > 2 * radius)) return undefined;
    // ((1+b)_n/n!)/|Q_n|² gains (n+b)/n and loses |ρ_n|²
    error += Math.log2((n + b) / n) - 2 * Math.log2(abs - radius) + 1e-12;
    if (error < -bits) return { n, error };
    const k = (n + b) / (abs * abs);
    const nr = (2 * n + 1 + b + re - k * pr) / (n + 1);
    const ni = (im + k * pi) / (n + 1);
    radius =
      ((n + b) * radius) / (abs * (abs - radius) * (n + 1)) +
      (((2 * n + 2 + Math.abs(b) + size) / (n + 1)) * 8 + (k * abs * 8) / (n + 1)) * 2 ** -52;
    pr = nr;
    pi = ni;
  }
  return undefined;
}

/** Σ ε_n σ_n² Π_{j<n} (j+1)(j+1+b)σ_j² in units of 2^-wp. */
function roundingBound(re: number, size: number, b: number, n: number): number {
  let sum = 0;
  let product = 1;
  for (let j = 0; j <= n; j++) {
    const sigma = j === 0 ? 1 / size : 1 / (j + Math.max(b, 0) + re);
    const next = (j + 1) * (j + 1 + b);
    const square = sigma * sigma;
    sum += (8 + 2 * next) * square * product;
    product *= next * square;
  }
  return sum * 1.001;
}

export interface FractionPlan {
  readonly terms: number;
  readonly wp: number;
  /** log2 of the absolute error of the result. */
  readonly errorBits: number;
}

/** Length and working precision for an absolute error near 2^-bits; undefined when the fraction does not serve. */
export function planFraction(re: number, im: number, b: number, bits: number): FractionPlan | undefined {
  if (!(b > -1) || !(re >= 0)) return undefined;
  const length = convergentLength(re, im, b, bits);
  if (length === undefined) return undefined;
  const noise = Math.log2(roundingBound(re, Math.hypot(re, im), b, length.n));
  if (!(noise < 4 * bits + 200)) return undefined;
  const wp = bits + Math.max(0, Math.ceil(noise)) + 2;
  const errorBits = Math.ceil(Math.log2(2 ** (length.error + bits) + 2 ** (noise - wp + bits)) - bits + 1e-6);
  return { terms: length.n, wp, errorBits };
}

/** Multiplies by (n+1)(n+1+b) for b = p/q: an integer factor and, for q > 1, a division. */
function scalar(n: number, b: Rational): bigint {
  const k = BigInt(n + 1);
  return k * (k * b.den + b.num);
}

/** G_b(w) for exact real w > 0. */
export function fractionReal(w: Ball, b: Exponent, plan: FractionPlan): Ball {
  const { terms, wp, errorBits } = plan;
  const bits = BigInt(wp);
  const q = b.value.den;
  const wb = shift(w.mid, w.exp + wp) + (b.value.num << bits) / q;
  let u = 1n << BigInt(wp + 32);
  let v = 0n; // u_(n+1)
  const top = wp + 96;
  for (let n = terms - 1; n >= 0; n--) {
    const step = wb + (BigInt(2 * n + 1) << bits);
    const back = v * scalar(n, b.value);
    const next = ((step * u) >> bits) - (q === 1n ? back : back / q);
    v = u;
    u = next;
    const cut = bitLength(u) - top;
    if (cut > 0 && n > 0) {
      u >>= BigInt(cut + 64);
      v >>= BigInt(cut + 64);
    }
  }
  return R.addError(R.ball((v << BigInt(wp + 8)) / u, -wp - 8, 1), 1.01, errorBits);
}

/** G_b(w) for exact complex w with Re w >= 0. */
export function fractionComplex(w: Complex, b: Exponent, plan: FractionPlan): Complex {
  const { terms, wp, errorBits } = plan;
  const bits = BigInt(wp);
  const q = b.value.den;
  const wr = shift(w.re.mid, w.re.exp + wp) + (b.value.num << bits) / q;
  const wi = shift(w.im.mid, w.im.exp + wp);
  let ur = 1n << BigInt(wp + 32);
  let ui = 0n;
  let vr = 0n;
  let vi = 0n;
  const top = wp + 96;
  for (let n = terms - 1; n >= 0; n--) {
    const sr = wr + (BigInt(2 * n + 1) << bits);
    const factor = scalar(n, b.value);
    let br = vr * factor;
    let bi = vi * factor;
    if (q !== 1n) {
      br /= q;
      bi /= q;
    }
    const nr = ((sr * ur - wi * ui) >> bits) - br;
    const ni = ((sr * ui + wi * ur) >> bits) - bi;
    vr = ur;
    vi = ui;
    ur = nr;
    ui = ni;
    const cut = Math.max(bitLength(ur), bitLength(ui)) - top;
    if (cut > 0 && n > 0) {
      const c = BigInt(cut + 64);
      ur >>= c;
      ui >>= c;
      vr >>= c;
      vi >>= c;
    }
  }
  // u_0/u_(−1)
  const norm = ur * ur + ui * ui;
  const shiftUp = BigInt(wp + 8);
  const re = ((vr * ur + vi * ui) << shiftUp) / norm;
  const im = ((vi * ur - vr * ui) << shiftUp) / norm;
  return {
    re: R.addError(R.ball(re, -wp - 8, 1), 1.01, errorBits),
    im: R.addError(R.ball(im, -wp - 8, 1), 1.01, errorBits),
  };
}
