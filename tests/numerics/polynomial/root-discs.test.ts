/** Smith's discs against their formula in exact numbers: never smaller, larger by a part in 500 at most; boxes meet where they should. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import * as R from '../../../src/numerics/ball/real.js';
import type { Ball } from '../../../src/numerics/ball/real.js';
import { RootCloud } from '../../../src/numerics/polynomial/roots-cloud.js';
import { smithDiscs, symmetrise } from '../../../src/numerics/polynomial/roots-discs.js';
import { mulPoly, type RationalPoly } from '../../../src/numerics/polynomial/index.js';
import { Rational } from '../../../src/numerics/rational.js';
import { cases } from '../ball/generate.js';
import { poly, q } from './random.js';

type Point = readonly [number, number];

/** Points as doubles with 20 bits, exact in the cloud. */
function cloud(coefficients: readonly Ball[], at: readonly Point[], w = 200): RootCloud {
  const exp = Int32Array.from(at, ([x, y]) => Math.round(Math.log2(Math.hypot(x, y))));
  return new RootCloud(
    coefficients,
    {
      re: Float64Array.from(at, ([x], i) => x * 2 ** -exp[i]!),
      im: Float64Array.from(at, ([, y], i) => y * 2 ** -exp[i]!),
      exp,
    },
    w,
  );
}

const exactBalls = (p: RationalPoly): Ball[] => p.map((c) => R.fromRational(c, 2000));
const withRoots = (roots: readonly Rational[], lead: Rational): RationalPoly =>
  roots.reduce<RationalPoly>((p, r) => mulPoly(p, [r.neg(), Rational.ONE]), [lead]);

/** log2 of n |p(z_i)| / (|a| Π |z_i − z_j|), from exact squares. */
function exactRadius(p: RationalPoly, at: readonly Point[], i: number): number {
  const [x, y] = at[i]!.map((v) => Rational.fromNumber(v)) as [Rational, Rational];
  let [re, im] = [Rational.ZERO, Rational.ZERO];
  for (const c of p.toReversed()) [re, im] = [re.mul(x).sub(im.mul(y)).add(c), re.mul(y).add(im.mul(x))];
  let square = re
    .mul(re)
    .add(im.mul(im))
    .div(p[p.length - 1]!.pow(2));
  at.forEach(([a, b], j) => {
    if (j === i) return;
    const [dx, dy] = [x.sub(Rational.fromNumber(a)), y.sub(Rational.fromNumber(b))];
    square = square.div(dx.mul(dx).add(dy.mul(dy)));
  });
  return Math.log2(at.length) + 0.5 * Math.log2(square.toNumber());
}

const grid = fc.integer({ min: -(2 ** 12), max: 2 ** 12 }).map((k) => k / 2 ** 10);

describe('radii', () => {
  test('equal n|p(z)|/(|a| Π|z − z_j|) to a part in 500, and are not below it', () => {
    fc.assert(
      fc.property(
        fc.uniqueArray(fc.tuple(grid, grid), {
          minLength: 2,
          maxLength: 6,
          selector: ([x, y]) => `${x},${y}`,
        }),
        fc.constantFrom(q(1), q(-3), q(1, 1024), q(5n * 2n ** 70n)),
        fc.integer({ min: -60, max: 60 }),
        (points, lead, scale) => {
          fc.pre(points.every(([x, y]) => Math.hypot(x, y) > 0.1));
          const at = points.map(([x, y]): Point => [x * 2 ** scale, y * 2 ** scale]);
          const p = withRoots(
            at.map((_z, i) => Rational.of(2 * i + 1).mul(Rational.fromNumber(2 ** scale))),
            lead,
          );
          const discs = smithDiscs(cloud(exactBalls(p), at));
          let accuracy = Infinity;
          at.forEach(([x, y], i) => {
            const wanted = exactRadius(p, at, i);
            if (wanted === -Infinity || wanted < -150 + scale) return;
            expect(discs.radius[i]! - wanted).toBeGreaterThanOrEqual(0);
            expect(discs.radius[i]! - wanted).toBeLessThan(2 ** -9);
            accuracy = Math.min(accuracy, Math.log2(Math.hypot(x, y)) - wanted);
          });
          expect(discs.accuracy).toBeLessThanOrEqual(accuracy);
          if (accuracy < 100) expect(discs.accuracy).toBeGreaterThan(accuracy - 2 ** -9);
          expect(discs.inputLimited).toBe(false);
          expect(discs.disjoint).toBe(!discs.crowded.includes(1));
        },
      ),
      cases(200),
    );
  });

  test('at a root: what rounding alone leaves, some twelve bits above the last one', () => {
    const p = withRoots([q(1), q(2), q(4)], q(1));
    for (const w of [100, 200, 500]) {
      const at: Point[] = [
        [1, 0],
        [2, 0],
        [4, 0],
      ];
      const { accuracy, loss, disjoint } = smithDiscs(cloud(exactBalls(p), at, w));
      expect(disjoint).toBe(true);
      expect(accuracy).toBeLessThan(w + 1);
      expect(accuracy).toBeGreaterThan(w - 14);
      // the loss is that of the worst disc, from the bound of rounding alone
      expect(loss).toBeGreaterThanOrEqual(w - accuracy - 1);
      expect(loss).toBeLessThan(14);
    }
  });

  test('a leading coefficient known to half of itself doubles them; one that may vanish leaves nothing', () => {
    const p = withRoots([q(1), q(2)], q(1));
    const at: Point[] = [
      [1.125, 0],
      [2.25, 0],
    ];
    const sharp = smithDiscs(cloud(exactBalls(p), at));
    const around = (rad: number): Ball[] => [
      ...exactBalls(p).slice(0, 2),
      { mid: 1n << 80n, exp: -80, rad: rad * 2 ** 80 },
    ];
    const half = smithDiscs(cloud(around(0.5), at));
    // |a| >= 1/2, and |p| may be larger by |z|²/2
    [0, 1].forEach((i) => {
      const value = Math.abs((at[i]![0] - 1) * (at[i]![0] - 2)) + 0.5 * at[i]![0] ** 2;
      const wanted = Math.log2((2 * value) / (0.5 * 1.125));
      expect(half.radius[i]! - wanted).toBeGreaterThan(-1e-3);
      expect(half.radius[i]! - wanted).toBeLessThan(0.2);
    });
    expect(half.inputLimited).toBe(true);
    expect(sharp.inputLimited).toBe(false);
    const lost = smithDiscs(cloud(around(1), at));
    expect([lost.radius[0], lost.disjoint]).toEqual([Infinity, false]);
    // a long coefficient, and one with a radius of few units
    const long = { mid: (1n << 400n) + 1n, exp: -400, rad: 3 };
    const fine = smithDiscs(cloud([...exactBalls(p).slice(0, 2), long], at));
    expect(fine.radius[0]! - sharp.radius[0]!).toBeCloseTo(0, 6);
  });
});

describe('boxes', () => {
  /** Two points at distance 1 from each other for (x − a)(x − b): radii |p(z)|·2. */
  test('are crowded when √2 times the radii together reach the distance, not when they fall short of it', () => {
    for (let k = 1; k < 200; k++) {
      const shift = k / 512;
      const p = withRoots([q(8).add(Rational.fromNumber(shift)), q(9).add(Rational.fromNumber(shift))], q(1));
      const at: Point[] = [
        [8, 0],
        [9, 0],
      ];
      const { radius, crowded } = smithDiscs(cloud(exactBalls(p), at));
      const together = 2 ** radius[0]! + 2 ** radius[1]!;
      if (together * Math.SQRT2 > 1) expect(Array.from(crowded)).toEqual([1, 1]);
      if (together * Math.SQRT2 < 1 - 2 ** -5) expect(Array.from(crowded)).toEqual([0, 0]);
    }
  });

  test.each([0, 40, -40])('only those that meet, at the scale 2^%i', (k) => {
    const unit = Rational.fromNumber(2 ** k);
    const p = withRoots([q(1).mul(unit), q(9, 8).mul(unit), q(64).mul(unit)], q(1));
    const at = [1.0625, 1.09375, 64].map((x): Point => [x * 2 ** k, 0]);
    const { crowded, disjoint } = smithDiscs(cloud(exactBalls(p), at));
    expect([Array.from(crowded), disjoint]).toEqual([[1, 1, 0], false]);
    const good = smithDiscs(
      cloud(
        exactBalls(p),
        [1.0001, 1.1249, 64].map((x): Point => [x * 2 ** k, 0]),
      ),
    );
    expect([Array.from(good.crowded), good.disjoint]).toEqual([[0, 0, 0], true]);
  });
});

describe('symmetry', () => {
  const pairUp = (at: readonly Point[], log: number): [boolean, RootCloud] => {
    const c = cloud(
      exactBalls(
        withRoots(
          at.map((_z, i) => q(i + 1)),
          q(1),
        ),
      ),
      at,
    );
    return [symmetrise(c, new Float64Array(at.length).fill(log)), c];
  };

  test('pairs nearest mirror images, whatever their order and scale', () => {
    const [done, c] = pairUp(
      [
        [3, 1],
        [0.01, -0.02],
        [3, -1.001],
        [5, 2 ** -30],
        [0.01, 0.0201],
        [3.5, 1],
        [3.5, -1],
      ],
      -20,
    );
    expect(done).toBe(true);
    expect(Array.from(c.partner)).toEqual([2, 4, 0, 3, 1, 6, 5]);
    expect(c.im[3]).toBe(0n);
    for (const [i, j] of [
      [0, 2],
      [1, 4],
      [5, 6],
    ] as const) {
      expect([c.re[j], c.im[j], c.exp[j]]).toEqual([c.re[i], -c.im[i]!, c.exp[i]]);
    }
  });

  test('mirror images find each other across a change of unit', () => {
    // moduli 1.410 and 1.421: units 1 and 2
    const [done, c] = pairUp(
      [
        [1.3, 0.546],
        [0.7, -0.27],
        [1.31, -0.55],
        [0.7, 0.271],
      ],
      -20,
    );
    expect(c.exp[0]).toBe(0);
    expect(done).toBe(true);
    expect(Array.from(c.partner)).toEqual([2, 3, 0, 1]);
  });

  test('a disc that reaches the axis makes a real root, one that stops short of it does not', () => {
    const at: Point[] = [
      [1, 0.125],
      [1, -0.125],
    ];
    expect(Array.from(pairUp(at, -3)[1].partner)).toEqual([0, 1]);
    expect(Array.from(pairUp(at, -3.001)[1].partner)).toEqual([1, 0]);
  });

  test('refuses what does not pair, and changes nothing', () => {
    for (const at of [
      [
        [1, 0.5],
        [2, 0.5],
        [3, -0.5],
      ],
      [
        [1, -0.5],
        [2, -0.5],
        [3, 0.5],
      ],
      [[1, 0.5]],
      [[1, -0.5]],
    ] as Point[][]) {
      const [done, c] = pairUp(at, -20);
      expect(done).toBe(false);
      expect(Array.from(c.partner)).toEqual(at.map(() => -1));
    }
  });

  test('partners share their radius', () => {
    const p = mulPoly(poly(5, -2, 1), poly(-3, 1));
    const c = cloud(exactBalls(p), [
      [1, 1.9375],
      [1, -1.9375],
      [3.0625, 0],
    ]);
    c.partner.set([1, 0, 2]);
    const { radius } = smithDiscs(c);
    expect(radius[0]).toBe(radius[1]);
    const alone = smithDiscs(
      cloud(exactBalls(p), [
        [1, 1.9375],
        [1, -1.9375],
        [3.0625, 0],
      ]),
    );
    expect(Array.from(radius)).toEqual(Array.from(alone.radius));
  });
});
