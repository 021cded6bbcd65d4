/**
 * @module Rounding as the Particle Data Group rounds.
 *
 * Method: the three leading digits of the error decide. 100 to 354: the error keeps two digits; 355 to 949: one;
 * 950 to 999: it becomes 1000 and keeps two. The value is rounded to the same place. Of several errors the smallest
 * decides the place for all; a +/− pair that differs by less than 10 % of its mean is replaced by the mean.
 * Errors round half-up, values half-even, both on decimal strings, so no binary tie is ever misjudged.
 * Reference: Particle Data Group, Review of Particle Physics, Introduction, section 5.3 (Phys. Rev. D 98 (2018) 030001);
 * the smallest of several errors: the same rule applied so that no component loses its digits.
 */
import type { Decimal } from './decimal.js';
import { digitCount, leadingPlace, parseDecimal, roundToPlace, writePlain } from './decimal.js';

/** A symmetric error, or the upward and downward parts of an asymmetric one; decimal strings, sign ignored. */
export type ErrorText = string | { readonly plus: string; readonly minus: string };

/** A rounded error; plus and minus are equal for a symmetric one. */
export interface RoundedError {
  readonly plus: Decimal;
  readonly minus: Decimal;
  readonly symmetric: boolean;
}

export interface RoundedValue {
  readonly value: Decimal;
  readonly errors: readonly RoundedError[];
}

const size = (d: Decimal): Decimal => ({
  ...d,
  coefficient: d.coefficient < 0n ? -d.coefficient : d.coefficient,
});

/** Both on the finer of the two exponents. */
function alike(a: Decimal, b: Decimal): readonly [bigint, bigint, number] {
  const exponent = Math.min(a.exponent, b.exponent);
  return [roundToPlace(a, exponent, 'half-up').coefficient, roundToPlace(b, exponent, 'half-up').coefficient, exponent];
}

/** The place (power of ten) of the last digit that an error of this size keeps; undefined for zero. */
export function pdgPlace(error: Decimal): number | undefined {
  if (error.coefficient === 0n) return undefined;
  const leading = leadingPlace(error);
  const e = size(error);
  const excess = digitCount(e) - 3;
  const three = excess >= 0 ? e.coefficient / 10n ** BigInt(excess) : e.coefficient * 10n ** BigInt(-excess);
  if (three <= 354n) return leading - 1;
  return leading;
}

/** An error in its final form before rounding: the mean where the two sides differ by less than 10 % of it. */
function settle(error: ErrorText): RoundedError | undefined {
  if (typeof error === 'string') {
    const d = parseDecimal(error);
    return d === undefined ? undefined : { plus: size(d), minus: size(d), symmetric: true };
  }
  const up = parseDecimal(error.plus);
  const down = parseDecimal(error.minus);
  if (up === undefined || down === undefined) return undefined;
  const [plus, minus] = [size(up), size(down)];
  const [p, m, exponent] = alike(plus, minus);
  const gap = p > m ? p - m : m - p;
  // |p − m| < 10 % of (p + m)/2; the mean may need one more digit.
  if (p === m || 20n * gap < p + m) {
    const mean: Decimal = { coefficient: (p + m) * 5n, exponent: exponent - 1 };
    return { plus: mean, minus: mean, symmetric: true };
  }
  return { plus, minus, symmetric: false };
}

/**
 * Rounds a value and its errors together.
 *
 * @param value decimal string
 * @param errors one or more errors; those that are zero keep their zero and decide nothing
 * @returns undefined when a text is no decimal number, or when no error is different from zero: then nothing says
 * where to round, and the value must be quoted as it is
 */
export function roundPdg(value: string, errors: readonly ErrorText[]): RoundedValue | undefined {
  const centre = parseDecimal(value);
  const settled = errors.map(settle);
  if (centre === undefined || !settled.every((e) => e !== undefined)) return undefined;
  const places = settled.flatMap((e) => [pdgPlace(e.plus), pdgPlace(e.minus)]).filter((p) => p !== undefined);
  if (places.length === 0) return undefined;
  const place = Math.min(...places);
  return {
    value: roundToPlace(centre, place, 'half-even'),
    errors: settled.map((e) => ({
      plus: roundToPlace(e.plus, place, 'half-up'),
      minus: roundToPlace(e.minus, place, 'half-up'),
      symmetric: e.symmetric,
    })),
  };
}

/** Beyond these places of the leading digit a common power of ten is taken out. A habit of typography. */
const PLAIN_PLACES = { from: -4, to: 5 } as const;

function commonPower(rounded: RoundedValue): number {
  const numbers = [rounded.value, ...rounded.errors.flatMap((e) => [e.plus, e.minus])];
  const top = Math.max(...numbers.filter((d) => d.coefficient !== 0n).map(leadingPlace));
  return top < PLAIN_PLACES.from || top > PLAIN_PLACES.to ? top : 0;
}

const scaled = (d: Decimal, power: number): Decimal => ({ ...d, exponent: d.exponent - power });

/**
 * "0.83 ± 0.12", "0.118 +0.004 −0.003", "(1.23 ± 0.04 ± 0.11)e-9": value and errors in the order given, each error
 * followed by its label if there is one ("0.83 ± 0.12 (truncation)").
 */
export function writePlusMinus(rounded: RoundedValue, labels: readonly string[] = []): string {
  const power = commonPower(rounded);
  const write = (d: Decimal): string => writePlain(scaled(d, power));
  const errors = rounded.errors.map((e, i) => {
    const label = labels[i];
    const text = e.symmetric ? `± ${write(e.plus)}` : `+${write(e.plus)} −${write(e.minus)}`;
    return label === undefined ? text : `${text} (${label})`;
  });
  const body = [write(rounded.value), ...errors].join(' ');
  return power === 0 ? body : `(${body})e${power}`;
}

/** "0.83(12)", "1.23(4)(11)e-9": the errors in units of the last digit. Undefined for an asymmetric error. */
export function writeParentheses(rounded: RoundedValue): string | undefined {
  if (rounded.errors.some((e) => !e.symmetric)) return undefined;
  const power = commonPower(rounded);
  const errors = rounded.errors.map((e) => {
    const { coefficient, exponent } = scaled(e.plus, power);
    return `(${exponent > 0 ? coefficient * 10n ** BigInt(exponent) : coefficient})`;
  });
  return `${writePlain(scaled(rounded.value, power))}${errors.join('')}${power === 0 ? '' : `e${power}`}`;
}
