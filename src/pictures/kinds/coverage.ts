/**
 * @module How often the stated intervals held the hidden answer, by method: the share with one standard error, against the
 * 68 per cent that the intervals claim.
 */
import type { BacktestResult, BacktestSummary } from '../../studies/index.js';
import type { Chart, Plotted } from '../chart.js';
import { labelName } from './words.js';

interface Share {
  readonly method: string;
  readonly tested: number;
  readonly inside: number;
}

const CLAIM = 0.68;

const isSummary = (result: BacktestResult | BacktestSummary): result is BacktestSummary => 'summary' in result;

function sharesOf(result: BacktestResult | BacktestSummary): Share[] {
  if (isSummary(result))
    return result.summary.map(({ method, tested, inside68 }) => ({ method, tested, inside: inside68 }));
  return [
    ...result.prescriptions.flatMap(({ prescription, records: [first] }) =>
      first === undefined ? [] : [{ method: prescription, tested: first.tested, inside: first.inside }],
    ),
    ...result.estimates.flatMap(({ model, records: [first] }) =>
      first === undefined ? [] : [{ method: model, tested: first.tested, inside: first.inside68 }],
    ),
  ];
}

export function coverageChart(result: BacktestResult | BacktestSummary): Chart {
  const shares = sharesOf(result).filter(({ tested }) => tested > 0);
  const title = isSummary(result) ? `${result.results.length} series` : result.series.title;
  const items = shares.map(({ tested, inside }, y) => {
    const x = inside / tested;
    // Standard error of a share, after Laplace's rule of succession, so that none or all does not claim certainty.
    const p = (inside + 1) / (tested + 2);
    const error = Math.sqrt((p * (1 - p)) / tested);
    return { x, y, minus: Math.min(error, x), plus: Math.min(error, 1 - x) };
  });
  const data: Plotted = {
    name: 'coverage',
    columns: ['method', 'tested', 'inside_68'],
    rows: shares.map(({ method, tested, inside }) => [method, String(tested), String(inside)]),
  };
  return {
    title: `Coverage of stated intervals in back-tests, ${title}`,
    description:
      'Share of hidden answers inside the stated 68 per cent interval: ' +
      shares.map(({ method, tested, inside }) => `${method} ${inside} of ${tested}`).join('; ') +
      '.',
    panels: [
      {
        x: { kind: 'linear', low: 0, high: 1, label: 'share inside', margin: 0.03 },
        y: { kind: 'names', names: shares.map(({ method }) => labelName(method)), label: '' },
        layers: [
          { kind: 'rule', along: 'x', at: CLAIM, line: 'dashed', ink: 1, name: 'claimed, 68 %' },
          { kind: 'intervals', along: 'x', items, ink: 0, weight: 'thin', name: 'one standard error' },
          { kind: 'curve', points: items.map(({ x, y }) => [x, y]), ink: 0, marker: 'disc' },
        ],
        legend: 'below',
      },
    ],
    data: [data],
  };
}
