/** Lateral sums at complex couplings, against quadrature, limits on the real axis, and each other. */
import { describe, expect, test } from 'vitest';
import { approximate, branchSum } from '../../src/borel/index.js';
import { C, exact, R, Rational } from '../../src/numerics/index.js';
import type { Complex } from '../../src/numerics/index.js';
import { branchAt } from '../../src/contour/model.js';
import type { LateralAt } from '../../src/contour/model.js';
import { rationalAt } from '../../src/contour/rational.js';
import { fittedModel, modelAnswers, padeAnswers } from '../../src/contour/answer-borel.js';
import { modelAt } from '../../src/contour/model.js';
import { contourBorel } from '../../src/contour/borel.js';
import { circleIntegrals } from '../../src/contour/integrate.js';
import { expectNear, rational } from '../support/check-value.js';
import { contourOf, originOf, standing } from '../support/contour.js';

const PREC = 160;
const branch = (t: string, exponent: string, corrections: readonly string[] = []) => ({
  t: exact(rational(t)),
  exponent: exact(rational(exponent)),
  corrections: corrections.map((c) => exact(rational(c))),
});
const upper = ({ below, half }: LateralAt): Complex =>
  C.add(below, C.mul({ re: R.ZERO, im: R.fromNumber(2) }, half, PREC), PREC);

describe('a branch point at t = 1, ω = 6 + 4i: ∫ along rays below and above, mpmath 1.3.0', () => {
  const w = C.fromNumbers(6, 4);
  const x = C.inv(w, 300);
  test.each([
    [
      '2.58',
      '0.1071151519727158090763',
      '-0.1451355628357897494985',
      '0.1248156698913482659849',
      '-0.3953037061378608628619',
    ],
    [
      '0.7',
      '0.1183505524537364449819',
      '-0.09287834542336854862618',
      '0.1126476135302544791876',
      '-0.09626583053482382647802',
    ],
    [
      '3',
      '0.0996989523804620884751',
      '-0.1567750008012147481684',
      '0.2261545586909926018443',
      '-0.5414594112984261633003',
    ],
    [
      '1',
      '0.1186899253026264303679',
      '-0.1005333208064249076998',
      '0.1069031356741829853539',
      '-0.1107134667478817811794',
    ],
  ])('exponent %s', (exponent, re, im, reUp, imUp) => {
    const found = branchAt(branch('1', exponent), x, PREC);
    const lower = C.div(found.below, w, PREC);
    const above = C.div(upper(found), w, PREC);
    expectNear(lower.re, re, 1e-20);
    expectNear(lower.im, im, 1e-20);
    expectNear(above.re, reUp, 1e-20);
    expectNear(above.im, imUp, 1e-20);
  });
});

describe('towards the real axis', () => {
  test.each([
    ['8/9', '209/81'],
    ['-4/9', '98/81'],
    ['4/3', '91/27'],
  ])('the mean of the lateral sums is the principal value, t = %s', (t, exponent) => {
    const s = branch(t, exponent, ['-1.2', '0.7']);
    const real = branchSum(s, R.fromNumber(0.11), PREC);
    const { below, half } = branchAt(s, { re: R.fromNumber(0.11), im: R.fromNumber(-1e-30) }, PREC);
    expect(R.toNumber(R.sub(R.sub(below.re, half.im, PREC), real.pv, PREC))).toBeCloseTo(0, 20);
    expect(R.toNumber(R.sub(half.re, real.im, PREC))).toBeCloseTo(0, 20);
  });
});

describe('rational transforms', () => {
  const x = C.fromNumbers(0.09, -0.06);
  const same = (a: Complex, b: Complex): void => {
    const d = C.sub(a, b, PREC);
    expect(Math.hypot(R.toNumber(d.re), R.toNumber(d.im))).toBeLessThan(1e-25);
  };

  test.each([
    [1, '1/2'],
    [3, '1/2'],
    [2, '-1/3'],
  ])('a pole of order %d at t = %s is a branch point with that exponent', (order, t) => {
    const at = rational(t);
    // c_n of (1 − t/t*)^(−m): (m)_n t*^(−n).
    let c = Rational.ONE;
    const list = Array.from({ length: order + 1 }, (_, n) => {
      if (n > 0) c = c.mul(Rational.of(order + n - 1)).div(at);
      return exact(c);
    });
    const a = approximate(list, Rational.ZERO, 0, order, 400, 0);
    const wanted = branchAt(branch(t, String(order)), x, PREC);
    const found = rationalAt(a)(x, PREC);
    same(found.below, wanted.below);
    same(found.half, wanted.half);
  });

  test('a pair near the axis counts as lying on it, a pair off it does not: rays around them', () => {
    const ray = (p: readonly [number, number], angle: number): Complex => {
      // ∫ dt/x e^{−t/x} (1 + p t)/(1 − 2 c t + t² r) along t = s e^{iθ}, by a fine midpoint rule in doubles.
      let re = 0;
      let im = 0;
      const [c, r] = p;
      const steps = 40_000;
      const X = { re: 0.09, im: -0.06 };
      const size = X.re ** 2 + X.im ** 2;
      const v = { re: X.re / size, im: -X.im / size };
      for (let i = 0; i < steps; i++) {
        const s = (6 * (i + 0.5)) / steps;
        const t = { re: s * Math.cos(angle), im: s * Math.sin(angle) };
        const e = Math.exp(-(t.re * v.re - t.im * v.im));
        const ph = -(t.re * v.im + t.im * v.re);
        const den = { re: 1 - 2 * c * t.re + r * (t.re ** 2 - t.im ** 2), im: -2 * c * t.im + 2 * r * t.re * t.im };
        const d2 = den.re ** 2 + den.im ** 2;
        // e^{…}/(x den) · e^{iθ}.
        let z = { re: e * Math.cos(ph), im: e * Math.sin(ph) };
        z = { re: (z.re * den.re + z.im * den.im) / d2, im: (z.im * den.re - z.re * den.im) / d2 };
        z = { re: z.re * v.re - z.im * v.im, im: z.re * v.im + z.im * v.re };
        re += z.re * Math.cos(angle) - z.im * Math.sin(angle);
        im += z.re * Math.sin(angle) + z.im * Math.cos(angle);
      }
      return C.fromNumbers((6 * re) / steps, (6 * im) / steps);
    };
    // Poles at |t| = 1 with arguments ±0.4 and ±0.9; x has the argument −0.588.
    for (const [angle, lower] of [
      [0.4, -0.7],
      [0.9, -0.05],
    ] as const) {
      const cos = Rational.fromNumber(Math.cos(angle));
      const series = [Rational.ONE];
      for (let n = 1; n < 4; n++)
        series.push(
          series[n - 1]!.mul(cos)
            .mul(Rational.of(2))
            .sub(n > 1 ? series[n - 2]! : Rational.ZERO),
        );
      let factorial = Rational.ONE;
      const c = series.map((b, n) => {
        if (n > 0) factorial = factorial.mul(Rational.of(n));
        return exact(b.mul(factorial));
      });
      const { below } = rationalAt(approximate(c, Rational.ZERO, 1, 2, 300, 0))(x, PREC);
      const wanted = ray([Math.cos(angle), 1], lower);
      expect(R.toNumber(R.sub(below.re, wanted.re, 60))).toBeCloseTo(0, 6);
      expect(R.toNumber(R.sub(below.im, wanted.im, 60))).toBeCloseTo(0, 6);
    }
  });
});

describe('the Borel sum of a moment', () => {
  test('of an exact toy, poles at u = −1 and −2 with one-loop running: approximant and model agree to 25 digits', async () => {
    const e = await contourOf('tessel', '0.3', { weight: ['1', '-1'], order: 12 });
    const [model] = modelAnswers(e, { digits: 25 });
    const pade = padeAnswers(e, { digits: 25 }).find((a) => a.kind === 'sum');
    if (model?.kind !== 'sum' || pade?.kind !== 'sum') throw new Error('refused');
    expect(R.overlaps(model.value, pade.value)).toBe(true);
    expect(R.accuracyBits(model.value)).toBeGreaterThan(80);
  });

  test('the fixed-order series of the model approaches it, the contour-improved one its own', async () => {
    const e = await contourOf('tau-contour-model', '0.2');
    const model = fittedModel(e.contour, 5, 300)!;
    const sums = standing(contourBorel(e.contour, e.x, modelAt(model.fit, model.singularities), 15));
    const x = R.toNumber(e.x.ball(60));
    const fixed = e.coefficients.reduce((s, c, n) => s + R.toNumber(c.ball(80)) * x ** (n + 1), 0);
    expect(Math.abs(fixed - R.toNumber(sums.pv))).toBeLessThan(2e-5);
    expect(R.toNumber(R.sub(sums.pv, sums.improved, 60))).toBeGreaterThan(2e-4);
  });

  test('the imaginary part of a singularity at u = 3 is (−1)³ W_3 times that of D, as the coupling vanishes', () => {
    const s = branch('4/3', '91/27');
    const origin = originOf(['1', '1'], ['1', '0', '-3', '2'], { loops: 2 });
    const ratio = (x: string): number => {
      const [around] = standing(
        circleIntegrals(
          origin,
          exact(rational(x)),
          (at, prec) => [C.mul(C.mul(at.weight, at.x, prec), branchAt(s, at.x, prec).half, prec)],
          15,
        ),
      );
      const own = R.mul(R.fromRational(rational(x), 100), branchSum(s, R.fromRational(rational(x), 100), 100).im, 100);
      return R.toNumber(R.div(around!, own, 100));
    };
    const [far, near] = [ratio('0.005') + 2, ratio('0.0025') + 2];
    // What the truncated running leaves of it is of second order.
    expect(Math.abs(near)).toBeLessThan(0.02);
    expect(far / near).toBeCloseTo(4, 0);
  });

  test('of one at u = 2 without x² in W it falls by two powers of the coupling, as the expected exponent says', async () => {
    const e = await contourOf('tau-contour', '0.3');
    const D = e.contour.stated.find((s) => Math.abs(R.toNumber(s.t.ball(60)) - 8 / 9) < 1e-9)!;
    const moment = e.stated.find((s) => Math.abs(R.toNumber(s.t.ball(60)) - 8 / 9) < 1e-9)!;
    const drop = R.toNumber(R.sub(D.exponent!.ball(80), moment.exponent!.ball(80), 80));
    expect(drop).toBeCloseTo(2, 12);
    const size = (x: string): number => {
      const at = { t: D.t, exponent: D.exponent!, corrections: D.corrections };
      const [around] = standing(
        circleIntegrals(
          e.contour,
          exact(rational(x)),
          (p, prec) => [C.mul(C.mul(p.weight, p.x, prec), branchAt(at, p.x, prec).half, prec)],
          6,
        ),
      );
      return R.toNumber(
        R.div(
          around!,
          R.mul(R.fromRational(rational(x), 100), branchSum(at, R.fromRational(rational(x), 100), 100).im, 100),
          100,
        ),
      );
    };
    expect(Math.log2(size('0.01') / size('0.005'))).toBeCloseTo(drop, 0);
  });
});
