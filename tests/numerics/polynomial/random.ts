/** @module Random exact polynomials and series for the property tests, biased to zeros, small and huge coefficients. */
import fc from 'fast-check';
import * as R from '../../../src/numerics/ball/real.js';
import { Rational } from '../../../src/numerics/rational.js';
import type { RationalPoly } from '../../../src/numerics/polynomial/rational-poly.js';

export const MULTIPLIER = Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? 1);

/** a/b, or the number written in the text. */
export function q(a: number | bigint | string, b: number | bigint = 1): Rational {
  if (typeof a !== 'string') return Rational.of(a, b);
  const parsed = Rational.parse(a);
  if (parsed === undefined) throw new Error(`${a} is no rational number`);
  return parsed;
}

export const poly = (...c: (number | bigint | string)[]): Rational[] => c.map((x) => q(x));

const small = fc.tuple(fc.integer({ min: -9, max: 9 }), fc.integer({ min: 1, max: 9 })).map(([a, b]) => q(a, b));
const large = fc
  .tuple(fc.bigInt({ min: -(10n ** 40n), max: 10n ** 40n }), fc.bigInt({ min: 1n, max: 10n ** 20n }))
  .map(([a, b]) => q(a, b));

/** Zero every third time: holes and blocks in Padé tables. */
export const rationals = fc.oneof(fc.constant(Rational.ZERO), small, large);

export const polynomials = (max: number): fc.Arbitrary<Rational[]> => fc.array(rationals, { maxLength: max + 1 });

/** First n coefficients of p/d as a power series, d_0 not zero. */
export function seriesOf(p: RationalPoly, d: RationalPoly, n: number): Rational[] {
  const out: Rational[] = [];
  for (let k = 0; k < n; k++) {
    let v = p[k] ?? Rational.ZERO;
    for (let j = 1; j <= k && j < d.length; j++) v = v.sub(d[j]!.mul(out[k - j]!));
    out.push(v.div(d[0]!));
  }
  return out;
}

/** n!-free coefficients of the Borel transform of two branch points: (1.3696)_n/n! 2^n + 0.3 (1.2)_n/n! (−1)^n. */
export function borelSeries(n: number): Rational[] {
  const out: Rational[] = [];
  let f = Rational.ONE;
  let g = Rational.ONE;
  for (let k = 0; k < n; k++) {
    out.push(f.mul(q(2n ** BigInt(k))).add(g.mul(q(k % 2 === 0 ? 3 : -3, 10))));
    f = f.mul(q(13696, 10000).add(q(k))).div(q(k + 1));
    g = g.mul(q(12, 10).add(q(k))).div(q(k + 1));
  }
  return out;
}

export const contains = (ball: R.Ball, value: Rational): boolean => R.containsRational(ball, value);
