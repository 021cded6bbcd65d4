/** @module The truncated sums against the renormalisation scale, a curve an order. */
import type { ScaleDependence } from '../../studies/index.js';
import type { Chart, Layer, LineStyle } from '../chart.js';
import { atCoupling, nameOf } from './words.js';

const STYLES: readonly LineStyle[] = ['full', 'dashed', 'dotted'];
/** The highest orders that are drawn: more curves than inks would repeat. */
const CURVES = 5;

export function scaleChart(result: ScaleDependence): Chart {
  const { points, orders } = result;
  const shown = orders.map((order, n) => ({ order, n })).slice(-CURVES);
  // The highest order gets the first ink and a full line.
  const layers: Layer[] = shown.map(({ order, n }, i): Layer => {
    const rank = shown.length - 1 - i;
    return {
      kind: 'curve',
      points: points.map((point) => [Number(point.ratio), Number(point.sums[n])]),
      ink: rank,
      line: STYLES[rank % STYLES.length]!,
      name: `through order ${order}`,
    };
  });
  const values = points.flatMap((point) => shown.map(({ n }) => Number(point.sums[n])));
  const ratios = points.map((point) => Number(point.ratio));
  return {
    title: `Scale dependence of ${nameOf(result)}, ${atCoupling(result)}`,
    description:
      `Sums through the orders ${shown.map(({ order }) => order).join(', ')} for scales from ${ratios[0] ?? 1} to ` +
      `${ratios.at(-1) ?? 1} times the scale of the series.` +
      (result.stopped === undefined ? '' : ` ${result.stopped.reason}.`),
    panels: [
      {
        x: { kind: 'log', low: Math.min(...ratios), high: Math.max(...ratios), label: '*μ* / *μ*_0' },
        y: { kind: 'linear', low: Math.min(...values), high: Math.max(...values), label: 'sum', margin: 0.06 },
        layers: [{ kind: 'rule', along: 'x', at: 1, line: 'dotted', ink: 'faint' }, ...layers],
        legend: 'inside',
      },
    ],
    data: [
      {
        name: 'scale',
        columns: ['mu_ratio', 'coupling', ...orders.map((order) => `through_${order}`)],
        rows: points.map((point) => [point.ratio, point.coupling, ...point.sums]),
      },
    ],
  };
}
