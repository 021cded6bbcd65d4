/** The clock of long commands: what it draws, that it draws while the program is busy, and that it is gone before results. */
import { build } from 'esbuild';
import { closeSync, mkdtempSync, openSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, expect, test } from 'vitest';
import { startProgress } from '../../src/cli/progress.js';
import { progressLine } from '../../src/cli/progress-line.js';
import { run } from '../../src/cli/run.js';
import type { Surroundings } from '../../src/cli/surroundings.js';

const folder = mkdtempSync(join(tmpdir(), 'leastterm-progress-'));
afterAll(() => rmSync(folder, { recursive: true }));

/** The thread is busy, as a calculation is. */
const busy = (milliseconds: number): void => {
  Atomics.wait(new Int32Array(new SharedArrayBuffer(4)), 0, 0, milliseconds);
};

async function drawn(work: (progress: ReturnType<typeof startProgress>) => void): Promise<string> {
  const worker = join(folder, 'clock.mjs');
  await build({
    entryPoints: [fileURLToPath(new URL('../../src/cli/progress-worker.ts', import.meta.url))],
    outfile: worker,
    bundle: true,
    format: 'esm',
    platform: 'node',
  });
  const path = join(folder, 'terminal.txt');
  const descriptor = openSync(path, 'w');
  const progress = startProgress('backtest', descriptor, 80, worker);
  work(progress);
  progress.end();
  closeSync(descriptor);
  return readFileSync(path, 'utf8');
}

test('a busy program still shows the time and its steps, and takes the line away', async () => {
  const text = await drawn((progress) => {
    progress.step(3, 14);
    busy(2500);
  });
  expect(text.startsWith('\rbacktest: ')).toBe(true);
  expect(text).toMatch(/s, 3 of 14/);
  expect(text).toMatch(/\r {20,}\r$/);
});

test('nothing is drawn for a command that is done before the second is over', async () => {
  expect(await drawn(() => busy(300))).toBe('');
});

test('the words of the line', () => {
  expect(progressLine('compare', 12.9, 0, 0)).toBe('compare: 12 s');
  expect(progressLine('report', 3, 2, 6)).toBe('report: 3 s, 2 of 6');
});

async function watched(argv: readonly string[]): Promise<string[]> {
  const events: string[] = [];
  const sink = (name: string) => ({ isTerminal: true, write: () => void events.push(name) });
  const surroundings: Surroundings = {
    stdout: sink('out'),
    stderr: sink('err'),
    stdinIsTerminal: false,
    environment: {},
    startProgress: async (command) => {
      events.push(`start ${command}`);
      return { step: (done, of) => void events.push(`${done}/${of}`), end: () => void events.push('end') };
    },
  };
  await run(argv, surroundings);
  return events;
}

test('the line goes before anything is written, and always in the end', async () => {
  expect(await watched(['sum', 'adler', '--at', '0.3', '--by', 'pade'])).toEqual(['start sum', 'end', 'out', 'end']);
  expect(await watched(['sum', 'nosuch', '--at', '0.3', '--by', 'pade'])).toEqual(['start sum', 'end', 'err']);
  expect(await watched(['sum', 'adler', '--at', '0.3', '--by', 'pade', '-q'])).toEqual(['out']);
});

test('a back-test of several series counts them', async () => {
  const events = await watched(['backtest', 'adler', 'bjorken', '--at', '0.3', '--hide', '1', '--only', 'fixed-order']);
  expect(events).toEqual(['start backtest', '0/2', '1/2', 'end', 'out', 'end']);
});
