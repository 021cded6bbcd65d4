/** @module Bare lists of coefficients: CSV with the header `order,value,error`, or one number a line. */
import type { Complaints } from './complaints.js';
import type { Entry, Place, TextEntry } from './entry.js';
import { LIMITS, grouped } from './limits.js';
import { suggestion } from './nearest.js';
import { quote } from './quote.js';

const COLUMNS: readonly string[] = ['order', 'value', 'error'];
const HEADER = 'the header order,value or order,value,error';

interface Line {
  readonly text: string;
  readonly number: number;
}

/** Lines that say something: without comments (from #) and blank ones. */
function lines(text: string): Line[] {
  const list: Line[] = [];
  text.split(/\r\n|\n|\r/).forEach((raw, i) => {
    const hash = raw.indexOf('#');
    const line = hash < 0 ? raw : raw.slice(0, hash);
    if (line.trim() !== '') list.push({ text: line, number: i + 1 });
  });
  return list;
}

interface Cell extends TextEntry {
  readonly at: Place;
}

/** Cells of a line; a cell may stand in double quotes. */
function cells(line: Line): Cell[] {
  const list: Cell[] = [];
  let start = 0;
  let quoted = false;
  for (let i = 0; i <= line.text.length; i++) {
    const c = line.text[i];
    if (c === '"') quoted = !quoted;
    if (i < line.text.length && (c !== ',' || quoted)) continue;
    const raw = line.text.slice(start, i);
    const text = raw
      .trim()
      .replace(/^"(.*)"$/, '$1')
      .replaceAll('""', '"')
      .trim();
    const lead = raw.length - raw.trimStart().length;
    list.push({ kind: 'text', text, at: { line: line.number, column: start + lead + 1 } });
    start = i + 1;
  }
  return list;
}

const START: Place = { line: 1, column: 1 };

function bare(coefficients: readonly Entry[], at: Place, firstPower?: Cell): Entry {
  const fields = new Map<string, { key: Place; value: Entry }>();
  if (firstPower !== undefined) fields.set('first power', { key: firstPower.at, value: firstPower });
  fields.set('coefficients', { key: at, value: { kind: 'list', items: coefficients, at } });
  return { kind: 'map', fields, at };
}

function tooMany(list: readonly Line[], complaints: Complaints): boolean {
  if (list.length <= LIMITS.coefficients + 1) return false;
  complaints.add(
    undefined,
    'coefficients',
    `${grouped(list.length)} lines of coefficients`,
    `at most ${grouped(LIMITS.coefficients)}`,
  );
  return true;
}

/** One coefficient a line; commas at the end of a line are allowed. */
export function listEntries(text: string, complaints: Complaints): Entry | undefined {
  const list = lines(text);
  if (tooMany(list, complaints)) return undefined;
  const items = list.map((line): Entry => {
    const column = line.text.length - line.text.trimStart().length + 1;
    const item = line.text.trim();
    const bareItem = item.endsWith(',') ? item.slice(0, -1).trimEnd() : item;
    return { kind: 'text', text: bareItem, at: { line: line.number, column } };
  });
  if (items[0] === undefined) return complaints.add(START, '', 'an empty file', 'a series file');
  return bare(items, items[0].at);
}

/** CSV with a header; the orders rise one by one, and the first is the power of the first coefficient. */
export function csvEntries(text: string, complaints: Complaints): Entry | undefined {
  const [head, ...rows] = lines(text);
  if (head === undefined) return complaints.add(START, '', 'an empty file', HEADER);
  if (tooMany(rows, complaints)) return undefined;
  const header = cells(head).map((cell) => ({ ...cell, text: cell.text.toLowerCase() }));
  for (const cell of header) {
    if (!COLUMNS.includes(cell.text)) {
      complaints.add(cell.at, 'header', `a column ${quote(cell.text)}${suggestion(cell.text, COLUMNS)}`, HEADER);
    } else if (header.find((other) => other.text === cell.text) !== cell) {
      complaints.add(cell.at, 'header', `the column ${quote(cell.text)} for a second time`, HEADER);
    }
  }
  const [order, value, error] = COLUMNS.map((name) => header.findIndex((cell) => cell.text === name));
  if (value! < 0) complaints.add(header[0]!.at, 'header', 'no column "value"', HEADER);
  if (complaints.any) return undefined;

  const items: Entry[] = [];
  let first: Cell | undefined;
  for (const [i, row] of rows.entries()) {
    const entries = cells(row);
    const field = `coefficients[${i}]`;
    if (entries.length !== header.length) {
      complaints.add(
        { line: row.number, column: 1 },
        field,
        `${entries.length} cells`,
        `${header.length}, as in the header`,
      );
      items.push({ kind: 'text', text: '0', at: { line: row.number, column: 1 } });
      continue;
    }
    const orderCell = entries[order!];
    if (orderCell !== undefined) {
      first ??= orderCell;
      const wanted = Number(first.text) + i;
      if (/^[+-]?\d{1,6}$/.test(first.text) && orderCell.text !== first.text && Number(orderCell.text) !== wanted) {
        complaints.add(
          orderCell.at,
          `${field}.order`,
          quote(orderCell.text),
          `${wanted}: orders rise one by one (write 0 for a coefficient that vanishes)`,
        );
      }
    }
    const valueCell = entries[value!]!;
    const errorCell = entries[error!];
    items.push(errorCell === undefined || errorCell.text === '' ? valueCell : withError(valueCell, errorCell));
  }
  return bare(items, rows[0] === undefined ? START : { line: rows[0].number, column: 1 }, first);
}

function withError(value: Cell, error: Cell): Entry {
  return {
    kind: 'map',
    fields: new Map([
      ['value', { key: value.at, value }],
      ['error', { key: error.at, value: error }],
    ]),
    at: value.at,
  };
}
