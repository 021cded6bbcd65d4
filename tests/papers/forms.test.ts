/** Tables of real results in every form: they parse, and hold the numbers of the result. */
import { parseAllDocuments } from 'yaml';
import { expect, test } from 'vitest';
import { PAPER_FORMS, TABLED, compareResults, paperText } from '../../src/papers/index.js';
import type { CommandResult } from '../../src/papers/index.js';
import { texNumber } from '../../src/papers/latex.js';
import { texHead, texText } from '../../src/papers/notation.js';
import { TABLED_COMMANDS } from '../../src/cli/papers.js';
import { leastterm, words } from '../cli/harness.js';

const LINES: Readonly<Record<string, string>> = {
  assess: "assess adler --at '0.3156(30)'",
  sum: 'sum adler --at 0.3156 --by borel-pade',
  compare: 'compare adler --grid 0.25,0.30 --only fixed-order,borel-pade,pade',
  truncation: 'truncation adler --at 0.3156',
  backtest: 'backtest adler --at 0.3156 --only fixed-order,borel-pade --hide 2',
  evolve: "evolve --alpha-s '0.1180(9)' --from MZ --to 1.77693GeV --to-flavours 3",
};

const run = async (line: string): Promise<string> => {
  const { status, stdout, stderr } = await leastterm(words(line));
  expect([status, stderr]).toEqual([0, '']);
  return stdout;
};
const resultOf = async (line: string): Promise<CommandResult> =>
  JSON.parse(await run(`${line} --json`)) as CommandResult;

test('the commands that offer forms are those whose results have tables', () => {
  expect([...TABLED_COMMANDS].sort()).toEqual([...TABLED].sort());
});

test.each(Object.keys(LINES))('%s in every form', async (command) => {
  const line = LINES[command]!;
  const result = await resultOf(line);
  for (const form of PAPER_FORMS) {
    const text = paperText(result, form);
    expect(text).not.toMatch(/undefined|NaN|\[object/);
    if (form !== 'csv' || !['compare', 'backtest'].includes(command)) expect(await run(`${line} --${form}`)).toBe(text);
  }
});

test('LaTeX: braces balance, every row has the columns of its table, nothing special is left bare', async () => {
  const text = paperText(await resultOf(LINES['assess']!), 'latex');
  for (const [, align, body] of text.matchAll(/\\begin\{tabular\}\{(\w+)\}([\s\S]*?)\\end\{tabular\}/g)) {
    const rows = body!.split('\n').filter((row) => row.endsWith('\\\\'));
    for (const row of rows) expect(row.split(/(?<!\\)&/).length).toBe(align!.length);
  }
  let depth = 0;
  for (const c of text.replace(/^ *%.*$/gm, '').replace(/\\[{}]/g, '')) {
    if (c === '{') depth++;
    if (c === '}') depth--;
    expect(depth).toBeGreaterThanOrEqual(0);
  }
  expect(depth).toBe(0);
  expect(texText('a_b & 50 % of {x} # ~ ^ \\')).toBe(
    'a\\_b \\& 50 \\% of \\{x\\} \\# \\textasciitilde{} \\textasciicircum{} \\textbackslash{}',
  );
  expect(texHead('*c_{n}* of alpha_s')).toBe('$c_{n}$ of $\\alpha_s$');
});

test('uncertainties as the Particle Data Group rounds them: its own examples', () => {
  // Review of Particle Physics, Introduction, section 5.3: 0.827 +- 0.119 is 0.83 +- 0.12, 0.827 +- 0.367 is 0.8 +- 0.4.
  const one = (value: string, size: string): string =>
    texNumber({ value, errors: [{ label: 'stat', plus: size, minus: size }] });
  expect(one('0.827', '0.119')).toBe('\\num{0.83(12)}');
  expect(one('0.827', '0.367')).toBe('\\num{0.8(4)}');
  expect(one('0.118', '0.0009')).toBe('\\num{0.1180(9)}');
});

test('the submission YAML: documents with variables of equal length, symmetric and asymmetric errors, no zero error', async () => {
  const text = paperText(await resultOf(LINES['truncation']!), 'hepdata');
  const documents = parseAllDocuments(text).map((document) => document.toJS() as Record<string, unknown>);
  expect(documents.length).toBeGreaterThan(0);
  for (const document of documents) {
    expect(String(document['name']).length).toBeLessThanOrEqual(64);
    const all = [document['independent_variables'], document['dependent_variables']].flat() as {
      header: { name: string };
      values: { value: unknown; errors?: { symerror?: number; asymerror?: { plus: number; minus: number } }[] }[];
    }[];
    const [first] = all;
    for (const variable of all) {
      expect(variable.values.length).toBe(first!.values.length);
      for (const { errors } of variable.values)
        for (const error of errors ?? []) {
          if (error.symerror !== undefined) expect(error.symerror).toBeGreaterThan(0);
          else {
            expect(error.asymerror!.minus).toBeLessThanOrEqual(0);
            expect(error.asymerror!.plus).toBeGreaterThanOrEqual(0);
          }
        }
    }
  }
});

test('BibTeX: methods that took part, with their identifiers, and none that refused', async () => {
  const text = paperText(await resultOf(LINES['assess']!), 'bibtex');
  expect(text).toMatch(/@article\{Beneke:2008,[\s\S]*?eprint = \{0806\.3156\}/);
  expect(text).toMatch(/note = \{P\. A\. Baikov[\s\S]*?eprint = \{0801\.1821\}/);
  const keys = [...text.matchAll(/^@\w+\{([^,]+),/gm)].map((match) => match[1]);
  expect(new Set(keys).size).toBe(keys.length);
  const refusing = paperText(await resultOf('sum adler --at 0.3156 --by fixed-order'), 'bibtex');
  expect(refusing).not.toContain('Mera:2015');
});

test('CSV keeps every digit and gives every error a column', async () => {
  const result = (await resultOf(LINES['evolve']!)) as CommandResult & { value: string };
  const [head, row] = paperText(result, 'csv').split('\n');
  expect(head).toContain('value +α_s,value -α_s');
  expect(row!.split(',')).toContain(result.value);
});

test('two forms at once are refused', async () => {
  const { status, stderr } = await leastterm(words('assess adler --at 0.3 --latex --json'));
  expect(status).toBe(2);
  expect(stderr).toContain('--latex and --json exclude each other');
});

test('replay: the same result does not move; a changed number is found, a changed last digit is not', async () => {
  const result = await resultOf(LINES['assess']!);
  expect(compareResults(result, result)).toEqual({ differences: [], sameDigits: 0, reasons: [] });
  const changed = structuredClone(result) as CommandResult & { verdict: { value: string }; leastterm: string };
  changed.verdict.value = '1.2';
  changed.leastterm = '0.0.1';
  const { differences, reasons } = compareResults(changed, result);
  expect(differences.map(({ path }) => path)).toEqual(['verdict.value']);
  expect(reasons.join()).toContain('another version');
  expect(compareResults({ a: '1.23456' }, { a: '1.23457' })).toMatchObject({ differences: [], sameDigits: 1 });
});
