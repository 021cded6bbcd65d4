/**
 * @module E₁(x) for x > 0, without the factor e^x.
 *
 * Purpose    the plain exponential integral where the scaled one would be multiplied by e^−x again.
 * Method     E₁(x) = −γ − log x − Σ_{k>=1} (−x)^k/(k·k!), whose cancellation e^(2x) is added to the working precision; where the cost of that is
 *            higher than that of the continued fraction, e^−x G₀(x).
 * Bound      exponential-sum.ts; a radius r of x changes E₁ by at most r e^−a/a, a the lower end of the ball (DLMF 6.2.1).
 * Reference  DLMF 6.2.1, 6.6.2.
 */
import { eulerGamma } from '../ball/constants.js';
import { exp, log } from '../ball/elementary.js';
import { divMag, magLower, magRadius, magUpper, mulMag, widenMag } from '../ball/mag.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import { Rational } from '../rational.js';
import { branchAlternating } from './branch-alternating.js';
import { columnSumCost, fractionCost, productCost } from './cost.js';
import { ORDER_ZERO } from './exponent.js';
import { exponentialSum, exponentialTerms } from './exponential-sum.js';
import { refine } from './refine.js';
import { fractionTerms } from './stieltjes-fraction.js';

/** The exponential beside the fraction, in products (heuristic). */
const ELEMENTARY_STEPS = 30;

/** E₁(x) for x > 0; INDETERMINATE for x not certainly positive. */
export function expintE1(x: Ball, prec: number): Ball {
  if (!R.isPositive(x)) return R.INDETERMINATE;
  const mid = R.exactMid(x);
  const y = exactE1(mid, prec);
  if (x.rad === 0) return y;
  const low = magLower(x);
  // e^−ξ/ξ on the ball
  const top = magUpper(exp(R.neg(x), 60));
  return R.round(widenMag(y, mulMag(magRadius(x), divMag(top, low))), prec);
}

function exactE1(x: Ball, prec: number): Ball {
  const size = Math.min(Math.max(R.toNumber(x), 1e-300), 1e300);
  const bits = prec + 10 + Math.ceil(2 * size * Math.LOG2E + Math.log2(2 + size));
  const series = columnSumCost(exponentialTerms(size, bits), bits, false);
  const fraction = fractionCost(fractionTerms(size, 0, prec + 10), prec + 10, false);
  if (size > prec || fraction + ELEMENTARY_STEPS * productCost(prec) < series) {
    return R.mul(exp(R.neg(x), prec + 6), branchAlternating(Rational.ZERO, x, prec + 6), prec);
  }
  return R.round(
    refine(prec, bits, (work) => convergent(x, size * (1 + 1e-12), work), R.accuracyBits),
    prec,
  );
}

function convergent(x: Ball, size: number, bits: number): Ball {
  const sum = exponentialSum(R.neg(x), size, ORDER_ZERO, bits);
  return R.neg(R.add(R.add(sum, log(x, bits + 4), bits), eulerGamma(bits), bits));
}
