/**
 * @module Mass anomalous dimension for a simple gauge group, MSbar, through four loops.
 * Convention  d ln m/d ln μ² = −Σ_k γ_k a^(k+1), a = g²/(16π²); dRAr, dRRr are the quartic invariants
 *             d_R^{abcd}d_A^{abcd}, d_R^{abcd}d_R^{abcd} over the dimension of the representation.
 */
import type { PublishedConstant } from './constant.js';

/** γ_0 … γ_3; the five-loop form for any group (arXiv:1612.05512, arXiv:1702.01458) is not included. */
export const MASS_DIMENSION_GROUP: readonly PublishedConstant[] = [
  {
    quantity: 'γ_0',
    formula: '3*CF',
    source: 'Tarrach 1981',
    status: 'rederived',
  },
  {
    quantity: 'γ_1',
    formula: '3/2*CF^2 + 97/6*CF*CA - 10/3*CF*TF*nf',
    source: 'Tarrach 1981',
    status: 'rederived',
  },
  {
    quantity: 'γ_2',
    formula:
      '129/2*CF^3 - 129/4*CF^2*CA + 11413/108*CF*CA^2 + CF^2*TF*nf*(-46 + 48*z3)' +
      ' + CF*CA*TF*nf*(-556/27 - 48*z3) - 140/27*CF*TF^2*nf^2',
    source: 'Tarasov 1982; Larin hep-ph/9302240',
    status: 'rederived',
  },
  {
    quantity: 'γ_3',
    formula:
      'CF^4*(-1261/8 - 336*z3) + CF^3*CA*(15349/12 + 316*z3)' +
      ' + CF^2*CA^2*(-34045/36 - 152*z3 + 440*z5) + CF*CA^3*(70055/72 + 1418/9*z3 - 440*z5)' +
      ' + CF^3*TF*nf*(-280/3 + 552*z3 - 480*z5) + CF^2*CA*TF*nf*(-8819/27 + 368*z3 - 264*z4 + 80*z5)' +
      ' + CF*CA^2*TF*nf*(-65459/162 - 2684/3*z3 + 264*z4 + 400*z5)' +
      ' + CF^2*TF^2*nf^2*(304/27 - 160*z3 + 96*z4) + CF*CA*TF^2*nf^2*(1342/81 + 160*z3 - 96*z4)' +
      ' + CF*TF^3*nf^3*(-664/81 + 128/9*z3) + dRAr*(-32 + 240*z3) + nf*dRRr*(64 - 480*z3)',
    source: 'Vermaseren, Larin, van Ritbergen hep-ph/9703284',
    status: 'rederived',
  },
];
