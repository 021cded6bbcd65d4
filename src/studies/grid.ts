/** @module A grid of coupling values: "start:stop:count", evenly spaced with both ends, or a list "0.1,0.2,0.3". */
import { addExact, divExact, exact, mulExact, Rational, subExact, toNumberExact } from '../numerics/index.js';
import { isNumberProblem, parseUncertain, textOf } from '../series/index.js';
import type { Uncertain } from '../series/index.js';

/** A grid longer than this is a mistake. */
export const MOST_POINTS = 1000;

export interface GridProblem {
  readonly problem: string;
  readonly wanted: string;
}

export const isGridProblem = (grid: readonly Uncertain[] | GridProblem): grid is GridProblem => 'problem' in grid;

const WANTED = 'start:stop:count such as 0.1:0.4:7, or a list such as 0.1,0.2,0.3';

function numberOf(text: string): Uncertain | GridProblem {
  const value = parseUncertain(text);
  return isNumberProblem(value) ? { problem: `"${text}": ${value.problem}`, wanted: value.wanted } : value;
}

/** The values of the grid, exactly; or what is wrong with its text. */
export function readGrid(text: string): readonly Uncertain[] | GridProblem {
  const parts = text.split(':').map((part) => part.trim());
  if (parts.length === 1) {
    const list: Uncertain[] = [];
    for (const item of text.split(',')) {
      const value = numberOf(item.trim());
      if ('problem' in value) return value;
      list.push(value);
    }
    return list.length <= MOST_POINTS ? list : { problem: `${list.length} points`, wanted: `at most ${MOST_POINTS}` };
  }
  const [from = '', to = '', number = ''] = parts;
  if (parts.length !== 3) return { problem: `"${text}" has ${parts.length} parts`, wanted: WANTED };
  const start = numberOf(from);
  if ('problem' in start) return start;
  const stop = numberOf(to);
  if ('problem' in stop) return stop;
  const count = /^\d{1,6}$/.test(number) ? Number(number) : 0;
  if (count < 2 || count > MOST_POINTS)
    return { problem: `"${number}" points`, wanted: `a whole number from 2 to ${MOST_POINTS} after the second colon` };
  if (toNumberExact(start.value) === toNumberExact(stop.value))
    return { problem: 'start and stop are the same', wanted: WANTED };
  const step = divExact(subExact(stop.value, start.value), exact(Rational.of(count - 1)));
  return Array.from({ length: count }, (_, i): Uncertain => {
    const value = addExact(start.value, mulExact(step, exact(Rational.of(i))));
    return { value, text: textOf(value) };
  });
}
