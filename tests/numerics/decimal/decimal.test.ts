import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  leadingPlace,
  parseDecimal,
  roundToDigits,
  roundToPlace,
  shorten,
  writeDecimal,
  writePlain,
  writeScientific,
} from '../../../src/numerics/decimal/decimal.js';
import type { Decimal } from '../../../src/numerics/decimal/decimal.js';

const RUNS = 1000 * Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? 1);

const decimals = fc.record({
  coefficient: fc.bigInt({ min: -(10n ** 40n), max: 10n ** 40n }),
  exponent: fc.integer({ min: -60, max: 20 }),
});

const read = (text: string): Decimal => {
  const d = parseDecimal(text);
  if (d === undefined) throw new Error(`${text} was not read`);
  return d;
};

/** |a − b| · 10^−exponent of the finer one, exactly. */
function distance(a: Decimal, b: Decimal): { readonly size: bigint; readonly exponent: number } {
  const exponent = Math.min(a.exponent, b.exponent);
  const lift = (d: Decimal): bigint => d.coefficient * 10n ** BigInt(d.exponent - exponent);
  const size = lift(a) - lift(b);
  return { size: size < 0n ? -size : size, exponent };
}

describe('reading', () => {
  test.each([
    ['0.3156', 3156n, -4],
    ['-12.50e-3', -1250n, -5],
    ['+7', 7n, 0],
    ['.5', 5n, -1],
    ['5.', 5n, 0],
    ['1e400', 1n, 400],
  ])('%s', (text, coefficient, exponent) => {
    expect(parseDecimal(text)).toEqual({ coefficient, exponent });
  });

  test.each(['', '.', 'e5', '1/3', '0.1(2)', 'NaN', 'Infinity', '1_000', '0x10', '--1', '1e9999999'])(
    '"%s" is no decimal number',
    (text) => {
      expect(parseDecimal(text)).toBeUndefined();
    },
  );
});

describe('writing', () => {
  test('both notations read back to the same number', () => {
    fc.assert(
      fc.property(decimals, (d) => {
        for (const text of [writePlain(d), writeScientific(d), writeDecimal(d)]) {
          expect(distance(read(text), d).size).toBe(0n);
        }
      }),
      { numRuns: RUNS },
    );
  });

  test('no zero is invented: 1230 known to three digits keeps its power of ten', () => {
    expect(writeDecimal({ coefficient: 123n, exponent: 1 })).toBe('1.23e3');
    expect(writeDecimal({ coefficient: 1230n, exponent: 0 })).toBe('1230');
  });
});

describe('rounding', () => {
  test('is never farther than half a unit of the last place', () => {
    fc.assert(
      fc.property(decimals, fc.integer({ min: -60, max: 30 }), fc.boolean(), (d, place, even) => {
        const rounded = roundToPlace(d, place, even ? 'half-even' : 'half-up');
        expect(rounded.exponent).toBe(place);
        const { size, exponent } = distance(rounded, d);
        expect(exponent <= place).toBe(true);
        expect(2n * size <= 10n ** BigInt(place - exponent)).toBe(true);
      }),
      { numRuns: RUNS },
    );
  });

  test.each([
    ['12.2135', -3, 'half-even', '12.214'],
    ['12.2145', -3, 'half-even', '12.214'],
    ['12.2145', -3, 'half-up', '12.215'],
    ['-0.05', -1, 'half-even', '0.0'],
    ['-0.05', -1, 'half-up', '-0.1'],
  ] as const)('%s to 10^%i, %s: %s', (text, place, tie, wanted) => {
    expect(writePlain(roundToPlace(read(text), place, tie))).toBe(wanted);
  });

  test.each([
    ['0.131201293847561', 8, '0.13120129'],
    ['9.996', 3, '10.0'],
    ['0.0999951', 3, '0.100'],
    ['1', 8, '1'],
    ['1234567890', 4, '1.235e9'],
    ['0.000001234567', 3, '1.23e-6'],
    ['no number', 3, 'no number'],
  ] as const)('%s to %i digits: %s', (text, digits, wanted) => {
    expect(shorten(text, digits)).toBe(wanted);
  });

  test('keeps at most the digits asked for', () => {
    fc.assert(
      fc.property(decimals, fc.integer({ min: 1, max: 30 }), (d, digits) => {
        const rounded = roundToDigits(d, digits);
        expect(rounded.coefficient.toString().replace('-', '').length).toBeLessThanOrEqual(
          Math.max(digits, d.coefficient.toString().replace('-', '').length > digits ? digits : 99),
        );
        if (rounded.coefficient !== 0n)
          expect(Math.abs(leadingPlace(rounded) - leadingPlace(d))).toBeLessThanOrEqual(1);
      }),
      { numRuns: RUNS },
    );
  });
});
