/**
 * Rounding by the rule of the Particle Data Group, Review of Particle Physics, Introduction, section 5.3
 * (Phys. Rev. D 98 (2018) 030001; rule text seen in a stored copy). The first rows are its own examples and check values
 * re-derived from the rule by hand.
 */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { parseDecimal } from '../../../src/numerics/decimal/decimal.js';
import { pdgPlace, roundPdg, writeParentheses, writePlusMinus } from '../../../src/numerics/decimal/pdg.js';
import type { ErrorText, RoundedValue } from '../../../src/numerics/decimal/pdg.js';

const RUNS = 1000 * Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? 1);

const rounded = (value: string, ...errors: ErrorText[]): RoundedValue => {
  const result = roundPdg(value, errors);
  if (result === undefined) throw new Error(`${value} with ${JSON.stringify(errors)} was not rounded`);
  return result;
};

describe('one symmetric error', () => {
  test.each([
    // Examples of the Introduction, 5.3, and of the packages that quote it.
    ['0.827', '0.119', '0.83 ± 0.12', '0.83(12)'],
    ['0.827', '0.367', '0.8 ± 0.4', '0.8(4)'],
    // Re-derived from the rule: 950 to 999 becomes 1000 and keeps two digits.
    ['0.827', '0.0096', '0.827 ± 0.010', '0.827(10)'],
    ['163.4567', '0.0951', '163.46 ± 0.10', '163.46(10)'],
    // The two sides of 354/355.
    ['4.18123', '0.00354', '4.1812 ± 0.0035', '4.1812(35)'],
    ['4.18123', '0.00355', '4.181 ± 0.004', '4.181(4)'],
    // The two sides of 949/950.
    ['4.18123', '0.00949', '4.181 ± 0.009', '4.181(9)'],
    ['4.18123', '0.00950', '4.181 ± 0.010', '4.181(10)'],
    ['12.2135', '0.03215', '12.214 ± 0.032', '12.214(32)'],
    ['12.2135', '0.06515', '12.21 ± 0.07', '12.21(7)'],
    ['1.0', '0.0962', '1.00 ± 0.10', '1.00(10)'],
    ['0.118', '0.0009', '0.1180 ± 0.0009', '0.1180(9)'],
    // Beyond the decimal point, and with a power of ten taken out.
    ['12345', '367', '12300 ± 400', '12300(400)'],
    ['-1234567', '1190', '(-1.2346 ± 0.0012)e6', '-1.2346(12)e6'],
    ['0.00001234567', '0.000000119', '(1.235 ± 0.012)e-5', '1.235(12)e-5'],
    // A value smaller than its error.
    ['0.003', '0.119', '0.00 ± 0.12', '0.00(12)'],
  ])('%s ± %s is %s', (value, error, wanted, short) => {
    const result = rounded(value, error);
    expect(writePlusMinus(result)).toBe(wanted);
    expect(writeParentheses(result)).toBe(short);
  });

  test('the three leading digits decide, not those after rounding to three', () => {
    expect(writePlusMinus(rounded('4.181234', '0.0035499'))).toBe('4.1812 ± 0.0035');
  });

  test('the value goes to the even neighbour, the error up', () => {
    expect(writePlusMinus(rounded('0.125', '0.115'))).toBe('0.12 ± 0.12');
    expect(writePlusMinus(rounded('0.135', '0.125'))).toBe('0.14 ± 0.13');
  });
});

describe('asymmetric errors', () => {
  test('that differ by less than 10 % of their mean become the mean', () => {
    expect(writePlusMinus(rounded('0.827', { plus: '0.121', minus: '0.119' }))).toBe('0.83 ± 0.12');
  });

  test('that differ by 10 % or more are rounded by the smaller one', () => {
    expect(writePlusMinus(rounded('0.827', { plus: '0.367', minus: '0.119' }))).toBe('0.83 +0.37 −0.12');
    expect(writeParentheses(rounded('0.827', { plus: '0.367', minus: '0.119' }))).toBeUndefined();
  });

  test('exactly 10 % of the mean is no longer less', () => {
    expect(writePlusMinus(rounded('2', { plus: '0.21', minus: '0.19' }))).toBe('2.00 +0.21 −0.19');
    expect(writePlusMinus(rounded('2', { plus: '0.2099', minus: '0.1901' }))).toBe('2.00 ± 0.20');
  });
});

describe('several errors', () => {
  test('the smallest decides the place of all', () => {
    expect(
      writePlusMinus(rounded('0.131533', '0.00213', '0.000099', '0.0031'), ['truncation', 'ambiguity', 'input']),
    ).toBe('0.13153 ± 0.00213 (truncation) ± 0.00010 (ambiguity) ± 0.00310 (input)');
    expect(writeParentheses(rounded('1.23456', '0.0412', '0.112'))).toBe('1.23(4)(11)');
  });

  test('a zero decides nothing', () => {
    expect(writePlusMinus(rounded('1.23456', '0.0412', '0'))).toBe('1.23 ± 0.04 ± 0.00');
  });

  test('without any error above zero nothing is rounded', () => {
    expect(roundPdg('1.23456', ['0'])).toBeUndefined();
    expect(roundPdg('1.23456', [])).toBeUndefined();
    expect(roundPdg('1.23456', ['infinite'])).toBeUndefined();
  });
});

test('an error keeps one digit, or two up to 35 or for a leading 1 rounded up', () => {
  fc.assert(
    fc.property(fc.bigInt({ min: 1n, max: 10n ** 12n }), fc.integer({ min: -20, max: 5 }), (coefficient, exponent) => {
      const text = `${coefficient}e${exponent}`;
      const result = rounded('0', text);
      const kept = Number(result.errors[0]?.plus.coefficient);
      expect(kept >= 4 && kept <= 35).toBe(true);
      const d = parseDecimal(text);
      expect(d === undefined ? undefined : pdgPlace(d)).toBe(result.value.exponent);
    }),
    { numRuns: RUNS },
  );
});
