/**
 * @module The beta function and the mass anomalous dimension in any normalisation of the coupling.
 * Convention  dx/d ln μ² = −Σ_k b_k x^(k+2),  b_k = β_k (divisor/4π)^(k+1);
 *             d ln m/d ln μ² = −Σ_k g_k x^(k+1), g_k = γ_k (divisor/4π)^(k+1).
 */
import { exact, mulExact, toNumberExact, type Exact } from '../numerics/index.js';
import { BETA } from './constants/beta.js';
import { formalAt, type PublishedConstant } from './constants/constant.js';
import { exactOfFormal } from './constants/formal-value.js';
import { MASS_DIMENSION } from './constants/mass-dimension.js';
import { overFourPi, type CouplingDivisor } from './divisor.js';

/** Number of loops kept in β or γ_m. */
export type Loops = 1 | 2 | 3 | 4 | 5;

export const MAX_LOOPS = 5;
/** Largest n_f with asymptotic freedom. */
export const MAX_FLAVOURS = 16;

const cache = new Map<string, readonly Exact[]>();

function coefficients(
  name: string,
  list: readonly PublishedConstant[],
  flavours: number,
  divisor: CouplingDivisor,
): readonly Exact[] {
  const key = `${name} ${flavours} ${divisor}`;
  let values = cache.get(key);
  if (values === undefined) {
    const unit = overFourPi(divisor);
    let power = exact(1);
    values = list.map((constant) => {
      power = mulExact(power, unit);
      return mulExact(exactOfFormal(formalAt(constant, { nf: flavours })), power);
    });
    cache.set(key, values);
  }
  return values;
}

/** b_0 … b_4 for n_f flavours in x = α_s/divisor. */
export const betaCoefficients = (flavours: number, divisor: CouplingDivisor = '4*pi'): readonly Exact[] =>
  coefficients('beta', BETA, flavours, divisor);

/** g_0 … g_4 of the quark mass for n_f flavours in x = α_s/divisor. */
export const massDimensionCoefficients = (flavours: number, divisor: CouplingDivisor = '4*pi'): readonly Exact[] =>
  coefficients('mass', MASS_DIMENSION, flavours, divisor);

/** The first `loops` of b_k as doubles. */
export const betaNumbers = (flavours: number, loops: number, divisor: CouplingDivisor = '4*pi'): readonly number[] =>
  betaCoefficients(flavours, divisor).slice(0, loops).map(toNumberExact);

/** The first `loops` of g_k as doubles. */
export const massDimensionNumbers = (
  flavours: number,
  loops: number,
  divisor: CouplingDivisor = '4*pi',
): readonly number[] => massDimensionCoefficients(flavours, divisor).slice(0, loops).map(toNumberExact);
