/** @module One column of a table: its decimals under each other, its words folded when the page is narrow. */
import type { Tone } from './paint.js';
import { fold, padEnd, padStart, width } from './text.js';

export interface Column {
  readonly head: string;
  /** point: the decimal points stand under each other. */
  readonly align: 'left' | 'right' | 'point';
  readonly tone?: Tone;
}

export interface SetColumn {
  readonly column: Column;
  readonly cells: readonly string[];
  /** Head and cells as lines, for a width of `width`. */
  readonly head: readonly string[];
  readonly lines: readonly (readonly string[])[];
  readonly width: number;
}

/** Words are not folded into less than this, nor torn. A habit of typography. */
const NARROWEST = 8;

/** Longer words than this are torn when the page is narrow. A habit of typography. */
const LONGEST_WHOLE = 24;

/** The longest piece that folding leaves whole. */
const longestWord = (texts: readonly string[]): number =>
  Math.min(LONGEST_WHOLE, Math.max(0, ...texts.flatMap((text) => text.split(/[ \u00a0]+/)).map(width)));

const NUMBER = /^[±+-]?\s?\d/;

/** What stands left of the decimal point, and the rest with the point. A text that is no number goes to the left part. */
function atPoint(cell: string): readonly [string, string] {
  if (!NUMBER.test(cell)) return [cell, ''];
  const point = cell.search(/[.e(]| [±+]/);
  return point < 0 ? [cell, ''] : [cell.slice(0, point), cell.slice(point)];
}

/** Pads numbers so that their points stand under each other; words and blanks stay as they are. */
function pointed(cells: readonly string[]): string[] {
  const parts = cells.map((cell) => (NUMBER.test(cell) ? atPoint(cell) : undefined));
  const left = Math.max(0, ...parts.map((p) => (p === undefined ? 0 : width(p[0]))));
  const right = Math.max(0, ...parts.map((p) => (p === undefined ? 0 : width(p[1]))));
  return cells.map((cell, i) => {
    const part = parts[i];
    return part === undefined ? padEnd(cell, left + right) : padStart(part[0], left) + padEnd(part[1], right);
  });
}

/** A column in its natural width. */
export function alignColumn(column: Column, texts: readonly string[]): SetColumn {
  const cells = column.align === 'point' ? pointed(texts) : [...texts];
  const columns = Math.max(width(column.head), ...cells.map(width), 0);
  return { column, cells, head: [column.head], lines: cells.map((cell) => [cell]), width: columns };
}

function withFoldedHead(set: SetColumn): SetColumn {
  const body = Math.max(0, ...set.cells.map(width));
  const columns = Math.max(body, longestWord([set.column.head]));
  return columns >= set.width ? set : { ...set, head: fold(set.column.head, columns), width: columns };
}

function withFoldedWords(set: SetColumn, columns: number): SetColumn {
  const lines = set.cells.map((cell) => {
    const lead = cell.length - cell.trimStart().length;
    return fold(cell, columns - lead).map((line) => ' '.repeat(lead) + line);
  });
  return { ...set, head: fold(set.column.head, columns), lines, width: columns };
}

/** Which columns may be folded: words first; numbers only at their blanks, when words give no more room. */
const FOLDABLE: readonly ((set: SetColumn) => boolean)[] = [
  (set) => set.column.align === 'left',
  (set) => set.column.align === 'point' && set.cells.some((cell) => /\S\s\S/.test(cell)),
];

/** Brings the columns into `room`: first the heads are folded, then the widest columns of words, numbers last. */
export function narrowed(columns: readonly SetColumn[], room: number): SetColumn[] {
  const excess = (sets: readonly SetColumn[]): number => sets.reduce((total, set) => total + set.width, -room);
  let sets = [...columns];
  if (excess(sets) <= 0) return sets;
  sets = sets.map((set) => withFoldedHead(set));
  for (const foldable of FOLDABLE) {
    for (;;) {
      const over = excess(sets);
      if (over <= 0) return sets;
      const words = sets
        .map((set) => ({ set, least: Math.max(NARROWEST, longestWord([set.column.head, ...set.cells])) }))
        .filter(({ set, least }) => foldable(set) && set.width > least)
        .toSorted((a, b) => b.set.width - a.set.width);
      const [first, second] = words;
      if (first === undefined) break;
      // No further than the next widest: then the two share what is left.
      const widest = first.set;
      const shared = Math.min(second?.set.width ?? 0, widest.width - 1);
      const target = Math.max(first.least, widest.width - over, shared);
      sets = sets.map((set) => (set === widest ? withFoldedWords(set, target) : set));
    }
  }
  return sets;
}
