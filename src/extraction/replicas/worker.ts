/** @module A worker thread: takes the problem once, then blocks, and sends back what they gave. Bundled into a file of its own. */
import { parentPort, workerData } from 'node:worker_threads';
import { Engine } from './engine.js';
import { runBlock } from './run-block.js';
import type { WorkerOrder } from './run.js';
import type { Block } from './tally.js';

const { problem, seed } = workerData as WorkerOrder;
const engine = new Engine(problem, seed);

parentPort?.on('message', (block: Block) => {
  const result = runBlock(engine, block);
  parentPort?.postMessage(result, [result.values.buffer as ArrayBuffer, result.codes.buffer as ArrayBuffer]);
});
