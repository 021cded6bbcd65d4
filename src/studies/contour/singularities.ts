/**
 * @module Singularities and condensates of D as the moment sees them.
 *
 * Method     the imaginary part that belongs to an operator of dimension d = 2k, C(x(−s)) (Λ²/(−s))^k with
 *            C = x^δ (1 + C_1 x + …), goes around the circle with the weight (−x)^(−k) W(x):
 *            Σ_l (J_l/l!) (β ∂)^l C,  J_l = (1/2πi) ∮ dx/x W (−x)^(−k) ln^l(−x)  (QCD room, rewrite/circle.ts).
 *            Position and kind stay. Where W has no x^k (J_0 = 0) the lowest powers of the coupling vanish and the exponent
 *            falls by as many: by 1 for δ ≠ 0, by 2 for δ = 0 (then the coefficient function itself has to run).
 * Bound      exact as far as the coefficient function is given.
 */
import {
  addExact,
  divExact,
  exact,
  isZeroExact,
  mulExact,
  Rational,
  signExact,
  subExact,
} from '../../numerics/index.js';
import type { Exact } from '../../numerics/index.js';
import { circleMoments, exactInPiSquared, expandOnCircle, expectedSingularity } from '../../qcd/index.js';
import type { Condensate, KnownSingularity, Series } from '../../series/index.js';

/** k of Λ^(2k)/Q^(2k), for a position in u or a dimension. */
const powerOf = (s: KnownSingularity): Rational | undefined => s.u?.rational ?? s.dimension?.div(Rational.of(2));

/** δ of C = x^δ (…): what lowers the exponent from the one that the dimension alone gives; undefined when it is not known. */
function couplingPower(series: Series, s: KnownSingularity, k: Rational): Exact | undefined {
  if (s.exponent === undefined) {
    if (k.sign() < 0 && s.anomalousDimension === undefined) return undefined;
    return s.anomalousDimension ?? exact(0);
  }
  const bare = expectedSingularity({
    flavours: series.flavours ?? 0,
    dimension: k.add(k),
    divisor: series.coupling.divisor,
  }).exponent;
  // The stated exponent counts n from the file's first coefficient, the bare one from the first power.
  return subExact(bare, subExact(s.exponent, exact(series.firstPower - 1)));
}

/** Smallest shift n with a coefficient of Σ r_n x^n that does not vanish; undefined when all do. */
const firstOf = (r: readonly Exact[]): number | undefined => {
  const n = r.findIndex((c) => !isZeroExact(c) && signExact(c) !== 0);
  return n < 0 ? undefined : n;
};

/** The singularity of the moment; undefined when it is gone altogether. */
export function momentSingularity(
  series: Series,
  s: KnownSingularity,
  integral: readonly Rational[],
  beta: readonly Exact[],
): KnownSingularity {
  const k = powerOf(s);
  const { exponent: _exponent, strength, anomalousDimension: _anomalous, wilsonCorrections, ...place } = s;
  if (k === undefined || series.flavours === undefined) return place;
  const delta = couplingPower(series, s, k);
  // Between the integers the circle takes nothing away, but it mixes the corrections.
  if (!k.isInteger()) return s.exponent === undefined ? place : { ...place, exponent: s.exponent };
  if (delta === undefined) return place;
  const known = s.exponent === undefined ? (wilsonCorrections ?? []) : [];
  const stays = integral[Number(k.num)]?.isZero() === false;
  // Without J_0 every order needs one correction less.
  const C = [exact(1), ...known, ...(stays ? [] : [exact(0)])];
  const moments = circleMoments(integral, C.length, Number(k.num)).map(exactInPiSquared);
  const r = expandOnCircle(C, delta, beta, moments);
  const first = firstOf(r);
  if (first === undefined) return { ...place, anomalousDimension: addExact(delta, exact(C.length)) };
  const corrections = r.slice(first + 1).map((c) => divExact(c, r[first]!));
  return {
    ...place,
    anomalousDimension: addExact(delta, exact(first)),
    ...(corrections.length === 0 ? {} : { wilsonCorrections: corrections }),
    ...(strength === undefined || !stays
      ? {}
      : { strength: { value: mulExact(strength.value, r[0]!), text: strength.text } }),
  };
}

/** The condensate's term of the moment, (C W_k (−1)^k) ⟨O⟩/s_0^k; without a coefficient where W has no x^k. */
export function momentCondensate(c: Condensate, integral: readonly Rational[]): Condensate {
  const { wilson, ...rest } = c;
  const k = c.dimension.div(Rational.of(2));
  const W = k.isInteger() ? integral[Number(k.num)] : undefined;
  if (wilson === undefined || W === undefined || W.isZero()) return rest;
  return { ...rest, wilson: mulExact(wilson, exact(k.num % 2n === 0n ? W : W.neg())) };
}
