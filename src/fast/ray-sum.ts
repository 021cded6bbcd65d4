/**
 * @module Laplace integrals along one rotated ray in doubles, for transforms known at fixed points.
 *
 * Purpose    (1/x) ∫_0^{∞e^{iθ}} dt e^{−t/x} B(t) for many x and many B: the points t_j do not move with x, so that what does not
 *            depend on the coefficients is computed once, and B once for each coefficient list.
 * Method     trapezoidal rule of step h in v, t = X e^{iθ} exp(v − e^{−v}), θ = 43.6°, X the central coupling. A simple pole
 *            of B at t(v₀) moves the sum by a known amount, so that it may lie on either side of the ray, and near it:
 *              ∫ = Σ + π ρ [cot(πv₀/h) ± i],  ρ = Res B · e^{−z/x}/x,  + for a contour below the pole, − above it.
 *            The sum as a function of x is a row of Chebyshev coefficients, linear in the values of B: one matrix, made once.
 * Bound      measured against enclosures: 1e-13 of the integral for X/2 <= x <= 2X where the first singularity lies at t > X/4.
 * Reference  M. Mori, M. Sugihara, J. Comput. Appl. Math. 127 (2001) 287 (the map; memory); E. T. Goodwin, Proc. Camb. Phil.
 *            Soc. 45 (1949) 241 (the correction by the cotangent; memory, re-derived from the residue theorem).
 */
import { RAYS } from '../borel/index.js';
import { ChebyshevLine, TABLED } from './tabled.js';

/** Step and range of v. Heuristic: e^{−33} is left out below, e^{−36} above at x = 2X. */
const STEP = 1 / 12;
const FROM = -40;
const TO = 57;
const NEWTON_STEPS = 40;
/** Degree in x; heuristic, see the tests. */
const DEGREE = 30;
/** q/(1 − q) is −1 from here on. */
const LARGE = 1e100;

/** Real parts of e^{−t_j/x}/x, as Chebyshev coefficients in x: times the real and the imaginary part of the values. */
interface Rows {
  readonly re: readonly Float64Array[];
  readonly im: readonly Float64Array[];
}

export class RaySum {
  readonly angle: number;
  readonly count = TO - FROM + 1;
  /** The points t_j. */
  readonly re = new Float64Array(this.count);
  readonly im = new Float64Array(this.count);
  /** h dt/dv at the points. */
  private readonly weightRe = new Float64Array(this.count);
  private readonly weightIm = new Float64Array(this.count);
  /** B times the weight. */
  private readonly valueRe = new Float64Array(this.count);
  private readonly valueIm = new Float64Array(this.count);
  private readonly X: number;
  private readonly line: ChebyshevLine;
  private made: Rows | undefined;
  private readonly coefficients = new Float64Array(DEGREE + 1);

  constructor(X: number) {
    this.X = X;
    this.line = new ChebyshevLine(DEGREE, TABLED.from * X, TABLED.to * X);
    this.angle = RAYS[0]!.angle;
    const [cos, sin] = [Math.cos(this.angle), Math.sin(this.angle)];
    for (let j = 0; j < this.count; j++) {
      const v = (FROM + j) * STEP;
      const r = X * Math.exp(v - Math.exp(-v));
      const slope = STEP * r * (1 + Math.exp(-v));
      this.re[j] = r * cos;
      this.im[j] = r * sin;
      this.weightRe[j] = slope * cos;
      this.weightIm[j] = slope * sin;
    }
  }

  /** The matrix, made when it is first needed. */
  private rows(): Rows {
    if (this.made !== undefined) return this.made;
    const { re, im, count, line } = this;
    const samples = Array.from(line.points, (x) => {
      const sample = { re: new Float64Array(count), im: new Float64Array(count) };
      for (let j = 0; j < count; j++) {
        const size = Math.exp(-re[j]! / x) / x;
        sample.re[j] = size * Math.cos(im[j]! / x);
        sample.im[j] = size * Math.sin(im[j]! / x);
      }
      return sample;
    });
    const table = (part: 're' | 'im'): Float64Array[] =>
      line.rows.map((row) => {
        const out = new Float64Array(count);
        row.forEach((weight, k) => {
          const sample = samples[k]![part];
          for (let j = 0; j < count; j++) out[j]! += weight * sample[j]!;
        });
        return out;
      });
    this.made = { re: table('re'), im: table('im') };
    return this.made;
  }

  /** B(t_j) = re + i·im. */
  set(j: number, re: number, im: number): void {
    const a = this.weightRe[j]!;
    const b = this.weightIm[j]!;
    this.valueRe[j] = re * a - im * b;
    this.valueIm[j] = re * b + im * a;
  }

  /** To be called when all values are set. */
  settle(): void {
    const { valueRe, valueIm, coefficients, count } = this;
    const rows = this.rows();
    for (let k = 0; k <= DEGREE; k++) {
      const a = rows.re[k]!;
      const b = rows.im[k]!;
      let sum = 0;
      for (let j = 0; j < count; j++) sum += a[j]! * valueRe[j]! + b[j]! * valueIm[j]!;
      coefficients[k] = sum;
    }
  }

  /** The real part of the sum of the present values as a function of x, without a table. */
  snapshot(): (x: number) => number {
    const [re, im] = [this.valueRe.slice(), this.valueIm.slice()];
    return (x) => this.direct(x, re, im);
  }

  /** Real part of the sum at x. */
  real(x: number): number {
    const tabled = this.line.at(this.coefficients, x);
    return Number.isNaN(tabled) ? this.direct(x, this.valueRe, this.valueIm) : tabled;
  }

  private direct(x: number, valueRe: Float64Array, valueIm: Float64Array): number {
    const { re, im, count } = this;
    let sum = 0;
    for (let j = 0; j < count; j++) {
      const turn = im[j]! / x;
      sum += Math.exp(-re[j]! / x) * (valueRe[j]! * Math.cos(turn) + valueIm[j]! * Math.sin(turn));
    }
    return sum / x;
  }

  /**
   * π [cot(πv₀/h) ± i] for a pole at z = re + i·im, into `out` (two numbers). `above`: the contour passes above the pole.
   */
  correction(re: number, im: number, above: boolean, out: Float64Array): void {
    // v₀ − e^{−v₀} = log(z/(X e^{iθ})).
    const a = Math.log(Math.hypot(re, im) / this.X);
    const c = Math.atan2(im, re) - this.angle;
    let x = a > 0 ? a : -Math.log1p(-a);
    let y = c / (1 + Math.exp(-x));
    for (let step = 0; step < NEWTON_STEPS; step++) {
      const e = Math.exp(-x);
      const er = e * Math.cos(y);
      const ei = -e * Math.sin(y);
      const fr = x - er - a;
      const fi = y - ei - c;
      const dr = 1 + er;
      const norm = dr * dr + ei * ei;
      const mr = (fr * dr + fi * ei) / norm;
      const mi = (fi * dr - fr * ei) / norm;
      x -= mr;
      y -= mi;
      if (Math.abs(mr) + Math.abs(mi) < 1e-15 * (1 + Math.abs(x))) break;
    }
    // π [cot ζ + i] = −2πi q/(1 − q), q = e^{2iζ}; π [cot ζ − i] = 2πi q/(1 − q), q = e^{−2iζ}; ζ = πv₀/h.
    const s = above ? 1 : -1;
    const size = Math.exp((s * 2 * Math.PI * y) / STEP);
    const turn = (-s * 2 * Math.PI * x) / STEP;
    out[0] = 0;
    out[1] = -s * 2 * Math.PI;
    if (!(size < LARGE)) return;
    const qr = size * Math.cos(turn);
    const qi = size * Math.sin(turn);
    const norm = (1 - qr) * (1 - qr) + qi * qi;
    out[0] = (-s * 2 * Math.PI * qi) / norm;
    out[1] = (s * 2 * Math.PI * (qr * (1 - qr) - qi * qi)) / norm;
  }
}
