/**
 * @module Weniger's δ transformation of an alternating series.
 *
 * The estimate of highest order from s_0 on; the last term serves as remainder estimate. The best of the sequence
 * transformations for alternating n! growth. Truncation error: the larger of the last two steps.
 * Reference: E. J. Weniger, Comput. Phys. Rep. 10 (1989) 189, arXiv:math/0306302, eq. (8.4-4) (from memory).
 */
import { wenigerDiagonal } from '../sequences/index.js';
import { sequenceSum } from './sequence-sum.js';
import type { Outcome, Prescription } from './prescription.js';
import { refusal } from './prescription.js';

/** Most terms used: each order costs about a digit of working precision. Heuristic. */
const MOST = 60;

export const wenigerDelta: Prescription = {
  name: 'weniger-delta',
  title: "Weniger's δ transformation",
  summary: 'factorial-series transformation of an alternating series, best for n! growth',
  family: 'coupling',
  apply(e, growth, request): readonly Outcome[] {
    const variant = 'δ from the first sum';
    if (growth.verdict === 'superfactorial' && growth.order !== 2)
      return [
        refusal(
          variant,
          'growth faster than (2n)!: nothing is known about convergence',
          'none of the methods here sums it; the sum may not be unique',
        ),
      ];
    const outcome = sequenceSum(e, growth, request, {
      variant,
      fewest: 4,
      most: MOST,
      estimates: wenigerDiagonal,
      ...(growth.verdict === 'superfactorial'
        ? { caution: 'growth like (2n)!: convergence is an observation, not a theorem' }
        : {}),
    });
    return [outcome.kind === 'sum' ? { ...outcome, central: true } : outcome];
  },
};
