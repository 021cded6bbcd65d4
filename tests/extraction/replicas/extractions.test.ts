/** @module Monte Carlos of real extractions: linear widths against the extraction's own slopes, replicas against linear widths. */
import { describe, expect, test } from 'vitest';
import type { Problem, Quantity } from '../../../src/extraction/problem.js';
import { buildReplicas } from '../../../src/extraction/replicas/build.js';
import { Engine } from '../../../src/extraction/replicas/engine.js';
import { singleSource } from '../../../src/extraction/replicas/from-extraction.js';
import type { ReplicaResult } from '../../../src/extraction/replicas/result.js';
import { runReplicas } from '../../../src/extraction/replicas/run.js';
import { summarise } from '../../../src/extraction/replicas/summary.js';
import { replicate } from '../../../src/extraction/replicas/study.js';
import { firstFit, fitSetting } from '../../../src/extraction/fit/fit.js';
import { thresholdSeries } from '../../../src/extraction/threshold-mass.js';
import { PRESCRIPTIONS } from '../../../src/prescriptions/index.js';
import type { Prescription } from '../../../src/prescriptions/index.js';
import type { Solved } from '../../../src/extraction/solve.js';
import { chosen, settingOf, solveAll } from '../../../src/extraction/setting.js';
import type { Shifts } from '../../../src/extraction/place.js';
import { DEFAULT_THRESHOLDS, isRefusal } from '../../../src/qcd/index.js';
import { loadSeries } from '../../../src/series/index.js';
import type { Series } from '../../../src/series/index.js';

const quantity = (value: string, error: number, dimension?: number): Quantity => ({
  text: `${value} +- ${error}`,
  value,
  plus: error,
  minus: error,
  ...(dimension === undefined ? {} : { dimension }),
});

const problem = (more: Partial<Problem> & Pick<Problem, 'for' | 'data'>): Problem => ({
  truncationBy: 'own',
  ambiguityBy: 'im/pi',
  condensates: [],
  fileCondensates: false,
  loops: 5,
  thresholds: DEFAULT_THRESHOLDS,
  digits: 15,
  ...more,
});

const ALPHA = quantity('0.1180', 0.0009);
const AT_MZ = { scale: 91.1879, flavours: 5 };

/** Tests are about the Monte Carlo: prescriptions that are quick to solve by. */
const SOME = ['fixed-order', 'pade', 'borel-pade', 'singularity-model'];

const CASES: readonly (readonly [string, string, Problem])[] = [
  [
    'α_s from the tau width',
    'tau-delta0-estimate',
    problem({
      for: 'alpha_s',
      data: [{ series: 'tau-delta0-estimate', measured: quantity('0.2042', 0.0005) }],
      prescriptions: [...SOME, 'borel-conformal', 'borel-partial-pade'],
    }),
  ],
  [
    'the charm mass from a moment',
    'charm-moment-1',
    problem({
      for: 'mass',
      data: [
        {
          series: 'charm-moment-1',
          measured: quantity('0.2166', 0.0031, -2),
          massPower: -2,
          norm: quantity('1/4', 0),
        },
      ],
      alphaS: ALPHA,
      prescriptions: SOME,
    }),
  ],
  [
    'the pole mass of the top quark',
    'pole-msbar',
    problem({
      for: 'pole-mass',
      data: [{ series: 'pole-msbar' }],
      alphaS: ALPHA,
      mass: quantity('162.5', 1.8, 1),
      prescriptions: SOME,
    }),
  ],
  [
    'the gluon condensate in the Adler function',
    'adler',
    problem({
      for: 'condensate',
      data: [{ series: 'adler', measured: quantity('1.13', 0.02) }],
      alphaS: ALPHA,
      condensate: '<(alpha_s/pi) G G>',
      prescriptions: SOME,
    }),
  ],
];

const prescriptionNamed = (name: string): Prescription => PRESCRIPTIONS.find((p) => p.name === name)!;

async function seriesOf(id: string): Promise<Series> {
  return loadSeries(id, id === 'pole-msbar' ? { flavours: 5 } : {});
}

/** σ from the extraction's own answers to ±1σ of everything that has an error. */
function linearOf(solved: Solved, asked: Problem, series: Series): number {
  const shifts: [Shifts, number][] = [];
  const [datum] = asked.data;
  const both = (size: number, make: (by: number) => [Shifts, number]): void => {
    // A hundredth of a standard deviation: the slope itself.
    if (size > 0) shifts.push(make(size / 100), make(-size / 100));
  };
  both(datum?.measured?.plus ?? 0, (by) => [{}, by]);
  if (asked.for !== 'alpha_s') both(asked.alphaS?.plus ?? 0, (by) => [{ alphaS: by }, 0]);
  if (asked.mass !== undefined) both(asked.mass.plus, (by) => [{ mass: by }, 0]);
  if (asked.for !== 'alpha_s')
    asked.thresholds.forEach((t, i) =>
      both(t.error ?? 0, (by) => [{ thresholds: asked.thresholds.map((_, k) => (k === i ? by : 0)) }, 0]),
    );
  series.coefficients.forEach((c, n) =>
    both(c.error?.plus.toNumber() ?? 0, (by) => [
      { coefficients: series.coefficients.map((_, k) => (k === n ? by : 0)) },
      0,
    ]),
  );
  let square = 0;
  for (let k = 0; k < shifts.length; k += 2) {
    const [up, down] = [solved.shifted(...shifts[k]!), solved.shifted(...shifts[k + 1]!)];
    if (isRefusal(up) || isRefusal(down)) expect.fail('the extraction refuses a shift');
    square += (50 * (up.value - down.value)) ** 2;
  }
  return Math.sqrt(square);
}

describe.each(CASES)('%s', (_, id, asked) => {
  test('linear widths are those of the extraction; the replicas have them within their Monte Carlo error', async () => {
    const series = await seriesOf(id);
    const setting = settingOf(asked, series, asked.data[0]!);
    if (isRefusal(setting)) expect.fail(setting.reason);
    const solved = solveAll(setting, chosen(asked, [series]));
    const built = buildReplicas(singleSource(setting, solved));
    if (isRefusal(built)) expect.fail(built.reason);
    const engine = new Engine(built.problem, 7);
    let compared = 0;
    for (const [p, one] of solved) {
      const place = built.problem.prescriptions.findIndex((m) => m.name === p.name);
      if (isRefusal(one) || place < 0) continue;
      expect(Math.abs(engine.central[place]![0]! / one.number - 1)).toBeLessThan(1e-9);
      const linear = Math.hypot(...engine.responses[place]!.map((r) => r[0]!));
      // The solution answers by its slope, which is a difference quotient.
      expect(Math.abs(linear / linearOf(one, asked, series) - 1), p.name).toBeLessThan(2e-3);
      compared++;
    }
    expect(compared).toBeGreaterThanOrEqual(2);
    const known = await runReplicas(built.problem, { count: 2000, seed: 7, workers: 1 });
    const result = summarise(built.problem, known, 7, built.leftOut);
    for (const row of result.rows) {
      const { ratio, distribution } = row.values[0]!;
      if (!row.stable) continue;
      // Where the response is not linear over the errors, a skewed distribution shows it.
      if (Math.abs(Number(distribution!.skewness.value)) > 0.3) continue;
      expect(Math.abs(Number(ratio!.value) - 1), row.prescription).toBeLessThan(0.02 + 4 * Number(ratio!.error));
    }
  });
});

describe('α_s at M_Z', () => {
  const asked = problem({
    for: 'alpha_s',
    data: [{ series: 'tau-delta0', measured: quantity('0.2042', 0.003) }],
    prescriptions: ['fixed-order', 'borel-pade', 'singularity-model'],
    to: AT_MZ,
  });
  const run = async (more: Partial<Problem> = {}): Promise<ReplicaResult> => {
    const result = await replicate({ ...asked, ...more }, [await loadSeries('tau-delta0')], {
      count: 1500,
      seed: 7,
      workers: 1,
    });
    if (isRefusal(result)) expect.fail(result.reason);
    return result;
  };

  test('is a second quantity, correlated with the first; its thresholds are inputs', async () => {
    const result = await run();
    expect(result.quantities.map((q) => q.symbol)).toEqual(['alpha_s', 'alpha_s(91.1879 GeV)']);
    expect(result.inputs.map((i) => i.name)).toEqual(['measurement of tau-delta0', 'm_c', 'm_b']);
    const [own, atMZ] = result.rows[0]!.values;
    expect(Number(own!.central)).toBeGreaterThan(0.3);
    expect(Number(atMZ!.central)).toBeGreaterThan(0.11);
    expect(Number(atMZ!.central)).toBeLessThan(0.125);
    const { labels, correlation } = result.covariance;
    expect(labels[1]).toBe('fixed-order: alpha_s(91.1879 GeV)');
    expect(Number(correlation[0]![1])).toBeGreaterThan(0.98);
    expect(correlation.every((row, i) => row[i] === '1')).toBe(true);
    expect(result.mixture?.prescriptions).toEqual(['fixed-order', 'borel-pade', 'singularity-model']);
  });

  test('the mixture lies between its prescriptions and is drawn by the seed', async () => {
    const result = await run();
    const medians = result.rows.map((row) => Number(row.values[0]!.distribution!.median.value));
    const mixed = Number(result.mixture!.values[0]!.distribution!.median.value);
    expect(mixed).toBeGreaterThan(Math.min(...medians));
    expect(mixed).toBeLessThan(Math.max(...medians));
    expect(await run()).toEqual(result);
  });

  test('a prescription without a fast version is named and left out', async () => {
    const result = await run({ prescriptions: ['fixed-order', 'fac', 'borel-pade'] });
    expect(result.rows.map((r) => r.prescription)).toEqual(['fixed-order', 'borel-pade']);
    expect(result.leftOut).toEqual([
      { prescription: 'fac', reason: expect.stringContaining('no version that is fast enough') },
    ]);
  });

  test('nothing with an error: no replicas', async () => {
    const exact = { ...asked, data: [{ series: 'tau-delta0', measured: quantity('0.2042', 0) }], thresholds: [] };
    const { to: _to, ...alone } = exact;
    const found = await replicate(alone, [await loadSeries('tau-delta0')], { count: 100, seed: 7, workers: 1 });
    expect(found).toMatchObject({ reason: expect.stringContaining('nothing has an error') });
  });
});

describe('a mass whose series moves with it', () => {
  test('the bottom mass from a PS mass: every input that the extraction shifts, at the slope that it has', async () => {
    const place = { definition: 'ps', scale: 2, light: 4, reference: 4.18 };
    const series = thresholdSeries({ place: { definition: 'ps', scale: 2 }, light: 4 }, place.reference);
    if (isRefusal(series)) expect.fail(series.reason);
    const asked = problem({
      for: 'mass',
      data: [{ series: series.id, measured: quantity('4.484', 0.06, 1), threshold: place }],
      alphaS: ALPHA,
      prescriptions: ['fixed-order'],
    });
    const setting = settingOf(asked, series, asked.data[0]!);
    if (isRefusal(setting)) expect.fail(setting.reason);
    const solved = solveAll(setting, chosen(asked, [series]));
    const [one] = [...solved.values()];
    if (one === undefined || isRefusal(one)) expect.fail('no solution');
    const built = buildReplicas(singleSource(setting, solved));
    if (isRefusal(built)) expect.fail(built.reason);
    expect(built.problem.data[0]!.drift?.maps).toHaveLength(series.coefficients.length);
    // The threshold of the quark whose mass is wanted lies at that mass: it is no input.
    expect(built.problem.inputs.drawn.map((i) => built.problem.inputs.names[i])).not.toContain('m_b');
    const engine = new Engine(built.problem, 7);
    expect(Math.abs(engine.central[0]![0]! / one.number - 1)).toBeLessThan(1e-9);
    const linear = Math.hypot(...engine.responses[0]!.map((r) => r[0]!));
    expect(Math.abs(linear / linearOf(one, asked, series) - 1)).toBeLessThan(2e-3);
  });
});

describe('fits', () => {
  test('mass and α_s from two moments: two parameters with their covariance', async () => {
    const series = [await loadSeries('charm-moment-1'), await loadSeries('charm-moment-2')];
    const asked = problem({
      for: 'mass',
      freeAlphaS: true,
      data: [
        { series: 'charm-moment-1', measured: quantity('0.2166', 0.0031, -2), massPower: -2, norm: quantity('1/4', 0) },
        {
          series: 'charm-moment-2',
          measured: quantity('0.01497', 0.00027, -4),
          massPower: -4,
          norm: quantity('1/16', 0),
        },
      ],
      correlation: [
        [1, 0.8],
        [0.8, 1],
      ],
      alphaS: ALPHA,
      prescriptions: ['fixed-order'],
    });
    const fitted = fitSetting(asked, series);
    if (isRefusal(fitted)) expect.fail(fitted.reason);
    const first = firstFit(fitted, prescriptionNamed('fixed-order'));
    if (isRefusal(first)) expect.fail(first.reason);
    const result = await replicate(asked, series, { count: 1000, seed: 5, workers: 1 });
    if (isRefusal(result)) expect.fail(result.reason);
    const { parameters, covariance } = first.minimum;
    result.rows[0]!.values.forEach((v, k) => {
      expect(Math.abs(Number(v.central) / parameters[k]! - 1)).toBeLessThan(1e-7);
      // The fit's own covariance holds the measurements; the threshold of the bottom quark adds next to nothing.
      expect(Math.abs(Number(v.linear) / Math.sqrt(covariance[k]![k]!) - 1)).toBeLessThan(0.02);
    });
    const rho = covariance[0]![1]! / Math.sqrt(covariance[0]![0]! * covariance[1]![1]!);
    expect(Math.abs(Number(result.covariance.correlation[0]![1]) - rho)).toBeLessThan(0.1);
  });

  test('two measurements of α_s(M_Z): the width of the weighted mean', async () => {
    const series = [await loadSeries('tau-delta0'), await loadSeries('bjorken')];
    const asked = problem({
      for: 'alpha_s',
      data: [
        { series: 'tau-delta0', measured: quantity('0.2042', 0.003) },
        { series: 'bjorken', measured: quantity('0.85', 0.02), scale: 1.8 },
      ],
      prescriptions: ['fixed-order'],
      thresholds: DEFAULT_THRESHOLDS.map(({ error: _error, ...t }) => t),
      to: AT_MZ,
    });
    const result = await replicate(asked, series, { count: 1000, seed: 7, workers: 1 });
    if (isRefusal(result)) expect.fail(result.reason);
    const both = result.rows[0]!.values[0]!;
    const alone = await Promise.all(
      asked.data.map(async (datum, i) => {
        const found = await replicate({ ...asked, data: [datum] }, [series[i]!], { count: 100, seed: 7, workers: 1 });
        if (isRefusal(found)) expect.fail(found.reason);
        return found.rows[0]!.values[1]!;
      }),
    );
    const weights = alone.map((v) => 1 / Number(v.linear) ** 2);
    const expected = 1 / Math.sqrt(weights.reduce((a, b) => a + b, 0));
    // The slopes of the two are taken at other couplings than the mean: a few per cent.
    expect(Number(both.linear) / expected).toBeCloseTo(1, 1);
    expect(Math.abs(Number(both.ratio!.value) - 1)).toBeLessThan(0.02 + 4 * Number(both.ratio!.error));
  });
});
