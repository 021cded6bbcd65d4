/** Quark masses from moments, threshold masses and pole masses, against published numbers. */
import { describe, expect, test } from 'vitest';
import { extract, thresholdSeries } from '../../src/extraction/index.js';
import type { Problem, Quantity } from '../../src/extraction/index.js';
import { convertMass } from '../../src/masses/index.js';
import { loadSeries } from '../../src/series/index.js';
import type { Series } from '../../src/series/index.js';
import { componentIn, near, quantity, rowOf, standing, usual } from '../extraction/support.js';

const moment = (measured: Quantity, massPower: number, norm: string, alpha: Quantity): Problem => ({
  ...usual,
  for: 'mass',
  alphaS: alpha,
  prescriptions: ['fixed-order'],
  data: [{ series: 'moment', measured, massPower, norm: quantity(norm) }],
});

describe('moments of the vector correlator', () => {
  // First moments of hep-ph/0702103 and arXiv:0907.2110 (moments from memory); there α_s(M_Z) = 0.1189(20).
  test('charm: m_c(m_c) = 1.286(13) (hep-ph/0702103, abstract read), 1.279(13) (arXiv:0907.2110, from memory)', async () => {
    const problem = moment(quantity('0.2166', 0.0031, -2), -2, '1/4', quantity('0.1189', 0.002));
    const row = rowOf(extract(problem, await loadSeries('charm-moment-1'), {}), 'fixed-order');
    expect(Math.abs(Number(row.value) - 1.279)).toBeLessThan(0.002);
    expect(Math.abs(Number(row.value) - 1.286)).toBeLessThan(0.013);
    // The published error of the moment alone is 0.009.
    near(componentIn(row, 'measurement').plus, 0.009, 0.1);
  });

  test('bottom: m_b(m_b) = 4.163(16) (arXiv:0907.2110, abstract read), from the first moment', async () => {
    const problem = moment(quantity('0.004592', 0.000031, -2), -2, '1/16', quantity('0.1189', 0.002));
    const row = rowOf(extract(problem, await loadSeries('bottom-moment-1'), {}), 'fixed-order');
    expect(Math.abs(Number(row.value) - 4.163)).toBeLessThan(0.016);
  });

  test('the slope is that of m^−2n: a moment larger by 2 % is a mass lower by 1 %, and some for the coupling', async () => {
    const problem = moment(quantity('0.004592', 0.00009184, -2), -2, '1/16', quantity('0.1189', 0));
    const row = rowOf(extract(problem, await loadSeries('bottom-moment-1'), {}), 'fixed-order');
    const relative = Number(componentIn(row, 'measurement').minus) / Number(row.value);
    expect(relative).toBeGreaterThan(0.009);
    expect(relative).toBeLessThan(0.0101);
  });
});

describe('pole masses', () => {
  const top = (alphaS: Quantity): Problem => ({
    ...usual,
    for: 'pole-mass',
    mass: quantity('163.508', 0, 1),
    alphaS,
    data: [{ series: 'pole-msbar-nl5' }],
  });

  // M. Beneke, P. Marquard, P. Nason, M. Steinhauser, arXiv:1605.03609 (abstract read, numbers from memory): m_t(m_t) =
  // 163.508 GeV, α_s(M_Z) = 0.1181: terms 7.531, 1.607, 0.494, 0.194; remainder 0.250; ambiguity 0.071, massless.
  test('top: four loops, the principal value, the ambiguity', async () => {
    const result = extract(top(quantity('0.1181')), await loadSeries('pole-msbar-nl5'), {});
    expect(
      Math.abs(Number(rowOf(result, 'fixed-order').value) - (163.508 + 7.531 + 1.607 + 0.494 + 0.194)),
    ).toBeLessThan(0.003);
    const pv = rowOf(result, 'terminant');
    expect(Math.abs(Number(pv.value) - 173.584)).toBeLessThan(0.005);
    expect(Math.abs(Number(pv.ambiguity?.GeV) - 0.071)).toBeLessThan(0.0015);
    near(componentIn(pv, 'ambiguity').plus, Number(pv.ambiguity?.GeV), 1e-6);
    expect(pv.ambiguity?.dimension).toBe('1');
  });

  // Particle Data Group 2018, quark-mass review (recalled): m_b(m_b) = 4.18 GeV, two loops: 4.78(6) GeV.
  test('bottom at two loops', async () => {
    const problem: Problem = {
      ...top(quantity('0.1181')),
      mass: quantity('4.18', 0, 1),
      order: 2,
      prescriptions: ['fixed-order'],
    };
    const row = rowOf(extract(problem, await loadSeries('pole-msbar-heavy', { flavours: 5 }), {}), 'fixed-order');
    expect(Math.abs(Number(row.value) - 4.78)).toBeLessThan(0.005);
  });

  test('there and back is the identity', async () => {
    const series = await loadSeries('pole-msbar-nl5');
    const alphaS = quantity('0.1181');
    for (const name of ['fixed-order', 'terminant']) {
      const there = rowOf(extract({ ...top(alphaS), prescriptions: [name] }, series, {}), name);
      const back: Problem = {
        ...usual,
        for: 'mass',
        alphaS,
        prescriptions: [name],
        data: [{ series: 'pole-msbar-nl5', measured: quantity(there.value ?? '', 0, 1) }],
      };
      near(rowOf(extract(back, series, {}), name).value, 163.508, 1e-10);
    }
  });
});

describe('threshold masses', () => {
  test.each([
    ['ps', 2],
    ['rs', 2],
    ['rs-prime', 2],
    ['kinetic', 1],
    ['pole', undefined],
  ] as const)('%s: the extraction finds the m(m) that the conversion has', (definition, scale) => {
    const place = { definition, ...(scale === undefined ? {} : { scale }) };
    const alpha = { value: 0.118, scale: 91.1879, flavours: 5 };
    const there = convertMass({ mass: 4.186, from: { definition: 'msbar' }, to: place, alpha, light: 4 });
    if ('reason' in there) throw new Error(there.reason);
    // Made at another m(m), so that the coefficients have to follow.
    const reference = 4.3;
    const series = thresholdSeries({ place, light: 4 }, reference) as Series;
    const problem: Problem = {
      ...usual,
      for: 'mass',
      alphaS: quantity('0.118'),
      prescriptions: ['fixed-order'],
      data: [
        {
          series: definition,
          measured: quantity(String(there.value), 0.02, 1),
          threshold: { ...place, light: 4, reference },
        },
      ],
    };
    const result = standing(extract(problem, series, {}));
    near(rowOf(result, 'fixed-order').value, 4.186, 1e-9);
  });
});
