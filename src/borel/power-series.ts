/**
 * @module Truncated power series over any number field: what re-expansions of a Borel transform need.
 * Bound: that of the field. All lists are ascending coefficients, truncated at the length asked for.
 */
import { Rational } from '../numerics/index.js';
import type { Field } from '../numerics/index.js';

/** a·b mod x^length. */
export function multiplySeries<T>(field: Field<T>, a: readonly T[], b: readonly T[], length: number): T[] {
  return Array.from({ length }, (_, n) => {
    let sum = field.zero;
    for (let k = Math.max(0, n - b.length + 1); k <= Math.min(n, a.length - 1); k++)
      sum = field.add(sum, field.mul(a[k]!, b[n - k]!));
    return sum;
  });
}

/** 1/a mod x^length; a(0) must not be zero. */
export function reciprocalSeries<T>(field: Field<T>, a: readonly T[], length: number): T[] {
  const head = field.div(field.one, a[0]!);
  const result: T[] = [];
  for (let n = 0; n < length; n++) {
    let sum = n === 0 ? field.one : field.zero;
    for (let k = 1; k <= Math.min(n, a.length - 1); k++) sum = field.sub(sum, field.mul(a[k]!, result[n - k]!));
    result.push(field.mul(sum, head));
  }
  return result;
}

/** outer(inner(x)) mod x^length by Horner's rule; inner(0) = 0. */
export function composeSeries<T>(field: Field<T>, outer: readonly T[], inner: readonly T[], length: number): T[] {
  // The acc of step k is needed only mod x^(length − k): inner starts at x.
  const tail = inner.slice(1);
  let acc: T[] = [];
  for (let k = Math.min(outer.length, length) - 1; k >= 0; k--) {
    acc = [outer[k]!, ...multiplySeries(field, acc, tail, length - k - 1)];
  }
  return acc;
}

/** (1 + c x)^p mod x^length. */
export function binomialSeries<T>(field: Field<T>, p: T, c: T, length: number): T[] {
  const result: T[] = [];
  let term = field.one;
  for (let n = 0; n < length; n++) {
    result.push(term);
    const ratio = field.div(field.sub(p, field.fromRational(Rational.of(n))), field.fromRational(Rational.of(n + 1)));
    term = field.mul(field.mul(term, ratio), c);
  }
  return result;
}
