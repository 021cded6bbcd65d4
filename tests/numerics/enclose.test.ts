import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { certainDigits, exp, pi, R, raisePrecision, Rational, sinCos, toDecimal } from '../../src/numerics/index.js';
import type { Ball } from '../../src/numerics/index.js';
import { cases, pointed, power2 } from './ball/generate.js';

const text = (a: Ball, digits = 15): string => toDecimal(a, digits).text;

describe('toDecimal', () => {
  it('every point of the ball lies within half a unit of the last digit printed, and the sign is right', () => {
    fc.assert(
      fc.property(pointed(600), fc.integer({ min: 1, max: 60 }), ({ ball, point }, digits) => {
        const { text: t, certainDigits: n } = toDecimal(ball, digits);
        if (n === 0) {
          // a bound on the size
          expect(t).toMatch(/^±1e-?\d+$/);
          const bound = Rational.parse(t.slice(1))!;
          expect(point.abs().cmp(bound)).toBeLessThanOrEqual(0);
          return;
        }
        const value = Rational.parse(t)!;
        expect(value.sign()).toBe(point.sign());
        const exponent = Number(/e(-?\d+)$/.exec(t)?.[1] ?? '0');
        const decimals = /\.(\d+)/.exec(t)?.[1]?.length ?? 0;
        const unit = Rational.of(10).pow(exponent - decimals);
        const error = value.sub(point).abs().mul(Rational.of(2));
        // an exact number printed in full has no error at all; otherwise half a unit
        expect(error.cmp(unit)).toBeLessThanOrEqual(0);
        expect(n).toBeLessThanOrEqual(digits + 3);
        // as many digits as the number says it has: the unit is 10^-n of the value, or an exact number ended sooner
        const lead = value.abs().div(unit);
        if (ball.rad > 0) expect(lead.cmp(Rational.of(10).pow(n - 1))).toBeGreaterThanOrEqual(0);
      }),
      cases(1000),
    );
  });

  it('exact doubles with 17 digits parse back to themselves', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (x) => {
        expect(Number(text(R.fromNumber(x), 17))).toBe(x === 0 ? 0 : x);
      }),
      cases(1000),
    );
  });

  it.each([
    ['π', pi(200), 15, '3.14159265358979'],
    ['−π to one digit', R.neg(pi(200)), 1, '-3'],
    ['exact, fewer digits asked', R.fromNumber(123456), 3, '1.23e5'],
    ['exact, ends early', R.fromNumber(1.5), 15, '1.5'],
    ['an integer with a radius', R.ball(123456n, 0, 100), 10, '1.2e5'],
    ['carry', R.fromNumber(999999), 3, '1.00e6'],
    ['half of a tie, one digit more', R.ball(5n, -1, 1e-30), 1, '2.5'],
    ['exact tie away from zero', R.ball(5n, -1), 1, '3'],
    ['negative exact tie', R.ball(-5n, -1), 1, '-3'],
    ['just positional', R.ball(1n, 0), 5, '1'],
    ['1e-6 is positional', R.fromRational(Rational.parse('0.00000123')!, 200), 5, '0.0000012300'],
    ['below 1e-6', R.fromRational(Rational.parse('9.87e-7')!, 200), 4, '9.870e-7'],
    ['1e15', R.fromNumber(1e15), 20, '1e15'],
    ['below 1e15', R.fromNumber(123456789012345), 15, '123456789012345'],
    ['exact and short', R.fromNumber(120000), 15, '120000'],
    ['1e-400', R.fromRational(Rational.parse('-1.25e-400')!, 200), 6, '-1.25000e-400'],
    ['zero', R.ZERO, 5, '0'],
    ['below a power of ten, no carry', R.fromRational(Rational.parse('99.92')!, 200), 3, '99.9'],
    ['below a power of ten, carry', R.fromRational(Rational.parse('99.96')!, 200), 3, '100'],
    ['one digit', R.fromRational(Rational.parse('0.6')!, 200), 1, '0.6'],
    ['one digit, carry', R.fromRational(Rational.parse('0.96')!, 200), 1, '1'],
  ] as const)('%s', (_, ball, digits, wanted) => {
    expect(text(ball, digits)).toBe(wanted);
  });

  it('says how large it is at most where no digit is certain', () => {
    expect(toDecimal(R.ball(0n, 0, 1), 5)).toEqual({ text: '±1e1', certainDigits: 0 });
    expect(toDecimal(R.ball(25n, -1, 30), 5).certainDigits).toBe(0);
    expect(toDecimal(R.INDETERMINATE, 5)).toEqual({ text: '±Infinity', certainDigits: 0 });
    expect(text(R.ball(2n, 0, 0.9))).toMatch(/^(2|±1e1)$/);
  });

  it('numbers with huge exponents', () => {
    // e^(10^6) = 3.0332153968…e434294 and e^(−10^10), as printed by mpmath 1.3.0
    expect(text(exp(R.fromNumber(1e6), 100), 20)).toBe('3.0332153968020875451e434294');
    expect(text(exp(R.fromNumber(-1e10), 100), 20)).toBe('9.2785844203248725781e-4342944820');
    expect(text(R.mul2exp(R.neg(R.ONE), 70_000), 8)).toBe('-1.2580459e21072');
    expect(text(exp(R.fromNumber(-1e20), 100))).toMatch(/^±1e-\d+$/);
  });
});

describe('raisePrecision', () => {
  it('reaches the digits asked through a cancellation', () => {
    // sin x minus a number that agrees with it to 90 bits
    const x = R.mul(R.fromNumber(10 ** 22), R.fromNumber(Math.PI), 1000);
    const close = R.exactMid(sinCos(x, 90).sin);
    for (const digits of [5, 15, 60, 200]) {
      const v = raisePrecision(digits, (prec) => R.sub(sinCos(x, prec).sin, close, prec));
      expect(certainDigits(v)).toBeGreaterThanOrEqual(digits);
      expect(R.upperBits(v)).toBeLessThan(-85);
    }
  });

  it('calls once when nothing is lost', () => {
    let calls = 0;
    const v = raisePrecision(50, (prec) => {
      calls++;
      return pi(prec);
    });
    expect(calls).toBe(1);
    expect(toDecimal(v, 50).certainDigits).toBe(50);
  });

  it('gives up on a zero, with its best bound', () => {
    let last = 0;
    const v = raisePrecision(20, (prec) => R.sub(pi((last = prec)), pi(prec + 3), prec));
    expect(R.containsZero(v)).toBe(true);
    expect(last).toBeGreaterThan(4000);
    expect(R.upperBits(v)).toBeLessThan(-4000);
    expect(raisePrecision(5, () => R.INDETERMINATE)).toBe(R.INDETERMINATE);
    expect(R.isExactZero(raisePrecision(5, () => R.ZERO))).toBe(true);
  });

  it('certain digits', () => {
    expect(certainDigits(R.ONE)).toBe(Infinity);
    expect(certainDigits(R.ball(0n, 0, 1))).toBe(0);
    fc.assert(
      fc.property(fc.integer({ min: 5, max: 300 }), (prec) => {
        // n digits are certain: the radius is below 10^-n of the value
        const v = pi(prec);
        const n = certainDigits(v);
        const radius = Rational.fromNumber(v.rad).mul(power2(v.exp));
        expect(radius.mul(Rational.of(10).pow(n)).cmp(Rational.of(4))).toBe(-1);
      }),
      cases(100),
    );
  });
});
