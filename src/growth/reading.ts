/**
 * @module First look at the coefficients: what is there to diagnose.
 *
 * Purpose    separates the empty, all-zero and terminating lists from true series, drops what the errors leave unknown,
 *            and finds the step between non-zero coefficients (a lacunary series is measured in that step).
 * Method     counting; nothing is fitted here.
 * Bound      exact statements on the given coefficients, apart from the named rule for "terminating".
 */
import type { GrowthInput, GrowthTerm } from './growth.js';

/**
 * Heuristic: a tail of exact zeros means "terminating" when it has at least this many zeros and is longer than any gap
 * within the series explains (see `terminates`).
 */
export const TRAILING_ZEROS = 3;
/** A coefficient with a relative error of this size or more is taken as not known at all. */
export const UNKNOWN_ERROR = 1;
/** Rounding of ln|c|, in units of its last place: the caller's logarithm and our differences. */
const LOG_ULPS = 2;
const ULP = 2 ** -53;

/** One coefficient in use: step index k, power n = k·stride (from the first non-zero one), ln|c_n|, sign. */
export interface Point {
  readonly k: number;
  readonly n: number;
  readonly y: number;
  readonly sign: -1 | 0 | 1;
  /** Relative error of c_n: quoted, or the rounding of its logarithm. */
  readonly sigma: number;
  readonly quoted: number;
  readonly estimated: boolean;
  /** An outlier put back in line by interpolation. */
  readonly repaired?: boolean;
}

export interface Sequence {
  readonly stride: number;
  /** Known coefficients in order of k; exact zeros inside are kept (sign 0), unknown ones are left out. */
  readonly points: readonly Point[];
  /** First power whose quoted error exceeds the value. */
  readonly unknownFrom?: number;
  readonly unknown: number;
  /** Zeros cut off in front of the first non-zero coefficient. */
  readonly leadingZeros: number;
  /** Terms of the input in front of it. */
  readonly cut: number;
}

export type Reading =
  | { readonly kind: 'empty' }
  | { readonly kind: 'all-zero'; readonly count: number }
  | { readonly kind: 'terminating'; readonly degree: number; readonly zeros: number; readonly sequence: Sequence }
  | { readonly kind: 'series'; readonly sequence: Sequence };

const isExactZero = (t: GrowthTerm): boolean => t.sign === 0 && !(t.relativeError > 0);

function gcd(a: number, b: number): number {
  while (b !== 0) [a, b] = [b, a % b];
  return a;
}

/** Longest run of exact zeros between two non-zero terms. */
function longestGap(terms: readonly GrowthTerm[], end: number): number {
  let gap = 0;
  let run = 0;
  for (let n = 0; n <= end; n++) {
    if (isExactZero(terms[n]!)) run++;
    else {
      gap = Math.max(gap, run);
      run = 0;
    }
  }
  return gap;
}

/** The tail of zeros must be longer than two of the gaps seen before: a lacunary series ends in at most one of them. */
const terminates = (zeros: number, gap: number): boolean => zeros >= TRAILING_ZEROS && zeros > 2 * gap + 1;

/** Sorts the input into one of four kinds. Leading zeros are cut here if the caller left them. */
export function readTerms(input: GrowthInput): Reading {
  const all = input.terms;
  const first = all.findIndex((t) => !isExactZero(t));
  if (first < 0) {
    const count = all.length + (input.leadingZeros ?? 0);
    return count === 0 ? { kind: 'empty' } : { kind: 'all-zero', count };
  }
  const terms = all.slice(first);
  let end = terms.length - 1;
  while (isExactZero(terms[end]!)) end--;
  const zeros = terms.length - 1 - end;
  const sequence = toSequence(terms, end, first, input.leadingZeros ?? 0);
  if (terminates(zeros, longestGap(terms, end))) return { kind: 'terminating', degree: end, zeros, sequence };
  return { kind: 'series', sequence };
}

function toSequence(terms: readonly GrowthTerm[], end: number, cut: number, cutBefore: number): Sequence {
  let step = 0;
  let nonZero = 0;
  for (let n = 0; n <= end; n++) {
    if (isExactZero(terms[n]!)) continue;
    step = gcd(n, step);
    nonZero++;
  }
  const stride = nonZero >= 3 ? Math.max(1, step) : 1;
  const points: Point[] = [];
  let unknownFrom: number | undefined;
  let unknown = 0;
  for (let n = 0; n <= end; n += stride) {
    const t = terms[n]!;
    const known = isExactZero(t) || (t.relativeError < UNKNOWN_ERROR && t.sign !== 0 && Number.isFinite(t.logAbs));
    if (!known) {
      unknownFrom ??= n;
      unknown++;
      continue;
    }
    const y = t.sign === 0 ? -Infinity : t.logAbs;
    const rounding = t.sign === 0 ? 0 : LOG_ULPS * ULP * Math.max(1, Math.abs(y));
    points.push({
      k: n / stride,
      n,
      y,
      sign: t.sign,
      sigma: Math.hypot(t.relativeError, rounding),
      quoted: t.relativeError,
      estimated: t.estimated,
    });
  }
  const base = { stride, points, unknown, cut, leadingZeros: cut + cutBefore };
  return unknownFrom === undefined ? base : { ...base, unknownFrom };
}

/** The points that are not zero. */
export const nonZero = (points: readonly Point[]): readonly Point[] => points.filter((p) => p.sign !== 0);
