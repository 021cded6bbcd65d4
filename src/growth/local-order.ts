/**
 * @module Growth order from the last few ratios.
 *
 * Purpose    short series start irregularly; the last ratios say more about the growth than a fit through everything.
 * Method     s = Δ ln|c_k/c_{k−1}| / Δ ln k over two steps; for Γ(k+γ)/T^k it is k/(k+γ−1).
 * Bound      heuristic: k times the change against the value one step earlier, the propagated errors, and
 *            EXPONENT_ALLOWANCE/k for the unknown γ.
 */
import type { Estimate } from './growth.js';
import type { Point } from './reading.js';

/** |γ − 1| that the error must allow for. */
const EXPONENT_ALLOWANCE = 1.2;

export interface LocalOrder extends Estimate {
  /** The same one step earlier; absent with four coefficients. */
  readonly before?: number;
}

/** Per power of x. points: consecutive, non-zero, regular signs; undefined below 4 of them. */
export function localOrder(points: readonly Point[], stride: number): LocalOrder | undefined {
  const n = points.length;
  if (n < 4) return undefined;
  const rho = points.slice(1).map((p, i) => ({ k: p.k, v: p.y - points[i]!.y }));
  const at = (i: number): number => {
    const a = rho[i]!;
    const b = rho[i - 2]!;
    return (a.v - b.v) / Math.log(a.k / b.k) / stride;
  };
  const last = rho.length - 1;
  if (rho[last - 2]!.k < 1) return undefined;
  const value = at(last);
  const before = last >= 3 && rho[last - 3]!.k >= 1 ? at(last - 1) : undefined;
  const span = Math.log(rho[last]!.k / rho[last - 2]!.k);
  const noise = Math.hypot(...points.slice(-4).map((p) => p.sigma)) / span;
  const k = rho[last]!.k;
  // For k/(k+γ−1) the change per step, times k, is what is still missing.
  const drift = before === undefined ? 0 : k * (value - before);
  const error = Math.hypot(drift, EXPONENT_ALLOWANCE / k / stride, noise / stride);
  return before === undefined ? { value, error } : { value, error, before };
}
