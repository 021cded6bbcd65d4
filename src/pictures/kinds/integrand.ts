/** @module The integrand of the Borel integral: on the positive axis, where its poles stand, and on the ray above it. */
import type { LaplaceIntegrand } from '../../studies/index.js';
import type { Chart, Layer, Point } from '../chart.js';
import { atCoupling, nameOf } from './words.js';

/** Near a pole the integrand leaves the picture, which shows so many times the range on the ray. */
const VIEW = 1.8;

/** The curve in pieces between poles: where it leaves the picture at one side and comes back from the other. */
function atPoles(points: readonly Point[], low: number, high: number): Point[][] {
  const pieces: Point[][] = [[]];
  for (const [i, point] of points.entries()) {
    const before = points[i - 1];
    if (before !== undefined && ((before[1] > high && point[1] < low) || (before[1] < low && point[1] > high)))
      pieces.push([]);
    pieces.at(-1)!.push(point);
  }
  return pieces;
}

export function integrandChart(result: LaplaceIntegrand): Chart {
  const { samples } = result;
  const of = (value: (sample: (typeof samples)[number]) => string): Point[] =>
    samples.map((sample) => [Number(sample.r), Number(value(sample))]);
  const axis = of((sample) => sample.axis);
  const re = of((sample) => sample.ray.re);
  const im = of((sample) => sample.ray.im);
  const rays = [...re, ...im].map(([, y]) => y);
  const [low, high] = [Math.min(0, ...rays) * VIEW, Math.max(...rays, Number(samples[0]?.axis ?? 1)) * 1.15];
  const curve = (points: readonly Point[], ink: number, line: 'full' | 'dashed' | 'dotted', name?: string): Layer => ({
    kind: 'curve',
    points,
    ink,
    line,
    ...(name === undefined ? {} : { name }),
  });
  const jumps = axis.filter(([, y]) => Math.abs(y) > Math.max(Math.abs(low), high)).length;
  return {
    title: `Borel integrand of ${nameOf(result)}, ${atCoupling(result)}`,
    description:
      `exp(−t/x) B(t)/x with the approximant ${result.approximant ?? 'none'} of the Borel transform, on the positive axis ` +
      `and on a ray at ${result.angle} degrees above it. ` +
      (jumps === 0
        ? 'No pole stands on or near the axis.'
        : 'The integrand on the axis leaves the picture near its poles.'),
    panels: [
      {
        x: { kind: 'linear', low: 0, high: Math.max(...axis.map(([x]) => x), 0), label: '*r* = |*t*|', margin: 0 },
        y: { kind: 'linear', low, high, label: 'integrand', margin: 0.03 },
        layers: [
          { kind: 'rule', along: 'y', at: 0, line: 'dotted', ink: 'faint' },
          ...atPoles(axis, low, high).map((piece, i) => curve(piece, 1, 'full', i === 0 ? 'on the axis' : undefined)),
          curve(re, 0, 'dashed', `real part, ${result.angle}° above`),
          curve(im, 2, 'dotted', 'imaginary part there'),
        ],
        legend: 'inside',
      },
    ],
    data: [
      {
        name: 'integrand',
        columns: ['r', 'axis', 'ray_re', 'ray_im'],
        rows: samples.map((sample) => [sample.r, sample.axis, sample.ray.re, sample.ray.im]),
      },
    ],
  };
}
