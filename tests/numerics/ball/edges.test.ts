/** Exact values, shortest representations and the ends of the range: what a random case does not meet. */
import { describe, expect, it } from 'vitest';
import { pow, R, Rational } from '../../../src/numerics/index.js';
import type { Ball } from '../../../src/numerics/index.js';
import { divMag, mulMag } from '../../../src/numerics/ball/mag.js';
import { mustContain, power2 } from './generate.js';

const q = (n: number, d = 1): Rational => Rational.of(n, d);
const ends = (a: Ball): Rational[] =>
  [1, -1].map((sign) => R.midpoint(a).add(Rational.fromNumber(a.rad * sign).mul(power2(a.exp))));

describe('making balls', () => {
  it('integers keep their digits, as bigints, doubles and rationals', () => {
    expect(R.fromNumber(-7n)).toEqual({ mid: -7n, exp: 0, rad: 0 });
    expect(R.fromNumber(2 ** 53 - 1)).toEqual({ mid: 2n ** 53n - 1n, exp: 0, rad: 0 });
    expect(R.fromRational(q(12345), 53)).toEqual({ mid: 12345n, exp: 0, rad: 0 });
    expect(R.ball(3n, -5)).toEqual({ mid: 3n, exp: -5, rad: 0 });
  });

  it('a fraction is exact when its denominator is a power of two, and as sharp as asked otherwise', () => {
    for (const dyadic of [q(3, 4), q(-5, 1024), Rational.of(2n ** 80n + 1n, 2n ** 90n)]) {
      const b = R.fromRational(dyadic, 100);
      expect(b.rad).toBe(0);
      expect(R.midpoint(b).equals(dyadic)).toBe(true);
    }
    for (const n of [1n, 7n ** 30n, 3n ** 500n])
      for (const d of [3n, 11n ** 40n, 5n ** 300n])
        for (const prec of [5, 53, 700]) {
          const b = R.fromRational(Rational.of(n, d), prec);
          mustContain(b, Rational.of(n, d), { n: String(n), d: String(d), prec });
          expect(R.accuracyBits(b)).toBeGreaterThanOrEqual(prec);
        }
  });

  it('an error of zero changes nothing; a tiny one on zero keeps its size', () => {
    const a = R.ball(5n, -2, 0.25);
    expect(R.addError(a, 0)).toBe(a);
    expect(R.addRelativeError(a, 0)).toBe(a);
    expect(R.radiusBits(R.addError(R.ZERO, 1, -1_000_000))).toBeCloseTo(-1_000_000, 3);
    expect(R.radiusBits(R.addError(R.ONE, 1, -100_000))).toBeCloseTo(-100_000, 3);
    expect(R.addError(R.ONE, Infinity)).toBe(R.INDETERMINATE);
    expect(R.widen(R.INDETERMINATE, R.ONE)).toBe(R.INDETERMINATE);
    expect(R.widen(R.ONE, R.INDETERMINATE)).toBe(R.INDETERMINATE);
  });
});

describe('questions at the ends', () => {
  it('size: |x| < 2^E for all points, E the smallest where the radius is below one unit', () => {
    expect(R.upperBits(R.ZERO)).toBe(-Infinity);
    expect(R.upperBits({ mid: 0n, exp: 9, rad: 0 })).toBe(-Infinity);
    expect(R.upperBits(R.ball(5n, 0, 0.5))).toBe(3);
    expect(R.upperBits({ mid: 7n, exp: 0, rad: 1 })).toBe(4);
    expect(R.upperBits(R.ball(-8n, 10))).toBe(14);
  });

  it('an exact number is accurate without limit, zero too', () => {
    expect(R.accuracyBits(R.ZERO)).toBe(Infinity);
    expect(R.radiusBits(R.ZERO)).toBe(-Infinity);
  });

  it('long midpoints as doubles', () => {
    for (const n of [60n, 63n, 64n, 65n, 66n, 200n, 1100n, 5000n]) {
      expect(R.toNumber({ mid: 3n << n, exp: -Number(n), rad: 0 })).toBe(3);
      expect(R.toNumber({ mid: -(3n << n) - 1n, exp: 2 - Number(n), rad: 0 })).toBeCloseTo(-12, 12);
    }
  });

  it('magnitudes: zero times and zero over anything is zero', () => {
    const infinite = { m: Infinity, e: 0 };
    const zero = { m: 0, e: 0 };
    expect([mulMag(infinite, zero), divMag(zero, infinite)]).toEqual([zero, zero]);
  });
});

describe('arithmetic', () => {
  it('what may be anything stays so, but for a factor that is exactly zero', () => {
    for (const a of [R.ONE, R.ball(3n, 0, 1), R.ball(0n, 0, 1)]) {
      for (const op of [R.add, R.sub, R.mul]) {
        expect(op(R.INDETERMINATE, a, 53)).toBe(R.INDETERMINATE);
        expect(op(a, R.INDETERMINATE, 53)).toBe(R.INDETERMINATE);
      }
      expect(R.div(R.INDETERMINATE, a, 53)).toBe(R.INDETERMINATE);
      expect(R.div(a, R.INDETERMINATE, 53)).toBe(R.INDETERMINATE);
    }
    expect(R.mul(R.INDETERMINATE, R.ZERO, 53)).toEqual(R.ZERO);
    expect(R.sqrt(R.INDETERMINATE, 53)).toBe(R.INDETERMINATE);
    expect(R.sqrt(R.ZERO, 53)).toEqual(R.ZERO);
  });

  it('zero added changes nothing but the rounding', () => {
    const a = R.ball(3n, -7, 0.25);
    for (const s of [R.add(a, R.ZERO, 53), R.add(R.ZERO, a, 53)]) expect(s).toEqual(R.round(a, 53));
  });

  it('cancellation loses nothing that was there', () => {
    for (const n of [20, 70, 100, 500, 3000]) {
      const large = { mid: 1n, exp: n, rad: 0 };
      const near = { mid: 1n - (1n << BigInt(n)), exp: 0, rad: 0 };
      for (const s of [R.add(large, near, 53), R.add(near, large, 53)]) expect(R.midpoint(s).equals(q(1))).toBe(true);
      const wide = R.add({ ...large, rad: 2 ** -40 }, near, 53);
      expect(R.radiusBits(wide)).toBeLessThan(n - 39);
    }
  });

  it('a quotient whose lowest word fits by chance is not taken for exact', () => {
    // divisor and shifted dividend both end in 64 zero bits
    const third = R.div(R.ONE, { mid: 3n << 64n, exp: -64, rad: 0 }, 53);
    expect(third.rad).toBe(1);
    mustContain(third, q(1, 3), 'third');
    const half = R.div({ mid: 3n << 64n, exp: 0, rad: 0 }, { mid: 3n << 65n, exp: 0, rad: 0 }, 53);
    expect([half.rad, R.toNumber(half)]).toEqual([0, 0.5]);
  });

  it('a divisor that misses zero by a part in 2^45 is given up, never divided by', () => {
    for (const n of [60, 1010]) {
      const mid = 1n << BigInt(n);
      const b = { mid, exp: 0, rad: Number(mid) * (1 - 2 ** -45) };
      expect(R.containsZero(b)).toBe(false);
      const value = R.div(R.ONE, b, 53);
      const far = Rational.of(mid).sub(Rational.fromNumber(b.rad)).inv();
      if (value.rad < Infinity) mustContain(value, far, n);
    }
  });

  it('a quotient by a long and wide divisor holds its corners, at few bits too', () => {
    for (const part of [0.3, 0.9, 0.99, 1 - 2 ** -30])
      for (const prec of [2, 3, 24, 53])
        for (const digits of [3n, 5n, 7n, 1001n]) {
          const mid = digits << 1005n;
          const b = { mid, exp: -1000, rad: Number(mid) * part };
          for (const a of [R.ONE, R.fromNumber(-7), R.ball(1n << 80n, -70, 2 ** 70), R.ball(9n, 5, 4)]) {
            const value = R.div(a, b, prec);
            for (const x of ends(a)) for (const y of ends(b)) mustContain(value, x.div(y), { part, prec });
          }
        }
  });

  it('integer powers lose at most a bit, negative ones too', () => {
    for (const n of [-40, -5, -1, 1, 2, 3, 20, 333])
      for (const prec of [24, 100, 500]) {
        const v = R.powInt(R.fromRational(q(7, 3), prec + 60), n, prec);
        expect(R.accuracyBits(v), `${n}, ${prec} bits`).toBeGreaterThan(prec - 1.5);
        mustContain(v, q(7, 3).pow(n), { n, prec });
      }
  });
});

describe('powers', () => {
  const LIMIT = 1 << 14;
  const around = (centre: bigint, exp: number, rad: number): Ball => ({ mid: centre, exp, rad });

  it('integer exponents: exact where the result fits, of any base by repeated squaring', () => {
    expect(pow(R.fromNumber(-3), R.fromNumber(5), 53)).toEqual(R.fromNumber(-243));
    expect(pow(R.fromNumber(-3), q(4), 53)).toEqual(R.fromNumber(81));
    expect(pow(R.fromNumber(2), q(-3), 53).rad).toBe(0);
    expect(pow(R.ZERO, R.ZERO, 53)).toEqual(R.ONE);
    expect(pow(R.ZERO, q(-1), 53)).toBe(R.INDETERMINATE);
    expect(pow(R.ZERO, q(1, 3), 53)).toEqual(R.ZERO);
    expect(pow(R.ZERO, q(-1, 3), 53)).toBe(R.INDETERMINATE);
  });

  it('a base that may be zero: up to 2^14 by squaring, no longer beyond', () => {
    const wide = around(0n, 0, 0.5);
    for (const n of [1, 2, 3, LIMIT]) {
      expect(pow(wide, q(n), 53).rad, `${n}`).toBeLessThan(Infinity);
      expect(pow(wide, R.fromNumber(n), 53).rad, `${n}`).toBeLessThan(Infinity);
    }
    expect(pow(wide, q(LIMIT + 1), 53)).toBe(R.INDETERMINATE);
    expect(pow(wide, q(-1), 53)).toBe(R.INDETERMINATE);
  });

  it.each([2, 3, 1000, LIMIT - 1, LIMIT, LIMIT + 1, LIMIT + 2, 100_001])(
    'exponents ±%i, ±half of it: the exact value within, and as many bits as asked',
    (n) => {
      const base = q(-1_000_003, 1_000_000);
      const a = R.fromRational(base, 400);
      for (const sign of [1, -1]) {
        const value = pow(a, q(sign * n), 100);
        const exactly = R.powInt(R.fromRational(base, 2000), sign * n, 2000);
        expect(R.overlaps(value, exactly)).toBe(true);
        expect(R.accuracyBits(value)).toBeGreaterThanOrEqual(97);
        expect(R.isNegative(value)).toBe(n % 2 === 1);
        const square = R.sqr(pow(R.neg(a), q(sign * n, 2), 100), 300);
        expect(R.overlaps(square, R.abs(exactly))).toBe(true);
        expect(R.accuracyBits(square)).toBeGreaterThanOrEqual(96);
      }
    },
  );

  it('an exponent that is not exact is no integer', () => {
    const value = pow(R.fromNumber(2), around(3n << 20n, -20, 2 ** 10), 80);
    for (const shift of [-1, 1]) {
      const at = pow(R.fromNumber(2), Rational.of(3).add(power2(-10).mul(q(shift))), 80);
      expect(R.overlaps(value, at)).toBe(true);
    }
    expect(R.accuracyBits(value)).toBeLessThan(12);
    expect(pow(R.fromNumber(-2), around(3n << 20n, -20, 2 ** 10), 80)).toBe(R.INDETERMINATE);
  });

  it('size costs no bits: huge and tiny results keep the precision asked', () => {
    for (const [a, b] of [
      [R.fromNumber(1e300), q(1_000_001, 7)],
      [R.fromNumber(1e-300), q(1_000_001, 7)],
      [R.fromNumber(3), q(1, 1_000_003)],
      [R.fromNumber(3), q(-7, 3)],
    ] as const) {
      const value = pow(a, b, 90);
      expect(R.accuracyBits(value)).toBeGreaterThanOrEqual(87);
      // (a^b)^den = a^num
      const back = R.powInt(pow(a, b, 500), Number(b.den) > 1000 ? 1 : Number(b.den), 500);
      if (Number(b.den) <= 1000) expect(R.overlaps(back, pow(a, Rational.of(b.num), 500))).toBe(true);
    }
  });

  it('exponents beyond all sizes say nothing, and do not throw', () => {
    expect(pow(R.fromNumber(2), R.mul2exp(R.ONE, 2000), 53)).toBe(R.INDETERMINATE);
    expect(pow(R.fromNumber(-2), R.mul2exp(R.ONE, 2000), 53).rad).toBe(Infinity);
    expect(pow(R.ONE, q(1, 3), 53)).toEqual(R.ONE);
  });
});
