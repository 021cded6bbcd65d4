/**
 * @module Greatest common divisor of long integers.
 *
 * Purpose    reduced fractions with thousands of digits.
 * Method     Lehmer: Euclid on the leading 53 bits of both numbers in doubles as long as the quotients are certainly
 *            those of the full numbers (Collins' condition), then one linear combination of the long numbers for about
 *            26 bits of progress.
 * Bound      exact.
 * Reference  D. E. Knuth, "The Art of Computer Programming" vol. 2, algorithm 4.5.2L; G. E. Collins, "Lecture notes on
 *            arithmetic algorithms" (1980); T. Jebelean, J. Symb. Comput. 19 (1995) 145 (the condition).
 */
import { bitLength } from './bits.js';

const LEADING_BITS = 53;

/** gcd(a, b) >= 0; gcd(0, 0) = 0. */
export function gcdBigInt(a: bigint, b: bigint): bigint {
  if (a < 0n) a = -a;
  if (b < 0n) b = -b;
  if (a < b) [a, b] = [b, a];
  while (b > 0xffffffffffffffffn) {
    const drop = bitLength(a) - LEADING_BITS;
    const k = BigInt(drop);
    let x = Number(a >> k);
    let y = Number(b >> k);
    // Rows of the cofactor matrix, absolute values; their signs alternate.
    let [u0, v0, u1, v1] = [1, 0, 0, 1];
    let even = true;
    while (y !== 0) {
      const q = Math.floor(x / y);
      const z = x - q * y;
      const u2 = u0 + q * u1;
      const v2 = v0 + q * v1;
      // Collins–Jebelean: q is the quotient of the full numbers too.
      if (even ? z < v2 || y - z < u1 + u2 : z < u2 || y - z < v1 + v2) break;
      x = y;
      y = z;
      [u0, v0, u1, v1] = [u1, v1, u2, v2];
      even = !even;
    }
    if (v0 === 0) {
      [a, b] = [b, a % b];
      continue;
    }
    const au = a * BigInt(u0);
    const bv = b * BigInt(v0);
    const au1 = a * BigInt(u1);
    const bv1 = b * BigInt(v1);
    [a, b] = even ? [au - bv, bv1 - au1] : [bv - au, au1 - bv1];
  }
  while (b !== 0n) [a, b] = [b, a % b];
  return a;
}
