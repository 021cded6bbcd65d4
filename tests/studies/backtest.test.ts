import { describe, expect, test } from 'vitest';
import { parseSeries, parseUncertain, isNumberProblem } from '../../src/series/index.js';
import type { ReadNumber, Series } from '../../src/series/index.js';
import { backtest, pool } from '../../src/studies/index.js';
import type { BacktestMethod, BacktestResult } from '../../src/studies/index.js';
import { intervalScore, scoreOf } from '../../src/studies/backtesting/score.js';
import { readBench } from '../support/expansions.js';

const number = (text: string): ReadNumber => {
  const value = parseUncertain(text);
  if (isNumberProblem(value)) throw new Error(value.problem);
  return value;
};

const plain = (coefficients: readonly string[], more = ''): Promise<Series> =>
  parseSeries(
    `format: 1\ntitle: t\nvariable: x\nfirst power: 0\n${more}coefficients: [${coefficients.map((c) => `'${c}'`).join(', ')}]\n`,
    { name: 't', form: 'yaml' },
  );

const run = async (series: Series | Promise<Series>, at: string, hide = 3, exact?: string): Promise<BacktestResult> =>
  backtest(await series, number(at), {
    hide,
    by: ['fixed-order', 'least-term', 'pade', 'borel-pade'],
    digits: 15,
    request: {},
    ...(exact === undefined ? {} : { exact: number(exact) }),
  });

const method = (result: BacktestResult, name: string): BacktestMethod => {
  const found = result.prescriptions.find((p) => p.prescription === name);
  if (found === undefined) expect.fail(`no ${name}`);
  return found;
};

/** The first coefficients of a bench series, and its sum at a coupling. */
function bench(id: string, count: number, place: number): { series: Promise<Series>; at: string; exact: string } {
  const b = readBench(id);
  const reference = b.references[place];
  if (reference === undefined) expect.fail('no reference');
  const coefficients = b.coefficients.slice(0, count).map((c) => c.rational?.toString() ?? '');
  return { series: plain(coefficients), at: reference.x, exact: reference.pv };
}

const EULER = ['1', '-1', '2', '-6', '24', '-120', '720'];

describe('a method that is exact on its class', () => {
  test('Borel–Padé on the Euler series: no bias against its own value, next coefficients exact', async () => {
    const result = await run(plain(EULER), '0.1');
    const borel = method(result, 'borel-pade');
    expect(borel.records.find((r) => r.against === 'own value')).toMatchObject({
      tested: 3,
      inside: 3,
      bias: '0',
      score: '0',
    });
    expect(borel.trials.map((t) => t.next?.miss)).toEqual(['0', '0', '0']);
    expect(borel.trials.map((t) => t.next?.order)).toEqual([6, 5, 4]);
    // The known sum lies off the truth by its own error, which is allowed for.
    expect(borel.records[0]).toMatchObject({ against: 'known sum', verdict: 'good', score: '0' });
  });

  test('Padé on a rational function: next coefficients exact, values exact', async () => {
    // (1 + x)/(1 - 3x + x²), by its recurrence c_n = 3 c_{n-1} - c_{n-2}.
    const result = await run(plain(['1', '4', '11', '29', '76', '199', '521', '1364']), '0.1', 2);
    const pade = method(result, 'pade');
    expect(pade.trials.map((t) => t.next?.miss)).toEqual(['0', '0']);
    expect(pade.records.find((r) => r.against === 'own value')).toMatchObject({ bias: '0', inside: 2 });
  });

  test('the Padé prediction of the Euler series is the hand-worked one', async () => {
    // [1/2] of 1 - x + 2x² - 6x³ is (1 + 3x)/(1 + 4x + 2x²): next coefficient -4(-6) - 2(2) = 20.
    const trial = method(await run(plain(EULER), '0.1'), 'pade').trials.find((t) => t.hidden === 3);
    expect(trial?.next).toMatchObject({ order: 4, predicted: '20', actual: '24', miss: '-0.167' });
  });
});

describe('targets', () => {
  test('an exact sum comes first; Borel–Padé covers it, the known sum is named beside it', async () => {
    const { series, at, exact } = bench('s01_euler_alternating', 7, 1);
    const borel = method(await run(series, at, 3, exact), 'borel-pade');
    expect(borel.records.map((r) => r.against)).toEqual(['exact', 'known sum', 'own value']);
    expect(Number(borel.records[0]?.bias)).toBeCloseTo(0, 12);
  });

  test('beyond the least term the sum is no target: own value only, said in words', async () => {
    const { series, at } = bench('s02_euler_nonalternating', 12, 3);
    const result = await run(series, at);
    expect(result.target.against).toBe('own value');
    expect(result.target.statement).toMatch(/stability, not correctness/);
    for (const p of result.prescriptions) for (const r of p.records) expect(r.against).toBe('own value');
    expect(result.estimates.filter((e) => e.about === 'remainder').every((e) => e.records.length === 0)).toBe(true);
  });

  test('with the exact principal value, fixed order past the least term misses, Borel–Padé does not', async () => {
    const { series, at, exact } = bench('s02_euler_nonalternating', 12, 3);
    const result = await run(series, at, 3, exact);
    const miss = (name: string): number => Math.abs(Number(method(result, name).records[0]?.bias));
    expect(miss('borel-pade')).toBeLessThan(1e-12);
    expect(miss('fixed-order')).toBeGreaterThan(1e-3);
  });

  test('a measurement without a unit is a target with its error', async () => {
    const series = await plain(EULER, 'measurement: 0.92(1)\n');
    const fixed = method(await run(series, '0.1'), 'fixed-order');
    expect(fixed.records[0]).toMatchObject({ against: 'measurement', tested: 3, inside: 3 });
  });

  test('a rounded decimal given as exact counts with half a unit of its last digit', async () => {
    const borel = method(await run(plain(EULER), '0.1', 1, '0.9156'), 'borel-pade');
    expect(borel.records[0]).toMatchObject({ against: 'exact', inside: 1, verdict: 'good' });
    const wrong = method(await run(plain(EULER), '0.1', 1, '0.9157'), 'borel-pade');
    expect(wrong.records[0]).toMatchObject({ inside: 0 });
  });
});

describe('hiding', () => {
  test('leaves two coefficients, and says when nothing can be hidden', async () => {
    expect((await run(plain(['1', '2', '3', '4']), '0.1')).hidden).toEqual([1, 2]);
    const short = await run(plain(['1', '2']), '0.1');
    expect(short.hidden).toEqual([]);
    expect(short.cautions.map((c) => c.code)).toContain('too-short');
  });

  test('what is hidden does not leak: the last coefficient changes no prediction', async () => {
    const a = await run(plain(EULER), '0.1', 1);
    const b = await run(plain([...EULER.slice(0, -1), '777']), '0.1', 1);
    const values = (r: BacktestResult) => r.prescriptions.map((p) => p.trials[0]?.value);
    expect(values(a)).toEqual(values(b));
  });

  test('estimated coefficients at the end are no test', async () => {
    const series = await plain(EULER);
    const last = series.coefficients.map((c, n) => (n === 6 ? { ...c, status: 'estimated' as const } : c));
    const result = await run({ ...series, coefficients: last }, '0.1', 1);
    expect(result.known).toBe(6);
    expect(result.cautions.map((c) => c.code)).toContain('estimated-left-out');
  });
});

describe('scores', () => {
  const miss = (m: number, error: number, targetError = 0) => ({ hidden: 1, miss: m, error, targetError });

  test('by hand: one inside, one outside', async () => {
    const score = scoreOf([miss(0.1, 0.2), miss(-0.5, 0.3)]);
    expect(score).toMatchObject({ tested: 2, inside: 1 });
    expect(score?.bias).toBeCloseTo(-0.2, 14);
    expect(score?.sharpness).toBeCloseTo(0.25, 14);
    // (2·0.2 + 2·0.3 + 6.25·0.2)/2
    expect(score?.score).toBeCloseTo(1.125, 14);
    expect(score?.worst).toBeCloseTo(5 / 3, 14);
  });

  test("the target's error widens in quadrature", async () => {
    expect(scoreOf([miss(0.5, 0.3, 0.4)])).toMatchObject({ inside: 1 });
    expect(scoreOf([miss(0.51, 0.3, 0.4)])).toMatchObject({ inside: 0 });
  });

  test('saying no error is no way to a good score: a point gets no allowance for the error of the target', async () => {
    const silent = scoreOf([{ hidden: 1, miss: 0.1, targetError: 0.4 }]);
    expect(silent).toMatchObject({ inside: 1 });
    expect(silent?.score).toBeCloseTo(6.25 * 0.1, 14);
    expect(scoreOf([miss(0.1, 0.1, 0.4)])?.score).toBeCloseTo(0.2, 14);
  });

  test('the interval score is least, on average, for the true 68 % interval of a uniform truth', async () => {
    const grid = Array.from({ length: 2001 }, (_, i) => i / 1000 - 1);
    const mean = (half: number): number =>
      grid.reduce((sum, y) => sum + intervalScore(-half, half, y, 0, 0.32), 0) / grid.length;
    for (const half of [0.5, 0.6, 0.76, 0.9]) expect(mean(0.68)).toBeLessThan(mean(half));
  });

  test('pooling adds tests and inside, method by method', async () => {
    const results = [await run(plain(EULER), '0.1'), await run(plain(EULER.slice(0, 5)), '0.1')];
    const fixed = pool(results).find((m) => m.method === 'fixed-order');
    expect(fixed).toMatchObject({ series: 2, tested: 6, inside68: 6, coverage68: '1.00' });
    expect(pool(results).find((m) => m.method === 'last-term')).toMatchObject({ tested: 6, about: 'next term' });
  });
});
