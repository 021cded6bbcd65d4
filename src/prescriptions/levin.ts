/**
 * @module Levin's transformations t, u, d and v of an alternating series.
 *
 * Each variant's estimate of highest order from s_0 on. Truncation error: the larger of its last two steps.
 * The central member is the one with the smallest such error.
 * Reference: D. Levin, Int. J. Comput. Math. B 3 (1973) 371; E. J. Weniger, arXiv:math/0306302 (from memory).
 */
import { levinDiagonal } from '../sequences/index.js';
import type { LevinVariant } from '../sequences/index.js';
import { sequenceSum } from './sequence-sum.js';
import type { Outcome, Prescription, Sum } from './prescription.js';
import { refusal } from './prescription.js';

/** Most terms used: each order costs about a digit of working precision. Heuristic. */
const MOST = 60;
const VARIANTS: readonly LevinVariant[] = ['t', 'u', 'd', 'v'];

export const levin: Prescription = {
  name: 'levin',
  title: 'Levin transformations',
  summary: 'Levin t, u, d, v on the terms of an alternating series',
  family: 'coupling',
  apply(e, growth, request): readonly Outcome[] {
    if (growth.verdict === 'superfactorial')
      return [
        refusal(
          't, u, d, v',
          'growth faster than n!: Levin transforms need not converge',
          'use the order-2 transform (borel-pade-2), or wynn-epsilon',
        ),
      ];
    const wanted = request.only === undefined ? VARIANTS : VARIANTS.filter((v) => v === request.only);
    const outcomes = wanted.map((variant) =>
      sequenceSum(e, growth, request, {
        variant,
        fewest: 4,
        most: MOST,
        estimates: (field, terms) => levinDiagonal(field, terms, variant),
      }),
    );
    // One refusal is enough when the reason is the series and not the variant.
    const first = outcomes[0];
    if (first?.kind === 'refusal' && outcomes.every((o) => o.kind === 'refusal' && o.reason === first.reason))
      return [{ ...first, variant: request.only ?? 't, u, d, v' }];
    const best = outcomes
      .filter((o): o is Sum => o.kind === 'sum')
      .sort((a, b) => (a.truncation ?? Infinity) - (b.truncation ?? Infinity))[0];
    return outcomes.map((o) => (o === best ? { ...o, central: true } : o));
  },
};
