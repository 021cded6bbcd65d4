/**
 * @module Quark-mass anomalous dimension of QCD, SU(3), MSbar, through five loops.
 * Convention  d ln m/d ln μ² = −Σ_k γ_k a^(k+1), a = α_s/(4π), n_f active flavours.
 */
import type { PublishedConstant } from './constant.js';

/** γ_0 … γ_4 as polynomials in nf with rational and zeta coefficients. */
export const MASS_DIMENSION: readonly PublishedConstant[] = [
  { quantity: 'γ_0', formula: '4', source: 'Tarrach 1981', status: 'confirmed-two-sources' },
  { quantity: 'γ_1', formula: '202/3 - 20/9*nf', source: 'Tarrach 1981', status: 'confirmed-two-sources' },
  {
    quantity: 'γ_2',
    formula: '1249 + nf*(-2216/27 - 160/3*z3) - 140/81*nf^2',
    source: 'Tarasov 1982; Larin hep-ph/9302240',
    status: 'confirmed-two-sources',
  },
  {
    quantity: 'γ_3',
    formula:
      '4603055/162 + 135680/27*z3 - 8800*z5 + nf*(-91723/27 - 34192/9*z3 + 880*z4 + 18400/9*z5)' +
      ' + nf^2*(5242/243 + 800/9*z3 - 160/3*z4) + nf^3*(-332/243 + 64/27*z3)',
    source: 'Chetyrkin hep-ph/9703278; Vermaseren, Larin, van Ritbergen hep-ph/9703284',
    status: 'confirmed-two-sources',
  },
  {
    quantity: 'γ_4',
    formula:
      '99512327/162 + 46402466/243*z3 + 96800*z3^2 - 698126/9*z4 - 231757160/243*z5 + 242000*z6 + 412720*z7' +
      ' + nf*(-150736283/1458 - 12538016/81*z3 - 75680/9*z3^2 + 2038742/27*z4 + 49876180/243*z5 - 638000/9*z6' +
      ' - 1820000/27*z7)' +
      ' + nf^2*(1320742/729 + 2010824/243*z3 + 46400/27*z3^2 - 166300/27*z4 - 264040/81*z5 + 92000/27*z6)' +
      ' + nf^3*(91865/1458 + 12848/81*z3 + 448/9*z4 - 5120/27*z5)' +
      ' + nf^4*(-260/243 - 320/243*z3 + 64/27*z4)',
    source: 'Baikov, Chetyrkin, Kühn arXiv:1402.6611; Luthe, Maier, Marquard, Schröder arXiv:1612.05512',
    status: 'rederived',
  },
];
