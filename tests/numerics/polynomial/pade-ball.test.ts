import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { pi } from '../../../src/numerics/ball/constants.js';
import * as R from '../../../src/numerics/ball/real.js';
import type { Ball } from '../../../src/numerics/ball/real.js';
import { ballField, doubleField } from '../../../src/numerics/field.js';
import type { Rational } from '../../../src/numerics/rational.js';
import { padeBall, padeExact, padeField } from '../../../src/numerics/polynomial/index.js';
import { MULTIPLIER, borelSeries, poly, q, rationals } from './random.js';

const balls = (b: readonly Rational[], prec: number): Ball[] => b.map((c) => R.fromRational(c, prec));

/** Balls of relative radius 2^-bits around numbers near the given ones, which stay inside. */
const fuzzy = (b: readonly Rational[], bits: number): Ball[] =>
  b.map((c) => R.addRelativeError(R.fromRational(c, bits + 20), 2 ** -bits));

function expectContains(found: readonly Ball[], exact: readonly Rational[]): void {
  expect(found.length).toBeGreaterThanOrEqual(exact.length);
  expect(found.filter((ball, i) => !R.containsRational(ball, exact[i] ?? q(0)))).toEqual([]);
}

describe('enclosure of the exact entry', () => {
  test('random series, holes included, all orders', () => {
    const cases = fc
      .tuple(fc.integer({ min: 0, max: 6 }), fc.integer({ min: 0, max: 6 }))
      .chain(([L, M]) =>
        fc.tuple(fc.constant(L), fc.constant(M), fc.array(rationals, { minLength: L + M + 1, maxLength: L + M + 1 })),
      );
    fc.assert(
      fc.property(cases, ([L, M, b]) => {
        const entry = padeExact(b, L, M);
        const found = padeBall(fuzzy(b, 900), L, M, 1000);
        if (found.exists === undefined) {
          // allowed only where the Toeplitz determinant is zero
          expect(entry.exists ? entry.deficiency : 1).toBeGreaterThan(0);
          return;
        }
        expect(found.exists).toBe(entry.exists);
        if (!found.exists || !entry.exists) return;
        expectContains(found.denominator, entry.denominator);
        expectContains(found.numerator, entry.numerator);
      }),
      { numRuns: 200 * MULTIPLIER },
    );
  });

  test('near-diagonal entries of a Borel series up to [18/18], and how many bits they keep', () => {
    const b = borelSeries(37);
    for (const [L, M] of [
      [18, 18],
      [17, 18],
      [12, 17],
    ] as const) {
      const entry = padeExact(b, L, M);
      const found = padeBall(balls(b, 600), L, M, 600);
      if (!found.exists || !entry.exists) throw new Error('no entry');
      expectContains(found.denominator, entry.denominator);
      expectContains(found.numerator, entry.numerator);
      const bits = Math.min(...found.denominator.slice(1).map(R.accuracyBits));
      expect(bits).toBeGreaterThan(600 - 14 * 18);
    }
  });

  test('every series in the balls has its entry in the result', () => {
    const b = borelSeries(7);
    const found = padeBall(fuzzy(b, 40), 3, 3, 100);
    if (!found.exists) throw new Error(found.reason);
    for (let k = 0; k < 7; k++) {
      for (const sign of [-1, 1]) {
        const moved = b.map((c, i) => (i === k ? c.add(c.mul(q(sign, 2n ** 40n))) : c));
        const entry = padeExact(moved, 3, 3);
        if (!entry.exists) throw new Error(entry.reason);
        expectContains(found.denominator, entry.denominator);
        expectContains(found.numerator, entry.numerator);
      }
    }
  });
});

describe('what balls can and cannot decide', () => {
  test('an intermediate block is walked around by pivoting', () => {
    // [2/2] of 1 + x² + x⁴/2: the entries [0/1], [1/1] on the way are no help
    const found = padeBall(fuzzy(poly(1, 0, 1, 0, '1/2'), 200), 2, 2, 250);
    if (!found.exists) throw new Error('not found');
    expectContains(found.denominator, poly(1, 0, '-1/2'));
    expectContains(found.numerator, poly(1, 0, '1/2'));
  });

  test('a vanishing determinant is left open for inexact series and settled for exact ones', () => {
    const b = poly(1, 0, 1);
    const exact = balls(b, 100);
    const inexact = [exact[0]!, R.addError(exact[1]!, 1, -80), exact[2]!];
    expect(padeBall(inexact, 1, 1, 100).exists).toBeUndefined();
    expect(padeBall(exact, 1, 1, 100).exists).toBe(false);
    const geometric = padeBall(balls(poly(1, 2, 4, 8, 16), 100), 2, 2, 100);
    expect(geometric.exists && geometric.deficiency).toBe(1);
  });

  test('coefficients with π: covariance under x → πx', () => {
    const b = borelSeries(13);
    const prec = 300;
    const scaled = b.map((c, n) => R.mul(R.fromRational(c, prec), R.powInt(pi(prec), n, prec), prec));
    const found = padeBall(scaled, 6, 6, prec);
    const entry = padeExact(b, 6, 6);
    if (!found.exists || !entry.exists) throw new Error('no entry');
    found.denominator.forEach((c, n) => {
      const back = R.div(c, R.powInt(pi(prec), n, prec), prec);
      expect(R.containsRational(back, entry.denominator[n]!)).toBe(true);
      expect(R.accuracyBits(back)).toBeGreaterThan(200);
    });
  });

  test('too little precision is said, not hidden', () => {
    expect(padeBall(balls(borelSeries(61), 60), 30, 30, 60).exists).toBeUndefined();
  });
});

describe('the generic way', () => {
  test('balls and doubles', () => {
    const b = borelSeries(9);
    const entry = padeExact(b, 4, 4);
    const inBalls = padeField(ballField(200), balls(b, 200), 4, 4);
    const inDoubles = padeField(
      doubleField,
      b.map((c) => c.toNumber()),
      4,
      4,
    );
    if (!entry.exists || !inBalls.exists || !inDoubles.exists) throw new Error('no entry');
    expectContains(inBalls.denominator, entry.denominator);
    inDoubles.denominator.forEach((c, j) => expect(c).toBeCloseTo(entry.denominator[j]!.toNumber(), 7));
    inDoubles.numerator.forEach((c, j) => expect(c).toBeCloseTo(entry.numerator[j]!.toNumber(), 7));
    expect(padeField(doubleField, [1, 0, 1], 1, 1).exists).toBeUndefined();
  });
});
