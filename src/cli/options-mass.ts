/** @module The options of mass. */
import type { OptionSpec } from './option-kinds.js';

export const MASS_OPTIONS = {
  cutoff: {
    kind: 'text',
    placeholder: 'SCALE',
    example: '2GeV',
    help: 'the scale of every definition of --to that needs one and has none of its own behind @',
  },
  light: {
    kind: 'whole',
    placeholder: 'N',
    example: '4',
    least: 0,
    most: 5,
    help: 'massless flavours n_l beside the quark (default: 3, 4, 5 for c, b, t)',
  },
  quark: {
    kind: 'text',
    placeholder: 'NAME',
    example: 'b',
    help: 'c, b or t: whose mass it is (default: the one with the nearest mass)',
  },
  strength: {
    kind: 'text',
    placeholder: 'N',
    example: "'0.506(20)'",
    help: 'strength of the leading renormalon with its error, in alpha_s, in place of the estimate',
  },
} as const satisfies Readonly<Record<string, OptionSpec>>;

export interface MassGiven {
  readonly cutoff?: string;
  readonly light?: number;
  readonly quark?: string;
  readonly strength?: string;
}
