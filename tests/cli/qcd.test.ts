/** evolve, rewrite, combine, the catalogue's filters and check, --alpha-s-mz: command lines, exit codes, complaints. */
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { leastterm, words } from './harness.js';

const run = (line: string): ReturnType<typeof leastterm> => leastterm(words(line));

let folder = '';
const file = (name: string): string => join(folder, name);
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'leastterm-qcd-'));
});
afterAll(() => {
  rmSync(folder, { recursive: true });
});

const BASIC =
  'coupling: { name: alpha_s, divisor: pi }\nscheme: MSbar\nflavours: 3\nscale ratio: 1\nhard scale: 2 GeV\nfirst power: 1\ncoefficients: [1, 2, 3]\n';
function write(name: string, text: string): string {
  writeFileSync(file(name), text);
  return file(name);
}

describe('leastterm evolve', () => {
  const TAU = "--alpha-s '0.1180(9)' --from MZ --to 1.77693GeV --to-flavours 3";

  test('prints value, errors, path and Λ', async () => {
    const { status, stdout, stderr } = await run(`evolve ${TAU}`);
    expect([status, stderr]).toEqual([0, '']);
    // mpmath 1.3.0, direct integration: 0.313894712825.
    expect(stdout).toContain('0.31389471282504');
    expect(stdout).toMatch(/error from α_s +\+0\.0072 -0\.0069/);
    expect(stdout).toMatch(/one loop less +0\.31379870 with 4: -0\.0000960/);
    expect(stdout).toContain('matching spread');
    expect(stdout).toMatch(/Λ, n_f = 3 +0\.33312\d* GeV/);
    expect(stdout.split('\n').every((line) => line.length <= 100)).toBe(true);
  });

  test('--quiet is the bare value; digits are certified, or it says why there are no more', async () => {
    expect((await run(`evolve ${TAU} -q --loops 4 --digits 40`)).stdout).toBe(
      '0.3137986952167879546190614401388601107027\n',
    );
    const { stdout } = await run(`evolve ${TAU} --digits 40`);
    expect(stdout).toContain('no more digits are certain');
  });

  test('--json repeats the request and gives every number as text', async () => {
    const result = JSON.parse((await run(`evolve ${TAU} --json`)).stdout) as Record<string, unknown>;
    expect(Object.keys(result).slice(0, 4)).toEqual(['leastterm', 'request', 'quantity', 'loops']);
    expect(result['request']).toEqual({
      command: 'evolve',
      'alpha-s': '0.1180(9)',
      from: 'MZ',
      to: '1.77693GeV',
      'to-flavours': 3,
      digits: 15,
    });
    expect(result['digits']).toBe('certified');
  });

  // K. Chetyrkin et al. arXiv:0907.2110: m_b(10 GeV) = 3.610 to m_b(m_b) = 4.163 at α_s(M_Z) = 0.1189 (abstract read).
  test('a mass to its own scale', async () => {
    const { stdout } = await run(
      "evolve --mass '3.610(16)GeV' --from 10GeV --from-flavours 5 --to own --alpha-s-mz 0.1189 --loops 4 -q",
    );
    expect(Number(stdout)).toBeCloseTo(4.163, 3);
  });

  test('MeV and GeV are the same scale', async () => {
    const [a, b] = await Promise.all(
      ['2000MeV', '2GeV'].map((to) => run(`evolve --alpha-s 0.118 --from MZ --to ${to} --to-flavours 4 -q`)),
    );
    expect(a?.stdout).toBe(b?.stdout);
  });

  test.each([
    ['--alpha-s 0.118 --from 91.1876 --to 2GeV', '--from: "91.1876" has no unit; write --from 91.1876GeV'],
    ['--mass 4.18 --from 4GeV --to MZ --from-flavours 5', '--mass: "4.18" has no unit; write --mass 4.18GeV'],
    ['--alpha-s 0.118 --from here --to 2GeV', '--from: "here" is no scale; wanted a positive number with its unit'],
    ['--alpha-s 0.118 --from MZ --to -3GeV', 'no such option|is no scale'],
    [
      '--alpha-s 0.118 --from MZ --to 2GeV',
      'both 3 and 4 flavours are in use (the c quark has 1.2729 GeV); write --to-flavours 3 or --to-flavours 4',
    ],
    ['--alpha-s 0.118 --from MZ --to 3GeV --to-flavours 17', '--to-flavours: "17" is not a whole number from 0 to 16'],
    ['--alpha-s 0.118 --from MZ --to 3GeV --to-flavours 3.5', '--to-flavours: "3.5" is not a whole number'],
    ['--alpha-s 0.118 --from MZ --to 3GeV --to-flavours 2', 'no threshold is known between 2 and 3 flavours'],
    ['--alpha-s 0.118 --from MZ --to 0.1GeV --to-flavours 3', 'the scale lies at or below the Landau pole'],
    ['--alpha-s 0.118 --from MZ --to own', 'only a mass has a scale of its own'],
    ['--alpha-s 0.118 --mass 4GeV --from MZ --to 3GeV', '--alpha-s and --mass exclude each other'],
    ['--alpha-s 0.118 --alpha-s-mz 0.118 --from MZ --to 3GeV', 'with --alpha-s there is one already'],
    ['--from MZ --to 3GeV', 'what is evolved is missing'],
    ['--alpha-s 0.118 --to 3GeV', '--from is missing; write --from 91.1879GeV'],
    ['--alpha-s 0.118 --from MZ', '--to is missing'],
    ['--alpha-s 12% --from MZ --to 3GeV', '--alpha-s: "12%" is a percentage'],
    ['--alpha-s 0.118 --from MZ --to 3GeV --loops 6', '--loops: "6" is not a whole number from 1 to 5'],
    ['--alpha-s 0.118 --from MZ --to 3GeV --threshold b=4.18', '--threshold: "4.18" has no unit'],
    ['--alpha-s 0.118 --from MZ --to 3GeV --threshold u=4.18GeV', 'is no threshold; wanted c, b or t with its mass'],
  ])('evolve %s', async (line, message) => {
    const { status, stdout, stderr } = await run(`evolve ${line}`);
    expect([status, stdout]).toEqual([2, '']);
    const flat = stderr.replaceAll('leastterm: ', '');
    expect(
      message.split('|').some((part) => flat.includes(part)),
      stderr,
    ).toBe(true);
  });
});

describe('leastterm rewrite', () => {
  test('writes a series file that the other commands read, and the way back is the first series', async () => {
    const there = file('there.yaml');
    expect(await run(`rewrite ${write('basic.yaml', BASIC)} --scale 3/2 -o ${there}`)).toMatchObject({
      status: 0,
      stdout: '',
    });
    expect(readFileSync(there, 'utf8')).toContain('  - 2 - 9/2*log(2) + 9/2*log(3)\n');
    const { stdout } = await run(`rewrite ${there} --scale 1`);
    expect(stdout).toContain('coefficients:\n  - 1\n  - 2\n  - 3\n');
    expect(stdout).toContain('Rewritten by leastterm');
    expect((await run(`assess ${there} --at 0.2 -q`)).status).toBe(0);
  });

  test('a scale with its unit is a ratio to the hard scale; --flavours is where the coupling goes', async () => {
    const basic = write('basic.yaml', BASIC);
    expect((await run(`rewrite ${basic} --scale 3GeV`)).stdout).toContain('scale ratio: 3/2\n');
    const { stdout } = await run(`rewrite ${basic} --flavours 4`);
    expect(stdout).toContain('\nflavours: 4\n');
    expect(stdout).toContain('four-loop decoupling of c with mass 1.2729 GeV');
  });

  test('--json is the series as plain data', async () => {
    const result = JSON.parse((await run('rewrite adler --coupling C:-1 --json')).stdout) as {
      scheme: string;
      coefficients: unknown[];
    };
    expect([result.scheme, result.coefficients.length]).toEqual(['C-scheme, C = -1', 4]);
  });

  test.each([
    ['adler', 'nothing to rewrite; wanted at least one of --scale, --coupling, --flavours, --mass'],
    ['adler --scale 0', '--scale: "0" is not positive'],
    ['adler --scale big', '--scale: "big" is no scale'],
    ['adler --coupling MOM', '--coupling: no coupling "MOM"'],
    ['adler --coupling C', '"C" needs the parameter of the C-scheme; write --coupling C:0'],
    ['adler --coupling C:x', '"C:x" needs the parameter'],
    ['adler --flavours 17', '--flavours: "17" is not a whole number from 0 to 16'],
    ['adler --flavours 2', 'no quark is known between 2 and 3 flavours; remedy: only c (4 flavours'],
    ['adler --mass msbar', '--mass-power is missing'],
    ['adler --mass msbar --mass-power 5', 'does not say which mass it is in; remedy: say it: --from-mass pole'],
    ['adler --mass heavy --mass-power 5', '--mass: no mass "heavy"'],
    ['adler --mass-power 5', '--mass-power says nothing without --mass'],
    ['plaquette --scale 2', 'the scheme "lattice, Wilson action" of plaquette is not known'],
    ['b-to-c-pole --mass msbar --mass-power 5', 'does not say which mass it is in'],
  ])('rewrite %s', async (line, message) => {
    const { status, stdout, stderr } = await run(`rewrite ${line}`);
    expect([status, stdout]).toEqual([2, '']);
    expect(stderr).toContain(message);
  });
});

describe('leastterm combine', () => {
  test('the width of the manual', async () => {
    const { status, stdout } = await run(
      "combine 'width * ratio^5' --with width=b-to-u-pole --with ratio=pole-msbar-nl4 --title 'Width'",
    );
    expect(status).toBe(0);
    expect(stdout).toContain('title: Width\n');
    expect(stdout).toContain('  - 65/6 - 2/3*pi^2\n');
    expect(stdout).toContain('error: 27 }');
    expect(stdout).toContain('T. van Ritbergen');
  });

  test('three terms cannot show that a singularity is gone, sixty can', async () => {
    const short = file('width.yaml');
    await run(`combine 'w * r^5' --with w=b-to-u-pole --with r=pole-msbar-nl4 -o ${short}`);
    expect((await run(`growth ${short} -q`)).stdout).toBe('undecided\n');
    const long = file('sum.yaml');
    await run(`combine 'p + q' --with p=marrowgate-pair --with q=marrowgate-partner -o ${long}`);
    const nearest = async (name: string): Promise<number> => {
      const result = JSON.parse((await run(`growth ${name} --json`)).stdout) as { growth: { nearest: { u: string } } };
      return Number(result.growth.nearest.u);
    };
    expect(await nearest('marrowgate-pair')).toBeCloseTo(0.5, 9);
    expect(await nearest(long)).toBeCloseTo(-1, 9);
  });

  test.each([
    ["'a * b'", '--with is missing'],
    ["'a * b' --with a", '--with: "a" names no series; write --with width=b-to-u-pole'],
    ["'a * b' --with a=adler", '"b" is not defined'],
    ["'a' --with a=adlr", 'did you mean "adler"?'],
    [
      "'a*b' --with a=adler --with b=r-ratio",
      'a has nf = 3, b nf = 5: one combination, one coupling; remedy: r-ratio-nf3 if',
    ],
    ["'a*b' --with a=adler --with b=tessel", 'a is in MSbar, b in toy, one-loop running only'],
    [
      "'a*b' --with a=adler --with b=static-self-energy",
      'the scheme "lattice, Wilson action" of static-self-energy is not known',
    ],
    ["'a b' --with a=adler --with b=adler", 'the expression: "a b" is not part of an expression'],
    ["'a+a' --with a=adler --with a=adler", 'two series called a'],
  ])('combine %s', async (line, message) => {
    const { status, stdout, stderr } = await run(`combine ${line}`);
    expect([status, stdout]).toEqual([2, '']);
    expect(stderr).toContain(message);
  });
});

describe('leastterm catalogue', () => {
  const ids = async (filters: string): Promise<string[]> =>
    (await run(`catalogue list -q ${filters}`)).stdout.split('\n').slice(0, -1);

  test('filters by word, dimension, flavours, invented or published', async () => {
    const all = await ids('');
    expect(await ids('--invented')).toEqual(all.filter((id) => /marrowgate|tessel|vellum/.test(id)));
    expect((await ids('--published')).length + (await ids('--invented')).length).toBe(all.length);
    expect(await ids('--dimension 1 --published')).toEqual(expect.arrayContaining(['b-to-u-pole', 'pole-msbar']));
    expect(await ids('--dimension 1')).not.toContain('adler');
    expect(await ids('--dimension=-2')).toContain('adler');
    expect(await ids('--quantity width')).toEqual(expect.arrayContaining(['b-to-c-pole', 'b-to-u-pole', 'top-width']));
    expect(await ids('--quantity mass')).not.toContain('adler');
    expect(await ids('--flavours 5 --quantity adler')).toContain('adler');
    expect(await ids('--flavours 6 --quantity tau')).toEqual([]);
    expect(JSON.parse((await run('catalogue list --json --quantity bjorken')).stdout)).toMatchObject([
      { id: 'bjorken', anyFlavours: true },
    ]);
  });

  test('check finds all files good', async () => {
    const { status, stdout } = await run('catalogue check');
    expect(stdout).toMatch(/4\d series read, 1\d\d recorded values held against them, 0 wrong\./);
    expect(status).toBe(0);
  }, 60_000);

  test('check fails with exit code 1 on a wrong value, a wrong file, a value that nobody would compare', async () => {
    const wrong = write('wrong.yaml', `${BASIC}checks: [{ values: [1, 2.3] }]\n`);
    const { status, stdout, stderr } = await run(`catalogue check ${wrong}`);
    expect([status, stderr]).toEqual([1, '']);
    expect(stdout).toContain('coefficients[1] is 2, recorded 2.3');
    const broken = await run(`catalogue check ${write('broken.yaml', 'coefficients: [1, two]\n')} -q`);
    expect(broken.status).toBe(1);
    expect(broken.stdout).toContain('broken.yaml:1:19');
    const orphan = await run(
      `catalogue check ${write('orphan.yaml', `${BASIC}checks: [{ flavours: 4, values: [1] }]\n`)} -q`,
    );
    expect(orphan.stdout).toContain('values are recorded for nf = 4');
    const good = await run(
      `catalogue check ${write('good.yaml', `${BASIC}checks: [{ flavours: 3, values: [1, 2, 3.0] }]\n`)} -q`,
    );
    expect([good.status, good.stdout]).toEqual([0, '']);
  });

  test.each([
    ['chek', '"chek" is no action of the catalogue (did you mean "check"?)'],
    ['show adler --invented', '--invented chooses from the list'],
    ['list --invented --published', 'exclude each other'],
    ['list --dimension four', '--dimension: "four" is no number'],
  ])('catalogue %s', async (line, message) => {
    const { status, stderr } = await run(`catalogue ${line}`);
    expect(status).toBe(2);
    expect(stderr).toContain(message);
  });
});

describe('--alpha-s-mz', () => {
  test.each(['assess adler', 'sum adler --by fixed-order', 'truncation adler'])('%s', async (line) => {
    const { status, stdout } = await run(`${line} --alpha-s-mz '0.1180(9)'`);
    expect(status).toBe(0);
    expect(stdout).toContain('0.313894712825');
    expect(stdout.replaceAll(/\s+/g, ' ')).toContain('start 91.1879 GeV, n_f = 5: α_s = 0.118000; run to 4.186 GeV');
  });

  test.each([
    ["assess adler --at 0.3 --alpha-s-mz '0.1180(9)'", '--at and --alpha-s-mz exclude each other'],
    ['assess adler --alpha-s-mz 12%', '--alpha-s-mz: "12%" is a percentage'],
    ['assess vellum --alpha-s-mz 0.118', 'toy, one-loop running only'],
    ['assess r-ratio-nf2 --alpha-s-mz 0.118', ''],
    ['assess adler-nf4 --alpha-s-mz 0.118', 'adler-nf4 has no hard scale'],
    ['assess plaquette --alpha-s-mz 0.118', 'the scheme "lattice, Wilson action"'],
  ])('%s', async (line, message) => {
    const { status, stderr } = await run(line);
    expect(status).toBe(2);
    expect(stderr).toContain(message);
  });
});
