import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { bash, builtProgram, removeProgram } from './built.js';
import type { Ended } from './built.js';
import { leastterm, words } from './harness.js';

let program = '';
beforeAll(async () => {
  program = await builtProgram();
});
afterAll(() => removeProgram(program));
const shell = async (line: string): Promise<Ended> => bash(program, line);

describe('the bundled program', () => {
  test.each(['--help', 'help sum', '--version', 'catalogue list', 'catalogue show adler', 'assess adler', 'grwth'])(
    'says what the sources say, in any locale: %s',
    async (line) => {
      const inside = await leastterm(words(line));
      const outside = await shell(`$LEASTTERM ${line}`);
      expect(outside).toEqual({ signal: null, ...inside });
    },
  );

  test('assess: the same bytes from bundle and sources, twice', async () => {
    const line = "assess adler --at '0.3156(30)' --json";
    const inside = await leastterm(words(line));
    const first = await shell(`$LEASTTERM ${line}`);
    const second = await shell(`$LEASTTERM ${line}`);
    expect(inside.status).toBe(0);
    expect(first.stdout).toBe(inside.stdout);
    expect(second.stdout).toBe(first.stdout);
  });
});

describe('streams', () => {
  test('a reader that leaves early is no error', async () => {
    const { stdout, stderr } = await shell('$LEASTTERM --help | true; echo ${PIPESTATUS[0]}');
    expect([stdout, stderr]).toEqual(['0\n', '']);
  });

  test('nor one that leaves in the middle of a long result', async () => {
    const { stdout, stderr } = await shell(
      'seq 1 3000 | $LEASTTERM catalogue show - --json | head -n 1; echo ${PIPESTATUS[1]}',
    );
    expect([stdout, stderr]).toEqual(['{\n0\n', '']);
  });

  test('a long result reaches a pipe whole', async () => {
    const { stdout } = await shell(
      'seq 1 3000 | $LEASTTERM catalogue show - --json | tail -c 2; seq 1 3000 | $LEASTTERM catalogue show - --json | wc -c',
    );
    expect(stdout.startsWith('}\n')).toBe(true);
    expect(Number(stdout.slice(2))).toBeGreaterThan(200_000);
  });

  test('a full disk behind standard output is told', async () => {
    const { status, stderr } = await shell('$LEASTTERM --help > /dev/full');
    expect(status).toBe(2);
    expect(stderr).toBe('leastterm: standard output cannot be written: no space left on the device\n');
  });

  test('closed streams do no harm', async () => {
    const { status } = await shell('$LEASTTERM --help >&- 2>&-');
    expect([0, 2]).toContain(status);
  });
});

test('Ctrl-C ends it at once: by the signal, which a shell reports as 130', async () => {
  const child = spawn(process.execPath, [program, 'growth', '-'], { stdio: ['pipe', 'ignore', 'pipe'] });
  let stderr = '';
  child.stderr.setEncoding('utf8').on('data', (text: string) => {
    stderr += text;
  });
  setTimeout(() => child.kill('SIGINT'), 600);
  await once(child, 'close');
  expect([child.signalCode, stderr]).toEqual(['SIGINT', '']);
});
