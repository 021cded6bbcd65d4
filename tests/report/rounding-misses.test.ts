import { expect, test } from 'vitest';
import { parseSeries } from '../../src/series/index.js';
import { growthText } from '../../src/report/index.js';
import { growthStudy } from '../../src/studies/index.js';

test('a prediction that misses by the rounding of doubles misses by nothing', async () => {
  // n!: every factorial model predicts the hidden coefficient exactly, a geometric one does not.
  const series = await parseSeries('1\n1\n2\n6\n24\n120\n720\n5040\n40320\n362880\n', { name: 'factorials' });
  const page = growthText(growthStudy(series, { digits: 8, request: {} }), { columns: 100 }).replace(/\s+/g, ' ');
  expect(page).toMatch(/predicted by factorial fit: off by 0 %/);
  expect(page).toMatch(/predicted by geometric fit: off by -?\d+ %/);
  expect(page).not.toMatch(/off by -?[\d.]+e-\d+ %/);
});
