/**
 * @module The sum rule for the strength in the conformal variable: for an infrared singularity with a nearer ultraviolet one.
 *
 * Purpose    Σ h_n of the sum rule (estimates.ts) is H(v) = Σ h_n v^n at v = 1, v = t/t_s. H is regular at v = 1 but singular
 *            at v = −a, where a nearby ultraviolet renormalon stands: for a < 1 the plain sum diverges.
 * Method     cuts (−∞, −a] and [b, ∞), b the next infrared singularity: v(w) = 4w/[(1−w)²/a + (1+w)²/b] maps the cut plane
 *            onto |w| < 1. H(v(w)) is expanded in w and summed at w(1) < 1: a convergent sum, whatever the strengths.
 * Bound      none of its own: the last step shows the convergence.
 * Reference  S. Ciulli, J. Fischer, Nucl. Phys. 24 (1961) 465; I. Caprini, J. Fischer, hep-ph/9811367 (the map); the
 *            combination with the sum rule is re-derived here.
 */
import { doubleField } from '../../numerics/index.js';
import { compose, reciprocal } from '../algebra/truncated.js';

/** Cuts in units of the singularity's own distance: the negative one begins at −a, the positive one at b > 1. */
export interface Cuts {
  readonly a: number;
  readonly b: number;
}

/** Coefficients of v(w) from w^0 on. */
function mapSeries({ a, b }: Cuts, length: number): number[] {
  const denominator = [1 / a + 1 / b, 2 / b - 2 / a, 1 / a + 1 / b];
  return [0, ...reciprocal(doubleField, denominator, length - 1).map((x) => 4 * x)];
}

/** w at v = 1. */
export function imageOfOne({ a, b }: Cuts): number {
  const [left, right] = [Math.sqrt(1 + 1 / a), Math.sqrt(1 - 1 / b)];
  return (left - right) / (left + right);
}

/** Partial sums of H(v(w)) at v = 1 for h_0, h_1, …, one for each number of them. */
export function conformalSums(h: readonly number[], cuts: Cuts): number[] {
  const n = h.length;
  if (n === 0) return [];
  const w = imageOfOne(cuts);
  const inW = compose(doubleField, h, mapSeries(cuts, Math.max(n, 2)), n);
  let sum = 0;
  return inW.map((c, k) => (sum += c * w ** k));
}
