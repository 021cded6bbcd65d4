/**
 * @module Contour improved in doubles: linear in the coefficients of D, with the integrals around the circle tabled.
 *
 *   F(x) x^power = Σ_n c_n A_n(x),   A_n = (1/2πi) ∮ ds/s W x(−s)^(n+p),  the c_n those of D, not of the fixed-order expansion.
 * The integrals are those of contour/double.ts, each as a table over x; outside of it there is no value.
 */
import { MapReader } from '../numerics/index.js';
import type { ChebyshevMap } from '../numerics/index.js';
import type { Kernel } from './kernel.js';

export interface ContourImprovedSetting {
  readonly kind: 'contour-improved';
  /** A_n(x), n = 0, 1, …, in units of x^power. */
  readonly integrals: readonly ChebyshevMap[];
}

export function contourImprovedKernel({ integrals }: ContourImprovedSetting): Kernel {
  const readers = integrals.map((map) => new MapReader(map));
  let c: Float64Array = new Float64Array(integrals.length);
  return {
    prepare(coefficients) {
      c = coefficients;
      return coefficients.length >= readers.length;
    },
    value(x) {
      let sum = 0;
      for (let n = 0; n < readers.length; n++) sum += c[n]! * readers[n]!.at(x);
      return sum;
    },
  };
}
