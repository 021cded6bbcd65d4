/** @module Taylor series of sin(πu)/π Σ w/(u − c), c integers: sin(πu)/(πu) times u Σ w/(u − c). */
import { Rational } from '../numerics/index.js';
import { addSeries, mulSeries } from '../qcd/index.js';
import { sinc } from './gamma-series.js';
import type { ConstantRing } from './gamma-series.js';
import type { Kernel } from './tower.js';

/** The first `length` coefficients of a kernel; without poles at u = 0 it starts at u^1. */
export function kernelSeries<T>(kernel: Kernel, ring: ConstantRing<T>, length: number): T[] {
  if (kernel.kind === 'plain') return Array.from({ length }, (_, n) => (n === 0 ? ring.one : ring.zero));
  let sum: T[] = Array.from({ length }, () => ring.zero);
  if (kernel.poles.length === 0 && length > 1) sum[1] = ring.one;
  for (const { at, weight } of kernel.poles) {
    // u/(u − c) = 1 for c = 0, −Σ_{n>=1} (u/c)^n otherwise.
    const own = Array.from({ length }, (_, n) => {
      if (at.isZero()) return ring.fromRational(n === 0 ? weight : Rational.ZERO);
      return ring.fromRational(n === 0 ? Rational.ZERO : weight.mul(at.pow(-n)).neg());
    });
    sum = addSeries(ring, sum, own, length);
  }
  return mulSeries(ring, sum, sinc(ring, length), length);
}
