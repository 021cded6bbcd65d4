/** @module The error budget of an extraction: a bar for each component, and the three totals, upwards and downwards. */
import type { BudgetEntry, ExtractResult, FitResult } from '../../extraction/index.js';
import type { Chart } from '../chart.js';
import { symbolLabel } from './words.js';

interface Budget {
  readonly title: string;
  readonly label: string;
  readonly entry: BudgetEntry;
}

function budgetOf(result: ExtractResult | FitResult): Budget | undefined {
  if (result.kind === 'fit') {
    const [entry] = result.summary?.values ?? [];
    const [parameter] = result.parameters;
    if (entry === undefined || parameter === undefined) return undefined;
    return {
      title: `${parameter.symbol} from ${result.data.length} measurements: ${entry.printed}`,
      label: labelOf(parameter),
      entry,
    };
  }
  if (result.summary === undefined) return undefined;
  return {
    title: `${result.unknown.symbol} from ${result.datum.series.title}: ${result.summary.printed}`,
    label: labelOf(result.unknown),
    entry: result.summary,
  };
}

const labelOf = ({ symbol, unit }: { readonly symbol: string; readonly unit?: string }): string =>
  `shift of ${symbolLabel(symbol)}${unit === undefined ? '' : ` [${unit}]`}`;

export function budgetChart(result: ExtractResult | FitResult): Chart {
  const budget = budgetOf(result);
  const size = (text: string | undefined): number => Math.abs(Number(text ?? 0));
  const parts = (budget?.entry.components ?? [])
    // What contributes nothing is a row of the table, and would be an empty one here.
    .filter(({ plus, minus }) => size(plus) !== 0 || size(minus) !== 0)
    .map((component) => ({
      name: component.counted ? component.name : `${component.name} (not counted)`,
      plus: size(component.plus),
      minus: size(component.minus),
      counted: component.counted,
    }));
  const totals = Object.entries(budget?.entry.totals ?? {}).map(([name, sides]) => ({
    name: `total, ${name}`,
    plus: size(sides.plus),
    minus: size(sides.minus),
  }));
  const names = [...parts, ...totals].map(({ name }) => name);
  const reach = Math.max(...[...parts, ...totals].flatMap(({ plus, minus }) => [plus, minus]), 1e-300);
  const bars = (list: readonly { readonly name: string; readonly plus: number; readonly minus: number }[]) =>
    list.map(({ name, plus, minus }) => ({ y: names.indexOf(name), from: -minus, to: plus }));
  return {
    title: `Error budget of ${budget?.title ?? 'nothing'}`,
    description: [...parts, ...totals]
      .map(({ name, plus, minus }) => `${name} +${plus.toPrecision(2)} -${minus.toPrecision(2)}`)
      .join('; '),
    panels: [
      {
        x: { kind: 'linear', low: -reach, high: reach, label: budget?.label ?? 'shift' },
        y: { kind: 'names', names, label: '' },
        layers: [
          { kind: 'rule', along: 'x', at: 0, line: 'full', ink: 'faint' },
          { kind: 'bars', items: bars(parts.filter(({ counted }) => counted)), ink: 0, name: 'counted' },
          ...(parts.every(({ counted }) => counted)
            ? []
            : [
                {
                  kind: 'bars',
                  items: bars(parts.filter(({ counted }) => !counted)),
                  ink: 4,
                  name: 'overlaps, not counted',
                } as const,
              ]),
          { kind: 'bars', items: bars(totals), ink: 1, name: 'totals' },
        ],
        legend: 'below',
      },
    ],
    data: [
      {
        name: 'budget',
        columns: ['component', 'plus', 'minus'],
        rows: [...parts, ...totals].map(({ name, plus, minus }) => [name, String(plus), String(minus)]),
      },
    ],
  };
}
