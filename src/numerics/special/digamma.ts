/**
 * @module ψ = Γ′/Γ on the real line.
 *
 * Method     x > 0: ψ(x) = ψ(X) − Σ_{j<n} 1/(x+j), ψ(X) = log X − 1/(2X) − Σ B_2k/(2k X^2k) (DLMF 5.11.2).
 *            x < 0: ψ(x) = ψ(1−x) − π cot πx (DLMF 5.5.4).
 * Bound      Stirling: stirling.ts. A radius r on the positive axis: 0 < ψ′(x) < 1/x + 1/x².
 */
import { shift } from '../bits.js';
import { pi } from '../ball/constants.js';
import { log, sinCosPi } from '../ball/elementary.js';
import { addMag, divMag, mag, magLower, magRadius, mulMag, widenMag } from '../ball/mag.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import { digammaDouble } from './gamma-double.js';
import { stepsToStirling } from './log-gamma.js';
import { bernoulliSum, harmonicSum, stirlingTerms } from './stirling.js';

/** Rounds of more working bits next to the zeros of ψ. */
const ROUNDS = 6;

/** ψ(x); INDETERMINATE on a ball that holds 0, −1, −2, … */
export function digamma(x: Ball, prec: number): Ball {
  if (x.rad === Infinity) return R.INDETERMINATE;
  let work = prec + 10 + smallness(x);
  let y = R.INDETERMINATE;
  for (let round = 0; round < ROUNDS; round++) {
    y = R.isPositive(x) ? positive(x, work) : reflected(x, work);
    const lack = prec - R.accuracyBits(y);
    // Bits beyond the argument's own radius gain nothing.
    if (!(lack > 2) || work + R.radiusBits(x) > 40 || work > 4 * prec + 400) break;
    work += Math.ceil(Math.min(lack, work)) + 8;
  }
  return R.round(y, prec);
}

/** Bits by which ψ is small at x, from its double value. */
function smallness(x: Ball): number {
  const size = Math.abs(digammaDouble(R.toNumber(x)));
  return size < 1 ? Math.min(60, Math.ceil(-Math.log2(size)) + 1) : 0;
}

function reflected(x: Ball, prec: number): Ball {
  const { sin, cos } = sinCosPi(x, prec);
  if (R.containsZero(sin)) return R.INDETERMINATE;
  const other = R.sub(R.ONE, x, x.rad === 0 ? 1e9 : prec + 80);
  const cot = R.div(R.mul(pi(prec), cos, prec), sin, prec);
  return R.isPositive(other) ? R.sub(positive(other, prec), cot, prec) : R.INDETERMINATE;
}

function positive(x: Ball, prec: number): Ball {
  // Stirling's series and the sum of reciprocals each lose a few ulp a term, prec/4 terms at most.
  const wp = prec + Math.ceil(Math.log2(prec)) + 1;
  const mid = R.exactMid(x);
  const n = R.upperBits(mid) > 40 ? 0 : stepsToStirling(R.toNumber(mid), wp);
  const big = R.add(mid, R.fromNumber(n), 1e9);
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
  if (n > 0) {
    const fixed = shift(mid.mid, mid.exp + wp + 8);
    if (n > 1) s = R.sub(s, R.ball(harmonicSum(fixed, wp + 8, 1, n), -wp - 8, 4 * n + 8), wp + 8);
    s = R.sub(s, R.div(R.ONE, mid, wp + 8), wp + 8);
  }
  if (x.rad === 0) return s;
  const low = magLower(x);
  const inv = divMag(mag(1), low);
  return widenMag(s, mulMag(addMag(inv, mulMag(inv, inv)), magRadius(x)));
}
