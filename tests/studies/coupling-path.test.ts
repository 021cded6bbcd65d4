import { describe, expect, test } from 'vitest';
import { R, exact, toNumberExact } from '../../src/numerics/index.js';
import { loadSeries, parseSeries, parseUncertain } from '../../src/series/index.js';
import type { Uncertain } from '../../src/series/index.js';
import { assess, couplingFromMZ, rewriteStudy, sumStudy } from '../../src/studies/index.js';
import type { EvolvedCoupling } from '../../src/studies/index.js';

function uncertain(text: string): Uncertain {
  const read = parseUncertain(text);
  if ('problem' in read) throw new Error(read.problem);
  return read;
}

const AVERAGE = uncertain('0.1180(9)');

async function at(name: string, alpha = AVERAGE): Promise<EvolvedCoupling> {
  const result = couplingFromMZ(await loadSeries(name), alpha);
  if ('reason' in result) throw new Error(result.reason);
  return result;
}

describe('α_s(M_Z) at the flavours and the scale of a series', () => {
  // Check values computed with mpmath 1.3.0: direct integration at five loops, thresholds at m(m) of the tables of 2026.
  test('the Adler function: three flavours at the τ mass', async () => {
    const { at: value, path } = await at('adler');
    expect(toNumberExact(value.value)).toBeCloseTo(0.313894712825, 11);
    expect(value.error?.plus.toNumber()).toBeCloseTo(0.00704, 4);
    expect(value.error?.plus.toString()).toBe(value.error?.minus.toString());
    expect(path[0]).toMatch(/^start 91\.1879 GeV, n_f = 5/);
    expect(path.filter((line) => line.includes(' threshold at '))).toHaveLength(2);
    expect(path.at(-1)).toMatch(/not in it: one loop less moves it by .*, crossing the thresholds elsewhere by/);
    // Certified to what the published decoupling constants allow.
    expect(R.accuracyBits(value.value.ball(200))).toBeGreaterThan(55);
  });

  test('the scale ratio of the file moves the scale', async () => {
    const adler = await loadSeries('adler');
    const twice = await rewriteStudy(adler, { scale: exact(2), find: (name) => loadSeries(name) });
    if ('reason' in twice) throw new Error(twice.reason);
    const there = couplingFromMZ(twice, AVERAGE);
    if ('reason' in there) throw new Error(there.reason);
    expect(there.path.join()).toContain('run to 3.55386 GeV, n_f = 3');
    const at1 = await at('adler');
    expect(toNumberExact(there.at.value)).toBeLessThan(toNumberExact(at1.at.value));
    // The same observable at two scales: closer together than one order less.
    const value = (series: typeof adler, a: Uncertain): number =>
      Number(sumStudy(series, a, { digits: 12, by: ['fixed-order'], request: {} }).values.at(-1)?.value);
    expect(Math.abs(value(adler, at1.at) - value(twice, there.at))).toBeLessThan(0.02);
  });

  test('assess shows the path, and its error', async () => {
    const adler = await loadSeries('adler');
    const { at: value, path } = await at('adler');
    const result = assess(adler, value, { digits: 12, request: {}, path, by: ['fixed-order'] });
    expect(result.coupling.path).toEqual(path);
    expect(
      Number(result.values[0]?.inputError ?? result.values.find((v) => v.inputError !== undefined)?.inputError),
    ).toBeGreaterThan(0);
  });
});

describe('refused, with the remedy', () => {
  const file =
    'coupling: { name: alpha_s }\nscheme: MSbar\nflavours: 3\nscale ratio: 1\nhard scale: 2 GeV\nfirst power: 1\ncoefficients: [1, 2]\n';
  test.each([
    ['coupling: { name: alpha_s }', 'variable: x', /plain variable x/, /--at/],
    ['scheme: MSbar', 'scheme: "C-scheme, C = 0"', /C-scheme, C = 0.* MSbar/, /--coupling MSbar/],
    ['scheme: MSbar', 'scheme: toy, one-loop running only', /toy/, /--at/],
    ['scheme: MSbar\n', '', /does not say its scheme/, /write scheme:/],
    ['flavours: 3\n', '', /number of flavours/, /flavours: 3/],
    ['flavours: 3', 'flavours: 2', /no threshold is known between 2 and 3/, /fixed n_f/],
    ['scale ratio: 1\n', '', /renormalisation scale/, /scale ratio: 1/],
    [
      'hard scale: 2 GeV\n',
      '',
      /no hard scale/,
      /hard scale: 1.777 GeV" into its file; of a catalogue series .* show test -q/,
    ],
    ['hard scale: 2 GeV', 'hard scale: 200 MeV', /Landau pole/, /higher scale/],
  ])('%s becomes "%s"', async (from, to, reason, remedy) => {
    const series = await parseSeries(file.replace(from, to), { name: 'test', form: 'yaml' });
    const result = couplingFromMZ(series, AVERAGE);
    if (!('reason' in result)) throw new Error('not refused');
    expect(result.reason).toMatch(reason);
    expect(result.remedy).toMatch(remedy);
  });
});
