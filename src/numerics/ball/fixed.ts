/**
 * @module Fixed-point sine/cosine series, and what all fixed-point series share.
 *
 * Purpose    (cos r, sin r) for an integer r that stands for r·2^-wp, without a ball in the loop; powers, small integers, row lengths.
 * Method     r below 2^-10 at least: by tables (fixed-tables.ts), or halved further here and doubled back. The Taylor series
 *            is summed by columns: with X = r^2m, every column a power series in X, so that only about 2·√n of the n terms cost a
 *            full product and the rest a division by a small integer.
 * Bound      all quantities are below 2 and every floor loses less than one unit in the last place (ulp).
 *            T = X^i/k! carries at most 3 ulp: e → e/k + 1 at a division, e → e·X + T·e_X + 1 at a product, where
 *            e_X <= 2·log2(m) + 1 meets T <= 1/m!.
 *            A column of `blocks` terms carries 3·blocks; Horner's rule with r < 2^-10 adds less than 2; the tail after
 *            T has fallen to 0 is below 4. Together 4·blocks + 8 <= SERIES_ULPS; `blocks` stays below 500 for wp <= 2^21.
 * Reference  D. M. Smith, "Efficient multiple-precision evaluation of elementary functions", Math. Comp. 52 (1989) 131
 *            (columns); R. P. Brent, P. Zimmermann, "Modern Computer Arithmetic" (2010), section 4.4.
 */

/** Error bound of the series, in units of 2^-wp. */
export const SERIES_ULPS = 2 ** 11;
/** Arguments of the exponential and trigonometric series are below 2^-LEAST_REDUCTION. */
export const LEAST_REDUCTION = 10;
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

/** x, …, x^m in fixed point at their index, |x| < 2^-10; each off by less than 2 ulp if x is off by less than 1. */
export function powersFixed(x: bigint, m: number, wp: bigint): bigint[] {
  const out = [1n << wp, x];
  for (let i = 2; i <= m; i++) out.push((out[i >> 1]! * out[i - (i >> 1)]!) >> wp);
  return out;
}

/** Terms in a row, about factor·√n and at most `most`, so that the rows of n terms are as full as they can be. */
export function rowsOf(n: number, factor: number, most: number): number {
  return Math.ceil(n / Math.ceil(n / Math.max(1, Math.min(most, Math.round(factor * Math.sqrt(n))))));
}

/**
 * Columns for about `terms` terms. Horner's rule and the power X cost about 1.4 full products a column; the terms/m products with
 * the shrinking T cost half of one each (heuristic).
 */
export function columns(terms: number): number {
  return Math.max(1, Math.min(64, Math.round((terms < 200 ? 0.6 : 1) * Math.sqrt(terms))));
}

/** Terms of the exponential series of r < 2^-h down to 2^-wp (an estimate; the sums stop by themselves). */
function termsNeeded(wp: number, h: number): number {
  let n = wp / (h + 2);
  for (let i = 0; i < 3; i++) n = wp / (h + Math.max(0, Math.log2(n + 1) - 1.44));
  return Math.ceil(n);
}

/** (cos r, sin r) for 0 <= r < 2^-h, h >= 10: even and odd columns of the exponential series with alternating signs. */
export function sinCosSeries(r: bigint, wp: number, h: number): [bigint, bigint] {
  const w = BigInt(wp);
  const m = Math.max(1, Math.round(columns(termsNeeded(wp, h)) / 2));
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

/** (cos r, sin r) for r < 2^-h, with s angle doublings. */
export function sinCosReduced(r: bigint, wp: number, h: number): [bigint, bigint] {
  const s = Math.max(halvings(wp), LEAST_REDUCTION - h);
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
