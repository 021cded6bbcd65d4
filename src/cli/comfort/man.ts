/** @module The manual page, troff man(7), from the commands' own descriptions. */
import type { Command } from '../command.js';
import { optionLabel, optionOf } from '../options.js';
import { TOPICS } from './topics.js';

/** A line of text in troff: backslashes, and dots and quotes where a line begins. */
const roff = (text: string): string =>
  text
    .replaceAll('\\', '\\e')
    .replace(/-/g, '\\-')
    .replace(/^([.'])/gm, '\\&$1')
    .replace(/[^\n -~]/g, (c) => `\\[u${c.codePointAt(0)!.toString(16).toUpperCase().padStart(4, '0')}]`);

const item = (label: string, text: string): string => `.TP\n.B ${roff(label)}\n${roff(text)}`;

function commandPart(command: Command): string {
  const operands = command.operands.map(({ name, optional, several }) => {
    const words = several === true ? `${name}...` : name;
    return optional === true ? `[${words}]` : words;
  });
  const options = command.options.map((name) => {
    const words = command.words?.[name];
    return item(optionLabel(name, words).trim(), optionOf(name, words).help);
  });
  return [
    `.SS ${roff(['leastterm', command.name, ...operands].join(' '))}`,
    roff(`${command.summary}.`),
    ...command.about.flatMap((paragraph) => ['.PP', roff(paragraph)]),
    ...options,
  ].join('\n');
}

export function manPage(commands: readonly Command[], version: string): string {
  return [
    `.TH LEASTTERM 1 "" "leastterm ${version}" "User Commands"`,
    '.SH NAME',
    'leastterm \\- what a truncated, divergent QCD series is worth',
    '.SH SYNOPSIS',
    '.B leastterm',
    '.I command',
    '[operands] [options]',
    '.SH COMMANDS',
    ...commands.map(commandPart),
    '.SH TOPICS',
    ...TOPICS.map(({ name, paragraphs }) =>
      [`.SS ${roff(name)}`, ...paragraphs.flatMap((p) => ['.PP', roff(p)])].join('\n'),
    ),
    '.SH EXAMPLES',
    ...commands.flatMap(({ examples }) => examples.slice(0, 1)).map(([line, meaning]) => item(line, meaning)),
    '.SH SEE ALSO',
    'docs/ in the package: a page a command, a page a method, the series file, the verdict.',
    '',
  ].join('\n');
}
