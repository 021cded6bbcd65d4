/**
 * @module Rough costs of BigInt operations, to choose between methods. They decide speed only, never correctness.
 *
 * Method     fits in microseconds to Node 20 on the machine of docs/benchmarks.md: operands of 192 to 3,400 bits.
 */

const words = (bits: number): number => bits / 64;

/** A full product with its shift back. */
export function productCost(bits: number): number {
  const w = words(bits);
  return 0.055 + 0.0012 * w * w;
}

/** Division by a small integer with the addition that follows. */
export function smallDivisionCost(bits: number): number {
  return 0.045 + 0.0065 * words(bits);
}

/** `terms` terms of the column sum of exponential-sum.ts. */
export function columnSumCost(terms: number, bits: number, complex: boolean): number {
  const full = 2.5 * Math.sqrt(terms) * productCost(bits);
  const small = 2 * terms * smallDivisionCost(bits);
  return complex ? 4 * full + 2 * small : full + small;
}

/** `terms` steps of the backward recurrence of stieltjes-fraction.ts. */
export function fractionCost(terms: number, bits: number, complex: boolean): number {
  const step = complex ? 4 * productCost(bits) + 0.5 : productCost(bits) + 0.3;
  return terms * step;
}
