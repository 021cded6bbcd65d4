/**
 * @module ψ = Γ′/Γ on the real line.
 *
 * Method     x > 0: ψ(x) = ψ(X) − Σ_{j<n} 1/(x+j), ψ(X) = log X − 1/(2X) − Σ B_2k/(2k X^2k) (DLMF 5.11.2).
 *            x < 0: ψ(x) = ψ(1−x) − π cot πx (DLMF 5.5.4).
 * Bound      Stirling: stirling.ts. A radius: 0 < ψ′(x) < 1/x + 1/x² on the positive axis; on the negative one
 *            0 < ψ′(x) = π²/sin² πx − ψ′(1−x) < π²/sin² πx.
 */
import { shift } from '../bits.js';
import { pi } from '../ball/constants.js';
import { log, sinCosPi } from '../ball/elementary.js';
import { addMag, divMag, mag, magLower, magRadius, mulMag, widenMag } from '../ball/mag.js';
import type { Mag } from '../ball/mag.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import { digammaDouble } from './gamma-double.js';
import { stepsToStirling } from './log-gamma.js';
import { refine } from './refine.js';
import { bernoulliSum, harmonicSum, stirlingTerms } from './stirling.js';

/** ψ(x); INDETERMINATE on a ball that holds 0, −1, −2, … */
export function digamma(x: Ball, prec: number): Ball {
  if (x.rad === Infinity) return R.INDETERMINATE;
  const slope = slopeBound(x);
  if (slope === undefined) return R.INDETERMINATE;
  const mid = R.exactMid(x);
  const start = prec + 6 + smallness(mid);
  const y = refine(prec, start, (bits) => (mid.mid > 0n ? positive(mid, bits) : reflected(mid, bits)), R.accuracyBits);
  return R.round(widenMag(y, mulMag(slope, magRadius(x))), prec);
}

/** Upper bound of ψ′ over the ball; undefined when it may hold a pole. */
function slopeBound(x: Ball): Mag | undefined {
  if (R.isPositive(x)) {
    const inverse = divMag(mag(1), magLower(x));
    return addMag(inverse, mulMag(inverse, inverse));
  }
  const low = magLower(sinCosPi(x, 60).sin);
  if (low.m === 0) return undefined;
  const ratio = divMag(mag(Math.PI * (1 + 1e-12)), low);
  return mulMag(ratio, ratio);
}

/** Bits by which ψ is small at x, from its double value. */
function smallness(x: Ball): number {
  const size = Math.abs(digammaDouble(R.toNumber(x)));
  return size < 1 ? Math.min(60, Math.ceil(-Math.log2(size)) + 1) : 0;
}

function reflected(x: Ball, prec: number): Ball {
  const { sin, cos } = sinCosPi(x, prec);
  const cot = R.div(R.mul(pi(prec), cos, prec), sin, prec);
  return R.sub(positive(R.sub(R.ONE, x, 1e9), prec), cot, prec);
}

/** ψ at exact x > 0, to an absolute error near 2^-prec (relative where ψ is large). */
function positive(x: Ball, prec: number): Ball {
  // Stirling's series and the sum of reciprocals each lose a few ulp a term, prec/4 terms at most.
  const wp = prec + Math.ceil(Math.log2(prec)) + 1;
  const n = R.upperBits(x) > 40 ? 0 : stepsToStirling(R.toNumber(x), wp);
  const big = R.add(x, R.fromNumber(n), 1e9);
  const bits = R.upperBits(big);
  const log2x = Math.log2(R.toNumber(R.mul2exp(big, -bits))) + bits - 1e-9;
  const { terms, remainder } = stirlingTerms(log2x, wp, false);
  const inverse = R.div(R.ONE, big, wp + 12);
  let s = R.sub(log(big, wp + 8), R.mul2exp(inverse, -1), wp + 8);
  if (terms > 1) {
    const y = R.sqr(inverse, wp + 12);
    const tail = R.ball(bernoulliSum(y.mid, -y.exp, terms, wp, false), -wp, 3 * terms + 6);
    s = R.sub(s, R.mul(tail, y, wp + 8), wp + 8);
  }
  s = R.addError(s, 1, Math.ceil(remainder));
  if (n === 0) return s;
  if (n > 1) {
    const fixed = shift(x.mid, x.exp + wp + 8);
    s = R.sub(s, R.ball(harmonicSum(fixed, wp + 8, 1, n), -wp - 8, 4 * n + 8), wp + 8);
  }
  return R.sub(s, R.div(R.ONE, x, wp + 8), wp + 8);
}
