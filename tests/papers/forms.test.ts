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
  growth: 'growth adler',
  'growth, cut': 'growth adler --at 0.32 --cut 0.5',
  plane: 'plane adler',
  bubbles: 'bubbles pole-mass --at 0.22 --order 5',
  'bubbles, list': 'bubbles',
  'bubbles, view': 'bubbles adler --at 0.32 --view scales',
  'bubbles, cut': 'bubbles adler --at 0.32 --cut 0.6',
  rewrite: 'rewrite adler-estimate --scale 2',
  combine: "combine 'd * c - 1' --with d=adler --with c=bjorken",
  'catalogue show': 'catalogue show adler-estimate',
  'catalogue list': 'catalogue list --quantity mass',
  'catalogue check': 'catalogue check adler',
  evolve: "evolve --alpha-s '0.1180(9)' --from MZ --to 1.77693GeV --to-flavours 3",
};

const run = async (line: string): Promise<string> => {
  const { status, stdout, stderr } = await leastterm(words(line));
  expect([status, stderr]).toEqual([0, '']);
  return stdout;
};
/** What a command writes as JSON, named after it where it does not say so itself. */
const resultOf = async (line: string): Promise<CommandResult> => {
  const written = JSON.parse(await run(`${line} --json`)) as object;
  const request = { command: words(line)[0] ?? '' };
  return Array.isArray(written)
    ? Object.assign({ request }, { entries: written as unknown[] })
    : { request, ...written };
};

test('the commands that offer forms are those whose results have tables', () => {
  expect([...TABLED_COMMANDS].sort()).toEqual([...TABLED].sort());
});

test.each(Object.keys(LINES))('%s in every form', async (command) => {
  const line = LINES[command]!;
  const result = await resultOf(line);
  // The way from the command line is the same for all forms: a different one for each command.
  const chosen = PAPER_FORMS[Object.keys(LINES).indexOf(command) % 3]!;
  expect(await run(`${line} --${chosen}`)).toBe(paperText(result, chosen));
  for (const form of PAPER_FORMS) {
    const text = paperText(result, form);
    expect(text).not.toMatch(/undefined|NaN|\[object/);
    expect(text).not.toBe('');
  }
});

test.each(Object.keys(LINES))('LaTeX of %s: braces balance, every row has the columns of its table', async (name) => {
  const text = paperText(await resultOf(LINES[name]!), 'latex');
  for (const [, align, body] of text.matchAll(/\\begin\{tabular\}\{(\w+)\}([\s\S]*?)\\end\{tabular\}/g)) {
    const rows = body!.split('\n').filter((row) => row.endsWith('\\\\'));
    for (const row of rows) expect(row.split(/(?<!\\)&/).length).toBe(align!.length);
    // A bracket there would be the argument of the line break above: LaTeX does not come back from it.
    for (const row of rows) expect(row.trim()).not.toMatch(/^[[*]/);
  }
  let depth = 0;
  for (const c of text.replace(/^ *%.*$/gm, '').replace(/\\[{}]/g, '')) {
    if (c === '{') depth++;
    if (c === '}') depth--;
    expect(depth).toBeGreaterThanOrEqual(0);
  }
  expect(depth).toBe(0);
});

test('nothing that means something to LaTeX is left bare', () => {
  expect(texText('large-β_0 limit of α_s')).toBe('large-$\\beta_0$ limit of $\\alpha_s$');
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
  // Below the last digit that was worked out: rounding, and no reason to make up digits between.
  expect(one('0.29517124682594', '2.8e-30')).toBe('\\num{0.29517125}');
  expect(one('1', '0.1')).toBe('\\num{1.00(10)}');
  // Two-sided errors end where the value does.
  const sided = (value: string, plus: string, minus: string): string =>
    texNumber({ value, errors: [{ label: 'total', plus, minus }] });
  expect(sided('0.32028898', '0.028', '0.0093')).toBe('$0.320\\,^{+0.028}_{-0.009}$');
  expect(sided('3.2028898e-9', '2.8e-10', '9.3e-11')).toBe('$(3.20\\,^{+0.28}_{-0.09})\\times 10^{-9}$');
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
