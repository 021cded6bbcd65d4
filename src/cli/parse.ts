/** @module From words on the command line to checked values. Every complaint names the option and the remedy. */
import { Parser } from 'yargs/helpers';
import type { Command, Given } from './command.js';
import { UsageError } from './faults.js';
import { fieldOf, OPTION_NAMES, OPTIONS, optionOf } from './options.js';
import type { OptionName, OptionSpec } from './options.js';

export interface Parsed {
  readonly operands: readonly string[];
  readonly given: Given;
}

const PARSER = {
  'boolean-negation': false,
  'camel-case-expansion': false,
  'dot-notation': false,
  'duplicate-arguments-array': true,
  'parse-numbers': false,
  'parse-positional-numbers': false,
  'strip-aliased': true,
} as const;

/** Texts of the parser that reach a person are replaced by ours; this one is recognised by its beginning. */
const MISSING_VALUE = 'Not enough arguments following: ';

const isOption = (name: string): name is OptionName => OPTION_NAMES.some((known) => known === name);

const byShort = (letter: string): OptionName | undefined =>
  OPTION_NAMES.find((name) => name === letter || OPTIONS[name].short === letter);

function missingValue(message: string, command: Command): UsageError {
  const key = message.slice(MISSING_VALUE.length);
  const name = isOption(key) ? key : byShort(key);
  const spec = name === undefined ? undefined : optionOf(name, command.words?.[name]);
  if (name === undefined || spec === undefined || spec.kind === 'flag') return new UsageError(message, command.name);
  const dash = name === 'at' ? `; a value that begins with a dash is joined on: --at=-0.1` : '';
  return new UsageError(`--${name}: no value given; write --${name} ${spec.example}${dash}`, command.name);
}

const namesOf = (flags: boolean): OptionName[] =>
  OPTION_NAMES.filter((name) => (OPTIONS[name].kind === 'flag') === flags);

/**
 * The raw result of the parser: option names to text or true, and the rest under "_". Only the word parser of yargs is
 * used: its commands, help and checks speak their own language, and loading them costs half as much as starting Node.
 */
function rawParse(words: readonly string[], command: Command): Map<string, unknown> {
  const shorts = OPTION_NAMES.flatMap((name) => {
    const { short } = OPTIONS[name];
    return short === undefined ? [] : [[name, short] as const];
  });
  const { argv, error } = Parser.detailed([...words], {
    alias: Object.fromEntries(shorts),
    boolean: namesOf(true),
    string: namesOf(false),
    narg: Object.fromEntries(namesOf(false).map((name) => [name, 1])),
    configuration: PARSER,
  });
  if (error !== null) {
    throw error.message.startsWith(MISSING_VALUE)
      ? missingValue(error.message, command)
      : new UsageError(error.message, command.name);
  }
  return new Map<string, unknown>(Object.entries(argv));
}

async function unknownOption(key: string, command: Command): Promise<UsageError> {
  const { series } = await import('./rooms.js');
  if (/^\d/.test(key))
    return new UsageError(
      `-${key} reads as an option; write it behind --, or join it on: --NAME=-${key}`,
      command.name,
    );
  const written = key.length === 1 ? `-${key}` : `--${key}`;
  const near = series.nearest(key, command.options);
  const hint = near === undefined ? '' : `; did you mean --${near}?`;
  return new UsageError(`${written}: no such option${hint}`, command.name);
}

/** "-digits" reads as -d -i -g -i -t -s; say so rather than complain about -d. */
function singleDash(words: readonly string[], command: Command): void {
  for (const word of words) {
    if (word === '--') return;
    const name = /^-([a-z][a-z-]+)/.exec(word)?.[1];
    if (name !== undefined && isOption(name)) {
      throw new UsageError(`${word}: long options have two dashes; write --${name}`, command.name);
    }
  }
}

function whole(name: OptionName, text: string, spec: OptionSpec & { kind: 'whole' }, command: string): number {
  const n = /^\+?\d{1,9}$/.test(text) ? Number(text) : Number.NaN;
  if (n >= spec.least && n <= spec.most) return n;
  throw new UsageError(
    `--${name}: "${text}" is not a whole number from ${spec.least} to ${spec.most}; write --${name} ${spec.example}`,
    command,
  );
}

function checkOperands(operands: readonly string[], command: Command): void {
  const needed = command.operands.filter((operand) => operand.optional !== true);
  const missing = needed[operands.length];
  if (missing !== undefined) {
    throw new UsageError(`${missing.name} is missing: ${missing.help}`, command.name);
  }
  const extra = operands[command.operands.length];
  if (extra !== undefined && command.operands.at(-1)?.several !== true) {
    const most = command.operands.length;
    const takes = most === 0 ? 'no operand' : most === 1 ? 'one operand' : `${most} operands`;
    throw new UsageError(`"${extra}" is one operand too many: ${command.name} takes ${takes}`, command.name);
  }
}

/** Parses the words after the command's name. */
export async function parse(words: readonly string[], command: Command): Promise<Parsed> {
  singleDash(words, command);
  const raw = rawParse(words, command);
  const values = new Map<OptionName, Value>();
  for (const [key, found] of raw) {
    // Given twice: the last one counts, except for options whose values add up.
    const value: unknown = Array.isArray(found) && key !== '_' ? found.at(-1) : found;
    if (key === '_' || key === '$0' || value === undefined) continue;
    const name = isOption(key) ? key : byShort(key);
    if (name === undefined) throw await unknownOption(key, command);
    if (!command.options.includes(name)) {
      throw new UsageError(`--${name}: ${command.name} has no such option`, command.name);
    }
    const spec = optionOf(name, command.words?.[name]);
    if (spec.kind === 'flag') values.set(name, value === true);
    else if (spec.kind === 'list' && allTexts(found)) values.set(name, [found].flat());
    else if (typeof value === 'string' && value !== '') {
      values.set(name, spec.kind === 'whole' ? whole(name, value, spec, command.name) : value);
    } else throw new UsageError(`--${name}: no value given; write --${name} ${spec.example}`, command.name);
  }
  const rest = raw.get('_');
  const operands = Array.isArray(rest) ? rest.map(String) : [];
  checkOperands(operands, command);
  return { operands, given: collect(values) };
}

type Value = string | number | boolean | readonly string[];

const isText = (value: unknown): value is string => typeof value === 'string' && value !== '';
const allTexts = (value: unknown): value is string | string[] =>
  Array.isArray(value) ? value.every(isText) : isText(value);

/** The values have the type that the kind of their option asks for: `parse` has seen to it. */
function collect(values: ReadonlyMap<OptionName, Value>): Given {
  const given: Given = { json: false, quiet: false, noColor: false };
  return Object.assign(given, Object.fromEntries([...values].map(([name, value]) => [fieldOf(name), value])));
}
