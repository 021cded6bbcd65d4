/**
 * @module Small products of the first 13 primes that come close to 1: the table behind smooth.ts.
 *
 * Purpose    row 0 is 2 itself; row i > 0 holds exponents d of 2, 3, 5, … 41 with ε = Σ d_j log p_j between 2^(−2i−2.5) and 2^(−2i).
 * Method     lattice reduction (PARI/GP's qflll) of unit vectors weighted by log p_j with Σ d_j log p_j as one more coordinate, for
 *            several weights of that; of the vectors with ε in the range, the one with the smallest exponents.
 * Bound      none is needed: the exponents are exact, and ε is computed where it is used. Tests hold the rows to their range.
 * Reference  F. Johansson, "Computing elementary functions using multi-prime argument reduction", arXiv:2207.02501.
 */

export const PRIMES: readonly number[] = [2, 3, 5, 7, 11, 13, 17, 19, 23, 29, 31, 37, 41];

export const RELATIONS: readonly (readonly number[])[] = [
  [1, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0],
  [1, 1, -1, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0],
  [-2, 1, -1, 1, 0, 0, 0, 0, 0, 0, 0, 0, 0],
  [1, 1, -1, 0, 1, -1, 0, 0, 0, 0, 0, 0, 0],
  [1, -1, -1, 0, 1, 1, 0, -1, 0, 0, 0, 0, 0],
  [-2, -2, 1, 0, 1, 0, 0, 1, 0, -1, 0, 0, 0],
  [-5, 2, 1, 1, -1, 0, -1, 1, 0, 0, 0, 0, 0],
  [3, -3, -1, -1, 1, 1, 0, 1, -1, 0, 0, 0, 0],
  [-3, 2, 1, 0, 1, 1, -1, 1, 0, -1, -1, 0, 0],
  [-2, -1, 1, -1, 1, -1, 1, 1, -1, -1, 0, 0, 1],
  [-3, 1, -1, 2, 1, 0, 0, -1, 1, 0, 1, -1, -1],
  [5, 3, -1, 1, 0, -1, -1, -2, -1, 0, 0, 1, 1],
  [1, -1, 0, 1, 1, 2, -1, 0, -2, 1, -1, -1, 1],
  [-1, -4, 5, -1, -1, -1, -1, 0, 1, 1, -1, 0, 1],
  [-6, 4, -2, 0, 2, 2, 0, -2, 2, 0, 0, -1, -1],
  [2, 6, 2, -4, -1, -2, 0, -2, 1, 0, 2, 0, 0],
  [-5, 1, 0, 2, -2, 2, 4, -3, 1, 1, -1, 0, -2],
  [-3, -5, -1, -1, 0, 2, 2, -1, -1, 0, 4, -1, -1],
  [-13, 0, -6, -4, 1, 0, 1, 2, 5, 1, 0, 0, -1],
  [-7, -11, -2, 5, -2, -2, 0, -1, 3, 3, -1, 2, 0],
  [8, -6, 3, 2, 4, -3, -4, -2, -1, 0, 2, -2, 3],
  [-8, -6, 8, 1, 0, -4, 3, -1, 6, -3, -3, 1, 0],
  [-27, 15, -4, -4, -3, 4, -4, 1, -1, -1, 4, 3, 1],
  [14, 12, 13, -5, -6, -4, -4, 2, -6, 2, -2, -1, 5],
  [-16, 2, -11, 0, -2, -4, -3, -1, 6, 7, 3, -4, 4],
  [-10, 14, -20, 0, 4, 1, 4, 7, -2, 0, -2, -2, 0],
  [24, -3, 3, 1, -4, 9, 6, -5, 3, -2, -6, -6, 1],
  [23, 10, -2, -6, -7, 6, -7, -2, 3, -3, 0, -9, 13],
  [-14, 28, 8, 6, -16, -5, -8, 13, 4, 1, 2, -6, -3],
  [39, 7, 5, 4, -11, 12, -9, -6, -9, -3, 11, 1, -4],
  [-3, -29, 26, 0, 7, -15, -1, -6, -7, 5, 3, 6, 2],
  [-43, 30, 32, 18, -2, -3, -9, -11, -8, 1, -9, 1, 8],
  [-22, -51, 31, 32, -4, -5, -6, -2, 2, -4, 9, 7, -12],
];
