/**
 * @module Polynomials over the rationals in named symbols: the exact form of the constants of perturbative QCD.
 * Purpose  149753/6 + 3564 ζ(3) − 6508/27 ζ(3) n_f stays exactly that, so that identities between published forms
 *          (colour factors, powers of n_f, absence of ζ(4)) are decided without rounding.
 * Method   a map from monomials to rational coefficients; zero coefficients are never stored.
 * Bound    exact.
 */
import { Rational } from '../../numerics/index.js';

/** Powers of symbols, sorted by name: "nf^2*z3"; the empty string is the constant monomial. */
type Monomial = string;

export interface Formal {
  readonly terms: ReadonlyMap<Monomial, Rational>;
}

export const FORMAL_ZERO: Formal = { terms: new Map() };
export const FORMAL_ONE: Formal = { terms: new Map([['', Rational.ONE]]) };

export function formalRational(q: Rational): Formal {
  return q.isZero() ? FORMAL_ZERO : { terms: new Map([['', q]]) };
}

export function formalSymbol(name: string): Formal {
  return { terms: new Map([[name, Rational.ONE]]) };
}

function powersOf(m: Monomial): Map<string, number> {
  const powers = new Map<string, number>();
  if (m === '') return powers;
  for (const factor of m.split('*')) {
    const [name = '', power = '1'] = factor.split('^');
    powers.set(name, Number(power));
  }
  return powers;
}

function monomialOf(powers: ReadonlyMap<string, number>): Monomial {
  return [...powers]
    .filter(([, k]) => k !== 0)
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([name, k]) => (k === 1 ? name : `${name}^${k}`))
    .join('*');
}

function multiplyMonomials(a: Monomial, b: Monomial): Monomial {
  if (a === '') return b;
  if (b === '') return a;
  const powers = powersOf(a);
  for (const [name, k] of powersOf(b)) powers.set(name, (powers.get(name) ?? 0) + k);
  return monomialOf(powers);
}

function accumulate(into: Map<Monomial, Rational>, m: Monomial, q: Rational): void {
  const sum = (into.get(m) ?? Rational.ZERO).add(q);
  if (sum.isZero()) into.delete(m);
  else into.set(m, sum);
}

export function addFormal(a: Formal, b: Formal): Formal {
  const terms = new Map(a.terms);
  for (const [m, q] of b.terms) accumulate(terms, m, q);
  return { terms };
}

export function scaleFormal(a: Formal, q: Rational): Formal {
  if (q.isZero()) return FORMAL_ZERO;
  return { terms: new Map([...a.terms].map(([m, c]) => [m, c.mul(q)])) };
}

export const negFormal = (a: Formal): Formal => scaleFormal(a, Rational.of(-1));
export const subFormal = (a: Formal, b: Formal): Formal => addFormal(a, negFormal(b));

export function mulFormal(a: Formal, b: Formal): Formal {
  const terms = new Map<Monomial, Rational>();
  for (const [m, p] of a.terms) for (const [n, q] of b.terms) accumulate(terms, multiplyMonomials(m, n), p.mul(q));
  return { terms };
}

/** Non-negative integer power. */
export function powFormal(a: Formal, n: number): Formal {
  let result = FORMAL_ONE;
  for (let k = 0; k < n; k++) result = mulFormal(result, a);
  return result;
}

export const isZeroFormal = (a: Formal): boolean => a.terms.size === 0;
export const equalsFormal = (a: Formal, b: Formal): boolean => isZeroFormal(subFormal(a, b));

/** The value when no symbol is left, undefined otherwise. */
export function rationalOfFormal(a: Formal): Rational | undefined {
  if (a.terms.size === 0) return Rational.ZERO;
  return a.terms.size === 1 ? a.terms.get('') : undefined;
}

/** Replaces symbols; those not named in `values` stay. */
export function substituteFormal(a: Formal, values: Readonly<Record<string, Formal>>): Formal {
  let sum = FORMAL_ZERO;
  for (const [m, q] of a.terms) {
    let product = formalRational(q);
    for (const [name, k] of powersOf(m)) {
      const factor = powFormal(values[name] ?? formalSymbol(name), k);
      product = mulFormal(product, factor);
    }
    sum = addFormal(sum, product);
  }
  return sum;
}

/** Coefficients of the powers of one symbol, ascending: the rest of each monomial stays in the coefficient. */
export function powersOfSymbol(a: Formal, symbol: string): Formal[] {
  const rows: Map<Monomial, Rational>[] = [];
  for (const [m, q] of a.terms) {
    const powers = powersOf(m);
    const k = powers.get(symbol) ?? 0;
    powers.delete(symbol);
    while (rows.length <= k) rows.push(new Map());
    const row = rows[k];
    if (row !== undefined) accumulate(row, monomialOf(powers), q);
  }
  return rows.map((terms) => ({ terms }));
}

/** Every monomial as (symbol → power) with its coefficient, for evaluation. */
export function monomialsOf(
  a: Formal,
): readonly { readonly powers: ReadonlyMap<string, number>; readonly factor: Rational }[] {
  return [...a.terms].map(([m, factor]) => ({ powers: powersOf(m), factor }));
}

/** The polynomials as a ring; division only by rational numbers (RangeError otherwise: a mistake in the program). */
export const formalRing = {
  zero: FORMAL_ZERO,
  one: FORMAL_ONE,
  fromRational: formalRational,
  add: addFormal,
  sub: subFormal,
  mul: mulFormal,
  div(a: Formal, b: Formal): Formal {
    const q = rationalOfFormal(b);
    if (q === undefined) throw new RangeError('formalRing.div: the divisor holds symbols');
    return scaleFormal(a, q.inv());
  },
};
