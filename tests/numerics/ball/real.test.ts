import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { R, Rational } from '../../../src/numerics/index.js';
import type { Ball } from '../../../src/numerics/index.js';
import { cases, mustContain, pointed, power2, precision } from './generate.js';

const RUNS = cases(1000);

/** A binary operation contains the exact result at every pair of points. */
function binary(
  op: (a: Ball, b: Ball, prec: number) => Ball,
  exact: (x: Rational, y: Rational) => Rational | undefined,
): void {
  fc.assert(
    fc.property(pointed(), pointed(), precision, (a, b, prec) => {
      const value = exact(a.point, b.point);
      if (value !== undefined) mustContain(op(a.ball, b.ball, prec), value, { a, b, prec });
    }),
    RUNS,
  );
}

describe('arithmetic of real balls contains the exact result', () => {
  it('sum', () => binary(R.add, (x, y) => x.add(y)));
  it('difference', () => binary(R.sub, (x, y) => x.sub(y)));
  it('product', () => binary(R.mul, (x, y) => x.mul(y)));
  it('quotient', () => binary(R.div, (x, y) => (y.isZero() ? undefined : x.div(y))));

  it('square', () => {
    fc.assert(
      fc.property(pointed(), precision, (a, prec) =>
        mustContain(R.sqr(a.ball, prec), a.point.mul(a.point), { a, prec }),
      ),
      RUNS,
    );
  });

  it('square root, of squares of points', () => {
    fc.assert(
      fc.property(pointed(), precision, (a, prec) => {
        const s = R.sqr(a.ball, 5000);
        mustContain(R.sqrt(s, prec), a.point.abs(), { a, prec });
      }),
      RUNS,
    );
  });

  it('square root, against squares of its end points', () => {
    fc.assert(
      fc.property(pointed(), precision, (a, prec) => {
        if (a.point.sign() <= 0) return;
        const r = R.sqrt(a.ball, prec);
        if (r.rad === Infinity) return;
        const radius = Rational.fromNumber(r.rad).mul(power2(r.exp));
        const high = R.midpoint(r).add(radius);
        const low = R.midpoint(r).sub(radius);
        expect(high.mul(high).cmp(a.point)).toBeGreaterThanOrEqual(0);
        if (low.sign() > 0) expect(low.mul(low).cmp(a.point)).toBeLessThanOrEqual(0);
      }),
      RUNS,
    );
  });

  it('integer powers', () => {
    fc.assert(
      fc.property(pointed(100), fc.integer({ min: -9, max: 20 }), precision, (a, n, prec) => {
        if (n >= 0 || !a.point.isZero()) mustContain(R.powInt(a.ball, n, prec), a.point.pow(n), { a, n, prec });
      }),
      RUNS,
    );
  });

  it('absolute value, negative, scaling, rounding, added errors', () => {
    fc.assert(
      fc.property(pointed(), pointed(), fc.integer({ min: -5000, max: 5000 }), precision, (a, b, k, prec) => {
        mustContain(R.abs(a.ball), a.point.abs(), { a });
        mustContain(R.neg(a.ball), a.point.neg(), { a });
        mustContain(R.mul2exp(a.ball, k), a.point.mul(power2(k)), { a, k });
        mustContain(R.round(a.ball, prec), a.point, { a, prec });
        // everything within |b| of the points of a
        const wide = R.widen(a.ball, b.ball);
        mustContain(wide, a.point.add(b.point), { a, b });
        mustContain(wide, a.point.sub(b.point), { a, b });
        const grown = R.addRelativeError(a.ball, 0.25, -k % 50);
        mustContain(grown, a.point.add(a.point.mul(Rational.of(1n, 4n)).mul(power2(-k % 50))), { a, k });
      }),
      RUNS,
    );
  });

  it('conversions', () => {
    fc.assert(
      fc.property(pointed(), precision, (a, prec) => {
        mustContain(R.fromRational(a.point, prec), a.point, { a, prec });
        mustContain(R.exactMid(a.ball), R.midpoint(a.ball), { a });
      }),
      RUNS,
    );
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (x) => {
        expect(R.midpoint(R.fromNumber(x)).equals(Rational.fromNumber(x))).toBe(true);
        expect(R.toNumber(R.fromNumber(x))).toBe(x === 0 ? 0 : x);
      }),
      RUNS,
    );
  });
});

describe('predicates and bounds hold for every point', () => {
  it('sign, zero, size, comparison', () => {
    fc.assert(
      fc.property(pointed(), pointed(), (a, b) => {
        const s = a.point.sign();
        if (R.isPositive(a.ball)) expect(s).toBe(1);
        if (R.isNegative(a.ball)) expect(s).toBe(-1);
        if (!R.containsZero(a.ball)) expect(s).not.toBe(0);
        if (R.isExactZero(a.ball)) expect(s).toBe(0);
        const up = R.upperBits(a.ball);
        if (up === -Infinity) expect(s).toBe(0);
        else expect(a.point.abs().cmp(power2(up))).toBe(-1);
        const order = R.compare(a.ball, b.ball, 200);
        if (order !== 0) expect(a.point.cmp(b.point)).toBe(order);
      }),
      RUNS,
    );
  });

  it('balls that share a point overlap', () => {
    fc.assert(
      fc.property(pointed(), fc.integer({ min: 0, max: 1 << 20 }), precision, (a, r, prec) => {
        const around = R.addError(R.fromRational(a.point, prec), r, -prec);
        expect(R.overlaps(a.ball, around)).toBe(true);
      }),
      RUNS,
    );
  });

  it('disjoint balls are told apart', () => {
    expect(R.overlaps(R.ball(1n, 0, 0.25), R.ball(2n, 0, 0.25))).toBe(false);
    expect(R.overlaps(R.ONE, R.add(R.ONE, R.mul2exp(R.ONE, -5000), 6000))).toBe(false);
  });
});

describe('results are sharp', () => {
  it('one rounding of exact operands costs at most one bit', () => {
    fc.assert(
      fc.property(pointed(), pointed(), fc.constantFrom(24, 53, 333, 3400), (a, b, prec) => {
        const x = R.exactMid(a.ball);
        const y = R.exactMid(b.ball);
        for (const r of [R.add(x, y, prec), R.mul(x, y, prec), R.isExactZero(y) ? R.ZERO : R.div(x, y, prec)]) {
          if (r.rad > 0) expect(R.accuracyBits(r)).toBeGreaterThanOrEqual(prec - 1);
        }
        if (R.isPositive(x)) expect(R.accuracyBits(R.sqrt(x, prec))).toBeGreaterThanOrEqual(prec - 1);
      }),
      RUNS,
    );
  });

  it('relative errors add in products and quotients, at any length', () => {
    for (const prec of [60, 366, 1100, 3400, 20_000]) {
      const a = R.ball((1n << BigInt(prec)) + 12345n, -prec, 1);
      const b = R.ball((3n << BigInt(prec - 1)) + 999n, -prec, 1);
      expect(R.accuracyBits(R.mul(a, b, prec)), `mul ${prec}`).toBeGreaterThan(prec - 2);
      expect(R.accuracyBits(R.div(a, b, prec)), `div ${prec}`).toBeGreaterThan(prec - 2);
      expect(R.accuracyBits(R.sqrt(a, prec)), `sqrt ${prec}`).toBeGreaterThan(prec - 2);
      expect(R.accuracyBits(R.mul(a, R.fromNumber(3), prec)), `small ${prec}`).toBeGreaterThan(prec - 2);
      expect(R.accuracyBits(R.div(a, R.fromNumber(3), prec)), `by small ${prec}`).toBeGreaterThan(prec - 2);
      expect(R.accuracyBits(R.powInt(a, 5, prec)), `power ${prec}`).toBeGreaterThan(prec - 4);
    }
  });

  it('exact results stay exact', () => {
    expect(R.mul(R.fromNumber(3), R.fromNumber(5), 53).rad).toBe(0);
    expect(R.add(R.fromNumber(2 ** 60), R.fromNumber(2 ** 60), 53).rad).toBe(0);
    expect(R.div(R.fromNumber(15), R.fromNumber(4), 53).rad).toBe(0);
    const seven = R.sqrt(R.fromNumber(49), 53);
    expect(seven.rad).toBe(0);
    expect(R.toNumber(seven)).toBe(7);
    expect(R.isExactZero(R.mul(R.ZERO, R.INDETERMINATE, 53))).toBe(true);
    expect(R.isExactZero(R.div(R.ZERO, R.ball(3n, 0, 1), 53))).toBe(true);
  });
});

describe('edges', () => {
  it('a sum over a huge gap keeps the small part in its radius', () => {
    const s = R.add(R.ONE, R.mul2exp(R.ONE, -5000), 53);
    expect(s.rad).toBeGreaterThan(0);
    expect(R.accuracyBits(s)).toBeGreaterThan(50);
  });

  it('an inaccurate ball plus a long exact one stays bounded', () => {
    const s = R.add(R.ball(3n, 0, 1), R.ball(1n, -3000), 3322);
    expect(s.rad).toBeLessThan(Infinity);
    expect(R.radiusToNumber(s)).toBeLessThan(1.001);
  });

  it('a product of two tiny balls around zero is not zero', () => {
    const z = R.ball(0n, 0, 2 ** -499);
    expect(R.mul(z, z, 53).rad).toBeGreaterThan(0);
  });

  it('a tiny error on an exact number stays tiny', () => {
    const w = R.addError(R.ONE, 1, -3400);
    expect(R.accuracyBits(w)).toBeGreaterThan(3390);
  });

  it('what cannot be said is INDETERMINATE, and nothing throws', () => {
    expect(R.div(R.ONE, R.ball(1n, 0, 2), 53)).toBe(R.INDETERMINATE);
    expect(R.div(R.ONE, R.ZERO, 53)).toBe(R.INDETERMINATE);
    expect(R.sqrt(R.ball(1n, 0, 2), 53)).toBe(R.INDETERMINATE);
    expect(R.sqrt(R.fromNumber(-1), 53)).toBe(R.INDETERMINATE);
    expect(R.add(R.INDETERMINATE, R.ONE, 53)).toBe(R.INDETERMINATE);
    expect(R.containsRational(R.INDETERMINATE, Rational.of(7))).toBe(true);
    expect(R.upperBits(R.INDETERMINATE)).toBe(Infinity);
    expect(R.powInt(R.ZERO, -1, 53)).toBe(R.INDETERMINATE);
    expect(R.powInt(R.ball(0n, 0, 1), 0, 53)).toEqual(R.ONE);
  });

  it('doubles that are no numbers are refused', () => {
    expect(() => R.fromNumber(NaN)).toThrow(RangeError);
    expect(() => R.fromNumber(Infinity)).toThrow(RangeError);
  });

  it('numbers outside the range of doubles become 0 or infinity as doubles', () => {
    expect(R.toNumber(R.mul2exp(R.ONE, 5000))).toBe(Infinity);
    expect(R.toNumber(R.mul2exp(R.neg(R.ONE), 1_000_000_000))).toBe(-Infinity);
    expect(R.toNumber(R.mul2exp(R.ONE, -5000))).toBe(0);
    expect(R.radiusToNumber(R.ball(1n, -5000, 1))).toBeGreaterThan(0);
  });
});
