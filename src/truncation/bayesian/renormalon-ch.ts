/**
 * @module The modified Cacciari–Houdeau model with the growth of the nearest known Borel singularity divided out.
 *
 * Assumption  c_n = Γ(n+γ)/Γ(γ) · b_n/t*^n with |b_n| ≤ b̄, each b_n uniform, ln b̄ uniform; t*, γ position and exponent of
 *             the nearest singularity (1 − t/t*)^(−γ) that the series file or the operator product expansion states. For a
 *             series that this singularity dominates the b_n tend to a constant, so the assumption holds at high order.
 * Formula     S = |Γ(N+γ)/Γ(γ)| |x/t*|^N max|b|, then as for Cacciari and Houdeau.
 * Reference   an adaptation of arXiv:1409.5036; it follows from the large-order behaviour of the coefficients, see
 *             M. Beneke, Phys. Rept. 317 (1999) 1.
 */
import { toNumberExact } from '../../numerics/index.js';
import { nextOrder } from '../known.js';
import { refuse, tooFew, type TruncationModel } from '../model.js';
import { bandsOf } from './cacciari-houdeau.js';

/** ln |Γ(n+γ)/Γ(γ)|; −Infinity when a factor vanishes. */
function logRising(gamma: number, n: number): number {
  let sum = 0;
  for (let i = 0; i < n; i++) sum += Math.log(Math.abs(i + gamma));
  return sum;
}

export const renormalonCacciariHoudeau: TruncationModel = {
  name: 'renormalon-ch',
  title: 'renormalon Cacciari–Houdeau',
  summary: 'the same after division by the growth of the nearest known Borel singularity',
  nature: 'credible',
  about: 'next term',
  digits: 5,
  priors: ['chbar.slope'],
  reference: 'adapted from arXiv:1409.5036',
  estimate({ known, expansion, priors }) {
    const refused = tooFew(known, 2, 'the width would be the prior alone');
    if (refused !== undefined) return refused;
    const [nearest] = expansion.stated;
    if (nearest === undefined) {
      return refuse(
        'no Borel singularity is known beforehand',
        'state one in the series file, or read the modified model with a lambda of your own',
      );
    }
    const gamma = nearest.exponent === undefined ? 1 : toNumberExact(nearest.exponent);
    const notes: string[] = [];
    if (nearest.exponent === undefined)
      notes.push('the exponent of the singularity is not known: 1 is taken, a simple pole');
    if (Number.isInteger(gamma) && gamma <= 0) {
      return refuse(
        `the exponent ${gamma} makes a logarithm: its coefficients start late`,
        'read the modified model instead',
      );
    }
    const logY = known.logX - Math.log(Math.abs(toNumberExact(nearest.t)));
    const growth = (order: number): number => {
      const n = order - expansion.power;
      return logRising(gamma, n) + n * logY;
    };
    const bounds = known.logs.map((l, k) => l - growth(known.orders[k] ?? 0));
    const scale = Math.exp(growth(nextOrder(known)) + Math.max(...bounds));
    const s = known.logs.length + priors['chbar.slope'];
    const facts = [
      { name: 'S', value: scale, scaled: true },
      { name: 't*', value: toNumberExact(nearest.t) },
      { name: 'exponent', value: gamma },
    ];
    return { kind: 'estimate', terms: known.logs.length, bands: bandsOf(scale, s), facts, notes };
  },
};
