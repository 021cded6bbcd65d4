/**
 * @module Numbers with their derivatives: forward differentiation of any ring formula, in doubles.
 * Purpose  linear propagation of the errors of coefficients through products, powers and compositions of series.
 * Method   a + Σ a_k ε_k with ε_j ε_k = 0; an empty list of derivatives means that all of them vanish.
 * Bound    rounding; the propagation itself is linear in the errors.
 */
import type { Ring } from '../../qcd/index.js';

export interface Dual {
  readonly value: number;
  readonly slopes: readonly number[];
}

const constant = (value: number): Dual => ({ value, slopes: [] });

/** p·a + q·b for lists of derivatives. */
function combination(p: number, a: readonly number[], q: number, b: readonly number[]): readonly number[] {
  if (a.length === 0 && b.length === 0) return a;
  const length = Math.max(a.length, b.length);
  // 0·∞ must not spoil the derivatives that are there.
  const part = (factor: number, slope: number): number => (slope === 0 ? 0 : factor * slope);
  return Array.from({ length }, (_, k) => part(p, a[k] ?? 0) + part(q, b[k] ?? 0));
}

export const dualRing: Ring<Dual> = {
  zero: constant(0),
  one: constant(1),
  fromRational: (q) => constant(q.toNumber()),
  add: (a, b) => ({ value: a.value + b.value, slopes: combination(1, a.slopes, 1, b.slopes) }),
  sub: (a, b) => ({ value: a.value - b.value, slopes: combination(1, a.slopes, -1, b.slopes) }),
  mul: (a, b) => ({ value: a.value * b.value, slopes: combination(b.value, a.slopes, a.value, b.slopes) }),
  div: (a, b) => ({
    value: a.value / b.value,
    slopes: combination(1 / b.value, a.slopes, -a.value / (b.value * b.value), b.slopes),
  }),
};
