/** The tools behind bubble chains: alternating sums, Gauss–Legendre rules, sums over towers of poles. */
import { describe, expect, test } from 'vitest';
import { alternatingLength, alternatingWeights, weightedSum } from '../../src/bubbles/alternating.js';
import { ADLER } from '../../src/bubbles/adler.js';
import { REAL } from '../../src/bubbles/b-to-u-real.js';
import { VIRTUAL } from '../../src/bubbles/b-to-u-virtual.js';
import { gaussLegendre } from '../../src/bubbles/gauss-legendre.js';
import { expandFraction, mulLaurent, principal, slopeAt, valueAt } from '../../src/bubbles/laurent.js';
import { SUBTRACTION_BOUND } from '../../src/bubbles/mass-subtraction.js';
import { MASS } from '../../src/bubbles/pole-mass.js';
import { InversePowers, taylorAt } from '../../src/bubbles/pole-values.js';
import { adlerSeries, massSeries } from '../../src/bubbles/taylor.js';
import { FORMAL_CONSTANTS, ballConstants, exponential } from '../../src/bubbles/gamma-series.js';
import { formText } from '../../src/bubbles/exact-text.js';
import { sumOver } from '../../src/bubbles/tower-sum.js';
import { C, R, Rational, ballField, exp, gammaComplex, ln2, rgammaComplex } from '../../src/numerics/index.js';
import type { Ball } from '../../src/numerics/index.js';
import { formalRational, mulSeries, rationalOfFormal } from '../../src/qcd/index.js';
import { q } from './support.js';

const PREC = 200;

describe('alternating sums', () => {
  test('Σ (−1)^k/(k+1) = ln 2, within the proved error', () => {
    for (const bits of [20, 60, 180]) {
      const weights = alternatingWeights(alternatingLength(bits));
      const terms = weights.c.map((_, k) => R.fromRational(Rational.of(1, k + 1), PREC + 40));
      const sum = R.addError(weightedSum(terms, weights, PREC + 40), 1, -weights.bits);
      expect(R.overlaps(sum, ln2(PREC + 40))).toBe(true);
      expect(R.radiusBits(sum)).toBeLessThanOrEqual(-bits);
    }
  });

  test('polynomials of low degree in k are summed as Abel would', () => {
    const weights = alternatingWeights(40);
    // Σ (−1)^k 1 = 1/2 and Σ (−1)^k k = −1/4: P(1) and its derivative are not small, so that only the constant is met.
    const ones = weights.c.map((): Ball => R.ONE);
    expect(R.toNumber(weightedSum(ones, weights, PREC))).toBeCloseTo(0.5, 14);
  });
});

describe('Gauss–Legendre rules', () => {
  test.each([1, 2, 5, 16, 33])('%i points are exact to degree 2n − 1', (n) => {
    const rule = gaussLegendre(n, PREC);
    for (const degree of [0, 1, 2 * n - 2, 2 * n - 1]) {
      const sum = rule.reduce<Ball>(
        (s, { x, weight }) => R.add(s, R.mul(weight, R.powInt(x, degree, PREC), PREC), PREC),
        R.ZERO,
      );
      const exact = degree % 2 === 1 ? Rational.ZERO : Rational.of(2, degree + 1);
      expect(R.containsRational(sum, exact)).toBe(true);
      expect(R.radiusToNumber(sum)).toBeLessThan(1e-50);
    }
  });

  test('∫ e^x converges as the ellipse says', () => {
    const sum = gaussLegendre(20, PREC).reduce<Ball>(
      (s, { x, weight }) => R.add(s, R.mul(weight, exp(x, PREC), PREC), PREC),
      R.ZERO,
    );
    const exact = R.sub(exp(R.ONE, PREC), exp(R.fromNumber(-1), PREC), PREC);
    expect(Math.abs(R.toNumber(R.sub(sum, exact, PREC)))).toBeLessThan(1e-48);
  });
});

describe('Laurent series of fractions', () => {
  const f = { factor: q('3'), numerator: [1, 0, -2], roots: [q('1'), q('1'), q('-1/2')] };
  test('value and slope off the poles', () => {
    expect(valueAt(f, q('2')).toString()).toBe('12/5');
    // (u² − 2)/((u−1)²(u+1/2)): derivative at 2 is 4/(5/2) − 2·2/(5/2) − 2/(25/4).
    expect(slopeAt(f, q('2')).toString()).toBe(q('3').mul(q('-8/25')).toString());
  });
  test('principal part at a double pole', () => {
    const parts = principal(expandFraction(f, q('1'), 6)).map((p) => rationalOfFormal(p)?.toString());
    // 3(u² − 2)/(u + 1/2) = −2 + (16/3)ε + … at u = 1 + ε.
    expect(parts).toEqual(['16/3', '-2']);
  });
  test('leading zeros cost no orders', () => {
    const cubic = expandFraction({ factor: q('1'), numerator: [1, 0, 0, 0], roots: [] }, q('0'), 6);
    const product = mulLaurent(cubic, { low: 0, c: [formalRational(q('7'))] });
    expect(product.low).toBe(3);
    expect(rationalOfFormal(product.c[0]!)?.toString()).toBe('7');
  });
});

/** Taylor coefficients from the poles, with κ^(−u) multiplied back. */
function fromTowers(component: typeof ADLER, length: number): Ball[] {
  const powers = new InversePowers(PREC);
  return Array.from({ length }, (_, n) => sumOver(component, taylorAt(n, powers, PREC), PREC));
}

describe('towers of poles', () => {
  test('the Taylor coefficients of the Adler function', () => {
    const series = adlerSeries(ballConstants(ballField(PREC), PREC), R.ZERO, 12);
    fromTowers(ADLER, 12).forEach((c, n) => {
      expect(R.overlaps(c, series[n]!)).toBe(true);
      expect(R.radiusBits(c)).toBeLessThan(-PREC + 30);
    });
  });

  test('the Taylor coefficients of the pole mass, with 4^(−u) and the subtraction', () => {
    const ring = ballConstants(ballField(PREC), PREC);
    const whole = massSeries(ring, R.ZERO, 8);
    const g = massSeries(ring, R.ONE, 8);
    // e^u times the first term differs from it by the first term alone: G_0 drops out of the difference.
    const bare = [R.fromRational(Rational.of(3, 4), PREC), ...fromTowers(MASS, 9)];
    const decay = exponential(ring, R.neg(R.mul2exp(ln2(PREC), 1)), 10);
    const first = mulSeries(ring, bare, decay, 10);
    const dressed = mulSeries(ring, first, exponential(ring, R.ONE, 10), 10);
    for (let n = 0; n < 8; n++) {
      const difference = R.sub(g[n]!, whole[n]!, PREC);
      expect(R.overlaps(difference, R.sub(dressed[n + 1]!, first[n + 1]!, PREC))).toBe(true);
    }
  });

  test('residues of the b → u width that no rational arithmetic shows: Q and V share their poles at u = 1', () => {
    // b has no pole at u = 1: the double pole of V cancels against the triple one of Q behind the sine.
    const at1 = (list: readonly { at: Rational; parts: readonly Rational[] }[]): readonly Rational[] =>
      list.find(({ at }) => at.equals(Rational.ONE))!.parts;
    const v = at1(VIRTUAL.poles);
    const r = at1(REAL[0]!.poles);
    // V/4 and −(−(u−1) Q)/4.
    expect(v[1]!.add(r[2]!).isZero()).toBe(true);
    expect(v[0]!.add(r[1]!).isZero()).toBe(true);
  });

  test('the masses that prove the errors are not exceeded by the first part of each tower', () => {
    for (const component of [ADLER, MASS, VIRTUAL]) {
      for (const tower of component.towers) {
        if (tower.decay.kind !== 'alternating') continue;
        const base = component.base.toNumber();
        for (const k of [0, 1, 5, 30]) {
          const p = (tower.side === 'infrared' ? 1 : -1) * (tower.first.toNumber() + k);
          const parts = tower.parts(k).map((x) => x.toNumber() * base ** p);
          const scaled = parts.map((x, i) => x + (parts[i + 1] ?? 0) * Math.log(base));
          scaled.forEach((x, i) => expect(Math.abs(x)).toBeLessThanOrEqual(tower.decay.kind === 'alternating' ? tower.decay.mass[i]! : 0)); // prettier-ignore
        }
      }
    }
  });
});

test('the subtraction of the pole mass stays below its bound on |u| = 2', () => {
  let largest = 0;
  for (let k = 0; k < 180; k++) {
    const angle = (Math.PI * (k + 0.37)) / 180;
    const u = C.fromNumbers(2 * Math.cos(angle), 2 * Math.sin(angle));
    const shift = (n: number, by: number): ReturnType<typeof C.add> =>
      C.add(C.mulReal(u, R.fromNumber(by), 60), C.fromNumbers(n, 0), 60);
    let g = C.mul(shift(3, 2), gammaComplex(shift(4, 2), 60), 60);
    g = C.mul(g, rgammaComplex(shift(1, -1), 60), 60);
    const two = rgammaComplex(shift(2, 1), 60);
    g = C.mul(C.mul(C.mul(g, two, 60), two, 60), rgammaComplex(shift(3, 1), 60), 60);
    largest = Math.max(largest, R.toNumber(C.abs(g, 60)) / 3);
  }
  expect(largest).toBeLessThan(SUBTRACTION_BOUND);
  expect(largest).toBeGreaterThan(0.9 * SUBTRACTION_BOUND);
});

test('closed forms read like series files', () => {
  const [, , second] = adlerSeries(FORMAL_CONSTANTS, formalRational(Rational.of(5, 3)), 3);
  expect(formText(second!)).toBe('151/9 - 38/3*zeta(3)');
});
