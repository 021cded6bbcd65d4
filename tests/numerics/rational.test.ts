import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { gcdBigInt, PARSE_LIMITS, Rational } from '../../src/numerics/rational.js';
import { cases } from './ball/generate.js';

const big = fc.oneof(fc.bigInt({ min: -30n, max: 30n }), fc.bigInt({ min: -(10n ** 40n), max: 10n ** 40n }));
const rationals = fc
  .tuple(
    big,
    big.filter((d) => d !== 0n),
  )
  .map(([n, d]) => Rational.of(n, d));

const pair = (q: Rational | undefined): [bigint, bigint] | undefined => (q === undefined ? undefined : [q.num, q.den]);

describe('lowest terms', () => {
  it('numerator and denominator share no factor, the denominator is positive, the value is kept', () => {
    fc.assert(
      fc.property(
        big,
        big.filter((d) => d !== 0n),
        (n, d) => {
          const q = Rational.of(n, d);
          expect(q.den > 0n).toBe(true);
          expect(gcdBigInt(q.num, q.den)).toBe(1n);
          expect(q.num * d).toBe(n * q.den);
        },
      ),
      cases(500),
    );
  });

  it('a zero denominator is refused, wherever it comes from', () => {
    expect(() => Rational.of(1, 0)).toThrow(RangeError);
    expect(() => Rational.ONE.div(Rational.ZERO)).toThrow(RangeError);
    expect(() => Rational.ZERO.inv()).toThrow(RangeError);
    expect(() => Rational.ZERO.pow(-1)).toThrow(RangeError);
  });

  it('field laws', () => {
    fc.assert(
      fc.property(rationals, rationals, rationals, (a, b, c) => {
        expect(a.add(b).sub(b).equals(a)).toBe(true);
        expect(a.mul(b.add(c)).equals(a.mul(b).add(a.mul(c)))).toBe(true);
        if (!b.isZero()) {
          expect(a.div(b).mul(b).equals(a)).toBe(true);
          expect(b.inv().mul(b).equals(Rational.ONE)).toBe(true);
          expect(b.pow(-3).mul(b.pow(3)).equals(Rational.ONE)).toBe(true);
        }
        for (const q of [a.add(b), a.sub(b), a.mul(b), a.neg(), a.abs(), a.pow(2)]) {
          expect(gcdBigInt(q.num, q.den)).toBe(1n);
        }
      }),
      cases(300),
    );
  });

  it('powers', () => {
    expect(pair(Rational.of(-2, 3).pow(0))).toEqual([1n, 1n]);
    expect(pair(Rational.of(-2, 3).pow(3))).toEqual([-8n, 27n]);
    expect(pair(Rational.of(-2, 3).pow(-3))).toEqual([-27n, 8n]);
  });
});

describe('order', () => {
  it('sign, comparison, absolute value, integers and the floor agree with the integers', () => {
    fc.assert(
      fc.property(rationals, rationals, (a, b) => {
        const d = a.num * b.den - b.num * a.den;
        expect(a.cmp(b)).toBe(d > 0n ? 1 : d < 0n ? -1 : 0);
        expect(a.equals(b)).toBe(d === 0n);
        expect(a.cmp(a.add(b).sub(b))).toBe(0);
        expect(a.sign()).toBe(a.num > 0n ? 1 : a.num < 0n ? -1 : 0);
        expect(a.isZero()).toBe(a.num === 0n);
        expect(a.abs().sign()).toBe(a.isZero() ? 0 : 1);
        const floor = Rational.of(a.floor());
        expect(floor.cmp(a)).toBeLessThanOrEqual(0);
        expect(floor.add(Rational.ONE).cmp(a)).toBe(1);
        expect(a.isInteger()).toBe(floor.equals(a));
      }),
      cases(500),
    );
  });

  it.each([
    [-7, 2, -4n],
    [7, 2, 3n],
    [-4, 2, -2n],
    [-1, 3, -1n],
    [0, 5, 0n],
  ])('floor of %i/%i is %i', (n, d, wanted) => {
    expect(Rational.of(n, d).floor()).toBe(wanted);
  });

  it('equal numerators do not make equal numbers, nor equal denominators', () => {
    expect(Rational.of(1, 2).equals(Rational.of(1, 3))).toBe(false);
    expect(Rational.of(1, 3).equals(Rational.of(2, 3))).toBe(false);
    expect(Rational.of(2, 6).equals(Rational.of(1, 3))).toBe(true);
  });
});

describe('reading and writing', () => {
  it.each([
    ['-12.5e-3', -1n, 80n],
    ['365/24', 365n, 24n],
    ['1.5/2', 3n, 4n],
    [' 1 / -3 ', -1n, 3n],
    ['+.5', 1n, 2n],
    ['5.', 5n, 1n],
    ['0.125', 1n, 8n],
    ['0.2', 1n, 5n],
    ['7.50', 15n, 2n],
    ['1e3', 1000n, 1n],
    ['0e-7', 0n, 1n],
    ['-0.000', 0n, 1n],
    ['12e+2', 1200n, 1n],
    ['1e-20000', 1n, 10n ** 20000n],
    ['3E2', 300n, 1n],
  ])('%s', (text, num, den) => {
    expect(pair(Rational.parse(text))).toEqual([num, den]);
  });

  it.each([
    '',
    ' ',
    '.',
    '-',
    'e3',
    '.e3',
    '1/0',
    '1/',
    '/2',
    '1/2/0',
    'x',
    '1x',
    'x1',
    '1 2',
    '1e',
    '1e2.5',
    '--1',
    '1.2.3',
  ])('"%s" is no number', (text) => {
    expect(Rational.parse(text)).toBeUndefined();
  });

  it('what passes the limits is refused, what just keeps them is read', () => {
    const { digits, exponent } = PARSE_LIMITS;
    expect(Rational.parse('1'.repeat(digits))?.num).toBe(BigInt('1'.repeat(digits)));
    expect(Rational.parse('1'.repeat(digits + 1))).toBeUndefined();
    expect(Rational.parse(`1e${exponent}`)?.num).toBe(10n ** BigInt(exponent));
    expect(Rational.parse(`1e${exponent + 1}`)).toBeUndefined();
    expect(Rational.parse(`1e-${exponent}`)?.den).toBe(10n ** BigInt(exponent));
    expect(Rational.parse(`1e-${exponent + 1}`)).toBeUndefined();
  });

  it('n·10^e comes in lowest terms, whatever factors 2 and 5 are in n', () => {
    for (let twos = 0; twos < 12; twos++)
      for (let fives = 0; fives < 12; fives++)
        for (const e of [-9, -8, -7, -6, -5, -4, -3, -2, -1, 0, 1, 3]) {
          const n = -7n * 2n ** BigInt(twos) * 5n ** BigInt(fives);
          const q = Rational.ofDecimal(n, e);
          const wanted = e >= 0 ? Rational.of(n * 10n ** BigInt(e)) : Rational.of(n, 10n ** BigInt(-e));
          expect(pair(q), `${n}e${e}`).toEqual(pair(wanted));
        }
    expect(pair(Rational.ofDecimal(0n, 5))).toEqual([0n, 1n]);
    expect(pair(Rational.ofDecimal(0n, -5))).toEqual([0n, 1n]);
  });

  it('text reads back to the same value; an integer has no slash', () => {
    fc.assert(
      fc.property(rationals, (a) => {
        expect(Rational.parse(a.toString())?.equals(a)).toBe(true);
        expect(JSON.parse(JSON.stringify(a))).toBe(a.toString());
        expect(a.toString().includes('/')).toBe(!a.isInteger());
      }),
      cases(300),
    );
  });
});

describe('doubles', () => {
  it('every double is taken exactly and comes back', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (x) => {
        const q = Rational.fromNumber(x);
        expect(gcdBigInt(q.num, q.den)).toBe(1n);
        expect(q.toNumber()).toBe(x === 0 ? 0 : x);
      }),
      cases(1000),
    );
    expect(pair(Rational.fromNumber(0.375))).toEqual([3n, 8n]);
    expect(pair(Rational.fromNumber(-6))).toEqual([-6n, 1n]);
    for (const x of [NaN, Infinity, -Infinity]) expect(() => Rational.fromNumber(x)).toThrow(RangeError);
  });

  it('a fraction is within three roundings of the double that its decimal text reads as, a long one within one', () => {
    // ECMA-262 takes a numeral of up to 20 digits to the nearest double: an outside answer.
    fc.assert(
      fc.property(fc.bigInt({ min: 1n, max: 10n ** 17n }), fc.integer({ min: -320, max: 290 }), (n, e) => {
        const wanted = Number(`${n}e${e}`);
        for (const factor of [1n, 3n ** 400n, 7n ** 900n]) {
          // the same value in terms that are not the lowest: short, long, and beyond the range of doubles
          const q = Rational.ofReduced(
            n * factor * (e > 0 ? 10n ** BigInt(e) : 1n),
            factor * (e < 0 ? 10n ** BigInt(-e) : 1n),
          );
          // three roundings where both sides are doubles, one where they are not; and that of the wanted one
          const roundings = factor === 7n ** 900n ? 2.001 : 4.001;
          expect(Math.abs(q.toNumber() - wanted)).toBeLessThanOrEqual(wanted * roundings * 2 ** -53 + Number.MIN_VALUE);
          expect(q.neg().toNumber()).toBe(-q.toNumber());
        }
      }),
      cases(300),
    );
  });

  it('outside the range of doubles: 0 and infinities of the right sign', () => {
    expect(Rational.ZERO.toNumber()).toBe(0);
    expect(Rational.ofDecimal(1n, 400).toNumber()).toBe(Infinity);
    expect(Rational.ofDecimal(-1n, 400).toNumber()).toBe(-Infinity);
    expect(Rational.ofDecimal(1n, -400).toNumber()).toBe(0);
    expect(Rational.ofDecimal(1n, -310).toNumber()).toBe(1e-310);
  });
});
