/**
 * @module Wynn's ε algorithm (Shanks' transformation) on the partial sums: Padé approximants of the coupling series.
 *
 * Estimates ε_{2k}^{(0)}, ε_{2k}^{(1)} by rising number of terms; for N terms the last one is the [n+k/k], n + 2k = N − 1,
 * n ≤ 1. Converges for alternating (Stieltjes) series up to growth (2n)!.
 * Reference: P. Wynn, MTAC 10 (1956) 91 (from memory); DLMF 3.9(iv).
 */
import { R, rationalField } from '../numerics/index.js';
import type { Ball, Exact, Rational } from '../numerics/index.js';
import { epsilonColumns, epsilonStaircase, sumsOf } from '../sequences/index.js';
import { sequenceSum } from './sequence-sum.js';
import type { Outcome, Prescription } from './prescription.js';
import { refusal } from './prescription.js';

/** Most terms used: more cost time without bringing digits that were asked for. Heuristic. */
const MOST = 80;
/** Exact rational tables grow fast: more terms than this are not decided exactly. Heuristic. */
const MOST_EXACT = 40;
/** Bits of the exact result's enclosure. */
const EXACT_BITS = 512;

/** The table in exact rationals, with the singular rules for equal elements. */
function exactEstimates(terms: readonly Exact[]): (Ball | undefined)[] | undefined {
  const rationals = terms.map((a) => a.rational).filter((q): q is Rational => q !== undefined);
  if (rationals.length < terms.length || terms.length > MOST_EXACT) return undefined;
  const stairs = epsilonStaircase(epsilonColumns(rationalField, sumsOf(rationalField, rationals)));
  return stairs.map((q) => (q === undefined ? undefined : R.fromRational(q, EXACT_BITS)));
}

export const wynnEpsilon: Prescription = {
  name: 'wynn-epsilon',
  title: "Wynn's ε algorithm",
  summary: 'Shanks transforms of the partial sums of an alternating series',
  family: 'coupling',
  apply(e, growth, request): readonly Outcome[] {
    const variant = 'last of the staircase';
    if (growth.verdict === 'superfactorial' && growth.order !== 2)
      return [
        refusal(
          variant,
          'growth faster than (2n)!: the Padé approximants need not converge to one function',
          'none of the methods here sums it; the sum may not be unique',
        ),
      ];
    const outcome = sequenceSum(e, growth, request, {
      variant,
      fewest: 3,
      most: MOST,
      estimates: (field, terms) => epsilonStaircase(epsilonColumns(field, sumsOf(field, terms))),
      exactly: exactEstimates,
      keepsLead: true,
    });
    return [outcome.kind === 'sum' ? { ...outcome, central: true } : outcome];
  },
};
