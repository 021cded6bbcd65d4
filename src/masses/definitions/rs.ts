/**
 * @module Renormalon-subtracted masses.
 * Formula    m_RS(ν_f) = M − N ν_f Σ_{n≥0} a_n α_s(ν_f)^(n+1); RS′: from n = 1, so that it agrees with M at order α_s.
 * Reference  A. Pineda, hep-ph/0105008.
 */
import { ASYMPTOTIC_FROM_SECOND, ASYMPTOTIC_SERIES } from '../asymptotic.js';
import type { SubtractedDefinition } from '../definition.js';

export const RS: SubtractedDefinition = {
  kind: 'subtracted',
  name: 'rs',
  title: 'Renormalon-subtracted mass (RS)',
  symbol: 'm_RS(ν_f)',
  parameter: { symbol: 'ν_f', meaning: 'factorisation scale of the subtracted asymptotic series' },
  relativeTo: 'pole',
  renormalonFree: true,
  orders: 4,
  needsStrength: true,
  pieces: [{ series: ASYMPTOTIC_SERIES, couplingAt: 1, form: 'R', timesStrength: true }],
  source: 'A. Pineda, JHEP 06 (2001) 022, hep-ph/0105008',
  status: 'rederived',
  notes: ['the asymptotic series with c_1 and c_2'],
};

export const RS_PRIME: SubtractedDefinition = {
  ...RS,
  name: 'rs-prime',
  title: "Renormalon-subtracted mass without its first term (RS')",
  symbol: "m_RS'(ν_f)",
  pieces: [{ series: ASYMPTOTIC_FROM_SECOND, couplingAt: 1, form: 'R', timesStrength: true }],
};
