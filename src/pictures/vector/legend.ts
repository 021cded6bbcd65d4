/** @module The legend of a panel: for each named layer a sample of it, and its name. */
import type { Layer, Point } from '../chart.js';
import { cutLine } from './clip.js';
import type { Format } from './format.js';
import type { Frame } from './frame.js';
import { BAND, BAND_SECOND, FAINT, ink, PAPER, TEXT } from './palette.js';
import type { Box, Mark } from './scene.js';
import { line, marker, rectangle, strokeOf } from './shapes.js';
import { typeset } from './typeset.js';

type NamedLayer = Exclude<Layer, { kind: 'note' }>;

const isNamed = (layer: Layer): layer is NamedLayer => layer.kind !== 'note' && layer.name !== undefined;

/** A sample of a layer, `length` long, its middle line at y. */
function sample(layer: NamedLayer, x: number, y: number, length: number, format: Format): Mark[] {
  const across = [
    [x, y],
    [x + length, y],
  ] as const;
  const patch = (fill: string, opacity: number): Mark =>
    rectangle({ x, y: y - format.text * 0.35, width: length, height: format.text * 0.7 }, { fill, opacity });
  switch (layer.kind) {
    case 'curve':
      return [
        ...(layer.line === undefined ? [] : [line(across, strokeOf(ink(layer.ink), format.line, layer.line))]),
        ...(layer.marker === undefined
          ? []
          : [marker(layer.marker, [x + length / 2, y], format.marker, ink(layer.ink))]),
      ];
    case 'band':
      return [patch(layer.tone === 'first' ? BAND : BAND_SECOND, 1)];
    case 'rule':
      return [line(across, strokeOf(layer.ink === 'faint' ? FAINT : ink(layer.ink), format.line * 0.8, layer.line))];
    case 'intervals': {
      const thick = layer.weight === 'thick';
      const stroke = { colour: ink(layer.ink), width: format.line * (thick ? 2.6 : 1) };
      const end = format.marker * 0.9;
      const ends = thick
        ? []
        : across.map(([at]) =>
            line(
              [
                [at, y - end],
                [at, y + end],
              ],
              stroke,
            ),
          );
      return [line(across, stroke), ...ends];
    }
    case 'columns':
      return [patch(ink(layer.ink), 0.55)];
    case 'bars':
      return [patch(ink(layer.ink), 0.8)];
  }
}

/** Cells that curves and intervals pass through, near enough to each other to find a legend in their way. */
function occupied(layers: readonly Layer[], { box, x, y }: Frame): Point[] {
  const place = ([a, b]: Point): Point => [x.at(a), y.at(b)];
  return layers.flatMap((layer): Point[] => {
    switch (layer.kind) {
      case 'curve': {
        const points = layer.points.map(place);
        if (layer.line === undefined) return points;
        return cutLine(points, box).flatMap((piece) =>
          piece.flatMap((point, i) => along(piece[i - 1] ?? point, point)),
        );
      }
      case 'intervals':
        return layer.items.flatMap((item) => {
          const [dx, dy] = layer.along === 'x' ? [1, 0] : [0, 1];
          return along(
            place([item.x - dx * item.minus, item.y - dy * item.minus]),
            place([item.x + dx * item.plus, item.y + dy * item.plus]),
          );
        });
      case 'columns':
        return layer.bins.map(({ from, to, height }) => place([(from + to) / 2, height]));
      case 'bars':
        return layer.items.flatMap((item) => along(place([item.from, item.y]), place([item.to, item.y])));
      case 'note':
        return [place(layer.at)];
      case 'rule':
      case 'band':
        return [];
    }
  });
}

/** Lines right across, and the edges of bands: a legend on one is no loss, but elsewhere it is better. */
const crossed = (layers: readonly Layer[], { box, x, y }: Frame): Point[] =>
  layers.flatMap((layer): Point[] => {
    if (layer.kind !== 'rule' && layer.kind !== 'band') return [];
    const places = layer.kind === 'rule' ? [layer.at] : [layer.from, layer.to];
    const [dx, dy] = layer.along === 'y' ? [box.width, 0] : [0, box.height];
    return places.flatMap((at) => {
      const start: Point = layer.along === 'y' ? [box.x, y.at(at)] : [x.at(at), box.y];
      return along(start, [start[0] + dx, start[1] + dy]);
    });
  });

const STEPS = 24;
const along = ([x0, y0]: Point, [x1, y1]: Point): Point[] =>
  Array.from({ length: STEPS + 1 }, (_, i) => [x0 + ((x1 - x0) * i) / STEPS, y0 + ((y1 - y0) * i) / STEPS]);

interface Place {
  readonly box: Box;
  /** Points of curves below it. */
  readonly covers: number;
}

/** The place of a box of this size, in a corner or in the middle above or below, where it covers least. */
function bestPlace(layers: readonly Layer[], frame: Frame, width: number, height: number, text: number): Place {
  const { box } = frame;
  const across = [box.x + box.width - width - text * 0.7, box.x + text * 0.7, box.x + (box.width - width) / 2];
  const up = [box.y + text * 0.7, box.y + box.height - height - text * 0.7];
  const within = (points: readonly Point[], place: Box): number =>
    points.filter(
      ([x, y]) =>
        x > place.x - text / 2 &&
        x < place.x + width + text / 2 &&
        y > place.y - text / 2 &&
        y < place.y + height + text / 2,
    ).length;
  const [taken, lines] = [occupied(layers, frame), crossed(layers, frame)];
  const places = up.flatMap((y) => across.map((x): Box => ({ x, y, width, height })));
  const judged = places.map((place) => ({ box: place, covers: within(taken, place), lines: within(lines, place) }));
  return judged.reduce((best, place) =>
    place.covers < best.covers || (place.covers === best.covers && place.lines < best.lines) ? place : best,
  );
}

/** From one entry to the next, and the length of a sample, in sizes of the text. */
export const LEGEND_STEP = 1.4;
const SAMPLE = 2;
const SIZE = 0.92;

const entryWidth = (layer: NamedLayer, format: Format): number =>
  format.text * (SAMPLE + 0.6) + typeset(layer.name ?? '', format.text * SIZE).width;

function entryMarks(layer: NamedLayer, x: number, base: number, format: Format): Mark[] {
  const { text } = format;
  return [
    ...sample(layer, x, base - text * 0.33, text * SAMPLE, format),
    {
      kind: 'text',
      x: x + text * (SAMPLE + 0.6),
      y: base,
      text: layer.name ?? '',
      size: text * SIZE,
      anchor: 'start',
      colour: TEXT,
    },
  ];
}

/** The legend inside a panel, on a ground of its own; undefined where it would stand on a curve wherever it stood. */
export function legendInside(layers: readonly Layer[], frame: Frame, format: Format): Mark[] | undefined {
  const named = layers.filter(isNamed);
  if (named.length === 0) return [];
  const { text } = format;
  const step = text * LEGEND_STEP;
  const width = text * 0.6 + Math.max(...named.map((layer) => entryWidth(layer, format)));
  const height = step * named.length + text * 0.3;
  const { box: ground, covers } = bestPlace(layers, frame, width, height, text);
  if (covers > 0) return undefined;
  return [
    rectangle(ground, { fill: PAPER, opacity: 0.85 }),
    ...named.flatMap((layer, i) => entryMarks(layer, ground.x + text * 0.3, ground.y + step * i + text * 1.15, format)),
  ];
}

/** Named layers in rows as wide as the format. */
export function rowsBelow(layers: readonly Layer[], format: Format): NamedLayer[][] {
  const rows: NamedLayer[][] = [];
  let used = Infinity;
  for (const layer of layers.filter(isNamed)) {
    const width = entryWidth(layer, format) + format.text * 1.5;
    if (used + width > format.width - format.text * 2) {
      rows.push([]);
      used = 0;
    }
    rows.at(-1)?.push(layer);
    used += width;
  }
  return rows;
}

/** The rows of a legend below a panel, each in the middle. */
export function legendBelow(rows: readonly (readonly NamedLayer[])[], top: number, format: Format): Mark[] {
  const gap = format.text * 1.5;
  return rows.flatMap((row, i) => {
    const widths = row.map((layer) => entryWidth(layer, format));
    const total = widths.reduce((sum, width) => sum + width, gap * (row.length - 1));
    let x = (format.width - total) / 2;
    return row.flatMap((layer, k) => {
      const marks = entryMarks(layer, x, top + format.text * (LEGEND_STEP * i + 0.8), format);
      x += widths[k]! + gap;
      return marks;
    });
  });
}
