/** Complex balls on the axes, around zero and at the ends: exact values and questions. */
import { describe, expect, it } from 'vitest';
import { C, R } from '../../../src/numerics/index.js';
import type { Ball, Complex } from '../../../src/numerics/index.js';

const n = C.fromNumbers;
const box = (re: Ball, im: Ball): Complex => ({ re, im });
const zeroish = R.ball(0n, 0, 0.5);

describe('zero', () => {
  it('may be in a rectangle only when both parts may be zero', () => {
    expect([C.ZERO, box(zeroish, zeroish), C.INDETERMINATE].map(C.containsZero)).toEqual([true, true, true]);
    expect([n(0, 1), n(1, 0), box(zeroish, R.ONE), box(R.ONE, zeroish)].map(C.containsZero)).toEqual([
      false,
      false,
      false,
      false,
    ]);
  });

  it('cannot be divided by, nor what may be zero', () => {
    for (const z of [C.ZERO, box(zeroish, zeroish)]) {
      const inverse = C.inv(z, 53);
      expect([inverse.re.rad, inverse.im.rad]).toEqual([Infinity, Infinity]);
    }
    expect(C.inv(n(0, 2), 53)).toEqual(n(0, -0.5));
  });
});

describe('on the axes', () => {
  it('products, quotients, squares and moduli are those of the parts', () => {
    expect(C.toNumbers(C.mul(n(0, 3), n(0, -5), 53))).toEqual({ re: 15, im: 0 });
    expect(C.toNumbers(C.mul(n(2, 0), n(3, 4), 53))).toEqual({ re: 6, im: 8 });
    expect(C.toNumbers(C.mul(n(3, 4), n(2, 0), 53))).toEqual({ re: 6, im: 8 });
    expect(C.toNumbers(C.mul(n(1, 2), n(3, -4), 53))).toEqual({ re: 11, im: 2 });
    expect(C.toNumbers(C.sqr(n(3, 4), 53))).toEqual({ re: -7, im: 24 });
    expect(C.toNumbers(C.sqr(n(-3, 0), 53))).toEqual({ re: 9, im: 0 });
    expect([n(3, 4), n(-3, 0), n(0, -3)].map((z) => R.toNumber(C.norm(z, 53)))).toEqual([25, 9, 9]);
    expect([n(3, 4), n(-3, 0), n(0, -3)].map((z) => R.toNumber(C.abs(z, 53)))).toEqual([5, 3, 3]);
    expect(C.toNumbers(C.div(n(11, 2), n(3, -4), 53))).toEqual({ re: 1, im: 2 });
    expect(C.toNumbers(C.div(n(6, 8), n(2, 0), 53))).toEqual({ re: 3, im: 4 });
  });

  it('a real factor keeps a real number real and exact, and meets no infinite part', () => {
    expect(R.isExactZero(C.mul(n(2, 0), n(3, 0), 53).im)).toBe(true);
    expect(R.isExactZero(C.sqr(box(R.ball(3n, 0, 1), R.ZERO), 53).im)).toBe(true);
    expect(R.isExactZero(C.mul(C.ZERO, C.INDETERMINATE, 53).re)).toBe(true);
  });

  it('sums, scaling, conjugates', () => {
    expect(C.toNumbers(C.add(n(1, 2), n(3, -5), 53))).toEqual({ re: 4, im: -3 });
    expect(C.toNumbers(C.sub(n(1, 2), n(3, -5), 53))).toEqual({ re: -2, im: 7 });
    expect(C.toNumbers(C.mul2exp(n(3, -5), 4))).toEqual({ re: 48, im: -80 });
    expect(C.toNumbers(C.mul2exp(n(48, -80), -4))).toEqual({ re: 3, im: -5 });
    expect(C.toNumbers(C.conj(n(3, -5)))).toEqual({ re: 3, im: 5 });
    expect(C.toNumbers(C.neg(n(3, -5)))).toEqual({ re: -3, im: 5 });
    expect(C.toNumbers(C.mulReal(n(3, -5), R.fromNumber(2), 53))).toEqual({ re: 6, im: -10 });
    expect(C.toNumbers(C.round(box(R.ball(3n << 100n, -100), R.ball(5n, 0)), 10))).toEqual({ re: 3, im: 5 });
  });
});

describe('size and accuracy', () => {
  it('|a| < 2^E', () => {
    expect([C.ZERO, n(3, 0), n(0, -8), n(3, 8), C.INDETERMINATE].map(C.upperBits)).toEqual([
      -Infinity,
      2,
      4,
      5,
      Infinity,
    ]);
  });

  it('the modulus of what may be zero reaches from zero to a bound', () => {
    const value = C.abs(box(R.ball(1n, 0, 2), R.ball(0n, 0, 2)), 53);
    const [mid, rad] = [R.toNumber(value), R.radiusToNumber(value)];
    expect(mid - rad).toBeLessThanOrEqual(0);
    expect(mid + rad).toBeGreaterThanOrEqual(Math.hypot(3, 2));
    expect(mid + rad).toBeLessThan(40);
    expect(C.abs(C.INDETERMINATE, 53)).toBe(R.INDETERMINATE);
  });

  it('accuracy relative to the larger part', () => {
    expect(C.accuracyBits(n(3, 4))).toBe(Infinity);
    expect(C.accuracyBits(C.INDETERMINATE)).toBe(-Infinity);
    // 2^10 known to 1/2, the other part small and known as well or better
    const part = { mid: 1n << 10n, exp: 0, rad: 0.5 };
    const small = { mid: 1n, exp: -3, rad: 2 };
    expect([C.accuracyBits(box(part, small)), C.accuracyBits(box(small, part))]).toEqual([11, 11]);
    expect(C.accuracyBits(box(R.ONE, { mid: 0n, exp: -20, rad: 1 }))).toBe(20);
    expect(C.accuracyBits(box({ mid: 0n, exp: 3, rad: 1 }, R.ZERO))).toBe(-3);
    expect(C.exactMid(box(part, small))).toEqual(box({ ...part, rad: 0 }, { ...small, rad: 0 }));
  });

  it('rectangles overlap when both parts do', () => {
    const a = box(R.ball(1n, 0, 0.5), R.ball(1n, 0, 0.5));
    expect(C.overlaps(a, n(1, 1))).toBe(true);
    expect([n(3, 1), n(1, 3), n(3, 3)].map((z) => C.overlaps(a, z))).toEqual([false, false, false]);
  });
});
