/**
 * @module Truncated power series: coefficient arrays, ascending, over any ring. The index is the power.
 * Method  schoolbook products cut at the given length; composition by Horner's rule; reversion by Lagrange's rule
 *         [x^n] f^{-1} = (1/n) [x^(n−1)] (x/f)^n; exponential and logarithm by their differential equations.
 * Bound   exact in the ring.
 */
import { Rational } from '../../numerics/index.js';
import type { Ring } from './ring.js';

const at = <T>(ring: Ring<T>, a: readonly T[], k: number): T => a[k] ?? ring.zero;

export const integer = <T>(ring: Ring<T>, n: number): T => ring.fromRational(Rational.of(n));

/** The first `length` coefficients, padded with zeros. */
export function truncate<T>(ring: Ring<T>, a: readonly T[], length: number): T[] {
  return Array.from({ length }, (_, k) => at(ring, a, k));
}

export function addSeries<T>(ring: Ring<T>, a: readonly T[], b: readonly T[], length: number): T[] {
  return Array.from({ length }, (_, k) => ring.add(at(ring, a, k), at(ring, b, k)));
}

export function scaleSeries<T>(ring: Ring<T>, a: readonly T[], factor: T): T[] {
  return a.map((x) => ring.mul(x, factor));
}

export function mulSeries<T>(ring: Ring<T>, a: readonly T[], b: readonly T[], length: number): T[] {
  const out = Array.from({ length }, () => ring.zero);
  for (let i = 0; i < Math.min(a.length, length); i++) {
    for (let j = 0; j < Math.min(b.length, length - i); j++) {
      out[i + j] = ring.add(at(ring, out, i + j), ring.mul(at(ring, a, i), at(ring, b, j)));
    }
  }
  return out;
}

export function derivative<T>(ring: Ring<T>, a: readonly T[]): T[] {
  return a.slice(1).map((x, k) => ring.mul(x, integer(ring, k + 1)));
}

/** outer(inner(x)); inner must start at x^1. */
export function compose<T>(ring: Ring<T>, outer: readonly T[], inner: readonly T[], length: number): T[] {
  let out: T[] = [];
  for (let k = Math.min(outer.length, length) - 1; k >= 0; k--) {
    // k factors of the inner series are still to come, each at least x: higher terms would be cut.
    out = mulSeries(ring, out, inner, length - k);
    out[0] = ring.add(at(ring, out, 0), at(ring, outer, k));
  }
  return truncate(ring, out, length);
}

/** 1/a with a_0 invertible: b_n = −(1/a_0) Σ_{k≥1} a_k b_{n−k}. */
export function reciprocal<T>(ring: Ring<T>, a: readonly T[], length: number): T[] {
  const out: T[] = [];
  for (let n = 0; n < length; n++) {
    let sum = n === 0 ? ring.one : ring.zero;
    for (let k = 1; k <= n; k++) sum = ring.sub(sum, ring.mul(at(ring, a, k), at(ring, out, n - k)));
    out.push(ring.div(sum, at(ring, a, 0)));
  }
  return out;
}

/** The inverse function of f = f_1 x + f_2 x² + …, f_1 invertible. */
export function reversion<T>(ring: Ring<T>, f: readonly T[], length: number): T[] {
  const ratio = reciprocal(ring, truncate(ring, f.slice(1), length), length);
  const out = [ring.zero];
  let power = ratio;
  for (let n = 1; n < length; n++) {
    out.push(ring.div(at(ring, power, n - 1), integer(ring, n)));
    power = mulSeries(ring, power, ratio, length);
  }
  return out.slice(0, length);
}

/** exp(a) with a_0 = 0: n e_n = Σ_{k≥1} k a_k e_{n−k}. */
export function expSeries<T>(ring: Ring<T>, a: readonly T[], length: number): T[] {
  const out: T[] = length > 0 ? [ring.one] : [];
  for (let n = 1; n < length; n++) {
    let sum = ring.zero;
    for (let k = 1; k <= n; k++) {
      sum = ring.add(sum, ring.mul(ring.mul(integer(ring, k), at(ring, a, k)), at(ring, out, n - k)));
    }
    out.push(ring.div(sum, integer(ring, n)));
  }
  return out;
}

/** ln(a) with a_0 = 1: l_n = a_n − (1/n) Σ_{0<k<n} k l_k a_{n−k}. */
export function logSeries<T>(ring: Ring<T>, a: readonly T[], length: number): T[] {
  const out: T[] = length > 0 ? [ring.zero] : [];
  for (let n = 1; n < length; n++) {
    let sum = ring.zero;
    for (let k = 1; k < n; k++) {
      sum = ring.add(sum, ring.mul(ring.mul(integer(ring, k), at(ring, out, k)), at(ring, a, n - k)));
    }
    out.push(ring.sub(at(ring, a, n), ring.div(sum, integer(ring, n))));
  }
  return out;
}

/** Non-negative integer power. */
export function powSeries<T>(ring: Ring<T>, a: readonly T[], n: number, length: number): T[] {
  let out = truncate(ring, [ring.one], length);
  for (let k = 0; k < n; k++) out = mulSeries(ring, out, a, length);
  return out;
}
