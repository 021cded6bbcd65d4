/**
 * @module What is to be thought of the poles of a replica's approximant, by the rules of borel/approximant.ts in doubles.
 *
 * A pole whose amplitude is at the level of the coefficients' noise and that has a zero next to it is a noise doublet: it has no
 * say, and Borel–Padé sums leave it out. Any other pole nearer to the origin than `innermost` makes the approximant one not to be
 * believed.
 */
import { DOUBLET_DISTANCE, NOISE_FACTOR } from '../borel/index.js';
import { DoubleRoots, PadeDouble } from '../numerics/index.js';
import { LEAST_PIVOT } from './pade.js';

export interface PoleRules {
  /** Poles nearer to the origin are refused; 0: none is. */
  readonly innermost: number;
  /** Relative noise of the coefficients, 0 when exact. */
  readonly noise: number;
}

/** [L/M] of a transformed coefficient list with its poles; real ones once, of a pair the upper member. */
export class Approximant {
  readonly pade: PadeDouble;
  /** 1 for the poles that count: upper member or real, and no noise doublet. */
  readonly counts: Uint8Array;
  /** Smallest distance of two poles, over their distance from the origin; of the last fit. */
  closest = Infinity;
  private readonly zeros: DoubleRoots;
  private readonly rules: PoleRules;

  constructor(L: number, M: number, rules: PoleRules) {
    this.pade = new PadeDouble(L, M);
    this.zeros = new DoubleRoots(L);
    this.counts = new Uint8Array(M);
    this.rules = rules;
  }

  /** Fits b_0 … b_{L+M}; false when the entry does not exist, or is not to be believed. */
  fit(b: Float64Array): boolean {
    const { pade, counts } = this;
    const { noise, innermost } = this.rules;
    if (!pade.fit(b) || !(pade.pivotRatio > LEAST_PIVOT) || !pade.findPoles()) return false;
    const faint = noise > 0 ? NOISE_FACTOR * noise * largest(b, pade.L + pade.M + 1) : 0;
    let zeros: boolean | undefined;
    for (let i = 0; i < pade.poleCount; i++) {
      counts[i] = pade.poleIm[i]! >= 0 ? 1 : 0;
      if (counts[i] === 0) continue;
      if (Math.hypot(pade.amplitudeRe[i]!, pade.amplitudeIm[i]!) <= faint) {
        zeros ??= this.zeros.find(pade.numerator, pade.L);
        if (zeros && this.isPaired(i)) counts[i] = 0;
      }
      const modulus = Math.hypot(pade.poleRe[i]!, pade.poleIm[i]!);
      if (counts[i] === 1 && modulus < innermost) return false;
    }
    this.closest = this.smallestGap();
    return true;
  }

  private isPaired(i: number): boolean {
    const x = this.pade.poleRe[i]!;
    const y = this.pade.poleIm[i]!;
    const reach = DOUBLET_DISTANCE * Math.hypot(x, y);
    for (let k = 0; k < this.zeros.count; k++)
      if (Math.hypot(this.zeros.re[k]! - x, this.zeros.im[k]! - y) < reach) return true;
    return false;
  }

  private smallestGap(): number {
    const { poleRe, poleIm, poleCount } = this.pade;
    let least = Infinity;
    for (let i = 1; i < poleCount; i++) {
      for (let k = 0; k < i; k++) {
        const gap = Math.hypot(poleRe[k]! - poleRe[i]!, poleIm[k]! - poleIm[i]!);
        least = Math.min(least, gap / Math.hypot(poleRe[i]!, poleIm[i]!));
      }
    }
    return least;
  }
}

function largest(b: Float64Array, count: number): number {
  let most = 0;
  for (let n = 0; n < count; n++) most = Math.max(most, Math.abs(b[n]!));
  return most;
}
