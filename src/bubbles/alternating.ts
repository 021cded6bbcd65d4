/**
 * @module Sums of alternating series by Chebyshev polynomials.
 *
 * Purpose    towers of Borel poles with residues of alternating sign that fall off like a power only.
 * Method     Σ_{k>=0} (−1)^k a_k ≈ Σ_{k<n} (c_k/d) a_k with integers c_k and d = T_n(3): for a_k = ∫_0^1 x^k dμ(x) that is
 *            ∫ (1 − P(x)/P(−1))/(1+x) dμ with P(x) = T_n(1−2x), d = P(−1).
 * Bound      |P| <= 1 on [0, 1], so the error is at most (∫|dμ|)/d, d > (3+√8)^n/2: 2.54 bits a term. The caller knows a
 *            bound of the total variation ∫|dμ|.
 * Reference  H. Cohen, F. Rodriguez Villegas, D. Zagier, Exp. Math. 9 (2000) 3, algorithm 1 (from memory).
 */
import { R } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';

/** log2(3+√8). */
const BITS_A_TERM = 2.5431;

export interface Weights {
  /** c_0 … c_(n−1), with their signs. */
  readonly c: readonly bigint[];
  readonly d: bigint;
  /** log2 d, rounded down. */
  readonly bits: number;
}

const known = new Map<number, Weights>();

function compute(n: number): Weights {
  // T_n(3) by its recurrence.
  let [before, d] = [1n, 3n];
  for (let k = 1; k < n; k++) [before, d] = [d, 6n * d - before];
  const c: bigint[] = [];
  let b = -1n;
  let weight = -d;
  for (let k = 0; k < n; k++) {
    weight = b - weight;
    c.push(weight);
    b = (b * BigInt(2 * (k + n) * (k - n))) / BigInt((2 * k + 1) * (k + 1));
  }
  return { c, d, bits: Math.floor(BITS_A_TERM * n - 1.01) };
}

/** Weights of n terms. */
export function alternatingWeights(n: number): Weights {
  const have = known.get(n) ?? compute(n);
  known.set(n, have);
  return have;
}

/** Terms for an error of 2^-bits times the total variation. */
export const alternatingLength = (bits: number): number => Math.max(4, Math.ceil((bits + 2) / BITS_A_TERM));

/** Σ (−1)^k a_k from a_0 … a_(n−1), without the error of the rule. */
export function weightedSum(a: readonly Ball[], { c, d }: Weights, prec: number): Ball {
  let sum: Ball = R.ZERO;
  a.forEach((term, k) => {
    sum = R.add(sum, R.mul(term, R.fromNumber(c[k]!), prec + 8), prec + 8);
  });
  return R.div(sum, R.fromNumber(d), prec);
}
