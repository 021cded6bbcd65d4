/** @module Axes: from numbers to points, with ticks where a reader expects them. */
import { scaleLinear, scaleLog } from 'd3-scale';
import type { NameAxis, ValueAxis } from './chart.js';

export interface Tick {
  readonly value: number;
  /** In the notation of `vector/typeset.ts`; empty for a tick without a number. */
  readonly label: string;
}

export interface Axis {
  readonly from: number;
  readonly to: number;
  /** Position in points of a value; infinite where a logarithmic axis has none. */
  at(value: number): number;
  readonly ticks: readonly Tick[];
  readonly label: string;
}

/** How many numbers an axis of this length carries: one in about so many sizes of its text. */
const SPACING = { along: 6.5, up: 3 };

const count = (length: number, text: number, direction: 'along' | 'up'): number =>
  Math.max(3, Math.floor(length / (text * SPACING[direction])));

export interface AxisPlace {
  /** Points where the axis starts and ends; they may fall (an upward axis). */
  readonly start: number;
  readonly end: number;
  readonly text: number;
  readonly direction: 'along' | 'up';
}

/** The axis of a wish; a whole one carries whole numbers only, as orders are. */
export function axisOf(wish: ValueAxis, place: AxisPlace): Axis {
  if (wish.kind === 'log') return logAxis(wish.low, wish.high, wish.label, place);
  const axis = linearAxis(wish.low, wish.high, wish.label, place, wish.margin);
  if (wish.kind === 'linear') return axis;
  const whole = axis.ticks.filter(({ value }) => Number.isInteger(value));
  return { ...axis, ticks: whole.map(({ value }) => ({ value, label: String(value).replace('-', '\u2212') })) };
}

/** An upward axis of names, the first at the top. */
export function nameAxis({ names, label }: NameAxis, start: number, end: number): Axis {
  const step = (end - start) / Math.max(1, names.length);
  return {
    from: names.length - 0.5,
    to: -0.5,
    label,
    at: (value) => end - (value + 0.5) * step,
    ticks: names.map((name, value) => ({ value, label: name })),
  };
}

/** A linear axis over [low, high], widened by `margin` of its length at both ends. */
export function linearAxis(low: number, high: number, label: string, place: AxisPlace, margin = 0.04): Axis {
  const span = high > low ? high - low : Math.max(Math.abs(high), 1e-300);
  const scale = scaleLinear([low - margin * span, high + margin * span], [place.start, place.end]);
  const wanted = count(Math.abs(place.end - place.start), place.text, place.direction);
  const [from, to] = scale.domain() as [number, number];
  const values = scale.ticks(wanted);
  const write = writerFor(values);
  return {
    from,
    to,
    label,
    at: (value) => scale(value),
    ticks: values.map((value) => ({ value, label: write(value) })),
  };
}

/** Numbers of one axis alike: plain where that is short, with a power of ten otherwise. */
function writerFor(values: readonly number[]): (value: number) => string {
  const largest = Math.max(...values.map(Math.abs), 0);
  const step = values.length > 1 ? Math.abs(values[1]! - values[0]!) : largest;
  const decade = largest > 0 ? Math.floor(Math.log10(largest) + 1e-9) : 0;
  const decimals = step > 0 ? Math.max(0, -Math.floor(Math.log10(step) + 1e-9)) : 0;
  const minus = (text: string): string => text.replace('-', '\u2212');
  if (decade >= 5 || decade <= -4) {
    const places = Math.max(0, decade - Math.floor(Math.log10(step) + 1e-9));
    return (value) =>
      value === 0 ? '0' : `${minus((value / 10 ** decade).toFixed(places))}·10^{${minus(String(decade))}}`;
  }
  return (value) => minus(value.toFixed(decimals));
}

/** From one numbered decade to the next, and the longest step between whose numbers every decade has a tick. */
const STEPS = [1, 2, 5, 10, 20, 50, 100];
const BARE = 5;

/** First digits in the order in which they earn a number on a short logarithmic axis. */
const ROUND = [1, 2, 5, 3, 4, 7, 6, 8, 9];

/** A logarithmic axis over [low, high], both positive. */
export function logAxis(low: number, high: number, label: string, place: AxisPlace): Axis {
  const pad = Math.max(1.12, (high / low) ** 0.05);
  const scale = scaleLog([low / pad, high * pad], [place.start, place.end]);
  const [from, to] = scale.domain() as [number, number];
  const first = Math.ceil(Math.log10(from) - 1e-9);
  const last = Math.floor(Math.log10(to) + 1e-9);
  const room = count(Math.abs(place.end - place.start), place.text, place.direction);
  const every = STEPS.find((step) => (last - first + 1) / step <= room) ?? last - first;
  const decades: Tick[] = [];
  for (let n = first; n <= last; n++) {
    const shown = n % every === 0;
    // Many decades: a tick for each would be a grey bar.
    if (shown || every <= BARE)
      decades.push({ value: 10 ** n, label: shown ? `10^{${String(n).replace('-', '\u2212')}}` : '' });
  }
  if (decades.length >= 2) return { from, to, label, at: (value) => scale(value), ticks: decades };
  // Less than a decade or two: the numbers between say more than the decades.
  const values = scale.ticks(room).filter((value) => value >= from && value <= to);
  const digits = (value: number): string => String(Number(value.toPrecision(2)));
  // Equal steps crowd towards the upper end: a number stands where those that matter more leave room, 1 before 2 and 5.
  const apart = place.text * (place.direction === 'along' ? 2.6 : 1.6);
  const placed: number[] = [];
  const rank = (value: number): number => ROUND.indexOf(Number(value.toExponential().slice(0, 1)));
  for (const value of values.toSorted((a, b) => rank(a) - rank(b)))
    if (placed.every((other) => Math.abs(scale(other) - scale(value)) >= apart)) placed.push(value);
  const write = (value: number): string => (placed.includes(value) ? digits(value) : '');
  return {
    from,
    to,
    label,
    at: (value) => scale(value),
    ticks: values.map((value) => ({ value, label: write(value) })),
  };
}
