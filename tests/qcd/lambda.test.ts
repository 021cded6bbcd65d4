import { describe, expect, it } from 'vitest';
import { alphaOfLambda, evolveAlpha, expandedAlpha, flowOf, isRefusal, lambdaOf } from '../../src/qcd/index.js';

const number = (x: unknown): number => (typeof x === 'number' ? x : NaN);
const close = (x: unknown, y: number, relative: number): void =>
  expect(Math.abs(number(x) / y - 1)).toBeLessThanOrEqual(relative);

describe('Λ_MSbar', () => {
  // Check values computed with mpmath 1.2.1: quadrature of the stable integrand, 36 digits.
  it('follows the exact definition', () => {
    close(lambdaOf(0.225, 4.18, { flavours: 4, loops: 4 }), 0.2911779172729683, 4e-15);
    close(lambdaOf(0.3017915663785547, 2, { flavours: 4, loops: 4 }), 0.2911779172729683, 4e-15);
  });

  it('is inverted by alphaOfLambda for every n_f and loop order', () => {
    for (let flavours = 0; flavours <= 16; flavours++) {
      for (let loops = 1; loops <= 5; loops++) {
        for (const alpha of [0.02, 0.118, 0.3, 0.6]) {
          const lambda = lambdaOf(alpha, 3, { flavours, loops });
          // Couplings beyond an infrared fixed point (many flavours) are refused.
          if (isRefusal(lambda)) expect(flavours).toBeGreaterThanOrEqual(10);
          // Λ of an almost conformal theory may leave the range of doubles.
          else if (lambda > 1e-290) close(alphaOfLambda(lambda, 3, { flavours, loops }), alpha, 3e-13);
        }
      }
    }
  });

  it('does not depend on the scale at which α_s is taken', () => {
    const theory = { flavours: 5, loops: 5 };
    const lambda = number(lambdaOf(0.118, 91.1879, theory));
    for (const scale of [5, 20, 1000, 1e6, 1e16]) {
      const alpha = number(evolveAlpha({ alpha: 0.118, from: 91.1879, to: scale, ...theory }));
      close(lambdaOf(alpha, scale, theory), lambda, 2e-13);
    }
  });

  it('approaches the asymptotic definition at high scales and differs at low ones', () => {
    for (let loops = 2; loops <= 5; loops++) {
      const exact = { flavours: 3, loops };
      const asymptotic = { ...exact, definition: 'asymptotic' as const };
      const high = number(lambdaOf(0.02, 1, asymptotic)) / number(lambdaOf(0.02, 1, exact)) - 1;
      const low = number(lambdaOf(0.3, 1, asymptotic)) / number(lambdaOf(0.3, 1, exact)) - 1;
      expect(Math.abs(high)).toBeLessThan(loops === 2 ? 0.1 : 1e-2);
      if (loops > 2) expect(Math.abs(low)).toBeGreaterThan(Math.abs(high));
      expect(Math.abs(low)).toBeLessThan(0.15);
      const lambda = number(lambdaOf(0.25, 2, asymptotic));
      close(alphaOfLambda(lambda, 2, asymptotic), 0.25, 1e-12);
    }
  });

  it('refuses what has no answer', () => {
    expect(isRefusal(lambdaOf(-0.1, 1, { flavours: 3, loops: 4 }))).toBe(true);
    expect(isRefusal(lambdaOf(0.1, 1, { flavours: 17, loops: 4 }))).toBe(true);
    expect(isRefusal(lambdaOf(0.1, 1, { flavours: 3.5, loops: 4 }))).toBe(true);
    expect(isRefusal(lambdaOf(0.1, 1, { flavours: 3, loops: 6 }))).toBe(true);
    expect(isRefusal(alphaOfLambda(0.3, 0.3, { flavours: 3, loops: 4 }))).toBe(true);
    expect(isRefusal(alphaOfLambda(0.3, 0.3, { flavours: 3, loops: 4, definition: 'asymptotic' }))).toBe(true);
    expect(isRefusal(alphaOfLambda(0.3, 0, { flavours: 3, loops: 4 }))).toBe(true);
  });

  it('the expansion in 1/ln(μ²/Λ²) misses terms of the next order only', () => {
    for (const flavours of [3, 5]) {
      for (const loops of [2, 3, 4, 5] as const) {
        const flow = flowOf(flavours, loops);
        const gap = (log: number): number => {
          const exact = number(alphaOfLambda(1, Math.exp(log / 2), { flavours, loops }));
          return Math.abs(expandedAlpha(flow, log) - exact) / (Math.log(log) ** loops / (flow.b0 * log) ** (loops + 1));
        };
        // The ratio to ln^n L/L^(n+1) stays bounded as L grows.
        expect(gap(300)).toBeLessThan(20);
        expect(gap(1200) / gap(300)).toBeLessThan(4);
      }
    }
  });
});
