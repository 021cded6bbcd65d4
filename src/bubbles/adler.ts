/**
 * @module The Adler function in the large-β0 limit, and what contours over it give: R(e+e−) and the hadronic width of the τ.
 *
 *   D = 1 + (1/π β0) ∫ du e^(−u/a) e^(5u/3) b(u),
 *   b(u) = (32/3)/(2−u) · Σ_{k>=2} (−1)^k k/[k² − (1−u)²]²
 *        = −2/(u−2) + Σ_{j>=1} [A_j/(u+j)² + B_j/(u+j)] + Σ_{j>=3} [C_j/(u−j)² + D_j/(u−j)],
 *   A_j = (8/3)(−1)^(j+1)/((j+1)(j+2)),  B_j = A_j [1/(j+1) + 1/(j+2)],
 *   C_j = (8/3)(−1)^j/((j−1)(j−2)),      D_j = −C_j [1/(j−1) + 1/(j−2)].
 * A term x^n of the weight in (1/2πi)∮ dx/x x^n D(s0 x) multiplies b by sin(πu)/(π(u−n)): R has the weight 1, the τ width
 * (1−x)³(1+x) = 1 − 2x + 2x³ − x⁴, which adds up to [sin(πu)/(πu)] 12/((1−u)(3−u)(4−u)).
 *
 * Masses     1/(k+c) is the moment sequence ∫ x^(k+c−1) dx of mass 1/c; sums and products add and multiply masses.
 * Reference  D. J. Broadhurst, Z. Phys. C 58 (1993) 339; M. Beneke, Nucl. Phys. B 405 (1993) 424; contours: P. Ball,
 *            M. Beneke, V. M. Braun, Nucl. Phys. B 452 (1995) 563, hep-ph/9502300. Status: formulas from memory, residues and
 *            kernels re-derived, checked against the leading-n_f terms of the four-loop results and by quadrature.
 */
import { Rational } from '../numerics/index.js';
import { PLAIN, UNIT } from './tower.js';
import type { Component, Kernel, SineKernel, Tower } from './tower.js';

const q = (n: number, d = 1): Rational => Rational.of(n, d);

/** Simple and double part of a pole: size/(xy) doubly, and ±(1/x + 1/y) times that simply. */
function doublePole(size: Rational, x: number, y: number, simpleSign: 1 | -1): readonly Rational[] {
  const double = size.mul(q(1, x * y));
  return [double.mul(q((x + y) * simpleSign, x * y)), double];
}

const EIGHT_THIRDS = q(8, 3);
const sign = (k: number): Rational => q(k % 2 === 0 ? 1 : -1);

/** u = −1, −2, …; k = j − 1. */
const ULTRAVIOLET: Tower = {
  side: 'ultraviolet',
  first: q(1),
  parts: (k) => doublePole(EIGHT_THIRDS.mul(sign(k)), k + 2, k + 3, 1),
  decay: { kind: 'alternating', mass: [(8 / 3) * (1 / 6) * (5 / 6), (8 / 3) * (1 / 6)].map((m) => m * 1.001) },
};

/** u = 3, 4, …; k = j − 3. */
const INFRARED: Tower = {
  side: 'infrared',
  first: q(3),
  parts: (k) => doublePole(EIGHT_THIRDS.mul(sign(k + 1)), k + 2, k + 1, -1),
  decay: { kind: 'alternating', mass: [(8 / 3) * (1 / 2) * (3 / 2), (8 / 3) * (1 / 2)].map((m) => m * 1.001) },
};

const adlerWith = (kernel: Kernel): Component => ({
  factor: UNIT,
  kernel,
  base: Rational.ONE,
  poles: [{ at: q(2), parts: [q(-2)] }],
  towers: [ULTRAVIOLET, INFRARED],
});

/** sin(πu)/(πu). */
const CIRCLE: SineKernel = { kind: 'sine', poles: [{ at: q(0), weight: q(1) }] };

/** sin(πu)/(πu) · 12/((1−u)(3−u)(4−u)). */
const TAU: SineKernel = {
  kind: 'sine',
  poles: [
    { at: q(0), weight: q(1) },
    { at: q(1), weight: q(-2) },
    { at: q(3), weight: q(2) },
    { at: q(4), weight: q(-1) },
  ],
};

export const ADLER = adlerWith(PLAIN);
export const R_RATIO = adlerWith(CIRCLE);
export const TAU_WIDTH = adlerWith(TAU);
