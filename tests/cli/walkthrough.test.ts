/** The tutorial and the library examples, run as a reader runs them: with the built program, in an empty folder. */
import { cpSync, existsSync, mkdtempSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { bash, builtProgram, removeProgram } from './built.js';

const root = (name: string): string => fileURLToPath(new URL(`../../${name}`, import.meta.url));
let program = '';
let folder = '';
beforeAll(async () => {
  program = await builtProgram();
  folder = mkdtempSync(join(tmpdir(), 'leastterm-test-'));
}, 60_000);
afterAll(() => {
  if (program !== '') removeProgram(program);
  rmSync(folder, { recursive: true });
});

test('every line of the tutorial works, one after the other', { timeout: 240_000 }, async () => {
  const lines = [...readFileSync(root('docs/tutorial.md'), 'utf8').matchAll(/^\$ leastterm (.*)$/gm)].map((m) => m[1]!);
  expect(lines.length).toBeGreaterThan(12);
  const script = lines.map((line) => `$LEASTTERM ${line} || { echo "FAILED: ${line.replaceAll('"', '')}"; exit 9; }`);
  const { status, stdout } = await bash(program, `cd "${folder}"\n${script.join('\n')}`);
  expect([status, /FAILED.*/.exec(stdout)?.[0]]).toEqual([0, undefined]);
  for (const name of ['terms.pdf', 'scale.png', 'table.tex', 'methods.bib', 'table.yaml', 'report.html'])
    expect(existsSync(join(folder, name))).toBe(true);
  expect(readFileSync(join(folder, 'table.tex'), 'utf8')).toContain('\\toprule');
});

const EXPECTED: Readonly<Record<string, readonly string[]>> = {
  'verdict.mjs': ['singularity-model', '(truncation)'],
  // e E1(1), DLMF 6.2: 0.59634736232319407…
  'own-series.mjs': ['borel-pade', '0.5963473623'],
  'scan.mjs': ['0.25,borel-pade,', '0.3,fixed-order,'],
};

test.each(readdirSync(root('docs/examples')))('the example %s', { timeout: 60_000 }, async (name) => {
  const library = pathToFileURL(join(dirname(program), 'index.mjs')).href;
  const copy = join(folder, name);
  cpSync(join(root('docs/examples'), name), copy);
  writeFileSync(copy, readFileSync(copy, 'utf8').replace("from 'leastterm'", `from '${library}'`));
  const { status, stdout, stderr } = await bash(program, `node "${copy}"`);
  expect([status, stderr]).toEqual([0, '']);
  for (const text of EXPECTED[name]!) expect(stdout).toContain(text);
});
