/**
 * @module How long a command has been at work, told on a terminal after a second: one line on standard error, gone before
 * anything else is written. Commands need not know of it; one that goes through a list may say how far it is.
 */
import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { Worker } from 'node:worker_threads';
import { CELL, CELLS, STATE } from './progress-line.js';
import type { ProgressOrder } from './progress-line.js';

export interface Progress {
  /** `done` of `of` parts are ready. */
  step(done: number, of: number): void;
  /** Takes the line away, and waits until it is. Any number of calls. */
  end(): void;
}

const NO_PROGRESS: Progress = { step: () => undefined, end: () => undefined };

/** Milliseconds that a thread which does not answer is waited for. */
const PATIENCE = 500;

/** The file of the clock: beside the program or beside its chunks; undefined when the program runs from its sources. */
const clockFile = (): string | undefined =>
  ['progress-worker.mjs', '../progress-worker.mjs']
    .map((path) => fileURLToPath(new URL(path, import.meta.url)))
    .find((path) => existsSync(path));

/** Starts the clock of the command `name` on the terminal behind `descriptor`. */
export function startProgress(name: string, descriptor: number, columns: number, file = clockFile()): Progress {
  if (file === undefined) return NO_PROGRESS;
  const shared = new SharedArrayBuffer(CELLS * Int32Array.BYTES_PER_ELEMENT);
  const cells = new Int32Array(shared);
  const workerData: ProgressOrder = { shared, descriptor, name, columns, since: Date.now() };
  const clock = new Worker(file, { workerData });
  // A clock that cannot run is none; the command goes on.
  clock.on('error', () => undefined);
  clock.unref();
  return {
    step(done, of) {
      Atomics.store(cells, CELL.done, done);
      Atomics.store(cells, CELL.of, of);
    },
    end() {
      const before = Atomics.exchange(cells, CELL.state, STATE.over);
      Atomics.notify(cells, CELL.state);
      if (before === STATE.drawing) Atomics.wait(cells, CELL.gone, 0, PATIENCE);
    },
  };
}
