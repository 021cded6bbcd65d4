/**
 * @module What a prediction is held against.
 *
 * exact        the exact value, where one is given;
 * measurement  the measured value of the file, with its error (no unit: the same number as the sum);
 * known sum    the sum of all known terms, as long as the hidden ones still fall: beyond the least term a partial sum is
 *              no target;
 * own value    what the same method says with all known terms: a test of stability, not of correctness.
 */
import { R } from '../../numerics/index.js';
import type { Ball } from '../../numerics/index.js';
import type { Growth } from '../../growth/index.js';
import { leastTerm, partialSums, terms } from '../../prescriptions/index.js';
import type { Expansion, Series, Uncertain } from '../../series/index.js';

export type TargetKind = 'exact' | 'measurement' | 'known sum' | 'own value';

export interface Target {
  readonly kind: TargetKind;
  readonly value: Ball;
  /** One standard deviation of the target itself, absolute. */
  readonly error: number;
}

/** Bits of values that are compared; predictions rarely agree to more. */
export const COMPARE_BITS = 256;

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

/** The targets that do not depend on the method, best first. */
export function commonTargets(series: Series, e: Expansion, growth: Growth, exactValue?: Uncertain): Target[] {
  const list: Target[] = [];
  if (exactValue !== undefined)
    list.push({ kind: 'exact', value: exactValue.value.ball(COMPARE_BITS), error: errorOf(exactValue) });
  const { measurement } = series;
  if (measurement !== undefined && measurement.unit === undefined)
    list.push({
      kind: 'measurement',
      value: measurement.value.ball(COMPARE_BITS),
      error: errorOf(measurement),
    });
  const sum = partialSums(e, COMPARE_BITS).at(-1);
  if (sum !== undefined && stillFalling(e, growth)) list.push({ kind: 'known sum', value: sum, error: 0 });
  return list;
}

const WORDS: Readonly<Record<TargetKind, string>> = {
  exact: 'the exact value given',
  measurement: 'the measured value of the file, with its error; power corrections are part of it',
  'known sum':
    'the sum of all known terms, which still fall: it lies nearer to the truth than what was seen, but misses the terms nobody knows',
  'own value':
    "the same method's value with all known terms: the terms have passed their least one, so that their sum is no target; this tests stability, not correctness",
};

/** What the target is, in words. */
export const targetWords = (kind: TargetKind): string => WORDS[kind];
