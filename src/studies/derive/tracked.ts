/**
 * @module A number that is computed exactly, remembers its closed form, and knows which uncertain inputs it depends on.
 * Method  one formula, three rings: enclosures for the value, polynomials in π, ζ(3), log(2) for the closed form, doubles
 *         with derivatives for the errors.
 */
import { R, exact, toNumberExact } from '../../numerics/index.js';
import type { Exact, Rational } from '../../numerics/index.js';
import { formalRational, formalRing, liftExact, rationalOfFormal } from '../../qcd/index.js';
import type { Formal, RingFormula } from '../../qcd/index.js';
import { dualRing } from './dual.js';

export interface Tracked {
  readonly value: Exact;
  /** The closed form, when there is one. */
  readonly formal?: Formal;
  /** Derivatives with respect to the sources of error, by their number; missing ones are zero. */
  readonly slopes: readonly number[];
}

/** Longer lists are computed as numbers only: their closed forms would fill pages (habit). */
const MOST_FORMAL_COEFFICIENTS = 9;

export const trackedRational = (q: Rational): Tracked => ({
  value: exact(q),
  formal: formalRational(q),
  slopes: [],
});

export const trackedExact = (value: Exact, formal?: Formal): Tracked => ({
  value,
  ...(value.rational !== undefined
    ? { formal: formalRational(value.rational) }
    : formal === undefined
      ? {}
      : { formal }),
  slopes: [],
});

/** The formula over polynomials; undefined when an input has no closed form or a divisor is not rational. */
function closedForms(inputs: readonly Tracked[], formula: RingFormula): readonly Formal[] | undefined {
  const formals: Formal[] = [];
  for (const { formal } of inputs) {
    if (formal === undefined) return undefined;
    formals.push(formal);
  }
  try {
    return formula(formalRing, formals);
  } catch (error) {
    if (error instanceof RangeError) return undefined;
    throw error;
  }
}

export interface DeriveOptions {
  /** Number of coefficients in the result; decides whether closed forms are worth their length. */
  readonly length: number;
}

/** Applies a formula to tracked numbers. Throws RangeError when it divides by a rational zero. */
export function derive(inputs: readonly Tracked[], formula: RingFormula, options: DeriveOptions): Tracked[] {
  const values = liftExact(
    inputs.map((x) => x.value),
    formula,
  );
  const formals = options.length <= MOST_FORMAL_COEFFICIENTS ? closedForms(inputs, formula) : undefined;
  const uncertain = inputs.some((x) => x.slopes.length > 0);
  const duals = uncertain
    ? formula(
        dualRing,
        inputs.map((x) => ({ value: toNumberExact(x.value), slopes: x.slopes })),
      )
    : undefined;
  return values.map((value, i) => {
    const formal = formals?.[i];
    const q = formal === undefined ? undefined : rationalOfFormal(formal);
    return {
      ...trackedExact(q === undefined ? value : exact(q), formal),
      slopes: duals?.[i]?.slopes ?? [],
    };
  });
}

/** Is the number exactly zero, as far as its closed form tells? */
export const isZeroTracked = (x: Tracked): boolean => x.value.rational?.isZero() ?? false;

/** Certainly different from zero. */
export function isNonZeroTracked(x: Tracked): boolean {
  if (x.value.rational !== undefined) return !x.value.rational.isZero();
  return !R.containsZero(x.value.ball(256));
}
