/**
 * @module compare: every prescription that accepts the series, one row each, at one coupling or many.
 */
import { R } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';
import type { Prescription, Sum } from '../prescriptions/index.js';
import { isRefusal } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import type { ReadNumber, Series, Uncertain } from '../series/index.js';
import type { AssessOptions } from './assess.js';
import { centralSums, sumUp } from './assess.js';
import type { Summed } from './assess.js';
import type { Caution, CouplingSummary, Refused, SeriesSummary, Standing, ValueRecord } from './assessment.js';
import { records, SEEN_OF_LONG } from './backtesting/record.js';
import { cautions } from './cautions.js';
import { valueCautions } from './comparing-cautions.js';
import { fixedOrderSeries } from './contour/moment.js';
import { checkCoupling } from './coupling-range.js';
import { ballText } from './figures.js';
import { atScaleRatio } from './scale-grid.js';
import type { ComparedAt } from './scale-grid.js';
import { couplingSummary, seriesSummary } from './summary.js';
import { valueEntry } from './values.js';
import type { Evaluated } from './values.js';
import { VERSION } from './version.js';

export const SORTS = ['value', 'truncation', 'ambiguity', 'score'] as const;
export type Sort = (typeof SORTS)[number];

export interface CompareRow {
  /** The coupling value of this row, and x; μ/Q where scales are compared. */
  readonly at: string;
  readonly x: string;
  readonly scale?: string;
  readonly prescription: string;
  readonly family: Prescription['family'];
  readonly variant: string;
  readonly value?: string;
  readonly truncationError?: string;
  readonly ambiguity?: string;
  readonly imaginary?: string;
  readonly inputError?: string;
  readonly termsUsed?: number;
  /** Trust in the number. */
  readonly standing?: Standing;
  /** How the shown digits are known. */
  readonly digits?: Standing;
  readonly record?: ValueRecord;
  readonly cautions: readonly Caution[];
  readonly refused?: Refused;
}

export interface Spread {
  readonly count: number;
  readonly low: string;
  readonly high: string;
  readonly width: string;
}

export interface ComparePoint {
  readonly coupling: CouplingSummary;
  /** μ/Q, where scales are compared. */
  readonly scale?: string;
  /** Lowest and highest value: of all rows, and of those without a caution. */
  readonly spread: { readonly all?: Spread; readonly unflagged?: Spread };
}

export interface CompareResult {
  readonly leastterm: string;
  readonly request: AssessOptions['request'];
  readonly series: SeriesSummary;
  /** One for each coupling or scale. */
  readonly points: readonly ComparePoint[];
  /** One for each point and prescription, refusals included. */
  readonly rows: readonly CompareRow[];
  readonly cautions: readonly Caution[];
}

export interface CompareOptions extends Omit<AssessOptions, 'verdictRule'> {
  readonly sort?: Sort;
  /** Most coefficients hidden in the back-test; 0 leaves it out. Absent: 1, but all after the first few for a long series. */
  readonly hide?: number;
  readonly exact?: ReadNumber;
}

interface Row {
  readonly entry: CompareRow;
  readonly value?: Ball;
  readonly key: number;
}

/** Beyond so many coefficients one step back costs as much as the comparison: the first few are seen instead. A heuristic. */
const LONG = 24;
/** Digits of the ends of a spread. */
const SPREAD_DIGITS = 8;

function spreadOf(values: readonly Ball[]): Spread | undefined {
  const [first] = values;
  if (first === undefined) return undefined;
  const order = (a: Ball, b: Ball): number => R.compare(a, b, 200);
  const low = values.reduce((a, b) => (order(b, a) < 0 ? b : a), first);
  const high = values.reduce((a, b) => (order(b, a) > 0 ? b : a), first);
  return {
    count: values.length,
    low: ballText(low, SPREAD_DIGITS),
    high: ballText(high, SPREAD_DIGITS),
    width: order(low, high) === 0 ? '0' : ballText(R.sub(high, low, 200), 3),
  };
}

/** What the rows are sorted by; without it a row comes last. */
function keyOf(sum: Sum, record: ValueRecord | undefined, sort: Sort | undefined): number {
  switch (sort) {
    case undefined:
      return 0;
    case 'value':
      return R.toNumber(sum.value);
    case 'truncation':
      return sum.truncation ?? Infinity;
    case 'ambiguity':
      return sum.imaginary === undefined ? Infinity : Math.abs(R.toNumber(sum.imaginary));
    case 'score':
      return record === undefined ? Infinity : Number(record.score);
  }
}

/** The rows at one coupling. */
function pointRows(
  { series, scale }: ComparedAt,
  summed: Summed,
  point: CouplingSummary,
  options: CompareOptions,
): Row[] {
  const { expanded, growth, values } = summed;
  const sums = centralSums(values);
  const long = expanded.expansion.coefficients.length > LONG;
  const { hide = 1 } = options;
  const what = options.hide === undefined && long ? { seen: SEEN_OF_LONG } : { hide };
  const exact = options.exact === undefined ? {} : { exact: options.exact };
  const list = hide > 0 ? records(series, expanded, sums, { what, ...exact }) : new Map<string, ValueRecord>();
  const place = { at: point.value, x: point.x, ...(scale === undefined ? {} : { scale }) };
  const rowOf = (prescription: Prescription, own: readonly Evaluated[]): Row => {
    const { name, family } = prescription;
    const sum = sums.get(prescription);
    const of = own.find((v) => v.outcome === sum) ?? own[0];
    if (of === undefined) {
      const refused = { reason: 'no value', remedy: 'choose another prescription' };
      return { entry: { ...place, prescription: name, family, variant: '', cautions: [], refused }, key: Infinity };
    }
    const { notes: _notes, central: _central, ...entry } = valueEntry(of, options.digits);
    if (sum === undefined) return { entry: { ...place, family, ...entry, cautions: [] }, key: Infinity };
    const record = list.get(name);
    const flags = valueCautions(expanded.expansion, growth, prescription, sum, record);
    return {
      entry: { ...place, family, ...entry, ...(record === undefined ? {} : { record }), cautions: flags },
      value: sum.value,
      key: keyOf(sum, record, options.sort),
    };
  };
  const prescriptions = [...new Set(values.map((v) => v.prescription))];
  const rows = prescriptions.map((p) =>
    rowOf(
      p,
      values.filter((v) => v.prescription === p),
    ),
  );
  if (options.sort === undefined) return rows;
  return rows.toSorted((a, b) => (a.key === b.key ? 0 : a.key - b.key));
}

/** All prescriptions side by side, at each of the coupling values. */
export function compare(given: Series, at: readonly Uncertain[], options: CompareOptions): CompareResult {
  const series = fixedOrderSeries(given);
  return comparePoints(
    series,
    at.map((value) => ({ series, at: value })),
    options,
  );
}

/** The same at each of the scales μ/Q, `at` being the coupling at the scale of the file. */
export async function compareScales(
  given: Series,
  at: Uncertain,
  scales: readonly Uncertain[],
  options: CompareOptions,
): Promise<CompareResult | Refusal> {
  const series = fixedOrderSeries(given);
  checkCoupling(series, at);
  const places: ComparedAt[] = [];
  for (const scale of scales) {
    const place = await atScaleRatio(series, at, scale);
    if (isRefusal(place)) return place;
    places.push(place);
  }
  return comparePoints(series, places, options);
}

function comparePoints(given: Series, places: readonly ComparedAt[], options: CompareOptions): CompareResult {
  const points: ComparePoint[] = [];
  const rows: CompareRow[] = [];
  const said: Caution[] = [];
  let summary: SeriesSummary | undefined;
  for (const place of places) {
    const { series, at: value, scale } = place;
    const summed = sumUp(series, value, options, true);
    const { expanded, growth } = summed;
    const coupling = couplingSummary(series, value, expanded, options.digits, options.path);
    const own = pointRows(place, summed, coupling, options);
    const all = spreadOf(own.flatMap((r) => (r.value === undefined ? [] : [r.value])));
    const unflagged = spreadOf(
      own.flatMap((r) => (r.value === undefined || r.entry.cautions.length > 0 ? [] : [r.value])),
    );
    points.push({
      coupling,
      ...(scale === undefined ? {} : { scale }),
      spread: { ...(all === undefined ? {} : { all }), ...(unflagged === undefined ? {} : { unflagged }) },
    });
    rows.push(...own.map((r) => r.entry));
    said.push(...cautions(series, expanded, growth, undefined, summed.values));
    summary ??= { ...seriesSummary(series, expanded), title: given.title, notes: given.notes };
  }
  if (summary === undefined) throw new RangeError('compare: no coupling value given');
  return {
    leastterm: VERSION,
    request: options.request,
    series: summary,
    points,
    rows,
    cautions: said.filter((c, i) => said.findIndex((d) => d.code === c.code) === i),
  };
}
