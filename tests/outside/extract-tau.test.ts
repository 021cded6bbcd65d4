/** α_s from the hadronic τ width, against published and independently computed numbers. */
import { describe, expect, test } from 'vitest';
import { extract } from '../../src/extraction/index.js';
import type { Problem } from '../../src/extraction/index.js';
import { loadSeries } from '../../src/series/index.js';
import { atMZ, componentIn, coupling, near, quantity, rowOf, standing, yaml } from '../extraction/support.js';

/** δ⁽⁰⁾ at fixed order with c_5 = 283: expanded with mpmath 1.3.0, 36 digits. */
const FIXED_ORDER =
  'coupling: { name: alpha_s, divisor: pi }\nscheme: MSbar\nflavours: 3\nscale ratio: 1\nhard scale: 1.77693 GeV\nfirst power: 1\n' +
  'coefficients: [1, 5.20232120489698, 26.3659289744870, 127.078620943025, 590.782544196892]\n';

const fixed = (measured: string, error: number, more: Partial<Problem> = {}): Problem =>
  coupling(quantity(measured, error), { prescriptions: ['fixed-order'], ...more });

describe('fixed order, δ⁽⁰⁾ = 0.2037, c_5 = 283 (root finding with mpmath 1.3.0, 36 digits)', () => {
  test('solution and slope', async () => {
    const row = rowOf(extract(fixed('0.2037', 0.0019), await yaml(FIXED_ORDER), {}), 'fixed-order');
    // The coefficients above have 15 digits, and so has the solution less what they lose.
    near(row.value, Number('0.319868648861861417'), 2e-14);
    near(row.slope, Number('1.18836340961718071'), 1e-10);
  });

  test.each([
    [0.0019, Number('0.00159883751436950238')],
    [0.006, Number('0.00504896057169316539')],
  ])('an error of %s in δ⁽⁰⁾', async (error, shift) => {
    const row = rowOf(extract(fixed('0.2037', error), await yaml(FIXED_ORDER), {}), 'fixed-order');
    near(componentIn(row, 'measurement').plus, shift, 1e-7);
    near(componentIn(row, 'measurement').minus, shift, 1e-7);
  });

  test('the last term as truncation error', async () => {
    const row = rowOf(extract(fixed('0.2037', 0), await yaml(FIXED_ORDER), {}), 'fixed-order');
    near(componentIn(row, 'truncation').plus, Number('0.00543985594918687924'), 1e-7);
  });
});

describe('evolved to M_Z with the thresholds in between', () => {
  // α_s^(3)(m_τ) → α_s^(5)(M_Z), recomputed with five-loop running by direct integration, m_c = 1.275, m_b = 4.18 GeV:
  // A. Pich, A. Rodríguez-Sánchez, arXiv:1606.07764 (abstract read): 0.328 → 0.1197; own 0.119747.
  test('0.328 gives 0.1197', async () => {
    const thresholds = [
      { name: 'c', flavours: 4, mass: 1.275 },
      { name: 'b', flavours: 5, mass: 4.18 },
    ];
    const line = await yaml(
      FIXED_ORDER.replace(/coefficients: .*/, 'coefficients: [3.141592653589793]').replace('1.77693', '1.777'),
    );
    const problem = fixed('0.328', 0.012, { to: { scale: 91.1876, flavours: 5 }, thresholds });
    const result = standing(extract(problem, line, {}));
    const row = rowOf(result, 'fixed-order');
    near(row.value, 0.328, 1e-12);
    near(row.evolved?.value, 0.119747, 1e-5);
    // Published error 0.0014 for ±0.012.
    const moved = result.summary?.evolved;
    near(moved && componentIn(moved, 'measurement').plus, 0.0014, 0.1);
  });
});

describe('fixed order against contour improvement', () => {
  /** Published pairs α_s(m_τ) at fixed order and contour improved (abstracts read). */
  const PUBLISHED = [
    ['D. Boito et al., arXiv:1110.1127', 0.307, 0.322],
    ['OPAL, as quoted there', 0.324, 0.348],
    ['S. Narison, arXiv:2508.05434', 0.3128, 0.333],
  ] as const;

  test('the distance lies within that of the published pairs', async () => {
    const problem = coupling(quantity('0.2042', 0.005), {
      to: atMZ,
      prescriptions: ['fixed-order', 'contour-improved'],
    });
    const result = extract(problem, await loadSeries('tau-contour'), {});
    const [fo, ci] = ['fixed-order', 'contour-improved'].map((name) => Number(rowOf(result, name).value));
    const distances = PUBLISHED.map(([, a, b]) => b - a);
    const apart = (ci ?? NaN) - (fo ?? NaN);
    expect(apart).toBeGreaterThan(Math.min(...distances));
    expect(apart).toBeLessThan(Math.max(...distances));
  });

  // At α_s = 0.34 the sums are 0.220014 and 0.198358 (four-loop running, the sums of arXiv:0806.3156, abstract read,
  // recomputed with mpmath 1.3.0): put in as measurements they give 0.34 back.
  test.each([
    ['fixed-order', '0.220014', 3e-6],
    ['contour-improved', '0.198358', 2e-5],
  ])('%s inverts its own published sum', async (name, sum, tolerance) => {
    const series = { ...(await loadSeries('tau-contour')), scheme: 'toy, four-loop running only' };
    near(rowOf(extract(coupling(quantity(sum), { prescriptions: [name] }), series, {}), name).value, 0.34, tolerance);
  });
});

test('the whole chain with a fifth coefficient, against arXiv:0806.3156', async () => {
  // M. Beneke, M. Jamin: α_s(m_τ) = 0.316 ± 0.006, α_s(M_Z) = 0.1180 ± 0.0008 from their Borel model (from memory); the
  // fixed-order value with the same input lies within its own scale error of it.
  const problem = coupling(quantity('0.2042', 0.005), { to: atMZ });
  const result = extract(problem, await loadSeries('tau-delta0-estimate'), {});
  const row = rowOf(result, 'fixed-order');
  const low = Number(row.value) - Number(componentIn(row, 'scale').minus);
  expect(low).toBeLessThan(0.316 + 0.006);
  expect(Math.abs(Number(row.evolved?.value) - 0.118)).toBeLessThan(
    0.0008 + Number(row.evolved?.totals.quadrature.minus),
  );
});
