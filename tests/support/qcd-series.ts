/** @module Series for the tests of rewriting and combining: small files, and shorthand for what is done with them. */
import { toNumberExact } from '../../src/numerics/index.js';
import { loadSeries, parseSeries, writeSeries } from '../../src/series/index.js';
import type { Series } from '../../src/series/index.js';
import { combineStudy, rewriteStudy } from '../../src/studies/index.js';
import type { RewriteRequest } from '../../src/studies/index.js';

/** A series in α_s/π at n_f = 3, μ = Q = 2 GeV, unless its text says otherwise. */
export const seriesOf = (coefficients: string, more = ''): Promise<Series> =>
  parseSeries(
    `coupling: { name: alpha_s, divisor: pi }\nscheme: MSbar\nflavours: 3\nscale ratio: 1\nhard scale: 2 GeV\n${more}\ncoefficients: ${coefficients}\n`,
    { name: 'test', form: 'yaml' },
  );

interface Refused {
  readonly reason: string;
  readonly remedy: string;
}

export type Change = Omit<RewriteRequest, 'find'>;

const find = (name: string): Promise<Series> => loadSeries(name);

/** The rewritten series; fails the test when it is refused. */
export async function rewritten(series: Series, change: Change): Promise<Series> {
  const result = await rewriteStudy(series, { ...change, find });
  if ('reason' in result) throw new Error(`${result.reason}; ${result.remedy}`);
  return result;
}

export async function rewriteRefused(series: Series, change: Change): Promise<Refused> {
  const result = await rewriteStudy(series, { ...change, find });
  if ('reason' in result) return result;
  throw new Error('not refused');
}

/** Written and read again, as a file on the way would be. */
export const throughFile = (series: Series): Promise<Series> =>
  parseSeries(writeSeries(series), { name: 'again.yaml', form: 'yaml' });

const bound = (given: Readonly<Record<string, string | Series>>) =>
  Promise.all(
    Object.entries(given).map(async ([name, series]) => ({
      name,
      from: typeof series === 'string' ? series : name,
      series: typeof series === 'string' ? await loadSeries(series) : series,
    })),
  );

export async function combined(expression: string, given: Readonly<Record<string, string | Series>>): Promise<Series> {
  const result = await combineStudy({ expression, operands: await bound(given) });
  if ('reason' in result) throw new Error(`${result.reason}; ${result.remedy}`);
  return result;
}

export async function combineRefused(
  expression: string,
  given: Readonly<Record<string, string | Series>>,
): Promise<Refused> {
  const result = await combineStudy({ expression, operands: await bound(given) });
  if ('reason' in result) return result;
  throw new Error(`${expression} was not refused`);
}

export const values = (series: Series): number[] => series.coefficients.map((c) => toNumberExact(c.value));
/** The rational coefficients as text; undefined for the others. */
export const rationals = (series: Series): (string | undefined)[] =>
  series.coefficients.map((c) => c.value.rational?.toString());
export const errors = (series: Series): (number | undefined)[] =>
  series.coefficients.map((c) => c.error && (c.error.plus.toNumber() + c.error.minus.toNumber()) / 2);
