/**
 * @module p/p' of a Padé denominator in doubles through its three-term recurrence.
 *
 * Purpose    starting points for the root finder that are right to 15 digits where the coefficients of the denominator
 *            need hundreds of bits: the recurrence conditions the roots as a symmetric eigenvalue problem does.
 * Method     q(x) = x^M P_M(1/x). With x = y·2^e, u = 1/y and P in u, q'/q = M/y − (P'/P)/y² (derivatives in y and u).
 * Bound      none needed: only the search uses it.
 * Reference  G. H. Golub, J. H. Welsch, Math. Comput. 23 (1969) 221 (nodes from recurrence coefficients).
 */
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import type { JacobiCoefficients } from './pade-moments.js';
import type { NewtonRatio } from './roots-start.js';

/** Values are brought back by this power of two when they pass it. */
const BIG = 2 ** 300;

interface Scaled {
  readonly alpha: Float64Array;
  readonly beta: Float64Array;
}

/** Newton ratio q/q' at y·2^e for the denominator with these recurrence coefficients. */
export function recurrenceRatio({ alpha, beta }: JacobiCoefficients<Ball>): NewtonRatio {
  const size = alpha.length;
  const cache = new Map<number, Scaled>();
  const scaledBy = (e: number): Scaled => {
    let s = cache.get(e);
    if (s === undefined) {
      s = {
        alpha: Float64Array.from(alpha, (a) => R.toNumber(R.mul2exp(a, e))),
        beta: Float64Array.from(beta, (b) => R.toNumber(R.mul2exp(b, 2 * e))),
      };
      cache.set(e, s);
    }
    return s;
  };
  return (re, im, exp, out) => {
    const s = scaledBy(exp);
    const norm = re * re + im * im;
    const ur = re / norm;
    const ui = -im / norm;
    // P_{k-1}, P_k and their derivatives in u.
    let [ar, ai, br, bi] = [0, 0, 1, 0];
    let [cr, ci, dr, di] = [0, 0, 0, 0];
    let size1 = 0;
    for (let k = 0; k < size; k++) {
      const xr = ur - s.alpha[k]!;
      const weight = k === 0 ? 0 : s.beta[k]!;
      const er = xr * br - ui * bi - weight * ar;
      const ei = xr * bi + ui * br - weight * ai;
      const fr = br + xr * dr - ui * di - weight * cr;
      const fi = bi + xr * di + ui * dr - weight * ci;
      size1 = Math.hypot(xr, ui) * Math.hypot(br, bi) + Math.abs(weight) * Math.hypot(ar, ai);
      [ar, ai, br, bi] = [br, bi, er, ei];
      [cr, ci, dr, di] = [dr, di, fr, fi];
      if (Math.abs(dr) + Math.abs(di) > BIG) {
        ar /= BIG;
        ai /= BIG;
        br /= BIG;
        bi /= BIG;
        cr /= BIG;
        ci /= BIG;
        dr /= BIG;
        di /= BIG;
        size1 /= BIG;
      }
    }
    // N = P y²/(M y P − P')
    const gr = size * (re * br - im * bi) - dr;
    const gi = size * (re * bi + im * br) - di;
    const y2r = re * re - im * im;
    const y2i = 2 * re * im;
    const nr = br * y2r - bi * y2i;
    const ni = br * y2i + bi * y2r;
    const q = gr * gr + gi * gi;
    if (q === 0 || !Number.isFinite(q)) {
      out[0] = 1e-3;
      out[1] = 1e-3;
      return false;
    }
    out[0] = (nr * gr + ni * gi) / q;
    out[1] = (ni * gr - nr * gi) / q;
    return Math.hypot(br, bi) <= size1 * 2 ** -52;
  };
}
