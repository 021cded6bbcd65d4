/** @module An extraction for people: solutions by prescription, the quoted value with its budget, where it is wanted. */
import type { ExtractResult, ExtractRow, FitResult, UnknownSummary } from '../extraction/index.js';
import { Page, unpainted, type Fact, type TerminalOptions } from '../report/index.js';
import { budgetTable, cellText, componentOf, cut, legend, refusedFacts, sidesText } from './budget-parts.js';
import { fitLines, fitText } from './extract-fit.js';
import { replicaSection } from './replicas.js';

const withPi = (text: string): string => text.replaceAll(/\balpha_s\b/g, 'α_s');

/** "α_s(1.77693 GeV), n_f = 3". */
export function symbolText(u: UnknownSummary): string {
  const scale = u.scale === undefined ? '' : `(${Number(u.scale)} GeV)`;
  return `${withPi(u.symbol)}${scale}${u.flavours === undefined ? '' : `, n_f = ${u.flavours}`}`;
}

function questionFacts({ datum, unknown, searched, rows }: ExtractResult): Fact[] {
  const { measured, scale, series } = datum;
  const at = scale === undefined ? '' : ` at Q = ${Number(scale)} GeV`;
  const found = rows.find((row) => row.ambiguity !== undefined)?.ambiguity;
  return [
    { label: 'measured', text: measured === undefined ? '' : `${measured.text}${at}` },
    { label: 'wanted', text: unknown.unit === undefined ? '' : `${symbolText(unknown)} in ${unknown.unit}` },
    { label: 'quantity', text: series.quantity ?? '' },
    {
      label: 'searched',
      text: searched === undefined ? '' : `from ${Number(searched.from)} to ${Number(searched.to)}`,
    },
    { label: 'ambiguity by', text: found?.convention ?? '' },
  ].filter((fact) => fact.text !== '');
}

/** Where else the measurement is reproduced. */
function rootsLegend(rows: readonly ExtractRow[]): string[] {
  const list = rows.flatMap((r) =>
    r.otherRoots === undefined ? [] : [`${r.prescription} ${r.otherRoots.map((p) => cut(p, 4)).join(', ')}`],
  );
  return list.length === 0
    ? []
    : [`several roots: the measurement is reproduced elsewhere as well: ${list.join('; ')}`];
}

/** Columns of a value that was evolved are shown where there is one. */
function solutionTable(page: Page, result: ExtractResult): void {
  const { rows, summary } = result;
  const standing = rows.filter((row) => row.refused === undefined);
  const evolved = summary?.evolved === undefined ? '' : `at ${goal(summary.evolved)}`;
  page.table(
    [
      { head: '', align: 'left' },
      { head: withPi(result.unknown.symbol), align: 'point', tone: 'mark' },
      { head: 'total', align: 'left' },
      { head: evolved, align: 'point', tone: 'mark' },
      { head: 'total', align: 'left' },
      { head: 'trust', align: 'left' },
      { head: 'digits', align: 'left', tone: 'faint' },
      { head: 'caution', align: 'left', tone: 'warn' },
    ],
    standing.map((row) => ({
      cells: [
        `${row.prescription}${row.prescription === summary?.prescription ? ' *' : ''}`,
        cut(row.value, page.digits),
        sidesText(row.totals?.quadrature).replace('± ', '±'),
        cut(row.evolved?.value, page.digits),
        sidesText(row.evolved?.totals.quadrature).replace('± ', '±'),
        row.trust ?? '',
        row.digits ?? '',
        row.cautions.map((c) => c.code).join(', '),
      ],
    })),
  );
  page.blank();
  const facts: Fact[] = [];
  if (summary?.spread !== undefined) {
    const { low, high, half, accepted } = summary.spread;
    facts.push({
      label: 'spread',
      text: `${cut(low, page.digits)} to ${cut(high, page.digits)}, half of it ${cut(half, 2)}: ${accepted.join(', ')}`,
    });
  }
  page.facts([...facts, ...refusedFacts(rows)]);
  page.blank();
  page.points([...legend(standing), ...rootsLegend(standing)], 'faint');
  page.say('* quoted below. Totals are in quadrature; digits are those of the solution, trust is in the sum.', 'faint');
}

const goal = ({ scale, flavours }: { readonly scale: string; readonly flavours: number }): string =>
  scale === '91.1879' && flavours === 5 ? 'M_Z' : `${scale} GeV`;

const SHORT = {
  measurement: 'measured',
  inputs: 'inputs',
  coefficients: 'coeff.',
  'power corrections': 'power',
  truncation: 'trunc.',
  scale: 'scale',
  ambiguity: 'ambig.',
} as const;

const isShort = (name: string): name is keyof typeof SHORT => name in SHORT;

function componentTable(page: Page, rows: readonly ExtractRow[]): void {
  const standing = rows.filter((row) => row.refused === undefined);
  const names = [...new Set(standing.flatMap((row) => row.components?.map((c) => c.name) ?? []))].filter(isShort);
  page.table(
    [{ head: '', align: 'left' }, ...names.map((name) => ({ head: SHORT[name], align: 'left' as const }))],
    standing.map((row) => ({
      cells: [
        row.prescription,
        ...names.map((name) => {
          const text = cellText(componentOf(row, name));
          return text === '0' ? '' : text;
        }),
      ],
    })),
  );
  page.blank();
  page.say('In parentheses: not counted, since a larger component estimates the same.', 'faint');
}

function ambiguityFacts(result: ExtractResult): Fact[] {
  const row = result.rows.find((r) => r.prescription === result.summary?.prescription);
  const found = row?.ambiguity;
  if (row === undefined || found === undefined) return [];
  const { convention, value, dimension, GeV, origin } = found;
  const power = dimension === undefined ? '' : dimension === '1' ? 'GeV' : `GeV^${dimension}`;
  const inPower = GeV === undefined || dimension === undefined ? '' : `; times Q^${dimension}: ${cut(GeV, 3)} ${power}`;
  const own = sidesText(componentOf(row, 'ambiguity'));
  const unit = result.unknown.unit === undefined ? '' : ` ${result.unknown.unit}`;
  return [
    { label: convention, text: `${cut(value, 3)} in R${inPower}` },
    { label: 'in the unknown', text: own === '' ? '' : `${own}${unit}` },
    { label: 'from', text: origin },
    { label: 'belongs to', text: row.belongsTo ?? '' },
  ].filter((fact) => fact.text !== '');
}

function summarySection(page: Page, result: ExtractResult): void {
  const { summary, unknown } = result;
  if (summary === undefined) return;
  const { evolved } = summary;
  page.head(`Quoted: ${summary.prescription}`);
  page.facts(
    [
      { label: symbolText(unknown), text: summary.printed, tone: 'mark' as const },
      {
        label: evolved === undefined ? '' : `α_s(${goal(evolved)})`,
        text: evolved?.printed ?? '',
        tone: 'mark' as const,
      },
      { label: 'chosen by', text: summary.rule },
    ].filter((fact) => fact.text !== ''),
  );
  page.blank();
  budgetTable(page, summary, evolved, [withPi(unknown.symbol), evolved === undefined ? '' : goal(evolved)]);
  const ambiguity = ambiguityFacts(result);
  if (ambiguity.length > 0) {
    page.head('Renormalon ambiguity');
    page.facts(ambiguity);
  }
  if (evolved !== undefined) {
    page.head(`Evolution to ${goal(evolved)}`);
    page.points(evolved.path.map((step) => step.text));
  }
}

function condensateSection(page: Page, result: ExtractResult): void {
  if (result.condensates === undefined) return;
  page.head('Power corrections');
  page.facts(
    result.condensates.flatMap((t): Fact[] => [
      { label: t.name, text: `${t.origin}: adds ${cut(t.adds, 3)} to R at the quoted solution` },
      { label: '', text: `the value belongs to ${t.belongsTo}` },
    ]),
  );
}

function singleText(result: ExtractResult, options: TerminalOptions): string {
  const page = new Page(options.columns ?? 100, options.paint ?? unpainted, options.digits);
  page.title(`${symbolText(result.unknown)} from: ${result.datum.series.title}`);
  page.facts(questionFacts(result));
  page.head('By prescription');
  solutionTable(page, result);
  if (result.rows.some((row) => row.refused === undefined)) {
    page.head('Components by prescription');
    componentTable(page, result.rows);
  }
  summarySection(page, result);
  condensateSection(page, result);
  if (result.replicas !== undefined) replicaSection(page, result.replicas);
  if (result.cautions.length > 0) {
    page.head('Cautions');
    page.points(result.cautions.map((c) => c.text), 'warn'); // prettier-ignore
  }
  return page.text();
}

/** The page of an extraction or a fit. */
export const extractText = (result: ExtractResult | FitResult, options: TerminalOptions = {}): string =>
  result.kind === 'fit' ? fitText(result, options) : singleText(result, options);

/** name, value, error upwards, error downwards (quadrature): a line a prescription, set off by tabs. */
export function extractLines(result: ExtractResult | FitResult): string {
  if (result.kind === 'fit') return fitLines(result);
  return result.rows
    .flatMap(({ prescription, value, totals }) =>
      value === undefined || totals === undefined
        ? []
        : [`${[prescription, value, totals.quadrature.plus, totals.quadrature.minus].join('\t')}\n`],
    )
    .join('');
}
