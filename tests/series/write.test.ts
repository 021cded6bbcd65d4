/** Writing: what is written reads back to the same series. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { R, Rational, exact, exactReal, pi } from '../../src/numerics/index.js';
import type { Exact } from '../../src/numerics/index.js';
import { catalogueIds, loadSeries, parseSeries, textOf, writeSeries } from '../../src/series/index.js';
import type { Series } from '../../src/series/index.js';

const CASES = 60 * Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? 1);

/** Plain data for comparison: rationals as p/q, enclosures as their text and 40 digits. */
function plain(value: unknown): unknown {
  if (value instanceof Rational) return value.toString();
  if (Array.isArray(value)) return value.map(plain);
  if (typeof value !== 'object' || value === null) return value;
  if ('ball' in value) {
    const number = value as Exact;
    if (number.rational !== undefined) return number.rational.toString();
    return `${textOf(number)} ${R.round(number.ball(200), 130).mid.toString()}`;
  }
  return Object.fromEntries(Object.entries(value).map(([key, part]) => [key, plain(part)]));
}

const again = async (series: Series): Promise<Series> =>
  parseSeries(writeSeries(series), { name: series.id, form: 'yaml' });

/** The texts of errors are rewritten (`{value, error}` becomes one text); everything else must be the same. */
function comparable(series: Series): unknown {
  const strip = (x: unknown): unknown => {
    if (Array.isArray(x)) return x.map(strip);
    if (typeof x !== 'object' || x === null) return x;
    return Object.fromEntries(
      Object.entries(x)
        .filter(([key]) => key !== 'text' || !('value' in x) || !('error' in x))
        .map(([key, part]) => [key, strip(part)]),
    );
  };
  return strip(plain(series));
}

test('strong-coupling exponents', async () => {
  const file = '{"strong coupling": {"power": "1/3", "spacing": "2/3"}, "coefficients": ["1", "-1"]}';
  const series = await parseSeries(file, { name: 'x' });
  expect(series.strongCoupling?.power.toString()).toBe('1/3');
  expect(comparable(await again(series))).toEqual(comparable(series));
});

const ids = await catalogueIds();

describe('the catalogue', () => {
  test.each(ids)('%s', async (id) => {
    const series = await loadSeries(id);
    expect(comparable(await again(series))).toEqual(comparable(series));
    // Written once more it does not change.
    expect(writeSeries(await again(series))).toBe(writeSeries(series));
  });
});

describe('any series', () => {
  const rational = fc
    .tuple(fc.bigInt(-(10n ** 30n), 10n ** 30n), fc.bigInt(1n, 10n ** 12n))
    .map(([n, d]) => Rational.of(n, d));
  const positive = rational.map((q) => (q.isZero() ? Rational.ONE : q.abs()));
  const text = fc.string({ minLength: 1, maxLength: 40, unit: 'grapheme' }).filter((s) => s.trim() === s && s !== '');
  const number = fc.oneof(
    fc.constantFrom(
      '1.000',
      '0.25(3)',
      '0.25 +0.03 -0.02',
      '365/24',
      '2*pi/3',
      'zeta(3) +- 0.1',
      '1e-400',
      '-1.5(+3-2)',
    ),
    rational.map((q) => q.toString()),
    fc.tuple(rational, positive).map(([q, e]) => `${q.toString()} +- ${e.toString()}`),
    fc.tuple(fc.integer(), fc.nat(5)).map(([n, k]) => `${n}.${'0'.repeat(k)}7`),
  );
  const coefficient = fc.oneof(
    number.map((n) => n as unknown),
    fc.record({
      value: rational.map(String),
      error: positive.map(String),
      status: fc.constantFrom('computed', 'estimated'),
    }),
    fc.record({
      value: fc.constant('nf*pi'),
      error: fc.record({ plus: positive.map(String), minus: positive.map(String) }),
    }),
  );
  const document = fc.record(
    {
      format: fc.constant('1'),
      title: text,
      quantity: text,
      sources: fc.array(fc.oneof(text, fc.record({ text, status: text })), { maxLength: 3 }),
      notes: fc.array(text, { maxLength: 3 }),
      invented: fc.constantFrom('true', 'false'),
      coupling: fc.record({ name: text, divisor: fc.constantFrom('1', 'pi', '2*pi', '4*pi') }),
      'first power': fc.integer({ min: -100, max: 100 }),
      scheme: text,
      flavours: fc.integer({ min: 0, max: 16 }),
      'flavour choices': fc.array(fc.integer({ min: 0, max: 16 }), { minLength: 1, maxLength: 4 }),
      'scale ratio': fc.oneof(positive.map(String), fc.constant('sqrt(2)')),
      'hard scale': fc.tuple(positive, fc.constantFrom('GeV', 'MeV')).map(([q, unit]) => `${q.toString()} ${unit}`),
      factor: fc.oneof(positive.map(String), fc.constant('-4*pi')),
      additive: rational.map(String),
      constants: fc.constant({ k: '2*pi', q: 'k^2' }),
      coefficients: fc.array(coefficient, { minLength: 1, maxLength: 6 }),
      singularities: fc.array(
        fc.oneof(
          fc.record({ dimension: positive.map(String), 'anomalous dimension': rational.map(String) }),
          fc.record({ u: positive.map((q) => `-${q.toString()}`), exponent: rational.map(String), strength: number }),
          fc.record({ t: fc.constant('6/25*pi'), kind: fc.constantFrom('infrared', 'other') }),
        ),
        { maxLength: 3 },
      ),
      condensates: fc.array(
        fc.record({
          dimension: fc.constant('4'),
          name: text,
          wilson: positive.map(String),
          value: number,
          unit: fc.constant('GeV^4'),
        }),
        { maxLength: 2 },
      ),
      measurement: fc.record({ value: rational.map(String), error: positive.map(String), unit: text, source: text }),
    },
    { requiredKeys: ['coefficients', 'flavours', 'coupling'] },
  );

  test('reads back', async () => {
    await fc.assert(
      fc.asyncProperty(document, async (data) => {
        const series = await parseSeries(JSON.stringify(data), { name: 'any', form: 'yaml' });
        const back = await again(series);
        expect(comparable(back)).toEqual(comparable(series));
        expect(writeSeries(back)).toBe(writeSeries(series));
      }),
      { numRuns: CASES },
    );
  });
});

describe('computed values', () => {
  test('one without a text is written with sixty digits', async () => {
    const base = await parseSeries('[1, 2]', { name: 'computed' });
    const value = exactReal((prec) => R.mul(pi(prec), R.fromRational(Rational.parse('-1e40')!, prec), prec));
    const text = writeSeries({ ...base, coefficients: [{ value, text: 'stale', status: 'computed' }] });
    expect(text).toContain('- -3.14159265358979323846264338327950288419716939937510582097494e40');
  });
  test('a stale text is not believed', async () => {
    const base = await parseSeries('[0.25(3)]', { name: 'computed' });
    const halved = { ...base.coefficients[0]!, value: exact(Rational.of(1, 8)) };
    const back = await again({ ...base, coefficients: [halved] });
    expect(back.coefficients[0]!.value.rational?.toString()).toBe('1/8');
    expect(back.coefficients[0]!.error?.plus.toString()).toBe('3/100');
  });
});
