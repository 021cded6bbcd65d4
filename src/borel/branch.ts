/**
 * @module One branch point (or pole) of the Borel transform and its closed-form sum.
 *
 *   B(t) ∋ N Σ_k c_k (1 − t/t*)^{−γ+k},  c_0 = 1.
 *   Taylor: c_n ∋ N t*^{−n} Σ_k c_k (γ−k)_n.
 *   Sum:    F(x) ∋ N Σ_k c_k ω F_{γ−1−k}(ω),  ω = |t*| / x > 0 (principal value), Im above = π ω^{γ−k} e^{−ω}/Γ(γ−k);
 *           t* < 0: N Σ_k c_k ω G_{γ−1−k}(ω),  ω = |t*| / x, no imaginary part.
 * F_b(ω) = PV∫_0^∞ e^{−ωv}(1−v)^{−1−b} dv, G_b(ω) = ∫_0^∞ e^{−ωv}(1+v)^{−1−b} dv.
 * Reference: M. Beneke, Phys. Rept. 317 (1999) 1, sec. 2 (from memory); re-derived and checked by quadrature.
 */
import {
  addExact,
  branchAlternating,
  branchSame,
  exact,
  exactReal,
  exp,
  mulExact,
  pi,
  pow,
  R,
  Rational,
  rgamma,
} from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import type { LaplaceSum } from './laplace.js';

export interface Branch {
  readonly t: Exact;
  readonly exponent: Exact;
  /** c_1, c_2, … */
  readonly corrections: readonly Exact[];
}

/** (a)_n = a (a+1) … (a+n−1) for n = 0 … count−1. */
function risingFactorials(a: Exact, count: number): Exact[] {
  const list: Exact[] = [exact(1)];
  for (let n = 1; n < count; n++) list.push(mulExact(list[n - 1]!, addInteger(a, n - 1)));
  return list;
}

const addInteger = (a: Exact, k: number): Exact => addExact(a, exact(k));

/** Coefficients c_0 … c_{count−1} of Σ c_n t^n n!^{-1} for unit strength. */
export function branchCoefficients(s: Branch, count: number): Exact[] {
  const weights = [exact(1), ...s.corrections];
  const columns = weights.map((_, k) => risingFactorials(addInteger(s.exponent, -k), count));
  return Array.from({ length: count }, (_, n) => {
    const sum = weights.reduce<Exact>((acc, c, k) => addExact(acc, mulExact(c, columns[k]![n]!)), exact(0));
    return mulExact(sum, inversePower(s.t, n));
  });
}

/** t^{−n}, without a chain of dependent enclosures. */
function inversePower(t: Exact, n: number): Exact {
  if (t.rational !== undefined) return exact(t.rational.pow(-n));
  return exactReal((prec) => R.powInt(t.ball(prec + 16), -n, prec + 8));
}

/** Closed-form lateral sum of the branch with unit strength at x > 0. */
export function branchSum(s: Branch, x: Ball, prec: number): LaplaceSum {
  const t = s.t.ball(prec);
  const w = R.div(R.abs(t), x, prec);
  const positive = R.isPositive(t);
  let pv: Ball = R.ZERO;
  let im: Ball = R.ZERO;
  [exact(1), ...s.corrections].forEach((c, k) => {
    const b = addInteger(s.exponent, -k - 1);
    const weight = R.mul(c.ball(prec), w, prec);
    if (!positive) {
      pv = R.add(pv, R.mul(weight, branchAlternating(b, w, prec), prec), prec);
      return;
    }
    pv = R.add(pv, R.mul(weight, branchSame(b, w, prec).pv, prec), prec);
    im = R.add(im, R.mul(c.ball(prec), branchImaginary(addInteger(b, 1), w, prec), prec), prec);
  });
  return { pv, im };
}

/** π ω^γ e^{−ω}/Γ(γ): imaginary part of the upper lateral sum of (1 − t/t*)^{−γ}. Zero when γ is 0, −1, −2, … */
export function branchImaginary(gamma: Exact, w: Ball, prec: number): Ball {
  if (gamma.rational !== undefined && gamma.rational.isInteger() && gamma.rational.cmp(Rational.ZERO) <= 0)
    return R.ZERO;
  const g = gamma.ball(prec);
  const body = R.mul(pow(w, g, prec), exp(R.neg(w), prec), prec);
  return R.mul(R.mul(pi(prec), body, prec), rgamma(g, prec), prec);
}
