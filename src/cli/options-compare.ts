/** @module The options of compare and backtest, and --verdict-rule. */
import type { OptionSpec } from './option-kinds.js';

export const COMPARE_OPTIONS = {
  grid: {
    kind: 'text',
    placeholder: 'GRID',
    example: '0.1:0.4:7',
    help: 'several couplings in place of --at: start:stop:count with both ends, or a list 0.1,0.2,0.3; or several scales mu/Q beside --at: scale=0.5:2:5 (even in ln mu), scale=0.5,1,2',
  },
  only: {
    kind: 'list',
    placeholder: 'NAMES',
    example: 'fixed-order,borel-pade',
    help: 'only these prescriptions, joined by commas; may be repeated',
  },
  except: {
    kind: 'list',
    placeholder: 'NAMES',
    example: 'pade',
    help: 'all prescriptions but these, joined by commas; may be repeated',
  },
  family: {
    kind: 'list',
    placeholder: 'NAMES',
    example: 'borel,model',
    help: 'only these families: truncation, scale, coupling, borel, model',
  },
  sort: {
    kind: 'text',
    placeholder: 'KEY',
    example: 'score',
    help: 'order of the rows: value, truncation, ambiguity or score, smallest first',
  },
  hide: {
    kind: 'whole',
    placeholder: 'K',
    example: '2',
    least: 0,
    most: 20,
    help: 'how many of the last coefficients to hide, one after the other',
  },
  exact: {
    kind: 'text',
    placeholder: 'VALUE',
    example: '0.915633',
    help: 'the exact sum, where it is known: predictions are held against it',
  },
  'strong-coupling': {
    kind: 'text',
    placeholder: 'S,D',
    example: '1/3,2/3',
    help: 'the sum behaves as x^S [1 + O(x^-D)] at large x: what order-dependent mapping needs',
  },
  catalogue: { kind: 'flag', help: 'every published series of the catalogue that runs in alpha_s' },
  csv: { kind: 'flag', help: 'write comma-separated values, a line a row' },
  'verdict-rule': {
    kind: 'text',
    placeholder: 'RULE',
    example: 'prescription:borel-pade',
    help: 'what makes the verdict: ladder (the default), fixed-order, least-term, prescription:NAME',
  },
} as const satisfies Readonly<Record<string, OptionSpec>>;
