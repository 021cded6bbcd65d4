/** @module A series on its way from one convention to another: what the steps change, and what they have to say. */
import type { Exact } from '../../numerics/index.js';
import { isRefusal } from '../../qcd/index.js';
import type { CouplingDivisor, Refusal } from '../../qcd/index.js';
import type { KnownSingularity, Series } from '../../series/index.js';
import { freestanding } from '../derive/freestanding.js';
import { FormalReader } from '../derive/read-formal.js';
import { Sources } from '../derive/sources.js';
import { trackedExact } from '../derive/tracked.js';
import type { Tracked } from '../derive/tracked.js';
import { couplingScheme, flavoursOf } from '../scheme.js';
import type { CouplingScheme } from '../scheme.js';

export interface State {
  readonly series: Series;
  readonly scheme: CouplingScheme;
  readonly flavours: number;
  readonly divisor: CouplingDivisor;
  readonly scaleRatio: Exact | undefined;
  readonly firstPower: number;
  readonly coefficients: readonly Tracked[];
  readonly sources: Sources;
  readonly singularities: readonly KnownSingularity[];
  /** Words for the scheme's mass; undefined when the file names none. */
  readonly mass: 'pole' | 'msbar' | 'running' | undefined;
  /** What was done, for the notes of the new file. */
  readonly notes: readonly string[];
  /** The quantity itself has changed (another mass in front of it). */
  readonly otherQuantity: boolean;
}

/** Coefficients of a series as tracked numbers; their errors become sources under its name. */
export async function trackedCoefficients(series: Series, name: string, sources: Sources): Promise<Tracked[]> {
  const reader = new FormalReader(series);
  const slopes = sources.ofSeries(series, name);
  const list: Tracked[] = [];
  for (const [i, { value }] of series.coefficients.entries()) {
    list.push({ ...trackedExact(value, await reader.read(value)), slopes: slopes[i] ?? [] });
  }
  return list;
}

/** The state before the first step; a refusal for a series that does not say what it is. */
export async function openState(series: Series, mass: State['mass']): Promise<State | Refusal> {
  const scheme = couplingScheme(series);
  if (isRefusal(scheme)) return scheme;
  const flavours = flavoursOf(series);
  if (isRefusal(flavours)) return flavours;
  const sources = new Sources();
  const bare = await freestanding(series);
  return {
    series: bare,
    scheme,
    flavours,
    divisor: series.coupling.divisor,
    scaleRatio: series.scaleRatio,
    firstPower: series.firstPower,
    coefficients: await trackedCoefficients(series, series.id, sources),
    sources,
    singularities: bare.singularities,
    mass,
    notes: [],
    otherQuantity: false,
  };
}

/** A step: the next state, or why it cannot be taken. */
export type Step = (state: State) => State | Refusal;
