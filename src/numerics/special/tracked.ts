/**
 * @module A complex product of many factors, kept as an exact number with a relative error beside it.
 *
 * Purpose    terms of series. In rectangles every turn by 45° widens the radii by √2, and after a thousand terms nothing is left.
 * Method     value·(1 + η) with |η| <= error, a magnitude. A factor is a rectangle of its own; the product's radius against its modulus is
 *            what the step adds.
 * Bound      (1 + η)(1 + ρ) − 1 is at most error + ρ + error·ρ.
 */
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import { addMag, divMag, mulMag } from '../ball/mag.js';
import type { Mag } from '../ball/mag.js';
import { modulusLower, modulusUpper, radiusOf } from './spread.js';

export interface Tracked {
  /** Radii are zero. */
  readonly value: Complex;
  readonly error: Mag;
}

const NONE: Mag = { m: 0, e: 0 };
export const TRACKED_ONE: Tracked = { value: C.ONE, error: NONE };

/** t·f. */
export function timesTracked(t: Tracked, f: Complex, bits: number): Tracked {
  const p = C.mul(t.value, f, bits);
  const radius = radiusOf(p);
  if (radius.m === 0) return { value: p, error: t.error };
  const value = C.exactMid(p);
  const own = divMag(radius, modulusLower(value));
  return { value, error: addMag(addMag(t.error, own), mulMag(t.error, own)) };
}

/** Bound of |t − value|. */
export function absoluteError(t: Tracked): Mag {
  return t.error.m === 0 ? NONE : mulMag(t.error, modulusUpper(t.value));
}
