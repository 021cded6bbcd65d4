/**
 * @module The forms for papers, added to every command whose result has tables: the command runs as with --json, and its
 * result is written in the form wanted. So a form can hold nothing that the JSON does not.
 */
import type { Call, Command, Given } from './command.js';
import { UsageError } from './faults.js';
import { deliver } from './output.js';
import type { OptionName } from './options.js';
import type { CommandResult, PaperForm } from '../papers/index.js';

/** Commands whose results have tables. */
export const TABLED_COMMANDS: readonly string[] = [
  'assess',
  'sum',
  'compare',
  'truncation',
  'backtest',
  'evolve',
  'extract',
  'mass',
  'contour',
  'growth',
  'plane',
  'bubbles',
  'rewrite',
  'combine',
  'catalogue',
];

const FORMS = ['latex', 'bibtex', 'markdown', 'hepdata'] as const satisfies readonly OptionName[];

/** The forms asked for; --csv only where the command has no --csv of its own. */
function formsIn(given: Given, ownCsv: boolean): PaperForm[] {
  const forms: PaperForm[] = FORMS.filter((form) => given[form] === true);
  return given.csv === true && !ownCsv ? [...forms, 'csv'] : forms;
}

async function runAs(form: PaperForm, command: Command, call: Call): Promise<number> {
  const { latex: _l, bibtex: _b, markdown: _m, hepdata: _h, csv: _c, output: _o, ...given } = call.given;
  let json = '';
  const status = await command.run({
    operands: call.operands,
    given: { ...given, json: true },
    surroundings: {
      ...call.surroundings,
      stdout: {
        isTerminal: false,
        write: (text) => {
          json += String(text);
        },
      },
    },
  });
  const { papers } = await import('./rooms-pictures.js');
  const text = papers.paperText(resultOf(JSON.parse(json), command.name), form);
  if (text === '')
    throw new UsageError(`there is no table in this for --${form}; --json has all that is known`, command.name);
  deliver(text, call);
  return status;
}

/** What a command wrote, named after it where it does not say so itself: lists and series do not. */
function resultOf(written: object, command: string): CommandResult {
  const named = { request: { command } };
  return Array.isArray(written) ? Object.assign(named, { entries: written }) : { ...named, ...written };
}

/** The command with the forms for papers. */
export function withPapers(command: Command): Command {
  if (!TABLED_COMMANDS.includes(command.name)) return command;
  const ownCsv = command.options.includes('csv');
  const added: readonly OptionName[] = ownCsv ? FORMS : [...FORMS, 'csv'];
  const place = command.options.indexOf('json') + 1;
  return {
    ...command,
    options: [...command.options.slice(0, place), ...added, ...command.options.slice(place)],
    run: (call) => {
      const [form, second] = formsIn(call.given, ownCsv);
      if (form === undefined) return command.run(call);
      const other = second ?? (call.given.json ? 'json' : undefined);
      if (other !== undefined)
        throw new UsageError(`--${form} and --${other} exclude each other: give one of them`, command.name);
      return runAs(form, command, call);
    },
  };
}
