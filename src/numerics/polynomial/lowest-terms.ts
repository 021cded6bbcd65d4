/**
 * @module Many fractions over one long denominator, brought to lowest terms together.
 *
 * Purpose    a gcd of two integers of 100,000 bits costs more than the determinant they come from; a hundred of them
 *            over the same denominator cost little more than one.
 * Method     G = gcd(Π nums mod den, den) is a multiple of gcd(num, den) for every numerator that is no multiple of den, and
 *            usually short: gcd(num, den) = gcd(num, G).
 * Bound      exact.
 * Reference  D. J. Bernstein, "Factoring into coprimes in essentially linear time", J. Algorithms 54 (2005) 1 (the idea).
 */
import { bitLength } from '../bits.js';
import { Rational, gcdBigInt } from '../rational.js';

/** Heuristic: shorter denominators are reduced one by one. */
const SHORT_BITS = 3000;

/** nums[i]/den in lowest terms; den is not zero. */
export function overCommonDenominator(nums: readonly bigint[], den: bigint): Rational[] {
  if (bitLength(den) < SHORT_BITS) return nums.map((c) => Rational.of(c, den));
  const sign = den < 0n ? -1n : 1n;
  const d = den * sign;
  let product = 1n;
  for (const c of nums) if (c !== 0n && c % d !== 0n) product = (product * (c % d)) % d;
  const part = gcdBigInt(product, d);
  return nums.map((c) => {
    const g = gcdBigInt(c % part, part);
    // c = 0, or a multiple of d, makes g the whole part but leaves d/part: divide by the true gcd there.
    if (c === 0n) return Rational.ZERO;
    if (c % d === 0n) return Rational.ofReduced((sign * c) / d, 1n);
    return Rational.ofReduced((sign * c) / g, d / g);
  });
}
