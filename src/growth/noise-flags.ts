/** @module Flags for noise and rounding, with the number of coefficients that a rational approximant may use. */
import type { GrowthFlag, GrowthInput } from './growth.js';
import { usableCoefficients } from './noise.js';
import type { Prepared } from './prepare.js';
import { short } from './words.js';

/** Quoted errors that stay within this factor of each other, on most coefficients, come from a number of digits. */
const UNIFORM = 40;
/** … but not all equal: an error in per cent is an error, not a number of digits. */
const EQUAL = 1.01;
const MOST = 0.6;
/** Decimal coefficients with at most this many digits count as rounded, when scatter is seen too. */
const FEW_DIGITS = 8;
/** Number of leading coefficients that a rational approximant may use; undefined when that is all of them. */
export function usableOf(p: Prepared): number | undefined {
  const known = p.points.filter((x) => x.sign !== 0);
  let errors = known.map((x) => (x.repaired === true ? Infinity : x.quoted));
  if (p.sequence.unknownFrom !== undefined)
    errors = errors.slice(0, known.filter((x) => x.n < p.sequence.unknownFrom!).length);
  const usable = usableCoefficients(errors);
  return usable < known.length || p.sequence.unknownFrom !== undefined ? usable : undefined;
}

/** Largest number of significant decimal digits among the coefficients; undefined when one is not a decimal number. */
function decimalDigits(input: GrowthInput): number | undefined {
  let most = 0;
  for (const e of input.exact ?? []) {
    const q = e.rational;
    if (q === undefined) return undefined;
    let den = q.den;
    while (den % 10n === 0n) den /= 10n;
    while (den % 2n === 0n) den /= 2n;
    while (den % 5n === 0n) den /= 5n;
    if (den !== 1n) return undefined;
    const digits = (q.num < 0n ? -q.num : q.num) * 5n ** BigInt(Math.max(0, q.den.toString(2).length - 1));
    most = Math.max(most, digits.toString().replace(/0+$/, '').length);
    if (most > FEW_DIGITS) return most;
  }
  return input.exact === undefined ? undefined : most;
}

export function noiseFlags(p: Prepared, input: GrowthInput, usable: number | undefined): GrowthFlag[] {
  const flags: GrowthFlag[] = [];
  const advice = usable === undefined ? '' : `; a rational approximant may use the first ${usable}`;
  if (p.noise !== undefined) {
    const digits = decimalDigits(input);
    if (digits !== undefined && digits <= FEW_DIGITS) {
      flags.push({ code: 'few-digits', text: `the coefficients are rounded to ${digits} significant digits${advice}` });
    }
    flags.push({
      code: 'noisy',
      text: `the coefficients scatter by a relative ${short(p.noise, 2)} about a smooth law${advice}`,
    });
    return flags;
  }
  const quoted = p.nonZero.filter((x) => x.repaired !== true && x.quoted > 0).map((x) => x.quoted);
  if (quoted.length === 0) return flags;
  const largest = Math.max(...quoted);
  const spread = largest / Math.min(...quoted);
  if (usable === undefined) return flags;
  const digitLike = quoted.length >= MOST * p.nonZero.length && spread < UNIFORM && spread > EQUAL && largest < 0.01;
  if (digitLike) {
    const digits = Math.max(1, Math.round(-Math.log10(largest)));
    flags.push({
      code: 'few-digits',
      text: `the coefficients are known to about ${digits} significant digits${advice}`,
    });
  } else if (p.outliers.length === 0) {
    flags.push({ code: 'noisy', text: `the coefficients have relative errors up to ${short(largest, 2)}${advice}` });
  }
  return flags;
}
