/**
 * @module Sign pattern of the coefficients, counted in strides.
 *
 * Purpose    same signs point at the positive axis, alternating ones at the negative axis; a regular pattern that sets in
 *            late, or is broken once, must be told from no pattern at all.
 * Method     both patterns are tried; violations of the majority sign of the later half are listed.
 */
import type { Point } from './reading.js';

/** Heuristic: a regular pattern must hold for at least this many of the last coefficients … */
export const REGULAR_RUN = 4;
/** … and for this part of all of them. */
export const REGULAR_SHARE = 0.5;

export interface SignPattern {
  readonly kind: 'same' | 'alternating' | 'irregular';
  /** Index into the points from which on the pattern holds without a break. */
  readonly from: number;
  /** Indices into the points that break the pattern. */
  readonly breaks: readonly number[];
  /** Common sign after the pattern is divided out. */
  readonly sign: -1 | 1;
}

function tryPattern(points: readonly Point[], alternating: boolean): Omit<SignPattern, 'kind'> {
  const s = points.map((p) => (alternating && p.k % 2 === 1 ? -p.sign : p.sign));
  const half = s.slice(Math.floor(s.length / 2)).reduce((a: number, b) => a + b, 0);
  const sign = half >= 0 ? 1 : -1;
  const breaks: number[] = [];
  s.forEach((v, i) => {
    if (v !== sign) breaks.push(i);
  });
  const from = breaks.length === 0 ? 0 : breaks[breaks.length - 1]! + 1;
  return { from, breaks, sign };
}

/** Points must be non-zero ones. */
export function signPattern(points: readonly Point[]): SignPattern {
  const same = tryPattern(points, false);
  const alternating = tryPattern(points, true);
  const fewer = same.breaks.length - alternating.breaks.length || same.from - alternating.from;
  const better = fewer <= 0 ? same : alternating;
  const kind = better === same ? 'same' : 'alternating';
  const run = points.length - better.from;
  const regular = run >= REGULAR_RUN && run >= REGULAR_SHARE * points.length;
  return { kind: regular ? kind : 'irregular', ...better };
}
