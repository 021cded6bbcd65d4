/** leastterm mass: command lines, exit codes, complaints. */
import { describe, expect, test } from 'vitest';
import { leastterm, words } from './harness.js';

const run = (line: string): ReturnType<typeof leastterm> => leastterm(words(`mass ${line}`));

describe('one definition', () => {
  test('value with its errors, order by order, the renormalon, the source', async () => {
    const { status, stdout, stderr } = await run("'4.186(6)GeV' --to rs --cutoff 2GeV");
    expect([status, stderr]).toEqual([0, '']);
    expect(stdout).toMatch(/m_RS\(2 GeV\) +4\.41460252127775 GeV/);
    expect(stdout).toContain('certified, for the truncated relations');
    for (const label of ['mass', 'α_s', 'four-loop coefficient', 'strength N'])
      expect(stdout).toContain(`error from ${label}`);
    expect(stdout).toMatch(/strength N +0\.506182 ± 0\.025, sum rule/);
    for (const name of ['|Im|', '|Im|/pi', 'least term', 'near-least partial sums']) expect(stdout).toContain(name);
    expect(stdout).toContain('hep-ph/0105008');
    expect(stdout.split('\n').every((line) => line.length <= 100)).toBe(true);
  });

  test('--quiet is the bare value, the way back the mass itself', async () => {
    const there = (await run("'4.186GeV' --to ps@2GeV -q --loops 4 --digits 30")).stdout.trim();
    expect(there).toMatch(/^4\.\d{29}$/);
    const { stdout } = await run(`${there}GeV --from ps@2GeV --to msbar -q --loops 4 --digits 25`);
    expect(Math.abs(Number(stdout) - 4.186)).toBeLessThan(1e-15);
    expect(stdout.trim()).toMatch(/^4\.1860{15,}|^4\.18599{15,}/);
  });

  test('an MSR mass with its path', async () => {
    const { stdout } = await run('4.18GeV --to msr-practical@2GeV --alpha-s 0.2250@4.18GeV --loops 4');
    // mpmath 1.3.0: m(2 GeV) − m = 0.29129534430187 GeV.
    expect(stdout).toContain('4.4712953443');
    expect(stdout).toContain('R-evolution of m_MSRp(2 GeV)');
    expect(stdout).toMatch(/leading logarithms +4\.4115726 GeV, in closed form/);
  });

  test('a pole mass keeps an ambiguity', async () => {
    const { stdout } = await run("'172.1(6)GeV' --from pole --to msbar");
    expect(stdout).toMatch(/ambiguity +± 0\.071 by \|Im\|\/π/);
    expect(stdout).toContain('(ambiguity)');
    expect(stdout).toContain('Between m(m) and M');
  });

  test('names in other spellings', async () => {
    const one = await run("4.18GeV --from MSbar --to RS' --cutoff 2GeV -q");
    const two = await run('4.18GeV --to rs-prime@2GeV -q');
    expect(one.stdout).toBe(two.stdout);
    expect((await run('4180MeV --to kin@1000MeV -q')).stdout).toBe((await run('4.18GeV --to kinetic@1GeV -q')).stdout);
  });
});

describe('several', () => {
  test('--to all, side by side; --quiet a line each', async () => {
    const { stdout } = await run('4.186GeV --to all --cutoff 2GeV -q');
    const names = stdout
      .trim()
      .split('\n')
      .map((line) => line.split(' ')[0]);
    expect(names).toEqual(['pole', 'rs', 'rs-prime', 'msr', 'msr-practical', 'ps', 'mrs', 'pv', 'kinetic']);
    const page = (await run('4.186GeV --to all --cutoff 2GeV')).stdout;
    expect(page).toContain('Side by side');
    expect(page).toContain('* holds the renormalon');
  });

  test('--json repeats the request and gives every number as text', async () => {
    const { stdout } = await run("'4.186(6)GeV' --to pole,mrs --alpha-s-mz '0.1182(8)' --json");
    const result = JSON.parse(stdout) as Record<string, unknown>;
    expect(Object.keys(result).slice(0, 4)).toEqual(['leastterm', 'request', 'mass', 'from']);
    expect(result['request']).toEqual({
      command: 'mass',
      mass: '4.186(6)GeV',
      from: 'msbar',
      to: 'pole,mrs',
      'alpha-s-mz': '0.1182(8)',
      digits: 15,
    });
    const values = result['values'] as readonly Record<string, unknown>[];
    expect(values.map((v) => v['definition'])).toEqual(['pole', 'mrs']);
    expect(values.every((v) => typeof v['value'] === 'string')).toBe(true);
  });
});

describe('complaints, with exit code 2', () => {
  test.each([
    ['4.18GeV --to rz', 'no mass definition "rz" (did you mean "rs"?); wanted one of pole, msbar'],
    ['4.18GeV --to RS(2)', 'a scale stands behind @, with its unit: rs@2GeV'],
    ['4.18GeV --to rs', 'needs ν_f (factorisation scale of the subtracted asymptotic series); write --cutoff 2GeV'],
    ['4.18GeV --from rs --to pole', 'write --from rs@2GeV'],
    ['4.18GeV --to all', '--cutoff is missing'],
    ['4.18GeV', '--to is missing'],
    ['4.18 --to pole', 'MASS: "4.18" has no unit; write 4.18GeV'],
    ['--to pole -- -4.18GeV', '"-4.18GeV" is not positive'],
    ['-4.18GeV --to pole', 'reads as an option; write it behind --'],
    ['0GeV --to pole', 'is not positive'],
    ['heavy --to pole', 'MASS: "heavy" is no mass'],
    ['4.18GeV --to rs@2', '--to: "2" has no unit; write --to 2GeV'],
    ['4.18GeV --to rs@5GeV', 'lies above the mass'],
    ['4.18GeV --to rs@0.58GeV', 'perturbation theory does not hold there; remedy: give a larger ν_f'],
    ['4.18GeV --to rs@0.2GeV', 'where α_s does not exist'],
    ['4.18GeV --to pole@2GeV', 'the pole mass has no scale'],
    ['4.18GeV --to pole --cutoff 2GeV', 'pole needs no scale'],
    ['4.18GeV --to pole --light 5', '5 light flavours do not fit the b quark'],
    ['4.18GeV --to pole --quark s', 'no quark "s"; wanted one of c, b, t'],
    ['4.18GeV --to pole --alpha-s 0.22', "does not say at which scale; write --alpha-s '0.22@4.18GeV'"],
    ['4.18GeV --to pole --alpha-s=-0.22@4GeV', 'is not positive'],
    ['4.18GeV --to pole --alpha-s 0.22@4GeV --alpha-s-mz 0.118', 'exclude each other'],
    ['4.18GeV --to pole --flavours 4', '--flavours belongs to the coupling of --alpha-s'],
    ['4.18GeV --to kinetic@1GeV --order 3', '2 orders of α_s are held, not 3'],
    ['4.18GeV --to pole --scale 0', 'is not positive'],
    ['4.18GeV --to rs@2GeV --strength 0', 'is not positive'],
    ['1.5GeV --from pole --to msbar', 'its series has no smaller value than'],
  ])('%s', async (line, complaint) => {
    const { status, stdout, stderr } = await run(line);
    expect([status, stdout]).toEqual([2, '']);
    expect(stderr).toContain(complaint);
    expect(stderr).toContain('see leastterm mass --help');
  });

  test('when every one of several is refused, exit code 1', async () => {
    const { status, stdout } = await run('4.18GeV --to rs,ps --cutoff 5GeV');
    expect(status).toBe(1);
    expect(stdout.match(/refused/g)).toHaveLength(2);
  });
});
