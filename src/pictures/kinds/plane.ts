/**
 * @module The Borel plane: poles and zeros of the Padé approximants of the Borel transform, doublets set aside, expected singularities,
 * the circle of convergence, and the path of the Laplace integral.
 */
import type { Assessment } from '../../studies/index.js';
import type { Chart, Layer, MarkerShape, Point } from '../chart.js';
import { nameOf } from './words.js';

/** Of an assessment, or of the plane alone, which does not know what is expected. */
type Plane = Pick<Assessment, 'series' | 'borelPlane'> & Partial<Pick<Assessment, 'growth'>>;
type PoleRow = Assessment['borelPlane']['entries'][number]['poles'][number];
/** A pole or a zero: where it is. */
type Place = Pick<PoleRow, 're' | 'im' | 'u'>;

/** Poles further out than this many radii of convergence say little, and would make the rest small. */
const VIEW = 4;

/** In u where the series has it, in t elsewhere. Both members of a pair. */
function placesOf(pole: Place, inU: boolean): Point[] {
  const at = inU && pole.u !== undefined ? pole.u : pole;
  const re = Number(at.re);
  const im = Number(at.im ?? 0);
  return im === 0
    ? [[re, 0]]
    : [
        [re, im],
        [re, -im],
      ];
}

const circlePoints = (radius: number): Point[] =>
  Array.from({ length: 121 }, (_, i) => {
    const angle = (i * Math.PI) / 60;
    return [radius * Math.cos(angle), radius * Math.sin(angle)];
  });

/** An entry of a degenerate block repeats a smaller one: it is drawn where there is no other. */
function distinct(entries: Plane['borelPlane']['entries']): Plane['borelPlane']['entries'] {
  const own = entries.filter(({ deficiency }) => deficiency === undefined);
  return own.length > 0 ? own : entries.slice(0, 1);
}

export function planeChart(result: Plane): Chart {
  const { entries } = result.borelPlane;
  const inU = entries.some((entry) => entry.poles.some((pole) => pole.u !== undefined));
  const variable = inU ? 'u' : 't';
  const plain = distinct(entries.filter((entry) => entry.leroy === '0' && entry.exists));
  const others = distinct(entries.filter((entry) => entry.leroy !== '0' && entry.exists));
  const genuine = (list: typeof entries): PoleRow[] =>
    list.flatMap((entry) => entry.poles.filter((pole) => pole.note !== 'doublet'));
  const doublets = entries.flatMap((entry) => entry.poles.filter((pole) => pole.note === 'doublet'));
  const { expected = [], nearest } = result.growth ?? {};
  const expectedAt = expected.map((s) => Number((inU ? s.u : undefined) ?? s.t)).filter(Number.isFinite);
  const found = Math.abs(Number((inU ? nearest?.u : undefined) ?? nearest?.t ?? Number.NaN));
  const radius = Number.isFinite(found) ? found : Math.min(...expectedAt.map(Math.abs), Infinity);
  const all = [...genuine(plain), ...genuine(others)].flatMap((pole) => placesOf(pole, inU));
  const size = Number.isFinite(radius) ? radius : Math.min(...all.map(([x, y]) => Math.hypot(x, y)), Infinity);
  const limit = Number.isFinite(size) ? VIEW * size : 1;
  const seen = all.filter(([x, y]) => Math.hypot(x, y) <= limit);
  const hidden = all.length - seen.length;
  const low = Math.min(...seen.map(([x]) => x), ...expectedAt.filter((x) => Math.abs(x) <= limit), -0.3 * limit);
  const high = Math.max(...seen.map(([x]) => x), ...expectedAt.filter((x) => Math.abs(x) <= limit), 0.6 * limit);
  const tall = Math.max(...seen.map(([, y]) => Math.abs(y)), 0.3 * limit);

  const marked = (points: readonly Point[], ink: number, marker: MarkerShape, name: string): Layer[] =>
    points.length === 0 ? [] : [{ kind: 'curve', points, ink, marker, name }];
  const placed = (poles: readonly Place[]): Point[] => poles.flatMap((pole) => placesOf(pole, inU));
  const ray: Point[] = [
    [0, 0],
    [high * 2, 0],
  ];
  const layers: Layer[] = [
    { kind: 'rule', along: 'y', at: 0, line: 'dotted', ink: 'faint' },
    { kind: 'rule', along: 'x', at: 0, line: 'dotted', ink: 'faint' },
    ...(Number.isFinite(radius)
      ? [{ kind: 'curve', points: circlePoints(radius), ink: 2, line: 'dashed', name: 'convergence' } as const]
      : []),
    { kind: 'curve', points: ray, ink: 4, line: 'full', name: 'Laplace integral' },
    ...marked(
      expectedAt.map((x): Point => [x, 0]),
      1,
      'ring',
      'expected',
    ),
    ...marked(placed(plain.flatMap(({ zeros = [] }) => zeros)), 0, 'diamond', 'zeros, Borel'),
    ...marked(placed(genuine(others)), 3, 'triangle', 'poles, Borel–Leroy'),
    ...marked(placed(genuine(plain)), 0, 'cross', 'poles, Borel'),
    ...marked(placed(doublets), 2, 'square', 'doublets'),
  ];
  return {
    title: `Borel plane of ${nameOf(result)}`,
    description:
      `Poles and zeros of the Padé approximants of the Borel transform in ${variable}: ${seen.length} poles shown` +
      `${hidden === 0 ? '' : `, ${hidden} outside the picture`}; ${result.borelPlane.doublets} doublets. ` +
      `Expected singularities at ${variable} = ${expectedAt.join(', ') || 'none'}. ` +
      (Number.isFinite(radius) ? `Radius of convergence ${radius.toPrecision(3)}.` : ''),
    panels: [
      {
        x: { kind: 'linear', low, high, label: `Re *${variable}*` },
        y: { kind: 'linear', low: -tall, high: tall, label: `Im *${variable}*` },
        layers,
        legend: 'inside',
        square: true,
      },
    ],
    data: [
      {
        name: 'poles',
        columns: ['entry', 'leroy', `re_${variable}`, `im_${variable}`, 'note'],
        rows: entries.flatMap((entry) =>
          entry.poles.map((pole) => {
            const at = inU && pole.u !== undefined ? pole.u : pole;
            return [entry.label, entry.leroy, at.re, at.im ?? '0', pole.note ?? ''];
          }),
        ),
      },
      {
        name: 'zeros',
        columns: ['entry', 'leroy', `re_${variable}`, `im_${variable}`],
        rows: entries.flatMap((entry) =>
          (entry.zeros ?? []).map((zero) => {
            const at = inU && zero.u !== undefined ? zero.u : zero;
            return [entry.label, entry.leroy, at.re, at.im ?? '0'];
          }),
        ),
      },
      {
        name: 'expected',
        columns: [variable, 'kind', 'exponent'],
        rows: expected.map((s) => [(inU ? s.u : undefined) ?? s.t, s.kind, s.exponent ?? '']),
      },
    ],
  };
}
