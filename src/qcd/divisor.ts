/**
 * @module Normalisations of the coupling: x = α_s/divisor.
 * Purpose  the beta function, anomalous dimensions and Borel variables in the variable of the series at hand.
 */
import { Rational, divExact, exact, mulExact, toNumberExact, type Exact } from '../numerics/index.js';
import { formalSymbol } from './constants/formal.js';
import { exactOfFormal } from './constants/formal-value.js';

/** Divisor of the coupling as the series files name it. */
export type CouplingDivisor = '1' | 'pi' | '2*pi' | '4*pi';

const PI = exactOfFormal(formalSymbol('pi'));
const FOUR_PI = mulExact(exact(4), PI);

/** How many π the divisor holds: 0 means that the divisor is the number 1. */
const TIMES_PI: Readonly<Record<CouplingDivisor, number>> = { '1': 0, pi: 1, '2*pi': 2, '4*pi': 4 };

/** The divisor as a number. */
export function divisorSize(divisor: CouplingDivisor): Exact {
  const k = TIMES_PI[divisor];
  return k === 0 ? exact(1) : mulExact(exact(k), PI);
}

/** a/x = divisor/(4π) for a = α_s/(4π): rational unless the divisor is 1. */
export function overFourPi(divisor: CouplingDivisor): Exact {
  const k = TIMES_PI[divisor];
  return k === 0 ? divExact(exact(1), FOUR_PI) : exact(Rational.of(k, 4));
}

/** divisor/(4π) as a double. */
export const overFourPiNumber = (divisor: CouplingDivisor): number => toNumberExact(overFourPi(divisor));
