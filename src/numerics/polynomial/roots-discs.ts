/**
 * @module Proved discs around approximate roots.
 *
 * Purpose    the theorem that turns numbers into enclosures; everything before it may be heuristic.
 * Method     Smith's discs. Let p have degree n and leading coefficient a, let z_1..z_n be distinct, and
 *            Q_i = p(z_i)/(a Π_{j≠i}(z_i − z_j)), r_i = n|Q_i|. Every zero of p lies in some |z − z_i| <= r_i, and a
 *            connected union of m discs that meets no other holds exactly m zeros.
 *            Proof: p(z)/(a Π(z − z_i)) = 1 + Σ Q_i/(z − z_i) (Lagrange); outside all discs the sum is below
 *            Σ 1/n = 1 in modulus, so p is not 0; for the count move Q_i → tQ_i, t from 0 to 1.
 *            A disc that meets no other and has a real centre holds a real zero: the conjugate zero lies in it too.
 *            A disc that does not meet its mirror image holds a zero that is not real.
 * Bound      logarithms in doubles: |p(z_i)| with its error bound from above, |a| from below, differences to a relative
 *            2^-29. With Math.log2 good to 2^-40 the sum of at most 400 terms is off by less than 2^-19; MARGIN covers
 *            it. With ball coefficients every polynomial in the ball has one zero in each disc.
 * Reference  B. T. Smith, J. ACM 17 (1970) 661; C. Carstensen, Numer. Math. 59 (1991) 349.
 */
import { bitLength } from '../bits.js';
import type { Ball } from '../ball/real.js';
import type { RootCloud } from './roots-cloud.js';
import { evaluateAt, inputErrorBound, log2Length, valueErrorBound } from './scaled-polynomial.js';

const MARGIN = 2 ** -12;
/** Boxes are stored around the discs: √2, and the rounding of their centres. */
const BOX = 0.5 + 2 ** -6;
/** Heuristic: a resting point has |p| up to twice the bound of its error, hence three times that in its disc. */
const LIMIT = 2;

export interface Discs {
  /** log2 of the radius. */
  readonly radius: Float64Array;
  /** crowded[i] = 1 when the box around disc i may meet another one. */
  readonly crowded: Uint8Array;
  /** True when no box is crowded. */
  readonly disjoint: boolean;
  /** Smallest log2(|z_i|/r_i). */
  readonly accuracy: number;
  /** Largest loss w − (accuracy that the error bound alone would leave), in bits. */
  readonly loss: number;
  /** True when, for the worst disc, the error of the coefficients outweighs rounding and remaining step. */
  readonly inputLimited: boolean;
}

/** Smith's discs of the cloud for its polynomial. */
export function smithDiscs(cloud: RootCloud): Discs {
  const { n, w } = cloud;
  const radius = new Float64Array(n);
  const logs = new Float64Array(n * n);
  const d = new Float64Array(2);
  const base = Math.log2(n) - lowerLog2(cloud.coefficients[n]!) + MARGIN;
  let accuracy = Infinity;
  let loss = 0;
  let inputLimited = false;
  for (let i = 0; i < n; i++) {
    if (!cloud.leads(i)) continue;
    let product = 0;
    for (let j = 0; j < n; j++) {
      if (j === i) continue;
      const log = cloud.logDistance(i, j, d);
      logs[i * n + j] = log;
      product += log;
    }
    const s = cloud.scaledAt(cloud.exp[i]!);
    const v = evaluateAt(s, cloud.re[i]!, cloud.im[i]!, false);
    const eta = cloud.modulusBound(i);
    const error = valueErrorBound(s, eta, false);
    const value = log2Length(v.re, v.im);
    const upper = Math.max(value, Math.log2(error)) + Math.log2(1 + 2 ** -Math.abs(value - Math.log2(error)));
    radius[i] = upper + s.unit + base - product;
    const size = log2Length(cloud.re[i]!, cloud.im[i]!) - w + cloud.exp[i]!;
    const bits = size - radius[i]!;
    loss = Math.max(loss, w - (size - (Math.log2(error) + s.unit + base - product)));
    if (!(bits >= accuracy)) {
      accuracy = bits;
      const input = inputErrorBound(s, eta);
      inputLimited = input === Infinity || Math.log2(input) > upper - LIMIT;
    }
    const partner = cloud.partner[i]!;
    if (partner >= 0) radius[partner] = radius[i]!;
  }
  const crowded = crowdedDiscs(cloud, radius, logs);
  return { radius, crowded, disjoint: !crowded.includes(1), accuracy, loss, inputLimited };
}

/** log2 of a lower bound of |a|, −Infinity when the ball may hold zero. */
function lowerLog2(a: Ball): number {
  const bits = bitLength(a.mid);
  const drop = Math.max(0, bits - 60);
  const size = Math.abs(Number(a.mid >> BigInt(drop))) * (1 - 2 ** -50) - a.rad * 2 ** -drop * (1 + 2 ** -50);
  return size > 0 ? Math.log2(size) + drop + a.exp : -Infinity;
}

function crowdedDiscs(cloud: RootCloud, radius: Float64Array, logs: Float64Array): Uint8Array {
  const { n } = cloud;
  const crowded = new Uint8Array(n);
  for (let i = 0; i < n; i++) {
    if (!cloud.leads(i)) continue;
    for (let j = 0; j < n; j++) {
      if (j === i) continue;
      const a = Math.max(radius[i]!, radius[j]!);
      const sum = a + Math.log2(1 + 2 ** (Math.min(radius[i]!, radius[j]!) - a));
      if (logs[i * n + j]! > sum + BOX) continue;
      crowded[i] = 1;
      crowded[j] = 1;
    }
  }
  return crowded;
}

/**
 * Decides which roots are real and which are conjugates, on the evidence of the discs, and makes the cloud symmetric.
 * False, and nothing changed, when the evidence does not pair the roots. The discs of the symmetric cloud must be
 * formed anew: they are the proof.
 */
export function symmetrise(cloud: RootCloud, radius: Float64Array): boolean {
  const { n, w } = cloud;
  const partner = new Int32Array(n).fill(-1);
  const absolute = (v: bigint, i: number): number => log2Length(v, 0n) - w + cloud.exp[i]!;
  for (let i = 0; i < n; i++) if (absolute(cloud.im[i]!, i) <= radius[i]!) partner[i] = i;
  for (let i = 0; i < n; i++) {
    if (partner[i]! >= 0 || cloud.im[i]! < 0n) continue;
    let best = -1;
    let least = Infinity;
    for (let j = 0; j < n; j++) {
      if (partner[j]! >= 0 || cloud.im[j]! > 0n) continue;
      const scale = 2 ** Math.max(-1000, Math.min(1000, cloud.exp[j]! - cloud.exp[i]!));
      const gap = Math.hypot(cloud.x[i]! - cloud.x[j]! * scale, cloud.y[i]! + cloud.y[j]! * scale);
      if (gap < least) [best, least] = [j, gap];
    }
    if (best < 0) return false;
    partner[i] = best;
    partner[best] = i;
  }
  if (partner.some((p) => p < 0)) return false;
  cloud.partner.set(partner);
  for (let i = 0; i < n; i++) {
    if (partner[i] === i) cloud.place(i, cloud.re[i]!, 0n);
    else if (cloud.leads(i)) cloud.place(i, cloud.re[i]!, cloud.im[i]!);
  }
  return true;
}
