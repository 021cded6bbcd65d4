/** @module Everything that the rows of an extraction share: the search, the place of the series, its power corrections. */
import { toNumberExact } from '../numerics/index.js';
import * as contour from '../contour/index.js';
import { CONTOUR_NAMES, PRESCRIPTIONS, contourPrescriptions } from '../prescriptions/index.js';
import type { Prescription } from '../prescriptions/index.js';
import { isRefusal, refuse } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import type { Series } from '../series/index.js';
import { CORE, fixedOrderSeries } from '../studies/index.js';
import { checkMeasurement } from './check.js';
import { cutSeries } from './cutoff.js';
import { hardScale, noScale, numberOf, placeOf } from './place.js';
import { powerTerms, wilsonOf } from './power-terms.js';
import type { Operator, PowerTerm } from './power-terms.js';
import type { Datum, Problem } from './problem.js';
import { solveRow } from './rows.js';
import type { Setting } from './rows.js';
import type { Solved } from './solve.js';
import { Stages } from './stage.js';

/** What is run when nothing is chosen: the prescriptions of an assessment. */
export const USUAL: readonly string[] = CORE;

/** Couplings that are searched when nothing else is said: beyond, neither series nor running mean anything. Heuristic. */
const COUPLINGS = { from: 0.01, to: 1.5 } as const;
const VARIABLES = { from: 1e-3, to: 10 } as const;
/** Masses that are searched: around the one that the leading term alone would give. */
const AROUND = 4;

/** Those of a contour quantity; its Borel sums take seconds and are run when asked for. */
const USUAL_ON_CIRCLE: readonly string[] = [...USUAL, CONTOUR_NAMES.improved.name];

/** The prescriptions of a problem, in the order of the table. */
export function chosen(problem: Problem, series: readonly Series[]): readonly Prescription[] {
  const circle = series.some((s) => s.contour !== undefined);
  const names = problem.prescriptions ?? (circle ? USUAL_ON_CIRCLE : USUAL);
  return [...PRESCRIPTIONS, ...(circle ? contourPrescriptions(contour) : [])].filter((p) => names.includes(p.name));
}

function searchOf(problem: Problem, series: Series, datum: Datum): Setting['search'] | Refusal {
  const weak = problem.for === 'mass' ? 'high' : 'low';
  if (problem.search !== undefined) return { ...problem.search, weak };
  if (problem.for !== 'mass') return { ...(series.coupling.plain ? VARIABLES : COUPLINGS), weak };
  const lead = toNumberExact(series.additive) || 1;
  const x = datum.measured === undefined ? NaN : numberOf(datum.measured);
  const norm = datum.norm === undefined ? 1 : numberOf(datum.norm);
  const m = (x / (norm * lead)) ** (1 / (datum.massPower ?? 1));
  if (!(m > 0 && m < Infinity)) {
    return refuse(
      `norm · m^${datum.massPower ?? 1} · R cannot equal ${datum.measured?.text ?? ''} for a positive mass`,
      'check the sign of the measurement and of --norm',
    );
  }
  return { from: m / AROUND, to: m * AROUND, weak };
}

/** The condensate whose value is wanted. */
function extractedOf(problem: Problem, series: Series): Operator | undefined | Refusal {
  if (problem.for !== 'condensate') return undefined;
  const names = [...new Set(series.condensates.filter((c) => c.wilson !== undefined).map((c) => c.name))];
  const name = problem.condensate ?? (names.length === 1 ? names[0] : undefined);
  const found = series.condensates.find((c) => c.name === name);
  if (found !== undefined) return wilsonOf(series, found);
  return refuse(
    name === undefined
      ? names.length === 0
        ? `${series.id} states no condensate with a Wilson coefficient`
        : `${series.id} states several condensates: ${names.join('; ')}`
      : `${series.id} states no condensate "${name}"`,
    names.length === 0 ? 'write condensates: into its file' : `name one: --condensate '${names[0] ?? ''}'`,
  );
}

/** The series that a condensate with a factorisation scale is added to: nothing of it lies below that scale. */
function withoutLow(series: Series, terms: readonly PowerTerm[], Q: number | undefined): Series | Refusal {
  const cuts = terms.flatMap((t) => (t.definition.kind === 'cutoff' ? [{ mu: t.definition.mu, d: t.dimension }] : []));
  let view: Series | Refusal = series;
  for (const { mu, d } of cuts) {
    if (isRefusal(view)) return view;
    if (Q === undefined) return noScale(series);
    view = cutSeries(view, d, mu, Q);
  }
  return view;
}

/** Everything that the rows share; a refusal where the question cannot be put. */
export function settingOf(problem: Problem, series: Series, datum: Datum, common = false): Setting | Refusal {
  const bad = checkMeasurement(problem, series, datum);
  if (bad !== undefined) return bad;
  const placeAt = placeOf(problem, series, datum, common);
  if (isRefusal(placeAt)) return placeAt;
  const search = searchOf(problem, series, datum);
  if (isRefusal(search)) return search;
  const extracted = extractedOf(problem, fixedOrderSeries(series));
  if (isRefusal(extracted)) return extracted;
  const terms = powerTerms(fixedOrderSeries(series), problem, extracted?.name);
  if (isRefusal(terms)) return terms;
  const { order, loops } = problem;
  const view = withoutLow(series, terms, hardScale(series, datum));
  if (isRefusal(view)) return view;
  return {
    problem,
    datum,
    stages: new Stages(view, { loops, ...(order === undefined ? {} : { order }) }),
    placeAt,
    terms,
    ...(search === undefined ? {} : { search }),
    ...(extracted === undefined ? {} : { extracted }),
  };
}

const isFixedOrder = (p: Prescription): boolean => p.name === 'fixed-order';

/** Every prescription solved; fixed order shows the others where to begin. */
export function solveAll(setting: Setting, list: readonly Prescription[]): Map<Prescription, Solved | Refusal> {
  const fixed = PRESCRIPTIONS.find(isFixedOrder);
  const first = fixed === undefined ? undefined : solveRow(setting, fixed);
  const start = first === undefined || isRefusal(first) ? undefined : first.number;
  return new Map(
    list.map((p) => [p, isFixedOrder(p) && first !== undefined ? first : solveRow(setting, p, start)] as const),
  );
}
