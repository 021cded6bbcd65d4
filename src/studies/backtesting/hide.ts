/** @module A series without its last known coefficients: what a method would have seen some years earlier. */
import type { Expanded } from '../expand.js';

/** Fewer coefficients than this leave nothing to work from. */
const FEWEST_SEEN = 2;

/** The first `count` coefficients, with everything that belongs to them; singularities stated beforehand stay. */
export function firstOf(expanded: Expanded, count: number): Expanded {
  const { expansion: e, growthInput: g } = expanded;
  if (count >= e.coefficients.length) return expanded;
  const { contour } = e;
  const onCircle = count + expanded.leadingZeros;
  return {
    ...expanded,
    expansion: {
      ...e,
      coefficients: e.coefficients.slice(0, count),
      relativeErrors: e.relativeErrors.slice(0, count),
      ...(contour === undefined
        ? {}
        : {
            contour: {
              ...contour,
              coefficients: contour.coefficients.slice(0, onCircle),
              errors: contour.errors.slice(0, onCircle),
            },
          }),
    },
    errors: expanded.errors.slice(0, count),
    growthInput: {
      ...g,
      terms: g.terms.slice(0, count),
      ...(g.exact === undefined ? {} : { exact: g.exact.slice(0, count) }),
    },
  };
}

/** Without the estimated coefficients at the end: an estimate is nothing that a prediction could be held against. */
export function computedPart(expanded: Expanded): Expanded {
  const last = expanded.growthInput.terms.findLastIndex((term) => !term.estimated);
  return firstOf(expanded, last + 1);
}

/** How many coefficients may be hidden, one after the other: 1 … most, as long as enough are left. */
export function hidings(known: number, most: number): number[] {
  return Array.from({ length: Math.max(0, Math.min(most, known - FEWEST_SEEN)) }, (_, i) => i + 1);
}
