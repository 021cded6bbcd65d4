/**
 * @module MSR masses.
 * Formula    m_MSR(R) = M − R Σ_{n≥1} a_n (α_s(R)/4π)^n. Natural: a_n of M/m(m) without loops of the heavy quark; practical: the
 *            full series written in α_s^(n_l), so that m_MSRp(m(m)) = m(m).
 * Reference  A. Hoang, A. Jain, I. Scimemi, I. Stewart, arXiv:0803.4214; A. Hoang et al., arXiv:1704.01580.
 */
import type { SubtractedDefinition } from '../definition.js';
import { NATURAL_SERIES, POLE_SERIES } from '../pole-series.js';

export const MSR: SubtractedDefinition = {
  kind: 'subtracted',
  name: 'msr',
  title: 'Natural MSR mass',
  symbol: 'm_MSR(R)',
  parameter: { symbol: 'R', meaning: 'scale of the subtraction, reached from m(m) by R-evolution' },
  relativeTo: 'pole',
  renormalonFree: true,
  orders: 4,
  needsStrength: false,
  pieces: [{ series: NATURAL_SERIES, couplingAt: 1, form: 'R', timesStrength: false }],
  evolution: NATURAL_SERIES,
  source: 'Hoang et al. arXiv:0803.4214, arXiv:1704.01580',
  status: 'rederived',
  notes: ['fourth coefficient recalled from arXiv:1704.01580'],
};

export const MSR_PRACTICAL: SubtractedDefinition = {
  ...MSR,
  name: 'msr-practical',
  title: 'Practical MSR mass',
  symbol: 'm_MSRp(R)',
  pieces: [{ series: POLE_SERIES, couplingAt: 1, form: 'R', timesStrength: false }],
  evolution: POLE_SERIES,
  notes: ['m_MSRp(m(m)) = m(m)'],
};
