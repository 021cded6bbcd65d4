/**
 * @module Unknowns that need no root: a pole mass from an MSbar mass, and a condensate as what a measurement leaves over.
 *
 *   pole-mass   M = m R(α_s(m)) + …: shifted inputs shift M itself
 *   condensate  ⟨O_d⟩ = (X − R) Q^d / C_d(x): linear in all that is measured or summed, and tied to the prescription of R
 */
import { R, toDecimal } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import { divisorSize, isRefusal, refuse } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import { exact } from '../numerics/index.js';
import { variableOf } from './place.js';
import type { Place, Shifts } from './place.js';
import { powerFactor } from './power-terms.js';
import type { Operator } from './power-terms.js';
import type { Solved } from './solve.js';
import type { Theory } from './theory.js';

const DIGITS = 17;
const CHANGE_DIGITS = 13;
/** Digits of a result that went through doubles. */
const DOUBLE_DIGITS = 13;

/** The unknown as a function of the shifts: exact in none of them, so nothing is linearised. */
type Formula = (x: number, place: Place, shifts: Shifts) => number;

function direct(
  family: Theory,
  target: Exact | undefined,
  slope: (place: Place) => number,
  formula: Formula,
  digits: number,
): Solved | Refusal {
  const nothing = exact(1);
  const whole = family.whole(nothing, DIGITS);
  if (isRefusal(whole)) return whole;
  const theory = family.member(whole);
  const at = (shifts: Shifts, dX: number, d: number): number | Refusal => {
    const place = theory.placeAt(nothing, shifts);
    if (isRefusal(place)) return place;
    const value = theory.value(nothing, d, shifts);
    if (isRefusal(value)) return value;
    const prec = Math.ceil(d * 3.33) + 64;
    const rest = target === undefined ? value : R.sub(target.ball(prec), value, prec);
    return formula(R.toNumber(rest) + dX, place, shifts);
  };
  const number = at({}, 0, DIGITS);
  if (isRefusal(number)) return number;
  const shown = Math.min(digits, DOUBLE_DIGITS);
  // What is left of a difference has fewer digits than its parts.
  const parts = Math.abs(
    R.toNumber(whole.sum.value) * whole.place.factor * (target === undefined ? 1 : 1 / slope(whole.place)),
  );
  const lost = number === 0 ? 0 : Math.max(0, Math.ceil(Math.log10(parts / Math.abs(number))));
  const error = 10 ** (lost - shown);
  return {
    theory,
    number,
    text: toDecimal(R.addRelativeError(R.fromNumber(number), error), shown).text,
    digits: 'converged',
    whole,
    slope: slope(whole.place),
    otherRoots: [],
    notes: [],
    shifted: (shifts, dX = 0) => {
      const value = at(shifts, dX, CHANGE_DIGITS);
      return isRefusal(value) ? value : { value, how: 'refit' };
    },
  };
}

/** X = factor · R itself. */
export const predict = (family: Theory, digits: number): Solved | Refusal =>
  direct(
    family,
    undefined,
    () => 1,
    (x) => x,
    digits,
  );

/** ⟨O_d⟩ from a measurement. */
export function leftOver(family: Theory, target: Exact, wilson: Operator, digits: number): Solved | Refusal {
  const { coupling } = family.prediction.stages.series;
  const divisor = coupling.plain ? exact(1) : divisorSize(coupling.divisor);
  const factor = (place: Place): number => powerFactor(wilson, variableOf(place.alpha, divisor), place.Q ?? 1);
  const start = family.placeAt(exact(1), {});
  if (isRefusal(start)) return start;
  if (factor(start) === 0)
    return refuse('the Wilson coefficient vanishes at this coupling', 'choose another condensate');
  return direct(family, target, factor, (x, place) => x / factor(place), digits);
}
