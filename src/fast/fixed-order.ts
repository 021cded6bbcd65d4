/** @module Fixed order in doubles: Σ_{n < terms} c_n x^n. */
import type { Kernel } from './kernel.js';
import { partialSum } from './kernel.js';

export interface FixedOrderSetting {
  readonly kind: 'fixed-order';
  readonly terms: number;
}

export function fixedOrderKernel({ terms }: FixedOrderSetting): Kernel {
  let c: Float64Array = new Float64Array(terms);
  return {
    prepare(coefficients) {
      c = coefficients;
      return coefficients.length >= terms;
    },
    value: (x) => partialSum(c, terms, x),
  };
}
