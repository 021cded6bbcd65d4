/** @module Borel coefficients c_k/Γ(qk+1) as doubles of moderate size: a factor e^{scale·k} and a constant are taken out. */
import { leastSquares } from './least-squares.js';
import { logGammaDouble } from '../numerics/index.js';
import type { Point } from './reading.js';

export interface ScaledBorel {
  /** Indexed by k from the first point on; undefined where unknown, 0 for an exact zero. */
  readonly beta: readonly (number | undefined)[];
  /** ln of the factor per step taken out: true β_k = beta_k·e^{scale·k + const}. */
  readonly scale: number;
}

export function scaledBorel(points: readonly Point[], q: number): ScaledBorel {
  const known = points.filter((p) => p.sign !== 0);
  const y = known.map((p) => p.y - logGammaDouble(q * p.k + 1));
  const fit = leastSquares([known.map(() => 1), known.map((p) => p.k)], y);
  const [c, a] = fit === undefined ? [y[0] ?? 0, 0] : [fit.coefficients[0]!, fit.coefficients[1]!];
  const beta: (number | undefined)[] = [];
  for (const p of points) {
    beta[p.k] = p.sign === 0 ? 0 : p.sign * Math.exp(p.y - logGammaDouble(q * p.k + 1) - c - a * p.k);
  }
  return { beta, scale: a };
}
