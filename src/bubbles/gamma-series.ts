/**
 * @module Power series of products of Γ functions: ln Γ(1+x) = −γx + Σ_{k>=2} ζ(k)(−x)^k/k, over any ring with these constants.
 *
 * Purpose    one text for exact forms (polynomials in π, γ and odd ζ values) and for enclosures.
 * Reference  DLMF 5.7.3, 25.6.2.
 */
import { R, Rational, bernoulli, eulerGamma, log, pi, zeta } from '../numerics/index.js';
import type { Ball, Field } from '../numerics/index.js';
import {
  expSeries,
  formalRational,
  formalRing,
  formalSymbol,
  mulFormal,
  powFormal,
  scaleFormal,
} from '../qcd/index.js';
import type { Formal, Ring } from '../qcd/index.js';

export interface ConstantRing<T> extends Ring<T> {
  integer(n: number): T;
  /** ζ(n), n >= 2. */
  zeta(n: number): T;
  readonly euler: T;
  /** π². */
  readonly piSquared: T;
}

export function ballConstants(field: Field<Ball>, prec: number): ConstantRing<Ball> {
  return {
    ...field,
    integer: R.fromNumber,
    zeta: (n) => zeta(n, prec),
    euler: eulerGamma(prec),
    piSquared: R.sqr(pi(prec), prec),
  };
}

/** ζ(2k) = |B_2k| (2π)^2k/(2 (2k)!) as a rational times π^2k; odd ones stay symbols z3, z5, …; γ is gE. */
function formalZeta(n: number): Formal {
  if (n % 2 === 1) return formalSymbol(`z${n}`);
  let factor = bernoulli(n)
    .abs()
    .mul(Rational.of(1n << BigInt(n), 2n));
  for (let k = 2; k <= n; k++) factor = factor.mul(Rational.of(1, k));
  return scaleFormal(powFormal(formalSymbol('pi'), n), factor);
}

export const FORMAL_CONSTANTS: ConstantRing<Formal> = {
  ...formalRing,
  integer: (n) => formalRational(Rational.of(n)),
  zeta: formalZeta,
  euler: formalSymbol('gE'),
  piSquared: mulFormal(formalSymbol('pi'), formalSymbol('pi')),
};

/** Value of a symbol of FORMAL_CONSTANTS. */
export function symbolBall(name: string, prec: number): Ball {
  if (name === 'pi') return pi(prec);
  if (name === 'gE') return eulerGamma(prec);
  if (name === 'ln2') return log(R.fromNumber(2), prec);
  return zeta(Number(name.slice(1)), prec);
}

/** Π Γ(1 + slope·u)^power. */
export function gammaProduct<T>(
  ring: ConstantRing<T>,
  factors: readonly { readonly slope: number; readonly power: number }[],
  length: number,
): T[] {
  const exponent: T[] = [];
  for (let k = 0; k < length; k++) {
    let weight = Rational.ZERO;
    for (const { slope, power } of factors) weight = weight.add(Rational.of(-slope).pow(k).mul(Rational.of(power)));
    if (k === 0 || weight.isZero()) exponent.push(ring.zero);
    else {
      const constant = k === 1 ? ring.euler : ring.zeta(k);
      exponent.push(ring.mul(constant, ring.fromRational(weight.mul(Rational.of(1, k)))));
    }
  }
  return expSeries(ring, exponent, length);
}

/** e^(cu). */
export function exponential<T>(ring: ConstantRing<T>, c: T, length: number): T[] {
  const list = [ring.one];
  for (let n = 1; n < length; n++) list.push(ring.div(ring.mul(list[n - 1]!, c), ring.integer(n)));
  return list;
}

/** sin(πu)/(πu). */
export function sinc<T>(ring: ConstantRing<T>, length: number): T[] {
  const list: T[] = [];
  let term = ring.one;
  for (let n = 0; n < length; n++) {
    list.push(n % 2 === 0 ? term : ring.zero);
    if (n % 2 === 0) term = ring.div(ring.mul(term, ring.piSquared), ring.integer(-(n + 2) * (n + 3)));
  }
  return list;
}

/** n! times each. */
export function timesFactorials(list: readonly Formal[]): Formal[] {
  let factorial = Rational.ONE;
  return list.map((c, n) => {
    if (n > 1) factorial = factorial.mul(Rational.of(n));
    return scaleFormal(c, factorial);
  });
}
