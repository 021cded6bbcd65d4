/** @module The verdict in the unit of the quantity: GeV and the like as the file says, or powers of its hard scale. */
import { Rational } from '../numerics/index.js';
import type { Series } from '../series/index.js';
import type { VerdictReport } from './assessment.js';
import { indicative } from './figures.js';
import { INPUT_NOT_KNOWN, writeVerdict } from './rounding.js';
import { hardScaleGeV } from './summary.js';

/** "Q", "Q^2", "Q^1/2". */
const POWER = /^Q(?:\^\(?(-?\d+(?:\/\d+)?)\)?)?$/;

/** Significant digits of a value without an error. */
const DIGITS = 12;

/** The unit in words, and by what a pure number is to be multiplied; undefined where nothing is stated or Q is not known. */
function unitOf(series: Series): { readonly unit: string; readonly factor: number } | undefined {
  const { unit } = series;
  if (unit === undefined) return undefined;
  const match = POWER.exec(unit.trim());
  if (match === null) return { unit, factor: 1 };
  const Q = hardScaleGeV(series);
  const power = Rational.parse(match[1] ?? '1');
  if (Q === undefined || power === undefined) return undefined;
  const name = power.equals(Rational.ONE) ? 'GeV' : `GeV^${power.toString()}`;
  return { unit: name, factor: Q ** power.toNumber() };
}

/** The verdict with its value in the unit of the quantity; the hard scale is taken as exact. */
export function inUnit(verdict: VerdictReport, series: Series): VerdictReport {
  const found = unitOf(series);
  if (found === undefined || verdict.value === undefined) return verdict;
  const { unit, factor } = found;
  const scaled = (text: string): number => Number(text) * factor;
  const value = scaled(verdict.value).toPrecision(DIGITS);
  const parts = [
    { label: 'truncation', text: verdict.truncation },
    { label: 'ambiguity', text: verdict.ambiguity },
    { label: 'input', text: verdict.input },
  ].flatMap(({ label, text }) =>
    text === undefined || !(Number(text) > 0) ? [] : [{ label, error: Math.abs(scaled(text)) }],
  );
  const [head = '', ...rest] = writeVerdict(value, parts).split('; ');
  const unknown = verdict.printed.includes(INPUT_NOT_KNOWN) ? [INPUT_NOT_KNOWN] : [];
  const printed = [`${bracketed(head)} ${unit}`, ...rest, ...unknown].join('; ');
  return { ...verdict, inUnit: { unit, value: indicative(Number(value), DIGITS), printed } };
}

/** A value with errors stands in parentheses before a unit. */
const bracketed = (text: string): string => (text.includes('±') && !text.startsWith('(') ? `(${text})` : text);
