/** @module What a Padé table entry is. */
import type { Rational } from '../rational.js';

/** Why an entry of the table is missing. */
export interface MissingEntry {
  readonly exists: false;
  readonly reason: string;
}

/** An entry p/q with q(0) = 1, coefficients ascending without trailing zeros (p = [] for the zero function). */
export interface PadeFraction<T> {
  readonly exists: true;
  readonly numerator: readonly T[];
  readonly denominator: readonly T[];
  /** min(L − deg p, M − deg q): positive inside a block of equal entries (deg 0 counts as −∞: then M − deg q). */
  readonly deficiency: number;
  /** Coefficients of the given series that p/q reproduces, counted from the first: at least L+M+1. */
  readonly contactOrder: number;
}

export type PadeEntry<T = Rational> = PadeFraction<T> | MissingEntry;

/** An entry that the precision at hand cannot decide. */
export interface UndecidedEntry {
  readonly exists: undefined;
  readonly reason: string;
}
