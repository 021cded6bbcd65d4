/** Contour quantities as series of their own: errors, singularities, condensates, orders, and what refuses them. */
import { describe, expect, test } from 'vitest';
import { exact, Rational, toNumberExact } from '../../src/numerics/index.js';
import {
  InputError,
  isNumberProblem,
  loadSeries,
  parseSeries,
  parseUncertain,
  writeSeries,
} from '../../src/series/index.js';
import type { Series } from '../../src/series/index.js';
import { assess, combineStudy, compare, contourStudy, growthStudy, sumStudy } from '../../src/studies/index.js';
import { fixedOrderSeries } from '../../src/studies/contour/moment.js';
import { expand } from '../../src/studies/expand.js';
import { contourPrescriptions } from '../../src/prescriptions/index.js';
import * as contour from '../../src/contour/index.js';
import { rewritten } from '../support/qcd-series.js';

const quantity = (coefficients: string, weight = 'kinematic', more = ''): Promise<Series> =>
  parseSeries(
    `kind: contour\nweight: ${weight}\ncoupling: { name: alpha_s, divisor: pi }\nscheme: MSbar\nflavours: 3\nfirst power: 1\nscale ratio: 1\nhard scale: 2 GeV\n${more}\ncoefficients: ${coefficients}\n`,
    { name: 'test', form: 'yaml' },
  );
const at = (text: string) => ({ value: exact(Rational.parse(text)!), text });
const numbers = (s: Series): number[] => s.coefficients.map((c) => toNumberExact(c.value));

describe('the fixed-order series', () => {
  test('a plain series is left alone', async () => {
    const adler = await loadSeries('adler');
    expect(fixedOrderSeries(adler)).toBe(adler);
  });

  test('the errors of all coefficients below go into each, fully correlated', async () => {
    const s = fixedOrderSeries(await quantity('[1, "2.0(3)", "5.0(4)"]'));
    // K_2 = c_2 + 57/16; K_3 = c_3 + c_2 · 2 · (9/4)(19/12) + …: a unit of c_2 makes 57/8 of K_3.
    expect(s.coefficients[0]!.error).toBeUndefined();
    expect(s.coefficients[1]!.error!.plus.toNumber()).toBeCloseTo(0.3, 10);
    expect(s.coefficients[2]!.error!.plus.toNumber()).toBeCloseTo(Math.hypot(0.4, (0.3 * 57) / 8), 10);
    const rho = s.correlation![1]![2]!.toNumber();
    expect(rho).toBeCloseTo((0.3 * 57) / 8 / Math.hypot(0.4, (0.3 * 57) / 8), 10);
  });

  test('asymmetric errors keep their sides through the sign of the map', async () => {
    const s = fixedOrderSeries(await quantity('[1, "2 +0.3 -0.1", 5]', '[0, 1]'));
    // w = x: W = 1 − x². The sign of dK_3/dc_2 is that of J_1 = −1/2·…
    const { plus, minus } = s.coefficients[2]!.error!;
    expect(plus.toNumber() / minus.toNumber()).toBeCloseTo(3, 8);
  });

  test('an estimate makes every later coefficient one', async () => {
    const s = fixedOrderSeries(await quantity('[1, 2, { value: 3, status: estimated }, 4]'));
    expect(s.coefficients.map((c) => c.status)).toEqual(['computed', 'computed', 'estimated', 'estimated']);
  });

  test('rounded decimals carry their rounding along', async () => {
    const s = fixedOrderSeries(await quantity('[1, 1.640, 6.371]'));
    expect(s.coefficients.map((c) => c.significantDigits)).toEqual([undefined, 4, 4]);
  });

  test('a weight whose integral vanishes starts one power later', async () => {
    const { expansion, leadingZeros } = expand(await quantity('[1, 2, 5]', '[1, -2]'), exact(Rational.of(1, 3)));
    expect([leadingZeros, expansion.power, expansion.coefficients.length]).toEqual([1, 2, 2]);
  });

  test('--order takes the same coefficients away from D', async () => {
    const s = await loadSeries('tau-contour');
    const e = expand(s, exact(Rational.of(1, 3)), 2).expansion;
    expect([e.coefficients.length, e.contour!.coefficients.length]).toEqual([2, 2]);
    expect(toNumberExact(e.coefficients[1]!)).toBeCloseTo(numbers(fixedOrderSeries(s))[1]!, 14);
  });

  test('the scale of D moves with the circle: rewriting and expanding commute', async () => {
    const s = await loadSeries('tau-contour');
    const first = fixedOrderSeries(await rewritten(s, { scale: exact(Rational.of(3, 2)) }));
    const { contour: _weight, expandedFrom: _from, ...moment } = fixedOrderSeries(s);
    const then = await rewritten({ ...moment, notes: [] }, { scale: exact(Rational.of(3, 2)) });
    numbers(first).forEach((c, n) => expect(c / numbers(then)[n]!).toBeCloseTo(1, 12));
  });
});

describe('singularities and condensates', () => {
  const momentOf = async (more: string, weight = 'kinematic') =>
    fixedOrderSeries(await quantity('[1, 2, 5]', weight, more));
  const text = (e: { rational?: Rational } | undefined): string | undefined => e?.rational?.toString();

  test.each([
    ['{ dimension: 6, kind: infrared }', '0'],
    ['{ dimension: 4, kind: infrared }', '2'],
    ['{ dimension: 4, wilson corrections: [-11/18], kind: infrared }', '2'],
    ['{ u: -1, anomalous dimension: -1, kind: ultraviolet }', '0'],
    ['{ dimension: 4, anomalous dimension: 1/3, kind: infrared }', '4/3'],
    // γ = 1 + 4b + 1/2 as stated: δ = −1/2.
    ['{ dimension: 4, exponent: 499/162, kind: infrared }', '1/2'],
  ])('%s: powers of the coupling %s', async (singularity, power) => {
    const [s] = (await momentOf(`singularities: [${singularity}]`)).singularities;
    expect(text(s!.anomalousDimension)).toBe(power);
    expect(s!.exponent).toBeUndefined();
  });

  test('with x in w the gluon condensate enters, and its corrections run', async () => {
    const s = await momentOf(
      'singularities: [{ dimension: 4, wilson corrections: [-11/18], strength: 2, kind: infrared }]',
      '[1, -2, 1]',
    );
    const [four] = s.singularities;
    expect(text(four!.anomalousDimension)).toBe('0');
    expect(text(four!.wilsonCorrections![0])).toBe('-11/18');
    // W_2 = −w_1 = 2.
    expect(text(four!.strength!.value)).toBe('4');
  });

  test('condensates carry (−1)^k W_k, and lose their coefficient where it vanishes', async () => {
    const condensates = (weight: string) =>
      momentOf(
        'condensates:\n  - { dimension: 4, name: gluon, wilson: 3 }\n  - { dimension: 6, name: quark, wilson: 5 }',
        weight,
      );
    const kinematic = (await condensates('kinematic')).condensates;
    expect(kinematic.map((c) => text(c.wilson))).toEqual([undefined, '-10']);
    const pinched = (await condensates('[1, -2, 1]')).condensates;
    expect(pinched.map((c) => text(c.wilson))).toEqual(['6', '10/3']);
  });
});

describe('the studies', () => {
  test('assess works on the moment, and says that another expansion exists', async () => {
    const result = assess(await loadSeries('tau-contour'), at('0.34'), { digits: 10, request: {} });
    expect(result.terms.map((t) => t.term.slice(0, 8))).toEqual(['0.108225', '0.060933', '0.033421', '0.017433']);
    expect(result.cautions.map((c) => c.code)).toContain('contour-quantity');
    expect(growthStudy(await loadSeries('tau-contour'), { digits: 10, request: {} }).series.coefficientsUsed).toBe(4);
  });

  test('compare tells how far the two expansions lie apart, and never averages', async () => {
    const result = compare(await loadSeries('tau-contour'), [at('0.34')], {
      digits: 10,
      request: {},
      by: ['fixed-order', 'contour-improved'],
      more: contourPrescriptions(contour),
      hide: 0,
    });
    const [fixed, improved] = result.rows.map((r) => Number(r.value));
    expect(fixed! - improved!).toBeCloseTo(0.022018, 5);
    expect(result.cautions.find((c) => c.code === 'contour-quantity')?.text).toMatch(
      /minus contour improved is 0\.0220, 1\.3 times/,
    );
  });

  test('the error of a coefficient of D goes into the sums on the circle', async () => {
    const sum = (name: string, series: Series): string | undefined =>
      sumStudy(series, at('0.34'), { digits: 10, request: {}, by: [name], more: contourPrescriptions(contour) })
        .values[0]?.inputError;
    const s = await loadSeries('tau-contour-estimate');
    // 142 A_5 and 142 x^5.
    expect(Number(sum('contour-improved', s))).toBeCloseTo(142 * 1.3207e-5, 5);
    expect(Number(sum('fixed-order', s))).toBeCloseTo(142 * (0.34 / Math.PI) ** 5, 5);
  });

  test('a contour prescription refuses a plain series', async () => {
    const [only] = sumStudy(await loadSeries('adler'), at('0.3'), {
      digits: 10,
      request: {},
      by: ['contour-improved'],
      more: contourPrescriptions(contour),
    }).values;
    expect(only?.refused?.reason).toContain('no contour quantity');
  });

  test('a coupling that is not MSbar is refused with the way there; combining too', async () => {
    const c = await rewritten(await loadSeries('tau-contour'), { coupling: { kind: 'C', c: Rational.ZERO } });
    expect(() => fixedOrderSeries(c)).toThrow(InputError);
    expect(() => fixedOrderSeries(c)).toThrow(/leastterm rewrite SERIES --coupling MSbar/);
    const refused = await combineStudy({
      expression: '2*tau',
      operands: [{ name: 'tau', from: 'tau-contour', series: await loadSeries('tau-contour') }],
    });
    expect('reason' in refused && refused.reason).toContain('contour quantity');
  });

  test('written and read again, a contour quantity is the same', async () => {
    const s = await quantity('[1, 2, 5]', '[1/2, 0, -3]');
    const again = await parseSeries(writeSeries(s), { name: 'test', form: 'yaml' });
    expect(again.contour?.coefficients.map(String)).toEqual(['1/2', '0', '-3']);
    expect(numbers(fixedOrderSeries(again))).toEqual(numbers(fixedOrderSeries(s)));
  });
});

describe('what the errors of the input move', () => {
  const sums = async (coefficients: string, coupling: string) => {
    const given = parseUncertain(coupling);
    if (isNumberProblem(given)) throw new Error(given.problem);
    return contourStudy(await quantity(coefficients), given, { digits: 12, request: {} }, contour).sums;
  };
  const fixed = async (coefficients: string, coupling: string) => {
    const found = (await sums(coefficients, coupling)).find((s) => s.name === 'Fixed order');
    return { coupling: Number(found?.coupling), coefficients: Number(found?.coefficients) };
  };

  test('fixed order: the derivatives of its polynomial', async () => {
    // K_2 = c_2 + 57/16 and so on: a unit of c_2 moves x² + (57/8) x³, α_s moves Σ n K_n x^n / α_s.
    const series = fixedOrderSeries(await quantity('[1, 2, 5]'));
    const x = 0.3 / Math.PI;
    const slope = numbers(series).reduce((sum, k, n) => sum + (n + 1) * k * x ** (n + 1), 0) / 0.3;
    const moved = await fixed('[1, "2.0(3)", 5]', '0.300(1)');
    expect(moved.coupling / (slope * 0.001)).toBeCloseTo(1, 2);
    expect(moved.coefficients / (0.3 * (x ** 2 + (57 / 8) * x ** 3))).toBeCloseTo(1, 2);
  });

  test('contour improved: the integral A_2 times the error of c_2', async () => {
    const found = (await sums('[1, "2.0(3)", 5]', '0.300')).find((s) => s.name === 'Contour improved');
    const engine = contourStudy(await quantity('[1, 2, 5]'), at('0.300'), { digits: 12, request: {} }, contour);
    expect(Number(found?.coefficients) / (0.3 * Number(engine.orders[1]?.integral))).toBeCloseTo(1, 2);
    expect(found?.coupling).toBeUndefined();
  });

  test('a coupling whose error reaches zero has none', async () => {
    const found = await sums('[1, 2, 5]', '0.3(3)');
    expect(found.map((s) => s.coupling)).toEqual(found.map(() => 'unknown'));
  });
});
