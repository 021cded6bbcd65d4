/** Fits: linear problems with known answers, weights, pulls, profiles, refusals. */
import { describe, expect, test } from 'vitest';
import { fit } from '../../src/extraction/index.js';
import type { FitResult, Problem } from '../../src/extraction/index.js';
import { chiSquareTail } from '../../src/extraction/fit/chi-square.js';
import { cholesky, inverseOf } from '../../src/extraction/fit/matrix.js';
import { minimise } from '../../src/extraction/fit/minimise.js';
import { loadSeries } from '../../src/series/index.js';
import { atMZ, near, quantity, refusedWith, standing, usual, yaml } from './support.js';

// mpmath 1.3.0, 40 digits: gammainc(dof/2, χ²/2, regularized).
test.each([
  [3.2, 1, 0.07363827012030265],
  [10.5, 7, 0.1619644930794281],
  [0.3, 4, 0.9898141728888165],
  [100, 30, Number('1.85680233651023859e-9')],
  [1e-3, 2, 0.9995001249791692],
])('the tail of χ² = %s with %s degrees of freedom', (value, dof, tail) => {
  near(chiSquareTail(value, dof), tail, 1e-12);
});

describe('small matrices', () => {
  // C = [[.04, .015], [.015, .09]]: mpmath 1.3.0, 36 digits.
  test('Cholesky factor and inverse', () => {
    const l = cholesky([[0.04, 0.015], [0.015, 0.09]])!; // prettier-ignore
    expect(l[0]?.[0]).toBeCloseTo(0.2, 15);
    expect(l[1]?.[0]).toBeCloseTo(0.075, 15);
    expect(l[1]?.[1]).toBeCloseTo(Number('0.290473750965556266'), 15);
    const inverse = inverseOf(l);
    expect(0.04 * inverse[0]![0]! + 0.015 * inverse[1]![0]!).toBeCloseTo(1, 13);
  });
  test('no factor for what is not positive definite', () => {
    expect(cholesky([[1, 1], [1, 1]])).toBeUndefined(); // prettier-ignore
    expect(cholesky([[1, 2], [2, 1]])).toBeUndefined(); // prettier-ignore
    expect(cholesky([[-1]])).toBeUndefined();
  });
});

test('two parameters of a linear theory come out as linear algebra has them', () => {
  const rows = [[1, 1], [1, 2], [1, 3]]; // prettier-ignore
  const data = [1.1, 1.9, 3.2];
  const theory = (p: readonly number[]): number[] => rows.map((r) => r[0]! * p[0]! + r[1]! * p[1]!);
  const factor = cholesky([[0.01, 0, 0], [0, 0.01, 0], [0, 0, 0.01]])!; // prettier-ignore
  const found = minimise(theory, data, factor, [1, 1])!;
  // Straight line through (1, 1.1), (2, 1.9), (3, 3.2): slope 1.05, intercept −1/30.
  expect(found.parameters[1]).toBeCloseTo(1.05, 9);
  expect(found.parameters[0]).toBeCloseTo(-1 / 30, 9);
  expect(found.covariance[1]?.[1]).toBeCloseTo(0.005, 9);
  near(found.chiSquare, 1.5 / 0.36, 1e-8);
});

/** x measured twice directly: R = x. */
const twice = (a: number, sa: number, b: number, sb: number, rho: number): Problem => ({
  ...usual,
  for: 'alpha_s',
  prescriptions: ['fixed-order'],
  data: [
    { series: 'one', measured: quantity(String(a), sa) },
    { series: 'two', measured: quantity(String(b), sb) },
  ],
  correlation: [
    [1, rho],
    [rho, 1],
  ],
});

const LINE = 'first power: 1\ncoefficients: [1]';

describe('two measurements of one number', () => {
  // Best linear unbiased estimate: weights (σ_b² − ρσ_aσ_b)/(σ_a² + σ_b² − 2ρσ_aσ_b).
  test.each([0, 0.3, -0.5])('with correlation %s give the weighted mean, its error, χ² and pulls', async (rho) => {
    const [a, sa, b, sb] = [0.31, 0.01, 0.34, 0.02];
    const series = [
      { ...(await yaml(LINE)), id: 'one' },
      { ...(await yaml(LINE)), id: 'two' },
    ];
    const result: FitResult = standing(fit(twice(a, sa, b, sb, rho), series, {}));
    const denominator = sa * sa + sb * sb - 2 * rho * sa * sb;
    const w = (sb * sb - rho * sa * sb) / denominator;
    const mean = w * a + (1 - w) * b;
    const sigma = Math.sqrt((sa * sa * sb * sb * (1 - rho * rho)) / denominator);
    const { summary } = result;
    near(summary?.values[0]?.value, mean, 1e-9);
    near(summary?.values[0]?.components.find((c) => c.name === 'measurement')?.plus, sigma, 1e-7);
    const chi = (a - b) ** 2 / denominator;
    near(result.rows[0]?.chiSquare, chi, 1e-6);
    expect(result.rows[0]?.degreesOfFreedom).toBe(1);
    near(result.rows[0]?.pValue, chiSquareTail(chi, 1), 1e-6);
    // With one degree of freedom both standardised residuals are √χ² in size.
    for (const p of summary!.pulls) near(Math.abs(Number(p.standardised)), Math.sqrt(chi), 1e-6);
    expect(summary?.pulls.map((p) => Number(p.alone))).toEqual([a, b]);
    const interval = summary?.profiles[0]?.interval;
    near(Number(interval?.high) - Number(interval?.low), 2 * sigma, 1e-5);
  });

  test('the same series twice moves together; different ones do not', async () => {
    const noisy = 'first power: 1\ncoefficients: [{ value: 1, error: 0.05 }]';
    const component = async (ids: readonly string[]): Promise<number> => {
      const series = await Promise.all(ids.map(async (id) => ({ ...(await yaml(noisy)), id })));
      const { summary } = standing(fit(twice(0.3, 0.01, 0.3, 0.01, 0), series, {}));
      return Number(summary?.values[0]?.components.find((c) => c.name === 'coefficients')?.plus);
    };
    const [together, apart] = [await component(['one', 'one']), await component(['one', 'two'])];
    near(together / apart, Math.SQRT2, 0.01);
  });

  test('theory in the weights takes weight from the uncertain prediction', async () => {
    // The second term keeps the truncation error out of the way.
    const sharp = { ...(await yaml('first power: 1\ncoefficients: [1, 1e-9]')), id: 'one' };
    const noisy = {
      ...(await yaml('first power: 1\ncoefficients: [{ value: 1, error: 0.2 }, 1e-9]')),
      id: 'two',
    };
    const problem = twice(0.3, 0.01, 0.36, 0.01, 0);
    const value = (more: Partial<Problem>): number =>
      Number(standing(fit({ ...problem, ...more }, [sharp, noisy], {})).summary?.values[0]?.value);
    near(value({}), 0.33, 1e-7);
    // Weights 1/0.01² and 1/(0.01² + (0.2 · 0.33)²).
    const w = 1 / (0.01 ** 2 + (0.2 * 0.33) ** 2);
    near(value({ theoryInWeights: true }), (0.3 / 0.01 ** 2 + 0.36 * w) / (1 / 0.01 ** 2 + w), 1e-6);
  });
});

describe('refused', () => {
  test('a correlation matrix that is not positive definite', async () => {
    const series = [await yaml(LINE), await yaml(LINE)];
    refusedWith(fit(twice(0.3, 0.01, 0.3, 0.01, 1), series, {}), 'not positive definite', 'check its entries');
  });
  test('a measurement without an error', async () => {
    const series = [await yaml(LINE), await yaml(LINE)];
    refusedWith(fit(twice(0.3, 0, 0.3, 0.01, 0), series, {}), 'has no error', 'give its error');
  });
  test('more parameters than measurements', async () => {
    const problem: Problem = {
      ...usual,
      for: 'mass',
      freeAlphaS: true,
      alphaS: quantity('0.118', 0.001),
      data: [
        { series: 'charm-moment-1', measured: quantity('0.2166', 0.0031, -2), massPower: -2, norm: quantity('1/4') },
      ],
    };
    refusedWith(fit(problem, [await loadSeries('charm-moment-1')], {}), '2 parameters from 1 measurement');
  });
});

describe('QCD series', () => {
  test('mass and α_s free: two moments fix both, and the mass alone at that α_s is the same', async () => {
    const series = [await loadSeries('charm-moment-1'), await loadSeries('charm-moment-2')];
    const base = { ...usual, alphaS: quantity('0.118', 0.001), prescriptions: ['fixed-order'] } as const;
    const made = (massPower: number, norm: string, value: string): Problem['data'][number] => ({
      series: 'moment',
      massPower,
      norm: quantity(norm),
      measured: quantity(value, Number(value) / 100, massPower),
    });
    const at = (data: Problem['data'], more: Partial<Problem>): FitResult =>
      standing(fit({ ...base, for: 'mass', data, ...more }, series, {}));
    const guess = [made(-2, '1/4', '0.2166'), made(-4, '1/16', '0.01497')];
    const free = at(guess, { freeAlphaS: true });
    const [mass, alpha] = [Number(free.summary?.values[0]?.value), Number(free.summary?.values[1]?.value)];
    // As many parameters as data: both are met, and a fit of the mass alone at that α_s finds the same mass with χ² = 0.
    expect(Number(free.rows[0]?.chiSquare)).toBeLessThan(1e-10);
    const fixed = at(guess, { alphaS: quantity(String(alpha)) });
    near(fixed.summary?.values[0]?.value, mass, 1e-7);
    expect(Number(fixed.rows[0]?.chiSquare)).toBeLessThan(1e-8);
    expect(free.rows[0]?.pValue).toBeUndefined();
  });

  test('one common α_s(M_Z) from two scales lies between the two', async () => {
    const series = [await loadSeries('tau-delta0'), await loadSeries('bjorken')];
    const problem: Problem = {
      ...usual,
      for: 'alpha_s',
      to: atMZ,
      prescriptions: ['fixed-order'],
      data: [
        { series: 'tau-delta0', measured: quantity('0.2037', 0.005) },
        { series: 'bjorken', scale: 1.77693, measured: quantity('0.84', 0.02) },
      ],
    };
    const { summary } = standing(fit(problem, series, {}));
    const alone = summary!.pulls.map((p) => Number(p.alone)).toSorted((a, b) => a - b);
    expect(Number(summary?.values[0]?.value)).toBeGreaterThan(alone[0]!);
    expect(Number(summary?.values[0]?.value)).toBeLessThan(alone[1]!);
    // δ⁽⁰⁾ rises with α_s and the Bjorken sum falls: a common scale moves them in a correlated way.
    const scale = summary?.correlations.find((c) => c.component === 'scale')?.matrix;
    expect(scale?.[0]?.[1]).toBe(scale?.[1]?.[0]);
    expect(Math.abs(Number(scale?.[0]?.[1]))).toBeGreaterThan(0.99);
  });
});
