/** @module What a shell can complete: commands with their options, and the names that options and operands take. */
import type { Command } from '../command.js';
import { OPTIONS } from '../options.js';
import type { OptionName } from '../options.js';
import { TOPICS } from './topics.js';

export interface CommandWords {
  readonly name: string;
  readonly summary: string;
  readonly options: readonly { readonly name: string; readonly help: string; readonly takesValue: boolean }[];
  /** Names that the operands take, besides files. */
  readonly operands: readonly string[];
}

export interface Vocabulary {
  readonly commands: readonly CommandWords[];
  /** By option: the names that its value may be. */
  readonly values: Readonly<Record<string, readonly string[]>>;
}

const SHELLS = ['bash', 'zsh', 'fish'];

/** Everything that completes, for a program with these commands. */
export async function vocabulary(commands: readonly Command[]): Promise<Vocabulary> {
  const { prescriptions, series, studies, truncation } = await import('../rooms.js');
  const { bubbles, extraction } = await import('../rooms-more.js');
  const { pictures } = await import('../rooms-pictures.js');
  const ids = await series.catalogueIds();
  const all = [
    ...prescriptions.PRESCRIPTIONS,
    ...Object.values(prescriptions.CONTOUR_NAMES),
    prescriptions.BUBBLE_CHAIN,
  ];
  const names = all.map(({ name }) => name);
  const operandsOf = (command: Command): readonly string[] => {
    const [first] = command.operands;
    if (command.name === 'help') return [...commands, ...TOPICS].map(({ name }) => name);
    if (command.name === 'bubbles') return bubbles.QUANTITY_NAMES;
    if (command.name === 'completion') return SHELLS;
    if (command.name === 'plot') return [...pictures.CHART_KINDS.map(({ name }) => name), ...ids];
    if (command.name === 'catalogue') return ['list', 'show', 'check', ...ids];
    return first?.name.startsWith('SERIES') === true ? ids : [];
  };
  return {
    commands: commands.map((command) => ({
      name: command.name,
      summary: command.summary,
      options: command.options.map((name: OptionName) => ({
        name,
        help: (command.words?.[name]?.help ?? OPTIONS[name].help).replace(/\s+/g, ' '),
        takesValue: OPTIONS[name].kind !== 'flag',
      })),
      operands: operandsOf(command),
    })),
    values: {
      by: names,
      only: names,
      except: names,
      central: names,
      for: extraction.UNKNOWNS,
      'ambiguity-by': extraction.AMBIGUITY_NAMES,
      'truncation-by': ['own', ...truncation.TRUNCATION_MODELS.map(({ name }) => name)],
      weights: ['measurement', 'theory'],
      view: extraction.BUBBLE_VIEWS,
      family: [...new Set(prescriptions.PRESCRIPTIONS.map(({ family }) => family))],
      sort: studies.SORTS,
      'verdict-rule': studies.verdictRules(),
      size: pictures.FORMATS.map(({ name }) => name),
      as: ['svg', 'pdf', 'png'],
    },
  };
}
