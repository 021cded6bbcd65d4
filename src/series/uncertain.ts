/**
 * @module Numbers with an error as papers print them: `0.1180(9)`, `1.234(56)e-3`, `0.25 +- 0.03`, `0.25 +0.03 -0.02`.
 * Read exactly; the same reader serves the series file and the command line.
 */
import { Rational, exact } from '../numerics/index.js';
import {
  DECIMAL,
  MANTISSA,
  isNumberProblem,
  misreading,
  parsePlain,
  plainSigns,
  significantDigits,
  tooLarge,
} from './number-text.js';
import type { NumberProblem } from './number-text.js';
import { quote } from './quote.js';
import type { Uncertain } from './series.js';

export const NUMBER_FORMS = 'a decimal, a fraction p/q, 0.25(3), 0.25 +- 0.03 or 0.25 +0.03 -0.02';

/** A number as read, with its significant digits when it is a plain decimal without an error. */
export interface ReadNumber extends Uncertain {
  readonly significantDigits?: number;
}

type Errors = { readonly plus: Rational; readonly minus: Rational };
type Parts = { readonly value: Rational; readonly error: Errors };

/** Signs between a value and its symmetric error. */
export const PLUS_MINUS = /\+\/?-|±/;

/**
 * Reads a plain number with an optional error. Errors in parentheses count units of the last digit (`0.25(3)` is
 * 0.25 ± 0.03) unless they hold a decimal point (`827.37(21.5)`); one exponent at the end scales both.
 * Refused: expressions, percentages, NaN, digit grouping, several errors, and `1 + 2 - 3`, which may be a sum.
 */
export function parseUncertain(text: string): ReadNumber | NumberProblem {
  const found = readNumber(text);
  if (found !== undefined) return found;
  return { problem: `${quote(text.trim())} is not a number`, wanted: NUMBER_FORMS };
}

/** As parseUncertain, but undefined for a text of no number form at all, which may be an expression. */
export function readNumber(text: string): ReadNumber | NumberProblem | undefined {
  const t = plainSigns(text);
  const plain = parsePlain(t);
  if (plain !== undefined) {
    if (isNumberProblem(plain)) return plain;
    const digits = significantDigits(t);
    return { value: exact(plain), text: t, ...(digits !== undefined && { significantDigits: digits }) };
  }
  const wrong = tooLarge(t) ?? misreading(t);
  if (wrong !== undefined) return wrong;
  const parts = concise(t) ?? symmetric(t) ?? asymmetric(t) ?? scaled(t);
  if (parts === undefined || isNumberProblem(parts)) return parts;
  return { value: exact(parts.value), error: parts.error, text: t };
}

/** value(error)e: error in units of the last digit, or absolute when it has a decimal point. */
function concise(t: string): Parts | NumberProblem | undefined {
  const m = /^([+-]?)([\d.]+)\s*\(([^()]*)\)\s*(?:[eE]([+-]?\d+))?$/.exec(t);
  if (m === null) {
    return /^[+-]?[\d.]+\s*(?:\([\d.]+\)\s*){2,}(?:[eE][+-]?\d+)?$/.test(t)
      ? { problem: `${quote(t)} has several errors`, wanted: 'one error: combine them first' }
      : undefined;
  }
  const [, sign = '', mantissa = '', inside = '', exponent = '0'] = m;
  if (!MANTISSA.test(mantissa)) return undefined;
  const decimals = mantissa.includes('.') ? mantissa.length - mantissa.indexOf('.') - 1 : 0;
  const unit = `e${Number(exponent) - decimals}`;
  const size = (digits: string): Rational | undefined =>
    MANTISSA.test(digits) ? Rational.parse(digits.includes('.') ? `${digits}e${exponent}` : digits + unit) : undefined;
  const both = /^\+([\d.]+)\s*,?\s*-([\d.]+)$/.exec(inside.trim());
  const swapped = /^-([\d.]+)\s*,?\s*\+([\d.]+)$/.exec(inside.trim());
  const plus = size(both?.[1] ?? swapped?.[2] ?? inside.trim());
  const minus = size(both?.[2] ?? swapped?.[1] ?? inside.trim());
  if (plus === undefined || minus === undefined) {
    return {
      problem: `${quote(t)} has the error ${quote(inside)}`,
      wanted: 'digits in the parentheses, as in 0.25(3) or 0.25(+3-2)',
    };
  }
  const value = Rational.parse(`${sign}${mantissa}e${exponent}`);
  return value === undefined ? undefined : { value, error: { plus, minus } };
}

/** value +- error, each a decimal or a fraction. */
function symmetric(t: string): Parts | NumberProblem | undefined {
  const sides = t.split(PLUS_MINUS).map((side) => side.trim());
  if (sides.length < 2) return undefined;
  const value = parsePlain(sides[0]!);
  if (value === undefined || isNumberProblem(value)) return value;
  if (sides.length > 2) return { problem: `${quote(t)} has several errors`, wanted: 'one error: combine them first' };
  const error = parsePlain(sides[1]!);
  if (error === undefined)
    return { problem: `${quote(t)} has the error ${quote(sides[1]!)}`, wanted: 'a number after +-' };
  if (isNumberProblem(error)) return error;
  if (error.sign() < 0) return { problem: `${quote(t)} has a negative error`, wanted: 'an error of 0 or more' };
  return { value, error: { plus: error, minus: error } };
}

/** value +plus -minus, signs glued to their numbers and set off by blanks. */
function asymmetric(t: string): Parts | NumberProblem | undefined {
  const words = t.split(/\s+/);
  const [value, first, second] = words;
  if (words.length === 3 && DECIMAL.test(value!) && /^[+-]/.test(first!) && /^[+-]/.test(second!)) {
    const a = parsePlain(first!);
    const b = parsePlain(second!);
    const v = parsePlain(value!);
    if (a instanceof Rational && b instanceof Rational && v instanceof Rational && first![0] !== second![0]) {
      const [plus, minus] = first!.startsWith('+') ? [a, b.neg()] : [b, a.neg()];
      return { value: v, error: { plus, minus } };
    }
  }
  // The same three numbers with other blanks read as a sum: refuse to choose.
  const sum = /^[+-]?([\d.]+)\s*([+-])\s*([\d.]+)\s*([+-])\s*([\d.]+)$/.exec(t);
  if (sum !== null && sum[2] !== sum[4] && [sum[1], sum[3], sum[5]].every((s) => MANTISSA.test(s!))) {
    return {
      problem: `${quote(t)} may be a sum or a number with two errors`,
      wanted: '0.25 +0.03 -0.02 or 0.25(+3-2) for errors, parentheses for a sum',
    };
  }
  return undefined;
}

/** (value +- error)e-4: one exponent for both. */
function scaled(t: string): Parts | NumberProblem | undefined {
  const m = /^\((.*)\)\s*[eE]([+-]?\d+)$/.exec(t);
  if (m === null) return undefined;
  const inner = m[1]!.trim();
  if (/[eE()]/.test(inner)) return undefined;
  const parts = symmetric(inner) ?? asymmetric(inner);
  if (parts === undefined || isNumberProblem(parts)) return parts;
  const unit = Rational.parse(`1e${m[2]!}`);
  if (unit === undefined) return undefined;
  return {
    value: parts.value.mul(unit),
    error: { plus: parts.error.plus.mul(unit), minus: parts.error.minus.mul(unit) },
  };
}
