/**
 * @module Beta function of QCD, SU(3), MSbar, through five loops.
 * Convention  da/d ln μ² = −Σ_k β_k a^(k+2), a = α_s/(4π), n_f active flavours.
 */
import type { PublishedConstant } from './constant.js';

/** β_0 … β_4 as polynomials in nf with rational and zeta coefficients (zK stands for ζ(K)). */
export const BETA: readonly PublishedConstant[] = [
  {
    quantity: 'β_0',
    formula: '11 - 2/3*nf',
    source: 'Gross, Wilczek 1973; Politzer 1973; FLAG Review 2024, arXiv:2411.04268, Eq. (287)',
    status: 'confirmed-two-sources',
  },
  {
    quantity: 'β_1',
    formula: '102 - 38/3*nf',
    source: 'Caswell 1974; Jones 1974; FLAG Review 2024, arXiv:2411.04268, Eq. (287)',
    status: 'confirmed-two-sources',
  },
  {
    quantity: 'β_2',
    formula: '2857/2 - 5033/18*nf + 325/54*nf^2',
    source: 'Tarasov, Vladimirov, Zharkov 1980; Larin, Vermaseren hep-ph/9302208; PDG 2015 review of QCD',
    status: 'confirmed-two-sources',
  },
  {
    quantity: 'β_3',
    formula: '149753/6 + 3564*z3 + nf*(-1078361/162 - 6508/27*z3) + nf^2*(50065/162 + 6472/81*z3) + 1093/729*nf^3',
    source: 'van Ritbergen, Vermaseren, Larin hep-ph/9701390; Czakon hep-ph/0411261',
    status: 'confirmed-two-sources',
  },
  {
    quantity: 'β_4',
    formula:
      '8157455/16 + 621885/2*z3 - 88209/2*z4 - 288090*z5' +
      ' + nf*(-336460813/1944 - 4811164/81*z3 + 33935/6*z4 + 1358995/27*z5)' +
      ' + nf^2*(25960913/1944 + 698531/81*z3 - 10526/9*z4 - 381760/81*z5)' +
      ' + nf^3*(-630559/5832 - 48722/243*z3 + 1618/27*z4 + 460/9*z5)' +
      ' + nf^4*(1205/2916 - 152/81*z3)',
    source:
      'Baikov, Chetyrkin, Kühn arXiv:1606.08659 (SU(3)); Herzog, Ruijl, Ueda, Vermaseren, Vogt arXiv:1701.01404 (any group)',
    status: 'rederived',
  },
];
