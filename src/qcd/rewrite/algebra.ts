/** @module Products and powers of coefficient lists, exact: what a change of mass or of a prefactor needs. */
import type { Exact } from '../../numerics/index.js';
import { liftExact } from '../algebra/ring.js';
import { mulSeries, powSeries, reciprocal } from '../algebra/truncated.js';

/** Σ a_n x^n · Σ b_n x^n to the length of the shorter list. */
export function multiplyCoefficients(a: readonly Exact[], b: readonly Exact[]): Exact[] {
  const n = Math.min(a.length, b.length);
  return liftExact([...a.slice(0, n), ...b.slice(0, n)], (ring, x) => mulSeries(ring, x.slice(0, n), x.slice(n), n));
}

/** (Σ a_n x^n)^power for an integer power; a_0 must not be zero when it is negative. */
export function powerOfCoefficients(a: readonly Exact[], power: number): Exact[] {
  return liftExact(a, (ring, x) => {
    const base = power < 0 ? reciprocal(ring, x, x.length) : x;
    return powSeries(ring, base, Math.abs(power), x.length);
  });
}
