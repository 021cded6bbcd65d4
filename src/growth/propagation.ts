/**
 * @module Errors of the coefficients carried through a Richardson table.
 *
 * Method     T_m is linear in the sequence, and each member depends on a few neighbouring coefficients: the derivatives with
 *            respect to ln c_k are summed and combined in quadrature, the errors being taken as independent.
 */
import type { Point } from './reading.js';
import { richardsonWeights } from './richardson.js';

/** Propagated error of T_m for a sequence whose k-th member changes by Σ_j stencil[j](k)·ε_{k−j}. */
export function noiseOf(points: readonly Point[], stencil: readonly ((k: number) => number)[]): (m: number) => number {
  const lastK = points[points.length - 1]!.k;
  const sigma = new Map(points.map((p) => [p.k, p.sigma]));
  return (m) => {
    const w = richardsonWeights(lastK, m);
    const total = new Map<number, number>();
    w.forEach((v, i) => {
      const k = lastK - m + i;
      stencil.forEach((f, j) => total.set(k - j, (total.get(k - j) ?? 0) + v * f(k)));
    });
    let sum = 0;
    for (const [k, v] of total) sum += (v * (sigma.get(k) ?? 0)) ** 2;
    return Math.sqrt(sum);
  };
}
