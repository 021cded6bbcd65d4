/** @module Tables of smooth functions: polynomials exactly, other functions within the checked bound, refusals. */
import { describe, expect, test } from 'vitest';
import { chebyshevMap, MapReader } from '../../../src/numerics/index.js';
import type { ChebyshevMap } from '../../../src/numerics/index.js';
import { uniform } from '../../truncation/random.js';

function read(map: ChebyshevMap, p: readonly number[]): number {
  const reader = new MapReader(map);
  reader.fix(p.slice(1));
  return reader.at(p[0]!);
}

describe('a map', () => {
  test('of a polynomial is exact, in any number of variables', () => {
    const f = ([x = 0, y = 0, z = 0]: readonly number[]): number => 3 + x ** 3 - 2 * x * y + (y - z) ** 2 + x * y * z;
    const map = chebyshevMap(f, [-1, 2, 0], [2, 5, 0.5], 1e-12)!;
    const random = uniform(1);
    for (let i = 0; i < 50; i++) {
      const p = [-1 + 3 * random(), 2 + 3 * random(), 0.5 * random()];
      expect(Math.abs(read(map, p) - f(p))).toBeLessThan(1e-12);
    }
  });

  test('of an analytic function keeps the bound that its check found', () => {
    const f = ([x = 0, y = 0]: readonly number[]): number => Math.exp(x) / (2 + Math.sin(3 * x + y));
    const map = chebyshevMap(f, [0, -0.3], [1, 0.3], 1e-12)!;
    expect(map.error).toBeLessThan(1e-12);
    const random = uniform(2);
    for (let i = 0; i < 200; i++) {
      const p = [random(), -0.3 + 0.6 * random()];
      expect(Math.abs(read(map, p) / f(p) - 1)).toBeLessThan(2e-12);
    }
  });

  test('has values at the ends of the box and none outside', () => {
    const map = chebyshevMap(([x = 0, y = 0]) => x + y, [1, 1], [2, 3], 1e-12)!;
    expect(read(map, [2, 3])).toBeCloseTo(5, 12);
    expect(read(map, [2.001, 3])).toBeNaN();
    expect(read(map, [1.5, 0.99])).toBeNaN();
  });

  test('a variable without extent costs nothing', () => {
    const map = chebyshevMap(([x = 0, y = 0]) => x * y, [1, 4], [2, 4], 1e-12)!;
    expect(map.degrees[1]).toBe(0);
    expect(read(map, [1.5, 4])).toBeCloseTo(6, 12);
  });

  test('is refused where the function has no value, is not smooth, or has too many variables', () => {
    expect(chebyshevMap(([x = 0]) => Math.log(x), [-1], [1], 1e-12)).toBeUndefined();
    expect(chebyshevMap(([x = 0]) => Math.abs(x - 0.1), [-1], [1], 1e-12)).toBeUndefined();
    expect(chebyshevMap(() => 1, new Array<number>(7).fill(0), new Array<number>(7).fill(1), 1e-12)).toBeUndefined();
  });
});
