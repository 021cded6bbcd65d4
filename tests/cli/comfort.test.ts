/** Completion, topics, the manual page, new series files. */
import { execFileSync, spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { COMMANDS } from '../../src/cli/commands.js';
import { manPage } from '../../src/cli/comfort/man.js';
import { splitCoefficients } from '../../src/cli/comfort/series-template.js';
import { TOPICS } from '../../src/cli/comfort/topics.js';
import { VERSION } from '../../src/cli/version.js';
import { loadSeries } from '../../src/series/index.js';
import { leastterm, words } from './harness.js';

let folder = '';
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'leastterm-test-'));
});
afterAll(() => rmSync(folder, { recursive: true }));

describe('completion', () => {
  test('bash completes commands, options, ids, and names of prescriptions', async () => {
    const script = join(folder, 'bash.sh');
    writeFileSync(script, (await leastterm(['completion', 'bash'])).stdout);
    const complete = (...line: string[]): string[] =>
      execFileSync('bash', [
        '-c',
        `source "$0"; COMP_WORDS=("$@"); COMP_CWORD=$(($# - 1)); _leastterm; printf '%s\\n' "\${COMPREPLY[@]}"`,
        script,
        ...line,
      ])
        .toString()
        .trim()
        .split('\n');
    expect(complete('leastterm', 'comp')).toEqual(expect.arrayContaining(['compare', 'completion']));
    expect(complete('leastterm', 'assess', 'bjork')).toEqual(['bjorken']);
    expect(complete('leastterm', 'assess', 'adler', '--alpha')).toContain('--alpha-s-mz');
    expect(complete('leastterm', 'sum', 'adler', '--by', 'borel-ler')).toEqual(['borel-leroy-pade']);
    expect(complete('leastterm', 'bubbles', 'pole-m')).toEqual(['pole-mass']);
    expect(complete('leastterm', 'help', TOPICS[0]!.name.slice(0, -1))).toContain(TOPICS[0]!.name);
    expect(complete('leastterm', 'extract', 'adler', '--for', 'al')).toEqual(['alpha_s']);
    expect(complete('leastterm', 'extract', 'adler', '--ambiguity-by', 'im')).toEqual(['im/pi', 'im']);
  });

  const installed = (shell: string): boolean => spawnSync(shell, ['-c', 'true']).status === 0;

  test.skipIf(!installed('fish'))('fish completes the same', async () => {
    const script = join(folder, 'script.fish');
    writeFileSync(script, (await leastterm(['completion', 'fish'])).stdout);
    const complete = (line: string): string[] =>
      execFileSync('fish', ['--no-config', '-c', `source ${script}; complete -C '${line}'`], { cwd: folder })
        .toString()
        .split('\n')
        .map((found) => found.split('\t')[0]!);
    expect(complete('leastterm ass')).toContain('assess');
    expect(complete('leastterm assess bjork')).toContain('bjorken');
    expect(complete('leastterm sum adler --by borel-ler')).toContain('borel-leroy-pade');
  });

  test.skipIf(!installed('zsh'))('zsh reads its script without a complaint', async () => {
    const script = join(folder, '_leastterm');
    writeFileSync(script, (await leastterm(['completion', 'zsh'])).stdout);
    const { status, stderr } = spawnSync('zsh', [
      '-f',
      '-c',
      `autoload -Uz compinit; compinit -u -D; source ${script}`,
    ]);
    expect([status, stderr.toString()]).toEqual([0, '']);
  });

  test('every script names every command and every option', async () => {
    for (const shell of ['bash', 'zsh', 'fish']) {
      const { stdout } = await leastterm(['completion', shell]);
      for (const command of COMMANDS) {
        expect(stdout).toContain(command.name);
        for (const option of command.options) expect(stdout).toContain(option);
      }
    }
  });

  test('an unknown shell is a complaint with a suggestion', async () => {
    const { status, stderr } = await leastterm(['completion', 'bsh']);
    expect(status).toBe(2);
    expect(stderr).toContain('did you mean "bash"?');
  });
});

describe('topics', () => {
  test.each(TOPICS.map(({ name }) => name))('%s reads in 80 columns of plain ASCII', async (name) => {
    const { status, stdout } = await leastterm(['help', name]);
    expect(status).toBe(0);
    expect(stdout).toMatch(/^[ -~\n]*$/);
    for (const line of stdout.split('\n')) expect(line.length).toBeLessThanOrEqual(80);
  });

  test('the general help lists them, and a slip finds them', async () => {
    const { stdout } = await leastterm(['help']);
    for (const { name } of TOPICS) expect(stdout).toContain(name);
    expect((await leastterm(['help', 'ambigity'])).stderr).toContain('did you mean ambiguity?');
  });
});

test('the manual page is that of the commands as they are; regenerate it with -u', async () => {
  await expect(manPage(COMMANDS, VERSION)).toMatchFileSnapshot('../../docs/leastterm.1');
});

describe('new', () => {
  const line = (file: string): string[] =>
    words(
      `new ${file} --title 'A "title"' --coupling alpha_s/pi --flavours 3 --scheme MSbar --hard-scale 1.777GeV --dimension 4`,
    );

  test('writes a file that reads back as what was said', async () => {
    const file = join(folder, 'made.yaml');
    const { status } = await leastterm([
      ...line(file),
      '--coefficients',
      '1, 365/24 - 11*zeta(3), 6.371(4), 283 +- 142',
    ]);
    expect(status).toBe(0);
    const series = await loadSeries(file);
    expect(series.title).toBe('A "title"');
    expect(series.coefficients).toHaveLength(4);
    expect(series.coefficients[3]!.error!.plus.toNumber()).toBe(142);
    expect(series.flavours).toBe(3);
    expect(series.singularities[0]!.dimension!.toString()).toBe('4');
    expect((await leastterm(['assess', file, '--at', '0.3', '-q'])).status).toBe(0);
    const again = await leastterm([...line(file), '--coefficients', '1, 2']);
    expect(again.status).toBe(2);
    expect(again.stderr).toContain('is there already');
    expect(readFileSync(file, 'utf8')).toContain('6.371(4)');
  });

  test('asks in a terminal, and takes empty answers', async () => {
    const { status, stdout, stderr } = await leastterm(['new', '-'], {
      stdinIsTerminal: true,
      stdin: 'Asked\n\nx\n1, -1, 2, -6\n0\n\n\n\n\n',
    });
    expect(status).toBe(0);
    expect(stderr).toContain('Coefficients');
    expect(stdout).toContain('title: "Asked"');
    expect(stdout).toContain('variable: "x"');
    expect(stdout).toContain('# quantity');
  });

  test('a coefficient that cannot be read is complained about, and nothing is written', async () => {
    const file = join(folder, 'bad.yaml');
    const { status, stderr } = await leastterm(['new', file, '--coefficients', '1, 1,64x']);
    expect(status).toBe(2);
    expect(stderr).toContain('unknown name "x"');
    expect(existsSync(file)).toBe(false);
    expect((await leastterm(['new', file])).status).toBe(2);
  });

  test('commas inside brackets belong to the expression', () => {
    expect(splitCoefficients('1, log(2), f(1, 2), 3')).toEqual(['1', 'log(2)', 'f(1, 2)', '3']);
  });
});
