/**
 * @module Entries of the Padé table near its diagonal, for exact or enclosed coefficients.
 */
import { padeBall, padeExact, R } from '../numerics/index.js';
import type { Ball, Exact, Rational } from '../numerics/index.js';

/**
 * [L/M] with L + M = order and |L − M| <= width, best first: the smallest |L − M|, and of two equals the one with
 * M > L (a Borel transform of a physical series falls at large t; the toy comparisons of the tests bear it out).
 */
export function nearDiagonal(order: number, width: number): [number, number][] {
  const list: [number, number][] = [];
  for (let L = 0; L <= order; L++) {
    const M = order - L;
    if (M >= 1 && Math.abs(L - M) <= width) list.push([L, M]);
  }
  return list.sort((a, b) => Math.abs(a[0] - a[1]) - Math.abs(b[0] - b[1]) || a[0] - b[0]);
}

export type PadeOutcome =
  | {
      readonly exists: true;
      readonly numerator: readonly Ball[];
      readonly denominator: readonly Ball[];
      readonly exact?: { numerator: readonly Rational[]; denominator: readonly Rational[] };
      readonly deficiency: number;
    }
  | { readonly exists: false | undefined; readonly reason: string };

const kept = new WeakMap<readonly Exact[], Map<string, ReturnType<typeof padeExact>>>();

/** Exact [L/M], made once for a list: evaluations at rising precision ask for it again. */
function exactEntry(list: readonly Exact[], rationals: readonly Rational[], L: number, M: number) {
  const entries = kept.get(list) ?? new Map<string, ReturnType<typeof padeExact>>();
  kept.set(list, entries);
  const key = `${L}/${M}`;
  const entry = entries.get(key) ?? padeExact(rationals, L, M);
  entries.set(key, entry);
  return entry;
}

/** [L/M] of Σ c_n x^n: exactly when all coefficients are rational, else enclosed at `prec` bits. */
export function padeOf(c: readonly Exact[], L: number, M: number, prec: number): PadeOutcome {
  const used = c.slice(0, L + M + 1);
  const rationals = used.map((e) => e.rational).filter((q): q is Rational => q !== undefined);
  if (rationals.length === used.length) {
    const p = exactEntry(c, rationals, L, M);
    if (!p.exists) return { exists: false, reason: p.reason };
    return {
      exists: true,
      numerator: p.numerator.map((q) => R.fromRational(q, prec)),
      denominator: p.denominator.map((q) => R.fromRational(q, prec)),
      exact: { numerator: p.numerator, denominator: p.denominator },
      deficiency: p.deficiency,
    };
  }
  const p = padeBall(
    used.map((e) => e.ball(prec)),
    L,
    M,
    prec,
  );
  if (p.exists !== true) return { exists: p.exists, reason: p.reason };
  return { exists: true, numerator: p.numerator, denominator: p.denominator, deficiency: 0 };
}
