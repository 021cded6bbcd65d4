/** @module Where the coupling of a datum comes from in a Monte Carlo: the doubles of place.ts. */
import { toNumberExact } from '../../numerics/index.js';
import { INPUTS, isRefusal, refuse } from '../../qcd/index.js';
import type { Refusal } from '../../qcd/index.js';
import type { Series } from '../../series/index.js';
import { hardScale, numberOf } from '../place.js';
import type { Datum, Problem, Quantity } from '../problem.js';
import { evolutionMap, LARGEST_DEVIATE } from './maps.js';
import type { Mapped, Variable } from './maps.js';
import type { CouplingSource, Slot } from './problem.js';
import type { Errors, SlotList } from './slots.js';

const MZ = { scale: Number(INPUTS.MZ.value), flavours: 5 } as const;

/** Where a parameter may go: central − reach to central + reach. */
export interface Range {
  readonly central: number;
  readonly reach: number;
}

export interface PlaceModel {
  readonly coupling: CouplingSource;
  /** m of X = norm · m^P · R. */
  readonly mass?: Slot;
  readonly massPower: number;
  readonly norm?: Slot;
  /** Hard scale in GeV. */
  readonly scale?: Slot;
}

export interface PlaceQuestion {
  readonly problem: Problem;
  readonly series: Series;
  readonly datum: Datum;
  readonly slots: SlotList;
  /** The parameters. */
  readonly ranges: readonly Range[];
  /** The parameter is α_s(M_Z). */
  readonly common: boolean;
  /** Tells this datum from the others. */
  readonly label: string;
}

const ratioOf = (series: Series): number => (series.scaleRatio === undefined ? 1 : toNumberExact(series.scaleRatio));

/** The input slot of a quoted quantity. */
export const quantitySlot = (slots: SlotList, name: string, q: Quantity): Slot => slots.add(name, numberOf(q), q);

const asVariable = (slot: Slot, central: number, { plus, minus }: Errors): Variable => ({
  slot,
  central,
  down: LARGEST_DEVIATE * minus,
  up: LARGEST_DEVIATE * plus,
});

const parameterVariable = (slot: Slot, { central, reach }: Range): Variable => ({
  slot,
  central,
  down: reach,
  up: reach,
});

const fromMap = ({ map, variables }: Mapped): CouplingSource => ({ kind: 'map', map, variables });

/** α_s(M_Z) as a variable: a free parameter, or an input. */
function couplingAtMZ(problem: Problem, slots: SlotList, ranges: readonly Range[]): Variable | Refusal {
  const { alphaS } = problem;
  const second = ranges[1];
  if (problem.freeAlphaS === true && second !== undefined) return parameterVariable(1, second);
  if (alphaS === undefined) return refuse('the coupling is missing', 'give --alpha-s-mz');
  return asVariable(quantitySlot(slots, 'alpha_s(M_Z)', alphaS), numberOf(alphaS), alphaS);
}

/** The coupling of a series at a fixed hard scale from α_s(M_Z). */
function fixedScale(
  problem: Problem,
  series: Series,
  Q: number,
  slots: SlotList,
  alpha: Variable,
): CouplingSource | Refusal {
  const to = { scale: Q * ratioOf(series), flavours: series.flavours ?? MZ.flavours };
  const mapped = evolutionMap(problem, slots, {
    variables: [alpha],
    path: ([value = NaN]) => ({ alpha: value, from: MZ, to }),
  });
  return isRefusal(mapped) ? mapped : fromMap(mapped);
}

function given({ problem, series, datum, slots, ranges, label }: PlaceQuestion): PlaceModel | Refusal {
  const { coupling } = problem;
  const Q = hardScale(series, datum);
  const scale = Q === undefined ? {} : { scale: slots.add(`Q of ${label}`, Q) };
  if (coupling !== undefined) {
    return { coupling: { kind: 'slot', slot: quantitySlot(slots, 'coupling', coupling) }, massPower: 0, ...scale };
  }
  const alpha = couplingAtMZ(problem, slots, ranges);
  if (isRefusal(alpha)) return alpha;
  if (Q === undefined) return refuse(`${series.id} has no hard scale`, 'give it: --scale-of-measurement');
  const source = fixedScale(problem, series, Q, slots, alpha);
  return isRefusal(source) ? source : { coupling: source, massPower: 0, ...scale };
}

function massPlace({ problem, series, datum, slots, ranges, label }: PlaceQuestion): PlaceModel | Refusal {
  const alpha = couplingAtMZ(problem, slots, ranges);
  if (isRefusal(alpha)) return alpha;
  const own = problem.for === 'pole-mass' && problem.mass !== undefined ? problem.mass : undefined;
  const mass =
    own === undefined
      ? parameterVariable(0, ranges[0] ?? { central: NaN, reach: NaN })
      : asVariable(quantitySlot(slots, 'm(m)', own), numberOf(own), own);
  const ratio = ratioOf(series);
  const flavours = series.flavours ?? MZ.flavours;
  const mapped = evolutionMap(problem, slots, {
    variables: [mass, alpha],
    path: ([m = NaN, value = NaN]) => ({ alpha: value, from: MZ, to: { scale: m * ratio, flavours } }),
  });
  if (isRefusal(mapped)) return mapped;
  const { norm, massPower = 1 } = datum;
  return {
    coupling: fromMap(mapped),
    mass: mass.slot,
    massPower,
    scale: mass.slot,
    ...(norm === undefined ? {} : { norm: quantitySlot(slots, `norm of ${label}`, norm) }),
  };
}

/** The place of a datum. */
export function placeModel(question: PlaceQuestion): PlaceModel | Refusal {
  const { problem, series, datum, slots, ranges, common, label } = question;
  const Q = hardScale(series, datum);
  const scale = Q === undefined ? {} : { scale: slots.add(`Q of ${label}`, Q) };
  switch (problem.for) {
    case 'alpha_s': {
      const [first] = ranges;
      if (!common) return { coupling: { kind: 'slot', slot: 0 }, massPower: 0, ...scale };
      if (first === undefined || Q === undefined) return refuse(`${series.id} has no hard scale`, 'give it');
      const source = fixedScale(problem, series, Q, slots, parameterVariable(0, first));
      return isRefusal(source) ? source : { coupling: source, massPower: 0, ...scale };
    }
    case 'condensate':
      return given(question);
    case 'mass':
      return datum.massPower === 0 ? given(question) : massPlace(question);
    case 'pole-mass':
      return massPlace(question);
  }
}
