/**
 * @module Exact numbers that remember how they were written, so that a series can be written again without loss.
 */
import { R, exact, writePlain, writeScientific } from '../numerics/index.js';
import type { Exact, Rational } from '../numerics/index.js';

export interface Written extends Exact {
  /** Reads back to the same value, given the same constants and flavours. */
  readonly text: string;
}

/** `value` with its text. */
export const written = (value: Exact, text: string): Written => ({
  ...(value.rational && { rational: value.rational }),
  ball: (prec) => value.ball(prec),
  text,
});

/** Digits given for a value that has neither a rational form nor a text of its own. */
const DIGITS = 60;

/**
 * Text that reads back to the value: the one it was written as, else p/q, else a decimal of 60 significant digits
 * (which is the value only to that accuracy).
 */
export function textOf(value: Exact): string {
  if ('text' in value && typeof value.text === 'string') return value.text;
  if (value.rational !== undefined) return value.rational.toString();
  return decimal(value);
}

function decimal(value: Exact): string {
  const ball = value.ball(Math.ceil(DIGITS * Math.log2(10)) + 16);
  const q = R.midpoint(ball);
  if (q.isZero()) return '0';
  const digits = (n: bigint): number => n.toString().length;
  const up = DIGITS - (digits(q.abs().num) - digits(q.den));
  const scale = 10n ** BigInt(Math.abs(up));
  const n = q
    .mul(up >= 0 ? exact(scale).rational! : exact(scale).rational!.inv())
    .abs()
    .floor();
  const text = n.toString().slice(0, DIGITS);
  const point = n.toString().length - up;
  return `${q.sign() < 0 ? '-' : ''}${text[0]!}.${text.slice(1)}e${point - 1}`;
}

/** A terminating decimal with up to so many digits is shorter to read than its fraction (habit). */
const SHORT = 24;

/** Zeros before the first digit, or places before the point, from which on a power of ten reads better (habit). */
const LONGEST = 15;

/** The decimal form of q when it ends, and soon; with a power of ten for a very small or large q. Reads back to q. */
export function decimalText(q: Rational): string | undefined {
  if (q.isZero()) return '0';
  let rest = q.den;
  let [twos, fives] = [0, 0];
  for (; rest % 2n === 0n; twos++) rest /= 2n;
  for (; rest % 5n === 0n; fives++) rest /= 5n;
  const places = Math.max(twos, fives);
  if (rest !== 1n) return undefined;
  const all = ((q.abs().num * 10n ** BigInt(places)) / q.den).toString();
  const digits = all.replace(/0+$/, '');
  if (digits.length > SHORT) return undefined;
  const exponent = all.length - digits.length - places;
  const short = { coefficient: BigInt(digits) * BigInt(q.sign()), exponent };
  const leading = all.length - places;
  return Math.abs(leading) > LONGEST || digits.length - exponent > SHORT ? writeScientific(short) : writePlain(short);
}
