/**
 * @module Geometric tail, |t_m| r/(1−r) with r = |t_m/t_{m−1}| < 1: all missing terms if the last ratio stayed.
 * Reference: common practice.
 */
import { lastStep } from '../conduct.js';
import { refuse, type TruncationModel } from '../model.js';
import { conventionalBands } from './bands.js';

export const geometricTail: TruncationModel = {
  name: 'geometric-tail',
  title: 'geometric tail',
  summary: 'all missing terms if the last ratio stayed',
  nature: 'conventional',
  about: 'remainder',
  digits: 5,
  priors: ['conventional.double'],
  reference: 'common practice',
  estimate(question) {
    const { known } = question;
    const step = lastStep(known);
    if ('reason' in step) return step;
    const { term, logRatio } = step;
    if (logRatio >= 0) {
      return refuse(
        `the last ratio ${Math.exp(logRatio).toPrecision(3)} is not below 1: a geometric tail has no sum`,
        'cut the series at its least term with --order, or take a smaller coupling',
      );
    }
    const tail = term / Math.expm1(-logRatio);
    const facts = [{ name: 'ratio', value: Math.exp(logRatio) }];
    return { kind: 'estimate', terms: known.values.length, bands: conventionalBands(tail, question), facts, notes: [] };
  },
};
