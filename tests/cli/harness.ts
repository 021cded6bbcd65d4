/** @module Runs a command line inside the test process, with streams that remember what was written. */
import { run } from '../../src/cli/run.js';
import type { Surroundings } from '../../src/cli/surroundings.js';

export interface Situation {
  readonly environment?: Readonly<Record<string, string | undefined>>;
  /** Standard output is a terminal of that many columns. */
  readonly terminal?: number;
  readonly stdin?: string;
  readonly stdinIsTerminal?: boolean;
}

export interface Outcome {
  readonly status: number;
  readonly stdout: string;
  readonly stderr: string;
}

async function* chunks(text: string): AsyncIterable<Uint8Array> {
  // Small pieces, so that a number is torn apart somewhere.
  for (let i = 0; i < text.length; i += 7) yield Buffer.from(text.slice(i, i + 7));
}

export async function leastterm(argv: readonly string[], situation: Situation = {}): Promise<Outcome> {
  let stdout = '';
  let stderr = '';
  const surroundings: Surroundings = {
    stdout: {
      write: (text) => {
        stdout += typeof text === 'string' ? text : Buffer.from(text).toString('latin1');
      },
      isTerminal: situation.terminal !== undefined,
      columns: situation.terminal,
    },
    stderr: {
      write: (text) => {
        stderr += typeof text === 'string' ? text : Buffer.from(text).toString('latin1');
      },
      isTerminal: false,
    },
    stdinIsTerminal: situation.stdinIsTerminal ?? false,
    stdin: chunks(situation.stdin ?? ''),
    environment: situation.environment ?? {},
  };
  const status = await run(argv, surroundings);
  return { status, stdout, stderr };
}

/** Splits a command line as a shell would, as far as the tests need it: blanks, and single quotes. */
export const words = (line: string): string[] =>
  [...line.matchAll(/'([^']*)'|(\S+)/g)].map((match) => match[1] ?? match[2] ?? '');
