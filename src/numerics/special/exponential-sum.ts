/**
 * @module The convergent sum Σ_{k≠m} z^k/(k!(k−b)) in fixed point, real and complex.
 *
 * Purpose    the entire part of F_b, G_b and E₁; m is the integer nearest to b, whose term the caller treats exactly.
 * Method     columns: with X = z^M the running term T = X^i/k! gives T/(k−b) to column k mod M; one or two divisions by
 *            small integers a term, full products only N/M + 2M times; Horner's rule in z joins the columns.
 * Bound      units are 2^-f, Z = max(1, |z|), B blocks, N = BM terms, t_k = |z|^k/k!. X is off by less than 5M·Z^(M−1). With r_i the
 *            error of T at the start of block i in units of |X|^i/(iM)!: r_(i+1) <= r_i + 4|X|/t_((i+1)M) + 5M. Since t_k is
 *            unimodal with t_k <= e^|z| and t_M = |X|/M!, the error of every T z^j is below 9·B·M!·e^|z|. Division by |k−b| >= 1/2,
 *            its floor (times |z|^j <= M!·e^|z|) and Horner's floors bring a sum of N terms to at most 32·N·B·M!·e^|z|.
 *            f is chosen so that this is 2^-bits·e^|z|. The loop ends when t_k <= 2^-bits·e^|z| with k >= 2|z| + 1 and
 *            k >= b + 2: the tail is below 2 t_k. In all 4·2^-bits·e^|z|.
 * Reference  D. M. Smith, Math. Comp. 52 (1989) 131 (columns).
 */
import { bitLength, shift } from '../bits.js';
import { int } from '../ball/fixed.js';
import type { Complex } from '../ball/complex.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import type { Exponent } from './exponent.js';

/** Columns are kept below this, because M! costs working bits (heuristic). */
const MAX_COLUMNS = 24;

interface Plan {
  readonly columns: number;
  readonly f: number;
  /** The loop may stop when T has at most this many bits and k >= from. */
  readonly stop: number;
  readonly from: number;
  /** Error of the result in units of 2^-f is 2^errorBits. */
  readonly errorBits: number;
}

/** Number of terms until |z|^k/k! <= 2^-bits·e^|z|, about. */
export function exponentialTerms(absZ: number, bits: number): number {
  const target = bits - absZ * Math.LOG2E;
  const l = Math.log2(absZ);
  // Newton on k(log2 k − log2 e) − k l = target from above the peak.
  let k = Math.max(4, 2 * absZ + 2, target / Math.max(1, 4 - l));
  for (let i = 0; i < 12; i++) {
    const value = k * (Math.log2(k) - Math.LOG2E - l) - target;
    const next = Math.max(1, k - value / Math.max(0.5, Math.log2(k) - l));
    if (Math.abs(next - k) < 0.5) break;
    k = Math.max(next, absZ + 1);
  }
  return Math.ceil(Math.max(k, 1));
}

function plan(absZ: number, bits: number, b: Exponent): Plan {
  const from = Math.ceil(Math.max(2 * absZ + 1, b.approx + 2));
  const terms = Math.max(from, exponentialTerms(absZ, bits)) + 2;
  const columns = Math.max(1, Math.min(MAX_COLUMNS, Math.round(Math.sqrt(terms))));
  const blocks = Math.ceil(terms / columns) + 1;
  let factorial = 0;
  for (let i = 2; i <= columns; i++) factorial += Math.log2(i);
  const guard = Math.ceil(5 + Math.log2(terms + columns) + Math.log2(blocks + 1) + factorial);
  const f = bits + guard;
  const peak = absZ * Math.LOG2E;
  return { columns, f, stop: Math.floor(guard + peak), from, errorBits: guard + Math.ceil(peak + 1e-6) + 2 };
}

/** Denominators k − b as integers: k·q − p for a short fraction b = p/q; otherwise with q = 2^s, wide enough not to matter. */
function denominators(b: Exponent, f: number): { p: bigint; q: bigint; up: bigint } {
  const { num, den } = b.value;
  if (bitLength(den) <= 64 || bitLength(den) * 3 < f) return { p: num, q: den, up: 0n };
  const s = f + 8;
  return { p: (num << BigInt(s)) / den, q: 1n << BigInt(s), up: BigInt(s) };
}

/** z^n, n >= 1. */
function power(z: bigint, n: number, w: bigint): bigint {
  if (n === 1) return z;
  const h = power(z, n >> 1, w);
  const x = (h * h) >> w;
  return n & 1 ? (x * z) >> w : x;
}

function powerComplex(re: bigint, im: bigint, n: number, w: bigint): [bigint, bigint] {
  if (n === 1) return [re, im];
  const [hr, hi] = powerComplex(re, im, n >> 1, w);
  const xr = ((hr + hi) * (hr - hi)) >> w;
  const xi = (hr * hi) >> (w - 1n);
  return n & 1 ? times(xr, xi, re, im, w) : [xr, xi];
}

/** From here on three products and five sums beat four products (heuristic, bits). */
const THREE_PRODUCTS = 700n;

/** (a + ib)(c + id), each part floored once (off by at most 1 unit). */
function times(a: bigint, b: bigint, c: bigint, d: bigint, w: bigint): [bigint, bigint] {
  if (w < THREE_PRODUCTS) return [(a * c - b * d) >> w, (a * d + b * c) >> w];
  const ac = a * c;
  const bd = b * d;
  return [(ac - bd) >> w, ((a + b) * (c + d) - ac - bd) >> w];
}

/** Σ_{k≠m} z^k/(k!(k−b)) for an exact real z with |z| <= absZ; absolute error about 2^-bits·e^|z|. */
export function exponentialSum(z: Ball, absZ: number, b: Exponent, bits: number): Ball {
  const { columns, f, stop, from, errorBits } = plan(absZ, bits, b);
  const w = BigInt(f);
  const { p, q, up } = denominators(b, f);
  const scale = up === 0n ? bitLength(q) - 1 : 0;
  const zf = shift(z.mid, z.exp + f);
  const x = power(zf, columns, w);
  const sums = new Array<bigint>(columns).fill(0n);
  let t = (up === 0n ? q : 1n) << w;
  let d = -p;
  for (let k = 0; ;) {
    for (let j = 0; j < columns; j++) {
      if (k !== b.m) sums[j]! += up === 0n ? t / d : (t << up) / d;
      d += q;
      t /= int(++k);
    }
    t = (t * x) >> w;
    if (k >= from && bitLength(t) <= stop + scale) break;
    if (t === 0n || t === -1n) break;
  }
  let s = sums[columns - 1]!;
  for (let j = columns - 2; j >= 0; j--) s = ((s * zf) >> w) + sums[j]!;
  return R.addError(R.ball(s, -f), 1, errorBits - f);
}

/** The same sum for an exact complex z. */
export function exponentialSumComplex(z: Complex, absZ: number, b: Exponent, bits: number): Complex {
  const { columns, f, stop, from, errorBits } = plan(absZ, bits, b);
  const w = BigInt(f);
  const { p, q, up } = denominators(b, f);
  const scale = up === 0n ? bitLength(q) - 1 : 0;
  const zr = shift(z.re.mid, z.re.exp + f);
  const zi = shift(z.im.mid, z.im.exp + f);
  const [xr, xi] = powerComplex(zr, zi, columns, w);
  const re = new Array<bigint>(columns).fill(0n);
  const im = new Array<bigint>(columns).fill(0n);
  let tr = (up === 0n ? q : 1n) << w;
  let ti = 0n;
  let d = -p;
  for (let k = 0; ;) {
    for (let j = 0; j < columns; j++) {
      if (k !== b.m) {
        re[j]! += up === 0n ? tr / d : (tr << up) / d;
        im[j]! += up === 0n ? ti / d : (ti << up) / d;
      }
      d += q;
      const n = int(++k);
      tr /= n;
      ti /= n;
    }
    [tr, ti] = times(tr, ti, xr, xi, w);
    const size = Math.max(bitLength(tr), bitLength(ti));
    if (k >= from && size < stop + scale) break;
    if (size <= 1) break;
  }
  let sr = re[columns - 1]!;
  let si = im[columns - 1]!;
  for (let j = columns - 2; j >= 0; j--) {
    [sr, si] = times(sr, si, zr, zi, w);
    sr += re[j]!;
    si += im[j]!;
  }
  return { re: R.addError(R.ball(sr, -f), 1, errorBits - f), im: R.addError(R.ball(si, -f), 1, errorBits - f) };
}
