/**
 * @module Euler's transformation of an alternating series with a finite radius of convergence.
 *
 * Truncation error: the larger of the last two terms of the transformed series.
 * Factorial growth is refused: the differences then grow as fast as the terms.
 * Reference: L. Euler (1755); DLMF 3.9(ii).
 */
import { eulerSums } from '../sequences/index.js';
import { sequenceSum } from './sequence-sum.js';
import type { Outcome, Prescription } from './prescription.js';
import { refusal } from './prescription.js';

/** Most terms used. Heuristic. */
const MOST = 200;

export const euler: Prescription = {
  name: 'euler',
  title: "Euler's transformation",
  summary: 'repeated averaging of an alternating series with geometric growth',
  family: 'coupling',
  apply(e, growth, request): readonly Outcome[] {
    const variant = 'all differences';
    if (growth.verdict !== 'geometric' && growth.verdict !== 'convergent' && growth.verdict !== 'terminating')
      return [
        refusal(
          variant,
          `the growth is ${growth.verdict}: the differences grow with the terms`,
          'use weniger-delta, or a Borel prescription',
        ),
      ];
    const outcome = sequenceSum(e, growth, request, { variant, fewest: 3, most: MOST, estimates: eulerSums });
    return [outcome.kind === 'sum' ? { ...outcome, central: true } : outcome];
  },
};
