/**
 * @module Padé approximants of a Borel transform with known singularities factored out.
 *
 * Purpose    P(t) = B(t) Π (1 − t/t_i)^{γ_i} has only what is not known left in it; B = Π (1 − t/t_i)^{−γ_i} [L/M]_P.
 * Method     product of binomial series, exactly when positions and exponents are rational; Padé as usual.
 * Bound      evaluation is in balls: it encloses the approximant.
 * Reference  D. Boito, P. Masjuan, F. Oliani, arXiv:1807.01567 ("partial Padé"; memory).
 */
import { C, cexp, clog, R } from '../numerics/index.js';
import type { Ball, Complex, Exact, Field } from '../numerics/index.js';
import { onExact } from './exact-algorithm.js';
import { binomialSeries, multiplySeries } from './power-series.js';

/** A factor (1 − t/t_i)^{−γ} of B. */
export interface KnownFactor {
  readonly t: Exact;
  readonly exponent: Exact;
}

/** Taylor coefficients of B Π (1 − t/t_i)^{γ_i}. */
export function withoutFactors(b: readonly Exact[], factors: readonly KnownFactor[]): Exact[] {
  const N = b.length;
  const strip = <T>(field: Field<T>, inputs: readonly T[]): T[] =>
    factors.reduce(
      (acc, _, i) => {
        const t = inputs[N + 2 * i]!;
        const gamma = inputs[N + 2 * i + 1]!;
        const slope = field.neg(field.div(field.one, t));
        return multiplySeries(field, acc, binomialSeries(field, gamma, slope, N), N);
      },
      inputs.slice(0, N),
    );
  return onExact([...b, ...factors.flatMap((f) => [f.t, f.exponent])], N, strip);
}

/** Π (1 − t/t_i)^{−γ_i} at t, off the cuts outward from each t_i. */
export function factorValue(factors: readonly KnownFactor[], t: Complex, prec: number): Complex {
  const exponent = factors.reduce((sum, f) => {
    const ratio = C.sub(C.ONE, C.mulReal(t, R.div(R.ONE, f.t.ball(prec), prec), prec), prec);
    return C.add(sum, C.mulReal(clog(ratio, prec), f.exponent.ball(prec), prec), prec);
  }, C.ZERO);
  return cexp(C.neg(exponent), prec);
}

/** p(t)/q(t) for real coefficients. */
export function rationalValue(p: readonly Ball[], q: readonly Ball[], t: Complex, prec: number): Complex {
  return C.div(polynomialValue(p, t, prec), polynomialValue(q, t, prec), prec);
}

/** Σ p_k t^k by Horner's rule. */
export function polynomialValue(p: readonly Ball[], t: Complex, prec: number): Complex {
  return p.reduceRight<Complex>((acc, c) => C.add(C.mul(acc, t, prec), C.fromReal(c), prec), C.ZERO);
}
