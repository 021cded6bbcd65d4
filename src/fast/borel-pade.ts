/**
 * @module Borel–Padé and Borel–Leroy–Padé in doubles: poles once for a coefficient list, principal values in closed form.
 *
 *   F = Σ_k a_k (1+b)_k x^k + Σ_i A_i J(−z_i/x),   J(W) = W G_b(W) off the positive axis, w F_b(w), w = z/x, on it,
 * a conjugate pair counting twice with its real part. Above a pair next to the axis the contour is lifted:
 * + Re 2πi A w^{1+b} e^{−w}/Γ(1+b), unless the terms confirm the pair. Formulas and rules: borel/laplace.ts, rational-sum.ts.
 * Where poles nearly coincide, so that their amplitudes cancel, the sum runs along a ray instead (rational-ray.ts).
 * Bound      1e-12 or so of the largest part.
 */
import { NEAR_AXIS_ANGLE } from '../borel/index.js';
import {
  branchAlternatingDouble,
  branchCutDouble,
  branchSameDouble,
  rgammaDouble,
  scaledE1Double,
} from '../numerics/index.js';
import type { Kernel } from './kernel.js';
import { Approximant } from './poles.js';
import type { PoleRules } from './poles.js';
import { RationalOnRay } from './rational-ray.js';

export interface BorelPadeSetting extends PoleRules {
  readonly kind: 'borel-pade' | 'borel-leroy-pade';
  readonly L: number;
  readonly M: number;
  /** Leroy parameter; 0: plain Borel. */
  readonly b: number;
  /** Pass above pairs next to the positive axis. */
  readonly lift: boolean;
  /** Central value of x. */
  readonly x: number;
}

/** Poles nearer to each other, relatively, cancel: four digits are lost in closed form. Heuristic. */
const CROWDED = 1e-2;

export function borelPadeKernel({ L, M, b, lift, x: X, ...rules }: BorelPadeSetting): Kernel {
  const fitted = new Approximant(L, M, rules);
  const { pade, counts } = fitted;
  const transformed = new Float64Array(L + M + 1);
  const rising = new Float64Array(L + M + 1).fill(1); // (1+b)_n
  for (let n = 1; n < rising.length; n++) rising[n] = rising[n - 1]! * (b + n);
  const onePlus = 1 + b;
  const normalisation = rgammaDouble(onePlus);
  const isLifted = (arg: number): boolean => lift && arg < NEAR_AXIS_ANGLE;
  let onRay: RationalOnRay | undefined;
  let crowded = false;

  /** t^b/Γ(1+b). */
  const weight = (re: number, im: number, out: Float64Array): void => {
    const size = normalisation * Math.exp(b * Math.log(Math.hypot(re, im)));
    const turn = b * Math.atan2(im, re);
    out[0] = size * Math.cos(turn);
    out[1] = size * Math.sin(turn);
  };

  const real = (i: number, x: number): number => {
    const w = pade.poleRe[i]! / x;
    return pade.amplitudeRe[i]! * w * (w > 0 ? branchSameDouble(b, w).pv : -branchAlternatingDouble(b, -w));
  };
  const pair = (i: number, x: number, lifted: boolean): number => {
    const re = pade.poleRe[i]! / x;
    const im = pade.poleIm[i]! / x;
    const ar = pade.amplitudeRe[i]!;
    const ai = pade.amplitudeIm[i]!;
    const g = b === 0 ? scaledE1Double(-re, -im) : branchCutDouble(b, -re, -im);
    const jr = im * g.im - re * g.re;
    const ji = -re * g.im - im * g.re;
    const straight = 2 * (ar * jr - ai * ji);
    if (!lifted) return straight;
    const size = 2 * Math.PI * normalisation * Math.exp(onePlus * Math.log(Math.hypot(re, im)) - re);
    const turn = onePlus * Math.atan2(im, re) - im;
    return straight - size * (ar * Math.sin(turn) + ai * Math.cos(turn));
  };
  const pole = (i: number, x: number): number => {
    const im = pade.poleIm[i]!;
    return im === 0 ? real(i, x) : im < 0 ? 0 : pair(i, x, isLifted(Math.atan2(im, pade.poleRe[i]!)));
  };

  return {
    prepare(c) {
      if (c.length < transformed.length) return false;
      for (let n = 0; n < transformed.length; n++) transformed[n] = c[n]! / rising[n]!;
      if (!fitted.fit(transformed)) return false;
      crowded = fitted.closest < CROWDED;
      if (crowded) {
        onRay ??= new RationalOnRay(fitted, weight, X);
        onRay.prepare(isLifted);
      }
      return true;
    },
    value(x) {
      let sum = 0;
      if (crowded && onRay !== undefined) {
        sum = onRay.value(x) * x ** -b;
        // The ray knows nothing of poles that have no say.
        for (let i = 0; i < pade.poleCount; i++) if (counts[i] === 0) sum -= pole(i, x);
        return sum;
      }
      let power = 1;
      for (let k = 0; k < pade.polynomialLength; k++) {
        sum += pade.polynomial[k]! * rising[k]! * power;
        power *= x;
      }
      for (let i = 0; i < pade.poleCount; i++) if (counts[i] === 1) sum += pole(i, x);
      return sum;
    },
  };
}
