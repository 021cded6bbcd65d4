/** @module Every option of the command line: its name, its value, its one line of help. */
import type { OptionSpec, OptionWords } from './option-kinds.js';
import { BUBBLE_OPTIONS } from './options-bubbles.js';
import { COMPARE_OPTIONS } from './options-compare.js';
import { EXTRACT_OPTIONS } from './options-extract.js';
import { REPLICA_OPTIONS } from './options-replicas.js';
import { MASS_OPTIONS } from './options-mass.js';
import { CONTOUR_OPTIONS } from './options-contour.js';
import { NEW_OPTIONS } from './options-new.js';
import { PAPER_OPTIONS } from './options-papers.js';
import { PICTURE_OPTIONS } from './options-pictures.js';
import { QCD_OPTIONS } from './options-qcd.js';

export type { OptionSpec, OptionWords } from './option-kinds.js';

export type OptionName =
  | 'at'
  | keyof typeof QCD_OPTIONS
  | keyof typeof COMPARE_OPTIONS
  | keyof typeof EXTRACT_OPTIONS
  | keyof typeof REPLICA_OPTIONS
  | keyof typeof BUBBLE_OPTIONS
  | keyof typeof CONTOUR_OPTIONS
  | keyof typeof MASS_OPTIONS
  | keyof typeof PICTURE_OPTIONS
  | keyof typeof NEW_OPTIONS
  | keyof typeof PAPER_OPTIONS
  | 'by'
  | 'variant'
  | 'by-order'
  | 'prior'
  | 'order'
  | 'flavours'
  | 'digits'
  | 'json'
  | 'output'
  | 'quiet'
  | 'no-color'
  | 'help'
  | 'version';

/** Digits beyond this take minutes for long series. */
const MOST_DIGITS = 2000;

export const OPTIONS: Readonly<Record<OptionName, OptionSpec>> = {
  ...QCD_OPTIONS,
  ...COMPARE_OPTIONS,
  ...EXTRACT_OPTIONS,
  ...REPLICA_OPTIONS,
  ...BUBBLE_OPTIONS,
  ...CONTOUR_OPTIONS,
  ...MASS_OPTIONS,
  ...PICTURE_OPTIONS,
  ...NEW_OPTIONS,
  ...PAPER_OPTIONS,
  at: {
    kind: 'text',
    placeholder: 'VALUE',
    example: "'0.3156(30)'",
    help: "the coupling or variable, with its error if there is one: '0.3156(30)', 0.3156+-0.0030",
  },
  by: {
    kind: 'text',
    placeholder: 'NAME',
    example: 'borel-pade',
    help: 'the prescription',
  },
  variant: {
    kind: 'text',
    placeholder: 'NAME',
    example: "'[2/2]'",
    help: "only this member of the family, such as '[2/2]'",
  },
  'by-order': { kind: 'flag', help: 'also at every lower order, with whether the next known term fell inside' },
  prior: {
    kind: 'text',
    placeholder: 'LIST',
    example: 'abc.xi=3,geometric.omega=2',
    help: 'priors by name, such as abc.xi=3,geometric.omega=2',
  },
  order: {
    kind: 'whole',
    placeholder: 'N',
    example: '4',
    least: 1,
    most: 1_000_000,
    help: 'use only the first N coefficients',
  },
  flavours: {
    kind: 'whole',
    placeholder: 'N',
    example: '4',
    least: 0,
    most: 16,
    help: 'number of active flavours, in place of the one in the file',
  },
  digits: {
    kind: 'whole',
    placeholder: 'N',
    example: '30',
    least: 1,
    most: MOST_DIGITS,
    help: 'certified digits wanted of each value (default 15)',
  },
  json: { kind: 'flag', help: 'write one JSON object instead of text' },
  output: {
    kind: 'text',
    short: 'o',
    placeholder: 'FILE',
    example: 'result.txt',
    help: 'write to FILE instead of standard output',
  },
  quiet: { kind: 'flag', short: 'q', help: 'only the result itself, nothing around it' },
  'no-color': { kind: 'flag', help: 'plain text, as with NO_COLOR in the environment' },
  help: { kind: 'flag', short: 'h', help: 'show this help' },
  version: { kind: 'flag', help: 'show the version' },
};

export const OPTION_NAMES = Object.keys(OPTIONS).filter((name): name is OptionName => name in OPTIONS);

/** "by-order" is the field byOrder of Given, and so on: every option its own field, named after it. */
export const fieldOf = (name: OptionName): string =>
  name === 'alpha-s-mz' ? 'alphaSMZ' : name.replace(/-([a-z])/g, (_, letter: string) => letter.toUpperCase());

/** The specification of an option in the words of a command. */
export const optionOf = (name: OptionName, words: OptionWords | undefined): OptionSpec => ({
  ...OPTIONS[name],
  ...words,
});

/** "-o, --output FILE". */
export function optionLabel(name: OptionName, words?: OptionWords): string {
  const spec = optionOf(name, words);
  const short = spec.short === undefined ? '    ' : `-${spec.short}, `;
  return `${short}--${name}${spec.kind === 'flag' ? '' : ` ${spec.placeholder}`}`;
}
