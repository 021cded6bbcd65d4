/**
 * @module Ratio test with linear extrapolation.
 *
 * Purpose    D_n = c_n/(n c_{n−1}) tends to 1/t*, and its linear extrapolants λ_n faster.
 * Method     D_n = (1/t*)[1 + (γ−1)/n + O(1/n²)]; λ_n = n D_n − (n−1) D_{n−1} removes the 1/n term. Logarithms are
 *            subtracted, so that coefficients of any size are in range.
 * Bound      errors of the coefficients are propagated to first order, independent of each other; the method error
 *            |λ_n − λ_{n−1}|/2 is added in quadrature.
 * Reference  C. Domb and M. F. Sykes, Proc. R. Soc. Lond. A 240 (1957) 214.
 */
import type { RatioRow } from './growth.js';
import { logGammaDouble } from '../numerics/index.js';
import type { Point } from './reading.js';

const SMALL_STEP = 8;

/** Π_{j<q} (qk − j) = Γ(qk + 1)/Γ(q(k−1) + 1), the factorial part of the ratio of neighbours at growth order q per step. */
export function fallingStep(k: number, q: number): bigint {
  let p = 1n;
  for (let j = 0; j < q; j++) p *= BigInt(q * k - j);
  return p;
}

/** Its logarithm; the product of up to SMALL_STEP factors is a double without overflow. */
export function logFallingStep(k: number, q: number): number {
  if (q > SMALL_STEP) return logGammaDouble(q * k + 1) - logGammaDouble(q * (k - 1) + 1);
  let p = 1;
  for (let j = 0; j < q; j++) p *= q * k - j;
  return Math.log(p);
}

/** c_k/c_{k−1} divided by the factorial step, for neighbours present; index = k. */
export function ratios(points: readonly Point[], q: number, scale = 0): (number | undefined)[] {
  const out: (number | undefined)[] = [];
  for (let i = 1; i < points.length; i++) {
    const a = points[i]!;
    const b = points[i - 1]!;
    if (a.k !== b.k + 1 || a.sign === 0 || b.sign === 0) continue;
    out[a.k] = a.sign * b.sign * Math.exp(a.y - b.y - scale - logFallingStep(a.k, q));
  }
  return out;
}

/**
 * Error of λ_k from the relative errors s_k, s_{k−1}, s_{k−2} of three neighbouring coefficients:
 * ∂λ/∂ln c_k = k D_k; ∂λ/∂ln c_{k−1} = −k D_k − (k−1) D_{k−1}; ∂λ/∂ln c_{k−2} = (k−1) D_{k−1}.
 */
export function linearSigma(k: number, d: number, dPrevious: number, s: readonly [number, number, number]): number {
  const a = k * d;
  const b = (k - 1) * dPrevious;
  return Math.hypot(a * s[0], (a + b) * s[1], b * s[2]);
}

export interface ScaledRows {
  /** Rows with e^{scale·stride} taken out: of moderate size for any coefficients. */
  readonly rows: readonly RatioRow[];
  readonly scale: number;
}

/** One row for every coefficient with a known predecessor. n counts powers of x; order q = stride (factorial growth). */
export function scaledRows(points: readonly Point[], stride: number): ScaledRows {
  const last = points.at(-1);
  const before = points.at(-2);
  if (last === undefined || before === undefined) return { rows: [], scale: 0 };
  const scale = (last.y - before.y) / (last.k - before.k) - logFallingStep(last.k, stride);
  const d = ratios(points, stride, scale);
  const byK = new Map(points.map((p) => [p.k, p]));
  const rows: RatioRow[] = [];
  let previous: { k: number; linear: number } | undefined;
  for (let k = 1; k < d.length; k++) {
    const dk = d[k];
    const dp = d[k - 1];
    if (dk === undefined) continue;
    const row = { n: k * stride, ratio: dk };
    if (k < 2 || dp === undefined) {
      rows.push(row);
      continue;
    }
    const linear = k * dk - (k - 1) * dp;
    const s = linearSigma(k, dk, dp, [byK.get(k)!.quoted, byK.get(k - 1)!.quoted, byK.get(k - 2)!.quoted]);
    const method = previous?.k === k - 1 ? Math.abs(linear - previous.linear) / 2 : undefined;
    const known = method !== undefined || s > 0;
    rows.push(known ? { ...row, linear, linearError: Math.hypot(s, method ?? 0) } : { ...row, linear });
    previous = { k, linear };
  }
  return { rows, scale };
}

/** The rows in the units of the series; beyond the range of doubles the ratio is ±Infinity or 0 and stands alone. */
export function ratioRows(points: readonly Point[], stride: number): RatioRow[] {
  const { rows, scale } = scaledRows(points, stride);
  const factor = Math.exp(scale);
  if (!(factor > 0 && factor < Infinity)) return rows.map((r) => ({ n: r.n, ratio: r.ratio * factor }));
  return rows.map((r) => ({
    n: r.n,
    ratio: r.ratio * factor,
    ...(r.linear === undefined ? {} : { linear: r.linear * factor }),
    ...(r.linearError === undefined ? {} : { linearError: r.linearError * factor }),
  }));
}
