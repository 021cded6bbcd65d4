/**
 * @module Least term: a divergent series cut at its smallest term is wrong by about that term.
 *
 * Assumption  the terms have reached their minimum and grow behind it. The band belongs to the sum through the least term,
 *             not to the sum of all known terms.
 * Reference   F. W. J. Olver, Asymptotics and Special Functions (1974), ch. 14; R. B. Dingle, Asymptotic Expansions (1973)
 *             [both from memory].
 */
import { leastIndex } from '../known.js';
import { lastNonZero } from '../conduct.js';
import { refuse, tooFew, type TruncationModel } from '../model.js';
import { conventionalBands } from './bands.js';

export const leastTerm: TruncationModel = {
  name: 'least-term',
  title: 'least term',
  summary: 'the smallest term, for the sum cut there',
  nature: 'conventional',
  about: 'remainder',
  digits: 5,
  priors: ['conventional.double'],
  reference: 'F. W. J. Olver 1974; R. B. Dingle 1973',
  estimate(question) {
    const { known } = question;
    const refused = tooFew(known, 2, 'there is no least term');
    if (refused !== undefined) return refused;
    const least = leastIndex(known);
    if (least === lastNonZero(known)) {
      return refuse(
        'the least term is not reached: the terms still fall at the last order',
        'use the last term, or a larger coupling',
      );
    }
    const bands = conventionalBands(known.values[least] ?? 0, question);
    const notes = [`belongs to the sum through order ${known.orders[least] ?? 0}`];
    return { kind: 'estimate', terms: least + 1, bands, facts: [], notes };
  },
};
