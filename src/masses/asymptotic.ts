/**
 * @module The leading renormalon of the pole mass: coefficients of unit strength, and what its Borel integral needs.
 *
 * Formulas   M ∋ N m Σ_{n≥0} a_n α_s^(n+1) at μ = m, a_n = t^(−n) Σ_k c_k Γ(n+1+b−k)/Γ(1+b−k), t = 2π/β_0, b = β_1/(2β_0²),
 *            c_0 = 1, c_1 and c_2 from the beta function (qcd/expected.ts). In the coupling with
 *            β = −b_0 α²/(1 − (b_1/b_0) α) the same Λ-dependence needs no c_k beyond c_0.
 * Reference  M. Beneke, Phys. Lett. B344 (1995) 341; A. Pineda, hep-ph/0105008 (c_1, c_2);
 *            N. Brambilla, J. Komijani, A. Kronfeld, A. Vairo, arXiv:1712.04983 (geometric coupling).
 */
import { Rational, addExact, exact, mulExact, toNumberExact, type Exact } from '../numerics/index.js';
import { betaCoefficients, divisorSize, expectedSingularity } from '../qcd/index.js';
import type { SeriesInA } from './definition.js';

/** Corrections c_k that the published schemes use. */
const CORRECTIONS = 2;
/** Orders to which the subtraction series are made: those of the pole mass. */
const ORDERS = 4;

export interface Renormalon {
  /** b = β_1/(2β_0²). */
  readonly b: Rational;
  /** 2π/β_0: position in the Borel variable of α_s. */
  readonly t: Exact;
  /** c_0 = 1, c_1, c_2. */
  readonly c: readonly Exact[];
}

const kept = new Map<number, Renormalon>();

/** Position and shape of the singularity for n_l flavours. */
export function renormalonOf(light: number): Renormalon {
  let found = kept.get(light);
  if (found === undefined) {
    const expected = expectedSingularity({ flavours: light, dimension: 1, divisor: '1' });
    const b = expected.exponent.rational;
    if (b === undefined) throw new RangeError('the exponent of the leading renormalon is rational');
    found = {
      b: b.sub(Rational.ONE),
      t: expected.t,
      c: [exact(1), ...expected.corrections.slice(0, CORRECTIONS)],
    };
    kept.set(light, found);
  }
  return found;
}

/** Γ(n+1+p)/Γ(1+p). */
function rising(p: Rational, n: number): Rational {
  let product = Rational.ONE;
  for (let k = 1; k <= n; k++) product = product.mul(p.add(Rational.of(k)));
  return product;
}

/** 2β_0 for n_l flavours: t^(−1) in a = α_s/(4π). */
const inverseT = (light: number): Exact => mulExact(exact(2), betaCoefficients(light)[0] ?? exact(0));

/** N = 1: the coefficient of a^(n+1) is 4π (2β_0)^n Σ_k c_k Γ(n+1+b−k)/Γ(1+b−k). */
function coefficients(light: number, c: readonly Exact[], orders: number, from: number): Exact[] {
  const { b } = renormalonOf(light);
  let power = divisorSize('4*pi');
  return Array.from({ length: orders }, (_, n) => {
    let sum = exact(0);
    c.forEach((ck, k) => {
      sum = addExact(sum, mulExact(ck, exact(rising(b.sub(Rational.of(k)), n))));
    });
    const value = n < from ? exact(0) : mulExact(power, sum);
    power = mulExact(power, inverseT(light));
    return value;
  });
}

/** The asymptotic series in the MSbar coupling. */
export const ASYMPTOTIC_SERIES: SeriesInA = {
  key: 'asymptotic',
  coefficients: (light) => coefficients(light, renormalonOf(light).c, ORDERS, 0),
};

/** The same without its first term. */
export const ASYMPTOTIC_FROM_SECOND: SeriesInA = {
  key: 'asymptotic from α²',
  coefficients: (light) => coefficients(light, renormalonOf(light).c, ORDERS, 1),
};

/** The series in the geometric coupling. */
export const GEOMETRIC_SERIES: SeriesInA = {
  key: 'geometric',
  coefficients: (light) => coefficients(light, [exact(1)], ORDERS, 0),
};

/** a_n of α_s^(n+1), unit strength, n = 0 … count − 1, as doubles: the continuation beyond the known orders. */
export function asymptoticNumbers(light: number, count: number): number[] {
  const fourPi = toNumberExact(divisorSize('4*pi'));
  return coefficients(light, renormalonOf(light).c, count, 0).map((c, n) => toNumberExact(c) / fourPi ** (n + 1));
}
