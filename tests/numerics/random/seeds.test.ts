/** A seed is the key of the generator: all of its 53 bits count. */
import { describe, expect, test } from 'vitest';
import { LARGEST_SEED, Philox, Substreams } from '../../../src/numerics/index.js';

const block = (p: Philox): number[] => {
  p.block(1, 2, 3, 4);
  return Array.from(p.words);
};

describe('seeds', () => {
  test.each([
    [0, 0, 0],
    [5, 5, 0],
    [2 ** 32 - 1, 0xffffffff, 0],
    [2 ** 32, 0, 1],
    [2 ** 32 + 7, 7, 1],
    [LARGEST_SEED, 0xffffffff, 2 ** 21 - 1],
  ])('%i has the words %i and %i', (seed, low, high) => {
    expect(block(Philox.ofSeed(seed))).toEqual(block(new Philox(low, high)));
  });

  test('different seeds, replicas and slots give different numbers', () => {
    const seen = new Set<number>();
    for (const seed of [0, 1, 2, 2 ** 32, 2 ** 32 + 1, 2 ** 33, LARGEST_SEED])
      for (const replica of [0, 1, 2 ** 32, 2 ** 32 + 1])
        for (const slot of [0, 1]) seen.add(new Substreams(seed).uniform(replica, slot));
    expect(seen.size).toBe(7 * 4 * 2);
  });

  test('what is no seed is refused', () => {
    for (const seed of [-1, 0.5, NaN, 2 ** 53]) expect(() => Philox.ofSeed(seed)).toThrow(RangeError);
  });
});
