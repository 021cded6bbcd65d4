/**
 * @module A parameter of a hypergeometric function: a number that can be had to more bits when cancellation asks for them.
 *
 * Purpose    parameters known exactly stay exact through sums and differences, so that integers are recognised, not guessed.
 */
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import type { Ball } from '../ball/real.js';
import * as R from '../ball/real.js';
import type { Exact } from '../exact.js';
import { Rational } from '../rational.js';

/** A complex number with rational parts, exactly. */
export interface ComplexRational {
  readonly re: Rational;
  readonly im: Rational;
}

/** What callers may give: exact values, enclosure procedures, or enclosures. */
export type Given = Rational | ComplexRational | Exact | Ball | Complex | number;

export interface Parameter {
  /** Present when the value is known to be this rational. */
  readonly rational?: Rational;
  /** Present when the value is known exactly, rational included. */
  readonly exact?: ComplexRational;
  at(bits: number): Complex;
}

export function parameter(x: Given): Parameter {
  if (typeof x === 'number') return fromRational(Rational.fromNumber(x));
  if (x instanceof Rational) return fromRational(x);
  if ('re' in x) return fromComplex(x);
  if ('mid' in x) return fromBall(x);
  if (x.rational !== undefined) return fromRational(x.rational);
  return { at: (bits) => C.fromReal(x.ball(bits)) };
}

function fromRational(q: Rational): Parameter {
  return { rational: q, exact: { re: q, im: Rational.ZERO }, at: (bits) => C.fromReal(R.fromRational(q, bits)) };
}

function fromExact(x: ComplexRational): Parameter {
  if (x.im.isZero()) return fromRational(x.re);
  return { exact: x, at: (bits) => ({ re: R.fromRational(x.re, bits), im: R.fromRational(x.im, bits) }) };
}

function fromComplex(x: Complex | ComplexRational): Parameter {
  if (isComplexRational(x)) return fromExact(x);
  if (R.isExactZero(x.im)) return fromBall(x.re);
  if (isPoint(x.re) && isPoint(x.im)) return fromExact({ re: R.midpoint(x.re), im: R.midpoint(x.im) });
  return { at: () => x };
}

const isComplexRational = (x: Complex | ComplexRational): x is ComplexRational => x.re instanceof Rational;
/** An exact ball whose rational is of moderate length. */
const isPoint = (x: Ball): boolean => x.rad === 0 && Math.abs(x.exp) < 1 << 14;

function fromBall(x: Ball): Parameter {
  return isPoint(x) ? fromRational(R.midpoint(x)) : { at: () => C.fromReal(x) };
}

export function plus(p: Parameter, q: Parameter | number): Parameter {
  if (typeof q === 'number') return plus(p, fromRational(Rational.of(q)));
  if (p.exact !== undefined && q.exact !== undefined) {
    return fromExact({ re: p.exact.re.add(q.exact.re), im: p.exact.im.add(q.exact.im) });
  }
  return { at: (bits) => C.add(p.at(bits + 4), q.at(bits + 4), bits + 4) };
}

export function minus(p: Parameter): Parameter {
  if (p.exact !== undefined) return fromExact({ re: p.exact.re.neg(), im: p.exact.im.neg() });
  return { at: (bits) => C.neg(p.at(bits)) };
}

export const difference = (p: Parameter, q: Parameter): Parameter => plus(p, minus(q));

/** The value if it is known to be an integer of moderate size. */
export function integer(p: Parameter): number | undefined {
  const q = p.rational;
  return q !== undefined && q.isInteger() && q.abs().cmp(Rational.of(1 << 20)) < 0 ? Number(q.num) : undefined;
}

/** Is it known to be 0, −1, −2, …? */
export function endsSeries(p: Parameter): boolean {
  const n = integer(p);
  return n !== undefined && n <= 0;
}

/** Rounds of raising the precision, and the precision at which to stop: FACTOR·prec + MORE bits (heuristic). */
const ROUNDS = 12;
const FACTOR = 12;
const MORE = 4000;
/** Rounds without a single bit after which more bits are thought hopeless (heuristic). */
const HOPELESS = 3;

/**
 * Evaluates with growing precision until the result has `prec` bits relative to its modulus, more bits stop helping (the parameters
 * are not known better) or the cap is reached. Returns the last value.
 */
export function sharpen(prec: number, start: number, evaluate: (bits: number) => Complex): Complex {
  let bits = start;
  let before = -Infinity;
  let empty = 0;
  for (let round = 1; ; round++) {
    const value = evaluate(bits);
    const known = C.accuracyBits(value);
    const lack = Math.ceil(prec + 2 - known);
    if (!(lack > 0) || round === ROUNDS || bits > FACTOR * prec + MORE) return value;
    if (known > 0 ? known < before + 2 : ++empty === HOPELESS) return value;
    before = known;
    bits += known > 0 ? lack + 8 : bits;
  }
}
