/**
 * @module A report as one self-contained HTML page: nothing is loaded, formulas are MathML, pictures are inline SVG, and the
 * results it was drawn from stand in it for reuse.
 */
import { CHART_KINDS } from '../../pictures/index.js';
import type { SavedResult } from '../../pictures/index.js';
import type { Assessment } from '../../studies/index.js';
import { tablesOf } from '../of-result.js';
import { plainNumber } from '../markdown.js';
import { referencesFor } from '../references.js';
import { symmetric } from '../table.js';
import { figureHtml, factsHtml, listHtml, tableHtml } from './blocks.js';
import { html, scriptJson } from './escape.js';
import { methodsHtml } from './methods.js';
import { STYLE } from './style.js';

export interface ReportInput {
  /** Results in the order of the page. */
  readonly results: readonly SavedResult[];
  /** Where the numbers come from: file, hash, date of nothing (the page depends on its input alone). */
  readonly provenance: readonly (readonly [name: string, value: string])[];
}

interface Section {
  readonly id: string;
  readonly title: string;
  readonly body: string;
}

const TITLES: Readonly<Record<string, string>> = {
  terms: 'Terms and partial sums',
  ratios: 'Growth of the coefficients',
  plane: 'Borel plane',
  values: 'Values by prescription',
  scale: 'Dependence on the scale',
  integrand: 'Borel integrand',
  compare: 'All prescriptions side by side',
  backtest: 'Back-tests',
  budget: 'Error budget',
  replicas: 'Replicas',
  truncation: 'Truncation error',
  sum: 'Sums',
  evolve: 'Evolution',
  extract: 'Extraction',
};

const isAssessment = (result: SavedResult): result is SavedResult & Assessment => result.request.command === 'assess';

function assessmentSections(result: SavedResult & Assessment): Section[] {
  const { verdict, series, coupling, growth, cautions } = result;
  const tables = new Map(tablesOf(result).map((table) => [table.name, table]));
  const table = (name: string): string => {
    const found = tables.get(name);
    return found === undefined ? '' : tableHtml(found);
  };
  const figure = (name: string): string => chartOf(result, name);
  return [
    {
      id: 'verdict',
      title: 'Verdict',
      body:
        `<p class="verdict">${html(verdict.printed)}</p>` +
        factsHtml([
          ['prescription', verdict.prescription],
          ['rule', verdict.rule],
          ['trust', verdict.standing],
        ]) +
        (cautions.length === 0
          ? ''
          : `<h3>Cautions</h3>${listHtml(
              cautions.map(({ text }) => text),
              'cautions',
            )}`),
    },
    {
      id: 'inputs',
      title: 'Inputs',
      body:
        factsHtml([
          ['series', `${series.title} (${series.id})`],
          ['quantity', series.quantity],
          ['coefficients used', `${series.coefficientsUsed} of ${series.coefficientsInFile}`],
          [
            'coupling',
            `${coupling.name} = ${plainNumber({ value: coupling.value, errors: symmetric('', coupling.error) })}`,
          ],
          ['expansion variable', `${coupling.name}/${coupling.divisor} = ${coupling.x}`],
          ['scheme', series.scheme],
          ['flavours', series.flavours === undefined ? undefined : String(series.flavours)],
          [
            'hard scale',
            series.hardScale === undefined ? undefined : `${series.hardScale.value} ${series.hardScale.unit}`,
          ],
          [
            'Λ',
            coupling.lambda?.GeV === undefined
              ? undefined
              : `${coupling.lambda.GeV} GeV (${coupling.lambda.definition})`,
          ],
          ['invented', series.invented ? 'yes: made up for demonstration' : undefined],
        ]) +
        `<h3>Sources</h3>${listHtml(series.sources)}` +
        (series.notes.length === 0 ? '' : `<h3>Notes</h3>${listHtml(series.notes)}`) +
        (coupling.path === undefined ? '' : `<h3>Path of the coupling</h3>${listHtml(coupling.path)}`),
    },
    { id: 'terms', title: TITLES['terms']!, body: figure('terms') + table('terms') },
    {
      id: 'growth',
      title: TITLES['ratios']!,
      body: `<p>${html(growth.statement)}.</p>${growth.agreement === undefined ? '' : `<p>${html(growth.agreement)}.</p>`}${figure('ratios')}${listHtml(growth.evidence.competition)}`,
    },
    { id: 'plane', title: TITLES['plane']!, body: figure('plane') + listHtml(result.borelPlane.notes) },
    { id: 'values', title: TITLES['values']!, body: figure('values') + table('values') },
    {
      id: 'ambiguity',
      title: 'Ambiguity and power correction',
      body: `<p>${html(result.ambiguity.statement)}.</p>${table('ambiguity')}<p>${html(result.powerCorrection.statement)}</p>`,
    },
    { id: 'truncation-order', title: 'Where to stop', body: `<p>${html(result.optimalTruncation.statement)}.</p>` },
  ];
}

/** The chart of a kind, where the result has something to draw. */
function chartOf(result: SavedResult, name: string): string {
  const kind = CHART_KINDS.find((entry) => entry.name === name);
  if (kind === undefined || !kind.from.includes(result.request.command)) return '';
  const chart = kind.draw(result);
  return chart.data.some(({ rows }) => rows.length > 0) ? figureHtml(chart) : '';
}

function otherSection(result: SavedResult, i: number): Section {
  const { command } = result.request;
  const charts = CHART_KINDS.filter(({ from }) => from[0] === command || from.includes(command)).map(
    ({ name }) => name,
  );
  const title = TITLES[command] ?? TITLES[charts[0] ?? ''] ?? command;
  const body = charts.map((name) => chartOf(result, name)).join('') + tablesOf(result).map(tableHtml).join('\n');
  return { id: `${command}-${i}`, title, body };
}

function methodSection(results: readonly SavedResult[]): Section {
  const names = new Set<string>();
  for (const result of results)
    if (isAssessment(result)) for (const { prescription } of result.values) names.add(prescription);
  const references = referencesFor('assess', [...names]).map(
    ({ authors, book, journal, volume, year, pages, eprint }) =>
      `${authors.join(', ')}${book === undefined ? '' : `, ${book}`}${journal === undefined ? '' : `, ${journal} ${volume ?? ''}`} (${year})${pages === undefined ? '' : ` ${pages}`}${eprint === undefined ? '' : `, arXiv:${eprint}`}`,
  );
  return {
    id: 'methods',
    title: 'Methods and references',
    body: `${methodsHtml([...names])}<h3>References</h3>${listHtml(references)}`,
  };
}

/** The page. Every picture and table is drawn from the results alone. */
export function reportPage({ results, provenance }: ReportInput): string {
  const main = results.find(isAssessment);
  const title =
    main === undefined ? 'Leastterm report' : `${main.series.title} at ${main.coupling.name} = ${main.coupling.value}`;
  const version = results[0] !== undefined && 'leastterm' in results[0] ? String(results[0].leastterm) : '';
  const sections: Section[] = [
    ...results.flatMap((result, i) => (isAssessment(result) ? assessmentSections(result) : [otherSection(result, i)])),
    methodSection(results),
    {
      id: 'provenance',
      title: 'Provenance',
      body:
        factsHtml([
          ['program', `leastterm ${version}`],
          ...provenance,
          ...results.map((result): [string, string] => [
            `request ${result.request.command}`,
            Object.entries(result.request)
              .map(([name, value]) => `${name} ${String(value)}`)
              .join(', '),
          ]),
        ]) + '<p class="notes">The results stand in this page as JSON, in the element with the id “results”.</p>',
    },
  ].filter(({ body }) => body !== '');
  return [
    '<!doctype html>',
    '<html lang="en">',
    '<head>',
    '<meta charset="utf-8">',
    '<meta name="viewport" content="width=device-width, initial-scale=1">',
    `<title>${html(title)}</title>`,
    `<style>${STYLE}</style>`,
    '</head>',
    '<body>',
    '<a class="skip" href="#content">Skip to the content</a>',
    `<header><h1>${html(title)}</h1></header>`,
    `<nav aria-label="Contents"><ol>${sections.map(({ id, title: t }) => `<li><a href="#${id}">${html(t)}</a></li>`).join('')}</ol></nav>`,
    '<main id="content">',
    ...sections.map(
      ({ id, title: t, body }) =>
        `<section aria-labelledby="${id}"><h2 id="${id}">${html(t)}</h2>\n${body}\n</section>`,
    ),
    '</main>',
    `<script type="application/json" id="results">${scriptJson(results)}</script>`,
    '</body>',
    '</html>',
    '',
  ].join('\n');
}
