/** @module The quantities whose large-β0 limit is known in closed form. */
import { Rational } from '../numerics/index.js';
import { ADLER, R_RATIO, TAU_WIDTH } from './adler.js';
import { widthAndMass, widthForms } from './b-to-u-forms.js';
import { REAL } from './b-to-u-real.js';
import { VIRTUAL } from './b-to-u-virtual.js';
import { MASS } from './pole-mass.js';
import type { Quantity } from './quantity.js';
import { POTENTIAL } from './static-potential.js';
import { SUM_RULES } from './sum-rules.js';
import type { Component } from './tower.js';
import { adlerSeries, circleSeries, massSeries, potentialSeries, sumRuleSeries, tauSeries } from './taylor.js';

const q = (n: number, d = 1): Rational => Rational.of(n, d);
const OVER_PI = { text: 'alpha_s/pi', factor: { rational: q(1), pi: -1 } };
const CF_OVER_PI = { text: 'C_F alpha_s/pi', factor: { rational: q(4, 3), pi: -1 } };

const ADLER_SOURCES = [
  'D. J. Broadhurst, Z. Phys. C 58 (1993) 339',
  'M. Beneke, Nucl. Phys. B 405 (1993) 424',
  'contours: P. Ball, M. Beneke, V. M. Braun, Nucl. Phys. B 452 (1995) 563, hep-ph/9502300',
];
const MASS_SOURCES = [
  'M. Beneke, V. M. Braun, Nucl. Phys. B 426 (1994) 301, hep-ph/9402364',
  'P. Ball, M. Beneke, V. M. Braun, Nucl. Phys. B 452 (1995) 563, hep-ph/9502300',
];
const WIDTH_SOURCES = [
  'own derivation: massive-gluon phase space and on-shell vertex',
  'numbers: P. Ball, M. Beneke, V. M. Braun, Phys. Rev. D 52 (1995) 3929, hep-ph/9503492',
];
const CHECKED = 'formula from memory; residues re-derived; checked against the leading n_f terms of known coefficients';

const SUM_RULE: Omit<Quantity, 'name' | 'title' | 'meaning'> = {
  formula: '(1/3) (3+u)/[(1-u^2)(1-u^2/4)]',
  sources: ['D. J. Broadhurst, A. L. Kataev, Phys. Lett. B 315 (1993) 179'],
  status: CHECKED,
  norm: OVER_PI,
  hard: 'Q',
  flavours: 3,
  components: [SUM_RULES],
  series: sumRuleSeries,
  rational: true,
  euclidean: true,
};

const scaled = (c: Component, by: Rational): Component => ({
  ...c,
  factor: { rational: c.factor.rational.mul(by), pi: c.factor.pi },
});

export const QUANTITIES: readonly Quantity[] = [
  {
    name: 'adler',
    title: 'Adler function',
    meaning: 'D = 1 + R, massless quarks, non-singlet, Euclidean Q',
    formula: '(32/3)/(2-u) sum_{k>=2} (-1)^k k/[k^2-(1-u)^2]^2',
    sources: ADLER_SOURCES,
    status: CHECKED,
    norm: OVER_PI,
    hard: 'Q',
    flavours: 3,
    components: [ADLER],
    series: adlerSeries,
    euclidean: true,
  },
  {
    name: 'r-ratio',
    title: 'R(e+e-)',
    meaning: 'R(s)/R_0 = 1 + R, massless quarks, non-singlet; Q = sqrt(s)',
    formula: 'that of the Adler function times sin(pi u)/(pi u)',
    sources: ADLER_SOURCES,
    status: CHECKED,
    norm: OVER_PI,
    hard: 'sqrt(s)',
    flavours: 3,
    components: [R_RATIO],
    series: circleSeries,
    euclidean: true,
  },
  {
    name: 'tau-width',
    title: 'Hadronic width of the tau',
    meaning: 'R_tau = R_0 (1 + R), massless quarks, fixed order in alpha_s(mu)',
    formula: 'that of the Adler function times [sin(pi u)/(pi u)] 12/[(1-u)(3-u)(4-u)]',
    sources: ADLER_SOURCES,
    status: CHECKED,
    norm: OVER_PI,
    hard: 'm_tau',
    flavours: 3,
    components: [TAU_WIDTH],
    series: tauSeries,
    euclidean: true,
  },
  {
    name: 'pole-mass',
    title: 'Pole mass over MSbar mass',
    meaning: 'm_pole = m(mu) (1 + R); with mu = m the mass is m(m)',
    formula: '(1/4) {6 (1-u) Gamma(u) Gamma(1-2u)/Gamma(3-u)}, and G_0(u)/(4u) beside it',
    sources: MASS_SOURCES,
    status: CHECKED,
    norm: CF_OVER_PI,
    hard: 'm(m)',
    flavours: 4,
    components: [MASS],
    subtraction: q(1, 4),
    series: massSeries,
    euclidean: true,
  },
  {
    name: 'static-potential',
    title: 'Static potential',
    meaning: 'V(r) = -(C_F/r) R',
    formula: '1/[cos(pi u) Gamma(1+2u)]',
    sources: ['U. Aglietti, Z. Ligeti, Phys. Lett. B 364 (1995) 75, hep-ph/9503209'],
    status: CHECKED,
    norm: { text: 'alpha_s', factor: { rational: q(1), pi: 0 } },
    hard: '1/r',
    flavours: 3,
    components: [POTENTIAL],
    series: potentialSeries,
    euclidean: true,
  },
  { ...SUM_RULE, name: 'bjorken', title: 'Polarised Bjorken sum rule', meaning: 'K = 1 - R, non-singlet' },
  {
    ...SUM_RULE,
    name: 'gross-llewellyn-smith',
    title: 'Gross-Llewellyn Smith sum rule',
    meaning: 'K = 1 - R, without light-by-light terms: the same R as for Bjorken',
  },
  {
    name: 'b-to-u-pole',
    title: 'Width of b -> u l nu, pole mass',
    meaning: 'Gamma = Gamma_0(m_pole^5) (1 + R)',
    formula: 'virtual part T(u) [c_X (psi(-2u) - psi(-u)) + c_0]/4, real part -sin(pi u) Q(u)/(4 pi)',
    sources: WIDTH_SOURCES,
    status:
      'own derivation; closed form and dispersive integral agree to 37 digits; exact c_2 matched by integer relation',
    norm: CF_OVER_PI,
    hard: 'm',
    flavours: 4,
    components: [VIRTUAL, ...REAL],
    matched: widthForms,
    euclidean: false,
  },
  {
    name: 'b-to-u-msbar',
    title: 'Width of b -> u l nu, MSbar mass',
    meaning: 'Gamma = Gamma_0(m(mu)^5) (1 + R): the width in the pole mass and five times the pole mass',
    formula: 'the sum of that of b-to-u-pole and five times that of pole-mass',
    sources: [...WIDTH_SOURCES, ...MASS_SOURCES],
    status:
      'own derivation; closed form and dispersive integral agree to 37 digits; exact c_2 matched by integer relation',
    norm: CF_OVER_PI,
    hard: 'm(m)',
    flavours: 4,
    components: [VIRTUAL, ...REAL, scaled(MASS, q(5))],
    subtraction: q(5, 4),
    matched: widthAndMass,
    euclidean: false,
  },
];

/** Other names that people write. */
const ALIASES: Readonly<Record<string, string>> = {
  r: 'r-ratio',
  tau: 'tau-width',
  'tau-delta0': 'tau-width',
  'pole-msbar': 'pole-mass',
  potential: 'static-potential',
  gls: 'gross-llewellyn-smith',
};

export const QUANTITY_NAMES: readonly string[] = QUANTITIES.map(({ name }) => name);

/** The quantity of a name; undefined for one that is not known. */
export const quantityNamed = (name: string): Quantity | undefined =>
  QUANTITIES.find((quantity) => quantity.name === (ALIASES[name.toLowerCase()] ?? name.toLowerCase()));
