/** Numbers with errors: exact values, both kinds of error, and the misreadings that are refused. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { isNumberProblem, parseUncertain } from '../../src/series/index.js';
import type { ReadNumber } from '../../src/series/index.js';

const CASES = 300 * Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? 1);

function read(text: string): ReadNumber {
  const found = parseUncertain(text);
  if (isNumberProblem(found)) throw new Error(`${text}: ${found.problem}`);
  return found;
}

const shown = (text: string): string => {
  const { value, error } = read(text);
  const errors = error === undefined ? [] : [error.plus.toString(), error.minus.toString()];
  return [value.rational!.toString(), ...errors].join(' ');
};

describe('parseUncertain', () => {
  test.each([
    ['0.11800000000000000000000000001', '11800000000000000000000000001/100000000000000000000000000000'],
    ['-12.5e-3', '-1/80'],
    ['365/24', '365/24'],
    ['1.5/2', '3/4'],
    ['.5', '1/2'],
    ['+2', '2'],
    ['−3.5', '-7/2'],
    ['0.1180(9)', '59/500 9/10000 9/10000'],
    ['1.234(56)e-3', '617/500000 7/125000 7/125000'],
    ['34(12)', '34 12 12'],
    ['11(1)e3', '11000 1000 1000'],
    ['827.37(21.5)', '82737/100 43/2 43/2'],
    ['0.25 +- 0.03', '1/4 3/100 3/100'],
    ['0.25+/-0.03', '1/4 3/100 3/100'],
    ['0.25 ± 3/100', '1/4 3/100 3/100'],
    ['0.25 +0.03 -0.02', '1/4 3/100 1/50'],
    ['0.25 -0.02 +0.03', '1/4 3/100 1/50'],
    ['0.25(+3-2)', '1/4 3/100 1/50'],
    ['0.25(+0.03 -0.02)', '1/4 3/100 1/50'],
    ['(5.98 +- 0.64)e-4', '299/500000 1/15625 1/15625'],
    ['(0.25 +0.03 -0.02)e1', '5/2 3/10 1/5'],
  ])('%s', (text, wanted) => expect(shown(text)).toBe(wanted));

  test.each([
    ['1.000', 4],
    ['0.0120', 3],
    ['8.215e3', 4],
    ['-4.0', 2],
    ['5', undefined],
    ['1e300', undefined],
    ['1/3', undefined],
    ['0.000', undefined],
    ['0.25(3)', undefined],
  ])('significant digits of %s: %s', (text, digits) => expect(read(text).significantDigits).toBe(digits));

  test.each([
    ['', 'nothing'],
    ['NaN', 'not a finite number'],
    ['-Infinity', 'not a finite number'],
    ['1,000', 'commas'],
    ['0,25', 'decimal comma'],
    ['1_000', 'underscore'],
    ['1 000', 'gaps'],
    ['0x10', 'not decimal'],
    ['1e', 'exponent without digits'],
    ['1..2', 'two decimal points'],
    ['--2', 'two signs'],
    ['10%', 'percentage'],
    ['2+3i', 'complex'],
    ['1/0', 'divides by zero'],
    ['1.2(3)(4)', 'several errors'],
    ['1 +- 2 +- 3', 'several errors'],
    ['1 +- -2', 'negative error'],
    ['1 +- x', 'has the error "x"'],
    ['1(a)', 'has the error "a"'],
    ['0.25 + 0.03 - 0.02', 'may be a sum'],
    ['0.25+0.03-0.02', 'may be a sum'],
    ['1e20001', 'exponent 20001'],
    ['1e999999999', 'exponent 999999999'],
    ['9'.repeat(10_001), '10,001 characters'],
    ['pi', 'is not a number'],
    ['2*3', 'is not a number'],
    ['1/2/3', 'is not a number'],
    ['0.25 +0.03 +0.02', 'is not a number'],
  ])('refuses %s', (text, reason) => {
    const found = parseUncertain(text);
    expect(isNumberProblem(found) ? found.problem : 'read').toContain(reason);
  });

  test('any decimal keeps all its digits', () => {
    const digits = fc.stringMatching(/^[0-9]{1,60}$/);
    fc.assert(
      fc.property(
        digits,
        digits,
        fc.integer({ min: -300, max: 300 }),
        fc.boolean(),
        (whole, fraction, exponent, minus) => {
          const { value } = read(`${minus ? '-' : ''}${whole}.${fraction}e${exponent}`);
          const q = value.rational!;
          const scale = exponent - fraction.length;
          const n = BigInt(whole + fraction) * (minus ? -1n : 1n);
          // q = n·10^scale, without division.
          if (scale >= 0) expect(q.num).toBe(n * 10n ** BigInt(scale) * q.den);
          else expect(q.num * 10n ** BigInt(-scale)).toBe(n * q.den);
        },
      ),
      { numRuns: CASES },
    );
  });

  test('the error in parentheses is in units of the last digit', () => {
    fc.assert(
      fc.property(fc.nat(999_999), fc.integer({ min: 0, max: 9 }), fc.nat(9_999), (n, decimals, error) => {
        const padded = n.toString().padStart(decimals + 1, '0');
        const text = decimals === 0 ? padded : `${padded.slice(0, -decimals)}.${padded.slice(-decimals)}`;
        const found = read(`${text}(${error})`);
        expect(found.error!.plus.num * 10n ** BigInt(decimals)).toBe(BigInt(error) * found.error!.plus.den);
      }),
      { numRuns: CASES },
    );
  });
});
