/** The cut through a user's own series: exact for a series that is nothing but its leading singularity. */
import { describe, expect, test } from 'vitest';
import { lowMomentumSeries, seriesCut } from '../../src/extraction/index.js';
import type { SeriesCutResult } from '../../src/extraction/index.js';
import { Rational, exact, mulExact, toNumberExact } from '../../src/numerics/index.js';
import { betaCoefficients, isRefusal } from '../../src/qcd/index.js';
import type { Refusal } from '../../src/qcd/index.js';
import { loadSeries, parseSeries } from '../../src/series/index.js';
import type { Series } from '../../src/series/index.js';

const q = (text: string): Rational => {
  const found = Rational.parse(text);
  if (found === undefined) throw new Error(text);
  return found;
};
const at = (text: string): { value: ReturnType<typeof exact>; text: string } => ({ value: exact(q(text)), text });
const ask = (series: Series, alpha: string, cut: string): SeriesCutResult | Refusal =>
  seriesCut({ series, at: at(alpha), cut: q(cut), digits: 12, request: {} });
const granted = (x: SeriesCutResult | Refusal): SeriesCutResult => {
  if (isRefusal(x)) throw new Error(x.reason);
  return x;
};

/** 7 times the low-momentum integral with d = 1, n_f = 4, in α_s/π. */
async function pure(count: number): Promise<Series> {
  const series = await parseSeries(
    'coupling: { name: alpha_s, divisor: pi }\nscheme: MSbar\nflavours: 4\nscale ratio: 1\nfirst power: 1\nsingularities: [{ dimension: 1 }]\ncoefficients: [1, 2, 3]\n',
    { name: 'pure.yaml' },
  );
  const g = lowMomentumSeries(betaCoefficients(4, 'pi'), exact(Rational.of(1, 2)), count);
  const coefficients = g.map((c) => ({ value: mulExact(exact(7), c), text: '', status: 'computed' as const }));
  return { ...series, coefficients };
}

describe('the low-momentum series', () => {
  test('one loop: g_n = n! b_0^n/s^(n+1)', () => {
    const g = lowMomentumSeries([exact(Rational.of(9, 4))], exact(2), 6).map((c) => c.rational!);
    let factorial = Rational.ONE;
    g.forEach((c, n) => {
      if (n > 0) factorial = factorial.mul(Rational.of(n));
      expect(c.equals(factorial.mul(Rational.of(9, 4).pow(n)).div(Rational.of(2).pow(n + 1)))).toBe(true);
    });
  });

  test('five loops: the ratio approaches b_0/s (n + b) as a singularity of dimension 1 demands', () => {
    const beta = betaCoefficients(4, 'pi');
    const g = lowMomentumSeries(beta, exact(Rational.of(1, 2)), 41).map(toNumberExact);
    const [b0, b1] = beta.map(toNumberExact) as [number, number];
    const b = b1 / (2 * b0 * b0);
    expect(g[40]! / g[39]! / (2 * b0 * (40 + b))).toBeCloseTo(1, 4);
  });
});

describe('a pure series', () => {
  test('its strength is found, and with the cut at Q nothing is left but a geometric window', async () => {
    const result = granted(ask(await pure(12), '0.15', '1'));
    expect(result.strength.value).toBe('7.000');
    expect(Number(result.strength.error)).toBeLessThan(1e-9);
    for (const { high } of result.terms) expect(Math.abs(Number(high))).toBeLessThan(1e-6);
  });

  test('the verdict changes', async () => {
    const { growth } = granted(ask(await pure(16), '0.15', '0.5'));
    expect(growth.whole.verdict).toBe('factorial');
    expect(growth.high.verdict).not.toBe('factorial');
  });

  test('the sum does not depend on the cut, to the last term', async () => {
    const { rows } = granted(ask(await pure(14), '0.12', '0.6'));
    const sums = rows.map((row) => Number(row.both));
    const spread = Math.max(...sums) - Math.min(...sums);
    const last = Math.max(...rows.map((row) => Math.abs(Number(row.lastTerm))));
    expect(rows.length).toBeGreaterThan(2);
    expect(spread).toBeLessThan(5 * last);
    expect(spread).toBeLessThan(2e-3 * sums[0]!);
  });
});

test('the pole mass loses its leading renormalon', async () => {
  const result = granted(ask(await loadSeries('pole-msbar', { flavours: 4 }), '0.22', '0.4'));
  expect(result.singularity.dimension).toBe('1');
  const [whole, high] = [result.terms, result.terms].map((t, i) =>
    Math.abs(Number(i === 0 ? t[3]!.whole : t[3]!.high)),
  );
  expect(high!).toBeLessThan(0.6 * whole!);
});

describe('refusals', () => {
  const file = (lines: string): Promise<Series> => parseSeries(`${lines}\n`, { name: 'mine.yaml' });
  const head = 'coupling: { name: alpha_s, divisor: pi }\nscheme: MSbar\nflavours: 3\nscale ratio: 1\n';
  test.each([
    ['coefficients: [1, 2, 6]', /running .* is not known/],
    [`${head}first power: 2\nsingularities: [{ dimension: 4 }]\ncoefficients: [1, 2, 6]`, /starts at the power 2/],
    [`${head}first power: 1\nsingularities: [{ dimension: 4 }]\ncoefficients: [1, 2]`, /say nothing/],
    [`${head}first power: 1\ncoefficients: [1, 2, 6]`, /states no infrared singularity/],
  ])('%s', async (lines, message) => {
    const result = ask(await file(lines), '0.2', '0.5');
    expect(isRefusal(result) && result.reason).toMatch(message);
  });
  test('a cut above Q', async () => {
    const result = ask(await pure(6), '0.2', '1.1');
    expect(isRefusal(result) && result.reason).toMatch(/lies above Q/);
  });
});
