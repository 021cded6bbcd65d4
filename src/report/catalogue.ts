/** @module The catalogue for people, and one series of it: what its file says, nothing evaluated. */
import { exact, parseDecimal, shorten, toDecimal } from '../numerics/index.js';
import type { Rational } from '../numerics/index.js';
import { textOf, weightText } from '../series/index.js';
import type { CatalogueEntry, Series, Uncertain } from '../series/index.js';
import type { Fact } from './layout/page.js';
import { Page } from './layout/page.js';
import { unpainted } from './layout/paint.js';
import type { TerminalOptions } from './terminal.js';
import { over } from './words.js';

const pageFor = (options: TerminalOptions): Page =>
  new Page(options.columns ?? 100, options.paint ?? unpainted, options.digits);

/** "3, or 3 to 6": the number of flavours, and those that the file also knows. */
function flavourText({ flavours, flavourChoices: choices }: CatalogueEntry): string {
  const own = flavours === undefined ? '' : String(flavours);
  if (choices.every((choice) => choice === flavours)) return own;
  const range = `${Math.min(...choices)} to ${Math.max(...choices)}`;
  return own === '' ? range : `${own} (${range})`;
}

export function catalogueText(entries: readonly CatalogueEntry[], options: TerminalOptions = {}): string {
  const page = pageFor(options);
  const columns = [
    { head: 'id', align: 'left' },
    { head: 'terms', align: 'right' },
    { head: 'flavours', align: 'left' },
    { head: 'title', align: 'left' },
  ] as const;
  const rows = (invented: boolean) =>
    entries
      .filter((entry) => entry.invented === invented)
      .map((entry) => ({ cells: [entry.id, String(entry.coefficients), flavourText(entry), entry.title] }));
  const published = rows(false);
  const made = rows(true);
  page.table(columns, [
    ...(published.length > 0 ? [{ note: 'Published series', tone: 'strong' } as const, ...published] : []),
    ...(made.length > 0 ? [{ note: 'Invented series, for demonstration', tone: 'strong' } as const, ...made] : []),
  ]);
  page.blank();
  page.say(
    'leastterm catalogue show ID prints one of them; ID-nf4 is the same at four flavours where the file allows it.',
    'faint',
  );
  return page.text();
}

/** Working precision for a handful of decimals. */
const BITS = 128;

/** The value in decimals: as the file writes it where it does, evaluated where it is an expression. */
function valueText({ value, text }: Uncertain, digits: number): string {
  return shorten(parseDecimal(text) === undefined ? toDecimal(value.ball(BITS), digits).text : text, digits);
}

/** Longest run of digits that is written out; --json and --quiet have all. */
const LONG_FRACTION = 60;

/** The text of the file, with the middle of a giant fraction left out. */
function writtenText(text: string): string {
  const parts = /^(-?)(\d+)\/(\d+)$/.exec(text);
  if (parts === null || text.length <= LONG_FRACTION) return text;
  const [, sign = '', top = '', bottom = ''] = parts;
  return `a fraction: ${sign}${top.slice(0, 6)}… over ${bottom.slice(0, 6)}…, ${top.length} and ${bottom.length} digits`;
}

function facts(series: Series): Fact[] {
  const list: Fact[] = [
    { label: 'id', text: series.id },
    { label: 'quantity', text: series.quantity ?? '' },
    { label: 'on a circle', text: series.contour === undefined ? '' : `weight w(x) = ${weightText(series.contour)}` },
    { label: 'variable', text: over(series.coupling.name, series.coupling.divisor) },
    { label: 'first power', text: String(series.firstPower) },
    { label: 'scheme', text: series.scheme ?? '' },
    { label: 'flavours', text: series.flavours === undefined ? '' : String(series.flavours) },
    { label: 'scale ratio', text: series.scaleRatio === undefined ? '' : `μ/Q = ${textOf(series.scaleRatio)}` },
    {
      label: 'hard scale',
      text: series.hardScale === undefined ? '' : series.hardScale.text,
    },
    { label: 'factor', text: textOf(series.factor) === '1' ? '' : textOf(series.factor) },
    { label: 'additive', text: textOf(series.additive) === '0' ? '' : textOf(series.additive) },
    ...series.singularities.map((s) => ({ label: 'singularity', text: singularityText(s) })),
    ...series.condensates.map((c) => ({
      label: 'condensate',
      text: `${c.name}, dimension ${c.dimension.toString()}${c.value === undefined ? '' : `: ${c.value.text} ${c.unit ?? ''}`}`,
    })),
    ...(series.measurement === undefined
      ? []
      : [{ label: 'measured', text: `${series.measurement.text} ${series.measurement.unit ?? ''}` }]),
    ...series.sources.map((text) => ({ label: 'source', text })),
    ...series.notes.map((text) => ({ label: 'note', text })),
  ];
  if (series.invented) list.push({ label: 'invented', text: 'made up for demonstration', tone: 'warn' });
  return list.filter((fact) => fact.text !== '');
}

function singularityText(s: Series['singularities'][number]): string {
  const place = [
    s.u === undefined ? '' : `u = ${textOf(s.u)}`,
    s.t === undefined ? '' : `t = ${textOf(s.t)}`,
    s.dimension === undefined ? '' : `dimension ${s.dimension.toString()}`,
    s.exponent === undefined ? '' : `exponent ${textOf(s.exponent)}`,
    s.strength === undefined ? '' : `strength ${s.strength.text}`,
  ].filter((part) => part !== '');
  return `${s.kind}, ${place.join(', ')}`;
}

export function seriesText(series: Series, options: TerminalOptions = {}): string {
  const page = pageFor(options);
  page.title(series.title);
  page.facts(facts(series));
  page.blank();
  page.table(
    [
      { head: 'order', align: 'right' },
      { head: 'value', align: 'point' },
      { head: '', align: 'left' },
      { head: 'as written', align: 'left', tone: 'faint' },
    ],
    series.coefficients.map((c, n) => ({
      cells: [
        String(n + series.firstPower),
        valueText(c, page.digits),
        c.status === 'estimated' ? 'estimated' : '',
        writtenText(c.text),
      ],
    })),
  );
  return page.text();
}

/** Significant digits of the decimals of coefficients. */
const DECIMALS = 15;

/** A coefficient and its error as decimals. */
function decimalOf({ value, text, error }: Uncertain): PlainDecimal {
  const decimal = (q: Rational): string => toDecimal(exact(q).ball(BITS), DECIMALS).text;
  return {
    value: parseDecimal(text) === undefined ? toDecimal(value.ball(BITS), DECIMALS).text : text,
    ...(error === undefined ? {} : { plus: decimal(error.plus), minus: decimal(error.minus) }),
  };
}

export interface PlainDecimal {
  readonly value: string;
  readonly plus?: string;
  readonly minus?: string;
}

/** What others read of a plain series; it holds all else that the file says as well. */
export interface PlainSeries {
  readonly [more: string]: unknown;
  readonly title: string;
  readonly sources: readonly string[];
  readonly notes: readonly string[];
  readonly coupling: { readonly name: string; readonly divisor: string };
  readonly coefficients: readonly {
    readonly order: number;
    readonly text: string;
    readonly status: string;
    readonly decimal: PlainDecimal;
  }[];
}

/** The series as plain data, numbers as the file writes them, the coefficients as decimals too. */
export function plainSeries(series: Series): PlainSeries {
  const {
    scaleRatio,
    factor,
    additive,
    coefficients,
    singularities,
    condensates,
    measurement,
    correlation,
    contour,
    ...rest
  } = series;
  const number = (n: Uncertain) => ({
    value: textOf(n.value),
    ...(n.error === undefined ? {} : { plus: n.error.plus.toString(), minus: n.error.minus.toString() }),
    text: n.text,
  });
  return {
    ...rest,
    contour: contour && { name: contour.name, weight: contour.coefficients.map(String) },
    hardScale:
      series.hardScale === undefined ? undefined : { value: series.hardScale.text, unit: series.hardScale.unit },
    ...(scaleRatio === undefined ? {} : { scaleRatio: textOf(scaleRatio) }),
    factor: textOf(factor),
    additive: textOf(additive),
    coefficients: coefficients.map((c, n) => ({
      order: n + series.firstPower,
      ...number(c),
      decimal: decimalOf(c),
      status: c.status,
    })),
    ...(correlation === undefined ? {} : { correlation: correlation.map((row) => row.map(String)) }),
    singularities: singularities.map((s) => ({
      kind: s.kind,
      ...(s.u === undefined ? {} : { u: textOf(s.u) }),
      ...(s.t === undefined ? {} : { t: textOf(s.t) }),
      ...(s.dimension === undefined ? {} : { dimension: s.dimension.toString() }),
      ...(s.exponent === undefined ? {} : { exponent: textOf(s.exponent) }),
      ...(s.strength === undefined ? {} : { strength: number(s.strength) }),
    })),
    condensates: condensates.map((c) => ({
      name: c.name,
      dimension: c.dimension.toString(),
      ...(c.wilson === undefined ? {} : { wilson: textOf(c.wilson) }),
      ...(c.value === undefined ? {} : { value: number(c.value) }),
      ...(c.unit === undefined ? {} : { unit: c.unit }),
      ...(c.source === undefined ? {} : { source: c.source }),
    })),
    ...(measurement === undefined ? {} : { measurement: number(measurement) }),
  };
}
