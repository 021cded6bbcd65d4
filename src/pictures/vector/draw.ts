/** @module A chart drawn as a picture: panels above each other, their layers, their legends. */
import type { Chart, Curve, Intervals, Layer, Panel, Point } from '../chart.js';
import { cutLine, held, inside } from './clip.js';
import type { Format } from './format.js';
import { frameOf, gutter } from './frame.js';
import type { Frame } from './frame.js';
import { LEGEND_STEP, legendBelow, legendInside, rowsBelow } from './legend.js';
import { BAND, BAND_SECOND, FAINT, ink, PAPER, TEXT } from './palette.js';
import type { Box, Mark, Picture, Stroke } from './scene.js';
import { area, line, marker, rectangle, strokeOf } from './shapes.js';

/** The four corners between two values of each axis, held to the box. */
function patch(box: Box, [x0, x1]: Point, [y0, y1]: Point, fill: string, opacity: number): Mark {
  const inX = (x: number): number => held(x, box.x, box.x + box.width);
  const inY = (y: number): number => held(y, box.y, box.y + box.height);
  const [a, b, c, d] = [inX(x0), inX(x1), inY(y0), inY(y1)];
  return area(
    [
      [a, c],
      [b, c],
      [b, d],
      [a, d],
    ],
    fill,
    opacity,
  );
}

function curveMarks(curve: Curve, { box, x, y }: Frame, format: Format): Mark[] {
  const colour = ink(curve.ink);
  const points = curve.points.map(([a, b]): Point => [x.at(a), y.at(b)]);
  const { line: style, marker: shape } = curve;
  const lines = style === undefined ? [] : cutLine(points, box);
  return [
    ...lines.map((piece) => line(piece, strokeOf(colour, format.line, style ?? 'full'))),
    ...(shape === undefined
      ? []
      : points.filter((point) => inside(point, box)).map((point) => marker(shape, point, format.marker, colour))),
  ];
}

function intervalMarks(layer: Intervals, { box, x, y }: Frame, format: Format): Mark[] {
  const thick = layer.weight === 'thick';
  const stroke: Stroke = { colour: ink(layer.ink), width: format.line * (thick ? 2.6 : 1) };
  const end = format.marker * 0.9;
  return layer.items.flatMap((item) => {
    const [px, py] = [x.at(item.x), y.at(item.y)];
    const [low, high] =
      layer.along === 'x'
        ? [x.at(item.x - item.minus), x.at(item.x + item.plus)]
        : [y.at(item.y - item.minus), y.at(item.y + item.plus)];
    const point = (at: number, aside: number): Point => (layer.along === 'x' ? [at, py + aside] : [px + aside, at]);
    const strokes: Point[][] = [[point(low, 0), point(high, 0)]];
    if (!thick && high !== low) strokes.push(...[low, high].map((at) => [point(at, -end), point(at, end)]));
    return strokes.flatMap((points) => cutLine(points, box)).map((points) => line(points, stroke));
  });
}

function layerMarks(layer: Layer, frame: Frame, format: Format): Mark[] {
  const { box, x, y } = frame;
  const across: Point = [box.x, box.x + box.width];
  const up: Point = [box.y, box.y + box.height];
  switch (layer.kind) {
    case 'curve':
      return curveMarks(layer, frame, format);
    case 'intervals':
      return intervalMarks(layer, frame, format);
    case 'band': {
      const fill = layer.tone === 'first' ? BAND : BAND_SECOND;
      return layer.along === 'y'
        ? [patch(box, across, [y.at(layer.from), y.at(layer.to)], fill, 1)]
        : [patch(box, [x.at(layer.from), x.at(layer.to)], up, fill, 1)];
    }
    case 'rule': {
      const stroke = strokeOf(layer.ink === 'faint' ? FAINT : ink(layer.ink), format.line * 0.8, layer.line);
      const at = layer.along === 'y' ? y.at(layer.at) : x.at(layer.at);
      const ends: Point[] = (layer.along === 'y' ? across : up).map((end) =>
        layer.along === 'y' ? [end, at] : [at, end],
      );
      return cutLine(ends, box).map((points) => line(points, stroke));
    }
    case 'columns':
      return layer.bins.map(({ from, to, height }) =>
        patch(box, [x.at(from), x.at(to)], [y.at(0), y.at(height)], ink(layer.ink), 0.55),
      );
    case 'bars': {
      const half = Math.abs(y.at(1) - y.at(0)) * 0.3;
      return layer.items.map(({ y: row, from, to }) =>
        patch(box, [x.at(from), x.at(to)], [y.at(row) - half, y.at(row) + half], ink(layer.ink), 0.8),
      );
    }
    case 'note':
      return [
        {
          kind: 'text',
          x: x.at(layer.at[0]),
          y: y.at(layer.at[1]) + format.text * 0.34,
          text: layer.text,
          size: format.text * 0.92,
          anchor: layer.anchor,
          colour: TEXT,
        },
      ];
  }
}

/** A row of names needs this much, in sizes of the text; all else of such a panel as much as SURROUNDINGS. */
const NAME_ROW = 1.45;
const SURROUNDINGS = 9;

/** The height of the format, or more where many names stand under each other. */
function heightFor({ panels }: Chart, { height, text }: Format): number {
  const needed = panels.map(({ y }) => (y.kind === 'names' ? (y.names.length * NAME_ROW + SURROUNDINGS) * text : 0));
  return Math.max(height, Math.max(...needed) * panels.length);
}

const layersIn = (panel: Panel, frame: Frame, format: Format): Mark[] => [
  ...panel.layers.flatMap((layer) => layerMarks(layer, frame, format)),
  ...frame.marks,
  ...(panel.y.kind === 'names' ? panel.layers.flatMap((layer) => beyond(layer, frame, format)) : []),
];

/** A value outside a panel of names still has its row: an arrow at the edge says where it is. */
function beyond(layer: Layer, { box, x, y }: Frame, format: Format): Mark[] {
  if (layer.kind !== 'curve' || layer.marker === undefined) return [];
  const size = format.marker * 1.3;
  const right = box.x + box.width;
  return layer.points.flatMap(([value, row]) => {
    const at = x.at(value);
    if (at >= box.x - 0.01 && at <= right + 0.01) return [];
    const [tip, back] = at > right ? [right - size * 0.4, -size] : [box.x + size * 0.4, size];
    const middle = y.at(row);
    const points: Point[] = [
      [tip + back, middle - size],
      [tip, middle],
      [tip + back, middle + size],
    ];
    return [line(points, { colour: ink(layer.ink), width: format.line * 1.2 })];
  });
}

/** Panels share the height evenly; what stands below the axes of the upper ones is taken from all. */
export function pictureOf(chart: Chart, format: Format): Picture {
  const { width } = format;
  const height = heightFor(chart, format);
  const share = height / chart.panels.length;
  const left = Math.max(...chart.panels.map((panel) => gutter(format, panel, share)));
  const panelMarks = (panel: Panel, i: number): Mark[] => {
    const outer = { x: 0, y: i * share, width, height: share };
    if (panel.legend !== 'below') {
      const frame = frameOf(format, panel, outer, left);
      const legend = panel.legend === undefined ? [] : legendInside(panel.layers, frame, format);
      if (legend !== undefined) return [...layersIn(panel, frame, format), ...legend];
    }
    const below = rowsBelow(panel.layers, format);
    const legendHeight = below.length * format.text * LEGEND_STEP;
    const frame = frameOf(format, panel, { ...outer, height: share - legendHeight }, left);
    return [...layersIn(panel, frame, format), ...legendBelow(below, (i + 1) * share - legendHeight, format)];
  };
  return {
    width,
    height,
    title: chart.title,
    description: chart.description,
    marks: [rectangle({ x: 0, y: 0, width, height }, { fill: PAPER }), ...chart.panels.flatMap(panelMarks)],
  };
}
