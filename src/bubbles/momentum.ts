/**
 * @module The momenta of a bubble chain: the distribution of virtualities that feeds the effective coupling.
 *
 *   R = (norm/β0) PV ∫ dτ/τ w(τ)/(L + ln τ),  b(u) = ∫ dτ/τ w(τ) τ^(−u),  τ = k²/Q², Im R = π (norm/β0) w(τ_L).
 * For a contour quantity w is that of the Adler function under the contour.
 *
 * Method     from the poles: those with p > 0 for τ < κ, the others for τ > κ (pole-values.ts); sin √τ/π for the potential.
 */
import { R, Rational, toNumberExact } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import { sharpened } from './point.js';
import type { ChainPoint } from './point.js';
import { lowCoefficients } from './cut.js';
import { chainCoefficients, schemeExponent } from './coefficients.js';
import { distributionAt } from './pole-values.js';
import type { Quantity } from './quantity.js';
import { sumOver } from './tower-sum.js';

function distributionBall(quantity: Quantity, tau: Rational, prec: number): Ball {
  return quantity.components.reduce<Ball>((sum, component) => {
    if (component.rest !== undefined) return R.add(sum, component.rest.distribution(tau, prec), prec);
    const x = tau.div(component.base);
    return R.add(sum, sumOver(component, distributionAt(x, prec), prec), prec);
  }, R.ZERO);
}

/** w(τ), τ > 0, in units of the norm. */
export const distribution = (quantity: Quantity, tau: Rational): Exact =>
  sharpened((prec) => distributionBall(quantity, tau, prec));

export interface OrderScale {
  readonly n: number;
  readonly coefficient: Exact;
  /** Mean of ln(k²/Q²) with the weight w(τ) (5/3 − ln τ)^n of the n-th coefficient; the weight may change sign. */
  readonly meanLog: number;
  /** Share of k < Q in the coefficient, and its own mean. */
  readonly share: number;
  readonly meanLogBelow: number;
  /** Mean of the rest, k > Q. */
  readonly meanLogAbove: number;
}

/**
 * The scale that feeds each coefficient: c_n = ∫ dτ/τ w (C − ln τ)^n with C = 5/3 + ln(μ²/Q²), so that the mean of ln τ is
 * C − c_(n+1)/c_n, for the whole and for the part k < Q alike.
 */
export function orderScales(quantity: Quantity, point: ChainPoint, length: number): OrderScale[] {
  const all = chainCoefficients(quantity, length + 1, point.ratio);
  const low = lowCoefficients(quantity, point.ratio, Rational.ONE, length + 1);
  const constant = R.toNumber(schemeExponent(point.ratio, 80));
  return Array.from({ length }, (_, n) => {
    const [c, next, b, bNext] = [all[n]!, all[n + 1]!, low[n]!, low[n + 1]!].map(toNumberExact) as [
      number,
      number,
      number,
      number,
    ];
    return {
      n,
      coefficient: all[n]!,
      meanLog: constant - next / c,
      share: b / c,
      meanLogBelow: constant - bNext / b,
      meanLogAbove: constant - (next - bNext) / (c - b),
    };
  });
}
