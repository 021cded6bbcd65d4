/**
 * @module [L/M] over any number field by a pivoted linear solve.
 *
 * Purpose    one code for doubles, rationals and balls; the way around intermediate blocks for ball series.
 * Method     Σ_{j=1}^M b_{L−j+i} q_j = −b_{L+i}, i = 1..M (b_k = 0 for k < 0), q_0 = 1; p_i = Σ_j q_j b_{i−j}, i <= L.
 * Bound      that of the field (see lu.ts). A regular system proves that the entry exists and is reduced.
 * Reference  G. A. Baker, P. Graves-Morris, "Padé Approximants", section 1.1.
 */
import type { Field } from '../field.js';
import { lu, solveFactored } from '../linear/lu.js';
import { checkOrders } from './pade-exact.js';
import type { PadeEntry, UndecidedEntry } from './pade-types.js';

/**
 * [L/M] of Σ b_n x^n over `field`. `exists: undefined` when a pivot cannot be told from zero or is zero: the entry may
 * be missing or stand inside a block (padeExact decides for exact series). Throws RangeError as padeExact does.
 */
export function padeField<T>(field: Field<T>, b: readonly T[], L: number, M: number): PadeEntry<T> | UndecidedEntry {
  checkOrders(b.length, L, M);
  const at = (k: number): T => (k < 0 ? field.zero : b[k]!);
  const matrix = Array.from({ length: M }, (_r, i) => Array.from({ length: M }, (_c, j) => at(L - j + i)));
  const f = lu(field, matrix);
  if (f.kind !== 'regular') {
    return { exists: undefined, reason: `the Toeplitz matrix of [${L}/${M}] is singular or too close to it` };
  }
  const rhs = Array.from({ length: M }, (_, i) => field.neg(at(L + 1 + i)));
  const denominator = [field.one, ...solveFactored(field, f, rhs)];
  return {
    exists: true,
    numerator: numeratorOf(field, denominator, b, L),
    denominator: dropZeros(field, denominator),
    deficiency: 0,
    contactOrder: L + M + 1,
  };
}

/** Coefficients 0..L of q·b, certain trailing zeros dropped. */
export function numeratorOf<T>(field: Field<T>, q: readonly T[], b: readonly T[], L: number): T[] {
  const p: T[] = [];
  for (let i = 0; i <= L; i++) {
    let sum: T = b[i]!;
    for (let j = 1; j < q.length && j <= i; j++) sum = field.add(sum, field.mul(q[j]!, b[i - j]!));
    p.push(sum);
  }
  return dropZeros(field, p);
}

/** The array without its certain trailing zeros. */
export function dropZeros<T>(field: Field<T>, a: T[]): T[] {
  let n = a.length;
  while (n > 0 && field.isZero(a[n - 1]!)) n--;
  return a.slice(0, n);
}
