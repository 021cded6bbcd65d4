/** Replay: what each command writes with --json holds all that was asked, so that it can be carried out again. */
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, expect, test } from 'vitest';
import { COMMANDS } from '../../src/cli/commands.js';
import { wordsOf } from '../../src/cli/commands/replay.js';
import type { SavedResult } from '../../src/pictures/index.js';
import { leastterm, words } from '../cli/harness.js';

const folder = mkdtempSync(join(tmpdir(), 'leastterm-replay-'));
afterAll(() => rmSync(folder, { recursive: true }));

const problem = join(folder, 'fit.yaml');
writeFileSync(
  problem,
  `for: mass
alpha-s-mz: 0.1189(20)
only: [fixed-order]
measurements:
  - { series: charm-moment-1, measured: 0.2166(31) GeV^-2, mass power: -2, norm: 1/4 }
  - { series: charm-moment-2, measured: 0.01497(27) GeV^-4, mass power: -4, norm: 1/16 }
correlation: 0.8
`,
);

const plain = join(folder, 'plain.txt');
writeFileSync(plain, '1\n-1\n2\n-6\n');

let count = 0;
async function saved(line: string): Promise<string> {
  const path = join(folder, `${count++}.json`);
  const { status, stderr } = await leastterm([...words(line), '--json', '-q', '-o', path]);
  expect([status, stderr]).toEqual([0, '']);
  return path;
}

test.each([
  'assess adler --at 0.3156(30) --order 3 --verdict-rule least-term',
  `sum ${plain} --at=-0.1 --by fixed-order`,
  'compare adler --grid scale=0.5:2:2 --at 0.3 --only fixed-order,pade --except pade --sort score --hide 1',
  'truncation adler --at 0.3 --by-order --prior abc.xi=3',
  'backtest adler bjorken --at 0.3 --hide 1 --only fixed-order --only pade',
  'contour tau-contour --at 0.34 --weight 1,-2,1 --loops 4 --order 3',
  'bubbles adler --at 0.32 --view scales',
  "mass '4.186(6)GeV' --to rs --cutoff 2GeV --loops 4 --alpha-s-mz 0.118",
  "evolve --mass '4.186(6)GeV' --from 4.186GeV --from-flavours 5 --to MZ --threshold b=4.2GeV",
  'extract tau-delta0-estimate --measured 0.2042(50) --for alpha_s --only fixed-order --replicas 200 --seed 7',
  "extract --measured '4.484(60) GeV' --from ps@2GeV --for mass --only fixed-order",
  "extract charm-moment-1 charm-moment-2 --measured '0.2166(31) GeV^-2' --measured '0.01497(27) GeV^-4' --for mass --mass-power=-2,-4 --norm 1/4,1/16 --only fixed-order",
  `extract --problem ${problem}`,
  'rewrite adler --scale 2',
  "combine 'd * c - 1' --with d=adler --with c=bjorken",
])('nothing moves: %s', async (line) => {
  const path = await saved(line);
  expect(await leastterm(['replay', path])).toEqual({ status: 0, stdout: `${path}: nothing moved\n`, stderr: '' });
});

test('the words of a request are those of the command line: operands, lists and dashes', () => {
  const command = COMMANDS.find(({ name }) => name === 'extract')!;
  const request = {
    command: 'extract',
    series: ['a', 'b'],
    measured: ['1(1)', '-2(1)'],
    'by-order': true,
    digits: 15,
  } as SavedResult['request'];
  expect(wordsOf(request, command)).toEqual([
    '--measured=1(1)',
    '--measured=-2(1)',
    '--by-order',
    '--digits=15',
    '--',
    'a',
    'b',
  ]);
});

test('the manner of writing is no part of a request', async () => {
  const path = await saved(
    'extract tau-delta0 --measured 0.20(1) --for alpha_s --only fixed-order --replicas 100 --workers 2',
  );
  const { request } = JSON.parse(readFileSync(path, 'utf8')) as SavedResult;
  expect(request).toEqual({
    command: 'extract',
    series: 'tau-delta0',
    measured: '0.20(1)',
    for: 'alpha_s',
    only: 'fixed-order',
    replicas: 100,
    seed: 1,
    digits: 15,
  });
});

test('a series from standard input is gone: a complaint, not a wait', async () => {
  const path = join(folder, 'stdin.json');
  await leastterm(['sum', '-', '--at', '0.1', '--by', 'fixed-order', '--json', '-q', '-o', path], { stdin: '1\n2\n' });
  const { status, stderr } = await leastterm(['replay', path]);
  expect(status).toBe(2);
  expect(stderr).toContain('its series came from standard input, which is gone; keep the series in a file');
});
