/** The circle: nodes, couplings, integrals, against exact answers, certified enclosures and mpmath. */
import { describe, expect, test } from 'vitest';
import { C, exact, exactReal, mulExact, pi, R, Rational } from '../../src/numerics/index.js';
import { complexAlpha, isRefusal } from '../../src/qcd/index.js';
import { arcNodes, arcNodesDouble } from '../../src/contour/gauss-legendre.js';
import { couplingsOnCircle } from '../../src/contour/circle.js';
import { couplingsOnArc } from '../../src/contour/circle-double.js';
import { contourIntegrals } from '../../src/contour/improved.js';
import { contourSum } from '../../src/contour/index.js';
import { flowOf } from '../../src/qcd/index.js';
import { expectNear, rational } from '../support/check-value.js';
import { contourOf, frame, originOf, standing } from '../support/contour.js';

const PI = exactReal((prec) => pi(prec));
const overPi = (alpha: string) =>
  mulExact(
    exact(rational(alpha)),
    exactReal((prec) => R.div(R.ONE, pi(prec), prec)),
  );

describe('Gauss–Legendre on [0, π]', () => {
  test('weights add up to one, and polynomials are integrated exactly', () => {
    const nodes = arcNodes(12, 160);
    for (const power of [0, 1, 7, 23]) {
      const sum = nodes.reduce(
        (s, { angle, weight }) => R.add(s, R.mul(weight, R.powInt(R.div(angle, pi(200), 200), power, 200), 200), 200),
        R.ZERO,
      );
      expectNear(sum, Rational.of(1, power + 1).toString(), 1e-44);
    }
  });

  test('the doubles are those of the enclosures', () => {
    arcNodesDouble(31).forEach(({ angle, weight }, i) => {
      const exactly = arcNodes(31, 200)[i]!;
      expect(angle).toBeCloseTo(R.toNumber(exactly.angle), 15);
      expect(weight).toBeCloseTo(R.toNumber(exactly.weight), 16);
    });
  });
});

describe('the coupling on the circle', () => {
  test.each([1, 2, 3, 4, 5] as const)('overlaps the certified path at φ = 2.5 and π, %d loops', (loops) => {
    const origin = originOf(['1'], ['1'], { loops });
    const angles = [exact(Rational.of(5, 2)), PI];
    const found = standing(
      couplingsOnCircle(
        origin,
        overPi('0.34'),
        angles.map((a) => a.ball(200)),
        150,
      ),
    );
    angles.forEach((im, i) => {
      const proved = complexAlpha(
        { alpha: exact(rational('0.34')), log: { re: exact(0), im }, flavours: 3, loops },
        120,
      );
      if (isRefusal(proved)) throw new Error(proved.reason);
      const x = C.mulReal(proved, R.div(R.ONE, pi(150), 150), 150);
      expect(R.overlaps(x.re, found[i]!.re) && R.overlaps(x.im, found[i]!.im)).toBe(true);
      expect(C.accuracyBits(found[i]!)).toBeGreaterThan(120);
    });
  });

  test('two loops, α = 0.3, at φ = π: mpmath 1.3.0, Taylor steps, 28 digits', () => {
    const [x] = standing(couplingsOnCircle(originOf(['1'], ['1'], { loops: 2 }), overPi('0.3'), [pi(160)], 120));
    expectNear(x!.re, '0.0593085712481849946748321481', 1e-27);
    expectNear(x!.im, '-0.0442636595869298340381465949', 1e-27);
  });

  test('the inner loop of replicas gives the same, and gives up where a step would be too long', () => {
    const angles = arcNodesDouble(20).map(({ angle }) => angle);
    const [re, im] = [new Float64Array(20), new Float64Array(20)];
    expect(couplingsOnArc(flowOf(3, 5), 0.35, angles, re, im)).toBe(true);
    const slow = standing(
      couplingsOnCircle(
        originOf(['1'], ['1'], { divisor: '1' }),
        exact(rational('0.35')),
        angles.map((a) => R.fromNumber(a)),
        80,
      ),
    );
    slow.forEach((x, i) => {
      expect(Math.abs(re[i]! - R.toNumber(x.re))).toBeLessThan(2e-15);
      expect(Math.abs(im[i]! - R.toNumber(x.im))).toBeLessThan(2e-15);
    });
    expect(couplingsOnArc(flowOf(3, 5), 3, [3], new Float64Array(1), new Float64Array(1))).toBe(false);
  });
});

describe('the integrals A_n', () => {
  test('one loop, W = 1: arctan(π b_0 x)/(π b_0) exactly', () => {
    const origin = { ...originOf(['1', '1'], ['1'], { loops: 1 }), integral: [Rational.ONE] };
    const [A1, A2] = standing(contourIntegrals(origin, exact(Rational.of(1, 10)), 30));
    // mpmath 1.3.0: atan(9π/40)/(9π/4); for A_2: x²/(1 + (9π/40)²).
    expectNear(A1!, '0.08704913354729963197810573646457', 1e-30);
    expectNear(A2!, '0.006668228264346218105653608549640', 1e-30);
  });

  test('two loops, w = (1−x)², α = 0.3: mpmath 1.3.0, quadrature over Taylor steps, 25 digits', () => {
    const A = standing(contourIntegrals(originOf(['1', '1', '1'], ['1', '-2', '1'], { loops: 2 }), overPi('0.3'), 28));
    expectNear(A[0]!, '0.09531405882166903177387037', 1e-26);
    expectNear(A[1]!, '0.01198575954012835988754249', 1e-26);
    expectNear(A[2]!, '0.001377876242000168753741563', 1e-27);
  });

  test('digits do not depend on how many were asked for', async () => {
    const e = await contourOf('tau-contour', '0.34', { weight: ['1', '0', '0', '-1', '3'] });
    const few = standing(contourIntegrals(e.contour, e.x, 12));
    const many = standing(contourIntegrals(e.contour, e.x, 30));
    few.forEach((A, n) => {
      expect(R.overlaps(A, many[n]!)).toBe(true);
      expect(R.accuracyBits(many[n]!)).toBeGreaterThan(95);
    });
  });

  test('are refused where the coupling cannot be run', () => {
    expect(contourIntegrals(originOf(['1'], ['1']), exact(rational('-0.1')), 15)).toHaveProperty('reason');
    expect(contourSum(frame(originOf(['1'], ['1'])), 'contour-improved', 12)).toHaveProperty('remedy');
  });
});
