/** The catalogue: every file reads, reproduces the published values it records, and has a source. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import {
  InputError,
  catalogueFolder,
  catalogueIds,
  checkSeries,
  listCatalogue,
  loadSeries,
} from '../../src/series/index.js';

const ids = await catalogueIds();

describe('every file', () => {
  test.each(ids)('%s', async (id) => {
    const series = await loadSeries(id);
    expect(series.id).toBe(id);
    expect(series.title).not.toBe(id);
    expect(series.quantity).toBeDefined();
    expect(series.sources.length).toBeGreaterThan(0);
    expect(series.sources.some((source) => /\[.+\]$/.test(source))).toBe(true);
    expect(series.notes.length).toBeGreaterThan(0);
    // The recorded values, at every number of flavours that has some, and each check is used.
    const asked = (series.checks ?? []).map((check) => check.flavours);
    for (const flavours of new Set(asked)) {
      const here = flavours === undefined || flavours === series.flavours ? series : await loadSeries(id, { flavours });
      expect(checkSeries(here)).toEqual([]);
    }
  });
});

describe('list', () => {
  test('a row for each file, with its numbers', async () => {
    const list = await listCatalogue();
    expect(list.map((entry) => entry.id)).toEqual(ids);
    expect(list.find((entry) => entry.id === 'adler')).toMatchObject({ coefficients: 4, flavours: 3, invented: false });
    expect(list.find((entry) => entry.id === 'pole-msbar')!.variants).toContain('pole-msbar-nl5');
    expect(list.filter((entry) => entry.invented).map((entry) => entry.id)).toEqual([
      'marrowgate-mass',
      'marrowgate-pair',
      'marrowgate-partner',
      'tessel',
      'vellum',
    ]);
  });

  test('the required entries are there', () => {
    for (const id of ['adler', 'adler-estimate', 'r-ratio', 'pole-msbar', 'bjorken']) expect(ids).toContain(id);
  });
});

describe('flavours in the id', () => {
  test('pole-msbar-nl3, -nl4, -nl5 with their hard scales', async () => {
    const scales = await Promise.all(
      [3, 4, 5].map(async (n) => (await loadSeries(`pole-msbar-nl${n}`)).hardScale?.text),
    );
    expect(scales).toEqual(['1.2729 GeV', '4.186 GeV', '163.508 GeV']);
    const five = await loadSeries('pole-msbar-nl5');
    expect(five).toMatchObject({ id: 'pole-msbar-nl5', flavours: 5 });
    // 1.64 and 0.040 nl in quadrature.
    expect(five.coefficients[3]!.error!.plus.toNumber()).toBeCloseTo(Math.hypot(1.64, 0.2), 12);
  });
  test('an explicit number wins over the id, and the file limits both', async () => {
    expect((await loadSeries('adler-nf4', { flavours: 5 })).flavours).toBe(5);
    await expect(loadSeries('pole-msbar-nl9')).rejects.toThrow(InputError);
    await expect(loadSeries('vellum-nf4')).rejects.toThrow('the coefficients are fixed numbers');
  });
});

describe('what is stated beside the coefficients', () => {
  test('the estimated coefficient of the Adler function is in adler-estimate only', async () => {
    const [known, estimate] = await Promise.all([loadSeries('adler'), loadSeries('adler-estimate')]);
    expect(known.coefficients).toHaveLength(4);
    expect(estimate.coefficients).toHaveLength(5);
    expect(estimate.coefficients[4]).toMatchObject({ status: 'estimated' });
    expect(estimate.coefficients[4]!.error!.plus.toString()).toBe('142');
    const pairs = known.coefficients.map((c, i) => [c.text, estimate.coefficients[i]!.text]);
    for (const [a, b] of pairs) expect(a).toBe(b);
  });

  test('the gluon condensate of the Adler function', async () => {
    const { condensates, singularities, additive, firstPower } = await loadSeries('adler');
    expect([additive.rational?.toString(), firstPower]).toEqual(['1', 1]);
    expect(condensates[0]!.dimension.toString()).toBe('4');
    expect(condensates[0]!.wilson!.ball(64).mid > 0n).toBe(true);
    expect(singularities.map((s) => s.kind)).toEqual(['infrared', 'infrared', 'ultraviolet', 'ultraviolet']);
  });

  test('the invented series are exact to sixty coefficients, and two of them cancel', async () => {
    const [pair, partner] = await Promise.all([loadSeries('marrowgate-pair'), loadSeries('marrowgate-partner')]);
    expect(pair.coefficients).toHaveLength(60);
    // The poles at u = 1/2, of residue +-4/3, grow as n! (2·25/12)^n; the sum has only those at u = -1 and 2.
    const ratio = (n: number): number => {
      const sum = pair.coefficients[n]!.value.rational!.add(partner.coefficients[n]!.value.rational!);
      return Math.abs(sum.div(pair.coefficients[n]!.value.rational!).toNumber());
    };
    expect(ratio(40)).toBeLessThan(1e-12);
    expect(ratio(40) * 2 ** 40).toBeCloseTo(1 / 8, 6);
  });
});

test('no constant is typed a second time with other digits', async () => {
  // The expressions shared by several files are the same text in each.
  const folder = await catalogueFolder();
  const squeeze = (id: string): string => readFileSync(join(folder, `${id}.yaml`), 'utf8').replace(/\s+/g, '');
  const adler = squeeze('adler');
  const last = '5/18*zeta(5))';
  const d4 = adler.slice(adler.indexOf('144939499'), adler.indexOf(last) + last.length);
  expect(d4.length).toBeGreaterThan(200);
  expect(squeeze('adler-estimate')).toContain(d4);
  expect(squeeze('r-ratio')).toContain(d4);
  const c3 = '652841/38880*pi^2-695/7776*pi^4-575/162*pi^2*l2-22/81*pi^2*l2^2-55/162*l2^4-220/27*li4_half';
  expect(squeeze('pole-msbar')).toContain(c3);
  expect(squeeze('pole-msbar-heavy')).toContain(c3);
});
