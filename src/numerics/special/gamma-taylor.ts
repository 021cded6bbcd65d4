/**
 * @module 1/Γ(1 + u) for |u| <= 1/2 in fixed point: Taylor polynomials kept for every working precision.
 *
 * Purpose    Γ of moderate arguments at up to TAYLOR_LIMIT bits, without logarithm, exponential and long shift.
 * Method     the series of reciprocal-gamma-series.ts is moved to the centres (2i+1)/2^b, as they are used, so that |v| <= 2^-b there; Horner's
 *            rule in w = 2^b v, where step k keeps only the words that still count.
 * Bound      units of 2^-base, base = wp + GUARD; the centre is c, y = 2c, |y| <= 1 − 2^(1−b). An error e in every coefficient of the series
 *            changes coefficient k at c by e (1−|y|)^(−k−1), which the scale 2^((1−b)k) of w^k brings back to e·2^(b−1). The same holds for an
 *            error of a unit made in round i of the synthetic division, where coefficients have lost (b−1)i bits at most: n·2^b
 *            from floors, twice that with those of the cuts. All below (2^11 + 2 n)·2^b <= 2^21 units, so an E_k is right to 0.51 units of 2^-wp.
 *            Horner: 3 units a step, 0.51 for each coefficient that rounds to 0, one for the tail.
 * Reference  DLMF 5.7.1; W. G. Horner, Phil. Trans. 109 (1819) 308 (shifts by synthetic division).
 */
import { bitLength } from '../bits.js';
import { int } from '../ball/fixed.js';
import { reciprocalGammaSeries, seriesLength } from './reciprocal-gamma-series.js';

/** Heuristic: beyond it the coefficients cost more than they save. Working bits. */
export const TAYLOR_LIMIT = 4096;
const GUARD = 28;
/** Heuristic: from here on sixteen times as many centres. */
const MANY_FROM = 1500;
/** Low bits are dropped in steps of this size while a polynomial is moved. */
const DROP = 60;

interface Centre {
  /** E_k in units of 2^-wp. */
  readonly e: readonly bigint[];
  /** Words that hold the running value of step k: as many of w are needed, and cost it less than a unit. */
  readonly words: readonly number[];
  readonly ulps: number;
}

/** b of the centres (2i+1)/2^b. */
const centreBits = (wp: number): number => (wp < MANY_FROM ? 5 : 9);

/** Taylor coefficients at t/2^b, t odd, scaled to w = 2^b v. */
function move(t: number, b: number, wp: number): Centre {
  const base = wp + GUARD;
  const a = [...reciprocalGammaSeries(base)];
  const numerator = BigInt(t);
  const shift = BigInt(b - 1);
  const e: bigint[] = [];
  let dropped = 0;
  for (let k = 0; k < a.length; k++) {
    for (let j = a.length - 2; j >= k; j--) a[j]! += (a[j + 1]! * numerator) >> shift;
    const cut = BigInt(base - wp + (b - 1) * k - dropped);
    e.push((a[k]! + (1n << (cut - 1n))) >> cut);
    if ((b - 1) * (k + 1) >= dropped + DROP) {
      for (let j = k + 1; j < a.length; j++) a[j]! >>= BigInt(DROP);
      dropped += DROP;
    }
    while (a.length > k + 1 && isTiny(a[a.length - 1]!)) a.pop();
  }
  while (e.length > 1 && e[e.length - 1] === 0n) e.pop();
  const words: number[] = [];
  let reach = 0n;
  for (let k = e.length - 1; k >= 0; k--) {
    reach += e[k]! < 0n ? -e[k]! : e[k]!;
    words[k] = Math.min(wp >> 6, Math.ceil(bitLength(reach) / 64));
  }
  return { e, words, ulps: 3 * e.length + seriesLength(base) + 8 };
}

const isTiny = (x: bigint): boolean => x === 0n || x === -1n;

/** Heuristic: coefficients pay after about so many values at one working precision, and at one centre. */
const PATIENCE = 200;
const CENTRE_PATIENCE = 8;
/** Working precisions kept. */
const MOST_TABLES = 24;

interface Table {
  asked: number;
  readonly askedAt: number[];
  readonly centres: (Centre | undefined)[];
}
const tables = new Map<number, Table>();

function tableFor(wp: number): Table {
  let table = tables.get(wp);
  if (table === undefined) {
    if (tables.size >= MOST_TABLES) tables.clear();
    table = { asked: 0, askedAt: [], centres: [] };
    tables.set(wp, table);
  }
  return table;
}

/** Index i >= 0 of the centre (2i + 1)/2^b − 1/2 next to u. */
function indexOf(u: bigint, wp: number, b: number): number {
  const i = Number(u >> BigInt(wp - b + 1)) + (1 << (b - 2));
  return Math.min((1 << (b - 1)) - 1, Math.max(0, i));
}

/** The polynomial around this centre, if it is there or pays by now; few values are cheaper without. */
function centreFor(i: number, b: number, wp: number): Centre | undefined {
  const table = tableFor(wp);
  const known = table.centres[i];
  if (known !== undefined) return known;
  const at = (table.askedAt[i] ?? 0) + 1;
  table.askedAt[i] = at;
  if (++table.asked < PATIENCE || at < CENTRE_PATIENCE) return undefined;
  return (table.centres[i] = move(2 * i + 1 - (1 << (b - 1)), b, wp));
}

/**
 * 1/Γ(1+u)·2^wp for u·2^wp given, |u| <= 1/2, wp <= TAYLOR_LIMIT a multiple of 64, and a bound on its error in units; undefined for the
 * first values at wp.
 */
export function reciprocalGamma(u: bigint, wp: number): { value: bigint; ulps: number } | undefined {
  const b = centreBits(wp);
  const i = indexOf(u, wp, b);
  const centre = centreFor(i, b, wp);
  if (centre === undefined) return undefined;
  const { e, words, ulps } = centre;
  const t = 2 * i + 1 - (1 << (b - 1));
  const w = (u << BigInt(b)) - (BigInt(t) << BigInt(wp));
  // w cut to whole words, as many as the running value has.
  const cuts: bigint[] = [0n];
  for (let n = 1; n <= words[0]!; n++) cuts.push(w >> BigInt(wp - 64 * n));
  let s = e[e.length - 1]!;
  for (let k = e.length - 2; k >= 0; k--) {
    const n = words[k + 1]!;
    s = e[k]! + ((s * cuts[n]!) >> SHIFTS[n]!);
  }
  return { value: s, ulps };
}

const SHIFTS: readonly bigint[] = Array.from({ length: TAYLOR_LIMIT / 64 + 1 }, (_, k) => int(64 * k));
