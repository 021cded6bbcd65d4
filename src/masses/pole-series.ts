/**
 * @module M/m(m) − 1 in a = α_s/(4π) with n_l flavours at μ = m(m), and the form without heavy-quark loops.
 *
 * Reference  K. Melnikov, T. van Ritbergen, hep-ph/9912391; P. Marquard et al., arXiv:1606.06754. Without heavy-quark loops:
 *            A. Hoang et al., arXiv:1704.01580 (numbers recalled). Its first three coefficients are derived here from the
 *            colour structures of hep-ph/9912391 with n_h = 0 and the running with n_l flavours (213.437 − 16.6619 n_l,
 *            12075.0 − 1707.35 n_l + 41.7722 n_l² as published). Of the fourth, n_l³ is exact, n_l² agrees with a dispersive
 *            calculation of the chain with one massive bubble (n_h n_l²: 0.0172 in (α_s/π)^4), the rest is recalled.
 */
import { Rational, exact, mulExact, type Exact } from '../numerics/index.js';
import {
  exactOfFormal,
  formalAt,
  massRatioSeries,
  numberOfFormal,
  poleMassCoefficientError,
  type PublishedConstant,
} from '../qcd/index.js';
import type { SeriesInA } from './definition.js';

/** (α_s/π)^4 in units of a^4. */
const FOURTH = 256;

/** m(m)-normalised pole mass. The error of the fourth coefficient is the published one. */
export const POLE_SERIES: SeriesInA = {
  key: 'pole',
  coefficients: (light) =>
    massRatioSeries({
      of: 'pole',
      over: 'msbar',
      light,
      divisor: '4*pi',
      coupling: 'light',
      reference: 'msbar',
      log: exact(0),
    }).slice(1),
  error: (light) => poleMassCoefficientError(light) * FOURTH,
};

/** c_n of M/m(m) in α_s^(n_l)/π at μ = m(m) without loops of the heavy quark. */
export const POLE_WITHOUT_HEAVY: readonly PublishedConstant[] = [
  { quantity: 'c_1', formula: '4/3', source: 'Tarrach 1981', status: 'confirmed-two-sources' },
  {
    quantity: 'c_2, n_h = 0',
    formula: '3049/288 + 2/9*pi^2 + 1/9*pi^2*ln2 - z3/6 + nl*(-71/144 - pi^2/18)',
    source: 'Gray, Broadhurst, Grafe, Schilcher, Z. Phys. C48 (1990) 673',
    status: 'rederived',
  },
  {
    quantity: 'c_3, n_h = 0',
    formula:
      '1145453/10368 + 25379/2592*pi^2 + 235/54*pi^2*ln2 - 7/27*pi^2*ln2^2 - 341/2592*pi^4 - 9/8*z3 - 1331/432*pi^2*z3' +
      ' + 1705/216*z5 - 19/54*ln2^4 - 76/9*a4' +
      ' + nl*(-81227/7776 - 965/648*pi^2 - 11/81*pi^2*ln2 + 2/81*pi^2*ln2^2 + 61/1944*pi^4 - 707/216*z3 + 1/81*ln2^4 + 8/27*a4)' +
      ' + nl^2*(2353/23328 + 13/324*pi^2 + 7/54*z3)',
    source: 'colour structures of Melnikov, van Ritbergen hep-ph/9912391',
    status: 'rederived',
  },
  {
    quantity: 'c_4, n_h = 0',
    formula:
      '(911588 - 190683*nl + 11105.0*nl^2)/256 - (42979/1119744 + 317/2592*z3 + 89/3888*pi^2 + 71/25920*pi^4)*nl^3',
    source: 'Hoang et al. arXiv:1704.01580, from arXiv:1606.06754 (numerical)',
    status: 'memory',
    error: '(417 + 10*nl)/256',
  },
];

/** 4^n: from α_s/π to a. */
const inA = (c: Exact, n: number): Exact => mulExact(c, exact(4 ** n));

export const NATURAL_SERIES: SeriesInA = {
  key: 'natural',
  coefficients: (light) =>
    POLE_WITHOUT_HEAVY.map((constant, k) => inA(exactOfFormal(formalAt(constant, { nl: light })), k + 1)),
  error: (light) =>
    numberOfFormal(formalAt({ formula: POLE_WITHOUT_HEAVY[3]?.error ?? '0' }, { nl: Rational.of(light) })) * FOURTH,
};
