/**
 * @module Truncation error of a Padé-type sum from its neighbours in the table.
 *
 * (1) the range over the entries of the same order, (2) the step from the central entry of the order before;
 * combined in quadrature. (Coefficient noise is propagated apart, as the input error.) Of a lacunary series, such as an even
 * one, neighbouring entries are the same function: their agreement says nothing, and the order before is the one without the
 * last coefficient other than zero.
 * Reference: the recipes compared in D. Boito, P. Masjuan, F. Oliani, JHEP 08 (2018) 075, arXiv:1807.01567 (memory).
 */
import { R } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import type { Expansion } from '../series/index.js';
import type { Sum } from './prescription.js';
import { prefactor } from './prescription.js';

/** Two orders that agree to this relative size are called converged. */
export const CONVERGED = 1e-6;

/** Entries closer than this, relative to their size, are taken for the same function. */
const COINCIDE = 1e-12;

/** The sum with its trust: converged when its truncation error is below CONVERGED of it. */
export function withTrust(sum: Sum): Sum {
  const converged = sum.truncation !== undefined && sum.truncation <= CONVERGED * Math.abs(R.toNumber(sum.value));
  return { ...sum, trust: converged ? 'converged' : 'indicative' };
}

/** Step between the powers with a coefficient other than zero, counted from the first such one; 1 where there is no common one. */
function strideOf(c: readonly Exact[]): number {
  const places = c.flatMap((a, n) => (a.rational?.isZero() === true ? [] : [n]));
  const gcd = (a: number, b: number): number => (b === 0 ? a : gcd(b, a % b));
  return Math.max(
    1,
    places.reduce((g, n) => gcd(g, n - places[0]!), 0),
  );
}

/** How many coefficients the order before has: one fewer; of a lacunary series those before the last one that is not zero. */
export function countBefore(c: readonly Exact[]): number {
  if (strideOf(c) === 1) return c.length - 1;
  let last = c.length - 1;
  while (last > 0 && c[last]!.rational?.isZero() === true) last--;
  return last;
}

export interface NeighbourErrors {
  readonly truncation?: number;
  readonly central?: boolean;
}

/**
 * @param values F values of the entries of one order, best first; undefined where the entry does not stand.
 * @param before F value of the order before, if any.
 * @returns errors of the i-th entry, in units of R; the first standing entry is marked central.
 */
export function combineErrors(
  e: Expansion,
  values: readonly (Ball | undefined)[],
  before: Ball | undefined,
): (i: number) => NeighbourErrors {
  const scale = Math.abs(R.toNumber(prefactor(e, 64)));
  const standing = values.filter((v): v is Ball => v !== undefined);
  const centre = values.findIndex((v) => v !== undefined);
  // Differences are taken on the balls: neighbours may agree far beyond double precision.
  const range = standing.reduce((m, a) => Math.max(m, ...standing.map((b) => distance(a, b))), 0);
  return (i) => {
    const v = values[i];
    if (v === undefined) return {};
    const step = before === undefined ? undefined : distance(v, before);
    // Without an order before, entries that coincide (but for rounding) are one entry.
    if (step === undefined && range <= COINCIDE * distance(v, R.ZERO)) return i === centre ? { central: true } : {};
    return { truncation: scale * Math.hypot(range, step ?? 0), ...(i === centre ? { central: true } : {}) };
  };
}

function distance(a: Ball, b: Ball): number {
  return Math.abs(R.toNumber(R.sub(a, b, 128)));
}
