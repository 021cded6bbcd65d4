/**
 * @module A grid of couplings, "start:stop:count" evenly spaced with both ends or a list "0.1,0.2,0.3", or of scales,
 * "scale=0.5:2:5" evenly spaced in ln μ or "scale=0.5,1,2".
 */
import {
  addExact,
  divExact,
  exact,
  mulExact,
  Rational,
  signExact,
  subExact,
  toNumberExact,
} from '../numerics/index.js';
import { isNumberProblem, parseUncertain, textOf } from '../series/index.js';
import type { Uncertain } from '../series/index.js';

/** A grid longer than this is a mistake. */
export const MOST_POINTS = 1000;

export interface GridProblem {
  readonly problem: string;
  readonly wanted: string;
}

export const isGridProblem = (grid: Grid | GridProblem): grid is GridProblem => 'problem' in grid;

const WANTED = 'start:stop:count such as 0.1:0.4:7, or a list such as 0.1,0.2,0.3';

export interface Grid {
  readonly over: 'coupling' | 'scale';
  readonly values: readonly Uncertain[];
}

function numberOf(text: string): Uncertain | GridProblem {
  const value = parseUncertain(text);
  return isNumberProblem(value) ? { problem: `"${text}": ${value.problem}`, wanted: value.wanted } : value;
}

/** Grid points between ends, by the number of the point, 0 … count − 1. */
type Spacing = (start: Uncertain, stop: Uncertain, count: number) => (i: number) => Uncertain;

const even: Spacing = (start, stop, count) => {
  const step = divExact(subExact(stop.value, start.value), exact(Rational.of(count - 1)));
  return (i) => {
    const value = addExact(start.value, mulExact(step, exact(Rational.of(i))));
    return { value, text: textOf(value) };
  };
};

/** Digits of a scale between the ends: the scale is the decimal that is shown, not the power it was rounded from. */
const SCALE_DIGITS = 6;

const evenInLogs: Spacing = (start, stop, count) => {
  const [low, high] = [Math.log(toNumberExact(start.value)), Math.log(toNumberExact(stop.value))];
  return (i) => {
    if (i === 0) return start;
    if (i === count - 1) return stop;
    const rounded = Number(Math.exp(low + ((high - low) * i) / (count - 1)).toPrecision(SCALE_DIGITS));
    const text = String(rounded);
    return { value: exact(Rational.parse(text) ?? Rational.fromNumber(rounded)), text };
  };
};

/** The grid of --grid; or what is wrong with its text. */
export function readGrid(text: string): Grid | GridProblem {
  const named = /^\s*([a-z]+)\s*=(.*)$/i.exec(text);
  if (named === null) {
    const values = readValues(text, even);
    return 'problem' in values ? values : { over: 'coupling', values };
  }
  const [, name = '', rest = ''] = named;
  if (name.toLowerCase() !== 'scale')
    return { problem: `"${name}=" is nothing a grid can run over`, wanted: `scale=0.5:2:5, or ${WANTED}` };
  const values = readValues(rest, evenInLogs);
  if ('problem' in values) return values;
  const wrong = values.find((v) => signExact(v.value) <= 0);
  return wrong === undefined
    ? { over: 'scale', values }
    : { problem: `the scale ${wrong.text} is not positive`, wanted: 'scales mu/Q above zero, such as scale=0.5:2:5' };
}

function readValues(text: string, spacing: Spacing): readonly Uncertain[] | GridProblem {
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
  if (spacing === evenInLogs && !(signExact(start.value) > 0 && signExact(stop.value) > 0))
    return { problem: `"${text}" reaches a scale that is not positive`, wanted: 'scale=0.5:2:5' };
  const point = spacing(start, stop, count);
  return Array.from({ length: count }, (_, i) => point(i));
}
