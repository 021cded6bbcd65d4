/** @module One run of the program: words in, exit code out; texts go to the surroundings. */
import { COMMANDS } from './commands.js';
import { EXIT, tell, UsageError } from './faults.js';
import { commandHelp, generalHelp } from './help.js';
import { plainText } from './letters.js';
import { OPTION_NAMES, OPTIONS } from './options.js';
import { parse } from './parse.js';
import type { Progress } from './progress.js';
import type { Sink, Surroundings } from './surroundings.js';
import { unknownCommand } from './unknown.js';
import { VERSION } from './version.js';

interface Words {
  /** The first word that is no option. */
  readonly command: string | undefined;
  /** All others. */
  readonly rest: readonly string[];
  readonly wantsHelp: boolean;
  readonly wantsVersion: boolean;
}

/** Does this word take the next one as its value? */
function takesValue(word: string): boolean {
  const name = OPTION_NAMES.find((option) => word === `--${option}` || word === `-${OPTIONS[option].short}`);
  return name !== undefined && OPTIONS[name].kind !== 'flag';
}

/** Place of the command: the first word that is neither an option nor an option's value. */
function commandPlace(argv: readonly string[]): number {
  for (let i = 0; i < argv.length; i++) {
    const word = argv[i] ?? '';
    if (word === '--') return -1;
    if (takesValue(word)) i++;
    else if (!word.startsWith('-')) return i;
  }
  return -1;
}

/** Looks for the command, and for --help and --version, which are answered without reading anything else. */
function survey(argv: readonly string[]): Words {
  const end = argv.indexOf('--');
  const before = end < 0 ? argv : argv.slice(0, end);
  const at = commandPlace(argv);
  return {
    command: at < 0 ? undefined : argv[at],
    rest: at < 0 ? argv : [...argv.slice(0, at), ...argv.slice(at + 1)],
    wantsHelp: before.some((word) => word === '-h' || word === '--help'),
    wantsVersion: before.includes('--version'),
  };
}

async function dispatch(argv: readonly string[], surroundings: Surroundings): Promise<number> {
  const { command: name, rest, wantsHelp, wantsVersion } = survey(argv);
  if (wantsVersion) {
    surroundings.stdout.write(`leastterm ${VERSION}\n`);
    return EXIT.done;
  }
  const command = COMMANDS.find((c) => c.name === name);
  if (name !== undefined && command === undefined) throw new UsageError(await unknownCommand(name, COMMANDS));
  if (command === undefined) {
    const [stray] = rest.filter((word) => word !== '-h' && word !== '--help' && word !== '--');
    if (stray !== undefined) {
      throw new UsageError(`no command given; wanted one of ${COMMANDS.map((c) => c.name).join(', ')}`);
    }
    surroundings.stdout.write(generalHelp(COMMANDS));
    return EXIT.done;
  }
  if (wantsHelp) {
    surroundings.stdout.write(commandHelp(command));
    return EXIT.done;
  }
  const { operands, given } = await parse(rest, command);
  if (given.quiet || command.asks === true) return command.run({ operands, given, surroundings });
  const progress = await surroundings.startProgress?.(command.name);
  if (progress === undefined) return command.run({ operands, given, surroundings });
  try {
    return await command.run({ operands, given, surroundings: watched(surroundings, progress) });
  } finally {
    progress.end();
  }
}

/** The surroundings with a clock, whose line goes before anything is written. */
function watched(surroundings: Surroundings, progress: Progress): Surroundings {
  const { stdout, stderr } = surroundings;
  const after = (sink: Sink): Sink => ({
    ...sink,
    write: (text) => {
      progress.end();
      sink.write(text);
    },
  });
  return { ...surroundings, stdout: after(stdout), stderr: after(stderr), progress };
}

/** Runs the command line `argv` (without program and script). Never throws; the exit code comes back. */
export async function run(argv: readonly string[], surroundings: Surroundings): Promise<number> {
  try {
    return await dispatch(argv, surroundings);
  } catch (error) {
    const debug = (surroundings.environment['LEASTTERM_DEBUG'] ?? '') !== '';
    const { text, exitCode } = tell(error, debug);
    surroundings.stderr.write(await plainText(text, surroundings));
    return exitCode;
  }
}
