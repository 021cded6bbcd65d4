/** Closed forms of coefficients: what is written reads back to the same polynomial, and to the same number. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { Rational, doubleField, rationalField } from '../../src/numerics/index.js';
import { addFormal, equalsFormal, mulSeries, negFormal, scaleFormal } from '../../src/qcd/index.js';
import type { Formal } from '../../src/qcd/index.js';
import { decimalText, parseSeries } from '../../src/series/index.js';
import { dualRing } from '../../src/studies/derive/dual.js';
import { formalText, rationalText } from '../../src/studies/derive/formal-text.js';
import { rationalPower } from '../../src/studies/derive/powers.js';
import { FormalReader } from '../../src/studies/derive/read-formal.js';
import { formalLog } from '../../src/studies/derive/symbols.js';

const runs = Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? 1);

const rational = fc
  .tuple(fc.integer({ min: -999_999, max: 999_999 }), fc.integer({ min: 1, max: 5000 }))
  .map(([a, b]) => Rational.of(a, b));
const symbol = fc.constantFrom(
  'pi',
  'pi^-1',
  'zeta(3)',
  'zeta(5)',
  'log(2)',
  'log(3)',
  'gamma_euler',
  'li4_half',
  'pi^2*zeta(3)',
  'log(2)^3',
  'log(59/7)',
);
const polynomial: fc.Arbitrary<Formal> = fc
  .array(fc.tuple(fc.oneof(fc.constant(''), symbol), rational), { maxLength: 6 })
  .map((terms) =>
    terms.reduce<Formal>((sum, [name, q]) => addFormal(sum, { terms: q.isZero() ? new Map() : new Map([[name, q]]) }), {
      terms: new Map(),
    }),
  );

async function readBack(texts: readonly string[], more = ''): Promise<readonly (Formal | undefined)[]> {
  const series = await parseSeries(`${more}\ncoefficients: ${JSON.stringify(texts)}\n`, { name: 't', form: 'yaml' });
  const reader = new FormalReader(series);
  return Promise.all(series.coefficients.map((c) => reader.read(c.value)));
}

describe('closed forms', () => {
  test('read back to the same polynomial', async () => {
    await fc.assert(
      fc.asyncProperty(polynomial, async (a) => {
        const [back] = await readBack([formalText(a)]);
        expect(back !== undefined && equalsFormal(a, back), formalText(a)).toBe(true);
      }),
      { numRuns: 60 * runs },
    );
  });

  test('are written in one way, constants first', () => {
    const terms = new Map([['zeta(3)', Rational.of(-11)], ['', Rational.of(365, 24)], ['pi^2', Rational.ONE], ['pi^-1', Rational.of(1, 3)]]); // prettier-ignore
    expect(formalText({ terms })).toBe('365/24 + 1/3/pi - 11*zeta(3) + pi^2');
    expect(formalText({ terms: new Map() })).toBe('0');
  });

  test.each([
    ['zeta(2)', 'pi^2/6', true],
    ['zeta(4)', 'pi^4/90', true],
    ['log(8)', '3*log(2)', true],
    ['log(6/35)', 'log(2) + log(3) - log(5) - log(7)', true],
    ['log(7/59)', '-log(59/7)', true],
    ['(1 + pi)^2/pi', '1/pi + 2 + pi', true],
    ['1/(2*pi^2)', '0.5*pi^-2', true],
    ['zeta(3)', 'zeta(5)', false],
  ])('%s and %s: the same polynomial %s', async (one, other, same) => {
    const [a, b] = await readBack([one, other]);
    expect(a !== undefined && b !== undefined && equalsFormal(a, b)).toBe(same);
  });

  test('names of the file and nf are replaced; what does not fit has no form', async () => {
    const [a, b, c] = await readBack(
      ['b0*nf - 33/4*nf + 1', '1/(1 + pi)', 'sqrt(3)^2'],
      'flavours: 3\nconstants: { b0: 11 - 2/3*nf }',
    );
    expect(a && formalText(a)).toBe('13/4');
    expect(b).toBeUndefined();
    expect(c && formalText(c)).toBe('sqrt(3)^2');
  });

  test('logarithms: the inverse is the negative', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 5000 }), fc.integer({ min: 1, max: 5000 }), (p, q) => {
        const x = Rational.of(p, q);
        expect(equalsFormal(formalLog(x), negFormal(formalLog(x.inv())))).toBe(true);
      }),
      { numRuns: 200 * runs },
    );
    expect(equalsFormal(formalLog(Rational.of(16, 9)), scaleFormal(formalLog(Rational.of(4, 3)), Rational.of(2)))).toBe(
      true,
    );
  });

  test('rationals as fractions or decimals, whichever reads better, never another number', () => {
    expect(rationalText(Rational.of(9, 4))).toBe('9/4');
    expect(rationalText(Rational.parse('-49.0757') ?? Rational.ZERO)).toBe('-49.0757');
    expect(decimalText(Rational.of(1, 3))).toBeUndefined();
    expect(decimalText(Rational.of(-1, 8))).toBe('-0.125');
    expect(decimalText(Rational.of(12000, 1))).toBe('12000');
    expect(decimalText(Rational.of(-24n * 10n ** 15n, 1n))).toBe('-2.4e16');
    expect(decimalText(Rational.of(3n, 2n * 10n ** 30n))).toBe('1.5e-30');
    for (const text of ['0', '1e15', '100000000000000', '1.25e-20', '-3.000001', '123456789012345678901234'])
      expect(
        Rational.parse(decimalText(Rational.parse(text)!)!)!
          .sub(Rational.parse(text)!)
          .isZero(),
      ).toBe(true);
    fc.assert(
      fc.property(rational, (q) => {
        expect(Rational.parse(rationalText(q))?.equals(q)).toBe(true);
      }),
    );
  });
});

describe('helpers of the algebra', () => {
  test('a rational power is the power: (a^(p/q))^q = a^p in rationals', () => {
    fc.assert(
      fc.property(
        fc.array(rational, { minLength: 1, maxLength: 5 }),
        fc.integer({ min: 1, max: 4 }),
        fc.integer({ min: 2, max: 5 }),
        (list, p, q) => {
          const a = [Rational.ONE, ...list];
          const n = a.length;
          const power = (base: readonly Rational[], k: number): Rational[] => {
            let product: Rational[] = [Rational.ONE, ...list.map(() => Rational.ZERO)];
            for (let i = 0; i < k; i++) product = mulSeries(rationalField, product, base, n);
            return product;
          };
          const root = rationalPower(rationalField, a, Rational.of(p, q), n);
          expect(power(root, q).map(String)).toEqual(power(a, p).map(String));
        },
      ),
      { numRuns: 40 * runs },
    );
  });

  test('derivatives agree with difference quotients', () => {
    const a = [1, 0.3, -0.7, 2.1];
    const step = 1e-6;
    const up = rationalPower(doubleField, [1, 0.3 + step, -0.7, 2.1], Rational.of(-2, 3), 4);
    const down = rationalPower(doubleField, [1, 0.3 - step, -0.7, 2.1], Rational.of(-2, 3), 4);
    const dual = rationalPower(dualRing, a.map((value, i) => ({ value, slopes: i === 1 ? [0, 1] : [] })), Rational.of(-2, 3), 4); // prettier-ignore
    dual.forEach((d, i) => {
      expect(d.slopes[1] ?? 0).toBeCloseTo(((up[i] ?? NaN) - (down[i] ?? NaN)) / (2 * step), 7);
      expect(d.slopes[0] ?? 0).toBe(0);
    });
    const quotient = dualRing.div({ value: 3, slopes: [1] }, { value: 4, slopes: [0, 2] });
    expect([quotient.value, ...quotient.slopes]).toEqual([0.75, 0.25, -0.375]);
  });
});
