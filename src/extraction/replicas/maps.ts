/**
 * @module Evolutions of the coupling as maps of all that varies: the coupling or the mass that is solved for, α_s(M_Z), the masses
 * of the thresholds that are crossed.
 *
 * Bound   1e-12, relative, checked off the grid (chebyshev-map.ts). Replicas outside the box of a map have no value; boxes reach
 *         farther than any deviate unless the evolution itself breaks off before.
 */
import { chebyshevMap } from '../../numerics/index.js';
import type { ChebyshevMap } from '../../numerics/index.js';
import { evolvePath, isRefusal, refuse } from '../../qcd/index.js';
import type { Refusal, ScalePoint } from '../../qcd/index.js';
import { shiftedThresholds } from '../place.js';
import type { Problem } from '../problem.js';
import type { Slot } from './problem.js';
import type { SlotList } from './slots.js';

export const TOLERANCE = 1e-12;
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

/** What a map evolves: the values of its variables in, a path out. */
export interface PathOf {
  readonly variables: readonly Variable[];
  /** Coupling, start and goal for values of the variables that come before the thresholds. */
  readonly path: (values: readonly number[]) => {
    readonly alpha: number;
    readonly from: ScalePoint;
    readonly to: ScalePoint;
  };
}

export interface Mapped {
  readonly map: ChebyshevMap;
  readonly variables: readonly Slot[];
}

/** Quark thresholds that the central path crosses and whose mass is uncertain, as variables. */
function crossed(
  problem: Problem,
  slots: SlotList,
  { variables, path }: PathOf,
): readonly { readonly place: number; readonly variable: Variable }[] {
  const { loops, thresholds } = problem;
  const central = evolvePath({ ...path(variables.map((v) => v.central)), options: { loops, thresholds } });
  if (isRefusal(central)) return [];
  const names = new Set(central.steps.map((s) => s.threshold));
  return thresholds.flatMap((t, place) => {
    if (!names.has(t.name) || !((t.error ?? 0) > 0)) return [];
    const error = t.error ?? 0;
    const slot = slots.add(`m_${t.name}`, t.mass, { plus: error, minus: error });
    const reach = LARGEST_DEVIATE * error;
    return [{ place, variable: { slot, central: t.mass, down: reach, up: reach } }];
  });
}

/** The map of an evolution; a refusal where it cannot be followed far enough around the central values. */
export function evolutionMap(problem: Problem, slots: SlotList, question: PathOf): Mapped | Refusal {
  const thresholds = crossed(problem, slots, question);
  const variables = [...question.variables, ...thresholds.map((t) => t.variable)];
  const own = question.variables.length;
  const value = (p: readonly number[]): number => {
    const shifts = problem.thresholds.map(() => 0);
    thresholds.forEach(({ place, variable }, k) => {
      shifts[place] = (p[own + k] ?? NaN) - variable.central;
    });
    const options = { loops: problem.loops, thresholds: shiftedThresholds(problem.thresholds, shifts) };
    const end = evolvePath({ ...question.path(p.slice(0, own)), options });
    return isRefusal(end) ? NaN : end.alpha;
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
