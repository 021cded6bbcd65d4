/** @module Replicas from the command line: their options, a bar on a terminal, and Ctrl-C, which keeps what is finished. */
import { availableParallelism } from 'node:os';
import type { Call } from './command.js';
import { UsageError } from './faults.js';
import { accepted } from './refused.js';
import type { Problem, ReplicaResult } from '../extraction/index.js';
import type { Series } from '../series/index.js';

export const USUAL_SEED = 1;
const BAR = 30;
/** Milliseconds between two drawings of the bar. */
const PERIOD = 100;

/** --seed and --workers belong to --replicas. */
export function checkReplicaOptions({ given }: Call, command: string): void {
  if (given.replicas !== undefined) return;
  for (const name of ['seed', 'workers'] as const) {
    if (given[name] !== undefined)
      throw new UsageError(`--${name} says something about replicas: write --replicas 100000 as well`, command);
  }
}

interface Bar {
  show(done: number): void;
  clear(): void;
}

/** The bar: on standard error, when that is a terminal; nothing else is written there. */
function barOf({ given, surroundings }: Call, count: number): Bar {
  const { stderr } = surroundings;
  if (!stderr.isTerminal || given.quiet) return { show: () => undefined, clear: () => undefined };
  const start = Date.now();
  let last = 0;
  let drawn = 0;
  return {
    show(done) {
      const now = Date.now();
      if (now - last < PERIOD && done < count) return;
      last = now;
      const full = Math.round((BAR * done) / count);
      const left = Math.ceil(((now - start) / Math.max(1, done)) * (count - done) * 1e-3);
      const line = `replicas [${'#'.repeat(full)}${'.'.repeat(BAR - full)}] ${done} of ${count}, ${left} s left`;
      stderr.write(`\r${line.padEnd(drawn)}`);
      drawn = line.length;
    },
    clear() {
      if (drawn > 0) stderr.write(`\r${' '.repeat(drawn)}\r`);
    },
  };
}

/** The replicas that were asked for; undefined when none were. */
export async function replicasOf(
  call: Call,
  problem: Problem,
  series: readonly Series[],
  command: string,
): Promise<ReplicaResult | undefined> {
  const { given, surroundings } = call;
  const { replicas: count, seed = USUAL_SEED, workers = availableParallelism() } = given;
  if (count === undefined) return undefined;
  const { extraction } = await import('./rooms-more.js');
  const stop = new AbortController();
  const release = surroundings.onInterrupt?.(() => stop.abort());
  const bar = barOf(call, count);
  try {
    const options = { count, seed, workers, signal: stop.signal, onProgress: (done: number) => bar.show(done) };
    return accepted(await extraction.replicate(problem, series, options), command);
  } finally {
    bar.clear();
    release?.();
  }
}
