/**
 * @module Stirling's series and rising factorials in fixed point: the core of Γ, log Γ and ψ for positive arguments.
 *
 * Purpose    log Γ(X) and ψ(X) for X large enough, and the product (x+1)…(x+n−1) that brings x there.
 * Method     Σ c_k y^k, y = 1/X², by Horner's rule where step k keeps only the wp − k·log2(1/y) fraction bits that still
 *            count; rising factorials in rows of four to sixteen factors, as polynomials in x with integer coefficients.
 * Bound      for X > 0 the remainder after N terms is below the first term left out, |B_2N|/(2N(2N−1) X^(2N−1)) for
 *            log Γ, |B_2N|/(2N X^2N) for ψ (DLMF 5.11(ii)). Step k of Horner's rule loses 3 units of 2^-f_k and is multiplied by
 *            y^k <= 2^(f_k − wp): 3N + 3 ulp in all.
 * Reference  DLMF 5.11.1, 5.11.2; F. Johansson, "Arbitrary-precision computation of the gamma function", arXiv:2109.08392.
 */
import { bitLength } from '../bits.js';
import { int } from '../ball/fixed.js';
import { bernoulli } from './bernoulli.js';

/** Heuristic balance between shifting and summing: X is brought above this fraction of the working precision. */
export const SHIFT_RATIO = 0.24;

/** Upper bound of log2 |B_2k|, from |B_2k| = 2(2k)! ζ(2k)/(2π)^2k with ζ <= 1.65 and n! <= √(2πn)(n/e)^n e^(1/12n). */
function bernoulliBits(k: number): number {
  const n = 2 * k;
  return 1.75 + (n + 0.5) * Math.log2(n) - n * Math.LOG2E + 1.33 - n * 2.6514961 + 0.13 / n;
}

/**
 * Number of terms N and log2 of a bound on the remainder, for log Γ (`forLog`) or ψ at X >= 2^log2x: the least N whose
 * remainder is below 2^-wp, or the best one when X is too small for that.
 */
export function stirlingTerms(log2x: number, wp: number, forLog: boolean): { terms: number; remainder: number } {
  let best = { terms: 1, remainder: Infinity };
  for (let n = 1; n <= wp + 2; n++) {
    const common = bernoulliBits(n) - 2 * n * log2x;
    const remainder = common + (forLog ? log2x - Math.log2(2 * n * (2 * n - 1)) : -Math.log2(2 * n)) + 1e-6;
    if (remainder >= best.remainder) break;
    best = { terms: n, remainder };
    if (remainder < -wp) break;
  }
  return best;
}

/**
 * Σ_{k=1}^{N−1} B_2k/(2k(2k−1))·y^(k−1) (`forLog`) or Σ B_2k/(2k)·y^(k−1), in units of 2^-wp, for y = yMid·2^-yExp < 2^-2L,
 * y given to wp relative bits. Off by at most 3N + 3.
 */
export function bernoulliSum(yMid: bigint, yExp: number, terms: number, wp: number, forLog: boolean): bigint {
  const yBits = bitLength(yMid);
  const l = yExp - yBits; // y < 2^-l
  let s = 0n;
  for (let k = terms - 1; k >= 1; k--) {
    const f = wp - (k - 1) * l; // fraction bits of this step
    // s has f − l fraction bits; s·y needs only as many bits of y as s has, and a few.
    if (s !== 0n) {
      const cut = Math.max(0, yBits - bitLength(s) - 8);
      const y = cut > 0 ? yMid >> BigInt(cut) : yMid;
      const drop = BigInt(yExp - cut - l);
      s = (s * y) >> drop;
    }
    const b = bernoulli(2 * k);
    const den = b.den * BigInt(forLog ? 2 * k * (2 * k - 1) : 2 * k);
    s += (f >= 0 ? b.num << BigInt(f) : b.num >> BigInt(-f)) / den;
  }
  return s;
}

/**
 * Rising product (x+1)(x+2)…(x+n) as mid·2^exp; x >= 0 in fixed point. Relative error below 2^(5−wp)·(n+1): x^i is off by i·max(1, x)^(i−1)
 * units, so a row V of m factors from x + a on by V′(max(1, x)) <= V(x)·(m/2)·(a+m)/a units, and a row costs one more rounding.
 */
export function risingProduct(x: bigint, wp: number, n: number): { mid: bigint; exp: number } {
  const w = BigInt(wp);
  const keep = wp + 8;
  let mid = 1n << w;
  let exp = -wp;
  const times = (q: bigint): void => {
    mid *= q;
    const cut = bitLength(mid) - keep;
    if (cut > 0) mid >>= BigInt(cut);
    exp += Math.max(0, cut) - wp;
  };
  const m = n < LEAST_ROW ? 1 : Math.max(LEAST_ROW, Math.min(MOST_IN_ROW, Math.round(0.6 * Math.sqrt(n))));
  const full = m === 1 ? 0 : Math.floor(n / m);
  if (full > 0) {
    const powers = [1n << w, x];
    for (let i = 2; i <= m; i++) powers.push((powers[i >> 1]! * powers[i - (i >> 1)]!) >> w);
    for (const c of risingRows(m, full)) {
      let row = (c[0]! << w) + powers[m]!;
      for (let i = 1; i < m; i++) row += c[i]! * powers[i]!;
      times(row);
    }
  }
  for (let j = full * m + 1; j <= n; j++) times(x + (BigInt(j) << w));
  return { mid, exp };
}

/** Heuristic, from timings: factors of a rising product that are multiplied out in whole numbers. */
const LEAST_ROW = 4;
const MOST_IN_ROW = 16;

const rows: bigint[][][] = [];

/** Coefficients of (x+mj+1)…(x+mj+m) for j < count, lowest first; made once. */
function risingRows(m: number, count: number): readonly (readonly bigint[])[] {
  const table = (rows[m] ??= []);
  for (let j = table.length; j < count; j++) {
    const c = [1n];
    for (let i = 1; i <= m; i++) {
      const k = int(m * j + i);
      c.push(1n);
      for (let l = i - 1; l > 0; l--) c[l] = c[l]! * k + c[l - 1]!;
      c[0]! *= k;
    }
    table.push(c);
  }
  return count === table.length ? table : table.slice(0, count);
}

/** (x+j)(x+j+1)(x+j+2)(x+j+3) from the powers of x. */
function quartic(x: bigint, x2: bigint, x3: bigint, x4: bigint, j: number, w: bigint): bigint {
  const e1 = 4 * j + 6;
  const e2 = (6 * j + 18) * j + 11;
  const e3 = ((4 * j + 18) * j + 22) * j + 6;
  const e4 = BigInt(j * (j + 1)) * BigInt((j + 2) * (j + 3));
  return x4 + BigInt(e1) * x3 + BigInt(e2) * x2 + BigInt(e3) * x + (e4 << w);
}

/** Σ_{j=a}^{b−1} 1/(x+j) in fixed point, a >= 1, x >= 0; off by at most 4·(b−a) + 4 ulp. */
export function harmonicSum(x: bigint, wp: number, a: number, b: number): bigint {
  const w = BigInt(wp);
  let s = 0n;
  let j = a;
  if (b - a >= 4) {
    const x2 = (x * x) >> w;
    const x3 = (x2 * x) >> w;
    const x4 = (x2 * x2) >> w;
    for (; j + 4 <= b; j += 4) {
      const q = quartic(x, x2, x3, x4, j, w);
      const slope =
        4n * x3 +
        BigInt(12 * j + 18) * x2 +
        BigInt((12 * j + 36) * j + 22) * x +
        (BigInt(((4 * j + 18) * j + 22) * j + 6) << w);
      s += (slope << w) / q;
    }
  }
  for (; j < b; j++) s += (1n << (2n * w)) / (x + (BigInt(j) << w));
  return s;
}
