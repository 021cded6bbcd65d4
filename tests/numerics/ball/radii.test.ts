/**
 * Radii from both sides: a result holds the exact results at the corners of its arguments, and is hardly wider than they ask. Radii have
 * all 53 bits, so that every rounding of a double that goes the wrong way shows.
 */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { R, Rational } from '../../../src/numerics/index.js';
import type { Ball } from '../../../src/numerics/index.js';
import { cases, mustContain, power2, precision } from './generate.js';

const lengths = fc.constantFrom(1, 20, 53, 61, 64, 65, 130, 400, 1001, 1100, 2100);
const mantissas = fc
  .tuple(lengths, fc.bigInt({ min: 0n, max: (1n << 2100n) - 1n }), fc.boolean())
  .map(([n, m, negative]) => ((m >> BigInt(2100 - n)) | (1n << BigInt(n - 1))) * (negative ? -1n : 1n));
const exponents = fc.oneof(fc.integer({ min: -150, max: 150 }), fc.integer({ min: -2500, max: 2500 }));
/** 53-bit radii of any size, more often below the midpoint than beyond it. */
const balls = fc
  .tuple(mantissas, exponents, fc.integer({ min: 2 ** 52, max: 2 ** 53 - 1 }), fc.integer({ min: -120, max: 120 }))
  .map(([mid, exp, digits, k]): Ball => ({ mid, exp, rad: digits * 2 ** (k - 52) }));
const points = fc.tuple(mantissas, exponents).map(([mid, exp]): Ball => ({ mid, exp, rad: 0 }));
/** Balls about as wide as their midpoint is large, on both sides of touching zero. */
const wide = fc
  .tuple(
    fc.constantFrom(3, 53, 64, 400, 505),
    fc.bigInt({ min: 0n, max: (1n << 505n) - 1n }),
    exponents,
    fc.boolean(),
    fc.integer({ min: 1, max: 2 ** 52 }),
  )
  .map(([n, m, exp, negative, part]): Ball => {
    const mid = (m >> BigInt(505 - n)) | (1n << BigInt(n - 1));
    return { mid: negative ? -mid : mid, exp, rad: Number(mid) * (part / 2 ** 51) };
  });
const either = fc.oneof({ weight: 4, arbitrary: balls }, { weight: 1, arbitrary: points });

const radius = (a: Ball): Rational => Rational.fromNumber(a.rad).mul(power2(a.exp));
const ends = (a: Ball): Rational[] => [R.midpoint(a).sub(radius(a)), R.midpoint(a).add(radius(a))];
const largest = (values: Rational[]): Rational => values.reduce((a, b) => (a.cmp(b) >= 0 ? a : b));

/** The corners lie in the ball, and its radius is at most what they need plus `units` of 2^-prec of the value. */
function sharp(value: Ball, corners: Rational[], prec: number, units: Rational, context: unknown): void {
  for (const corner of corners) mustContain(value, corner, context);
  const mid = R.midpoint(value);
  const need = largest(corners.map((c) => c.sub(mid).abs()));
  const allowed = need.mul(Rational.ONE.add(power2(-30))).add(mid.abs().mul(power2(-prec)).mul(units));
  if (radius(value).cmp(allowed) > 0) {
    const excess = radius(value).div(allowed).toNumber();
    throw new Error(
      `radius ${excess} times as large as allowed: ${JSON.stringify(context, (_, v: unknown) => (typeof v === 'bigint' ? v.toString() : v))}`,
    );
  }
}

type Operation = readonly [
  name: string,
  op: (a: Ball, b: Ball, prec: number) => Ball,
  exact: (x: Rational, y: Rational) => Rational,
];
const OPERATIONS: readonly Operation[] = [
  ['sum', R.add, (x, y) => x.add(y)],
  ['difference', R.sub, (x, y) => x.sub(y)],
  ['product', R.mul, (x, y) => x.mul(y)],
];

describe('no radius is too small at a corner, none is much too large', () => {
  it.each(OPERATIONS)('%s', (_, op, exact) => {
    fc.assert(
      fc.property(either, either, precision, (a, b, prec) => {
        const corners = ends(a).flatMap((x) => ends(b).map((y) => exact(x, y)));
        sharp(op(a, b, prec), corners, prec, Rational.of(1), { a, b, prec });
      }),
      cases(300),
    );
  });

  it('quotient', () => {
    fc.assert(
      fc.property(either, either, precision, (a, b, prec) => {
        const value = R.div(a, b, prec);
        const [low, high] = ends(b) as [Rational, Rational];
        if (low.sign() * high.sign() <= 0) {
          expect(value).toBe(R.INDETERMINATE);
          return;
        }
        // A divisor that nearly reaches zero may be given up, no other one.
        if (value.rad === Infinity) {
          expect(R.accuracyBits(b)).toBeLessThan(1);
          return;
        }
        const corners = ends(a).flatMap((x) => ends(b).map((y) => x.div(y)));
        for (const corner of corners) mustContain(value, corner, { a, b, prec });
        if (R.accuracyBits(b) > 40) sharp(value, corners, prec, Rational.of(1), { a, b, prec });
      }),
      cases(300),
    );
  });

  it('square root, by the squares of its ends', () => {
    fc.assert(
      fc.property(balls, precision, (a, prec) => {
        const value = R.sqrt(a, prec);
        const [low, high] = ends(a) as [Rational, Rational];
        if (low.sign() <= 0) {
          expect(value).toBe(R.INDETERMINATE);
          return;
        }
        if (value.rad === Infinity) {
          expect(R.accuracyBits(a)).toBeLessThan(1);
          return;
        }
        const [from, to] = ends(value) as [Rational, Rational];
        expect(from.sign() < 0 || from.mul(from).cmp(low) <= 0).toBe(true);
        expect(to.mul(to).cmp(high)).toBeGreaterThanOrEqual(0);
        // half the relative error of the argument, where that is small, and the rounding
        if (R.accuracyBits(a) > 40) {
          const relative = radius(value).div(R.midpoint(value));
          const need = radius(a)
            .div(R.midpoint(a))
            .mul(Rational.of(1, 2))
            .mul(Rational.ONE.add(power2(-30)));
          expect(relative.cmp(need.add(power2(-prec)))).toBeLessThanOrEqual(0);
        }
      }),
      cases(300),
    );
  });

  it('the same for balls about as wide as their midpoint is large', () => {
    fc.assert(
      fc.property(wide, wide, precision, (a, b, prec) => {
        const pairs = ends(a).flatMap((x) => ends(b).map((y): [Rational, Rational] => [x, y]));
        for (const [, op, exact] of OPERATIONS) {
          sharp(
            op(a, b, prec),
            pairs.map(([x, y]) => exact(x, y)),
            prec,
            Rational.of(1),
            { a, b, prec },
          );
        }
        const quotient = R.div(a, b, prec);
        if (quotient.rad < Infinity) for (const [x, y] of pairs) mustContain(quotient, x.div(y), { a, b, prec });
        else expect(R.accuracyBits(b)).toBeLessThan(1);
        const root = R.sqrt(a, prec);
        if (root.rad === Infinity) expect(R.isPositive(a) && R.accuracyBits(a) > 1).toBe(false);
        else {
          const [low, high] = ends(a) as [Rational, Rational];
          const [from, to] = ends(root) as [Rational, Rational];
          expect(from.sign() <= 0 || from.mul(from).cmp(low) <= 0).toBe(true);
          expect(to.mul(to).cmp(high)).toBeGreaterThanOrEqual(0);
        }
      }),
      cases(300),
    );
  });

  it('balls of one unit: radii add', () => {
    fc.assert(
      fc.property(balls, balls, precision, (a, b, prec) => {
        const c: Ball = { ...b, exp: a.exp };
        const corners = ends(a).flatMap((x) => ends(c).map((y) => x.add(y)));
        sharp(R.add(a, c, prec), corners, prec, Rational.of(1), { a, c, prec });
      }),
      cases(100),
    );
  });

  it('rounding and scaling', () => {
    fc.assert(
      fc.property(either, precision, fc.integer({ min: -3000, max: 3000 }), (a, prec, k) => {
        sharp(R.round(a, prec), ends(a), prec, Rational.of(1), { a, prec });
        sharp(
          R.mul2exp(a, k),
          ends(a).map((x) => x.mul(power2(k))),
          5000,
          Rational.ZERO,
          { a, k },
        );
      }),
      cases(400),
    );
  });

  it('added errors: absolute, relative, another ball', () => {
    const errors = fc.tuple(fc.integer({ min: 2 ** 52, max: 2 ** 53 - 1 }), fc.integer({ min: -60, max: 60 }));
    fc.assert(
      fc.property(either, either, errors, fc.integer({ min: -1500, max: 1500 }), (a, b, [digits, k], e) => {
        const r = digits * 2 ** (k - 52);
        const exactly = Rational.fromNumber(r).mul(power2(e));
        const around = (x: Rational): Rational[] => [R.midpoint(a).sub(x), R.midpoint(a).add(x)];
        sharp(R.addError(a, r, e), around(radius(a).add(exactly)), 5000, Rational.of(1), { a, r, e });
        const size = (x: Ball): Rational => R.midpoint(x).abs().add(radius(x));
        sharp(R.addRelativeError(a, r, e), around(radius(a).add(size(a).mul(exactly))), 5000, Rational.of(1), {
          a,
          r,
          e,
        });
        sharp(R.widen(a, b), around(radius(a).add(size(b))), 5000, Rational.of(1), { a, b });
      }),
      cases(400),
    );
  });
});

describe('questions answered as sharply as they can be', () => {
  it('the bound of the size is at most a factor 8 above it, and above it', () => {
    fc.assert(
      fc.property(either, (a) => {
        const top = R.midpoint(a).abs().add(radius(a));
        const up = R.upperBits(a);
        expect(top.cmp(power2(up))).toBe(-1);
        expect(top.cmp(power2(up - 3))).toBeGreaterThanOrEqual(0);
      }),
      cases(300),
    );
  });

  it('a ball that stays clear of zero by a part in 2^40 is told from it, one that touches zero never', () => {
    fc.assert(
      fc.property(lengths, fc.bigInt({ min: 1n, max: (1n << 53n) - 1n }), exponents, (n, digits, exp) => {
        const mid = digits << BigInt(n);
        const rad = Number(mid);
        if (rad === Infinity) return;
        for (const sign of [1n, -1n]) {
          const touching: Ball = { mid: sign * mid, exp, rad };
          expect([R.isPositive(touching), R.isNegative(touching), R.containsZero(touching)]).toEqual([
            false,
            false,
            true,
          ]);
          const clear: Ball = { mid: sign * mid, exp, rad: rad * (1 - 2 ** -40) };
          expect([R.isPositive(clear), R.isNegative(clear), R.containsZero(clear)]).toEqual([
            sign > 0n,
            sign < 0n,
            false,
          ]);
        }
      }),
      cases(400),
    );
  });

  it('a rational at the end of a ball is inside, one beyond it is not', () => {
    fc.assert(
      fc.property(balls, (a) => {
        const [low, high] = ends(a) as [Rational, Rational];
        const step = radius(a).mul(power2(-80));
        expect([low, high].map((x) => R.containsRational(a, x))).toEqual([true, true]);
        expect([low.sub(step), high.add(step)].map((x) => R.containsRational(a, x))).toEqual([false, false]);
      }),
      cases(300),
    );
  });

  it('accuracy: log2 of midpoint over radius, within a bit', () => {
    fc.assert(
      fc.property(balls, (a) => {
        const ratio = R.midpoint(a).abs().div(radius(a));
        const bits = R.accuracyBits(a);
        expect(Number.isFinite(bits)).toBe(true);
        const whole = Math.floor(bits);
        expect(ratio.cmp(power2(whole)) >= 0 || bits < whole + 2 ** -40).toBe(true);
        expect(ratio.cmp(power2(whole + 2))).toBe(-1);
        expect(R.radiusBits(a)).toBeCloseTo(a.exp + Math.log2(a.rad), 9);
      }),
      cases(300),
    );
    expect([R.accuracyBits(R.ONE), R.accuracyBits(R.INDETERMINATE)]).toEqual([Infinity, -Infinity]);
    expect([R.ball(0n, 0, 0.5), R.ball(0n, 0, 8)].map((z) => Math.round(R.accuracyBits(z)) + 0)).toEqual([0, -3]);
    expect([R.radiusBits(R.ONE), R.radiusBits(R.INDETERMINATE)]).toEqual([-Infinity, Infinity]);
  });

  it('comparison and overlap are certain for balls that are clearly apart', () => {
    fc.assert(
      fc.property(balls, balls, (a, b) => {
        const [la, ha] = ends(a) as [Rational, Rational];
        const [lb, hb] = ends(b) as [Rational, Rational];
        const apart = ha.cmp(lb) < 0 ? -1 : hb.cmp(la) < 0 ? 1 : 0;
        const order = R.compare(a, b, 3000);
        if (order !== 0) expect(order).toBe(apart);
        if (apart === 0) expect(R.overlaps(a, b)).toBe(true);
        const gap = (apart < 0 ? lb.sub(ha) : la.sub(hb)).div(largest([radius(a), radius(b)]));
        if (apart !== 0 && gap.cmp(power2(-20)) > 0) {
          expect(order).toBe(apart);
          expect(R.overlaps(a, b)).toBe(false);
        }
      }),
      cases(300),
    );
  });
});
