/**
 * @module Brezinski's ϑ algorithm.
 *
 *   ϑ_{−1} = 0, ϑ_0^{(n)} = s_n,
 *   ϑ_{2k+1}^{(n)} = ϑ_{2k−1}^{(n+1)} + 1/Δϑ_{2k}^{(n)},
 *   ϑ_{2k+2}^{(n)} = ϑ_{2k}^{(n+1)} + Δϑ_{2k}^{(n+1)} Δϑ_{2k+1}^{(n+1)}/Δ²ϑ_{2k+1}^{(n)}.
 * Three terms an order. Bound: that of the field; a vanishing difference gives an INDETERMINATE (or infinite) element.
 * Reference  C. Brezinski, C. R. Acad. Sci. A 273 (1971) 727 (from memory).
 */
import type { Field } from '../numerics/index.js';
import { differences } from './sums.js';

/** Even columns: entry k holds ϑ_{2k}^{(0)}, ϑ_{2k}^{(1)}, …; three elements fewer each. */
export function thetaColumns<T>(field: Field<T>, s: readonly T[]): T[][] {
  let even: T[] = [...s];
  let odd: T[] = s.map(() => field.zero);
  const columns: T[][] = [even];
  while (even.length >= 4) {
    const evenStep = differences(field, even);
    const nextOdd = evenStep.map((d, n) => field.add(odd[n + 1]!, field.div(field.one, d)));
    const oddStep = differences(field, nextOdd);
    const oddSecond = differences(field, oddStep);
    const nextEven = oddSecond.map((d, n) =>
      field.add(even[n + 1]!, field.div(field.mul(evenStep[n + 1]!, oddStep[n + 1]!), d)),
    );
    odd = nextOdd;
    even = nextEven;
    columns.push(even);
  }
  return columns;
}
