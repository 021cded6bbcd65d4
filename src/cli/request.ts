/**
 * @module The request: what was asked, for the result to repeat and for `replay` to carry out again. Operands under their
 * names, options under theirs, as the command line gave them.
 */
import type { Given } from './command.js';
import { fieldOf, OPTION_NAMES } from './options.js';
import type { OptionName } from './options.js';

type Value = string | number | boolean | readonly string[];
export type Request = Record<string, Value>;

/** Options that say how and where to write, or with how many hands: no result depends on them. */
const MANNER: ReadonlySet<OptionName> = new Set([
  'json',
  'csv',
  'latex',
  'bibtex',
  'markdown',
  'hepdata',
  'output',
  'quiet',
  'no-color',
  'workers',
  'size',
  'as',
  'terminal',
  'help',
  'version',
]);

const FIELDS: ReadonlyMap<string, OptionName> = new Map(OPTION_NAMES.map((name) => [fieldOf(name), name]));

/** A list of one is its entry. */
const plain = (value: Value): Value => (Array.isArray(value) && value.length === 1 ? String(value[0]) : value);

/**
 * The request of `command` with these operands (an empty list is none) and the options in `given`; `usual` holds what counts
 * where an option was not given.
 */
export function askedOf(
  command: string,
  operands: Readonly<Record<string, string | readonly string[] | undefined>>,
  given: Given,
  usual: Request = {},
): Request {
  const request: Request = { command };
  for (const [name, value] of Object.entries(operands))
    if (value !== undefined && value.length > 0) request[name] = plain(value);
  for (const [field, value] of Object.entries(given) as [string, Value | undefined][]) {
    const name = FIELDS.get(field);
    if (name !== undefined && value !== undefined && !MANNER.has(name)) request[name] = plain(value);
  }
  for (const [name, value] of Object.entries(usual)) request[name] ??= value;
  return request;
}
