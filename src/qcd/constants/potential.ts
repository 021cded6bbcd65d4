/**
 * @module Static quark-antiquark potential in momentum space, SU(3), through three loops.
 * Convention  V(q) = −4π C_F α_s(q)/q² [1 + a_1 a + a_2 a² + (a_3 + 8π² C_A³ ln(μ_us²/q²)) a³], a = α_s^(nl)(q)/(4π).
 *             The ultrasoft logarithm is left out of a_3.
 */
import type { PublishedConstant } from './constant.js';

export const POTENTIAL: readonly PublishedConstant[] = [
  { quantity: 'a_1', formula: '31/3 - 10/9*nl', source: 'Fischler 1977; Billoire 1980', status: 'memory' },
  {
    quantity: 'a_2',
    formula:
      '9*(4343/162 + 4*pi^2 - pi^4/4 + 22/3*z3) - 3/2*(1798/81 + 56/3*z3)*nl - 2/3*(55/3 - 16*z3)*nl + 100/81*nl^2',
    source: 'Peter hep-ph/9610209, hep-ph/9702245; Schröder hep-ph/9812205',
    status: 'memory',
  },
  {
    quantity: 'a_3',
    formula:
      '502.24*27 - 136.39*15/16' +
      ' + nl*(-709.717*9/2 + (-71281/162 + 264*z3 + 80*z5)*2 + (286/9 + 296/3*z3 - 160*z5)*8/9 - 56.83*5/96)' +
      ' + nl^2*((12541/243 + 368/3*z3 + 64/135*pi^4)*3/4 + (14002/81 - 416/3*z3)/3)' +
      ' - 1000/729*nl^3',
    source:
      'Smirnov, Smirnov, Steinhauser arXiv:0809.1927, arXiv:0911.4742; Anzai, Kiyo, Sumino arXiv:0911.4335 (numerical)',
    status: 'memory',
    error: '0.01*27 + 0.12*15/16 + 0.01*5/96*nl',
  },
];

/** Coefficient of a³ ln(μ_us²/q²) in momentum space (dimensional regularisation): 8π² C_A³. */
export const POTENTIAL_ULTRASOFT: PublishedConstant = {
  quantity: 'ultrasoft logarithm',
  formula: '216*pi^2',
  source: 'Appelquist, Dine, Muzinich 1978; Kniehl, Penin, Smirnov, Steinhauser hep-ph/0203166',
  status: 'memory',
};
