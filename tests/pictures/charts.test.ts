/** Charts of real results: what they draw is what the result says, in every form. */
import { describe, expect, test } from 'vitest';
import {
  CHART_KINDS,
  FORMATS,
  chartCsv,
  pdfOf,
  pictureOf,
  pngOf,
  svgOf,
  terminalChart,
} from '../../src/pictures/index.js';
import { axisOf } from '../../src/pictures/axis.js';
import type { Chart, SavedResult } from '../../src/pictures/index.js';
import { toNumberExact } from '../../src/numerics/index.js';
import { loadSeries, parseUncertain, isNumberProblem } from '../../src/series/index.js';
import {
  assess,
  backtest,
  compare,
  growthStudy,
  laplaceIntegrand,
  planeStudy,
  scaleDependence,
} from '../../src/studies/index.js';

const at = (() => {
  const value = parseUncertain('0.3156(30)');
  if (isNumberProblem(value)) throw new Error('no number');
  return value;
})();
const adler = await loadSeries('adler');
const options = (command: string) => ({ digits: 12, request: { command, series: 'adler' } });

const RESULTS: Readonly<Record<string, object>> = {
  assess: assess(adler, at, options('assess')),
  compare: compare(adler, [at], options('compare')),
  backtest: backtest(adler, at, { ...options('backtest'), hide: 2 }),
  scale: scaleDependence(adler, at, options('scale')),
  integrand: laplaceIntegrand(adler, at, options('integrand')),
};
const kinds = CHART_KINDS.filter(({ from }) => from.some((command) => command in RESULTS));
const drawn = (name: string): Chart => {
  const kind = kinds.find((entry) => entry.name === name)!;
  const command = kind.from.find((from) => from in RESULTS)!;
  return kind.draw(JSON.parse(JSON.stringify(RESULTS[command])) as SavedResult);
};
const column = FORMATS[0]!;

describe.each(kinds.map(({ name }) => name))('%s', (name) => {
  const chart = drawn(name);

  test('has a title, a description and numbers', () => {
    expect(chart.title).toContain('Adler');
    expect(chart.description.length).toBeGreaterThan(40);
    for (const { columns, rows } of chart.data) for (const row of rows) expect(row.length).toBe(columns.length);
  });

  test('is finite, inside its frame, and alike from run to run', () => {
    const svg = svgOf(pictureOf(chart, column));
    expect(svg).not.toMatch(/NaN|Infinity|undefined/);
    expect(svgOf(pictureOf(drawn(name), column))).toBe(svg);
    const height = Number(/viewBox="0 0 \S+ (\S+)"/.exec(svg)![1]);
    // A turned label is written where it was before it was turned.
    const straight = svg.replaceAll(/<path [^>]*transform[^>]*>/g, '');
    for (const [, x, y] of straight.matchAll(/[ML](-?[\d.]+) (-?[\d.]+)/g)) {
      expect(Number(x)).toBeGreaterThan(-8);
      expect(Number(x)).toBeLessThan(column.width + 8);
      expect(Number(y)).toBeGreaterThan(-8);
      expect(Number(y)).toBeLessThan(height + 8);
    }
  });

  test.each([true, false])('reads in 80 columns (Unicode: %s)', (unicode) => {
    const text = terminalChart(chart, { columns: 80, unicode });
    for (const line of text.split('\n')) expect([...line].length).toBeLessThanOrEqual(80);
    if (!unicode) expect(/^[ -~\n]*$/.test(text)).toBe(true);
  });
});

test('PNG and PDF files are what they claim to be, with the size of the format', async () => {
  const picture = pictureOf(drawn('terms'), column);
  const png = await pngOf(picture, 2);
  expect(Buffer.from(png.slice(1, 4)).toString()).toBe('PNG');
  const header = new DataView(png.buffer, png.byteOffset);
  expect(header.getUint32(16)).toBe(Math.round(column.width * 2));
  const pdf = Buffer.from(await pdfOf(picture)).toString('latin1');
  expect(pdf.startsWith('%PDF-')).toBe(true);
  expect(pdf).toContain('/FontFile2');
  expect(Buffer.from(await pdfOf(picture)).toString('latin1')).toBe(pdf);
});

test('the plotted numbers are those of the result', () => {
  const result = RESULTS['assess'] as ReturnType<typeof assess>;
  const lines = chartCsv(drawn('terms')).split('\n');
  expect(lines[0]).toBe('order,term,partial_sum,least');
  expect(lines[2]).toBe(`2,${result.terms[1]!.term},${result.terms[1]!.partialSum},0`);
});

test('at its own scale the scan gives the sums of the fixed order', () => {
  const scan = RESULTS['scale'] as ReturnType<typeof scaleDependence>;
  const result = RESULTS['assess'] as ReturnType<typeof assess>;
  const own = scan.points.find((point) => Number(point.ratio) === 1)!;
  own.sums.forEach((sum, n) => expect(Number(sum)).toBeCloseTo(Number(result.terms[n]!.partialSum), 8));
});

test('the integrand at the origin is c_0/x, and the ray and the axis start alike', () => {
  const { samples, coupling } = RESULTS['integrand'] as ReturnType<typeof laplaceIntegrand>;
  expect(Number(samples[0]!.axis)).toBeCloseTo(1 / Number(coupling.x), 3);
  expect(Math.hypot(Number(samples[0]!.ray.re), Number(samples[0]!.ray.im))).toBeCloseTo(1 / Number(coupling.x), 3);
});

test('the integral along the ray has the imaginary part of the lateral sum', () => {
  // Trapezoidal rule over the drawn samples against the closed form of the same approximant, to the drawn accuracy.
  const { samples, approximant, coupling } = RESULTS['integrand'] as ReturnType<typeof laplaceIntegrand>;
  const step = Number(samples[1]!.r);
  const sum = samples.reduce(
    (total, { ray }, i) => {
      const weight = i === 0 || i === samples.length - 1 ? 0.5 : 1;
      return { re: total.re + weight * Number(ray.re), im: total.im + weight * Number(ray.im) };
    },
    { re: 0, im: 0 },
  );
  const values = (RESULTS['assess'] as ReturnType<typeof assess>).values;
  const entry = values.find(({ prescription, variant }) => prescription === 'borel-pade' && variant === approximant)!;
  const x = Number(coupling.x);
  // R = 1 + x F, F = (1/x) ∫: the integral of the samples is F.
  expect(1 + x * sum.re * step).toBeCloseTo(Number(entry.value), 3);
  expect(Math.abs(x * sum.im * step)).toBeCloseTo(Math.abs(Number(entry.imaginary)), 3);
});

describe('what a picture must not lose', () => {
  const kindOf = (name: string) => CHART_KINDS.find((entry) => entry.name === name)!;
  const plain = (result: object): SavedResult => JSON.parse(JSON.stringify(result)) as SavedResult;

  test('a legend that would stand on a curve stands below the panel', () => {
    const chart = (points: (readonly [number, number])[]): Chart => ({
      title: 't',
      description: 'd',
      panels: [
        {
          x: { kind: 'linear', low: 0, high: 1, label: 'x' },
          y: { kind: 'linear', low: 0, high: 1, label: 'y' },
          layers: [{ kind: 'curve', points, ink: 0, line: 'full', name: 'a curve with a name' }],
          legend: 'inside',
        },
      ],
      data: [],
    });
    const lowest = (drawing: Chart): number =>
      Math.max(...pictureOf(drawing, column).marks.flatMap((mark) => (mark.kind === 'text' ? [mark.y] : [])));
    const free = chart([[0, 0], [1, 1]]); // prettier-ignore
    const everywhere = chart([...Array(41).keys()].map((i) => [i / 40, i % 2] as const));
    expect(lowest(everywhere)).toBeGreaterThan(lowest(free));
  });

  test('a value outside the frame has an arrow at its edge', () => {
    // The Padé approximant of this series lies far from the others.
    const values = kindOf('values').draw(plain(RESULTS['compare']!));
    const [panel] = values.panels;
    const high = panel!.x.high;
    const outside = panel!.layers.flatMap((layer) =>
      layer.kind === 'curve' ? layer.points.filter(([x]) => x > high) : [],
    );
    expect(outside.length).toBeGreaterThan(0);
    // Nothing else in this picture is an open line of three points.
    const arrows = pictureOf(values, column).marks.filter(
      (mark) => mark.kind === 'path' && mark.fill === undefined && /^M[^LZ]*L[^LZ]*L[^LZ]*$/.test(mark.d),
    );
    expect(arrows.length).toBe(outside.length);
  });

  test('a degenerate Borel transform still shows its poles', async () => {
    const series = await loadSeries('marrowgate-mass');
    const result = assess(series, at, { digits: 12, request: { command: 'assess', series: 'marrowgate-mass' } });
    const poles = kindOf('plane')
      .draw(plain(result))
      .panels[0]!.layers.flatMap((layer) =>
        layer.kind === 'curve' && layer.marker === 'cross' ? layer.points.map(([x]) => x) : [],
      );
    // The file's own singularities: u = 1/2, -1 and 3/2.
    expect(poles.toSorted((a, b) => a - b).map((x) => Number(x.toFixed(4)))).toEqual([-1, 0.5, 1.5]);
  });

  test('growth and plane results are drawn as an assessment is', () => {
    const request = (command: string) => ({ digits: 12, request: { command, series: 'adler' } });
    const growth = growthStudy(adler, request('growth'));
    const plane = planeStudy(adler, request('plane'));
    const whole = plain(RESULTS['assess']!);
    expect(kindOf('ratios').draw(plain(growth)).data).toEqual(kindOf('ratios').draw(whole).data);
    expect(kindOf('plane').draw(plain(plane)).data[0]).toEqual(kindOf('plane').draw(whole).data[0]);
  });

  test('the integrand is not drawn across its poles', () => {
    const pieces = drawn('integrand').panels[0]!.layers.filter((layer) => layer.kind === 'curve' && layer.ink === 1);
    expect(pieces.length).toBe(2);
  });

  test('a short logarithmic axis numbers 1 before 0.9, a long one round decades', () => {
    const labels = (low: number, high: number): string[] =>
      axisOf({ kind: 'log', low, high, label: '' }, { start: 0, end: 180, text: 7.5, direction: 'along' })
        .ticks.map(({ label }) => label)
        .filter((label) => label !== '');
    expect(labels(0.4, 2.5)).toEqual(expect.arrayContaining(['0.5', '1', '2']));
    expect(labels(1e-4, 1e45)).toEqual(['10^{0}', '10^{20}', '10^{40}']);
  });
});

test('zeros of the Borel plane: that of [1/1] by hand', () => {
  // P/Q = (1 + (b_1 + q_1) t)/(1 + q_1 t), q_1 = −b_2/b_1, b_n = d_(n+1)/n! of the Adler function; u = 9/4 t for three flavours.
  const [, b1 = NaN, b2 = NaN] = adler.coefficients.map(({ value }, n) => toNumberExact(value) / (n === 2 ? 2 : 1));
  const zero = (-1 / (b1 - b2 / b1)) * 2.25;
  const rows = drawn('plane').data.find(({ name }) => name === 'zeros')?.rows ?? [];
  const found = rows.find(([entry, leroy]) => entry === '[1/1]' && leroy === '0');
  expect(Number(found?.[2]) / zero).toBeCloseTo(1, 7);
});
