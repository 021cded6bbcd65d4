/**
 * @module How many coefficients a rational approximant uses.
 *
 * A short series uses all it has. A long one climbs: tables of 24, 36, 54, … coefficients, until the truncation error is
 * below the digits asked; the table with the smallest error is kept. That is quicker than starting at the top, and a
 * top spoilt by noise in the coefficients does not spoil the result. Heuristic, stated with the value (terms used).
 */
import { R } from '../numerics/index.js';
import type { Outcome, Sum } from './prescription.js';

/** First rung and the factor between rungs. */
const FIRST = 24;
const FACTOR = 1.5;
/** After this many rungs without improvement the climb ends. */
const PATIENCE = 2;

/** Numbers of coefficients to try, ascending, ending at `most`. */
export function rungs(most: number): number[] {
  const list: number[] = [];
  for (let n = FIRST; n < most; n = Math.round(n * FACTOR)) list.push(n);
  return [...list, most];
}

/** Runs `table` up the rungs and returns the outcomes of the best one. */
export function climb(most: number, digits: number, table: (count: number) => readonly Outcome[]): readonly Outcome[] {
  let best: readonly Outcome[] | undefined;
  let bestError = Infinity;
  let idle = 0;
  for (const count of rungs(most)) {
    const outcomes = table(count);
    const centre = outcomes.find((o): o is Sum => o.kind === 'sum' && o.central === true);
    const size = centre === undefined ? 0 : Math.abs(R.toNumber(centre.value));
    const error = centre?.truncation === undefined ? Infinity : size > 0 ? centre.truncation / size : centre.truncation;
    if (best === undefined || error < bestError) {
      best = outcomes;
      bestError = error;
      idle = 0;
    } else idle++;
    if (error <= 10 ** -(digits + 1) || idle >= PATIENCE) break;
  }
  return best ?? [];
}

/** L and M of a label "[L/M]", anywhere in a variant's name. */
export function placeOf(variant: string): [number, number] | undefined {
  const m = /\[(\d+)\/(\d+)\]/.exec(variant);
  return m === null ? undefined : [Number(m[1]), Number(m[2])];
}
