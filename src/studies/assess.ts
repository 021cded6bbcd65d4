/**
 * @module assess: from a series and a coupling to everything a referee asks for, as one plain object.
 */
import { diagnoseGrowth } from '../growth/index.js';
import type { Growth } from '../growth/index.js';
import { toNumberExact } from '../numerics/index.js';
import { PRESCRIPTIONS } from '../prescriptions/index.js';
import type { Prescription, Sum } from '../prescriptions/index.js';
import type { Series, Uncertain } from '../series/index.js';
import { ambiguityReport, powerReport } from './ambiguity-report.js';
import type { Assessment, ValueEntry, ValueRecord } from './assessment.js';
import { recordCautions, records, SEEN_OF_LONG } from './backtesting/record.js';
import { cautions } from './cautions.js';
import { fixedOrderSeries } from './contour/moment.js';
import { keptCorrelation } from './correlation.js';
import { checkCoupling } from './coupling-range.js';
import { expand } from './expand.js';
import type { Expanded } from './expand.js';
import { growthReport } from './growth-report.js';
import { optimalReport } from './optimal-report.js';
import { planeReport } from './plane-report.js';
import { leadingStrength, strengthReport } from './strength-report.js';
import { ultravioletReport } from './ultraviolet-report.js';
import { couplingSummary, relativeCouplingError, seriesSummary } from './summary.js';
import { termTable } from './terms.js';
import { evaluateAll, valueEntry } from './values.js';
import type { Evaluated, Inputs } from './values.js';
import { inUnit } from './units.js';
import { picked, verdict } from './verdict.js';
import type { VerdictRule } from './verdict-rule.js';
import { VERSION } from './version.js';

export interface AssessOptions {
  /** Use only the first `order` coefficients. */
  readonly order?: number;
  /** Certified decimal digits of each value; 15 is the usual choice. */
  readonly digits: number;
  /** Names of the prescriptions to run; CORE when absent. */
  readonly by?: readonly string[];
  /** Prescriptions beside the usual ones: those of contour quantities, see contourPrescriptions. */
  readonly more?: readonly Prescription[];
  /** The rule that makes the verdict; the ladder when absent. */
  readonly verdictRule?: VerdictRule;
  /** What was asked, repeated in the result. */
  readonly request: Assessment['request'];
  /** How the coupling was reached, one line a step. */
  readonly path?: readonly string[];
}

/** What an assessment shows; `compare` runs all prescriptions, `sum` any of them. */
export const CORE: readonly string[] = [
  'fixed-order',
  'least-term',
  'terminant',
  'pade',
  'borel-pade',
  'borel-leroy-pade',
  'borel-pade-2',
  'singularity-model',
];

/** The core, and the prescription that the verdict's rule names. */
const withNamed = (rule: VerdictRule | undefined): readonly string[] =>
  rule?.kind !== 'prescription' || CORE.includes(rule.name) ? CORE : [...CORE, rule.name];

/** The order-2 transform is worth a row only where the growth asks for it. */
const worthARow = (v: Evaluated, growth: Growth): boolean =>
  v.prescription.name !== 'borel-pade-2' || growth.verdict === 'superfactorial';

/** Input errors of an expanded series. */
function inputsOf(series: Series, expanded: Expanded, at: Uncertain): Inputs {
  const correlation = keptCorrelation(series, expanded);
  return {
    xError: relativeCouplingError(at),
    coefficientErrors: expanded.errors,
    ...(correlation === undefined ? {} : { correlation }),
    ...onCircle(series, expanded),
  };
}

/** Of a contour quantity: the errors of the coefficients that stand under the integral. */
function onCircle(series: Series, expanded: Expanded): Pick<Inputs, 'onCircle'> {
  const { contour } = expanded.expansion;
  if (contour === undefined) return {};
  const kept = contour.errors.length;
  const correlation = series.expandedFrom?.correlation
    ?.slice(0, kept)
    .map((row) => row.slice(0, kept).map((q) => q.toNumber()));
  return {
    onCircle: { coefficientErrors: contour.errors, ...(correlation === undefined ? {} : { correlation }) },
  };
}

/** The prescriptions of that name, all when `by` is absent; `more` beside the usual ones. Throws RangeError naming the known ones. */
export function prescriptionsNamed(
  by: readonly string[] | undefined,
  more: readonly Prescription[] = [],
): readonly Prescription[] {
  const known = more.length === 0 ? PRESCRIPTIONS : [...PRESCRIPTIONS, ...more];
  if (by === undefined) return known;
  return by.map((name) => {
    const found = known.find((p) => p.name === name);
    if (found === undefined)
      throw new RangeError(`no prescription "${name}"; known: ${known.map((p) => p.name).join(', ')}`);
    return found;
  });
}

export interface Summed {
  readonly expanded: Expanded;
  readonly growth: Growth;
  readonly values: readonly Evaluated[];
}

/** Expands, diagnoses and runs the prescriptions; with `central` each gives its own choice only. */
export function sumUp(
  given: Series,
  at: Uncertain,
  options: Pick<AssessOptions, 'order' | 'digits' | 'by' | 'more'>,
  central = false,
): Summed {
  const series = fixedOrderSeries(given);
  checkCoupling(series, at);
  const expanded = expand(series, at.value, options.order);
  const growth = diagnoseGrowth(expanded.growthInput);
  const values = evaluateAll(
    expanded.expansion,
    growth,
    prescriptionsNamed(options.by, options.more),
    options.digits,
    inputsOf(series, expanded, at),
    central,
  );
  return { expanded, growth, values };
}

/** Fewer coefficients than this leave too little to test. */
const SHORTEST = 6;

/** The record that stands beside the values: one step back, or from the first coefficients of a long series. */
function shortRecords(series: Series, expanded: Expanded, values: readonly Evaluated[]): Map<string, ValueRecord> {
  const { length } = expanded.expansion.coefficients;
  if (length < SHORTEST) return new Map();
  const what = length > SEEN_OF_LONG ? { seen: SEEN_OF_LONG } : { hide: 1 };
  return records(series, expanded, centralSums(values), { what });
}

/** The value that stands for each prescription. */
export function centralSums(values: readonly Evaluated[]): Map<Prescription, Sum> {
  const sums = new Map<Prescription, Sum>();
  for (const { prescription, outcome } of values)
    if (outcome.kind === 'sum' && (outcome.central === true || !sums.has(prescription)))
      sums.set(prescription, outcome);
  return sums;
}

function withRecord(entry: ValueEntry, list: ReadonlyMap<string, ValueRecord>): ValueEntry {
  const record = entry.central === true ? list.get(entry.prescription) : undefined;
  return record === undefined ? entry : { ...entry, record };
}

/** The whole assessment of a series at the coupling value `at`. */
export function assess(given: Series, at: Uncertain, options: AssessOptions): Assessment {
  const series = fixedOrderSeries(given);
  const {
    expanded,
    growth,
    values: all,
  } = sumUp(series, at, {
    ...options,
    by: options.by ?? withNamed(options.verdictRule),
  });
  const values = options.by === undefined ? all.filter((v) => worthARow(v, growth)) : all;
  const alpha = toNumberExact(at.value);
  const table = termTable(series, expanded, options.digits);
  const count = expanded.expansion.coefficients.length;
  const preferred = picked(values, growth, count, options.verdictRule);
  const strength = leadingStrength(series, expanded);
  const ambiguity = ambiguityReport(series, expanded, growth, table, values, {
    ...(preferred === undefined ? {} : { preferred }),
    ...(strength === undefined ? {} : { strength }),
  });
  const record = shortRecords(series, expanded, values);
  const rows: ValueEntry[] = values.map((v) => withRecord(valueEntry(v, options.digits), record));
  return {
    leastterm: VERSION,
    request: options.request,
    series: seriesSummary(series, expanded),
    coupling: couplingSummary(series, at, expanded, options.digits, options.path),
    terms: table.rows,
    growth: growthReport(growth, expanded, strengthReport(strength), ultravioletReport(series, expanded)),
    borelPlane: planeReport(expanded, growth, options.digits, keptCorrelation(series, expanded)),
    values: rows,
    ambiguity: ambiguity.report,
    powerCorrection: powerReport(series, expanded, ambiguity, alpha),
    optimalTruncation: optimalReport(series, expanded, growth, table, options.digits),
    verdict: inUnit(verdict(values, growth, count, ambiguity.chosen, options.verdictRule), series),
    cautions: [...cautions(series, expanded, growth, table, values, alpha), ...recordCautions(record)],
  };
}
