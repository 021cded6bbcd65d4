/**
 * @module Several data as functions of common parameters, by one prescription: what a least-squares fit needs.
 *
 * Parameters  alpha_s: α_s(M_Z), or the coupling that all series share when nothing is evolved; mass: m(m), and α_s(M_Z)
 *             beside it when it is left free.
 */
import { Rational, exact, toNumberExact } from '../../numerics/index.js';
import type { Exact } from '../../numerics/index.js';
import type { Prescription } from '../../prescriptions/index.js';
import { isRefusal, refuse } from '../../qcd/index.js';
import type { Refusal } from '../../qcd/index.js';
import { numberOf } from '../place.js';
import type { Shifts } from '../place.js';
import { definitionObjection } from '../power-terms.js';
import { predictionOf } from '../prediction.js';
import type { Problem } from '../problem.js';
import type { Setting } from '../rows.js';
import { theoryOf } from '../theory.js';
import type { Theory, Whole } from '../theory.js';
import type { TheoryVector } from './minimise.js';

/** Shifts of every datum; absent: none. */
export type ShiftsOf = (datum: number) => Shifts;

export interface FitModel {
  readonly prescription: Prescription;
  readonly problem: Problem;
  readonly settings: readonly Setting[];
  readonly theories: readonly Theory[];
  /** X_i(p; shifts). */
  vector(shifts?: ShiftsOf): TheoryVector;
  /** X_i of one datum; undefined where the theory has no value. */
  one(datum: number, p: readonly number[], shifts?: Shifts): number | undefined;
  /** The families' central sums at p. */
  wholes(p: readonly number[]): readonly Whole[] | Refusal;
}

const WHOLE_DIGITS = 13;

const fromDouble = (x: number): Exact => exact(Rational.fromNumber(x));

/** α_s(M_Z) around which a free coupling is a shift. */
const reference = (problem: Problem): number => (problem.alphaS === undefined ? 0 : numberOf(problem.alphaS));

/** The unknown and the shifts that a parameter vector stands for. */
function placed(problem: Problem, p: readonly number[], shifts: Shifts): readonly [unknown: Exact, shifts: Shifts] {
  const [first = NaN, second] = p;
  if (problem.for !== 'mass' || second === undefined) return [fromDouble(first), shifts];
  return [fromDouble(first), { ...shifts, alphaS: (shifts.alphaS ?? 0) + second - reference(problem) }];
}

/** The model of a prescription with the members that its families name at p; a refusal where one of them has none. */
export function fitModel(
  problem: Problem,
  settings: readonly Setting[],
  prescription: Prescription,
  p: readonly number[],
): FitModel | Refusal {
  const families: Theory[] = [];
  for (const { stages, placeAt, terms } of settings) {
    for (const { definition } of terms) {
      const no = definitionObjection(definition, prescription);
      if (no !== undefined) return no;
    }
    families.push(theoryOf(predictionOf(prescription, stages), placeAt, terms));
  }
  const wholes = (at: readonly number[]): readonly Whole[] | Refusal => {
    const list: Whole[] = [];
    for (const [i, family] of families.entries()) {
      const [unknown, shifts] = placed(problem, at, {});
      const whole = family.whole(unknown, WHOLE_DIGITS, shifts);
      if (isRefusal(whole)) return refuse(`${settings[i]?.stages.series.id ?? ''}: ${whole.reason}`, whole.remedy);
      list.push(whole);
    }
    return list;
  };
  const first = wholes(p);
  if (isRefusal(first)) return first;
  const theories = families.flatMap((family, i) => {
    const whole = first[i];
    return whole === undefined ? [] : [family.member(whole)];
  });
  const one: FitModel['one'] = (i, at, shifts = {}) => {
    const [unknown, all] = placed(problem, at, shifts);
    if (!(toNumberExact(unknown) > 0)) return undefined;
    return theories[i]?.number(toNumberExact(unknown), all);
  };
  return {
    prescription,
    problem,
    settings,
    theories,
    one,
    wholes,
    vector: (shifts) => (at) => {
      const list: number[] = [];
      for (let i = 0; i < theories.length; i++) {
        const value = one(i, at, shifts?.(i));
        if (value === undefined) return undefined;
        list.push(value);
      }
      return list;
    },
  };
}
