/**
 * @module Mathematical constants to any precision: π, ln 2, Euler's γ. (ζ(n) is in zeta.ts.)
 *
 * Purpose    one place where each constant is computed, kept at the highest precision asked so far.
 * Method     π: Chudnovsky series, binary splitting. ln 2: Machin-like sum of three inverse hyperbolic cotangents, binary
 *            splitting. γ: Brent–McMillan algorithm B1 with n a power of two.
 * Bound      written above each function; all are below 1 ulp (2^-wp), which the ball's radius carries.
 * Reference  D. V. & G. V. Chudnovsky, in "Ramanujan Revisited" (1988) 375; R. P. Brent, E. M. McMillan,
 *            "Some new algorithms for high-precision computation of Euler's constant", Math. Comp. 34 (1980) 305;
 *            R. P. Brent, F. Johansson, "A bound for the error term in the Brent–McMillan algorithm",
 *            Math. Comp. 84 (2015) 2351.
 */
import { isqrt } from '../bits.js';
import { ball } from './real.js';
import type { Ball } from './real.js';
import { int } from './fixed.js';

/** Guard bits of every computation here; all error counts stay far below 2^GUARD ulp. */
const GUARD = 32;

/** A constant in fixed point with an error below 1 ulp, kept at the highest precision asked so far. */
function cached(compute: (wp: number) => bigint): (wp: number) => bigint {
  let have = -1;
  let value = 0n;
  return (wp) => {
    if (wp > have) {
      // Some room, so that a slowly rising precision does not recompute at every step.
      have = wp + Math.max(64, wp >> 3);
      value = compute(have + GUARD) >> BigInt(GUARD);
    }
    return have === wp ? value : value >> BigInt(have - wp);
  };
}

/** A real constant as a ball from its fixed-point value (floor of a value right to 1 ulp: below 2 ulp in all). */
export function ballFromFixed(value: bigint, wp: number, ulps: number, prec: number): Ball {
  return ball(value, -wp, ulps, prec);
}

type Split = [bigint, bigint, bigint];

const A = 13591409n;
const B = 545140134n;
const C3_24 = 10939058860032000n; // 640320³/24

/** Products P, Q and sum T of the Chudnovsky series over terms a <= k < b. */
function chudnovsky(a: number, b: number): Split {
  if (b - a === 1) {
    if (a === 0) return [1n, 1n, A];
    const k = BigInt(a);
    const p = (6n * k - 5n) * (2n * k - 1n) * (6n * k - 1n);
    const t = p * (A + B * k);
    return [p, k * k * k * C3_24, a & 1 ? -t : t];
  }
  const m = (a + b) >> 1;
  const [p1, q1, t1] = chudnovsky(a, m);
  const [p2, q2, t2] = chudnovsky(m, b);
  return [p1 * p2, q1 * q2, t1 * q2 + p1 * t2];
}

/**
 * π = 426880·√10005·Q/T. The series alternates and its terms fall by 151931373056000 > 2^47.1 each: the remainder is below
 * the first omitted term, 2^(24 − 47.1 n)·A. The root and the division lose 2 ulp.
 */
const piRaw = cached((wp) => {
  const n = Math.ceil(wp / 47) + 2;
  const [, q, t] = chudnovsky(0, n);
  const w = BigInt(wp);
  const root = isqrt(10005n << (2n * w));
  return (426880n * q * root) / t;
});

/** Heuristic: terms added one by one at the bottom of the splitting. */
const LEAF = 12;

/** Σ_{a<=k<b} 1/((2k+1) x2^(k−a)) as T/(P Q) with P = x2^(b−a), Q = Π(2k+1). */
function acothSplit(x2: bigint, a: number, b: number): Split {
  if (b - a <= LEAF) {
    let p = 1n;
    let q = 1n;
    let t = 0n;
    for (let k = a; k < b; k++) {
      const odd = int(2 * k + 1);
      t = (t * odd + q) * x2;
      q *= odd;
      p *= x2;
    }
    return [p, q, t];
  }
  const m = (a + b) >> 1;
  const [p1, q1, t1] = acothSplit(x2, a, m);
  const [p2, q2, t2] = acothSplit(x2, m, b);
  return [p1 * p2, q1 * q2, t1 * q2 * p2 + t2 * q1];
}

/** artanh(1/x)·2^wp, x >= 2: the tail after n terms is below 2·x^-(2n+1) < 2^-wp; one more ulp from the division. */
export function acothFixed(x: number, wp: number): bigint {
  const n = Math.ceil((wp + 2) / (2 * Math.log2(x))) + 1;
  const [p, q, t] = acothSplit(BigInt(x * x), 0, n);
  return (t << BigInt(wp)) / (p * q * BigInt(x));
}

/** ln 2 = 18 artanh(1/26) − 2 artanh(1/4801) + 8 artanh(1/8749): 28·2 ulp at most, below 2^GUARD. */
const ln2Raw = cached((wp) => 18n * acothFixed(26, wp) - 2n * acothFixed(4801, wp) + 8n * acothFixed(8749, wp));

/**
 * γ = S/I − ln n − δ with I = Σ (n^k/k!)², S = Σ H_k (n^k/k!)² and 0 < δ = K₀(2n)/I₀(2n) < π e^{−4n}.
 * Here n = 2^s with 4n/ln 2 >= wp + 4. Summation stops when the term is below one ulp with k > 2n (ratio < 1/4), so
 * each tail is below 2 ulp. A term's relative rounding error grows by 2 ulp a step and the quotient is below 20, so the
 * total stays below 20·(2k + 8) ulp with k < 4n + wp: below 2^GUARD ulp for every wp < 2^20.
 */
const gammaRaw = cached((wp) => {
  const s = Math.max(0, Math.ceil(Math.log2(((wp + 4) * Math.LN2) / 4)));
  const n = 2 ** s;
  const twice = BigInt(2 * s);
  let b = 1n << BigInt(wp); // (n^k/k!)²
  let a = 0n; // H_k (n^k/k!)²
  let sumB = b;
  let sumA = 0n;
  for (let k = 1; b !== 0n || k <= 2 * n; k++) {
    const kk = int(k);
    b = (b << twice) / (kk * kk);
    a = ((a << twice) / kk + b) / kk;
    sumB += b;
    sumA += a;
  }
  return (sumA << BigInt(wp)) / sumB - BigInt(s) * (ln2Raw(wp + 16) >> 16n);
});

/** π·2^wp, below 2 ulp off. */
export const piFixed = (wp: number): bigint => piRaw(wp);
/** ln 2·2^wp, below 2 ulp off. */
export const ln2Fixed = (wp: number): bigint => ln2Raw(wp);
/** γ·2^wp, below 2 ulp off. */
export const eulerGammaFixed = (wp: number): bigint => gammaRaw(wp);

/** π to prec bits. */
export const pi = (prec: number): Ball => ballFromFixed(piRaw(prec + 8), prec + 8, 2, prec);
/** ln 2 to prec bits. */
export const ln2 = (prec: number): Ball => ballFromFixed(ln2Raw(prec + 8), prec + 8, 2, prec);
/** Euler's constant γ = 0.5772… to prec bits. */
export const eulerGamma = (prec: number): Ball => ballFromFixed(gammaRaw(prec + 8), prec + 8, 2, prec);
