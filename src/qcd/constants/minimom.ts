/**
 * @module The mini-MOM coupling in Landau gauge, SU(3), through three loops.
 * Convention  α_MM(μ) = α_s(μ) (1 + Σ_k D_k a^k), a = α_s(μ)/(4π) in MSbar.
 */
import type { PublishedConstant } from './constant.js';

const SOURCE = 'von Smekal, Maltman, Sternbeck arXiv:0903.1696';

export const MINIMOM: readonly PublishedConstant[] = [
  { quantity: 'D_1', formula: '169/12 - 10/9*nf', source: SOURCE, status: 'memory' },
  {
    quantity: 'D_2',
    formula: '76063/144 - 351/8*z3 - (1913/27 + 4/3*z3)*nf + 100/81*nf^2',
    source: SOURCE,
    status: 'memory',
  },
  {
    quantity: 'D_3',
    formula:
      '42074947/1728 - 60675/16*z3 - 70245/64*z5 - (769387/162 - 8362/27*z3 - 2320/9*z5)*nf' +
      ' + (199903/972 + 28/9*z3)*nf^2 - 1000/729*nf^3',
    source: SOURCE,
    status: 'memory',
  },
];
