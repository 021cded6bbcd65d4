/** @module Rational powers of a power series that begins with 1. */
import { Rational } from '../../numerics/index.js';
import { integer } from '../../qcd/index.js';
import type { Ring } from '../../qcd/index.js';

/**
 * a^p for a_0 = 1 and any rational p, by n b_n = Σ_{k=1}^{n} (p k − (n − k)) a_k b_{n−k} (from b′ a = p a′ b); exact in the
 * ring. a_0 is taken as 1 without looking.
 */
export function rationalPower<T>(ring: Ring<T>, a: readonly T[], p: Rational, length: number): T[] {
  const out: T[] = length > 0 ? [ring.one] : [];
  for (let n = 1; n < length; n++) {
    let sum = ring.zero;
    for (let k = 1; k <= n; k++) {
      const weight = ring.fromRational(p.mul(Rational.of(k)).sub(Rational.of(n - k)));
      sum = ring.add(sum, ring.mul(ring.mul(weight, a[k] ?? ring.zero), out[n - k] ?? ring.zero));
    }
    out.push(ring.div(sum, integer(ring, n)));
  }
  return out;
}
