/** @module Tables in Markdown (the pipe tables of CommonMark's common extension), notes below. */
import { parseDecimal, roundPdg, shorten, writeParentheses, writePlusMinus } from '../numerics/index.js';
import { markdownText, plainHead } from './notation.js';
import { isMeasured, knownErrors } from './table.js';
import type { Cell, Column, Measured, PaperTable } from './table.js';

const DIGITS = 8;
const SIZE_DIGITS = 2;

/** "0.1180(9)", with the names of the errors where there are several. */
export function plainNumber(cell: Measured): string {
  const { value } = cell;
  const known = knownErrors(cell);
  if (known.length === 0) return shorten(value, DIGITS);
  const rounded = roundPdg(
    value,
    known.map(({ plus, minus }) => (plus === minus ? plus : { plus, minus })),
  );
  if (rounded === undefined) return value;
  return (
    (known.length === 1 ? writeParentheses(rounded) : undefined) ??
    writePlusMinus(rounded, known.length === 1 ? [] : known.map(({ label }) => label))
  );
}

/** A cell as a reader sees it. */
export function cellWords(cell: Cell, kind: Column['kind']): string {
  if (isMeasured(cell)) return plainNumber(cell);
  return kind === 'size' && parseDecimal(cell) !== undefined ? shorten(cell, SIZE_DIGITS) : cell;
}

function tableText(table: PaperTable): string {
  const heads = table.columns.map(({ head, unit }) =>
    markdownText(plainHead(head) + (unit === undefined ? '' : ` [${unit}]`)),
  );
  const line = (cells: readonly string[]): string => `| ${cells.join(' | ')} |`;
  return [
    `### ${markdownText(table.title)}`,
    '',
    line(heads),
    line(table.columns.map(({ kind }) => (kind === 'text' ? '---' : '---:'))),
    ...table.rows.map((row) => line(table.columns.map(({ kind }, i) => markdownText(cellWords(row[i] ?? '', kind))))),
    ...table.notes.flatMap((note) => ['', markdownText(note)]),
  ].join('\n');
}

export const markdownOf = (tables: readonly PaperTable[]): string => `${tables.map(tableText).join('\n\n')}\n`;
