/**
 * Pairs and competitors.
 * Complex pair: G. N. Mercer and A. J. Roberts, SIAM J. Appl. Math. 50 (1990) 1547 (from memory; sequences re-derived).
 * D-log Padé: G. A. Baker, Phys. Rev. 124 (1961) 768 (from memory).
 * Check values: own evaluation, 30 reliable digits, computed with mpmath 1.2.1 and PARI/GP 2.15.2.
 */
import { describe, expect, it } from 'vitest';
import { dlogPoles } from '../../src/growth/dlog.js';
import { fixedStrengths } from '../../src/growth/fixed-strengths.js';
import { readTerms } from '../../src/growth/reading.js';
import { complexPair, mercerRoberts, realPositions, recurrence } from '../../src/growth/two-root.js';
import { fromBorel, input, power } from './generate.js';

/** 2 Re[e^{0.4 i}(0.8 e^{0.9 i})^(−n) (1.3)_n/n!]. */
const pair = power(0.8, 1.3, 40).map((v, n) => 2 * v * Math.cos(0.4 - 0.9 * n));

describe('complex pair', () => {
  const rows = recurrence(pair);

  it('B_30 and cos θ_30', () => {
    const m = mercerRoberts(rows.find((r) => r.k === 30)!)!;
    expect(m.b).toBeCloseTo(1.2622675899547178, 9);
    expect(m.cos).toBeCloseTo(0.6213268930718269, 9);
  });

  it('straight lines over k = 20 … 38', () => {
    const at = rows.filter((r) => r.k >= 20 && r.k <= 38);
    const line = (x: readonly number[], y: readonly number[]): [number, number] => {
      const n = x.length;
      const [sx, sy] = [x.reduce((a, b) => a + b), y.reduce((a, b) => a + b)];
      const sxx = x.reduce((a, b) => a + b * b, 0);
      const sxy = x.reduce((a, b, i) => a + b * y[i]!, 0);
      const slope = (n * sxy - sx * sy) / (n * sxx - sx * sx);
      return [(sy - slope * sx) / n, slope];
    };
    const [c0, c1] = line(
      at.map((r) => 1 / r.k),
      at.map((r) => mercerRoberts(r)!.b),
    );
    expect(1 / c0).toBeCloseTo(0.8000473743023926, 9);
    expect(1 + c1 / c0).toBeCloseTo(1.301948388471214, 8);
    const [cos] = line(
      at.map((r) => 1 / r.k ** 2),
      at.map((r) => mercerRoberts(r)!.cos),
    );
    expect(cos).toBeCloseTo(0.6216575080292457, 9);
  });

  it('the fit covers modulus, angle and exponent', () => {
    const fit = complexPair(rows)!;
    expect(Math.abs(fit.modulus.value - 0.8)).toBeLessThan(fit.modulus.error);
    expect(Math.abs(fit.cosine.value - Math.cos(0.9))).toBeLessThan(fit.cosine.error);
    expect(Math.abs(fit.exponent.value - 1.3)).toBeLessThan(fit.exponent.error);
    expect(fit.modulus.error).toBeLessThan(0.005);
    expect(fit.cosine.error).toBeLessThan(0.01);
  });

  it('is rejected for two real poles', () => {
    const real = power(2, 1, 30).map((v, n) => 3 * v + 0.5 * (n % 2 === 0 ? 1 : -1));
    expect(complexPair(recurrence(real))).toBeUndefined();
  });
});

describe('competing real singularities', () => {
  it('the recurrence is exact for two poles', () => {
    const b = [0, 1, 2, 3, 4, 5].map((n) => 3 * 2 ** -n + 0.5 * (-1) ** n);
    const [near, far] = realPositions(recurrence(b).find((r) => r.k === 4)!)!;
    expect(near).toBeCloseTo(-1, 11);
    expect(far).toBeCloseTo(2, 11);
  });

  const far = power(2, 2.58, 6);
  const branch = power(-1, 1.21, 6).map((v, n) => -0.02 * v + 3 * far[n]!);

  it('and strongly biased for branch points', () => {
    const [near, other] = realPositions(recurrence(branch).find((r) => r.k === 4)!)!;
    expect(near).toBeCloseTo(1.4585036498101107, 9);
    expect(other).toBeCloseTo(-17.214372674668116, 5);
  });

  it('with fixed positions and exponents the last two coefficients give the strengths', () => {
    const reading = readTerms(input(fromBorel(branch)));
    if (reading.kind !== 'series') throw new Error(reading.kind);
    const p = reading.sequence.points;
    const s = fixedStrengths({ t: -1, exponent: 1.21 }, { t: 2, exponent: 2.58 }, [p[4]!, p[5]!])!;
    expect(s.first).toBeCloseTo(-0.02, 11);
    expect(s.second).toBeCloseTo(3, 11);
    expect(s.condition).toBeGreaterThan(1);
  });
});

describe('D-log Padé', () => {
  it('[0/1] is exact for a single power', () => {
    const [pole] = dlogPoles(power(0.5, 1.3951, 4), 0, 1)!;
    expect(pole!.position.re).toBeCloseTo(0.5, 12);
    expect(pole!.exponent.re).toBeCloseTo(1.3951, 12);
  });

  const parts = [power(0.5, 0.3951, 8), power(1.5, 1.8, 8), power(-1, 1.2, 8)];
  const mixed = power(0.5, 1.3951, 8).map(
    (v, n) => v + 0.3 * parts[0]![n]! + 0.5 * parts[1]![n]! + 0.1 * parts[2]![n]!,
  );

  it.each([
    [1, 1, 0.5184619513312096, 1.2643517655565777],
    [1, 2, 0.4601923275977485, 0.9326372490054841],
    [2, 2, 0.4617501995107191, 0.9425146968762286],
    [2, 3, 0.4599524265970776, 0.9316738191470932],
    [3, 3, 0.5304823611865876, 3.349630689786679],
  ])('[%i/%i] of the mixed series, pole nearest 1/2', (L, M, position, exponent) => {
    const poles = dlogPoles(mixed, L, M)!;
    const pole = [...poles].sort((a, b) => Math.abs(a.position.re - 0.5) - Math.abs(b.position.re - 0.5))[0]!;
    expect(pole.position.re).toBeCloseTo(position, 8);
    expect(pole.exponent.re).toBeCloseTo(exponent, 6);
  });
});
