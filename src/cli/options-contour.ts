/** @module The options of contour. */
import type { OptionSpec } from './option-kinds.js';

export const CONTOUR_OPTIONS = {
  weight: {
    kind: 'text',
    placeholder: 'WEIGHT',
    example: "'1,-2,1'",
    help: "another weight w(x): coefficients w_0,w_1,... of a polynomial in x = s/s_0, such as '1,-2,1', or a name, such as kinematic",
  },
  norm: {
    kind: 'text',
    placeholder: 'VALUE',
    example: "'0.57(23)'",
    help: "norm N_g of the gluon condensate's renormalon that is subtracted, with its error, or model for the one that the series' own singularity model has",
  },
  'subtraction-scale': {
    kind: 'text',
    placeholder: 'RATIO',
    example: '0.8',
    help: 'scale R of that subtraction over sqrt(s_0) (default 0.8)',
  },
} as const satisfies Readonly<Record<string, OptionSpec>>;

/** Their values after checking. */
export interface ContourGiven {
  readonly weight?: string;
  readonly norm?: string;
  readonly subtractionScale?: string;
}
