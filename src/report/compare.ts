/** @module All prescriptions side by side: for people, and as comma-separated values. */
import type { ComparePoint, CompareResult, CompareRow, Spread } from '../studies/index.js';
import { shorten } from '../numerics/index.js';
import { csv } from './csv.js';
import { plusMinus, rough } from './layout/figures.js';
import { Page } from './layout/page.js';
import type { Fact } from './layout/page.js';
import { unpainted } from './layout/paint.js';
import { couplingFacts } from './sections/read.js';
import { cautionPoints } from './sections/verdict.js';
import type { TerminalOptions } from './terminal.js';

const codes = (row: CompareRow): string => row.cautions.map((caution) => caution.code).join(', ');

function rowCells(row: CompareRow, digits: number): string[] {
  return [
    row.prescription,
    shorten(row.value ?? '', digits),
    plusMinus(row.truncationError),
    plusMinus(row.ambiguity),
    row.termsUsed === undefined ? '' : String(row.termsUsed),
    row.standing ?? '',
    row.digits ?? '',
    row.record === undefined ? '' : rough(row.record.score),
    codes(row),
  ];
}

/** "prescriptions that refused, by reason": one line a reason. */
function refusals(rows: readonly CompareRow[]): string[] {
  const grouped = new Map<string, string[]>();
  for (const { prescription, refused } of rows) {
    if (refused !== undefined) grouped.set(refused.reason, [...(grouped.get(refused.reason) ?? []), prescription]);
  }
  return [...grouped].map(([reason, names]) => `${names.join(', ')}: ${reason}`);
}

function spreadText(spread: Spread | undefined, what: string, digits: number): string {
  if (spread === undefined) return '';
  const { count, low, high, width } = spread;
  if (count === 1) return `${what}: one value, ${shorten(low, digits)}`;
  return `${what}: ${shorten(low, digits)} to ${shorten(high, digits)}, width ${rough(width)}, ${count} values`;
}

function pointTable(page: Page, rows: readonly CompareRow[], point: ComparePoint): void {
  const standing = rows.filter((row) => row.refused === undefined);
  page.table(
    [
      { head: '', align: 'left' },
      { head: 'value', align: 'point' },
      { head: 'truncation', align: 'point' },
      { head: 'ambiguity', align: 'point' },
      { head: 'terms', align: 'right' },
      { head: 'trust', align: 'left' },
      { head: 'digits', align: 'left', tone: 'faint' },
      { head: 'score', align: 'point' },
      { head: 'caution', align: 'left', tone: 'warn' },
    ],
    standing.map((row) => ({ cells: rowCells(row, page.digits) })),
  );
  page.blank();
  const { all, unflagged } = point.spread;
  const flagged = standing.some((row) => row.cautions.length > 0);
  page.facts(
    [
      { label: 'spread', text: spreadText(all, flagged ? 'all' : 'all, none with a caution', page.digits) },
      {
        label: 'spread',
        text: !flagged
          ? ''
          : unflagged === undefined
            ? 'without a caution: no value'
            : spreadText(unflagged, 'without a caution', page.digits),
      },
      ...refusals(rows).map((text) => ({ label: 'refused', text, tone: 'faint' as const })),
    ].filter((fact) => fact.text !== ''),
  );
}

/** Why rows are flagged, each reason once. */
function legend(rows: readonly CompareRow[]): string[] {
  const known = new Map(rows.flatMap((row) => row.cautions.map((c) => [c.code, c.text] as const)));
  return [...known].map(([code, text]) => `${code}: ${text}`);
}

function scoreWords(rows: readonly CompareRow[]): string {
  const against = [...new Set(rows.flatMap((row) => (row.record === undefined ? [] : [row.record.against])))];
  if (against.length === 0) return '';
  const target = against.map((kind) =>
    kind === 'own value' ? "the method's own value with all terms (stability only)" : `the ${kind}`,
  );
  const seen = rows.find((row) => row.record?.seen !== undefined)?.record?.seen;
  const from = seen === undefined ? 'with the last coefficients hidden' : `from the first ${seen} coefficients`;
  return ` Score: interval score of the predictions ${from}, held against ${target.join(' or ')}; small is good.`;
}

/** The comparison for people. */
export function compareText(result: CompareResult, options: TerminalOptions = {}): string {
  const page = new Page(options.columns ?? 100, options.paint ?? unpainted, options.digits);
  page.title(result.series.title);
  for (const point of result.points) {
    const { value: at } = point.coupling;
    const scale: Fact[] = point.scale === undefined ? [] : [{ label: 'scale', text: `μ/Q = ${point.scale}` }];
    page.blank();
    page.facts(
      result.points.length === 1
        ? couplingFacts(result.series, point.coupling)
        : [...scale, ...couplingFacts(result.series, point.coupling).slice(0, 1)],
    );
    page.blank();
    pointTable(
      page,
      result.rows.filter((row) => row.at === at && row.scale === point.scale),
      point,
    );
  }
  page.blank();
  page.points(legend(result.rows), 'faint');
  page.say(
    `Trust is in the number as an answer, digits in its decimals: certified digits of an indicative model are still a model's. Ambiguity is |Im|/π.${scoreWords(result.rows)}`,
    'faint',
  );
  cautionPoints(page, result.cautions);
  return page.text();
}

/** name, value, truncation error: a line a value, set off by tabs; the coupling (the scale) in front where there are several. */
export function compareLines(result: CompareResult): string {
  return result.rows
    .flatMap((row) =>
      row.value === undefined
        ? []
        : [
            `${[...(result.points.length > 1 ? [row.scale ?? row.at] : []), row.prescription, row.value, row.truncationError ?? ''].join('\t')}\n`,
          ],
    )
    .join('');
}

const HEAD = [
  'coupling',
  'scale',
  'x',
  'prescription',
  'family',
  'variant',
  'value',
  'truncation',
  'ambiguity',
  'imaginary',
  'input',
  'terms',
  'trust',
  'digits',
  'score',
  'bias',
  'inside',
  'tested',
  'against',
  'cautions',
  'refused',
];

/** One line a point and prescription. */
export function compareCsv(result: CompareResult): string {
  return csv(
    HEAD,
    result.rows.map((row) => [
      row.at,
      row.scale,
      row.x,
      row.prescription,
      row.family,
      row.variant,
      row.value,
      row.truncationError,
      row.ambiguity,
      row.imaginary,
      row.inputError,
      row.termsUsed?.toString(),
      row.standing,
      row.digits,
      row.record?.score,
      row.record?.bias,
      row.record?.inside.toString(),
      row.record?.tested.toString(),
      row.record?.against,
      row.cautions.map((c) => c.code).join('; '),
      row.refused?.reason,
    ]),
  );
}
