/**
 * @module Runs the replicas: in this thread, or on worker threads that fetch one block after the other.
 *
 * A replica depends on seed and number alone and every block goes to its own place, so that the result is the same, bit for bit,
 * for any number of workers and any order in which blocks come back.
 */
import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { Worker } from 'node:worker_threads';
import { Engine } from './engine.js';
import type { ReplicaProblem } from './problem.js';
import { runBlock } from './run-block.js';
import { blocksOf, Tally } from './tally.js';
import type { Block, BlockResult, Known } from './tally.js';

export interface RunOptions {
  readonly count: number;
  readonly seed: number;
  /** Threads beside this one; below 2: this one alone. */
  readonly workers: number;
  /** Called now and then with the number of replicas done. */
  readonly onProgress?: (done: number) => void;
  /** When it aborts, what is finished is given back. */
  readonly signal?: AbortSignal;
  /** The file that a worker runs, in place of the one beside the program. */
  readonly workerFile?: string;
}

/** What a worker is started with. */
export interface WorkerOrder {
  readonly problem: ReplicaProblem;
  readonly seed: number;
}

/** The worker's file in the built program, beside it or one folder up; undefined when run from the sources. */
function builtWorker(): string | undefined {
  const places = ['./replica-worker.mjs', '../replica-worker.mjs'].map((path) =>
    fileURLToPath(new URL(path, import.meta.url)),
  );
  return places.find((path) => existsSync(path));
}

const pause = async (): Promise<void> =>
  new Promise((resolve) => {
    setImmediate(resolve);
  });

async function alone(
  problem: ReplicaProblem,
  blocks: readonly Block[],
  tally: Tally,
  options: RunOptions,
): Promise<void> {
  const engine = new Engine(problem, options.seed);
  let done = 0;
  for (const block of blocks) {
    if (options.signal?.aborted === true) return;
    tally.add(runBlock(engine, block));
    done += block.count;
    options.onProgress?.(done);
    // Signals and progress get their turn.
    await pause();
  }
}

async function threaded(
  problem: ReplicaProblem,
  blocks: readonly Block[],
  tally: Tally,
  file: string,
  options: RunOptions,
): Promise<void> {
  const order: WorkerOrder = { problem, seed: options.seed };
  const threads: Worker[] = [];
  let next = 0;
  let done = 0;
  const work = async (): Promise<void> =>
    new Promise((resolve, reject) => {
      const worker = new Worker(file, { workerData: order });
      const send = worker.postMessage.bind(worker);
      threads.push(worker);
      const hand = (): void => {
        const block = blocks[next];
        if (block === undefined || options.signal?.aborted === true) resolve();
        else {
          next++;
          send(block);
        }
      };
      worker.on('message', (result: BlockResult) => {
        tally.add(result);
        done += result.count;
        options.onProgress?.(done);
        hand();
      });
      worker.once('error', reject);
      worker.once('exit', (code) => {
        if (code !== 0) reject(new Error(`a worker ended with code ${code}`));
      });
      options.signal?.addEventListener('abort', () => resolve(), { once: true });
      hand();
    });
  try {
    await Promise.all(Array.from({ length: Math.min(options.workers, blocks.length) }, work));
  } finally {
    for (const worker of threads) worker.removeAllListeners('exit');
    await Promise.all(threads.map(async (worker) => worker.terminate()));
  }
}

/** All replicas, or those finished when the signal came. */
export async function runReplicas(problem: ReplicaProblem, options: RunOptions): Promise<Known> {
  const blocks = blocksOf(options.count);
  const tally = new Tally(problem, options.count);
  const file = options.workers > 1 ? (options.workerFile ?? builtWorker()) : undefined;
  if (file === undefined) await alone(problem, blocks, tally, options);
  else await threaded(problem, blocks, tally, file, options);
  return tally.known();
}
