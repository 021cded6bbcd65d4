/**
 * Hypergeometric Borel transforms.
 * Check values: mpmath 1.2.1 (Meijer G, direct quadrature, Rayleigh–Ritz; 15 to 22 reliable digits as stated beside them).
 * Method: H. Mera, T. G. Pedersen, B. K. Nikolić, arXiv:1405.7956, 1802.06034 (abstract seen).
 */
import { describe, expect, it } from 'vitest';
import { C, exact, R, Rational } from '../../src/numerics/index.js';
import type { Ball, Exact } from '../../src/numerics/index.js';
import { fitRatios } from '../../src/borel/hypergeometric-fit.js';
import { hypergeometricSum, parameterBits } from '../../src/borel/hypergeometric-sum.js';
import type { HypergeometricSum } from '../../src/borel/hypergeometric-sum.js';
import { borelTransform } from '../../src/borel/transform.js';
import { expectNear, rational } from '../support/check-value.js';

const q = (s: string): Exact => exact(rational(s));

/** Ψ(x)·b_0 from coefficients c_n of Σ c_n x^n. */
function sum(c: readonly Exact[], x: string, prec = 110): HypergeometricSum {
  const fit = fitRatios(borelTransform(c));
  if (typeof fit === 'string') expect.fail(fit);
  const rough = fit.at(64);
  if (typeof rough === 'string') expect.fail(rough);
  const bits = parameterBits(rough, q(x).ball(64), prec);
  const h = fit.at(bits);
  if (typeof h === 'string') expect.fail(h);
  const s = hypergeometricSum(h, q(x).ball(bits), prec);
  if (s === undefined) expect.fail('undefined');
  const head = h.head.ball(bits);
  return { pv: R.mul(s.pv, head, bits), im: R.mul(s.im, head, bits), certified: s.certified };
}

/** z_n = (−1)^n (4n−1)!!/n! of ∫ dφ/√(2π) exp(−φ²/2 − gφ⁴). */
function phi4(count: number, sign: 1 | -1): Exact[] {
  const list = [Rational.ONE];
  for (let n = 1; n < count; n++) list.push(list[n - 1]!.mul(Rational.of(sign * (4 * n - 1) * (4 * n - 3), n)));
  return list.map((c) => exact(c));
}

const OSCILLATOR = [
  '3/4',
  '-21/8',
  '333/16',
  '-30885/128',
  '916731/256',
  '-65518401/1024',
  '2723294673/2048',
  '-1030495099053/32768',
].map(q);

describe('fit of the ratios', () => {
  it('finds the parameters of the zero-dimensional integral', () => {
    const fit = fitRatios(borelTransform(phi4(6, -1)));
    if (typeof fit === 'string') expect.fail(fit);
    const h = fit.at(100);
    if (typeof h === 'string') expect.fail(h);
    const real = (list: readonly { re: Ball }[]): number[] => list.map((z) => R.toNumber(z.re)).sort((a, b) => a - b);
    // B = 2F1(1/4, 3/4; 1; −16 t): the smallest system that explains all ratios has no spare pair of parameters.
    expect(real(h.upper)).toEqual([0.25, 0.75]);
    expect(real(h.lower)).toEqual([1]);
    expect(R.toNumber(h.K)).toBe(-16);
    expect(fit.explained).toBe(true);
  });
  it('agrees between exact ratios and enclosed ones', () => {
    const c = borelTransform(OSCILLATOR.slice(0, 6));
    const hidden = c.map((x): Exact => ({ ball: (prec) => x.ball(prec) }));
    const [a, b] = [fitRatios(c), fitRatios(hidden)];
    if (typeof a === 'string' || typeof b === 'string') expect.fail('no fit');
    const [p, r] = [a.at(120), b.at(120)];
    if (typeof p === 'string' || typeof r === 'string') expect.fail('no parameters');
    p.upper.forEach((z, i) => expect(C.overlaps(z, r.upper[i]!)).toBe(true));
    expect(R.overlaps(p.K, r.K)).toBe(true);
    expect(R.accuracyBits(r.K)).toBeGreaterThan(80);
  });
  it('refuses a vanishing coefficient', () => {
    expect(typeof fitRatios([exact(1), exact(0), exact(2)])).toBe('string');
  });
});

describe('sums', () => {
  it('the Euler series: a single pole, two coinciding parameters', () => {
    const s = sum([exact(1), exact(-1)], '1');
    expectNear(s.pv, '0.596347362323194074341078499369279376', 1e-30);
    expect(s.certified).toBe(false);
  });
  it('the zero-dimensional integral, exactly, and certified', () => {
    const known: [string, string][] = [
      ['0.1', '0.857608585344411597854417516946'],
      ['1', '0.620282559595264943403029113284'],
    ];
    for (const [g, value] of known) {
      const s = sum(phi4(6, -1), g);
      expectNear(s.pv, value, 1e-20);
      expect(s.certified).toBe(true);
      expect(R.accuracyBits(s.pv)).toBeGreaterThan(100);
    }
  });
  it('the same from four coefficients only', () => {
    // Three ratios: the two-parameter fit with upper parameters 1 and 0.2389… (22 reliable digits).
    const c = phi4(4, -1);
    const s = sum(c, '1');
    expectNear(s.pv, '0.621169668727289558508212473764', 1e-20);
  });
  it('on the cut: principal value and upper imaginary part', () => {
    const s = sum(phi4(6, 1), '0.05');
    expectNear(s.pv, '1.12876086049957099246410326517296610', 1e-15);
    expectNear(s.im, '0.183948168177256347221757285822712860', 1e-15);
  });
  it('the anharmonic oscillator: (E − 1/2)/g by N ratios', () => {
    const known: [string, number, string][] = [
      ['0.1', 1, '0.558432789323283590573269578'],
      ['0.1', 3, '0.559221379837175291762847920'],
      ['0.1', 5, '0.559145618142617816235703949'],
      ['0.1', 7, '0.559146343766161004594223364'],
      ['1', 1, '0.768637378067312420813168144'],
      ['1', 3, '0.834255257172938451845529931'],
      ['1', 5, '0.803025608237535678517218413'],
      ['1', 7, '0.803815893577957088584343260'],
    ];
    for (const [g, N, value] of known) {
      const s = sum(OSCILLATOR.slice(0, N + 1), g);
      const energy = R.add(q('1/2').ball(200), R.mul(q(g).ball(200), s.pv, 200), 200);
      expectNear(energy, value, 1e-14);
    }
  });
  it('a small imaginary part keeps its relative digits; the largest |y| takes the divergent series', () => {
    // b_n = 1: pole at t = 1, Im = π ω e^{−ω}.
    const small = sum([exact(1), exact(1)], '1/60');
    expect(Math.abs(R.toNumber(small.im) / (Math.PI * 60 * Math.exp(-60)) - 1)).toBeLessThan(1e-12);
    const tiny = sum([exact(1), exact(-1)], '1/2000');
    expectNear(tiny.pv, '0.999500499251496261210781794774', 1e-17);
  });
  it('does not see a common factor, and scales with x', () => {
    const a = sum(
      phi4(6, 1).map((c) => exact(c.rational!.mul(Rational.of(7)))),
      '0.05',
    );
    const b = sum(phi4(6, 1), '0.05');
    expect(R.overlaps(a.pv, R.mul(b.pv, R.fromNumber(7), 200))).toBe(true);
    const moved = sum(
      phi4(6, 1).map((c, n) => exact(c.rational!.mul(Rational.of(3).pow(n)))),
      '0.05/3',
    );
    expect(R.overlaps(moved.pv, b.pv)).toBe(true);
    expect(R.overlaps(moved.im, b.im)).toBe(true);
  });
});
