/** @module Every option of the command line: its name, its value, its one line of help. */

export type OptionName =
  | 'at'
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

interface Flag {
  readonly kind: 'flag';
  readonly short?: string;
  readonly help: string;
}

interface Text {
  readonly kind: 'text';
  readonly short?: string;
  /** Stands for the value in help and messages. */
  readonly placeholder: string;
  readonly example: string;
  readonly help: string;
}

interface Whole {
  readonly kind: 'whole';
  readonly short?: string;
  readonly placeholder: string;
  readonly example: string;
  readonly least: number;
  readonly most: number;
  readonly help: string;
}

export type OptionSpec = Flag | Text | Whole;

/** Digits beyond this take minutes for long series. */
const MOST_DIGITS = 2000;

export const OPTIONS: Readonly<Record<OptionName, OptionSpec>> = {
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

/** "-o, --output FILE". */
export function optionLabel(name: OptionName): string {
  const spec = OPTIONS[name];
  const short = spec.short === undefined ? '    ' : `-${spec.short}, `;
  return `${short}--${name}${spec.kind === 'flag' ? '' : ` ${spec.placeholder}`}`;
}
