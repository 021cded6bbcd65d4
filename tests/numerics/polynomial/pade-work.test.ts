/** How much work is done, counted and not timed: working bits, attempts, lengths of integers. */
import { afterEach, describe, expect, test, vi } from 'vitest';
import { bitLength } from '../../../src/numerics/bits.js';
import * as C from '../../../src/numerics/ball/complex.js';
import * as R from '../../../src/numerics/ball/real.js';
import type { Exact } from '../../../src/numerics/exact.js';
import { Rational } from '../../../src/numerics/rational.js';
import { bernoulli } from '../../../src/numerics/special/bernoulli.js';
import { padeExact, padePoles, padeTable, type PadeEntry } from '../../../src/numerics/polynomial/index.js';
import { heightBits, type IntPoly } from '../../../src/numerics/polynomial/integer.js';
import type * as Euclid from '../../../src/numerics/polynomial/pade-euclid.js';
import type * as Minors from '../../../src/numerics/polynomial/pade-minors.js';
import { inOwnUnit } from '../../../src/numerics/polynomial/pade-scale.js';
import { RootCloud } from '../../../src/numerics/polynomial/roots-cloud.js';
import { isolateRoots } from '../../../src/numerics/polynomial/roots-isolate.js';
import { ballRoots, refinableRoots } from '../../../src/numerics/polynomial/roots.js';
import { scaleCoefficients, usefulBits, valueErrorBound } from '../../../src/numerics/polynomial/scaled-polynomial.js';
import { sharpFractions } from '../../../src/numerics/polynomial/sharp-fractions.js';
import { TaylorEnclosure } from '../../../src/numerics/polynomial/taylor-enclosure.js';
import { borelSeries, poly, q } from './random.js';

/** Longest integer that exact arithmetic of Padé entries was given. */
const longest = vi.hoisted(() => ({ bits: 0 }));

vi.mock('../../../src/numerics/polynomial/pade-minors.js', async (original) => {
  const actual = await original<typeof Minors>();
  const { heightBits: height } = await import('../../../src/numerics/polynomial/integer.js');
  return {
    ...actual,
    toeplitzMinors: (b: IntPoly, L: number, M: number): bigint[] | undefined => {
      longest.bits = Math.max(longest.bits, height(b));
      return actual.toeplitzMinors(b, L, M);
    },
  };
});

vi.mock('../../../src/numerics/polynomial/pade-euclid.js', async (original) => {
  const actual = await original<typeof Euclid>();
  const { heightBits: height } = await import('../../../src/numerics/polynomial/integer.js');
  const see = (b: IntPoly): void => {
    longest.bits = Math.max(longest.bits, height(b));
  };
  return {
    ...actual,
    euclidRow: (...args: Parameters<typeof actual.euclidRow>): ReturnType<typeof actual.euclidRow> => {
      see(args[0]);
      return actual.euclidRow(...args);
    },
    euclidRows: (...args: Parameters<typeof actual.euclidRows>): ReturnType<typeof actual.euclidRows> => {
      see(args[0]);
      return actual.euclidRows(...args);
    },
  };
});

/** The highest precision to which root searches raise their points from now on. */
function watchRaises(): { bits: number } {
  const top = { bits: 0 };
  const raise = Reflect.get(RootCloud.prototype, 'raise');
  vi.spyOn(RootCloud.prototype, 'raise').mockImplementation(function (this: RootCloud, w: number) {
    top.bits = Math.max(top.bits, w);
    raise.call(this, w);
  });
  return top;
}

afterEach(() => {
  vi.restoreAllMocks();
});

/** (n+1)B_{2n+2}/(2n+2)!: t-derivative of t·(√t/2)coth(√t/2), double poles at −4π²k², which approximants split. */
function doublePoles(count: number): Rational[] {
  let factorial = Rational.ONE;
  return Array.from({ length: count }, (_, n) => {
    factorial = factorial.mul(q((2 * n + 1) * (2 * n + 2)));
    return bernoulli(2 * n + 2)
      .mul(q(n + 1))
      .div(factorial);
  });
}

/** The series, and the precisions at which it was asked for. */
function recorded(b: readonly Rational[]): { series: Exact[]; asked: Set<number> } {
  const asked = new Set<number>();
  const series = b.map((rational) => ({
    rational,
    ball(prec: number): R.Ball {
      asked.add(prec);
      return R.fromRational(rational, prec);
    },
  }));
  return { series, asked };
}

describe('poles that nearly coincide', () => {
  test.each([
    [20, 21, [60, 75, 90, 160]],
    [26, 27, [120, 128, 150, 160]],
    [15, 16, [60, 75]],
  ] as const)('[%i/%i]: three attempts, and no search beyond the bits of its coefficients', (L, M, precs) => {
    const b = doublePoles(L + M + 1);
    for (const prec of precs) {
      const { series, asked } = recorded(b);
      const top = watchRaises();
      const result = padePoles(series, L, M, prec);
      vi.restoreAllMocks();
      if (!result.exists) throw new Error(result.reason);
      expect(result.poles.length).toBe(M);
      for (const pole of result.poles) expect(C.accuracyBits(pole.position)).toBeGreaterThanOrEqual(prec);
      expect(asked.size).toBeLessThanOrEqual(3);
      expect(top.bits).toBeGreaterThan(0);
      expect(top.bits).toBeLessThanOrEqual(Math.max(...asked) + 64);
    }
  });

  test('a doublet hundreds of bits below the other poles: bits are added in growing strides', () => {
    for (const n of [45, 96]) {
      const { series, asked } = recorded(borelSeries(2 * n + 1));
      const result = padePoles(series, n, n, 60);
      if (!result.exists) throw new Error(result.reason);
      const weakest = result.poles.reduce((a, b) => (C.upperBits(a.amplitude) < C.upperBits(b.amplitude) ? a : b));
      expect(C.upperBits(weakest.amplitude)).toBeLessThan(-400);
      expect(C.accuracyBits(weakest.amplitude)).toBeGreaterThanOrEqual(60);
      expect(asked.size).toBeLessThanOrEqual(3);
    }
  });

  test('roots that coincide within the error of the coefficients: given up at the bits these have', () => {
    // (x − 1)²(x − 2)²(x + 3) with 200 bits
    const square = poly(12, -32, 27, -5, -3, 1).map((c) => R.addRelativeError(R.fromRational(c, 400), 2 ** -200));
    const top = watchRaises();
    const result = isolateRoots(square, 100);
    expect('failed' in result && result.failed).toMatch(/within the error/);
    expect(top.bits).toBeLessThanOrEqual(usefulBits(square, 1) + 64 + 8);
  });

  test('a search gone on with starts from the roots found and sharpens them', () => {
    const p = poly(6, -5, -2, 1).map((c) => R.fromRational(c, 600));
    const search = refinableRoots(p);
    const rough = search(60);
    const starts = vi.spyOn(RootCloud.prototype, 'lift');
    const top = watchRaises();
    const sharp = search(300);
    if ('failed' in rough || 'failed' in sharp) throw new Error('no roots');
    expect(starts).not.toHaveBeenCalled();
    expect(top.bits).toBeGreaterThan(300);
    sharp.roots.forEach((root, i) => {
      expect(C.overlaps(root.value, rough.roots[i]!.value)).toBe(true);
      expect(C.accuracyBits(root.value)).toBeGreaterThanOrEqual(299);
      expect([q(1), q(-2), q(3)].some((x) => R.containsRational(root.value.re, x))).toBe(true);
    });
  });

  test('residues whose poles are too rough: few evaluations, and the accuracy that would do', () => {
    const p = poly(6, -5, -2, 1).map((c) => R.fromRational(c, 4000));
    const rough = ballRoots(p, 60);
    if ('failed' in rough) throw new Error(rough.failed);
    const prec = Math.ceil(Math.max(...rough.roots.map((root) => C.accuracyBits(root.value)))) + 40;
    const evaluations = vi.spyOn(TaylorEnclosure.prototype, 'coefficient');
    const sharp = sharpFractions([R.ONE], p, rough.roots, prec, 4000);
    expect(evaluations.mock.calls.length).toBeLessThanOrEqual(4 * 2 * 3);
    if (!('reason' in sharp)) throw new Error('sharp without sharp poles');
    const sharper = ballRoots(p, Math.ceil(sharp.poleBits!) + 16);
    if ('failed' in sharper) throw new Error(sharper.failed);
    expect('reason' in sharpFractions([R.ONE], p, sharper.roots, prec, 4000)).toBe(false);
  });

  test('working bits far beyond a radius: bounds are infinite, never NaN', () => {
    const inexact = poly(1, -3, 1).map((c) => R.addRelativeError(R.fromRational(c, 60), 2 ** -40));
    const s = scaleCoefficients(inexact, 0, 3000);
    expect(Array.from(s.weight).every((x) => x <= 1.01)).toBe(true);
    expect(valueErrorBound(s, 1, true)).toBe(Infinity);
  });
});

describe('coefficients of extreme size', () => {
  const scaledBy = (b: readonly Rational[], unit: Rational): Rational[] => b.map((c, n) => c.mul(unit.pow(n)));
  const factorials = (n: number): Rational[] => {
    let f = Rational.ONE;
    return Array.from({ length: n }, (_, k) => (f = f.mul(q(k === 0 ? 1 : -k))));
  };
  const unscaled = (entry: PadeEntry, unit: Rational): PadeEntry =>
    entry.exists
      ? { ...entry, numerator: scaledBy(entry.numerator, unit), denominator: scaledBy(entry.denominator, unit) }
      : entry;

  test.each(['1e300', '1e-300', '-7/3e300'])('n!·(%s)^n: entries of n!, on integers of about its length', (text) => {
    const unit = q(text);
    const plain = factorials(31);
    const huge = scaledBy(plain, unit);
    longest.bits = 0;
    for (const [L, M] of [
      [15, 15],
      [14, 16],
      [5, 6],
    ] as const) {
      expect(padeExact(huge, L, M)).toEqual(unscaled(padeExact(plain, L, M), unit));
    }
    expect(padeTable(huge.slice(0, 22), { minOrder: 17 })).toEqual(
      padeTable(plain.slice(0, 22), { minOrder: 17 }).map((e) => ({ ...e, entry: unscaled(e.entry, unit) })),
    );
    expect(longest.bits).toBeGreaterThan(0);
    expect(longest.bits).toBeLessThan(4 * heightBits(plain.map((c) => c.num)));
  });

  test('holes, leading zeros and blocks survive the change of the unit', () => {
    const unit = q('1e300');
    for (const b of [poly(0, 0, 1, 2, 0, 3, 4, 5), poly(1, 0, 1, 1, 1, 1, 1, 1), poly(1, 2, 4, 8, 16, 32, 64, 128)]) {
      for (let L = 0; L <= 7; L++) {
        for (let M = 0; L + M <= 7; M++) {
          const entry = padeExact(scaledBy(b, unit), L, M);
          expect(entry).toEqual(unscaled(padeExact(b, L, M), unit));
        }
      }
    }
  });

  test('decimals of 15 digits: the power of ten they share is taken out, short series are left alone', () => {
    const b = Array.from({ length: 12 }, (_, n) =>
      q(`${123456789012345n + 98765432109876n * BigInt(n * n)}e${280 * n}`),
    );
    const own = inOwnUnit(b);
    if (own === undefined) throw new Error('left alone');
    expect(own.den > 10n ** 270n).toBe(true);
    expect(Math.max(...own.coefficients.map((c) => bitLength(c.num) + bitLength(c.den)))).toBeLessThan(600);
    own.coefficients.forEach((c, n) => expect(c.mul(Rational.of(own.den, own.num).pow(n)).equals(b[n]!)).toBe(true));
    expect(inOwnUnit(borelSeries(20))).toBeUndefined();
    expect(inOwnUnit(factorials(30))).toBeUndefined();
  });
});
