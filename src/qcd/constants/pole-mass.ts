/**
 * @module Pole mass over MSbar mass, SU(3), through four loops.
 * Convention  M/m(m) = 1 + Σ_k c_k a^k, a = α_s^(nl+1)(m)/π, m = m(m), nl massless flavours beside the heavy one.
 */
import type { PublishedConstant } from './constant.js';

export const POLE_OVER_MSBAR: readonly PublishedConstant[] = [
  { quantity: 'c_1', formula: '4/3', source: 'Tarrach 1981', status: 'confirmed-two-sources' },
  {
    quantity: 'c_2',
    formula: '307/32 + 2*z2 + 2/3*z2*ln2 - z3/6 + nl*(-71/144 - 1/3*z2)',
    source: 'Gray, Broadhurst, Grafe, Schilcher, Z. Phys. C48 (1990) 673',
    status: 'rederived',
  },
  {
    quantity: 'c_3',
    formula:
      '8481925/93312 + 652841/38880*pi^2 - 575/162*pi^2*ln2 - 22/81*pi^2*ln2^2 - 695/7776*pi^4 + 58/27*z3' +
      ' - 1439/432*pi^2*z3 + 1975/216*z5 - 55/162*ln2^4 - 220/27*a4' +
      ' + nl*(-231847/23328 - 991/648*pi^2 - 11/81*pi^2*ln2 + 2/81*pi^2*ln2^2 + 61/1944*pi^4 - 241/72*z3' +
      ' + 1/81*ln2^4 + 8/27*a4)' +
      ' + nl^2*(2353/23328 + 13/324*pi^2 + 7/54*z3)',
    source: 'Melnikov, van Ritbergen hep-ph/9912391; Chetyrkin, Steinhauser hep-ph/9907509, hep-ph/9911434 (numerical)',
    status: 'rederived',
  },
  {
    quantity: 'c_4',
    formula: '3567.60 - 745.721*nl + 43.3962*nl^2 - (42979/1119744 + 317/2592*z3 + 89/3888*pi^2 + 71/25920*pi^4)*nl^3',
    source:
      'Marquard, Smirnov, Smirnov, Steinhauser, Wellmann arXiv:1606.06754 (numerical); nl² and nl³: ' +
      'Lee, Marquard, Smirnov, Smirnov, Steinhauser arXiv:1301.6481',
    status: 'rederived',
    // The errors of the nl^0 and nl^1 terms, added linearly: the correlation is not published.
    error: '1.64 + 0.040*nl',
  },
];
