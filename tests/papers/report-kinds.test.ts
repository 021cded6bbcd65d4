/** Pages and pictures drawn from saved results: every kind has its section, or is refused with a remedy. */
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { leastterm, words } from '../cli/harness.js';

const folder = mkdtempSync(join(tmpdir(), 'leastterm-kinds-'));
afterAll(() => rmSync(folder, { recursive: true }));
const file = (name: string): string => join(folder, `${name}.json`);

const LINES: Readonly<Record<string, string>> = {
  extract:
    'extract tau-delta0-estimate --measured 0.2042(50) --for alpha_s --only fixed-order,borel-pade --replicas 400 --seed 3',
  fit: "extract charm-moment-1 charm-moment-2 --measured '0.2166(31) GeV^-2' --measured '0.01497(27) GeV^-4' --for mass --mass-power=-2,-4 --norm 1/4,1/16 --only fixed-order",
  contour: 'contour tau-contour --at 0.34',
  mass: 'mass 4.186(6)GeV --to rs --cutoff 2GeV',
  compare: 'compare adler --at 0.3156 --only fixed-order,pade,borel-pade',
  backtest: 'backtest adler bjorken --at 0.3 --hide 1 --only fixed-order,pade',
  growth: 'growth adler',
  plane: 'plane adler',
  sum: 'sum adler --by borel-pade --at 0.3156',
  truncation: 'truncation adler --at 0.32',
  evolve: 'evolve --alpha-s 0.1180(9) --from MZ --to 1.77693GeV --to-flavours 3',
  bubbles: 'bubbles adler --at 0.32 --view scales',
  rewrite: 'rewrite adler --scale 2',
  assess: 'assess adler --at 0.3156(30)',
  again: 'assess adler --at 0.30',
};

beforeAll(async () => {
  for (const [name, line] of Object.entries(LINES)) {
    const { status, stdout } = await leastterm([...words(line), '--json']);
    expect(status).toBe(0);
    writeFileSync(file(name), stdout);
  }
}, 240_000);

const page = async (...names: string[]): Promise<string> => {
  const { status, stdout, stderr } = await leastterm(['report', ...names.map(file)]);
  expect([status, stderr]).toEqual([0, '']);
  return stdout;
};

test.each(Object.keys(LINES))('a page of %s: a title, tables, no hole', async (name) => {
  const html = await page(name);
  const seen = html.replace(/<script[\s\S]*<\/script>/, '');
  expect(seen).not.toMatch(/undefined|NaN|\[object/);
  expect(/<h1>(.*)<\/h1>/.exec(html)![1]).not.toBe('Leastterm report');
  expect(seen).toContain('<table>');
  const ids = [...seen.matchAll(/ id="([^"]+)"/g)].map((match) => match[1]);
  expect(new Set(ids).size).toBe(ids.length);
});

test('an extraction: what is quoted, budget and histogram as pictures, every value and every percentile', async () => {
  const html = await page('extract');
  const result = JSON.parse(readFileSync(file('extract'), 'utf8')) as {
    summary: { printed: string };
    replicas: { rows: { values: { distribution: { median: { value: string } } }[] }[] };
  };
  expect(html).toContain(`<p class="verdict">${result.summary.printed}</p>`);
  expect([...html.matchAll(/<svg /g)].length).toBe(2);
  expect(html).toContain('Error budget of');
  expect(html).toContain('<td>Borel'.toLowerCase());
  for (const { values } of result.replicas.rows)
    expect(html).toContain(Number(values[0]!.distribution.median.value).toPrecision(2));
});

test('pictures of the pages: ratio plot, plane, values, coverage', async () => {
  for (const name of ['growth', 'plane', 'sum', 'compare', 'backtest'])
    expect([...(await page(name)).matchAll(/<svg /g)].length, name).toBe(1);
});

test('two assessments on one page keep their sections apart', async () => {
  const html = await page('assess', 'again');
  const ids = [...html.matchAll(/ id="([^"]+)"/g)].map((match) => match[1]);
  expect(new Set(ids).size).toBe(ids.length);
});

test('what is no result is refused with what is wanted, by report and plot alike', async () => {
  writeFileSync(file('list'), '[{"id": "adler"}]');
  for (const argv of [['report'], ['plot', 'terms']]) {
    const { status, stderr } = await leastterm([...argv, file('list')]);
    expect(status).toBe(2);
    expect(stderr).toContain('holds no result with the request behind it; wanted a file that');
  }
});

test('a result that lacks what is drawn is wrong input, not a fault of the program', async () => {
  const { growth: _, ...rest } = JSON.parse(readFileSync(file('assess'), 'utf8')) as { growth: unknown };
  writeFileSync(file('torn'), JSON.stringify(rest));
  for (const argv of [['report'], ['plot', 'ratios']]) {
    const { status, stderr } = await leastterm([...argv, file('torn')]);
    expect(status).toBe(2);
    expect(stderr).toContain('not all that this version needs is in it; write it anew with --json');
  }
});

test('budget and replicas are drawn from a saved extraction; without replicas the remedy is named', async () => {
  for (const kind of ['budget', 'replicas']) {
    const { status, stdout } = await leastterm(['plot', kind, file('extract')]);
    expect(status).toBe(0);
    expect(stdout).toContain('<svg');
  }
  expect((await leastterm(['plot', 'budget', file('fit')])).status).toBe(0);
  const { status, stderr } = await leastterm(['plot', 'replicas', file('fit')]);
  expect(status).toBe(2);
  expect(stderr).toContain('nothing to draw; wanted the result of extract with --replicas 10000 --json');
});
