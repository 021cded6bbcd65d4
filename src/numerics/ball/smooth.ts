/**
 * @module Reduction of an argument by the logarithms of several primes.
 *
 * Purpose    for |t| < 64: small exponents e_j with t − Σ e_j log p_j tiny, and the fraction Π p_j^e_j as two short integers. exp and log
 *            then need few terms of their series, and nothing is kept but 13 logarithms.
 * Method     the rows of relations.ts in turn, each as often as it fits; t and the rows in fixed point of 2·45 bits, exactly.
 * Bound      the exponents are exact integers, so any of them are right; how small the rest becomes only decides how fast the
 *            series converges, and callers measure it. Σ |e_j| stays below 2^13 with all rows.
 * Reference  F. Johansson, "Computing elementary functions using multi-prime argument reduction", arXiv:2207.02501.
 */
import { int } from './fixed.js';
import { primeLogs } from './prime-logs.js';
import { PRIMES, RELATIONS } from './relations.js';

/** Heuristic: from this working precision on the reduction by primes is cheaper than tables. */
export const SMOOTH_FROM = 900;

/** Heuristic: rows of the table that pay at wp bits; the rest is then below 2^-43 at least. */
export function rowsFor(wp: number): number {
  return Math.min(RELATIONS.length, 8 + Math.ceil(Math.sqrt(wp) / 2));
}

/** t = high·2^-45 + low·2^-90 with integers high and low; |t| < 2^REACH keeps all products of words exact in doubles. */
export const WORD = 45;
export const REACH = 6;
const UNIT = 2 ** WORD;

/** ε of each row: its two words, and the whole as a double in units of 2^-90. */
interface Sizes {
  readonly high: Float64Array;
  readonly low: Float64Array;
  readonly whole: Float64Array;
}
let sizes: Sizes | undefined;

function measure(): Sizes {
  const logs = primeLogs(2 * WORD);
  const out = {
    high: new Float64Array(RELATIONS.length),
    low: new Float64Array(RELATIONS.length),
    whole: new Float64Array(RELATIONS.length),
  };
  RELATIONS.forEach((row, i) => {
    const epsilon = row.reduce((sum, d, j) => sum + BigInt(d) * logs[j]!, 0n);
    out.high[i] = Number(epsilon >> BigInt(WORD));
    out.low[i] = Number(BigInt.asUintN(WORD, epsilon));
    out.whole[i] = Number(epsilon);
  });
  return out;
}

/** Exponents e with |t − Σ e_j log p_j| of 2^(1−2·rows) or less, for t = high·2^-45 + low·2^-90, |t| < 64. */
export function smoothExponents(high: number, low: number, rows: number): Int32Array {
  const { high: eh, low: el, whole } = (sizes ??= measure());
  const e = new Int32Array(PRIMES.length);
  const count = Math.min(rows, RELATIONS.length);
  for (let i = 0; i < count; i++) {
    const q = Math.round((high * UNIT + low) / whole[i]!);
    if (q === 0) continue;
    high -= q * eh[i]!;
    low -= q * el[i]!;
    const row = RELATIONS[i]!;
    for (let j = 0; j < row.length; j++) e[j]! += q * row[j]!;
  }
  return e;
}

/** Heuristic spare bits: Σ |e_j| < 2^13 errors of 2 units of 2^-(wp + SPARE) stay below 1/4. */
const SPARE = 16;
const SPARE_BITS = BigInt(SPARE);

/** Σ e_j log p_j in units of 2^-wp, off by less than 2. */
export function smoothLog(e: Int32Array, wp: number): bigint {
  const logs = primeLogs(wp + SPARE);
  let sum = 0n;
  for (let j = 0; j < e.length; j++) {
    const k = e[j]!;
    if (k > 0) sum += logs[j]! * int(k);
    else if (k < 0) sum -= logs[j]! * int(-k);
  }
  return sum >> SPARE_BITS;
}
/** Π p_j^e_j over the odd primes as num/den; the power of 2 is e[0]. */
export function smoothFraction(e: Int32Array): { num: bigint; den: bigint } {
  return { num: product(e, 1), den: product(e, -1) };
}

function product(e: Int32Array, sign: 1 | -1): bigint {
  let out = 1n;
  let word = 1;
  for (let j = 1; j < e.length; j++) {
    const p = PRIMES[j]!;
    for (let k = sign * e[j]!; k > 0; k--) {
      if (word > Number.MAX_SAFE_INTEGER / p) {
        out *= BigInt(word);
        word = 1;
      }
      word *= p;
    }
  }
  return out * BigInt(word);
}
