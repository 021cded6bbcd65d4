/**
 * @module Riemann's ζ at integers n >= 2.
 *
 * Purpose    constants of perturbation theory, and Taylor coefficients of log Γ next to 1.
 * Method     large n: the defining sum. Small even n: Bernoulli numbers and π (DLMF 25.6.2). Otherwise Borwein's alternating
 *            sum. Each n is kept at the highest precision asked so far.
 * Bound      Borwein with N terms: ζ(s)(1 − 2^(1−s)) = (1/d_N) Σ_{k<N} (−1)^k (d_N − d_k)/(k+1)^s + γ_N with
 *            γ_N = (±1/(d_N Γ(s))) ∫_0^1 T_N(1−2x) |log x|^(s−1)/(1+x) dx, so |γ_N| <= 1/d_N <= 2·(3+√8)^(−N).
 *            Defining sum with K terms: the tail is below K^(1−s)/(s−1).
 * Reference  P. Borwein, "An efficient algorithm for the Riemann zeta function", CMS Conf. Proc. 27 (2000) 29, algorithm 2.
 */
import { pi } from '../ball/constants.js';
import { powInt, fromRational, mul, round, ball, addError, INDETERMINATE } from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import { Rational } from '../rational.js';
import { bernoulli } from './bernoulli.js';

const GUARD = 24;
/** Heuristic: even n up to this go through Bernoulli numbers. */
const EVEN_LIMIT = 100;
/** Heuristic: the defining sum serves when it needs at most this many terms. */
const DIRECT_TERMS = 48;

const known = new Map<number, { prec: number; value: Ball }>();

/** ζ(n) for integer n >= 2 to prec bits; INDETERMINATE for other n. */
export function zeta(n: number, prec: number): Ball {
  if (!Number.isInteger(n) || n < 2) return INDETERMINATE;
  const have = known.get(n);
  if (have !== undefined && have.prec >= prec) return round(have.value, prec);
  const work = prec + Math.max(64, prec >> 3);
  const value = compute(n, work);
  known.set(n, { prec: work, value });
  return round(value, prec);
}

function compute(n: number, prec: number): Ball {
  const wp = prec + GUARD;
  if (n >= wp + 2) return addError(ball(1n, 0), 1, 1 - n);
  const terms = Math.ceil(2 ** ((wp + 2) / (n - 1)));
  if (terms <= DIRECT_TERMS) return direct(n, terms, wp, prec);
  if (n % 2 === 0 && n <= EVEN_LIMIT) return fromBernoulli(n, prec);
  return borwein(n, wp, prec);
}

function direct(n: number, terms: number, wp: number, prec: number): Ball {
  const one = 1n << BigInt(wp);
  let s = one;
  for (let k = 2; k <= terms; k++) s += one / BigInt(k) ** BigInt(n);
  return ball(s, -wp, terms + 2, prec);
}

/** ζ(2k) = |B_2k| (2π)^2k/(2 (2k)!). */
function fromBernoulli(n: number, prec: number): Ball {
  const work = prec + 16;
  let f = 2n;
  for (let k = 2; k <= n; k++) f *= BigInt(k);
  const b = bernoulli(n).abs();
  const factor = Rational.of(b.num << BigInt(n), b.den * f);
  return mul(powInt(pi(work), n, work), fromRational(factor, work), prec);
}

function borwein(n: number, wp: number, prec: number): Ball {
  const size = Math.ceil((wp + 4) / Math.log2(3 + Math.SQRT2 * 2)) + 1;
  // d_k = N Σ_{i<=k} (N+i−1)! 4^i/((N−i)! (2i)!), an integer; term ratio 4(N+i)(N−i)/((2i+1)(2i+2)).
  const d: bigint[] = [];
  let term = 1n;
  let sum = 0n;
  for (let i = 0; i <= size; i++) {
    sum += term;
    d.push(sum);
    term = (term * BigInt(4 * (size + i) * (size - i))) / BigInt((2 * i + 1) * (2 * i + 2));
  }
  const total = d[size]!;
  let s = 0n;
  const scale = BigInt(GUARD);
  for (let k = 0; k < size; k++) {
    const t = ((total - d[k]!) << scale) / BigInt(k + 1) ** BigInt(n);
    s += k & 1 ? -t : t;
  }
  // Each floor loses 1 of total·2^GUARD >= 2^(wp+GUARD) units; then (1 − 2^(1−n)) is divided out exactly.
  const top = s << BigInt(wp + n - 1);
  const low = (total << scale) * ((1n << BigInt(n - 1)) - 1n);
  // γ_N/(1 − 2^(1−n)) <= 2·2^-wp/8, floors at most `size`·2^-(wp+GUARD)·2, last division 1.
  return ball(top / low, -wp, 4, prec);
}
