/** @module The section on replicas: percentiles by prescription and of the mixture, widths against linear ones, small histograms. */
import { roundPdg, shorten, writeParentheses } from '../numerics/index.js';
import type { ReplicaDistribution, ReplicaNumber, ReplicaResult } from '../extraction/index.js';
import { sidesText } from './budget-parts.js';
import { rough, type Fact, type Page } from '../report/index.js';

/** Heights of a bar, an empty one first. */
const BARS = { blocks: '·▁▂▃▄▅▆▇█', ascii: '._:-=+*#@' } as const;
const withPi = (text: string): string => text.replace(/\balpha_s\b/g, 'α_s').replace('(91.1879 GeV)', '(M_Z)');

/** "0.11881(13)": the Monte Carlo error in units of the last digit. */
function number({ value, error }: ReplicaNumber): string {
  const rounded = roundPdg(value, [error]);
  return (rounded && writeParentheses(rounded)) ?? value;
}

/** Both sides of an interval about the median, to two digits. */
function about(median: ReplicaNumber, low: ReplicaNumber, high: ReplicaNumber): string {
  const plus = (Number(high.value) - Number(median.value)).toPrecision(3);
  const minus = (Number(median.value) - Number(low.value)).toPrecision(3);
  return sidesText({ plus, minus }).replace('± ', '±');
}

const digits = (text: string, count: number): string => String(Number(Number(text).toPrecision(count)));

const share = (part: number, of: number): string =>
  part === 0 ? '' : `${rough(((100 * part) / Math.max(1, of)).toPrecision(3))} %`;

/** One sign a bin, the fullest bin at full height. */
export function sparkline(counts: readonly number[], ascii: boolean): string {
  const bars = ascii ? BARS.ascii : BARS.blocks;
  const most = Math.max(1, ...counts);
  return counts.map((n) => bars[n === 0 ? 0 : Math.max(1, Math.round((n / most) * (bars.length - 1)))] ?? '').join('');
}

/** Significant digits of a width and of a ratio of widths. */
const WIDTH_DIGITS = 3;

const cut = (text: string | undefined): string => (text === undefined ? '' : shorten(text, WIDTH_DIGITS, 'half-up'));

function cells(name: string, d: ReplicaDistribution, ratio: string | undefined, failed: string): readonly string[] {
  const { median, low68, high68, low95, high95, sigma, skewness } = d;
  return [
    name,
    number(median),
    about(median, low68, high68),
    about(median, low95, high95),
    cut(sigma.value),
    cut(ratio),
    Number(skewness.value)
      .toFixed(2)
      .replace(/^-(0\.0+)$/, '$1'),
    failed,
  ];
}

/** Percentiles of one quantity. */
function percentileTable(page: Page, replicas: ReplicaResult, q: number): void {
  const quantity = replicas.quantities[q];
  if (quantity === undefined) return;
  const rows = replicas.rows.flatMap((row) => {
    const { distribution: d, ratio } = row.values[q] ?? {};
    if (d === undefined) return [];
    const failed = share(row.failed, replicas.done);
    if (row.stable) return [{ cells: cells(row.prescription, d, ratio?.value, failed) }];
    return [{ cells: cells(`(${row.prescription})`, d, ratio?.value, failed), tone: 'faint' as const }];
  });
  const { mixture } = replicas;
  const mixed = mixture?.values[q]?.distribution;
  const last =
    mixed === undefined
      ? []
      : [{ cells: cells('drawn at random', mixed, undefined, share(mixture?.failed ?? 0, replicas.done)) }];
  const unit = quantity.unit === undefined ? '' : ` in ${quantity.unit}`;
  page.table(
    [
      { head: `${withPi(quantity.symbol)}${unit}`, align: 'left' },
      { head: 'median', align: 'point', tone: 'mark' },
      { head: '68 %', align: 'left' },
      { head: '95 %', align: 'left' },
      { head: 'σ', align: 'left' },
      { head: '/linear', align: 'left' },
      { head: 'skew', align: 'point', tone: 'faint' },
      { head: 'failed', align: 'left', tone: 'warn' },
    ],
    [...rows, ...last],
  );
}

/** Histograms on one scale, a line each. */
function histograms(page: Page, replicas: ReplicaResult, q: number): void {
  const quantity = replicas.quantities[q];
  if (quantity === undefined) return;
  const ascii = page.paint.ascii === true;
  const rows = replicas.rows.flatMap((row) => {
    const counts = row.values[q]?.distribution?.histogram;
    return counts === undefined ? [] : [{ label: row.prescription, counts }];
  });
  const mixed = replicas.mixture?.values[q]?.distribution?.histogram;
  const lines = mixed === undefined ? rows : [...rows, { label: 'drawn at random', counts: mixed }];
  if (lines.length === 0) return;
  const bins = lines[0]?.counts.length ?? 0;
  const range = `${bins} bins from ${digits(quantity.from, 4)} to ${digits(quantity.to, 4)}`;
  page.blank();
  page.facts([
    ...lines.map(({ label, counts }): Fact => ({ label, text: `|${sparkline(counts, ascii)}|` })),
    { label: withPi(quantity.symbol), text: range, tone: 'faint' },
  ]);
}

/** The section, behind the budgets. */
export function replicaSection(page: Page, replicas: ReplicaResult): void {
  page.head('Replicas');
  const { asked, done, seed, inputs } = replicas;
  const drawn = inputs.map(({ name, central, plus, minus }) => {
    const size = plus === minus ? `± ${digits(plus, 2)}` : `+${digits(plus, 2)} -${digits(minus, 2)}`;
    return `${withPi(name)} ${digits(central, 6)} ${size}`;
  });
  page.facts([
    { label: 'replicas', text: `${done}${done === asked ? '' : ` of ${asked}, interrupted`}, seed ${seed}` },
    ...drawn.map((text): Fact => ({ label: 'drawn', text })),
  ]);
  if (done === 0) return;
  // Where α_s is wanted elsewhere as well, that is what is quoted: it comes last.
  for (let q = replicas.quantities.length - 1; q >= 0; q--) {
    page.blank();
    percentileTable(page, replicas, q);
  }
  histograms(page, replicas, replicas.quantities.length - 1);
  page.blank();
  page.points(words(replicas));
  if (replicas.notes.length > 0) page.points(replicas.notes, 'warn');
}

function words({ mixture, leftOut, rows }: ReplicaResult): string[] {
  const halves = Math.max(...rows.flatMap((r) => r.values.map((v) => Number(v.distribution?.halves ?? 0))));
  return [
    'In parentheses behind the median: its Monte Carlo error in units of the last digit. Intervals are about the median; /linear is σ over the width by linear propagation of the same errors; failed replicas have no value.',
    ...(halves > 0
      ? [`First and second half of the replicas differ by at most ${halves} of the expected standard deviations.`]
      : []),
    ...(mixture === undefined
      ? []
      : [
          `Drawn at random: for each replica one of ${mixture.prescriptions.join(', ')}, all alike; a convention, not a probability.`,
        ]),
    ...leftOut.map(({ prescription, reason }) => `${prescription} is left out: ${reason}.`),
  ];
}
