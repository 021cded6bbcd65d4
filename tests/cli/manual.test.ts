/** The manual and the program agree: its examples run, and nothing is missing from it. */
import { existsSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { COMMANDS } from '../../src/cli/commands.js';
import { PRESCRIPTIONS } from '../../src/prescriptions/index.js';
import { VERSION as CLI_VERSION } from '../../src/cli/version.js';
import { prescriptionTitle } from '../../src/report/words.js';
import { VERSION } from '../../src/studies/index.js';
import { leastterm, words } from './harness.js';

const root = (name: string): URL => new URL(`../../${name}`, import.meta.url);
const read = (name: string): string => readFileSync(root(name), 'utf8');
const page = (command: string): string => {
  const name = `docs/commands/${command}.md`;
  return existsSync(root(name)) ? read(name) : '';
};

/** The `$` lines of a page that can run anywhere: no redirection; results go nowhere but to the test. */
const examplesIn = (text: string): string[] =>
  [...text.matchAll(/^\$ leastterm (.*)$/gm)]
    .map((match) => match[1] ?? '')
    .filter((line) => !line.includes('<'))
    .map((line) => line.replace(/ -o \S+/, ''));

describe.each(COMMANDS.map((command) => command.name))('the page of %s', (name) => {
  test('exists', () => {
    expect(existsSync(root(`docs/commands/${name}.md`))).toBe(true);
  });

  const examples = examplesIn(page(name));
  test.each(examples.length > 0 ? examples : [`help ${name}`])('leastterm %s', async (line) => {
    const { status, stdout, stderr } = await leastterm(words(line));
    expect([status, stderr]).toEqual([0, '']);
    expect(stdout).not.toBe('');
  });
});

test('the page of sum and the help name every prescription, and each has a title', async () => {
  const { stdout } = await leastterm(words('help sum'));
  for (const { name } of PRESCRIPTIONS) {
    expect(page('sum')).toContain(`| \`${name}\` |`);
    expect(stdout.replaceAll(/\s+/g, ' ')).toContain(name);
    expect(prescriptionTitle(name)).toMatch(/^[A-Z]/);
  }
});

test('the README names every command', () => {
  for (const { name } of COMMANDS) expect(read('README.md')).toContain(`(docs/commands/${name}.md)`);
});

test('the examples of the help are command lines that the program takes', () => {
  for (const command of COMMANDS) {
    for (const [line] of command.examples) expect(words(line)[1]).toBe(command.name);
  }
});

test('one version everywhere', () => {
  expect(JSON.parse(read('package.json')).version).toBe(VERSION);
  expect(CLI_VERSION).toBe(VERSION);
});
