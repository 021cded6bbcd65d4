/** @module Replicas from the command line: usage, the page, JSON, threads of the built program, Ctrl-C. */
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { bash, builtProgram, removeProgram } from './built.js';
import { leastterm, words } from './harness.js';

const LINE = "extract tau-delta0 --measured '0.2042(30)' --for alpha_s --only fixed-order,borel-pade";

interface Replicas {
  readonly asked: number;
  readonly done: number;
  readonly interrupted: boolean;
  readonly seed: string;
  readonly rows: readonly {
    readonly prescription: string;
    readonly values: readonly {
      readonly distribution?: { readonly replicas: number; readonly histogram: readonly number[] };
    }[];
  }[];
  readonly covariance: { readonly labels: readonly string[]; readonly matrix: readonly (readonly string[])[] };
}

const replicasOf = (stdout: string): Replicas => (JSON.parse(stdout) as { replicas: Replicas }).replicas;

describe('usage', () => {
  test.each([
    ['--replicas=-5', '--replicas: "-5" is not a whole number from 100 to 2000000; write --replicas 100000'],
    ['--replicas 99', '--replicas: "99" is not a whole number from 100 to 2000000'],
    ['--replicas many', '--replicas: "many" is not a whole number'],
    ['--replicas 1000 --seed 1.5', '--seed: "1.5" is not a whole number from 0 to 999999999; write --seed 7'],
    ['--replicas 1000 --seed=-1', '--seed: "-1" is not a whole number'],
    ['--replicas 1000 --workers 0', '--workers: "0" is not a whole number from 1 to 256'],
    ['--seed 7', '--seed says something about replicas: write --replicas 100000 as well'],
    ['--workers 2', '--workers says something about replicas'],
  ])('%s', async (options, message) => {
    const { status, stdout, stderr } = await leastterm(words(`${LINE} ${options}`));
    expect([status, stdout]).toEqual([2, '']);
    expect(stderr).toContain(message);
    expect(stderr).toContain('leastterm extract --help');
  });

  test('nothing with an error is refused with the remedy', async () => {
    const line = 'extract tau-delta0 --measured 0.2042 --for alpha_s --to none --only fixed-order --replicas 200';
    const { status, stderr } = await leastterm(words(line));
    expect(status).toBe(2);
    expect(stderr).toContain(
      "nothing has an error: all replicas would be the same; remedy: give errors: --measured '0.2042(50)'",
    );
  });
});

describe('the page', () => {
  test('has the section with percentiles, histograms and what was drawn', async () => {
    const { status, stdout, stderr } = await leastterm(words(`${LINE} --replicas 600 --seed 7 --workers 1`));
    expect([status, stderr]).toEqual([0, '']);
    const section = stdout.slice(stdout.indexOf('Replicas'));
    expect(section).toContain('600, seed 7');
    expect(section).toContain('measurement of tau-delta0 0.2042 ± 0.003');
    expect(section).toMatch(/α_s\(M_Z\) +median +68 % +95 % +σ/);
    for (const name of ['fixed-order', 'borel-pade', 'drawn at random']) expect(section).toContain(name);
    expect(section).toMatch(/\|[·▁▂▃▄▅▆▇█]{41}\|/);
    expect(Math.max(...section.split('\n').map((line) => line.length))).toBeLessThanOrEqual(100);
  });

  test('without --replicas there is none', async () => {
    const { stdout } = await leastterm(words(LINE));
    expect(stdout).not.toContain('Replicas');
  });
});

describe('JSON', () => {
  test('carries histograms and the covariance; seed 1 unless another is given', async () => {
    const { status, stdout } = await leastterm(words(`${LINE} --replicas 600 --workers 1 --json`));
    expect(status).toBe(0);
    const replicas = replicasOf(stdout);
    expect([replicas.asked, replicas.done, replicas.interrupted, replicas.seed]).toEqual([600, 600, false, '1']);
    const { distribution } = replicas.rows[0]!.values[0]!;
    expect(distribution!.histogram).toHaveLength(41);
    expect(replicas.covariance.labels).toHaveLength(4);
    expect(replicas.covariance.matrix.every((row) => row.length === 4)).toBe(true);
  });
});

describe('the built program', () => {
  let program = '';
  beforeAll(async () => {
    program = await builtProgram();
  }, 60_000);
  afterAll(() => removeProgram(program));

  test('gives the same bytes on two and three threads as the sources on one', async () => {
    const line = `${LINE} --replicas 2600 --seed 7 --json`;
    const inside = await leastterm(words(line));
    for (const workers of [2, 3]) {
      const { status, stdout, stderr } = await bash(program, `$LEASTTERM ${line} --workers ${workers}`);
      expect([status, stderr]).toEqual([0, '']);
      expect(stdout === inside.stdout, `${workers} threads`).toBe(true);
    }
  });

  test('Ctrl-C: what is known so far, and exit code 130', async () => {
    const ask = (count: number): string[] => [
      program,
      ...words(`${LINE} --replicas ${count} --seed 7 --workers 2 --json`),
    ];
    const start = performance.now();
    const short = spawn(process.execPath, ask(1000), { stdio: 'ignore' });
    await once(short, 'close');
    const warm = performance.now() - start;
    const child = spawn(process.execPath, ask(2_000_000), { stdio: ['ignore', 'pipe', 'pipe'] });
    let stdout = '';
    let stderr = '';
    child.stdout.setEncoding('utf8').on('data', (text: string) => {
      stdout += text;
    });
    child.stderr.setEncoding('utf8').on('data', (text: string) => {
      stderr += text;
    });
    // By then a short run would have ended, and the long one is in its replicas.
    setTimeout(() => child.kill('SIGINT'), 1.5 * warm + 500);
    await once(child, 'close');
    expect([child.exitCode, child.signalCode, stderr]).toEqual([130, null, '']);
    const { asked, done, interrupted, rows } = replicasOf(stdout);
    expect([asked, interrupted]).toEqual([2_000_000, true]);
    expect(done).toBeGreaterThan(0);
    expect(done).toBeLessThan(2_000_000);
    expect(rows[0]!.values[0]!.distribution!.replicas).toBe(done);
  });
});
