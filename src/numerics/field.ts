/**
 * @module The small number-field interface: what an algorithm needs that must run on exact numbers, balls and doubles alike.
 *
 * Purpose    linear solves, Padé approximants, partial sums and sequence transformations are written once against it.
 * Method     three instances: rationals, doubles, balls of a stated precision. Keep call sites monomorphic where
 *            speed matters (one instance per hot loop or worker thread).
 * Bound      each instance inherits that of its numbers: exact; rounded to nearest; enclosed.
 */
import * as R from './ball/real.js';
import type { Ball } from './ball/real.js';
import { Rational } from './rational.js';

export interface Field<T> {
  readonly zero: T;
  readonly one: T;
  fromRational(q: Rational): T;
  add(a: T, b: T): T;
  sub(a: T, b: T): T;
  mul(a: T, b: T): T;
  /** Quotient. A divisor that is or may be zero never throws: it gives NaN/∞ in doubles, INDETERMINATE in balls. Rationals throw RangeError. */
  div(a: T, b: T): T;
  neg(a: T): T;
  /** True only when the number certainly is zero. */
  isZero(a: T): boolean;
  /** True only when the number certainly is not zero: what a pivot must be. */
  isNonZero(a: T): boolean;
  /** Size for choosing pivots and for display; not an enclosure. */
  toNumber(a: T): number;
}

/** Exact rational arithmetic. */
export const rationalField: Field<Rational> = {
  zero: Rational.ZERO,
  one: Rational.ONE,
  fromRational: (q) => q,
  add: (a, b) => a.add(b),
  sub: (a, b) => a.sub(b),
  mul: (a, b) => a.mul(b),
  div: (a, b) => a.div(b),
  neg: (a) => a.neg(),
  isZero: (a) => a.isZero(),
  isNonZero: (a) => !a.isZero(),
  toNumber: (a) => a.toNumber(),
};

/** IEEE doubles, rounded to nearest. */
export const doubleField: Field<number> = {
  zero: 0,
  one: 1,
  fromRational: (q) => q.toNumber(),
  add: (a, b) => a + b,
  sub: (a, b) => a - b,
  mul: (a, b) => a * b,
  div: (a, b) => a / b,
  neg: (a) => -a,
  isZero: (a) => a === 0,
  isNonZero: (a) => a !== 0 && !Number.isNaN(a),
  toNumber: (a) => a,
};

/** Real balls rounded to `prec` bits after every operation. */
export function ballField(prec: number): Field<Ball> {
  return {
    zero: R.ZERO,
    one: R.ONE,
    fromRational: (q) => R.fromRational(q, prec),
    add: (a, b) => R.add(a, b, prec),
    sub: (a, b) => R.sub(a, b, prec),
    mul: (a, b) => R.mul(a, b, prec),
    div: (a, b) => R.div(a, b, prec),
    neg: R.neg,
    isZero: R.isExactZero,
    isNonZero: (a) => !R.containsZero(a),
    toNumber: R.toNumber,
  };
}
