/** @module The truncation-error models side by side, and order by order. */
import type { BandText, Fell, TruncationEstimate, TruncationOrder, TruncationResult } from '../studies/index.js';
import { parseDecimal, shorten } from '../numerics/index.js';
import { Page } from './layout/page.js';
import { unpainted } from './layout/paint.js';
import type { TableNote, TableRow } from './layout/table.js';
import { competingFacts } from './sections/competing.js';
import { couplingFacts } from './sections/read.js';
import { cautionPoints } from './sections/verdict.js';
import { sentence } from './words.js';
import type { TerminalOptions } from './terminal.js';

/** Significant digits of a band: a model's width is not known better. */
const BAND_DIGITS = 3;

const capital = (text: string): string => text.slice(0, 1).toUpperCase() + text.slice(1);

/** "± 0.0046", or "-0.0107 to +0.0222". */
export function bandWords(band: BandText | undefined): string {
  if (band === undefined) return '';
  const { low, high } = band;
  if (low === `-${high}`) return `± ${shorten(high, BAND_DIGITS)}`;
  const signed = (text: string): string => {
    const short = shorten(text, BAND_DIGITS);
    return (parseDecimal(text)?.coefficient ?? 0n) > 0n ? `+${short}` : short;
  };
  return `${signed(low)} to ${signed(high)}`;
}

function estimateRows(entry: TruncationEstimate): (TableRow | TableNote)[] {
  const { refused } = entry;
  const name = `  ${entry.title}`;
  if (refused !== undefined) {
    return [
      {
        note: `${entry.title}: refused. ${capital(refused.reason)}. Remedy: ${refused.remedy}.`,
        indent: 2,
        tone: 'warn',
      },
    ];
  }
  const guess = entry.next === undefined ? '' : shorten(entry.next, BAND_DIGITS);
  const row: TableRow = { cells: [name, bandWords(entry.band68), bandWords(entry.band95), entry.about, guess] };
  const said = [...facts(entry), ...(entry.notes ?? [])];
  return [row, ...said.map((note): TableNote => ({ note: `· ${note}`, indent: 4, tone: 'faint' }))];
}

/** Priors and facts in one line each. */
function facts(entry: TruncationEstimate): string[] {
  const priors = entry.priors.map(({ name, value }) => `${name} = ${value}`).join(', ');
  const own = (entry.facts ?? []).map(({ name, value }) => `${name} = ${value}`).join(', ');
  const lines = entry.nature === 'credible' ? [[priors, own].filter((text) => text !== '').join('; ')] : [own];
  return lines.filter((text) => text !== '');
}

function sideBySide(page: Page, result: TruncationResult): void {
  page.head(`Truncation error of the sum through order ${result.sum.through}`);
  page.facts([
    { label: 'sum', text: shorten(result.sum.value, page.digits) },
    { label: 'last term', text: shorten(result.sum.lastTerm, page.digits) },
  ]);
  page.blank();
  const of = (nature: TruncationEstimate['nature']): (TableRow | TableNote)[] =>
    result.estimates.filter((entry) => entry.nature === nature).flatMap(estimateRows);
  page.table(
    [
      { head: '', align: 'left' },
      { head: '68 %', align: 'left' },
      { head: '95 %', align: 'left' },
      { head: 'about', align: 'left', tone: 'faint' },
      { head: 'guess', align: 'point' },
    ],
    [
      { note: 'Conventional: a custom, no probability stands behind it', tone: 'strong' },
      ...of('conventional'),
      { note: 'Credible: Bayesian, under the priors named', tone: 'strong' },
      ...of('credible'),
    ],
  );
  page.blank();
  page.say('Bands are distances from the sum. All of them are indicative: models and rules of thumb.', 'faint');
}

function competing(page: Page, { competing: found }: TruncationResult): void {
  if (found === undefined) return;
  page.head('Competing growth: where to stop');
  page.facts(competingFacts(found, page.digits));
  page.blank();
  page.say(sentence(found.statement));
}

const FELL: Readonly<Record<Fell, string>> = { 68: 'inside', 95: 'in the 95 % band', outside: 'outside' };

function orderRows(order: TruncationOrder, titles: ReadonlyMap<string, string>): (TableRow | TableNote)[] {
  const rows: TableRow[] = [];
  for (const row of order.rows) {
    if (row.fell === undefined) continue;
    const cells = [
      `  ${titles.get(row.model) ?? row.model}`,
      bandWords(row.band68),
      bandWords(row.band95),
      FELL[row.fell],
    ];
    rows.push(row.fell === 'outside' ? { cells, tone: 'warn' } : { cells });
  }
  const silent = order.rows.filter((row) => row.fell === undefined).map((row) => titles.get(row.model) ?? row.model);
  return [
    {
      note: `through order ${order.through}; the term of order ${order.next.order} is ${shorten(order.next.term, BAND_DIGITS)}`,
      tone: 'strong',
    },
    ...rows,
    ...(silent.length === 0 ? [] : [{ note: `no answer: ${silent.join(', ')}`, indent: 2, tone: 'faint' } as const]),
  ];
}

function recordTable(page: Page, result: TruncationResult, titles: ReadonlyMap<string, string>): void {
  page.head('The record on this series');
  page.table(
    [
      { head: '', align: 'left' },
      { head: 'answers', align: 'right' },
      { head: 'inside 68 %', align: 'right' },
      { head: 'inside 95 %', align: 'right' },
    ],
    (result.record ?? []).map(({ model, asked, refused, inside68, inside95 }) => ({
      cells: [titles.get(model) ?? model, String(asked - refused), String(inside68), String(inside95)],
    })),
  );
  page.blank();
  page.say('How often the next known sum lay inside the band. A few orders of one series prove no coverage.', 'faint');
}

function byOrder(page: Page, result: TruncationResult): void {
  const titles = new Map(result.estimates.map((entry) => [entry.model, entry.title]));
  page.head('Order by order: did the next term fall inside');
  const orders = result.byOrder ?? [];
  if (orders.length === 0) {
    page.say('There is no second term to predict.');
    return;
  }
  page.table(
    [
      { head: '', align: 'left' },
      { head: '68 %', align: 'left' },
      { head: '95 %', align: 'left' },
      { head: 'next term', align: 'left' },
    ],
    orders.flatMap((order) => orderRows(order, titles)),
  );
  recordTable(page, result, titles);
}

/** The whole comparison. */
export function truncationText(result: TruncationResult, options: TerminalOptions = {}): string {
  const page = new Page(options.columns ?? 100, options.paint ?? unpainted, options.digits);
  page.title(result.series.title);
  page.blank();
  page.facts(couplingFacts(result.series, result.coupling));
  sideBySide(page, result);
  competing(page, result);
  if (result.byOrder !== undefined) byOrder(page, result);
  cautionPoints(page, result.cautions);
  return page.text();
}

/** One line a model that answers, for scripts: name, ends of the 68 % band, ends of the 95 % band, set off by tabs. */
export function truncationLines(result: TruncationResult): string {
  return result.estimates
    .flatMap(({ model, band68, band95 }) =>
      band68 === undefined || band95 === undefined
        ? []
        : [`${[model, band68.low, band68.high, band95.low, band95.high].join('\t')}\n`],
    )
    .join('');
}

/** Keys in the order in which they are written. */
const KEYS = [
  'leastterm',
  'request',
  'series',
  'coupling',
  'sum',
  'estimates',
  'competing',
  'byOrder',
  'record',
  'cautions',
] as const satisfies readonly (keyof TruncationResult)[];

/** The result with its keys in the documented order. */
export const truncationObject = (result: TruncationResult): object =>
  Object.fromEntries(KEYS.filter((key) => key in result).map((key) => [key, result[key]]));
