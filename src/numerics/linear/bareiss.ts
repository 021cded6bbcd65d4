/**
 * @module Determinants of rational matrices, exactly.
 *
 * Purpose    decide whether a determinant is zero, and its sign.
 * Method     rows scaled to integers, then Bareiss's fraction-free elimination: all divisions are exact and every
 *            intermediate entry is a minor of the matrix.
 * Bound      exact.
 * Reference  E. H. Bareiss, Math. Comput. 22 (1968) 565.
 */
import { Rational, gcdBigInt } from '../rational.js';
import type { Matrix } from './lu.js';

/** det A. Throws RangeError when A is not square. */
export function determinantExact(a: Matrix<Rational>): Rational {
  const n = a.length;
  let scale = 1n;
  const m = a.map((row) => {
    if (row.length !== n) throw new RangeError(`determinantExact: a row of ${row.length} entries in ${n} rows`);
    const den = row.reduce((d, c) => (d / gcdBigInt(d, c.den)) * c.den, 1n);
    scale *= den;
    return row.map((c) => c.num * (den / c.den));
  });
  let previous = 1n;
  let sign = 1n;
  for (let k = 0; k < n - 1; k++) {
    const best = m.findIndex((row, i) => i >= k && row[k] !== 0n);
    if (best < 0) return Rational.ZERO;
    if (best !== k) {
      [m[k], m[best]] = [m[best]!, m[k]!];
      sign = -sign;
    }
    const top = m[k]!;
    for (let i = k + 1; i < n; i++) {
      const row = m[i]!;
      for (let j = k + 1; j < n; j++) row[j] = (row[j]! * top[k]! - row[k]! * top[j]!) / previous;
    }
    previous = top[k]!;
  }
  return n === 0 ? Rational.ONE : Rational.of(sign * m[n - 1]![n - 1]!, scale);
}
