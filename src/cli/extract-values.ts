/** @module The values of extract's options as plain data: measurements, condensates, correlations. Nothing is guessed. */
import { UsageError } from './faults.js';
import { scaleOf } from './quantities.js';
import type { CondensateChoice, CondensateDefinition, Problem, Quantity } from '../extraction/index.js';

const COMMAND = 'extract';

const complain = (option: string, text: string, wanted: string): UsageError =>
  new UsageError(`--${option}: "${text}" ${wanted}`, COMMAND);

const UNIT = /^(.*?)\s*(GeV|MeV|TeV)(?:\^([-+]?\d+(?:\.\d+)?))?$/;
const IN_GEV = { GeV: 1, MeV: 1e-3, TeV: 1e3 } as const;
const isUnit = (text: string | undefined): text is keyof typeof IN_GEV => text !== undefined && text in IN_GEV;

/** A number with its errors and perhaps a power of GeV. */
export async function quantityOf(option: string, text: string): Promise<Quantity> {
  const { numerics, series } = await import('./rooms.js');
  const [, number, unit, power = '1'] = UNIT.exec(text.trim()) ?? [undefined, text, undefined];
  const read = series.parseUncertain(number ?? text);
  if (series.isNumberProblem(read))
    throw new UsageError(`--${option}: ${read.problem}; wanted ${read.wanted}`, COMMAND);
  const value = read.value.rational ?? numerics.Rational.ZERO;
  const dimension = unit === undefined ? undefined : Number(power);
  const inGeV = isUnit(unit) ? IN_GEV[unit] : 1;
  if (inGeV !== 1 && !Number.isInteger(dimension))
    throw complain(option, text, 'has a broken power of its unit; give it in GeV');
  const scale = inGeV === 1 ? numerics.Rational.ONE : numerics.Rational.fromNumber(inGeV).pow(dimension ?? 1);
  const scaled = value.mul(inGeV < 1 ? numerics.Rational.of(1, 1000).pow(dimension ?? 1) : scale);
  const size = inGeV ** (dimension ?? 0);
  return {
    text: text.trim(),
    value: series.decimalText(scaled) ?? scaled.toString(),
    plus: (read.error?.plus.toNumber() ?? 0) * size,
    minus: (read.error?.minus.toNumber() ?? 0) * size,
    ...(dimension === undefined ? {} : { dimension }),
  };
}

/** NAME=VALUE or NAME. */
export async function condensateOf(text: string): Promise<CondensateChoice> {
  const at = text.lastIndexOf('=');
  if (at < 0) return { name: text.trim() };
  const name = text.slice(0, at).trim();
  const value = await quantityOf('condensate', text.slice(at + 1));
  if (value.dimension === undefined)
    throw complain(
      'condensate',
      text,
      `has no unit; write '${name}=${value.text} GeV^4' with the power of its dimension`,
    );
  return { name, value };
}

/** pv, truncated, cutoff:1GeV, any. */
export async function definitionOf(text: string | undefined): Promise<CondensateDefinition | undefined> {
  if (text === undefined) return undefined;
  if (text === 'pv' || text === 'truncated' || text === 'any') return { kind: text };
  const cut = /^cutoff:(.+)$/.exec(text);
  if (cut !== null) return { kind: 'cutoff', mu: await scaleOf('condensate-by', cut[1] ?? '', COMMAND) };
  throw complain('condensate-by', text, 'is no sum; wanted pv, truncated, cutoff:1GeV or any');
}

/** One number for all pairs, or the rows of a file. */
export async function correlationOf(text: string | undefined, count: number): Promise<Problem['correlation']> {
  if (text === undefined) return undefined;
  if (count < 2) throw new UsageError('--correlation: one measurement has none to be correlated with', COMMAND);
  const single = Number(text);
  if (text.trim() !== '' && Number.isFinite(single)) {
    if (Math.abs(single) >= 1)
      throw complain('correlation', text, 'is no correlation; wanted a number between -1 and 1');
    return square(count, (i, j) => (i === j ? 1 : single));
  }
  const { series } = await import('./rooms.js');
  const lines = (await series.readTextFile(text)).split('\n').map((line) => line.replace(/#.*/, '').trim());
  const rows = lines
    .filter((line) => line !== '')
    .map((line) => line.split(/[,;\s]+/).filter((cell) => cell !== '').map(Number)); // prettier-ignore
  return checkedMatrix(rows, count, `--correlation: ${text}`);
}

const square = (n: number, entry: (i: number, j: number) => number): number[][] =>
  Array.from({ length: n }, (_, i) => Array.from({ length: n }, (__, j) => entry(i, j)));

/** A symmetric matrix with 1 on its diagonal. */
export function checkedMatrix(
  rows: readonly (readonly number[])[],
  count: number,
  where: string,
): readonly (readonly number[])[] {
  const bad = (found: string, wanted: string): UsageError =>
    new UsageError(`${where}: ${found}; wanted ${wanted}`, COMMAND);
  if (rows.length !== count) throw bad(`${rows.length} rows`, `${count}, one for each measurement`);
  rows.forEach((row, i) => {
    if (row.length !== count) throw bad(`${row.length} numbers in row ${i + 1}`, `${count}, one for each measurement`);
    row.forEach((value, j) => {
      const place = `row ${i + 1}, column ${j + 1}`;
      if (Number.isNaN(value)) throw bad(`no number in ${place}`, 'numbers from -1 to 1');
      if (i === j && value !== 1) {
        const variance = value < 0 ? ', a negative variance' : '';
        throw bad(`${value} in ${place}, on the diagonal${variance}`, '1 there: correlations, no covariances');
      }
      if (Math.abs(value) > 1) throw bad(`${value} in ${place}`, 'numbers from -1 to 1');
      const across = rows[j]?.[i];
      if (across !== value)
        throw bad(`${value} in ${place}, but ${across ?? ''} across the diagonal`, 'a symmetric matrix');
    });
  });
  return rows;
}

/** FROM:TO. */
export function searchOf(text: string | undefined): Problem['search'] {
  if (text === undefined) return undefined;
  const [from, to, more] = text.split(':').map((part) => Number(part.replace(/\s*GeV$/, '')));
  if (more !== undefined || !(from !== undefined && to !== undefined && from > 0 && to > from && to < Infinity))
    throw complain('search', text, 'is no range; wanted FROM:TO with 0 < FROM < TO, such as 0.1:0.5');
  return { from, to };
}
