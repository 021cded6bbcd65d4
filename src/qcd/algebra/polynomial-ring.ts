/** @module Polynomials in one symbol over a ring, as a ring: a logarithm that stays a symbol while series are composed. */
import type { Ring } from './ring.js';
import { addSeries, mulSeries, scaleSeries, truncate } from './truncated.js';

/** Ascending coefficients; missing ones are zero. */
export type PolynomialOver<T> = readonly T[];

/** The ring of polynomials over `ring`. Division only by constants (polynomials of degree 0). */
export function polynomialRing<T>(ring: Ring<T>): Ring<PolynomialOver<T>> {
  const at = (a: PolynomialOver<T>, k: number): T => a[k] ?? ring.zero;
  const zip = (a: PolynomialOver<T>, b: PolynomialOver<T>, f: (x: T, y: T) => T): T[] =>
    Array.from({ length: Math.max(a.length, b.length) }, (_, k) => f(at(a, k), at(b, k)));
  return {
    zero: [],
    one: [ring.one],
    fromRational: (q) => [ring.fromRational(q)],
    add: (a, b) => (a.length === 0 ? b : b.length === 0 ? a : zip(a, b, (x, y) => ring.add(x, y))),
    sub: (a, b) => (b.length === 0 ? a : zip(a, b, (x, y) => ring.sub(x, y))),
    mul(a, b) {
      if (a.length === 0 || b.length === 0) return [];
      const out = Array.from({ length: a.length + b.length - 1 }, () => ring.zero);
      a.forEach((x, i) => {
        b.forEach((y, j) => {
          out[i + j] = ring.add(at(out, i + j), ring.mul(x, y));
        });
      });
      return out;
    },
    div: (a, b) => a.map((x) => ring.div(x, at(b, 0))),
  };
}

/**
 * A series whose coefficients are polynomials in a symbol, with a series put for the symbol:
 * Σ_k a^k Σ_j c_kj v(a)^j, coefficients 0 … length−1.
 */
export function substituteSymbol<T>(
  base: Ring<T>,
  series: readonly PolynomialOver<T>[],
  value: readonly PolynomialOver<T>[],
  length: number,
): PolynomialOver<T>[] {
  const ring = polynomialRing(base);
  let sum = truncate(ring, [], length);
  series.slice(0, length).forEach((coefficient, k) => {
    let power = truncate(ring, [ring.one], length - k);
    for (const part of coefficient) {
      const shifted = [...truncate(ring, [], k), ...scaleSeries(ring, power, [part])];
      sum = addSeries(ring, sum, shifted, length);
      power = mulSeries(ring, power, value, length - k);
    }
  });
  return sum;
}

/**
 * The symbol in terms of another one, s = s′ + δ(a, s) with δ of order a: a series in a with coefficients in s′.
 * Each round of the iteration fixes one more power of a.
 */
export function solveSymbol<T>(
  base: Ring<T>,
  delta: readonly PolynomialOver<T>[],
  length: number,
): PolynomialOver<T>[] {
  const ring = polynomialRing(base);
  const symbol: PolynomialOver<T> = [base.zero, base.one];
  let value = truncate(ring, [symbol], length);
  for (let k = 0; k < length; k++) {
    value = addSeries(ring, [symbol], substituteSymbol(base, delta, value, length), length);
  }
  return value;
}

/** The polynomial at a value of the symbol. */
export function evaluatePolynomial<T>(ring: Ring<T>, a: PolynomialOver<T>, x: T): T {
  let sum = ring.zero;
  for (let k = a.length - 1; k >= 0; k--) sum = ring.add(ring.mul(sum, x), a[k] ?? ring.zero);
  return sum;
}
