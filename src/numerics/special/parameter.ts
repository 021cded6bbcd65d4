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

/** What callers may give: exact values, enclosure procedures, or enclosures. */
export type Given = Rational | Exact | Ball | Complex | number;

export interface Parameter {
  /** Present when the value is known to be this rational. */
  readonly rational?: Rational;
  at(bits: number): Complex;
}

export function parameter(x: Given): Parameter {
  if (typeof x === 'number') return fromRational(Rational.fromNumber(x));
  if (x instanceof Rational) return fromRational(x);
  if ('re' in x) return R.isExactZero(x.im) ? fromBall(x.re) : { at: () => x };
  if ('mid' in x) return fromBall(x);
  if (x.rational !== undefined) return fromRational(x.rational);
  return { at: (bits) => C.fromReal(x.ball(bits)) };
}

function fromRational(q: Rational): Parameter {
  return { rational: q, at: (bits) => C.fromReal(R.fromRational(q, bits)) };
}

function fromBall(x: Ball): Parameter {
  return x.rad === 0 && Math.abs(x.exp) < 1 << 14 ? fromRational(R.midpoint(x)) : { at: () => C.fromReal(x) };
}

export function plus(p: Parameter, q: Parameter | number): Parameter {
  if (typeof q === 'number') return plus(p, fromRational(Rational.of(q)));
  if (p.rational !== undefined && q.rational !== undefined) return fromRational(p.rational.add(q.rational));
  return { at: (bits) => C.add(p.at(bits + 4), q.at(bits + 4), bits + 4) };
}

export function minus(p: Parameter): Parameter {
  return p.rational !== undefined ? fromRational(p.rational.neg()) : { at: (bits) => C.neg(p.at(bits)) };
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
