import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import * as C from '../../../src/numerics/ball/complex.js';
import type { Complex } from '../../../src/numerics/ball/complex.js';
import { pi } from '../../../src/numerics/ball/constants.js';
import * as R from '../../../src/numerics/ball/real.js';
import type { Ball } from '../../../src/numerics/ball/real.js';
import { Rational } from '../../../src/numerics/rational.js';
import {
  certifiedRoots,
  countNegativeRealRoots,
  countPositiveRealRoots,
  degreePoly,
  mulPoly,
  trimPoly,
  type CertifiedRoot,
  type RationalPoly,
} from '../../../src/numerics/polynomial/index.js';
import { MULTIPLIER, poly, polynomials, q } from './random.js';

function rootsOf(p: RationalPoly | readonly Ball[], prec: number): readonly CertifiedRoot[] {
  const result = certifiedRoots(p as RationalPoly, prec);
  if ('failed' in result) throw new Error(result.failed);
  return result.roots;
}

const withRoots = (...roots: Rational[]): RationalPoly =>
  roots.reduce<RationalPoly>((p, r) => mulPoly(p, [r.neg(), Rational.ONE]), poly(1));

const times = (p: RationalPoly, n: number): RationalPoly =>
  Array.from({ length: n }).reduce<RationalPoly>((acc) => mulPoly(acc, p), poly(1));

/** p on the box by Horner's rule in balls. */
function evaluate(p: RationalPoly, z: Complex, prec: number): Complex {
  return p
    .toReversed()
    .reduce<Complex>((acc, c) => C.add(C.mul(acc, z, prec), C.fromReal(R.fromRational(c, prec)), prec), C.ZERO);
}

const bits = (roots: readonly CertifiedRoot[]): number => Math.min(...roots.map((r) => C.accuracyBits(r.value)));

/** Everything that must hold for any polynomial whatever. */
function expectSound(p: RationalPoly, roots: readonly CertifiedRoot[], prec: number): void {
  const degree = degreePoly(p);
  expect(roots.reduce((n, r) => n + r.multiplicity, 0)).toBe(degree);
  expect(bits(roots)).toBeGreaterThanOrEqual(prec - 1);
  const work = prec + 40 * degree + 400;
  let sum = C.ZERO;
  let product = C.ONE;
  roots.forEach((r, i) => {
    for (let k = 0; k < r.multiplicity; k++) {
      sum = C.add(sum, r.value, work);
      product = C.mul(product, C.neg(r.value), work);
    }
    const value = evaluate(p, r.value, work);
    expect(R.containsZero(value.re) && R.containsZero(value.im)).toBe(true);
    expect(R.isExactZero(r.value.im)).toBe(r.real);
    if (!r.real) {
      // not real: the box stays off the axis, and its exact mirror image is the neighbour in the list
      expect(R.containsZero(r.value.im)).toBe(false);
      const mate = roots[R.isPositive(r.value.im) ? i + 1 : i - 1]!;
      expect(mate.value).toEqual(C.conj(r.value));
      expect(mate.multiplicity).toBe(r.multiplicity);
    }
    for (let j = 0; j < i; j++) expect(C.overlaps(r.value, roots[j]!.value)).toBe(false);
  });
  // Vieta
  const t = trimPoly(p);
  const lead = t[degree]!;
  expect(R.containsRational(sum.re, t[degree - 1]!.div(lead).neg())).toBe(true);
  expect(R.containsZero(sum.im)).toBe(true);
  expect(R.containsRational(product.re, t[0]!.div(lead))).toBe(true);
  // Exact counts of distinct real roots
  expect(roots.filter((r) => r.real && R.isPositive(r.value.re)).length).toBe(countPositiveRealRoots(p));
  expect(roots.filter((r) => r.real && R.isNegative(r.value.re)).length).toBe(countNegativeRealRoots(p));
}

describe('any polynomial', () => {
  test('count, Vieta, symmetry, disjointness, exact real counts', () => {
    fc.assert(
      fc.property(polynomials(7), fc.constantFrom(20, 53, 200), (p, prec) => {
        fc.pre(degreePoly(p) >= 1);
        expectSound(p, rootsOf(p, prec), prec);
      }),
      { numRuns: 150 * MULTIPLIER },
    );
  });

  test('repeated and mixed factors', () => {
    fc.assert(
      fc.property(polynomials(2), polynomials(2), (a, b) => {
        const p = [a, b, b].reduce<RationalPoly>(mulPoly, poly(1));
        fc.pre(degreePoly(p) >= 1);
        expectSound(p, rootsOf(p, 60), 60);
      }),
      { numRuns: 50 * MULTIPLIER },
    );
  });

  test('a sharper answer lies inside the rougher one', () => {
    fc.assert(
      fc.property(polynomials(6), (p) => {
        fc.pre(degreePoly(p) >= 1);
        const rough = rootsOf(p, 20);
        for (const r of rootsOf(p, 300)) {
          const homes = rough.filter((s) => C.overlaps(s.value, r.value));
          expect(homes.length).toBe(1);
          expect(homes[0]!.real).toBe(r.real);
          expect(R.containsRational(homes[0]!.value.re, R.midpoint(r.value.re))).toBe(true);
          expect(R.containsRational(homes[0]!.value.im, R.midpoint(r.value.im))).toBe(true);
        }
      }),
      { numRuns: 100 * MULTIPLIER },
    );
  });
});

describe('hard cases', () => {
  test('Wilkinson: roots 1..n of degree 20 and 60', () => {
    for (const n of [20, 60]) {
      const roots = rootsOf(withRoots(...Array.from({ length: n }, (_, k) => q(k + 1))), 200);
      expect(roots.length).toBe(n);
      roots.forEach((r, k) => {
        expect(r.real && R.containsRational(r.value.re, q(k + 1))).toBe(true);
        expect(R.accuracyBits(r.value.re)).toBeGreaterThan(199);
      });
    }
  });

  test('Chebyshev T_40: roots cos((2k − 1)π/80), through T_40(cos φ) = cos 40φ', () => {
    let [a, b]: [RationalPoly, RationalPoly] = [poly(1), poly(0, 1)];
    for (let n = 2; n <= 40; n++) {
      const doubled = mulPoly(poly(0, 2), b);
      [a, b] = [b, doubled.map((c, i) => c.sub(a[i] ?? Rational.ZERO))];
    }
    const roots = rootsOf(b, 150);
    expect(roots.every((r) => r.real)).toBe(true);
    const found = roots.map((r) => R.toNumber(r.value.re)).sort((x, y) => x - y);
    found.forEach((x, k) => expect(x).toBeCloseTo(-Math.cos(((2 * k + 1) * Math.PI) / 80), 14));
    expect(bits(roots)).toBeGreaterThan(149);
  });

  test('cyclotomic product (x^24 − 1)(x^18 − 1)/(x^6 − 1): all on the unit circle', () => {
    const minusOne = (n: number): RationalPoly => [q(-1), ...Array.from({ length: n - 1 }, () => q(0)), q(1)];
    // x^12 + x^6 + 1 times x^24 − 1
    const p = mulPoly(minusOne(24), poly(1, 0, 0, 0, 0, 0, 1, 0, 0, 0, 0, 0, 1));
    const roots = rootsOf(p, 120);
    expectSound(p, roots, 120);
    for (const r of roots) {
      const square = R.add(R.mul(r.value.re, r.value.re, 300), R.mul(r.value.im, r.value.im, 300), 300);
      expect(R.containsRational(square, q(1))).toBe(true);
    }
    expect(roots.filter((r) => r.real).length).toBe(2);
  });

  test('multiplicities are exact', () => {
    const p = mulPoly(mulPoly(times(poly(-1, 1), 4), times(poly(1, 0, 1), 3)), mulPoly(poly(0, 0, 1), poly(-2, 0, 1)));
    const roots = rootsOf(p, 100);
    expect(roots.map((r) => [C.toNumbers(r.value).re.toFixed(3), r.multiplicity, r.real])).toEqual([
      ['0.000', 2, true],
      ['1.000', 4, true],
      ['0.000', 3, false],
      ['0.000', 3, false],
      [expect.stringMatching(/1\.414/), 1, true],
      [expect.stringMatching(/1\.414/), 1, true],
    ]);
    expect(R.containsRational(roots[1]!.value.re, q(1))).toBe(true);
    expect(roots[0]!.value).toEqual(C.ZERO);
  });

  test('roots of different multiplicity 1e-30 apart are told apart', () => {
    const near = q(1).add(q('1e-30'));
    const roots = rootsOf(mulPoly(times(poly(-1, 1), 2), withRoots(near)), 40);
    expect(roots.length).toBe(2);
    for (const r of roots) {
      expect(R.containsRational(r.value.re, q(1))).toBe(r.multiplicity === 2);
      expect(R.containsRational(r.value.re, near)).toBe(r.multiplicity === 1);
    }
  });

  test('simple clusters 1e-30 apart, on and off the axis', () => {
    const d = q('1e-30');
    const real = rootsOf(withRoots(q(1), q(1).add(d), q(1).sub(d), q(-1)), 53);
    expect(real.filter((r) => r.real).length).toBe(4);
    for (const x of [q(1), q(1).add(d), q(1).sub(d)]) {
      expect(real.filter((r) => R.containsRational(r.value.re, x)).length).toBe(1);
    }
    // ((x − 1)² + 1e-60)(x + 3): a pair that only looks real
    const pair = rootsOf(mulPoly([q(1).add(q('1e-60')), q(-2), q(1)], poly(3, 1)), 53);
    expect(pair.map((r) => r.real)).toEqual([false, false, true]);
    expect(R.containsRational(pair[0]!.value.im, d)).toBe(true);
  });

  test('coefficients and roots from 1e-400 to 1e400', () => {
    const sizes = ['-1e-400', '2e-30', '3', '-7e120', '1e400'].map((t) => q(t));
    const p = mulPoly(withRoots(...sizes), [q('1e200'), q(0), q('1e-200')]);
    const roots = rootsOf(p, 90);
    expect(roots.length).toBe(7);
    for (const s of sizes) expect(roots.filter((r) => r.real && R.containsRational(r.value.re, s)).length).toBe(1);
    const pair = roots.filter((r) => !r.real);
    expect(R.containsRational(pair[0]!.value.im, q('1e200'))).toBe(true);
    expect(bits(roots)).toBeGreaterThan(89);
  });

  test('degree 200, pseudo-random', () => {
    let s = 7n;
    const p = Array.from({ length: 201 }, () => {
      s = (s * 6364136223846793005n + 1442695040888963407n) % 2n ** 64n;
      return q((s >> 40n) - 2n ** 23n);
    });
    const roots = rootsOf(p, 120);
    expect(roots.length).toBe(200);
    expect(bits(roots)).toBeGreaterThan(119);
    expect(roots.filter((r) => r.real && R.isPositive(r.value.re)).length).toBe(countPositiveRealRoots(p));
    const sum = roots.reduce((acc, r) => R.add(acc, r.value.re, 200), R.ZERO);
    expect(R.containsRational(sum, p[199]!.div(p[200]!).neg())).toBe(true);
  });

  test('constants, linear and zero polynomials', () => {
    expect(rootsOf(poly(5), 53)).toEqual([]);
    expect(rootsOf(poly(0, 0, 3), 53)).toEqual([{ value: C.ZERO, multiplicity: 2, real: true }]);
    const [root] = rootsOf(poly(3, 7), 100);
    expect(R.containsRational(root!.value.re, q(-3, 7))).toBe(true);
    expect(() => certifiedRoots(poly(0), 53)).toThrow(RangeError);
    expect(() => certifiedRoots([R.ZERO], 53)).toThrow(RangeError);
  });

  test('more digits than doubles have exponents', () => {
    const [root] = rootsOf(poly(-2, 0, 1), 3000);
    expect(R.containsRational(R.mul(root!.value.re, root!.value.re, 3100), q(2))).toBe(true);
    expect(R.accuracyBits(root!.value.re)).toBeGreaterThan(2999);
  });
});

describe('coefficients known by enclosures', () => {
  const fuzzy = (p: RationalPoly, relative: number): Ball[] =>
    p.map((c) => R.addRelativeError(R.fromRational(c, relative + 30), 2 ** -relative));

  test('contain the roots of every polynomial in the balls', () => {
    const p = withRoots(q(1, 3), q(-2), q(5, 7), q(11));
    const balls = fuzzy(p, 60);
    const roots = rootsOf(balls, 200);
    expect(bits(roots)).toBeLessThan(60);
    expect(bits(roots)).toBeGreaterThan(48);
    for (let k = 0; k <= 4; k++) {
      for (const sign of [-1, 1]) {
        const moved = p.map((c, i) => (i === k ? c.add(c.mul(q(sign, 2n ** 60n))) : c));
        for (const exact of rootsOf(moved, 200)) {
          const home = roots.filter((r) => R.containsRational(r.value.re, R.midpoint(exact.value.re)));
          expect(home.length).toBe(1);
        }
      }
    }
  });

  test('a double root or a closer pair is refused with its reason', () => {
    for (const p of [poly(1, -2, 1), [q(1).add(q('1e-30')), q(-2), q(1)]]) {
      const result = certifiedRoots(fuzzy(p, 60), 100);
      expect(result).toEqual({ failed: 'roots cannot be told apart within the error of the coefficients' });
    }
    // the same pair with enough known digits
    expect(rootsOf(fuzzy([q(1).add(q('1e-30')), q(-2), q(1)], 200), 60).map((r) => r.real)).toEqual([false, false]);
  });

  test('an uncertain degree or an uncertain zero root is refused', () => {
    const unsure = R.addError(R.ZERO, 1, -50);
    expect(certifiedRoots([R.ONE, R.ONE, unsure], 53)).toHaveProperty('failed');
    expect(certifiedRoots([unsure, R.ONE, R.ONE], 53)).toHaveProperty('failed');
    expect(rootsOf([R.ZERO, R.ONE, R.ONE, R.ZERO], 53).map((r) => R.toNumber(r.value.re))).toEqual([0, -1]);
  });

  test('x² − π: the root squares to π', () => {
    const roots = rootsOf([R.neg(pi(400)), R.ZERO, R.ONE], 350);
    for (const r of roots) expect(R.overlaps(R.mul(r.value.re, r.value.re, 500), pi(500))).toBe(true);
    expect(bits(roots)).toBeGreaterThan(349);
  });
});
