/** @module Many back-tests together for people and in lines: empirical coverage by method. */
import type { BacktestSummary, PooledMethod } from '../studies/index.js';
import { LEGEND } from './backtest.js';
import { rough } from './layout/figures.js';
import { Page } from './layout/page.js';
import { unpainted } from './layout/paint.js';
import { cautionPoints } from './sections/verdict.js';
import type { TerminalOptions } from './terminal.js';

const small = (text: string | undefined): string => (text === undefined ? '' : rough(text));

function pooledTable(page: Page, rows: readonly PooledMethod[]): void {
  page.table(
    [
      { head: '', align: 'left' },
      { head: 'series', align: 'right' },
      { head: 'tests', align: 'right' },
      { head: 'in 68 %', align: 'left' },
      { head: 'in 95 %', align: 'left' },
      { head: 'bias', align: 'point' },
      { head: 'sharpness', align: 'point' },
      { head: 'score', align: 'point' },
    ],
    rows.map((row) => ({
      cells: [
        row.method,
        String(row.series),
        String(row.tested),
        `${percent(row.coverage68)} ± ${percent(row.coverageError)}`,
        row.coverage95 === undefined ? '' : percent(row.coverage95),
        small(row.bias),
        small(row.sharpness),
        small(row.score),
      ],
    })),
  );
}

const percent = (share: string): string => `${Math.round(100 * Number(share))} %`;

/** Coverage over many series. */
export function backtestSummaryText(result: BacktestSummary, options: TerminalOptions = {}): string {
  const page = new Page(options.columns ?? 100, options.paint ?? unpainted, options.digits);
  page.title('Empirical coverage by method');
  page.blank();
  page.facts([
    { label: 'series', text: result.results.map((r) => r.series.id).join(', ') || 'none' },
    ...result.skipped.map(({ series, reason }) => ({
      label: 'left out',
      text: `${series}: ${reason}`,
      tone: 'faint' as const,
    })),
  ]);
  const kinds: readonly (readonly [PooledMethod['kind'], string])[] = [
    ['prescription', 'Values'],
    ['truncation error', 'Truncation errors'],
  ];
  for (const [kind, head] of kinds) {
    page.head(head);
    pooledTable(
      page,
      result.summary.filter((row) => row.kind === kind),
    );
  }
  page.blank();
  page.say(
    `Each series counts with its own first target: ${targets(result)}. ${LEGEND} Bias, sharpness and score are medians over the series. The errors of the shares take tests as independent, which those of one series are not.`,
    'faint',
  );
  const cautions = result.results
    .flatMap((r) => r.cautions)
    .filter((c, i, all) => all.findIndex((d) => d.code === c.code) === i);
  cautionPoints(page, cautions);
  return page.text();
}

function targets(result: BacktestSummary): string {
  const kinds = [...new Set(result.results.map((r) => r.target.against))];
  return kinds
    .map((kind) => `${kind} for ${result.results.filter((r) => r.target.against === kind).length}`)
    .join(', ');
}

/** The same of many series, pooled. */
export function backtestSummaryLines(result: BacktestSummary): string {
  return result.summary
    .map((row) => `${[row.method, row.inside68, row.tested, row.bias, row.score].join('\t')}\n`)
    .join('');
}
