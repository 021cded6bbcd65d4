/**
 * @module The unit of the variable in which an exact series has short coefficients.
 *
 * Purpose    coefficients such as n!·10^(300n) cost exact arithmetic a hundred times what n! costs.
 * Method     Padé approximants are covariant: [L/M] of b(λy) is that of b at x = λy. With the greatest common divisors N of
 *            the numerators and D of the denominators of the ratios b_{n+1}/b_n, λ = D/N takes the common factor out of
 *            every ratio.
 * Bound      exact for any λ; a poor λ costs time only.
 * Reference  G. A. Baker, P. Graves-Morris, "Padé Approximants", section 1.5 (invariance under a change of the variable).
 */
import { bitLength } from '../bits.js';
import { Rational, gcdBigInt } from '../rational.js';
import type { PadeEntry } from './pade-types.js';

/** Heuristic: numerators and denominators shorter than this per order are left alone. */
const LONG_BITS = 64;

/** b(λy) with λ = num/den: coefficients b_n λ^n. */
export interface ScaledSeries {
  readonly coefficients: readonly Rational[];
  readonly num: bigint;
  readonly den: bigint;
}

/** The series in its own unit; undefined when it has short coefficients as it is or its ratios have nothing in common. */
export function inOwnUnit(b: readonly Rational[]): ScaledSeries | undefined {
  if (!b.some((c, n) => n > 0 && bitLength(c.num) + bitLength(c.den) > LONG_BITS * (n + 1))) return undefined;
  let [num, den] = [0n, 0n];
  for (let n = 1; n < b.length; n++) {
    if (b[n]!.isZero() || b[n - 1]!.isZero()) continue;
    const ratio = b[n]!.div(b[n - 1]!);
    num = gcdBigInt(num, ratio.num);
    den = gcdBigInt(den, ratio.den);
    if (num === 1n && den === 1n) return undefined;
  }
  return num === 0n ? undefined : { coefficients: scaled(b, den, num), num: den, den: num };
}

/** The approximant of b from that of b(λy): coefficients times λ^-j. */
export function fromOwnUnit(entry: PadeEntry, { num, den }: ScaledSeries): PadeEntry {
  if (!entry.exists) return entry;
  return { ...entry, numerator: scaled(entry.numerator, den, num), denominator: scaled(entry.denominator, den, num) };
}

/** a_n (num/den)^n for coprime num, den > 0: gcds with the a_n only, which may be short where the powers are long. */
function scaled(a: readonly Rational[], num: bigint, den: bigint): Rational[] {
  let [top, bottom] = [1n, 1n];
  return a.map((c, n) => {
    if (n > 0) [top, bottom] = [top * num, bottom * den];
    if (c.isZero()) return c;
    const g = gcdBigInt(c.num, bottom);
    const h = gcdBigInt(c.den, top);
    return Rational.ofReduced((c.num / g) * (top / h), (c.den / h) * (bottom / g));
  });
}
