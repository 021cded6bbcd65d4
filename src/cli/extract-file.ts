/**
 * @module The problem file of extract: measurements with their series, and any option by its name. What the command line says
 * as well, the command line wins.
 */
import type { Given } from './command.js';
import { EXTRACT_OPTIONS } from './options-extract.js';
import { UsageError } from './faults.js';
import { checkedMatrix } from './extract-values.js';
import type { PlainTree } from '../series/index.js';

const COMMAND = 'extract';

/** One measurement as texts. */
export interface Row {
  readonly series: string;
  readonly measured?: string;
  readonly scale?: string;
  readonly massPower?: string;
  readonly norm?: string;
}

export interface ProblemFile {
  readonly given: Given;
  readonly rows: readonly Row[];
  readonly correlation?: readonly (readonly number[])[];
}

/** Fields of a measurement, and what they are called inside. */
const ROW_FIELDS = {
  series: 'series',
  measured: 'measured',
  'scale of measurement': 'scale',
  'mass power': 'massPower',
  norm: 'norm',
} as const;

/** Options that a file may hold besides those of extract alone. */
const COMMON = {
  to: 'to', only: 'only', except: 'except', family: 'family', threshold: 'threshold', at: 'at', mass: 'mass',
  'alpha-s-mz': 'alphaSMZ',
} as const; // prettier-ignore
const COUNTS = { loops: 'loops', order: 'order', 'to-flavours': 'toFlavours', digits: 'digits' } as const;
const LISTS = ['only', 'except', 'family', 'threshold', 'condensate'];
/** Not for a file, or read apart. */
const APART = ['problem', 'measured', 'scale-of-measurement', 'correlation'];

const camel = (name: string): string => name.replace(/-(\w)/g, (_, letter: string) => letter.toUpperCase());

const isMap = (tree: PlainTree | undefined): tree is { readonly [field: string]: PlainTree } =>
  typeof tree === 'object' && !Array.isArray(tree);
const isList = (tree: PlainTree | undefined): tree is readonly PlainTree[] => Array.isArray(tree);

const complain = (path: string, field: string, found: string, wanted: string): UsageError =>
  new UsageError(`${path}: ${field}: ${found}; wanted ${wanted}`, COMMAND);

async function suggestion(name: string, known: readonly string[]): Promise<string> {
  const { series } = await import('./rooms.js');
  return series.suggestion(name, known);
}

async function rowOf(path: string, tree: PlainTree, i: number): Promise<Row> {
  const field = `measurements[${i}]`;
  if (!isMap(tree)) throw complain(path, field, 'no group of fields', '{ series: adler, measured: 0.2042(50) }');
  const row: Record<string, string> = {};
  const known = Object.keys(ROW_FIELDS);
  for (const [name, value] of Object.entries(tree)) {
    if (!(name in ROW_FIELDS))
      throw complain(
        path,
        `${field}.${name}`,
        `unknown field${await suggestion(name, known)}`,
        `one of ${known.join(', ')}`,
      );
    if (typeof value !== 'string') throw complain(path, `${field}.${name}`, 'no single value', 'a text or a number');
    row[ROW_FIELDS[name as keyof typeof ROW_FIELDS]] = value;
  }
  const { series, ...rest } = row;
  if (series === undefined) throw complain(path, field, 'no series', 'a catalogue id or a series file');
  return { series, ...rest };
}

/** A correlation matrix written into the file. */
function matrixOf(path: string, tree: PlainTree, count: number): readonly (readonly number[])[] {
  if (!isList(tree)) throw complain(path, 'correlation', 'no matrix', 'a list of rows, or one number');
  const rows = tree.map((row) =>
    isList(row) ? row.map((cell) => (typeof cell === 'string' ? Number(cell) : NaN)) : [],
  );
  return checkedMatrix(rows, count, `${path}: correlation`);
}

/** The options of the file under the names of their fields. */
async function optionsOf(
  path: string,
  fields: readonly (readonly [string, PlainTree])[],
): Promise<Record<string, unknown>> {
  const given: Record<string, unknown> = {};
  const own = Object.keys(EXTRACT_OPTIONS).filter((name) => !APART.includes(name));
  const known = [...own, ...Object.keys(COMMON), ...Object.keys(COUNTS), 'norm', 'mass-power'];
  for (const [name, value] of fields) {
    const option = name.replaceAll(' ', '-');
    if (!known.includes(option))
      throw complain(
        path,
        name,
        `unknown field${await suggestion(option, ['measurements', ...known])}`,
        `measurements, correlation, or one of ${known.join(', ')}`,
      );
    const place = option in COMMON ? COMMON[option as keyof typeof COMMON] : camel(option);
    if (option in COUNTS) {
      const count = typeof value === 'string' ? Number(value) : NaN;
      if (!Number.isInteger(count) || count < 0) throw complain(path, name, 'no whole number', 'a whole number');
      given[COUNTS[option as keyof typeof COUNTS]] = count;
    } else if (LISTS.includes(option)) {
      const list = isList(value) ? value : [value];
      if (!list.every((item) => typeof item === 'string')) throw complain(path, name, 'no list of texts', 'texts');
      given[place] = list;
    } else {
      if (typeof value !== 'string') throw complain(path, name, 'no single value', 'a text or a number');
      given[place] = value;
    }
  }
  return given;
}

/** Reads the file and lays the command line over it. */
export async function problemFile(path: string, onLine: Given): Promise<ProblemFile> {
  const { series } = await import('./rooms.js');
  const tree = await series.loadPlainTree(path);
  if (!isMap(tree)) throw complain(path, 'the file', 'no fields', 'measurements: and options by their names');
  const { measurements, correlation, ...others } = tree;
  if (!isList(measurements) || measurements.length === 0)
    throw complain(path, 'measurements', 'none', 'a list of { series: adler, measured: 0.2042(50) }');
  const rows = await Promise.all(measurements.map((m, i) => rowOf(path, m, i)));
  const options = await optionsOf(path, Object.entries(others));
  const matrix = isList(correlation) ? matrixOf(path, correlation, rows.length) : undefined;
  const single = typeof correlation === 'string' ? { correlation } : {};
  return {
    given: { ...options, ...single, ...onLine },
    rows,
    ...(matrix === undefined || onLine.correlation !== undefined ? {} : { correlation: matrix }),
  };
}
