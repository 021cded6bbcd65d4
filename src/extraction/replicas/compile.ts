/**
 * @module From an extraction to its Monte Carlo: inputs with their errors, data, prescriptions with the members of their families.
 *
 * Ranges of the parameters are found in two steps: a first guess, then as many standard deviations as the responses to the inputs
 * ask for.
 */
import { fastSetting } from '../../fast/index.js';
import type { FastSetting } from '../../fast/index.js';
import { exact, R, toNumberExact } from '../../numerics/index.js';
import type { Prescription, Sum } from '../../prescriptions/index.js';
import { divisorSize, isRefusal, refuse } from '../../qcd/index.js';
import type { Refusal } from '../../qcd/index.js';
import type { Series } from '../../series/index.js';
import { fixedOrderOf } from '../../studies/index.js';
import type { Expanded } from '../../studies/index.js';
import { numberOf } from '../place.js';
import type { PlaceOf } from '../place.js';
import type { PowerTerm } from '../power-terms.js';
import type { Datum, Problem } from '../problem.js';
import type { Extracted } from '../rows.js';
import type { Stage, Stages } from '../stage.js';
import type { Whole } from '../theory.js';
import type { Range } from './places.js';
import { placeModel } from './places.js';
import type { DatumModel, PrescriptionModel, Slot } from './problem.js';
import type { SlotList } from './slots.js';

/** One measurement of an extraction, with its series and power corrections. */
export interface DatumSource {
  readonly datum: Datum;
  readonly stages: Stages;
  readonly placeAt: PlaceOf;
  readonly terms: readonly PowerTerm[];
  readonly extracted?: Extracted;
}

/** The central solution by one prescription: parameters, and for each datum the member and the sum there. */
export interface CentralSource {
  readonly prescription: Prescription;
  readonly parameters: readonly number[];
  readonly members: readonly { readonly variant: string | undefined; readonly whole: Whole }[];
  /** For a fit: rows of L⁻¹ of the covariance that weighs the data. */
  readonly whitening?: readonly (readonly number[])[];
}

/** Names that tell the data apart: the series, numbered where it serves several. */
export function labelsOf(sources: readonly DatumSource[]): string[] {
  const ids = sources.map((s) => s.stages.series.id);
  return ids.map((id, i) => {
    const before = ids.slice(0, i).filter((other) => other === id).length;
    return before === 0 ? id : `${id} #${before + 1}`;
  });
}

/** Slots of the coefficients that are used, with errors and correlations of the file; of D for a contour quantity. */
function coefficientSlots({ expanded }: Stage, series: Series, slots: SlotList): readonly Slot[] {
  const { expansion, leadingZeros } = expanded;
  const skipped = expansion.contour === undefined ? leadingZeros : 0;
  const list = (expansion.contour?.coefficients ?? expansion.coefficients).map((c, n) => {
    const error = series.coefficients[n + skipped]?.error;
    const errors = { plus: error?.plus.toNumber() ?? 0, minus: error?.minus.toNumber() ?? 0 };
    return slots.add(`${series.id}: coefficient of order ${n + skipped + series.firstPower}`, toNumberExact(c), errors);
  });
  list.forEach((a, n) =>
    list.slice(0, n).forEach((b, m) => {
      slots.correlate(a, b, series.correlation?.[n + skipped]?.[m + skipped]?.toNumber() ?? 0);
    }),
  );
  return list;
}

/** The matrix from coefficients of D to those of the fixed-order expansion. */
function circleOf({ expansion }: Expanded): Pick<DatumModel, 'circle'> {
  const { contour } = expansion;
  if (contour === undefined) return {};
  const N = contour.coefficients.length;
  const columns = Array.from({ length: N }, (_, k) => {
    const unit = Array.from({ length: N }, (_n, n) => exact(n === k ? 1 : 0));
    return fixedOrderOf(contour, unit, expansion).map(toNumberExact);
  });
  return { circle: expansion.coefficients.map((_, n) => columns.map((column) => column[n] ?? 0)) };
}

/** All data as models; fills `slots`. */
export function dataModels(
  problem: Problem,
  sources: readonly DatumSource[],
  slots: SlotList,
  ranges: readonly Range[],
  common: boolean,
): readonly DatumModel[] | Refusal {
  const labels = labelsOf(sources);
  const measured = sources.map(({ datum }, i) =>
    datum.measured === undefined
      ? undefined
      : slots.add(`measurement of ${labels[i] ?? ''}`, numberOf(datum.measured), datum.measured),
  );
  measured.forEach((a, i) =>
    measured.slice(0, i).forEach((b, j) => {
      if (a !== undefined && b !== undefined) slots.correlate(a, b, problem.correlation?.[i]?.[j] ?? 0);
    }),
  );
  const models: DatumModel[] = [];
  for (const [i, { datum, stages, placeAt, terms }] of sources.entries()) {
    const { series } = stages;
    const stage = stages.at();
    if (isRefusal(stage)) return stage;
    const coefficients = coefficientSlots(stage, series, slots);
    const label = labels[i] ?? '';
    const count = coefficients.length;
    const question = { problem, series, datum, placeAt, slots, ranges, common, label, coefficients: count };
    const place = placeModel(question);
    if (isRefusal(place)) return place;
    const { expansion } = stage.expanded;
    const own = measured[i];
    models.push({
      series: series.id,
      ...place,
      divisor: series.coupling.plain ? 1 : toNumberExact(divisorSize(series.coupling.divisor)),
      additive: toNumberExact(expansion.additive),
      factor: toNumberExact(expansion.factor),
      power: expansion.power,
      coefficients,
      ...circleOf(stage.expanded),
      terms: terms.map(({ name, wilson, corrections, dimension, value, plus, minus }) => ({
        wilson,
        corrections,
        dimension,
        value: slots.add(name, value, { plus, minus }),
      })),
      ...(own === undefined ? {} : { measured: own }),
    });
  }
  return models;
}

/** Digits of a sum that only names the member. */
const MEMBER_DIGITS = 13;

/** The sum of the member at the place of the central solution. */
function memberSum(
  prescription: Prescription,
  stages: Stages,
  { variant, whole }: CentralSource['members'][number],
): { readonly sum: Sum; readonly setting: FastSetting | undefined } | Refusal {
  const stage = stages.at();
  if (isRefusal(stage)) return stage;
  const e = stage.at(whole.place.alpha);
  if (isRefusal(e)) return e;
  let { sum } = whole;
  if (variant !== undefined && sum.variant !== variant) {
    const [own] = prescription.apply(e, stage.growth, { digits: MEMBER_DIGITS, only: variant });
    if (own?.kind !== 'sum') return refuse(`${variant} has no value at the solution`, 'choose another prescription');
    sum = own;
  }
  return { sum, setting: fastSetting(prescription.name, e, stage.growth, sum) };
}

/** The prescription's model; a refusal where there is no fast version of it. */
export function prescriptionModel(
  { prescription, parameters, members, whitening }: CentralSource,
  sources: readonly DatumSource[],
): PrescriptionModel | Refusal {
  const settings: FastSetting[] = [];
  const variants: string[] = [];
  for (const [i, source] of sources.entries()) {
    const member = members[i];
    if (member === undefined) return refuse('a measurement has no solution', 'choose another prescription');
    const found = memberSum(prescription, source.stages, member);
    if (isRefusal(found)) return found;
    if (found.setting === undefined || !Number.isFinite(R.toNumber(found.sum.value))) {
      return refuse(
        `${prescription.title} has no version that is fast enough for replicas`,
        'leave it out of the replicas; its own row stands',
      );
    }
    settings.push(found.setting);
    variants.push(found.sum.variant);
  }
  return {
    name: prescription.name,
    variants,
    settings,
    central: parameters,
    ...(whitening === undefined ? {} : { whitening }),
  };
}
