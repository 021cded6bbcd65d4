import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import * as R from '../../../src/numerics/ball/real.js';
import { Rational } from '../../../src/numerics/rational.js';
import { RootCloud } from '../../../src/numerics/polynomial/roots-cloud.js';
import { smithDiscs, symmetrise } from '../../../src/numerics/polynomial/roots-discs.js';
import { aberthSweeps, polynomialRatio, startingPoints } from '../../../src/numerics/polynomial/roots-start.js';
import {
  evaluateAt,
  inputErrorBound,
  log2Length,
  scaleCoefficients,
  usefulBits,
  valueErrorBound,
} from '../../../src/numerics/polynomial/scaled-polynomial.js';
import { mulPoly, type RationalPoly } from '../../../src/numerics/polynomial/index.js';
import { MULTIPLIER, poly, polynomials, q } from './random.js';

const two = (e: number): Rational => (e >= 0 ? q(2n ** BigInt(e)) : q(1, 2n ** BigInt(-e)));

/** p(x + iy) exactly. */
function exactValue(p: RationalPoly, x: Rational, y: Rational): [Rational, Rational] {
  let [re, im] = [Rational.ZERO, Rational.ZERO];
  for (const c of p.toReversed()) [re, im] = [re.mul(x).sub(im.mul(y)).add(c), re.mul(y).add(im.mul(x))];
  return [re, im];
}

const exactBalls = (p: RationalPoly): R.Ball[] => p.map((c) => R.fromRational(c, 4000));

describe('fixed-point evaluation', () => {
  const point = fc.tuple(
    fc.integer({ min: -1400, max: 1400 }),
    fc.oneof(fc.constant(0), fc.integer({ min: -1400, max: 1400 })),
  );

  test('the error bound holds for exact and for inexact coefficients, real and complex points', () => {
    fc.assert(
      fc.property(
        polynomials(12),
        point,
        fc.integer({ min: -9, max: 9 }),
        fc.constantFrom(40, 64, 200),
        fc.boolean(),
        fc.boolean(),
        (p, [a, b], e, w, slope, inexact) => {
          const size = Math.hypot(a, b) / 1024;
          fc.pre(p.some((c) => !c.isZero()) && size > 0.6 && size < 1.6);
          const balls = inexact ? p.map((c) => R.addRelativeError(R.fromRational(c, 60), 2 ** -30)) : exactBalls(p);
          // a polynomial inside the balls, at the edge of each
          const inside = inexact ? p.map((c, i) => c.add(c.mul(q(i % 2 === 0 ? 1 : -1, 2n ** 30n)))) : p;
          const s = scaleCoefficients(balls, e, w);
          const fixed = (v: number): bigint => BigInt(v) << BigInt(w - 10);
          const v = evaluateAt(s, fixed(a), fixed(b), slope);
          const unit = two(s.unit);
          const [re, im] = exactValue(inside, q(a, 1024).mul(two(e)), q(b, 1024).mul(two(e)));
          const dr = re.div(unit).sub(q(v.re)).toNumber();
          const di = im.div(unit).sub(q(v.im)).toNumber();
          expect(Math.hypot(dr, di)).toBeLessThanOrEqual(valueErrorBound(s, size * (1 + 1e-12), slope));
          if (!inexact) expect(inputErrorBound(s, size)).toBeLessThan(1e-200 + 2 ** (w - 3900));
        },
      ),
      { numRuns: 400 * MULTIPLIER },
    );
  });

  test('the bound holds where all roundings go one way: 200 equal terms at points of full width', () => {
    const ones = poly(...Array.from({ length: 200 }, () => 1));
    const w = 62;
    const s = scaleCoefficients(exactBalls(ones), 0, w);
    let seed = 11n;
    for (let run = 0; run < 10; run++) {
      seed = (seed * 6364136223846793005n + 1442695040888963407n) % 2n ** 64n;
      const yr = 2n ** 62n - (seed >> 8n);
      const yi = run % 2 === 0 ? 0n : seed >> 9n;
      const v = evaluateAt(s, yr, yi, false);
      const [re, im] = exactValue(ones, q(yr, 2n ** 62n), q(yi, 2n ** 62n));
      const unit = two(s.unit);
      const size = Math.hypot(Number(yr), Number(yi)) / 2 ** 62;
      const error = Math.hypot(re.div(unit).sub(q(v.re)).toNumber(), im.div(unit).sub(q(v.im)).toNumber());
      const bound = valueErrorBound(s, size * (1 + 1e-12), false);
      expect(error).toBeLessThanOrEqual(bound);
      // and it is no more than a few bits too wide
      expect(error).toBeGreaterThan(bound / 40);
    }
  });

  test('the slope is the derivative', () => {
    const p = poly(3, -1, 4, 1, -5, 9, -2, 6);
    const s = scaleCoefficients(exactBalls(p), 1, 120);
    const [x, y] = [q(900, 1024), q(-500, 1024)];
    const fixed = (v: number): bigint => BigInt(v) << 110n;
    const v = evaluateAt(s, fixed(900), fixed(-500), true);
    // d/dy p(2y) = 2 p'(2y)
    const derivative = p.slice(1).map((c, i) => c.mul(q(2 * (i + 1))));
    const [re, im] = exactValue(derivative, x.mul(q(2)), y.mul(q(2)));
    expect(q(v.slopeRe).mul(two(s.unit)).sub(re).abs().toNumber()).toBeLessThan(1e-25);
    expect(q(v.slopeIm).mul(two(s.unit)).sub(im).abs().toNumber()).toBeLessThan(1e-25);
  });

  test('the bound for 101 terms is at most 13 bits above the last one', () => {
    const s = scaleCoefficients(exactBalls(poly(...Array.from({ length: 101 }, () => '1/3'))), 0, 200);
    expect(valueErrorBound(s, 1, true)).toBeLessThan(2 ** 13);
  });

  test('useful bits are those between the coefficients and their errors', () => {
    const balls = [R.ONE, R.addError(R.fromNumber(8), 1, -40)];
    expect(usefulBits(balls, 0)).toBeGreaterThanOrEqual(43);
    expect(usefulBits(balls, 0)).toBeLessThanOrEqual(46);
    expect(usefulBits([R.ONE, R.ONE], 5)).toBe(Infinity);
  });

  test('log2 of a length', () => {
    expect(log2Length(3n, 4n)).toBeCloseTo(Math.log2(5), 14);
    expect(log2Length(3n << 4000n, -(4n << 4000n))).toBeCloseTo(4000 + Math.log2(5), 10);
    expect(log2Length(0n, 0n)).toBe(-Infinity);
  });
});

describe('discs', () => {
  /** A cloud at given doubles for the polynomial with the given real roots. */
  function cloudFor(roots: readonly Rational[], at: readonly (readonly [number, number])[], w = 200): RootCloud {
    const p = roots.reduce<RationalPoly>((acc, r) => mulPoly(acc, [r.neg(), Rational.ONE]), poly(1));
    const exp = Int32Array.from(at, ([x, y]) => Math.round(Math.log2(Math.hypot(x, y))));
    return new RootCloud(
      exactBalls(p),
      {
        re: Float64Array.from(at, ([x], i) => x * 2 ** -exp[i]!),
        im: Float64Array.from(at, ([, y], i) => y * 2 ** -exp[i]!),
        exp,
      },
      w,
    );
  }

  test('around any distinct points at all, the union holds every root', () => {
    fc.assert(
      fc.property(
        fc.uniqueArray(fc.integer({ min: 1, max: 40 }), { minLength: 2, maxLength: 6 }),
        fc.array(fc.tuple(fc.integer({ min: -90, max: 90 }), fc.integer({ min: -90, max: 90 })), {
          minLength: 6,
          maxLength: 6,
        }),
        (roots, shifts) => {
          const at = roots.map((r, i) => [r + shifts[i]![0] / 128, shifts[i]![1] / 128] as const);
          const { radius } = smithDiscs(
            cloudFor(
              roots.map((r) => q(r)),
              at,
            ),
          );
          for (const r of roots) {
            expect(at.some(([x, y], i) => Math.hypot(x - r, y) <= 2 ** radius[i]! * (1 + 1e-12))).toBe(true);
          }
        },
      ),
      { numRuns: 300 * MULTIPLIER },
    );
  });

  test('disjoint discs hold one root each; coarse points are called crowded', () => {
    const good = smithDiscs(
      cloudFor(
        [q(1), q(2), q(4)],
        [
          [1.001, 0],
          [2, 0.001],
          [4.002, 0],
        ],
      ),
    );
    expect(good.disjoint).toBe(true);
    expect(good.accuracy).toBeGreaterThan(6);
    [1, 2, 4].forEach((r, i) =>
      expect(Math.hypot([1.001, 2, 4.002][i]! - r, [0, 0.001, 0][i]!)).toBeLessThan(2 ** good.radius[i]!),
    );
    const bad = smithDiscs(
      cloudFor(
        [q(1), q(3, 2), q(4)],
        [
          [1.2, 0],
          [1.3, 0],
          [4, 0],
        ],
      ),
    );
    expect(bad.disjoint).toBe(false);
    expect(Array.from(bad.crowded.slice(0, 2))).toEqual([1, 1]);
  });

  test('two equal points, or a pair that collapsed onto the axis, are never accepted', () => {
    const cloud = cloudFor(
      [q(1), q(2)],
      [
        [1, 0.01],
        [1, -0.01],
      ],
    );
    cloud.partner.set([1, 0]);
    cloud.place(0, cloud.re[0]!, 0n);
    expect(smithDiscs(cloud).disjoint).toBe(false);
    expect(cloud.im[1]).toBe(0n);
  });

  test('symmetry: real roots are put on the axis, pairs made conjugate, odd ones refused', () => {
    const real = cloudFor(
      [q(1), q(2)],
      [
        [1, 1e-12],
        [2, -1e-13],
      ],
    );
    expect(symmetrise(real, smithDiscs(real).radius)).toBe(true);
    expect(real.im).toEqual([0n, 0n]);
    const odd = cloudFor(
      [q(1), q(2)],
      [
        [1, 0.2],
        [2, 0.3],
      ],
    );
    expect(symmetrise(odd, new Float64Array([-10, -10]))).toBe(false);
    expect([...odd.partner]).toEqual([-1, -1]);
  });

  test('distances across 2^1500 keep the larger modulus', () => {
    const cloud = cloudFor(
      [q(1), q(2)],
      [
        [1, 0],
        [2, 0],
      ],
    );
    cloud.exp[1] = 1500;
    const d = new Float64Array(2);
    expect(cloud.logDistance(0, 1, d)).toBeCloseTo(1500, 9);
    expect(cloud.logDistance(1, 0, d)).toBeCloseTo(1500, 9);
  });

  test('close points are told apart far below the resolution of doubles', () => {
    const cloud = cloudFor(
      [q(1), q(2)],
      [
        [1, 0],
        [1, 0],
      ],
      600,
    );
    cloud.place(1, cloud.re[1]! + (1n << 100n), 0n);
    expect(cloud.logDistance(0, 1, new Float64Array(2))).toBeCloseTo(-500, 9);
  });
});

describe('starting points', () => {
  test('radii on the Newton polygon for separated roots', () => {
    // (x − 2^-100)(x − 1)(x − 2^300), to leading order
    const points = startingPoints([200, 300, 300, 0]);
    expect(Array.from(points.exp).sort((a, b) => a - b)).toEqual([-100, 0, 300]);
  });

  test('doubles alone find well-conditioned roots to 14 digits', () => {
    const n = 30;
    const coefficients = Array.from({ length: n + 1 }, (_, k) => (k === 0 ? -1 : k === n ? 1 : 0));
    const logs = coefficients.map((c) => Math.log2(Math.abs(c)));
    const points = startingPoints(logs);
    aberthSweeps(points, polynomialRatio(logs, coefficients.map(Math.sign)));
    for (let i = 0; i < n; i++) {
      const z = [points.re[i]! * 2 ** points.exp[i]!, points.im[i]! * 2 ** points.exp[i]!] as const;
      expect(Math.hypot(...z)).toBeCloseTo(1, 13);
      const turns = (Math.atan2(z[1], z[0]) / (2 * Math.PI)) * n;
      expect(Math.abs(turns - Math.round(turns))).toBeLessThan(1e-12);
    }
  });
});
