/**
 * @module The coefficient that a prescription implies beyond the ones it was built from.
 *
 * Purpose    what a back-test may hold against the next known coefficient.
 * Method     Padé entries: q_0 b_n = −Σ_{j>=1} q_j b_{n−j} for n > L + M; back to c_n by the weights of the transform.
 *            Singularity model: the strengths times the coefficients of the branch points, n-th ones. The other methods:
 *            next-coefficient-borel.ts, next-coefficient-scale.ts. Sums that are no function of the coefficients alone
 *            (fixed order, least term) and sequence transformations imply none here.
 * Bound      enclosures of what the approximant implies; nothing is said of the truth.
 * Reference  M. A. Samuel, J. Ellis, M. Karliner, Phys. Rev. Lett. 74 (1995) 4380 (Padé prediction; from memory).
 */
import { exact, R, Rational } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import { borelTransform, borelTransformOrder2, branchCoefficients, fitModel } from '../borel/index.js';
import type { Growth } from '../growth/index.js';
import type { Expansion } from '../series/index.js';
import { leroyParameter } from './borel-pade.js';
import { knownFactors } from './borel-partial-pade.js';
import {
  conformalImplies,
  dlogImplies,
  hypergeometricImplies,
  padeImplies,
  partialImplies,
  quadraticImplies,
} from './next-coefficient-borel.js';
import { chargeImplies, optimumImplies, terminantImplies } from './next-coefficient-scale.js';
import { modelUsed } from './singularity-model.js';

/** Working precision in bits: rational approximants of a few dozen coefficients cancel much. */
const PREC = 512;
/** The zeros of a discriminant are found along the way: fewer bits. */
const QUADRATIC_PREC = 192;

type Transform = (c: readonly Exact[]) => readonly Exact[];

/** Coefficient n of what a transform of the series is, times n! or what the transform has in its place. */
function untransformed(next: Ball | undefined, n: number, transform: Transform): Ball | undefined {
  // The transform of 1, 1, 1, … is one over the weights.
  const weight = transform(Array.from({ length: n + 1 }, () => exact(Rational.ONE)))[n];
  return next === undefined || weight === undefined ? undefined : R.div(next, weight.ball(PREC), PREC);
}

const fromPade = (c: readonly Exact[], variant: string, transform: Transform): Ball | undefined =>
  untransformed(padeImplies(transform(c), variant, PREC), c.length, transform);

function fromModel(e: Expansion): Ball | undefined {
  const n = e.coefficients.length;
  const model = modelUsed(e);
  const fit = model.length === 0 ? undefined : fitModel(e.coefficients, model, PREC);
  return fit?.strengths.reduce<Ball>((sum, s, i) => {
    const own = model[i] === undefined ? undefined : branchCoefficients(model[i], n + 1)[n];
    return own === undefined ? sum : R.add(sum, R.mul(s, own.ball(PREC), PREC), PREC);
  }, R.ZERO);
}

/**
 * c_N as the member `variant` of the prescription `name` implies it from c_0 … c_{N−1}; undefined where the prescription
 * implies none, or does not use all coefficients.
 */
export function nextCoefficient(name: string, variant: string, e: Expansion, growth: Growth): Ball | undefined {
  const c = e.coefficients;
  const plain = (list: readonly Exact[]): readonly Exact[] => borelTransform(list);
  const borel = (next: Ball | undefined): Ball | undefined => untransformed(next, c.length, plain);
  const found = ((): Ball | undefined => {
    switch (name) {
      case 'pade':
        return fromPade(c, variant, (list) => list);
      case 'borel-pade':
        return fromPade(c, variant, plain);
      case 'borel-leroy-pade': {
        const b = leroyParameter(e, growth);
        return b === undefined ? undefined : fromPade(c, variant, (list) => borelTransform(list, b));
      }
      case 'borel-pade-2':
        return fromPade(c, variant, borelTransformOrder2);
      case 'borel-dlog':
        return borel(dlogImplies(c, variant, PREC));
      case 'borel-partial-pade':
        return borel(partialImplies(c, knownFactors(e), variant, PREC));
      case 'borel-quadratic':
        return borel(quadraticImplies(c, variant, QUADRATIC_PREC));
      case 'borel-conformal':
        return borel(conformalImplies(e, variant, PREC));
      case 'borel-hypergeometric':
        return borel(variant === `${c.length} coefficients` ? hypergeometricImplies(c, PREC) : undefined);
      case 'singularity-model':
        return fromModel(e);
      case 'fac':
        return variant === `effective charge, ${c.length} terms` ? chargeImplies(e, PREC) : undefined;
      case 'pms':
        return optimumImplies(e, variant, PREC);
      case 'terminant':
        return terminantImplies(e, variant, PREC);
      default:
        return undefined;
    }
  })();
  return found !== undefined && found.rad < Infinity ? found : undefined;
}
