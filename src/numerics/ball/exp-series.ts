/**
 * @module The exponential series of a small argument in fixed point.
 *
 * Purpose    the last step of exp: e^r for an integer r that stands for r·2^-wp, |r| < 2^-10.
 * Method     rows of m terms (Paterson and Stockmeyer): s_j = 1 + (Σ_{0<i<m} c_i r^i + r^m s_(j+1))/c_0 with whole numbers
 *            c_i = (mj+i+1)…(mj+m), so that a term costs a product with a small integer and a row one full product and one short
 *            division. Row j is multiplied by r^(mj) < 2^-hmj in the end and keeps that many bits less.
 * Bound      units are those of row j, 2^-f. Powers are off by less than 2, cut by less than 3; they enter with Σ_{i>0} c_i/c_0 < e − 1.
 *            r^m meets |s| < 1.2, and the error e_(j+1) of the row above at most its own size, since f falls by hm a row:
 *            e_j <= 3(e−1) + (3·1.2 + e_(j+1) + 1)/c_0 + 1 <= 17. Terms left out: below 2|r|^n/n! < 1. In all below EXP_ULPS.
 * Reference  M. S. Paterson, L. J. Stockmeyer, SIAM J. Comput. 2 (1973) 60; F. Johansson, "Evaluating parametric holonomic sequences
 *            using rectangular splitting", arXiv:1310.3741; R. P. Brent, P. Zimmermann, "Modern Computer Arithmetic" (2010), section 4.4.
 */
import { int, LEAST_REDUCTION, powersFixed, rowsOf } from './fixed.js';

/** Error bound of expSeries in units of 2^-wp. */
export const EXP_ULPS = 32;
/** Fewest fraction bits of a row. */
const LEAST_BITS = 8;
const MOST_COLUMNS = 16;
const SQUARING_GUARD = 64;

/** e^r for |r| < 2^-h, h >= 10. */
export function expSeries(r: bigint, wp: number, h: number): bigint {
  const n = terms(wp, h);
  const m = rowsOf(n, columnsFactor(wp), MOST_COLUMNS);
  const powers = powersFixed(r, m, BigInt(wp));
  const top = powers[m]!;
  const table = coefficients(m, Math.ceil(n / m));
  let s = 0n;
  let above = 0n;
  for (let j = Math.ceil(n / m) - 1; j >= 0; j--) {
    const c = table[j]!;
    const drop = Math.min(wp - LEAST_BITS, h * m * j);
    const cut = BigInt(drop);
    const f = BigInt(wp - drop);
    let sum = 0n;
    if (drop === 0) for (let i = 1; i < m; i++) sum += powers[i]! * c[i]!;
    else for (let i = 1; i < m; i++) sum += (powers[i]! >> cut) * c[i]!;
    if (s !== 0n) sum += ((top >> cut) * s) >> above;
    s = (1n << f) + sum / c[0]!;
    above = f;
  }
  return s;
}

/** e^r for 0 <= r < 2^-h, by halvings and squarings where h < 10: ten squarings at most turn EXP_ULPS into 2^-40 ulp of the guarded value. */
export function expReduced(r: bigint, wp: number, h: number): bigint {
  const s = LEAST_REDUCTION - h;
  if (s <= 0) return expSeries(r, wp, h);
  const work = wp + SQUARING_GUARD;
  const w = BigInt(work);
  let e = expSeries(r << BigInt(SQUARING_GUARD - s), work, LEAST_REDUCTION);
  for (let i = 0; i < s; i++) e = (e * e) >> w;
  return e >> BigInt(SQUARING_GUARD);
}

/** log2 k!, below it by less than 2^-20. */
const log2Factorials: number[] = [0];

/** Least n with 2 |r|^n/n! < 2^-wp for |r| < 2^-h. */
function terms(wp: number, h: number): number {
  for (let n = 1; ; n++) {
    if (log2Factorials.length <= n) log2Factorials.push(log2Factorials[n - 1]! + Math.log2(n) * (1 - 2 ** -40));
    if (n * h + log2Factorials[n]! > wp + 1) return n;
  }
}

/** Heuristic, from timings: columns over the root of the number of terms. */
function columnsFactor(wp: number): number {
  return wp < 700 ? 1.3 : wp < 2000 ? 0.9 : 0.78;
}

const tables: bigint[][][] = [];

/** c_i, i = 0 … m, of the rows of m columns; made once. */
function coefficients(m: number, rows: number): readonly (readonly bigint[])[] {
  const table = (tables[m] ??= []);
  for (let j = table.length; j < rows; j++) {
    const c = new Array<bigint>(m + 1).fill(1n);
    for (let i = m - 1; i >= 0; i--) c[i] = c[i + 1]! * int(m * j + i + 1);
    table.push(c);
  }
  return table;
}
