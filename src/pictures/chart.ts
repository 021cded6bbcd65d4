/** @module The frame of a chart: where the curves go, the axes around it, a legend inside it. */
import { linearAxis, logAxis } from './axis.js';
import type { Axis } from './axis.js';
import type { Format } from './format.js';
import { FRAME, TEXT } from './palette.js';
import { line, marker, rectangle } from './shapes.js';
import type { MarkerShape } from './shapes.js';
import { typeset } from './typeset.js';
import type { Box, Mark, Stroke } from './scene.js';

export interface AxisWish {
  readonly low: number;
  readonly high: number;
  readonly label: string;
  /** whole: a linear axis that carries whole numbers only, as orders are. */
  readonly kind?: 'linear' | 'log' | 'whole';
  readonly margin?: number;
}

export interface Chart {
  readonly box: Box;
  readonly x: Axis;
  readonly y: Axis;
  /** Frame, ticks and labels; to be drawn behind or before the curves. */
  readonly marks: readonly Mark[];
}

const axisOf = (wish: AxisWish, start: number, end: number, text: number, direction: 'along' | 'up'): Axis => {
  const place = { start, end, text, direction };
  if (wish.kind === 'log') return logAxis(wish.low, wish.high, wish.label, place);
  const axis = linearAxis(wish.low, wish.high, wish.label, place, wish.margin);
  if (wish.kind !== 'whole') return axis;
  const whole = axis.ticks.filter(({ value }) => Number.isInteger(value));
  return { ...axis, ticks: whole.map(({ value }) => ({ value, label: String(value) })) };
};

/** Room for the numbers of an upward axis; charts above each other share the largest, so that their frames align. */
export function gutter(format: Format, wishY: AxisWish, height: number): number {
  const { ticks } = axisOf(wishY, height, 0, format.text, 'up');
  return Math.max(0, ...ticks.map((tick) => typeset(tick.label, format.text).width));
}

/** A framed chart that fills the format, or the part `within` of it; `numbers` is room for the numbers of the upward axis. */
export function chart(format: Format, wishX: AxisWish, wishY: AxisWish, within?: Box, numbers?: number): Chart {
  const { text } = format;
  const outer = within ?? { x: 0, y: 0, width: format.width, height: format.height };
  const top = outer.y + text * 0.8;
  const bottom = outer.y + outer.height - text * 3.4;
  const y = axisOf(wishY, bottom, top, text, 'up');
  const room = numbers ?? Math.max(0, ...y.ticks.map((tick) => typeset(tick.label, text).width));
  const left = outer.x + room + text * 2.6;
  const right = outer.x + outer.width - text * 1.2;
  const x = axisOf(wishX, left, right, text, 'along');
  const box: Box = { x: left, y: top, width: right - left, height: bottom - top };
  return { box, x, y, marks: [...ticksOf(box, x, y, text, format.line), ...labelsOf(box, x, y, text, outer)] };
}

function ticksOf(box: Box, x: Axis, y: Axis, text: number, width: number): Mark[] {
  const stroke: Stroke = { colour: FRAME, width: width * 0.7 };
  const length = text * 0.4;
  const bottom = box.y + box.height;
  const right = box.x + box.width;
  const marks: Mark[] = [rectangle(box, { stroke })];
  for (const { value, label } of x.ticks) {
    const at = x.at(value);
    marks.push(
      line(
        [
          [at, bottom],
          [at, bottom - length],
        ],
        stroke,
      ),
      line(
        [
          [at, box.y],
          [at, box.y + length],
        ],
        stroke,
      ),
    );
    if (label !== '')
      marks.push({
        kind: 'text',
        x: at,
        y: bottom + text * 1.25,
        text: label,
        size: text,
        anchor: 'middle',
        colour: TEXT,
      });
  }
  for (const { value, label } of y.ticks) {
    const at = y.at(value);
    marks.push(
      line(
        [
          [box.x, at],
          [box.x + length, at],
        ],
        stroke,
      ),
      line(
        [
          [right, at],
          [right - length, at],
        ],
        stroke,
      ),
    );
    if (label !== '')
      marks.push({
        kind: 'text',
        x: box.x - text * 0.5,
        y: at + text * 0.36,
        text: label,
        size: text,
        anchor: 'end',
        colour: TEXT,
      });
  }
  return marks;
}

const labelsOf = (box: Box, x: Axis, y: Axis, text: number, outer: Box): Mark[] => [
  {
    kind: 'text',
    x: box.x + box.width / 2,
    y: outer.y + outer.height - text * 0.75,
    text: x.label,
    size: text * 1.1,
    anchor: 'middle',
    colour: TEXT,
  },
  {
    kind: 'text',
    x: outer.x + text * 1.25,
    y: box.y + box.height / 2,
    text: y.label,
    size: text * 1.1,
    anchor: 'middle',
    colour: TEXT,
    turn: 90,
  },
];

export interface LegendEntry {
  readonly text: string;
  readonly colour: string;
  readonly shape?: MarkerShape;
  readonly dash?: readonly number[] | 'none';
}

/** A legend in a corner of the box: for each entry its line, its marker, its text. */
export function legend(
  entries: readonly LegendEntry[],
  box: Box,
  format: Format,
  corner: 'top left' | 'top right' | 'bottom left' | 'bottom right',
): Mark[] {
  const { text } = format;
  const size = text * 0.92;
  const step = text * 1.45;
  const sample = text * 2;
  const width = sample + text * 0.6 + Math.max(0, ...entries.map((entry) => typeset(entry.text, size).width));
  const left = corner.endsWith('left') ? box.x + text : box.x + box.width - text - width;
  const top = corner.startsWith('top')
    ? box.y + text * 1.5
    : box.y + box.height - text * 0.9 - step * (entries.length - 1);
  return entries.flatMap((entry, i) => {
    const y = top + i * step;
    const middle = y - text * 0.33;
    const marks: Mark[] = [];
    if (entry.dash !== 'none')
      marks.push(
        line(
          [
            [left, middle],
            [left + sample, middle],
          ],
          {
            colour: entry.colour,
            width: format.line,
            ...(entry.dash === undefined ? {} : { dash: entry.dash }),
          },
        ),
      );
    if (entry.shape !== undefined)
      marks.push(marker(entry.shape, [left + sample / 2, middle], format.marker, entry.colour));
    marks.push({
      kind: 'text',
      x: left + sample + text * 0.6,
      y,
      text: entry.text,
      size,
      anchor: 'start',
      colour: TEXT,
    });
    return marks;
  });
}
