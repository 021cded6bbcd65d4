/**
 * @module Decimal strings without loss: read, round, and write.
 *
 * Purpose: every number of a result is a decimal string with as many digits as are known; a report may show fewer of
 * them, never others.
 * Method: an integer mantissa times a power of ten; rounding is one integer division.
 */

/** coefficient · 10^exponent. */
export interface Decimal {
  readonly coefficient: bigint;
  readonly exponent: number;
}

/** What happens to a tie: to the even neighbour (values), or away from zero (errors, which must not shrink). */
export type Tie = 'half-even' | 'half-up';

const FORM = /^([+-]?)(\d*)(?:\.(\d*))?(?:[eE]([+-]?\d{1,6}))?$/;

/** Reads "-12.5e-3"; undefined for anything that is not one decimal number. */
export function parseDecimal(text: string): Decimal | undefined {
  const match = FORM.exec(text.trim());
  if (match === null) return undefined;
  const [, sign = '', whole = '', fraction = '', power = '0'] = match;
  if (whole === '' && fraction === '') return undefined;
  const coefficient = BigInt(whole + fraction);
  return { coefficient: sign === '-' ? -coefficient : coefficient, exponent: Number(power) - fraction.length };
}

const sizeOf = (n: bigint): bigint => (n < 0n ? -n : n);

/** Number of digits of the coefficient. */
export const digitCount = (d: Decimal): number => sizeOf(d.coefficient).toString().length;

/** Place of the leading digit: 0 for 1 to 9.99, -1 for 0.1 to 0.99. Zero has the place of its last digit. */
export const leadingPlace = (d: Decimal): number => d.exponent + digitCount(d) - 1;

/** Rounds to a multiple of 10^place. A value that is already coarser gets zeros: only do so where they are known. */
export function roundToPlace(d: Decimal, place: number, tie: Tie): Decimal {
  if (d.exponent >= place) {
    return { coefficient: d.coefficient * 10n ** BigInt(d.exponent - place), exponent: place };
  }
  const unit = 10n ** BigInt(place - d.exponent);
  const size = sizeOf(d.coefficient);
  let quotient = size / unit;
  const twice = 2n * (size % unit);
  if (twice > unit || (twice === unit && (tie === 'half-up' || quotient % 2n === 1n))) quotient += 1n;
  return { coefficient: d.coefficient < 0n ? -quotient : quotient, exponent: place };
}

/** Rounds to at most `digits` significant digits; a shorter number stays as it is. */
export function roundToDigits(d: Decimal, digits: number, tie: Tie = 'half-even'): Decimal {
  const excess = digitCount(d) - digits;
  if (excess <= 0) return d;
  const rounded = roundToPlace(d, d.exponent + excess, tie);
  // 9.996 to three digits is 10.00: one digit too many, and it is a zero.
  return digitCount(rounded) > digits
    ? { coefficient: rounded.coefficient / 10n, exponent: rounded.exponent + 1 }
    : rounded;
}

/** Positional notation: 12.50, 0.0031, 12300. */
export function writePlain(d: Decimal): string {
  const sign = d.coefficient < 0n ? '-' : '';
  const digits = sizeOf(d.coefficient).toString();
  if (d.exponent >= 0) return sign + (d.coefficient === 0n ? '0' : digits + '0'.repeat(d.exponent));
  const padded = digits.padStart(1 - d.exponent, '0');
  return `${sign}${padded.slice(0, d.exponent)}.${padded.slice(d.exponent)}`;
}

/** One digit before the point and a power of ten: 1.25e-7. */
export function writeScientific(d: Decimal): string {
  if (d.coefficient === 0n) return '0';
  const sign = d.coefficient < 0n ? '-' : '';
  const digits = sizeOf(d.coefficient).toString();
  const mantissa = digits.length > 1 ? `${digits.slice(0, 1)}.${digits.slice(1)}` : digits;
  return `${sign}${mantissa}e${leadingPlace(d)}`;
}

/** Sizes that read better without a power of ten, by the place of the leading digit. A habit of typography. */
const PLAIN_PLACES = { from: -5, to: 6 } as const;

/** Writes in the notation that reads better, showing exactly the digits of `d`. */
export function writeDecimal(d: Decimal): string {
  const place = leadingPlace(d);
  const zerosWouldBeInvented = d.exponent > 0 && d.coefficient !== 0n;
  const plain = place >= PLAIN_PLACES.from && place <= PLAIN_PLACES.to && !zerosWouldBeInvented;
  return plain || d.coefficient === 0n ? writePlain(d) : writeScientific(d);
}

/** At most `digits` significant digits of a decimal string; a text that is no decimal number comes back as it is. */
export function shorten(text: string, digits: number, tie: Tie = 'half-even'): string {
  const d = parseDecimal(text);
  return d === undefined ? text : writeDecimal(roundToDigits(d, digits, tie));
}
