/** Extractions with exact answers: closed forms recovered, errors as calculus has them, refusals with reasons. */
import { describe, expect, test } from 'vitest';
import { extract } from '../../src/extraction/index.js';
import type { ExtractResult } from '../../src/extraction/index.js';
import { exact } from '../../src/numerics/index.js';
import { evolveLog, flowOf } from '../../src/qcd/index.js';
import { loadSeries } from '../../src/series/index.js';
import { rewriteStudy } from '../../src/studies/index.js';
import { atMZ, componentIn, coupling, near, quantity, refusedWith, rowOf, standing, usual, yaml } from './support.js';

const POLYNOMIAL = 'first power: 1\ncoefficients: [1, 1]';

describe('a closed form R(x)', () => {
  test('x + x² = 1 gives the golden section to fifteen digits, certified', async () => {
    const row = rowOf(extract(coupling(quantity('1', 0.1)), await yaml(POLYNOMIAL), {}), 'fixed-order');
    expect(row.value).toBe('0.618033988749895');
    expect(row.digits).toBe('certified');
    // dx/dR = 1/(1 + 2x) = 1/√5.
    near(row.slope, Math.sqrt(5), 1e-10);
    near(componentIn(row, 'measurement').plus, 0.1 / Math.sqrt(5), 0.1);
  });

  test('as many digits as are asked for', async () => {
    const problem = { ...coupling(quantity('1')), digits: 40 };
    const row = rowOf(extract(problem, await yaml(POLYNOMIAL), {}), 'fixed-order');
    // mpmath 1.3.0, 40 digits: (√5 − 1)/2.
    expect(row.value).toBe('0.6180339887498948482045868343656381177203');
  });

  // Σ (−1)^n n! x^n has the Borel sum e^(1/x) E_1(1/x)/x, which Borel–Padé gives exactly; at x = 0.2: mpmath 1.3.0, 40 digits.
  test('the Borel sum of factorials gives back its argument', async () => {
    const series = await yaml('coefficients: [1, -1, 2, -6, 24, -120, 720]');
    const problem = {
      ...coupling(quantity('0.8521108814236610090624349558628044776271')),
      prescriptions: ['borel-pade', 'fixed-order'],
    };
    const row = rowOf(extract(problem, series, {}), 'borel-pade');
    expect([row.value, row.digits]).toEqual(['0.200000000000000', 'certified']);
  });

  test('a large change is solved for again, a small one is not', async () => {
    const series = await yaml(POLYNOMIAL);
    const small = componentIn(rowOf(extract(coupling(quantity('1', 0.01)), series, {}), 'fixed-order'), 'measurement');
    expect(small.sources[0]?.shifts.map((s) => s.how)).toEqual(['slope', 'slope']);
    const large = componentIn(rowOf(extract(coupling(quantity('1', 0.5)), series, {}), 'fixed-order'), 'measurement');
    expect(large.sources[0]?.shifts.map((s) => s.how)).toEqual(['refit', 'refit']);
    // Exactly: (√(1 + 4·1.5) − 1)/2 and (√(1 + 4·0.5) − 1)/2.
    near(large.plus, (Math.sqrt(7) - Math.sqrt(5)) / 2, 1e-7);
    near(large.minus, (Math.sqrt(5) - Math.sqrt(3)) / 2, 1e-7);
  });

  test('asymmetric errors of the measurement stay asymmetric', async () => {
    const measured = { text: '1(+2-1)', value: '1', plus: 0.02, minus: 0.01 };
    const c = componentIn(rowOf(extract(coupling(measured), await yaml(POLYNOMIAL), {}), 'fixed-order'), 'measurement');
    near(Number(c.plus) / Number(c.minus), 2, 1e-6);
  });
});

describe('roots', () => {
  const hill = 'first power: 1\ncoefficients: [1, -1]';

  test('several are reported; the one at weak coupling is taken', async () => {
    const row = rowOf(extract(coupling(quantity('0.1875')), await yaml(hill), {}), 'fixed-order');
    expect(row.value).toBe('0.250000000000000');
    expect(row.otherRoots?.map(Number)).toEqual([0.75]);
    expect(row.cautions.map((c) => c.code)).toContain('several roots');
  });

  test('none: the measurement is outside what the sum reaches, and the range is told', async () => {
    const result = standing(extract(coupling(quantity('0.3')), await yaml(hill), {}));
    expect(result.summary).toBeUndefined();
    expect(rowOf(result, 'fixed-order').refused?.reason).toMatch(/0\.3 lies outside .* 0\.001 to 10: -90 to 0\.2/);
  });

  test('--search narrows it', async () => {
    const problem = { ...coupling(quantity('0.1875')), search: { from: 0.5, to: 2 } };
    expect(rowOf(extract(problem, await yaml(hill), {}), 'fixed-order').value).toBe('0.750000000000000');
  });
});

describe('coefficient errors', () => {
  const noisy = (correlation = ''): string =>
    `first power: 1\ncoefficients:\n  - { value: 1, error: 0.01 }\n  - { value: 1, error: 0.02 }\n${correlation}`;

  test('with and without correlation, as J C Jᵀ has them', async () => {
    const x = (Math.sqrt(5) - 1) / 2;
    const [a, b] = [(0.01 * x) / Math.sqrt(5), (0.02 * x * x) / Math.sqrt(5)];
    const plain = rowOf(extract(coupling(quantity('1')), await yaml(noisy()), {}), 'fixed-order');
    near(componentIn(plain, 'coefficients').plus, Math.hypot(a, b), 1e-6);
    const tied = rowOf(
      extract(coupling(quantity('1')), await yaml(noisy('correlation: [[1, 0.5], [0.5, 1]]')), {}),
      'fixed-order',
    );
    near(componentIn(tied, 'coefficients').plus, Math.sqrt(a * a + b * b + a * b), 1e-6);
  });

  test('each coefficient says what it does, with its sign', async () => {
    const row = rowOf(extract(coupling(quantity('1')), await yaml(noisy()), {}), 'fixed-order');
    const shifts = componentIn(row, 'coefficients').sources.flatMap((s) => s.shifts);
    expect(shifts.map((s) => [s.cause, Math.sign(Number(s.shift))])).toEqual([
      ['coefficient of order 1 +0.01', -1],
      ['coefficient of order 1 -0.01', 1],
      ['coefficient of order 2 +0.02', -1],
      ['coefficient of order 2 -0.02', 1],
    ]);
  });
});

describe('scale, ambiguity and truncation', () => {
  const problem = (more: object = {}): Parameters<typeof extract>[0] => ({
    ...coupling(quantity('0.2037', 0.005), { to: atMZ }),
    ...more,
  });

  test('a scale component is what the re-expanded series gives when it is solved again', async () => {
    const series = await loadSeries('tau-delta0-estimate');
    const row = rowOf(extract(problem({ prescriptions: ['fixed-order'] }), series, {}), 'fixed-order');
    const shift = componentIn(row, 'scale').sources[0]?.shifts.find((s) => s.cause === 'μ times 2')?.shift;
    const there = await rewriteStudy(series, { scale: exact(2), find: (name) => loadSeries(name) });
    if ('reason' in there) throw new Error(there.reason);
    const moved = rowOf(extract(coupling(quantity('0.2037')), there, {}), 'fixed-order');
    // α_s(2 m_τ) by that fit, evolved back to m_τ.
    const back = evolveLog(flowOf(3, 5), Number(moved.value), -2 * Math.log(2));
    near(Number(back) - Number(row.value), Number(shift), 1e-6);
  });

  test('the conventions of the ambiguity differ by π, and none leaves it out', async () => {
    const series = await loadSeries('tau-delta0-estimate');
    const size = (ambiguityBy: 'im' | 'im/pi'): number =>
      Number(
        componentIn(
          rowOf(
            extract(problem({ ambiguityBy, prescriptions: ['singularity-model'] }), series, {}),
            'singularity-model',
          ),
          'ambiguity',
        ).sources[0]?.shifts[1]?.shift,
      );
    near(size('im') / size('im/pi'), Math.PI, 0.02);
    const none = rowOf(
      extract(problem({ ambiguityBy: 'none', prescriptions: ['singularity-model'] }), series, {}),
      'singularity-model',
    );
    expect(componentIn(none, 'ambiguity').missing).toContain('left out as asked');
  });

  test('a truncation model serves in place of the recipe; asymmetric bands keep their sides', async () => {
    const series = await loadSeries('tau-delta0-estimate');
    const by = (truncationBy: string): ReturnType<typeof componentIn> =>
      componentIn(
        rowOf(extract(problem({ truncationBy, prescriptions: ['fixed-order'] }), series, {}), 'fixed-order'),
        'truncation',
      );
    near(by('last-term').plus, Number(by('own').plus), 1e-6);
    const abc = by('abc');
    // The band of the abc model lies above the sum: the coupling can only come down.
    expect(Number(abc.minus)).toBeGreaterThan(5 * Number(abc.plus));
  });
});

describe('refused before anything is computed', () => {
  test.each([
    ['a unit where none belongs', coupling(quantity('0.2', 0.01, 1)), 'is in GeV, but R is a pure number'],
    ['no measurement', { ...usual, for: 'alpha_s', data: [{ series: 'toy' }] } as const, 'nothing is measured'],
  ])('%s', async (_, problem, words) => {
    refusedWith(extract(problem, await yaml(POLYNOMIAL), {}), words);
  });

  test('a series in α_s without a hard scale cannot be evolved', async () => {
    const text =
      'coupling: { name: alpha_s, divisor: pi }\nscheme: MSbar\nflavours: 3\nscale ratio: 1\nfirst power: 1\ncoefficients: [1, 2]';
    const series = await yaml(text);
    refusedWith(
      extract(coupling(quantity('0.1'), { to: atMZ }), series, {}),
      'no hard scale',
      '--scale-of-measurement',
    );
    expect(standing(extract(coupling(quantity('0.1')), series, {})).summary?.evolved).toBeUndefined();
  });

  test('a mass whose power clashes with the unit, or that cannot be positive', async () => {
    const series = await loadSeries('charm-moment-1');
    const mass = (value: string, dimension: number, massPower = -2): Parameters<typeof extract>[0] => ({
      ...usual,
      for: 'mass',
      alphaS: quantity('0.118'),
      data: [{ series: 'charm-moment-1', measured: quantity(value, 0.001, dimension), massPower }],
    });
    refusedWith(extract(mass('0.2', -4), series, {}), 'GeV^-4', 'norm · m^-2 · R is in GeV^-2', '--mass-power');
    refusedWith(extract(mass('-0.2', -2), series, {}), 'for a positive mass');
  });

  test('couplings that are no MSbar couplings stay where they are, and it is said', async () => {
    const result: ExtractResult = standing(
      extract(coupling(quantity('0.0437', 0.0012), { to: atMZ, order: 8 }), await loadSeries('tessel'), {}),
    );
    expect(result.summary?.evolved).toBeUndefined();
    expect(result.cautions.map((c) => c.code)).toEqual(['invented', 'not evolved']);
  });
});

describe('the quoted row', () => {
  test('as chosen, or by the ladder among the rows without a caution', async () => {
    const series = await loadSeries('tau-delta0-estimate');
    const problem = coupling(quantity('0.2037', 0.005), { to: atMZ });
    expect(standing(extract(problem, series, {})).summary?.prescription).toBe('singularity-model');
    expect(standing(extract({ ...problem, central: 'borel-pade' }, series, {})).summary).toMatchObject({
      prescription: 'borel-pade',
      rule: 'as chosen',
    });
  });

  test('fixed order and contour improvement are told apart, not averaged', async () => {
    const problem = coupling(quantity('0.2042', 0.005), {
      to: atMZ,
      prescriptions: ['fixed-order', 'contour-improved'],
    });
    const result = standing(extract(problem, await loadSeries('tau-contour'), {}));
    expect(componentIn(result.summary!, 'prescription').missing).toContain('no spread');
    expect(result.cautions.find((c) => c.code === 'contested')?.text).toContain('do not average');
  });
});
