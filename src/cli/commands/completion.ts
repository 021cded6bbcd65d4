/** @module leastterm completion: a script that lets a shell complete commands, options and names. */
import { COMPLETIONS } from '../comfort/completion.js';
import { vocabulary } from '../comfort/vocabulary.js';
import type { Command } from '../command.js';
import { EXIT, UsageError } from '../faults.js';
import { deliver } from '../output.js';
import { helpCommand } from './help.js';

/** The command for a program with these other commands. */
export function completionCommand(others: readonly Command[]): Command {
  const completion: Command = {
    name: 'completion',
    summary: 'a script with which bash, zsh or fish completes words',
    about: [
      'Prints the script for a shell: commands, options, ids of the catalogue, prescriptions and charts are completed, files elsewhere. All words stand in the script; write it anew after an update.',
    ],
    operands: [{ name: 'SHELL', help: Object.keys(COMPLETIONS).join(', ') }],
    options: ['output', 'quiet', 'help'],
    examples: [
      ['leastterm completion bash', 'for ~/.bashrc: eval "$(leastterm completion bash)"'],
      ['leastterm completion fish -o leastterm.fish', 'for ~/.config/fish/completions/'],
    ],
    async run(call) {
      const [shell = ''] = call.operands;
      const write = COMPLETIONS[shell];
      if (write === undefined) {
        const { series } = await import('../rooms.js');
        const names = Object.keys(COMPLETIONS);
        throw new UsageError(
          `no completion for "${shell}"${series.suggestion(shell, names)}; wanted one of ${names.join(', ')}`,
          'completion',
        );
      }
      const all = [...others, completion];
      deliver(write(await vocabulary([...all, helpCommand(all)])), call);
      return EXIT.done;
    },
  };
  return completion;
}
