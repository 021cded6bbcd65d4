/**
 * @module D-log Padé: position and exponent from the logarithmic derivative of the Borel transform.
 *
 * Purpose    a second opinion that does not use ratios.
 * Method     F = B′/B, d_k = [(k+1) b_{k+1} − Σ_{j<k} d_j b_{k−j}]/b_0; a pole of [L/M] of F is a singularity of B and
 *            minus its residue the exponent γ. Exact for a single power.
 * Bound      none; with 5 to 8 coefficients and other singularities about, positions are good to some 8 %, exponents to 0.4.
 * Reference  G. A. Baker, Phys. Rev. 124 (1961) 768.
 */
import { divideComplex, evaluate, smallPade, smallRoots, type ComplexNumber } from './small-pade.js';

export interface DlogPole {
  readonly position: ComplexNumber;
  readonly exponent: ComplexNumber;
}

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
export function dlogPoles(b: readonly number[], l: number, m: number): readonly DlogPole[] | undefined {
  const pade = smallPade(logDerivative(b.slice(0, l + m + 2)), l, m);
  if (pade === undefined) return undefined;
  const derivative = pade.denominator.slice(1).map((v, i) => v * (i + 1));
  return smallRoots(pade.denominator)
    .map((position) => {
      const residue = divideComplex(evaluate(pade.numerator, position), evaluate(derivative, position));
      return { position, exponent: { re: -residue.re, im: -residue.im } };
    })
    .sort((a, c) => Math.hypot(a.position.re, a.position.im) - Math.hypot(c.position.re, c.position.im));
}
