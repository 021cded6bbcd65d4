/** What --json writes for real series is what the schema promises, and what the exit codes say. */
import { Ajv } from 'ajv';
import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { leastterm, words } from './harness.js';

const SCHEMA = new URL('../../docs/assessment.schema.json', import.meta.url);
const validate = new Ajv({ strict: true, allErrors: true }).compile(JSON.parse(readFileSync(SCHEMA, 'utf8')));

const FACTORIAL = 'format: 1\ntitle: Euler\nvariable: x\ncoefficients: [1, -1, 2, -6, 24, -120, 720, -5040]\n';

/** Every scalar of a JSON value with its path. */
function* leaves(value: unknown, path: string): Generator<readonly [string, unknown]> {
  if (typeof value !== 'object' || value === null) yield [path, value];
  else for (const [key, inner] of Object.entries(value)) yield* leaves(inner, `${path}.${key}`);
}

describe('assess --json', () => {
  test.each([
    ["adler --at '0.3156(30)'", ''],
    ['r-ratio --at 0.118 --order 3', ''],
    ['vellum --at 0.3 --order 9', ''],
    ['- --at 0.1', FACTORIAL],
    ['- --at 0.25', '1\n0.5\n0.25\n'],
    ['- --at 0.5', '1\n'],
    ['- --at 0.1', '0\n0\n0\n'],
    ['- --at 0.1', '1(3)\n2(5)\n1(9)\n8(30)\n'],
  ])('assess %s keeps to the schema', async (line, stdin) => {
    const { status, stdout, stderr } = await leastterm(words(`assess ${line} --json`), { stdin });
    expect(stderr).toBe('');
    expect([0, 1]).toContain(status);
    const result: unknown = JSON.parse(stdout);
    expect(validate(result), JSON.stringify(validate.errors)).toBe(true);
    for (const [path, value] of leaves(result, '')) {
      // Counts and orders are JSON numbers; every quantity is a decimal string.
      if (typeof value === 'number') expect(Number.isSafeInteger(value), path).toBe(true);
    }
  });

  test('the text of the same result keeps to the page', async () => {
    for (const [columns, line] of [
      [80, "adler --at '0.3156(30)'"],
      [100, 'vellum --at 0.3 --order 12 --digits 40'],
    ] as const) {
      const { stdout } = await leastterm(words(`assess ${line} --no-color`), { terminal: columns });
      for (const row of stdout.split('\n')) expect([...row].length, row).toBeLessThanOrEqual(columns);
    }
  });
});

describe('the parts', () => {
  test.each([
    ['growth adler', ['leastterm', 'request', 'series', 'growth', 'cautions']],
    ['plane adler', ['leastterm', 'request', 'series', 'borelPlane', 'cautions']],
    ['sum adler --by fixed-order --at 0.3', ['leastterm', 'request', 'series', 'coupling', 'values', 'cautions']],
  ])('%s', async (line, keys) => {
    const { stdout } = await leastterm(words(`${line} --json`));
    expect(Object.keys(JSON.parse(stdout))).toEqual(keys);
  });
});

describe('exit code 1: there is a report, and no value', () => {
  test.each(['', ' --json', ' -q'])('sum by a prescription that refuses%s', async (form) => {
    const { status, stdout, stderr } = await leastterm(words(`sum - --by least-term --at 0.01${form}`), {
      stdin: FACTORIAL,
    });
    expect([status, stderr]).toEqual([1, '']);
    if (form === ' -q') expect(stdout).toBe('');
    else expect(stdout).toContain('refused');
  });
});

test('fifty certified digits of a sum that is known in closed form', async () => {
  // 1 + 1/3: exact, so every digit can be told.
  const { stdout } = await leastterm(words('sum - --by fixed-order --at 0.1 --digits 50 -q'), { stdin: '1\n10/3\n' });
  expect(stdout).toBe(`1.${'3'.repeat(49)}\n`);
});
