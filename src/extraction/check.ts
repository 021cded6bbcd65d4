/** @module What makes a question unanswerable before any number is computed: missing parts, clashing units, unstated definitions. */
import { refuse } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import type { Series } from '../series/index.js';
import { hardScale, noScale, notMSbar } from './place.js';
import type { Datum, Problem } from './problem.js';

const powerOf = (dimension: number | undefined): string =>
  dimension === undefined || dimension === 0 ? 'a pure number' : dimension === 1 ? 'in GeV' : `in GeV^${dimension}`;

/** Dimension that the measured quantity must have. */
function wantedDimension(problem: Problem, { massPower = 1, norm }: Datum): number {
  return problem.for === 'mass' ? massPower + (norm?.dimension ?? 0) : 0;
}

/** Measurement and its unit. */
export function checkMeasurement(problem: Problem, series: Series, datum: Datum): Refusal | undefined {
  const { measured } = datum;
  if (problem.for === 'pole-mass') return undefined;
  if (measured === undefined) {
    return refuse(`nothing is measured: ${series.id} states no measurement`, "give one: --measured '0.2042(50)'");
  }
  const wanted = wantedDimension(problem, datum);
  const found = measured.dimension ?? 0;
  if (found !== wanted) {
    const why = problem.for === 'mass' ? `norm · m^${datum.massPower ?? 1} · R` : 'R';
    return refuse(
      `the measurement ${measured.text} is ${powerOf(found)}, but ${why} is ${powerOf(wanted)}`,
      problem.for === 'mass'
        ? 'give the unit of the measurement, or the power of the mass: --mass-power'
        : 'divide by the scale first: the series predicts a pure number',
    );
  }
  return undefined;
}

/** Can α_s be brought to where it is wanted? The reason when it cannot. */
export function checkEvolution(series: Series, datum: Datum): Refusal | undefined {
  const bad = notMSbar(series);
  if (bad !== undefined) return bad;
  return hardScale(series, datum) === undefined ? noScale(series) : undefined;
}

/** Is α_s(M_Z) meant by this series at all? Without a scheme, or outside MSbar, it is not. */
export const isMSbar = (series: Series): boolean => notMSbar(series) === undefined;
