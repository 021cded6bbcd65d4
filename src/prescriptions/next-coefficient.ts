/**
 * @module The coefficient that a prescription implies beyond the ones it was built from.
 *
 * Purpose    what a back-test may hold against the next known coefficient.
 * Method     [L/M] of a transform b_n: q_0 b_n = −Σ_{j>=1} q_j b_{n−j} for n > L + M; back to c_n by the weights of the
 *            transform. Singularity model: the strengths times the coefficients of the branch points, n-th ones.
 * Bound      enclosures of what the approximant implies; nothing is said of the truth.
 * Reference  M. A. Samuel, J. Ellis, M. Karliner, Phys. Rev. Lett. 74 (1995) 4380 (Padé prediction; from memory).
 */
import { exact, R, Rational } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import { borelTransform, borelTransformOrder2, branchCoefficients, fitModel, padeOf } from '../borel/index.js';
import type { Growth } from '../growth/index.js';
import type { Expansion } from '../series/index.js';
import { leroyParameter } from './borel-pade.js';
import { placeOf } from './climb.js';
import { modelUsed } from './singularity-model.js';

/** Working precision in bits: rational approximants of a few dozen coefficients cancel much. */
const PREC = 512;

type Transform = (c: readonly Exact[]) => readonly Exact[];

/** Next coefficient of [L/M] of the transformed series; undefined where the entry does not use all coefficients. */
function fromPade(c: readonly Exact[], variant: string, transform: Transform): Ball | undefined {
  const place = placeOf(variant);
  const n = c.length;
  if (place === undefined || place[0] + place[1] + 1 !== n) return undefined;
  const b = transform(c);
  const entry = padeOf(b, place[0], place[1], PREC);
  const [q0, ...q] = entry.exists === true ? entry.denominator : [];
  if (q0 === undefined) return undefined;
  const next = q.reduce<Ball>((sum, qj, j) => {
    const before = b[n - 1 - j];
    return before === undefined ? sum : R.sub(sum, R.mul(qj, before.ball(PREC), PREC), PREC);
  }, R.ZERO);
  // The transform of 1, 1, 1, … is one over the weights.
  const weight = transform(Array.from({ length: n + 1 }, () => exact(Rational.ONE)))[n];
  return weight === undefined ? undefined : R.div(R.div(next, q0, PREC), weight.ball(PREC), PREC);
}

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
  const found = ((): Ball | undefined => {
    switch (name) {
      case 'pade':
        return fromPade(c, variant, (list) => list);
      case 'borel-pade':
        return fromPade(c, variant, (list) => borelTransform(list));
      case 'borel-leroy-pade': {
        const b = leroyParameter(e, growth);
        return b === undefined ? undefined : fromPade(c, variant, (list) => borelTransform(list, b));
      }
      case 'borel-pade-2':
        return fromPade(c, variant, borelTransformOrder2);
      case 'singularity-model':
        return fromModel(e);
      default:
        return undefined;
    }
  })();
  return found !== undefined && found.rad < Infinity ? found : undefined;
}
