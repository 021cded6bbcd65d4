/** @module Random numbers: published test vectors, moments, independence of the order in which replicas are asked. */
import { describe, expect, test } from 'vitest';
import { LARGEST_SEED, Philox, Substreams } from '../../../src/numerics/index.js';

const hex = (p: Philox): string => [...p.words].map((w) => w.toString(16).padStart(8, '0')).join(' ');

describe('Philox 4×32-10', () => {
  // Known answers of the authors' distribution (kat_vectors of the SC'11 paper's software; values from memory: three blocks of
  // 128 bits do not agree by accident).
  test.each([
    [[0, 0], [0, 0, 0, 0], '6627e8d5 e169c58d bc57ac4c 9b00dbd8'],
    [[-1, -1], [-1, -1, -1, -1], '408f276d 41c83b0e a20bc7c6 6d5451fd'],
    [[0xa4093822, 0x299f31d0], [0x243f6a88, 0x85a308d3, 0x13198a2e, 0x03707344], 'd16cfe09 94fdcceb 5001e420 24126ea1'],
  ] as const)('key %j, counter %j', ([k0, k1], [a, b, c, d], words) => {
    const p = new Philox(k0, k1);
    p.block(a >>> 0, b >>> 0, c >>> 0, d >>> 0);
    expect(hex(p)).toBe(words);
  });

  test('the product of two words is exact in both halves', () => {
    // One round mixes both halves of both products: against BigInt, through the whole bijection.
    const p = new Philox(1, 2);
    const reference = (counter: readonly bigint[]): string => {
      const mask = 0xffffffffn;
      let [c0, c1, c2, c3] = counter as [bigint, bigint, bigint, bigint];
      let [k0, k1] = [1n, 2n];
      for (let round = 0; round < 10; round++) {
        const a = 0xd2511f53n * c0;
        const b = 0xcd9e8d57n * c2;
        [c0, c1, c2, c3] = [(b >> 32n) ^ c1 ^ k0, b & mask, (a >> 32n) ^ c3 ^ k1, a & mask];
        k0 = (k0 + 0x9e3779b9n) & mask;
        k1 = (k1 + 0xbb67ae85n) & mask;
      }
      return [c0, c1, c2, c3].map((w) => w.toString(16).padStart(8, '0')).join(' ');
    };
    for (const c of [
      [1, 2, 3, 4],
      [0xffffffff, 0, 0xffff0000, 7],
      [0x10000, 0xffff, 0x8000_0000, 0xdeadbeef],
    ] as const) {
      const [a, b, d, e] = c;
      p.block(a, b, d, e);
      expect(hex(p)).toBe(reference(c.map(BigInt)));
    }
  });

  test('seeds are integers that a double holds', () => {
    for (const seed of [-1, 0.5, NaN, Infinity, LARGEST_SEED + 1])
      expect(() => Philox.ofSeed(seed)).toThrow(RangeError);
    const [a, b] = [Philox.ofSeed(7), Philox.ofSeed(2 ** 32 + 7)];
    for (const p of [a, b]) p.block(1, 0, 0, 0);
    expect(hex(a)).not.toBe(hex(b));
  });
});

describe('substreams', () => {
  test('a replica has the same numbers in any order and company', () => {
    const s = new Substreams(7);
    const out = new Float64Array(5);
    s.normals(3, out);
    const first = [...out];
    s.normals(2 ** 40, out);
    s.uniform(3);
    const other = new Float64Array(4);
    new Substreams(7).normals(3, other);
    expect([...other]).toEqual(first.slice(0, 4));
    s.normals(3, out);
    expect([...out]).toEqual(first);
    s.normals(3 + 2 ** 32, out);
    expect([...out]).not.toEqual(first);
  });

  test('normal deviates have the moments of the normal distribution, each slot and between slots', () => {
    const N = 40_000;
    const s = new Substreams(12);
    const z = new Float64Array(4);
    const sums = { one: 0, two: 0, three: 0, four: 0, cross: 0, next: 0, tail: 0 };
    let before = 0;
    for (let i = 0; i < N; i++) {
      s.normals(i, z);
      sums.one += z[0]!;
      sums.two += z[1]! ** 2;
      sums.three += z[2]! ** 3;
      sums.four += z[3]! ** 4;
      sums.cross += z[0]! * z[1]!;
      sums.next += z[0]! * before;
      sums.tail += Math.abs(z[0]!) > 2 ? 1 : 0;
      before = z[0]!;
    }
    // Standard deviations of these means: √(variance of the summand/N); four of them are allowed.
    const near = (sum: number, expected: number, variance: number): void =>
      expect(Math.abs(sum / N - expected)).toBeLessThan(4 * Math.sqrt(variance / N));
    near(sums.one, 0, 1);
    near(sums.two, 1, 2);
    near(sums.three, 0, 15);
    near(sums.four, 3, 96);
    near(sums.cross, 0, 1);
    near(sums.next, 0, 1);
    near(sums.tail, 0.0455003, 0.0434); // erfc(√2)
  });

  test('uniform numbers fill (0, 1) evenly and stay inside', () => {
    const N = 20_000;
    const bins = new Float64Array(20);
    const s = new Substreams(1);
    for (let i = 0; i < N; i++) {
      const u = s.uniform(i);
      expect(u > 0 && u < 1).toBe(true);
      bins[Math.floor(20 * u)]! += 1;
    }
    const chi2 = bins.reduce((sum, n) => sum + (n - N / 20) ** 2 / (N / 20), 0);
    expect(chi2).toBeLessThan(43.8); // 19 degrees of freedom, probability 0.001 above
    expect(s.uniform(5, 0)).not.toBe(s.uniform(5, 1));
  });
});
