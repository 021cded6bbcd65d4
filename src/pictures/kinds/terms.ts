/**
 * @module The terms and the partial sums against the order: where the terms stop falling, and how wide the ambiguity is
 * there. Sizes of terms above on a logarithmic axis, partial sums below with the band of the ambiguity.
 */
import type { Assessment } from '../../studies/index.js';
import { chart, gutter, legend } from '../chart.js';
import type { Chart } from '../chart.js';
import type { Format } from '../format.js';
import { BAND, FAINT, ink } from '../palette.js';
import { area, line, marker } from '../shapes.js';
import type { Point } from '../shapes.js';
import { plain } from '../typeset.js';
import type { Mark, Picture } from '../scene.js';

type TermRow = Assessment['terms'][number];

/** Value and half width of the band: the verdict and its ambiguity (or, without one, its truncation error). */
interface Band {
  readonly value: number;
  readonly half: number;
  readonly what: string;
}

function bandOf({ verdict }: Assessment): Band | undefined {
  if (verdict.value === undefined) return undefined;
  const [text, what] =
    verdict.ambiguity === undefined ? [verdict.truncation, 'truncation error'] : [verdict.ambiguity, 'ambiguity'];
  return text === undefined ? undefined : { value: Number(verdict.value), half: Math.abs(Number(text)), what };
}

function termMarks(rows: readonly TermRow[], frame: Chart, format: Format): Mark[] {
  const { box, x, y } = frame;
  const shown = rows.filter((row) => Number(row.term) !== 0);
  const points = shown.map((row): Point => [x.at(row.order), y.at(Math.abs(Number(row.term)))]);
  const marks: Mark[] = [line(points, { colour: ink(0), width: format.line }, box)];
  shown.forEach((row, i) => {
    const negative = Number(row.term) < 0;
    marks.push(marker(negative ? 'ring' : 'disc', points[i]!, format.marker, ink(0), box));
  });
  const least = shown.findIndex((row) => row.least === true);
  if (least >= 0) {
    const [px, py] = points[least]!;
    marks.push(
      line(
        [
          [px, py],
          [px, box.y + box.height],
        ],
        { colour: ink(1), width: format.line * 0.8, dash: [2, 2] },
        box,
      ),
      marker('diamond', [px, py], format.marker * 1.25, ink(1), box),
    );
  }
  return marks;
}

function sumMarks(rows: readonly TermRow[], band: Band | undefined, frame: Chart, format: Format): Mark[] {
  const { box, x, y } = frame;
  const marks: Mark[] = [];
  if (band !== undefined) {
    const edge = (value: number): Point[] => [
      [box.x, y.at(value)],
      [box.x + box.width, y.at(value)],
    ];
    marks.push(
      area([...edge(band.value - band.half), ...edge(band.value + band.half).toReversed()], BAND, 1, box),
      line(edge(band.value), { colour: FAINT, width: format.line * 0.8, dash: [4, 2] }, box),
    );
  }
  const points = rows.map((row): Point => [x.at(row.order), y.at(Number(row.partialSum))]);
  marks.push(line(points, { colour: ink(0), width: format.line }, box));
  for (const point of points) marks.push(marker('disc', point, format.marker, ink(0), box));
  return marks;
}

/** Partial sums far beyond the least term would flatten all the others: this many bands are kept in view. */
const VIEW = 12;

function viewOf(rows: readonly TermRow[], band: Band | undefined): readonly [number, number] {
  const sums = rows.map((row) => Number(row.partialSum));
  const least = rows.findIndex((row) => row.least === true);
  const near = least < 0 ? sums : sums.slice(0, least + 2);
  const ends = band === undefined ? near : [...near, band.value - band.half, band.value + band.half];
  const low = Math.min(...ends);
  const high = Math.max(...ends);
  const reach = band === undefined ? 0 : VIEW * band.half;
  const within = sums.filter((s) => band !== undefined && Math.abs(s - band.value) <= reach);
  return [Math.min(low, ...within), Math.max(high, ...within)];
}

/** Terms and partial sums of an assessment. */
export function termsPicture(result: Assessment, format: Format): Picture {
  const rows = result.terms;
  const { width, height, text } = format;
  const orders = rows.map((row) => row.order);
  const along = { low: Math.min(...orders), high: Math.max(...orders), label: 'order', kind: 'whole' as const };
  const sizes = rows.map((row) => Math.abs(Number(row.term))).filter((size) => size > 0);
  const band = bandOf(result);
  const [low, high] = viewOf(rows, band);
  const half = height / 2;
  const wishes = {
    term: { low: Math.min(...sizes), high: Math.max(...sizes), label: '| term |', kind: 'log' },
    sum: { low, high, label: 'partial sum', margin: 0.08 },
  } as const;
  const room = Math.max(gutter(format, wishes.term, half), gutter(format, wishes.sum, half));
  const upper = chart(
    format,
    { ...along, label: '' },
    wishes.term,
    { x: 0, y: 0, width, height: half + text * 1.4 },
    room,
  );
  const lower = chart(format, along, wishes.sum, { x: 0, y: half, width, height: half }, room);
  const name = plain(result.series.title);
  const at = `${plain(result.coupling.name)} = ${result.coupling.value}`;
  const least = rows.find((row) => row.least === true);
  const entries = [
    { text: 'partial sums', colour: ink(0), shape: 'disc' as const },
    ...(band === undefined ? [] : [{ text: `resummed value, ${band.what}`, colour: FAINT, dash: [4, 2] }]),
  ];
  return {
    width,
    height,
    title: `Terms and partial sums of ${name}, ${at}`,
    description:
      `Sizes of the terms on a logarithmic axis and partial sums against the order, orders ${along.low} to ${along.high}. ` +
      (least === undefined
        ? 'No least term is reached.'
        : `The least term is that of order ${least.order}, ${least.term}.`) +
      (band === undefined ? '' : ` The band is ${band.value} with its ${band.what} ${band.half.toPrecision(2)}.`),
    marks: [
      ...termMarks(rows, upper, format),
      ...upper.marks,
      ...sumMarks(rows, band, lower, format),
      ...lower.marks,
      ...legend(entries, lower.box, format, 'bottom right'),
    ],
    data: [
      {
        name: 'terms',
        columns: ['order', 'term', 'partial_sum', 'least'],
        rows: rows.map((row) => [String(row.order), row.term, row.partialSum, row.least === true ? '1' : '0']),
      },
    ],
  };
}
