/** @module Last term: the truncation error is the size of the last known term. Reference: common practice. */
import { endsWithZero } from '../conduct.js';
import { tooFew, type TruncationModel } from '../model.js';
import { conventionalBands } from './bands.js';

export const lastTerm: TruncationModel = {
  name: 'last-term',
  title: 'last term',
  summary: 'the size of the last known term',
  nature: 'conventional',
  about: 'next term',
  digits: 5,
  priors: ['conventional.double'],
  reference: 'common practice',
  estimate(question) {
    const { known } = question;
    const refused = tooFew(known, 1, 'there is no last term') ?? endsWithZero(known);
    if (refused !== undefined) return refused;
    const bands = conventionalBands(known.values.at(-1) ?? 0, question);
    return { kind: 'estimate', terms: known.values.length, bands, facts: [], notes: [] };
  },
};
