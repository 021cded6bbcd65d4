import { describe, expect, test } from 'vitest';
import { gaussLegendre } from '../../src/truncation/numeric/gauss-legendre.js';
import { integrate, panelNodes } from '../../src/truncation/numeric/quadrature.js';
import { increasingRoot } from '../../src/truncation/numeric/root.js';

describe('the panel rule', () => {
  test('integrates powers up to 22 (Kronrod) and 13 (Gauss) exactly, and no further', () => {
    const moment = (power: number, by: 'kronrod' | 'gauss'): number =>
      panelNodes(-1, 1).reduce((sum, node) => sum + node[by] * node.at ** power, 0);
    for (let k = 0; k <= 22; k += 2) expect(moment(k, 'kronrod')).toBeCloseTo(2 / (k + 1), 14);
    for (let k = 0; k <= 12; k += 2) expect(moment(k, 'gauss')).toBeCloseTo(2 / (k + 1), 14);
    expect(Math.abs(moment(14, 'gauss') - 2 / 15)).toBeGreaterThan(1e-5);
    expect(Math.abs(moment(24, 'kronrod') - 2 / 25)).toBeGreaterThan(1e-10);
  });
});

describe('adaptive quadrature', () => {
  test('reaches its tolerance on a narrow peak far from the middle, and says so', () => {
    const f = (x: number): number => 1 / (1 + 1e6 * (x - 0.777) ** 2);
    const exact = (Math.atan(1e3 * (1 - 0.777)) + Math.atan(1e3 * 0.777)) / 1e3;
    const { value, error } = integrate(f, [0, 1], 1e-11);
    expect(Math.abs(value / exact - 1)).toBeLessThan(1e-11);
    expect(error).toBeLessThanOrEqual(1e-11 * value);
  });

  test('takes a square-root singularity at an end', () => {
    expect(integrate(Math.sqrt, [0, 1], 1e-10).value).toBeCloseTo(2 / 3, 9);
  });

  test('an empty range integrates to nothing', () => {
    expect(integrate(Math.exp, [1], 1e-10)).toEqual({ value: 0, error: 0 });
    expect(integrate(Math.exp, [2, 2], 1e-10).value).toBe(0);
  });
});

describe('Gauss and Legendre', () => {
  test.each([2, 3, 15, 31, 99])('%i nodes integrate x^(2n-2) exactly', (n) => {
    const nodes = gaussLegendre(n);
    const sum = (power: number): number => nodes.reduce((s, { at, weight }) => s + weight * at ** power, 0);
    expect(sum(0)).toBeCloseTo(2, 13);
    expect(sum(2 * n - 2)).toBeCloseTo(2 / (2 * n - 1), 13);
    expect(nodes.map((node) => node.at)).toEqual(nodes.map((node) => node.at).toSorted((a, b) => a - b));
  });
});

describe('the root of an increasing function', () => {
  test.each([-40, -1, 0, 3, 1e3])('is found from a start far away: %d', (root) => {
    const found = increasingRoot((x) => Math.tanh(x - root), 1, 1, 1e-12);
    expect(found).toBeCloseTo(root, 9);
  });

  test('is not invented', () => {
    expect(increasingRoot((x) => 1 + Math.exp(x), 0, 1, 1e-12)).toBeUndefined();
  });
});
