/** @module The help texts, made from the commands' own descriptions: examples first. */
import type { Command } from './command.js';
import { TOPICS } from './comfort/topics.js';
import type { Topic } from './comfort/topics.js';
import { OPTIONS, optionLabel, optionOf } from './options.js';
import type { OptionName } from './options.js';

const WIDTH = 80;

/** Folds at blanks. Help is plain ASCII, so a character is a column. */
function fold(text: string, columns: number): string[] {
  const lines: string[] = [];
  for (const word of text.split(' ')) {
    const last = lines.at(-1);
    if (last !== undefined && last.length + 1 + word.length <= columns) lines[lines.length - 1] = `${last} ${word}`;
    else lines.push(word);
  }
  return lines;
}

/** Two columns: labels, and their explanations folded beside them. */
function pairs(rows: readonly (readonly [label: string, text: string])[]): string {
  const column = Math.max(...rows.map(([label]) => label.length));
  return rows
    .flatMap(([label, text]) =>
      fold(text, WIDTH - column - 5).map((line, i) => `  ${(i === 0 ? label : '').padEnd(column)}   ${line}`),
    )
    .join('\n');
}

function examples(list: Command['examples']): string {
  return list.map(([command, meaning]) => `  ${command}\n      ${meaning}`).join('\n');
}

const DOCS = 'docs/commands/ in the package, and docs/series-file.md for the input';

/** leastterm --help. */
export function generalHelp(commands: readonly Command[]): string {
  const always: readonly OptionName[] = ['json', 'output', 'quiet', 'no-color', 'help', 'version'];
  const first = commands.flatMap((command) => command.examples.slice(0, 1));
  return [
    'leastterm: what a truncated, divergent QCD series is worth',
    `Examples\n${examples(first)}`,
    `Commands\n${pairs(commands.map((command) => [command.name, command.summary]))}`,
    `Options of every command\n${pairs(always.map((name) => [optionLabel(name), OPTIONS[name].help]))}`,
    'Exit codes: 0 done; 1 every prescription refused; 2 wrong input or usage;\n3 a fault of leastterm; 130 interrupted.',
    `Topics\n${pairs(TOPICS.map((topic) => [topic.name, topic.summary]))}`,
    `More: leastterm help COMMAND, leastterm help TOPIC\nManual: ${DOCS}`,
  ]
    .join('\n\n')
    .concat('\n');
}

function usage(command: Command): string {
  const operands = command.operands.map((operand) => {
    const name = operand.several === true ? `${operand.name}...` : operand.name;
    return operand.optional === true ? `[${name}]` : name;
  });
  const needed = (command.needs ?? []).map((name) => optionLabel(name, command.words?.[name]).trim());
  return ['leastterm', command.name, ...operands, ...needed, '[options]'].join(' ');
}

/** leastterm COMMAND --help. */
export function commandHelp(command: Command): string {
  const parts = [
    fold(`leastterm ${command.name}: ${command.summary}`, WIDTH).join('\n'),
    `Examples\n${examples(command.examples)}`,
    `Usage\n  ${usage(command)}`,
    ...command.about.map((paragraph) => fold(paragraph, WIDTH).join('\n')),
  ];
  if (command.operands.length > 0) {
    parts.push(`Operands\n${pairs(command.operands.map((operand) => [operand.name, operand.help]))}`);
  }
  const row = (name: OptionName): readonly [string, string] => {
    const words = command.words?.[name];
    return [optionLabel(name, words), optionOf(name, words).help];
  };
  parts.push(`Options\n${pairs(command.options.map(row))}`);
  parts.push(`Manual: docs/commands/${command.name}.md in the package`);
  return `${parts.join('\n\n')}\n`;
}

/** leastterm help TOPIC. */
export const topicHelp = ({ name, summary, paragraphs }: Topic): string =>
  [`${name}: ${summary}`, ...paragraphs.map((paragraph) => fold(paragraph, WIDTH).join('\n'))]
    .join('\n\n')
    .concat('\n');
