/**
 * @module Approximate roots in fixed point, moved by Ehrlich–Aberth steps of any precision.
 *
 * Purpose    from starting points in doubles to as many bits as are asked for. Nothing here is proved.
 * Method     root i is (re + i·im)·2^(exp − w) with modulus near 2^exp. One sweep moves every active root by
 *            N/(1 − N S), N = p/p' in long integers, S = Σ 1/(z_i − z_j) and the factor 1/(1 − N S) − 1 in doubles:
 *            k correct bits become min(3k, 2k + 50). Conjugate partners are moved together once they are known.
 * Reference  O. Aberth, Math. Comput. 27 (1973) 339; D. A. Bini, G. Fiorentino, Numer. Algorithms 23 (2000) 127
 *            (raising the precision only as far as the roots need it).
 */
import { shift } from '../bits.js';
import type { Ball } from '../ball/real.js';
import type { Points } from './roots-start.js';
import {
  evaluateAt,
  log2Length,
  scaleCoefficients,
  usefulBits,
  valueErrorBound,
  type ScaledCoefficients,
} from './scaled-polynomial.js';

/** Differences below this (in units of the modulus) are formed in integers, larger ones in doubles. */
const CLOSE = 2 ** -22;
/** Longest integer that is turned into a double in one step. */
const DOUBLE_BITS = 900;
const FAR = 500;

export class RootCloud {
  readonly coefficients: readonly Ball[];
  readonly n: number;
  w: number;
  readonly exp: number[];
  readonly re: bigint[];
  readonly im: bigint[];
  /** Doubles near re·2^-w, im·2^-w. */
  readonly x: Float64Array;
  readonly y: Float64Array;
  /** partner[i]: index of the conjugate root, i itself for a real one; −1 while unknown. */
  readonly partner: Int32Array;
  private scaled = new Map<number, ScaledCoefficients>();

  constructor(coefficients: readonly Ball[], points: Points, w: number) {
    this.coefficients = coefficients;
    this.n = points.re.length;
    this.w = w;
    this.exp = Array.from(points.exp);
    const fixed = (v: number): bigint => shift(BigInt(Math.round(v * 2 ** 53)), w - 53);
    this.re = Array.from(points.re, fixed);
    this.im = Array.from(points.im, fixed);
    this.x = points.re.slice();
    this.y = points.im.slice();
    this.partner = new Int32Array(this.n).fill(-1);
  }

  /** Raises the working precision; positions keep their values. */
  raise(w: number): void {
    const k = BigInt(w - this.w);
    for (let i = 0; i < this.n; i++) {
      this.re[i]! <<= k;
      this.im[i]! <<= k;
    }
    this.w = w;
    this.scaled = new Map();
  }

  scaledAt(e: number): ScaledCoefficients {
    let s = this.scaled.get(e);
    if (s === undefined) this.scaled.set(e, (s = scaleCoefficients(this.coefficients, e, this.w)));
    return s;
  }

  /** Bits up to which the coefficients are known, seen from the scale that knows them best. */
  usefulBits(): number {
    return Math.max(...[...new Set(this.exp)].map((e) => usefulBits(this.coefficients, e)));
  }

  /** Is i the root that stands for itself and its conjugate? (every root while partners are unknown) */
  leads(i: number): boolean {
    const j = this.partner[i]!;
    return j < 0 || i <= j;
  }

  /**
   * z_i − z_j in units of 2^exp[i] as doubles, relative error below 2^-29; 0 only when equal to 2^-900, Infinity when z_j
   * is larger by 2^FAR or more.
   */
  difference(i: number, j: number, out: Float64Array): void {
    const d = this.exp[j]! - this.exp[i]!;
    if (d > FAR) {
      out[0] = Infinity;
      out[1] = 0;
      return;
    }
    const scale = d === 0 ? 1 : 2 ** d;
    out[0] = this.x[i]! - this.x[j]! * scale;
    out[1] = this.y[i]! - this.y[j]! * scale;
    if (Math.abs(d) <= 2 && Math.abs(out[0]) < CLOSE && Math.abs(out[1]) < CLOSE) {
      // Both in the finer of the two units.
      const fine = Math.min(d, 0);
      const re = shift(this.re[i]!, -fine) - shift(this.re[j]!, d - fine);
      const im = shift(this.im[i]!, -fine) - shift(this.im[j]!, d - fine);
      out[0] = this.toDouble(re) * 2 ** fine;
      out[1] = this.toDouble(im) * 2 ** fine;
    }
  }

  /** log2|z_i − z_j|, to 2^-28; −Infinity when they agree to 2^-900. */
  logDistance(i: number, j: number, scratch: Float64Array): number {
    // The farther one decides when the scales differ by more than the error allowed.
    if (this.exp[j]! - this.exp[i]! > 64) return Math.log2(Math.hypot(this.x[j]!, this.y[j]!)) + this.exp[j]!;
    this.difference(i, j, scratch);
    return Math.log2(Math.hypot(scratch[0]!, scratch[1]!)) + this.exp[i]!;
  }

  /** Moves root i off the real axis by 2^log (log absolute): iterations that start on the axis never leave it. */
  lift(i: number, log: number): void {
    const k = Math.floor(log) - this.exp[i]! + this.w;
    if (k >= 0 && k < this.w) this.place(i, this.re[i]!, this.im[i]! + (i % 2 === 0 ? 1n : -1n) * (1n << BigInt(k)));
  }

  toDouble(v: bigint): number {
    const drop = this.w - DOUBLE_BITS;
    return drop <= 0 ? Number(v) * 2 ** -this.w : Number(v >> BigInt(drop)) * 2 ** -DOUBLE_BITS;
  }

  /** Upper bound on |y_i|. */
  modulusBound(i: number): number {
    return Math.hypot(this.x[i]!, this.y[i]!) * (1 + 2 ** -40) + 2 ** -900;
  }

  /**
   * One step of root i (and its partner). True when the root rests: |p| is at its error bound, or the step is below
   * the last bits.
   */
  step(i: number): boolean {
    const { w } = this;
    const s = this.scaledAt(this.exp[i]!);
    const v = evaluateAt(s, this.re[i]!, this.im[i]!, true);
    if (log2Length(v.re, v.im) <= Math.log2(valueErrorBound(s, this.modulusBound(i), true)) + 1) return true;
    const k = BigInt(w);
    let nr: bigint;
    let ni = 0n;
    if (v.slopeIm === 0n && v.im === 0n) {
      if (v.slopeRe === 0n) return this.nudge(i);
      nr = (v.re << k) / v.slopeRe;
    } else {
      const norm = v.slopeRe * v.slopeRe + v.slopeIm * v.slopeIm;
      if (norm === 0n) return this.nudge(i);
      nr = ((v.re * v.slopeRe + v.im * v.slopeIm) << k) / norm;
      ni = ((v.im * v.slopeRe - v.re * v.slopeIm) << k) / norm;
    }
    const [gr, gi] = this.aberthFactor(i, this.toDouble(nr), this.toDouble(ni));
    const dr = nr + ((nr * gr - ni * gi) >> 60n);
    const di = ni + ((nr * gi + ni * gr) >> 60n);
    this.place(i, this.re[i]! - dr, this.partner[i] === i ? 0n : this.im[i]! - di);
    return log2Length(dr, di) < 6;
  }

  /** 1/(1 − N S) − 1 in units of 2^-60; 0 where doubles cannot hold it. */
  private aberthFactor(i: number, nx: number, ny: number): [bigint, bigint] {
    const d = new Float64Array(2);
    let sx = 0;
    let sy = 0;
    for (let j = 0; j < this.n; j++) {
      if (j === i) continue;
      this.difference(i, j, d);
      const q = d[0]! * d[0]! + d[1]! * d[1]!;
      if (q === 0 || q === Infinity) continue;
      sx += d[0]! / q;
      sy -= d[1]! / q;
    }
    const px = nx * sx - ny * sy;
    const py = nx * sy + ny * sx;
    // 1/(1 − P) − 1 = P/(1 − P)
    const q = (1 - px) * (1 - px) + py * py;
    const gx = (px * (1 - px) - py * py) / q;
    const gy = py / q;
    if (!(Math.abs(gx) < 2 ** 40) || !(Math.abs(gy) < 2 ** 40)) return [0n, 0n];
    return [BigInt(Math.round(gx * 2 ** 60)), BigInt(Math.round(gy * 2 ** 60))];
  }

  /** A stationary point of p: leave it by a fixed small turn. */
  private nudge(i: number): boolean {
    const up = this.partner[i] === i ? 0n : this.re[i]! >> 12n;
    this.place(i, this.re[i]! + (this.re[i]! >> 11n) + 1n, this.im[i]! + up);
    return false;
  }

  /** Sets root i and its partner, bringing the modulus back near 2^exp. */
  place(i: number, re: bigint, im: bigint): void {
    const size = log2Length(re, im) - this.w;
    if (size === -Infinity) return;
    const s = size > 0.6 || size < -0.6 ? Math.round(size) : 0;
    this.set(i, shift(re, -s), shift(im, -s), this.exp[i]! + s);
    const j = this.partner[i]!;
    if (j >= 0 && j !== i) this.set(j, this.re[i]!, -this.im[i]!, this.exp[i]!);
  }

  private set(i: number, re: bigint, im: bigint, exp: number): void {
    this.re[i] = re;
    this.im[i] = im;
    this.exp[i] = exp;
    this.x[i] = this.toDouble(re);
    this.y[i] = this.toDouble(im);
  }
}
