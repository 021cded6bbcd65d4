/** Magnitudes against exact rationals: an upper bound is not below the value, a lower one not above it, both are close. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { R, Rational } from '../../../src/numerics/index.js';
import type { Ball } from '../../../src/numerics/index.js';
import {
  addMag,
  addMagLower,
  divMag,
  leMag,
  mag,
  magBits,
  magLower,
  magRadius,
  magToNumber,
  magUpper,
  mulMag,
  mulMagLower,
  widenMag,
} from '../../../src/numerics/ball/mag.js';
import type { Mag } from '../../../src/numerics/ball/mag.js';
import { cases, mustContain, power2 } from './generate.js';

const exactly = (a: Mag): Rational => Rational.fromNumber(a.m).mul(power2(a.e));
const CLOSE = power2(-40);
const near = (x: Rational, factor: Rational): Rational => x.mul(factor);
function boundsAbove(a: Mag, x: Rational): void {
  expect(exactly(a).cmp(x)).toBeGreaterThanOrEqual(0);
  expect(exactly(a).cmp(near(x, Rational.ONE.add(CLOSE)))).toBeLessThanOrEqual(0);
}
function boundsBelow(a: Mag, x: Rational): void {
  expect(exactly(a).cmp(x)).toBeLessThanOrEqual(0);
  expect(exactly(a).cmp(near(x, Rational.ONE.sub(CLOSE)))).toBeGreaterThanOrEqual(0);
}

/** 53-bit mantissas in the range of m, near its ends now and then; exponents far beyond doubles. */
const mags = fc
  .tuple(
    fc.integer({ min: 2 ** 52, max: 2 ** 53 - 1 }),
    fc.oneof(fc.integer({ min: -60, max: 60 }), fc.constantFrom(-199, -150, 150, 199)),
    fc.oneof(fc.integer({ min: -80, max: 80 }), fc.integer({ min: -3000, max: 3000 })),
  )
  .map(([digits, k, e]): Mag => ({ m: digits * 2 ** (k - 52), e }));
const zero: Mag = { m: 0, e: 0 };
const infinite: Mag = { m: Infinity, e: 0 };

describe('magnitudes', () => {
  it('are brought back near 1 when they stray, rounded up', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 2 ** 52, max: 2 ** 53 - 1 }),
        fc.integer({ min: -1000, max: 1000 }),
        fc.integer({ min: -2000, max: 2000 }),
        (digits, k, e) => {
          const m = digits * 2 ** (k - 52);
          const a = mag(m, e);
          boundsAbove(a, Rational.fromNumber(m).mul(power2(e)));
          expect(a.m < 2 ** 200 && a.m > 2 ** -200).toBe(true);
          if (m > 2 ** -200 && m < 2 ** 200) expect(a).toEqual({ m, e });
          else expect(a.m >= 0.5 && a.m < 2 + 2 ** -40).toBe(true);
        },
      ),
      cases(300),
    );
    expect(mag(0, 7)).toEqual(zero);
    expect(mag(Infinity, 7)).toEqual(infinite);
    expect(mag(NaN)).toEqual(infinite);
    expect(mag(3)).toEqual({ m: 3, e: 0 });
  });

  it('sum, product and quotient bound the exact ones', () => {
    fc.assert(
      fc.property(mags, mags, (a, b) => {
        const [x, y] = [exactly(a), exactly(b)];
        boundsAbove(mulMag(a, b), x.mul(y));
        boundsAbove(addMag(a, b), x.add(y));
        boundsAbove(divMag(a, b), x.div(y));
        boundsBelow(mulMagLower(a, b), x.mul(y));
        boundsBelow(addMagLower(a, b), x.add(y));
        // comparison of numbers that a double can tell apart
        const ratio = x.div(y);
        if (ratio.cmp(Rational.of(4)) > 0) expect([leMag(a, b), leMag(b, a)]).toEqual([false, true]);
        expect(leMag(a, a)).toBe(true);
      }),
      cases(300),
    );
  });

  it('zero and infinity', () => {
    const one: Mag = { m: 1, e: 5 };
    expect([mulMag(zero, one), mulMag(one, zero), mulMag(zero, infinite)]).toEqual([zero, zero, zero]);
    expect([addMag(zero, one), addMag(one, zero)]).toEqual([one, one]);
    expect(addMag(infinite, one)).toEqual(infinite);
    expect([divMag(one, zero), divMag(zero, zero), divMag(zero, one)]).toEqual([infinite, infinite, zero]);
    expect(divMag(one, infinite)).toEqual(infinite);
    expect([addMagLower(zero, zero), mulMagLower(zero, one)]).toEqual([zero, zero]);
    expect(addMagLower(zero, one).m).toBeLessThanOrEqual(1);
    expect([leMag(zero, one), leMag(one, zero), leMag(zero, zero)]).toEqual([true, false, true]);
    expect([magToNumber(zero), magBits(zero)]).toEqual([0, -Infinity]);
  });

  it('as doubles: never below the bound, 0 only for zero, infinite beyond the range', () => {
    fc.assert(
      fc.property(mags, (a) => {
        const x = magToNumber(a);
        expect(x).toBeGreaterThan(0);
        if (x < Infinity) expect(Rational.fromNumber(x).cmp(exactly(a))).toBeGreaterThanOrEqual(0);
        expect(magBits(a)).toBeCloseTo(Math.log2(a.m) + a.e, 9);
        if (magBits(a) > -1000 && magBits(a) < 1023 && a.e <= 1200) expect(Math.log2(x)).toBeCloseTo(magBits(a), 9);
        if (magBits(a) > 1025) expect(x).toBe(Infinity);
        if (magBits(a) < -1075) expect(x).toBe(Number.MIN_VALUE);
      }),
      cases(300),
    );
    // where doubles end, rounding to the nearest may go down by half of the smallest one
    for (let e = -1080; e < -1060; e++)
      for (const m of [1, 1.1, 1.25, 1.4, 1.5, 1.6, 1.75]) {
        const x = Rational.fromNumber(magToNumber({ m, e }));
        expect(x.cmp(exactly({ m, e }))).toBeGreaterThanOrEqual(0);
      }
    expect(magToNumber({ m: 2 ** -199, e: 1200 })).toBeLessThan(Infinity);
    expect(magToNumber({ m: 1, e: 1201 })).toBe(Infinity);
    expect(magToNumber({ m: 2 ** 199, e: -1201 })).toBeGreaterThanOrEqual(2 ** -1002);
    expect(magToNumber({ m: 1, e: -1_000_000 })).toBe(Number.MIN_VALUE);
  });
});

describe('magnitudes of balls', () => {
  const balls = fc
    .tuple(
      fc.constantFrom(1, 30, 59, 60, 61, 62, 100, 1200),
      fc.bigInt({ min: 0n, max: (1n << 1200n) - 1n }),
      fc.boolean(),
      fc.integer({ min: -2000, max: 2000 }),
      fc.constantFrom(0, 1, 2, 3),
      fc.integer({ min: 2 ** 52, max: 2 ** 53 - 1 }),
    )
    .map(([n, digits, negative, exp, kind, r]): Ball => {
      const mid = (digits >> BigInt(1200 - n)) | (1n << BigInt(n - 1));
      const size = Math.min(n - 1, 900);
      const rad =
        kind === 0 ? 0 : kind === 1 ? r * 2 ** -100 : kind === 2 ? r * 2 ** (size - 60) : r * 2 ** (size - 50);
      return { mid: negative ? -mid : mid, exp, rad };
    });

  it('from above and from below', () => {
    fc.assert(
      fc.property(balls, (x) => {
        const mid = R.midpoint(x).abs();
        const rad = Rational.fromNumber(x.rad).mul(power2(x.exp));
        boundsAbove(magUpper(x), mid.add(rad));
        const low = mid.sub(rad);
        if (low.sign() <= 0) expect(magLower(x)).toEqual(zero);
        else {
          expect(exactly(magLower(x)).cmp(low)).toBeLessThanOrEqual(0);
          if (rad.mul(Rational.of(2)).cmp(mid) < 0) boundsBelow(magLower(x), low);
        }
        boundsAbove(magRadius(x), rad);
      }),
      cases(300),
    );
  });

  it('a ball widened by a magnitude holds what lies that far off', () => {
    fc.assert(
      fc.property(balls, mags, (x, a) => {
        const wide = widenMag(x, a);
        for (const sign of [1n, -1n])
          mustContain(wide, R.midpoint(x).add(exactly(a).mul(Rational.of(sign))), { x: String(x.mid), a });
      }),
      cases(200),
    );
  });
});
