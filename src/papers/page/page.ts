/**
 * @module A report as one self-contained HTML page: nothing is loaded, formulas are MathML, pictures are inline SVG, and the
 * results it was drawn from stand in it for reuse.
 */
import { CHART_KINDS } from '../../pictures/index.js';
import type { SavedResult } from '../../pictures/index.js';
import type { Assessment } from '../../studies/index.js';
import { tablesOf } from '../of-result.js';
import { plainNumber } from '../markdown.js';
import { methodsIn } from '../bibtex.js';
import { referencesFor } from '../references.js';
import type { Reference } from '../references.js';
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
  mass: 'Masses by definition',
  contour: 'Integral over a circle',
  bubbles: 'Exact large-β₀ limit',
  rewrite: 'Series rewritten',
  combine: 'Series combined',
};

const isAssessment = (result: SavedResult): result is SavedResult & Assessment => result.request.command === 'assess';

function assessmentSections(result: SavedResult & Assessment, mark = ''): Section[] {
  const { verdict, series, coupling, growth, cautions } = result;
  const tables = new Map(tablesOf(result).map((table) => [table.name, table]));
  const table = (name: string): string => {
    const found = tables.get(name);
    return found === undefined ? '' : tableHtml(found);
  };
  const figure = (name: string): string => chartOf(result, name, mark);
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
function chartOf(result: SavedResult, name: string, mark = ''): string {
  const kind = CHART_KINDS.find((entry) => entry.name === name);
  if (kind === undefined || !kind.from.includes(result.request.command)) return '';
  const chart = kind.draw(result);
  return chart.data.some(({ rows }) => rows.length > 0) ? figureHtml(chart, mark) : '';
}

/** What results of other commands say in words, where they do. */
interface Spoken {
  readonly summary?: { readonly printed?: string; readonly values?: readonly { readonly printed: string }[] };
  readonly difference?: { readonly statement: string };
  readonly cautions?: readonly (string | { readonly text: string })[];
}

function otherSection(result: SavedResult, i: number): Section {
  const { command } = result.request;
  const charts = CHART_KINDS.filter(({ from }) => from[0] === command || from.includes(command)).map(
    ({ name }) => name,
  );
  const title = TITLES[command] ?? TITLES[charts[0] ?? ''] ?? command;
  const { summary, difference, cautions = [] } = result as Spoken & SavedResult;
  // A back-test over several series has a summary of another kind: a list.
  const quoted = Array.isArray(summary) ? [] : [summary?.printed, ...(summary?.values ?? []).map((v) => v.printed)];
  const lines = [...quoted, difference?.statement];
  const words = lines.flatMap((line) => (line === undefined ? [] : [`<p class="verdict">${html(line)}</p>`])).join('');
  const warned = cautions.map((caution) => (typeof caution === 'string' ? caution : caution.text));
  const body =
    words +
    charts.map((name) => chartOf(result, name, String(i))).join('') +
    tablesOf(result).map(tableHtml).join('\n') +
    (warned.length === 0 ? '' : `<h3>Cautions</h3>${listHtml(warned, 'cautions')}`);
  return { id: `${command}-${i}`, title, body };
}

function referenceText({ authors, book, journal, volume, year, pages, eprint }: Reference): string {
  const where = journal === undefined ? '' : `, ${journal}${volume === undefined ? '' : ` ${volume}`}`;
  return (
    // Braces keep the name of a group whole in BibTeX.
    `${authors.join(', ').replace(/[{}]/g, '')}${book === undefined ? '' : `, ${book}`}${where} (${year})` +
    `${pages === undefined ? '' : ` ${pages}`}${eprint === undefined ? '' : `, arXiv:${eprint}`}`
  );
}

/** Formulas and literature of the methods whose numbers stand in the results. */
function methodSection(results: readonly SavedResult[]): Section {
  const names = [...methodsIn(results)];
  const references = results.flatMap(({ request }) => referencesFor(request.command, names)).map(referenceText);
  const formulas = methodsHtml(names);
  return {
    id: 'methods',
    title: formulas === '' ? 'References' : 'Methods and references',
    body:
      formulas +
      (references.length === 0
        ? ''
        : `${formulas === '' ? '' : '<h3>References</h3>'}${listHtml([...new Set(references)])}`),
  };
}

/** Several assessments on one page: the names of the later ones' sections get a number. */
const numbered = (sections: readonly Section[], i: number, title: string): Section[] =>
  sections.map((section) => ({ ...section, id: `${section.id}-${i}`, title: `${section.title}: ${title}` }));

/** The name of a page without an assessment: that of its first table. */
function pageTitle(results: readonly SavedResult[]): string {
  const main = results.find(isAssessment);
  if (main !== undefined) return `${main.series.title} at ${main.coupling.name} = ${main.coupling.value}`;
  return results.flatMap(tablesOf)[0]?.title ?? 'Leastterm report';
}

function resultSections(results: readonly SavedResult[]): Section[] {
  const first = results.find(isAssessment);
  return results.flatMap((result, i) => {
    if (!isAssessment(result)) return [otherSection(result, i)];
    const sections = assessmentSections(result, String(i));
    return result === first
      ? sections
      : numbered(sections, i, `${result.series.title} at ${result.coupling.name} = ${result.coupling.value}`);
  });
}

/** The page. Every picture and table is drawn from the results alone. */
export function reportPage({ results, provenance }: ReportInput): string {
  const title = pageTitle(results);
  const version = results[0] !== undefined && 'leastterm' in results[0] ? String(results[0].leastterm) : '';
  const sections: Section[] = [
    ...resultSections(results),
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
