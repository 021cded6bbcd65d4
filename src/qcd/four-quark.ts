/**
 * @module The first ultraviolet singularity beyond large β_0: anomalous dimensions of the four-quark operators behind u = −1.
 *
 * Purpose    operators of dimension six in the Lagrangian make the singularity at u = −1. Their mixing under renormalisation
 *            shifts the exponent of each eigenvector by λ_i = γ_i/(2β_0).
 * Method     flavour singlets (V×V)_1, (A×A)_1, (V×V)_8, (A×A)_8; γ O_i = γ_ij O_j α_s/(4π) at one loop,
 *              ( 0, 0, 8/3, 12 ; 0, 0, 44/3, 0 ; 0, 8/3, 8n_f/3 − 85/9, 5 ; 8/3, 0, 41/9, −9 ).
 *            A correlator of two currents takes them in after two mixings by a quark loop, each worth a factor 1/α_s:
 *              D: r_n ∝ (−β_0)^n Γ(n+1+b), b = 2 − β_1/β_0² + λ_1; a cross section (R, τ width) one power less.
 * Bound      λ_i to double precision of the one-loop matrix. The number 2 rests on the mixing argument and is not checked against
 *            coefficients; no strength is known.
 * Reference  M. Beneke, V. M. Braun, N. Kivel, Phys. Lett. B 404 (1997) 315, hep-ph/9703389 (abstract read; its numbers 0.379,
 *            0.126, −0.332, −0.753 for n_f = 3 from memory); the matrix is re-derived from the current-current and penguin rules.
 */
import { toNumberExact } from '../numerics/index.js';
import { betaCoefficients } from './beta-function.js';

const BISECTIONS = 80;

/** Coefficients of the characteristic polynomial, the leading one first (Faddeev–LeVerrier). */
function characteristic(m: readonly (readonly number[])[]): number[] {
  const n = m.length;
  const c = [1];
  let power = m.map((row) => row.map(() => 0));
  for (let k = 1; k <= n; k++) {
    const before = c[k - 1] ?? 0;
    const next = m.map((row, i) =>
      row.map((_, j) => row.reduce((sum, own, l) => sum + own * (power[l]?.[j] ?? 0), 0) + (i === j ? before : 0)),
    );
    power = next;
    const trace = m.reduce((sum, row, i) => sum + row.reduce((s, own, l) => s + own * (next[l]?.[i] ?? 0), 0), 0);
    c.push(-trace / k);
  }
  return c;
}

const valueAt = (c: readonly number[], x: number): number => c.reduce((sum, own) => sum * x + own, 0);

/** Roots of a polynomial all of whose roots are real, ascending: one between any two of its derivative's. */
function realRoots(c: readonly number[]): number[] {
  const degree = c.length - 1;
  const [a = 1, b = 0] = c;
  if (degree === 1) return [-b / a];
  const inner = realRoots(c.slice(0, -1).map((own, k) => own * (degree - k)));
  const far = 1 + Math.max(...c.slice(1).map((own) => Math.abs(own / a)));
  const ends = [-far, ...inner, far];
  return ends.slice(1).map((right, k) => {
    let [low, high] = [ends[k] ?? -far, right];
    const rising = valueAt(c, high) > 0;
    for (let i = 0; i < BISECTIONS; i++) {
      const middle = (low + high) / 2;
      if (valueAt(c, middle) > 0 === rising) high = middle;
      else low = middle;
    }
    return (low + high) / 2;
  });
}

/** λ_1 > λ_2 > λ_3 > λ_4. */
export function fourQuarkShifts(flavours: number): number[] {
  const beta = 11 - (2 * flavours) / 3;
  const matrix = [
    [0, 0, 8 / 3, 12],
    [0, 0, 44 / 3, 0],
    [0, 8 / 3, (8 * flavours) / 3 - 85 / 9, 5],
    [8 / 3, 0, 41 / 9, -9],
  ];
  return realRoots(characteristic(matrix))
    .map((g) => g / (2 * beta))
    .toReversed();
}

/** γ of (1 − t/t_s)^(−γ) at u = −1 for n counted from x^1: D or another correlator of currents, or a cross section made of it. */
export function currentUltraviolet(flavours: number, kind: 'correlator' | 'cross section'): number {
  const [b0 = NaN, b1 = NaN] = betaCoefficients(flavours).map(toNumberExact);
  const [first = NaN] = fourQuarkShifts(flavours);
  return (kind === 'correlator' ? 3 : 2) - b1 / b0 ** 2 + first;
}
