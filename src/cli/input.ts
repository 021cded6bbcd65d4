/** @module From operands and options to a series, a coupling value, and the request that the result repeats. */
import type { Call } from './command.js';
import { UsageError } from './faults.js';
import { couplingValue } from './quantities.js';
import { accepted } from './refused.js';
import { askedOf } from './request.js';
import type { Request } from './request.js';
import type { ReadNumber, Series, Uncertain } from '../series/index.js';

/** Certified digits of each value when --digits is not given. */
export const USUAL_DIGITS = 15;

/** Loads the series that the first operand names: a catalogue id, a file, or - for standard input. */
export async function readSeries(name: string, { given, surroundings }: Call): Promise<Series> {
  const series = await import('./rooms-core.js');
  if (name === '-' && surroundings.stdinIsTerminal && !given.quiet) {
    surroundings.stderr.write('leastterm: reading the series from the terminal; Ctrl-D ends it\n');
  }
  const flavours = given.flavours === undefined ? {} : { flavours: given.flavours };
  const stdin = surroundings.stdin === undefined ? {} : { stdin: surroundings.stdin };
  const loaded = await series.loadSeries(name, { ...flavours, ...stdin });
  const known = loaded.coefficients.length;
  if ((given.order ?? 0) > known && !given.quiet)
    surroundings.stderr.write(`leastterm: --order ${given.order}: ${loaded.id} has ${known}; all of them are used\n`);
  if (given.strongCoupling === undefined) return loaded;
  const strongCoupling = series.parseStrongCoupling(given.strongCoupling);
  if (strongCoupling !== undefined) return { ...loaded, strongCoupling };
  throw new UsageError(
    `--strong-coupling: "${given.strongCoupling}" is not two numbers, the second one positive; wanted the power and the spacing of the exponents, such as 1/3,2/3`,
  );
}

/** The value of --at. */
export async function readCoupling(at: string, command: string): Promise<Uncertain> {
  const series = await import('./rooms-core.js');
  const value = series.parseUncertain(at);
  if (series.isNumberProblem(value)) throw new UsageError(`--at: ${value.problem}; wanted ${value.wanted}`, command);
  return value;
}

/** The value of --at where the command cannot do without. */
export async function neededCoupling({ given }: Call, command: string): Promise<Uncertain> {
  if (given.at === undefined) {
    throw new UsageError(`--at is missing: the value of the coupling or variable; write --at '0.3156(30)'`, command);
  }
  return readCoupling(given.at, command);
}

/** The coupling as the command line gives it: its value, or alpha_s(M_Z) that has to be evolved to the series. */
export type WantedCoupling =
  { readonly at: Uncertain; readonly mz?: undefined } | { readonly at?: undefined; readonly mz: Uncertain };

/** --at or --alpha-s-mz, one of the two, read before the series is. */
export async function wantedCoupling(call: Call, command: string): Promise<WantedCoupling> {
  const { at, alphaSMZ } = call.given;
  if (alphaSMZ === undefined) return { at: await neededCoupling(call, command) };
  if (at !== undefined) throw new UsageError('--at and --alpha-s-mz exclude each other: give one of them', command);
  return { mz: await couplingValue('alpha-s-mz', alphaSMZ, command) };
}

/** The coupling of the series, and how it was reached when it was evolved. */
export async function couplingOf(
  wanted: WantedCoupling,
  series: Series,
  command: string,
): Promise<{ readonly at: Uncertain; readonly path?: readonly string[] }> {
  if (wanted.at !== undefined) return { at: wanted.at };
  const { studies } = await import('./rooms.js');
  return accepted(studies.couplingFromMZ(series, wanted.mz), command);
}

/** The value of --exact. */
export async function exactValue(text: string | undefined, command: string): Promise<ReadNumber | undefined> {
  if (text === undefined) return undefined;
  const { series } = await import('./rooms.js');
  const value = series.parseUncertain(text);
  if (series.isNumberProblem(value)) throw new UsageError(`--exact: ${value.problem}; wanted ${value.wanted}`, command);
  return value;
}

/** What was asked of a command on a series. */
export const requestOf = (command: string, series: string | readonly string[], { given }: Call): Request =>
  askedOf(command, { series }, given, { digits: USUAL_DIGITS });
