/**
 * @module The odd series Σ (±1)^k u^(2k+1)/(2k+1) in fixed point: artan and artanh of a small argument.
 *
 * Purpose    the last step of log and atan2, after a double-precision start has made u small.
 * Method     columns: with X = u², Σ_j X^j Σ_i (X^m)^i/(2(im+j)+1); one division by a small integer a term.
 * Bound      for |u| < 2^-10: powers of X are right to 2 ulp, a column of `blocks` terms to 3·blocks, Horner's rule adds
 *            less than 2, the tail after the power has fallen to zero is below 3: in all 3·blocks + 6 <= ODD_ULPS ulp
 *            (blocks < 300 for wp <= 2^21), times |u| < 1.
 * Reference  D. M. Smith, Math. Comp. 52 (1989) 131.
 */
import { bitLength } from '../bits.js';
import { columns, int, powFixed } from './fixed.js';

export const ODD_ULPS = 2 ** 10;

/** Σ s^k u^(2k+1)/(2k+1) with s = −1 (artan) or s = 1 (artanh), |u| < 2^(wp−10). */
export function oddSeries(u: bigint, wp: number, s: 1 | -1): bigint {
  if (u === 0n) return 0n;
  const w = BigInt(wp);
  const x = (u * u) >> w;
  if (x === 0n) return u;
  const bits = 2 * (wp - bitLength(u));
  const terms = Math.ceil(wp / Math.max(20, bits)) + 1;
  const m = terms < 6 ? 1 : columns(terms);
  const y = powFixed(x, m, w);
  const sums: bigint[] = new Array<bigint>(m).fill(0n);
  let k = 0;
  for (let t = 1n << w; t !== 0n; t = (t * y) >> w) {
    for (let j = 0; j < m; j++, k++) {
      const q = t / int(2 * k + 1);
      sums[j]! += s < 0 && k & 1 ? -q : q;
    }
  }
  let sum = sums[m - 1]!;
  for (let j = m - 2; j >= 0; j--) sum = ((sum * x) >> w) + sums[j]!;
  return (sum * u) >> w;
}
