/**
 * @module Change of scale as an operator on power series.
 *
 * Method     With da/d ln μ² = β(a) = −Σ b_k a^(k+2) and L = ln(μ′²/μ²):  a(μ′) = exp(L β ∂_a) a = Σ_k L^k f_k/k!,
 *            f_0 = a, f_k = β f_{k−1}′. A quantity with d ln m/d ln μ² = −Σ g_k a^(k+1) = −g(a) obeys
 *            m(μ′)/m(μ) = exp(L(β ∂_a − g)) 1. Every power of a receives finitely many terms, so the truncated result is
 *            exact to the order kept, for L a number or a symbol.
 * Bound      exact in the ring.
 */
import { Rational } from '../../numerics/index.js';
import type { Ring } from './ring.js';
import { addSeries, derivative, mulSeries, scaleSeries, truncate } from './truncated.js';

/** β(a) as a series: index = power. Not padded: zeros beyond the known loops would only be multiplied. */
function betaSeries<T>(ring: Ring<T>, b: readonly T[], length: number): T[] {
  return [ring.zero, ring.zero, ...b.map((x) => ring.sub(ring.zero, x))].slice(0, length);
}

/** Σ_k L^k f_k/k! for f_k = next(f_{k−1}), which must raise the lowest power at every step. */
function exponentiate<T>(ring: Ring<T>, start: readonly T[], log: T, length: number, next: (f: T[]) => T[]): T[] {
  let sum = truncate(ring, start, length);
  let f = sum;
  let weight = ring.one;
  for (let k = 1; k < length; k++) {
    f = next(f);
    weight = ring.mul(weight, ring.mul(log, ring.fromRational(Rational.of(1, k))));
    sum = addSeries(ring, sum, scaleSeries(ring, f, weight), length);
  }
  return sum;
}

/**
 * a(μ′) in powers of a(μ), coefficients 0 … length−1, L = ln(μ′²/μ²).
 * b_k beyond the array count as zero: give at least length − 2 of them for a result exact to that order.
 */
export function shiftCoupling<T>(ring: Ring<T>, b: readonly T[], log: T, length: number): T[] {
  const beta = betaSeries(ring, b, length);
  return exponentiate(ring, [ring.zero, ring.one], log, length, (f) =>
    mulSeries(ring, beta, derivative(ring, f), length),
  );
}

/** m(μ′)/m(μ) in powers of a(μ), coefficients 0 … length−1. */
export function shiftMass<T>(ring: Ring<T>, b: readonly T[], g: readonly T[], log: T, length: number): T[] {
  const beta = betaSeries(ring, b, length);
  const minusG = truncate(ring, [ring.zero, ...g.map((x) => ring.sub(ring.zero, x))], length);
  return exponentiate(ring, [ring.one], log, length, (f) =>
    addSeries(ring, mulSeries(ring, beta, derivative(ring, f), length), mulSeries(ring, minusG, f, length), length),
  );
}
