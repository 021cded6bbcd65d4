/**
 * @module The modified Cacciari–Houdeau model: factorials are divided out before the coefficients are bounded.
 *
 * Assumption  Σ (k−1)! b_k (α/λ)^k with |b_k| ≤ b̄, each b_k uniform, ln b̄ uniform; α is the coupling itself.
 * Formula     S = k! (α/λ)^(k+1) max|b|, then as for Cacciari and Houdeau. λ ≈ 1 was fitted for quantities without, ≈ 0.6
 *             for those with hadrons in the initial state [memory].
 * Invariant   under α → cα with λ → cλ.
 * Reference   E. Bagnaschi, M. Cacciari, A. Guffanti, L. Jenniches, JHEP 02 (2015) 133, arXiv:1409.5036
 *             [summary in arXiv:1505.08029 seen; formulas re-derived].
 */
import { toNumberExact } from '../../numerics/index.js';
import { divisorSize } from '../../qcd/index.js';
import { nextOrder, type Known } from '../known.js';
import { refuse, tooFew, type TruncationModel } from '../model.js';
import { bandsOf } from './cacciari-houdeau.js';

/** ln (k−1)! for every order from 1 to the largest one. */
function logFactorials(most: number): (k: number) => number {
  const table = [0, 0];
  for (let k = 2; k <= most; k++) table.push((table[k - 1] ?? 0) + Math.log(k - 1));
  return (k) => table[k] ?? 0;
}

/** ln S in the unit of the terms; `logY` is ln|α/λ|, `lift` is added to every order so that the first is at least 1. */
export function logModifiedSize(known: Known, logY: number, lift: number): number {
  const next = nextOrder(known) + lift;
  const gamma = logFactorials(next);
  const bounds = known.logs.map((l, i) => {
    const k = (known.orders[i] ?? 0) + lift;
    return l - gamma(k) - k * logY;
  });
  return gamma(next) + next * logY + Math.max(...bounds);
}

export const modifiedCacciariHoudeau: TruncationModel = {
  name: 'modified-ch',
  title: 'modified Cacciari–Houdeau',
  summary: 'the same after division by (k-1)!',
  nature: 'credible',
  about: 'next term',
  digits: 5,
  priors: ['chbar.lambda', 'chbar.slope'],
  reference: 'E. Bagnaschi, M. Cacciari, A. Guffanti, L. Jenniches, arXiv:1409.5036',
  estimate({ known, coupling, priors }) {
    const refused = tooFew(known, 2, 'the width would be the prior alone');
    if (refused !== undefined) return refused;
    const first = known.orders[0] ?? 1;
    if (first < 0)
      return refuse(
        `the series starts at order ${first}: (k-1)! needs positive orders`,
        'take out a power of the variable',
      );
    const lift = first === 0 ? 1 : 0;
    const divisor = coupling.plain ? 1 : toNumberExact(divisorSize(coupling.divisor));
    const logY = known.logX + Math.log(divisor / priors['chbar.lambda']);
    const scale = Math.exp(logModifiedSize(known, logY, lift));
    const s = known.logs.length + priors['chbar.slope'];
    const notes = lift === 1 ? ['the series starts at order 0: orders are counted from 1 in the factorials'] : [];
    return {
      kind: 'estimate',
      terms: known.logs.length,
      bands: bandsOf(scale, s),
      facts: [{ name: 'S', value: scale, scaled: true }],
      notes,
    };
  },
};
