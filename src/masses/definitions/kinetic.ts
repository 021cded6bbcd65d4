/**
 * @module The kinetic mass to two loops.
 *
 * Formula    m_kin(μ) = M − Λ̄(μ) − μ_π²(μ)/(2M), in A = α_s^(n_l)(2μ)/π:
 *            Λ̄ = (4/3) C_F μ A [1 + A (4/3 β_0 − C_A (π²/6 − 13/12))],
 *            μ_π² = C_F μ² A [1 + A (13/12 β_0 − C_A (π²/6 − 13/12))];
 *            the published logarithm −(β_0/2) ln(2μ/m) in α_s(m) is the change of scale from 2μ to m.
 *            1/(2M) is expanded with the rest; the difference to 1/(2m_kin) is of order μ³/m², which the definition leaves out.
 * Reference  I. Bigi et al., hep-ph/9704245; A. Czarnecki, K. Melnikov, N. Uraltsev, hep-ph/9708372 (recalled, size of the
 *            one-loop shift confirmed). Three loops are published (M. Fael, K. Schönwald, M. Steinhauser, arXiv:2005.06487,
 *            arXiv:2011.11655); their coefficients are not held here.
 */
import { exact, mulExact, type Exact } from '../../numerics/index.js';
import { exactOfFormal, formalAt } from '../../qcd/index.js';
import type { SeriesInA, SubtractedDefinition } from '../definition.js';

/** C_A (π²/6 − 13/12). */
const NON_ABELIAN = '3*(pi^2/6 - 13/12)';

/** first · a [1 + 4a (c β_0 − …)] in a = α_s/(4π). */
function twoTerms(first: string, c: string, light: number): readonly Exact[] {
  const lead = exactOfFormal(formalAt({ formula: `4*${first}` }, {}));
  const second = formalAt({ formula: `4*(${c}*(11 - 2/3*nl) - ${NON_ABELIAN})` }, { nl: light });
  return [lead, mulExact(lead, exactOfFormal(second)), exact(0), exact(0)];
}

const BINDING: SeriesInA = { key: 'kinetic Λ̄', coefficients: (light) => twoTerms('16/9', '4/3', light) };
const KINETIC_ENERGY: SeriesInA = { key: 'kinetic μ_π²', coefficients: (light) => twoTerms('4/3', '13/12', light) };

export const KINETIC: SubtractedDefinition = {
  kind: 'subtracted',
  name: 'kinetic',
  title: 'Kinetic mass',
  symbol: 'm_kin(μ)',
  parameter: { symbol: 'μ', meaning: 'cutoff on the excitation energy' },
  relativeTo: 'pole',
  renormalonFree: true,
  orders: 2,
  needsStrength: false,
  pieces: [
    { series: BINDING, couplingAt: 2, form: 'R', timesStrength: false },
    { series: KINETIC_ENERGY, couplingAt: 2, form: 'R^2/2M', timesStrength: false },
  ],
  source: 'Bigi et al. hep-ph/9704245; Czarnecki, Melnikov, Uraltsev hep-ph/9708372',
  status: 'memory',
  notes: ['two loops; the three-loop coefficients of arXiv:2005.06487 and arXiv:2011.11655 are not held'],
};
