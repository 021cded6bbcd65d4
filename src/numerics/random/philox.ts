/**
 * @module Philox 4×32-10: random bits as a function of a key and a counter, without a state.
 *
 * Purpose    replicas: the numbers of replica i depend on the seed and on i alone, so that any split of the work among
 *            threads or shards gives the same numbers.
 * Method     ten rounds of a bijection of 128 bits: two 32 × 32 → 64 bit products, keys raised by the Weyl constants between
 *            rounds.
 * Bound      period 2^128 for each of the 2^64 keys; passes the published batteries (BigCrush).
 * Reference  J. K. Salmon, M. A. Moraes, R. O. Dror, D. E. Shaw, "Parallel random numbers: as easy as 1, 2, 3", Proc. SC'11
 *            (2011), doi:10.1145/2063384.2063405: constants and round function (memory; the known-answer vectors agree).
 */

const M0 = 0xd2511f53;
const M1 = 0xcd9e8d57;
/** Golden ratio and √3 − 1, times 2^32. */
const W0 = 0x9e3779b9;
const W1 = 0xbb67ae85;
const ROUNDS = 10;

/** High word of the 64-bit product of two unsigned words, by halves: no intermediate reaches 2^32. */
function highWord(a: number, b: number): number {
  const al = a & 0xffff;
  const ah = a >>> 16;
  const bl = b & 0xffff;
  const bh = b >>> 16;
  const middle = ah * bl + ((al * bl) >>> 16);
  const other = al * bh + (middle & 0xffff);
  return ah * bh + (middle >>> 16) + (other >>> 16);
}

/** Largest seed: the integers that a double holds exactly. */
export const LARGEST_SEED = Number.MAX_SAFE_INTEGER;

/** The block of four 32-bit words at a counter. */
export class Philox {
  /** Words of the last `block`. */
  readonly words = new Uint32Array(4);
  private readonly k0: number;
  private readonly k1: number;

  /** @param low, high the words of the key */
  constructor(low: number, high: number) {
    this.k0 = low >>> 0;
    this.k1 = high >>> 0;
  }

  /** The generator of a seed, an integer from 0 to LARGEST_SEED: its low and high words are the key. */
  static ofSeed(seed: number): Philox {
    if (!Number.isSafeInteger(seed) || seed < 0)
      throw new RangeError(`seed ${seed} is not an integer from 0 to 2^53 - 1`);
    return new Philox(seed % 2 ** 32, Math.floor(seed / 2 ** 32));
  }

  /** Fills `words` from the counter (c0, c1, c2, c3), unsigned words. */
  block(c0: number, c1: number, c2: number, c3: number): void {
    let [k0, k1] = [this.k0, this.k1];
    for (let round = 0; round < ROUNDS; round++) {
      const high0 = highWord(M0, c0);
      const low0 = Math.imul(M0, c0);
      const high1 = highWord(M1, c2);
      const low1 = Math.imul(M1, c2);
      c0 = (high1 ^ c1 ^ k0) >>> 0;
      c1 = low1 >>> 0;
      c2 = (high0 ^ c3 ^ k1) >>> 0;
      c3 = low0 >>> 0;
      k0 = (k0 + W0) >>> 0;
      k1 = (k1 + W1) >>> 0;
    }
    this.words[0] = c0;
    this.words[1] = c1;
    this.words[2] = c2;
    this.words[3] = c3;
  }
}
