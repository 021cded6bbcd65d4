/**
 * @module Lines cut at a box before they are drawn: a partial sum far outside would hand a writer coordinates that no page
 * has. Method of Liang and Barsky (ACM Trans. Graph. 3 (1984) 1).
 */
import type { Point } from '../chart.js';
import type { Box } from './scene.js';

export const inside = ([x, y]: Point, box: Box): boolean =>
  x >= box.x - 0.01 && x <= box.x + box.width + 0.01 && y >= box.y - 0.01 && y <= box.y + box.height + 0.01;

/** The part of a segment in the box. */
function cutSegment([x0, y0]: Point, [x1, y1]: Point, box: Box): readonly [Point, Point] | undefined {
  const dx = x1 - x0;
  const dy = y1 - y0;
  let from = 0;
  let to = 1;
  const edges: readonly (readonly [step: number, room: number])[] = [
    [-dx, x0 - box.x],
    [dx, box.x + box.width - x0],
    [-dy, y0 - box.y],
    [dy, box.y + box.height - y0],
  ];
  for (const [step, room] of edges) {
    if (step === 0) {
      if (room < 0) return undefined;
    } else if (step < 0) from = Math.max(from, room / step);
    else to = Math.min(to, room / step);
  }
  if (!(from <= to)) return undefined;
  const at = (s: number): Point => [x0 + s * dx, y0 + s * dy];
  return [at(from), at(to)];
}

/** The pieces of a line in the box, each with at least two points. */
export function cutLine(points: readonly Point[], box: Box): Point[][] {
  const pieces: Point[][] = [];
  for (let i = 1; i < points.length; i++) {
    const cut = cutSegment(points[i - 1]!, points[i]!, box);
    if (cut === undefined) continue;
    const last = pieces.at(-1);
    const end = last?.at(-1);
    if (last !== undefined && end !== undefined && end[0] === cut[0][0] && end[1] === cut[0][1]) last.push(cut[1]);
    else pieces.push([...cut]);
  }
  return pieces;
}

/** A value between the ends of an interval, for bands and bars that reach beyond the box. */
export const held = (value: number, low: number, high: number): number => Math.min(Math.max(value, low), high);
