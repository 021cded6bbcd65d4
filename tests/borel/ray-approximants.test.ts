/**
 * Logarithmic-derivative, partial and quadratic approximants.
 * Check values: mpmath 1.2.1 and exact fractions, 34 reliable digits. Methods: Baker & Graves-Morris (1996),
 * D. Boito, P. Masjuan, F. Oliani, arXiv:1807.01567 (memory).
 */
import { describe, expect, it } from 'vitest';
import { addExact, C, exact, R, Rational } from '../../src/numerics/index.js';
import type { Complex, Exact } from '../../src/numerics/index.js';
import { dlogApproximant, dlogValue, logarithmicDerivative } from '../../src/borel/dlog.js';
import { quadraticApproximant, quadraticPoles, quadraticValue } from '../../src/borel/hermite-pade.js';
import { quadraticDegrees } from '../../src/borel/hermite-pade-vector.js';
import { factorValue, withoutFactors } from '../../src/borel/partial.js';
import { expectNear, rational } from '../support/check-value.js';

const q = (s: string): Exact => exact(rational(s));
const PREC = 240;
const at = (re: string, im = '0'): Complex => ({ re: q(re).ball(PREC), im: q(im).ball(PREC) });

/** b_n of A (1 − u/u0)^(−p): A (p)_n u0^(−n)/n!. */
function branch(A: string, u0: string, p: string, count: number): Exact[] {
  const list: Rational[] = [rational(A)];
  for (let n = 1; n < count; n++)
    list.push(list[n - 1]!.mul(rational(p).add(Rational.of(n - 1))).div(rational(u0).mul(Rational.of(n))));
  return list.map((c) => exact(c));
}
const sum = (...lists: readonly Exact[][]): Exact[] =>
  lists[0]!.map((_, n) => lists.reduce<Exact>((acc, l) => addExact(acc, l[n]!), exact(0)));

describe('logarithmic derivative', () => {
  it('is exact for one power', () => {
    const a = dlogApproximant(branch('1', '1/2', '1.3951', 3), 0, 1, PREC);
    if (typeof a === 'string') expect.fail(a);
    expectNear(a.poles[0]!.z.re, '0.5', 1e-60);
    expectNear(a.poles[0]!.principal[0]!.re, '-1.3951', 1e-60);
  });

  const mixed = sum(
    branch('1', '1/2', '1.3951', 8),
    branch('0.3', '1/2', '0.3951', 8),
    branch('0.5', '1.5', '1.8', 8),
    branch('0.1', '-1', '1.2', 8),
  );
  const known: [number, number, string, string][] = [
    [1, 1, '0.518461951331209624963741912028981104', '1.26435176555657761628265833681366749'],
    [1, 2, '0.460192327597748496900358103895473308', '0.932637249005484071622916216158535433'],
    [2, 2, '0.461750199510719092490728788468882441', '0.942514696876228571856390259696685459'],
    [2, 3, '0.459952426597077589618496175798667221', '0.931673819147093225870415762559486600'],
    [3, 3, '0.530482361186587654134049817591290749', '3.34963068978667932515251424953605649'],
  ];
  for (const [L, M, position, exponent] of known) {
    it(`[${L}/${M}] of a mixed transform has its known pole next to 1/2`, () => {
      const a = dlogApproximant(mixed, L, M, PREC);
      if (typeof a === 'string') expect.fail(a);
      const pole = [...a.poles].sort(
        (x, y) => Math.abs(R.toNumber(x.z.re) - 0.5) - Math.abs(R.toNumber(y.z.re) - 0.5),
      )[0]!;
      expectNear(pole.z.re, position, 1e-34);
      expectNear(R.neg(pole.principal[0]!.re), exponent, 1e-33);
    });
  }

  it('reproduces the coefficients it was made from', () => {
    const a = dlogApproximant(mixed.slice(0, 6), 2, 2, PREC);
    if (typeof a === 'string') expect.fail(a);
    // B(h) − Σ b_n h^n is O(h^6).
    const h = at('1e-8');
    const direct = mixed
      .slice(0, 6)
      .reduceRight<Complex>((acc, c) => C.add(C.mul(acc, h, PREC), C.fromReal(c.ball(PREC)), PREC), C.ZERO);
    const miss = C.sub(dlogValue(a, h, PREC), direct, PREC);
    expect(C.upperBits(miss)).toBeLessThan(-6 * 26.5 + 12);
  });

  it('integrates a double pole of the derivative', () => {
    // B = exp(t/(1−t)): B′/B = 1/(1−t)², the Taylor coefficients are 1, 1, 3/2, 13/6, 73/24.
    const b = ['1', '1', '3/2', '13/6', '73/24'].map(q);
    expect(logarithmicDerivative(b).map((c) => c.rational!.toString())).toEqual(['1', '2', '3', '4']);
    const a = dlogApproximant(b, 0, 2, PREC);
    if (typeof a === 'string') expect.fail(a);
    // exp(1/2 / (1/2)) = e.
    expectNear(dlogValue(a, at('1/2'), PREC).re, '2.71828182845904523536028747135266249776', 1e-37);
  });
});

describe('factoring out known singularities', () => {
  it('leaves a polynomial of a transform that is one, times its factors', () => {
    const b = branch('1', '2', '1.3', 6);
    const stripped = withoutFactors(b, [{ t: exact(2), exponent: q('1.3') }]);
    expect(stripped.map((c) => c.rational!.toString())).toEqual(['1', '0', '0', '0', '0', '0']);
    const value = factorValue([{ t: exact(2), exponent: q('1.3') }], at('1', '1'), PREC);
    // (1 − (1+i)/2)^(−1.3) = (√2 e^{iπ/4}... )^{1.3}: modulus 2^{0.65}, argument 1.3 π/4.
    const { re, im } = C.toNumbers(value);
    expect(Math.hypot(re, im)).toBeCloseTo(2 ** 0.65, 13);
    expect(Math.atan2(im, re)).toBeCloseTo((1.3 * Math.PI) / 4, 13);
  });
});

describe('quadratic approximants', () => {
  const factorials = (count: number): Exact[] => {
    const list = [Rational.ONE];
    for (let n = 1; n < count; n++) list.push(list[n - 1]!.mul(Rational.of(n)));
    return list.map((c) => exact(c));
  };
  const known: [number, string, string][] = [
    [1, '1.3125', '0.165359456941536911906350984602453777'],
    [2, '1.34259259259259259259259259259259259', '0.110724636510198129825276303298107561'],
    [3, '1.35132575757575757575757575757575758', '0.105070971412264900894844968108827167'],
    [4, '1.35427689594356261022927689594356261', '0.105781950425710525070275107788856280'],
  ];
  for (const [k, re, im] of known) {
    it(`[${k},${k},${k}] of Σ n! x^n at x = 0.2`, () => {
      const a = quadraticApproximant(factorials(3 * k + 2), [k, k, k], PREC);
      if (typeof a === 'string') expect.fail(a);
      const value = quadraticValue(a, at('0.2'), PREC);
      expectNear(value.re, re, 1e-33);
      expectNear(R.abs(value.im), im, 1e-33);
    });
  }
  it('agrees in balls with exact fractions', () => {
    const hidden = factorials(11).map((c): Exact => ({ ball: (prec) => c.ball(prec) }));
    const a = quadraticApproximant(hidden, [3, 3, 3], PREC);
    const b = quadraticApproximant(factorials(11), [3, 3, 3], PREC);
    if (typeof a === 'string' || typeof b === 'string') expect.fail('no approximant');
    const t = at('0.3', '0.4');
    expect(C.overlaps(quadraticValue(a, t, PREC), quadraticValue(b, t, PREC))).toBe(true);
    expect(C.accuracyBits(quadraticValue(a, t, PREC))).toBeGreaterThan(100);
  });
  it('is exact on its own class, and on rational functions', () => {
    // √(1 − t)/(1 + t/2) + 1: quadratic over the rationals.
    const root = branch('1', '1', '-1/2', 14).map((c) => c.rational!);
    const pole = Array.from({ length: 14 }, (_, n) => Rational.of(-1, 2).pow(n));
    const b = root.map((_, n) =>
      exact(
        root.slice(0, n + 1).reduce((s, x, k) => s.add(x.mul(pole[n - k]!)), n === 0 ? Rational.ONE : Rational.ZERO),
      ),
    );
    const [degrees] = quadraticDegrees(11);
    const a = quadraticApproximant(b, degrees!, PREC);
    if (typeof a === 'string') expect.fail(a);
    const value = quadraticValue(a, at('3/4'), PREC);
    expectNear(
      value.re,
      rational('1')
        .add(rational('1/2').div(rational('11/8')))
        .toString(),
      1e-50,
    );
    expect(quadraticPoles(a, 80).map((p) => R.toNumber(p.value.re))).toEqual([-2]);
    const simple = quadraticApproximant(pole.map(exact), [1, 1, 1], PREC);
    if (typeof simple === 'string') expect.fail(simple);
    expectNear(quadraticValue(simple, at('5'), PREC).re, rational('2/7').toString(), 1e-50);
  });
  it('uses every coefficient', () => {
    for (let count = 5; count < 12; count++) {
      for (const [p, qq, r] of quadraticDegrees(count)) expect(p + qq + r + 2).toBe(count);
    }
  });
});
