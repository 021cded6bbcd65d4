/**
 * @module Virtual part of the b → u width in the large-β0 limit: vertex and on-shell wave function.
 *
 *   V(u) = T(u) [c_X(u) (ψ(−2u) − ψ(−u)) + c_0(u)],  T = −Γ(1+u)Γ(−2u)/(u Γ(1−u)) = 4^(−u) Γ(u)Γ(1/2−u)/(2√π u),
 *   c_X = 64 u(u+1)(2u−1)/D,  c_0 = 4u(9u³ − 103u² − 14u + 62)/(3D),  D = (u−1)(u−2)(u−4).
 * With ψ(−2u) − ψ(−u) = [ψ(1/2−u) − ψ(−u)]/2 + ln 2 and g_k = (1/2)_k/k!, O_k = Σ_{j<=k} 1/(2j−1), c_X = 2u x(u),
 * c_0 = 2u y(u), the principal parts are rational:
 *   u = −k:    simple  (−4)^k g_k [x(−k)(O_k − H_(k−1)/2) + y(−k)],
 *   u = k+1/2: double  −(−1)^k 4^(−u) g_k x(u)/2,  simple (−1)^k 4^(−u) g_k [x(u)/(2u) − x′(u)/2 − y(u)],
 *   u = k >= 1: simple −(−1)^k 4^(−k) x(k)/(2k g_k); at 1, 2, 4 from the Laurent series of x and y.
 * Masses     by partial fractions of x and y, whose poles at 1, 2, 4 lie below the towers; 1/(k g_k) = B(k, 1/2).
 * Reference  own derivation (massive-gluon phase space and on-shell vertex); reproduces the numbers of P. Ball, M. Beneke,
 *            V. M. Braun, Phys. Rev. D 52 (1995) 3929, hep-ph/9503492 (table from memory). Status: derived, checked two ways.
 */
import { Rational } from '../numerics/index.js';
import { halfBinomial } from './pole-mass.js';
import { PLAIN, remembered } from './tower.js';
import type { Component, Pole, Tower } from './tower.js';

const q = (n: number, d = 1): Rational => Rational.of(n, d);
const sign = (k: number): Rational => q(k % 2 === 0 ? 1 : -1);
const FOUR = q(4);
const HALF = q(1, 2);
const ROOTS = [1, 2, 4];

const polynomial = (coefficients: readonly number[], u: Rational): Rational =>
  coefficients.reduce((sum, c) => sum.mul(u).add(q(c)), Rational.ZERO);

/** 32(u+1)(2u−1) and its derivative, (2/3)(9u³ − 103u² − 14u + 62). */
const numeratorX = (u: Rational): Rational => polynomial([64, 32, -32], u);
const slopeX = (u: Rational): Rational => polynomial([128, 32], u);
const numeratorY = (u: Rational): Rational => polynomial([9, -103, -14, 62], u).mul(q(2, 3));

/** Π (u − root) and Σ 1/(u − root) over the roots but one. */
function denominator(u: Rational, without?: number): { readonly value: Rational; readonly log: Rational } {
  const factors = ROOTS.filter((r) => r !== without).map((r) => u.sub(q(r)));
  return {
    value: factors.reduce((product, f) => product.mul(f), Rational.ONE),
    log: factors.reduce((sum, f) => sum.add(f.inv()), Rational.ZERO),
  };
}

const x = (u: Rational): Rational => numeratorX(u).div(denominator(u).value);
const y = (u: Rational): Rational => numeratorY(u).div(denominator(u).value);

function xSlope(u: Rational): Rational {
  const { value, log } = denominator(u);
  return slopeX(u).sub(numeratorX(u).mul(log)).div(value);
}

/** H_k and O_k. */
const harmonic = partialSum((j) => q(1, j));
const odd = partialSum((j) => q(1, 2 * j - 1));

/** k → Σ_{j=1}^k f(j), with the sums kept. */
function partialSum(f: (j: number) => Rational): (k: number) => Rational {
  const sums = [Rational.ZERO];
  return (k) => {
    for (let j = sums.length; j <= k; j++) sums.push(sums[j - 1]!.add(f(j)));
    return sums[k]!;
  };
}

function ultraviolet(k: number): readonly Rational[] {
  const u = q(-k);
  const bracket = x(u)
    .mul(odd(k).sub(harmonic(k - 1).mul(HALF)))
    .add(y(u));
  return [FOUR.pow(k).mul(sign(k)).mul(halfBinomial(k)).mul(bracket)];
}

function halfInteger(k: number): readonly Rational[] {
  const u = q(2 * k + 1, 2);
  const size = halfBinomial(k).mul(sign(k)).div(FOUR.pow(k)).mul(HALF);
  const simple = x(u).div(u).sub(xSlope(u)).mul(HALF).sub(y(u));
  return [size.mul(simple), size.mul(x(u)).mul(HALF).neg()];
}

const size = (k: number): Rational =>
  sign(k)
    .div(FOUR.pow(k))
    .div(q(2 * k))
    .div(halfBinomial(k));
const integer = (k: number): readonly Rational[] => [
  size(k)
    .mul(x(q(k)))
    .neg(),
];

/** u = 1, 2, 4: x and y have poles there themselves. */
function special(k: number): Pole {
  const at = q(k);
  const { value, log } = denominator(at, k);
  const residueX = numeratorX(at).div(value);
  const regularX = slopeX(at).sub(numeratorX(at).mul(log)).div(value);
  const residueY = numeratorY(at).div(value);
  // Per 2u: x/ε + x_0 times −1/(2ε) + s, with 2u = 2k(1 + ε/k) and T = T_k (1 + tε).
  const s = odd(k).sub(harmonic(k).mul(HALF));
  const t = harmonic(k - 1).sub(odd(k).mul(q(2)));
  const double = residueX.mul(HALF).neg();
  const simple = residueX.mul(s).sub(regularX.mul(HALF)).add(residueY).add(double.mul(t));
  return { at, parts: [simple, double].map((part) => part.mul(size(k)).mul(q(2))) };
}

const atHalf = (k: number): Pole => ({ at: q(2 * k + 1, 2), parts: halfInteger(k) });

const TOWERS: readonly Tower[] = [
  {
    side: 'ultraviolet',
    first: q(1),
    parts: remembered((k) => ultraviolet(k + 1)),
    decay: { kind: 'alternating', mass: [100] },
  },
  {
    side: 'infrared',
    first: q(11, 2),
    parts: remembered((k) => halfInteger(k + 5)),
    decay: { kind: 'alternating', mass: [300, 90] },
  },
  {
    side: 'infrared',
    first: q(5),
    parts: remembered((k) => integer(k + 5)),
    decay: { kind: 'alternating', mass: [100] },
  },
];

/** V(u)/4, in units of C_F/π. */
export const VIRTUAL: Component = {
  factor: { rational: q(1, 4), pi: 0 },
  kernel: PLAIN,
  base: FOUR,
  poles: [
    { at: q(0), parts: [q(-20, 3), q(-2)] },
    ...[0, 1, 2, 3, 4].map(atHalf),
    ...[1, 2, 4].map(special),
    { at: q(3), parts: integer(3) },
  ],
  towers: TOWERS,
};
