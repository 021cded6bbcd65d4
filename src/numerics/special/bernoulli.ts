/**
 * @module Bernoulli numbers, exactly.
 *
 * Purpose    coefficients of Stirling's series and of ζ at even integers.
 * Method     tangent numbers T_n by the in-place O(n²) recurrence on integers;
 *            B_2n = (−1)^(n−1)·2n·T_n/(2^2n (2^2n − 1)).  All of B_2 … B_2N are kept; when more are asked for, all are made
 *            anew with an eighth to spare.
 * Bound      exact.
 * Reference  R. P. Brent, D. Harvey, "Fast computation of Bernoulli, tangent and secant numbers", arXiv:1108.0286.
 */
import { int } from '../ball/fixed.js';
import { Rational } from '../rational.js';

const even: Rational[] = [Rational.ONE];

function extend(n: number): void {
  const size = Math.max(32, n + (n >> 3));
  const t: bigint[] = [0n, 1n];
  for (let k = 2; k <= size; k++) t.push(BigInt(k - 1) * t[k - 1]!);
  for (let k = 2; k <= size; k++) {
    for (let j = k; j <= size; j++) t[j] = int(j - k) * t[j - 1]! + int(j - k + 2) * t[j]!;
  }
  for (let k = even.length; k <= size; k++) {
    const four = 1n << BigInt(2 * k);
    const num = BigInt(2 * k) * t[k]!;
    even.push(Rational.of(k & 1 ? num : -num, four * (four - 1n)));
  }
}

/** B_n with B_1 = −1/2; n >= 0. */
export function bernoulli(n: number): Rational {
  if (n === 1) return Rational.of(-1n, 2n);
  if (n % 2 === 1) return Rational.ZERO;
  const k = n / 2;
  if (k >= even.length) extend(k);
  return even[k]!;
}
