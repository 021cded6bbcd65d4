/** @module The check of the catalogue for people. */
import type { CheckedSeries } from '../studies/index.js';
import { Page } from './layout/page.js';
import { unpainted } from './layout/paint.js';
import type { TableNote, TableRow } from './layout/table.js';
import type { TerminalOptions } from './terminal.js';

function rows(entry: CheckedSeries): (TableRow | TableNote)[] {
  const good = entry.problems.length === 0;
  const row = {
    cells: [entry.id, entry.flavours.join(', '), String(entry.values), good ? 'good' : 'wrong'],
    ...(good ? {} : { tone: 'warn' as const }),
  };
  return [row, ...entry.problems.map((text): TableNote => ({ note: text, indent: 2, tone: 'warn' }))];
}

/** One line a series, and a sum. */
export function catalogueCheckText(list: readonly CheckedSeries[], options: TerminalOptions = {}): string {
  const page = new Page(options.columns ?? 100, options.paint ?? unpainted, options.digits);
  page.table(
    [
      { head: 'id', align: 'left' },
      { head: 'read at n_f', align: 'left' },
      { head: 'values held', align: 'right' },
      { head: '', align: 'left' },
    ],
    list.flatMap(rows),
  );
  page.blank();
  const wrong = list.filter((entry) => entry.problems.length > 0).length;
  const values = list.reduce((sum, entry) => sum + entry.values, 0);
  page.say(
    `${list.length} series read, ${values} recorded values held against them, ${wrong} wrong.`,
    wrong > 0 ? 'warn' : 'plain',
  );
  return page.text();
}

/** The problems alone, one a line. */
export const catalogueProblems = (list: readonly CheckedSeries[]): string =>
  list.flatMap((entry) => entry.problems.map((text) => `${text}\n`)).join('');
