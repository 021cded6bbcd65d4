/** @module The tables of truncation errors, back-tests, evolutions and chosen sums. */
import type {
  BacktestResult,
  BacktestSummary,
  EvolveResult,
  SumResult,
  TruncationResult,
} from '../../studies/index.js';
import { measured, number, size, text } from '../table.js';
import type { NamedError, PaperTable } from '../table.js';
import { atCoupling, valueTable } from './assess.js';

/** A band about a sum as an error: distances below and above. */
const band = (label: string, range: { readonly low: string; readonly high: string } | undefined): NamedError[] =>
  range === undefined ? [] : [{ label, plus: range.high.replace(/^[-+]/, ''), minus: range.low.replace(/^[-+]/, '') }];

export function truncationTables(result: TruncationResult): PaperTable[] {
  return [
    {
      name: 'truncation',
      title: `Truncation error of ${result.series.title} at ${atCoupling(result)} by model`,
      columns: [
        text('model'),
        text('nature'),
        text('about'),
        number('sum68', 'sum, 68 %'),
        number('sum95', 'sum, 95 %'),
      ],
      rows: result.estimates
        .filter((estimate) => estimate.refused === undefined)
        .map((estimate) => [
          estimate.title,
          estimate.nature,
          estimate.about,
          measured(estimate.sum ?? result.sum.value, band('68 %', estimate.band68)),
          measured(estimate.sum ?? result.sum.value, band('95 %', estimate.band95)),
        ]),
      notes: result.estimates.flatMap(({ title, refused }) =>
        refused === undefined ? [] : [`${title} refused: ${refused.reason}`],
      ),
    },
  ];
}

export function sumTables(result: SumResult): PaperTable[] {
  return [valueTable(result)];
}

export function evolveTables(result: EvolveResult): PaperTable[] {
  const unit = result.unit;
  return [
    {
      name: 'evolve',
      title: `${result.quantity} evolved at ${result.loops} loops`,
      columns: [
        number('from', 'from', 'GeV'),
        number('to', 'to', 'GeV'),
        number('flavours', '*n_{f}*'),
        number('value', result.quantity === 'alpha_s' ? '*α_{s}*' : '*m*', unit),
      ],
      rows: [
        [
          result.from.scale,
          result.to.scale,
          String(result.to.flavours),
          measured(
            result.value,
            result.errors.map(({ label, plus, minus }) => ({
              label,
              plus: plus.replace(/^[-+]/, ''),
              minus: minus.replace(/^[-+]/, ''),
            })),
          ),
        ],
      ],
      notes: [
        ...(result.oneLoopLess === undefined ? [] : [`shift from one loop less: ${result.oneLoopLess.shift}`]),
        ...(result.matching === undefined ? [] : [`matching spread: ${result.matching.spread}`]),
        ...result.path.map((step) => step.text),
      ],
    },
  ];
}

const isSummary = (result: BacktestResult | BacktestSummary): result is BacktestSummary => 'summary' in result;

export function backtestTables(result: BacktestResult | BacktestSummary): PaperTable[] {
  const columns = [
    text('method'),
    text('kind'),
    number('tested'),
    number('inside68', 'inside 68 %'),
    size('bias'),
    size('sharpness'),
    size('score'),
  ];
  if (isSummary(result))
    return [
      {
        name: 'coverage',
        title: `Back-tests over ${result.results.length} series`,
        columns,
        rows: result.summary.map((row) => [
          row.method,
          row.kind,
          String(row.tested),
          String(row.inside68),
          row.bias,
          row.sharpness ?? '',
          row.score,
        ]),
        notes: result.skipped.map(({ series, reason }) => `${series} left out: ${reason}`),
      },
    ];
  return [
    {
      name: 'backtest',
      title: `Back-test of ${result.series.title} at ${atCoupling(result)}`,
      columns,
      rows: [
        ...result.prescriptions.flatMap(({ prescription, records: [first] }) =>
          first === undefined
            ? []
            : [
                [
                  prescription,
                  'prescription',
                  String(first.tested),
                  String(first.inside),
                  first.bias,
                  first.sharpness ?? '',
                  first.score,
                ],
              ],
        ),
        ...result.estimates.flatMap(({ model, records: [first] }) =>
          first === undefined
            ? []
            : [
                [
                  model,
                  'truncation error',
                  String(first.tested),
                  String(first.inside68),
                  first.bias,
                  first.sharpness,
                  first.score68,
                ],
              ],
        ),
      ],
      notes: [result.target.statement],
    },
  ];
}
