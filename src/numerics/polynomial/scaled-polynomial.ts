/**
 * @module A real polynomial evaluated in fixed point at complex points, with a proved error.
 *
 * Purpose    the one inner loop of the root finder; coefficients may span any range of exponents.
 * Method     z = y·2^e with |y| near 1. The coefficients c_k = a_k 2^(ke) are written in units of 2^(T−w), where 2^T
 *            bounds them all and w is the working precision; Y = y·2^w is an exact integer pair. Powers up to y^m are
 *            formed once, blocks of m coefficients are integer dot products with them, blocks are joined by Horner's
 *            rule in y^m; the derivative shares the powers.
 * Bound      in units of 2^(T−w), with η >= |y|, |C_k − c_k| <= ε_k, W_k >= |c_k|2^-T and δ_j the error of the power y^j
 *            in units of 2^-w: δ_0 = δ_1 = 0, δ_{j+1} <= η δ_j + √2;
 *            block error <= Σ (ε_k η^j + W_k δ_j) + √2;
 *            error <= η^m·(error above) + δ_m Σ_above W_k η^(k−…) + √2 + block error.
 *            The products of two errors (a relative 2^-w·δ <= 2^-10) and the rounding of these double sums are covered
 *            by the factor SLACK.
 * Reference  M. S. Paterson, L. J. Stockmeyer, SIAM J. Comput. 2 (1973) 60 (blocks); N. J. Higham, "Accuracy and
 *            Stability of Numerical Algorithms", section 5.1 (running error bounds).
 */
import { bitLength, shift } from '../bits.js';
import { radiusBits, upperBits, type Ball } from '../ball/real.js';

const SLACK = 1.01;
const ROUND = 1.4143; // > √2: both parts of a complex number rounded down

/** The coefficients for the points z = y·2^e at w bits. */
export interface ScaledCoefficients {
  readonly w: number;
  /** Values are integers times 2^unit. */
  readonly unit: number;
  readonly value: readonly bigint[];
  readonly slope: readonly bigint[];
  /** |c_k|·2^-T rounded up. */
  readonly weight: Float64Array;
  /** Error of C_k in units, and the part of it that the input balls brought. */
  readonly error: Float64Array;
  readonly inputError: Float64Array;
}

/** Coefficients a_k (ascending) of p(y·2^e) at w bits; the a_k are exact or enclosed. */
export function scaleCoefficients(a: readonly Ball[], e: number, w: number): ScaledCoefficients {
  const n = a.length;
  let top = -Infinity;
  for (let k = 0; k < n; k++) top = Math.max(top, upperBits(a[k]!) + k * e);
  const unit = top - w;
  const value: bigint[] = [];
  const slope: bigint[] = [];
  const weight = new Float64Array(n);
  const error = new Float64Array(n);
  const inputError = new Float64Array(n);
  for (let k = 0; k < n; k++) {
    const { mid, exp, rad } = a[k]!;
    const s = exp + k * e - unit;
    const rounding = s < 0 ? 1 : 0;
    const c = shift(mid, s);
    value.push(c);
    if (k > 0) slope.push(c * BigInt(k));
    weight[k] = c === 0n ? 0 : 2 ** (bitLength(c) - w);
    inputError[k] = rad === 0 ? 0 : rad * 2 ** Math.max(s, -1000) * SLACK;
    error[k] = inputError[k]! + rounding;
    // Not from error[k]: that is Infinity where a radius is beyond 2^1024 units, and Infinity·2^-w would be NaN.
    weight[k]! += (rad === 0 ? 0 : rad * 2 ** Math.max(s - w, -1000) * SLACK) + rounding * 2 ** -w;
  }
  return { w, unit, value, slope, weight, error, inputError };
}

/**
 * Bits between the largest |a_k| 2^(ke) and the largest radius among them: more working bits than these and a few
 * describe the error of the coefficients only. Infinity for exact coefficients.
 */
export function usefulBits(a: readonly Ball[], e: number): number {
  let top = -Infinity;
  let radius = -Infinity;
  for (let k = 0; k < a.length; k++) {
    top = Math.max(top, upperBits(a[k]!) + k * e);
    radius = Math.max(radius, radiusBits(a[k]!) + k * e);
  }
  return radius === -Infinity ? Infinity : Math.max(0, Math.ceil(top - radius));
}

/** p(y) and p'(y) (derivative in y) as integers in units of 2^unit; slope parts are 0 when not asked for. */
export interface PointValue {
  readonly re: bigint;
  readonly im: bigint;
  readonly slopeRe: bigint;
  readonly slopeIm: bigint;
}

/** Block length that makes m + 2n/m complex products small. */
const blockLength = (n: number, withSlope: boolean): number =>
  Math.max(1, Math.min(n, Math.round(Math.sqrt((withSlope ? 2 : 1) * n))));

/** Value (and slope) at y = (yr + i·yi)·2^-w. */
export function evaluateAt(s: ScaledCoefficients, yr: bigint, yi: bigint, withSlope: boolean): PointValue {
  const m = blockLength(s.value.length, withSlope);
  if (yi === 0n) {
    const powers = realPowers(yr, m, s.w);
    return {
      re: realBlocks(s.value, powers, s.w),
      im: 0n,
      slopeRe: withSlope ? realBlocks(s.slope, powers, s.w) : 0n,
      slopeIm: 0n,
    };
  }
  const [pr, pi] = complexPowers(yr, yi, m, s.w);
  const [re, im] = complexBlocks(s.value, pr, pi, s.w);
  const [slopeRe, slopeIm] = withSlope ? complexBlocks(s.slope, pr, pi, s.w) : [0n, 0n];
  return { re, im, slopeRe, slopeIm };
}

/** Bound on the error of `evaluateAt(s, ·, ·, withSlope).re + i·im` in units, at a point with |y| <= eta. */
export function valueErrorBound(s: ScaledCoefficients, eta: number, withSlope: boolean): number {
  const n = s.value.length;
  const m = blockLength(n, withSlope);
  const power = new Float64Array(m + 1);
  const delta = new Float64Array(m + 1);
  power[0] = 1;
  for (let j = 1; j <= m; j++) {
    power[j] = power[j - 1]! * eta;
    delta[j] = j === 1 ? 0 : delta[j - 1]! * eta + ROUND;
  }
  let total = 0;
  let size = 0;
  for (let b = Math.ceil(n / m) - 1; b >= 0; b--) {
    let block = ROUND;
    let weight = 0;
    for (let j = 0, k = b * m; j < m && k < n; j++, k++) {
      block += s.error[k]! * power[j]! + s.weight[k]! * delta[j]!;
      weight += s.weight[k]! * power[j]!;
    }
    total = total * power[m]! + size * delta[m]! + ROUND + block;
    size = size * power[m]! + weight;
  }
  return total * SLACK;
}

/** The part of the error that stems from the radii of the coefficients: more bits cannot lower it. */
export function inputErrorBound(s: ScaledCoefficients, eta: number): number {
  let total = 0;
  for (let k = s.value.length - 1; k >= 0; k--) total = total * eta + s.inputError[k]!;
  return total;
}

function realPowers(y: bigint, m: number, w: number): bigint[] {
  const k = BigInt(w);
  const out = [1n << k, y];
  for (let j = 2; j <= m; j++) out.push((out[j - 1]! * y) >> k);
  return out;
}

function realBlocks(c: readonly bigint[], powers: readonly bigint[], w: number): bigint {
  const m = powers.length - 1;
  const k = BigInt(w);
  let total = 0n;
  for (let b = Math.ceil(c.length / m) - 1; b >= 0; b--) {
    let sum = 0n;
    const top = Math.min(m, c.length - b * m);
    for (let j = 1; j < top; j++) sum += c[b * m + j]! * powers[j]!;
    if (total !== 0n) total = (total * powers[m]!) >> k;
    total += (sum >> k) + c[b * m]!;
  }
  return total;
}

function complexPowers(yr: bigint, yi: bigint, m: number, w: number): [bigint[], bigint[]] {
  const k = BigInt(w);
  const re = [1n << k, yr];
  const im = [0n, yi];
  for (let j = 2; j <= m; j++) {
    const a = re[j - 1]!;
    const b = im[j - 1]!;
    re.push((a * yr - b * yi) >> k);
    im.push((a * yi + b * yr) >> k);
  }
  return [re, im];
}

function complexBlocks(
  c: readonly bigint[],
  pr: readonly bigint[],
  pi: readonly bigint[],
  w: number,
): [bigint, bigint] {
  const m = pr.length - 1;
  const k = BigInt(w);
  const ur = pr[m]!;
  const ui = pi[m]!;
  let re = 0n;
  let im = 0n;
  for (let b = Math.ceil(c.length / m) - 1; b >= 0; b--) {
    let sr = 0n;
    let si = 0n;
    const top = Math.min(m, c.length - b * m);
    for (let j = 1; j < top; j++) {
      const a = c[b * m + j]!;
      sr += a * pr[j]!;
      si += a * pi[j]!;
    }
    const nr = (re * ur - im * ui) >> k;
    const ni = (re * ui + im * ur) >> k;
    re = nr + (sr >> k) + c[b * m]!;
    im = ni + (si >> k);
  }
  return [re, im];
}

/** log2 of |re + i·im| for integers, to about 1e-15 absolute; -Infinity for 0. */
export function log2Length(re: bigint, im: bigint): number {
  const bits = Math.max(bitLength(re), bitLength(im));
  if (bits === 0) return -Infinity;
  const drop = Math.max(0, bits - 60);
  const k = BigInt(drop);
  const x = Number(drop > 0 ? re >> k : re);
  const y = Number(drop > 0 ? im >> k : im);
  return drop + 0.5 * Math.log2(x * x + y * y);
}
