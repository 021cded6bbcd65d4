/** The building blocks of balls: powers of two as doubles, bounds rounded up, bits cut off. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { R, Rational } from '../../../src/numerics/index.js';
import {
  absUp,
  COARSE_BITS,
  cutBits,
  power2 as doublePower,
  rounded,
  scale2,
  scaleUp,
  shiftLeft,
  shiftRound,
  SPARE,
} from '../../../src/numerics/ball/core.js';
import { cases, mustContain, power2 } from './generate.js';

const TINY = 2 ** -500;

describe('powers of two and scaled doubles', () => {
  it('2^k in the normal range, 0 below, infinite above', () => {
    for (const k of [-1022, -1021, -500, -1, 0, 1, 62, 1022, 1023]) expect(doublePower(k)).toBe(2 ** k);
    expect([doublePower(-1023), doublePower(-5000), doublePower(1024), doublePower(5000)]).toEqual([
      0,
      0,
      Infinity,
      Infinity,
    ]);
  });

  it('a bound x·2^k is exact in the normal range, and never rounded down to zero', () => {
    for (const x of [1, 1.75, 2 ** -500, 2 ** 500])
      for (const k of [-2201, -2200, -1700, -1023, -1022, -300, 0, 7, 1023, 1024, 1500, 2200, 2201]) {
        const y = scaleUp(x, k);
        const log = Math.log2(x) + k;
        if (log >= 1024) expect(y).toBe(Infinity);
        else if (k > 2200) expect(y).toBe(Infinity);
        else expect(Rational.fromNumber(y).cmp(Rational.fromNumber(x).mul(power2(k)))).toBeGreaterThanOrEqual(0);
        if (log > -1000 && log < 1024 && k <= 2200)
          expect(y).toBe(x * 2 ** Math.trunc(k / 2) * 2 ** (k - Math.trunc(k / 2)));
        if (log < -1080) expect(y).toBeLessThanOrEqual(2 * Number.MIN_VALUE);
      }
    expect([scaleUp(0, 3), scaleUp(0, 3000), scaleUp(0, -3000), scaleUp(1.5, 0)]).toEqual([0, 0, 0, 1.5]);
    expect(scaleUp(Infinity, -5)).toBe(Infinity);
  });

  it('a value x·2^k crosses the range of doubles without loss', () => {
    expect(scale2(2 ** -1000 * 1.5, 2000)).toBe(2 ** 1000 * 1.5);
    expect(scale2(-(2 ** 1000), -2000)).toBe(-(2 ** -1000));
    expect([scale2(3, 5), scale2(3, -5), scale2(-3, 0)]).toEqual([96, 3 / 32, -3]);
    expect([scale2(1, 2201), scale2(-1, 2201), scale2(0, 2201)]).toEqual([Infinity, -Infinity, 0]);
    expect([scale2(2 ** -1074, 2000), scale2(2 ** -1000, 2200)]).toEqual([2 ** 926, Infinity]);
    expect([scale2(1, -2201), scale2(1e300, -5000), scale2(2 ** 1000, -2000)]).toEqual([0, 0, 2 ** -1000]);
  });
});

describe('shifts', () => {
  it('left, at lengths on both sides of the table of counts', () => {
    for (const k of [0, 1, 63, 1022, 1023, 1024, 1025, 5000]) expect(shiftLeft(-3n, k)).toBe(-3n * 2n ** BigInt(k));
  });

  it('right, to the nearest integer, ties upwards', () => {
    expect([shiftRound(5n, 1), shiftRound(-5n, 1), shiftRound(6n, 2), shiftRound(7n, 3), shiftRound(3n, 3)]).toEqual([
      3n,
      -2n,
      2n,
      1n,
      0n,
    ]);
    for (const k of [1, 64, 1024, 1025]) expect(shiftRound((3n << BigInt(k)) + (1n << BigInt(k - 1)) - 1n, k)).toBe(3n);
  });
});

describe('cutting bits', () => {
  const mids = fc
    .tuple(fc.constantFrom(1, 53, 64, 65, 130, 1100), fc.bigInt({ min: 0n, max: (1n << 1100n) - 1n }), fc.boolean())
    .map(([n, m, negative]) => ((m >> BigInt(1100 - n)) | (1n << BigInt(n - 1))) * (negative ? -1n : 1n));

  it('exact midpoints: exact where only zero bits go, one unit of error otherwise', () => {
    fc.assert(
      fc.property(mids, fc.integer({ min: -3, max: 1200 }), fc.integer({ min: 0, max: 1200 }), (odd, drop, zeros) => {
        const mid = odd << BigInt(zeros);
        const b = cutBits(mid, 7, 0, drop, 0);
        const exactly = Rational.of(mid).mul(power2(7));
        mustContain(b, exactly, { mid: String(mid), drop });
        const cut = Math.max(drop, 0);
        expect(b.exp).toBe(7 + cut);
        const same = R.midpoint(b).equals(exactly);
        expect(b.rad).toBe(same ? 0 : 1);
      }),
      cases(400),
    );
    // zero low words, with something above them
    expect(cutBits(5n << 64n, 0, 0, 64, 0)).toEqual({ mid: 5n, exp: 64, rad: 0 });
    expect(cutBits(5n << 64n, 0, 0, 65, 0)).toEqual({ mid: 2n, exp: 65, rad: 1 });
    expect(cutBits(5n << 64n, 0, 0, 66, 0)).toEqual({ mid: 1n, exp: 66, rad: 1 });
    expect(cutBits((5n << 64n) + 1n, 0, 0, 64, 0)).toEqual({ mid: 5n, exp: 64, rad: 1 });
  });

  it('radii: what is cut off is added, nothing else but a part in 2^30', () => {
    fc.assert(
      fc.property(
        mids,
        fc.integer({ min: 2 ** 52, max: 2 ** 53 - 1 }),
        fc.integer({ min: -300, max: 300 }),
        fc.integer({ min: -3, max: 400 }),
        fc.constantFrom(0, 1, 200, 3000),
        (mid, digits, k, drop, radExp) => {
          const rad = digits * 2 ** (k - 52);
          const b = cutBits(mid, -9, rad, drop, radExp);
          const need = Rational.fromNumber(rad).mul(power2(radExp - 9));
          const at = Rational.of(mid).mul(power2(-9));
          for (const end of [at.sub(need), at.add(need)]) mustContain(b, end, { mid: String(mid), rad, drop, radExp });
          const lost = R.midpoint(b).sub(at).abs();
          const allowed = need
            .add(power2(b.exp))
            .mul(Rational.ONE.add(power2(-40)))
            .add(power2(b.exp).mul(Rational.fromNumber(TINY)));
          expect(Rational.fromNumber(b.rad).mul(power2(b.exp)).cmp(allowed)).toBeLessThanOrEqual(0);
          expect(lost.cmp(power2(b.exp))).toBeLessThanOrEqual(0);
          // a radius never reaches beyond the bits that mean something by much, and bits are cut only for that or as asked
          if (b.exp > -9 + Math.max(drop, 0)) expect(b.rad).toBeGreaterThan(2 ** (COARSE_BITS - 10));
          if (radExp > 0) expect(b.rad).toBeLessThan(2 ** (COARSE_BITS + 1));
        },
      ),
      cases(400),
    );
  });

  it('wide radii shorten the midpoint, moderate ones do not', () => {
    const mid = 1n << 200n;
    expect(cutBits(mid, 0, 2 ** 39, 0, 0).exp).toBe(0);
    expect(cutBits(mid, 0, 2 ** 40, 0, 0).exp).toBe(0);
    expect(cutBits(mid, 0, 2 ** 41, 0, 0).exp).toBe(41 - COARSE_BITS + 8);
    expect(cutBits(mid, 0, 2 ** 60, 0, 0).exp).toBe(60 - COARSE_BITS + 8);
    expect(cutBits(mid, 0, 2 ** 60, 40, 0).exp).toBe(40);
    expect(cutBits(mid, 0, 2 ** 100, 40, 0).exp).toBe(100 - COARSE_BITS + 8);
  });

  it('no radius: no number; a positive radius is never rounded to zero', () => {
    expect(cutBits(1n, 0, NaN, 0, 0)).toBe(R.INDETERMINATE);
    expect(cutBits(1n, 0, Infinity, 0, 0)).toBe(R.INDETERMINATE);
    expect(cutBits(1n, 0, 2 ** -1070, 0, 0).rad).toBe(TINY);
    expect(cutBits(1n, 0, TINY * 2, 0, 0).rad / (TINY * 2)).toBeCloseTo(1, 12);
  });

  it('rounding keeps the bits asked for and two more', () => {
    const mid = (3n << 298n) + 12345n;
    for (const prec of [10, 100, 200]) {
      const b = rounded(mid, 0, 0, prec);
      expect(b.exp).toBe(300 - prec - SPARE);
      expect(b.mid).toBe(mid >> BigInt(b.exp));
    }
    expect(rounded(mid, 3, 0, Infinity)).toEqual({ mid, exp: 3, rad: 0 });
  });

  it('an upper bound of |m|·2^e, above by at most a part in 2^40', () => {
    fc.assert(
      fc.property(mids, fc.integer({ min: -1500, max: 500 }), (m, e) => {
        const size = Rational.of(m < 0n ? -m : m).mul(power2(e));
        const bound = absUp(m, e);
        if (bound === Infinity) {
          expect(size.cmp(power2(1023))).toBeGreaterThanOrEqual(0);
          return;
        }
        expect(Rational.fromNumber(bound).cmp(size)).toBeGreaterThanOrEqual(0);
        const allowed = size.mul(Rational.ONE.add(power2(-40))).add(power2(-1072));
        expect(Rational.fromNumber(bound).cmp(allowed)).toBeLessThanOrEqual(0);
      }),
      cases(400),
    );
    expect(absUp(0n, 50)).toBe(0);
  });
});
