/**
 * @module The expansion of α_s in inverse powers of L = ln(μ²/Λ²), for comparison with the exact solution.
 *
 * Method     with c_k = b_k/b_0 (α_s itself as the variable), l = ln L:
 *            α = 1/(b_0L) − c_1 l/(b_0L)² + [c_1²(l² − l − 1) + c_2]/(b_0L)³ + … , as many terms as loops.
 * Bound      none of its own: the neglected terms are of relative order ln^n L/L^n.
 * Reference  K. Chetyrkin, B. Kniehl, M. Steinhauser, hep-ph/9706430 (four terms); B. Kniehl, A. Kotikov, A. Onishchenko,
 *            O. Veretin, hep-ph/0607202 (five). Formulas recalled, tested against the exact integral at large L.
 */
import { refuse, type Refusal } from '../refusal.js';
import { logOverLambda, type Flow } from './flow.js';

/** α_s from L = ln(μ²/Λ²) > 0, truncated after as many terms as loops. */
export function expandedAlpha(flow: Flow, log: number): number {
  const [, c1 = 0, c2 = 0, c3 = 0, c4 = 0] = flow.s;
  const l = Math.log(log);
  const x = 1 / (flow.b0 * log);
  const terms = [
    1,
    -c1 * l,
    c1 ** 2 * (l ** 2 - l - 1) + c2,
    c1 ** 3 * (-(l ** 3) + 2.5 * l ** 2 + 2 * l - 0.5) - 3 * c1 * c2 * l + c3 / 2,
    c1 ** 4 * (l ** 4 - (13 / 3) * l ** 3 - 1.5 * l ** 2 + 4 * l + 7 / 6) +
      3 * c1 ** 2 * c2 * (2 * l ** 2 - l - 1) -
      c1 * c3 * (2 * l + 1 / 6) +
      (5 / 3) * c2 ** 2 +
      c4 / 3,
  ];
  let sum = 0;
  for (let k = flow.loops - 1; k >= 0; k--) sum = sum * x + (terms[k] ?? 0);
  return sum * x;
}

/** Steps of the bisection below: enough for every double. */
const BISECTIONS = 200;

/** L with expandedAlpha(L) = α: the branch that joins the exact solution at high scales. */
export function expandedLog(flow: Flow, alpha: number): number | Refusal {
  const failed = refuse(
    `the expansion in 1/ln(μ²/Λ²) does not reach α_s = ${alpha} at ${flow.loops} loops for n_f = ${flow.flavours}`,
    'use the exact definition of Λ or give α_s at a higher scale',
  );
  // From weak coupling downwards: the first L at which the expansion, seen from above, has grown to α.
  let high = Math.max(2 * logOverLambda(flow, alpha), 8 / (flow.b0 * alpha), 20);
  if (expandedAlpha(flow, high) > alpha) return failed;
  let low = high;
  while (expandedAlpha(flow, low) < alpha) {
    high = low;
    low /= 1.01;
    if (low < 1) return failed;
  }
  for (let k = 0; k < BISECTIONS && high > low; k++) {
    const middle = (low + high) / 2;
    if (middle === low || middle === high) break;
    if (expandedAlpha(flow, middle) < alpha) high = middle;
    else low = middle;
  }
  return (low + high) / 2;
}
