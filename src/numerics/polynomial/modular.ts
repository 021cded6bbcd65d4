/**
 * @module Polynomials over the field of integers modulo a prime below 2^25, in doubles.
 *
 * Purpose    cheap exact evidence about big polynomials: degree of a gcd, normality of a Padé table, determinants.
 * Method     residues are doubles in [0, p). With p < 2^25 a product stays below 2^50 and a sum of eight products below
 *            2^53, so every operation on doubles is exact; x mod p = x − floor(x·(1/p))·p with one correction.
 * Bound      exact. |x·(1/p) − x/p| <= x/p·2^-52 < 1 for x < 2^53 and p > 2: the floor is off by one at most.
 * Reference  J. von zur Gathen, J. Gerhard, "Modern Computer Algebra", chapters 5 and 6 (modular algorithms).
 */

/** Residues in ascending order of degree; the last one is non-zero. */
export type ModPoly = Float64Array;

const PRIME_TOP = 2 ** 25;
/** Some 900 primes at a time: more than most runs need, at little cost. */
const SIEVE_SPAN = 2 ** 14;
const primes: number[] = [];
let sieved = PRIME_TOP;

/** Sieves the next span below the ones known. */
function sieveMore(): void {
  const low = sieved - SIEVE_SPAN;
  const composite = new Uint8Array(SIEVE_SPAN);
  const root = Math.floor(Math.sqrt(sieved)) + 1;
  const small = new Uint8Array(root + 1);
  for (let d = 2; d <= root; d++) {
    if (small[d] === 1) continue;
    for (let m = d * d; m <= root; m += d) small[m] = 1;
    for (let m = Math.ceil(low / d) * d; m < sieved; m += d) composite[m - low] = 1;
  }
  for (let i = SIEVE_SPAN - 1; i >= 0; i--) if (composite[i] === 0) primes.push(low + i);
  sieved = low;
}

/** The i-th prime below 2^25, descending from i = 0. There are about 10^6 of at least 24 bits. */
export function wordPrime(i: number): number {
  while (primes.length <= i) {
    if (sieved <= 2 ** 24) throw new RangeError(`wordPrime: no prime with index ${i}`);
    sieveMore();
  }
  return primes[i]!;
}

/** x mod p for 0 <= x < 2^53. */
export function modWord(x: number, p: number, inverse: number): number {
  const r = x - Math.floor(x * inverse) * p;
  return r < 0 ? r + p : r >= p ? r - p : r;
}

/** 1/a mod p for 0 < a < p (extended Euclid). */
export function invertWord(a: number, p: number): number {
  let [r0, r1, t0, t1] = [p, a, 0, 1];
  while (r1 !== 0) {
    const q = Math.floor(r0 / r1);
    [r0, r1] = [r1, r0 - q * r1];
    [t0, t1] = [t1, t0 - q * t1];
  }
  return t0 < 0 ? t0 + p : t0;
}

/** Integers reduced modulo p, trailing zero residues dropped. */
export function reduceInt(a: readonly bigint[], p: number): ModPoly {
  const out = new Float64Array(a.length);
  const big = BigInt(p);
  let n = 0;
  for (let i = 0; i < a.length; i++) {
    const r = Number(a[i]! % big);
    out[i] = r < 0 ? r + p : r;
    if (r !== 0) n = i + 1;
  }
  return out.subarray(0, n);
}

/** Degree of gcd(a, b) modulo p, and the monic gcd itself. Both arguments are left alone; gcd(0, 0) is []. */
export function gcdMod(a: ModPoly, b: ModPoly, p: number): ModPoly {
  const inverse = 1 / p;
  let x = a.slice();
  let y = b.slice();
  let nx = x.length;
  let ny = y.length;
  while (ny > 0) {
    const lead = invertWord(y[ny - 1]!, p);
    for (let k = nx - ny; k >= 0; k--) {
      const c = modWord(x[k + ny - 1]! * lead, p, inverse);
      if (c !== 0) {
        const f = p - c;
        for (let j = 0; j < ny - 1; j++) x[k + j] = modWord(x[k + j]! + f * y[j]!, p, inverse);
      }
      x[k + ny - 1] = 0;
    }
    nx = Math.min(nx, ny - 1);
    while (nx > 0 && x[nx - 1] === 0) nx--;
    [x, y, nx, ny] = [y, x, ny, nx];
  }
  const g = x.subarray(0, nx);
  if (nx > 0) {
    const f = invertWord(g[nx - 1]!, p);
    for (let i = 0; i < nx; i++) g[i] = modWord(g[i]! * f, p, inverse);
  }
  return g;
}
