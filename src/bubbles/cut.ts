/**
 * @module A bubble chain with a hard cut at the virtuality k² = μ_f² of the gluon: k < μ_f and k > μ_f apart.
 *
 *   R = R_< + R_>,  R_< = (norm/β0) ∫_0^{τ_f} dτ/τ w(τ)/(L + ln τ),  τ_f = μ_f²/Q².
 * In the Borel plane B_<(u) = e^(5u/3) τ_f^(−u) Σ_{p>0} (principal part of τ_f^u b(u) at p): the towers of the infrared
 * poles with κ = τ_f, which then fall off like τ_f^p. B_> = B − B_< has no infrared pole: its coefficients are a geometric
 * window μ_f < k < Q and the ultraviolet part; its Borel sum has no imaginary part. Contour kernels act on both parts.
 *
 * Bound      enclosures; R_> = R_PV − R_<.
 */
import { R, Rational, ballField, exact, exactReal, log } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import { mulSeries, refuse } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import { chainSum, componentIntegral } from './borel-sum.js';
import { chainCoefficients, schemeExponent } from './coefficients.js';
import { ballConstants, exponential } from './gamma-series.js';
import { kernelSeries } from './kernel-series.js';
import { landauOverQ, logLength, overBeta, sharpened } from './point.js';
import type { ChainPoint } from './point.js';
import { InversePowers, taylorAt } from './pole-values.js';
import type { Quantity } from './quantity.js';
import { polesWithin } from './tower.js';
import type { Component, Pole } from './tower.js';
import { sumOver } from './tower-sum.js';

/** Why there is nothing to cut, or not there: μ_f/Q as an exact number. */
export function cutObjection(quantity: Quantity, point: ChainPoint, cut: Rational): Refusal | undefined {
  if (!quantity.euclidean) {
    return refuse(
      `${quantity.title} has no integral over a Euclidean gluon momentum: phase space is cut by nothing but the mass`,
      'choose another quantity; its momenta are seen through --view dispersive',
    );
  }
  if (cut.cmp(Rational.ONE) > 0) {
    return refuse(
      `the cut mu_f = ${cut.toNumber().toPrecision(4)} ${quantity.hard} lies above the hard scale: nothing of the short distances would be left`,
      `give a cut between ${landauOverQ(point).toPrecision(3)} and 1 (in units of ${quantity.hard})`,
    );
  }
  const landau = landauOverQ(point);
  if (cut.toNumber() > landau * 1.0001) return undefined;
  return refuse(
    `the cut mu_f = ${cut.toNumber().toPrecision(4)} ${quantity.hard} lies below the Landau pole of the chain's coupling at ${landau.toPrecision(3)} ${quantity.hard}: what is left above it would still be ambiguous`,
    `give a cut between ${landau.toPrecision(3)} and 1 (in units of ${quantity.hard})`,
  );
}

const LOW = { side: 'infrared' } as const;

/** R_<, principal value; all of it, or of one Borel pole alone. */
export function lowPart(quantity: Quantity, point: ChainPoint, cut: Rational, only?: Rational): Exact {
  const base = cut.mul(cut);
  return sharpened((prec) => {
    const L = logLength(point, prec);
    const sum = quantity.components.reduce<Ball>((total, component) => {
      const part = only === undefined ? component : alone(component, only);
      return R.add(total, componentIntegral(part, 'laplace', L, prec, { ...LOW, base }), prec);
    }, R.ZERO);
    return R.mul(overBeta(quantity, point, prec), sum, prec);
  });
}

/** A component without its other poles. */
function alone(component: Component, at: Rational): Component {
  const poles: Pole[] = polesWithin(component, at.toNumber() + 0.25).filter((pole) => pole.at.equals(at));
  return { ...component, poles, towers: [] };
}

export interface CutSum {
  /** k > μ_f: without ambiguity. */
  readonly high: Exact;
  /** k < μ_f: its principal value; all of the imaginary part belongs here. */
  readonly low: Exact;
  readonly whole: Exact;
}

export function cutSum(quantity: Quantity, point: ChainPoint, cut: Rational): CutSum {
  const { pv } = chainSum(quantity, point);
  const low = lowPart(quantity, point, cut);
  return { low, whole: pv, high: sharpened((prec) => R.sub(pv.ball(prec), low.ball(prec), prec)) };
}

/** [u^n] of B_<: e^(5u/3) (μ²/Q²)^u τ_f^(−u) K(u) Σ … */
function lowBorel(quantity: Quantity, ratio: Exact, base: Rational, length: number, prec: number): Ball[] {
  const ring = ballConstants(ballField(prec), prec);
  const exponent = R.sub(schemeExponent(ratio, prec), log(R.fromRational(base, prec), prec), prec);
  let sum = Array.from({ length }, (): Ball => R.ZERO);
  for (const component of quantity.components) {
    const powers = new InversePowers(prec);
    const bare = Array.from({ length }, (_, n) =>
      sumOver(component, taylorAt(n, powers, prec), prec, { ...LOW, base }),
    );
    const own = mulSeries(ring, bare, kernelSeries(component.kernel, ring, length), length);
    sum = sum.map((x, n) => R.add(x, own[n]!, prec));
  }
  return mulSeries(ring, sum, exponential(ring, exponent, length), length);
}

/** Coefficients of the part k < μ_f, to order length − 1. μ_f = Q gives everything below the hard scale. */
export function lowCoefficients(quantity: Quantity, ratio: Exact, cut: Rational, length: number): Exact[] {
  const base = cut.mul(cut);
  let last: { readonly prec: number; readonly values: readonly Ball[] } | undefined;
  const at = (prec: number): readonly Ball[] => {
    for (let work = prec + 64 + 4 * length; last === undefined || last.prec < prec; work *= 2) {
      let factorial = 1n;
      const values = lowBorel(quantity, ratio, base, length, work).map((c, n) => {
        if (n > 1) factorial *= BigInt(n);
        return R.mul(c, R.fromNumber(factorial), work);
      });
      const reached = Math.min(...values.map((v) => R.accuracyBits(v)));
      if (reached >= prec || work > 8 * prec + 4096) last = { prec: Math.max(prec, Math.min(reached, work)), values };
    }
    return last.values;
  };
  return Array.from({ length }, (_, n) => exactReal((prec) => at(prec)[n] ?? R.INDETERMINATE));
}

export interface CutCoefficients {
  readonly whole: readonly Exact[];
  readonly low: readonly Exact[];
  /** μ_f < k < Q. */
  readonly window: readonly Exact[];
  /** k > Q, and the subtraction of a mass. */
  readonly ultraviolet: readonly Exact[];
  /** k > μ_f: window and ultraviolet. */
  readonly high: readonly Exact[];
}

const difference = (a: readonly Exact[], b: readonly Exact[]): Exact[] =>
  a.map((x, n) => sharpened((prec) => R.sub(x.ball(prec), b[n]!.ball(prec), prec)));

/** The coefficients by momentum. */
export function cutCoefficients(quantity: Quantity, ratio: Exact, cut: Rational, length: number): CutCoefficients {
  const whole = chainCoefficients(quantity, length, ratio);
  const low = lowCoefficients(quantity, ratio, cut, length);
  const below = cut.equals(Rational.ONE) ? low : lowCoefficients(quantity, ratio, Rational.ONE, length);
  return {
    whole,
    low,
    window: cut.equals(Rational.ONE) ? low.map(() => exact(0)) : difference(below, low),
    ultraviolet: difference(whole, below),
    high: difference(whole, low),
  };
}

/** Where the effective coupling is evaluated at the cut: 1/(β0 (L + ln τ_f)) as a double. */
export function couplingAtCut(point: ChainPoint, cut: Rational): number {
  const L = R.toNumber(logLength(point, 80));
  const beta = (33 - 2 * point.flavours) / (12 * Math.PI);
  return 1 / (beta * (L + 2 * Math.log(cut.toNumber())));
}
