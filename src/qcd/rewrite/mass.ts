/**
 * @module Ratios of the definitions of a heavy-quark mass as series in the coupling, at any scale.
 *
 * Purpose    re-expansion of a series under a change of mass definition: M = m · (M/m), with the logarithms and the
 *            coupling (n_l or n_l + 1 flavours) of the series at hand.
 * Method     M/m(m) at μ = m, moved to μ by the renormalisation group with the logarithm as a symbol; m(μ)/m(m) from
 *            γ_m; the logarithm of the pole mass and the coupling of the light theory are solved for order by order.
 * Bound      exact through x^4 (four-loop pole mass: numerically known, see constants/pole-mass.ts for its error).
 * Reference  K. Melnikov, T. van Ritbergen, hep-ph/9912391; P. Marquard et al., arXiv:1606.06754.
 */
import { exact, mulExact, type Exact } from '../../numerics/index.js';
import {
  evaluatePolynomial,
  polynomialRing,
  solveSymbol,
  substituteSymbol,
  type PolynomialOver,
} from '../algebra/polynomial-ring.js';
import { shiftCoupling, shiftMass } from '../algebra/renormalisation.js';
import { liftExact, type Ring } from '../algebra/ring.js';
import {
  compose,
  integer,
  logSeries,
  mulSeries,
  reciprocal,
  reversion,
  scaleSeries,
  truncate,
} from '../algebra/truncated.js';
import { formalRing, type Formal } from '../constants/index.js';
import { overFourPi, type CouplingDivisor } from '../divisor.js';
import { MATCHING_ORDER, matchingTable, type MatchingConstants } from '../matching/logs.js';
import { formalConstants, matchingConstants, matchingInputs } from '../matching/tables.js';

/** 'pole' M; 'msbar' m(m); 'running' m(μ) at the scale of the coupling. MSbar masses with n_l + 1 flavours. */
export type MassDefinition = 'pole' | 'msbar' | 'running';

export interface MassRatioQuestion {
  readonly of: MassDefinition;
  readonly over: MassDefinition;
  /** Massless flavours n_l beside the heavy quark. */
  readonly light: number;
  readonly divisor: CouplingDivisor;
  /** The coupling of the series: with n_l + 1 ('heavy') or n_l flavours ('light'). */
  readonly coupling: 'heavy' | 'light';
  /** The mass in the logarithm below: M or m(m). */
  readonly reference: 'pole' | 'msbar';
  /** ln(μ²/mass²) for that mass. */
  readonly log: Exact;
}

const LENGTH = MATCHING_ORDER + 1;

type Shape = Pick<MassRatioQuestion, 'of' | 'over' | 'coupling' | 'reference'>;

/** The ratio in a = α_s/π with polynomials in the logarithm as coefficients. */
function ratioTable<T>(base: Ring<T>, constants: MatchingConstants<T>, question: Shape): PolynomialOver<T>[] {
  const ring = polynomialRing(base);
  const lift = (list: readonly T[]): PolynomialOver<T>[] => list.map((x) => [x]);
  const minusLog = [base.zero, base.sub(base.zero, base.one)];
  const beta = lift(constants.betaHeavy);
  const down = shiftCoupling(ring, beta, minusLog, LENGTH);
  const pole = compose(ring, lift(constants.pole), down, LENGTH);
  const series = {
    pole,
    msbar: truncate(ring, [ring.one], LENGTH),
    // The shift by −l leads from m(μ) to m(m).
    running: reciprocal(ring, shiftMass(ring, beta, lift(constants.gammaHeavy), minusLog, LENGTH), LENGTH),
  };
  let ratio = mulSeries(ring, series[question.of], reciprocal(ring, series[question.over], LENGTH), LENGTH);
  if (question.reference === 'pole') {
    const delta = scaleSeries(ring, logSeries(ring, pole, LENGTH), integer(ring, 2));
    ratio = substituteSymbol(base, ratio, solveSymbol(base, delta, LENGTH), LENGTH);
  }
  if (question.coupling === 'light') {
    const heavyMass = question.reference === 'pole' ? 'pole' : 'scale-invariant';
    const z = matchingTable(base, constants, 'coupling', heavyMass);
    const lightInHeavy = [ring.zero, ...z.slice(0, LENGTH)];
    ratio = compose(ring, ratio, reversion(ring, lightInHeavy, LENGTH), LENGTH);
  }
  return ratio;
}

/** Coefficients of x^0 … x^4 of a ratio of two masses, x = α_s/divisor at the scale μ of the logarithm. */
export function massRatioSeries(question: MassRatioQuestion): Exact[] {
  const { of, over, coupling, reference } = question;
  const inPi = liftExact([question.log, ...matchingInputs(question.light)], (ring, [log, ...flat]) =>
    ratioTable(ring, matchingConstants(flat), { of, over, coupling, reference })
      .slice(0, LENGTH)
      .map((row) => evaluatePolynomial(ring, row, log ?? ring.zero)),
  );
  const unit = mulExact(exact(4), overFourPi(question.divisor));
  let power = exact(1);
  return inPi.map((c, k) => {
    if (k > 0) power = mulExact(power, unit);
    return k === 0 ? c : mulExact(c, power);
  });
}

/** The same ratio in α_s/π with every constant kept as a symbol, from the logarithm in symbols. */
export function massRatioFormal(question: Omit<MassRatioQuestion, 'divisor' | 'log'>, log: Formal): Formal[] {
  return ratioTable(formalRing, formalConstants(question.light), question)
    .slice(0, LENGTH)
    .map((row) => evaluatePolynomial(formalRing, row, log));
}
