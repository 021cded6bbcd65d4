/**
 * @module 1/Γ(1 + u) for |u| <= 1/2 in fixed point: Taylor polynomials kept for every working precision.
 *
 * Purpose    Γ of moderate arguments at up to TAYLOR_LIMIT bits, without logarithm, exponential and long shift.
 * Method     d_k of 1/Γ(1+u) = Σ d_k u^k from k d_k = γ d_(k−1) + Σ_{j>=2} (−1)^(j+1) ζ(j) d_(k−j); the ζ(j) all together by Borwein's sum,
 *            where one more power costs one small division a term. The polynomial is then moved to the centres (2i+1)/32, as they
 *            are used, so that |v| <= 1/32 there; Horner's rule in w = 32v, where step k keeps only the wp − 5k bits that still count.
 * Bound      coefficients: errors δ_k obey k δ_k <= Σ ζ(j) δ_(k−j) + η Σ |d_(k−j)| + k, summed in doubles (|d_k| <= 1); the moves amplify a unit
 *            of 2^-base by 2^n at most. Tail: |Γ(x+iy)| >= Γ(x) √sech(πy) for x >= 1/2 and Γ(x) > 0.885 give, on |u| = N,
 *            |1/Γ(1+u)| <= 1.13 e^(πN/2) (2N)!/N! =: M_N, so |d_k| <= M_N N^-k, and the terms beyond n on |u| <= 1/2 sum to less
 *            than M_N (2N)^-n for N >= 1. Horner: 3 units of 2^-wp a step, half a unit for each coefficient that rounds to 0.
 * Reference  DLMF 5.7.1, 5.7.2, 5.6.7; P. Borwein, CMS Conf. Proc. 27 (2000) 29.
 */
import { eulerGammaFixed } from '../ball/constants.js';
import { int } from '../ball/fixed.js';

/** Heuristic: beyond it the coefficients cost more than they save. Working bits. */
export const TAYLOR_LIMIT = 1152;
const CENTRE_BITS = 5;
const GUARD = 64;

interface Table {
  /** Number of coefficients of the polynomial around 0. */
  readonly n: number;
  /** d_k·a^0 in units of 2^-base. */
  readonly base: number;
  readonly d: readonly bigint[];
  /** Coefficients at centre (2i+1)/32, i = −8..7: E_k in units of 2^(5k−wp). */
  readonly centres: (readonly bigint[] | undefined)[];
}
const tables = new Map<number, Table>();

/** Σ_{j>n} |d_j| 2^-j < 2^-bits: least n, from the bound of the header. */
function length(bits: number): number {
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

/** ζ(2) … ζ(n) in units of 2^-bits, each off by less than 4·terms + 4 units; [0] and [1] are unused. */
function zetas(n: number, bits: number): { values: bigint[]; terms: number } {
  const terms = Math.ceil((bits + 4) / 2.5431) + 1; // log2(3 + √8) > 2.5431
  const partial: bigint[] = [];
  let term = 1n;
  let sum = 0n;
  for (let i = 0; i <= terms; i++) {
    sum += term;
    partial.push(sum);
    term = (term * BigInt(4 * (terms + i) * (terms - i))) / BigInt((2 * i + 1) * (2 * i + 2));
  }
  const total = partial[terms]!;
  const weights: bigint[] = [];
  for (let k = 0; k < terms; k++) weights.push(((total - partial[k]!) << BigInt(bits)) / total / int(k + 1));
  const values = [0n, 0n];
  let active = terms;
  for (let j = 2; j <= n; j++) {
    let eta = 0n;
    for (let k = 0; k < active; k++) {
      const t = weights[k]! / int(k + 1);
      weights[k] = t;
      eta += k & 1 ? -t : t;
    }
    while (active > 1 && weights[active - 1] === 0n) active--;
    const half = 1n << BigInt(j - 1);
    values.push((eta * half) / (half - 1n));
  }
  return { values, terms };
}

function build(wp: number): Table {
  const n = length(wp + 8);
  const base = wp + GUARD + n;
  const w = BigInt(base);
  const { values } = zetas(n, base);
  values[1] = eulerGammaFixed(base);
  const d: bigint[] = [1n << w];
  for (let k = 1; k <= n; k++) {
    let s = 0n;
    for (let j = 1; j <= k; j++) {
      const t = values[j]! * d[k - j]!;
      s += j & 1 ? t : -t;
    }
    d.push((s >> w) / int(k));
  }
  return { n, base, d, centres: new Array<undefined>(16).fill(undefined) };
}

/** The polynomial at the centre t/32, t odd: with y = u·32/t, p(y + 1) by additions alone, then y = w/t. */
function move(table: Table, t: number, wp: number): bigint[] {
  const { n, base, d } = table;
  const at: bigint[] = [];
  let power = 1n;
  for (let j = 0; j <= n; j++) {
    at.push((d[j]! * power) >> BigInt(CENTRE_BITS * j));
    power *= BigInt(t);
  }
  for (let k = 0; k < n; k++) for (let j = n - 1; j >= k; j--) at[j]! += at[j + 1]!;
  const out: bigint[] = [];
  let divisor = 1n;
  const drop = BigInt(base - wp);
  const half = 1n << (drop - 1n);
  for (let k = 0; k <= n; k++) {
    // e_k = at_k (32/t)^k, in units of 2^(5k − wp): at_k t^-k 2^(wp − base)
    out.push((at[k]! / divisor + half) >> drop);
    divisor *= BigInt(t);
  }
  while (out.length > 1 && out[out.length - 1] === 0n) out.pop();
  return out;
}

/** Heuristic: the coefficients pay after about this many values at one working precision. */
const PATIENCE = 200;
const asked = new Map<number, number>();

/** Do the Taylor polynomials serve at wp bits? From the PATIENCE-th question on; few values are cheaper without them. */
export function taylorServes(wp: number): boolean {
  if (wp > TAYLOR_LIMIT) return false;
  if (tables.has(wp)) return true;
  const count = (asked.get(wp) ?? 0) + 1;
  asked.set(wp, count);
  return count >= PATIENCE;
}

/** 1/Γ(1+u)·2^wp for u·2^wp given, |u| <= 1/2, wp <= TAYLOR_LIMIT a multiple of 64; and a bound on its error in units. */
export function reciprocalGamma(u: bigint, wp: number): { value: bigint; ulps: number } {
  let table = tables.get(wp);
  if (table === undefined) tables.set(wp, (table = build(wp)));
  const i = Math.min(7, Math.max(-8, Number(u >> BigInt(wp - 4))));
  const e = (table.centres[i + 8] ??= move(table, 2 * i + 1, wp));
  const w = (u << 5n) - (BigInt(2 * i + 1) << BigInt(wp));
  // w cut to whole words, as many as the running value has bits, and one.
  const cuts: bigint[] = [];
  for (let words = 1; 64 * words <= wp; words++) cuts.push(w >> BigInt(wp - 64 * words));
  const top = e.length - 1;
  let s = e[top]!;
  for (let k = top - 1; k >= 0; k--) {
    // |s| < 2^(wp − 5(k+1) + 1): e_k is below 1
    const words = Math.min(cuts.length, Math.max(1, ((wp - CENTRE_BITS * (k + 1)) >> 6) + 2));
    s = e[k]! + ((s * cuts[words - 1]!) >> SHIFTS[words]!);
  }
  return { value: s, ulps: 3 * e.length + table.n + 8 };
}

const SHIFTS: readonly bigint[] = Array.from({ length: TAYLOR_LIMIT / 64 + 1 }, (_, k) => BigInt(64 * k));
