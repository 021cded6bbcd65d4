/**
 * @module The potential-subtracted mass.
 *
 * Formula    m_PS(μ_f) = M + (1/2) ∫_{q<μ_f} d³q/(2π)³ V(q) = M − (C_F/π) ∫_0^{μ_f} dq α_V(q), V = −4π C_F α_V/q². With α_V(q)
 *            written in α_s(μ_f) and ln(q²/μ_f²): the average of ln^k(q²/μ_f²) over 0 < q < μ_f is (−2)^k k!, exactly. The
 *            ultrasoft logarithm 8π² C_A³ ln(μ_us²/q²) of the fourth order is kept at μ_us = μ_f, where its average is 2.
 * Reference  M. Beneke, hep-ph/9804241; fourth order: M. Beneke, Y. Kiyo, K. Schuller, hep-ph/0501289 (convention recalled).
 */
import { Rational, addExact, exact, mulExact, type Exact } from '../../numerics/index.js';
import {
  POTENTIAL,
  POTENTIAL_ULTRASOFT,
  betaCoefficients,
  exactOfFormal,
  formalAt,
  numberOfFormal,
  potentialRelation,
  scaleLogTable,
} from '../../qcd/index.js';
import type { SeriesInA, SubtractedDefinition } from '../definition.js';

const FOUR_CF = Rational.of(16, 3);
/** Average of the ultrasoft logarithm at μ_us = μ_f. */
const ULTRASOFT_AVERAGE = 2;
const LAST = 4;

/** Average of ln^k(q²/μ_f²). */
function average(k: number): Exact {
  let value = 1;
  for (let j = 1; j <= k; j++) value *= -2 * j;
  return exact(value);
}

export const PS_SERIES: SeriesInA = {
  key: 'ps',
  coefficients(light) {
    const relation = potentialRelation(light, '4*pi');
    const table = scaleLogTable({ coefficients: relation, firstPower: 1 }, betaCoefficients(light));
    return table.slice(0, LAST).map((row, n) => {
      let sum = row.reduce((total, c, k) => addExact(total, mulExact(c, average(k))), exact(0));
      if (n + 1 === LAST) {
        const ultrasoft = mulExact(exactOfFormal(formalAt(POTENTIAL_ULTRASOFT, {})), exact(ULTRASOFT_AVERAGE));
        sum = addExact(sum, ultrasoft);
      }
      return mulExact(exact(FOUR_CF), sum);
    });
  },
  error: (light) =>
    FOUR_CF.toNumber() * numberOfFormal(formalAt({ formula: POTENTIAL[2]?.error ?? '0' }, { nl: light })),
};

export const PS: SubtractedDefinition = {
  kind: 'subtracted',
  name: 'ps',
  title: 'Potential-subtracted mass (PS)',
  symbol: 'm_PS(μ_f)',
  parameter: { symbol: 'μ_f', meaning: 'cutoff on the momentum in the static potential' },
  relativeTo: 'pole',
  renormalonFree: true,
  orders: LAST,
  needsStrength: false,
  pieces: [{ series: PS_SERIES, couplingAt: 1, form: 'R', timesStrength: false }],
  source: 'M. Beneke, Phys. Lett. B434 (1998) 115, hep-ph/9804241; potential: constants/potential.ts',
  status: 'rederived',
  notes: ['at α_s⁴ with the ultrasoft scale at μ_f (convention of hep-ph/0501289, recalled)'],
};
