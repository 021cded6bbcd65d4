/** @module leastterm replay: a saved result carried out again, and what moved. */
import type { Call, Command } from '../command.js';
import { EXIT, UsageError } from '../faults.js';
import { deliver } from '../output.js';
import { parse } from '../parse.js';
import { savedResult } from '../saved.js';
import type { Difference, Replay } from '../../papers/index.js';
import type { SavedResult } from '../../pictures/index.js';

/** Differences shown on the page; all are in the JSON. */
const SHOWN = 20;

/**
 * Words of the command line that a request stands for. Options first, their values joined on, since a value may begin with
 * a dash; operands last, behind a --.
 */
export function wordsOf(request: SavedResult['request'], { operands }: Pick<Command, 'operands'>): string[] {
  const names = operands.map(({ name }) => name.toLowerCase());
  const texts = (value: unknown): string[] =>
    value === undefined || value === null ? [] : (Array.isArray(value) ? value : [value]).map(String);
  const options = Object.entries(request).filter(([name]) => name !== 'command' && !names.includes(name));
  return [
    ...options.flatMap(([name, value]) => {
      if (value === true) return [`--${name}`];
      return value === false ? [] : texts(value).map((text) => `--${name}=${text}`);
    }),
    '--',
    ...names.flatMap((name) => texts(request[name])),
  ];
}

const line = ({ path, before, after, relative }: Difference): string =>
  `${path}: ${before ?? 'absent'} -> ${after ?? 'absent'}${relative === undefined ? '' : ` (relative ${relative.toPrecision(2)})`}`;

function textOf(name: string, { differences, sameDigits, reasons }: Replay): string {
  const rounding = sameDigits === 0 ? '' : `; ${sameDigits} numbers differ in their last digits only`;
  if (differences.length === 0) return `${name}: nothing moved${rounding}\n`;
  const more = differences.length - SHOWN;
  return [
    `${name}: ${differences.length} entries moved${rounding}`,
    ...differences.slice(0, SHOWN).map((difference) => `   ${line(difference)}`),
    ...(more > 0 ? [`   and ${more} more: all with --json`] : []),
    'why:',
    ...reasons.map((reason) => `   ${reason}`),
    '',
  ].join('\n');
}

/** The command for a program with these other commands. */
export function replayCommand(others: readonly Command[]): Command {
  async function run(call: Call): Promise<number> {
    const [name = ''] = call.operands;
    const saved = await savedResult(name, 'replay');
    if (saved === undefined)
      throw new UsageError(
        `${name} holds no result with the request behind it: wanted a file that ends in .json, written with --json by another command`,
        'replay',
      );
    const command = others.find((other) => other.name === saved.request.command);
    if (command === undefined)
      throw new UsageError(
        `${name} holds a result of "${saved.request.command}", which cannot be carried out again; wanted one of ${others.map((c) => c.name).join(', ')}`,
        'replay',
      );
    const { operands, given } = await parse(wordsOf(saved.request, command), command);
    if (operands.includes('-'))
      throw new UsageError(
        `${name}: its series came from standard input, which is gone; keep the series in a file, and run ${command.name} on that`,
        'replay',
      );
    let json = '';
    await command.run({
      operands,
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
    const { papers } = await import('../rooms-pictures.js');
    const now: unknown = JSON.parse(json);
    if (typeof now !== 'object' || now === null) throw new Error('a result is an object');
    const replay = papers.compareResults(saved, now);
    if (call.given.json) {
      const { report } = await import('../rooms.js');
      deliver(report.plainJson({ result: name, request: saved.request, ...replay }), call);
    } else deliver(textOf(name, replay), call);
    return replay.differences.length === 0 ? EXIT.done : EXIT.allRefused;
  }

  return {
    name: 'replay',
    summary: 'a saved result carried out again: what moved, and why',
    about: [
      'Reads the request in a file that --json wrote, carries it out with the program and the files as they are now, and lists every entry that moved beyond its digits, with the reasons there may be: another version, a changed series, another coupling. Exit code 0 when nothing moved, 1 otherwise.',
    ],
    operands: [{ name: 'RESULT', help: 'a file written with --json' }],
    options: ['json', 'output', 'quiet', 'help'],
    examples: [['leastterm replay result.json', 'does the result still hold?']],
    run,
  };
}
