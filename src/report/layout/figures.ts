/** @module How single numbers look in a report. The digits are those of the result, fewer of them at times. */
import {
  parseDecimal,
  roundPdg,
  roundToDigits,
  shorten,
  writeDecimal,
  writeParentheses,
} from '../../numerics/index.js';

/** Errors are shown to two digits: more would pretend to know the error of the error. */
const ERROR_DIGITS = 2;

/** A value with its error takes no more digits than these. */
const MOST_DIGITS = 12;

/** An error or any other size that is read for its magnitude, without sign word. */
export const rough = (text: string): string => shorten(text, ERROR_DIGITS, 'half-up');

/** "± 0.0012", or "+0.03 -0.02" as it stands; empty for an absent error. */
export function plusMinus(text: string | undefined): string {
  if (text === undefined) return '';
  const d = parseDecimal(text);
  if (d === undefined) return text;
  return d.coefficient === 0n ? '0' : `± ${rough(text).replace(/^-/, '')}`;
}

const digitsOf = (d: { readonly coefficient: bigint }): number => String(d.coefficient).replace('-', '').length;

/** "277(51)" with an error, "49.075700" without: at most `digits` digits. */
export function withError(value: string, error: string | undefined, digits: number): string {
  if (error === undefined) return shorten(value, digits);
  const rounded = roundPdg(value, [error]);
  // An error far below the digits of a page says that all of them are known.
  if (rounded === undefined || digitsOf(rounded.value) > MOST_DIGITS) return shorten(value, Math.max(digits, 10));
  return writeParentheses(rounded) ?? `${shorten(value, digits)} ± ${rough(error)}`;
}

/**
 * A real number, or a pair of complex conjugates: "0.72 ± 0.08i", and "0.33 ∓ 0.02i" where the part of the upper member is
 * negative.
 */
export function conjugates(re: string, im: string | undefined, digits: number): string {
  const real = shorten(re, digits);
  if (im === undefined) return real;
  return `${real} ${im.startsWith('-') ? '∓' : '±'} ${shorten(im.replace(/^[+-]/, ''), digits)}i`;
}

/** A ratio near 1 or below as per cent: "3.1 %". */
export function percent(ratio: string): string {
  const d = parseDecimal(ratio);
  if (d === undefined) return ratio;
  return `${writeDecimal(roundToDigits({ ...d, exponent: d.exponent + 2 }, ERROR_DIGITS, 'half-up'))} %`;
}
