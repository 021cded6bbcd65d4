/**
 * @module Fixed-point exp and sin/cos on [0, 1) by tables of eight bits a level.
 *
 * Purpose    exp t and (cos t, sin t) for an integer t that stands for t·2^-wp; and the table values alone, exp and sin/cos of
 *            arguments with few bits, which log and atan2 start from.
 * Method     t = Σ_l j_l 2^(−8l) + r with 0 <= j_l < 256. The value at j_l 2^(−8l) is the product of those at its two halves of four
 *            bits; both are filled as they are used and kept with 64 bits to spare. What is left, r < 2^(−8L), goes to the series.
 * Bound      a table value is right to 1 ulp: its halves are right to 2^(13−64). The factors of all levels together are below e;
 *            so the SERIES_ULPS of the last one at most triple, and each of the L products adds 3 ulp, tripled at most:
 *            FIXED_ULPS in all. The table values alone carry TABLE_ULPS.
 * Reference  R. P. Brent, P. Zimmermann, "Modern Computer Arithmetic" (2010), section 4.3.
 */
import { expReduced, expSeries } from './exp-series.js';
import { int, SERIES_ULPS, sinCosReduced, sinCosSeries } from './fixed.js';

/** Error bound, in units of 2^-wp, of expFixed and sinCosFixed. */
export const FIXED_ULPS = 4 * SERIES_ULPS;
/** Error bound of expLeading and sinCosLeading. */
export const TABLE_ULPS = 64;
/** Heuristic: tables of sin and cos pay up to this precision; beyond it they would cost more to fill than they save. */
const TABLE_LIMIT = 4096;
const LEVEL_BITS = 8;
const HALF = LEVEL_BITS / 2;
const GUARD = 64;

type Pair = readonly [bigint, bigint];
interface Level<T> {
  readonly whole: (T | undefined)[];
  /** Values at j·2^(4−8l) and j·2^(−8l), j < 16, in units of 2^-(wp + GUARD). */
  readonly high: (T | undefined)[];
  readonly low: (T | undefined)[];
}
interface Tables {
  readonly exp: Level<bigint>[];
  readonly trig: Level<Pair>[];
}
const tables = new Map<number, Tables>();

function tablesFor(wp: number): Tables {
  let t = tables.get(wp);
  if (t === undefined) tables.set(wp, (t = { exp: [], trig: [] }));
  return t;
}

function levelOf<T>(levels: Level<T>[], l: number): Level<T> {
  while (levels.length <= l) levels.push({ whole: [], high: [], low: [] });
  return levels[l]!;
}

/** Number of levels: each costs one product (sin/cos: four) and saves terms of the series (heuristic). */
export function levelsFor(wp: number, products: 1 | 4): number {
  if (products === 4) return wp <= 2000 ? 2 : 3;
  return wp <= 256 ? 2 : wp <= 640 ? 3 : 4;
}

/** The halves' exponentials: r < 2^-h for h bits that are zero at the top. */
function halfExp(row: (bigint | undefined)[], j: number, up: number, wp: number): bigint {
  return (row[j] ??= expReduced(int(j) << BigInt(wp + GUARD - up), wp + GUARD, up - HALF));
}

function expEntry(levels: Level<bigint>[], l: number, j: number, wp: number): bigint {
  const level = levelOf(levels, l);
  const known = level.whole[j];
  if (known !== undefined) return known;
  const top = LEVEL_BITS * (l + 1);
  const high = halfExp(level.high, j >> HALF, top - HALF, wp);
  const low = halfExp(level.low, j & 15, top, wp);
  return (level.whole[j] = (high * low) >> BigInt(wp + 2 * GUARD));
}

function halfTrig(row: (Pair | undefined)[], j: number, up: number, wp: number): Pair {
  return (row[j] ??= sinCosReduced(int(j) << BigInt(wp + GUARD - up), wp + GUARD, up - HALF));
}

function trigEntry(levels: Level<Pair>[], l: number, j: number, wp: number): Pair {
  const level = levelOf(levels, l);
  const known = level.whole[j];
  if (known !== undefined) return known;
  const top = LEVEL_BITS * (l + 1);
  const high = halfTrig(level.high, j >> HALF, top - HALF, wp);
  const low = halfTrig(level.low, j & 15, top, wp);
  return (level.whole[j] = rotate(high, low, BigInt(wp + 2 * GUARD)));
}

function rotate([c, s]: Pair, [tc, ts]: Pair, w: bigint): Pair {
  return [(c * tc - s * ts) >> w, (s * tc + c * ts) >> w];
}

/** exp(n·2^(−8L))·2^wp for an integer 0 <= n < 2^(8L), L <= 4; TABLE_ULPS. wp a multiple of 64. */
export function expLeading(n: number, levels: number, wp: number): bigint {
  const w = BigInt(wp);
  const table = tablesFor(wp).exp;
  let rest = n;
  let e: bigint | undefined;
  for (let l = levels - 1; l >= 0; l--) {
    const j = rest % 256;
    rest = (rest - j) / 256;
    if (j === 0) continue;
    const entry = expEntry(table, l, j, wp);
    e = e === undefined ? entry : (e * entry) >> w;
  }
  return e ?? 1n << w;
}

/** (cos, sin)(n·2^(−8L))·2^wp, as expLeading. */
export function sinCosLeading(n: number, levels: number, wp: number): Pair {
  const w = BigInt(wp);
  const table = tablesFor(wp).trig;
  let rest = n;
  let e: Pair | undefined;
  for (let l = levels - 1; l >= 0; l--) {
    const j = rest % 256;
    rest = (rest - j) / 256;
    if (j === 0) continue;
    const entry = trigEntry(table, l, j, wp);
    e = e === undefined ? entry : rotate(e, entry, w);
  }
  return e ?? [1n << w, 0n];
}

/** exp(t·2^-wp)·2^wp for 0 <= t < 2^wp; wp a multiple of 64, of moderate size (smooth-exp.ts beyond). Off by at most FIXED_ULPS. */
export function expFixed(t: bigint, wp: number): bigint {
  const levels = levelsFor(wp, 1);
  const down = wp - LEVEL_BITS * levels;
  const n = Number(t >> BigInt(down));
  const r = BigInt.asUintN(down, t);
  if (r === 0n) return expLeading(n, levels, wp);
  const e = expSeries(r, wp, LEVEL_BITS * levels);
  return n === 0 ? e : (e * expLeading(n, levels, wp)) >> BigInt(wp);
}

/** (cos, sin)(t·2^-wp)·2^wp for 0 <= t < 2^wp; wp a multiple of 64. Off by at most FIXED_ULPS. */
export function sinCosFixed(t: bigint, wp: number): [bigint, bigint] {
  if (wp > TABLE_LIMIT) return sinCosReduced(t, wp, 0);
  const levels = levelsFor(wp, 4);
  const down = wp - LEVEL_BITS * levels;
  const n = Number(t >> BigInt(down));
  const cs = sinCosSeries(BigInt.asUintN(down, t), wp, LEVEL_BITS * levels);
  if (n === 0) return cs;
  const [c, s] = rotate(cs, sinCosLeading(n, levels, wp), BigInt(wp));
  return [c, s];
}
