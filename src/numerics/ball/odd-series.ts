/**
 * @module The odd series Σ (±1)^k u^(2k+1)/(2k+1) in fixed point: artan and artanh of a small argument.
 *
 * Purpose    the last step of log and atan2, after a start value has made u small.
 * Method     with x = ±u², rows of m terms: s_j = (Σ_{i<m} c_i x^i)/d + x^m s_(j+1), d = Π (2(mj+i)+1) and whole numbers c_i = d/(2(mj+i)+1);
 *            row j is multiplied by x^(mj) < 2^-hmj in the end and keeps hm − 1 bits less a row.
 * Bound      |u| < 2^-10; units are those of row j. Powers are off by less than 2, cut by less than 3, and Σ_{0<i<m} c_i/d < 1.5 for m <= 12;
 *            x^m meets |s| < 1.1; the error of the row above counts at most half, by the bit that is kept:
 *            e_j <= 4.5 + 1 + (3·1.1 + 1) + 0.51 e_(j+1) <= 21. Terms left out: below 2|x|^n < 1. Then times |u| and one floor:
 *            below ODD_ULPS. Few terms: each is off by less than 3.
 * Reference  M. S. Paterson, L. J. Stockmeyer, SIAM J. Comput. 2 (1973) 60; D. M. Smith, Math. Comp. 52 (1989) 131.
 */
import { bitLength } from '../bits.js';
import { int, powersFixed, rowsOf } from './fixed.js';

export const ODD_ULPS = 64;
/** Heuristic: so few terms need no rows. */
const SHORT = 10;
const LEAST_BITS = 8;
const MOST_COLUMNS = 12;

/** Σ s^k u^(2k+1)/(2k+1) with s = −1 (artan) or s = 1 (artanh), |u| < 2^(wp−10). */
export function oddSeries(u: bigint, wp: number, s: 1 | -1): bigint {
  if (u === 0n) return 0n;
  const w = BigInt(wp);
  const x = (u * u) >> w;
  if (x === 0n) return u;
  const h = wp - bitLength(x); // x < 2^-h
  const n = Math.ceil((wp + 1) / h);
  const signed = s < 0 ? -x : x;
  return ((n <= SHORT ? short(signed, n, w) : byRows(signed, n, h, wp)) * u) >> w;
}

/** Σ_{k<n} x^k/(2k+1), one term after the other. */
function short(x: bigint, n: number, w: bigint): bigint {
  let t = x;
  let sum = 1n << w;
  for (let k = 1; k < n; k++) {
    sum += t / int(2 * k + 1);
    t = (t * x) >> w;
  }
  return sum;
}

/** The same by rows, for |x| <= 2^-h. */
function byRows(x: bigint, n: number, h: number, wp: number): bigint {
  const m = rowsOf(n, columnsFactor(wp), MOST_COLUMNS);
  const powers = powersFixed(x, m, BigInt(wp));
  const top = powers[m]!;
  const table = coefficients(m, Math.ceil(n / m));
  let t = 0n;
  let above = 0n;
  for (let j = Math.ceil(n / m) - 1; j >= 0; j--) {
    const c = table[j]!;
    const drop = Math.min(wp - LEAST_BITS, (h * m - 1) * j);
    const cut = BigInt(drop);
    const f = BigInt(wp - drop);
    let sum = c[0]! << f;
    if (drop === 0) for (let i = 1; i < m; i++) sum += powers[i]! * c[i]!;
    else for (let i = 1; i < m; i++) sum += (powers[i]! >> cut) * c[i]!;
    sum /= c[m]!;
    t = t === 0n ? sum : sum + (((top >> cut) * t) >> above);
    above = f;
  }
  return t;
}

/** Heuristic, from timings: columns over the root of the number of terms. */
function columnsFactor(wp: number): number {
  return wp < 700 ? 1.2 : wp < 2000 ? 0.9 : 0.8;
}

const tables: bigint[][][] = [];

/** c_0 … c_(m−1) and d of the rows of m columns; made once. */
function coefficients(m: number, rows: number): readonly (readonly bigint[])[] {
  const table = (tables[m] ??= []);
  for (let j = table.length; j < rows; j++) {
    let d = 1n;
    for (let i = 0; i < m; i++) d *= int(2 * (m * j + i) + 1);
    const c: bigint[] = [];
    for (let i = 0; i < m; i++) c.push(d / int(2 * (m * j + i) + 1));
    c.push(d);
    table.push(c);
  }
  return table;
}
