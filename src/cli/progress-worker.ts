/**
 * @module The clock of a long command, in a thread of its own: the work is synchronous, so that no timer of the program fires
 * while it lasts. Draws one line on a descriptor and takes it away again.
 */
import { writeSync } from 'node:fs';
import { workerData } from 'node:worker_threads';
import { CELL, progressLine, STATE } from './progress-line.js';
import type { ProgressOrder } from './progress-line.js';

/** Milliseconds before the first line, and between two. */
const FIRST = 1000;
const PERIOD = 250;

const { shared, descriptor, name, columns, since } = workerData as ProgressOrder;
const cells = new Int32Array(shared);

function write(text: string): void {
  try {
    writeSync(descriptor, text);
  } catch {
    // A terminal that does not take it now gets the next one.
  }
}

Atomics.wait(cells, CELL.state, STATE.quiet, FIRST);
// Only the one who changes the cell first goes on: from here on the program waits until the line is gone.
if (Atomics.compareExchange(cells, CELL.state, STATE.quiet, STATE.drawing) === STATE.quiet) {
  let drawn = '';
  while (Atomics.load(cells, CELL.state) === STATE.drawing) {
    const [done, of] = [Atomics.load(cells, CELL.done), Atomics.load(cells, CELL.of)];
    const line = progressLine(name, (Date.now() - since) / 1000, done, of).slice(0, columns - 1);
    if (line !== drawn) write(`\r${line.padEnd(drawn.length)}`);
    drawn = line;
    Atomics.wait(cells, CELL.state, STATE.drawing, PERIOD);
  }
  write(`\r${' '.repeat(drawn.length)}\r`);
  Atomics.store(cells, CELL.gone, 1);
  Atomics.notify(cells, CELL.gone);
}
