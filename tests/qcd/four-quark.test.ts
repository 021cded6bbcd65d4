/** Four-quark operators at u = −1: published eigenvalues, invariants of the matrix, exponents of the Adler function and of R. */
import { describe, expect, test } from 'vitest';
import { currentUltraviolet, fourQuarkShifts } from '../../src/qcd/index.js';

describe('anomalous dimensions', () => {
  // M. Beneke, V. M. Braun, N. Kivel, hep-ph/9703389 (numbers for n_f = 3 from memory); n_f = 4, 5: numpy 1.24, eigvals.
  test.each([
    [3, [0.379, 0.126, -0.332, -0.753]],
    [4, [0.4865, 0.1396, -0.3019, -0.791]],
    [5, [0.6301, 0.1549, -0.2752, -0.8431]],
  ])('n_f = %d', (flavours, wanted) => {
    fourQuarkShifts(flavours).forEach((x, i) => expect(Math.abs(x - wanted[i]!)).toBeLessThan(6e-4));
  });

  // Trace 8 n_f/3 − 166/9, determinant 11264/9 for any n_f: sympy 1.11.
  test.each([1, 2, 3, 4, 5, 6])('trace and determinant of the matrix, n_f = %d', (flavours) => {
    const gammas = fourQuarkShifts(flavours).map((x) => x * 2 * (11 - (2 * flavours) / 3));
    expect(gammas.reduce((a, b) => a + b, 0)).toBeCloseTo((8 * flavours) / 3 - 166 / 9, 9);
    expect(gammas.reduce((a, b) => a * b, 1) / (11264 / 9)).toBeCloseTo(1, 9);
  });
});

describe('exponents', () => {
  // n! n^1.59 for the Adler function with three flavours: hep-ph/9703389, from memory.
  test('the Adler function and R differ by one power', () => {
    expect(currentUltraviolet(3, 'correlator') - 1).toBeCloseTo(1.588, 3);
    expect(currentUltraviolet(4, 'correlator') - 1).toBeCloseTo(1.747, 3);
    expect(currentUltraviolet(5, 'correlator') - 1).toBeCloseTo(1.972, 3);
    expect(currentUltraviolet(3, 'correlator') - currentUltraviolet(3, 'cross section')).toBeCloseTo(1, 12);
  });
});
