/** Certified integrals at every goal: the exact value inside, the radius as small as asked, the cost as low as it should be. */
import { describe, expect, it } from 'vitest';
import { awayFromCut, C, cexp, integrateAnalytic, log, pi, R, Rational } from '../../src/numerics/index.js';
import type { Ball, Complex } from '../../src/numerics/index.js';
import { mustContain } from './ball/generate.js';

const P = 160;
const n = C.fromNumbers;
const power =
  (k: number) =>
  (z: Complex, p: number): Complex => {
    let out = C.ONE;
    for (let i = 0; i < k; i++) out = C.mul(out, z, p);
    return out;
  };
const inverse = (z: Complex, p: number): Complex => C.inv(z, p);
const bits = (b: Ball): number => R.radiusBits(b);

describe('goals', () => {
  it.each([4, 10, 20, 40, 80, 120, 150])('%i bits: the value is inside, the radius meets the goal', (goal) => {
    const cases: [(z: Complex, p: number) => Complex, Complex, Complex, Ball][] = [
      [cexp, C.ZERO, C.ONE, R.sub(cexp(C.ONE, P + 40).re, R.ONE, P + 40)],
      [inverse, n(1, 0), n(3, 0), log(R.fromNumber(3), P + 40)],
      [inverse, n(3, 0), n(1, 0), R.neg(log(R.fromNumber(3), P + 40))],
      [(z, p) => C.inv(C.add(C.ONE, C.sqr(z, p), p), p), n(-1, 0), n(1, 0), R.mul2exp(pi(P + 40), -1)],
    ];
    for (const [f, a, b, exact] of cases) {
      const { value, standing } = integrateAnalytic(f, a, b, P, { goal });
      expect(standing).toBe('certified');
      expect(R.overlaps(value.re, exact)).toBe(true);
      expect(R.containsZero(value.im)).toBe(true);
      // the exact value is known to far more bits than the radius: it lies inside, not only near
      expect(R.containsRational(value.re, R.midpoint(exact))).toBe(true);
      expect(bits(value.re)).toBeLessThan(R.upperBits(exact) - goal + 2);
      // a rule is chosen for its goal, not for much more
      if (goal < 100) expect(bits(value.re)).toBeGreaterThan(-goal * 2 - 40);
    }
  });

  it('an integrand that falls by e^40 along the segment, from either side', () => {
    for (const sign of [-1, 1])
      for (const goal of [5, 20, 60]) {
        const f = (z: Complex, p: number): Complex => cexp(C.mul(n(40 * sign, 0), z, p), p);
        const { value } = integrateAnalytic(f, n(1, 0), n(2, 0), P, { goal });
        const at = (x: number): Ball => cexp(n(40 * sign * x, 0), P + 80).re;
        const exact = R.div(R.sub(at(2), at(1), P + 60), R.fromNumber(40 * sign), P + 60);
        expect(R.containsRational(value.re, R.midpoint(exact))).toBe(true);
        expect(R.accuracyBits(value.re)).toBeGreaterThan(goal - 3);
      }
  });

  it('powers: exact where the rule is, enclosed where it is not', () => {
    for (const k of [0, 1, 3, 7, 8, 16, 40, 65]) {
      const { value } = integrateAnalytic(power(k), n(0, 0), n(1, 0), P);
      mustContain(value.re, Rational.of(1, k + 1), k);
      expect(bits(value.re)).toBeLessThan(-P + 4);
    }
  });

  it('a real segment of any length and place', () => {
    for (const [a, b] of [
      [0, 2 ** -40],
      [-1000, 1000],
      [5, 5 + 2 ** -20],
    ] as const) {
      const whole = integrateAnalytic(power(2), n(a, 0), n(b, 0), P).value.re;
      const [x, y] = [Rational.fromNumber(a), Rational.fromNumber(b)];
      mustContain(whole, y.pow(3).sub(x.pow(3)).div(Rational.of(3)), [a, b]);
      expect(R.accuracyBits(whole)).toBeGreaterThan(P - 60);
    }
  });

  it('a path in the plane: the two ways around a corner agree with the straight one', () => {
    const corner = n(1, 0);
    const end = n(1, 2);
    const f = (z: Complex, p: number): Complex => C.mul(cexp(z, p), z, p);
    const straight = integrateAnalytic(f, C.ZERO, end, P).value;
    const around = C.add(integrateAnalytic(f, C.ZERO, corner, P).value, integrateAnalytic(f, corner, end, P).value, P);
    expect(C.overlaps(straight, around)).toBe(true);
    // (z − 1) e^z from 0 to 1 + 2i
    const exact = C.add(C.mul(n(0, 2), cexp(end, P), P), C.ONE, P);
    expect(C.overlaps(straight, exact)).toBe(true);
    expect(C.accuracyBits(straight)).toBeGreaterThan(P - 6);
  });
});

describe('what is left when nothing more may be halved', () => {
  it('one piece: the range of the integrand times the length', () => {
    const { value, evaluations } = integrateAnalytic(inverse, n(1, 0), n(1024, 0), P, { mostPieces: 1 });
    expect(R.overlaps(value.re, log(R.fromNumber(1024), P))).toBe(true);
    // 1/z over [1, 1024] lies in (0, 1]
    expect(R.radiusToNumber(value.re)).toBeLessThan(1024);
    expect(R.radiusToNumber(value.re)).toBeGreaterThan(400);
    expect(evaluations).toBeLessThan(20);
  });

  it('more pieces, a smaller radius; never fewer than asked for', () => {
    const radius = (mostPieces: number): number =>
      R.radiusToNumber(integrateAnalytic(inverse, n(1, 0), n(1024, 0), P, { mostPieces }).value.re);
    const radii = [1, 2, 4, 8].map(radius);
    for (let i = 1; i < radii.length; i++) expect(radii[i]!).toBeLessThan(radii[i - 1]!);
    expect(radius(64)).toBeLessThan(2 ** -140);
  });

  it('a pole on the path gives no number, at once', () => {
    const { value, evaluations } = integrateAnalytic(inverse, n(-1, 0), n(1, 0), 60, { mostPieces: 20 });
    expect(value.re.rad).toBe(Infinity);
    expect(evaluations).toBeLessThan(8 + 20 * 12 + 2000);
  });

  it('the zero function', () => {
    const { value } = integrateAnalytic(() => C.ZERO, n(0, 0), n(5, 0), P);
    expect(R.isExactZero(value.re)).toBe(true);
    expect(R.isExactZero(value.im)).toBe(true);
  });
});

describe('rectangles and the negative axis', () => {
  it('one that may touch (−∞, 0] has no value, any other one keeps its own', () => {
    const box = (re: number, im: number, half: number): Complex => ({
      re: R.ball(BigInt(re), 0, half),
      im: R.ball(BigInt(im), 0, half),
    });
    for (const free of [box(2, 0, 1), box(-5, 2, 1), box(-5, -2, 1), box(0, 3, 1)])
      expect(awayFromCut(free)).toBe(free);
    for (const on of [box(-5, 0, 1), box(-5, 1, 2), box(0, 0, 1), box(1, 0, 2), C.ZERO]) {
      expect(awayFromCut(on)).toBe(C.INDETERMINATE);
    }
  });
});

describe('cost', () => {
  it('an entire function takes one piece and few nodes, more nodes for more bits', () => {
    const cost = (prec: number): number => integrateAnalytic(cexp, C.ZERO, C.ONE, prec).evaluations;
    // 8 for the first estimate, 5 ellipses, and the rule
    expect(cost(30)).toBeLessThanOrEqual(8 + 5 + 12);
    expect(cost(100)).toBeLessThanOrEqual(8 + 5 + 32);
    expect(cost(30)).toBeGreaterThanOrEqual(8 + 5 + 4);
    expect(cost(300)).toBeGreaterThan(cost(100));
  });

  it('a lower goal costs less', () => {
    const cost = (goal: number): number => integrateAnalytic(inverse, n(1, 0), n(64, 0), P, { goal }).evaluations;
    expect(cost(10)).toBeLessThan(cost(60));
    expect(cost(60)).toBeLessThan(cost(160));
  });
});
