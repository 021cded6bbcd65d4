/** @module The parts of a Monte Carlo: roots, statistics, inputs and their correlations. */
import { describe, expect, test } from 'vitest';
import { rootNear } from '../../../src/extraction/replicas/root.js';
import { SlotList } from '../../../src/extraction/replicas/slots.js';
import { histogram, orderStatistic, pairOf, statistics } from '../../../src/extraction/replicas/statistics.js';
import { Substreams } from '../../../src/numerics/index.js';
import { isRefusal } from '../../../src/qcd/index.js';

describe('rootNear', () => {
  test('finds the root from a good start, a bad one, and one outside the range', () => {
    const f = (p: number): number => Math.exp(p) - 2;
    for (const start of [0.69, 0.1, 1.9, 5, -3])
      expect(Math.abs(rootNear(f, start, 2, 0, 2) - Math.LN2)).toBeLessThan(1e-14);
  });

  test('stays on the branch of the slope, the nearest to the start', () => {
    const f = (p: number): number => Math.sin(p);
    expect(rootNear(f, 6.4, 1, 1, 20)).toBeCloseTo(2 * Math.PI, 12);
    expect(rootNear(f, 12.2, 1, 1, 20)).toBeCloseTo(4 * Math.PI, 12);
    expect(rootNear(f, 9, -1, 1, 20)).toBeCloseTo(3 * Math.PI, 12);
    // Secants alone would fall to the root at π, where f falls.
    expect(rootNear(f, 2.5, 1, 1, 20)).toBeCloseTo(2 * Math.PI, 12);
  });

  test('a wrong slope, a jump and a pole are no roots', () => {
    expect(rootNear((p) => p - 0.5, 0.5001, -1, 0.6, 1)).toBeNaN();
    expect(rootNear((p) => (p < 0.5 ? -1 : 1), 0.4, 1, 0, 1)).toBeNaN();
    expect(rootNear((p) => 1 / (0.5 - p), 0.4, 1, 0, 0.9)).toBeNaN();
    expect(rootNear(() => NaN, 0.4, 1, 0, 1)).toBeNaN();
    expect(rootNear((p) => p * p + 1, 0.4, 1, 0, 1)).toBeNaN();
  });

  test('a start that is no number is no hindrance', () => {
    expect(rootNear((p) => p - 0.25, NaN, 1, 0, 1)).toBeCloseTo(0.25, 13);
  });
});

describe('statistics', () => {
  test('order statistics are interpolated and end at the ends', () => {
    const sorted = Float64Array.of(1, 2, 4);
    expect([-1, 0, 0.5, 1, 1.5, 2, 9].map((p) => orderStatistic(sorted, p))).toEqual([1, 1, 1.5, 2, 3, 4, 4]);
  });

  test('of few, or of none: undefined, or without halves', () => {
    expect(statistics(Float64Array.of())).toBeUndefined();
    expect(statistics(Float64Array.of(NaN, 1, NaN))).toBeUndefined();
    const s = statistics(Float64Array.of(1, NaN, 2, 3))!;
    expect([s.count, s.mean.value, s.sigma.value, s.halves]).toEqual([3, 2, 1, undefined]);
    const same = statistics(new Float64Array(200).fill(5))!;
    expect([same.sigma.value, same.skewness.value, same.halves]).toEqual([0, 0, 0]);
  });

  test('halves that disagree are seen', () => {
    const drifting = Float64Array.from({ length: 1000 }, (_, i) => (i < 500 ? 0 : 3) + Math.sin(i * 12.9898) * 0.5);
    expect(statistics(drifting)!.halves).toBeGreaterThan(5);
  });

  test('halves of one distribution differ by as much as they should', () => {
    const z = new Float64Array(1);
    const largest = Array.from({ length: 30 }, (_, seed) => {
      const streams = new Substreams(seed);
      const column = Float64Array.from({ length: 800 }, (_value, i) => {
        streams.normals(i, z);
        return z[0]!;
      });
      return statistics(column)!.halves!;
    });
    // The largest of five standard normal sizes, somewhat correlated: between 1 and 2 on the average.
    const mean = largest.reduce((a, b) => a + b) / largest.length;
    expect(mean).toBeGreaterThan(1);
    expect(mean).toBeLessThan(2);
  });

  test('covariance over the replicas that both have', () => {
    const a = Float64Array.of(1, 2, 3, NaN, 100);
    const b = Float64Array.of(2, 4, 6, 50, NaN);
    const both = pairOf(a, b);
    expect(both.covariance).toBeCloseTo(2, 12);
    expect(both.correlation).toBeCloseTo(1, 12);
    expect(pairOf(a, Float64Array.of(1, 1, 1, 1, 1)).correlation).toBe(0);
    expect(pairOf(Float64Array.of(1, NaN), Float64Array.of(NaN, 1)).covariance).toBeNaN();
  });

  test('histograms count everything once', () => {
    const h = histogram(Float64Array.of(0, 0.1, 0.5, 1, 1.1, -0.1, NaN), 0, 1, 4);
    expect(h).toEqual({ from: 0, to: 1, counts: [2, 0, 1, 1], below: 1, above: 1 });
  });
});

describe('inputs', () => {
  test('each name once; errors and correlations of what is drawn', () => {
    const list = new SlotList(2);
    const a = list.add('a', 1, { plus: 0.1, minus: 0.1 });
    const fixed = list.add('fixed', 5);
    const b = list.add('b', 2, { plus: 0.2, minus: 0 });
    expect(list.add('a', 9)).toBe(a);
    list.correlate(a, b, 0.6);
    list.correlate(a, fixed, 0.9);
    expect([a, fixed, b]).toEqual([2, 3, 4]);
    const inputs = list.inputs();
    if (isRefusal(inputs)) expect.fail(inputs.reason);
    expect(inputs.drawn).toEqual([0, 2]);
    expect(inputs.factor).toEqual([[1], [0.6, expect.closeTo(0.8, 14)]]);
  });

  test('correlations that cannot be are refused by name', () => {
    const list = new SlotList(0);
    const slots = ['a', 'b', 'c'].map((name) => list.add(name, 1, { plus: 1, minus: 1 }));
    list.correlate(slots[0]!, slots[1]!, 0.9);
    list.correlate(slots[1]!, slots[2]!, 0.9);
    list.correlate(slots[0]!, slots[2]!, -0.9);
    expect(list.inputs()).toMatchObject({ reason: expect.stringContaining('correlations of c') });
  });
});
