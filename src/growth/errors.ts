/**
 * @module Which errors the coefficients really have: quoted, unquoted, or common to all of them.
 *
 * Purpose    noise that nobody quoted must widen the fits; quoted errors that the coefficients do not show, because
 *            neighbours share them, must not drown the ratio test.
 * Method     the roughness of the tail against the quoted errors. Errors far above it move neighbours together: ratios are
 *            taken as known to the roughness, and the position gets the drift (error of the last coefficient)/n that a common
 *            factor (1 + ε)^n would hide.
 * Bound      heuristic constants below.
 */
import { roughness } from './noise.js';
import type { Point } from './reading.js';

/** A scatter counts as unquoted when it is larger than this many times the quoted error. */
const UNQUOTED = 3;
/** Quoted errors are common ones when they exceed the roughness by this factor. */
const COMMON = 5;

export interface ErrorModel {
  /** Scatter seen in the coefficients beyond their quoted errors. */
  readonly noise?: number;
  /** Relative error of T per step from errors common to neighbours. */
  readonly drift?: number;
  readonly apply: (p: Point) => Point;
}

export function errorModel(tail: readonly Point[], regular: boolean): ErrorModel {
  const seen = regular ? roughness(tail) : undefined;
  const last = tail.at(-1);
  const median = tail.map((p) => p.quoted).sort((a, b) => a - b)[Math.floor(tail.length / 2)] ?? 0;
  if (seen === undefined || last === undefined) return { apply: (p) => p };
  if (seen.noise && seen.level > UNQUOTED * median) {
    const noise = seen.level;
    const apply = (p: Point): Point => ({
      ...p,
      sigma: Math.hypot(p.sigma, noise),
      quoted: Math.hypot(p.quoted, noise),
    });
    return { noise, apply };
  }
  if (median > COMMON * seen.level) {
    const apply = (p: Point): Point => ({ ...p, sigma: Math.min(p.sigma, seen.level) });
    return { drift: last.quoted / Math.max(1, last.k), apply };
  }
  return { apply: (p) => p };
}
