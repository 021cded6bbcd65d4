/**
 * The hadronic width of the τ lepton, δ^(0): M. Beneke, M. Jamin, JHEP 09 (2008) 044, arXiv:0806.3156 (abstract read; its
 * numbers from memory, all re-derived). Inputs α_s(m_τ) = 0.34, n_f = 3, four-loop running, c_5 = 283.
 * Longer values: mpmath 1.2.1 at 40 digits, Taylor steps of the running and Gauss–Legendre quadrature, 28 reliable digits.
 */
import { describe, expect, test } from 'vitest';
import { R, toNumberExact } from '../../src/numerics/index.js';
import type { Ball } from '../../src/numerics/index.js';
import { terms } from '../../src/prescriptions/index.js';
import { contourSum } from '../../src/contour/index.js';
import { contourIntegrals, improvedTerms } from '../../src/contour/improved.js';
import { couplingsOnCircle } from '../../src/contour/circle.js';
import { fittedModel } from '../../src/contour/answer-borel.js';
import { contourBorel } from '../../src/contour/borel.js';
import { modelAt } from '../../src/contour/model.js';
import { pi } from '../../src/numerics/index.js';
import { expectNear } from '../support/check-value.js';
import { contourOf, standing } from '../support/contour.js';

const five = await contourOf('tau-contour-estimate', '0.34', { loops: 'four' });
const model = await contourOf('tau-contour-model', '0.34');
const fixed = terms(five, 200);
const improved = improvedTerms(five.contour, standing(contourIntegrals(five.contour, five.x, 28)), 200);
const sums = (list: readonly Ball[]): Ball[] => {
  let total: Ball = R.ZERO;
  return list.map((t) => (total = R.add(total, t, 200)));
};
const published = (b: Ball, text: string): void => expect(R.toNumber(b).toFixed(4)).toBe(text);

describe('fixed order', () => {
  test('coefficients 1, 5.202, 26.37, 127.1, 307.8 + c_5 (published); mpmath 1.2.1', () => {
    [
      '1',
      '5.20232120489698476473568987973',
      '26.3659289744869978241746745075',
      '127.078620943025365846349810411',
      '590.782544196892119103071472552',
    ].forEach((c, n) => expectNear(five.coefficients[n]!.ball(200), c, 1e-26));
  });

  test('terms 0.1082, 0.0609, 0.0334, 0.0174, 0.0088; sums 0.2200, 0.2288 (published)', () => {
    ['0.1082', '0.0609', '0.0334', '0.0174', '0.0088'].forEach((t, n) => published(fixed[n]!, t));
    published(sums(fixed)[3]!, '0.2200');
    published(sums(fixed)[4]!, '0.2288');
    expectNear(sums(fixed)[4]!, '0.228785711647652475412415338381', 1e-27);
  });
});

describe('contour improved', () => {
  test('terms 0.1479, 0.0297, 0.0122, 0.0086, 0.0038; sums 0.1984, 0.2021 (published)', () => {
    ['0.1479', '0.0297', '0.0122', '0.0086', '0.0038'].forEach((t, n) => published(improved[n]!, t));
    published(sums(improved)[3]!, '0.1984');
    published(sums(improved)[4]!, '0.2021');
    expectNear(sums(improved)[4]!, '0.202144642919184139157135009882', 1e-26);
  });

  test('the coupling at s = s_0 and the integrals A_n (mpmath 1.2.1)', () => {
    const [end] = standing(couplingsOnCircle(five.contour, five.x, [pi(200)], 160));
    expectNear(end!.re, '0.0586629402447304536230694643870476848', 1e-28);
    expectNear(end!.im, '-0.0495867491594023283794841092567552637', 1e-28);
    const A = standing(contourIntegrals(five.contour, five.x, 28));
    [
      '0.147898391792480581335992118760357195',
      '0.0181009564740805972116883952098618539',
      '0.00191264354913649077957108485313898507',
      '0.000175079142311096983143351053604177994',
      '0.0000133791789900983551200815499654137559',
    ].forEach((a, n) => expectNear(A[n]!, a, 1e-27));
  });

  test('in doubles to 1e-14', () => {
    expect(Number(contourSum(five, 'contour-improved', 0.34))).toBeCloseTo(0.2021446429191841, 14);
    expect(Number(contourSum(five, 'fixed-order', 0.34))).toBeCloseTo(0.2287857116476525, 14);
  });
});

describe('their Borel model', () => {
  const fit = fittedModel(model.contour, 5, 300)!;
  const borel = standing(contourBorel(model.contour, model.x, modelAt(fit.fit, fit.singularities), 25));

  test('Borel sum 0.2371 ± 0.0060 i, the imaginary part not divided by π (published)', () => {
    published(borel.pv, '0.2371');
    published(borel.imaginary, '0.0060');
    expectNear(borel.pv, '0.237091306606573623306105478474', 1e-23);
    expectNear(borel.imaginary, '0.00601063985795794305438069944341', 1e-23);
  });

  test('the contour-improved series has the sum 0.18886 of its own, separation 0.0482 (quadrature, mpmath 1.3.0)', () => {
    expectNear(borel.improved, '0.18885599383478848580581321', 1e-23);
    expect(R.toNumber(R.sub(borel.pv, borel.improved, 80)).toFixed(4)).toBe('0.0482');
  });

  test('partial sums to order 12: fixed order comes to the Borel sum, contour improved does not', () => {
    const A = standing(contourIntegrals(model.contour, model.x, 15));
    const ci = sums(improvedTerms(model.contour, A, 200)).map(R.toNumber);
    const fo = sums(terms(model, 200)).map(R.toNumber);
    // mpmath 1.2.1.
    const wanted = [
      [0.108225361302489, 0.147898391792481],
      [0.169158738857086, 0.177580724047595],
      [0.20258056770478, 0.1897662038001535],
      [0.220014231667135, 0.198358335264986],
      [0.228785711647652, 0.202144642919184],
      [0.232751664461816, 0.204535142338465],
      [0.2342055252553205, 0.204554056858],
      [0.235323246299212, 0.201726068731292],
      [0.236721354308005, 0.200440611396491],
      [0.239006872715211, 0.184244580991602],
      [0.240238359221161, 0.196195331274109],
      [0.2436160128100236, 0.112330543513502],
    ] as const;
    wanted.forEach(([f, c], n) => {
      expect(fo[n]).toBeCloseTo(f, 11);
      expect(ci[n]).toBeCloseTo(c, 10);
    });
    const nearest = (list: readonly number[]): number =>
      Math.min(...list.map((x) => Math.abs(x - R.toNumber(borel.pv))));
    expect(nearest(fo)).toBeLessThan(0.0005);
    expect(nearest(ci)).toBeGreaterThan(0.03);
  });

  test('at α_s = 0.3156: 0.2042 ± 0.0029 i (mpmath 1.2.1)', async () => {
    const e = await contourOf('tau-contour-model', '0.3156');
    const at = standing(contourBorel(e.contour, e.x, modelAt(fit.fit, fit.singularities), 12));
    expect(R.toNumber(at.pv)).toBeCloseTo(0.20419928, 8);
    expect(R.toNumber(at.imaginary)).toBeCloseTo(0.00290071, 8);
    expect(toNumberExact(e.x)).toBeCloseTo(0.3156 / Math.PI, 14);
  });
});
