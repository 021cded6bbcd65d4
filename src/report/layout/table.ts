/** @module A table as a paper sets it: heads over one thin rule, decimals aligned, notes across all columns. */
import { alignColumn, narrowed } from './column.js';
import type { Column, SetColumn } from './column.js';
import type { Paint, Tone } from './paint.js';
import { fold, padEnd, padStart, printable } from './text.js';

export interface TableRow {
  readonly cells: readonly string[];
  readonly tone?: Tone;
}

/** A line across the table: a group's name, or why a number is missing. */
export interface TableNote {
  readonly note: string;
  readonly indent?: number;
  readonly tone?: Tone;
}

export interface TableFrame {
  /** Columns available, indent included. */
  readonly width: number;
  readonly indent: number;
  readonly paint: Paint;
  /** One column of the rule under the heads; a thin line when absent. */
  readonly rule?: string;
}

/** Blanks between columns, the widest that fit. */
const GAPS = [3, 2, 1] as const;

const isNote = (row: TableRow | TableNote): row is TableNote => 'note' in row;

const sum = (numbers: readonly number[]): number => numbers.reduce((a, b) => a + b, 0);

/** Lines of one row: a folded cell takes several. */
function rowLines(texts: readonly (readonly string[])[], columns: readonly SetColumn[]): string[][] {
  const height = Math.max(1, ...texts.map((lines) => lines.length));
  return Array.from({ length: height }, (_, i) =>
    columns.map(({ column, width }, j) => {
      const text = texts[j]?.[i] ?? '';
      return column.align === 'left' ? padEnd(text, width) : padStart(text, width);
    }),
  );
}

/** Columns folded to fit with two blanks between them, with one where two do not do. */
function squeezed(
  natural: readonly SetColumn[],
  spare: (gap: number) => number,
): { gap: number; set: readonly SetColumn[] } {
  const set = narrowed(natural, spare(2));
  return sum(set.map((c) => c.width)) <= spare(2) ? { gap: 2, set } : { gap: 1, set: narrowed(natural, spare(1)) };
}

/** Sets a table. Columns whose cells are all empty are left out. */
export function table(
  columns: readonly Column[],
  rows: readonly (TableRow | TableNote)[],
  frame: TableFrame,
): string[] {
  const { indent, paint } = frame;
  const filled = rows.filter((row): row is TableRow => !isNote(row));
  const cellsOf = (j: number): string[] => filled.map((row) => printable(row.cells[j] ?? ''));
  const natural = columns
    .map((column, j) => alignColumn(column, cellsOf(j)))
    .filter((set) => filled.length > 0 && set.cells.some((cell) => cell.trim() !== ''));
  const room = frame.width - indent;
  const spare = (gap: number): number => room - gap * (natural.length - 1);
  const total = sum(natural.map((set) => set.width));
  const roomy = GAPS.find((g) => total <= spare(g));
  const { gap, set } = roomy === undefined ? squeezed(natural, spare) : { gap: roomy, set: natural };

  const margin = ' '.repeat(indent);
  const between = ' '.repeat(gap);
  const draw = (texts: readonly (readonly string[])[], tone: Tone | undefined): string[] =>
    rowLines(texts, set).map((cells) => {
      // Nothing is painted behind the last word: blanks at the end of a line are noise.
      const last = cells.findLastIndex((cell) => cell.trim() !== '');
      const kept = cells.slice(0, last + 1).map((cell, j) => (j === last ? cell.trimEnd() : cell));
      if (tone !== undefined) return margin + paint(kept.join(between), tone);
      return margin + kept.map((cell, j) => paint(cell, set[j]?.column.tone ?? 'plain')).join(between);
    });
  const drawNote = ({ note, indent: more = 0, tone = 'plain' }: TableNote): string[] =>
    fold(note, room - more).map((text) => margin + ' '.repeat(more) + paint(text, tone));

  const lines: string[] = [];
  if (set.length > 0) {
    const ruled = sum(set.map((c) => c.width)) + gap * (set.length - 1);
    lines.push(
      ...draw(
        set.map((c) => c.head),
        'faint',
      ),
      margin + paint((frame.rule ?? '─').repeat(ruled), 'faint'),
    );
  }
  let at = 0;
  for (const row of rows) {
    if (isNote(row)) lines.push(...drawNote(row));
    else {
      lines.push(
        ...draw(
          set.map((c) => c.lines[at] ?? []),
          row.tone,
        ),
      );
      at++;
    }
  }
  return lines;
}
