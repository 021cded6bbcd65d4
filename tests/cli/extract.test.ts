/** leastterm extract: command lines, problem files, exit codes, complaints. */
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { leastterm, words } from './harness.js';

const run = (line: string): ReturnType<typeof leastterm> => leastterm(words(line));

let folder = '';
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'leastterm-extract-'));
});
afterAll(() => {
  rmSync(folder, { recursive: true });
});
const write = (name: string, text: string): string => {
  const path = join(folder, name);
  writeFileSync(path, text);
  return path;
};

const LINE = 'first power: 1\ncoefficients: [1, 1]\n';
const COUPLED =
  'coupling: { name: alpha_s, divisor: pi }\nscheme: MSbar\nflavours: 3\nscale ratio: 1\nfirst power: 1\ncoefficients: [1, 2, 3]\n';

describe('leastterm extract', () => {
  test('prints solutions, budget, totals by name and the way to M_Z', async () => {
    const { status, stdout, stderr } = await run(
      "extract tau-delta0 --measured '0.2037(50)' --for alpha_s --only fixed-order,borel-pade",
    );
    expect([status, stderr]).toEqual([0, '']);
    expect(stdout).toContain('α_s(1.77693 GeV), n_f = 3 from: Hadronic tau width');
    expect(stdout).toMatch(/fixed-order \* +0\.3257454/);
    for (const name of ['quadrature', 'linear', 'mixed']) expect(stdout).toContain(`total, ${name}`);
    expect(stdout).toMatch(/c threshold at 1\.2729 GeV, n_f 3 → 4/);
    expect(stdout).toContain('estimates the same missing orders as');
    expect(stdout.split('\n').every((line) => line.length <= 100)).toBe(true);
  });

  test('--quiet is a line a prescription; --json repeats the request and gives numbers as text', async () => {
    const golden = write('golden.yaml', LINE);
    expect((await run(`extract ${golden} --measured '1.0(1)' --for alpha_s --only fixed-order -q`)).stdout).toMatch(
      /^fixed-order\t0\.618033988749895\t0\.\d+\t0\.\d+\n$/,
    );
    const { stdout } = await run(`extract ${golden} --measured '1.0(1)' --for alpha_s --only fixed-order --json`);
    const result = JSON.parse(stdout) as Record<string, unknown>;
    expect(Object.keys(result)).toEqual([
      'leastterm',
      'request',
      'kind',
      'unknown',
      'datum',
      'searched',
      'rows',
      'summary',
      'cautions',
    ]);
    expect(result['request']).toMatchObject({
      command: 'extract',
      measured: '1.0(1)',
      for: 'alpha_s',
      only: 'fixed-order',
    });
    expect(stdout).not.toMatch(/: -?\d+\.\d/);
  });

  test('the measurement of the file serves when none is given', async () => {
    const file = write('measured.yaml', `${LINE}measurement: { value: 1, error: 0.1 }\n`);
    expect((await run(`extract ${file} --for alpha_s --only fixed-order -q`)).stdout).toContain('0.618033988749895');
  });

  test('MeV and GeV are the same measurement', async () => {
    const line = (measured: string): string =>
      `extract --measured '${measured}' --from ps@2GeV --for mass --only fixed-order -q`;
    const [a, b] = await Promise.all(['4.484(60) GeV', '4484(60) MeV'].map((m) => run(line(m))));
    expect(a?.stdout).toBe(b?.stdout);
    // The conversion of leastterm mass, which proves its digits: 4.16656156840774.
    expect(a?.stdout).toMatch(/^fixed-order\t4\.16656156841\t/);
  });

  test('a series in units of its hard scale takes a measurement in GeV', async () => {
    const file = write('in-q.yaml', `${COUPLED}hard scale: 2 GeV\nunit: Q\nadditive: 1\n`);
    const energy = await run(`extract ${file} --measured '2.4(1) GeV' --for alpha_s --only fixed-order --to none -q`);
    const ratio = await run(`extract ${file} --measured '1.20(5)' --for alpha_s --only fixed-order --to none -q`);
    expect([energy.status, energy.stderr]).toEqual([0, '']);
    expect(energy.stdout).toBe(ratio.stdout);
    const squared = await run(`extract ${file} --measured '2.4(1) GeV^2' --for alpha_s --to none`);
    expect(squared.stderr).toContain('is in GeV^2, but R is a pure number');
  });

  test('exit code 1 when every prescription fails to reach the measurement, with the range that it reaches', async () => {
    const hill = write('hill.yaml', 'first power: 1\ncoefficients: [1, -1]\n');
    const { status, stdout } = await run(`extract ${hill} --measured 0.3 --for alpha_s --only fixed-order`);
    expect(status).toBe(1);
    expect(stdout.replaceAll(/\s+/g, ' ')).toContain('the measurement 0.3 lies outside what fixed-order reaches');
  });

  test('a problem file is the same as its command line', async () => {
    const [one, two] = [write('one.yaml', LINE), write('two.yaml', LINE)];
    const file = write(
      'problem.yaml',
      `for: alpha_s\nto: none\nonly: [fixed-order]\nmeasurements:\n  - { series: ${one}, measured: 1.0(1) }\n  - { series: ${two}, measured: 1.1(1) }\ncorrelation: [[1, 0.3], [0.3, 1]]\n`,
    );
    const written = await run(`extract --problem ${file} -q`);
    const typed = await run(
      `extract ${one} ${two} --measured '1.0(1)' --measured '1.1(1)' --correlation 0.3 --for alpha_s --to none --only fixed-order -q`,
    );
    expect(written).toEqual(typed);
    expect(written.status).toBe(0);
    const matrix = write('rho.csv', '# measurements\n1, 0.3\n0.3, 1\n');
    const read = await run(
      `extract ${one} ${two} --measured '1.0(1)' --measured '1.1(1)' --correlation ${matrix} --for alpha_s --to none --only fixed-order -q`,
    );
    expect(read.stdout).toBe(typed.stdout);
    const page = (await run(`extract --problem ${file}`)).stdout;
    for (const word of ['Pulls', 'χ² along each parameter', 'Correlations', '1 degree of freedom'])
      expect(page).toContain(word);
  });

  test.each([
    ["adler --measured '0.2(1)'", '--for is missing'],
    [
      "adler --measured '0.2(1)' --for beauty",
      '--for: no "beauty"; wanted one of alpha_s, mass, pole-mass, condensate',
    ],
    ["adler --measured '0.2(1)' --for alpha_s,condensate", 'cannot be fitted together'],
    ["--measured '0.2(1)' --for alpha_s", 'there is no series; name one, such as adler'],
    ['adler --for alpha_s', 'nothing is measured'],
    ["adler --measured '0.2(-1)' --for alpha_s", '--measured: "0.2(-1)" has the error "-1"'],
    ["adler --measured '0.2 +- -0.1' --for alpha_s", 'has a negative error'],
    ["adler --measured '1.1(1) GeV' --for alpha_s", 'is in GeV, but R is a pure number'],
    ["adler --measured '1.1(1)' --measured '1.2(1)' --for alpha_s", '--measured: 2 values for 1 series'],
    ["COUPLED --measured '0.1(1)' --for alpha_s", 'has no hard scale'],
    [
      "COUPLED --measured '0.1(1)' --for alpha_s --scale-of-measurement 2",
      '--scale-of-measurement: "2" has no unit; write --scale-of-measurement 2GeV',
    ],
    ["adler --measured '1.1(1)' --for alpha_s --at 0.3", 'here α_s is what is wanted'],
    [
      "adler --measured '1.1(1)' --for alpha_s --truncation-by guess",
      '--truncation-by: no "guess"; wanted one of own, last-term',
    ],
    ["adler --measured '1.1(1)' --for alpha_s --ambiguity-by i", '--ambiguity-by: no "i"; wanted one of im/pi, im'],
    [
      "adler --measured '1.1(1)' --for alpha_s --central pade --only fixed-order",
      'pade is not among the prescriptions that are run',
    ],
    ["adler --measured '1.1(1)' --for alpha_s --search 0.5:0.1", 'wanted FROM:TO with 0 < FROM < TO'],
    [
      "adler --measured '1.1(1)' --for alpha_s --to 2GeV",
      'both 3 and 4 flavours are in use; write --to-flavours 3 or 4',
    ],
    ["adler --measured '1.1(1)' --for alpha_s --condensate '<(alpha_s/pi) G G>'", '3 values|2 values'],
    ["adler --measured '1.1(1)' --for alpha_s --condensate '<(alpha_s/pi) G G>=0.01'", 'has no unit; write'],
    [
      "adler --measured '1.1(1)' --for alpha_s --condensate '<(alpha_s/pi) G G>=0.01 GeV^4'",
      'it is not said to which; remedy: say it: --condensate-by',
    ],
    [
      "adler --measured '1.1(1)' --for alpha_s --condensate 'quarks=0.01 GeV^3' --condensate-by pv",
      'adler has no condensate "quarks"',
    ],
    [
      "adler --measured '1.1(1)' --for alpha_s --condensate '<(alpha_s/pi) G G>=0.01 GeV^2' --condensate-by pv",
      'GeV^2, but <(alpha_s/pi) G G> has dimension 4',
    ],
    ["adler --measured '1.1(1)' --for alpha_s --condensate-by best", '--condensate-by: "best" is no sum'],
    [
      "charm-moment-1 --measured '0.2(1) GeV^-2' --for mass --mass-power half",
      '--mass-power: "half" is no whole number',
    ],
    [
      "charm-moment-1 --measured '0.2(1)' --for mass --mass-power -2",
      'is a pure number, but norm · m^-2 · R is in GeV^-2',
    ],
    ['pole-msbar-nl5 --for pole-mass', '--mass is missing'],
    ['pole-msbar-nl5 --for pole-mass --mass 163', '"163" has no unit; write --mass 163GeV'],
    [
      "--measured '4.5(1) GeV' --from msr@2GeV --for mass",
      'is no plain series in the coupling at m(m); remedy: convert it: leastterm mass',
    ],
    ['--measured 4.5 --from ps@2GeV --for mass', '--measured: "4.5" is no mass; write 4.5GeV'],
    ["adler adler --measured '1.1(1)' --measured '1.1(1)' --for condensate", '--for condensate takes one series'],
    [
      "adler adler --measured '1.1(1)' --measured '1.1(1)' --for alpha_s --correlation 1",
      '--correlation: "1" is no correlation',
    ],
    ["adler --measured '1.1(1)' --for alpha_s --correlation 0.5", 'one measurement has none to be correlated with'],
    ["adler adler --measured '1.1(1)' --measured '1.1' --for alpha_s", 'has no error: it would have infinite weight'],
    [
      "adler adler adler --measured '1.1(1)' --measured '1.1(1)' --measured '1.1(1)' --for alpha_s --correlation -0.6",
      'not positive definite',
    ],
    [
      "adler adler --measured '1.1(1)' --measured '1.1(1)' --for alpha_s --correlation NEGATIVE",
      'row 1, column 1, on the diagonal, a negative variance; wanted 1 there',
    ],
    [
      "adler adler --measured '1.1(1)' --measured '1.1(1)' --for alpha_s --correlation SKEW",
      'across the diagonal; wanted a symmetric matrix',
    ],
    ['--problem MISTYPED', 'unknown field (did you mean "central"?)'],
    ['--problem EMPTY', 'measurements: none; wanted a list'],
    ['adler --problem EMPTY', '--problem holds the measurements'],
  ])('extract %s', async (line, message) => {
    const files = {
      COUPLED: () => write('coupled.yaml', COUPLED),
      NEGATIVE: () => write('negative.csv', '-0.5 0\n0 1\n'),
      SKEW: () => write('skew.csv', '1 0.2\n0.3 1\n'),
      MISTYPED: () => write('mistyped.yaml', 'centrall: pade\nmeasurements: [{ series: adler, measured: 1.1(1) }]\n'),
      EMPTY: () => write('empty.yaml', 'for: alpha_s\n'),
    };
    const full = Object.entries(files).reduce((text, [name, make]) => text.replace(name, () => make()), line);
    const { status, stdout, stderr } = await run(`extract ${full}`);
    expect([status, stdout]).toEqual([2, '']);
    const flat = stderr.replaceAll('leastterm: ', '');
    expect(
      message.split('|').some((part) => flat.includes(part)),
      stderr,
    ).toBe(true);
  });
});
