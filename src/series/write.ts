/**
 * @module A Series as a series file. What is read back is the same series: numbers and expressions are written as they
 * were read, or as p/q; a computed value that has neither form is written with 60 digits.
 */
import { isNumberProblem } from './number-text.js';
import { spreadText } from './field-reader.js';
import { FORMAT } from './read-series.js';
import type { Coefficient, Condensate, KnownSingularity, Series, Uncertain } from './series.js';
import { readNumber } from './uncertain.js';
import { textOf } from './written.js';

/** Words that YAML readers may take for something else than text, and the shapes that need no quotes. */
const SAFE = /^-?[A-Za-z0-9(][A-Za-z0-9 ()+*/^._-]*$/;

/** A scalar: plain where that is safe, in double quotes otherwise (JSON strings are YAML). */
function scalar(text: string): string {
  return SAFE.test(text) && text.trim() === text && text.length <= 80 ? text : JSON.stringify(text);
}

type Field = readonly [name: string, value: string | undefined];

const flow = (fields: readonly Field[]): string =>
  `{ ${fields
    .filter(([, value]) => value !== undefined)
    .map(([name, value]) => `${name}: ${value!}`)
    .join(', ')} }`;

/** The texts of a value and its error; one text when it reads back to just this number. */
function numberFields(n: Uncertain): { readonly text?: string; readonly fields: readonly Field[] } {
  const read = readNumber(n.text);
  const same =
    read !== undefined && !isNumberProblem(read) && n.value.rational !== undefined && read.value.rational!.equals(n.value.rational) &&
    (read.error === undefined) === (n.error === undefined) &&
    (n.error === undefined || (read.error!.plus.equals(n.error.plus) && read.error!.minus.equals(n.error.minus))); // prettier-ignore
  if (same) return { text: n.text, fields: [['value', scalar(n.text)]] };
  const value = textOf(n.value);
  if (n.error === undefined) return { text: value, fields: [['value', scalar(value)]] };
  return {
    fields: [
      ['value', scalar(value)],
      ['error', scalar(spreadText(n.error).replace(/^\+- /, ''))],
    ],
  };
}

function uncertain(n: Uncertain, others: readonly Field[] = []): string {
  const { text, fields } = numberFields(n);
  const extra = others.some(([, value]) => value !== undefined);
  return text !== undefined && !extra ? scalar(text) : flow([...fields, ...others]);
}

const text = (value: string | undefined): string | undefined => (value === undefined ? undefined : scalar(value));

const coefficient = (c: Coefficient): string =>
  uncertain(c, [['status', c.status === 'estimated' ? c.status : undefined]]);

const singularity = (s: KnownSingularity): string =>
  flow([
    ['u', s.u && scalar(textOf(s.u))],
    ['t', s.t && scalar(textOf(s.t))],
    ['dimension', s.dimension?.toString()],
    ['exponent', s.exponent && scalar(textOf(s.exponent))],
    ['anomalous dimension', s.anomalousDimension && scalar(textOf(s.anomalousDimension))],
    ['wilson corrections', s.wilsonCorrections && `[${s.wilsonCorrections.map((c) => scalar(textOf(c))).join(', ')}]`],
    ['strength', s.strength && uncertain(s.strength)],
    ['kind', s.kind],
  ]);

const condensate = (c: Condensate): string =>
  flow([
    ['dimension', c.dimension.toString()],
    ['name', scalar(c.name)],
    ['wilson', c.wilson && scalar(textOf(c.wilson))],
    ['value', c.value && uncertain(c.value)],
    ['unit', text(c.unit)],
    ['source', text(c.source)],
    ['defined by', text(c.definedBy)],
  ]);

/** The series as YAML. */
export function writeSeries(s: Series): string {
  const lines: string[] = [];
  const field = (name: string, value: string | undefined): void => {
    if (value !== undefined) lines.push(`${name}: ${value}`);
  };
  const list = (name: string, items: readonly string[]): void => {
    if (items.length > 0) lines.push(`${name}:`, ...items.map((item) => `  - ${item}`));
  };
  field('format', String(FORMAT));
  field('title', scalar(s.title));
  field('quantity', text(s.quantity));
  list('sources', s.sources.map(scalar));
  list('notes', s.notes.map(scalar));
  if (s.invented) field('invented', 'true');
  if (s.coupling.plain) field('variable', scalar(s.coupling.name));
  else field('coupling', flow([['name', scalar(s.coupling.name)], ['divisor', s.coupling.divisor]])); // prettier-ignore
  field('first power', String(s.firstPower));
  if (s.contour !== undefined) field('kind', 'contour');
  field('weight', s.contour && (s.contour.name ?? `[${s.contour.coefficients.join(', ')}]`));
  field('scheme', text(s.scheme));
  field('flavours', s.flavours?.toString());
  if (s.flavourChoices !== undefined) field('flavour choices', `[${s.flavourChoices.join(', ')}]`);
  field('scale ratio', s.scaleRatio && scalar(textOf(s.scaleRatio)));
  field('hard scale', s.hardScale && scalar(s.hardScale.text));
  field('unit', text(s.unit));
  field('factor', scalar(textOf(s.factor)));
  field('additive', scalar(textOf(s.additive)));
  if (s.constants !== undefined) lines.push('constants:', ...s.constants.map((c) => `  ${c.name}: ${scalar(c.text)}`));
  list('coefficients', s.coefficients.map(coefficient));
  list(
    'correlation',
    (s.correlation ?? []).map((row) => `[${row.map((q) => q.toString()).join(', ')}]`),
  );
  list('singularities', s.singularities.map(singularity));
  list('condensates', s.condensates.map(condensate));
  field('bubble chain', text(s.bubbleChain));
  const { strongCoupling } = s;
  field('strong coupling', strongCoupling && flow([['power', strongCoupling.power.toString()], ['spacing', strongCoupling.spacing.toString()]])); // prettier-ignore
  if (s.measurement) field('measurement', uncertain(s.measurement, [['unit', text(s.measurement.unit)], ['source', text(s.measurement.source)]])); // prettier-ignore
  list('checks', (s.checks ?? []).map((c) => flow([['flavours', c.flavours?.toString()], ['values', `[${c.values.join(', ')}]`], ['source', text(c.source)]]))); // prettier-ignore
  return `${lines.join('\n')}\n`;
}
