/**
 * @module Borel and Borel–Leroy transforms of a coefficient list, exactly.
 *
 *   B_b(t) = Σ c_n t^n / (1+b)_n,   (1+b)_n = Γ(n+1+b)/Γ(1+b);   b = 0: B(t) = Σ c_n t^n/n!.
 *
 * A branch point (1 − t/t*)^{−γ} of the plain transform becomes a simple pole of B_b for b = γ − 1.
 * Order-2 transform, for series that grow like (2n)!:  B(s) = Σ c_n s^n/(2n)!,  F(x) = ∫_0^∞ ds e^{−s} B(x s²).
 */
import { exact, exactReal, R, Rational } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';

/** c_n divided by the given exact rational. */
function over(c: Exact, d: Rational): Exact {
  if (c.rational !== undefined) return exact(c.rational.div(d));
  return exactReal((prec) => R.div(c.ball(prec + 8), R.fromRational(d, prec + 8), prec + 8));
}

/** Coefficients of B_b; b rational, b > −1 (throws RangeError otherwise: the weight t^b would not be integrable). */
export function borelTransform(c: readonly Exact[], b: Rational = Rational.ZERO): Exact[] {
  if (b.cmp(Rational.of(-1)) <= 0)
    throw new RangeError(`borelTransform: Leroy parameter ${b.toString()} is not above -1`);
  let weight = Rational.ONE;
  return c.map((cn, n) => {
    if (n > 0) weight = weight.mul(b.add(Rational.of(n)));
    return over(cn, weight);
  });
}

/** Coefficients c_n/(2n)! of the order-2 transform. */
export function borelTransformOrder2(c: readonly Exact[]): Exact[] {
  let weight = Rational.ONE;
  return c.map((cn, n) => {
    if (n > 0) weight = weight.mul(Rational.of(2 * n * (2 * n - 1)));
    return over(cn, weight);
  });
}
