/** @module Shapes as marks: lines, bands, and the markers that tell series apart without colour. */
import type { LineStyle, MarkerShape, Point } from '../chart.js';
import { pt } from './scene.js';
import type { Box, PathMark, Stroke } from './scene.js';

const DASHES: Readonly<Record<Exclude<LineStyle, 'full'>, readonly number[]>> = {
  dashed: [4, 2.2],
  dotted: [1.1, 1.8],
};

/** Dashes grow with the width, so that they stay dashes. */
export const strokeOf = (colour: string, width: number, style: LineStyle): Stroke =>
  style === 'full'
    ? { colour, width }
    : { colour, width, dash: DASHES[style].map((length) => length * Math.max(1, width)) };

const moves = (points: readonly Point[]): string =>
  points.map(([x, y], i) => `${i === 0 ? 'M' : 'L'}${pt(x)} ${pt(y)}`).join('');

export const line = (points: readonly Point[], stroke: Stroke, clip?: Box): PathMark => ({
  kind: 'path',
  d: moves(points),
  stroke,
  ...(clip === undefined ? {} : { clip }),
});

/** A filled area without an edge. */
export const area = (points: readonly Point[], fill: string, opacity = 1, clip?: Box): PathMark => ({
  kind: 'path',
  d: `${moves(points)}Z`,
  fill,
  opacity,
  ...(clip === undefined ? {} : { clip }),
});

export const corners = ({ x, y, width, height }: Box): Point[] => [
  [x, y],
  [x + width, y],
  [x + width, y + height],
  [x, y + height],
];

export const rectangle = (
  box: Box,
  look: { readonly stroke?: Stroke; readonly fill?: string; readonly opacity?: number },
): PathMark => ({
  kind: 'path',
  d: `${moves(corners(box))}Z`,
  ...look,
});

/** Control points of a quarter of a circle by one cubic: within 3e-4 of the radius (common practice, no source). */
const KAPPA = 0.552285;

const circlePath = ([x, y]: Point, r: number): string => {
  const k = KAPPA * r;
  const at = (dx: number, dy: number): string => `${pt(x + dx)} ${pt(y + dy)}`;
  return (
    `M${at(r, 0)}C${at(r, k)} ${at(k, r)} ${at(0, r)}C${at(-k, r)} ${at(-r, k)} ${at(-r, 0)}` +
    `C${at(-r, -k)} ${at(-k, -r)} ${at(0, -r)}C${at(k, -r)} ${at(r, -k)} ${at(r, 0)}Z`
  );
};

export const circle = (
  centre: Point,
  r: number,
  look: { readonly stroke?: Stroke; readonly fill?: string; readonly opacity?: number; readonly clip?: Box },
): PathMark => ({ kind: 'path', d: circlePath(centre, r), ...look });

/** A marker of about the same weight whatever its shape; `r` is the radius of the disc. */
export function marker(shape: MarkerShape, [x, y]: Point, r: number, colour: string, clip?: Box): PathMark {
  const clipped = clip === undefined ? {} : { clip };
  const polygon = (points: readonly Point[]): PathMark => area(points, colour, 1, clip);
  switch (shape) {
    case 'disc':
      return circle([x, y], r, { fill: colour, ...clipped });
    case 'ring':
      return circle([x, y], r * 0.9, { fill: '#ffffff', stroke: { colour, width: r * 0.4 }, ...clipped });
    case 'square':
      return polygon(corners({ x: x - r * 0.9, y: y - r * 0.9, width: r * 1.8, height: r * 1.8 }));
    case 'diamond':
      return polygon([
        [x, y - r * 1.3],
        [x + r * 1.3, y],
        [x, y + r * 1.3],
        [x - r * 1.3, y],
      ]);
    case 'triangle':
      return polygon([
        [x, y - r * 1.25],
        [x + r * 1.15, y + r * 0.85],
        [x - r * 1.15, y + r * 0.85],
      ]);
    case 'cross': {
      const a = r * 0.95;
      const d = `M${pt(x - a)} ${pt(y - a)}L${pt(x + a)} ${pt(y + a)}M${pt(x - a)} ${pt(y + a)}L${pt(x + a)} ${pt(y - a)}`;
      return { kind: 'path', d, stroke: { colour, width: r * 0.55 }, ...clipped };
    }
    case 'bar':
      return line(
        [
          [x, y - r * 1.2],
          [x, y + r * 1.2],
        ],
        { colour, width: r * 0.7 },
        clip,
      );
  }
}
