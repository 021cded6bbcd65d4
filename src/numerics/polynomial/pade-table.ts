/**
 * @module The near-diagonal part of the Padé table of an exact series.
 *
 * Purpose    the approximants whose spread is quoted as an error, with the missing and the repeated ones named.
 * Method     one run of Euclid's scheme passes all entries of an antidiagonal L + M = s in turn.
 * Bound      exact.
 * Reference  as pade-euclid.ts.
 */
import type { Rational } from '../rational.js';
import { EUCLID_ORDER, entryFromIntegers, finish } from './pade-exact.js';
import { euclidRows } from './pade-euclid.js';
import { fromOwnUnit, inOwnUnit } from './pade-scale.js';
import type { PadeEntry } from './pade-types.js';
import { toIntegers } from './rational-poly.js';

export interface TableEntry {
  readonly L: number;
  readonly M: number;
  readonly entry: PadeEntry;
}

export interface TableRange {
  readonly maxL?: number;
  readonly maxM?: number;
  /** Largest |L − M|; 2 by default. */
  readonly band?: number;
  /** Smallest L + M; 0 by default. */
  readonly minOrder?: number;
}

/** All [L/M] with L + M <= b.length − 1 in the range, by rising L + M, then falling L. */
export function padeTable(b: readonly Rational[], range: TableRange = {}): TableEntry[] {
  const { maxL = Infinity, maxM = Infinity, band = 2, minOrder = 0 } = range;
  const own = inOwnUnit(b);
  const { integers, content } = toIntegers(own?.coefficients ?? b);
  const out: TableEntry[] = [];
  const add = (L: number, M: number, entry: PadeEntry): void => {
    out.push({ L, M, entry: own === undefined ? entry : fromOwnUnit(entry, own) });
  };
  for (let order = minOrder; order < b.length; order++) {
    const degrees: number[] = [];
    for (let L = order; L >= 0; L--) {
      const M = order - L;
      if (Math.abs(L - M) <= band && L <= maxL && M <= maxM) degrees.push(L);
    }
    if (order >= EUCLID_ORDER) {
      for (const L of degrees) {
        add(L, order - L, entryFromIntegers(integers, content, b.length, L, order - L));
      }
      continue;
    }
    euclidRows(integers, order + 1, degrees).forEach(({ r, t }, i) => {
      const L = degrees[i]!;
      add(L, order - L, finish(r, t, integers, content, b.length, L, order - L));
    });
  }
  return out;
}
