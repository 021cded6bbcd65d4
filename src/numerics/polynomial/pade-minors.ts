/**
 * @module The denominator of a non-singular [L/M] as minors of the Toeplitz matrix, by many primes.
 *
 * Purpose    large exact approximants: the coefficients of Euclid's remainders grow to the size of the M×M minors at
 *            once, modulo a prime they never do.
 * Method     for each prime below 2^25 Euclid's scheme on x^n and b (n = L+M+1) gives the row (r, t) with deg r = L;
 *            σ·t, σ_k = σ_{k−1}·lc(r_{k−1})², is up to one common sign the vector of M×M minors D_0..D_M of the matrix
 *            [b_{L+i−j}], i = 1..M, j = 0..M (signed as by Cramer's rule), so Σ_j D_j b_{L+i−j} = 0. The Chinese
 *            remainder theorem joins the primes in a product tree.
 * Bound      exact: the product of the primes exceeds twice Hadamard's bound on every minor, taken after the scaling
 *            b_k → 2^(gk) b_k that makes it smallest of a few.
 *            The scheme is followed only where all quotients are linear; otherwise the caller uses Euclid on integers.
 * Reference  von zur Gathen–Gerhard, "Modern Computer Algebra", sections 5.5, 6.10 (subresultants), 10.3.
 */
import { bitLength } from '../bits.js';
import type { IntPoly } from './integer.js';
import { invertWord, modWord, reduceInt, wordPrime } from './modular.js';

/** Heuristic: after so many primes with a non-linear quotient the scheme is taken to be singular itself. */
const SINGULAR_TRIES = 2;
const PRIME_BITS = 24.99;

/**
 * D_0..D_M (up to a common sign) for the coefficients b_0..b_{L+M}; undefined when Euclid's scheme on the way to [L/M]
 * has a quotient that is not linear (an intermediate block) or C(L/M) = D_0 is zero modulo the primes tried.
 */
export function toeplitzMinors(b: IntPoly, L: number, M: number): bigint[] | undefined {
  const n = L + M + 1;
  if (b.length < n || b[n - 1] === 0n) return undefined;
  const bits = minorBits(b, L, M) + 2;
  const count = Math.ceil(bits / PRIME_BITS);
  const used: number[] = [];
  const residues: Float64Array[] = [];
  let failures = 0;
  for (let i = 0; used.length < count; i++) {
    const p = wordPrime(i);
    const row = minorsModulo(b, L, M, p);
    if (row === undefined) {
      failures++;
      if (used.length === 0 && failures >= SINGULAR_TRIES) return undefined;
      continue;
    }
    used.push(p);
    residues.push(row);
  }
  return chineseRemainder(used, residues, M + 1);
}

/** The minors modulo p, or undefined when the scheme is not normal there. */
export function minorsModulo(b: IntPoly, L: number, M: number, p: number): Float64Array | undefined {
  const n = L + M + 1;
  const inverse = 1 / p;
  let r1 = new Float64Array(n);
  const reduced = reduceInt(b.length > n ? b.slice(0, n) : b, p);
  if (reduced.length < n) return undefined;
  r1.set(reduced);
  let r0 = new Float64Array(n + 1);
  r0[n] = 1;
  let t0 = new Float64Array(M + 2);
  let t1 = new Float64Array(M + 2);
  t1[0] = 1;
  let sigma = 1;
  for (let k = 1; k <= M; k++) {
    const top = n - k; // degree of r1; r0 has degree top + 1
    const lead = r1[top]!;
    if (lead === 0) return undefined;
    sigma = modWord(sigma * modWord(lead * lead, p, inverse), p, inverse);
    const over = invertWord(lead, p);
    const c1 = p - modWord(r0[top + 1]! * over, p, inverse);
    const c0 = p - modWord(modWord(r0[top]! + c1 * r1[top - 1]!, p, inverse) * over, p, inverse);
    // r0 ← r0 + (c1 x + c0) r1, the same for t; c1, c0 already carry the minus sign.
    for (let i = top - 1; i > 0; i--) r0[i] = modWord(r0[i]! + c1 * r1[i - 1]! + c0 * r1[i]!, p, inverse);
    r0[0] = modWord(r0[0]! + c0 * r1[0]!, p, inverse);
    for (let i = k; i > 0; i--) t0[i] = modWord(t0[i]! + c1 * t1[i - 1]! + c0 * t1[i]!, p, inverse);
    t0[0] = modWord(t0[0]! + c0 * t1[0]!, p, inverse);
    [r0, r1, t0, t1] = [r1, r0, t1, t0];
  }
  if (t1[0] === 0) return undefined;
  const out = t1.subarray(0, M + 1);
  for (let i = 0; i <= M; i++) out[i] = modWord(out[i]! * sigma, p, inverse);
  return out;
}

/** log2 of a bound on all |D_j|: Hadamard on rows after b_k → 2^(gk) b_k, smallest over a few g. */
function minorBits(b: IntPoly, L: number, M: number): number {
  const size = (k: number): number => (k < 0 || b[k] === 0n ? -Infinity : bitLength(b[k]!));
  const n = L + M;
  const slope = (size(n) - size(Math.max(0, L - M))) / (2 * M);
  let best = Infinity;
  for (const g of [0, -slope, -slope / 2, -2 * slope]) {
    if (!Number.isFinite(g)) continue;
    let rows = 0;
    for (let i = 1; i <= M; i++) {
      let peak = -Infinity;
      for (let j = 0; j <= M; j++) peak = Math.max(peak, size(L + i - j) + g * (L + i - j));
      rows += peak + 0.5 * Math.log2(M + 1);
    }
    best = Math.min(best, rows - g * (M * L + (g > 0 ? 0 : M)));
  }
  return Math.max(best, 0);
}

/** Integers of least absolute value with the given residues modulo each prime. */
function chineseRemainder(used: readonly number[], residues: readonly Float64Array[], width: number): bigint[] {
  const modulus = productTree(used, 0, used.length);
  // Σ_i (w_i v_i mod p_i)·(P/p_i) with w_i = (P/p_i)^{-1} mod p_i; Σ_j P/p_j mod p_i leaves only the i-th term.
  const ones = combine(used, () => 1, 0, used.length).value;
  const weights = used.map((p) => invertWord(Number(ones % BigInt(p)), p));
  const half = modulus >> 1n;
  const out: bigint[] = [];
  for (let j = 0; j < width; j++) {
    const digit = (i: number): number => modWord(residues[i]![j]! * weights[i]!, used[i]!, 1 / used[i]!);
    const value = combine(used, digit, 0, used.length).value % modulus;
    out.push(value > half ? value - modulus : value);
  }
  return out;
}

const treeCache = new WeakMap<readonly number[], Map<string, bigint>>();

/** Product of used[low..high), kept per node. */
function productTree(used: readonly number[], low: number, high: number): bigint {
  let cache = treeCache.get(used);
  if (cache === undefined) treeCache.set(used, (cache = new Map()));
  const key = `${low},${high}`;
  let value = cache.get(key);
  if (value === undefined) {
    const mid = (low + high) >> 1;
    value = high - low === 1 ? BigInt(used[low]!) : productTree(used, low, mid) * productTree(used, mid, high);
    cache.set(key, value);
  }
  return value;
}

const LEAF = 6;

/** Σ digit(i)·Π_{j≠i} p_j over used[low..high). */
function combine(
  used: readonly number[],
  digit: (i: number) => number,
  low: number,
  high: number,
): { value: bigint; product: bigint } {
  if (high - low <= LEAF) {
    let value = 0n;
    let product = 1n;
    for (let i = low; i < high; i++) {
      const p = BigInt(used[i]!);
      value = value * p + BigInt(digit(i)) * product;
      product *= p;
    }
    return { value, product };
  }
  const mid = (low + high) >> 1;
  const left = combine(used, digit, low, mid);
  const right = combine(used, digit, mid, high);
  const product = productTree(used, low, high);
  return { value: left.value * right.product + right.value * left.product, product };
}
