/**
 * @module The ambiguity as a power correction.
 *
 * A singularity at u = d/2 leaves an ambiguity ∝ (Λ/Q)^d; with a condensate, R ∋ C_d ⟨O_d⟩/Q^d, a change of prescription
 * by A is absorbed by δ⟨O_d⟩ = Q^d A / C_d of opposite sign.
 * References: M. Beneke, Phys. Rept. 317 (1999) 1 (from memory); one-dimensional form checked against
 * A = N (2π/β₀) 2^{−b} Λ/Γ(1+b).
 */

/** (Λ/Q)^d. */
export function powerOf(lambdaOverQ: number, dimension: number): number {
  return lambdaOverQ ** dimension;
}

/** Q^d A in GeV^d. @param Q hard scale in GeV. */
export function inGeV(ambiguity: number, Q: number, dimension: number): number {
  return ambiguity * Q ** dimension;
}

/** δ⟨O_d⟩ that absorbs the ambiguity, in GeV^d. @param wilson C_d, non-zero. */
export function condensateShift(ambiguity: number, Q: number, dimension: number, wilson: number): number {
  return Math.abs((ambiguity * Q ** dimension) / wilson);
}
