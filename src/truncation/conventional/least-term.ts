/**
 * @module Least term: a divergent series cut at its smallest term is wrong by about that term.
 *
 * Assumption  the terms have reached their minimum and grow behind it. The band belongs to the sum through the least term,
 *             not to the sum of all known terms. Where ultraviolet and infrared growth compete the smallest term alone is not
 *             trusted: the band then reaches to the ends of the bracket of bracket.ts.
 * Reference   F. W. J. Olver, Asymptotics and Special Functions (1974), ch. 14; R. B. Dingle, Asymptotic Expansions (1973)
 *             [both from memory].
 */
import { competingBracket } from '../bracket.js';
import { leastIndex } from '../known.js';
import { lastNonZero } from '../conduct.js';
import { refuse, tooFew, type Band, type Question, type TruncationModel } from '../model.js';
import { conventionalBands } from './bands.js';

/** The bracket as distances from the sum through the least term; undefined where nothing competes or no sum of it is known. */
function reach(question: Question, least: number): (Band & { readonly note: string }) | undefined {
  const bracket = competingBracket(question);
  if (bracket?.sums === undefined) return undefined;
  const { known } = question;
  const sum = known.values.slice(0, least + 1).reduce((a, b) => a + b, 0);
  const order = (n: number): number => (known.orders[0] ?? 0) + n;
  const { low, high, through } = bracket.sums;
  return {
    low: low - sum,
    high: high - sum,
    note: `ultraviolet and infrared growth compete: the band reaches to all sums through orders ${order(bracket.from)} to ${order(through)}`,
  };
}

export const leastTerm: TruncationModel = {
  name: 'least-term',
  title: 'least term',
  summary: 'the smallest term, for the sum cut there; the bracket of sums where two kinds of growth compete',
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
    const size = Math.abs(known.values[least] ?? 0);
    const bracket = reach(question, least);
    const notes = [
      `belongs to the sum through order ${known.orders[least] ?? 0}`,
      ...(bracket === undefined ? [] : [bracket.note]),
    ];
    const shared = { kind: 'estimate', terms: least + 1, facts: [], notes } as const;
    if (bracket === undefined) return { ...shared, bands: conventionalBands(size, question) };
    const double = question.priors['conventional.double'];
    const wide = { low: Math.min(-size, bracket.low), high: Math.max(size, bracket.high) };
    return { ...shared, bands: { 68: wide, 95: { low: double * wide.low, high: double * wide.high } } };
  },
};
