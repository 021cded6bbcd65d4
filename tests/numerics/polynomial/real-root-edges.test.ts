/** Roots exactly where intervals are halved, with neighbours close enough that they must be halved there. */
import { describe, expect, test } from 'vitest';
import {
  countNegativeRealRoots,
  countPositiveRealRoots,
  countRealRoots,
  countRealRootsIn,
  mulPoly,
  type RationalPoly,
} from '../../../src/numerics/polynomial/index.js';
import { signVariations } from '../../../src/numerics/polynomial/real-root-count.js';
import { Rational } from '../../../src/numerics/rational.js';
import { poly, q } from './random.js';

const product = (roots: readonly Rational[]): RationalPoly =>
  roots.reduce<RationalPoly>((p, r) => mulPoly(p, [r.neg(), Rational.ONE]), poly(1));

describe('roots on the points of bisection', () => {
  // all in the octave [1/2, 1): its ends, its middle 3/4, the middles of its halves, and neighbours
  const octave = [q(1, 2), q(5, 8), q(3, 4), q(7, 8), q(13, 16), q(2, 3), q(1)];

  test.each([-300, -3, -1, 0, 1, 2, 40, 300])('seven in one octave, times 2^%i', (k) => {
    const unit = k >= 0 ? q(2n ** BigInt(k)) : q(1, 2n ** BigInt(-k));
    const roots = octave.map((r) => r.mul(unit));
    const p = mulPoly(product(roots), poly(3, 1, 1));
    expect(countPositiveRealRoots(p)).toBe(7);
    expect(countNegativeRealRoots(p)).toBe(0);
    const mirrored = mulPoly(product(roots.map((r) => r.neg())), poly(0, 1));
    expect([countPositiveRealRoots(mirrored), countNegativeRealRoots(mirrored), countRealRoots(mirrored)]).toEqual([
      0, 7, 8,
    ]);
  });

  test('every way to leave some of them out', () => {
    for (let mask = 0; mask < 128; mask++) {
      const roots = octave.filter((_r, i) => (mask >> i) & 1);
      expect(countPositiveRealRoots(product(roots)), String(mask)).toBe(roots.length);
      const inside = roots.filter((r) => r.cmp(q(1, 2)) > 0);
      expect(countRealRootsIn(product(roots), q(1, 2), q(1)), String(mask)).toBe(inside.length);
      expect(countRealRootsIn(product(roots), q(0), q(3, 4)), String(mask)).toBe(
        roots.filter((r) => r.cmp(q(3, 4)) <= 0).length,
      );
    }
  });

  test('an interval with ends of different denominators, both negative and positive', () => {
    const p = product([q(-7, 3), q(-1, 5), q(0), q(2, 7), q(11, 4)]);
    expect(countRealRootsIn(p, q(-7, 3), q(2, 7))).toBe(3);
    expect(countRealRootsIn(p, q(-8, 3), q(2, 9))).toBe(3);
    expect(countRealRootsIn(p, q(-1, 5), q(0))).toBe(1);
    expect(countRealRootsIn(p, q(-100), q(100))).toBe(5);
    expect(() => countRealRootsIn(p, q(1), q(1, 2))).toThrow(RangeError);
    expect(() => countRealRootsIn(poly(0), q(0), q(1))).toThrow(RangeError);
  });
});

test('sign changes, zeros skipped', () => {
  expect(
    [[], [0n, 0n], [1n], [1n, 0n, 2n], [1n, 0n, -2n], [-1n, 1n, -1n], [0n, -3n, 0n, 0n, 5n]].map(signVariations),
  ).toEqual([0, 0, 0, 0, 1, 2, 1]);
});
