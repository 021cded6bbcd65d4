/**
 * @module What the prescriptions ask of a series before they touch it: enough clean terms, the right growth, the right signs.
 */
import { exact, mulExact, R, Rational, signExact } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import type { Growth } from '../growth/index.js';
import type { Expansion } from '../series/index.js';
import { CONVERGED } from './neighbours.js';
import type { Refusal, Trust } from './prescription.js';
import { refusal } from './prescription.js';

/** The coefficients that stand above their noise, at most `most` of them. */
export function cleanPart(e: Expansion, growth: Growth, most: number): Expansion {
  const usable = Math.min(e.coefficients.length, growth.usableCoefficients ?? most, most);
  if (usable === e.coefficients.length) return e;
  return { ...e, coefficients: e.coefficients.slice(0, usable), relativeErrors: e.relativeErrors.slice(0, usable) };
}

/** Do singularities compete in the terms? One may then be small because they cancel in it, and says little about the next. */
export const mayCancel = (growth: Growth): boolean => growth.flags.some((f) => f.code === 'competing-singularities');

/** Refusals that any method shares: errors larger than values, too few coefficients, x not positive. */
export function inputObjection(e: Expansion, growth: Growth, variant: string, fewest: number): Refusal | undefined {
  if (growth.flags.some((f) => f.code === 'errors-exceed-values'))
    return refusal(
      variant,
      'coefficient errors exceed the coefficients',
      'give coefficients with smaller errors, or fewer of them (--order)',
    );
  const N = e.coefficients.length;
  if (N < fewest)
    return refusal(
      variant,
      `${N} usable coefficient${N === 1 ? '' : 's'}: ${fewest} are needed`,
      'give more, or more precise, coefficients',
    );
  if (signExact(e.x) <= 0)
    return refusal(variant, 'the expansion variable is not positive', 'give a positive coupling');
  return undefined;
}

/** Refusal of every method that lives in the order-1 Borel plane, when the growth does not lead there. */
export function growthObjection(growth: Growth, variant: string): Refusal | undefined {
  switch (growth.verdict) {
    case 'terminating':
    case 'convergent':
    case 'geometric':
      return refusal(variant, `the growth is ${growth.verdict}: nothing to resum`, 'use the fixed-order sum');
    case 'superfactorial':
      return growth.order === 2
        ? refusal(
            variant,
            'growth like (2n)!: the order-1 Borel transform has zero radius of convergence',
            'use the order-2 transform (borel-pade-2)',
          )
        : refusal(
            variant,
            'growth faster than any (kn)!: no Borel method of finite order applies',
            'none of the methods here sums it; the sum may not be unique',
          );
    case 'factorial':
    case 'subfactorial':
    case 'undecided':
      return undefined;
  }
}

/** Does the diagnosis of the terms confirm a complex pair? Then its poles are real physics and no contour is lifted over them. */
export const pairConfirmed = (growth: Growth): boolean =>
  growth.nearest?.kind === 'complex pair' || growth.signPattern === 'quasi-periodic';

/**
 * How many leading terms stand before a strictly alternating rest: 0 or 1 (a first term may be the free value that the
 * corrections alternate around); undefined when the signs do not alternate.
 */
export function termsBeforeAlternation(e: Expansion): 0 | 1 | undefined {
  const signs = e.coefficients.map(signExact);
  const from = (first: number): boolean =>
    signs.slice(first).every((s, n, rest) => s !== 0 && (n === 0 || s === -rest[n - 1]!));
  if (from(0)) return 0;
  return signs.length > 2 && from(1) ? 1 : undefined;
}

/** c_n x^n, exact where x and the coefficients are. */
export function bareTerms(e: Expansion): Exact[] {
  const x = e.x.rational;
  let power: Exact = exact(Rational.ONE);
  return e.coefficients.map((c, n) => {
    if (n > 0) power = x === undefined ? powerOf(e.x, n) : mulExact(power, e.x);
    return mulExact(c, power);
  });
}

/** x^n without a chain of dependent enclosures. */
function powerOf(x: Exact, n: number): Exact {
  return { ball: (prec) => R.powInt(x.ball(prec + 8), n, prec + 8) };
}

/** The standing of a value whose own error recipe gave `truncation`. */
export function trustOf(value: Ball, truncation: number | undefined): Trust {
  return truncation !== undefined && truncation <= CONVERGED * Math.abs(R.toNumber(value)) ? 'converged' : 'indicative';
}
