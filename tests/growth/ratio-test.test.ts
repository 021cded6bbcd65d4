/**
 * Ratio test and its extrapolants: C. Domb and M. F. Sykes, Proc. R. Soc. Lond. A 240 (1957) 214 (from memory).
 * Check values for B(u) = (1−2u)^−1.3951 and for the mixed series
 * B(u) = (1−2u)^−1.3951 + 0.3(1−2u)^−0.3951 + 0.5(1−u/1.5)^−1.8 + 0.1(1+u)^−1.2: own recursion, 30 reliable digits,
 * computed with mpmath 1.2.1 and PARI/GP 2.15.2.
 */
import { describe, expect, it } from 'vitest';
import { logStrengths } from '../../src/growth/axis-fit.js';
import { linearSigma, ratioRows, ratios } from '../../src/growth/ratio-test.js';
import { statedError } from '../../src/growth/measured.js';
import { readTerms, type Point } from '../../src/growth/reading.js';
import { doubleArithmetic, extrapolate, richardsonWeights } from '../../src/growth/richardson.js';
import { fromBorel, input, lnGamma, power } from './generate.js';

const GAMMA = 1.3951;

function mixed(count: number): number[] {
  const parts = [
    [1, 0.5, GAMMA],
    [0.3, 0.5, GAMMA - 1],
    [0.5, 1.5, 1.8],
    [0.1, -1, 1.2],
  ] as const;
  const columns = parts.map(([a, t, g]) => power(t, g, count).map((v) => a * v));
  return columns[0]!.map((_, n) => columns.reduce((s, c) => s + c[n]!, 0));
}

function points(b: readonly number[]): readonly Point[] {
  const reading = readTerms(input(fromBorel(b)));
  if (reading.kind !== 'series') throw new Error(reading.kind);
  return reading.sequence.points;
}

describe('ratios and linear extrapolants', () => {
  it('are exact for a pure power', () => {
    const rows = ratioRows(points(power(0.5, GAMMA, 8)), 1);
    const d = [2.7902, 2.3951, 2.2634, 2.19755, 2.15804, 2.1317, 2.1128857142857145];
    rows.forEach((r, i) => expect(r.ratio).toBeCloseTo(d[i]!, 12));
    for (const r of rows.slice(1)) expect(r.linear).toBeCloseTo(2, 11);
    expect(5 * (rows[4]!.ratio / 2 - 1) + 1).toBeCloseTo(GAMMA, 11);
  });

  it.each([
    [6, 2.1189422873082098, 1.9215307369007693, 1.1298367517774668],
    [12, 2.069576764200364, 1.9971908450402402, 1.9181872779007831],
    [24, 2.0338986741421627, 2.0004868880472286, 1.9999072359103947],
  ])('mixed series, %i coefficients', (count, last, linear, quadratic) => {
    const rows = ratioRows(points(mixed(count)), 1);
    const [a, b] = [rows.at(-1)!, rows.at(-2)!];
    expect(a.ratio).toBeCloseTo(last, 11);
    expect(a.linear).toBeCloseTo(linear, 10);
    const n = a.n;
    expect((n * a.linear! - (n - 2) * b.linear!) / 2).toBeCloseTo(quadratic, 9);
    // The method error is half the last change.
    expect(a.linearError).toBeCloseTo(Math.abs(a.linear! - b.linear!) / 2, 10);
  });

  it('propagates errors of the coefficients: b = 1, 2.7, 7.0(0.05), 17.5(0.6) gives 2.3148 ± 0.2726', () => {
    const d3 = 17.5 / 7;
    const d2 = 7 / 2.7;
    expect(3 * d3 - 2 * d2).toBeCloseTo(2.314814814814815, 12);
    expect(linearSigma(3, d3, d2, [0.6 / 17.5, 0.05 / 7, 0])).toBeCloseTo(0.2726395844691529, 12);
  });

  it('steps over the zeros of a lacunary series', () => {
    const terms = fromBorel([1, 0, 1, 0, 1, 0, 1, 0, 1]);
    const reading = readTerms(input(terms));
    if (reading.kind !== 'series') throw new Error(reading.kind);
    expect(reading.sequence.stride).toBe(2);
    const rows = ratioRows(reading.sequence.points, 2);
    expect(rows.map((r) => r.n)).toEqual([2, 4, 6, 8]);
    for (const r of rows) expect(r.ratio).toBeCloseTo(1, 11);
  });
});

describe('Richardson extrapolation', () => {
  const seq = ratios(points(mixed(24)), 1);

  it.each([
    [1, 2.0000845659863065],
    [2, 2.015586375109671],
    [3, 1.8913884862494075],
    [4, 2.5946697688491995],
    [5, -0.7544037507407239],
    [6, 13.263722905079062],
  ])('R_%i(12) of the mixed series', (m, wanted) => {
    const w = richardsonWeights(12 + m, m);
    const value = w.reduce((s, v, k) => s + v * seq[12 + k]!, 0);
    expect(Math.abs(value - wanted)).toBeLessThan(1e-9 * 10 ** m);
  });

  it('stops before the alternating admixture is amplified', () => {
    const s = seq.slice(1) as number[];
    const found = extrapolate(s, 23, doubleArithmetic, 8, () => 0)!;
    expect(Math.abs(found.limit.value - 2)).toBeLessThan(statedError(found.limit));
    expect(statedError(found.limit)).toBeLessThan(0.01);
    expect(found.order).toBeLessThan(6);
  });

  it('removes every power of 1/n that is there, exactly', () => {
    const s = Array.from({ length: 12 }, (_, i) => 3 + 2 / (i + 1) - 5 / (i + 1) ** 2 + 1 / (i + 1) ** 3);
    const found = extrapolate(s, 12, doubleArithmetic, 6, () => 0)!;
    expect(found.order).toBeGreaterThanOrEqual(3);
    expect(found.limit.value).toBeCloseTo(3, 9);
  });
});

describe('running strength', () => {
  it('N_n = b_n t*^n n!/(γ)_n tends to the strength 1 of the mixed series', () => {
    const wanted = [
      1.9, 1.2569923302989032, 1.153037825258371, 1.0568671098580977, 1.042797594970064, 1.0239049883622953,
      1.0210190811454989, 1.0160306176993852,
    ];
    const running = logStrengths(points(mixed(8)), 1, Math.log(0.5), GAMMA);
    const linear: number[] = [];
    running.forEach(({ k, value }, i) => {
      expect(Math.exp(value + lnGamma(GAMMA))).toBeCloseTo(wanted[i]!, 10);
      if (i > 0) linear.push(k * wanted[i]! - (k - 1) * wanted[i - 1]!);
    });
    expect(linear.at(-1)).toBeCloseTo(0.9860998370227031, 10);
  });
});
