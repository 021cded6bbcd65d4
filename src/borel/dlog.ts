/**
 * @module Logarithmic-derivative Padé approximants of a Borel transform.
 *
 * Purpose    F = B′/B has simple poles where B has branch points: −residue is the exponent γ of (1 − t/z)^{−γ}. The [L/M] of
 *            F, integrated, is a product of such powers:
 *              B = b_0 Π (1 − t/z)^{r_z} exp(∫ polynomial part),  r_z the residue of F at z.
 * Method     d_k = [(k+1) b_{k+1} − Σ_{j<k} d_j b_{k−j}]/b_0; poles and residues certified; a multiple pole adds
 *            exp(Σ_{j≥2} c_j [(t−z)^{1−j} − (−z)^{1−j}]/(1−j)).
 * Bound      evaluation is in balls: it encloses the approximant.
 * Reference  G. A. Baker, Phys. Rev. 124 (1961) 768; D. Hunter, G. Baker, Phys. Rev. B 7 (1973) 3346 (from memory).
 */
import { C, cexp, clog, DoubleDouble as D, padePoles, R, Rational } from '../numerics/index.js';
import type { Ball, Complex, Exact, Field } from '../numerics/index.js';
import { onExact } from './exact-algorithm.js';
import { quickComplexes, quickReals } from './ray-quick.js';
import type { Lossy, QuickComplex } from './ray-quick.js';

/** Taylor coefficients of B′/B: one fewer than of B. b_0 must not vanish. */
export function logarithmicDerivative(b: readonly Exact[]): Exact[] {
  return onExact(b, b.length - 1, derivativeSeries);
}

function derivativeSeries<T>(field: Field<T>, b: readonly T[]): T[] {
  const d: T[] = [];
  for (let k = 0; k + 1 < b.length; k++) {
    let sum = field.mul(field.fromRational(Rational.of(k + 1)), b[k + 1]!);
    for (let j = 0; j < k; j++) sum = field.sub(sum, field.mul(d[j]!, b[k - j]!));
    d.push(field.div(sum, b[0]!));
  }
  return d;
}

export interface DlogPole {
  readonly z: Complex;
  /** 1/z. */
  readonly inverse: Complex;
  readonly real: boolean;
  /** Coefficients of (t − z)^{−j}, j = 1, 2, …; minus the first is the exponent. */
  readonly principal: readonly Complex[];
}

export interface DlogApproximant {
  /** Every pole, conjugates included. */
  readonly poles: readonly DlogPole[];
  /** Polynomial part of F. */
  readonly polynomial: readonly Ball[];
  readonly head: Exact;
  readonly deficiency: number;
}

/** [L/M] of B′/B; a string tells why there is none. */
export function dlogApproximant(b: readonly Exact[], L: number, M: number, prec: number): DlogApproximant | string {
  const found = padePoles(logarithmicDerivative(b), L, M, prec);
  if (found.exists !== true) return found.reason;
  return {
    poles: found.poles.map((p) => ({
      z: p.position,
      inverse: C.inv(p.position, prec + 32),
      real: p.real,
      principal: p.principal,
    })),
    polynomial: found.polynomial,
    head: b[0]!,
    deficiency: found.entry.deficiency,
  };
}

/** The approximant of B at t, off the cuts that run outward from each pole. */
export function dlogValue(a: DlogApproximant, t: Complex, prec: number): Complex {
  let exponent = C.ZERO;
  for (const { z, inverse, principal } of a.poles) {
    const ratio = C.sub(C.ONE, C.mul(t, inverse, prec), prec);
    exponent = C.add(exponent, C.mul(principal[0]!, clog(ratio, prec), prec), prec);
    for (let j = 2; j <= principal.length; j++) {
      const difference = C.sub(inversePower(C.sub(t, z, prec), j - 1, prec), inversePower(C.neg(z), j - 1, prec), prec);
      const weight = C.mulReal(principal[j - 1]!, R.fromRational(Rational.of(-1, j - 1), prec), prec);
      exponent = C.add(exponent, C.mul(weight, difference, prec), prec);
    }
  }
  const integral = a.polynomial.reduceRight<Complex>(
    (acc, c, k) => C.mul(C.add(acc, C.fromReal(R.div(c, R.fromNumber(k + 1), prec)), prec), t, prec),
    C.ZERO,
  );
  return C.mulReal(cexp(C.add(exponent, integral, prec), prec), a.head.ball(prec), prec);
}

function inversePower(x: Complex, n: number, prec: number): Complex {
  let power = C.ONE;
  for (let i = 0; i < n; i++) power = C.mul(power, x, prec);
  return C.inv(power, prec);
}

const Z = D.complex;
/** What a logarithm, an exponential or a handful of products lose, in units of D.UNIT. */
const FUNCTION_LOSS = 64;

/** The approximant at t = x s in double-double arithmetic; undefined for multiple poles and parts known too badly. */
export function dlogQuick(a: DlogApproximant, x: Ball, prec: number): ((s: QuickComplex) => Lossy) | undefined {
  if (a.poles.some((p) => p.principal.length > 1)) return undefined;
  const slopes = quickComplexes(a.poles.map((p) => C.mulReal(p.inverse, x, prec)));
  // Exponents count absolutely: those of doublets next to nothing need no digits of their own.
  const exponents = quickComplexes(
    a.poles.map((p) => p.principal[0]!),
    0,
  );
  // ∫ of the polynomial part, as a polynomial in s without its constant.
  const integral = quickReals(
    a.polynomial.map((c, k) => R.div(R.mul(c, R.powInt(x, k + 1, prec), prec), R.fromNumber(k + 1), prec)),
  );
  const head = quickReals([a.head.ball(prec)])?.[0];
  if (slopes === undefined || exponents === undefined || integral === undefined || head === undefined) return undefined;
  const sizes = exponents.map(Z.size);
  return (s) => {
    let exponent = Z.mul(Z.polynomial(integral, s), s);
    let lost = FUNCTION_LOSS * (1 + Z.size(exponent));
    for (let i = 0; i < slopes.length; i++) {
      const step = Z.mul(s, slopes[i]!);
      const ratio = Z.sub(Z.ONE, step);
      const logarithm = Z.log(ratio);
      exponent = Z.add(exponent, Z.mul(exponents[i]!, logarithm));
      lost += sizes[i]! * (FUNCTION_LOSS * (1 + Z.size(logarithm)) + (4 * (1 + Z.size(step))) / Z.size(ratio));
    }
    return { value: Z.mulReal(Z.exp(exponent), head), lost };
  };
}
