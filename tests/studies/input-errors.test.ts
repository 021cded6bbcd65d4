import { describe, expect, test } from 'vitest';
import { R, exact, toNumberExact } from '../../src/numerics/index.js';
import { diagnoseGrowth } from '../../src/growth/index.js';
import { isNumberProblem, loadSeries, parseUncertain } from '../../src/series/index.js';
import type { Uncertain } from '../../src/series/index.js';
import type { Prescription } from '../../src/prescriptions/index.js';
import { assess } from '../../src/studies/index.js';
import { expand } from '../../src/studies/expand.js';
import { evaluateAll } from '../../src/studies/values.js';

const number = (text: string): Uncertain => {
  const value = parseUncertain(text);
  if (isNumberProblem(value)) throw new Error(value.problem);
  return value;
};

const adler = await loadSeries('adler');

/** dR/dα of the fixed-order sum at α = 0.3, from the published coefficients (arXiv:0801.1821). */
const slope = [1, 1.6398212, 6.3710145, 49.0757].reduce(
  (s, c, n) => s + (c * (n + 1) * (0.3 / Math.PI) ** n) / Math.PI,
  0,
);

describe('errors of the coupling', () => {
  test.each([
    ['0.3(1)', 0.1],
    ['0.3(4)', 0.4],
    ['0.30(100)', 1],
    ['0.3(100)', 10],
  ])('%s is carried through every central value, however wide', (text, sigma) => {
    const result = assess(adler, number(text), { digits: 12, request: {} });
    for (const v of result.values.filter((w) => w.central === true))
      expect(Number(v.inputError), v.prescription).toBeGreaterThan(sigma / 100);
    const fixed = result.values.find((v) => v.prescription === 'fixed-order')!;
    expect(Number(fixed.inputError) / (slope * sigma)).toBeCloseTo(1, 1);
    expect(result.verdict.printed).toContain('(input)');
    expect(result.cautions.some((c) => c.code === 'wide-coupling')).toBe(sigma / 0.3 > 0.3);
  });

  test('a narrow one needs no word', () => {
    const codes = assess(adler, number('0.3000(30)'), { digits: 12, request: {} }).cautions;
    expect(codes.map((c) => c.code)).not.toContain('wide-coupling');
  });

  test('a value that stands at the central coupling alone says that its error is not known', () => {
    const at = exact(1);
    const expanded = expand(adler, number('0.3').value);
    const growth = diagnoseGrowth(expanded.growthInput);
    const { expansion } = expanded;
    const x0 = toNumberExact(expansion.x);
    const fragile: Prescription = {
      name: 'fragile',
      title: 'fragile',
      summary: 'stands at one coupling',
      family: 'truncation',
      apply: (e) =>
        toNumberExact(e.x) === x0
          ? [
              {
                kind: 'sum',
                variant: 'all',
                value: at.ball(64),
                termsUsed: 1,
                trust: 'indicative',
                notes: [],
                central: true,
              },
            ]
          : [{ kind: 'refusal', variant: 'all', reason: 'elsewhere', remedy: 'none' }],
    };
    const evaluate = (xError: number) =>
      evaluateAll(expansion, growth, [fragile], 12, { xError, coefficientErrors: [] })[0]!;
    expect(evaluate(0.01)).toMatchObject({ inputUnknown: true });
    expect(evaluate(0.01).input).toBeUndefined();
    expect(evaluate(0).inputUnknown).toBeUndefined();
    const { outcome } = evaluate(0);
    expect(outcome.kind === 'sum' && R.toNumber(outcome.value)).toBe(1);
  });
});
