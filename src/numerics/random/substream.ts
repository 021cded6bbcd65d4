/**
 * @module Normal deviates and uniform numbers of replica i: a substream of its own for each i.
 *
 * Method     counter (i low word, i high word, k, purpose); the k-th block gives two uniform numbers u, v of 53 bits, strictly
 *            inside (0, 1), and these √(−2 ln u) cos 2πv and √(−2 ln u) sin 2πv (Box–Muller). Nothing is carried from one
 *            replica to the next, and normal deviates and uniform numbers never share a counter.
 * Bound      deviates reach 8.6 standard deviations (u is not below 2^-54); otherwise the rounding of doubles.
 * Reference  G. E. P. Box, M. E. Muller, Ann. Math. Stat. 29 (1958) 610; the counters: see philox.ts.
 */
import { Philox } from './philox.js';

const NORMAL = 0;
const UNIFORM = 1;
const SCALE = 2 ** -53;

/** A uniform number of 53 bits inside (0, 1) from two words. */
const unit = (a: number, b: number): number => ((a >>> 5) * 2 ** 26 + (b >>> 6) + 0.5) * SCALE;

/** The substreams of one seed. */
export class Substreams {
  private readonly philox: Philox;

  constructor(seed: number) {
    this.philox = Philox.ofSeed(seed);
  }

  /** Fills `out` with independent standard normal deviates of replica `index` (an integer from 0 below 2^53). */
  normals(index: number, out: Float64Array): void {
    const { words } = this.philox;
    const low = index % 2 ** 32;
    const high = Math.floor(index / 2 ** 32);
    for (let k = 0; 2 * k < out.length; k++) {
      this.philox.block(low, high, k, NORMAL);
      const radius = Math.sqrt(-2 * Math.log(unit(words[0]!, words[1]!)));
      const angle = 2 * Math.PI * unit(words[2]!, words[3]!);
      out[2 * k] = radius * Math.cos(angle);
      if (2 * k + 1 < out.length) out[2 * k + 1] = radius * Math.sin(angle);
    }
  }

  /** A uniform number in (0, 1) of replica `index`; `slot` counts the uses. */
  uniform(index: number, slot = 0): number {
    this.philox.block(index % 2 ** 32, Math.floor(index / 2 ** 32), slot, UNIFORM);
    return unit(this.philox.words[0]!, this.philox.words[1]!);
  }
}
