import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { Rational } from '../../../src/numerics/rational.js';
import * as R from '../../../src/numerics/ball/real.js';
import {
  countNegativeRealRoots,
  countPositiveRealRoots,
  countRealRoots,
  countRealRootsIn,
  derivativePoly,
  divmodPoly,
  evaluatePoly,
  mulPoly,
  scalePoly,
  trimPoly,
  certifiedRoots,
  type RationalPoly,
} from '../../../src/numerics/polynomial/index.js';
import { MULTIPLIER, poly, polynomials, q } from './random.js';

/** Sturm's theorem, the textbook way: distinct roots in (a, b], neither end a multiple root. */
function sturm(p: RationalPoly, a: Rational, b: Rational): number {
  const chain: RationalPoly[] = [trimPoly(p), derivativePoly(p)];
  for (;;) {
    const [f, g] = chain.slice(-2);
    if (g!.length === 0) break;
    chain.push(scalePoly(divmodPoly(f!, g!).remainder, q(-1)));
  }
  const variations = (x: Rational): number => {
    const signs = chain.map((f) => evaluatePoly(f, x).sign()).filter((s) => s !== 0);
    return signs.filter((s, i) => i > 0 && s !== signs[i - 1]).length;
  };
  return variations(a) - variations(b);
}

const product = (...roots: Rational[]): RationalPoly =>
  roots.reduce<RationalPoly>((p, r) => mulPoly(p, [r.neg(), Rational.ONE]), poly(1));

describe('agreement with Sturm', () => {
  test('random polynomials, any interval', () => {
    fc.assert(
      fc.property(polynomials(7), fc.integer({ min: -20, max: 20 }), fc.integer({ min: 1, max: 30 }), (p, a, width) => {
        fc.pre(trimPoly(p).length > 1);
        const [lo, hi] = [q(a, 3), q(a + width, 3)];
        fc.pre(!evaluatePoly(p, lo).isZero() && !evaluatePoly(p, hi).isZero());
        expect(countRealRootsIn(p, lo, hi)).toBe(sturm(p, lo, hi));
      }),
      { numRuns: 100 * MULTIPLIER },
    );
  });

  test('half axes: beyond every root bound nothing is missed', () => {
    fc.assert(
      fc.property(polynomials(7), (p) => {
        const f = trimPoly(p);
        fc.pre(f.length > 1 && !f[0]!.isZero());
        const bound = f
          .reduce((s, c) => s.add(c.abs()), Rational.ONE)
          .div(f[f.length - 1]!.abs())
          .add(Rational.ONE);
        expect(countPositiveRealRoots(p)).toBe(sturm(p, Rational.ZERO, bound));
        expect(countNegativeRealRoots(p)).toBe(sturm(p, bound.neg(), Rational.ZERO));
      }),
      { numRuns: 100 * MULTIPLIER },
    );
  });
});

describe('roots put there on purpose', () => {
  test('distinct roots are counted once, zero belongs to neither half axis', () => {
    const p = mulPoly(product(q(0), q(0), q(1), q(1), q(3), q(-2)), poly(1, 0, 1));
    expect([countPositiveRealRoots(p), countNegativeRealRoots(p), countRealRoots(p)]).toEqual([2, 1, 4]);
  });

  test('(a, b] takes the right end and leaves the left one', () => {
    const p = product(q(1), q(2), q(3));
    expect(countRealRootsIn(p, q(1), q(3))).toBe(2);
    expect(countRealRootsIn(p, q(1, 2), q(1))).toBe(1);
    expect(countRealRootsIn(p, q(3), q(9))).toBe(0);
    expect(() => countRealRootsIn(p, q(3), q(3))).toThrow(RangeError);
  });

  test('dyadic roots on the bisection points', () => {
    const roots = [q(1, 4), q(1, 2), q(3, 8), q(1), q(2), q(4), q(3), q(64)];
    expect(countPositiveRealRoots(product(...roots))).toBe(8);
  });

  test('neighbours 1e-30 apart, with and without a root between', () => {
    const d = q('1e-30');
    const close = product(q(1, 3), q(1, 3).add(d), q(2));
    expect(countPositiveRealRoots(close)).toBe(3);
    // (3x − 1)² + 1e-60: the same pair moved off the axis
    const near = [Rational.ONE.add(q('1e-60')), q(-6), q(9)];
    expect(countPositiveRealRoots(mulPoly(near, product(q(2))))).toBe(1);
  });

  test('roots from 1e-400 to 1e400', () => {
    const sizes = ['1e-400', '1e-200', '3e-7', '1', '5e90', '1e400'].map((t) => q(t));
    expect(countPositiveRealRoots(mulPoly(product(...sizes), poly(1, 0, 1)))).toBe(6);
  });

  test('constants have none, the zero polynomial is refused', () => {
    expect(countRealRoots(poly(5))).toBe(0);
    expect(() => countRealRoots(poly(0))).toThrow(RangeError);
  });
});

test('degree 50 with 500-digit coefficients agrees with the certified roots', () => {
  let s = 12345n;
  const p = Array.from({ length: 51 }, () => {
    s = (s * 6364136223846793005n + 1442695040888963407n) % 10n ** 500n;
    return q(s - 10n ** 500n / 2n);
  });
  const found = certifiedRoots(p, 60);
  if ('failed' in found) throw new Error(found.failed);
  const real = found.roots.filter((r) => r.real);
  expect(countPositiveRealRoots(p)).toBe(real.filter((r) => R.isPositive(r.value.re)).length);
  expect(countNegativeRealRoots(p)).toBe(real.filter((r) => R.isNegative(r.value.re)).length);
});
