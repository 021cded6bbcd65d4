/**
 * @module exp of |t| < 64 in fixed point by reduction with the logarithms of 13 primes: long working precisions.
 *
 * Purpose    exp where products with table entries would cost more than the series they shorten.
 * Method     exp t = 2^e₀ (num/den) exp r, r = t − Σ e_j log p_j, with the fraction Π_{j>0} p_j^e_j of some hundred bits (smooth.ts).
 * Bound      r is off by less than 2 ulp plus the error of t, and exp r by EXP_ULPS more; what multiplies it, 2^(e₀−n) num/den, is near
 *            exp(t − n ln 2) < 1.5; the division cuts 1: below 64 ulp.
 * Reference  F. Johansson, "Computing elementary functions using multi-prime argument reduction", arXiv:2207.02501.
 */
import { bitLength } from '../bits.js';
import { expSeries } from './exp-series.js';
import { rowsFor, smoothExponents, smoothFraction, smoothLog, WORD } from './smooth.js';

const WORD_BITS = BigInt(WORD);
/** Error bound of expSmooth. */
export const SMOOTH_ULPS = 64;

/** exp(t·2^-wp) = y·2^(n−wp) for |t| < 64·2^wp off by less than 3, wp >= SMOOTH_FROM; y in (0.7, 1.5)·2^wp is off by less than SMOOTH_ULPS. */
export function expSmooth(t: bigint, wp: number): { y: bigint; n: number } {
  const top = t >> BigInt(wp - 2 * WORD);
  const high = Number(top >> WORD_BITS);
  const e = smoothExponents(high, Number(BigInt.asUintN(WORD, top)), rowsFor(wp));
  const r = t - smoothLog(e, wp);
  const { num, den } = smoothFraction(e);
  const product = expSeries(r, wp, wp - bitLength(r)) * num;
  const n = Math.round((high * 2 ** -WORD) / Math.LN2);
  const up = e[0]! - n;
  return { y: up >= 0 ? (product << BigInt(up)) / den : product / (den << BigInt(-up)), n };
}
