/**
 * @module The subtraction of the pole mass, ∫_0^∞ du e^(−u/a) G_0(u)/u as a finite part: see pole-mass.ts.
 *
 * Method     g_n by power series in balls, the Γ functions through ζ values.
 * Bound      G is analytic for |u| < 5/2 and |G| <= 150 on |u| = 2, so |g_n| <= 150·2^(−n), and for a < 1 the terms after N
 *            add up to less than 150 (a/2)^N/(1 − a/2).
 */
import { R, ballField, eulerGamma, log } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';
import { ballConstants, gammaProduct } from './gamma-series.js';
import type { ConstantRing } from './gamma-series.js';
import { mulSeries, reciprocal } from '../qcd/index.js';

/** Bound of |G| on |u| = 2 (the maximum is 139.6). */
export const SUBTRACTION_BOUND = 150;

/** g_0 … g_(N−1) over a ring: Γ(4+2u) = (3+2u)(2+2u)(1+2u)Γ(1+2u), Γ(2+u) = (1+u)Γ(1+u), Γ(3+u) = (2+u)(1+u)Γ(1+u). */
export function subtraction<T>(ring: ConstantRing<T>, length: number): T[] {
  const poly = (...c: number[]): T[] => c.map((n) => ring.integer(n));
  const product = (a: readonly T[], b: readonly T[]): T[] => mulSeries(ring, a, b, length);
  const gammas = gammaProduct(
    ring,
    [
      { slope: 2, power: 1 },
      { slope: -1, power: -1 },
      { slope: 1, power: -3 },
    ],
    length,
  );
  // (3+2u)² (2+2u)(1+2u) / [(1+u)³ (2+u)] / 3 = 2 (3+2u)² (1+2u) / [3 (1+u)² (2+u)].
  const top = product(product(poly(3, 2), poly(3, 2)), poly(-2, -4));
  const bottom = product(product(poly(1, 1), poly(1, 1)), poly(6, 3));
  return product(product(top, reciprocal(ring, bottom, length)), gammas);
}

/** Finite part of ∫ e^(−u/a) G_0(u)/u du = g_0 (ln a − γ) + Σ_{n>=1} g_n a^n/n, 0 < a < 1. */
export function subtractionLaplace(a: Ball, prec: number): Ball {
  const size = R.toNumber(a) * 1.0001;
  if (!(size < 1)) return R.INDETERMINATE;
  const length = Math.max(2, Math.ceil((prec + 10) / -Math.log2(size / 2)));
  const g = subtraction(ballConstants(ballField(prec), prec), length);
  let sum = R.mul(g[0]!, R.sub(log(a, prec), eulerGamma(prec), prec), prec);
  let power = a;
  for (let n = 1; n < length; n++) {
    sum = R.add(sum, R.div(R.mul(g[n]!, power, prec), R.fromNumber(n), prec), prec);
    power = R.mul(power, a, prec);
  }
  return R.addError(sum, (SUBTRACTION_BOUND / (1 - size / 2)) * 1.01, Math.ceil(length * Math.log2(size / 2)));
}
