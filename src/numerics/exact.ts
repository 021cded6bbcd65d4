/**
 * @module A real number known exactly: a rational, or an expression that can be enclosed to any precision asked.
 * Purpose: coefficients such as 365/24 − 11 ζ(3) keep every digit until an algorithm says how many it needs.
 */
import * as B from './ball/real.js';
import type { Ball } from './ball/real.js';
import { Rational } from './rational.js';

export interface Exact {
  /** Present when the value is rational. */
  readonly rational?: Rational;
  /** Enclosure with at least roughly `prec` correct bits. */
  ball(prec: number): Ball;
}

/** Wraps a rational (or an integer). */
export function exact(q: Rational | number | bigint): Exact {
  const r = q instanceof Rational ? q : Rational.of(q);
  return { rational: r, ball: (prec) => B.fromRational(r, prec) };
}

/** Wraps an enclosure procedure; the last result is kept, since callers ask for the same precision again and again. */
export function exactReal(enclose: (prec: number) => Ball): Exact {
  let last: { prec: number; value: Ball } | undefined;
  return {
    ball(prec) {
      if (last === undefined || last.prec < prec) last = { prec, value: enclose(prec) };
      return last.prec > prec + 64 ? B.round(last.value, prec) : last.value;
    },
  };
}

type BinaryOp = 'add' | 'sub' | 'mul' | 'div';

function binary(op: BinaryOp, a: Exact, b: Exact): Exact {
  if (a.rational !== undefined && b.rational !== undefined) return exact(a.rational[op](b.rational));
  return exactReal((prec) => B[op](a.ball(prec + 8), b.ball(prec + 8), prec + 8));
}

/** Sum, exact when both are rational. */
export const addExact = (a: Exact, b: Exact): Exact => binary('add', a, b);
/** Difference, exact when both are rational. */
export const subExact = (a: Exact, b: Exact): Exact => binary('sub', a, b);
/** Product, exact when both are rational. */
export const mulExact = (a: Exact, b: Exact): Exact => binary('mul', a, b);
/** Quotient; throws RangeError when b is the rational zero, encloses with INDETERMINATE when b's ball holds zero. */
export const divExact = (a: Exact, b: Exact): Exact => binary('div', a, b);

/** True only for the exact rational zero: an expression that happens to vanish cannot be proved to. */
export const isZeroExact = (a: Exact): boolean => a.rational?.isZero() ?? false;

/** Nearest double (0 or ±Infinity outside the range of doubles). */
export const toNumberExact = (a: Exact): number => a.rational?.toNumber() ?? B.toNumber(a.ball(80));

/** Certain sign, looking at up to 4,096 bits; 0 for exact zero and for a value not told from zero. */
export function signExact(a: Exact): -1 | 0 | 1 {
  if (a.rational !== undefined) return a.rational.sign();
  for (let prec = 64; prec <= 4096; prec *= 4) {
    const v = a.ball(prec);
    if (B.isPositive(v)) return 1;
    if (B.isNegative(v)) return -1;
  }
  return 0;
}
