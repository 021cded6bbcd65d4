/** Where the notation changes, and what is no number. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  digitCount,
  leadingPlace,
  parseDecimal,
  roundToDigits,
  roundToPlace,
  shorten,
  writeDecimal,
  writePlain,
  writeScientific,
} from '../../../src/numerics/decimal/decimal.js';
import { pdgPlace, roundPdg, writeParentheses, writePlusMinus } from '../../../src/numerics/decimal/pdg.js';
import type { ErrorText } from '../../../src/numerics/decimal/pdg.js';
import { cases } from '../ball/generate.js';

const both = (value: string, ...errors: ErrorText[]): [string, string | undefined] | undefined => {
  const rounded = roundPdg(value, errors);
  return rounded === undefined ? undefined : [writePlusMinus(rounded), writeParentheses(rounded)];
};

describe('decimal numbers', () => {
  test.each(['1e1234567', '1.2.3', '1 2', 'a1', '1a', '1e', '1e+', '.e1', '+', '-.', '1e1.5'])(
    '"%s" is none',
    (text) => {
      expect(parseDecimal(text)).toBeUndefined();
    },
  );

  test.each([
    [' 1.50 ', 150n, -2],
    ['-.25E+2', -25n, 0],
    ['1e-123456', 1n, -123456],
    ['1e999999', 1n, 999999],
    ['0012', 12n, 0],
  ])('"%s" is read', (text, coefficient, exponent) => {
    expect(parseDecimal(text)).toEqual({ coefficient, exponent });
  });

  test('digits and places', () => {
    const places = ['1', '9.99', '0.1', '0.0999', '1234', '0', '-0.05', '0.00'].map((t) => parseDecimal(t)!);
    expect(places.map(leadingPlace)).toEqual([0, 0, -1, -2, 3, 0, -2, -2]);
    expect(places.map(digitCount)).toEqual([1, 3, 1, 3, 4, 1, 1, 1]);
  });

  test.each([
    [123n, 0, '123', '1.23e2'],
    [-123n, 2, '-12300', '-1.23e4'],
    [0n, 3, '0', '0'],
    [0n, -2, '0.00', '0'],
    [5n, -1, '0.5', '5e-1'],
    [-5n, -3, '-0.005', '-5e-3'],
    [1250n, -2, '12.50', '1.250e1'],
    [7n, 0, '7', '7e0'],
  ])('%d·10^%d', (coefficient, exponent, plain, scientific) => {
    expect(writePlain({ coefficient, exponent })).toBe(plain);
    expect(writeScientific({ coefficient, exponent })).toBe(scientific);
  });

  test.each([
    ['0.00001', '0.00001'],
    ['0.00000999', '9.99e-6'],
    ['9999999', '9999999'],
    ['10000000', '1.0000000e7'],
    ['-0.00001', '-0.00001'],
    ['-1e7', '-1e7'],
    ['12e1', '1.2e2'],
    ['0e5', '0'],
    ['0e-9', '0.000000000'],
  ])('%s is best written %s', (text, wanted) => {
    expect(writeDecimal(parseDecimal(text)!)).toBe(wanted);
  });

  test('rounding to digits: shorter numbers stay, carries keep the number of digits', () => {
    const d = (coefficient: bigint, exponent = 0): { coefficient: bigint; exponent: number } => ({
      coefficient,
      exponent,
    });
    expect(roundToDigits(d(1234n), 4)).toEqual(d(1234n));
    expect(roundToDigits(d(12n, -1), 5)).toEqual(d(12n, -1));
    expect(roundToDigits(d(1234n), 3)).toEqual(d(123n, 1));
    expect(roundToDigits(d(9996n), 3)).toEqual(d(100n, 2));
    expect(roundToDigits(d(-9996n), 3)).toEqual(d(-100n, 2));
    expect(roundToDigits(d(1225n), 3)).toEqual(d(122n, 1));
    expect(roundToDigits(d(1225n), 3, 'half-up')).toEqual(d(123n, 1));
    expect(roundToDigits(d(1235n), 3)).toEqual(d(124n, 1));
    expect(shorten('1225', 3, 'half-up')).toBe('1.23e3');
    expect(shorten('1225', 3)).toBe('1.22e3');
  });

  test('rounding is the nearest integer number of units, by integers alone', () => {
    fc.assert(
      fc.property(fc.bigInt({ min: -5000n, max: 5000n }), fc.integer({ min: 0, max: 3 }), (n, drop) => {
        const unit = 10n ** BigInt(drop);
        const up = roundToPlace({ coefficient: n, exponent: 0 }, drop, 'half-up').coefficient;
        const size = n < 0n ? -n : n;
        const wanted = (2n * size + unit) / (2n * unit);
        expect(up).toBe(n < 0n ? -wanted : wanted);
        const even = roundToPlace({ coefficient: n, exponent: 0 }, drop, 'half-even').coefficient;
        const tie = (2n * size) % (2n * unit) === unit;
        expect(even).toBe(tie && wanted % 2n === 1n ? (n < 0n ? -(wanted - 1n) : wanted - 1n) : up);
      }),
      cases(500),
    );
    expect(roundToPlace({ coefficient: 12n, exponent: 1 }, -1, 'half-up')).toEqual({
      coefficient: 1200n,
      exponent: -1,
    });
  });
});

describe('values with errors', () => {
  test.each([
    // the leading place −4 is still plain, −5 is not; 5 is plain, 6 is not
    ['0.00012345', ['0.0000012'], '0.0001234 ± 0.0000012', '0.0001234(12)'],
    ['0.00001234', ['0.00000012'], '(1.234 ± 0.012)e-5', '1.234(12)e-5'],
    ['123456', ['1200'], '123500 ± 1200', '123500(1200)'],
    ['1234567', ['12000'], '(1.235 ± 0.012)e6', '1.235(12)e6'],
    // the largest of value and errors decides, zeros do not
    ['0', ['0.00012'], '0.00000 ± 0.00012', '0.00000(12)'],
    ['0', ['0.000012'], '(0.0 ± 1.2)e-5', '0.0(12)e-5'],
    ['0.000001', ['0.0012'], '0.0000 ± 0.0012', '0.0000(12)'],
    ['-0.5', ['-0.12'], '-0.50 ± 0.12', '-0.50(12)'],
  ])('%s ± %s', (value, errors, plusMinus, parentheses) => {
    expect(both(value, ...errors)).toEqual([plusMinus, parentheses]);
  });

  test('an asymmetric error: signs ignored, zero on one side, different numbers of decimals', () => {
    expect(both('1', { plus: '0.4', minus: '-0.2' })).toEqual(['1.00 +0.40 −0.20', undefined]);
    expect(both('1', { plus: '0.4', minus: '0' })).toEqual(['1.0 +0.4 −0.0', undefined]);
    expect(both('1', '0.4', { plus: '0', minus: '0' })).toEqual(['1.0 ± 0.4 ± 0.0', '1.0(4)(0)']);
    expect(both('1', { plus: '0.40', minus: '0.4' })).toEqual(['1.0 ± 0.4', '1.0(4)']);
    expect(both('1', { plus: '0.4', minus: '0.385' })).toEqual(['1.0 ± 0.4', '1.0(4)']);
    expect(both('1', { plus: '0.12', minus: '0.125' })).toEqual(['1.00 ± 0.12', '1.00(12)']);
    expect(both('1', { plus: '0.1', minus: '0.12345' })).toEqual(['1.00 +0.10 −0.12', undefined]);
    expect(both('1', { plus: '0.12345', minus: '0.1' })).toEqual(['1.00 +0.12 −0.10', undefined]);
    expect(both('1', '0.4', { plus: '0.5', minus: '0.6' })).toEqual(['1.0 ± 0.4 +0.5 −0.6', undefined]);
  });

  test('what is no number gives no rounded value', () => {
    expect(both('x', '0.1')).toBeUndefined();
    expect(both('1', '0.1', 'x')).toBeUndefined();
    expect(both('1', { plus: 'x', minus: '0.1' })).toBeUndefined();
    expect(both('1', { plus: '0.1', minus: 'x' })).toBeUndefined();
    expect(both('1', { plus: '0', minus: '0' })).toBeUndefined();
  });

  test('the place of errors of one, two and many digits', () => {
    const place = (text: string): number | undefined => pdgPlace(parseDecimal(text)!);
    expect(['1', '3', '4', '35', '36', '354', '355', '3549999', '3550000', '-2'].map(place)).toEqual([
      -1, -1, 0, 0, 1, 1, 2, 5, 6, -1,
    ]);
    expect(place('0')).toBeUndefined();
  });
});
