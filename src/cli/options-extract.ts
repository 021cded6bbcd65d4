/** @module The options of extract. */
import type { OptionSpec } from './option-kinds.js';

export const EXTRACT_OPTIONS = {
  measured: {
    kind: 'list',
    placeholder: 'VALUE',
    example: "'0.2042(50)'",
    help: "the measured value with its error, and its unit where it has one, '0.2166(31) GeV^-2'; once for each series",
  },
  for: {
    kind: 'text',
    placeholder: 'UNKNOWN',
    example: 'alpha_s',
    help: 'what is extracted: alpha_s, mass, condensate, pole-mass (the way back), or mass,alpha_s in a fit',
  },
  'scale-of-measurement': {
    kind: 'list',
    placeholder: 'SCALE',
    example: '1.77693GeV',
    help: 'the hard scale Q of the measurement in place of the one in the file; once, or once for each series',
  },
  central: {
    kind: 'text',
    placeholder: 'NAME',
    example: 'fixed-order',
    help: 'the prescription whose value is quoted (default: the ladder of the verdict, among the rows without a caution)',
  },
  'truncation-by': {
    kind: 'text',
    placeholder: 'NAME',
    example: 'last-term',
    help: "what estimates the missing orders: own (default, the prescription's recipe), or a model of leastterm truncation",
  },
  'ambiguity-by': {
    kind: 'text',
    placeholder: 'NAME',
    example: 'im',
    help: 'the convention of the renormalon ambiguity: im/pi (default), im, least-term, near-least, none',
  },
  condensate: {
    kind: 'list',
    placeholder: 'NAME=VALUE',
    example: "'gluon condensate=0.012(4) GeV^4'",
    help: "a condensate of the file with its value, or its name for the file's value; none for no condensates at all; for --for condensate the name of the one that is wanted; may be repeated",
  },
  'condensate-by': {
    kind: 'text',
    placeholder: 'SUM',
    example: 'pv',
    help: 'the sum that the condensate values belong to: pv, truncated, cutoff:1GeV, or any to mix them knowingly',
  },
  correlation: {
    kind: 'text',
    placeholder: 'MATRIX',
    example: '0.3',
    help: 'correlation of the measurements: one number for all pairs, or a file with the matrix, a row a line',
  },
  weights: {
    kind: 'text',
    placeholder: 'NAME',
    example: 'theory',
    help: 'what the weights of a fit hold: measurement (default), or theory: coefficient and truncation errors as well',
  },
  search: {
    kind: 'text',
    placeholder: 'FROM:TO',
    example: '0.1:0.5',
    help: 'values of the unknown between which solutions are looked for (masses in GeV)',
  },
  problem: {
    kind: 'text',
    placeholder: 'FILE',
    example: 'fit.yaml',
    help: 'a YAML file with the measurements and any of these options; the command line wins',
  },
} as const satisfies Readonly<Record<string, OptionSpec>>;

export interface ExtractGiven {
  readonly measured?: readonly string[];
  readonly for?: string;
  readonly scaleOfMeasurement?: readonly string[];
  readonly central?: string;
  readonly truncationBy?: string;
  readonly ambiguityBy?: string;
  readonly condensate?: readonly string[];
  readonly condensateBy?: string;
  readonly correlation?: string;
  readonly weights?: string;
  readonly search?: string;
  readonly problem?: string;
}
