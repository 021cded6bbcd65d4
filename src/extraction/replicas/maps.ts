/**
 * @module Couplings as maps of all that varies: the coupling or the mass that is solved for, α_s(M_Z), the masses of the thresholds
 * that are crossed.
 *
 * Bound   1e-12 of the largest value, checked off the grid (chebyshev-map.ts). Replicas outside the box of a map have no value;
 *         boxes reach farther than any deviate unless the evolution itself breaks off before.
 */
import { chebyshevMap } from '../../numerics/index.js';
import type { ChebyshevMap } from '../../numerics/index.js';
import { refuse } from '../../qcd/index.js';
import type { Refusal } from '../../qcd/index.js';
import type { Problem } from '../problem.js';
import type { Slot } from './problem.js';
import type { SlotList } from './slots.js';

const TOLERANCE = 1e-12;
/** No deviate is larger, in standard deviations. */
export const LARGEST_DEVIATE = 8.7;
/** Sizes of boxes that are tried where the evolution breaks off inside the whole one. */
const SHRINK = [1, 0.8, 0.65, 0.55, 0.46];

/** A variable of a map: its slot, its middle, how far it may go downwards and upwards. */
export interface Variable {
  readonly slot: Slot;
  readonly central: number;
  readonly down: number;
  readonly up: number;
}

/** α for values of the variables and shifts of the threshold masses; NaN where there is none. */
export type CouplingAt = (values: readonly number[], thresholds: readonly number[]) => number;

export interface Mapped {
  readonly map: ChebyshevMap;
  readonly variables: readonly Slot[];
}

interface Moving {
  /** Place among the thresholds of the problem. */
  readonly place: number;
  readonly variable: Variable;
}

/** Thresholds with an uncertain mass that moves the coupling. */
function moving(problem: Problem, slots: SlotList, central: readonly number[], at: CouplingAt): readonly Moving[] {
  const none = problem.thresholds.map(() => 0);
  const still = at(central, none);
  return problem.thresholds.flatMap((t, place) => {
    const error = t.error ?? 0;
    const shifted = none.map((_, k) => (k === place ? error : 0));
    if (!(error > 0) || at(central, shifted) === still) return [];
    const slot = slots.add(`m_${t.name}`, t.mass, { plus: error, minus: error });
    const reach = LARGEST_DEVIATE * error;
    return [{ place, variable: { slot, central: t.mass, down: reach, up: reach } }];
  });
}

/** The map of a coupling; a refusal where it cannot be followed far enough around the central values. */
export function couplingMap(
  problem: Problem,
  slots: SlotList,
  own: readonly Variable[],
  at: CouplingAt,
): Mapped | Refusal {
  const middle = own.map((v) => v.central);
  const thresholds = moving(problem, slots, middle, at);
  const variables = [...own, ...thresholds.map((t) => t.variable)];
  const value = (p: readonly number[]): number => {
    const shifts = problem.thresholds.map(() => 0);
    thresholds.forEach(({ place, variable }, k) => {
      shifts[place] = (p[own.length + k] ?? NaN) - variable.central;
    });
    return at(p.slice(0, own.length), shifts);
  };
  for (const share of SHRINK) {
    const map = chebyshevMap(
      value,
      variables.map((v) => v.central - share * v.down),
      variables.map((v) => v.central + share * v.up),
      TOLERANCE,
    );
    if (map !== undefined) return { map, variables: variables.map((v) => v.slot) };
  }
  return refuse(
    'the coupling cannot be evolved over four standard deviations of the inputs: its path comes too near to the Landau singularity',
    'give smaller errors, or leave the coupling at its own scale (--to none)',
  );
}

/** Errors that tables of moving coefficients may have: the coefficients are differences of conversions. */
const DRIFT_TOLERANCES = [1e-8, 1e-7, 1e-6];

/** One table a coefficient over a mass; undefined where one cannot be made. */
export function driftMaps(
  drift: (m: number) => readonly number[] | undefined,
  count: number,
  { central, down, up }: Variable,
): readonly ChebyshevMap[] | undefined {
  const list: ChebyshevMap[] = [];
  for (let n = 0; n < count; n++) {
    const value = ([m = NaN]: readonly number[]): number => drift(m)?.[n] ?? NaN;
    let found: ChebyshevMap | undefined;
    for (const tolerance of DRIFT_TOLERANCES) {
      found ??= chebyshevMap(value, [central - down], [central + up], tolerance);
    }
    if (found === undefined) return undefined;
    list.push(found);
  }
  return list;
}
