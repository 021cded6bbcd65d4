/**
 * @module f(t) [L/M](t) summed along the ray of ray-sum.ts, f known beforehand: no partial fractions, so that poles may coincide.
 *
 * Real poles on the positive axis lie below the contour: the real part is the principal value. Complex poles that the caller's
 * contour passes on the other side than the ray are put right by their residues, which are taken to be simple.
 */
import type { Approximant } from './poles.js';
import { RaySum } from './ray-sum.js';

/** A function of complex t, into out[0] + i·out[1]. */
export type ComplexFunction = (re: number, im: number, out: Float64Array) => void;

/** Poles farther from the ray than this angle do not touch the sum. Heuristic, in the manner of the step of ray-sum.ts. */
const OUT_OF_REACH = 0.9;

export class RationalOnRay {
  readonly ray: RaySum;
  private readonly fitted: Approximant;
  private readonly f: ComplexFunction;
  private readonly fRe: Float64Array;
  private readonly fIm: Float64Array;
  /** Poles with a correction: position, residue, π [cot ± i]. */
  private readonly near: Float64Array;
  private nearCount = 0;
  private readonly out = new Float64Array(2);

  constructor(fitted: Approximant, f: ComplexFunction, X: number) {
    this.fitted = fitted;
    this.f = f;
    this.ray = new RaySum(X);
    this.fRe = new Float64Array(this.ray.count);
    this.fIm = new Float64Array(this.ray.count);
    this.near = new Float64Array(6 * fitted.pade.M);
    for (let j = 0; j < this.ray.count; j++) {
      f(this.ray.re[j]!, this.ray.im[j]!, this.out);
      this.fRe[j] = this.out[0]!;
      this.fIm[j] = this.out[1]!;
    }
  }

  /** Takes the approximant of the last fit; `above(arg)`: does the contour pass above a pole of that argument? */
  prepare(above: (arg: number) => boolean): void {
    const { pade } = this.fitted;
    this.nearCount = 0;
    for (let i = 0; i < pade.poleCount; i++) {
      if (!(pade.poleIm[i]! > 0)) continue;
      const arg = Math.atan2(pade.poleIm[i]!, pade.poleRe[i]!);
      if (arg < this.ray.angle + OUT_OF_REACH) this.addPole(i, above(arg));
    }
    this.evaluate();
  }

  /** Residue of f [L/M] at the pole i, −z A f(z), and its weight. */
  private addPole(i: number, above: boolean): void {
    const { pade } = this.fitted;
    const { out } = this;
    const zr = pade.poleRe[i]!;
    const zi = pade.poleIm[i]!;
    const ar = pade.amplitudeRe[i]!;
    const ai = pade.amplitudeIm[i]!;
    const rr = zi * ai - zr * ar;
    const ri = -(zr * ai + zi * ar);
    this.f(zr, zi, out);
    const residueRe = rr * out[0]! - ri * out[1]!;
    const residueIm = rr * out[1]! + ri * out[0]!;
    this.ray.correction(zr, zi, above, out);
    this.near.set([zr, zi, residueRe, residueIm, out[0]!, out[1]!], 6 * this.nearCount);
    this.nearCount++;
  }

  /** f p/q at the points of the ray. */
  private evaluate(): void {
    const { ray, fRe, fIm } = this;
    const { numerator: p, denominator: q, L, M } = this.fitted.pade;
    for (let j = 0; j < ray.count; j++) {
      const x = ray.re[j]!;
      const y = ray.im[j]!;
      let pr = 0;
      let pi = 0;
      for (let i = L; i >= 0; i--) {
        const t = pr * x - pi * y + p[i]!;
        pi = pr * y + pi * x;
        pr = t;
      }
      let qr = 0;
      let qi = 0;
      for (let i = M; i >= 0; i--) {
        const t = qr * x - qi * y + q[i]!;
        qi = qr * y + qi * x;
        qr = t;
      }
      const norm = qr * qr + qi * qi;
      const vr = (pr * qr + pi * qi) / norm;
      const vi = (pi * qr - pr * qi) / norm;
      ray.set(j, vr * fRe[j]! - vi * fIm[j]!, vr * fIm[j]! + vi * fRe[j]!);
    }
    ray.settle();
  }

  /** Real part of (1/x) ∫ e^{−t/x} f(t) [L/M](t) dt. */
  value(x: number): number {
    const { near } = this;
    let sum = this.ray.real(x);
    for (let k = 0; k < 6 * this.nearCount; k += 6) {
      const size = Math.exp(-near[k]! / x) / x;
      const cos = Math.cos(near[k + 1]! / x);
      const sin = -Math.sin(near[k + 1]! / x);
      const rr = near[k + 2]! * cos - near[k + 3]! * sin;
      const ri = near[k + 2]! * sin + near[k + 3]! * cos;
      sum += size * (rr * near[k + 4]! - ri * near[k + 5]!);
    }
    return sum;
  }
}
