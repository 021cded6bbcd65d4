/**
 * @module Last term times the last ratio, |t_m²/t_{m−1}|: the next term if the ratio stayed. Reference: common practice.
 */
import { lastStep, lastStepNote } from '../conduct.js';
import type { TruncationModel } from '../model.js';
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
    const step = lastStep(known);
    if ('reason' in step) return step;
    const next = step.term * step.ratio;
    const facts = [{ name: 'ratio', value: step.ratio }];
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
