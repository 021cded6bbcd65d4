/**
 * @module A series in the coupling with one flavour more or less, at the same scale.
 * Method  the decoupling relation as a relation between couplings (matching/logs.ts), exact through four loops.
 * Bound   exact for rational logarithms up to the numerically known constants.
 */
import { divExact, exact, mulExact, addExact, type Exact } from '../../numerics/index.js';
import { overFourPi, type CouplingDivisor } from '../divisor.js';
import type { HeavyMass } from '../matching/logs.js';
import { exactTable, type MatchedQuantity } from '../matching/tables.js';
import { invertRelation, type CouplingRelation } from './relation.js';

export interface Decoupling {
  /** Light flavours nl; the other coupling has nl + 1. */
  readonly light: number;
  readonly divisor: CouplingDivisor;
  /** ln(μ²/m²) for the heavy mass of the kind below. */
  readonly log: Exact;
  readonly heavyMass: HeavyMass;
}

/** Z or ζ in powers of x^(nl+1): coefficients of x^0 … x^4. */
function ratioSeries(quantity: MatchedQuantity, decoupling: Decoupling): Exact[] {
  // The table is in powers of α_s/π = (x divisor/π).
  const unit = mulExact(exact(4), overFourPi(decoupling.divisor));
  let power = divExact(exact(1), unit);
  return exactTable(decoupling.light, quantity, decoupling.heavyMass).map((row) => {
    power = mulExact(power, unit);
    let sum = exact(0);
    for (let j = row.length - 1; j >= 0; j--) sum = addExact(mulExact(sum, decoupling.log), row[j] ?? exact(0));
    return mulExact(sum, power);
  });
}

/** x^(nl) in powers of x^(nl+1): five terms. */
export const decouplingRelation = (decoupling: Decoupling): CouplingRelation => ratioSeries('coupling', decoupling);

/** x^(nl+1) in powers of x^(nl): five terms. */
export const inverseDecouplingRelation = (decoupling: Decoupling): CouplingRelation =>
  invertRelation(decouplingRelation(decoupling));

/** m_q^(nl)/m_q^(nl+1) of a light quark in powers of x^(nl+1), from x^0 to x^4. */
export const decouplingMassFactor = (decoupling: Decoupling): Exact[] => ratioSeries('mass', decoupling);
