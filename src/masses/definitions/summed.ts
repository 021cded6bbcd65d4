/**
 * @module Masses with the renormalon summed: its series is taken out of the pole series and its Borel integral put in.
 *
 * Formulas   MRS: m_MRS = m [1 + Σ (r_n − R_n) α_g^(n+1)] + J, R_n = N (2b_0)^n Γ(n+1+b)/Γ(1+b), α_g the geometric coupling,
 *            J = m N t ∫_0^1 dv e^(−xv) (1−v)^(−1−b) = m N t e^(−x) Σ_k x^k/(k!(k−b)) (finite part at v = 1), x = t/α_g.
 *            PV: m_PV = m [1 + Σ (r_n − N a_n) α^(n+1)] + m N t Σ_k c_k F_{b−k}(t/α), F the principal value to infinity.
 *            The integrals differ by a multiple of Λ: PV − MRS = |Im| cot(πb) = N (2π/β_0) 2^(−b) π cot(πb) Λ/Γ(1+b).
 * Reference  N. Brambilla et al., arXiv:1712.04983 (MRS; J and δm recalled, the two masses told apart by the published
 *            charm value, see the tests); C. Ayala, X. Lobregat, A. Pineda, arXiv:1909.01370 (PV).
 */
import type { SummedDefinition } from '../definition.js';

export const MRS: SummedDefinition = {
  kind: 'summed',
  name: 'mrs',
  title: 'Minimal renormalon-subtracted mass (MRS)',
  symbol: 'm_MRS',
  relativeTo: 'msbar',
  renormalonFree: true,
  orders: 4,
  needsStrength: true,
  coupling: 'geometric',
  integral: 'to the branch point',
  source: 'N. Brambilla, J. Komijani, A. Kronfeld, A. Vairo, arXiv:1712.04983',
  status: 'memory',
  notes: ['the Borel integral up to its branch point; the principal value is larger by |Im| cot(πb)'],
};

export const PV: SummedDefinition = {
  ...MRS,
  name: 'pv',
  title: 'Principal-value mass (PV)',
  symbol: 'm_PV',
  coupling: 'msbar',
  integral: 'principal value',
  source: 'C. Ayala, X. Lobregat, A. Pineda, arXiv:1909.01370',
  status: 'rederived',
  notes: ['in the MSbar coupling with c_1 and c_2'],
};
