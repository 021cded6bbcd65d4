/**
 * @module Riemann's ζ on the real line.
 *
 * Purpose    anomalous exponents and sums whose order is no integer; integers go to zeta.ts.
 * Method     s >= 1/2: Borwein's alternating sum η(s) = (1/d_N) Σ_{k<N} (−1)^k (d_N − d_k)(k+1)^−s + γ_N and ζ(s) = η(s)/(1 − 2^(1−s)), with
 *            n^−s of composite n from those of its factors; large s: the defining sum. s < 1/2: DLMF 25.4.1,
 *            ζ(s) = 2 (2π)^(s−1) sin(πs/2) Γ(1−s) ζ(1−s), with the sine relatively accurate next to the trivial zeros.
 * Bound      γ_N = (±1/(d_N Γ(s))) ∫_0^1 T_N(1−2x)|log x|^(s−1)/(1+x) dx, so |γ_N| <= 1/d_N <= 2 (3+√8)^−N for s > 0. Defining sum:
 *            the tail beyond K is below K^(1−s)/(s−1). Next to s = 1 the factor 1 − 2^(1−s) comes from expm1. A radius of s enters
 *            through the sums in ball arithmetic, which overestimates by a few bits.
 * Reference  P. Borwein, CMS Conf. Proc. 27 (2000) 29, algorithm 2; DLMF 25.2.1, 25.4.1.
 */
import { ln2, pi } from '../ball/constants.js';
import { exp, expm1, log, sinCosPi } from '../ball/elementary.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import { Rational } from '../rational.js';
import { gamma } from './gamma.js';
import { refine } from './refine.js';
import { zeta } from './zeta.js';

/** Arguments beyond this are not followed to the left. */
const LEFT_LIMIT = 1 << 16;
/** Wider balls are not followed. */
const WIDEST = 0.25;
/** Heuristic: the defining sum serves when it needs at most this many terms. */
const DIRECT_TERMS = 24;
const HALF = Rational.of(1n, 2n);

/** ζ(s) for real s; INDETERMINATE on a ball that holds the pole at 1, is wider than ±1/4, or lies below −65536. */
export function zetaReal(s: Ball, prec: number): Ball {
  if (s.rad === Infinity || R.containsZero(R.sub(s, R.ONE, 1e9))) return R.INDETERMINATE;
  const n = integerOf(s);
  if (n !== undefined && n >= 2 && n < 1e9) return zeta(n, prec);
  if (n === 0) return R.fromRational(HALF.neg(), prec);
  const x = R.toNumber(s);
  const r = R.radiusToNumber(s);
  if (x < -LEFT_LIMIT || r > WIDEST) return R.INDETERMINATE;
  const lost = Math.ceil(Math.log2(2 + Math.abs(x)));
  return R.round(x >= 0.5 ? right(s, x - r, prec + 4) : reflected(s, x + r, prec + 8 + lost), prec);
}

function integerOf(s: Ball): number | undefined {
  if (s.rad !== 0 || R.upperBits(s) > 40) return undefined;
  const q = R.midpoint(s);
  return q.isInteger() ? Number(q.num) : undefined;
}

function reflected(s: Ball, x: number, prec: number): Ball {
  const { sin } = sinCosPi(R.mul2exp(s, -1), prec);
  if (R.isExactZero(sin)) return R.ZERO;
  const other = R.sub(R.ONE, s, s.rad === 0 ? 1e9 : prec + 60);
  const work = prec + Math.ceil(Math.log2(2 + Math.abs(x))) + 4;
  const twoPi = R.mul2exp(pi(work), 1);
  const power = exp(R.neg(R.mul(other, log(twoPi, work), work)), prec);
  const size = R.mul(R.mul(power, gamma(other, prec), prec), R.mul2exp(right(other, 1 - x, prec), 1), prec);
  return R.mul(size, sin, prec);
}

/** s > 0 and not 1; x is a lower bound of s. */
function right(s: Ball, x: number, prec: number): Ball {
  return refine(prec, prec + 12, (bits) => sum(s, x, bits), R.accuracyBits);
}

function sum(s: Ball, x: number, bits: number): Ball {
  if (x > 2) {
    // K^(1−s)/(s−1) < 2^-bits
    const terms = Math.ceil(2 ** Math.min(40, (bits + 1) / (x - 1.001))) + 1;
    if (terms <= DIRECT_TERMS) return direct(s, terms, x, bits);
  }
  return alternating(s, bits);
}

function direct(s: Ball, terms: number, x: number, bits: number): Ball {
  const powers = inversePowers(s, terms, bits);
  let total: Ball = R.ZERO;
  for (let k = terms; k >= 1; k--) total = R.add(total, powers[k]!, bits);
  // The tail is below K^(1−s)/(s−1) with K = terms.
  const tail = R.mul(powers[terms]!, R.fromNumber(terms), 40);
  const bound = R.div(tail, R.fromNumber(Math.max(1, Math.floor(x - 1.001))), 40);
  return R.widen(total, bound);
}

/** η(s)/(1 − 2^(1−s)). */
function alternating(s: Ball, bits: number): Ball {
  const size = Math.ceil((bits + 4) / 2.5431) + 1; // log2(3 + √8) > 2.5431
  const partial: bigint[] = [];
  let term = 1n;
  let d = 0n;
  for (let i = 0; i <= size; i++) {
    d += term;
    partial.push(d);
    term = (term * BigInt(4 * (size + i) * (size - i))) / BigInt((2 * i + 1) * (2 * i + 2));
  }
  const powers = inversePowers(s, size, bits + 8);
  let total: Ball = R.ZERO;
  for (let k = size - 1; k >= 0; k--) {
    const t = R.mul(powers[k + 1]!, R.fromNumber(d - partial[k]!), bits + 8);
    total = R.add(total, k & 1 ? R.neg(t) : t, bits + 8);
  }
  const eta = R.addError(R.div(total, R.fromNumber(d), bits + 8), 2, -Math.floor(2.5431 * size));
  const less = R.mul(R.sub(R.ONE, s, s.rad === 0 ? 1e9 : bits + 60), ln2(bits + 20), bits + 20);
  return R.div(eta, R.neg(expm1(less, bits + 8)), bits);
}

/** n^−s for n = 1 … count: primes by the exponential, composites as products. */
function inversePowers(s: Ball, count: number, bits: number): Ball[] {
  const factor = new Int32Array(count + 1);
  for (let p = 2; p * p <= count; p++) {
    if (factor[p] === 0) for (let q = p * p; q <= count; q += p) if (factor[q] === 0) factor[q] = p;
  }
  const work = bits + 2 * Math.ceil(Math.log2(count + 2)) + 4;
  const more = work + Math.max(0, R.upperBits(s)) + 4;
  const out: Ball[] = [R.INDETERMINATE, R.ONE];
  for (let n = 2; n <= count; n++) {
    const p = factor[n]!;
    out.push(
      p === 0 ? exp(R.neg(R.mul(s, log(R.fromNumber(n), more), more)), work) : R.mul(out[p]!, out[n / p]!, work),
    );
  }
  return out;
}
