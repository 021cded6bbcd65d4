/**
 * @module Euler's transformation of an alternating series.
 *
 *   Σ_{n<N} (−1)^n b_n → Σ_{k<N} (−1)^k Δ^k b_0 / 2^{k+1}.
 * Purpose    geometric growth: an alternating series of radius of convergence R is summed out to x < 3R, and faster inside.
 *            Of no use for n! (twelve terms of the Euler series give −3040).
 * Bound      that of the field; the partial sums are returned, the last step tells the error.
 * Reference  L. Euler (1755); DLMF 3.9(ii) (from memory).
 */
import { Rational } from '../numerics/index.js';
import type { Field } from '../numerics/index.js';
import { differences } from './sums.js';

/** Partial sums of the transformed series of Σ a_n, a_n = (−1)^n b_n: entry k uses a_0 … a_k. */
export function eulerSums<T>(field: Field<T>, terms: readonly T[]): T[] {
  let row: T[] = terms.map((a, n) => (n % 2 === 0 ? a : field.neg(a)));
  const half = field.fromRational(Rational.of(1, 2));
  let weight = half;
  let sum = field.zero;
  return terms.map(() => {
    sum = field.add(sum, field.mul(weight, row[0]!));
    row = differences(field, row);
    weight = field.neg(field.mul(weight, half));
    return sum;
  });
}
