/** What growth says of u = −1 beyond large β_0, and of exponents that leave out anomalous dimensions. */
import { describe, expect, test } from 'vitest';
import { loadSeries, parseSeries } from '../../src/series/index.js';
import type { Series } from '../../src/series/index.js';
import { growthStudy } from '../../src/studies/index.js';
import type { GrowthReport } from '../../src/studies/index.js';

const growthOf = (series: Series): GrowthReport => growthStudy(series, { digits: 15, request: {} }).growth;

describe('u = -1', () => {
  // hep-ph/9703389: n! n^1.59 for three flavours (from memory).
  test('the Adler function: both exponents, and what stands behind them', async () => {
    const { ultraviolet } = growthOf(await loadSeries('adler'));
    expect(ultraviolet).toMatchObject({ inFile: '1.20988', exponent: '2.58842', standing: 'indicative' });
    expect(ultraviolet!.shifts[0]).toBe('0.3785');
    expect(ultraviolet!.statement).toMatch(/double pole.*not checked.*file's own exponent/);
  });

  test('R: one power less', async () => {
    const { ultraviolet } = growthOf(await loadSeries('r-ratio'));
    expect(ultraviolet!.exponent).toBe('1.97222');
    expect(ultraviolet!.inFile).toBeUndefined();
    expect(ultraviolet!.statement).not.toMatch(/own exponent/);
  });

  test('other quantities: not known, and said so', async () => {
    const { ultraviolet } = growthOf(await loadSeries('bjorken'));
    expect(ultraviolet!.exponent).toBeUndefined();
    expect(ultraviolet!.statement).toMatch(/exponent is not known.*simple pole/);
  });

  test('nothing about series of another world, or without that singularity', async () => {
    for (const id of ['tessel', 'vellum', 'static-potential'])
      expect(growthOf(await loadSeries(id)).ultraviolet, id).toBeUndefined();
    expect(growthOf(await parseSeries('[1, 2, 6, 24]', { name: 'list' })).ultraviolet).toBeUndefined();
  });
});

test('exponents of the dimension alone are marked, but for d = 1 and the gluon condensate', async () => {
  const marked = async (id: string): Promise<string[]> =>
    growthOf(await loadSeries(id))
      .expected.filter((s) => s.dimensionAlone === true)
      .map((s) => s.u ?? '');
  expect(await marked('adler')).toEqual(['3']);
  expect(await marked('bjorken')).toEqual(['1']);
  expect(await marked('pole-msbar')).toEqual(['1.5']);
  expect(await marked('r-ratio')).toEqual([]);
});
