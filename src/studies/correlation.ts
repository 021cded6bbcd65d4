/** @module The correlation matrix of the coefficients that an expansion keeps. */
import type { Series } from '../series/index.js';
import type { Expanded } from './expand.js';

/** Rows and columns of the kept coefficients; undefined where the file states no correlation. */
export function keptCorrelation(series: Series, expanded: Expanded): number[][] | undefined {
  const from = expanded.leadingZeros;
  const to = from + expanded.expansion.coefficients.length;
  return series.correlation?.slice(from, to).map((row) => row.slice(from, to).map((q) => q.toNumber()));
}
