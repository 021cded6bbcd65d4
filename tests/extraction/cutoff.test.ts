/** Condensates and their definitions: mixing refused, values recovered, a factorisation scale that takes the renormalon out. */
import { describe, expect, test } from 'vitest';
import { cutSeries, singularCoefficients } from '../../src/extraction/cutoff.js';
import { extract } from '../../src/extraction/index.js';
import type { Problem } from '../../src/extraction/index.js';
import { powerFactor } from '../../src/extraction/power-terms.js';
import { toNumberExact } from '../../src/numerics/index.js';
import type { Series } from '../../src/series/index.js';
import { expand } from '../../src/studies/index.js';
import { exact } from '../../src/numerics/index.js';
import { componentIn, coupling, near, quantity, refusedWith, rowOf, standing, usual, yaml } from './support.js';

const HEAD =
  'coupling: { name: alpha_s, divisor: pi }\nscheme: toy, one-loop running only\nflavours: 3\nscale ratio: 1\nhard scale: 2 GeV\nfirst power: 1\n';

/** c_n = n! (9/8)^n: a simple pole at u = 2, t = 8/9, of strength 1. */
const pole = (strength: string, count = 8): string => {
  let c = 1;
  const list = Array.from({ length: count }, (_, n) => (n === 0 ? c : (c *= (n * 9) / 8)));
  return `${HEAD}coefficients: [${list.join(', ')}]\nsingularities:\n  - { dimension: 4, exponent: 1, ${strength}kind: infrared }\n`;
};

const CONDENSATE = 'condensates:\n  - { dimension: 4, name: gluon, wilson: 2, value: 0.02(1), unit: GeV^4';

describe('a factorisation scale', () => {
  test('the singular form of the file is what its coefficients are', async () => {
    const series = await yaml(pole('strength: 1, '));
    const { stated, coefficients } = expand(series, exact(1)).expansion;
    const form = singularCoefficients(stated[0]!, 8);
    coefficients.forEach((c, n) => near(toNumberExact(c), form[n]!, 1e-13));
  });

  test('at μ_f = Q nothing of a pure renormalon is left', async () => {
    const cut = cutSeries(await yaml(pole('strength: 1, ')), 4, 2, 2) as Series;
    for (const c of cut.coefficients) expect(Math.abs(toNumberExact(c.value))).toBeLessThan(1e-9);
    expect(cut.singularities).toEqual([]);
  });

  test('below Q the factorial growth is gone: what is left converges to the difference of two principal values', async () => {
    const series = await yaml(pole('strength: 1, ', 26));
    const cut = cutSeries(series, 4, 1.6, 2) as Series;
    const x = 0.07;
    const at = (n: number): number =>
      cut.coefficients.slice(0, n).reduce((sum, c, k) => sum + toNumberExact(c.value) * x ** (k + 1), 0);
    // One-loop running: 1/x(μ_f) = 1/x − (9/2) ln(Q/μ_f); PV ∫ dt e^(−t/x)/(1 − t/t*) = t* e^(−t*/x) Ei(t*/x), t* = 8/9.
    // PV(0.07) − 0.8⁴ PV(x(1.6 GeV)): mpmath 1.3.0, 30 digits.
    near(at(26), Number('0.0426235767489006828640211341424'), 1e-6);
    const term = (c: Series, n: number): number => Math.abs(toNumberExact(c.coefficients[n]!.value)) * x ** (n + 1);
    expect(term(cut, 25) / term(series, 25)).toBeLessThan(1e-5);
  });

  test('without a strength it is refused, and so on a plain variable', async () => {
    refusedWith(cutSeries(await yaml(pole('')), 4, 1, 2) as object, 'has no strength', '--condensate-by pv');
    refusedWith(cutSeries(await yaml('coefficients: [1, 2, 6]'), 4, 1, 2) as object, 'plain variable');
  });
});

describe('definitions are not mixed', () => {
  const problem = (more: Partial<Problem>): Problem =>
    coupling(quantity('0.12', 0.001), { prescriptions: ['fixed-order', 'terminant', 'pade'], ...more });

  test('a value of the principal value is refused to truncated sums, and the other way round', async () => {
    const series = await yaml(`${pole('')}${CONDENSATE} }\n`);
    const by = (kind: 'pv' | 'truncated' | 'any') => {
      const result = standing(
        extract(problem({ condensates: [{ name: 'gluon' }], condensateBy: { kind } }), series, {}),
      );
      return result.rows.filter((r) => r.refused?.reason.includes('belongs to')).map((r) => r.prescription);
    };
    expect(by('pv')).toEqual(['fixed-order', 'pade']);
    expect(by('truncated')).toEqual(['terminant', 'pade']);
    expect(by('any')).toEqual([]);
  });

  test('a value without a definition is refused; one that the file defines enters by itself', async () => {
    const bare = await yaml(`${pole('')}${CONDENSATE} }\n`);
    refusedWith(
      extract(problem({ condensates: [{ name: 'gluon' }] }), bare, {}),
      'not said to which',
      '--condensate-by',
    );
    expect(standing(extract(problem({}), bare, {})).cautions.map((c) => c.code)).toContain('condensates left out');
    const defined = await yaml(`${pole('')}${CONDENSATE}, defined by: principal value }\n`);
    const result = standing(extract(problem({}), defined, {}));
    expect(result.condensates?.[0]).toMatchObject({ name: 'gluon', belongsTo: 'the principal value of the Borel sum' });
    expect(rowOf(result, 'fixed-order').refused?.reason).toContain('belongs to');
    expect(standing(extract(problem({ fileCondensates: false }), defined, {})).condensates).toBeUndefined();
  });

  test('the file and the command line must agree', async () => {
    const defined = await yaml(`${pole('')}${CONDENSATE}, defined by: truncated sum }\n`);
    const asked = problem({ condensates: [{ name: 'gluon' }], condensateBy: { kind: 'pv' } });
    refusedWith(extract(asked, defined, {}), 'not by what --condensate-by says');
  });

  test('a unit of another dimension is refused', async () => {
    const series = await yaml(`${pole('')}${CONDENSATE} }\n`);
    const asked = problem({
      condensates: [{ name: 'gluon', value: quantity('0.02', 0, 2) }],
      condensateBy: { kind: 'any' },
    });
    refusedWith(extract(asked, series, {}), 'GeV^2', 'dimension 4');
  });
});

describe('a condensate from what a measurement leaves over', () => {
  const asked = (measured: string, error = 0): Problem => ({
    ...usual,
    for: 'condensate',
    coupling: quantity('0.2', 0.01),
    data: [{ series: 'toy', measured: quantity(measured, error) }],
    prescriptions: ['fixed-order'],
  });

  test('is (X − R) Q^d / C, and its error is that of X times Q^d / C', async () => {
    const series = await yaml(`${pole('', 3)}${CONDENSATE} }\n`);
    const row = rowOf(extract(asked('0.1', 0.001), series, {}), 'fixed-order');
    const x = 0.2 / Math.PI;
    const R = x + (9 / 8) * x ** 2 + 2 * (9 / 8) ** 2 * x ** 3;
    near(row.value, ((0.1 - R) * 16) / 2, 1e-10);
    near(componentIn(row, 'measurement').plus, (0.001 * 16) / 2, 1e-7);
    // A larger coupling leaves less over.
    expect(Number(componentIn(row, 'inputs').sources[0]?.shifts[0]?.shift)).toBeLessThan(0);
    expect(row.belongsTo).toBe('the truncated sum of 3 terms');
  });

  test('put back, it gives the coupling back', async () => {
    const series = await yaml(`${pole('', 3)}${CONDENSATE} }\n`);
    const { value = '' } = rowOf(extract(asked('0.1'), series, {}), 'fixed-order');
    const back = coupling(quantity('0.1'), {
      prescriptions: ['fixed-order'],
      condensates: [{ name: 'gluon', value: quantity(value, 0, 4) }],
      condensateBy: { kind: 'truncated' },
    });
    near(rowOf(extract(back, series, {}), 'fixed-order').value, 0.2, 1e-10);
  });

  // δ⟨O⟩ = Q⁴ A/C with D ∋ (2π²/3)(1 − (11/18) a)⟨aGG⟩/Q⁴: mpmath 1.3.0, 30 digits.
  test('the shift that absorbs an ambiguity of the Adler function', () => {
    const wilson = { wilson: (2 * Math.PI ** 2) / 3, corrections: [-11 / 18], dimension: 4 };
    const factor = powerFactor(wilson, 0.34 / Math.PI, 1.77686);
    near(Number('0.00607464601400593430943') / factor, Number('0.00985467937017525724958'), 1e-13);
  });
});
