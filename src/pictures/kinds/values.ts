/**
 * @module The values by prescription side by side: the truncation error as a thin interval with ends, the ambiguity as a
 * thick one behind it, since the two are not the same kind of error. A ring is a value with a caution, or with a refuted
 * record. The band is the verdict with its ambiguity or truncation error, or the spread of the values without a caution.
 */
import type { Assessment, CompareResult, SumResult } from '../../studies/index.js';
import type { Chart, Layer } from '../chart.js';
import { atCoupling, labelName, nameOf } from './words.js';

interface Row {
  readonly prescription: string;
  readonly variant: string;
  readonly value: string;
  readonly truncation?: string;
  readonly ambiguity?: string;
  readonly standing: string;
  readonly flagged: boolean;
}

interface Values {
  readonly title: string;
  readonly coupling: string;
  readonly rows: readonly Row[];
  readonly band?: { readonly from: number; readonly to: number; readonly at?: number; readonly name: string };
}

type Drawn = Assessment | SumResult | CompareResult;

const isComparison = (result: Drawn): result is CompareResult => 'rows' in result;

/** Of an assessment, or of one prescription: that has no verdict, and all its members are shown. */
function ofEntries(result: SumResult & Partial<Assessment>): Values {
  const { verdict } = result;
  const half = Math.abs(Number(verdict?.ambiguity ?? verdict?.truncation ?? Number.NaN));
  const at = Number(verdict?.value ?? Number.NaN);
  return {
    title: nameOf(result),
    coupling: atCoupling(result),
    rows: result.values
      .filter((entry) => entry.value !== undefined && (verdict === undefined || entry.central === true))
      .map((entry) => ({
        prescription: entry.prescription,
        variant: entry.variant,
        value: entry.value ?? '',
        ...(entry.truncationError === undefined ? {} : { truncation: entry.truncationError }),
        ...(entry.ambiguity === undefined ? {} : { ambiguity: entry.ambiguity }),
        standing: entry.standing ?? '',
        flagged: entry.record?.verdict === 'bad',
      })),
    ...(Number.isFinite(at) && Number.isFinite(half)
      ? {
          band: {
            from: at - half,
            to: at + half,
            at,
            name: verdict?.ambiguity === undefined ? 'verdict ± truncation' : 'verdict ± ambiguity',
          },
        }
      : {}),
  };
}

function ofComparison(result: CompareResult): Values {
  const at = result.points[0]?.coupling;
  const spread = result.points[0]?.spread.unflagged ?? result.points[0]?.spread.all;
  const rows = result.rows
    .filter((row) => row.value !== undefined && row.at === result.rows[0]?.at)
    .map((row) => ({
      prescription: row.prescription,
      variant: row.variant,
      value: row.value ?? '',
      ...(row.truncationError === undefined ? {} : { truncation: row.truncationError }),
      ...(row.ambiguity === undefined ? {} : { ambiguity: row.ambiguity }),
      standing: row.standing ?? '',
      flagged: row.cautions.length > 0,
    }));
  return {
    title: nameOf(result),
    coupling: at === undefined ? '' : atCoupling({ coupling: at }),
    rows,
    ...(spread === undefined
      ? {}
      : { band: { from: Number(spread.low), to: Number(spread.high), name: 'spread without cautions' } }),
  };
}

/** The middle of the values; half of them lie within `spread` of it. Wild values do not move it. */
function middle(values: readonly number[]): { readonly at: number; readonly spread: number } {
  const median = (list: readonly number[]): number => {
    const sorted = [...list].sort((a, b) => a - b);
    return ((sorted[Math.floor((sorted.length - 1) / 2)] ?? 0) + (sorted[Math.ceil((sorted.length - 1) / 2)] ?? 0)) / 2;
  };
  const at = median(values);
  return { at, spread: median(values.map((v) => Math.abs(v - at))) };
}

/** Values and errors further from the middle than this many spreads are cut off by the frame. */
const VIEW = 10;

export function valuesChart(result: Drawn): Chart {
  const { title, coupling, rows, band } = isComparison(result) ? ofComparison(result) : ofEntries(result);
  // Rows of one prescription differ by their variant.
  const one = new Set(rows.map((row) => row.prescription)).size === 1 && rows.length > 1;
  const nameIn = (row: Row): string => (one ? row.variant : labelName(row.prescription));
  const size = (text: string | undefined): number => Math.abs(Number(text ?? 0));
  const { at, spread } = middle(rows.map((row) => Number(row.value)));
  const reach = Math.max(VIEW * spread, ...(band === undefined ? [] : [at - band.from, band.to - at]));
  const ends = rows.flatMap(({ value, truncation, ambiguity }) => {
    const half = Math.max(size(truncation), size(ambiguity));
    return [Number(value) - half, Number(value) + half];
  });
  const view = [...ends, ...(band === undefined ? [] : [band.from, band.to])].map((end) =>
    Math.min(Math.max(end, at - reach), at + reach),
  );
  const interval = (weight: 'thin' | 'thick', key: 'truncation' | 'ambiguity', ink: number, name: string): Layer => ({
    kind: 'intervals',
    along: 'x',
    items: rows.flatMap((row, y) =>
      row[key] === undefined ? [] : [{ x: Number(row.value), y, minus: size(row[key]), plus: size(row[key]) }],
    ),
    ink,
    weight,
    name,
  });
  const [left, right] = [Math.min(...view), Math.max(...view)];
  const inView = ({ value }: Row): boolean => Number(value) >= left && Number(value) <= right;
  const points = (flagged: boolean): Layer => ({
    kind: 'curve',
    points: rows.flatMap((row, y) => (row.flagged === flagged ? [[Number(row.value), y] as const] : [])),
    ink: 0,
    marker: flagged ? 'ring' : 'disc',
    ...(flagged && rows.some((row) => row.flagged && inView(row)) ? { name: 'with caution' } : {}),
  });
  return {
    title: `Values by prescription of ${title}, ${coupling}`,
    description:
      `${rows.length} values; truncation errors are thin intervals, ambiguities thick ones. ` +
      rows.map((row) => `${labelName(row.prescription)} ${row.value}`).join('; ') +
      '.',
    panels: [
      {
        x: { kind: 'linear', low: left, high: right, label: 'value', margin: 0.05 },
        y: { kind: 'names', names: rows.map(nameIn), label: '' },
        layers: [
          ...(band === undefined
            ? []
            : [{ kind: 'band', along: 'x', from: band.from, to: band.to, tone: 'first', name: band.name } as const]),
          ...(band?.at === undefined
            ? []
            : [{ kind: 'rule', along: 'x', at: band.at, line: 'dashed', ink: 'faint' } as const]),
          interval('thick', 'ambiguity', 1, 'ambiguity |Im|/π'),
          interval('thin', 'truncation', 0, 'truncation error'),
          points(false),
          points(true),
        ],
        legend: 'below',
      },
    ],
    data: [
      {
        name: 'values',
        columns: ['prescription', 'variant', 'value', 'truncation_error', 'ambiguity', 'standing', 'caution'],
        rows: rows.map((row) => [
          row.prescription,
          row.variant,
          row.value,
          row.truncation ?? '',
          row.ambiguity ?? '',
          row.standing,
          row.flagged ? '1' : '0',
        ]),
      },
    ],
  };
}
