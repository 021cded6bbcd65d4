import { describe, expect, it } from 'vitest';
import { R, Rational, pi } from '../../src/numerics/index.js';
import type { Ball, Exact } from '../../src/numerics/index.js';
import {
  addExact,
  divExact,
  exact,
  exactReal,
  isZeroExact,
  mulExact,
  signExact,
  subExact,
  toNumberExact,
} from '../../src/numerics/exact.js';

const third = exact(Rational.of(1, 3));
const circle = exactReal(pi);

describe('numbers known exactly', () => {
  it('rationals stay rational through the four operations', () => {
    const half = exact(Rational.of(1, 2));
    const values: [Exact, Rational][] = [
      [addExact(half, third), Rational.of(5, 6)],
      [subExact(half, third), Rational.of(1, 6)],
      [mulExact(half, third), Rational.of(1, 6)],
      [divExact(half, third), Rational.of(3, 2)],
      [exact(4n), Rational.of(4)],
      [exact(-4), Rational.of(-4)],
    ];
    for (const [value, wanted] of values) {
      expect(value.rational?.equals(wanted)).toBe(true);
      expect(R.containsRational(value.ball(80), wanted)).toBe(true);
      expect(toNumberExact(value)).toBe(wanted.toNumber());
    }
    expect(() => divExact(half, exact(0))).toThrow(RangeError);
  });

  it.each([
    ['+', addExact, Math.PI + 1 / 3, 1 / 3 + Math.PI],
    ['−', subExact, Math.PI - 1 / 3, 1 / 3 - Math.PI],
    ['·', mulExact, Math.PI / 3, Math.PI / 3],
    ['/', divExact, Math.PI * 3, 1 / (3 * Math.PI)],
  ] as const)('an irrational makes the result of %s irrational, with the bits asked', (_, op, left, right) => {
    for (const [a, b, wanted] of [
      [circle, third, left],
      [third, circle, right],
    ] as const) {
      const value = op(a, b);
      expect(value.rational).toBeUndefined();
      expect(toNumberExact(value)).toBeCloseTo(wanted, 14);
      for (const prec of [53, 300, 100]) expect(R.accuracyBits(value.ball(prec))).toBeGreaterThanOrEqual(prec);
    }
  });

  it('an enclosure is kept: asked again for as much it is not made anew, for far less it is cut down', () => {
    const asked: number[] = [];
    const x = exactReal((prec) => {
      asked.push(prec);
      return pi(prec);
    });
    const first = x.ball(500);
    expect(x.ball(500)).toBe(first);
    expect(x.ball(436)).toBe(first);
    const cut = x.ball(435);
    expect(cut).not.toBe(first);
    expect(R.accuracyBits(cut)).toBeLessThan(440);
    expect(R.accuracyBits(cut)).toBeGreaterThanOrEqual(434);
    expect(asked).toEqual([500]);
    x.ball(501);
    expect(asked).toEqual([500, 501]);
  });
});

describe('signs', () => {
  /** 2^-bits, as a number not known to be rational; calls are counted. */
  const tiny = (bits: number, sign: bigint): { value: Exact; asked: number[] } => {
    const asked: number[] = [];
    const value = exactReal((prec): Ball => {
      asked.push(prec);
      return R.addError({ mid: sign, exp: -bits, rad: 0 }, 1, -prec);
    });
    return { value, asked };
  };

  it.each([1n, -1n])('%i is certain as soon as the precision allows', (sign) => {
    for (const [bits, wanted] of [
      [10, [64]],
      [200, [64, 256]],
      [4000, [64, 256, 1024, 4096]],
    ] as const) {
      const { value, asked } = tiny(bits, sign);
      expect(signExact(value)).toBe(Number(sign));
      expect(asked).toEqual(wanted);
    }
    expect(signExact(tiny(5000, sign).value)).toBe(0);
  });

  it('of rationals; only the rational zero is zero', () => {
    expect([signExact(exact(0)), signExact(third), signExact(exact(-2))]).toEqual([0, 1, -1]);
    expect(isZeroExact(exact(0))).toBe(true);
    expect(isZeroExact(third)).toBe(false);
    expect(isZeroExact(subExact(circle, circle))).toBe(false);
  });
});
