/** Implied next coefficients: exact on a series of the method's own class, and consistent with the method's own value. */
import { describe, expect, it } from 'vitest';
import { exact, R, Rational, rationalField } from '../../src/numerics/index.js';
import type { Exact } from '../../src/numerics/index.js';
import { composeSeries, multiplySeries, reciprocalSeries } from '../../src/borel/index.js';
import { nextCoefficient } from '../../src/prescriptions/index.js';
import { pms } from '../../src/prescriptions/pms.js';
import type { Expansion, StatedSingularity } from '../../src/series/index.js';
import { expansion, growthOf, outcomes } from '../support/expansions.js';
import { rational } from '../support/check-value.js';

const q = (s: string): Rational => rational(s);
const one = (...list: string[]): Rational[] => list.map(q);
const times = (a: readonly Rational[], b: readonly Rational[], n: number): Rational[] =>
  multiplySeries(rationalField, a, b, n);

/** (1 − t/t0)^{−p}, n coefficients. */
function power(t0: string, p: string, n: number): Rational[] {
  const list = [Rational.ONE];
  for (let k = 1; k < n; k++) list.push(list[k - 1]!.mul(q(p).add(Rational.of(k - 1))).div(q(t0).mul(Rational.of(k))));
  return list;
}
/** c_n = n! b_n. */
function fromBorel(b: readonly Rational[]): Exact[] {
  let f = Rational.ONE;
  return b.map((x, n) => {
    if (n > 0) f = f.mul(Rational.of(n));
    return exact(x.mul(f));
  });
}
const at = (t: string, exponent?: string): StatedSingularity => ({
  t: exact(q(t)),
  ...(exponent === undefined ? {} : { exponent: exact(q(exponent)) }),
  corrections: [],
  kind: 'other',
  origin: 'file',
});
/** Predicts the last of the coefficients from the others. */
function check(name: string, variant: string, c: readonly Exact[], more: Partial<Expansion> = {}, digits = 25): void {
  const e = expansion(c.slice(0, -1), exact(q('1/10')), more);
  const found = nextCoefficient(name, variant, e, growthOf(e));
  if (found === undefined) return expect.fail(`${name} implies nothing`);
  const actual = c[c.length - 1]!.ball(400);
  expect(Math.abs(R.toNumber(R.div(R.sub(found, actual, 400), actual, 400))), name).toBeLessThan(10 ** -digits);
}

describe('implied next coefficients are exact on the own class of', () => {
  it('logarithmic derivatives: a product of two powers', () => {
    const b = times(power('1', '1.3', 6), power('-2', '0.7', 6), 6);
    check('borel-dlog', '[1/2]', fromBorel(b));
  });
  it('known factors: a power times a rational function', () => {
    const rest = times(one('1', '1', '0', '0'), power('-3', '1', 4), 4);
    check('borel-partial-pade', '[1/1]', fromBorel(times(power('1', '1.3', 4), rest, 4)), { stated: [at('1', '1.3')] });
  });
  it('quadratic relations: a square root', () => {
    // √(1 − t): P = −(1 − t), Q = 0, R = 1.
    check('borel-quadratic', '[1,1,1]', fromBorel(power('1', '-1/2', 6)));
  });
  it('conformal maps: a polynomial in the mapped variable, softened or not', () => {
    // One cut from 1: t = 4w/(1 + w)², w = (1 − √(1−t))/(1 + √(1−t)).
    const n = 6;
    const root = power('1', '-1/2', n);
    const minus = root.map((x, k) => (k === 0 ? Rational.ONE.sub(x) : x.neg()));
    const plus = root.map((x, k) => (k === 0 ? Rational.ONE.add(x) : x));
    const w = times(minus, reciprocalSeries(rationalField, plus, n), n);
    const d = composeSeries(rationalField, one('1', '-2/3', '1/7', '5', '2'), w, n);
    check('borel-conformal', 'one cut, not softened', fromBorel(d), { stated: [at('1')] });
    const soft = times(d, power('1', '1.7', n), n);
    check('borel-conformal', 'one cut, softened in t', fromBorel(soft), { stated: [at('1', '1.7')] });
  });
  it('hypergeometric functions, also after a first term that stands apart', () => {
    const b = [Rational.ONE];
    for (let k = 0; k < 6; k++)
      b.push(
        b[k]!.mul(q('0.3').add(Rational.of(k)))
          .mul(q('1.9').add(Rational.of(k)))
          .div(q('0.8').add(Rational.of(k)))
          .div(Rational.of(k + 1)),
      );
    const c = fromBorel(b);
    check('borel-hypergeometric', '6 coefficients', c);
    // c′_0 free, then x times the same.
    check('borel-hypergeometric', '7 coefficients', [exact(-5), ...c]);
  });
  it('effective charges: the one-loop coupling at another scale, and its square', () => {
    const c = Array.from({ length: 5 }, (_, n) => exact(q('2/3').pow(n)));
    const running = { beta: one('1', '0', '0', '0', '0', '0').map(exact), scaleRatio: exact(1) };
    check('fac', 'effective charge, 4 terms', c, { power: 1, running });
    const square = c.map((x, n) => exact(x.rational!.mul(Rational.of(n + 1))));
    check('fac', 'effective charge, 4 terms', square, { power: 2, running });
  });
  it('terminants: pure factorial growth', () => {
    const c = [Rational.ONE];
    for (let n = 0; n < 5; n++) c.push(c[n]!.mul(q('1.3').add(Rational.of(n))).div(q('-1/2')));
    check('terminant', '3 terms', c.map(exact), { stated: [at('-1/2', '1.3')] });
  });
});

describe('minimal sensitivity', () => {
  // The optimum re-expanded at small coupling: what lies beyond the known terms, over the power that comes next.
  for (const [N, variant, small, tolerance] of [
    [2, 'optimum, next-to-leading order', 200_000, 1e-6],
    [3, 'optimum, next-to-next-to-leading order', 400, 2e-3],
  ] as const) {
    it(`implies the coefficient of its own expansion, ${N} terms`, () => {
      const c = one('1', '1.6', '6.4').slice(0, N).map(exact);
      const running = { beta: one('9/4', '4', '10', '47', '200').map(exact), scaleRatio: exact(1) };
      const beyond = (x: string): number => {
        const e = expansion(c, exact(q(x)), { power: 1, running });
        const value = outcomes(pms, e, 40).find((o) => o.variant === variant);
        if (value?.kind !== 'sum') return expect.fail('no optimum');
        const sum = c.reduceRight((acc, k) => acc.mul(q(x)).add(k.rational!), Rational.ZERO).mul(q(x));
        const rest = R.sub(value.value, R.fromRational(sum, 300), 300);
        return R.toNumber(R.div(rest, R.powInt(R.fromRational(q(x), 300), N + 1, 300), 300));
      };
      const e = expansion(c, exact(q('1/1000')), { power: 1, running });
      const implied = R.toNumber(nextCoefficient('pms', variant, e, growthOf(e))!);
      // Linear extrapolation in x removes the first correction.
      const limit = 2 * beyond(`1/${small}`) - beyond(`2/${small}`);
      expect(Math.abs(limit / implied - 1)).toBeLessThan(tolerance);
    });
  }
});

it('nothing is implied by a member that does not use all coefficients, or by a plain sum', () => {
  const e = expansion(fromBorel(power('1', '1.3', 6)), exact(q('1/10')));
  for (const [name, variant] of [
    ['borel-dlog', '[1/1]'],
    ['borel-quadratic', '[1,1,0]'],
    ['borel-conformal', 'one cut, softened in w'],
    ['borel-hypergeometric', '5 coefficients'],
    ['fixed-order', 'through order 5'],
    ['fac', 'effective charge, 6 terms'],
  ] as const)
    expect(nextCoefficient(name, variant, e, growthOf(e)), name).toBeUndefined();
});
