/** @module From columns of replicas to the plain result. */
import { Substreams } from '../../numerics/index.js';
import { estimateText, indicative } from '../../studies/index.js';
import { errorText, numberText } from '../entries.js';
import type { LeftOut } from './build.js';
import { Engine, FAILURES } from './engine.js';
import type { ReplicaProblem } from './problem.js';
import { quantitiesOf } from './problem.js';
import type { ReplicaDistribution, ReplicaNumber, ReplicaQuantity, ReplicaResult, ReplicaRow } from './result.js';
import { histogram, pairOf, statistics } from './statistics.js';
import type { Estimate, Pair, Statistics } from './statistics.js';
import type { Known } from './tally.js';

/** A prescription that fails in more replicas than this is unstable, and left out of the mixture. */
export const MOST_FAILURES = 0.05;
/** Bins of the histograms. */
const BINS = 41;
/** Half-width of the range around values that are all alike, relative. */
const ALIKE = 1e-6;
/** Halves that differ by more than this many standard deviations have not converged: five percentiles, one chance in 500. */
const HALVES = 3.5;
/** Skewness from which a symmetric error misleads. Heuristic, as in the rule of thumb for linear propagation. */
const SKEWED = 0.2;
/** Ratio of widths from which the linear one misleads, beyond three Monte Carlo errors. Heuristic. */
const WIDTHS_DIFFER = 0.1;
const CENTRAL_DIGITS = 12;

/** A number with so many digits; a correlation without common replicas is not known. */
const textOf = (x: number, digits = 8): string => (Number.isFinite(x) ? indicative(x, digits) : 'unknown');

const numberOf = ({ value, error }: Estimate): ReplicaNumber => estimateText(value, error);

interface Column {
  readonly prescription: number;
  readonly quantity: number;
  readonly values: Float64Array;
  readonly statistics: Statistics | undefined;
}

interface Ends {
  readonly from: number;
  readonly to: number;
}

/** Range that holds all but the outermost values of every column. */
function endsOf(columns: readonly Column[]): Ends {
  let [from, to] = [Infinity, -Infinity];
  for (const { statistics: s } of columns) {
    from = Math.min(from, s?.ends.from ?? Infinity);
    to = Math.max(to, s?.ends.to ?? -Infinity);
  }
  if (from < to) return { from, to };
  // All values alike, or none at all.
  const room = Number.isFinite(from) ? Math.abs(from) * ALIKE : 0;
  return room > 0 ? { from: from - room, to: from + room } : { from: 0, to: 0 };
}

function distribution(values: Float64Array, s: Statistics, { from, to }: Ends): ReplicaDistribution {
  const { counts, below, above } = histogram(values, from, to, BINS);
  const { low95, low68, median, high68, high95 } = s.percentiles;
  return {
    replicas: s.count,
    median: numberOf(median),
    low68: numberOf(low68),
    high68: numberOf(high68),
    low95: numberOf(low95),
    high95: numberOf(high95),
    mean: numberOf(s.mean),
    sigma: numberOf(s.sigma),
    skewness: numberOf(s.skewness),
    ...(s.halves === undefined ? {} : { halves: indicative(s.halves, 3) }),
    histogram: counts,
    below,
    above,
  };
}

/** Width by linear propagation: the responses to independent deviates, in quadrature. */
const linearWidth = (engine: Engine, p: number, q: number): number =>
  Math.sqrt(engine.responses[p]!.reduce((sum, r) => sum + r[q]! ** 2, 0));

/** The values of the prescription drawn for each replica. */
function mixed(
  known: Known,
  stable: readonly number[],
  quantity: number,
  quantities: number,
  seed: number,
): Float64Array {
  const streams = new Substreams(seed);
  return known.index.map((index, i) => {
    const drawn = stable[Math.floor(streams.uniform(index) * stable.length)]!;
    return known.columns[drawn * quantities + quantity]![i]!;
  });
}

function rowOf(
  problem: ReplicaProblem,
  engine: Engine,
  known: Known,
  p: number,
  columns: readonly Column[],
  ends: readonly Ends[],
): ReplicaRow {
  const codes = known.codes[p]!;
  const counts = FAILURES.map((_, k) => codes.reduce((sum, code) => sum + (code === k + 1 ? 1 : 0), 0));
  const failed = counts.reduce((sum, n) => sum + n, 0);
  const { name, variants } = problem.prescriptions[p]!;
  return {
    prescription: name,
    variants,
    failed,
    reasons: FAILURES.flatMap((reason, k) => (counts[k]! > 0 ? [{ reason, count: counts[k]! }] : [])),
    stable: failed <= MOST_FAILURES * codes.length,
    values: columns
      .filter((c) => c.prescription === p)
      .map(({ quantity, values, statistics: s }) => {
        const linear = linearWidth(engine, p, quantity);
        const ratio = s && linear > 0 ? { value: s.sigma.value / linear, error: s.sigma.error / linear } : undefined;
        return {
          central: indicative(engine.central[p]![quantity]!, CENTRAL_DIGITS),
          linear: textOf(linear),
          ...(s === undefined ? {} : { distribution: distribution(values, s, ends[quantity]!) }),
          ...(ratio === undefined || !Number.isFinite(ratio.value) ? {} : { ratio: numberOf(ratio) }),
        };
      }),
  };
}

/** Words about the result as a whole. */
function notesOf(known: Known, rows: readonly ReplicaRow[], columns: readonly Column[], engine: Engine): string[] {
  const notes: string[] = [];
  const names = (list: readonly number[]): string => [...new Set(list.map((p) => rows[p]!.prescription))].join(', ');
  const those = (test: (c: Column) => boolean): readonly number[] => columns.filter(test).map((c) => c.prescription);
  if (known.index.length < known.asked)
    notes.push(`interrupted: ${known.index.length} of ${known.asked} replicas were finished`);
  const unstable = rows.filter((r) => !r.stable);
  if (unstable.length > 0)
    notes.push(
      `unstable, with more than ${100 * MOST_FAILURES} % of the replicas failed, and dropped from the mixture: ${unstable
        .map((r) => r.prescription)
        .join(', ')}`,
    );
  const apart = those((c) => (c.statistics?.halves ?? 0) > HALVES);
  if (apart.length > 0) notes.push(`the two halves of the replicas disagree: take more replicas (${names(apart)})`);
  const skewed = those((c) => c.statistics !== undefined && Math.abs(c.statistics.skewness.value) > SKEWED);
  if (skewed.length > 0)
    notes.push(
      `skewed (beyond ${SKEWED}): quote both ends of the interval, not one symmetric error (${names(skewed)})`,
    );
  const wide = those(({ prescription, quantity, statistics: s }) => {
    const linear = linearWidth(engine, prescription, quantity);
    return s !== undefined && Math.abs(s.sigma.value - linear) > Math.max(WIDTHS_DIFFER * linear, 3 * s.sigma.error);
  });
  if (wide.length > 0)
    notes.push(
      `linear propagation misses the width of the replicas by more than ${100 * WIDTHS_DIFFER} % (${names(wide)})`,
    );
  return notes;
}

function quantityEntries(problem: ReplicaProblem, ends: readonly Ends[]): ReplicaQuantity[] {
  const list = [...problem.parameters, ...(problem.derived === undefined ? [] : [problem.derived])];
  return list.map(({ symbol, unit }, q) => ({
    symbol,
    ...(unit === undefined ? {} : { unit }),
    from: numberText(ends[q]!.from, 6),
    to: numberText(ends[q]!.to, 6),
  }));
}

/** The result of all replicas that are known. */
export function summarise(
  problem: ReplicaProblem,
  known: Known,
  seed: number,
  leftOut: readonly LeftOut[],
): ReplicaResult {
  const engine = new Engine(problem, seed);
  const quantities = quantitiesOf(problem);
  const columns = known.columns.map((values, k): Column => ({
    prescription: Math.floor(k / quantities),
    quantity: k % quantities,
    values,
    statistics: statistics(values),
  }));
  const ends = Array.from({ length: quantities }, (_, q) => endsOf(columns.filter((c) => c.quantity === q)));
  const rows = problem.prescriptions.map((_, p) => rowOf(problem, engine, known, p, columns, ends));
  const stable = rows.flatMap((row, p) => (row.stable ? [p] : []));
  const { names, central, plus, minus, drawn } = problem.inputs;
  return {
    asked: known.asked,
    done: known.index.length,
    interrupted: known.index.length < known.asked,
    seed: String(seed),
    quantities: quantityEntries(problem, ends),
    inputs: drawn.map((i) => ({
      name: names[i]!,
      central: numberText(central[i]!, CENTRAL_DIGITS),
      plus: errorText(plus[i]!),
      minus: errorText(minus[i]!),
    })),
    rows,
    ...(stable.length < 2 ? {} : { mixture: mixtureOf(problem, known, stable, ends, seed) }),
    covariance: covariances(problem, rows, columns),
    leftOut,
    notes: notesOf(known, rows, columns, engine),
  };
}

/** Covariances and correlations of all columns that have values. */
function covariances(
  problem: ReplicaProblem,
  rows: readonly ReplicaRow[],
  columns: readonly Column[],
): ReplicaResult['covariance'] {
  const symbols = [...problem.parameters, ...(problem.derived === undefined ? [] : [problem.derived])].map(
    (q) => q.symbol,
  );
  const known = columns.filter((c) => c.statistics !== undefined);
  const pairs = known.map((a, i) => known.slice(0, i + 1).map((b) => pairOf(a.values, b.values)));
  const table = (text: (pair: Pair) => string): string[][] =>
    known.map((_, i) => known.map((_column, j) => text(pairs[Math.max(i, j)]![Math.min(i, j)]!)));
  return {
    labels: known.map((c) => `${rows[c.prescription]!.prescription}: ${symbols[c.quantity]!}`),
    matrix: table((p) => textOf(p.covariance)),
    correlation: table((p) => (p.correlation === 1 ? '1' : textOf(p.correlation, 4))),
  };
}

function mixtureOf(
  problem: ReplicaProblem,
  known: Known,
  stable: readonly number[],
  ends: readonly Ends[],
  seed: number,
): NonNullable<ReplicaResult['mixture']> {
  const quantities = quantitiesOf(problem);
  const lists = ends.map((_, q) => mixed(known, stable, q, quantities, seed));
  return {
    prescriptions: stable.map((p) => problem.prescriptions[p]!.name),
    failed: lists[0]!.reduce((sum, value) => sum + (Number.isNaN(value) ? 1 : 0), 0),
    values: lists.map((values, q) => {
      const s = statistics(values);
      return s === undefined ? {} : { distribution: distribution(values, s, ends[q]!) };
    }),
  };
}
