/**
 * @module A Borel–Padé approximant of D, summed at complex couplings.
 *
 * Method     a pole at z with the parts A_j (1 − t/z)^(−j) gives Σ A_j J_j, W = −z/x: J_0 = 1, J_1 = W e^W E₁(W),
 *            j J_{j+1} = (j − 1 − W) J_j + W J_{j−1}. This is the integral along the ray of x; the lateral sums run along the
 *            real axis, so that a pole between the two adds its crossing, J_0 = 0, J_1 = 2πi w e^{−w}, w = z/x. Pairs near the
 *            positive axis count as singularities on it: both lateral sums pass around them.
 * Bound      enclosures of what the approximant defines.
 * Reference  residue theorem; DLMF 13.3.10.
 */
import { C, R, cexp, pi, scaledE1 } from '../numerics/index.js';
import type { Complex } from '../numerics/index.js';
import { NEAR_AXIS_ANGLE } from '../borel/index.js';
import type { Approximant, PolePart } from '../borel/index.js';
import type { LateralSum } from './model.js';

function contract(j0: Complex, j1: Complex, W: Complex, amplitudes: readonly Complex[], prec: number): Complex {
  let previous = j0;
  let current = j1;
  let sum: Complex = C.ZERO;
  amplitudes.forEach((A, index) => {
    const j = index + 1;
    sum = C.add(sum, C.mul(A, current, prec), prec);
    const shift = C.sub(C.fromReal(R.fromNumber(j - 1)), W, prec);
    const next = C.add(C.mul(shift, current, prec), C.mul(W, previous, prec), prec);
    previous = current;
    current = C.mulReal(next, R.div(R.ONE, R.fromNumber(j), prec), prec);
  });
  return sum;
}

/** The integral along the ray of x. */
function alongRay(pole: PolePart, x: Complex, prec: number): Complex {
  const W = C.neg(C.div(pole.z, x, prec));
  return contract(C.ONE, C.mul(W, scaledE1(W, prec), prec), W, pole.amplitudes, prec);
}

/** Passing above the pole minus passing below it. */
function crossing(pole: PolePart, x: Complex, prec: number): Complex {
  const w = C.div(pole.z, x, prec);
  const turn: Complex = { re: R.ZERO, im: R.mul2exp(pi(prec), 1) };
  const j1 = C.mul(turn, C.mul(w, cexp(C.neg(w), prec), prec), prec);
  return contract(C.ZERO, j1, C.neg(w), pole.amplitudes, prec);
}

const conjugate = (p: PolePart): PolePart => ({ ...p, z: C.conj(p.z), amplitudes: p.amplitudes.map(C.conj) });

const argument = (z: Complex): number => {
  const { re, im } = C.toNumbers(z);
  return Math.atan2(im, re);
};

/** The approximant as a function of the coupling; noise doublets are left out. */
export function rationalAt(a: Approximant): LateralSum {
  const poles = a.poles
    .filter((p) => p.role !== 'noise doublet')
    .flatMap((p): PolePart[] => (p.real ? [p] : [p, conjugate(p)]))
    .map((p) => ({ pole: p, angle: p.real ? (R.isPositive(p.z.re) ? 0 : Math.PI) : argument(p.z) }));
  return (x, prec) => {
    const ray = argument(x);
    let below: Complex = C.ZERO;
    let jump: Complex = C.ZERO;
    for (const { pole, angle } of poles) {
      below = C.add(below, alongRay(pole, x, prec), prec);
      const onAxis = Math.abs(angle) < NEAR_AXIS_ANGLE;
      if (onAxis) jump = C.add(jump, crossing(pole, x, prec), prec);
      // The lower sum passes below what counts as on the axis, and above every other pole of the lower half-plane.
      const sumIsBelow = onAxis || angle > 0;
      const rayIsBelow = ray < angle;
      if (sumIsBelow && !rayIsBelow) below = C.sub(below, crossing(pole, x, prec), prec);
      if (!sumIsBelow && rayIsBelow) below = C.add(below, crossing(pole, x, prec), prec);
    }
    let power: Complex = C.ONE;
    a.polynomialPart.forEach((d, k) => {
      if (k > 0) power = C.mul(power, C.mulReal(x, R.fromNumber(k), prec), prec);
      below = C.add(below, C.mulReal(power, d, prec), prec);
    });
    return { below, half: C.mul({ re: R.ZERO, im: R.fromNumber(-0.5) }, jump, prec) };
  };
}
