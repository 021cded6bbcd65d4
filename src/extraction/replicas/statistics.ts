/**
 * @module What a column of replicas says, with its Monte Carlo errors.
 *
 * Percentile    the order statistic at (n − 1) q, interpolated; its error is half the distance between the order statistics
 *               √(n q (1 − q)) ranks above and below.
 * Moments       mean ± σ/√n; σ ± σ √((κ + 2)/(4n)), κ the excess; skewness ± √(6/n) (normal distribution).
 * Halves        the percentiles of the first and of the second half, their difference in units of its error, 2 × that of all.
 * Reference     H. A. David, H. N. Nagaraja, Order Statistics (2003), ch. 7 (memory).
 */

/** Ends of the central intervals, and the median. */
export const LEVELS = { low95: 0.025, low68: 0.16, median: 0.5, high68: 0.84, high95: 0.975 } as const;
export type LevelName = keyof typeof LEVELS;
const LEVEL_NAMES = ['low95', 'low68', 'median', 'high68', 'high95'] as const;

export interface Estimate {
  readonly value: number;
  readonly error: number;
}

export interface Statistics {
  readonly count: number;
  readonly percentiles: Readonly<Record<LevelName, Estimate>>;
  readonly mean: Estimate;
  readonly sigma: Estimate;
  readonly skewness: Estimate;
  /** All values but the share OUTSIDE at either end. */
  readonly ends: { readonly from: number; readonly to: number };
  /** Largest difference of the halves' percentiles in units of its error; absent for fewer than TWO_HALVES replicas. */
  readonly halves?: number;
}

/** Share of the values left outside of a histogram at each end. */
const OUTSIDE = 0.002;
/** Replicas below which halves say nothing. */
const TWO_HALVES = 100;

/** The order statistic at place p (from 0), interpolated. */
export function orderStatistic(sorted: Float64Array, p: number): number {
  const at = Math.min(Math.max(p, 0), sorted.length - 1);
  const low = Math.floor(at);
  const value = sorted[low]!;
  const next = sorted[Math.min(low + 1, sorted.length - 1)]!;
  return value + (at - low) * (next - value);
}

function percentile(sorted: Float64Array, q: number): Estimate {
  const n = sorted.length;
  const at = (n - 1) * q;
  const ranks = Math.sqrt(n * q * (1 - q));
  return {
    value: orderStatistic(sorted, at),
    error: (orderStatistic(sorted, at + ranks) - orderStatistic(sorted, at - ranks)) / 2,
  };
}

/** Values that are numbers, in order of the replicas. */
export function present(column: Float64Array): Float64Array {
  return column.filter((value) => !Number.isNaN(value));
}

function percentiles(sorted: Float64Array): Record<LevelName, Estimate> {
  const at = (name: LevelName): Estimate => percentile(sorted, LEVELS[name]);
  return { low95: at('low95'), low68: at('low68'), median: at('median'), high68: at('high68'), high95: at('high95') };
}

/** Mean and central moments 2, 3, 4, by two passes. */
function moments(values: Float64Array): { mean: number; m2: number; m3: number; m4: number } {
  const n = values.length;
  let sum = 0;
  for (const value of values) sum += value;
  const mean = sum / n;
  let [m2, m3, m4] = [0, 0, 0];
  for (const value of values) {
    const d = value - mean;
    m2 += d * d;
    m3 += d * d * d;
    m4 += d * d * d * d;
  }
  return { mean, m2: m2 / n, m3: m3 / n, m4: m4 / n };
}

/** Statistics of a column; undefined when fewer than two replicas have a value. */
export function statistics(column: Float64Array): Statistics | undefined {
  const values = present(column);
  const n = values.length;
  if (n < 2) return undefined;
  const { mean, m2, m3, m4 } = moments(values);
  const sigma = Math.sqrt((m2 * n) / (n - 1));
  const excess = m2 > 0 ? m4 / (m2 * m2) - 3 : 0;
  const sorted = values.toSorted();
  const all = percentiles(sorted);
  const common = {
    count: n,
    percentiles: all,
    ends: {
      from: orderStatistic(sorted, OUTSIDE * (n - 1)),
      to: orderStatistic(sorted, (1 - OUTSIDE) * (n - 1)),
    },
    mean: { value: mean, error: sigma / Math.sqrt(n) },
    sigma: { value: sigma, error: sigma * Math.sqrt(Math.max(0, excess + 2) / (4 * n)) },
    skewness: { value: m2 > 0 ? m3 / m2 ** 1.5 : 0, error: Math.sqrt(6 / n) },
  };
  if (n < TWO_HALVES) return common;
  const half = Math.floor(n / 2);
  const [first, second] = [values.subarray(0, half), values.subarray(n - half)].map((part) =>
    percentiles(part.toSorted()),
  );
  const pulls = LEVEL_NAMES.map((name) => {
    const gap = Math.abs(first![name].value - second![name].value);
    return gap === 0 ? 0 : gap / (2 * all[name].error);
  });
  return { ...common, halves: Math.max(...pulls) };
}

/** Covariance and correlation of two columns over the replicas in which both have a value. */
export interface Pair {
  /** NaN for fewer than two replicas. */
  readonly covariance: number;
  /** 0 where one of them does not vary. */
  readonly correlation: number;
}

export function pairOf(a: Float64Array, b: Float64Array): Pair {
  let n = 0;
  let [sa, sb] = [0, 0];
  for (let i = 0; i < a.length; i++) {
    const [x, y] = [a[i]!, b[i]!];
    // Only a number equals itself.
    if (x === x && y === y) {
      n++;
      sa += x;
      sb += y;
    }
  }
  if (n < 2) return { covariance: NaN, correlation: NaN };
  const [ma, mb] = [sa / n, sb / n];
  let [aa, ab, bb] = [0, 0, 0];
  for (let i = 0; i < a.length; i++) {
    const [x, y] = [a[i]! - ma, b[i]! - mb];
    if (x === x && y === y) {
      aa += x * x;
      ab += x * y;
      bb += y * y;
    }
  }
  const size = Math.sqrt(aa * bb);
  return { covariance: ab / (n - 1), correlation: size > 0 ? ab / size : 0 };
}

export interface Histogram {
  readonly from: number;
  readonly to: number;
  readonly counts: readonly number[];
  readonly below: number;
  readonly above: number;
}

/** Counts in equal bins; values at the upper end belong to the last one. */
export function histogram(column: Float64Array, from: number, to: number, bins: number): Histogram {
  const counts = new Array<number>(bins).fill(0);
  let [below, above] = [0, 0];
  for (const value of column) {
    if (Number.isNaN(value)) continue;
    if (value < from) below++;
    else if (value > to) above++;
    else counts[Math.min(bins - 1, Math.floor(((value - from) / (to - from)) * bins))]! += 1;
  }
  return { from, to, counts, below, above };
}
