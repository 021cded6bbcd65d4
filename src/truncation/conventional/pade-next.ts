/**
 * @module The next term that a near-diagonal Padé approximant predicts.
 *
 * Method      [L/M] with L + M = m from c_0 … c_m, L = ⌊m/2⌋; expanded one order further,
 *             c_{m+1} = −Σ_j q_j c_{m+1−j}. The band is as wide as the predicted term.
 * Fails       in singular blocks (refused); an accidental zero of the prediction makes the band too narrow, so the
 *             neighbour [L+1/M−1] is named beside it.
 * Reference   M. A. Samuel, J. Ellis, M. Karliner, Phys. Rev. Lett. 74 (1995) 4380, hep-ph/9503411 [memory].
 */
import { R, padeBall, type Ball } from '../../numerics/index.js';
import { endsWithZero } from '../conduct.js';
import { nextOrder } from '../known.js';
import { refuse, tooFew, type Question, type TruncationModel } from '../model.js';
import { conventionalBands } from './bands.js';

/** Precisions tried, in bits. */
const PRECISIONS = [256, 1024, 4096];
/** A prediction is used from so many certain bits on. */
const WANTED_BITS = 40;

/** c_{m+1} of [L/M]; undefined when the entry does not exist or cannot be decided. */
function predicted(coefficients: (prec: number) => readonly Ball[], L: number, M: number): Ball | undefined {
  for (const prec of PRECISIONS) {
    const c = coefficients(prec);
    const entry = padeBall(c, L, M, prec);
    if (entry.exists === false) return undefined;
    if (entry.exists === undefined) continue;
    let next = R.ZERO;
    entry.denominator.forEach((q, j) => {
      if (j > 0) next = R.sub(next, R.mul(q, c[c.length - j] ?? R.ZERO, prec), prec);
    });
    if (R.isExactZero(next) || R.accuracyBits(next) >= WANTED_BITS) return next;
  }
  return undefined;
}

/** The predicted next term in the unit of the terms. */
function predictedTerm(question: Question, L: number, M: number): number | undefined {
  const { known, expansion } = question;
  const next = predicted(
    (prec) => known.orders.map((order) => expansion.coefficients[order - expansion.power]?.ball(prec) ?? R.ZERO),
    L,
    M,
  );
  if (next === undefined) return undefined;
  const power = R.powInt(expansion.x.ball(256), nextOrder(known), 256);
  const term = R.mul(R.mul(next, expansion.factor.ball(256), 256), power, 256);
  return R.toNumber(R.mul2exp(term, -known.unit));
}

export const padeNext: TruncationModel = {
  name: 'pade-next',
  title: 'Padé-predicted next term',
  summary: 'the next term of a near-diagonal Padé approximant',
  nature: 'conventional',
  about: 'next term',
  digits: 5,
  priors: ['conventional.double'],
  reference: 'M. A. Samuel, J. Ellis, M. Karliner, hep-ph/9503411',
  estimate(question) {
    const { known } = question;
    const refused = tooFew(known, 3, 'no approximant that predicts') ?? endsWithZero(known);
    if (refused !== undefined) return refused;
    const m = known.values.length - 1;
    const tried = [
      [Math.floor(m / 2), Math.ceil(m / 2)],
      [Math.floor(m / 2) + 1, Math.ceil(m / 2) - 1],
    ].filter(([, M = 0]) => M > 0);
    const found = tried.flatMap(([L = 0, M = 0]) => {
      const value = predictedTerm(question, L, M);
      return value === undefined || !Number.isFinite(value) ? [] : [{ label: `[${L}/${M}]`, value }];
    });
    const [best, other] = found;
    if (best === undefined)
      return refuse(
        'the near-diagonal approximants do not exist: a singular block',
        'use the last term, or cut the series one order lower',
      );
    const facts = found.map(({ label, value }) => ({ name: `next term of ${label}`, value, scaled: true }));
    const notes =
      other !== undefined && best.value * other.value < 0
        ? [`${best.label} and ${other.label} differ in the sign of the next term`]
        : [];
    return {
      kind: 'estimate',
      terms: known.values.length,
      next: best.value,
      bands: conventionalBands(best.value, question),
      facts,
      notes,
    };
  },
};
