/** @module The options of new. */
import type { OptionSpec } from './option-kinds.js';

export const NEW_OPTIONS = {
  coefficients: {
    kind: 'text',
    placeholder: 'LIST',
    example: "'1, 1.6398, 6.371(4), 283 +- 142'",
    help: 'the coefficients, from the lowest order on, separated by commas',
  },
  'first-power': {
    kind: 'whole',
    placeholder: 'P',
    example: '1',
    least: 0,
    most: 1000,
    help: 'the power of the first coefficient (default 1 with a coupling, 0 without)',
  },
  scheme: { kind: 'text', placeholder: 'WORDS', example: 'MSbar', help: 'the renormalisation scheme' },
  'hard-scale': { kind: 'text', placeholder: 'SCALE', example: '1.777GeV', help: 'the hard scale Q with its unit' },
} as const satisfies Readonly<Record<string, OptionSpec>>;

export interface NewGiven {
  readonly coefficients?: string;
  readonly firstPower?: number;
  readonly scheme?: string;
  readonly hardScale?: string;
}
