/** The cut through a user's own series: exact for a series that is nothing but its leading singularity. */
import { describe, expect, test } from 'vitest';
import { quantityNamed } from '../../src/bubbles/index.js';
import {
  bubbleCut,
  chainSeries,
  lowMomentumSeries,
  lowMomentumStrength,
  lowMomentumSum,
  seriesCut,
} from '../../src/extraction/index.js';
import type { BubbleCutResult, LowMomentumSum, SeriesCutResult } from '../../src/extraction/index.js';
import { R, Rational, exact, exactReal, gammaDouble, log, mulExact, toNumberExact } from '../../src/numerics/index.js';
import { betaCoefficients, changeScale, evolveAlpha, isRefusal } from '../../src/qcd/index.js';
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
function granted<T extends object>(x: T | Refusal): T {
  if (isRefusal(x)) throw new Error(x.reason);
  return x;
}

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

  test('one loop with nu: g_n = (1 + nu)_n b_0^n/s^(n+1)', () => {
    const g = lowMomentumSeries([exact(1)], exact(1), 4, exact(Rational.of(1, 2)));
    expect(g.map((c) => String(c.rational))).toEqual(['1', '3/2', '15/4', '105/8']);
  });

  test('five loops: the ratio approaches b_0/s (n + b) as a singularity of dimension 1 demands', () => {
    const beta = betaCoefficients(4, 'pi');
    const g = lowMomentumSeries(beta, exact(Rational.of(1, 2)), 41).map(toNumberExact);
    const [b0, b1] = beta.map(toNumberExact) as [number, number];
    const b = b1 / (2 * b0 * b0);
    expect(g[40]! / g[39]! / (2 * b0 * (40 + b))).toBeCloseTo(1, 4);
  });

  test('its strength: 1/s at one loop', () => {
    expect(lowMomentumStrength([9 / 4], 2, 0)).toBeCloseTo(0.5, 12);
  });
});

describe('the low-momentum sum', () => {
  const sum = (beta: readonly number[], s: number, x: number, nu = 0): LowMomentumSum =>
    granted(lowMomentumSum(beta, s, x, nu));

  // exp(−X) Ei(X)/b_0 and π exp(−X)/b_0 at X = s/(b_0 x); mpmath 1.3.
  test('one loop is an exponential integral', () => {
    const { pv, im } = sum([9 / 4], 2, 0.1);
    expect(pv).toBeCloseTo(0.057777455505998, 10);
    expect(im).toBeCloseTo(0.000192562608287855, 10);
  });

  // √w_0/b_0 ∫ dw w^(−3/2) e^(s(w − w_0)/b_0) from −∞ to w_0 = 1/0.15, above the origin; quadrature by mpmath 1.3.
  test('with nu = 1/2', () => {
    const { pv, im } = sum([9 / 4], 1, 0.15, 0.5);
    expect(pv).toBeCloseTo(0.233902976611188, 9);
    expect(im).toBeCloseTo(0.140115783753568, 9);
  });

  test('five loops: two cuts differ by the integral between them', () => {
    const beta = betaCoefficients(4, 'pi').map(toNumberExact);
    const alpha = 0.22;
    const run = (to: number): number =>
      granted({ a: evolveAlpha({ alpha, from: 1, to, flavours: 4, loops: 5 }) }).a as number;
    const low = (cut: number): number => cut * sum(beta, 0.5, run(cut) / Math.PI).pv;
    const f = (y: number): number => (Math.exp(y / 2) * run(Math.exp(y / 2))) / Math.PI;
    const [a, panels] = [2 * Math.log(0.5), 40];
    let integral = 0;
    for (let i = 0; i <= 2 * panels; i++) {
      integral += f(a * (1 - i / (2 * panels))) * (i === 0 || i === 2 * panels ? 1 : i % 2 === 1 ? 4 : 2);
    }
    expect(low(1) - low(0.5)).toBeCloseTo((integral * -a) / (6 * panels), 9);
  });

  // |Im| = π N t_s (t_s b_0)^b/Γ(1+b) (Λ/Q)^d for all x (M. Beneke, Phys. Rept. 317 (1999) 1, from memory), and at two loops
  // (Λ/Q)^d = e^(−t_s/x) (b_0 x)^(−b) (1 + b_1 x/b_0)^b exactly.
  test('two loops: the imaginary part is N and Λ', () => {
    const [b0, b1, s, x] = [25 / 12, 77 / 24, 0.5, 0.08];
    const [t, b] = [s / b0, (s * b1) / b0 ** 2];
    const n = lowMomentumStrength([b0, b1], s, 0);
    const power = Math.exp(-t / x) * (b0 * x) ** -b * (1 + (b1 * x) / b0) ** b;
    expect(sum([b0, b1], s, x).im / ((Math.PI * n * t * (t * b0) ** b * power) / gammaDouble(1 + b))).toBeCloseTo(1, 7);
  });

  test('refused where the beta function is not led by one loop', () => {
    const found = lowMomentumSum(betaCoefficients(3, 'pi').map(toNumberExact), 2, 0.3, 0);
    expect(isRefusal(found) && found.reason).toMatch(/so strong/);
  });
});

describe('a pure series', () => {
  test('its strength is found, and with the cut at Q nothing is left but a geometric window', async () => {
    const { cut } = granted(ask(await pure(12), '0.15', '1'));
    expect(cut.strengths[0]).toMatchObject({ value: '7.0000', source: 'the last coefficient' });
    expect(Number(cut.strengths[0]!.error)).toBeLessThan(1e-9);
    for (const { high } of cut.terms) expect(Math.abs(Number(high))).toBeLessThan(1e-6);
  });

  test('the strength N of growth says the same', async () => {
    const { strengths } = granted(ask(await pure(9), '0.15', '1')).cut;
    const n = strengths.find((s) => s.source === 'the strength N of growth')!;
    expect(Math.abs(Number(n.value) - 7)).toBeLessThan(2 * Number(n.error));
  });

  test('the verdict changes', async () => {
    const { growth } = granted(ask(await pure(16), '0.15', '0.5')).cut;
    expect(growth.whole.verdict).toBe('factorial');
    expect(growth.high.verdict).not.toBe('factorial');
  });

  test('the sum is the whole integral and does not depend on the cut', async () => {
    const series = await pure(14);
    const beta = betaCoefficients(4, 'pi').map(toNumberExact);
    const all = 7 * granted(lowMomentumSum(beta, 0.5, 0.12 / Math.PI, 0)).pv;
    const { values } = granted(ask(series, '0.12', '0.6')).cut;
    for (const { sum } of values!.rows) expect(Number(sum) / all).toBeCloseTo(1, 5);
    expect(Number(values!.spread)).toBeLessThan(1e-5 * all);
  });
});

test('coefficients at another scale are cut at the same place', async () => {
  const series = await pure(10);
  const beta = betaCoefficients(4, 'pi');
  const twice = exactReal((prec) => R.mul2exp(log(R.fromNumber(2), prec), 1));
  const moved = changeScale({ coefficients: series.coefficients.map((c) => c.value), firstPower: 1 }, beta, twice);
  const other: Series = {
    ...series,
    scaleRatio: exact(2),
    coefficients: moved.map((value) => ({ value, text: '', status: 'computed' as const })),
  };
  const alpha = granted({ a: evolveAlpha({ alpha: 0.15, from: 1, to: 2, flavours: 4, loops: 5 }) }).a as number;
  const [here, there] = [granted(ask(series, '0.15', '0.6')).cut, granted(ask(other, String(alpha), '0.6')).cut];
  expect(Number(there.strengths[0]!.value)).toBeCloseTo(7, 3);
  expect(Number(there.values!.low) / Number(here.values!.low)).toBeCloseTo(1, 4);
  expect(Number(there.values!.sum) / Number(here.values!.sum)).toBeCloseTo(1, 4);
});

describe('beside the exact cut of the same bubble chain', () => {
  /** The model's k is the scale of the MSbar coupling; the gluon's virtuality is e^(5/6) times larger. */
  const VIRTUALITY = Math.exp(5 / 6);
  function both(name: string, alpha: string, order: number, cut: number): [SeriesCutResult, BubbleCutResult] {
    const quantity = quantityNamed(name)!;
    const { flavours } = quantity;
    const point = { alpha: at(alpha).value, flavours, ratio: exact(1) };
    const model = ask(chainSeries(quantity, point, order), alpha, String(cut));
    const question = { quantity, at: at(alpha), flavours, ratio: exact(1), digits: 10, order, request: {} };
    return [granted(model), granted(bubbleCut(question, Rational.fromNumber(cut * VIRTUALITY)))];
  }

  // Eight coefficients each; with x = C_F α_s/π Σ c_n a^n the exact λ is e^(5/6)/2.
  test.each([
    ['pole-mass', '0.22', 0.3, 0.005, 0.05],
    ['static-potential', '0.25', 0.35, 0.005, 0.05],
    ['bjorken', '0.32', 0.35, 0.05, 0.25],
  ])('%s', (name, alpha, cut, first, all) => {
    const [model, chain] = both(name, alpha, 8, cut);
    const off = (r: { cut: string }): number => Math.abs(Number(r.cut) - Number(chain.cut.overHard));
    const own = chain.cut.rows.toSorted((a, b) => off(a) - off(b))[0]!;
    const low = Number(model.cut.values!.low);
    expect(Math.abs(low / Number(own.leading) - 1)).toBeLessThan(first);
    expect(Math.abs(low / Number(own.low) - 1)).toBeLessThan(all);
    expect(Math.abs(Number(model.cut.values!.sum) / Number(own.sum) - 1)).toBeLessThan(0.04);
  });

  test('the pole mass: strength e^(5/6)/2, ambiguity and sum of the chain', () => {
    const [model, chain] = both('pole-mass', '0.22', 8, 0.3);
    expect(Math.abs(Number(model.cut.strengths[0]!.value) / (Math.exp(5 / 6) / 2) - 1)).toBeLessThan(0.003);
    expect(model.cut.growth.whole.verdict).toBe('factorial');
    expect(model.cut.growth.high.verdict).not.toBe('factorial');
    // The exact sum is 0.194261; the sum uncut in fixed order is 0.606.
    expect(Number(model.cut.values!.whole)).toBeGreaterThan(0.6);
    expect(Math.abs(Number(model.cut.values!.sum) - Number(chain.cut.rows[0]!.sum))).toBeLessThan(5e-5);
    expect(Number(model.cut.values!.ambiguity) * Math.PI).toBeCloseTo(Number(chain.cut.imaginary.low), 3);
  });
});

// Invented series with known Borel transforms at α_s/π = 1/20; principal values by mpmath and PARI/GP, 50 digits.
test.each([
  ['marrowgate-mass', 0.0869870374025461, 0.0082736962],
  ['vellum', 0.0620419394982386, 4.27e-6],
])('%s: the sum of eight terms is the principal value to the last term above the cut', async (id, pv, im) => {
  const series = await loadSeries(id);
  const question = { at: at('0.15707963267948966'), cut: q('0.7'), order: 8, digits: 12, request: {} };
  const { values } = granted(seriesCut({ series, ...question })).cut;
  expect(Math.abs(Number(values!.sum) - pv)).toBeLessThan(Number(values!.truncation));
  expect(Math.abs(Number(values!.whole) - pv)).toBeGreaterThan(Math.abs(Number(values!.sum) - pv));
  expect((Number(values!.ambiguity) * Math.PI) / im).toBeCloseTo(1, 2);
});

test('the pole mass loses its leading renormalon', async () => {
  const { cut } = granted(ask(await loadSeries('pole-msbar', { flavours: 4 }), '0.22', '0.4'));
  expect(cut.singularity.dimension).toBe('1');
  const last = cut.terms[3]!;
  expect(Math.abs(Number(last.high))).toBeLessThan(0.1 * Number(last.whole));
  expect(Number(cut.values!.spread)).toBeLessThan(0.002);
});

test('an ultraviolet singularity that is nearer is named, and the strength is no better known than its sources agree', async () => {
  const { cut, cautions } = granted(ask(await loadSeries('adler'), '0.32', '0.6'));
  expect(cautions.map((c) => c.code)).toContain('ultraviolet-nearer');
  const [first, other] = cut.strengths;
  expect(Number(first!.error)).toBeGreaterThanOrEqual(0.98 * Math.abs(Number(first!.value) - Number(other!.value)));
});

test('an error of the coupling goes through both parts', async () => {
  const series = await loadSeries('pole-msbar', { flavours: 4 });
  const value = (alpha: string): number => Number(granted(ask(series, alpha, '0.5')).cut.values!.sum);
  const error = { plus: q('0.002'), minus: q('0.002') };
  const { values } = granted(
    seriesCut({ series, at: { ...at('0.22'), error }, cut: q('0.5'), digits: 12, request: {} }),
  ).cut;
  expect(Number(values!.inputError) / ((value('0.222') - value('0.218')) / 2)).toBeCloseTo(1, 1);
  expect(granted(ask(series, '0.22', '0.5')).cut.values!.inputError).toBeUndefined();
});

test('without a coupling: coefficients and verdicts, no sums', async () => {
  const result = granted(seriesCut({ series: await pure(6), cut: q('0.5'), digits: 12, request: {} }));
  expect(result.cut.terms).toHaveLength(6);
  expect(result.cut.values).toBeUndefined();
  expect(result.coupling).toBeUndefined();
});

test('a coefficient that starts with a power of the coupling takes the exponent down', async () => {
  const [plain, weak] = await Promise.all(
    ['2.5', '0.5'].map((exponent) =>
      parseSeries(
        `coupling: { name: alpha_s, divisor: pi }\nscheme: MSbar\nflavours: 3\nscale ratio: 1\nfirst power: 1\nsingularities: [{ dimension: 4, exponent: ${exponent} }]\ncoefficients: [1, 2, 6, 40]\n`,
        { name: 'mine.yaml' },
      ),
    ),
  );
  const low = (series: Series): number => Number(granted(ask(series, '0.2', '0.5')).cut.terms[0]!.low);
  expect(low(plain!)).toBeGreaterThan(0);
  expect(low(weak!)).toBe(0);
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
  test('a contour quantity', async () => {
    const result = ask(await loadSeries('tau-contour'), '0.32', '0.5');
    expect(isRefusal(result) && result.reason).toMatch(/integral over a circle/);
  });
  test('a coupling at μ_f beyond its beta function: coefficients, but no sum', async () => {
    const { values } = granted(ask(await loadSeries('adler'), '0.32', '0.35')).cut;
    expect(values!.refused!.remedy).toMatch(/larger cut/);
    expect(values!.sum).toBeUndefined();
  });
});
