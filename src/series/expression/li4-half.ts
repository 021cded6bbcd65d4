/**
 * @module The polylogarithm Li₄(1/2), which the three-loop relation between the pole mass and the MSbar mass needs.
 *
 * Method     Li₄(1/2) = Σ_{k≥1} 1/(2^k k⁴), summed in integers in units of 2^−w.
 * Bound      each of the N terms is rounded down by less than one unit; the tail after N terms is below 2^−N/N⁴ < 2^−w
 *            for N = w. Radius: N + 1 units.
 * Reference  L. Lewin, Polylogarithms and Associated Functions, North-Holland 1981 (the defining series).
 */
import { R } from '../../numerics/index.js';
import type { Ball } from '../../numerics/index.js';

/** Enclosure of Li₄(1/2) = 0.51747906167389938633… to `prec` bits. */
export function li4Half(prec: number): Ball {
  const w = prec + 16 + Math.ceil(Math.log2(prec + 16));
  let sum = 0n;
  for (let k = 1; k <= w; k++) sum += (1n << BigInt(w - k)) / BigInt(k) ** 4n;
  return R.ball(sum, -w, w + 1, prec + 8);
}
