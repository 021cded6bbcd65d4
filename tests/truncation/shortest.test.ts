import { describe, expect, test } from 'vitest';
import { shortestIntervals, type Predictive } from '../../src/truncation/numeric/predictive.js';

/** (1/π)(arctan y) + 1/2: heavy tails on both sides. */
const cauchy: Predictive = {
  at: (y) => ({ cdf: Math.atan(y) / Math.PI + 0.5, pdf: 1 / (Math.PI * (1 + y * y)) }),
  centre: 0.3,
  spread: 1,
};

/** y e^(−y) for y > 0: skew, with a known distribution 1 − (1 + y) e^(−y). */
const gamma2: Predictive = {
  at: (y) => (y <= 0 ? { cdf: 0, pdf: 0 } : { cdf: 1 - (1 + y) * Math.exp(-y), pdf: y * Math.exp(-y) }),
  centre: 2,
  spread: 1,
};

/** Two logistic bumps, a tall narrow one at 0 and a low broad one at 20. */
const logistic = (y: number, width: number): { cdf: number; pdf: number } => {
  const e = Math.exp(-Math.abs(y) / width);
  const cdf = y > 0 ? 1 / (1 + e) : e / (1 + e);
  return { cdf, pdf: e / (width * (1 + e) ** 2) };
};
const bumps: Predictive = {
  at: (y) => {
    const [a, b] = [logistic(y, 0.1), logistic(y - 20, 1)];
    return { cdf: 0.75 * a.cdf + 0.25 * b.cdf, pdf: 0.75 * a.pdf + 0.25 * b.pdf };
  },
  centre: 5,
  spread: 3,
};

const content = (p: Predictive, [low, high]: readonly [number, number]): number => p.at(high).cdf - p.at(low).cdf;

describe('the shortest interval', () => {
  test('of a symmetric density is symmetric, with the known quantiles', () => {
    const [one, two] = shortestIntervals(cauchy, [0.68, 0.95]);
    expect(one?.high).toBeCloseTo(Math.tan(Math.PI * 0.34), 4);
    expect(one?.low).toBeCloseTo(-Math.tan(Math.PI * 0.34), 4);
    expect(two?.high).toBeCloseTo(Math.tan(Math.PI * 0.475), 1);
  });

  test('of a skew density has equal densities at its ends and the wanted content', () => {
    for (const level of [0.5, 0.68, 0.95]) {
      const [interval] = shortestIntervals(gamma2, [level]);
      if (interval === undefined) expect.fail();
      const { low, high } = interval;
      expect(content(gamma2, [low, high])).toBeCloseTo(level, 9);
      expect(gamma2.at(low).pdf).toBeCloseTo(gamma2.at(high).pdf, 5);
      expect(low).toBeGreaterThan(0);
      expect(low).toBeLessThan(1);
    }
  });

  test('picks the tall bump when it holds enough, and both when it does not', () => {
    const [small, large] = shortestIntervals(bumps, [0.68, 0.95]);
    if (small === undefined || large === undefined) expect.fail();
    expect(small.high).toBeLessThan(1);
    expect(content(bumps, [small.low, small.high])).toBeCloseTo(0.68, 9);
    expect(large.high).toBeGreaterThan(20);
    expect(content(bumps, [large.low, large.high])).toBeCloseTo(0.95, 9);
  });

  test('stretches with the density', () => {
    const wide: Predictive = {
      at: (y) => ({ cdf: gamma2.at(y / 1e20).cdf, pdf: gamma2.at(y / 1e20).pdf / 1e20 }),
      centre: 2e20,
      spread: 1e20,
    };
    const [unit] = shortestIntervals(gamma2, [0.68]);
    const [stretched] = shortestIntervals(wide, [0.68]);
    expect((stretched?.high ?? 0) / 1e20).toBeCloseTo(unit?.high ?? 0, 4);
  });
});
