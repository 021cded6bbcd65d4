import { Ajv } from 'ajv';
import { describe, expect, test } from 'vitest';
import { readFileSync } from 'node:fs';
import { isNumberProblem, parseSeries, parseUncertain } from '../../src/series/index.js';
import type { ReadNumber } from '../../src/series/index.js';
import { toNumberExact } from '../../src/numerics/index.js';
import {
  assess,
  compare,
  compareScales,
  isGridProblem,
  readGrid,
  verdictRule,
  verdictRules,
} from '../../src/studies/index.js';
import type { Grid } from '../../src/studies/index.js';

const number = (text: string): ReadNumber => {
  const value = parseUncertain(text);
  if (isNumberProblem(value)) throw new Error(value.problem);
  return value;
};
const euler = await parseSeries('1\n-1\n2\n-6\n24\n-120\n720\n', { name: 'euler' });
const options = { digits: 15, request: {} };
/** Those that no quadrature slows down. */
const QUICK = ['fixed-order', 'least-term', 'pade', 'wynn-epsilon', 'levin', 'borel-pade', 'singularity-model'];
const quick = { ...options, by: QUICK };

describe('compare', () => {
  test('one row a prescription, in the order of the list; sorting moves those without a key to the end', async () => {
    const rows = compare(euler, [number('0.1')], quick).rows.map((r) => r.prescription);
    expect(new Set(rows).size).toBe(rows.length);
    expect(rows[0]).toBe('fixed-order');
    const sorted = compare(euler, [number('0.1')], { ...quick, sort: 'truncation' }).rows;
    const keys = sorted.map((r) => (r.truncationError === undefined ? Infinity : Number(r.truncationError)));
    expect(keys).toEqual(keys.toSorted((a, b) => (a === b ? 0 : a - b)));
  });

  test('the same values as an assessment', () => {
    const at = number('0.10(1)');
    const central = assess(euler, at, options).values.filter((v) => v.central === true);
    const assessed = central.filter((v) => QUICK.includes(v.prescription));
    const rows = compare(euler, [at], { ...quick, hide: 0 }).rows;
    expect(assessed.length).toBeGreaterThan(2);
    for (const v of assessed)
      expect(rows.find((r) => r.prescription === v.prescription)).toMatchObject({
        value: v.value,
        variant: v.variant,
        inputError: v.inputError,
      });
  });

  test('flags fixed order past its least term, and states the spread without it', async () => {
    const series = await parseSeries('1\n1\n2\n6\n24\n120\n720\n5040\n', { name: 'n!' });
    const { rows, points } = compare(series, [number('1/2')], quick);
    expect(rows.find((r) => r.prescription === 'fixed-order')?.cautions.map((c) => c.code)).toContain(
      'past least term',
    );
    const { all, unflagged } = points[0]?.spread ?? {};
    expect(Number(all?.width)).toBeGreaterThan(Number(unflagged?.width));
    expect((all?.count ?? 0) > (unflagged?.count ?? 0)).toBe(true);
  });

  test('a grid gives one point a coupling, and the rows of each', async () => {
    const grid = readGrid('0.1:0.2:3');
    if (isGridProblem(grid)) expect.fail(grid.problem);
    const { points, rows } = compare(euler, grid.values, { ...options, by: ['fixed-order', 'pade'] });
    expect(points.map((p) => p.coupling.value)).toEqual(['0.1', '0.15', '0.2']);
    expect(rows.map((r) => `${r.at} ${r.prescription}`)).toEqual(
      ['0.1', '0.15', '0.2'].flatMap((at) => [`${at} fixed-order`, `${at} pade`]),
    );
  });

  test('an exact method has the best score against the exact sum', async () => {
    // Sum of the Euler series at 1/10 (re-derived; the bench of series with exact answers has it to 50 digits).
    const exact = number('0.915633339397880818760');
    const { rows } = compare(euler, [number('0.1')], { ...quick, exact, sort: 'score' });
    expect(rows[0]?.prescription).toMatch(/^borel-/);
    expect(rows[0]?.record?.against).toBe('exact');
  });
});

describe('grids', () => {
  test('both ends, exactly', async () => {
    const grid = readGrid('0.1:0.4:7');
    if (isGridProblem(grid)) expect.fail(grid.problem);
    expect(grid.over).toBe('coupling');
    expect(grid.values.map((g) => toNumberExact(g.value))).toEqual([0.1, 0.15, 0.2, 0.25, 0.3, 0.35, 0.4]);
    expect(grid.values[1]?.value.rational?.toString()).toBe('3/20');
  });

  test('of scales: even in ln μ, the decimals shown are the scales used', () => {
    const grid = readGrid('scale=0.5:2:5');
    if (isGridProblem(grid)) expect.fail(grid.problem);
    expect(grid.over).toBe('scale');
    expect(grid.values.map((g) => g.text)).toEqual(['0.5', '0.707107', '1', '1.41421', '2']);
    expect(grid.values.map((g) => g.value.rational?.toString())).toEqual([
      '1/2',
      '707107/1000000',
      '1',
      '141421/100000',
      '2',
    ]);
    const list = readGrid(' scale = 1/2, 1');
    expect(isGridProblem(list) ? list.problem : list.values.length).toBe(2);
  });

  test.each(['scale=0:2:3', 'scale=-1,1', 'scale=0.5:2', 'flavours=3:5:3', 'scale='])('%s is no grid', (text) => {
    expect(isGridProblem(readGrid(text))).toBe(true);
  });

  test.each(['0.1:0.4', '0.1:0.4:1', '0.1:0.4:x', '0.1:0.1:3', 'a,b', '0.1,,0.2', '1:2:3:4', '0.1:0.4:99999'])(
    '%s is none',
    (text) => {
      expect(isGridProblem(readGrid(text))).toBe(true);
    },
  );
});

describe('over scales', () => {
  const scales = (text: string): Grid['values'] => {
    const grid = readGrid(text);
    return isGridProblem(grid) ? expect.fail(grid.problem) : grid.values;
  };
  const file = (scheme: string): string =>
    `{"format": 1, "title": "a charge", "coupling": {"name": "alpha_s", "divisor": "pi"}, "first power": 1, "flavours": 3,
      "scheme": "${scheme}", "scale ratio": 1, "coefficients": ["1", "1.5", "6", "40(2)"]}`;

  test('an effective charge does not see the scale, fixed order does; errors of coefficients and coupling go along', async () => {
    const series = await parseSeries(file('four-loop running only'), { name: 'charge' });
    const found = await compareScales(series, number('0.25(1)'), scales('scale=0.7:2:4'), {
      ...options,
      by: ['fac', 'fixed-order'],
      hide: 0,
    });
    if ('reason' in found) return expect.fail(found.reason);
    expect(found.points.map((p) => p.scale)).toEqual(['0.7', '0.993288', '1.40946', '2']);
    const of = (name: string) => found.rows.filter((r) => r.prescription === name);
    const [charge, fixed] = [of('fac'), of('fixed-order')];
    expect(charge[0]?.variant).toMatch(/^effective charge/);
    for (const row of charge) {
      // Four loops for four coefficients: the charge is the same to all digits.
      expect(Number(row.value)).toBeCloseTo(Number(charge[0]?.value), 12);
      expect(Number(row.inputError)).toBeCloseTo(Number(charge[0]?.inputError), 4);
    }
    expect(new Set(fixed.map((r) => r.value?.slice(0, 6))).size).toBeGreaterThan(2);
    // At larger scales the coupling is smaller, and so is its error.
    const at = found.rows.filter((r) => r.prescription === 'fac').map((r) => Number(r.at));
    expect(at).toEqual(at.toSorted((a, b) => b - a));
  });

  test('at the scale of the file nothing changes', async () => {
    const series = await parseSeries(file('MSbar'), { name: 'charge' });
    const wanted = { ...options, by: ['fixed-order', 'borel-pade', 'fac'] };
    const found = await compareScales(series, number('0.25'), scales('scale=1'), wanted);
    if ('reason' in found) return expect.fail(found.reason);
    const plain = compare(series, [number('0.25')], wanted).rows;
    expect(found.rows.map((r) => r.value)).toEqual(plain.map((r) => r.value));
  });

  test('refusals name the scale, and what a series lacks', async () => {
    const series = await parseSeries(file('MSbar'), { name: 'charge' });
    expect(await compareScales(series, number('0.3'), scales('scale=0.01,1'), options)).toMatchObject({
      reason: expect.stringMatching(/^at μ\/Q = 0\.01: .*Landau pole/) as string,
    });
    expect(await compareScales(euler, number('0.3'), scales('scale=0.5,1'), options)).toMatchObject({
      reason: expect.stringMatching(/plain variable/) as string,
    });
  });
});

describe('the rule of the verdict', () => {
  const by = (rule: string) => {
    const named = verdictRule(rule);
    if (named === undefined) expect.fail(rule);
    return assess(euler, number('0.1'), { ...options, verdictRule: named }).verdict;
  };

  test('names itself in the output', async () => {
    expect(by('ladder').rule).toMatch(/^ladder \(docs\/verdict\.md\); rung: /);
    expect(by('fixed-order')).toMatchObject({ prescription: 'fixed-order: through order 6' });
    expect(by('fixed-order').rule).toMatch(/^fixed-order /);
    expect(by('prescription:levin').prescription).toMatch(/^levin: /);
    expect(by('prescription:singularity-model').printed).toMatch(/^no value: singularity-model refused: /);
  });

  test('least-term falls back on the sum of all terms where they still fall', async () => {
    expect(by('least-term').prescription).toMatch(/^fixed-order/);
    const rule = verdictRule('least-term');
    if (rule === undefined) expect.fail();
    const past = assess(euler, number('1/2'), { ...options, verdictRule: rule }).verdict;
    expect(past.prescription).toMatch(/^least-term/);
  });

  test('unknown rules are none', async () => {
    expect(verdictRule('prescription:nothing')).toBeUndefined();
    expect(verdictRule('best')).toBeUndefined();
    expect(verdictRules()).toContain('prescription:borel-pade');
  });
});

describe('the record in an assessment', () => {
  const schema = JSON.parse(
    readFileSync(new URL('../../docs/assessment.schema.json', import.meta.url), 'utf8'),
  ) as object;

  test('stands beside central values of series with 6 to 12 coefficients, and fits the schema', async () => {
    const result = assess(euler, number('0.1'), options);
    const fixed = result.values.find((v) => v.prescription === 'fixed-order');
    expect(fixed?.record).toMatchObject({ against: 'known sum', tested: 1, inside: 1, verdict: 'good' });
    const ajv = new Ajv({ strict: false });
    expect(ajv.validate(schema, JSON.parse(JSON.stringify(result))), ajv.errorsText()).toBe(true);
    const four = assess(euler, number('0.1'), { ...options, order: 4 });
    expect(four.values.every((v) => v.record === undefined)).toBe(true);
  });

  test('of a long series is made from its first twelve coefficients, in assessments and comparisons alike', async () => {
    const c = Array.from({ length: 30 }, (_, n) => n).reduce<bigint[]>(
      (list, n) => (n === 0 ? [1n] : [...list, list[n - 1]! * BigInt(-n)]),
      [],
    );
    const series = await parseSeries(`${c.join('\n')}\n`, { name: 'long' });
    const result = assess(series, number('0.2'), options);
    const of = (name: string) => result.values.find((v) => v.prescription === name && v.record !== undefined)?.record;
    // From twelve terms fixed order says 12! 0.2^12 of thirty terms that end at 29! 0.2^29: its error is no measure.
    expect(of('fixed-order')).toMatchObject({ seen: 12, tested: 1, inside: 0, against: 'own value', verdict: 'bad' });
    expect(of('borel-pade')).toMatchObject({ seen: 12, inside: 1, verdict: 'good' });
    expect(result.cautions.find((c2) => c2.code === 'bad-record')?.text).toMatch(
      /^from the first 12 coefficients alone, fixed-order/,
    );
    const rows = compare(series, [number('0.2')], quick).rows;
    expect(rows.find((r) => r.prescription === 'borel-pade')?.record).toEqual(of('borel-pade'));
    expect(compare(series, [number('0.2')], { ...quick, hide: 1 }).rows[0]?.record?.seen).toBeUndefined();
  });

  test('a bad one is a caution', async () => {
    // A wild fifth term after calm ones, summed to below its own noise by a Padé approximant of its own class.
    const series = await parseSeries('1\n1/2\n1/4\n1/8\n1/16\n1/32\n9\n', { name: 'jump' });
    const result = assess(series, number('0.5'), options);
    const bad = result.values.filter((v) => v.record?.verdict === 'bad').map((v) => v.prescription);
    expect(result.cautions.some((c) => c.code === 'bad-record')).toBe(bad.length > 0);
    expect(bad.length).toBeGreaterThan(0);
  });
});
