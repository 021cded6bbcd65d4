/**
 * @module Aitken's Δ² process, iterated.
 *
 *   A_{k+1}^{(n)} = A_k^{(n)} − (Δ A_k^{(n)})²/Δ² A_k^{(n)},  A_0^{(n)} = s_n.
 * A second difference that certainly vanishes leaves the newest element, A_k^{(n+2)}.
 * Bound      that of the field.
 * Reference  A. C. Aitken, Proc. R. Soc. Edinb. 46 (1926) 289; E. J. Weniger (1989) sec. 5 (from memory).
 */
import type { Field } from '../numerics/index.js';

/** All columns: entry k holds A_k^{(0)}, A_k^{(1)}, …; two elements fewer each. */
export function aitkenColumns<T>(field: Field<T>, s: readonly T[]): T[][] {
  const columns: T[][] = [[...s]];
  for (let last = columns[0]!; last.length >= 3; last = columns[columns.length - 1]!) {
    columns.push(last.slice(2).map((newest, n) => accelerate(field, last[n]!, last[n + 1]!, newest)));
  }
  return columns;
}

function accelerate<T>(field: Field<T>, a: T, b: T, c: T): T {
  const first = field.sub(b, a);
  const second = field.sub(field.sub(c, b), first);
  return field.isZero(second) ? c : field.sub(a, field.div(field.mul(first, first), second));
}
