/** Printing and raising the precision at their edges: ties at the end of a ball, exact numbers, one digit, losses counted in bits. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { certainDigits, R, raisePrecision, Rational, toDecimal } from '../../src/numerics/index.js';
import type { Ball } from '../../src/numerics/index.js';
import { cases, power2 } from './ball/generate.js';

const text = (a: Ball, digits: number): string => toDecimal(a, digits).text;

describe('toDecimal', () => {
  it.each([
    ['an exact number with zeros beyond its digits', R.fromNumber(12e19), 5, '1.2e20'],
    ['an exact number with a unit above one', { mid: 3n, exp: 2, rad: 0 }, 4, '12'],
    ['zeros that are not the whole number stay', R.fromNumber(1 + 2 ** -10), 3, '1.00'],
    ['one digit of a huge number', R.mul2exp(R.ONE, 70_000), 1, '1e21072'],
    ['a huge negative number', R.mul2exp(R.neg(R.ONE), 70_000), 3, '-1.26e21072'],
    ['a bound below two', R.ball(0n, 0, 0.5), 3, '±1e1'],
    ['a bound of one', R.ball(0n, 0, 0.25), 3, '±1e0'],
  ] as const)('%s', (_, ball, digits, wanted) => {
    expect(text(ball, digits)).toBe(wanted);
  });

  it('a huge number without a certain digit is bounded', () => {
    // |x| <= 1.9·2^100000 < 10^30104
    expect(text(R.ball(1n, 100_000, 0.9), 5)).toMatch(/^±1e3010[45]$/);
  });

  it('a ball that passes a tie by a part in 2^41 of its radius is not rounded as if it did not', () => {
    // from 2.5 − 2^−82 upwards: 3 is more than half a unit off
    const ball = R.ball(5n * 2n ** 60n + 2n ** 20n, -61, 2 ** 20 + 2 ** -21);
    expect(toDecimal(ball, 1).text).not.toBe('3');
    expect(text(R.ball(5n * 2n ** 60n + 2n ** 20n, -61, 2 ** 20 - 2 ** -10), 1)).toBe('3');
  });
});

describe('certain digits', () => {
  it('n digits are certain: twice the radius is at most 10^-n of the value, and n + 2 would be too many', () => {
    fc.assert(
      fc.property(
        fc.bigInt({ min: 1n, max: 10n ** 40n }),
        fc.integer({ min: 2 ** 20, max: 2 ** 21 }),
        fc.integer({ min: -200, max: -21 }),
        (mid, digits, k) => {
          const ball = R.ball(mid, 3, digits * 2 ** k);
          const n = certainDigits(ball);
          const twice = Rational.of(digits).mul(power2(k + 1));
          if (n > 0) expect(twice.mul(Rational.of(10).pow(n)).cmp(Rational.of(mid))).toBeLessThanOrEqual(0);
          expect(twice.mul(Rational.of(10).pow(n + 2)).cmp(Rational.of(mid))).toBe(1);
        },
      ),
      cases(300),
    );
  });
});

describe('raisePrecision', () => {
  /** A one that has lost `loss` bits, and the precisions it was asked for. */
  function losing(loss: number): { asked: number[]; evaluate: (prec: number) => Ball } {
    const asked: number[] = [];
    return {
      asked,
      evaluate: (prec) => {
        asked.push(prec);
        return prec <= loss
          ? { mid: 1n, exp: 0, rad: 2 ** 600 }
          : { mid: 1n << BigInt(prec), exp: -prec, rad: 2 ** loss };
      },
    };
  }

  it('holds the digits asked whatever is lost, and looks again no more often than it must', () => {
    for (const digits of [1, 2, 5, 15, 16, 17, 50, 301])
      for (let loss = 0; loss <= 20; loss++) {
        const { asked, evaluate } = losing(loss);
        expect(certainDigits(raisePrecision(digits, evaluate))).toBeGreaterThanOrEqual(digits);
        // eight bits are spare at the first attempt
        expect(asked.length).toBe(loss <= 8 ? 1 : 2);
      }
  });

  it('adds what was lost; doubles where nothing was certain', () => {
    const known = losing(100);
    raisePrecision(60, known.evaluate);
    expect(known.asked.length).toBe(2);
    expect(known.asked[1]! - known.asked[0]!).toBe(100);
    const dark = losing(500);
    raisePrecision(30, dark.evaluate);
    // 500 bits are lost: nothing is known below, then a few bits are missing at most
    const doubled = dark.asked.filter((prec) => prec <= 500);
    expect(doubled).toEqual(doubled.map((_p, i) => dark.asked[0]! * 2 ** i));
    expect(doubled.length).toBeGreaterThan(2);
  });

  it('returns the sharpest ball it has met', () => {
    const sharp = R.ball(1n, 0, 2 ** -10);
    let calls = 0;
    const value = raisePrecision(10, () => (calls++ === 0 ? sharp : R.ball(1n, 0, 2 ** -5)));
    expect(value).toBe(sharp);
    expect(calls).toBeGreaterThan(1);
  });
});
