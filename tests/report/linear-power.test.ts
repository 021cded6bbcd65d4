/** A power correction of dimension one, such as the residual mass: units and ratios are written without an exponent. */
import { expect, test } from 'vitest';
import { isNumberProblem, loadSeries, parseUncertain } from '../../src/series/index.js';
import { assessmentText } from '../../src/report/index.js';
import { assess } from '../../src/studies/index.js';
import { powerOfGeV } from '../../src/extraction/place.js';

test('the page of a pole mass', async () => {
  const at = parseUncertain('0.2247');
  if (isNumberProblem(at)) throw new Error(at.problem);
  const page = assessmentText(assess(await loadSeries('pole-msbar-nl4'), at, { digits: 8, request: {} }), {
    columns: 100,
  });
  expect(page).toContain('times Λ/Q\n');
  expect(page.match(/^ +Λ\/Q +0\.0694?/gm)).toHaveLength(1);
  expect(page).not.toMatch(/\^1\b/);
});

test('units', () => {
  expect([1, 2, 4, -1].map(powerOfGeV)).toEqual(['GeV', 'GeV^2', 'GeV^4', 'GeV^-1']);
});
