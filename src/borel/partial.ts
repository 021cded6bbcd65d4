/**
 * @module Padé approximants of a Borel transform with known singularities factored out.
 *
 * Purpose    P(t) = B(t) Π (1 − t/t_i)^{γ_i} has only what is not known left in it; B = Π (1 − t/t_i)^{−γ_i} [L/M]_P.
 * Method     product of binomial series, exactly when positions and exponents are rational; Padé as usual.
 * Bound      evaluation is in balls: it encloses the approximant.
 * Reference  D. Boito, P. Masjuan, F. Oliani, arXiv:1807.01567 ("partial Padé"; memory).
 */
import { C, cexp, clog, DoubleDouble as D, R } from '../numerics/index.js';
import type { Ball, Complex, Exact, Field } from '../numerics/index.js';
import { onExact } from './exact-algorithm.js';
import { binomialSeries, multiplySeries } from './power-series.js';
import { quickReals } from './ray-quick.js';
import type { Lossy, QuickComplex } from './ray-quick.js';

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

const Z = D.complex;
/** What a logarithm, an exponential or a handful of products lose, in units of D.UNIT. */
const FUNCTION_LOSS = 64;

/** factorValue at t = x s in double-double arithmetic. */
export function factorQuick(
  factors: readonly KnownFactor[],
  x: Ball,
  prec: number,
): ((s: QuickComplex) => Lossy) | undefined {
  const slopes = quickReals(factors.map((f) => R.div(x, f.t.ball(prec), prec)));
  const exponents = quickReals(factors.map((f) => f.exponent.ball(prec)));
  if (slopes === undefined || exponents === undefined) return undefined;
  return (s) => {
    let exponent = Z.ZERO;
    let lost = FUNCTION_LOSS;
    for (let i = 0; i < slopes.length; i++) {
      const step = Z.mulReal(s, slopes[i]!);
      const ratio = Z.sub(Z.ONE, step);
      const logarithm = Z.log(ratio);
      exponent = Z.sub(exponent, Z.mulReal(logarithm, exponents[i]!));
      const weight = Math.abs(exponents[i]![0]);
      lost += weight * (FUNCTION_LOSS * (1 + Z.size(logarithm)) + (4 * (1 + Z.size(step))) / Z.size(ratio));
    }
    return { value: Z.exp(exponent), lost };
  };
}

/** p(x s)/q(x s) in double-double arithmetic. */
export function rationalQuick(
  p: readonly Ball[],
  q: readonly Ball[],
  x: Ball,
  prec: number,
): ((s: QuickComplex) => Lossy) | undefined {
  const scaled = (c: readonly Ball[]): D.DoubleDouble[] | undefined =>
    quickReals(c.map((a, k) => R.mul(a, R.powInt(x, k, prec), prec)));
  const [top, below] = [scaled(p), scaled(q)];
  if (top === undefined || below === undefined) return undefined;
  return (s) => {
    const [above, under] = [Z.polynomial(top, s), Z.polynomial(below, s)];
    const lost = 4 * (p.length * amplification(top, s, above) + q.length * amplification(below, s, under)) + 8;
    return { value: Z.div(above, under), lost };
  };
}

/** |p|(|t|)/|p(t)|: how much larger the terms of a polynomial are than its value. */
export function amplification(p: readonly D.DoubleDouble[], t: QuickComplex, value: QuickComplex): number {
  const r = Z.size(t);
  return p.reduceRight((acc, c) => acc * r + Math.abs(c[0]), 0) / Z.size(value);
}
