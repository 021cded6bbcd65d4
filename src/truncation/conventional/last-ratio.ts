/**
 * @module Last term times the last ratio, |t_m²/t_{m−1}|: the next term if the ratio stayed. Reference: common practice.
 */
import { endsWithZero, lastLogRatio, lastStepNote } from '../conduct.js';
import { refuse, tooFew, type TruncationModel } from '../model.js';
import { conventionalBands } from './bands.js';

export const lastRatio: TruncationModel = {
  name: 'last-ratio',
  title: 'last term times ratio',
  summary: 'the next term if the last ratio stayed',
  nature: 'conventional',
  about: 'next term',
  digits: 5,
  priors: ['conventional.double'],
  reference: 'common practice',
  estimate(question) {
    const { known } = question;
    const refused = tooFew(known, 2, 'there is no ratio') ?? endsWithZero(known);
    if (refused !== undefined) return refused;
    const logRatio = lastLogRatio(known);
    if (logRatio === undefined)
      return refuse('the term before the last one is zero: there is no ratio', 'use the last term');
    const ratio = Math.exp(logRatio) * Math.sign((known.values.at(-1) ?? 0) * (known.values.at(-2) ?? 0));
    const next = (known.values.at(-1) ?? 0) * ratio;
    const facts = [{ name: 'ratio', value: ratio }];
    return {
      kind: 'estimate',
      terms: known.values.length,
      next,
      bands: conventionalBands(next, question),
      facts,
      notes: lastStepNote(known),
    };
  },
};
