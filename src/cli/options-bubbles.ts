/** @module The options of bubbles. */
import type { OptionSpec } from './option-kinds.js';

export const BUBBLE_OPTIONS = {
  mu: {
    kind: 'text',
    placeholder: 'RATIO',
    example: '2',
    help: 'scale of the coupling and the coefficients over the hard scale, mu/Q (default 1)',
  },
  view: {
    kind: 'text',
    placeholder: 'NAME',
    example: 'scales',
    help: 'the momenta behind the chain as a table: distribution, scales, dispersive',
  },
  cut: {
    kind: 'text',
    placeholder: 'MU_F',
    example: "'1.2 GeV'",
    help: 'remove the momenta below mu_f: in units of the hard scale, or with its unit',
  },
} as const satisfies Readonly<Record<string, OptionSpec>>;

/** Their values after checking. */
export interface BubbleGiven {
  readonly mu?: string;
  readonly view?: string;
  readonly cut?: string;
}
