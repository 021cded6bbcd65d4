/** Verdicts of noisy, broken and competing series against exact sums (sources: see tests/outside/bench-assess.test.ts). */
import { describe, expect, test } from 'vitest';
import { exact, Rational } from '../../src/numerics/index.js';
import { parseSeries } from '../../src/series/index.js';
import type { Series, Uncertain } from '../../src/series/index.js';
import { assess } from '../../src/studies/index.js';
import type { Assessment } from '../../src/studies/index.js';
import { assessmentText } from '../../src/report/index.js';
import { benchFile, benchSeries } from '../support/bench.js';

const at = (x: string): Uncertain => ({ value: exact(Rational.parse(x)!), text: x });
const run = (series: Series, x: string): Assessment => assess(series, at(x), { digits: 15, request: {} });
const sizes = (v: Assessment['verdict']): number =>
  [v.truncation, v.ambiguity, v.input].reduce((sum, text) => sum + Number(text ?? 0), 0);

describe('a long series with errors of per cent', () => {
  // Σ n! x^n, the third and later coefficients off by their own errors of 1 %, up and down in turn.
  const factorials = Array.from({ length: 30 }, (_, n) =>
    Array.from({ length: n }, (_none, k) => k + 1).reduce((a, b) => a * b, 1),
  );
  const rows = factorials.map((c, n) => (n < 2 ? `${n},${c},` : `${n},${c * (n % 2 === 0 ? 1.01 : 0.99)},${c * 0.01}`));
  const x = '1/20';
  const pv = Number(benchFile('s02_euler_nonalternating').references.find((r) => r.x === x)!.pv);

  test.each([
    ['without a singularity', ''],
    ['with the singularity stated', 'singularities:\n  - { t: 1, exponent: 1, kind: other }\n'],
  ])('%s: approximants that noise confines to the first few are passed over', async (_name, more) => {
    const values = rows.map((row) => {
      const [, value, error] = row.split(',');
      return `  - { value: ${value}${error === '' ? '' : `, error: ${error}`} }\n`;
    });
    const {
      verdict,
      values: table,
      ambiguity,
    } = run(await parseSeries(`variable: x\n${more}coefficients:\n${values.join('')}`, { name: 'noisy' }), x);
    const pade = table.find((v) => v.prescription === 'borel-pade' && v.central === true);
    expect(2 * (pade?.termsUsed ?? 0)).toBeLessThan(30);
    expect(verdict.prescription).not.toContain('pade');
    expect(Math.abs(Number(verdict.value) - pv)).toBeLessThan(2 * sizes(verdict));
    // The noise of 1 % in 2 x² sets the scale; an approximant from three coefficients is off by more than it.
    expect(sizes(verdict)).toBeLessThan(0.01 * 2 * 0.05 ** 2 * 3);
    for (const c of ambiguity.conventions) expect(c.origin).not.toContain('pade');
  });
});

describe('an outlier', () => {
  test('makes the verdict conditional and never converged', () => {
    const { verdict } = run(benchSeries(benchFile('s138_sign_typo')), '1/10');
    expect(verdict.standing).toBe('indicative');
    expect(verdict.rule).not.toContain('converged');
    expect(verdict.assumption).toMatch(/^the outlier is an error and all further coefficients follow .* first 7$/);
  });
  test('is not seen in the series without it', () => {
    const { verdict } = run(benchSeries(benchFile('s02_euler_nonalternating'), 20), '1/10');
    expect(verdict.standing).toBe('converged');
    expect(verdict.assumption).not.toContain('outlier');
  });
});

describe('competing singularities', () => {
  const file = benchFile('s151_demo_vellum_adler');
  // Eight terms of the same sign; the next ones alternate. The eighth is small since the two singularities cancel in it.
  test.each(file.references.map((r) => [r.x, Number(r.pv)] as const))(
    'at x = %s the error does not rest on one small term',
    (x, pv) => {
      const { verdict, values, cautions } = run(benchSeries(file, 8), x);
      expect(cautions.map((c) => c.code)).toContain('competing-singularities');
      expect(verdict.prescription).toContain('fixed-order');
      const fixed = values.find((v) => v.prescription === 'fixed-order')!;
      expect(Math.abs(Number(fixed.value) - pv)).toBeLessThan(1.5 * Number(fixed.truncationError));
    },
  );
});

test('one coefficient: nothing is said of terms that fall', async () => {
  const result = run(await parseSeries('1\n', { name: 'one' }), '3/10');
  expect(result.optimalTruncation.statement).toBe('one term alone neither falls nor grows');
  const page = assessmentText(result, { columns: 100 });
  expect(page).not.toMatch(/still fall/);
  expect(page).toContain('one term alone has none to compare with');
});

test('an ambiguity above the value is said to drown it', () => {
  // Σ n! x^n at x = 2: Im = π e^(−1/2)/2 exactly, |Im|/π = 0.303 above PV = e^(−1/2) Ei(1/2)/2 = 0.138 (mpmath 1.2.1).
  const codes = (x: string): string[] =>
    run(benchSeries(benchFile('s02_euler_nonalternating'), 12), x).cautions.map((c) => c.code);
  expect(codes('2')).toContain('ambiguity-above-value');
  expect(codes('1/10')).not.toContain('ambiguity-above-value');
});

describe('growth undecided from six terms of regular signs that rise', () => {
  // Σ (−1)^n (2n)! (3/2)^n x^n at x = 3/10 is ∫ e^(−t)/(1 + 0.45 t²) dt = 0.72831170 (mpmath 1.2.1, quad).
  const rising = '1\n-3\n54\n-2430\n204120\n-27556200\n';

  test('stops at the least term', async () => {
    const { verdict, growth } = run(await parseSeries(rising, { name: 'rising' }), '3/10');
    expect(growth.verdict).toBe('undecided');
    expect(verdict.prescription).toContain('least-term');
    expect(Math.abs(Number(verdict.value) - 0.7283117)).toBeLessThan(Number(verdict.truncation));
    expect(verdict.ambiguity).toBeUndefined();
  });

  test('and takes all terms where they fall', async () => {
    const { verdict } = run(await parseSeries(rising, { name: 'rising' }), '1/1000');
    expect(verdict.prescription).toContain('fixed-order');
  });
});
