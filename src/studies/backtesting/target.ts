/**
 * @module What a prediction is held against.
 *
 * exact        the exact value, where one is given;
 * measurement  the measured value of the file, with its error (no unit: the same number as the sum);
 * known sum    the sum of all known terms, with the error of a fixed-order sum: it misses the terms that nobody knows. Only
 *              as long as the hidden ones still fall: beyond the least term a partial sum is no target;
 * own value    what the same method says with all known terms: a test of stability, not of correctness.
 */
import { R, toNumberExact } from '../../numerics/index.js';
import type { Ball } from '../../numerics/index.js';
import type { Growth } from '../../growth/index.js';
import { CONTOUR_NAMES, leastTerm, partialSums, PRESCRIPTIONS, terms } from '../../prescriptions/index.js';
import type { Expansion, ReadNumber, Series, Uncertain } from '../../series/index.js';

export type TargetKind = 'exact' | 'measurement' | 'known sum' | 'own value';

export interface Target {
  readonly kind: TargetKind;
  readonly value: Ball;
  /** One standard deviation of the target itself, absolute. */
  readonly error: number;
}

/** Bits of values that are compared; predictions rarely agree to more. */
export const COMPARE_BITS = 256;

const ERROR_DIGITS = 6;
const CONVERGING = ['convergent', 'geometric', 'terminating'];

/** Do the known terms fall to the last one? Only then is their sum nearer to the truth than the sums before it. */
export function stillFalling(e: Expansion, growth: Growth): boolean {
  if (CONVERGING.includes(growth.verdict)) return true;
  const t = terms(e, COMPARE_BITS);
  const least = leastTerm(t);
  return (
    least !== undefined && least.tiedWith === undefined && least.index === t.findLastIndex((b) => !R.isExactZero(b))
  );
}

const errorOf = (n: Uncertain): number =>
  n.error === undefined ? 0 : (n.error.plus.toNumber() + n.error.minus.toNumber()) / 2;

/** Fewer digits than this are taken as written short (0.5), not as rounded; a heuristic, the same as for coefficients. */
const ROUNDED_DIGITS = 3;

/** The error of a number given as exact: quoted, or half a unit of its last digit where it is a rounded decimal. */
function exactError(n: ReadNumber): number {
  if (n.error !== undefined) return errorOf(n);
  const size = Math.abs(toNumberExact(n.value));
  if (n.significantDigits === undefined || n.significantDigits < ROUNDED_DIGITS || size === 0) return 0;
  return 0.5 * 10 ** (Math.floor(Math.log10(size)) - n.significantDigits + 1);
}

/** What the sum of all known terms misses, by the recipe of the fixed-order prescription. */
function fixedOrderError(e: Expansion, growth: Growth): number {
  const fixed = PRESCRIPTIONS.find((p) => p.name === 'fixed-order')?.apply(e, growth, { digits: ERROR_DIGITS })[0];
  return fixed?.kind === 'sum' ? (fixed.truncation ?? 0) : 0;
}

/** Is this a target for that method? The fixed-order sum is none for the contour-improved one, which tends elsewhere. */
export const isTargetOf = (target: Target, prescription: string): boolean =>
  target.kind !== 'known sum' || prescription !== CONTOUR_NAMES.improved.name;

/** The targets that do not depend on the method, best first. */
export function commonTargets(series: Series, e: Expansion, growth: Growth, exactValue?: ReadNumber): Target[] {
  const list: Target[] = [];
  if (exactValue !== undefined)
    list.push({ kind: 'exact', value: exactValue.value.ball(COMPARE_BITS), error: exactError(exactValue) });
  const { measurement } = series;
  if (measurement !== undefined && measurement.unit === undefined)
    list.push({
      kind: 'measurement',
      value: measurement.value.ball(COMPARE_BITS),
      error: errorOf(measurement),
    });
  const sum = partialSums(e, COMPARE_BITS).at(-1);
  if (sum !== undefined && stillFalling(e, growth))
    list.push({ kind: 'known sum', value: sum, error: fixedOrderError(e, growth) });
  return list;
}

const WORDS: Readonly<Record<TargetKind, string>> = {
  exact: 'the exact value given',
  measurement: 'the measured value of the file, with its error; power corrections are part of it',
  'known sum':
    'the sum of all known terms, which still fall; its own error, that of a fixed-order sum for the terms nobody knows, is allowed for',
  'own value':
    "the same method's value with all known terms: the terms have passed their least one, so that their sum is no target; this tests stability, not correctness",
};

/** What the target is, in words. */
export const targetWords = (kind: TargetKind): string => WORDS[kind];
