/**
 * @module The pole mass over the MSbar mass in the large-β0 limit, m_pole = m(μ)[1 + X].
 *
 *   X = (C_F/π β0) ∫ du e^(−u/a) (1/4) { 6 e^(5u/3) (μ²/m²)^u (1−u) Γ(u)Γ(1−2u)/Γ(3−u) + G_0(u)/u },
 *   G_0(u) = Σ g_n u^n/n!,  Σ g_n u^n = G(u) = −(3+2u) Γ(4+2u)/[3 Γ(1−u) Γ(2+u)² Γ(3+u)].
 * By the duplication formula the first term is 4^(−u) (6/√π) Γ(u)Γ(1/2−u)/(2−u): simple poles at 0, −1, −2, …, at
 * 1/2, 3/2, … and at 2. With g_k = (1/2)_k/k!, the residues of 4^u times it are 6 (−1)^k g_k/(k+2) at −k and
 * −6 (−1)^k g_k/(3/2−k) at 1/2+k. G_0 is entire: the subtraction is the anomalous dimension of the mass, and its integral
 * is Σ_{n>=1} g_n a^n/n beside the pole at 0, for |a| < 5/2.
 *
 * Masses     g_k = (1/π) ∫ x^k dx/√(x(1−x)) is a moment sequence of mass 1.
 * Reference  M. Beneke, V. M. Braun, Nucl. Phys. B 426 (1994) 301, hep-ph/9402364; P. Ball, M. Beneke, V. M. Braun, Nucl.
 *            Phys. B 452 (1995) 563. Status: formula from memory, checked against the n_l terms up to four loops.
 */
import { Rational } from '../numerics/index.js';
import { PLAIN } from './tower.js';
import type { Component, Tower } from './tower.js';

const q = (n: number, d = 1): Rational => Rational.of(n, d);

const binomials: Rational[] = [Rational.ONE];

/** g_k = (1/2)_k/k!. */
export function halfBinomial(k: number): Rational {
  for (let n = binomials.length; n <= k; n++) binomials.push(binomials[n - 1]!.mul(q(2 * n - 1, 2 * n)));
  return binomials[k]!;
}

const sign = (k: number): Rational => q(k % 2 === 0 ? 1 : -1);
const FOUR = q(4);

/** 4^k with the sign of (−1)^k. */
export const signedPower = (k: number): Rational => FOUR.pow(k).mul(sign(k));

/** u = 1/2 + k. */
function halfInteger(k: number): Rational {
  const size = halfBinomial(k)
    .mul(q(-6))
    .div(q(3 - 2 * k, 2));
  return size.mul(sign(k)).div(q(2)).div(FOUR.pow(k));
}

const ULTRAVIOLET: Tower = {
  side: 'ultraviolet',
  first: q(1),
  parts: (k) => [
    signedPower(k + 1)
      .mul(halfBinomial(k + 1))
      .mul(q(6, k + 3)),
  ],
  decay: { kind: 'alternating', mass: [1.001] },
};

/** From u = 5/2 on the residues alternate. */
const INFRARED: Tower = {
  side: 'infrared',
  first: q(5, 2),
  parts: (k) => [halfInteger(k + 2)],
  decay: { kind: 'alternating', mass: [4.501] },
};

/** The first term, in units of C_F/π. */
export const MASS: Component = {
  factor: { rational: q(1, 4), pi: 0 },
  kernel: PLAIN,
  base: FOUR,
  poles: [
    { at: q(0), parts: [q(3)] },
    { at: q(1, 2), parts: [halfInteger(0)] },
    { at: q(3, 2), parts: [halfInteger(1)] },
    { at: q(2), parts: [q(-1, 2)] },
  ],
  towers: [ULTRAVIOLET, INFRARED],
};
