import { describe, expect, it } from 'vitest';
import { isNumberProblem, loadSeries, parseUncertain, type Series } from '../../src/series/index.js';
import { assess, growthStudy } from '../../src/studies/index.js';

function ambiguitySources(series: Series, coupling: string): string {
  const at = parseUncertain(coupling);
  if (isNumberProblem(at)) throw new Error(at.problem);
  return JSON.stringify(assess(series, at, { digits: 15, request: {} }).ambiguity);
}

describe('the strength of the leading singularity in a report', () => {
  // Published: 0.5056 (ratio) in M. Beneke, P. Marquard, P. Nason, M. Steinhauser, arXiv:1605.03609, section 2 (recalled).
  it('is stated where the methods agree', async () => {
    const pole = await loadSeries('pole-msbar-nf4');
    const { growth } = growthStudy(pole, { digits: 15, request: {} });
    expect(growth.strength?.refused).toBeUndefined();
    expect(Number(growth.strength?.value)).toBeCloseTo(0.5056, 2);
    expect(Number(growth.strength?.error)).toBeLessThan(0.03);
    expect(ambiguitySources(pole, '0.2186')).toContain('strength N');
  });

  // The plaquette's coefficients know only the exponent of their coupling: each step more than doubles the strength.
  it('is not determined where the error reaches the value, and makes no ambiguity then', async () => {
    const series = await loadSeries('plaquette');
    const { growth } = growthStudy(series, { digits: 15, request: {} });
    expect(growth.strength?.value).toBeUndefined();
    expect(growth.strength?.refused?.reason).toContain('error');
    expect(growth.strength?.methods.length).toBeGreaterThan(0);
    expect(ambiguitySources(series, '0.0796')).not.toContain('strength N');
  });
});
