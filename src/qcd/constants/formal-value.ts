/**
 * @module Turns exact polynomials in ζ(n), π, ln 2, … into numbers of any precision.
 * Method  each symbol is an Exact (an enclosure procedure); the polynomial is evaluated in balls with guard bits.
 * Bound   the balls carry it.
 */
import { R, exact, exactReal, toNumberExact, type Ball, type Exact } from '../../numerics/index.js';
import { monomialsOf, rationalOfFormal, type Formal } from './formal.js';
import { SYMBOLS } from './symbols.js';

/** Guard bits: the constants cancel to a few digits at most. */
const GUARD = 32;

function symbolBall(name: string, prec: number): Ball {
  const symbol = SYMBOLS[name];
  if (symbol === undefined) throw new ReferenceError(`the symbol ${name} has no value`);
  return symbol.ball(prec);
}

function evaluate(a: Formal, prec: number): Ball {
  const work = prec + GUARD;
  let sum: Ball = R.ZERO;
  for (const { powers, factor } of monomialsOf(a)) {
    let term = R.fromRational(factor, work);
    for (const [name, k] of powers) term = R.mul(term, R.powInt(symbolBall(name, work), k, work), work);
    sum = R.add(sum, term, work);
  }
  return sum;
}

/** The number as an Exact: a rational when no symbol is left. Throws ReferenceError for a symbol without value (nf, l). */
export function exactOfFormal(a: Formal): Exact {
  const q = rationalOfFormal(a);
  return q !== undefined ? exact(q) : exactReal((prec) => evaluate(a, prec));
}

/** Nearest double. */
export const numberOfFormal = (a: Formal): number => toNumberExact(exactOfFormal(a));
