/**
 * @module Polylogarithms at one half: Li_n(1/2) = Σ_{k>=1} 1/(2^k k^n), kept at the highest precision asked so far.
 *
 * Purpose    Li₄(1/2) and Li₅(1/2) of perturbative coefficients, to any digits.
 * Method     the defining series in integers in units of 2^-w.
 * Bound      N terms are each rounded down by less than a unit; the tail after N = w terms is below 2^-w. Radius: N + 1 units.
 * Reference  L. Lewin, "Polylogarithms and Associated Functions" (1981), section 7.1 (the defining series); DLMF 25.12.10.
 */
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';

const known = new Map<number, { prec: number; value: Ball }>();

/** Li_n(1/2) to prec bits for integer n >= 0; INDETERMINATE for other n. */
export function polylogHalf(n: number, prec: number): Ball {
  if (!Number.isInteger(n) || n < 0) return R.INDETERMINATE;
  const have = known.get(n);
  if (have !== undefined && have.prec >= prec) return R.round(have.value, prec);
  const work = prec + Math.max(64, prec >> 3);
  const w = work + 8 + Math.ceil(Math.log2(work + 8));
  const order = BigInt(n);
  let sum = 0n;
  for (let k = 1; k <= w; k++) sum += (1n << BigInt(w - k)) / BigInt(k) ** order;
  const value = R.ball(sum, -w, w + 1);
  known.set(n, { prec: work, value });
  return R.round(value, prec);
}
