/**
 * @module The exponent b of a branch-point kernel: an exact nominal value, its distance from the nearest integer, a radius.
 *
 * Purpose    kernels are evaluated at exact b, where the limit next to an integer can be taken without loss; what is not
 *            known about b enters at the end as an error.
 */
import type { Ball } from '../ball/real.js';
import * as R from '../ball/real.js';
import { mag, magRadius } from '../ball/mag.js';
import type { Mag } from '../ball/mag.js';
import type { Exact } from '../exact.js';
import { Rational } from '../rational.js';

/** Exponents beyond this are refused: the kernels would cost memory in proportion. */
export const EXPONENT_LIMIT = 1 << 15;
/** Extra bits asked of an exponent that is an enclosure procedure, beyond the bits of the result (kernels lose about 10). */
const MARGIN = 40;

export interface Exponent {
  readonly value: Rational;
  /** Nearest integer. */
  readonly m: number;
  /** value − m, exactly; |eps| <= 1/2. */
  readonly eps: Rational;
  /** Uncertainty of b around `value`. */
  readonly radius: Mag;
  readonly approx: number;
}

/** Reads b; undefined when it is unbounded or beyond EXPONENT_LIMIT. */
export function readExponent(b: Exact | Rational | Ball, prec: number): Exponent | undefined {
  if (b instanceof Rational) return fromRational(b, mag(0));
  if ('mid' in b) {
    if (!(R.upperBits(b) <= 15)) return undefined;
    return fromRational(R.midpoint(b), magRadius(b));
  }
  return b.rational !== undefined ? fromRational(b.rational, mag(0)) : readExponent(b.ball(prec + MARGIN), prec);
}

function fromRational(value: Rational, radius: Mag): Exponent | undefined {
  if (value.abs().cmp(Rational.of(EXPONENT_LIMIT)) > 0) return undefined;
  const m = Rational.of(2n * value.num + value.den, 2n * value.den).floor();
  return { value, m: Number(m), eps: value.sub(Rational.of(m)), radius, approx: value.toNumber() };
}

/** b = 0, exactly: the exponent of E₁ and Ei. */
export const ORDER_ZERO: Exponent = { value: Rational.ZERO, m: 0, eps: Rational.ZERO, radius: mag(0), approx: 0 };
