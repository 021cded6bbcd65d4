/**
 * @module X(p; shifts): the measured quantity as a function of the unknown p and of every input that an error budget shifts.
 *
 *   X = factor(p) · [ R(α(p); shifts) + Σ_d C_d ⟨O_d⟩/Q^d + remainder ]
 *
 * Evaluates only; roots, budgets and Monte Carlo are built on it.
 */
import { R, Rational, exact, toNumberExact } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import { divisorSize, isRefusal, refuse } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import type { Sum } from '../prescriptions/index.js';
import { variableOf } from './place.js';
import type { Place, PlaceOf, Shifts } from './place.js';
import { powerFactor } from './power-terms.js';
import type { PowerTerm } from './power-terms.js';
import type { Prediction } from './prediction.js';

export interface Theory {
  readonly prediction: Prediction;
  readonly terms: readonly PowerTerm[];
  readonly placeAt: PlaceOf;
  /** X, an enclosure as far as the prescription's is one. */
  value(unknown: Exact, digits: number, shifts?: Shifts): Ball | Refusal;
  /** The family's central sum of R at this place, with its own errors. */
  whole(unknown: Exact, digits: number, shifts?: Shifts): Whole | Refusal;
  /** X in doubles: by the fast version of the member, or to a few digits where there is none; undefined without a value. */
  rough(unknown: number, shifts?: Shifts): number | undefined;
  /** X in doubles: by the fast version, or by the prescription itself where that has no value. */
  number(unknown: number, shifts?: Shifts): number | undefined;
  /** The member that the sum stands for. */
  member(whole: Whole): Theory;
}

export interface Whole {
  readonly sum: Sum;
  readonly place: Place;
  /** Σ C_d ⟨O_d⟩/Q^d. */
  readonly power: number;
}

/** Digits of a value that goes through doubles anyway. */
const NUMBER_DIGITS = 13;
/** Digits of a search without a fast version. */
const ROUGH_DIGITS = 6;

/** Shifts of the coefficients on top of what the place itself does to them. */
function drifted({ drift }: Place, shifts: Shifts): Shifts {
  if (drift === undefined) return shifts;
  return { ...shifts, coefficients: drift.map((d, n) => d + (shifts.coefficients?.[n] ?? 0)) };
}

const numeric = (b: Ball | Refusal): number | undefined => (isRefusal(b) ? undefined : R.toNumber(b));

/** Σ_d C_d ⟨O_d⟩/Q^d with shifted condensates. */
export function powerSum(terms: readonly PowerTerm[], x: number, Q: number | undefined, shifts: Shifts = {}): number {
  return terms.reduce(
    (sum, term, i) => sum + powerFactor(term, x, Q ?? 1) * (term.value + (shifts.condensates?.[i] ?? 0)),
    0,
  );
}

export function theoryOf(prediction: Prediction, placeAt: PlaceOf, terms: readonly PowerTerm[]): Theory {
  const { coupling } = prediction.stages.series;
  const divisor = coupling.plain ? exact(1) : divisorSize(coupling.divisor);
  const powerAt = (place: Place, shifts: Shifts): number =>
    terms.length === 0 ? 0 : powerSum(terms, variableOf(place.alpha, divisor), place.Q, shifts);
  const wanted = (digits: number): number => Math.ceil(digits * 3.33) + 64;
  return {
    prediction,
    terms,
    placeAt,
    value(unknown, digits, shifts = {}) {
      const place = placeAt(unknown, shifts);
      if (isRefusal(place)) return place;
      const sum = prediction.value(place.alpha, digits, drifted(place, shifts));
      if (isRefusal(sum)) return sum;
      const added = powerAt(place, shifts) + (shifts.remainder ?? 0);
      if (!Number.isFinite(added) || !Number.isFinite(place.factor))
        return refuse('the value leaves the range of doubles', 'give smaller numbers');
      const prec = wanted(digits);
      const whole = added === 0 ? sum : R.add(sum, R.fromNumber(added), prec);
      return place.factor === 1 ? whole : R.mul(whole, R.fromNumber(place.factor), prec);
    },
    whole(unknown, digits, shifts = {}) {
      const place = placeAt(unknown, shifts);
      if (isRefusal(place)) return place;
      const sum = prediction.whole(place.alpha, digits, drifted(place, {}));
      return isRefusal(sum) ? sum : { sum, place, power: powerAt(place, shifts) };
    },
    rough(unknown, shifts = {}) {
      const at = exact(Rational.fromNumber(unknown));
      const { quick } = prediction;
      if (quick === undefined) return numeric(this.value(at, ROUGH_DIGITS, shifts));
      const place = placeAt(at, shifts);
      if (isRefusal(place)) return undefined;
      const sum = quick(toNumberExact(place.alpha), drifted(place, shifts));
      return sum === undefined ? undefined : place.factor * (sum + powerAt(place, shifts) + (shifts.remainder ?? 0));
    },
    number(unknown, shifts = {}) {
      const fast = prediction.quick === undefined ? undefined : this.rough(unknown, shifts);
      return fast ?? numeric(this.value(exact(Rational.fromNumber(unknown)), NUMBER_DIGITS, shifts));
    },
    member: ({ sum, place }) => theoryOf(prediction.member(sum, place.alpha), placeAt, terms),
  };
}
