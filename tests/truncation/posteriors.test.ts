/** Posteriors on their own: normalised, right about the ensembles that they assume, and in one piece at the edges. */
import { describe, expect, test } from 'vitest';
import { abcInner, outside } from '../../src/truncation/bayesian/abc-inner.js';
import { abcPosterior, type SignedLog } from '../../src/truncation/bayesian/abc-posterior.js';
import { densityAt, halfWidth, within } from '../../src/truncation/bayesian/bounded-uniform.js';
import { geometricPosterior } from '../../src/truncation/bayesian/geometric-posterior.js';
import { integrate } from '../../src/truncation/numeric/quadrature.js';
import { shortestIntervals } from '../../src/truncation/numeric/predictive.js';
import { uniform } from './random.js';
import { expectClose } from './support.js';

const usual = { omega: 1, epsilon: 0.1, xi: 2, eta: 0.1 };
const signed = (values: readonly number[]): SignedLog[] =>
  values.map((d) => ({ sign: Math.sign(d), log: Math.log(Math.abs(d)) }));

describe('uniform within an unknown bound', () => {
  test.each([1, 1.1, 4, 40])('s = %d: the density integrates to 1, level and half-width are inverse', (s) => {
    const inner = integrate((r) => densityAt(s, r), [0, 1], 1e-13).value;
    // r = 1/q maps the tail to a finite range.
    const tail = integrate((q) => densityAt(s, 1 / q) / q ** 2, [0, 1], 1e-13).value;
    expectClose(2 * (inner + tail), 1, 1e-11);
    for (const p of [0.01, 0.5, 0.68, s / (s + 1), 0.95, 0.999]) expectClose(within(s, halfWidth(s, p)), p, 1e-13);
    expect(halfWidth(s, 0.68)).toBeLessThan(halfWidth(s, 0.95));
  });
});

describe('geometric posterior', () => {
  const cases: readonly (readonly number[])[] = [
    [1, 0.5, 0.3, 0.12],
    [1, -0.9],
    [1, 0.1, 0.3, 0.001, 0.02],
    [1, 0, 0.25, 0.1],
    [1, 0.99, 0.98, 0.97],
  ];

  test.each(cases.map((c) => [c]))('of %j is normalised, its density the slope of its distribution', (values) => {
    for (const omega of [0, 0.5, 1, 7]) {
      const p = geometricPosterior(
        values.map((d) => Math.log(Math.abs(d))),
        { omega, epsilon: 0.1 },
      );
      if (p === undefined) expect.fail();
      expect(p.within(-60)).toBeLessThan(1e-15);
      expectClose(p.within(80), 1, 1e-9);
      expectClose(
        p.components.reduce((sum, c) => sum + c.weight, 0),
        1,
        1e-12,
      );
      for (const logD of [-6, -3, -1.5, 0, 1]) {
        const h = 1e-4;
        const slope = (p.within(logD + h) - p.within(logD - h)) / (2 * h);
        expect(Math.abs(2 * p.density(logD) * Math.exp(logD) - slope)).toBeLessThan(1e-7);
      }
      for (const level of [0.68, 0.95]) expectClose(p.within(p.logHalfWidth(level)), level, 1e-9);
      expect(p.meanRatio).toBeGreaterThan(0);
      expect(p.meanRatio).toBeLessThan(1);
    }
  });

  test('its evidence is the integral over ratio and size', () => {
    const values = [1, 0.5, 0.2];
    const p = geometricPosterior(values.map(Math.log), { omega: 2, epsilon: 0.3 });
    const size = (a: number): number => Math.max(1, ...values.map((d, k) => d / a ** k));
    // ∫dc ε c^(−1−ε) (2c)^(−3) a^(−3) from the largest |δ_k|/a^k on.
    const inner = (a: number): number => (0.3 / 8 / 3.3) * size(a) ** -3.3 * a ** -3;
    const kinks = [0, 0.4, Math.sqrt(0.2), 0.5, 1];
    const evidence = integrate((a) => 3 * (1 - a) ** 2 * inner(a), kinks, 1e-12).value;
    expectClose(Math.exp(p?.logEvidence ?? 0), evidence, 1e-10);
  });

  test('too many zeros at the end leave nothing to normalise', () => {
    expect(geometricPosterior([0, -Infinity, -Infinity], { omega: 1, epsilon: 0.1 })).toBeUndefined();
  });
});

describe('abc posterior', () => {
  const inner = abcInner(3, -0.4, 1, 0, usual);
  /** M(b) of the inner integral in its own unit. */
  const bound = (b: number): number => {
    const unit = Math.exp(inner.logUnit);
    return Math.max(usual.eta / unit, Math.abs(b) / usual.xi, inner.hi - b, b - inner.lo);
  };
  const edges = [-1e6, -1e5, -1e4, -4e3, -400, -40, -8, -2, -1, -0.5, 0, 0.5, 1, 2, 8, 40, 400, 4e3, 1e4, 1e5, 1e6];

  test('the inner integral and its tails are those of brute force', () => {
    const s = 4.1;
    const area = integrate((b) => bound(b) ** -s, edges, 1e-12).value;
    expectClose(Math.exp(inner.logWeight - (1 - s) * inner.logUnit), area / s, 1e-9);
    for (const z of [inner.hi, inner.hi + 0.3, inner.hi + 5]) {
      const density = integrate((b) => Math.max(bound(b), Math.abs(z - b)) ** (-s - 1), edges, 1e-12).value;
      expectClose(outside(inner, z, 1).pdf, ((s / (2 * (s + 1))) * density) / area, 1e-7);
    }
    const slope = (outside(inner, inner.lo - 1.001, -1).tail - outside(inner, inner.lo - 0.999, -1).tail) / 0.002;
    expectClose(-slope, outside(inner, inner.lo - 1, -1).pdf, 1e-6);
    expectClose(inner.below + (inner.hi - inner.lo) * inner.plateau + outside(inner, inner.hi, 1).tail, 1, 1e-12);
  });

  test.each([0.3, 0.999, 1, 1.001, 20])('the distribution at fixed ratio adds up to 1 for xi = %d', (xi) => {
    const one = abcInner(4, -0.2, 0.7, 0.5, { ...usual, xi });
    expectClose(one.below + (one.hi - one.lo) * one.plateau + outside(one, one.hi, 1).tail, 1, 1e-9);
    expect(outside(one, one.hi + 1e6, 1).tail).toBeLessThan(1e-12);
  });

  const cases: readonly (readonly number[])[] = [
    [1, 0.5, 0.3, 0.12],
    [1, -0.5, 0.3],
    [1, 0.9],
    [1, 0.3, -0.2, 0.05, 0.06],
  ];
  test.each(cases.map((c) => [c]))('of %j is normalised and mirrors with the terms', (values) => {
    const p = abcPosterior(signed(values), usual);
    const mirrored = abcPosterior(signed(values.map((d, k) => (k % 2 === 0 ? d : -d))), usual);
    if (p === undefined || mirrored === undefined) expect.fail();
    expect(p.at(-1e9).cdf).toBeLessThan(1e-9);
    expectClose(p.at(1e9).cdf, 1, 1e-9);
    for (const y of [-2, 0, 0.7]) expect(p.ruleDifference(y)).toBeLessThan(1e-4);
    // δ_k → (−1)^k δ_k turns a into −a: the next term changes sign when its index is odd.
    const flip = values.length % 2 === 1 ? -1 : 1;
    expectClose(mirrored.mean * Math.exp(mirrored.logUnit), flip * p.mean * Math.exp(p.logUnit), 1e-9);
    const [one, two] = shortestIntervals(p, [0.68, 0.95]);
    if (one === undefined || two === undefined) expect.fail();
    expectClose(p.at(one.high).cdf - p.at(one.low).cdf, 0.68, 1e-8);
    expectClose(p.at(two.high).cdf - p.at(two.low).cdf, 0.95, 1e-8);
    expect(two.high - two.low).toBeGreaterThan(one.high - one.low);
  });
});

/** Share of 1,000 seeded draws that `draw` reports as inside. */
const DRAWS = 1000;
function share(seed: number, draw: (next: () => number) => boolean): number {
  const next = uniform(seed);
  let count = 0;
  for (let k = 0; k < DRAWS; k++) if (draw(next)) count++;
  return count / DRAWS;
}

/** 68 % within 3 %, two standard deviations of 1,000 draws. */
const expectCovered = (found: number, level = 0.68): void => {
  expect(Math.abs(found - level), `covered ${found}`).toBeLessThanOrEqual(0.03);
};

describe('the 68 % interval covers 68 % of what the model itself assumes', () => {
  test.each([2, 4])('Cacciari and Houdeau, %i known coefficients', (n) => {
    const covered = (level: number): number =>
      share(n, (next) => {
        const c = Array.from({ length: n + 1 }, () => 2 * next() - 1).map(Math.abs);
        const bound = Math.max(...c.slice(0, n));
        return (c[n] ?? 0) <= bound * halfWidth(n, level);
      });
    expectCovered(covered(0.68));
    expectCovered(covered(0.95), 0.95);
  });

  test('geometric model', () => {
    const prior = { omega: 1, epsilon: 0.1 };
    const found = share(11, (next) => {
      const logA = Math.log(1 - next() ** (1 / (1 + prior.omega)));
      const logC = -Math.log(next()) / prior.epsilon;
      const logs = Array.from({ length: 4 }, (_, k) => logC + k * logA + Math.log(next()));
      const posterior = geometricPosterior(logs.slice(0, 3), prior);
      return posterior !== undefined && posterior.within(logs[3] ?? 0) <= 0.68;
    });
    expectCovered(found);
  });

  test('abc model', () => {
    const found = share(12, (next) => {
      const a = (1 - next() ** (1 / (1 + usual.omega))) * (next() < 0.5 ? -1 : 1);
      const logC = Math.log(usual.eta) - Math.log(next()) / usual.epsilon;
      const bias = usual.xi * (2 * next() - 1);
      const terms = Array.from({ length: 4 }, (_, k): SignedLog => {
        const value = bias + 2 * next() - 1;
        const sign = Math.sign(value) * (k % 2 === 0 ? 1 : Math.sign(a));
        return { sign, log: logC + Math.log(Math.abs(value)) + k * Math.log(Math.abs(a)) };
      });
      // A coarse tolerance serves: coverage is wanted to 3 %.
      const p = abcPosterior(terms.slice(0, 3), usual, 1e-3);
      const [interval] = p === undefined ? [] : shortestIntervals(p, [0.68]);
      const last = terms[3];
      if (p === undefined || interval === undefined || last === undefined) return false;
      const y = last.sign * Math.exp(last.log - p.logUnit);
      return y >= interval.low && y <= interval.high;
    });
    expectCovered(found);
  });
});
