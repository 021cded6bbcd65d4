/**
 * @module Numbers into decimal strings that carry no digit that is not known.
 */
import { R, toDecimal } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';

/** Significant digits of an indicative number without a quoted error. */
const INDICATIVE_DIGITS = 4;

/** Rounding of estimates that were computed in doubles. */
const DOUBLE_ROUNDING = 1e-14;

/** A number enclosed so closely about zero is written 0. */
const ZERO_PLACES = 30;
const ABOUT_ZERO = /^±1e-(\d+)$/;

/** Certain digits of an enclosure, at most `digits`; a wide one about zero is written `±1e5`, a bound on its size. */
export function ballText(b: Ball, digits: number): string {
  const { text } = toDecimal(b, digits);
  const bound = ABOUT_ZERO.exec(text);
  return bound !== null && Number(bound[1]) >= ZERO_PLACES ? '0' : text;
}

/** Digits of an exactly known number, at most `digits`; an exact rational that is short is written in full. */
export function exactText(e: Exact, digits: number): string {
  if (e.rational !== undefined) {
    const q = e.rational;
    if (q.isInteger() && q.num.toString().length <= digits + 1) return q.num.toString();
  }
  return trimZeros(ballText(e.ball(Math.ceil(digits * 3.33) + 32), digits), e);
}

/** 0.2500000 of an exact 1/4 reads 0.25. */
function trimZeros(text: string, e: Exact): string {
  if (e.rational === undefined || !text.includes('.') || text.includes('e')) return text;
  const short = text.replace(/0+$/, '').replace(/\.$/, '');
  return short === '' || short === '-' ? text : short;
}

/** A double that is a model's or an estimate's number: a few significant digits. */
export function indicative(x: number, digits = INDICATIVE_DIGITS): string {
  if (x === 0) return '0';
  if (!Number.isFinite(x)) return x > 0 ? 'infinite' : '-infinite';
  const magnitude = Math.floor(Math.log10(Math.abs(x)));
  if (magnitude < -5 || magnitude >= 7) return x.toExponential(digits - 1).replace('e+', 'e');
  return Number(x.toPrecision(digits)).toFixed(Math.max(0, digits - 1 - magnitude));
}

/** Value and error of an estimate: the error to two significant digits, the value to the same place. */
export function estimateText(value: number, error: number): { value: string; error: string } {
  if (!Number.isFinite(error)) return { value: indicative(value, 12), error: 'unknown' };
  // A double carries no more than fifteen digits, whatever the method claims.
  error = Math.max(error, Math.abs(value) * DOUBLE_ROUNDING);
  if (!(error > 0)) return { value: indicative(value, 12), error: '0' };
  const place = Math.floor(Math.log10(error)) - 1;
  if (place < -14 || place > 6)
    return { value: indicative(value, 12), error: error.toExponential(1).replace('e+', 'e') };
  return place >= 0
    ? {
        value: String(Math.round(value / 10 ** place) * 10 ** place),
        error: String(Math.round(error / 10 ** place) * 10 ** place),
      }
    : { value: value.toFixed(-place), error: error.toFixed(-place) };
}

/** Midpoint of a ball as a double. */
export const number = (b: Ball): number => R.toNumber(b);
