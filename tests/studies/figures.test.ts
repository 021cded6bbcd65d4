import { describe, expect, test } from 'vitest';
import { exact, R, Rational } from '../../src/numerics/index.js';
import { parseSeries } from '../../src/series/index.js';
import { compare, planeStudy } from '../../src/studies/index.js';
import { ballText } from '../../src/studies/figures.js';

/** A decimal number, as JSON readers take it. */
const NUMBER = /^-?\d+(\.\d+)?(e-?\d+)?$/;

describe('numbers enclosed about zero', () => {
  test.each([-30, -40, -3466])('closer than 10^%i is zero', (place) => {
    const bits = Math.floor(place * 3.3219280949) - 2;
    expect(ballText(R.addError(R.ZERO, 1, bits), 15)).toBe('0');
  });

  test('a wide one keeps its bound, and a small number its digits', () => {
    expect(ballText(R.addError(R.ZERO, 1, 3), 15)).toMatch(/^±1e\d$/);
    expect(ballText(exact(Rational.parse('1e-3000')!).ball(200), 5)).toBe('1.0000e-3000');
  });

  test('a rational approximant that vanishes at the coupling', async () => {
    // [1/2] of 1 + 3x + 12x² + 60x³ is (1 − 5x)/(1 − 8x + 12x²), zero at 1/5.
    const series = await parseSeries('1\n3\n12\n60\n', { name: 'vanishing' });
    const at = { value: exact(Rational.of(1, 5)), text: '0.2' };
    const { rows } = compare(series, [at], { digits: 12, hide: 0, by: ['pade'], request: {} });
    expect(rows[0]).toMatchObject({ variant: '[1/2]', value: '0' });
  });

  test('poles of an even transform lie on the imaginary axis', async () => {
    const series = await parseSeries('1/12\n0\n-1/360\n0\n1/1260\n0\n-1/1680\n0\n1/1188\n0\n', { name: 'even' });
    const { borelPlane } = planeStudy(series, { digits: 15, request: {} });
    const poles = borelPlane.entries.flatMap((e) => e.poles ?? []);
    expect(poles.length).toBeGreaterThan(0);
    for (const p of poles) {
      expect(p.re).toBe('0');
      for (const text of [p.im, p.amplitude?.re, p.amplitude?.im]) if (text !== undefined) expect(text).toMatch(NUMBER);
    }
  });
});
