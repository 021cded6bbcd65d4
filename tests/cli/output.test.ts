import {
  chmodSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  symlinkSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { writeWhole } from '../../src/cli/output.js';
import { leastterm, words } from './harness.js';

let folder = '';
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'leastterm-output-'));
});
afterEach(() => {
  rmSync(folder, { recursive: true, force: true });
});

describe('a file is whole or not there', () => {
  test('it appears under its name only, whatever stood there before', () => {
    const path = join(folder, 'result.txt');
    writeWhole(path, 'first\n');
    writeWhole(path, 'second\n');
    expect(readFileSync(path, 'utf8')).toBe('second\n');
    expect(readdirSync(folder)).toEqual(['result.txt']);
  });

  test('a failure leaves the old file and no other', () => {
    mkdirSync(join(folder, 'sub'));
    writeFileSync(join(folder, 'sub', 'kept.txt'), 'old\n');
    expect(() => writeWhole(join(folder, 'missing', 'x.txt'), 'new\n')).toThrow('ENOENT');
    expect(() => writeWhole(join(folder, 'sub'), 'new\n')).toThrow('EISDIR');
    expect(readdirSync(folder)).toEqual(['sub']);
    expect(readdirSync(join(folder, 'sub'))).toEqual(['kept.txt']);
  });

  test('behind a link the file is replaced, not the link', () => {
    writeFileSync(join(folder, 'real.txt'), 'old\n');
    symlinkSync('real.txt', join(folder, 'link.txt'));
    writeWhole(join(folder, 'link.txt'), 'new\n');
    expect(readFileSync(join(folder, 'real.txt'), 'utf8')).toBe('new\n');
    expect(readdirSync(folder).toSorted()).toEqual(['link.txt', 'real.txt']);
  });

  test('a device is written directly', () => {
    expect(() => writeWhole('/dev/null', 'text\n')).not.toThrow();
  });

  test('a full device says so', () => {
    expect(() => writeWhole('/dev/full', 'text\n')).toThrow('ENOSPC');
  });
});

describe('--output', () => {
  test('the result goes to the file, one line of news to standard error', async () => {
    const path = join(folder, 'list.txt');
    const { status, stdout, stderr } = await leastterm(['catalogue', 'list', '-o', path]);
    expect({ status, stdout, stderr }).toEqual({ status: 0, stdout: '', stderr: `wrote ${path}\n` });
    const direct = await leastterm(words('catalogue list'));
    expect(readFileSync(path, 'utf8')).toBe(direct.stdout);
  });

  test('-q says nothing', async () => {
    const { stderr } = await leastterm(['catalogue', 'list', '-q', '-o', join(folder, 'ids')]);
    expect(stderr).toBe('');
  });

  test('holds no colour, even from a terminal', async () => {
    const path = join(folder, 'list.txt');
    await leastterm(['catalogue', 'list', '-o', path], { terminal: 100 });
    expect(readFileSync(path, 'utf8')).not.toContain(String.fromCodePoint(27));
    const shown = await leastterm(words('catalogue list'), { terminal: 100 });
    expect(shown.stdout).toContain(String.fromCodePoint(27));
    const plain = await leastterm(words('catalogue list --no-color'), { terminal: 100 });
    expect(plain.stdout).not.toContain(String.fromCodePoint(27));
  });

  test('- is standard output', async () => {
    const { stdout } = await leastterm(words('catalogue list -q -o -'));
    expect(stdout).toContain('adler');
  });

  test.each([
    ['missing/x.txt', 'its folder does not exist'],
    ['.', 'it is a folder'],
  ])('%s cannot be written', async (name, reason) => {
    const path = join(folder, name);
    const { status, stdout, stderr } = await leastterm(['catalogue', 'list', '-o', path]);
    expect([status, stdout]).toEqual([2, '']);
    expect(stderr).toContain(`leastterm: --output: ${path} cannot be written: ${reason}; name another file\n`);
  });

  test.skipIf(process.getuid?.() === 0)('a folder without permission', async () => {
    chmodSync(folder, 0o500);
    const { status, stderr } = await leastterm(['catalogue', 'list', '-o', join(folder, 'x')]);
    expect(status).toBe(2);
    expect(stderr).toContain('no permission to write there');
  });
});
