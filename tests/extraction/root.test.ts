/** Roots on a grid: all that it shows, jumps told from roots, none where there is none. */
import { describe, expect, test } from 'vitest';
import { logGrid, nearRoot, refineRoot, scanGrid } from '../../src/extraction/root.js';

const grid = logGrid(0.1, 10, 41);

describe('brackets and roots', () => {
  test('every simple root between grid points is bracketed and refined', () => {
    const f = (p: number): number => (p - 0.3) * (p - 1.7) * (p - 6);
    const { brackets } = scanGrid(f, grid);
    const roots = brackets.map((b) => refineRoot(f, b, 1e-15)!);
    expect(roots.map((r) => r.kind)).toEqual(['root', 'root', 'root']);
    roots.forEach((r, i) => expect(r.p).toBeCloseTo([0.3, 1.7, 6][i]!, 14));
  });

  test('the end of the grid is a root when the value is zero there', () => {
    const { brackets } = scanGrid((p) => p - 10, grid);
    expect(refineRoot((p) => p - 10, brackets[0]!, 1e-15)).toEqual({ kind: 'root', p: 10 });
  });

  test('a jump and a pole change the sign but are no roots', () => {
    for (const f of [(p: number) => (p < 2.345 ? -1 : 0.5), (p: number) => 1 / (p - 2.345)]) {
      const { brackets } = scanGrid(f, grid);
      expect(brackets).toHaveLength(1);
      const found = refineRoot(f, brackets[0]!, 1e-15)!;
      expect(found.kind).toBe('jump');
      expect(found.p).toBeCloseTo(2.345, 12);
    }
  });

  test('no value is no bracket', () => {
    const f = (p: number): number | undefined => (p > 1 && p < 3 ? undefined : p - 2);
    expect(scanGrid(f, grid).brackets).toEqual([]);
  });

  test('a flat root of third order is found to what doubles can tell', () => {
    const f = (p: number): number => (p - 2) ** 3;
    const { brackets } = scanGrid(f, grid);
    expect(refineRoot(f, brackets[0]!, 1e-15)!.p).toBeCloseTo(2, 4);
  });
});

describe('a root near a start', () => {
  test('with a rough slope', () => {
    expect(nearRoot((p) => p * p - 2, 1.3, 2, 1e-15)).toBeCloseTo(Math.SQRT2, 14);
  });
  test('undefined where steps leave the positive axis or the function', () => {
    expect(nearRoot((p) => p + 1, 1, 1, 1e-15)).toBeUndefined();
    expect(nearRoot((p) => (p > 2 ? undefined : p - 3), 1, 1, 1e-15)).toBeUndefined();
  });
});
