/** @module A polynomial in π, ζ(3), log(2), … as an expression of a series file. */
import { Rational } from '../../numerics/index.js';
import { monomialsOf } from '../../qcd/index.js';
import type { Formal } from '../../qcd/index.js';
import { decimalText } from '../../series/index.js';

/** Denominators up to here stay fractions: 9/4 says more than 2.25 (habit). */
const SMALL_DENOMINATOR = 1000n;
/** q as p/q or, where that is shorter to read, as a terminating decimal. Reads back to q. */
export function rationalText(q: Rational): string {
  if (q.den <= SMALL_DENOMINATOR) return q.toString();
  return decimalText(q) ?? q.toString();
}

interface Term {
  readonly factor: Rational;
  /** Symbols with their powers, and what orders the terms. */
  readonly above: string;
  readonly below: string;
  readonly degree: number;
}

const product = (powers: readonly (readonly [string, number])[]): string =>
  powers.map(([name, k]) => (k === 1 ? name : `${name}^${k}`)).join('*');

function termsOf(a: Formal): Term[] {
  return monomialsOf(a)
    .map(({ powers, factor }) => {
      const list = [...powers];
      const above = list.filter(([, k]) => k > 0);
      const below = list.filter(([, k]) => k < 0).map(([name, k]) => [name, -k] as const);
      const degree = list.reduce((sum, [, k]) => sum + Math.abs(k), 0);
      return { factor, above: product(above), below: below.map((p) => `/${product([p])}`).join(''), degree };
    })
    .toSorted((s, t) => s.degree - t.degree || (s.above + s.below < t.above + t.below ? -1 : 1));
}

/** The sum of its terms, lowest first; reads back to the same number. */
export function formalText(a: Formal): string {
  const terms = termsOf(a);
  if (terms.length === 0) return '0';
  return terms
    .map(({ factor, above, below }, i) => {
      const sign = factor.sign() < 0 ? (i === 0 ? '-' : ' - ') : i === 0 ? '' : ' + ';
      const size = factor.abs();
      const number = rationalText(size);
      const front = above === '' ? number : size.equals(Rational.ONE) ? above : `${number}*${above}`;
      return sign + front + below;
    })
    .join('');
}
