/**
 * @module Strengths of two singularities whose positions and exponents are known.
 *
 * Purpose    with theory's positions, how strong each is in the terms seen, and from which order the nearer one leads.
 * Method     b_n = S₁ u_n + S₂ v_n from the last two Borel coefficients, u_n = (γ)_n/(n! t^n); columns scaled to length one,
 *            whose singular values are √(1 ± c) with c the cosine between them.
 * Bound      exact for two pure powers; the condition number says how far anything else is amplified.
 * Reference  G. Darboux 1878; R. B. Dingle 1973 (the form of the coefficients).
 */
import { logGammaDouble } from '../numerics/index.js';
import type { Point } from './reading.js';

/** b_n = c_n/n! at a position t with exponent γ and unit strength: (γ)_n/(n! t^n), as logarithm and sign. */
function unit(t: number, exponent: number, n: number): { log: number; sign: number } {
  let sign = t < 0 && n % 2 === 1 ? -1 : 1;
  let log = -n * Math.log(Math.abs(t));
  for (let j = 0; j < n; j++) {
    const f = (exponent + j) / (j + 1);
    log += Math.log(Math.abs(f));
    if (f < 0) sign = -sign;
  }
  return { log, sign };
}

export interface FixedStrengths {
  readonly first: number;
  readonly second: number;
  /** Condition number of the scaled 2×2 system. */
  readonly condition: number;
}

export interface FixedPosition {
  readonly t: number;
  readonly exponent: number;
}

/** Strengths of two singularities with given positions and exponents from b_n and b_{n+1} = c/n! (logs and signs). */
export function fixedStrengths(
  a: FixedPosition,
  b: FixedPosition,
  last: readonly [Point, Point],
): FixedStrengths | undefined {
  const rows = last.map((p) => {
    const u = unit(a.t, a.exponent, p.n);
    const v = unit(b.t, b.exponent, p.n);
    const scale = p.y - logGammaDouble(p.n + 1);
    return { x: u.sign * Math.exp(u.log - scale), y: v.sign * Math.exp(v.log - scale), r: p.sign };
  });
  const [r1, r2] = [rows[0]!, rows[1]!];
  const cx = Math.hypot(r1.x, r2.x);
  const cy = Math.hypot(r1.y, r2.y);
  const [a11, a12, a21, a22] = [r1.x / cx, r1.y / cy, r2.x / cx, r2.y / cy];
  const det = a11 * a22 - a12 * a21;
  if (!(Math.abs(det) > 1e-14)) return undefined;
  const first = (r1.r * a22 - a12 * r2.r) / det / cx;
  const second = (a11 * r2.r - a21 * r1.r) / det / cy;
  // Columns of length one: the singular values are √(1 ± c), c the cosine between them.
  const c = Math.abs(a11 * a12 + a21 * a22);
  return { first, second, condition: Math.sqrt((1 + c) / (1 - c)) };
}

/** Orders where the sizes of two singular parts cross are looked for up to this one. */
const FARTHEST_CROSSING = 400;

/** First order from `from` on at which a (strength sa) outweighs b (strength sb); undefined when there is none. */
export function crossing(a: FixedPosition, sa: number, b: FixedPosition, sb: number, from: number): number | undefined {
  const lead = (n: number): number =>
    Math.log(Math.abs(sa)) + unit(a.t, a.exponent, n).log - Math.log(Math.abs(sb)) - unit(b.t, b.exponent, n).log;
  for (let n = from; n < FARTHEST_CROSSING; n++) if (lead(n) > 0) return n;
  return undefined;
}
