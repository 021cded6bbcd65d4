/** The bubble chain as a prescription: exact where the series is its chain, corrected where it is not. */
import { describe, expect, test } from 'vitest';
import * as bubbles from '../../src/bubbles/index.js';
import { chainSeries } from '../../src/extraction/index.js';
import { diagnoseGrowth } from '../../src/growth/index.js';
import { R, Rational, exact, toNumberExact } from '../../src/numerics/index.js';
import { BUBBLE_CHAIN, bubbleChain } from '../../src/prescriptions/index.js';
import type { Outcome, Sum } from '../../src/prescriptions/index.js';
import { loadSeries, parseSeries, writeSeries } from '../../src/series/index.js';
import type { Series } from '../../src/series/index.js';
import { expand, prescriptionsNamed, sumStudy } from '../../src/studies/index.js';

const prescription = bubbleChain(bubbles);

function applied(series: Series, at: string, order?: number): Outcome {
  const value = Rational.parse(at);
  if (value === undefined) throw new Error(at);
  const { expansion, growthInput } = expand(series, exact(value), order);
  const [outcome] = prescription.apply(expansion, diagnoseGrowth(growthInput), { digits: 20 });
  if (outcome === undefined) throw new Error('no outcome');
  return outcome;
}

function summed(outcome: Outcome): Sum {
  if (outcome.kind === 'refusal') throw new Error(outcome.reason);
  return outcome;
}

const point = (alpha: string, flavours: number): bubbles.ChainPoint => ({
  alpha: exact(Rational.parse(alpha) ?? Rational.ZERO),
  flavours,
  ratio: exact(1),
});

describe('the chain of a chain', () => {
  test.each(bubbles.QUANTITIES.map((q) => [q.name, q] as const))('%s is summed exactly', (name, quantity) => {
    const at = point('0.22', quantity.flavours);
    const series: Series = { ...chainSeries(quantity, at, 4), bubbleChain: name };
    const sum = summed(applied(series, '0.22'));
    const chain = bubbles.chainSum(quantity, at);
    expect(R.overlaps(sum.value, chain.pv.ball(100))).toBe(true);
    expect(R.overlaps(sum.imaginary!, chain.im.ball(100))).toBe(true);
    expect(R.accuracyBits(sum.value)).toBeGreaterThan(66);
    expect(sum.truncation).toBeLessThan(1e-30);
  });
});

describe('real series', () => {
  test('corrections and chain add up: the Adler function', async () => {
    const series = await loadSeries('adler');
    const sum = summed(applied(series, '0.3'));
    const at = point('0.3', 3);
    const adler = bubbles.quantityNamed('adler')!;
    const x = 0.3 / Math.PI;
    const chain = bubbles.chainCoefficients(adler, 4).map((c, n) => toNumberExact(c) * 2.25 ** n);
    const known = series.coefficients.map((c) => toNumberExact(c.value));
    let expected = 1 + toNumberExact(bubbles.chainSum(adler, at).pv);
    known.forEach((c, n) => (expected += (c - chain[n]!) * x ** (n + 1)));
    expect(R.toNumber(sum.value)).toBeCloseTo(expected, 13);
    expect(sum.truncation).toBeCloseTo(Math.abs(known[3]! - chain[3]!) * x ** 4, 13);
    expect(sum.trust).toBe('indicative');
  });

  test('one coefficient gives the chain alone, with no error to quote', async () => {
    const sum = summed(applied(await loadSeries('adler'), '0.3', 1));
    const pv = bubbles.chainSum(bubbles.quantityNamed('adler')!, point('0.3', 3)).pv;
    expect(R.toNumber(sum.value)).toBeCloseTo(1 + toNumberExact(pv), 14);
    expect(sum.truncation).toBeUndefined();
  });

  test('a sign of the series is that of its first coefficient: 1 − X for the sum rules', async () => {
    const sum = summed(applied(await loadSeries('bjorken'), '0.25', 1));
    const pv = bubbles.chainSum(bubbles.quantityNamed('bjorken')!, point('0.25', 3)).pv;
    expect(R.toNumber(sum.value)).toBeCloseTo(1 - toNumberExact(pv), 14);
  });

  test('its coefficients are those that BLM notes: naive non-abelianisation of the pole mass', async () => {
    const { notes } = summed(applied(await loadSeries('pole-msbar', { flavours: 4 }), '0.22'));
    expect(notes.join(' ')).toContain('13.02 (9.278), 102.0 (94.21)');
  });
});

describe('refusals', () => {
  const reason = (outcome: Outcome): string => (outcome.kind === 'refusal' ? outcome.reason : 'none');
  const file = (lines: string): Promise<Series> =>
    parseSeries(`coupling: { name: alpha_s, divisor: pi }\n${lines}\ncoefficients: [1, 1.6, 6.4]\n`, {
      name: 'mine.yaml',
    });
  test.each([
    ['first power: 1\nscheme: MSbar\nflavours: 3', /no bubble chain is named/],
    ['first power: 1\nscheme: MSbar\nflavours: 3\nbubble chain: adlr', /no bubble chain "adlr"/],
    ['first power: 1\nbubble chain: adler', /running of its coupling/],
    ['first power: 2\nscheme: MSbar\nflavours: 3\nbubble chain: adler', /starts at the power 2/],
    ['first power: 1\nscheme: MSbar\nflavours: 4\nscale ratio: 2\nbubble chain: pole-mass', /mass of the series runs/],
  ])('%s', async (lines, message) => {
    expect(reason(applied(await file(lines), '0.2'))).toMatch(message);
  });
  test('a coupling with the Landau pole above Q', async () => {
    const series = await file('first power: 1\nscheme: MSbar\nflavours: 3\nbubble chain: adler');
    expect(reason(applied(series, '0.9'))).toMatch(/Landau pole/);
  });
});

test('the field survives writing', async () => {
  const series = await loadSeries('adler');
  expect(series.bubbleChain).toBe('adler');
  const back = await parseSeries(writeSeries(series), { name: 'back.yaml' });
  expect(back.bubbleChain).toBe('adler');
});

test('studies take it beside the usual prescriptions', async () => {
  expect(() => prescriptionsNamed([BUBBLE_CHAIN.name])).toThrow(/no prescription "bubble-chain"/);
  const at = { value: exact(Rational.of(3, 10)), text: '0.3' };
  const { values } = sumStudy(await loadSeries('adler'), at, {
    by: [BUBBLE_CHAIN.name],
    more: [prescription],
    digits: 12,
    request: {},
  });
  expect(values[0]?.value).toMatch(/^1\.13/);
});
