/**
 * @module Fixed-point exponential and sine/cosine: the inner loops of all elementary functions.
 *
 * Purpose    exp t and (cos t, sin t) for an integer t that stands for t·2^-wp, without a ball in the loop.
 * Method     two tables (steps 1/32 and 1/1024, filled as they are used) leave a remainder below 2^-10; above
 *            HALVING_FROM bits it is halved further and the result squared back. The Taylor series is summed by columns:
 *            with X = r^m, Σ r^k/k! = Σ_j r^j Σ_i X^i/(im+j)!, so that only about 2·√n of the n terms cost a full
 *            product and the rest a division by a small integer.
 * Bound      all quantities are below 2 and every floor loses less than one unit in the last place (ulp).
 *            T = X^i/k! carries at most 3 ulp: e → e/k + 1 at a division, e → e·X + T·e_X + 1 at a product, where
 *            e_X <= 2·log2(m) + 1 meets T <= 1/m!.
 *            A column of `blocks` terms carries 3·blocks; Horner's rule with r < 2^-10 adds less than 2; the tail after
 *            T has fallen to 0 is below 4. Together 4·blocks + 8; `blocks` stays below 300 for wp <= 2^21.
 *            A table factor (<= 2.1, right to 1 ulp) at most doubles it and adds 3: the results are off by at most
 *            FIXED_ULPS = 2^13 ulp in all.
 * Reference  D. M. Smith, "Efficient multiple-precision evaluation of elementary functions", Math. Comp. 52 (1989) 131
 *            (columns); R. P. Brent, P. Zimmermann, "Modern Computer Arithmetic" (2010), section 4.4.
 */

/** Error bound, in units of 2^-wp, of expFixed and sinCosFixed. */
export const FIXED_ULPS = 2 ** 13;
const TABLE_BITS = 10;
/** Heuristic: tables pay up to this precision; beyond it they would cost more to fill than they save. */
const TABLE_LIMIT = 4096;
/** Heuristic: from here on a few halvings are cheaper than the terms they save. */
const HALVING_FROM = 900;
/** Guard bits for halvings: s <= 48 squarings turn 2^11 ulp into less than 2^60. */
const HALVING_GUARD = 64;

const small: bigint[] = [];
/** BigInt(k) for small k without a fresh allocation. */
export function int(k: number): bigint {
  if (k >= 8192 || k < 0) return BigInt(k);
  while (small.length <= k) small.push(BigInt(small.length));
  return small[k]!;
}

/** Working precision: `bits` rounded up to whole machine words, where tables can be shared. */
export function wordPrec(bits: number): number {
  return Math.ceil(bits / 64) * 64;
}

/** x^n in fixed point, n >= 1; off by less than 2·log2(n) + 1 ulp for 0 <= x <= 1/2 (each level adds at most 2). */
export function powFixed(x: bigint, n: number, wp: bigint): bigint {
  if (n === 1) return x;
  const h = powFixed(x, n >> 1, wp);
  const sq = (h * h) >> wp;
  return n & 1 ? (sq * x) >> wp : sq;
}

/** Columns for about `terms` terms: the number of full products is near 2m − and terms/m. */
function columns(terms: number): number {
  return Math.max(1, Math.min(64, Math.round(Math.sqrt(terms))));
}

/** Terms of the exponential series of r < 2^-h down to 2^-wp (an estimate; the sums stop by themselves). */
function termsNeeded(wp: number, h: number): number {
  let n = wp / (h + 2);
  for (let i = 0; i < 3; i++) n = wp / (h + Math.max(0, Math.log2(n + 1) - 1.44));
  return Math.ceil(n);
}

/** exp r for 0 <= r < 2^-h, h >= 10. */
function expSeries(r: bigint, wp: number, h: number): bigint {
  const w = BigInt(wp);
  const m = columns(termsNeeded(wp, h));
  const x = powFixed(r, m, w);
  const sums: bigint[] = new Array<bigint>(m).fill(0n);
  let t = 1n << w;
  for (let k = 1; t !== 0n; t = (t * x) >> w) {
    for (let j = 0; j < m; j++, k++) {
      sums[j]! += t;
      t /= int(k);
    }
  }
  let s = sums[m - 1]!;
  for (let j = m - 2; j >= 0; j--) s = ((s * r) >> w) + sums[j]!;
  return s;
}

/** (cos r, sin r) for 0 <= r < 2^-h, h >= 10: even and odd columns of the exponential series with alternating signs. */
function sinCosSeries(r: bigint, wp: number, h: number): [bigint, bigint] {
  const w = BigInt(wp);
  const m = Math.max(1, Math.round(Math.sqrt(termsNeeded(wp, h)) / 2));
  const r2 = (r * r) >> w;
  const x = powFixed(r2, m, w);
  const cos: bigint[] = new Array<bigint>(m).fill(0n);
  const sin: bigint[] = new Array<bigint>(m).fill(0n);
  let t = 1n << w;
  let positive = true;
  for (let k = 1; t !== 0n; t = (t * x) >> w) {
    for (let j = 0; j < m; j++) {
      cos[j]! += positive ? t : -t;
      t /= int(k++);
      sin[j]! += positive ? t : -t;
      t /= int(k++);
      positive = !positive;
    }
  }
  let c = cos[m - 1]!;
  let s = sin[m - 1]!;
  for (let j = m - 2; j >= 0; j--) {
    c = ((c * r2) >> w) + cos[j]!;
    s = ((s * r2) >> w) + sin[j]!;
  }
  return [c, (s * r) >> w];
}

/** Number of halvings that balance squarings against terms (heuristic). */
function halvings(wp: number): number {
  return wp < HALVING_FROM ? 0 : Math.min(48, Math.round(Math.sqrt(wp) / 5));
}

/** exp r for r < 2^-h (h >= 10 after s halvings), with s squarings. */
function expReduced(r: bigint, wp: number, h: number): bigint {
  const s = Math.max(halvings(wp), TABLE_BITS - h);
  if (s === 0) return expSeries(r, wp, h);
  const work = wp + HALVING_GUARD;
  const w = BigInt(work);
  let e = expSeries(r << BigInt(HALVING_GUARD - s), work, h + s);
  for (let i = 0; i < s; i++) e = (e * e) >> w;
  return e >> BigInt(HALVING_GUARD);
}

/** (cos r, sin r) for r < 2^-h, with s angle doublings. */
function sinCosReduced(r: bigint, wp: number, h: number): [bigint, bigint] {
  const s = Math.max(halvings(wp), TABLE_BITS - h);
  if (s === 0) return sinCosSeries(r, wp, h);
  const work = wp + HALVING_GUARD;
  const w = BigInt(work);
  const one = 1n << w;
  let [cos, sin] = sinCosSeries(r << BigInt(HALVING_GUARD - s), work, h + s);
  for (let i = 0; i < s; i++) {
    const s2 = (sin * sin) >> (w - 1n);
    sin = (sin * cos) >> (w - 1n);
    cos = one - s2;
  }
  return [cos >> BigInt(HALVING_GUARD), sin >> BigInt(HALVING_GUARD)];
}

interface Tables {
  readonly exp: (bigint | undefined)[][];
  readonly trig: ([bigint, bigint] | undefined)[][];
}
const tables = new Map<number, Tables>();

function tablesFor(wp: number): Tables {
  let t = tables.get(wp);
  if (t === undefined) tables.set(wp, (t = { exp: [[], []], trig: [[], []] }));
  return t;
}

/** Value of table `level` (steps 2^-5, 2^-10) at index j, right to 1 ulp. */
function expEntry(t: Tables, level: 0 | 1, j: number, wp: number): bigint {
  const row = t.exp[level]!;
  return (row[j] ??= expReduced(int(j) << BigInt(wp + 64 - 5 * (level + 1)), wp + 64, level === 0 ? 0 : 5) >> 64n);
}

function trigEntry(t: Tables, level: 0 | 1, j: number, wp: number): [bigint, bigint] {
  const row = t.trig[level]!;
  const known = row[j];
  if (known !== undefined) return known;
  const [c, s] = sinCosReduced(int(j) << BigInt(wp + 64 - 5 * (level + 1)), wp + 64, level === 0 ? 0 : 5);
  return (row[j] = [c >> 64n, s >> 64n]);
}

/** exp(t·2^-wp)·2^wp for 0 <= t < 2^wp; wp a multiple of 64. Off by at most FIXED_ULPS. */
export function expFixed(t: bigint, wp: number): bigint {
  if (wp > TABLE_LIMIT) return expReduced(t, wp, 0);
  const w = BigInt(wp);
  const j = Number(t >> BigInt(wp - TABLE_BITS));
  let e = expReduced(BigInt.asUintN(wp - TABLE_BITS, t), wp, TABLE_BITS);
  if (j === 0) return e;
  const table = tablesFor(wp);
  if (j & 31) e = (e * expEntry(table, 1, j & 31, wp)) >> w;
  if (j >> 5) e = (e * expEntry(table, 0, j >> 5, wp)) >> w;
  return e;
}

/** (cos, sin)(t·2^-wp)·2^wp for 0 <= t < 2^wp; wp a multiple of 64. Off by at most FIXED_ULPS. */
export function sinCosFixed(t: bigint, wp: number): [bigint, bigint] {
  if (wp > TABLE_LIMIT) return sinCosReduced(t, wp, 0);
  const j = Number(t >> BigInt(wp - TABLE_BITS));
  let cs = sinCosReduced(BigInt.asUintN(wp - TABLE_BITS, t), wp, TABLE_BITS);
  if (j === 0) return cs;
  const table = tablesFor(wp);
  if (j & 31) cs = rotate(cs, trigEntry(table, 1, j & 31, wp), wp);
  if (j >> 5) cs = rotate(cs, trigEntry(table, 0, j >> 5, wp), wp);
  return cs;
}

function rotate([c, s]: [bigint, bigint], [tc, ts]: [bigint, bigint], wp: number): [bigint, bigint] {
  const w = BigInt(wp);
  return [(c * tc - s * ts) >> w, (s * tc + c * ts) >> w];
}
