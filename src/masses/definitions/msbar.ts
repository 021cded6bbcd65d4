/** @module The MSbar mass at its own scale, and at any other. */
import type { MsbarDefinition } from '../definition.js';

const SOURCE = 'W. A. Bardeen et al., Phys. Rev. D18 (1978) 3998; running: qcd/running';

export const MSBAR: MsbarDefinition = {
  kind: 'msbar',
  name: 'msbar',
  title: 'MSbar mass at its own scale',
  symbol: 'm(m)',
  relativeTo: 'msbar',
  renormalonFree: true,
  orders: 4,
  needsStrength: false,
  source: SOURCE,
  status: 'confirmed-two-sources',
  notes: [],
};

export const RUNNING: MsbarDefinition = {
  ...MSBAR,
  name: 'running',
  title: 'MSbar mass at a scale',
  symbol: 'm(μ)',
  parameter: { symbol: 'μ', meaning: 'renormalisation scale, with n_l + 1 flavours' },
  notes: ['by the renormalisation group from m(m), with the heavy quark among the flavours'],
};
