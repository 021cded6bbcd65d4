/**
 * @module Laplace integral of a rational Borel transform, in closed form.
 *
 * Purpose    (1/(Γ(1+b) x^{1+b})) ∫_0^∞ dt t^b e^{−t/x} [ Σ_k a_k t^k + Σ_i Σ_j A_ij (1 − t/z_i)^{−j} ]
 *            for real b > −1 (b = 0: plain Borel), as principal value and imaginary part of the upper lateral sum.
 * Method     polynomial part: a_k (1+b)_k x^k. A pole at z, with W = −z/x, contributes Σ_j A_j J_j where
 *              J_j = (W^{1+b}/Γ(1+b)) ∫_0^∞ dv v^b e^{−Wv} (1+v)^{−j} = W^{1+b} U(1+b, 2+b−j, W),
 *              J_0 = 1,   J_1 = W ∫_0^∞ dv e^{−Wv} (1+v)^{−1−b},
 *              j J_{j+1} = (j − 1 − b − W) J_j + W J_{j−1}                                     (DLMF 13.3.10).
 *            On the positive axis J_1 = w [F_b(w) ± iπ w^b e^{−w}/Γ(1+b)], w = z/x, and the recurrence holds for the
 *            principal value (J_0 = 1) and for the imaginary part (J_0 = 0) separately.
 *            Crossing a pole adds the jump of J: J_0 = 0, J_1 = 2πi w^{1+b} e^{−w}/Γ(1+b), same recurrence.
 * Bound      everything is ball arithmetic: the result encloses the integral of the given rational function.
 * Reference  DLMF 13.3.10, 13.4.4; for b = 0 the integrals reduce to e^{−w} Ei(w) and e^{W} E₁(W), DLMF 6.2.
 */
import { branchCut, branchSame, C, cexp, clog, exp, pi, pow, R, rgamma } from '../numerics/index.js';
import type { Ball, Complex, Rational } from '../numerics/index.js';

/** A pole with its principal part Σ_j amplitudes[j−1] (1 − t/z)^{−j}. */
export interface PolePart {
  readonly z: Complex;
  /** True when z is proved real (z.im is then exactly zero). */
  readonly real: boolean;
  readonly amplitudes: readonly Complex[];
}

export interface LaplaceSum {
  /** Re of the upper lateral sum: the principal value. */
  readonly pv: Ball;
  /** Im of the upper lateral sum. */
  readonly im: Ball;
}

const isOnPositiveAxis = (p: PolePart): boolean => p.real && R.isPositive(p.z.re);

/** w^{1+b} e^{−w}/Γ(1+b) for real w > 0: π times it is the imaginary part of J_1. */
export function residueWeight(w: Ball, b: Rational, prec: number): Ball {
  const onePlusB = R.add(R.ONE, R.fromRational(b, prec), prec);
  const power = b.isZero() ? w : pow(w, onePlusB, prec);
  return R.mul(R.mul(power, exp(R.neg(w), prec), prec), rgamma(onePlusB, prec), prec);
}

/** Σ_j A_j J_j by the recurrence from J_0, J_1. */
function contract(
  j0: Complex,
  j1: Complex,
  W: Complex,
  b: Ball,
  amplitudes: readonly Complex[],
  prec: number,
): Complex {
  let previous = j0;
  let current = j1;
  let sum = C.ZERO;
  amplitudes.forEach((A, index) => {
    const j = index + 1;
    sum = C.add(sum, C.mul(A, current, prec), prec);
    if (j < amplitudes.length) {
      const shift = C.sub(C.fromReal(R.sub(R.fromNumber(j - 1), b, prec)), W, prec);
      const next = C.add(C.mul(shift, current, prec), C.mul(W, previous, prec), prec);
      previous = current;
      current = C.mulReal(next, R.div(R.ONE, R.fromNumber(j), prec), prec);
    }
  });
  return sum;
}

/** Contribution of one real pole z > 0: principal value and Im above. */
function onAxis(pole: PolePart, x: Ball, b: Rational, prec: number): LaplaceSum {
  const w = R.div(pole.z.re, x, prec);
  const W = C.fromReal(R.neg(w));
  const bBall = R.fromRational(b, prec);
  const { pv } = branchSame(b, w, prec);
  const pvSum = contract(C.ONE, C.fromReal(R.mul(w, pv, prec)), W, bBall, pole.amplitudes, prec);
  const jump = R.mul(pi(prec), residueWeight(w, b, prec), prec);
  const imSum = contract(C.ZERO, C.fromReal(jump), W, bBall, pole.amplitudes, prec);
  return { pv: pvSum.re, im: imSum.re };
}

/** Contribution of a pole off the positive axis (complex; a pair is completed by its conjugate by the caller). */
function offAxis(pole: PolePart, x: Ball, b: Rational, prec: number): Complex {
  const W = C.neg(C.mulReal(pole.z, R.div(R.ONE, x, prec), prec));
  const j1 = C.mul(W, branchCut(b, W, prec), prec);
  return contract(C.ONE, j1, W, R.fromRational(b, prec), pole.amplitudes, prec);
}

/**
 * What the lateral sum above the axis gains when its contour is lifted over the pole at z (Im z > 0):
 * 2πi w^{1+b} e^{−w}/Γ(1+b) A for a simple pole.
 */
export function crossingJump(pole: PolePart, x: Ball, b: Rational, prec: number): Complex {
  const w = C.mulReal(pole.z, R.div(R.ONE, x, prec), prec);
  const bBall = R.fromRational(b, prec);
  const onePlusB = R.add(R.ONE, bBall, prec);
  const weight = cexp(C.sub(C.mulReal(clog(w, prec), onePlusB, prec), w, prec), prec);
  const factor: Complex = { re: R.ZERO, im: R.mul(R.mul2exp(pi(prec), 1), rgamma(onePlusB, prec), prec) };
  return contract(C.ZERO, C.mul(factor, weight, prec), C.neg(w), bBall, pole.amplitudes, prec);
}

/**
 * Lateral Laplace sum of a rational Borel transform.
 * `poles` lists real poles once and of each conjugate pair the member with Im z > 0 only.
 */
export function laplace(
  polynomialPart: readonly Ball[],
  poles: readonly PolePart[],
  x: Ball,
  b: Rational,
  prec: number,
): LaplaceSum {
  let pv: Ball = R.ZERO;
  let im: Ball = R.ZERO;
  let weight: Ball = R.ONE; // (1+b)_k x^k
  const bBall = R.fromRational(b, prec);
  polynomialPart.forEach((a, k) => {
    if (k > 0) weight = R.mul(weight, R.mul(R.add(bBall, R.fromNumber(k), prec), x, prec), prec);
    pv = R.add(pv, R.mul(a, weight, prec), prec);
  });
  for (const pole of poles) {
    if (isOnPositiveAxis(pole)) {
      const part = onAxis(pole, x, b, prec);
      pv = R.add(pv, part.pv, prec);
      im = R.add(im, part.im, prec);
    } else {
      const part = offAxis(pole, x, b, prec);
      pv = R.add(pv, pole.real ? part.re : R.mul2exp(part.re, 1), prec);
    }
  }
  return { pv, im };
}
