/** @module A fit to several measurements for people: parameters by prescription, pulls, profiles, correlations. */
import type { FitResult, FitSummary } from '../extraction/index.js';
import { Page, unpainted, type TerminalOptions } from '../report/index.js';
import { budgetTable, cut, legend, refusedFacts, sidesText } from './budget-parts.js';
import { replicaSection } from './replicas.js';

const withPi = (text: string): string => text.replaceAll(/\balpha_s\b/g, 'α_s');

const nameOf = (p: FitResult['parameters'][number]): string =>
  `${withPi(p.symbol)}${p.scale === undefined ? '' : `(${Number(p.scale)} GeV)`}`;

function byPrescription(page: Page, result: FitResult): void {
  const { rows, parameters, summary } = result;
  const standing = rows.filter((row) => row.refused === undefined);
  page.table(
    [
      { head: '', align: 'left' },
      ...parameters.flatMap((p) => [
        { head: nameOf(p), align: 'point' as const, tone: 'mark' as const },
        { head: 'total', align: 'left' as const },
      ]),
      { head: 'χ²', align: 'point' },
      { head: 'p-value', align: 'point' },
      { head: 'caution', align: 'left', tone: 'warn' },
    ],
    standing.map((row) => ({
      cells: [
        `${row.prescription}${row.prescription === summary?.prescription ? ' *' : ''}`,
        ...(row.values ?? []).flatMap((v) => [
          cut(v.value, page.digits),
          sidesText(v.totals.quadrature).replace('± ', '±'),
        ]),
        cut(row.chiSquare, 4),
        cut(row.pValue, 3),
        row.cautions.map((c) => c.code).join(', '),
      ],
    })),
  );
  page.blank();
  const dof = standing[0]?.degreesOfFreedom;
  page.facts([
    {
      label: 'weights',
      text: `${result.weights}${dof === undefined ? '' : `; ${dof} degree${dof === 1 ? '' : 's'} of freedom`}`,
    },
    ...refusedFacts(rows),
  ]);
  page.blank();
  page.points(legend(standing), 'faint');
}

function pullTable(page: Page, summary: FitSummary): void {
  page.table(
    [
      { head: '', align: 'left' },
      { head: 'measured', align: 'point' },
      { head: 'theory', align: 'point' },
      { head: 'residual', align: 'point' },
      { head: 'pull', align: 'point', tone: 'mark' },
      { head: 'standardised', align: 'point' },
      { head: 'alone', align: 'point' },
    ],
    summary.pulls.map((p) => ({
      cells: [
        p.series,
        cut(p.measured, 6),
        cut(p.theory, 6),
        cut(p.residual, 2),
        cut(p.pull, 3),
        cut(p.standardised, 3),
        cut(p.alone, page.digits),
      ],
    })),
  );
  page.blank();
  page.say(
    'Pull: residual over the error of the measurement; standardised: over its own deviation, the share of the fit taken off; alone: the parameter from this datum only.',
    'faint',
  );
}

function profiles(page: Page, summary: FitSummary): void {
  page.table(
    [
      { head: '', align: 'left' },
      { head: 'value', align: 'point' },
      { head: 'Δχ²', align: 'point' },
    ],
    summary.profiles.flatMap((p) =>
      p.points.map((point, i) => ({
        cells: [i === 0 ? withPi(p.parameter) : '', cut(point.value, page.digits), cut(point.deltaChiSquare, 3)],
      })),
    ),
  );
  page.blank();
  page.facts(
    summary.profiles.flatMap((p) =>
      p.interval === undefined
        ? []
        : [
            {
              label: `${withPi(p.parameter)}, Δχ² = 1`,
              text: `${cut(p.interval.low, page.digits)} to ${cut(p.interval.high, page.digits)}`,
            },
          ],
    ),
  );
}

const row = (cells: readonly string[]): string => cells.map((c) => cut(c, 2)).join('  ');

function correlations(page: Page, result: FitResult, summary: FitSummary): void {
  page.say('How the predictions move together under each component; 1 is the same relative shift of both.', 'faint');
  page.blank();
  page.facts(
    summary.correlations.flatMap(({ component, matrix }) =>
      matrix.map((cells, i) => ({
        label: i === 0 ? component : `${component} `.padEnd(component.length + i + 1),
        text: row(cells),
      })),
    ),
  );
  if (result.parameters.length < 2) return;
  page.blank();
  page.facts(
    summary.correlation.map((cells, i) => ({
      label: i === 0 ? 'parameters' : `parameters${' '.repeat(i)}`,
      text: row(cells),
    })),
  );
}

export function fitText(result: FitResult, options: TerminalOptions): string {
  const page = new Page(options.columns ?? 100, options.paint ?? unpainted, options.digits);
  page.title(`${result.parameters.map(nameOf).join(' and ')} from ${result.data.length} measurements`);
  page.facts(
    result.data.map((d) => ({
      label: d.series.id,
      text: `${d.measured?.text ?? ''}${d.scale === undefined ? '' : ` at Q = ${Number(d.scale)} GeV`}: ${d.series.title}`,
    })),
  );
  page.head('By prescription');
  byPrescription(page, result);
  const { summary } = result;
  if (summary !== undefined) {
    summary.values.forEach((v, k) => {
      const p = result.parameters[k];
      const name = p === undefined ? '' : nameOf(p);
      page.head(`Quoted: ${name} by ${summary.prescription}`);
      page.facts([
        { label: name, text: v.printed, tone: 'mark' },
        { label: 'chosen by', text: summary.rule },
      ]);
      page.blank();
      budgetTable(page, v, v.evolved, [name, v.evolved === undefined ? '' : `${v.evolved.scale} GeV`]);
    });
    page.head('Pulls');
    pullTable(page, summary);
    page.head('χ² along each parameter, the others following');
    profiles(page, summary);
    page.head('Correlations');
    correlations(page, result, summary);
  }
  if (result.replicas !== undefined) replicaSection(page, result.replicas);
  if (result.cautions.length > 0) {
    page.head('Cautions');
    page.points(result.cautions.map((c) => c.text), 'warn'); // prettier-ignore
  }
  return page.text();
}

/** name, then value, error upwards and downwards of each parameter (quadrature), χ². */
export function fitLines(result: FitResult): string {
  return result.rows
    .flatMap(({ prescription, values, chiSquare }) =>
      values === undefined
        ? []
        : [
            `${[prescription, ...values.flatMap((v) => [v.value, v.totals.quadrature.plus, v.totals.quadrature.minus]), chiSquare ?? ''].join('\t')}\n`,
          ],
    )
    .join('');
}
