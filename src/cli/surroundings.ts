/** @module What a command sees of the outside world: streams, environment, terminal. Tests put their own in its place. */
import type { Progress } from './progress.js';

export interface Sink {
  /** Text, or the bytes of a picture. */
  write(text: string | Uint8Array): void;
  readonly isTerminal: boolean;
  readonly columns?: number | undefined;
}

export interface Surroundings {
  readonly stdout: Sink;
  readonly stderr: Sink;
  readonly stdinIsTerminal: boolean;
  /** Standard input, when it is not the process's own. */
  readonly stdin?: AsyncIterable<Uint8Array | string>;
  readonly environment: Readonly<Record<string, string | undefined>>;
  /** Starts the clock of a command on standard error; absent where that is no terminal. */
  readonly startProgress?: (command: string) => Promise<Progress>;
  /** The clock of the command at work. */
  readonly progress?: Progress;
  /** Calls the handler at the first Ctrl-C in place of ending; the second one ends at once. The way back comes back. */
  readonly onInterrupt?: (handler: () => void) => () => void;
}

const USUAL_COLUMNS = 80;

async function progressOnTerminal(command: string): Promise<Progress> {
  // Loaded where somebody looks: pipes and scripts do not pay for it.
  const { startProgress } = await import('./progress.js');
  // Some terminals do not know their width, or say 0.
  return startProgress(command, process.stderr.fd, process.stderr.columns || USUAL_COLUMNS);
}

/** The process's own. */
export function processSurroundings(): Surroundings {
  const sink = (stream: NodeJS.WriteStream): Sink => ({
    write: (text) => {
      stream.write(text);
    },
    isTerminal: stream.isTTY === true,
    columns: stream.isTTY === true ? stream.columns : undefined,
  });
  return {
    stdout: sink(process.stdout),
    stderr: sink(process.stderr),
    stdinIsTerminal: process.stdin.isTTY === true,
    environment: process.env,
    ...(process.stderr.isTTY === true ? { startProgress: progressOnTerminal } : {}),
    onInterrupt: (handler) => {
      process.once('SIGINT', handler);
      return () => {
        process.removeListener('SIGINT', handler);
      };
    },
  };
}
