/**
 * @module The ratio plot of Domb and Sykes (Proc. R. Soc. A 240 (1957) 214): c_n/(n c_(n−1)) against 1/n, with its linear
 * (Richardson) extrapolants. Factorial growth is a straight line to a finite value at 1/n = 0, the inverse of the position.
 */
import type { Assessment } from '../../studies/index.js';
import type { Chart, Layer, Point } from '../chart.js';
import { nameOf, printedNumber } from './words.js';

/** The coefficients of the Borel transform grow by c_n/(n c_(n−1)) → 1/t*. */
export function ratiosChart(result: Pick<Assessment, 'series' | 'growth'>): Chart {
  const { ratios } = result.growth.evidence;
  const points = ratios.map(({ n, ratio }): Point => [1 / n, Number(ratio)]);
  const linear = ratios.filter((row) => row.linear !== undefined);
  const expected = result.growth.expected.filter(({ t }) => Number(t) !== 0);
  const layers: Layer[] = [
    ...expected.slice(0, 2).map(({ t, u }, i): Layer => ({
      kind: 'rule',
      along: 'y',
      at: 1 / Number(t),
      line: i === 0 ? 'dashed' : 'dotted',
      ink: 'faint',
      name: `expected, ${u === undefined ? `*t* = ${printedNumber(t)}` : `*u* = ${printedNumber(u)}`}`,
    })),
    { kind: 'curve', points, ink: 0, line: 'full', marker: 'disc', name: '*c*_{*n*} / (*n c*_{*n*−1})' },
    {
      kind: 'intervals',
      along: 'y',
      items: linear.map(({ n, linear: value, linearError: error }) => ({
        x: 1 / n,
        y: Number(value),
        minus: Number(error ?? 0),
        plus: Number(error ?? 0),
      })),
      ink: 1,
      weight: 'thin',
    },
    {
      kind: 'curve',
      points: linear.map(({ n, linear: value }): Point => [1 / n, Number(value)]),
      ink: 1,
      marker: 'square',
      name: 'linear extrapolants',
    },
  ];
  const values = [
    ...points.map(([, y]) => y),
    ...linear.map((row) => Number(row.linear)),
    ...expected.slice(0, 2).map(({ t }) => 1 / Number(t)),
    0,
  ];
  const nearest = result.growth.nearest;
  return {
    title: `Ratio plot of ${nameOf(result)}`,
    description:
      `Ratios of successive coefficients divided by the order, against the inverse order, for ${ratios.length} ratios. ` +
      `${result.growth.statement}.` +
      (nearest === undefined ? '' : ` Nearest singularity at t = ${nearest.t}.`),
    panels: [
      {
        x: { kind: 'linear', low: 0, high: 1, label: '1/*n*' },
        y: { kind: 'linear', low: Math.min(...values), high: Math.max(...values), label: 'ratio', margin: 0.08 },
        layers,
        legend: 'inside',
      },
    ],
    data: [
      {
        name: 'ratios',
        columns: ['n', 'ratio', 'linear', 'linear_error'],
        rows: ratios.map((row) => [String(row.n), row.ratio, row.linear ?? '', row.linearError ?? '']),
      },
    ],
  };
}
