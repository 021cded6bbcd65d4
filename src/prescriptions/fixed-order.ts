/**
 * @module Fixed order: the plain partial sum of all known terms.
 * Truncation error: the last non-zero term; where the growth is geometric or convergent, not less than the tail that
 * the last ratio ρ < 1 implies, |T| ρ/(1−ρ); where singularities compete, not less than the term before. Reference: common
 * practice, no source.
 */
import { R } from '../numerics/index.js';
import type { Growth } from '../growth/index.js';
import { mayCancel } from './eligibility.js';
import type { Prescription } from './prescription.js';
import { partialSums, refusal, terms, toDigits } from './prescription.js';

export const fixedOrder: Prescription = {
  name: 'fixed-order',
  title: 'fixed order',
  summary: 'sum of all known terms; error: the last term',
  family: 'truncation',
  apply(e, growth, request) {
    const N = e.coefficients.length;
    if (N === 0) return [refusal('all terms', 'there are no terms', 'give at least one coefficient')];
    const sum = toDigits(
      request.digits,
      (prec) => partialSums(e, prec)[N]!,
      (v) => v,
    );
    const t = terms(e, 128);
    const exactSum = growth.verdict === 'terminating' && growth.standing === 'certified';
    const notes: string[] = [];
    if (exactSum) notes.push('the series terminates: the sum of its terms is exact');
    else if (growth.verdict === 'convergent' || growth.verdict === 'geometric')
      notes.push('the terms converge: plain summation is the right method');
    return [
      {
        kind: 'sum',
        variant: `through order ${N - 1 + e.power}`,
        value: sum,
        truncation: exactSum
          ? 0
          : lastStep(
              t.map((b) => Math.abs(R.toNumber(b))),
              growth,
            ),
        termsUsed: N,
        trust: exactSum ? 'converged' : 'indicative',
        notes,
        central: true,
      },
    ];
  },
};

/** Last non-zero term (an exact zero at the end of a lacunary series says nothing), or what is larger: see above. */
function lastStep(sizes: readonly number[], growth: Growth): number {
  const standing = sizes.filter((size) => size > 0);
  const last = standing[standing.length - 1] ?? 0;
  const before = standing[standing.length - 2];
  if (before === undefined) return last;
  if (mayCancel(growth)) return Math.max(last, before);
  const converging = growth.verdict === 'geometric' || growth.verdict === 'convergent';
  if (!converging || !(last < before)) return last;
  const ratio = last / before;
  return Math.max(last, (last * ratio) / (1 - ratio));
}
