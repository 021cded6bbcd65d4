import { describe, expect, test } from 'vitest';
import { leastterm, words } from './harness.js';

const run = (line: string, stdin?: string): ReturnType<typeof leastterm> =>
  leastterm(words(line), stdin === undefined ? {} : { stdin });

const LIST = '1\n0.5\n0.3\n0.12\n';

describe('leastterm truncation', () => {
  test('sets the models side by side, conventional and credible apart, priors named', async () => {
    const { status, stdout } = await run('truncation - --at 1', LIST);
    expect(status).toBe(0);
    expect(stdout).toContain('Conventional: a custom, no probability stands behind it');
    expect(stdout).toContain('Credible: Bayesian, under the priors named');
    expect(stdout).toMatch(/last term +± 0\.120 +± 0\.240 +next term/);
    expect(stdout).toMatch(/geometric model +± 0\.0667 +± 0\.187 +next term/);
    expect(stdout).toContain('geometric.omega = 1, geometric.epsilon = 0.1; mean of a = 0.50595');
    expect(stdout).toMatch(/not invariant under a change of variable/);
    expect(stdout.split('\n').every((line) => line.length <= 100)).toBe(true);
  });

  test('goes order by order, and counts', async () => {
    const { stdout } = await run('truncation - --at 1 --by-order', LIST);
    expect(stdout).toContain('through order 1; the term of order 2 is 0.300');
    expect(stdout).toMatch(/last term times ratio +± 0\.250 +± 0\.500 +in the 95 % band/);
    expect(stdout).toMatch(/The record on this series/);
  });

  test('takes priors by name', async () => {
    const line = 'truncation - --at 1 --json --prior geometric.omega=3';
    const { stdout } = await run(line, LIST);
    const result = JSON.parse(stdout) as {
      request: Record<string, unknown>;
      estimates: { model: string; priors: { name: string; value: string }[] }[];
    };
    expect(Object.keys(result)).toEqual(['leastterm', 'request', 'series', 'coupling', 'sum', 'estimates', 'cautions']);
    expect(result.request['prior']).toBe('geometric.omega=3');
    expect(result.estimates.find((e) => e.model === 'geometric')?.priors[0]).toMatchObject({
      name: 'geometric.omega',
      value: '3',
    });
  });

  test('--quiet is a line a model', async () => {
    const { stdout } = await run('truncation - --at 1 -q', LIST);
    const lines = stdout.trimEnd().split('\n');
    expect(lines[0]).toBe('last-term\t-0.12000\t0.12000\t-0.24000\t0.24000');
    for (const line of lines) expect(line).toMatch(/^[a-z-]+(\t-?[0-9.e-]+){4}$/);
  });

  test.each([
    ['--prior abc.zeta=1', /--prior: no prior "abc\.zeta"; wanted one of conventional\.double/],
    ['--prior abc.xi=0', /--prior: abc\.xi = 0; wanted a number above 0/],
    ['--prior', /--prior: no value given; write --prior abc\.xi=3/],
  ])('%s is a usage error', async (option, message) => {
    const { status, stderr } = await run(`truncation adler --at 0.3 ${option}`);
    expect(status).toBe(2);
    expect(stderr).toMatch(message);
  });

  test('competing growth has a section of its own, and assess says the same', async () => {
    const text =
      'first power: 0\nsingularities: [{ t: -1, exponent: 1 }, { t: 2, exponent: 1 }]\ncoefficients: [4, 1/2, 7/2, -15/4, 57/2, -435/4, 3015/4, -39375/8, 81585/2]\n';
    const { stdout } = await run('truncation - --at 0.2', text);
    expect(stdout).toMatch(/Competing growth: where to stop/);
    expect(stdout).toMatch(/bracket +orders 4 to 10: sums from 4\.\d+ to 4\.\d+ through order 8/);
    expect(stdout).toMatch(/smallest \|term\| alone is not trusted/);
    const { competing } = JSON.parse((await run('truncation - --at 0.2 --json', text)).stdout) as {
      competing: { orders: number[]; sums: { low: string; high: string } };
    };
    expect(competing.orders).toEqual([4, 10]);
    const assessed = (await run('assess - --at 0.2', text)).stdout;
    expect(assessed).toMatch(/bracket +orders 4 to 10/);
    const stop = Math.abs(Number(/error of stopping +± ([\d.]+)/.exec(assessed)![1]));
    expect(stop).toBeGreaterThan((Number(competing.sums.high) - Number(competing.sums.low)) / 2);
  });

  test('without a coupling it asks for one; with one coefficient it says what is missing', async () => {
    expect((await run('truncation adler')).status).toBe(2);
    const { status, stdout } = await run('truncation - --at 0.3', '1\n');
    expect(status).toBe(0);
    expect(stdout).toContain('refused. 1 coefficient known');
  });

  test('when every model refuses the exit code says so', async () => {
    const { status, stdout } = await run('truncation - --at 0.3', '0\n0\n');
    expect(status).toBe(1);
    expect(stdout).toContain('Every term is zero');
  });
});
