/** @module Replicas of toys with a closed form: every replica exactly, widths within their Monte Carlo errors. */
import { describe, expect, test } from 'vitest';
import { Draw } from '../../../src/extraction/replicas/draw.js';
import { Engine, REFUSED, UNSOLVED } from '../../../src/extraction/replicas/engine.js';
import type { ReplicaProblem } from '../../../src/extraction/replicas/problem.js';
import { runBlock } from '../../../src/extraction/replicas/run-block.js';
import { statistics } from '../../../src/extraction/replicas/statistics.js';
import { correlated, datum, identity, inputsOf, quadratic } from './toys.js';

const SEED = 7;

/** Values of the first quantity, and the inputs drawn for each replica. */
function replicas(
  problem: ReplicaProblem,
  count: number,
): { values: Float64Array; codes: Uint8Array; inputs: Float64Array[] } {
  const { values, codes } = runBlock(new Engine(problem, SEED), { index: 0, first: 0, count });
  const draw = new Draw(problem.inputs, SEED);
  const inputs = Array.from({ length: count }, (_, i) => {
    const state = new Float64Array(problem.inputs.central.length);
    draw.replica(i, state, 0);
    return state;
  });
  return { values: values.subarray(0, count), codes, inputs };
}

describe('closed forms, replica by replica', () => {
  test('R = α gives the measurement that was drawn', () => {
    const { values, inputs } = replicas(identity, 2000);
    values.forEach((value, i) => expect(Math.abs(value / inputs[i]![0]! - 1)).toBeLessThan(1e-14));
  });

  test('R = α + c α² gives the root of the quadratic', () => {
    const { values, inputs, codes } = replicas(quadratic, 2000);
    values.forEach((value, i) => {
      const [X = NaN, , c = NaN] = inputs[i]!;
      if (c <= 0) return;
      expect(codes[i]).toBe(0);
      expect(Math.abs(value / ((Math.sqrt(1 + 4 * c * X) - 1) / (2 * c)) - 1)).toBeLessThan(1e-13);
    });
  });

  test('a condensate is what the measurement leaves over', () => {
    const problem: ReplicaProblem = {
      task: { kind: 'condensate', term: { wilson: 2, corrections: [-0.5], dimension: 4 } },
      parameters: [{ symbol: 'G', from: -Infinity, to: Infinity }],
      inputs: inputsOf([
        ['measurement', 0.2, 0.01],
        ['alpha', 0.3, 0.02],
        ['c0', 0.5, 0],
        ['Q', 1.5, 0],
      ]),
      data: [datum({ coupling: { kind: 'slot', slot: 2 }, coefficients: [3], measured: 1, scale: 4 })],
      prescriptions: [{ ...identity.prescriptions[0]!, central: [0] }],
    };
    const { values, inputs } = replicas(problem, 500);
    values.forEach((value, i) => {
      const [X = NaN, a = NaN] = inputs[i]!;
      const expected = ((X - 0.5 * a) * 1.5 ** 4) / (2 * (1 - 0.5 * a));
      expect(Math.abs(value - expected)).toBeLessThan(1e-14);
    });
  });

  test('norm, mass power and power corrections enter as written', () => {
    const problem: ReplicaProblem = {
      ...correlated,
      inputs: inputsOf([
        ['a', 1, 0.1],
        ['alpha', 0.3, 0],
        ['m', 4, 0.2],
        ['norm', 0.7, 0.01],
        ['G', 0.02, 0.005],
      ]),
      data: [
        datum({
          coupling: { kind: 'slot', slot: 2 },
          additive: 1,
          coefficients: [1],
          mass: 3,
          norm: 4,
          massPower: 5,
          scale: 3,
          terms: [{ wilson: 3, corrections: [0.1], dimension: 4, value: 5 }],
        }),
      ],
      prescriptions: [{ ...identity.prescriptions[0]!, central: [1] }],
    };
    const { values, inputs } = replicas(problem, 300);
    values.forEach((value, i) => {
      const [a = NaN, x = NaN, m = NaN, norm = NaN, G = NaN] = inputs[i]!;
      const expected = norm * m ** 5 * (1 + a * x + (3 * (1 + 0.1 * x) * G) / m ** 4);
      expect(Math.abs(value / expected - 1)).toBeLessThan(1e-13);
    });
  });

  test('a fit of two measurements of α is their weighted mean', () => {
    const problem: ReplicaProblem = {
      task: { kind: 'fit' },
      parameters: identity.parameters,
      inputs: inputsOf([
        ['first', 0.3, 0.01],
        ['second', 0.31, 0.02],
        ['c0', 1, 0],
      ]),
      data: [datum({ coefficients: [3], measured: 1 }), datum({ coefficients: [3], measured: 2 })],
      prescriptions: [
        {
          ...identity.prescriptions[0]!,
          whitening: [[1 / 0.01], [0, 1 / 0.02]],
          settings: [
            { kind: 'fixed-order', terms: 1 },
            { kind: 'fixed-order', terms: 1 },
          ],
        },
      ],
    };
    const { values, inputs } = replicas(problem, 500);
    values.forEach((value, i) => {
      const [a = NaN, b = NaN] = inputs[i]!;
      expect(Math.abs(value / ((4 * a + b) / 5) - 1)).toBeLessThan(1e-9);
    });
  });
});

describe('distributions', () => {
  test('R = α: the normal distribution of the measurement, percentiles within their errors', () => {
    const s = statistics(replicas(identity, 20_000).values)!;
    // Quantiles of the standard normal distribution: Φ⁻¹(0.975) and Φ⁻¹(0.84), mpmath 1.3.0.
    const expected = {
      low95: -1.959963984540054,
      low68: -0.994457883209753,
      median: 0,
      high68: 0.994457883209753,
      high95: 1.959963984540054,
    };
    for (const [name, z] of Object.entries(expected) as [keyof typeof expected, number][]) {
      const { value, error } = s.percentiles[name];
      expect(Math.abs(value - (0.3 + 0.01 * z)), name).toBeLessThan(4 * error);
      // The error itself: √(q (1 − q)/n)/density.
      const q = { low95: 0.025, low68: 0.16, median: 0.5, high68: 0.84, high95: 0.975 }[name];
      const density = Math.exp((-z * z) / 2) / (0.01 * Math.sqrt(2 * Math.PI));
      expect(error / (Math.sqrt((q * (1 - q)) / 20_000) / density)).toBeCloseTo(1, 0);
    }
    expect(Math.abs(s.sigma.value - 0.01)).toBeLessThan(4 * s.sigma.error);
    expect(Math.abs(s.skewness.value)).toBeLessThan(4 * s.skewness.error);
    expect(s.halves).toBeLessThan(3.5);
  });

  test('correlated inputs: √(J C Jᵀ) = 0.320312347560939, linear exactly and in the replicas within their error', () => {
    // J = (1.5, −0.7), C = [[0.04, 0.015], [0.015, 0.09]]; arithmetic. Without the correlation 0.366196668472011.
    const engine = new Engine(correlated, SEED);
    const linear = Math.hypot(...engine.responses[0]!.map((r) => r[0]!));
    expect(Math.abs(linear - 0.320312347560939)).toBeLessThan(1e-12);
    const s = statistics(replicas(correlated, 20_000).values)!;
    expect(Math.abs(s.sigma.value - 0.320312347560939)).toBeLessThan(4 * s.sigma.error);
    expect(0.366196668472011 - s.sigma.value).toBeGreaterThan(10 * s.sigma.error);
    const bare = new Engine({ ...correlated, inputs: { ...correlated.inputs, factor: [[1], [0, 1]] } }, SEED);
    expect(Math.abs(Math.hypot(...bare.responses[0]!.map((r) => r[0]!)) - 0.366196668472011)).toBeLessThan(1e-12);
  });

  test('unequal errors keep the median and reach their own ends', () => {
    const problem: ReplicaProblem = { ...identity, inputs: { ...identity.inputs, plus: [0.03, 0], minus: [0.01, 0] } };
    const s = statistics(replicas(problem, 20_000).values)!;
    const z = 0.994457883209753;
    expect(Math.abs(s.percentiles.median.value - 0.3)).toBeLessThan(4 * s.percentiles.median.error + 1e-4);
    expect(Math.abs(s.percentiles.high68.value - (0.3 + 0.03 * z))).toBeLessThan(4 * s.percentiles.high68.error);
    expect(Math.abs(s.percentiles.low68.value - (0.3 - 0.01 * z))).toBeLessThan(4 * s.percentiles.low68.error);
    expect(s.skewness.value).toBeGreaterThan(0.5);
  });
});

describe('replicas without a value', () => {
  test('say whether the prescription refused or nothing solves', () => {
    const refusing: ReplicaProblem = {
      ...identity,
      inputs: inputsOf([
        ['measurement', 0.3, 0.01],
        ['c0', 1, 0],
        ['c1', -0.1, 0.1],
        ['c2', 0.2, 0],
        ['c3', -0.6, 0],
      ]),
      data: [datum({ coefficients: [2, 3, 4, 5], measured: 1 })],
      prescriptions: [
        {
          ...identity.prescriptions[0]!,
          settings: [{ kind: 'weniger-delta', variant: 'd', count: 4, start: 0 }],
          central: [0.31],
        },
      ],
    };
    const { codes, inputs, values } = replicas(refusing, 400);
    inputs.forEach((state, i) => {
      expect(codes[i] === REFUSED).toBe(!(state[2]! < 0));
      expect(Number.isNaN(values[i]!)).toBe(codes[i] !== 0);
    });
    const unreachable: ReplicaProblem = {
      ...identity,
      parameters: [{ symbol: 'alpha', from: 0.2, to: 0.3 }],
    };
    const out = replicas(unreachable, 400);
    out.inputs.forEach((state, i) => expect(out.codes[i]).toBe(state[0]! > 0.3 ? UNSOLVED : 0));
  });
});
