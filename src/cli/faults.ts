/** @module What can go wrong, in words for the user, with the exit code. */

/** 0 done; 1 every prescription refused; 2 wrong input or usage; 3 a fault of the program; 130 interrupted. */
export const EXIT = { done: 0, allRefused: 1, wrongInput: 2, fault: 3, interrupted: 130 } as const;

/** A command line that cannot be carried out. The message says what was found and what to write instead. */
export class UsageError extends Error {
  override readonly name = 'UsageError';
  /** Command whose help is pointed to; none for an unknown command. */
  readonly command: string | undefined;

  constructor(message: string, command?: string, options?: ErrorOptions) {
    super(message, options);
    this.command = command;
  }
}

export interface Told {
  readonly text: string;
  readonly exitCode: number;
}

/** An error of the reader of series files; recognised by name, so that the reader is not loaded for a usage error. */
const isInputError = (error: unknown): error is Error => error instanceof Error && error.name === 'InputError';

const prefixed = (lines: string): string =>
  lines
    .split('\n')
    .map((line) => `leastterm: ${line}\n`)
    .join('');

function faultText(error: unknown, debug: boolean): string {
  const message = error instanceof Error ? `${error.name}: ${error.message}` : String(error);
  const [first = ''] = message.split('\n');
  const block = [
    `internal fault: ${first}`,
    'this is a fault of leastterm, not of your input',
    'please report it with the command line, the series file and the output of leastterm --version',
    debug ? '' : 'set LEASTTERM_DEBUG=1 to see where it happened',
  ];
  const stack = debug && error instanceof Error && error.stack !== undefined ? `${error.stack}\n` : '';
  return prefixed(block.filter((line) => line !== '').join('\n')) + stack;
}

/** Words and exit code for anything that was thrown. */
export function tell(error: unknown, debug: boolean): Told {
  if (error instanceof UsageError) {
    const more = error.command === undefined ? 'leastterm --help' : `leastterm ${error.command} --help`;
    return { text: prefixed(`${error.message}\nsee ${more}`), exitCode: EXIT.wrongInput };
  }
  if (isInputError(error)) return { text: prefixed(error.message), exitCode: EXIT.wrongInput };
  return { text: faultText(error, debug), exitCode: EXIT.fault };
}
