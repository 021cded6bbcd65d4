/**
 * @module Richardson extrapolation in 1/n, stopped where it ceases to help.
 *
 * Purpose    limit of a sequence with an expansion in integer powers of 1/n.
 * Method     T_0(n) = s_n, T_m(n) = [n T_{m−1}(n) − (n−m) T_{m−1}(n−1)]/m, which is
 *            Σ_k (−1)^{k+m} (n−m+k)^m s_{n−m+k}/(k!(m−k)!). The order is raised only while |T_m − T_{m−1}| falls
 *            (PATIENCE rises in a row are passed over): an oscillating admixture or noise makes it grow again.
 * Bound      none is proved. The error is that last difference, continued as a geometric tail where it falls slowly, or the
 *            step |T_m(n) − T_m(n−1)| if larger, and the propagated errors of the coefficients beside it (measured.ts).
 * Reference  L. F. Richardson and J. A. Gaunt, Phil. Trans. R. Soc. A 226 (1927) 299; C. M. Bender and S. A. Orszag,
 *            "Advanced Mathematical Methods for Scientists and Engineers", 1978, section 8.1.
 */
import { R, type Ball } from '../numerics/index.js';
import { statedError, type Measured } from './measured.js';

/** What the table needs of its numbers; run on doubles for noisy input, on enclosures for exact input. */
export interface Arithmetic<T> {
  /** (n a − l b)/m. */
  combine(n: number, a: T, l: number, b: T, m: number): T;
  /** a − b as a double. */
  difference(a: T, b: T): number;
  toNumber(a: T): number;
  /** Half-width of the enclosure; 0 for doubles. */
  radius(a: T): number;
}

export const doubleArithmetic: Arithmetic<number> = {
  combine: (n, a, l, b, m) => (n * a - l * b) / m,
  difference: (a, b) => a - b,
  toNumber: (a) => a,
  radius: () => 0,
};

export function ballArithmetic(prec: number): Arithmetic<Ball> {
  const int = (x: number): Ball => R.fromNumber(x);
  return {
    combine: (n, a, l, b, m) => R.div(R.sub(R.mul(int(n), a, prec), R.mul(int(l), b, prec), prec), int(m), prec),
    difference: (a, b) => R.toNumber(R.sub(a, b, prec)),
    toNumber: R.toNumber,
    radius: R.radiusToNumber,
  };
}

export interface Extrapolated<T> {
  readonly top: T;
  /** value; method: last difference (and step) of the table; noise: propagated input error. */
  readonly limit: Measured;
  readonly order: number;
}

/** Weights of T_m at the last index n, for s_{n−m} … s_n. */
export function richardsonWeights(n: number, m: number): number[] {
  const w: number[] = [];
  for (let k = 0; k <= m; k++) {
    let v = (k + m) % 2 === 0 ? 1 : -1;
    for (let j = 1; j <= m; j++) v *= n - m + k;
    for (let j = 2; j <= k; j++) v /= j;
    for (let j = 2; j <= m - k; j++) v /= j;
    w.push(v);
  }
  return w;
}

/** Heuristic: a rise of the difference is tolerated this often in a row before the table is closed. */
const PATIENCE = 2;

/** Differences that fall more slowly than this factor do not tell a tail apart from a drift. */
const SLOW = 0.9;

/**
 * Extrapolates s (ending at index `last`, in steps of one) to n → ∞.
 * noise(m): propagated error of T_m at `last`. Undefined with fewer than two members.
 */
export function extrapolate<T>(
  s: readonly T[],
  last: number,
  arithmetic: Arithmetic<T>,
  maxOrder: number,
  noise: (m: number) => number,
): Extrapolated<T> | undefined {
  let column = s.slice();
  let best: Extrapolated<T> | undefined;
  let smallest = Infinity;
  let previous = Infinity;
  let rises = 0;
  for (let m = 1; m <= maxOrder && column.length >= 2; m++) {
    const next: T[] = [];
    for (let i = 1; i < column.length; i++) {
      const n = last - (column.length - 1 - i);
      if (n - m >= 0) next.push(arithmetic.combine(n, column[i]!, n - m, column[i - 1]!, m));
    }
    const top = next[next.length - 1];
    if (top === undefined) break;
    const below = next[next.length - 2];
    // The difference at the last two n: one of them may be small by accident.
    const here = Math.abs(arithmetic.difference(top, column[column.length - 1]!));
    const before = below === undefined ? 0 : Math.abs(arithmetic.difference(below, column[column.length - 2]!));
    const difference = Math.max(here, before);
    const step = below === undefined ? 0 : Math.abs(arithmetic.difference(top, below));
    const propagated = noise(m) + arithmetic.radius(top);
    // Differences falling by a factor r each leave a tail of r/(1 − r) of the last one.
    const r = difference / previous;
    const tail = m === 1 ? 1 : r < SLOW ? Math.max(1, r / (1 - r)) : SLOW / (1 - SLOW);
    const limit = { value: arithmetic.toNumber(top), method: Math.max(difference * tail, step), noise: propagated };
    previous = difference;
    if (!(statedError(limit) < Infinity)) break;
    if (best === undefined || statedError(limit) < statedError(best.limit)) best = { top, limit, order: m };
    rises = difference < smallest ? 0 : rises + 1;
    if (rises > PATIENCE) break;
    smallest = Math.min(smallest, difference);
    column = next;
  }
  return best;
}
