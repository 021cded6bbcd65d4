import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import * as R from '../../../src/numerics/ball/real.js';
import type { Ball } from '../../../src/numerics/ball/real.js';
import { ballField, doubleField, rationalField } from '../../../src/numerics/field.js';
import {
  conditionEstimate,
  determinantExact,
  determinantField,
  lu,
  solveBall,
  solveField,
  type Matrix,
} from '../../../src/numerics/linear/index.js';
import { Rational } from '../../../src/numerics/rational.js';

const MULTIPLIER = Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? 1);
const q = (a: number | bigint, b: number | bigint = 1): Rational => Rational.of(a, b);

const entry = fc.oneof(
  fc.constant(Rational.ZERO),
  fc.tuple(fc.integer({ min: -9, max: 9 }), fc.integer({ min: 1, max: 5 })).map(([a, b]) => q(a, b)),
);
const square = fc
  .integer({ min: 1, max: 5 })
  .chain((n) => fc.array(fc.array(entry, { minLength: n, maxLength: n }), { minLength: n, maxLength: n }));

/** Σ over permutations, the definition. */
function leibniz(a: Matrix<Rational>): Rational {
  if (a.length === 0) return Rational.ONE;
  return a[0]!.reduce((sum, c, j) => {
    const minor = leibniz(a.slice(1).map((row) => row.filter((_, k) => k !== j)));
    return sum.add(c.mul(minor).mul(q(j % 2 === 0 ? 1 : -1)));
  }, Rational.ZERO);
}

const times = (a: Matrix<Rational>, x: readonly Rational[]): Rational[] =>
  a.map((row) => row.reduce((s, c, j) => s.add(c.mul(x[j]!)), Rational.ZERO));

const hilbert = (n: number): Rational[][] =>
  Array.from({ length: n }, (_r, i) => Array.from({ length: n }, (_c, j) => q(1, i + j + 1)));

describe('determinants', () => {
  test('Bareiss and elimination equal the sum over permutations', () => {
    fc.assert(
      fc.property(square, (a) => {
        const det = leibniz(a);
        expect(determinantExact(a).equals(det)).toBe(true);
        expect(determinantField(rationalField, a)!.equals(det)).toBe(true);
      }),
      { numRuns: 300 * MULTIPLIER },
    );
  });

  test('Hilbert matrices: 1/det is an integer known in closed form', () => {
    // det H_n = Π_{k<n} (k!)^4 / Π_{k<2n} k!
    const f = (n: number): bigint => (n < 2 ? 1n : BigInt(n) * f(n - 1));
    for (const n of [1, 4, 10]) {
      let [num, den] = [1n, 1n];
      for (let k = 0; k < n; k++) num *= f(k) ** 4n;
      for (let k = 0; k < 2 * n; k++) den *= f(k);
      expect(determinantExact(hilbert(n)).equals(q(num, den))).toBe(true);
    }
  });

  test('balls: enclosed, or undecided when a pivot may vanish', () => {
    const balls = hilbert(6).map((row) => row.map((c) => R.fromRational(c, 100)));
    const det = determinantField(ballField(100), balls)!;
    expect(R.containsRational(det, determinantExact(hilbert(6)))).toBe(true);
    expect(R.isPositive(det)).toBe(true);
    const unsure = [[R.addError(R.ZERO, 1, -30)]];
    expect(determinantField(ballField(100), unsure)).toBeUndefined();
    expect(lu(ballField(100), unsure)).toEqual({ kind: 'undecided', column: 0 });
    expect(lu(ballField(100), [[R.ZERO]])).toEqual({ kind: 'singular', column: 0 });
  });

  test('matrices that are not square are refused', () => {
    expect(() => determinantExact([[q(1), q(2)]])).toThrow(RangeError);
    expect(() => lu(doubleField, [[1, 2]])).toThrow(RangeError);
    expect(determinantExact([]).equals(q(1))).toBe(true);
  });
});

describe('solutions', () => {
  test('A·solve(A, b) = b exactly; undefined exactly for singular A', () => {
    fc.assert(
      fc.property(square, fc.array(entry, { minLength: 5, maxLength: 5 }), (a, b) => {
        const rhs = b.slice(0, a.length);
        const x = solveField(rationalField, a, rhs);
        if (leibniz(a).isZero()) expect(x).toBeUndefined();
        else times(a, x!).forEach((c, i) => expect(c.equals(rhs[i]!)).toBe(true));
      }),
      { numRuns: 300 * MULTIPLIER },
    );
  });

  test('a zero on the diagonal is no obstacle', () => {
    expect(
      solveField(
        doubleField,
        [
          [0, 2],
          [3, 1],
        ],
        [4, 5],
      ),
    ).toEqual([1, 2]);
  });

  test('balls contain the exact solution, elimination and residual way', () => {
    fc.assert(
      fc.property(square, fc.array(entry, { minLength: 5, maxLength: 5 }), (a, b) => {
        fc.pre(!leibniz(a).isZero());
        const rhs = b.slice(0, a.length);
        const x = solveField(rationalField, a, rhs)!;
        const balls = a.map((row) => row.map((c) => R.fromRational(c, 120)));
        const right = rhs.map((c) => R.fromRational(c, 120));
        for (const found of [solveField(ballField(120), balls, right)!, solveBall(balls, right, 120)!]) {
          found.forEach((c, i) => {
            expect(R.containsRational(c, x[i]!)).toBe(true);
            expect(R.radiusToNumber(c)).toBeLessThan(1e-25 * (1 + Math.abs(x[i]!.toNumber())));
          });
        }
      }),
      { numRuns: 200 * MULTIPLIER },
    );
  });

  test('the residual way encloses the solutions of all systems in the balls, with radii near the sensitivity', () => {
    const n = 6;
    const exactMatrix = hilbert(n);
    const b = exactMatrix.map((_, i) => q(i + 1));
    const fuzz = (c: Rational): Ball => R.addRelativeError(R.fromRational(c, 150), 2 ** -60);
    const found = solveBall(
      exactMatrix.map((row) => row.map(fuzz)),
      b.map(fuzz),
      150,
    )!;
    const moved = exactMatrix.map((row, i) =>
      row.map((c, j) => c.add(c.mul(q((i + j) % 2 === 0 ? 1 : -1, 2n ** 60n)))),
    );
    const x = solveField(
      rationalField,
      moved,
      b.map((c) => c.add(c.mul(q(1, 2n ** 60n)))),
    )!;
    x.forEach((c, i) => expect(R.containsRational(found[i]!, c)).toBe(true));
    // condition of H_6 is 1.5e7, so about 24 of the 60 bits are lost
    expect(Math.min(...found.map(R.accuracyBits))).toBeGreaterThan(30);
  });

  test('not shown to be regular: undefined', () => {
    const wide = R.addError(R.ONE, 2, 0);
    expect(solveBall([[wide]], [R.ONE], 60)).toBeUndefined();
    expect(
      solveBall(
        [
          [R.ONE, R.ONE],
          [R.ONE, R.ONE],
        ],
        [R.ONE, R.ONE],
        60,
      ),
    ).toBeUndefined();
  });
});

describe('condition estimate', () => {
  test('is a lower bound within a factor three of the true 1-norm condition', () => {
    // ‖H‖₁‖H^{-1}‖₁ from the exact inverse
    for (const n of [2, 4, 7]) {
      const h = hilbert(n);
      const inverse = h.map((_, j) =>
        solveField(
          rationalField,
          h,
          h.map((_r, i) => q(i === j ? 1 : 0)),
        )!,
      );
      const norm = (columns: readonly (readonly Rational[])[]): number =>
        Math.max(...columns.map((c) => c.reduce((s, v) => s + Math.abs(v.toNumber()), 0)));
      const truth = norm(h) * norm(inverse);
      const estimate = conditionEstimate(h.map((row) => row.map((c) => c.toNumber())));
      expect(estimate).toBeLessThanOrEqual(truth * 1.001);
      expect(estimate).toBeGreaterThan(truth / 3);
    }
  });

  test('identity, singular, empty', () => {
    expect(
      conditionEstimate([
        [1, 0],
        [0, 1],
      ]),
    ).toBe(1);
    expect(
      conditionEstimate([
        [1, 2],
        [2, 4],
      ]),
    ).toBe(Infinity);
    expect(conditionEstimate([])).toBe(1);
  });
});
