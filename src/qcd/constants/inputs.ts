/**
 * @module Measured inputs: defaults of the thresholds and of the coupling.
 * Values in GeV (α_s is a pure number); errors are one standard deviation unless `confidence` says otherwise.
 */

export type InputName =
  'alphaSMZ' | 'alphaSMZLattice' | 'MZ' | 'MW' | 'mTau' | 'mCharm' | 'mBottom' | 'mTop' | 'mTopPole' | 'mTopDirect';

export interface Input {
  readonly quantity: string;
  /** Decimal text as published. */
  readonly value: string;
  /** Upper and lower error. */
  readonly error: readonly [plus: string, minus: string];
  readonly confidence: string;
  readonly source: string;
}

const TABLE_2026 = 'PDG 2026 mass table; Takahashi et al. (PDG), Int. J. Mod. Phys. A41 (2026) 2630011';
const SIGMA = 'one standard deviation';

export const INPUTS: Readonly<Record<InputName, Input>> = {
  alphaSMZ: {
    quantity: 'α_s(M_Z), five flavours, MSbar, world average',
    value: '0.1180',
    error: ['0.0009', '0.0009'],
    confidence: SIGMA,
    source: 'PDG 2024, 2025 and 2026 review of QCD (Huston, Rabbertz, Zanderighi), Eq. (9.25)',
  },
  alphaSMZLattice: {
    quantity: 'α_s(M_Z), five flavours, MSbar, lattice average',
    value: '0.11833',
    error: ['0.00067', '0.00067'],
    confidence: SIGMA,
    source: 'FLAG Review 2024, arXiv:2411.04268, Eq. (399)',
  },
  MZ: { quantity: 'Z mass', value: '91.1879', error: ['0.0020', '0.0020'], confidence: SIGMA, source: TABLE_2026 },
  MW: { quantity: 'W mass', value: '80.3625', error: ['0.008', '0.008'], confidence: SIGMA, source: TABLE_2026 },
  mTau: { quantity: 'τ mass', value: '1.77693', error: ['0.00009', '0.00009'], confidence: SIGMA, source: TABLE_2026 },
  mCharm: {
    quantity: 'charm MSbar mass m_c(m_c)',
    value: '1.2729',
    error: ['0.0045', '0.0045'],
    confidence: '90 per cent',
    source: TABLE_2026,
  },
  mBottom: {
    quantity: 'bottom MSbar mass m_b(m_b)',
    value: '4.186',
    error: ['0.006', '0.006'],
    confidence: '90 per cent',
    source: TABLE_2026,
  },
  mTop: {
    quantity: 'top MSbar mass m_t(m_t) from cross sections',
    value: '162.5',
    error: ['2.1', '1.5'],
    confidence: SIGMA,
    source: TABLE_2026,
  },
  mTopPole: {
    quantity: 'top pole mass from cross sections',
    value: '172.1',
    error: ['0.6', '0.6'],
    confidence: SIGMA,
    source: TABLE_2026,
  },
  mTopDirect: {
    quantity: 'top mass from direct measurements',
    value: '172.60',
    error: ['0.27', '0.27'],
    confidence: SIGMA,
    source: TABLE_2026,
  },
};
