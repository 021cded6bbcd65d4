/**
 * @module [L/M] of a series known by enclosures of its coefficients.
 *
 * Purpose    coefficients with π or ζ(3) in them, and exact ones of orders where exact arithmetic grows too long.
 * Method     Chebyshev's algorithm on the moments b_{L−M+1}, b_{L−M+2}, … in O(M²) balls (for L < M−1 on the reciprocal
 *            series: [L/M] of b is 1/[M/L] of 1/b); where a pivot may vanish, elimination with row pivoting; where that
 *            fails and all coefficients are exact, Euclid in integers.
 * Bound      balls: every series in the input balls has its approximant in the output balls. About 11 bits are lost per
 *            order M for a Borel transform with two branch points.
 * Reference  as in pade-moments.ts; G. A. Baker, P. Graves-Morris, "Padé Approximants", section 1.5 (duality).
 */
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import { ballField, type Field } from '../field.js';
import { checkOrders, padeExact } from './pade-exact.js';
import { dropZeros, numeratorOf, padeField } from './pade-field.js';
import { jacobiFromMoments, reversedOrthogonal, type JacobiCoefficients } from './pade-moments.js';
import type { PadeEntry, PadeFraction, UndecidedEntry } from './pade-types.js';

/**
 * [L/M] of Σ b_n x^n, working with `prec` bits. `exists: undefined` when this precision cannot tell a determinant from
 * zero. Throws RangeError as padeExact does.
 */
export function padeBall(b: readonly Ball[], L: number, M: number, prec: number): PadeEntry<Ball> | UndecidedEntry {
  const normal = padeNormal(b, L, M, prec);
  if (normal !== undefined) return normal.entry;
  const pivoted = padeField(ballField(prec), b, L, M);
  if (pivoted.exists !== undefined || !b.every((c) => c.rad === 0)) return pivoted;
  const exact = padeExact(b.map(R.midpoint), L, M);
  if (!exact.exists) return exact;
  return {
    ...exact,
    numerator: exact.numerator.map((c) => R.fromRational(c, prec)),
    denominator: exact.denominator.map((c) => R.fromRational(c, prec)),
  };
}

/** An entry reached along normal entries, with the continued fraction of its denominator where there is one. */
export interface NormalEntry {
  readonly entry: PadeFraction<Ball>;
  readonly jacobi?: JacobiCoefficients<Ball>;
}

/** The O(M²) way; undefined when a pivot on the way may vanish. */
export function padeNormal(b: readonly Ball[], L: number, M: number, prec: number): NormalEntry | undefined {
  checkOrders(b.length, L, M);
  const field = ballField(prec);
  const found = (numerator: Ball[], denominator: Ball[]): PadeFraction<Ball> => ({
    exists: true,
    numerator,
    denominator: dropZeros(field, denominator),
    deficiency: 0,
    contactOrder: L + M + 1,
  });
  if (L >= M - 1) {
    const jacobi = jacobiFromMoments(field, b.slice(L - M + 1, L + M + 1));
    if (jacobi === undefined) return undefined;
    const q = reversedOrthogonal(field, jacobi);
    return { entry: found(numeratorOf(field, q, b, L), q), jacobi };
  }
  const inverse = reciprocalSeries(field, b, L + M + 1);
  if (inverse === undefined) return undefined;
  const jacobi = jacobiFromMoments(field, inverse.slice(M - L + 1, L + M + 1));
  if (jacobi === undefined) return undefined;
  const q = reversedOrthogonal(field, jacobi);
  const p = numeratorOf(field, q, inverse, M);
  const scaled = (a: Ball[]): Ball[] => a.map((c) => R.mul(c, b[0]!, prec));
  return { entry: found(scaled(q), [R.ONE, ...scaled(p.slice(1))]) };
}

/** First n coefficients of 1/Σ b_k x^k; undefined when b_0 may be zero. */
function reciprocalSeries(field: Field<Ball>, b: readonly Ball[], n: number): Ball[] | undefined {
  if (!field.isNonZero(b[0]!)) return undefined;
  const first = field.div(field.one, b[0]!);
  const out = [first];
  for (let k = 1; k < n; k++) {
    let sum = field.zero;
    for (let j = 1; j <= k; j++) sum = field.add(sum, field.mul(b[j]!, out[k - j]!));
    out.push(field.neg(field.mul(sum, first)));
  }
  return out;
}
