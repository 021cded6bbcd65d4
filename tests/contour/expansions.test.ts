/** Fixed order and contour improved: identities that need no reference. */
import { describe, expect, test } from 'vitest';
import { exact, R, Rational } from '../../src/numerics/index.js';
import type { Ball } from '../../src/numerics/index.js';
import { terms } from '../../src/prescriptions/index.js';
import { contourSum } from '../../src/contour/index.js';
import { contourIntegrals, improvedTerms } from '../../src/contour/improved.js';
import type { ContourQuantity } from '../../src/contour/index.js';
import { contourOf, frame, originOf, standing } from '../support/contour.js';

const add = (list: readonly Ball[]): number => R.toNumber(list.reduce((s, t) => R.add(s, t, 300), R.ZERO));
const fixedOrder = (e: ContourQuantity): number => add(terms(e, 300));
const improved = (e: ContourQuantity, digits = 25): number =>
  add(improvedTerms(e.contour, standing(contourIntegrals(e.contour, e.x, digits)), 300));
const value = (x: number | { readonly reason: string }): number => {
  if (typeof x === 'number') return x;
  throw new Error(x.reason);
};

describe('fixed order minus contour improved', () => {
  test.each([2, 3, 4])('begins at the next order: %d terms', async (order) => {
    const gap = async (alpha: string): Promise<number> => {
      const e = await contourOf('tau-contour', alpha, { order });
      return fixedOrder(e) - improved(e);
    };
    const ratio = (await gap('0.002')) / (await gap('0.001'));
    expect(Math.log2(ratio)).toBeCloseTo(order + 1, 1);
  });

  test('the missing coefficient is that of the longer expansion', async () => {
    const long = await contourOf('tau-contour', '0.0004', { order: 4 });
    const short = await contourOf('tau-contour', '0.0004', { order: 3 });
    // Both expansions of D cut at a³: what the circle puts into a⁴ without c_4.
    const missing = (improved(short) - fixedOrder(short)) / R.toNumber(R.powInt(short.x.ball(100), 4, 100));
    const K4 = R.toNumber(long.coefficients[3]!.ball(100));
    const c4 = R.toNumber(long.contour.coefficients[3]!.ball(100));
    expect(missing / (K4 - c4)).toBeCloseTo(1, 1);
  });

  test('vanishes with the running: A_n/(W_0 x^n) → 1', () => {
    const origin = originOf(['1', '1'], ['1', '0', '-3', '2'], { flavours: 16 });
    for (const x of [1e-4, 1e-6]) {
      const A = standing(contourIntegrals(origin, exact(Rational.fromNumber(x)), 20));
      expect(Math.abs(R.toNumber(A[0]!) / x - 1)).toBeLessThan(x);
      expect(Math.abs(R.toNumber(A[1]!) / x ** 2 - 1)).toBeLessThan(2 * x);
    }
  });
});

describe('contourSum', () => {
  test.each(['0.1', '0.25', '0.34', '0.45', '0.6'])('agrees with the enclosures at α_s = %s', async (alpha) => {
    for (const loops of ['one', 'three', 'four'] as const) {
      const e = await contourOf('tau-contour-model', alpha, { loops, order: 5 });
      const close = (found: number, wanted: number): void =>
        expect(Math.abs(found - wanted)).toBeLessThan(2e-14 * Math.max(1, Math.abs(wanted)));
      close(value(contourSum(e, 'contour-improved', Number(alpha))), improved(e, 18));
      close(value(contourSum(e, 'fixed-order', Number(alpha))), fixedOrder(e));
    }
  });

  test('at a weight of high degree', async () => {
    const weight = ['1', '0', '0', '0', '2', '0', '0', '0', '0', '0', '-3', '0', '0', '1'];
    const e = await contourOf('tau-contour', '0.34', { weight });
    expect(Math.abs(value(contourSum(e, 'contour-improved', 0.34)) - improved(e, 18))).toBeLessThan(1e-13);
  });

  test('is linear in the weight and in the coefficients', () => {
    const c = ['1', '1.64', '6.37', '49.08'];
    const sum = (weight: readonly string[], coefficients?: readonly number[]): number =>
      value(contourSum(frame(originOf(c, weight)), 'contour-improved', 0.3, coefficients));
    expect(sum(['3', '-2', '5'])).toBeCloseTo(3 * sum(['1']) - 2 * sum(['0', '1']) + 5 * sum(['0', '0', '1']), 13);
    expect(sum(['1', '-1'], [2, 3.28, 12.74, 98.16])).toBeCloseTo(2 * sum(['1', '-1']), 13);
    for (const n of [0, 3]) {
      const unit = [0, 0, 0, 0].map((_, k) => (k === n ? 1 : 0));
      const shifted = [1, 1.64, 6.37, 49.08].map((x, k) => (k === n ? x + 1 : x));
      expect(sum(['1', '-1'], shifted)).toBeCloseTo(sum(['1', '-1']) + sum(['1', '-1'], unit), 13);
    }
  });

  test('puts factor and additive part on, and takes replicas at fixed order', () => {
    const origin = originOf(['1', '2'], ['1', '0', '-3', '2']);
    const plain = value(contourSum(frame(origin), 'fixed-order', 0.3));
    const dressed = { factor: exact(Rational.of(3)), additive: exact(Rational.of(7)), contour: origin };
    expect(value(contourSum(dressed, 'fixed-order', 0.3))).toBeCloseTo(7 + 3 * plain, 13);
    const x = 0.3 / Math.PI;
    // K_2 = c_2 − (19/12)(−9/4) c_1.
    expect(value(contourSum(frame(origin), 'fixed-order', 0.3, [1, 5]))).toBeCloseTo(x + (5 + 57 / 16) * x * x, 14);
  });
});
