/**
 * @module Beta function of a simple gauge group with n_f fermions in one representation, MSbar, through five loops.
 * Convention  da/d ln μ² = −Σ_k β_k a^(k+2), a = g²/(16π²); CA, CF, TF colour factors; dAA, dRA, dRR the quartic
 *             invariants d_A^{abcd}d_A^{abcd}, d_R^{abcd}d_A^{abcd}, d_R^{abcd}d_R^{abcd} over the number of generators.
 */
import type { PublishedConstant } from './constant.js';

export const BETA_GROUP: readonly PublishedConstant[] = [
  {
    quantity: 'β_0',
    formula: '11/3*CA - 4/3*TF*nf',
    source: 'Gross, Wilczek 1973; Politzer 1973',
    status: 'confirmed-two-sources',
  },
  {
    quantity: 'β_1',
    formula: '34/3*CA^2 - 4*CF*TF*nf - 20/3*CA*TF*nf',
    source: 'Caswell 1974; Jones 1974',
    status: 'confirmed-two-sources',
  },
  {
    quantity: 'β_2',
    formula:
      '2857/54*CA^3 + 2*CF^2*TF*nf - 205/9*CF*CA*TF*nf - 1415/27*CA^2*TF*nf + 44/9*CF*TF^2*nf^2' +
      ' + 158/27*CA*TF^2*nf^2',
    source: 'Tarasov, Vladimirov, Zharkov 1980; Larin, Vermaseren hep-ph/9302208',
    status: 'rederived',
  },
  {
    quantity: 'β_3',
    formula:
      'CA^4*(150653/486 - 44/9*z3) + dAA*(-80/9 + 704/3*z3) + CA^3*TF*nf*(-39143/81 + 136/3*z3)' +
      ' + CA^2*CF*TF*nf*(7073/243 - 656/9*z3) + CA*CF^2*TF*nf*(-4204/27 + 352/9*z3)' +
      ' + dRA*nf*(512/9 - 1664/3*z3) + 46*CF^3*TF*nf + CA^2*TF^2*nf^2*(7930/81 + 224/9*z3)' +
      ' + CF^2*TF^2*nf^2*(1352/27 - 704/9*z3) + CA*CF*TF^2*nf^2*(17152/243 + 448/9*z3)' +
      ' + dRR*nf^2*(-704/9 + 512/3*z3) + 424/243*CA*TF^3*nf^3 + 1232/243*CF*TF^3*nf^3',
    source: 'van Ritbergen, Vermaseren, Larin hep-ph/9701390',
    status: 'rederived',
  },
  {
    quantity: 'β_4',
    formula:
      'CA^5*(8296235/3888 - 1630/81*z3 + 121/6*z4 - 1045/9*z5)' +
      ' + dAA*CA*(-514/3 + 18716/3*z3 - 968*z4 - 15400/3*z5)' +
      ' + CA^4*TF*nf*(-5048959/972 + 10505/81*z3 - 583/3*z4 + 1230*z5)' +
      ' + CA^3*CF*TF*nf*(8141995/1944 + 146*z3 + 902/3*z4 - 8720/3*z5)' +
      ' + CA^2*CF^2*TF*nf*(-548732/81 - 50581/27*z3 - 484/3*z4 + 12820/3*z5)' +
      ' + CA*CF^3*TF*nf*(3717 + 5696/3*z3 - 7480/3*z5) - CF^4*TF*nf*(4157/6 + 128*z3)' +
      ' + dAA*TF*nf*(904/9 - 20752/9*z3 + 352*z4 + 4000/9*z5)' +
      ' + dRA*CA*nf*(11312/9 - 127736/9*z3 + 2288*z4 + 67520/9*z5)' +
      ' + dRA*CF*nf*(-320 + 1280/3*z3 + 6400/3*z5)' +
      ' + CA^3*TF^2*nf^2*(843067/486 + 18446/27*z3 - 104/3*z4 - 2200/3*z5)' +
      ' + CA^2*CF*TF^2*nf^2*(5701/162 + 26452/27*z3 - 944/3*z4 + 1600/3*z5)' +
      ' + CF^2*CA*TF^2*nf^2*(31583/18 - 28628/27*z3 + 1144/3*z4 - 4400/3*z5)' +
      ' + CF^3*TF^2*nf^2*(-5018/9 - 2144/3*z3 + 4640/3*z5)' +
      ' + dRA*TF*nf^2*(-3680/9 + 40160/9*z3 - 832*z4 - 1280/9*z5)' +
      ' + dRR*CA*nf^2*(-7184/3 + 40336/9*z3 - 704*z4 + 2240/9*z5)' +
      ' + dRR*CF*nf^2*(4160/3 + 5120/3*z3 - 12800/3*z5)' +
      ' + CA^2*TF^3*nf^3*(-2077/27 - 9736/81*z3 + 112/3*z4 + 320/9*z5)' +
      ' + CA*CF*TF^3*nf^3*(-736/81 - 5680/27*z3 + 224/3*z4)' +
      ' + CF^2*TF^3*nf^3*(-9922/81 + 7616/27*z3 - 352/3*z4)' +
      ' + dRR*TF*nf^3*(3520/9 - 2624/3*z3 + 256*z4 + 1280/3*z5) + CA*TF^4*nf^4*(916/243 - 640/81*z3)' +
      ' - CF*TF^4*nf^4*(856/243 + 128/27*z3)',
    source: 'Herzog, Ruijl, Ueda, Vermaseren, Vogt arXiv:1701.01404',
    status: 'rederived',
  },
];
