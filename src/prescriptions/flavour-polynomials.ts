/**
 * @module Coefficients as polynomials in the number of flavours, and what BLM and naive non-abelianisation make of them.
 *
 *   c_n(n_f) = Σ_k e_nk n_f^k; n_f = 33/2 − (3/2) β_0, β_0 = 11 − 2n_f/3.
 *   NNA: c_n → e_nn (−3β_0/2)^n, the leading power of n_f with n_f → −3β_0/2.
 * Method     Newton's interpolation at n_f = 0, 1, 2, …, exact.
 * Reference  S. J. Brodsky, G. P. Lepage, P. B. Mackenzie, Phys. Rev. D 28 (1983) 228; D. J. Broadhurst, A. G. Grozin, Phys.
 *            Rev. D 52 (1995) 4082, hep-ph/9410240; M. Beneke, V. M. Braun, Phys. Lett. B 348 (1995) 513.
 */
import { addExact, divExact, exact, mulExact, Rational, subExact } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import type { Running } from '../series/index.js';

/**
 * Entry [n][k] multiplies n_f^k in c_n, from the coefficient lists at n_f = 0, 1, …; c_n must be a polynomial of degree n at
 * most, and lists for n_f = 0 … N−1 are needed for N coefficients (missing ones: shorter result).
 */
export function flavourPolynomials(lists: readonly (readonly Exact[])[]): Exact[][] {
  const count = Math.min(lists.length, ...lists.map((l) => l.length));
  return Array.from({ length: count }, (_, n) => interpolate(lists.slice(0, n + 1).map((l) => l[n]!)));
}

/** Polynomial through the values at 0, 1, 2, …, ascending coefficients. */
function interpolate(values: readonly Exact[]): Exact[] {
  let differences = [...values];
  let basis: Exact[] = [exact(1)];
  let result: Exact[] = values.map(() => exact(0));
  for (let k = 0; k < values.length; k++) {
    const weight = differences[0]!;
    result = result.map((c, i) => addExact(c, mulExact(weight, basis[i] ?? exact(0))));
    differences = differences.slice(1).map((d, i) => divExact(subExact(d, differences[i]!), exact(k + 1)));
    // basis · (n_f − k)
    basis = [...basis, exact(0)].map((_, i) =>
      subExact(basis[i - 1] ?? exact(0), mulExact(exact(k), basis[i] ?? exact(0))),
    );
  }
  return result;
}

/** b_0/(11 − 2n_f/3): 1/(4π) for α_s, 1/4 for α_s/π, 1 for α_s/4π. */
export function betaUnit(running: Running): Exact | undefined {
  if (running.flavours === undefined || running.beta[0] === undefined) return undefined;
  return divExact(running.beta[0], exact(betaNought(running.flavours)));
}

/** β_0 = 11 − 2n_f/3. */
export const betaNought = (flavours: number): Rational => Rational.of(33 - 2 * flavours, 3);

/** Naive non-abelianisation of every coefficient. */
export function nonAbelianised(polynomials: readonly (readonly Exact[])[], flavours: number): Exact[] {
  const base = betaNought(flavours).mul(Rational.of(-3, 2));
  return polynomials.map((p, n) => mulExact(p[n] ?? exact(0), exact(base.pow(n))));
}
