/**
 * @module Conformally mapped Borel transform in doubles: linear in the coefficients, summed along a ray.
 *
 *   B = (1+w)^{−2γ₁} (1−w)^{−2γ₂} Σ d_n w^n  or  (1+t/a)^{−γ₁} (1−t/b)^{−γ₂} Σ d_n w^n  or  Σ d_n w^n,   d = D c,
 * with the matrix D of the re-expansion made beforehand in enclosures; the integrals of w^n are tabled. Formulas: borel/conformal.ts; the ray: ray-sum.ts.
 */
import type { Kernel } from './kernel.js';
import { RaySum } from './ray-sum.js';
import { TabledSums } from './tabled.js';

export interface ConformalSetting {
  readonly kind: 'borel-conformal';
  /** D: d_n = Σ_k rows[n][k] c_k. */
  readonly rows: readonly (readonly number[])[];
  readonly softening: 'none' | 'in w' | 'in t';
  /** 1/a and 1/b, zero for an absent cut, and the exponents. */
  readonly left: { readonly inverse: number; readonly exponent: number };
  readonly right: { readonly inverse: number; readonly exponent: number };
  /** Central value of x. */
  readonly x: number;
}

/** Square root with positive real part. */
function root(re: number, im: number): { re: number; im: number } {
  const size = Math.hypot(re, im);
  const a = Math.sqrt((size + Math.abs(re)) / 2);
  if (re >= 0) return { re: a, im: a === 0 ? 0 : im / (2 * a) };
  return { re: Math.abs(im) / (2 * a), im: im < 0 ? -a : a };
}

export function conformalKernel({ rows, softening, left, right, x: X }: ConformalSetting): Kernel {
  const N = rows.length;
  const ray = new RaySum(X);
  const d = new Float64Array(N);
  const wRe = new Float64Array(ray.count);
  const wIm = new Float64Array(ray.count);
  const factorRe = new Float64Array(ray.count);
  const factorIm = new Float64Array(ray.count);
  for (let j = 0; j < ray.count; j++) {
    const [x, y] = [ray.re[j]!, ray.im[j]!];
    const l = root(1 + x * left.inverse, y * left.inverse);
    const r = root(1 - x * right.inverse, -y * right.inverse);
    const sr = l.re + r.re;
    const si = l.im + r.im;
    const norm = sr * sr + si * si;
    const dr = l.re - r.re;
    const di = l.im - r.im;
    wRe[j] = (dr * sr + di * si) / norm;
    wIm[j] = (di * sr - dr * si) / norm;
    // log of the factor: −2γ₁ log left − 2γ₂ log right, in w with (sum/2)^{2γ₁+2γ₂} as well.
    let log = 0;
    let turn = 0;
    if (softening !== 'none') {
      log = -2 * (left.exponent * Math.log(Math.hypot(l.re, l.im)) + right.exponent * Math.log(Math.hypot(r.re, r.im)));
      turn = -2 * (left.exponent * Math.atan2(l.im, l.re) + right.exponent * Math.atan2(r.im, r.re));
    }
    if (softening === 'in w') {
      const both = 2 * (left.exponent + right.exponent);
      log += both * Math.log(Math.hypot(sr, si) / 2);
      turn += both * Math.atan2(si, sr);
    }
    factorRe[j] = Math.exp(log) * Math.cos(turn);
    factorIm[j] = Math.exp(log) * Math.sin(turn);
  }
  const sumFor = (coefficients: ArrayLike<number>): void => {
    for (let j = 0; j < ray.count; j++) {
      const [x, y] = [wRe[j]!, wIm[j]!];
      let re = 0;
      let im = 0;
      for (let n = N - 1; n >= 0; n--) {
        const t = re * x - im * y + coefficients[n]!;
        im = re * y + im * x;
        re = t;
      }
      ray.set(j, re * factorRe[j]! - im * factorIm[j]!, re * factorIm[j]! + im * factorRe[j]!);
    }
  };
  // The integrals of w^n, one after the other, are the functions; the d_n their weights.
  const integrals = Array.from({ length: N }, (_, n) => {
    sumFor(Float64Array.from({ length: N }, (_d, k) => (k === n ? 1 : 0)));
    return ray.snapshot();
  });
  const sums = new TabledSums(
    N,
    (x, out) => {
      for (let n = 0; n < N; n++) out[n] = integrals[n]!(x);
    },
    X,
  );
  return {
    prepare(c) {
      if (c.length < N) return false;
      for (let n = 0; n < N; n++) {
        let sum = 0;
        const row = rows[n]!;
        for (let k = 0; k <= n; k++) sum += row[k]! * c[k]!;
        d[n] = sum;
      }
      sums.contract(d);
      return true;
    },
    value(x) {
      const tabled = sums.at(x);
      if (!Number.isNaN(tabled)) return tabled;
      let sum = 0;
      for (let n = 0; n < N; n++) sum += d[n]! * integrals[n]!(x);
      return sum;
    },
  };
}
