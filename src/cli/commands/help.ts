/** @module leastterm help: the general help, or that of one command. */
import type { Command } from '../command.js';
import { EXIT, UsageError } from '../faults.js';
import { TOPICS } from '../comfort/topics.js';
import { commandHelp, generalHelp, topicHelp } from '../help.js';
import { unknownCommand } from '../unknown.js';

/** The help command for a program with these other commands. */
export function helpCommand(others: readonly Command[]): Command {
  const help: Command = {
    name: 'help',
    summary: 'this help, or that of a command or a topic',
    about: [],
    operands: [
      {
        name: 'TOPIC',
        help: `a command (${others.map((c) => c.name).join(', ')}) or one of ${TOPICS.map((t) => t.name).join(', ')}`,
        optional: true,
      },
    ],
    options: ['help'],
    examples: [
      ['leastterm help sum', 'everything about leastterm sum'],
      ['leastterm help ambiguity', 'the conventions of the renormalon ambiguity'],
    ],
    async run({ operands, surroundings }) {
      const all = [...others, help];
      const [name] = operands;
      const command = all.find((c) => c.name === name);
      const topic = TOPICS.find((t) => t.name === name);
      if (name !== undefined && command === undefined && topic === undefined)
        throw new UsageError(await unknownCommand(name, [...all, ...TOPICS]));
      const text = command === undefined ? topic && topicHelp(topic) : commandHelp(command);
      surroundings.stdout.write(text ?? generalHelp(all));
      return EXIT.done;
    },
  };
  return help;
}
