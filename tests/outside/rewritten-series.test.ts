/**
 * Published coefficients in other conventions, reached from the catalogue by rewriting and combining.
 * Status words: memory (recalled, not seen in a text), re-derived (recomputed from the formula named).
 */
import { describe, expect, test } from 'vitest';
import { Rational, exact } from '../../src/numerics/index.js';
import { loadSeries } from '../../src/series/index.js';
import { combined, errors, rewritten, seriesOf, values } from '../support/qcd-series.js';

const q = (text: string) => exact(Rational.parse(text) ?? Rational.ZERO);
const C = (text: string) => ({ kind: 'C', c: Rational.parse(text) ?? Rational.ZERO }) as const;

/** Agreement with decimals to half a unit of their last digit, and half of one for the rounding of what they came from. */
function agree(own: readonly number[], published: readonly string[]): void {
  published.forEach((text, i) => {
    const places = text.includes('.') ? text.length - text.indexOf('.') - 1 : 0;
    expect(Math.abs((own[i] ?? NaN) - Number(text)), `coefficient ${i}: ${own[i]} against ${text}`).toBeLessThanOrEqual(
      10 ** -places,
    );
  });
}

describe('the Adler function at n_f = 3', () => {
  // Check values computed with mpmath from the coefficients of arXiv:0801.1821 by composing the series (re-derived).
  test('at mu = 2Q and Q/2', async () => {
    const adler = await loadSeries('adler');
    agree(
      values(await rewritten(adler, { scale: q('2') })),
      ['1', '4.75898351741674', '31.8751024625949', '262.274518647566'].map((t) => t.slice(0, 14)),
    );
    agree(values(await rewritten(adler, { scale: q('1/2') })), [
      '1',
      '-1.47934110762',
      '0.32527356729',
      '18.083054245',
    ]);
  });

  // D. Boito, M. Jamin, R. Miravitllas, Phys. Rev. Lett. 117 (2016) 152001, arXiv:1606.06175: 7.682, 61.06 (memory).
  test('in the C-scheme', async () => {
    const adler = await loadSeries('adler');
    agree(values(await rewritten(adler, { coupling: C('0') })), ['1', '1.640', '7.682', '61.06']);
    // Re-derived with mpmath from the closed beta function.
    agree(values(await rewritten(adler, { coupling: C('-1') })), ['1', '-0.6101787951', '1.3648900487', '24.9934731']);
  });
});

describe('the pole mass over the MSbar mass', () => {
  // P. Marquard et al., arXiv:1606.06754: both forms recalled separately; decoupling takes one into the other.
  test.each([3, 4, 5])('from the coupling of %i light flavours to that with the heavy one', async (light) => {
    const [lightForm, heavyForm] = await Promise.all([
      loadSeries(`pole-msbar-nl${light}`),
      loadSeries(`pole-msbar-heavy-nf${light + 1}`),
    ]);
    const mass = { 3: 1.2729, 4: 4.186, 5: 163.508 }[light] ?? NaN;
    const names = { 3: 'c', 4: 'b', 5: 't' } as const;
    const name = light === 3 || light === 4 || light === 5 ? names[light] : '';
    // At μ = m(m) of the quark itself: no logarithm.
    const there = await rewritten(lightForm, {
      flavours: light + 1,
      thresholds: [{ name, flavours: light + 1, mass }],
    });
    const own = values(heavyForm);
    values(there)
      .slice(0, 3)
      .forEach((c, i) => expect(c / (own[i] ?? NaN)).toBeCloseTo(1, 13));
    // The fourth order of both forms is rounded to two or three decimals.
    expect((values(there)[3] ?? NaN) / (own[3] ?? NaN)).toBeCloseTo(1, 5);
    expect(errors(there)[3]).toBeCloseTo(errors(heavyForm)[3] ?? NaN, 9);
  });

  // K. Melnikov, T. van Ritbergen, hep-ph/9912391 (memory): m(M)/M = 1 − 4/3 a − …, here from M/m(m).
  test('turned over, by the renormalisation group and by combining', async () => {
    const [there, back] = await Promise.all([loadSeries('pole-msbar-heavy-nf5'), loadSeries('msbar-over-pole-nf5')]);
    // As a series in α_s(m): 1/(M/m).
    const inverse = await combined('1/r', { r: there });
    expect(values(inverse)[0]).toBeCloseTo(-4 / 3, 14);
    // From the pole mass to the running mass, both logarithms at μ = M: R = M · 1 becomes m(M) · M/m(M).
    const one = await seriesOf('[0, 0, 0, 0]', 'first power: 1\nadditive: 1');
    const ratio = await rewritten(
      { ...one, flavours: 5 },
      { mass: { to: 'running', from: 'pole', power: Rational.of(-1), heavyInCoupling: true, hardScale: 'pole' } },
    );
    agree(
      values(ratio).slice(0, 3),
      values(back)
        .slice(0, 3)
        .map((c) => c.toFixed(3)),
    );
  });
});

describe('a heavy-quark width', () => {
  // T. van Ritbergen, hep-ph/9903226: 4.25360, 26.78476 (memory; second coefficient re-derived, 48.0803 − 21.2955).
  test('from the pole to the MSbar mass, by rewriting and by combining alike', async () => {
    const pole = await loadSeries('b-to-u-pole');
    const one = await rewritten(pole, { mass: { to: 'msbar', power: Rational.of(5) } });
    const other = await combined('width * ratio^5', { width: 'b-to-u-pole', ratio: 'pole-msbar-nl4' });
    agree(values(one), ['4.25360', '26.785']);
    values(one).forEach((c, i) => expect(c / (values(other)[i] ?? NaN)).toBeCloseTo(1, 12));
    expect(errors(one)).toEqual(errors(other));
  });
});

describe('time-like from Euclidean', () => {
  // r_2 at n_f = 5 by arXiv:0801.1821 (memory): −12.767, here at μ = 2 √s and back through a file of decimals.
  test('R at another scale has the same fixed-order value to the order kept', async () => {
    const r = await loadSeries('r-ratio-nf5');
    const there = await rewritten(r, { scale: q('2') });
    const b0 = 23 / 12;
    const log = 2 * Math.log(2);
    const [, r2 = NaN] = values(r);
    agree(values(there).slice(0, 2), ['1', (r2 + b0 * log).toFixed(10)]);
  });
});
