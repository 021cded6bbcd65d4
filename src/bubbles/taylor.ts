/**
 * @module Taylor coefficients of the Borel transforms, over any ring with ζ values: exact forms and enclosures from one text.
 *
 * Adler      (32/3)/(2−u) · [g(1+u) − g(3−u)]/(4(1−u)), g(x) = Σ (−1)^k/(x+k)² = 1/x² − g(x+1); with η(n) = (1 − 2^(1−n))ζ(n),
 *            g(1+u) − g(1−u) = −2 Σ_{m odd} (m+1) η(m+2) u^m, and g(3−u) = g(1−u) − 1/(1−u)² + 1/(2−u)².
 * Mass       6/(2−u) · Γ(1+u)Γ(1−2u)/Γ(1−u) · 1/u, and G_0(u)/u.
 * Potential  1/[cos(πu) Γ(1+2u)].
 */
import { Rational } from '../numerics/index.js';
import { mulSeries, reciprocal } from '../qcd/index.js';
import { exponential, gammaProduct, sinc } from './gamma-series.js';
import type { ConstantRing } from './gamma-series.js';
import { subtraction } from './mass-subtraction.js';

const times = <T>(ring: ConstantRing<T>, n: number, factors: readonly (readonly T[])[]): T[] =>
  factors.reduce<T[]>((product, f) => mulSeries(ring, product, f, n), [ring.one]);

const linear = <T>(ring: ConstantRing<T>, constant: number, slope: number): T[] => [
  ring.integer(constant),
  ring.integer(slope),
];

const inverse = <T>(ring: ConstantRing<T>, constant: number, slope: number, n: number): T[] =>
  reciprocal(ring, linear(ring, constant, slope), n);

/** π b of the Adler function without the exponential. */
function adlerBare<T>(ring: ConstantRing<T>, n: number): T[] {
  const oneMinus = inverse(ring, 1, -1, n);
  const twoMinus = inverse(ring, 2, -1, n);
  const square = mulSeries(ring, oneMinus, oneMinus, n);
  const other = mulSeries(ring, twoMinus, twoMinus, n);
  const difference = Array.from({ length: n }, (_, m) => {
    const rational = ring.sub(square[m]!, other[m]!);
    if (m % 2 === 0) return rational;
    const eta = ring.fromRational(Rational.ONE.sub(Rational.of(1n, 2n << BigInt(m))).mul(Rational.of(-2 * (m + 1))));
    return ring.add(rational, ring.mul(eta, ring.zeta(m + 2)));
  });
  return times(ring, n, [difference, oneMinus, twoMinus, [ring.fromRational(Rational.of(8, 3))]]);
}

export const adlerSeries = <T>(ring: ConstantRing<T>, exponent: T, n: number): T[] =>
  times(ring, n, [adlerBare(ring, n), exponential(ring, exponent, n)]);

export const circleSeries = <T>(ring: ConstantRing<T>, exponent: T, n: number): T[] =>
  times(ring, n, [adlerSeries(ring, exponent, n), sinc(ring, n)]);

export const tauSeries = <T>(ring: ConstantRing<T>, exponent: T, n: number): T[] =>
  times(ring, n, [
    circleSeries(ring, exponent, n),
    inverse(ring, 1, -1, n),
    inverse(ring, 3, -1, n),
    inverse(ring, 4, -1, n),
    [ring.integer(12)],
  ]);

export const sumRuleSeries = <T>(ring: ConstantRing<T>, exponent: T, n: number): T[] =>
  times(ring, n, [
    linear(ring, 3, 1),
    inverse(ring, 1, -1, n),
    inverse(ring, 1, 1, n),
    inverse(ring, 2, -1, n),
    inverse(ring, 2, 1, n),
    [ring.fromRational(Rational.of(4, 3))],
    exponential(ring, exponent, n),
  ]);

export const potentialSeries = <T>(ring: ConstantRing<T>, exponent: T, n: number): T[] => {
  const cosine: T[] = [];
  let term = ring.one;
  for (let k = 0; k < n; k++) {
    cosine.push(k % 2 === 0 ? term : ring.zero);
    if (k % 2 === 0) term = ring.div(ring.mul(term, ring.piSquared), ring.integer(-(k + 1) * (k + 2)));
  }
  return times(ring, n, [
    reciprocal(ring, cosine, n),
    gammaProduct(ring, [{ slope: 2, power: -1 }], n),
    exponential(ring, exponent, n),
  ]);
};

/** G_0(u)/u without its pole: g_(n+1)/(n+1)!. */
export function subtractionSeries<T>(ring: ConstantRing<T>, n: number): T[] {
  let factorial = 1n;
  return subtraction(ring, n + 1)
    .slice(1)
    .map((g, k) => {
      factorial *= BigInt(k + 1);
      return ring.mul(g, ring.fromRational(Rational.of(1n, factorial)));
    });
}

/** The whole of the pole mass: the poles at u = 0 of its two terms cancel. */
export function massSeries<T>(ring: ConstantRing<T>, exponent: T, n: number): T[] {
  const gammas = gammaProduct(
    ring,
    [
      { slope: 1, power: 1 },
      { slope: -2, power: 1 },
      { slope: -1, power: -1 },
    ],
    n + 1,
  );
  const first = times(ring, n + 1, [
    [ring.integer(6)],
    inverse(ring, 2, -1, n + 1),
    gammas,
    exponential(ring, exponent, n + 1),
  ]).slice(1);
  const second = subtractionSeries(ring, n);
  return first.map((x, k) => ring.mul(ring.add(x, second[k]!), ring.fromRational(Rational.of(1, 4))));
}
