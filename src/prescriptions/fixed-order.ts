/**
 * @module Fixed order: the plain partial sum of all known terms.
 * Truncation error: the larger of the last term and, where the last two terms fall, the last term times their ratio's
 * geometric tail is not used: a tail assumes convergence. Reference: common practice, no source.
 */
import { R } from '../numerics/index.js';
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
    const last = Math.abs(R.toNumber(t[N - 1]!));
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
        truncation: exactSum ? 0 : lastStep(t.map((b) => Math.abs(R.toNumber(b))), last),
        termsUsed: N,
        trust: exactSum ? 'converged' : 'indicative',
        notes,
        central: true,
      },
    ];
  },
};

/** Last non-zero term: an exact zero at the end (a lacunary series) says nothing about the truncation. */
function lastStep(sizes: readonly number[], last: number): number {
  if (last > 0) return last;
  for (let n = sizes.length - 1; n >= 0; n--) if (sizes[n]! > 0) return sizes[n]!;
  return 0;
}
