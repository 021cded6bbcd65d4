/**
 * @module What a prescription in doubles is: made once from a setting, given a coefficient list, then evaluated at many couplings.
 *
 * A kernel computes F of R = additive + factor · x^power · F(x), F = Σ c_n x^n, by the member of its family that the setting
 * names, and refuses where the prescription of that name refuses that member.
 */

export interface Kernel {
  /** Takes the coefficients c_0, c_1, …; false where the prescription refuses them. */
  prepare(c: Float64Array): boolean;
  /** F(x), x > 0, of the coefficients last taken; NaN where it has no value. Principal value where there is a choice. */
  value(x: number): number;
}

/** Σ_{n < count} c_n x^n. */
export function partialSum(c: Float64Array, count: number, x: number): number {
  let sum = 0;
  for (let n = count - 1; n >= 0; n--) sum = sum * x + c[n]!;
  return sum;
}
