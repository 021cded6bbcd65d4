/**
 * @module Squarefree decomposition: exact multiplicities before any root is computed.
 *
 * Purpose    a root finder needs simple roots; a multiple pole of an exact approximant must be known as one.
 * Method     Yun's algorithm; a single prime that shows gcd(a, a') = 1 settles the usual case at once.
 * Bound      exact.
 * Reference  D. Y. Y. Yun, "On square-free decomposition algorithms", SYMSAC 1976, p. 26.
 */
import { derivativeInt, divideExactInt, primitiveInt, subInt, type IntPoly } from './integer.js';
import { gcdInt, provablySquarefree } from './gcd.js';
import { fromIntegers, toIntegers, type RationalPoly } from './rational-poly.js';

export interface SquarefreeFactor<P> {
  readonly factor: P;
  readonly multiplicity: number;
}

/** a = constant·Π factor^multiplicity; factors primitive, squarefree, pairwise coprime, of degree >= 1. */
export function squarefreeInt(a: IntPoly): SquarefreeFactor<IntPoly>[] {
  const f = primitiveInt(a);
  if (f.length < 2) return [];
  if (provablySquarefree(f)) return [{ factor: f, multiplicity: 1 }];
  const out: SquarefreeFactor<IntPoly>[] = [];
  const df = derivativeInt(f);
  const g = gcdInt(f, df);
  let b = exactQuotient(f, g);
  let d = subInt(exactQuotient(df, g), derivativeInt(b));
  for (let i = 1; b.length > 1; i++) {
    const h = d.length === 0 ? primitiveInt(b) : gcdInt(b, d);
    if (h.length > 1) out.push({ factor: h, multiplicity: i });
    const c = exactQuotient(b, h);
    d = subInt(d.length === 0 ? [] : exactQuotient(d, h), derivativeInt(c));
    b = c;
  }
  return out;
}

/** The same for rational coefficients; factors have coprime integer coefficients and a positive leading one. */
export function squarefree(a: RationalPoly): SquarefreeFactor<RationalPoly>[] {
  return squarefreeInt(toIntegers(a).integers).map(({ factor, multiplicity }) => ({
    factor: fromIntegers(factor),
    multiplicity,
  }));
}

/** Division that the algorithm guarantees to be exact (divisors are primitive: Gauss's lemma). */
function exactQuotient(a: IntPoly, b: IntPoly): IntPoly {
  const q = divideExactInt(a, b);
  if (q === undefined) throw new Error('squarefreeInt: an exact division left a remainder');
  return q;
}
