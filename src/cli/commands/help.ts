/** @module leastterm help: the general help, or that of one command. */
import type { Command } from '../command.js';
import { EXIT, UsageError } from '../faults.js';
import { commandHelp, generalHelp } from '../help.js';
import { unknownCommand } from '../unknown.js';

/** The help command for a program with these other commands. */
export function helpCommand(others: readonly Command[]): Command {
  const help: Command = {
    name: 'help',
    summary: 'this help, or that of one command',
    about: [],
    operands: [{ name: 'COMMAND', help: `one of ${others.map((c) => c.name).join(', ')}`, optional: true }],
    options: ['help'],
    examples: [['leastterm help sum', 'everything about leastterm sum']],
    async run({ operands, surroundings }) {
      const all = [...others, help];
      const [topic] = operands;
      const command = all.find((c) => c.name === topic);
      if (topic !== undefined && command === undefined) throw new UsageError(await unknownCommand(topic, all));
      surroundings.stdout.write(command === undefined ? generalHelp(all) : commandHelp(command));
      return EXIT.done;
    },
  };
  return help;
}
