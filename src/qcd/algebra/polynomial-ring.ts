/** @module Polynomials in one symbol over a ring, as a ring: a logarithm that stays a symbol while series are composed. */
import type { Ring } from './ring.js';

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
