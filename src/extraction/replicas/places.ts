/**
 * @module Where the coupling of a datum comes from in a Monte Carlo: the places of the extraction itself (place.ts), as tables over
 * the parameters and inputs that move them.
 */
import { Rational, exact, toNumberExact } from '../../numerics/index.js';
import type { Exact } from '../../numerics/index.js';
import { isRefusal, refuse } from '../../qcd/index.js';
import type { Refusal } from '../../qcd/index.js';
import type { Series } from '../../series/index.js';
import { hardScale, numberOf } from '../place.js';
import type { PlaceOf, Shifts } from '../place.js';
import type { Datum, Problem, Quantity } from '../problem.js';
import { couplingMap, driftMaps, LARGEST_DEVIATE } from './maps.js';
import type { CouplingAt, Variable } from './maps.js';
import type { DatumModel, Slot } from './problem.js';
import type { Errors, SlotList } from './slots.js';

/** Where a parameter may go: central − reach to central + reach. */
export interface Range {
  readonly central: number;
  readonly reach: number;
}

/** What a place makes of a datum. */
export type PlaceModel = Pick<DatumModel, 'coupling' | 'mass' | 'massPower' | 'norm' | 'scale' | 'drift'>;

export interface PlaceQuestion {
  readonly problem: Problem;
  readonly series: Series;
  readonly datum: Datum;
  readonly placeAt: PlaceOf;
  readonly slots: SlotList;
  /** The parameters. */
  readonly ranges: readonly Range[];
  /** The parameter is α_s(M_Z). */
  readonly common: boolean;
  /** Tells this datum from the others. */
  readonly label: string;
  /** Coefficients that are used. */
  readonly coefficients: number;
}

/** The input slot of a quoted quantity. */
const quantitySlot = (slots: SlotList, name: string, q: Quantity): Slot => slots.add(name, numberOf(q), q);

const inputVariable = (slot: Slot, central: number, { plus, minus }: Errors): Variable => ({
  slot,
  central,
  down: LARGEST_DEVIATE * minus,
  up: LARGEST_DEVIATE * plus,
});

const parameterVariable = (slot: Slot, range: Range | undefined): Variable => ({
  slot,
  central: range?.central ?? NaN,
  down: range?.reach ?? NaN,
  up: range?.reach ?? NaN,
});

/** α_s(M_Z) as a variable, a free parameter or an input, with the value around which the places count its shifts. */
function couplingAtMZ({
  problem,
  slots,
  ranges,
}: PlaceQuestion): (Variable & { readonly reference: number }) | Refusal {
  const { alphaS } = problem;
  if (alphaS === undefined) return refuse('the coupling is missing', 'give --alpha-s-mz');
  const reference = numberOf(alphaS);
  if (problem.freeAlphaS === true && ranges[1] !== undefined) return { ...parameterVariable(1, ranges[1]), reference };
  return { ...inputVariable(quantitySlot(slots, 'alpha_s(M_Z)', alphaS), reference, alphaS), reference };
}

const fromDouble = (x: number): Exact => exact(Rational.fromNumber(x));

/** α at a place; NaN where the place refuses, or where a variable has left the numbers. */
function alphaAt(placeAt: PlaceOf, unknown: number, shifts: Shifts): number {
  if (!(unknown > 0 && unknown < Infinity)) return NaN;
  const place = placeAt(fromDouble(unknown), shifts);
  return isRefusal(place) ? NaN : toNumberExact(place.alpha);
}

/** The coupling as a map of some variables. */
function mapped(
  question: PlaceQuestion,
  variables: readonly Variable[],
  at: CouplingAt,
): PlaceModel['coupling'] | Refusal {
  const found = couplingMap(question.problem, question.slots, variables, at);
  return isRefusal(found) ? found : { kind: 'map', ...found };
}

/** The coupling is an input. */
function given(question: PlaceQuestion, scale: Pick<PlaceModel, 'scale'>): PlaceModel | Refusal {
  const { problem, slots, placeAt } = question;
  if (problem.coupling !== undefined) {
    const slot = quantitySlot(slots, 'coupling', problem.coupling);
    return { coupling: { kind: 'slot', slot }, massPower: 0, ...scale };
  }
  const alpha = couplingAtMZ(question);
  if (isRefusal(alpha)) return alpha;
  const coupling = mapped(question, [alpha], ([value = NaN], thresholds) =>
    alphaAt(placeAt, 1, { alphaS: value - alpha.reference, thresholds }),
  );
  return isRefusal(coupling) ? coupling : { coupling, massPower: 0, ...scale };
}

/** The mass is the unknown, or an input behind a pole mass, and the hard scale as well. */
function atMass(question: PlaceQuestion): PlaceModel | Refusal {
  const { problem, slots, placeAt, ranges, datum, label, coefficients } = question;
  const alpha = couplingAtMZ(question);
  if (isRefusal(alpha)) return alpha;
  const own = problem.for === 'pole-mass' ? problem.mass : undefined;
  const mass =
    own === undefined
      ? parameterVariable(0, ranges[0])
      : inputVariable(quantitySlot(slots, 'm(m)', own), numberOf(own), own);
  const shiftsOf = (m: number): Shifts => (own === undefined ? {} : { mass: m - mass.central });
  const coupling = mapped(question, [mass, alpha], ([m = NaN, value = NaN], thresholds) =>
    alphaAt(placeAt, m, { ...shiftsOf(m), alphaS: value - alpha.reference, thresholds }),
  );
  if (isRefusal(coupling)) return coupling;
  const drift = driftOf((m) => placeAt(fromDouble(m), shiftsOf(m)), coefficients, mass);
  if (drift !== undefined && isRefusal(drift)) return drift;
  const { norm, massPower = 1 } = datum;
  return {
    coupling,
    mass: mass.slot,
    massPower,
    scale: mass.slot,
    ...(norm === undefined ? {} : { norm: quantitySlot(slots, `norm of ${label}`, norm) }),
    ...(drift === undefined ? {} : { drift: { variable: mass.slot, maps: drift } }),
  };
}

type Drift = NonNullable<DatumModel['drift']>['maps'];

/** How the coefficients move with the mass; undefined where they stand still. */
function driftOf(
  placeAt: (m: number) => ReturnType<PlaceOf>,
  count: number,
  mass: Variable,
): Drift | undefined | Refusal {
  const at = (m: number): readonly number[] | undefined => {
    const place = placeAt(m);
    return isRefusal(place) ? undefined : place.drift;
  };
  if (at(mass.central) === undefined) return undefined;
  return (
    driftMaps(at, count, mass) ??
    refuse('the coefficients move with the mass in a way that no table follows', 'give a smaller error')
  );
}

/** The place of a datum. */
export function placeModel(question: PlaceQuestion): PlaceModel | Refusal {
  const { problem, series, datum, placeAt, slots, ranges, common, label } = question;
  const Q = hardScale(series, datum);
  const scale = Q === undefined ? {} : { scale: slots.add(`Q of ${label}`, Q) };
  switch (problem.for) {
    case 'alpha_s': {
      if (!common) return { coupling: { kind: 'slot', slot: 0 }, massPower: 0, ...scale };
      const coupling = mapped(question, [parameterVariable(0, ranges[0])], ([value = NaN], thresholds) =>
        alphaAt(placeAt, value, { thresholds }),
      );
      return isRefusal(coupling) ? coupling : { coupling, massPower: 0, ...scale };
    }
    case 'condensate':
      return given(question, scale);
    case 'mass':
      return datum.massPower === 0 ? given(question, scale) : atMass(question);
    case 'pole-mass':
      return atMass(question);
  }
}
