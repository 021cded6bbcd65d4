/**
 * @module Logarithms of the first primes in fixed point, kept at the highest precision asked so far.
 *
 * Purpose    the constants of argument reduction by several primes (smooth.ts); ln 2 is the one of constants.ts.
 * Method     2 log p = log(p−1) + log(p+1) + 2 artanh(1/(2p²−1)) for odd p: both neighbours have smaller prime factors only.
 * Bound      an error of 2 ulp of ln 2 and of each artanh: with e_p the error of log p, e_p <= (Σ_q v_q((p−1)(p+1)) e_q)/2 + 3; the
 *            multiplicities of p² − 1 for p <= 41 keep every e_p below 2^7 ulp, far below the GUARD.
 * Reference  the identity log(p²/(p²−1)) = 2 artanh(1/(2p²−1)).
 */
import { acothFixed, ln2Fixed } from './constants.js';
import { PRIMES } from './relations.js';

const GUARD = 32;

let have = -1;
let highest: readonly bigint[] = [];
/** The same cut to the precision asked last but a few. */
const cut = new Map<number, readonly bigint[]>();
const CUT_KEPT = 16;

/** log 2, log 3, … log 41, in units of 2^-wp, each off by less than 2 units. */
export function primeLogs(wp: number): readonly bigint[] {
  const known = cut.get(wp);
  if (known !== undefined) return known;
  if (wp > have) {
    have = wp + Math.max(64, wp >> 3);
    highest = compute(have + GUARD).map((v) => v >> BigInt(GUARD));
    cut.clear();
  }
  const drop = BigInt(have - wp);
  const values = highest.map((v) => v >> drop);
  if (cut.size >= CUT_KEPT) cut.clear();
  cut.set(wp, values);
  return values;
}

function compute(wp: number): bigint[] {
  const logs = [ln2Fixed(wp)];
  for (const p of PRIMES.slice(1)) {
    const twice = logOf(p - 1, logs) + logOf(p + 1, logs) + 2n * acothFixed(2 * p * p - 1, wp);
    logs.push(twice >> 1n);
  }
  return logs;
}

/** log n from the logarithms of its prime factors, all of which are known. */
function logOf(n: number, logs: readonly bigint[]): bigint {
  let sum = 0n;
  let rest = n;
  for (const [j, log] of logs.entries()) {
    const p = PRIMES[j]!;
    for (; rest % p === 0; rest /= p) sum += log;
  }
  return sum;
}
