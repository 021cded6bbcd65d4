/** @module The central member of a prescription, and whether a sum from few coefficients is worth less than the plain sums. */
import type { Evaluated } from './values.js';

/** The family's own choice, where it stands. */
export function central(values: readonly Evaluated[], name: string): Evaluated | undefined {
  return values.find((v) => v.prescription.name === name && v.outcome.kind === 'sum' && v.outcome.central === true);
}

/**
 * Is this a Borel sum from fewer than half of `count` coefficients, because noise leaves no more to a rational approximant,
 * with a larger error than the plain sums that use them? House rule.
 */
export function outclassed({ prescription, outcome }: Evaluated, values: readonly Evaluated[], count: number): boolean {
  if (prescription.family !== 'borel' || outcome.kind !== 'sum' || outcome.trust === 'converged') return false;
  if (2 * outcome.termsUsed >= count) return false;
  const plain = ['least-term', 'fixed-order'].flatMap((name) => {
    const other = central(values, name)?.outcome;
    return other?.kind === 'sum' && other.truncation !== undefined ? [other.truncation] : [];
  });
  return (outcome.truncation ?? Infinity) > Math.min(Infinity, ...plain);
}
