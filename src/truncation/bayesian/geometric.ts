/**
 * @module The geometric model: terms bounded by c a^k, with a and c from the known ones.
 *
 * Assumption  relative terms δ_k = t_k/t_0 uniform in [−c a^k, c a^k]; priors (1+ω)(1−a)^ω and ε c^(−1−ε), c > 1.
 * Formula     see geometric-posterior; the density of the next term is even in it, so the intervals are symmetric.
 * Fails       when the terms do not fall (a cannot exceed 1), and does not know of factorial growth.
 * Reference   M. Bonvini, arXiv:2006.16293; C. Duhr, A. Huss, A. Mazeliauskas, R. Szafron, arXiv:2106.04585
 *             [abstracts seen, priors from memory; integrals re-derived].
 */
import { doesNotFall, lastStepNote } from '../conduct.js';
import type { Known } from '../known.js';
import { refuse, symmetric, tooFew, type TruncationModel } from '../model.js';
import type { Priors } from '../priors.js';
import { geometricPosterior, type GeometricPosterior } from './geometric-posterior.js';

export const ENDS_WITH_ZEROS = refuse(
  'the known coefficients end with too many zeros: the posterior cannot be normalised',
  'cut the series before the zeros with --order; if the series ends there, its sum has no truncation error',
);

/** The posterior of δ_{m+1} from the known terms. */
export function posteriorOf(known: Known, priors: Priors): GeometricPosterior | undefined {
  const [first = 0] = known.logs;
  const prior = { omega: priors['geometric.omega'], epsilon: priors['geometric.epsilon'] };
  return geometricPosterior(
    known.logs.map((l) => l - first),
    prior,
  );
}

export const geometric: TruncationModel = {
  name: 'geometric',
  title: 'geometric model',
  summary: 'terms bounded by c a^k, c and a from the known ones',
  nature: 'credible',
  about: 'next term',
  digits: 5,
  priors: ['geometric.omega', 'geometric.epsilon'],
  reference: 'M. Bonvini, arXiv:2006.16293; C. Duhr, A. Huss, A. Mazeliauskas, R. Szafron, arXiv:2106.04585',
  estimate({ known, priors }) {
    const refused =
      tooFew(known, 2, 'there is no ratio to learn from') ?? doesNotFall(known, 'terms below c a^k with a < 1');
    if (refused !== undefined) return refused;
    const posterior = posteriorOf(known, priors);
    if (posterior === undefined) return ENDS_WITH_ZEROS;
    const [first = 0] = known.logs;
    const half = (p: number): number => Math.exp(first + posterior.logHalfWidth(p));
    return {
      kind: 'estimate',
      terms: known.logs.length,
      bands: { 68: symmetric(half(0.68)), 95: symmetric(half(0.95)) },
      facts: [{ name: 'mean of a', value: posterior.meanRatio }],
      notes: lastStepNote(known),
    };
  },
};
