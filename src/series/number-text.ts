/**
 * @module Plain numbers as people write them, read exactly: `-12.5e-3`, `365/24`.
 * Nothing here guesses: what has two readings is refused and told how to say one of them.
 */
import { Rational } from '../numerics/index.js';
import { LIMITS, grouped } from './limits.js';
import { quote } from './quote.js';

/** What is wrong with a text that should be a number. */
export interface NumberProblem {
  readonly problem: string;
  readonly wanted: string;
}

export const isNumberProblem = (x: object): x is NumberProblem => 'problem' in x;

const DIGITS = String.raw`(?:\d+(?:\.\d*)?|\.\d+)`;
/** A decimal without sign and exponent. */
export const MANTISSA = new RegExp(`^${DIGITS}$`);
export const DECIMAL = new RegExp(String.raw`^[+-]?${DIGITS}(?:[eE][+-]?\d+)?$`);
const FRACTION = new RegExp(String.raw`^([+-]?${DIGITS}(?:[eE][+-]?\d+)?)\s*/\s*(${DIGITS}(?:[eE][+-]?\d+)?)$`);
const EXPONENT = /[eE]([+-]?\d+)$/;

/** Minus signs that come with copied text. */
export const plainSigns = (text: string): string => text.trim().replace(/[\u2212\u2010\u2011\ufe63\uff0d]/g, '-');

/** Words and habits that look like numbers but are not, with the reason. */
const MISREADINGS: readonly (readonly [RegExp, string, string])[] = [
  [/^[+-]?(?:nan|inf|infinity|\.nan|\.inf)$/i, 'is not a finite number', 'a number'],
  [/^(?:null|nil|none|n\/a|na|~|-)$/i, 'is an empty entry', 'a number (0 for a coefficient that vanishes)'],
  [/^(?:true|false|yes|no|on|off)$/i, 'is a yes or no', 'a number'],
  [/^[+-]?\d{1,3}(?:,\d{3})+(?:\.\d*)?$/, 'has commas between its digits', 'digits without commas'],
  [/^[+-]?\d+,\d*(?:[eE][+-]?\d+)?$/, 'has a decimal comma', 'a decimal point'],
  [/^[+-]?[\d.]*\d_[\d_.]*(?:[eE].*)?$/, 'has an underscore between its digits', 'digits without underscores'],
  [/^[+-]?\d+(?:[ \u00a0\u2009\u202f]\d{3})+(?:\.\d*)?$/, 'has gaps between its digits', 'digits without gaps'],
  [/^[+-]?0[xob][0-9a-f]*$/i, 'is not decimal', 'a decimal number'],
  [/^[+-]?[\d.]+[eE][+-]?$/, 'has an exponent without digits', 'digits after e, as in 1e-3'],
  [/^[+-]?[\d.]+\s*%$/, 'is a percentage', 'the number itself, 0.1 for 10 %'],
  [/^[+-]?[\d.]*\.[\d]*\.[\d.]*$/, 'has two decimal points', 'a number with one decimal point'],
  [/^(?:.*\d)?\s*[+-]?\s*[\d.]*(?:\d|\s)[ij]$/, 'is complex', 'a real number'],
  [/^[+-]\s*[+-]/, 'has two signs', 'one sign'],
];

/** The reason why `text` is a known misreading, if it is one. */
export function misreading(text: string): NumberProblem | undefined {
  if (text === '') return { problem: 'nothing', wanted: 'a number' };
  if (text.length > 200) return undefined;
  const hit = MISREADINGS.find(([pattern]) => pattern.test(text));
  return hit === undefined ? undefined : { problem: `${quote(text)} ${hit[1]}`, wanted: hit[2] };
}

/** Complaint about a number that is too long or too large, before any arithmetic is done with it. */
export function tooLarge(text: string): NumberProblem | undefined {
  if (text.length > LIMITS.numberLength) {
    return {
      problem: `a number of ${grouped(text.length)} characters`,
      wanted: `at most ${grouped(LIMITS.numberLength)}`,
    };
  }
  const most = LIMITS.exponent;
  for (const m of text.matchAll(/[eE]([+-]?\d+)/g)) {
    if (!(Math.abs(Number(m[1])) <= most)) {
      return {
        problem: `${quote(text)} has the exponent ${quote(m[1]!).slice(1, -1)}`,
        wanted: `exponents from -${most} to ${most}`,
      };
    }
  }
  return undefined;
}

/**
 * Cost of turning `text` into a rational, in units of LIMITS.work: twice the length for a decimal, the product of the lengths
 * for a fraction (which is reduced).
 */
export function numberCost(text: string): number {
  const words = text.split('/').map((part) => {
    const exponent = Math.abs(Number(EXPONENT.exec(part.trim())?.[1] ?? 0));
    return 1 + (part.length + Math.min(exponent, LIMITS.exponent)) / 19;
  });
  return words.length === 2 ? words[0]! * words[1]! : 2 * words[0]!;
}

/** A decimal or a fraction, exactly; undefined when `text` has neither form. */
export function parsePlain(text: string): Rational | NumberProblem | undefined {
  const large = tooLarge(text);
  const fraction = FRACTION.exec(text);
  if (fraction === null && !DECIMAL.test(text)) return undefined;
  if (large !== undefined) return large;
  if (fraction === null) return Rational.parse(text);
  const denominator = Rational.parse(fraction[2]!);
  if (denominator?.isZero() === true)
    return { problem: `${quote(text)} divides by zero`, wanted: 'a denominator other than 0' };
  return denominator === undefined ? undefined : Rational.parse(fraction[1]!)?.div(denominator);
}

/**
 * Significant digits of a decimal as written: "1.000" has 4, "0.0120" has 3, "8.2e3" has 2. Undefined for integers and
 * fractions, which are taken as exact, and for zero.
 */
export function significantDigits(text: string): number | undefined {
  if (!DECIMAL.test(text) || !text.includes('.')) return undefined;
  const digits = text
    .replace(EXPONENT, '')
    .replace(/[+\-.]/g, '')
    .replace(/^0+/, '');
  return digits === '' ? undefined : digits.length;
}
