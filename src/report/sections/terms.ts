/** @module Section 2: the terms, order by order, with the least one marked. */
import type { Assessment, TermRow } from '../../studies/index.js';
import { shorten } from '../../numerics/index.js';
import type { Page } from '../layout/page.js';
import type { TableNote, TableRow } from '../layout/table.js';

/** Longer lists are shown by their two ends; the JSON output has every row. */
const SHOWN = { atMost: 24, head: 10, tail: 10 } as const;

const RATIO_DIGITS = 5;

function remark(row: TermRow, reached: boolean): string {
  const words: string[] = [];
  if (row.least === true) words.push(reached ? '← least term' : '← smallest so far');
  if (row.estimated === true) words.push('estimated');
  return words.join(', ');
}

/** Digits of an error that the file gives by an expression. */
const ERROR_DIGITS = 4;

/** As the file says it: nothing of an input is rounded to its error. */
function coefficient(row: TermRow, digits: number): string {
  if (row.written !== undefined) return row.written;
  const value = shorten(row.coefficient, digits);
  return row.coefficientError === undefined ? value : `${value} ± ${shorten(row.coefficientError, ERROR_DIGITS)}`;
}

function setRow(row: TermRow, page: Page, reached: boolean): TableRow {
  const cells = [
    String(row.order),
    coefficient(row, page.digits),
    shorten(row.term, page.digits),
    shorten(row.partialSum, page.digits),
    row.ratio === undefined ? '' : shorten(row.ratio, RATIO_DIGITS),
    remark(row, reached),
  ];
  return row.least === true && reached ? { cells, tone: 'mark' } : { cells };
}

function closing(rows: readonly TermRow[], status: Assessment['optimalTruncation']['status']): string {
  const least = rows.find((row) => row.least === true);
  if (status === 'reached' && least !== undefined) return `Least term: order ${least.order}.`;
  if (status === 'not reached')
    return rows.length < 2
      ? 'Least term: one term alone has none to compare with.'
      : 'Least term: not reached. The terms still fall at the last known order.';
  return 'Least term: there is none to look for in this series.';
}

export function termsSection(
  page: Page,
  { terms, optimalTruncation }: Pick<Assessment, 'terms' | 'optimalTruncation'>,
): void {
  page.head('The terms');
  if (terms.length === 0) {
    page.say('There are no terms.');
    return;
  }
  const reached = optimalTruncation.status === 'reached';
  const rows: (TableRow | TableNote)[] = terms.map((row) => setRow(row, page, reached));
  if (rows.length > SHOWN.atMost) {
    const hidden = rows.length - SHOWN.head - SHOWN.tail;
    rows.splice(SHOWN.head, hidden, { note: `… ${hidden} more of ${terms.length} rows; all in --json`, tone: 'faint' });
  }
  page.table(
    [
      { head: 'order', align: 'right' },
      { head: 'coefficient', align: 'point' },
      { head: 'term', align: 'point' },
      { head: 'partial sum', align: 'point' },
      { head: 'ratio', align: 'point' },
      { head: '', align: 'left' },
    ],
    rows,
  );
  page.blank();
  page.say(closing(terms, optimalTruncation.status));
  page.say('The digits of terms and sums are certified for these coefficients and this coupling.', 'faint');
}
