/**
 * @module The Taylor coefficients of 1/Γ(1 + u) around 0 in fixed point, kept at the highest precision asked so far.
 *
 * Purpose    what the Taylor polynomials of gamma-taylor.ts are moved from.
 * Method     F(u) = M!/Γ(M+1+u) with M = 16: F′/F = γ − H_M + Σ_{j>=2} (−1)^(j+1) η_j u^(j−1), η_j = ζ(j) − Σ_{m<=M} m^-j, so that
 *            k F_k = (γ − H_M) F_(k−1) + Σ_{j>=2} (−1)^(j+1) η_j F_(k−j), where both factors fall quickly and are cut to the bits that
 *            count; then 1/Γ(1+u) = F(u) Π_{m<=M} (1 + u/m). All in the variable y = 2u: |y| <= 1 where it serves.
 * Bound      units of 2^-base. η_j is off by less than 2 + 1.1 M < 20; |F_k| (in y) sums to less than 8, so these errors bring 160; a product costs
 *            one floor and 2^-7 of cuts: e_k <= (1.4 e_(k−1) + 0.1 max e + 1.01 k + 160)/k + 1 < 2^8. The factors multiply by Π (1 + 1/2m) < 4.7
 *            and add 1 each, 75 in all: below 2^11.
 *            Tail: |Γ(x+iy)| >= Γ(x) √sech(πy) for x >= 1/2 and Γ(x) > 0.885 give, on |u| = N,
 *            |1/Γ(1+u)| <= 1.13 e^(πN/2) (2N)!/N! =: M_N, so |d_k| <= M_N N^-k, and the terms beyond n on |u| <= 1/2 sum to less
 *            than M_N (2N)^-n for N >= 1.
 * Reference  DLMF 5.7.1, 5.7.2.
 */
import { bitLength } from '../bits.js';
import { eulerGammaFixed } from '../ball/constants.js';
import { int } from '../ball/fixed.js';
import { zetaList } from './zeta-list.js';

/** Heuristic: steps up from 1 that make both factors of the recurrence small. */
const STEPS = 16;
const CUT_GUARD = 8;

let have = -1;
let highest: readonly bigint[] = [];

/** d_k·2^(base−k) for k = 0, 1, …, each off by less than 2^11; what is left out sums to less than 1 for |u| <= 1/2. */
export function reciprocalGammaSeries(base: number): readonly bigint[] {
  if (base > have) {
    have = base;
    highest = compute(base);
  }
  if (have === base) return highest;
  const drop = BigInt(have - base);
  const out = highest.map((d) => d >> drop);
  while (out.length > 1 && (out[out.length - 1] === 0n || out[out.length - 1] === -1n)) out.pop();
  return out;
}

/** Least n (even) with Σ_{j>n} |d_j| 2^-j < 2^-bits, from the bound of the header. */
export function seriesLength(bits: number): number {
  for (let n = 8; ; n += 2) {
    let least = Infinity;
    for (let N = 2; N <= n; N++) {
      // log2 of 1.13 e^(πN/2) (2N)!/N! (2N)^−n, with (2N)!/N! <= √2·(4N/e)^N·1.05
      const log = 0.75 + N * (2.2662 + Math.log2((4 * N) / Math.E)) - n * Math.log2(2 * N);
      least = Math.min(least, log);
    }
    if (least < -bits) return n;
  }
}

/** η_j·2^(base−j) for 2 <= j <= n; entry 1 is γ − H_M, in units of 2^(1−base). */
function slopes(n: number, base: number): bigint[] {
  const z = zetaList(n, base);
  const one = 1n << BigInt(base);
  z[1] = eulerGammaFixed(base) >> 1n;
  for (let m = 1; m <= STEPS; m++) {
    const twice = int(2 * m);
    let power = one / twice;
    for (let j = 1; j <= n && power !== 0n; j++) {
      z[j]! -= power;
      power /= twice;
    }
  }
  return z;
}

function compute(base: number): bigint[] {
  const n = seriesLength(base);
  const z = slopes(n, base);
  const zBits = z.map(bitLength);
  const f: bigint[] = [1n << BigInt(base)];
  const fBits = [base + 1];
  for (let k = 1; k <= n; k++) {
    let sum = 0n;
    for (let j = 1; j <= k; j++) {
      // both factors without the bits that the product does not need
      const i = k - j;
      const keep = zBits[j]! + fBits[i]! - base + CUT_GUARD;
      if (keep <= CUT_GUARD) continue;
      const cutZ = Math.max(0, zBits[j]! - keep);
      const cutF = Math.max(0, fBits[i]! - keep);
      const t = ((z[j]! >> BigInt(cutZ)) * (f[i]! >> BigInt(cutF))) >> BigInt(base - cutZ - cutF);
      sum += j & 1 ? t : -t;
    }
    f.push(sum / int(k));
    fBits.push(bitLength(f[k]!));
  }
  for (let m = 1; m <= STEPS; m++) {
    const twice = int(2 * m);
    for (let k = n; k >= 1; k--) f[k]! += f[k - 1]! / twice;
  }
  return f;
}
