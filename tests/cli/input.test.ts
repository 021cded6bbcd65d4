import { describe, expect, test } from 'vitest';
import { leastterm, words } from './harness.js';

const LIST = '1\n1.6398\n6.3710\n49.0757\n283(142)\n';
const YAML = `format: 1
title: Five numbers
variable: x
coefficients: [1, 1, 2, 6, 24]
`;

describe('standard input', () => {
  test('a bare list', async () => {
    const { status, stdout, stderr } = await leastterm(words('growth - --json'), { stdin: LIST });
    expect([status, stderr]).toEqual([0, '']);
    expect(JSON.parse(stdout).series.coefficientsInFile).toBe(5);
  });

  test('a series file', async () => {
    const { status, stdout } = await leastterm(words('growth -'), { stdin: YAML });
    expect(status).toBe(0);
    expect(stdout.split('\n')[0]).toBe('Five numbers');
  });

  test('from a terminal is announced, unless -q', async () => {
    const told = await leastterm(words('growth -'), { stdin: LIST, stdinIsTerminal: true });
    expect(told.stderr).toBe('leastterm: reading the series from the terminal; Ctrl-D ends it\n');
    const quiet = await leastterm(words('growth - -q'), { stdin: LIST, stdinIsTerminal: true });
    expect(quiet.stderr).toBe('');
  });

  test('that is no series ends with the places of all mistakes', async () => {
    const wrong = YAML.replace('variable', 'varaible').replace('[1, 1, 2', '[1, one, 2');
    const { status, stdout, stderr } = await leastterm(words('assess - --at 0.1'), { stdin: wrong });
    expect([status, stdout]).toEqual([2, '']);
    const lines = stderr.trimEnd().split('\n');
    expect(lines.length).toBeGreaterThanOrEqual(2);
    for (const line of lines) expect(line).toMatch(/^leastterm: standard input(:\d+:\d+)?: .*; wanted /);
  });
});

describe('a name that is nothing', () => {
  test.each(['adlr', 'adler-fonction'])('%s: did you mean adler?', async (name) => {
    const { status, stderr } = await leastterm(['assess', name, '--at', '0.3']);
    expect(status).toBe(2);
    expect(stderr).toMatch(new RegExp(`^leastterm: ${name}: `));
    if (name === 'adlr') expect(stderr).toContain('did you mean "adler"?');
  });

  test('a missing file', async () => {
    const { status, stderr } = await leastterm(words('growth ./no/such/file.yaml'));
    expect(status).toBe(2);
    expect(stderr).toContain('./no/such/file.yaml');
  });
});

describe('options stand where they like', () => {
  test.each([
    'sum --by fixed-order --at 0.1 -q -',
    'sum - -q --at 0.1 --by fixed-order',
    '--at 0.1 sum - --by fixed-order -q',
    '-q --by=fixed-order sum --at=0.1 -',
    'sum --by pade --by fixed-order --at 0.5 --at 0.1 -q -',
    'sum --by fixed-order --at 0.1 -q -- -',
  ])('%s', async (line) => {
    const { status, stdout, stderr } = await leastterm(words(line), { stdin: YAML });
    expect([status, stderr]).toEqual([0, '']);
    expect(stdout).toMatch(/^1\.1/);
  });

  test('a negative value of --at', async () => {
    for (const line of ['sum - --by fixed-order -q --at -0.1', 'sum - --by fixed-order -q --at=-0.1']) {
      const { status, stdout } = await leastterm(words(line), { stdin: YAML });
      expect(status).toBe(0);
      expect(Number(stdout)).toBeLessThan(1);
    }
  });
});
