/** @module The tables of an extraction, of one measurement or of several fitted together: values and their budgets. */
import type { BudgetEntry, ExtractResult, FitResult, ReplicaResult } from '../../extraction/index.js';
import { measured, number, size, text } from '../table.js';
import type { NamedError, PaperTable } from '../table.js';
import { replicaTables } from './replicas.js';

const bare = (value: string): string => value.replace(/^[-+]/, '');

/** The total in quadrature, as the page shows it beside a value; the budget has the others by name. */
const total = ({ quadrature }: BudgetEntry['totals']): NamedError[] => [
  { label: 'total', plus: bare(quadrature.plus), minus: bare(quadrature.minus) },
];

function budgetTable(name: string, title: string, unit: string | undefined, entry: BudgetEntry): PaperTable {
  return {
    name,
    title,
    columns: [
      text('component'),
      size('plus', '+', unit),
      size('minus', '−', unit),
      text('nature'),
      text('counted'),
      text('note'),
    ],
    rows: [
      ...entry.components
        .filter((component) => component.plus !== undefined || component.missing !== undefined)
        .map((component) => [
          component.name,
          component.plus ?? '',
          component.minus ?? '',
          component.nature,
          component.counted ? 'yes' : 'no',
          component.missing ?? component.note ?? '',
        ]),
      ...Object.entries(entry.totals).map(([label, sides]) => [`total, ${label}`, sides.plus, sides.minus, '', '', '']),
    ],
    notes: [],
  };
}

function single(result: ExtractResult): PaperTable[] {
  const { unknown, datum, summary } = result;
  const what = `${unknown.symbol} from ${datum.series.title}`;
  const solved = result.rows.filter((row) => row.value !== undefined);
  const values: PaperTable = {
    name: 'extract',
    title: `${what} by prescription`,
    columns: [
      text('prescription'),
      text('variant'),
      number('value', unknown.symbol, unknown.unit),
      size('ambiguity'),
      ...(solved.some((row) => row.evolved !== undefined) ? [number('evolved', 'evolved', unknown.unit)] : []),
      text('trust'),
      text('cautions'),
    ],
    rows: solved.map((row) => [
      row.prescription,
      row.variant,
      measured(row.value, row.totals === undefined ? [] : total(row.totals)),
      row.ambiguity?.value ?? '',
      ...(solved.some((other) => other.evolved !== undefined)
        ? [row.evolved === undefined ? '' : measured(row.evolved.value, total(row.evolved.totals))]
        : []),
      row.trust ?? '',
      row.cautions.map(({ code }) => code).join(', '),
    ]),
    notes: [
      'errors are the total in quadrature; the budget has the other totals by name',
      ...result.rows.flatMap(({ prescription, refused }) =>
        refused === undefined ? [] : [`${prescription} refused: ${refused.reason}`],
      ),
    ],
  };
  return summary === undefined
    ? [values]
    : [values, budgetTable('budget', `Error budget of ${what}: ${summary.printed}`, unknown.unit, summary)];
}

function fit(result: FitResult): PaperTable[] {
  const { summary, parameters } = result;
  if (summary === undefined) return [];
  const [symbols] = [parameters.map(({ symbol }) => symbol)];
  return [
    ...summary.values.map((entry, i) =>
      budgetTable(
        `budget${i + 1}`,
        `Error budget of ${symbols[i] ?? ''}: ${entry.printed}`,
        parameters[i]?.unit,
        entry,
      ),
    ),
    {
      name: 'pulls',
      title: `Pulls of the fit of ${symbols.join(', ')} by ${summary.prescription}`,
      columns: [text('series'), number('measured'), number('theory'), number('residual'), number('pull')],
      rows: summary.pulls.map((pull) => [pull.series, pull.measured, pull.theory, pull.residual, pull.pull]),
      notes: [],
    },
  ];
}

type WithReplicas = (ExtractResult | FitResult) & { readonly replicas?: ReplicaResult };

export const extractTables = (result: WithReplicas): PaperTable[] => [
  ...(result.kind === 'fit' ? fit(result) : single(result)),
  ...replicaTables(result.replicas),
];
