/** @module The Cholesky factor of covariances. */
import { describe, expect, test } from 'vitest';
import { cholesky } from '../../../src/numerics/index.js';
import { uniform } from '../../truncation/random.js';

const product = (L: readonly (readonly number[])[]): number[][] =>
  L.map((row, i) =>
    L.map((other, j) => row.reduce((s, v, k) => s + (k <= Math.min(i, j) ? v * (other[k] ?? 0) : 0), 0)),
  );

describe('cholesky', () => {
  test('the factor of [[0.04, 0.015], [0.015, 0.09]]: 0.2; 0.075, √0.084375', () => {
    const L = cholesky([
      [0.04, 0.015],
      [0.015, 0.09],
    ]);
    expect(L).toEqual([[0.2], [0.075, expect.closeTo(Math.sqrt(0.084375), 15)]]);
  });

  test('L Lᵀ gives the matrix back', () => {
    const random = uniform(3);
    for (let n = 1; n <= 8; n++) {
      const A = Array.from({ length: n }, () => Array.from({ length: n }, () => random() - 0.5));
      const C = A.map((row) => A.map((other) => row.reduce((s, v, k) => s + v * other[k]!, 0)));
      const L = cholesky(C);
      if (!Array.isArray(L)) expect.fail('refused');
      product(L).forEach((row, i) => row.forEach((v, j) => expect(v).toBeCloseTo(C[i]![j]!, 12)));
    }
  });

  test('fully correlated inputs have a factor with an empty column', () => {
    const [a, b, c] = [0.3, 0.1, 7];
    const L = cholesky([
      [a * a, a * b, -a * c],
      [a * b, b * b, -b * c],
      [-a * c, -b * c, c * c],
    ]);
    if (!Array.isArray(L)) expect.fail('refused');
    expect(L.map((row) => row[0]!)).toEqual([a, expect.closeTo(b, 14), expect.closeTo(-c, 13)]);
    expect(L.flatMap((row) => row.slice(1)).every((v) => Math.abs(v) < 1e-6)).toBe(true);
    expect(cholesky([[0]])).toEqual([[0]]);
  });

  test('no covariance: a negative variance, a correlation beyond 1, three that exclude each other', () => {
    expect(cholesky([[-1]])).toEqual({ row: 0, pivot: -1 });
    expect(
      cholesky([
        [1, 1.1],
        [1.1, 1],
      ]),
    ).toMatchObject({ row: 1 });
    expect(
      cholesky([
        [1, 0.9, -0.9],
        [0.9, 1, 0.9],
        [-0.9, 0.9, 1],
      ]),
    ).toMatchObject({ row: 2 });
    expect(
      cholesky([
        [0, 0.1],
        [0.1, 1],
      ]),
    ).toMatchObject({ row: 1 });
    expect(cholesky([[NaN]])).toMatchObject({ row: 0 });
  });
});
