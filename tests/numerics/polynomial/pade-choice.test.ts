/**
 * Exact or ball arithmetic: the answer of padePoles does not depend on which one is used. Up to [24/24] both ways are gone and must meet; at
 * [100/100], and with LEASTTERM_TEST_MULTIPLIER above 1 at [200/200], the result is held against coefficients of the series.
 */
import { describe, expect, test } from 'vitest';
import * as C from '../../../src/numerics/ball/complex.js';
import type { Complex } from '../../../src/numerics/ball/complex.js';
import * as R from '../../../src/numerics/ball/real.js';
import type { Ball } from '../../../src/numerics/ball/real.js';
import { exact } from '../../../src/numerics/exact.js';
import type { Rational } from '../../../src/numerics/rational.js';
import { borelSeries } from './random.js';
import { certifiedRoots, padeExact, padePoles, partialFractions } from '../../../src/numerics/polynomial/index.js';
import type { Pole } from '../../../src/numerics/polynomial/index.js';

describe('both ways to the same poles', () => {
  test.each([
    [3, 3],
    [8, 8],
    [8, 9],
    [9, 8],
    [12, 12],
    [5, 14],
    [15, 6],
    [24, 24],
  ])('[%i/%i]', (L, M) => {
    const prec = 120;
    const b = borelSeries(L + M + 1);
    const chosen = padePoles(b.map(exact), L, M, prec);
    // Wrapped, the coefficients are not seen to be rational: balls at every order.
    const balls = padePoles(
      b.map((x) => ({ ball: (bits: number) => R.fromRational(x, bits) })),
      L,
      M,
      prec,
    );
    const entry = padeExact(b, L, M);
    if (chosen.exists !== true || balls.exists !== true || !entry.exists) throw new Error('an entry is missing');
    const found = certifiedRoots(entry.denominator, prec + 40);
    if ('failed' in found) throw new Error(found.failed);
    const bits = prec + 400;
    const enclosed = (p: readonly Rational[]): Ball[] => p.map((x) => R.fromRational(x, bits));
    const parts = partialFractions(enclosed(entry.numerator), enclosed(entry.denominator), found.roots, bits);
    for (const other of [balls.poles, parts.poles]) {
      expect(other.length).toBe(chosen.poles.length);
      for (const pole of chosen.poles) {
        const twin = other.find((x) => C.overlaps(x.position, pole.position));
        expect(twin, JSON.stringify(C.toNumbers(pole.position))).toBeDefined();
        expect(twin!.real).toBe(pole.real);
        expect(C.overlaps(twin!.amplitude, pole.amplitude)).toBe(true);
      }
    }
  });
});

const ORDERS = Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? '1') > 1 ? [100, 200] : [100];

test.each(ORDERS)('[%i/…]: coefficients come back from certified poles', (N) => {
  const prec = 100;
  const b = borelSeries(2 * N + 1);
  const found = padePoles(b.map(exact), N, N, prec);
  if (found.exists !== true) throw new Error(found.reason);
  expect(found.poles.length).toBe(N);
  for (const p of found.poles) expect(C.accuracyBits(p.position)).toBeGreaterThanOrEqual(prec);
  // b_k = a_k + Σ A ζ^−k for simple poles A/(1 − t/ζ)
  for (const k of [0, 1, 7]) {
    let sum: Complex = C.fromReal(found.polynomial[k] ?? R.ZERO);
    for (const p of found.poles) sum = C.add(sum, coefficient(p, k, 3 * prec), 3 * prec);
    expect(R.containsRational(sum.re, b[k]!)).toBe(true);
    expect(R.containsZero(sum.im)).toBe(true);
    expect(R.accuracyBits(sum.re)).toBeGreaterThan(prec / 2);
  }
});

function coefficient(p: Pole, k: number, prec: number): Complex {
  let value = p.amplitude;
  for (let i = 0; i < k; i++) value = C.div(value, p.position, prec);
  return value;
}
