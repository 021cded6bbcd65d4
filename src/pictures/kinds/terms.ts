/**
 * @module The terms and the partial sums against the order: where the terms stop falling, and how wide the ambiguity is
 * there. Sizes of terms above on a logarithmic axis, partial sums below with the band of the ambiguity.
 */
import type { Assessment } from '../../studies/index.js';
import type { Chart, Layer, Panel } from '../chart.js';
import { atCoupling, nameOf } from './words.js';

type TermRow = Assessment['terms'][number];

/** Value and half width of the band: the verdict and its ambiguity (or, without one, its truncation error). */
interface VerdictBand {
  readonly value: number;
  readonly half: number;
  readonly what: string;
}

function bandOf({ verdict }: Assessment): VerdictBand | undefined {
  if (verdict.value === undefined) return undefined;
  const [text, what] =
    verdict.ambiguity === undefined ? [verdict.truncation, 'truncation error'] : [verdict.ambiguity, 'ambiguity'];
  return text === undefined ? undefined : { value: Number(verdict.value), half: Math.abs(Number(text)), what };
}

/** Partial sums far beyond the least term would flatten all the others: this many bands are kept in view. */
const VIEW = 12;

function viewOf(rows: readonly TermRow[], band: VerdictBand | undefined): readonly [number, number] {
  const sums = rows.map((row) => Number(row.partialSum));
  const least = rows.findIndex((row) => row.least === true);
  const near = least < 0 ? sums : sums.slice(0, least + 2);
  if (band === undefined) return [Math.min(...near), Math.max(...near)];
  const within = sums.filter((sum) => Math.abs(sum - band.value) <= VIEW * band.half);
  const ends = [...near, ...within, band.value - band.half, band.value + band.half];
  return [Math.min(...ends), Math.max(...ends)];
}

function termLayers(rows: readonly TermRow[]): Layer[] {
  const shown = rows.filter((row) => Number(row.term) !== 0);
  const point = (row: TermRow): readonly [number, number] => [row.order, Math.abs(Number(row.term))];
  const positive = shown.filter((row) => Number(row.term) > 0).map(point);
  const negative = shown.filter((row) => Number(row.term) < 0).map(point);
  const least = shown.find((row) => row.least === true);
  const both = negative.length > 0;
  return [
    { kind: 'curve', points: shown.map(point), ink: 0, line: 'full' },
    { kind: 'curve', points: positive, ink: 0, marker: 'disc', ...(both ? { name: 'positive' } : {}) },
    ...(both ? [{ kind: 'curve', points: negative, ink: 0, marker: 'ring', name: 'negative' } as const] : []),
    ...(least === undefined
      ? []
      : [
          { kind: 'rule', along: 'x', at: least.order, line: 'dotted', ink: 1 } as const,
          { kind: 'curve', points: [point(least)], ink: 1, marker: 'diamond', name: 'least term' } as const,
        ]),
  ];
}

/** Terms and partial sums of an assessment. */
export function termsChart(result: Assessment): Chart {
  const rows = result.terms;
  const band = bandOf(result);
  const orders = rows.map((row) => row.order);
  const along = { kind: 'whole', low: Math.min(...orders), high: Math.max(...orders) } as const;
  const sizes = rows.map((row) => Math.abs(Number(row.term))).filter((size) => size > 0);
  const [low, high] = viewOf(rows, band);
  const least = rows.find((row) => row.least === true);
  const upper: Panel = {
    x: { ...along, label: '' },
    y: { kind: 'log', low: Math.min(...sizes), high: Math.max(...sizes), label: '| term |' },
    layers: termLayers(rows),
    legend: 'inside',
  };
  const lower: Panel = {
    x: { ...along, label: 'order' },
    y: { kind: 'linear', low, high, label: 'partial sum', margin: 0.08 },
    layers: [
      ...(band === undefined
        ? []
        : [
            {
              kind: 'band',
              along: 'y',
              from: band.value - band.half,
              to: band.value + band.half,
              tone: 'first',
              name: band.what,
            } as const,
            { kind: 'rule', along: 'y', at: band.value, line: 'dashed', ink: 'faint', name: 'resummed' } as const,
          ]),
      {
        kind: 'curve',
        points: rows.map((row) => [row.order, Number(row.partialSum)]),
        ink: 0,
        line: 'full',
        marker: 'disc',
        name: 'partial sums',
      },
    ],
    legend: 'inside',
  };
  return {
    title: `Terms and partial sums of ${nameOf(result)}, ${atCoupling(result)}`,
    description:
      `Sizes of the terms on a logarithmic axis, and partial sums, for orders ${along.low} to ${along.high}. ` +
      (least === undefined
        ? 'No least term is reached.'
        : `The least term is that of order ${least.order}: ${least.term}.`) +
      (band === undefined ? '' : ` The band is ${band.value} with its ${band.what}, ${band.half.toPrecision(2)}.`),
    panels: [upper, lower],
    data: [
      {
        name: 'terms',
        columns: ['order', 'term', 'partial_sum', 'least'],
        rows: rows.map((row) => [String(row.order), row.term, row.partialSum, row.least === true ? '1' : '0']),
      },
    ],
  };
}
