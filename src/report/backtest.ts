/** @module The back-test of a series for people, in lines, and as comma-separated values. */
import type { BacktestEstimate, BacktestMethod, BacktestResult } from '../studies/index.js';
import { shorten } from '../numerics/index.js';
import { csv } from './csv.js';
import { rough } from './layout/figures.js';
import { Page } from './layout/page.js';
import { unpainted } from './layout/paint.js';
import type { TableNote, TableRow } from './layout/table.js';
import { couplingFacts } from './sections/read.js';
import { cautionPoints } from './sections/verdict.js';
import type { TerminalOptions } from './terminal.js';

const pageFor = (options: TerminalOptions): Page =>
  new Page(options.columns ?? 100, options.paint ?? unpainted, options.digits);

const of = (part: number, whole: number): string => `${part} of ${whole}`;

const small = (text: string | undefined): string => (text === undefined ? '' : rough(text));

/** One row a target; refusals of the shorter series in a note. */
function methodRows(method: BacktestMethod): (TableRow | TableNote)[] {
  const rows = method.records.map((record, i) => ({
    cells: [
      i === 0 ? method.prescription : '',
      record.against,
      of(record.inside, record.tested),
      small(record.bias),
      small(record.sharpness),
      small(record.score),
      record.verdict,
    ],
    ...(record.verdict === 'bad' ? { tone: 'warn' as const } : {}),
  }));
  return rows;
}

function prescriptionTable(page: Page, result: BacktestResult): void {
  page.head('Values predicted with the last coefficients hidden');
  page.say(`Held against ${result.target.statement}.`);
  page.blank();
  page.table(
    [
      { head: '', align: 'left' },
      { head: 'against', align: 'left', tone: 'faint' },
      { head: 'inside', align: 'left' },
      { head: 'bias', align: 'point' },
      { head: 'sharpness', align: 'point' },
      { head: 'score', align: 'point' },
      { head: 'record', align: 'left' },
    ],
    result.prescriptions.flatMap(methodRows),
  );
  const refused = new Map<string, string[]>();
  for (const { prescription, trials } of result.prescriptions) {
    const [first] = trials;
    const reason = first?.refused?.reason;
    if (reason === undefined || trials.some((trial) => trial.refused === undefined)) continue;
    refused.set(reason, [...(refused.get(reason) ?? []), prescription]);
  }
  if (refused.size > 0) {
    page.blank();
    page.facts(
      [...refused].map(([reason, names]) => ({
        label: 'refused',
        text: `${names.join(', ')}: ${reason}`,
        tone: 'faint',
      })),
    );
  }
}

function nextTable(page: Page, result: BacktestResult): void {
  const rows = result.prescriptions.flatMap(({ prescription, trials }) =>
    trials.flatMap(({ next, variant = '' }) =>
      next === undefined
        ? []
        : [
            {
              cells: [
                prescription,
                variant,
                String(next.order),
                shorten(next.predicted, 5),
                shorten(next.actual, 5),
                next.miss === undefined ? '' : small(next.miss),
              ],
            },
          ],
    ),
  );
  if (rows.length === 0) return;
  page.head('Next coefficient that a method implies');
  page.table(
    [
      { head: '', align: 'left' },
      { head: '', align: 'left', tone: 'faint' },
      { head: 'order', align: 'right' },
      { head: 'predicted', align: 'point' },
      { head: 'known', align: 'point' },
      { head: 'relative miss', align: 'point' },
    ],
    rows,
  );
}

function estimateRows(entry: BacktestEstimate): TableRow[] {
  return entry.records.map((record, i) => ({
    cells: [
      i === 0 ? entry.title : '',
      record.against,
      of(record.inside68, record.tested),
      of(record.inside95, record.tested),
      small(record.bias),
      small(record.sharpness),
      small(record.score68),
    ],
  }));
}

function estimateTable(page: Page, result: BacktestResult): void {
  page.head('Truncation errors with the last coefficients hidden');
  page.say(
    'A model of the next term is held against the sum with the next term, a model of the remainder against the target above.',
  );
  page.blank();
  page.table(
    [
      { head: '', align: 'left' },
      { head: 'against', align: 'left', tone: 'faint' },
      { head: 'in 68 %', align: 'left' },
      { head: 'in 95 %', align: 'left' },
      { head: 'bias', align: 'point' },
      { head: 'sharpness', align: 'point' },
      { head: 'score', align: 'point' },
    ],
    result.estimates.flatMap(estimateRows),
  );
  const silent = result.estimates.filter((entry) => entry.records.length === 0).map((entry) => entry.title);
  if (silent.length > 0) {
    page.blank();
    page.facts([
      {
        label: 'not tested',
        text: `${silent.join(', ')}: refused, or no target for what they speak of`,
        tone: 'faint',
      },
    ]);
  }
}

/** What the columns of scores mean. */
export const LEGEND =
  'Bias (mean of predicted minus target), sharpness (mean stated error) and score are in units of the target. Score: interval score at 68 %, small is good. Where the target has an error of its own, it is allowed for. A handful of tests on one series proves no coverage.';

/** The back-test of one series. */
export function backtestText(result: BacktestResult, options: TerminalOptions = {}): string {
  const page = pageFor(options);
  page.title(result.series.title);
  page.blank();
  page.facts([
    ...couplingFacts(result.series, result.coupling).slice(0, 1),
    {
      label: 'known',
      text: `${result.known} computed coefficients; hidden in turn: ${result.hidden.join(', ') || 'none'}`,
    },
  ]);
  if (result.hidden.length > 0) {
    prescriptionTable(page, result);
    nextTable(page, result);
    estimateTable(page, result);
    page.blank();
    page.say(LEGEND, 'faint');
  }
  cautionPoints(page, result.cautions);
  return page.text();
}

/** A line a method: name, inside, tested, bias, score, set off by tabs. */
export function backtestLines(result: BacktestResult): string {
  return result.prescriptions
    .flatMap(({ prescription, records: [record] }) =>
      record === undefined
        ? []
        : [`${[prescription, record.inside, record.tested, record.bias, record.score].join('\t')}\n`],
    )
    .join('');
}

const HEAD = [
  'series',
  'coupling',
  'kind',
  'method',
  'against',
  'tested',
  'inside68',
  'inside95',
  'bias',
  'sharpness',
  'score',
  'record',
];

/** One line a series, method and target. */
export function backtestCsv(results: readonly BacktestResult[]): string {
  return csv(
    HEAD,
    results.flatMap((r) => [
      ...r.prescriptions.flatMap((p) =>
        p.records.map((record) => [
          r.series.id,
          r.coupling.value,
          'prescription',
          p.prescription,
          record.against,
          String(record.tested),
          String(record.inside),
          undefined,
          record.bias,
          record.sharpness,
          record.score,
          record.verdict,
        ]),
      ),
      ...r.estimates.flatMap((e) =>
        e.records.map((record) => [
          r.series.id,
          r.coupling.value,
          'truncation error',
          e.model,
          record.against,
          String(record.tested),
          String(record.inside68),
          String(record.inside95),
          record.bias,
          record.sharpness,
          record.score68,
          undefined,
        ]),
      ),
    ]),
  );
}
