/**
 * @module The abc model: terms scattered about b a^k, so that signs count and the interval is asymmetric.
 *
 * Assumption  δ_k/a^k − b uniform in [−c, c] for the relative terms δ_k = t_k/t_0; priors ½(1+ω)(1−|a|)^ω on (−1,1) and
 *             ε η^ε/(2ξ c^(2+ε)) for c > η, |b| < ξ c.
 * Formula     see abc-posterior; the interval is the shortest one that holds the probability.
 * Fails       when the terms do not fall, and does not know of factorial growth.
 * Reference   C. Duhr, A. Huss, A. Mazeliauskas, R. Szafron, JHEP 09 (2021) 122, arXiv:2106.04585
 *             [abstract seen, priors from memory; integrals re-derived].
 */
import { doesNotFall, lastStepNote } from '../conduct.js';
import { refuse, tooFew, type Band, type TruncationModel } from '../model.js';
import { shortestIntervals } from '../numeric/predictive.js';
import { abcPosterior } from './abc-posterior.js';
import { ENDS_WITH_ZEROS } from './geometric.js';

/** Largest difference of the two quadrature rules in the content of an interval that is let through. */
const UNSETTLED = 1e-3;

export const abc: TruncationModel = {
  name: 'abc',
  title: 'asymmetric (abc) model',
  summary: 'terms scattered about b a^k within c a^k, with signs',
  nature: 'credible',
  about: 'next term',
  digits: 4,
  priors: ['abc.omega', 'abc.epsilon', 'abc.xi', 'abc.eta'],
  reference: 'C. Duhr, A. Huss, A. Mazeliauskas, R. Szafron, arXiv:2106.04585',
  estimate({ known, priors }) {
    const refused =
      tooFew(known, 2, 'there is no ratio to learn from') ?? doesNotFall(known, 'terms of the size a^k with |a| < 1');
    if (refused !== undefined) return refused;
    const [first = 0] = known.logs;
    const lead = Math.sign(known.values[0] ?? 1);
    const posterior = abcPosterior(
      known.logs.map((l, k) => ({ sign: Math.sign(known.values[k] ?? 0) * lead, log: l - first })),
      { omega: priors['abc.omega'], epsilon: priors['abc.epsilon'], xi: priors['abc.xi'], eta: priors['abc.eta'] },
    );
    if (posterior === undefined) return ENDS_WITH_ZEROS;
    const [one, two] = shortestIntervals(posterior, [0.68, 0.95]);
    const ends = [one?.low, one?.high, two?.low, two?.high].map((y) => y ?? Number.NaN);
    if (one === undefined || two === undefined || ends.some((y) => !(posterior.ruleDifference(y) < UNSETTLED))) {
      return refuse(
        'the integral over the ratio does not settle for these terms and priors',
        'use the geometric model, or change the priors of the abc model',
      );
    }
    const unit = lead * Math.exp(first + posterior.logUnit);
    const band = ({ low, high }: Band): Band =>
      unit > 0 ? { low: low * unit, high: high * unit } : { low: high * unit, high: low * unit };
    return {
      kind: 'estimate',
      terms: known.logs.length,
      next: posterior.mean * unit,
      bands: { 68: band(one), 95: band(two) },
      facts: [{ name: 'mean of a', value: posterior.meanRatio }],
      notes: lastStepNote(known),
    };
  },
};
