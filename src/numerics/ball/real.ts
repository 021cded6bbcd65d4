/**
 * @module Real balls: midpoint–radius intervals on BigInt mantissas.
 *
 * Purpose    every operation returns a ball that contains the exact result for every choice of points in its arguments.
 * Method     a ball is (mid ± rad)·2^exp; mid is a BigInt, rad a non-negative double in units of 2^exp.
 *            Results are rounded to `prec` bits (a positive integer, or Infinity where the function allows it); the
 *            rounding error (half a unit) is added to the radius.
 * Bound      every radius is a sum of at most eight rounded-to-nearest double operations on upper bounds, each off by
 *            a relative 2^-53 at most; the factor UP = 1 + 2^-48 covers them all. Products that could leave the range
 *            of doubles carry a binary exponent beside them until the result's unit is known.
 * Reference  F. Johansson, "Arb: efficient arbitrary-precision midpoint-radius interval arithmetic",
 *            IEEE Trans. Comput. 66 (2017) 1281 (the idea of a low-precision radius beside a long midpoint).
 */
export { INDETERMINATE, ONE, ZERO } from './core.js';
export type { Ball } from './core.js';
export { addError, addRelativeError, ball, fromNumber, fromRational, widen } from './construct.js';
export { abs, add, div, mul, mul2exp, neg, powInt, round, sqr, sqrt, sub } from './arithmetic.js';
export { containsZero, isExactZero, isNegative, isPositive } from './predicates.js';
export {
  accuracyBits,
  compare,
  containsRational,
  exactMid,
  midpoint,
  overlaps,
  radiusBits,
  radiusToNumber,
  toNumber,
  upperBits,
} from './inspect.js';
