/** @module Partial sums and differences, the input of every sequence transformation. */
import type { Field } from '../numerics/index.js';

/** s_n = a_0 + … + a_n. */
export function sumsOf<T>(field: Field<T>, terms: readonly T[]): T[] {
  let sum = field.zero;
  return terms.map((a) => (sum = field.add(sum, a)));
}

/** s_{n+1} − s_n, one entry fewer. */
export function differences<T>(field: Field<T>, s: readonly T[]): T[] {
  return s.slice(1).map((next, n) => field.sub(next, s[n]!));
}
