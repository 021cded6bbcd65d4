/** @module The same replicas in this thread and on any number of workers; interruption. */
import { rmSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { runReplicas } from '../../../src/extraction/replicas/run.js';
import { summarise } from '../../../src/extraction/replicas/summary.js';
import type { Known } from '../../../src/extraction/replicas/tally.js';
import { BLOCK } from '../../../src/extraction/replicas/tally.js';
import { identity, quadratic } from './toys.js';

const folder = fileURLToPath(new URL(`../../../node_modules/.cache/leastterm/worker-${process.pid}`, import.meta.url));
const workerFile = join(folder, 'replica-worker.mjs');

beforeAll(async () => {
  await build({
    entryPoints: [fileURLToPath(new URL('../../../src/extraction/replicas/worker.ts', import.meta.url))],
    outfile: workerFile,
    bundle: true,
    format: 'esm',
    platform: 'node',
    target: 'node20',
    logLevel: 'warning',
  });
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const COUNT = 7 * BLOCK + 123;

const bytes = (known: Known): Buffer =>
  Buffer.concat(
    [known.index, ...known.columns, ...known.codes].map((a) => Buffer.from(a.buffer, a.byteOffset, a.byteLength)),
  );

describe('workers', () => {
  test('one thread, one, two and three workers give the same bits', async () => {
    const alone = await runReplicas(quadratic, { count: COUNT, seed: 7, workers: 1 });
    expect(alone.index.length).toBe(COUNT);
    for (const workers of [2, 3]) {
      const shared = await runReplicas(quadratic, { count: COUNT, seed: 7, workers, workerFile });
      expect(bytes(shared).equals(bytes(alone)), `${workers} workers`).toBe(true);
      expect(summarise(quadratic, shared, 7, [])).toEqual(summarise(quadratic, alone, 7, []));
    }
  });

  test('another seed gives other replicas, more replicas begin with the same', async () => {
    const run = async (count: number, seed: number): Promise<Known> =>
      runReplicas(identity, { count, seed, workers: 1 });
    const [a, b, longer] = await Promise.all([run(600, 7), run(600, 8), run(1300, 7)]);
    expect(bytes(a).equals(bytes(b))).toBe(false);
    expect([...longer.columns[0]!.subarray(0, 600)]).toEqual([...a.columns[0]!]);
  });

  test('a worker that cannot start is a fault, not a wait without end', async () => {
    const options = { count: 1000, seed: 7, workers: 2, workerFile: join(folder, 'missing.mjs') };
    await expect(runReplicas(identity, options)).rejects.toThrow(/missing|Cannot find/);
  });
});

describe('interruption', () => {
  test.each([1, 2])(
    'what is finished is kept, and is what the whole run has in its place; %i workers',
    async (workers) => {
      const whole = await runReplicas(quadratic, { count: COUNT, seed: 7, workers: 1 });
      const stop = new AbortController();
      const seen: number[] = [];
      const part = await runReplicas(quadratic, {
        count: COUNT,
        seed: 7,
        workers,
        workerFile,
        signal: stop.signal,
        onProgress: (done) => {
          seen.push(done);
          if (done >= 3 * BLOCK) stop.abort();
        },
      });
      expect(part.index.length).toBeGreaterThanOrEqual(3 * BLOCK);
      expect(part.index.length).toBeLessThan(COUNT);
      expect(seen).toEqual(seen.toSorted((a, b) => a - b));
      part.index.forEach((at, i) => expect(part.columns[0]![i]).toBe(whole.columns[0]![at]));
      const result = summarise(quadratic, part, 7, []);
      expect([result.asked, result.done, result.interrupted]).toEqual([COUNT, part.index.length, true]);
      expect(result.notes[0]).toContain(`${part.index.length} of ${COUNT} replicas were finished`);
    },
  );

  test('before anything is finished: no replicas, and no number', async () => {
    const stop = new AbortController();
    stop.abort();
    const none = await runReplicas(identity, { count: 1000, seed: 7, workers: 1, signal: stop.signal });
    expect(none.index.length).toBe(0);
    const result = summarise(identity, none, 7, []);
    expect(result.done).toBe(0);
    expect(result.rows[0]!.values[0]!.distribution).toBeUndefined();
    expect(JSON.stringify(result)).not.toMatch(/NaN|infinite|null/);
    expect(result.covariance.labels).toEqual([]);
  });
});
