/**
 * @module Colour factors: the values that turn the group forms into SU(N) or into QED.
 * Reference  van Ritbergen, Vermaseren, Larin hep-ph/9701390; Vermaseren, Larin, van Ritbergen hep-ph/9703284.
 */
import { Rational } from '../../numerics/index.js';
import { formalAt } from './constant.js';
import { rationalOfFormal, type Formal } from './formal.js';

/** The symbols of the group forms. */
export type ColourSymbol = 'CA' | 'CF' | 'TF' | 'dAA' | 'dRA' | 'dRR' | 'dRAr' | 'dRRr';
export type ColourFactors = Readonly<Record<ColourSymbol, Rational>>;

/** SU(N), fermions in the fundamental representation, T_F = 1/2; numerator and denominator polynomials in N. */
const SUN: Readonly<Record<ColourSymbol, readonly [string, string]>> = {
  CA: ['N', '1'],
  CF: ['N^2 - 1', '2*N'],
  TF: ['1', '2'],
  dAA: ['N^2*(N^2 + 36)', '24'],
  dRA: ['N*(N^2 + 6)', '48'],
  dRR: ['N^4 - 6*N^2 + 18', '96*N^2'],
  // The same invariants over N instead of over N² − 1.
  dRAr: ['(N^2 - 1)*(N^2 + 6)', '48'],
  dRRr: ['(N^2 - 1)*(N^4 - 6*N^2 + 18)', '96*N^3'],
};

const evaluate = (formula: string, n: number): Rational =>
  rationalOfFormal(formalAt({ formula }, { N: n })) ?? Rational.ZERO;

/** Colour factors of SU(n), n ≥ 2. */
export function colourOfSU(n: number): ColourFactors {
  const at = (s: ColourSymbol): Rational => evaluate(SUN[s][0], n).div(evaluate(SUN[s][1], n));
  return {
    CA: at('CA'),
    CF: at('CF'),
    TF: at('TF'),
    dAA: at('dAA'),
    dRA: at('dRA'),
    dRR: at('dRR'),
    dRAr: at('dRAr'),
    dRRr: at('dRRr'),
  };
}

/** QED with n_f charged leptons of unit charge. */
export const QED: ColourFactors = {
  CA: Rational.ZERO,
  CF: Rational.ONE,
  TF: Rational.ONE,
  dAA: Rational.ZERO,
  dRA: Rational.ZERO,
  dRR: Rational.ONE,
  dRAr: Rational.ZERO,
  dRRr: Rational.ONE,
};

/** A group form for given colour factors: a polynomial in nf and zeta values. */
export const forGroup = (constant: { readonly formula: string }, colour: ColourFactors): Formal =>
  formalAt(constant, { ...colour });
