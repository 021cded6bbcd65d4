/**
 * @module The singularity model of D, summed at complex couplings.
 *
 * Purpose    lateral sums of F(x) = Σ_i N_i Σ_k c_k (branch point of exponent γ_i − k) + polynomial for x on the circle.
 * Method     with ω = t/x the lower lateral sum of a branch point at t > 0 is −ω G_{γ−1}(−ω), G_b(w) = ∫_0^∞ e^{−wv}(1+v)^{−1−b} dv,
 *            on the sheet that Im ω > 0 reaches from Re ω > 0 (the upper half of the circle: Im x < 0); the upper one is
 *            2iπ ω^γ e^{−ω}/Γ(γ) more. Ultraviolet ones are ω G_{γ−1}(ω), ω = |t|/x. Lower exponents by
 *            b F_b = ω F_{b−1} − 1 and b G_b = 1 − ω G_{b−1}, downward.
 * Bound      enclosures of what the model defines.
 * Reference  M. Beneke, M. Jamin, JHEP 09 (2008) 044, arXiv:0806.3156, section 5 (the model); the sum on the circle follows
 *            from the analyticity of the kernels in ω.
 */
import { C, R, addExact, branchCut, cexp, clog, exact, pi, rgamma } from '../numerics/index.js';
import type { Ball, Complex, Exact } from '../numerics/index.js';
import type { ModelFit, ModelSingularity } from '../borel/index.js';

/** A transform's lateral sums at a complex coupling: the lower one, and half of (upper − lower)/i. */
export interface LateralAt {
  readonly below: Complex;
  readonly half: Complex;
}

/** The lateral sums of a Borel transform as functions of the coupling. */
export type LateralSum = (x: Complex, prec: number) => LateralAt;

const I: Complex = C.I;

/** π ω^(b) e^(−ω)/Γ(1+b). */
function residue(b: Exact, w: Complex, prec: number): Complex {
  const q = addExact(b, exact(1));
  if (q.rational?.isInteger() === true && q.rational.sign() <= 0) return C.ZERO;
  const power = cexp(C.sub(C.mulReal(clog(w, prec), b.ball(prec), prec), w, prec), prec);
  return C.mulReal(power, R.mul(pi(prec), rgamma(q.ball(prec), prec), prec), prec);
}

/** Σ_k c_k ω K_{γ−1−k}(ω) for one branch point with unit strength. */
export function branchAt(s: ModelSingularity, x: Complex, prec: number): LateralAt {
  const t = s.t.ball(prec);
  const infrared = R.isPositive(t);
  const w = C.div(C.fromReal(R.abs(t)), x, prec);
  const b = addExact(s.exponent, exact(-1));
  let kernel: Complex;
  let half: Complex = C.ZERO;
  if (infrared) {
    half = residue(b, w, prec);
    kernel = C.neg(branchCut(b, C.neg(w), prec));
    // Seen from below the real axis the principal branch is the upper sum.
    if (R.isNegative(w.im)) kernel = C.sub(kernel, C.mul(C.mul2exp(I, 1), half, prec), prec);
  } else {
    kernel = branchCut(b, w, prec);
  }
  let below: Complex = C.ZERO;
  let jump: Complex = C.ZERO;
  [exact(1), ...s.corrections].forEach((c, k) => {
    const weight = C.mulReal(w, c.ball(prec), prec);
    below = C.add(below, C.mul(weight, kernel, prec), prec);
    jump = C.add(jump, C.mul(weight, half, prec), prec);
    const lower = addExact(b, exact(-k)).ball(prec);
    const scaled = C.mulReal(kernel, lower, prec);
    kernel = C.div(infrared ? C.add(C.ONE, scaled, prec) : C.sub(C.ONE, scaled, prec), w, prec);
    half = C.div(C.mulReal(half, lower, prec), w, prec);
  });
  return { below, half: jump };
}

/** The fitted model as a function of the coupling. */
export function modelAt(fit: ModelFit, singularities: readonly ModelSingularity[]): LateralSum {
  return (x, prec) => {
    let below: Complex = C.ZERO;
    let half: Complex = C.ZERO;
    singularities.forEach((s, i) => {
      const part = branchAt(s, x, prec);
      const strength: Ball = fit.strengths[i]!;
      below = C.add(below, C.mulReal(part.below, strength, prec), prec);
      half = C.add(half, C.mulReal(part.half, strength, prec), prec);
    });
    let power: Complex = C.ONE;
    for (const d of fit.polynomial) {
      below = C.add(below, C.mulReal(power, d, prec), prec);
      power = C.mul(power, x, prec);
    }
    return { below, half };
  };
}
