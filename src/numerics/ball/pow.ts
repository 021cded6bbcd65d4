/** @module Real powers a^b of positive (or, for integer b, any) balls. */
import { Rational } from '../rational.js';
import { exp } from './exp.js';
import { log } from './log.js';
import * as R from './real.js';
import type { Ball } from './real.js';

/** Integer exponents up to this size go by repeated squaring (heuristic); larger ones through the logarithm. */
const LIMIT = 1n << 14n;

/**
 * a^b. An exact integer b allows any a (0^0 = 1, 0 to a negative power is INDETERMINATE); otherwise a must certainly be
 * positive, or exactly 0 with b > 0. A rational b with denominator 2 uses the square root.
 */
export function pow(a: Ball, b: Ball | Rational, prec: number): Ball {
  const n = integerValue(b);
  if (n !== undefined && n <= LIMIT && n >= -LIMIT) return R.powInt(a, Number(n), prec);
  if (b instanceof Rational && b.den === 2n && b.num < LIMIT && b.num > -LIMIT) {
    return R.powInt(R.sqrt(a, prec + 20), Number(b.num), prec);
  }
  const positiveExponent = b instanceof Rational ? b.sign() > 0 : R.isPositive(b);
  if (R.isExactZero(a)) return positiveExponent ? R.ZERO : R.INDETERMINATE;
  if (!R.isPositive(a)) {
    if (n === undefined || !R.isNegative(a)) return R.INDETERMINATE;
    const size = pow(R.neg(a), b, prec);
    return n % 2n === 0n ? size : R.neg(size);
  }
  // |b log a| < 2^up: the exponential turns an absolute error into a relative one, so up more bits are needed.
  const rough = R.upperBits(log(a, 30)) + (b instanceof Rational ? R.upperBits(R.fromRational(b, 30)) : R.upperBits(b));
  if (rough === -Infinity) return R.ONE;
  const work = prec + 8 + Math.max(0, Math.min(rough, 60));
  const bb = b instanceof Rational ? R.fromRational(b, work) : b;
  return exp(R.mul(bb, log(a, work), work), prec);
}

function integerValue(b: Ball | Rational): bigint | undefined {
  if (b instanceof Rational) return b.isInteger() ? b.num : undefined;
  if (b.rad !== 0) return undefined;
  const q = R.upperBits(b) > 1000 ? undefined : R.midpoint(b);
  return q?.isInteger() === true ? q.num : undefined;
}
