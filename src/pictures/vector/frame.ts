/** @module The frame of a panel: where its layers go, ticks and labels around it. */
import { axisOf, nameAxis } from '../axis.js';
import type { Axis } from '../axis.js';
import type { NameAxis, Panel, ValueAxis } from '../chart.js';
import type { Format } from './format.js';
import { FRAME, TEXT } from './palette.js';
import type { Box, Mark, Stroke } from './scene.js';
import { line, rectangle } from './shapes.js';
import { typeset } from './typeset.js';

export interface Frame {
  readonly box: Box;
  readonly x: Axis;
  readonly y: Axis;
  readonly marks: readonly Mark[];
}

const upward = (wish: ValueAxis | NameAxis, bottom: number, top: number, text: number): Axis =>
  wish.kind === 'names'
    ? nameAxis(wish, bottom, top)
    : axisOf(wish, { start: bottom, end: top, text, direction: 'up' });

/** Room for what stands left of an upward axis; panels above each other share the largest, so that their frames align. */
export function gutter(format: Format, { y }: Panel, height: number): number {
  const widths = upward(y, height, 0, format.text).ticks.map((tick) => typeset(tick.label, format.text).width);
  return Math.max(0, ...widths) + format.text * (y.label === '' ? 1.1 : 2.6);
}

/** What stands below an axis with a label, and without, in sizes of the text. */
const BELOW = { labelled: 3.4, bare: 2 };

/** Frame and axes of a panel inside `outer`, `left` points kept for the upward axis. */
export function frameOf(format: Format, panel: Panel, outer: Box, left: number): Frame {
  const { text } = format;
  const top = outer.y + text * 0.8;
  const bottom = outer.y + outer.height - text * (panel.x.label === '' ? BELOW.bare : BELOW.labelled);
  const box: Box = { x: outer.x + left, y: top, width: outer.width - left - text * 1.2, height: bottom - top };
  const [wishX, wishY] = panel.square === true ? squared(panel, box) : [panel.x, panel.y];
  const y = upward(wishY, bottom, top, text);
  const x = axisOf(wishX, { start: box.x, end: box.x + box.width, text, direction: 'along' });
  return { box, x, y, marks: [...tickMarks(box, x, y, text, format.line), ...labelMarks(box, x, y, text, outer)] };
}

/** Widens the axis that has room, so that a unit of x is as long as a unit of y. */
function squared({ x, y }: Panel, box: Box): readonly [ValueAxis, ValueAxis | NameAxis] {
  if (y.kind === 'names') return [x, y];
  const perPoint = Math.max((x.high - x.low) / box.width, (y.high - y.low) / box.height);
  const widened = (wish: ValueAxis, length: number): ValueAxis => {
    const half = (perPoint * length) / 2;
    const middle = (wish.low + wish.high) / 2;
    return { ...wish, low: middle - half, high: middle + half, margin: 0.04 };
  };
  return [widened(x, box.width), widened(y, box.height)];
}

function tickMarks(box: Box, x: Axis, y: Axis, text: number, width: number): Mark[] {
  const stroke: Stroke = { colour: FRAME, width: width * 0.7 };
  const length = text * 0.4;
  const bottom = box.y + box.height;
  const right = box.x + box.width;
  const marks: Mark[] = [rectangle(box, { stroke })];
  const tick = (from: readonly [number, number], to: readonly [number, number]): Mark => line([from, to], stroke);
  const words = (label: string, at: readonly [number, number], anchor: 'middle' | 'end'): Mark[] =>
    label === '' ? [] : [{ kind: 'text', x: at[0], y: at[1], text: label, size: text, anchor, colour: TEXT }];
  for (const { value, label } of x.ticks) {
    const at = x.at(value);
    marks.push(tick([at, bottom], [at, bottom - length]), tick([at, box.y], [at, box.y + length]));
    marks.push(...words(label, [at, bottom + text * 1.25], 'middle'));
  }
  for (const { value, label } of y.ticks) {
    const at = y.at(value);
    marks.push(tick([box.x, at], [box.x + length, at]), tick([right, at], [right - length, at]));
    marks.push(...words(label, [box.x - text * 0.5, at + text * 0.36], 'end'));
  }
  return marks;
}

const labelMarks = (box: Box, x: Axis, y: Axis, text: number, outer: Box): Mark[] => {
  const common = { kind: 'text', size: text * 1.1, anchor: 'middle', colour: TEXT } as const;
  return [
    { ...common, x: box.x + box.width / 2, y: outer.y + outer.height - text * 0.75, text: x.label },
    { ...common, x: outer.x + text * 1.25, y: box.y + box.height / 2, text: y.label, turn: 90 },
  ].filter((mark) => mark.text !== '');
};
