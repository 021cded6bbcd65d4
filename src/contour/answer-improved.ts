/** @module The contour-improved sum of all known terms. Truncation error: its last term. */
import { refused, bitsFor, CONTESTED, lastSize, sum } from './answers.js';
import type { ContourAnswer, ContourQuantity, ContourRequest } from './answers.js';
import { contourIntegrals, improvedTerms } from './improved.js';

export function improvedAnswers(e: ContourQuantity, request: ContourRequest): readonly ContourAnswer[] {
  const { contour: origin, x } = e;
  const count = origin.coefficients.length;
  const variant = `through order ${origin.power + count - 1}`;
  const integrals = contourIntegrals(origin, x, request.digits);
  if ('reason' in integrals) return [refused(variant, integrals)];
  const prec = bitsFor(request.digits);
  const terms = improvedTerms(origin, integrals, prec);
  return [
    {
      kind: 'sum',
      variant,
      value: sum(terms, prec),
      truncation: lastSize(terms),
      termsUsed: count,
      notes: [CONTESTED],
      central: true,
    },
  ];
}
