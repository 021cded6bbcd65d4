/**
 * @module How good predictions with errors were: bias, coverage, sharpness, and one proper score.
 *
 * For value v ± s against a target T, all in units of |T|: miss m = (v − T)/|T|.
 *   bias       mean of m
 *   coverage   share of |m| <= w, w = √(s² + the target's own error²)
 *   sharpness  mean of s
 *   score      mean of 2 s + (2/α) max(0, |m| − w), α = 0.32: the interval score at 68 %; small is good, 0 is perfect.
 * A prediction without an error is scored as a point, w = 0: otherwise saying nothing would score best against a target that is
 * known badly.
 * The score is proper: on average it is least for the interval that one believes in; wide and wrong both cost.
 * Reference: T. Gneiting, A. E. Raftery, J. Am. Stat. Assoc. 102 (2007) 359, sec. 6.2 (from memory).
 */
import { R } from '../../numerics/index.js';
import type { Ball } from '../../numerics/index.js';
import type { Target } from './target.js';
import { COMPARE_BITS } from './target.js';

/** A conventional error counts as one of 68 %. */
export const LEVEL_68 = 0.32;
export const LEVEL_95 = 0.05;

/** One prediction against one target, relative to the target. */
export interface Miss {
  readonly hidden: number;
  readonly miss: number;
  /** Stated error; absent: none was stated. */
  readonly error?: number;
  readonly targetError: number;
}

export interface Score {
  readonly tested: number;
  readonly inside: number;
  readonly bias: number;
  /** Absent where an error is missing. */
  readonly sharpness?: number;
  readonly score: number;
  /** Largest |m|/w. */
  readonly worst: number;
}

/** Relative miss of a value; 0 where the enclosures overlap; undefined for a target that is not told from zero. */
export function missOf(hidden: number, value: Ball, error: number | undefined, target: Target): Miss | undefined {
  if (R.containsZero(target.value)) return undefined;
  const size = R.abs(target.value);
  const difference = R.sub(value, target.value, COMPARE_BITS);
  const relative = (x: number): number => R.toNumber(R.div(R.fromNumber(x), size, COMPARE_BITS));
  const miss = R.containsZero(difference) ? 0 : R.toNumber(R.div(difference, size, COMPARE_BITS));
  if (!Number.isFinite(miss) || (error !== undefined && !Number.isFinite(error))) return undefined;
  return {
    hidden,
    miss,
    ...(error === undefined ? {} : { error: relative(error) }),
    targetError: relative(target.error),
  };
}

/** Half-width that a miss is held against. */
const width = (m: Miss): number => Math.hypot(m.error ?? 0, m.targetError);

export const isInside = (m: Miss): boolean => Math.abs(m.miss) <= width(m);

/** Interval score of one prediction. */
const scoreOfOne = (m: Miss): number =>
  2 * (m.error ?? 0) + (2 / LEVEL_68) * Math.max(0, Math.abs(m.miss) - (m.error === undefined ? 0 : width(m)));

/** |m|/w. */
export const pull = (m: Miss): number => (m.miss === 0 ? 0 : Math.abs(m.miss) / width(m));

/** How far `at` lies outside low … high, whose half-width is widened by `error` in quadrature. */
export function outsideBy(low: number, high: number, at: number, error: number): number {
  const half = (high - low) / 2;
  return Math.max(0, Math.abs(at - (low + high) / 2) - (error === 0 ? half * (1 + 1e-12) : Math.hypot(half, error)));
}

/** Interval score of low … high (relative distances) for a truth at `at`, known to `error`. */
export const intervalScore = (low: number, high: number, at: number, error: number, alpha: number): number =>
  high - low + (2 / alpha) * outsideBy(low, high, at, error);

const mean = (list: readonly number[]): number => list.reduce((a, b) => a + b, 0) / list.length;

/** The scores of predictions; undefined without any. */
export function scoreOf(misses: readonly Miss[]): Score | undefined {
  if (misses.length === 0) return undefined;
  const errors = misses.flatMap((m) => (m.error === undefined ? [] : [m.error]));
  return {
    tested: misses.length,
    inside: misses.filter(isInside).length,
    bias: mean(misses.map((m) => m.miss)),
    ...(errors.length < misses.length ? {} : { sharpness: mean(errors) }),
    score: mean(misses.map(scoreOfOne)),
    worst: Math.max(...misses.map(pull)),
  };
}
