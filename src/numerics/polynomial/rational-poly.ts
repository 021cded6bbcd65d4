/**
 * @module Polynomials with rational coefficients.
 *
 * Purpose    the exact face of the polynomial room: arithmetic, derivative, evaluation, division, gcd.
 * Method     ascending arrays of Rational; products, divisions and gcds go through a common denominator and integers.
 * Bound      exact.
 * Reference  J. von zur Gathen, J. Gerhard, "Modern Computer Algebra", chapters 2 and 6.
 */
import { Rational, gcdBigInt } from '../rational.js';
import { addInt, contentInt, mulInt, trimInt, type IntPoly } from './integer.js';
import { gcdInt } from './gcd.js';

/** Ascending coefficients; trailing zeros are allowed on input and never produced. */
export type RationalPoly = readonly Rational[];

/** Drops trailing zeros. */
export function trimPoly(a: RationalPoly): RationalPoly {
  let n = a.length;
  while (n > 0 && a[n - 1]!.isZero()) n--;
  return n === a.length ? a : a.slice(0, n);
}

/** Degree; -1 for the zero polynomial. */
export const degreePoly = (a: RationalPoly): number => trimPoly(a).length - 1;

/** a = (content/1)·integers with integers primitive (content of 1) and sign kept; integers [] and content 0 for zero. */
export function toIntegers(a: RationalPoly): { integers: IntPoly; content: Rational } {
  let den = 1n;
  for (const c of a) if (den % c.den !== 0n) den *= c.den / gcdBigInt(den, c.den);
  const scaled = trimInt(a.map((c) => c.num * (den / c.den)));
  if (scaled.length === 0) return { integers: [], content: Rational.ZERO };
  const g = contentInt(scaled);
  return { integers: g === 1n ? scaled : scaled.map((c) => c / g), content: Rational.of(g, den) };
}

/** content·integers as rationals. */
export const fromIntegers = (integers: IntPoly, content: Rational = Rational.ONE): RationalPoly =>
  integers.map((c) => Rational.of(c * content.num, content.den));

export function addPoly(a: RationalPoly, b: RationalPoly): RationalPoly {
  const n = Math.max(a.length, b.length);
  return trimPoly(Array.from({ length: n }, (_, i) => (a[i] ?? Rational.ZERO).add(b[i] ?? Rational.ZERO)));
}

export const subPoly = (a: RationalPoly, b: RationalPoly): RationalPoly => addPoly(a, scalePoly(b, Rational.of(-1)));

export const scalePoly = (a: RationalPoly, k: Rational): RationalPoly => (k.isZero() ? [] : a.map((c) => c.mul(k)));

export function mulPoly(a: RationalPoly, b: RationalPoly): RationalPoly {
  const x = toIntegers(a);
  const y = toIntegers(b);
  return fromIntegers(mulInt(x.integers, y.integers), x.content.mul(y.content));
}

export const derivativePoly = (a: RationalPoly): RationalPoly =>
  trimPoly(a.slice(1).map((c, i) => c.mul(Rational.of(i + 1))));

/** a(x) by Horner's rule. */
export function evaluatePoly(a: RationalPoly, x: Rational): Rational {
  const { integers, content } = toIntegers(a);
  let value = 0n;
  let power = 1n;
  for (let i = integers.length - 1; i >= 0; i--) {
    value = value * x.num + integers[i]! * power;
    if (i > 0) power *= x.den;
  }
  return Rational.of(value, power).mul(content);
}

/** Quotient and remainder, deg remainder < deg b. Throws RangeError when b is zero. */
export function divmodPoly(a: RationalPoly, b: RationalPoly): { quotient: RationalPoly; remainder: RationalPoly } {
  const x = toIntegers(a);
  const y = toIntegers(b);
  if (y.integers.length === 0) throw new RangeError('divmodPoly: division by the zero polynomial');
  const drop = x.integers.length - y.integers.length;
  if (drop < 0) return { quotient: [], remainder: trimPoly(a) };
  // lead^(drop+1)·x = quotient·y + rest over the integers (pseudo-division).
  const lead = y.integers[y.integers.length - 1]!;
  let rest: bigint[] = x.integers.slice();
  const quotient = new Array<bigint>(drop + 1).fill(0n);
  for (let k = drop; k >= 0; k--) {
    const c = rest[k + y.integers.length - 1]!;
    for (let i = k + 1; i <= drop; i++) quotient[i]! *= lead;
    quotient[k] = c;
    rest = rest.slice(0, k + y.integers.length - 1).map((r) => r * lead);
    for (let j = 0; j < y.integers.length - 1; j++) rest[k + j]! -= c * y.integers[j]!;
  }
  const scale = x.content.div(Rational.of(lead).pow(drop + 1));
  return {
    quotient: trimPoly(fromIntegers(quotient, scale.div(y.content))),
    remainder: trimPoly(fromIntegers(trimInt(rest), scale)),
  };
}

/** a/b when b divides a, else undefined. Throws RangeError when b is zero. */
export function divideExactPoly(a: RationalPoly, b: RationalPoly): RationalPoly | undefined {
  const { quotient, remainder } = divmodPoly(a, b);
  return remainder.length === 0 ? quotient : undefined;
}

/** Monic greatest common divisor; [] when both are zero. */
export function gcdPoly(a: RationalPoly, b: RationalPoly): RationalPoly {
  const g = gcdInt(toIntegers(a).integers, toIntegers(b).integers);
  return g.length === 0 ? [] : fromIntegers(g, Rational.of(1n, g[g.length - 1]!));
}

/** Are the two equal as polynomials? */
export const equalPoly = (a: RationalPoly, b: RationalPoly): boolean =>
  addInt([], toIntegers(subPoly(a, b)).integers).length === 0;
