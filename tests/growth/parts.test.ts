/** The single steps: least squares, reading, sign pattern, noise, outliers, growth order. */
import { describe, expect, it } from 'vitest';
import { growthOrder } from '../../src/growth/growth-order.js';
import { diagnoseGrowth } from '../../src/growth/index.js';
import { logGammaDouble } from '../../src/numerics/index.js';
import { leastSquares } from '../../src/growth/least-squares.js';
import { roughness, usableCoefficients } from '../../src/growth/noise.js';
import { findOutliers } from '../../src/growth/outliers.js';
import { readTerms, type Point } from '../../src/growth/reading.js';
import { signPattern } from '../../src/growth/sign-pattern.js';
import { Dice, fromBorel, input, lnFactorial, power, term, zero } from './generate.js';
import { fromTexts } from './terms.js';

function pointsOf(terms: ReturnType<typeof fromBorel>): readonly Point[] {
  const reading = readTerms(input(terms));
  if (reading.kind !== 'series') throw new Error(reading.kind);
  return reading.sequence.points;
}

describe('least squares', () => {
  it('recovers an exact law and leaves no residual', () => {
    const k = [0, 1, 2, 3, 4, 5];
    const fit = leastSquares(
      [k.map(() => 1), k, k.map((v) => v * v)],
      k.map((v) => 2 - 3 * v + 0.5 * v * v),
    )!;
    [2, -3, 0.5].forEach((v, i) => expect(fit.coefficients[i]).toBeCloseTo(v, 12));
    expect(fit.rss).toBeLessThan(1e-24);
  });

  it('has the residuals orthogonal to the columns, with weights', () => {
    const x = [1, 2, 3, 4, 5, 6];
    const y = [2, 1, 4, 3, 7, 5];
    const w = [1, 0.5, 2, 1, 0.1, 3];
    const fit = leastSquares([x.map(() => 1), x], y, w)!;
    expect(fit.residuals.reduce((s, r, i) => s + w[i]! * r, 0)).toBeCloseTo(0, 12);
    expect(fit.residuals.reduce((s, r, i) => s + w[i]! * r * x[i]!, 0)).toBeCloseTo(0, 12);
    // Variance of the slope for equal weights: 1/Σ(x − x̄)².
    expect(leastSquares([x.map(() => 1), x], y)!.unitVariances[1]).toBeCloseTo(1 / 17.5, 12);
  });

  it('refuses dependent columns and too few points', () => {
    expect(
      leastSquares(
        [
          [1, 1, 1],
          [2, 2, 2],
        ],
        [1, 2, 3],
      ),
    ).toBeUndefined();
    expect(
      leastSquares(
        [
          [1, 1],
          [1, 2],
          [1, 4],
        ],
        [1, 2],
      ),
    ).toBeUndefined();
  });
});

describe('reading', () => {
  it('tells empty, all-zero, terminating and lacunary lists apart', () => {
    expect(readTerms(input([])).kind).toBe('empty');
    expect(readTerms({ ...input([]), leadingZeros: 5 }).kind).toBe('all-zero');
    expect(readTerms(input([zero(), zero()])).kind).toBe('all-zero');
    expect(readTerms(input([term(0, 1), term(1, 1), zero(), zero(), zero()])).kind).toBe('terminating');
    expect(readTerms(input([term(0, 1), term(1, 1), zero(), zero()])).kind).toBe('series');
    const lacunary = readTerms(input([1, 0, 0, 1, 0, 0, 1, 0, 0, 1, 0, 0].map((v) => (v === 1 ? term(0, 1) : zero()))));
    expect(lacunary.kind === 'series' && lacunary.sequence.stride).toBe(3);
  });

  it('a wide stride loses nothing: (100k)! x^(100k), exact and in doubles', () => {
    const factorial = [1n];
    for (let n = 1; n <= 1500; n++) factorial.push(factorial[n - 1]! * BigInt(n));
    const texts = Array.from({ length: 1501 }, (_, n) => (n % 100 === 0 ? `${factorial[n]!}` : '0'));
    for (const exact of [true, false]) {
      const g = diagnoseGrowth(fromTexts(texts, { exact }));
      expect(g.verdict, g.statement).toBe('factorial');
      expect(g.stride).toBe(100);
      expect(Math.abs(g.nearest!.t.value - 1)).toBeLessThanOrEqual(g.nearest!.t.error);
    }
  });

  it('a zero with an error is not an exact zero', () => {
    const vague = { ...zero(), relativeError: 1 };
    expect(readTerms(input([term(0, 1), term(1, 1), vague, vague, vague])).kind).toBe('series');
  });

  it('cuts leading zeros that the caller left, exact coefficients included', () => {
    const left = fromTexts([
      '0',
      '0',
      ...Array.from({ length: 30 }, (_, n) => (-1) ** n * Math.exp(lnFactorial(n))).map((v) => `${Math.round(v)}`),
    ]);
    const g = diagnoseGrowth(left);
    expect(g.verdict).toBe('factorial');
    expect(g.flags.map((f) => f.code)).toContain('leading-zeros');
    expect(g.nearest!.t.value).toBeCloseTo(-1, 6);
  });
});

describe('sign pattern', () => {
  const pattern = (signs: string): ReturnType<typeof signPattern> =>
    signPattern(pointsOf([...signs].map((s, n) => term(n, s === '+' ? 1 : -1))));
  it.each([
    ['++++', 'same', 0],
    ['-+-+-', 'alternating', 0],
    ['++-+-+', 'alternating', 1],
    ['+---', 'irregular', 1],
    ['+-----', 'same', 1],
    ['++++-+-+', 'alternating', 3],
    ['+++--+++--', 'irregular', 8],
  ])('%s is %s from %i', (signs, kind, from) => {
    expect(pattern(signs).kind).toBe(kind);
    if (kind !== 'irregular') expect(pattern(signs).from).toBe(from);
  });
});

describe('growth order', () => {
  it.each([
    ['n!', 1, (n: number) => lnFactorial(n)],
    ['(2n)!', 2, (n: number) => lnFactorial(2 * n)],
    ['(n!)^2 5^n', 2, (n: number) => 2 * lnFactorial(n) + n * Math.log(5)],
    ['1/n!', -1, (n: number) => -lnFactorial(n)],
    ['3^n', 0, (n: number) => n * Math.log(3)],
    ['(n+1)^2.5', 0, (n: number) => 2.5 * Math.log(n + 1)],
    ['Γ(1 + n/2)', 0.5, (n: number) => logGammaDouble(1 + n / 2)],
    ['(3n)!/n!', 2, (n: number) => lnFactorial(3 * n) - lnFactorial(n)],
  ])('%s has order %d', (_, order, law) => {
    for (const count of [16, 40, 120]) {
      const fit = growthOrder(pointsOf(Array.from({ length: count }, (_u, n) => term(law(n), 1))), 1, true)!;
      expect(Math.abs(fit.order.value - order)).toBeLessThan(Math.max(3 * fit.order.error, 1e-9));
      expect(fit.order.error).toBeLessThan(0.2);
      expect(fit.beyond).toBe(false);
    }
  });

  it('2^(n(n−1)/2) is beyond all', () => {
    const p = pointsOf(Array.from({ length: 20 }, (_, n) => term((n * (n - 1) * Math.LN2) / 2, 1)));
    expect(growthOrder(p, 1, true)!.beyond).toBe(true);
  });
});

describe('noise', () => {
  it.each([1e-7, 1e-5, 1e-3, 0.05, 0.3])('finds a scatter of %d within a factor two', (level) => {
    const d = new Dice(5);
    const p = pointsOf(fromBorel(power(1.3, 1.4, 60).map((v) => v * (1 + level * d.normal()))));
    const found = roughness(p)!.level;
    expect(roughness(p)!.noise).toBe(true);
    expect(found).toBeGreaterThan(level / 2);
    expect(found).toBeLessThan(level * 2);
  });

  it('sees none in exact series, with and without an alternating admixture', () => {
    expect(roughness(pointsOf(fromBorel(power(1.3, 1.4, 60))))?.noise).toBe(false);
    const far = power(-1.6, 1, 60);
    expect(roughness(pointsOf(fromBorel(power(1, 1.4, 60).map((v, n) => v + 0.3 * far[n]!))))?.noise).toBe(false);
  });

  it('turns errors into usable coefficients', () => {
    expect(usableCoefficients([0, 0, 0, 0])).toBe(4);
    expect(usableCoefficients(Array.from({ length: 40 }, () => 1e-6))).toBe(8);
    expect(usableCoefficients(Array.from({ length: 30 }, () => 5e-5))).toBe(6);
    expect(usableCoefficients(Array.from({ length: 30 }, () => 0.3))).toBe(1);
    // The pole mass: 0.13 % on the fourth coefficient costs nothing.
    expect(usableCoefficients([0, 0, 0, 1.3e-3])).toBe(4);
  });
});

describe('outliers', () => {
  const clean = fromBorel(power(0.7, 1.4, 24));
  it('names a wrong digit and a wrong sign, and nothing in a clean series', () => {
    const digit = pointsOf(clean.map((t, n) => (n === 9 ? { ...t, logAbs: t.logAbs + Math.log(1.02) } : t)));
    const found = findOutliers(digit, signPattern(digit)).outliers;
    expect(found).toHaveLength(1);
    expect(found[0]).toMatchObject({ k: 9, what: 'size' });
    expect(found[0]!.offset).toBeCloseTo(Math.log(1.02), 3);
    const sign = pointsOf(clean.map((t, n) => (n === 12 ? { ...t, sign: -1 as const } : t)));
    expect(findOutliers(sign, signPattern(sign)).outliers).toMatchObject([{ k: 12, what: 'sign' }]);
    const none = pointsOf(clean);
    expect(findOutliers(none, signPattern(none)).outliers).toEqual([]);
  });

  it('two misprints are both found', () => {
    const p = pointsOf(clean.map((t, n) => (n === 7 || n === 15 ? { ...t, logAbs: t.logAbs + Math.log(10) } : t)));
    expect(
      findOutliers(p, signPattern(p))
        .outliers.map((o) => o.k)
        .sort((a, b) => a - b),
    ).toEqual([7, 15]);
  });
});
