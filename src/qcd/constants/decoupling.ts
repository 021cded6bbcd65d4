/**
 * @module Decoupling of one heavy quark at its own MSbar mass: α_s and light-quark masses.
 * Convention  a = α_s^(nl+1)(m)/π, m = m(m) the MSbar mass with nl+1 flavours, nl light flavours;
 *             α_s^(nl)(m) = α_s^(nl+1)(m) (1 + Σ c_k a^k),  m_q^(nl)(m) = m_q^(nl+1)(m) (1 + Σ d_k a^k).
 *             All logarithms at other scales follow from the renormalisation group (decoupling/logs.ts).
 */
import type { PublishedConstant } from './constant.js';

/** c_1 … c_4 of the coupling. */
export const DECOUPLING_ALPHA: readonly PublishedConstant[] = [
  { quantity: 'c_1', formula: '0', source: 'no constant at one loop in MSbar', status: 'confirmed-two-sources' },
  {
    quantity: 'c_2',
    formula: '11/72',
    source: 'Bernreuther, Wetzel 1982; Larin, van Ritbergen, Vermaseren hep-ph/9411260; FLAG Review 2024, Eq. (293)',
    status: 'confirmed-two-sources',
  },
  {
    quantity: 'c_3',
    formula: '564731/124416 - 82043/27648*z3 - 2633/31104*nl',
    source: 'Chetyrkin, Kniehl, Steinhauser hep-ph/9708255; FLAG Review 2024, Eq. (294)',
    status: 'confirmed-two-sources',
  },
  {
    quantity: 'c_4',
    formula:
      '291716893/6123600 - 121/4320*ln2^5 + 3031309/1306368*ln2^4 + 121/432*z2*ln2^3 - 3031309/217728*z2*ln2^2' +
      ' + 2057/576*z4*ln2 - 2362581983/87091200*z3 - 76940219/2177280*z4 + 1389/256*z5 + 3031309/54432*a4 + 121/36*a5' +
      ' - 151369/2177280*X0' +
      ' + nl*(-4770941/2239488 + 685/124416*ln2^4 - 685/20736*z2*ln2^2 + 3645913/995328*z3 - 541549/165888*z4' +
      ' + 115/576*z5 + 685/5184*a4)' +
      ' + nl^2*(-271883/4478976 + 167/5184*z3)',
    source:
      'Chetyrkin, Kühn, Sturm hep-ph/0512060; Schröder, Steinhauser hep-ph/0512058; ' +
      'FLAG Review 2024, Eq. (295): 5.170347 − 1.009932 nl − 0.021978 nl²',
    status: 'confirmed-two-sources',
  },
];

/** d_1 … d_4 of the light-quark masses. */
export const DECOUPLING_MASS: readonly PublishedConstant[] = [
  { quantity: 'd_1', formula: '0', source: 'no effect at one loop', status: 'confirmed-two-sources' },
  { quantity: 'd_2', formula: '89/432', source: 'Chetyrkin, Kniehl, Steinhauser hep-ph/9708255', status: 'memory' },
  {
    quantity: 'd_3',
    formula:
      '2951/2916 - 407/864*z3 + 5/4*z4 - 1/36*(16*a4 - 13/2*z4 - 4*z2*ln2^2 + 2/3*ln2^4)' +
      ' + nl*(1327/11664 - 2/27*z3)',
    source: 'Chetyrkin, Kniehl, Steinhauser hep-ph/9708255',
    status: 'memory',
  },
  {
    quantity: 'd_4',
    formula: '6.850 - 1.466*nl + 0.05616*nl^2',
    source: 'Liu, Steinhauser arXiv:1502.04719 (numerical, the digits shown)',
    status: 'memory',
    error: '0.0005 + 0.0005*nl + 0.000005*nl^2',
  },
];
