/**
 * @module Levin's t, u, d, v and Weniger's δ in doubles, as explicit ratios of sums.
 *
 *   L = Σ_j B_j s_j/ω_j / Σ_j B_j/ω_j,   B_j = (−1)^j C(K, j) ((1+j)/(1+K))^{K−1}             (Levin),
 *                                        B_j = (−1)^j C(K, j) (1+j)_{K−1}/(1+K)_{K−1}         (δ),
 * with the remainder estimates ω of sequences/levin.ts and β = 1; K + 1 of them are used. Sums are counted from the first one, so
 * that less cancels. Refuses coefficients that do not alternate strictly from `start` on; the terms before stand apart.
 * Bound      about a digit an order is lost, as in the recursion; twelve terms are what doubles bear.
 * Reference  E. J. Weniger, Comput. Phys. Rep. 10 (1989) 189, arXiv:math/0306302, eqs. (7.1-7), (8.2-7) (memory; equals the
 *            recursion of sequences/levin.ts in the tests).
 */
import type { Kernel } from './kernel.js';
import { partialSum } from './kernel.js';
import { alternates } from './alternation.js';

export interface LevinSetting {
  readonly kind: 'levin' | 'weniger-delta';
  readonly variant: 't' | 'u' | 'd' | 'v';
  readonly count: number;
  readonly start: number;
}

function weights({ kind }: LevinSetting, K: number): Float64Array {
  const list = new Float64Array(K + 1);
  let binomial = 1;
  for (let j = 0; j <= K; j++) {
    let growth = 1;
    for (let i = 0; i < K - 1; i++) growth *= kind === 'levin' ? (1 + j) / (1 + K) : (1 + j + i) / (1 + K + i);
    list[j] = (j % 2 === 0 ? binomial : -binomial) * growth;
    binomial = (binomial * (K - j)) / (j + 1);
  }
  return list;
}

export function levinKernel(setting: LevinSetting): Kernel {
  const { variant, count, start } = setting;
  const terms = count - start;
  const needsNext = variant === 'd' || variant === 'v';
  const K = terms - (needsNext ? 2 : 1);
  const B = weights(setting, Math.max(0, K));
  const a = new Float64Array(terms);
  let c: Float64Array = new Float64Array(count);
  const omega = (j: number): number => {
    switch (variant) {
      case 't':
        return a[j]!;
      case 'u':
        return (1 + j) * a[j]!;
      case 'd':
        return a[j + 1]!;
      case 'v':
        return (a[j]! * a[j + 1]!) / (a[j]! - a[j + 1]!);
    }
  };
  return {
    prepare(coefficients) {
      c = coefficients;
      return K >= 0 && alternates(c, start, count);
    },
    value(x) {
      let power = x ** start;
      for (let n = 0; n < terms; n++) {
        a[n] = c[start + n]! * power;
        power *= x;
      }
      let numerator = 0;
      let denominator = 0;
      let sum = 0; // s_j − s_0
      for (let j = 0; j <= K; j++) {
        if (j > 0) sum += a[j]!;
        const weight = B[j]! / omega(j);
        numerator += weight * sum;
        denominator += weight;
      }
      const value = partialSum(c, start, x) + a[0]! + numerator / denominator;
      return Number.isFinite(value) ? value : NaN;
    },
  };
}
