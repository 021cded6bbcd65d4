/**
 * @module The logarithms of the decoupling relations at any scale, from the constants at μ = m(m) alone.
 *
 * Purpose    α_s^(nl)(μ) = α_s^(nl+1)(μ) Z(a, l) and m_q^(nl)(μ) = m_q^(nl+1)(μ) ζ(a, l), a = α_s^(nl+1)(μ)/π,
 *            with l the logarithm of μ² over the heavy mass squared in one of three definitions of that mass.
 * Method     go from μ to μ_h = m(μ_h) with nl+1 flavours, decouple there, come back with nl flavours, with l kept as a
 *            symbol. The other masses enter through ln(M²/μ_h²) or ln(m(μ)²/μ_h²), solved order by order for
 *            ln(μ²/μ_h²). One text for any ring: doubles, balls, exact polynomials in nl and ζ values.
 * Bound      exact in the ring through a^4.
 * Reference  K. Chetyrkin, B. Kniehl, M. Steinhauser, hep-ph/9708255; Y. Schröder, M. Steinhauser, hep-ph/0512058;
 *            K. Chetyrkin, J. Kühn, C. Sturm, hep-ph/0512060; T. Liu, M. Steinhauser, arXiv:1502.04719.
 */
import { polynomialRing, solveSymbol, substituteSymbol, type PolynomialOver } from '../algebra/polynomial-ring.js';
import { shiftCoupling, shiftMass } from '../algebra/renormalisation.js';
import type { Ring } from '../algebra/ring.js';
import { compose, integer, logSeries, mulSeries, scaleSeries } from '../algebra/truncated.js';

/**
 * Definition of the heavy mass in l: 'scale-invariant' μ_h = m(μ_h); 'running' m(μ) at the matching scale, MSbar with
 * nl+1 flavours; 'pole'.
 */
export type HeavyMass = 'scale-invariant' | 'running' | 'pole';

/** Four-loop matching: series in a through a^4. */
export const MATCHING_ORDER = 4;
const LENGTH = MATCHING_ORDER + 1;

/** What the derivation starts from, everything in α_s/π. */
export interface MatchingConstants<T> {
  readonly betaHeavy: readonly T[];
  readonly betaLight: readonly T[];
  readonly gammaHeavy: readonly T[];
  readonly gammaLight: readonly T[];
  /** 1, c_1, …, c_4 of the coupling and 1, d_1, …, d_4 of light masses at μ = m(m). */
  readonly coupling: readonly T[];
  readonly mass: readonly T[];
  /** 1, c_1, … of M/m(m). */
  readonly pole: readonly T[];
}

/** Row k: coefficients of a^k, ascending in l. */
export type MatchingTable<T> = readonly (readonly T[])[];

/** Z ('coupling') or ζ ('mass') through a^4. */
export function matchingTable<T>(
  base: Ring<T>,
  constants: MatchingConstants<T>,
  quantity: 'coupling' | 'mass',
  heavyMass: HeavyMass,
): MatchingTable<T> {
  const ring = polynomialRing(base);
  type P = PolynomialOver<T>;
  const lift = (list: readonly T[]): P[] => list.map((x) => [x]);
  const log: P = [base.zero, base.one];
  const minusLog: P = [base.zero, base.sub(base.zero, base.one)];
  const betaHeavy = lift(constants.betaHeavy);
  const betaLight = lift(constants.betaLight);
  const gammaHeavy = lift(constants.gammaHeavy);

  /** a_h(μ_h) in a, l = ln(μ²/μ_h²). */
  const down = shiftCoupling(ring, betaHeavy, minusLog, LENGTH + 1);
  /** a_l(μ_h) in a. */
  const timesA = mulSeries(ring, [ring.zero, ring.one], lift(constants.coupling), LENGTH + 1);
  const light = compose(ring, timesA, down, LENGTH + 1);

  function couplingRatio(): P[] {
    return compose(ring, shiftCoupling(ring, betaLight, log, LENGTH + 1), light, LENGTH + 1).slice(1);
  }

  function massRatio(): P[] {
    const threshold = compose(ring, lift(constants.mass), down, LENGTH);
    const heavyDown = shiftMass(ring, betaHeavy, gammaHeavy, minusLog, LENGTH);
    const lightUp = compose(ring, shiftMass(ring, betaLight, lift(constants.gammaLight), log, LENGTH), light, LENGTH);
    return mulSeries(ring, mulSeries(ring, heavyDown, threshold, LENGTH), lightUp, LENGTH);
  }

  /** ln(M²/μ_h²) or ln(m(μ)²/μ_h²) in a and l = ln(μ²/μ_h²). */
  function massLog(): P[] {
    if (heavyMass === 'pole') {
      const ratio = compose(ring, lift(constants.pole), down, LENGTH);
      return scaleSeries(ring, logSeries(ring, ratio, LENGTH), integer(ring, 2));
    }
    // The shift by −l gives m(μ_h)/m(μ) = μ_h/m(μ).
    const ratio = shiftMass(ring, betaHeavy, gammaHeavy, minusLog, LENGTH);
    return scaleSeries(ring, logSeries(ring, ratio, LENGTH), integer(ring, -2));
  }

  const ratio = quantity === 'coupling' ? couplingRatio() : massRatio();
  if (heavyMass === 'scale-invariant') return ratio;
  return substituteSymbol(base, ratio, solveSymbol(base, massLog(), LENGTH), LENGTH);
}
