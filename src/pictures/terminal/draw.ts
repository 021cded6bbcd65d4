/** @module A chart drawn with characters: what a terminal of 80 columns can show, with Unicode and without. */
import { axisOf, nameAxis } from '../axis.js';
import type { Axis } from '../axis.js';
import type { Chart, Curve, Layer, Panel, Point } from '../chart.js';
import { ASCII, UNICODE } from './glyphs.js';
import type { Glyphs } from './glyphs.js';
import { terminalWords } from './words.js';

export interface TerminalPage {
  readonly columns: number;
  readonly unicode: boolean;
}

/** Rows of one panel of values; panels of names take a row a name. */
const ROWS = 15;
/** Room for names is at most this part of the width. */
const NAMES = 0.45;

/** A field of characters; what is written outside is lost. */
class Field {
  readonly columns: number;
  readonly rows: number;
  readonly #cells: string[][];
  constructor(columns: number, rows: number) {
    this.columns = columns;
    this.rows = rows;
    this.#cells = Array.from({ length: rows }, () => Array.from({ length: columns }, () => ' '));
  }
  put(x: number, y: number, glyph: string): void {
    const row = this.#cells[Math.round(y)];
    const column = Math.round(x);
    if (row !== undefined && column >= 0 && column < this.columns) row[column] = glyph;
  }
  words(x: number, y: number, text: string): void {
    [...text].forEach((glyph, i) => this.put(x + i, y, glyph));
  }
  lines(): string[] {
    return this.#cells.map((row) => row.join(''));
  }
}

/** Cells between two points, one a column or a row, whichever are more. */
function between([x0, y0]: Point, [x1, y1]: Point): Point[] {
  const steps = Math.max(Math.abs(Math.round(x1) - Math.round(x0)), Math.abs(Math.round(y1) - Math.round(y0)), 1);
  if (!Number.isFinite(steps) || steps > 2000) return [];
  return Array.from({ length: steps + 1 }, (_, i) => [x0 + ((x1 - x0) * i) / steps, y0 + ((y1 - y0) * i) / steps]);
}

/** A line beside its markers is faint; one without has a character of its own. */
const lineGlyph = (curve: Curve, glyphs: Glyphs): string =>
  curve.marker !== undefined || curve.name === undefined
    ? glyphs.line[curve.line ?? 'full']
    : glyphs.curves[curve.ink % glyphs.curves.length]!;

function drawLayer(field: Field, layer: Layer, x: Axis, y: Axis, glyphs: Glyphs, unicode: boolean): void {
  const put = (points: readonly Point[], glyph: string): void => points.forEach(([a, b]) => field.put(a, b, glyph));
  switch (layer.kind) {
    case 'curve': {
      const points = layer.points.map(([a, b]): Point => [x.at(a), y.at(b)]);
      const style = layer.line;
      if (style !== undefined)
        points.slice(1).forEach((point, i) => {
          const cells = between(points[i]!, point);
          put(cells, lineGlyph(layer, glyphs));
        });
      if (layer.marker !== undefined) put(points, glyphs.marker[layer.marker]);
      return;
    }
    case 'band': {
      const [from, to] = (
        layer.along === 'y' ? [y.at(layer.from), y.at(layer.to)] : [x.at(layer.from), x.at(layer.to)]
      ).sort((a, b) => a - b) as [number, number];
      const across = layer.along === 'y' ? field.columns : field.rows;
      for (let k = Math.round(from); k <= Math.round(to) && k < 10_000; k++)
        for (let i = 0; i < across; i++)
          field.put(layer.along === 'y' ? i : k, layer.along === 'y' ? k : i, glyphs.band[layer.tone]);
      return;
    }
    case 'rule': {
      const glyph = glyphs.rule[layer.along];
      if (layer.along === 'y') for (let i = 0; i < field.columns; i++) field.put(i, y.at(layer.at), glyph);
      else for (let i = 0; i < field.rows; i++) field.put(x.at(layer.at), i, glyph);
      return;
    }
    case 'intervals':
      for (const item of layer.items) {
        const ends: readonly [Point, Point] =
          layer.along === 'x'
            ? [
                [Math.max(0, x.at(item.x - item.minus)), y.at(item.y)],
                [Math.min(field.columns - 1, x.at(item.x + item.plus)), y.at(item.y)],
              ]
            : [
                [x.at(item.x), Math.max(0, y.at(item.y + item.plus))],
                [x.at(item.x), Math.min(field.rows - 1, y.at(item.y - item.minus))],
              ];
        put(between(...ends), layer.along === 'y' ? glyphs.interval.upright : glyphs.interval[layer.weight]);
      }
      return;
    case 'columns':
      for (const { from, to, height } of layer.bins)
        for (let column = Math.round(x.at(from)); column < Math.max(x.at(to), x.at(from) + 1) - 0.5; column++)
          if (height > 0) put(between([column, y.at(height)], [column, field.rows - 1]), glyphs.column);
      return;
    case 'bars':
      for (const { y: row, from, to } of layer.items)
        put(between([x.at(from), y.at(row)], [x.at(to), y.at(row)]), glyphs.bar);
      return;
    case 'note':
      field.words(x.at(layer.at[0]), y.at(layer.at[1]), terminalWords(layer.text, unicode));
  }
}

const sampleOf = (layer: Layer, glyphs: Glyphs): string => {
  switch (layer.kind) {
    case 'curve':
      return layer.marker === undefined ? lineGlyph(layer, glyphs).repeat(2) : glyphs.marker[layer.marker];
    case 'band':
      return glyphs.band[layer.tone].repeat(2);
    case 'rule':
      return glyphs.rule[layer.along].repeat(layer.along === 'y' ? 2 : 1);
    case 'intervals':
      return glyphs.interval[layer.weight].repeat(2);
    case 'columns':
    case 'bars':
      return glyphs.column;
    case 'note':
      return '';
  }
};

const cut = (text: string, columns: number): string =>
  [...text].length <= columns ? text : [...text].slice(0, columns).join('');

function panelLines(panel: Panel, page: TerminalPage): string[] {
  const glyphs = page.unicode ? UNICODE : ASCII;
  const words = (label: string): string => terminalWords(label, page.unicode);
  const rows = panel.y.kind === 'names' ? panel.y.names.length : ROWS;
  const y =
    panel.y.kind === 'names'
      ? nameAxis(panel.y, rows - 0.5, -0.5)
      : axisOf(panel.y, { start: rows - 1, end: 0, text: 1, direction: 'up' });
  const ticks = new Map(y.ticks.map((tick) => [Math.round(y.at(tick.value)), words(tick.label)]));
  const widest = Math.max(0, ...[...ticks.values()].map((label) => [...label].length));
  const left = Math.min(widest, Math.floor(page.columns * NAMES));
  const columns = Math.max(10, page.columns - left - 3);
  const x = axisOf(panel.x, { start: 0, end: columns - 1, text: 1.6, direction: 'along' });
  const field = new Field(columns, rows);
  for (const layer of panel.layers) drawLayer(field, layer, x, y, glyphs, page.unicode);

  const body = field.lines().map((line, row) => {
    const label = ticks.get(row);
    return `${cut(label ?? '', left).padStart(left)} ${label === undefined || label === '' ? glyphs.frame.up : glyphs.frame.tickUp}${line}`;
  });
  const rule = Array.from({ length: columns }, () => glyphs.frame.across);
  const numbers = new Field(columns + 2, 1);
  let free = 0;
  for (const { value, label } of x.ticks) {
    const at = Math.round(x.at(value));
    if (at >= 0 && at < columns) rule[at] = glyphs.frame.tickAcross;
    const text = words(label);
    const start = Math.max(free, Math.min(columns + 2 - [...text].length, at - Math.floor(([...text].length - 1) / 2)));
    if (text !== '' && Math.abs(start - at) <= [...text].length) {
      numbers.words(start, 0, text);
      free = start + [...text].length + 1;
    }
  }
  const legend = panel.layers.flatMap((layer) =>
    layer.kind === 'note' || layer.name === undefined ? [] : [`${sampleOf(layer, glyphs)} ${words(layer.name)}`],
  );
  const indent = ' '.repeat(left + 2);
  return [
    ...(panel.y.label === '' ? [] : [words(panel.y.label)]),
    ...body,
    `${' '.repeat(left)} ${glyphs.frame.corner}${rule.join('')}`,
    `${indent}${numbers.lines()[0]!.trimEnd()}`,
    ...(panel.x.label === ''
      ? []
      : [`${indent}${words(panel.x.label).padStart(Math.floor((columns + [...words(panel.x.label)].length) / 2))}`]),
    ...folded(legend, page.columns),
  ].map((line) => line.trimEnd());
}

/** Entries side by side as far as they fit. */
function folded(entries: readonly string[], columns: number): string[] {
  const lines: string[] = [];
  for (const entry of entries) {
    const last = lines.at(-1);
    if (last !== undefined && [...last].length + 3 + [...entry].length <= columns)
      lines[lines.length - 1] = `${last}   ${entry}`;
    else lines.push(cut(entry, columns));
  }
  return lines;
}

/** The chart as text, ended by a line feed. */
export function terminalChart(chart: Chart, page: TerminalPage): string {
  const title = terminalWords(chart.title.replace(/[\\*_^]/g, '\\$&'), page.unicode);
  const panels = chart.panels.map((panel) => panelLines(panel, page).join('\n'));
  return `${cut(title, page.columns)}\n\n${panels.join('\n\n')}\n`;
}
