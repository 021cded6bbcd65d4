/** Moments on a circle: against numerical integrals, exact closed forms and identities in rationals. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { exact, Rational, toNumberExact } from '../../src/numerics/index.js';
import {
  betaCoefficients,
  circleMoments,
  exactInPiSquared,
  expandOnCircle,
  inPiSquaredText,
  scaleLogTable,
  weightIntegral,
} from '../../src/qcd/index.js';
import { parseSeries } from '../../src/series/index.js';

const q = (n: number, d = 1): Rational => Rational.of(n, d);
const KINEMATIC = [q(1), q(0), q(-3), q(2)];
const weights = fc
  .array(fc.integer({ min: -9, max: 9 }), { minLength: 1, maxLength: 6 })
  .map((w) => w.map((n) => q(n)));

/** (1/2π) ∫_{−π}^{π} dφ W(−e^{iφ}) e^{−ikφ} (iφ)^l by the midpoint rule on the halves, doubles. */
function numeric(W: readonly number[], l: number, k: number): number {
  const steps = 20_000;
  let sum = 0;
  for (let i = 0; i < steps; i++) {
    const phi = (Math.PI * (i + 0.5)) / steps;
    let re = 0;
    let im = 0;
    W.forEach((w, m) => {
      const c = m % 2 === 0 ? w : -w;
      re += c * Math.cos((m - k) * phi);
      im += c * Math.sin((m - k) * phi);
    });
    // Real part of (re + i·im)(iφ)^l.
    sum += phi ** l * [re, -im, -re, im][l % 4]!;
  }
  return sum / steps;
}

describe('W(x) = 2 ∫_x^1 w', () => {
  test('the kinematic weight gives (1−x)³(1+x)', () => {
    expect(weightIntegral(KINEMATIC).map(String)).toEqual(['1', '-2', '0', '2', '-1']);
  });

  test('vanishes at x = 1, and is twice the integral at 0', () => {
    fc.assert(
      fc.property(weights, (w) => {
        const W = weightIntegral(w);
        expect(W.reduce((s, c) => s.add(c), Rational.ZERO).isZero()).toBe(true);
        const integral = w.reduce((s, c, i) => s.add(c.div(q(i + 1))), Rational.ZERO);
        expect(W[0]!.equals(integral.mul(q(2)))).toBe(true);
      }),
    );
  });
});

describe('J_l', () => {
  test('the kinematic weight: −19/12, 265/72 − π²/3 (M. Beneke, M. Jamin, arXiv:0806.3156, memory, re-derived)', () => {
    const J = circleMoments(weightIntegral(KINEMATIC), 3);
    expect(J.map(inPiSquaredText)).toEqual(['1', '-19/12', '265/72 - 1/3*pi^2']);
  });

  test.each([0, 2, -1, 3])('against the midpoint rule, shift %d', (k) => {
    const W = weightIntegral([q(2), q(-3, 2), q(1), q(0), q(5)]);
    circleMoments(W, 7, k).forEach((moment, l) => {
      const wanted = numeric(
        W.map((c) => c.toNumber()),
        l,
        k,
      );
      expect(Math.abs(toNumberExact(exactInPiSquared(moment)) - wanted)).toBeLessThan(1e-5 * (1 + Math.PI ** l));
    });
  });

  test('the text is an expression of the series file with the same value', async () => {
    const moment = circleMoments(weightIntegral(KINEMATIC), 6)[5]!;
    const file = await parseSeries(`coefficients: ["${inPiSquaredText(moment)}"]`, { name: 'J' });
    expect(toNumberExact(file.coefficients[0]!.value)).toBeCloseTo(toNumberExact(exactInPiSquared(moment)), 12);
  });
});

describe('the fixed-order expansion', () => {
  const beta = betaCoefficients(3, 'pi');
  const c = [q(1), q(164, 100), q(637, 100), q(4907, 100), q(283), q(3275)].map((x) => exact(x));

  test.each([1, 2, 0])('is the log table with J_l put for the logarithms, first power %d', (power) => {
    const W = weightIntegral(KINEMATIC);
    const J = circleMoments(W, c.length).map(exactInPiSquared);
    const table = scaleLogTable({ coefficients: c, firstPower: power }, beta);
    const wanted = table.map((row) => row.reduce((sum, t, k) => sum + toNumberExact(t) * toNumberExact(J[k]!), 0));
    // The table's logarithm is ln(Q²/μ²) of a series at Q: the logarithm of the circle has the same sign.
    expandOnCircle(c, exact(power), beta, J).forEach((found, n) => {
      expect(toNumberExact(found)).toBeCloseTo(wanted[n]!, 6);
    });
  });

  test('is linear in the weight, exactly', () => {
    fc.assert(
      fc.property(weights, weights, (v, w) => {
        const sum = Array.from({ length: Math.max(v.length, w.length) }, (_, i) =>
          (v[i] ?? Rational.ZERO).add(w[i] ?? Rational.ZERO),
        );
        const [Jv, Jw, J] = [v, w, sum].map((weight) => circleMoments(weightIntegral(weight), 5));
        J!.forEach((moment, l) => moment.forEach((x, k) => expect(x.equals(Jv![l]![k]!.add(Jw![l]![k]!))).toBe(true)));
      }),
      { numRuns: 30 },
    );
  });
});
