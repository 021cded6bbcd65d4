/**
 * Moments of other weights: w = 1 and w = (1 − x)², α_s(m_τ) = 0.34, n_f = 3, four-loop running, five terms with c_5 = 283.
 * Values: mpmath 1.2.1 at 40 digits (Taylor steps of the running, Gauss–Legendre quadrature), 28 reliable digits.
 */
import { describe, expect, test } from 'vitest';
import { R } from '../../src/numerics/index.js';
import type { Ball } from '../../src/numerics/index.js';
import { terms } from '../../src/prescriptions/index.js';
import { contourSum } from '../../src/contour/index.js';
import { contourIntegrals, improvedTerms } from '../../src/contour/improved.js';
import { expectNear } from '../support/check-value.js';
import { contourOf, standing } from '../support/contour.js';

const sum = (list: readonly Ball[]): Ball => list.reduce<Ball>((s, t) => R.add(s, t, 200), R.ZERO);

describe.each([
  {
    weight: ['1'],
    coefficients: [
      '2',
      '7.77964240979396952947137975947',
      '22.4405049565981589668203104797',
      '20.0707592604958625057098279923',
      '-292.258830155187790457123380510',
    ],
    fixed: '0.334431705458031242424947334526',
    improved: '0.313153513375280984802622644231',
  },
  {
    weight: ['1', '-2', '1'],
    coefficients: [
      '0.666666666666666666666666666667',
      '3.84321413659798984315712658649',
      '22.9894435533307371230015504148',
      '142.759860103628477710703406165',
      '959.950009224738881339495729213',
    ],
    fixed: '0.180144047090361030397389114827',
    improved: '0.174795360784654870851200974994',
  },
])('w = $weight', ({ weight, coefficients, fixed, improved }) => {
  test('fixed order, contour improved, and both in doubles', async () => {
    const e = await contourOf('tau-contour-estimate', '0.34', { weight, loops: 'four' });
    coefficients.forEach((c, n) => expectNear(e.coefficients[n]!.ball(200), c, 1e-26));
    expectNear(sum(terms(e, 200)), fixed, 1e-27);
    expectNear(sum(improvedTerms(e.contour, standing(contourIntegrals(e.contour, e.x, 28)), 200)), improved, 1e-26);
    expect(Number(contourSum(e, 'fixed-order', 0.34))).toBeCloseTo(Number(fixed), 14);
    expect(Number(contourSum(e, 'contour-improved', 0.34))).toBeCloseTo(Number(improved), 14);
  });
});
