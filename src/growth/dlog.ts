/**
 * @module D-log Padé: position and exponent from the logarithmic derivative of the Borel transform.
 *
 * Purpose    a second opinion that does not use ratios.
 * Method     F = B′/B, d_k = [(k+1) b_{k+1} − Σ_{j<k} d_j b_{k−j}]/b_0; a pole of [L/M] of F is a singularity of B and
 *            minus its residue the exponent γ. Exact for a single power.
 * Bound      none; with 5 to 8 coefficients and other singularities about, positions are good to some 8 %, exponents to 0.4.
 * Reference  G. A. Baker, Phys. Rev. 124 (1961) 768.
 */
import { PadeDouble } from '../numerics/index.js';

export interface ComplexNumber {
  readonly re: number;
  readonly im: number;
}

export interface DlogPole {
  readonly position: ComplexNumber;
  readonly exponent: ComplexNumber;
}

/** An approximant with a smaller pivot than this, relative, sits in or near a block and is not used. */
const SINGULAR = 1e-11;

/** Taylor coefficients of B′/B. b_0 must not vanish. */
export function logDerivative(b: readonly number[]): number[] {
  const d: number[] = [];
  for (let k = 0; k + 1 < b.length; k++) {
    let s = (k + 1) * b[k + 1]!;
    for (let j = 0; j < k; j++) s -= d[j]! * b[k - j]!;
    d.push(s / b[0]!);
  }
  return d;
}

/** Poles of [L/M] of B′/B, nearest first; undefined when the approximant does not exist. Uses b_0 … b_{L+M+1}. */
export function dlogPoles(b: readonly number[], L: number, M: number): readonly DlogPole[] | undefined {
  const pade = new PadeDouble(L, M);
  if (!pade.fit(logDerivative(b.slice(0, L + M + 2))) || pade.pivotRatio < SINGULAR || !pade.findPoles())
    return undefined;
  // PadeDouble gives A of A/(1 − t/z); with F = −γ/(t − z) = (γ/z)/(1 − t/z) the exponent is γ = A z.
  return Array.from({ length: pade.poleCount }, (_, i) => {
    const position = { re: pade.poleRe[i]!, im: pade.poleIm[i]! };
    const [ar, ai] = [pade.amplitudeRe[i]!, pade.amplitudeIm[i]!];
    return {
      position,
      exponent: { re: ar * position.re - ai * position.im, im: ar * position.im + ai * position.re },
    };
  }).sort((a, c) => Math.hypot(a.position.re, a.position.im) - Math.hypot(c.position.re, c.position.im));
}
