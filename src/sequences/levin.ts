/**
 * @module Levin's transformations t, u, d, v and Weniger's δ, by one recursion for numerator and denominator.
 *
 * Purpose    accelerates, or sums, a series whose remainder is ω_n times a slowly varying function of n.
 * Method     L_k = N_k/D_k, both from X_0^{(n)} = s_n/ω_n (numerator) and 1/ω_n (denominator) by
 *              X_{k+1}^{(n)} = X_k^{(n+1)} − f(n, k) X_k^{(n)},
 *              Levin:  f = (β+n)(β+n+k)^{k−1}/(β+n+k+1)^k                      (1/(β+n)-series for the remainder),
 *              δ:      f = (β+n+k)(β+n+k−1)/((β+n+2k)(β+n+2k−1)), f(n, 0) = 1  (factorial series), β = 1.
 *            Remainder estimates from the terms a_n: t: a_n; u: (β+n) a_n; d and δ: a_{n+1};
 *            v: a_n a_{n+1}/(a_n − a_{n+1}).
 * Bound      that of the field. Numerator and denominator cancel about one digit an order: balls lose it visibly,
 *            doubles silently; twelve terms are what doubles bear.
 * Reference  D. Levin, Int. J. Comput. Math. B 3 (1973) 371; E. J. Weniger, Comput. Phys. Rep. 10 (1989) 189,
 *            arXiv:math/0306302, sections 7 and 8 (from memory; the recursion equals the explicit ratio of sums).
 */
import { Rational } from '../numerics/index.js';
import type { Field } from '../numerics/index.js';
import { sumsOf } from './sums.js';

export type LevinVariant = 't' | 'u' | 'd' | 'v';

/** f(n, k) with β = 1. */
type Factor = (n: number, k: number) => Rational;

const levinFactor: Factor = (n, k) =>
  k === 0
    ? Rational.ONE
    : Rational.of(BigInt(n + 1) * BigInt(n + k + 1) ** BigInt(k - 1), BigInt(n + k + 2) ** BigInt(k));

const wenigerFactor: Factor = (n, k) =>
  k === 0 ? Rational.ONE : Rational.of((n + k + 1) * (n + k), (n + 2 * k + 1) * (n + 2 * k));

/** L_0 … L_K, all from s_0 on; K + 1 remainder estimates are used. */
function diagonal<T>(field: Field<T>, sums: readonly T[], omegas: readonly T[], factor: Factor): T[] {
  let numerator = omegas.map((w, n) => field.div(sums[n]!, w));
  let denominator = omegas.map((w) => field.div(field.one, w));
  const result: T[] = [];
  for (let k = 0; numerator.length > 0; k++) {
    result.push(field.div(numerator[0]!, denominator[0]!));
    const weights = numerator.slice(1).map((_, n) => field.fromRational(factor(n, k)));
    const step = (x: readonly T[]): T[] => weights.map((f, n) => field.sub(x[n + 1]!, field.mul(f, x[n]!)));
    numerator = step(numerator);
    denominator = step(denominator);
  }
  return result;
}

function remainderEstimates<T>(field: Field<T>, a: readonly T[], variant: LevinVariant): T[] {
  switch (variant) {
    case 't':
      return [...a];
    case 'u':
      return a.map((term, n) => field.mul(field.fromRational(Rational.of(n + 1)), term));
    case 'd':
      return a.slice(1);
    case 'v':
      return a.slice(1).map((next, n) => field.div(field.mul(a[n]!, next), field.sub(a[n]!, next)));
  }
}

/**
 * Levin transforms of orders 0, 1, … of Σ a_n: the last entry uses every term.
 * A zero term has no remainder estimate: entries that meet one are INDETERMINATE (or NaN).
 * The u transform is exact when s_n = s + (β+n) a_n Σ_{j<k} c_j/(β+n)^j, and so on for the others.
 */
export function levinDiagonal<T>(field: Field<T>, terms: readonly T[], variant: LevinVariant): T[] {
  return diagonal(field, sumsOf(field, terms), remainderEstimates(field, terms, variant), levinFactor);
}

/** Weniger's δ transforms of orders 0, 1, …; the last uses every term (the last one as remainder estimate only). */
export function wenigerDiagonal<T>(field: Field<T>, terms: readonly T[]): T[] {
  return diagonal(field, sumsOf(field, terms), terms.slice(1), wenigerFactor);
}
