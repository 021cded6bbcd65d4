/**
 * @module Least term with terminant in doubles, the cut of the central values kept.
 *
 *   Σ_{k<n} c_k x^k + c_n x^n · ω F_{n+γ−1}(ω)  (t* > 0, principal value)  or  ω G_{n+γ−1}(ω)  (t* < 0),  ω = |t*|/x.
 * Bound and reference: branch-double.ts; prescriptions/terminant.ts.
 */
import { branchAlternatingDouble, branchSameDouble } from '../numerics/index.js';
import type { Kernel } from './kernel.js';
import { partialSum } from './kernel.js';

export interface TerminantSetting {
  readonly kind: 'terminant';
  /** Terms before the terminant; the next one scales it. */
  readonly terms: number;
  readonly t: number;
  readonly exponent: number;
}

export function terminantKernel({ terms, t, exponent }: TerminantSetting): Kernel {
  let c: Float64Array = new Float64Array(terms + 1);
  const b = terms + exponent - 1;
  return {
    prepare(coefficients) {
      c = coefficients;
      return coefficients.length > terms;
    },
    value(x) {
      const w = Math.abs(t) / x;
      const factor = w * (t > 0 ? branchSameDouble(b, w).pv : branchAlternatingDouble(b, w));
      return partialSum(c, terms, x) + c[terms]! * x ** terms * factor;
    },
  };
}
