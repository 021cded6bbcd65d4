/**
 * @module From a series to the partial fractions of its [L/M] with a stated number of certain bits.
 *
 * Purpose    the one call behind Borel–Padé: entry, poles, residues, each as sharp as asked.
 * Method     exact series of low order: padeExact and exact multiplicities. Otherwise balls: poles are sharpened as far as
 *            residues ask for and the coefficients allow, then the working precision is raised by what is missing.
 *            Where balls decide nothing (a singular block, a multiple pole) one prime is asked: it proves that an exact
 *            series has the entry and simple poles, and more bits will do; or the series goes to padeExact.
 * Bound      enclosures. Poles have relative accuracy 2^-prec, amplitudes 2^-prec of the strongest amplitude and 64 bits of
 *            their own (doublets may be as weak as 2^-1500).
 * Reference  see pade-exact.ts, pade-ball.ts, roots.ts, partial-fractions.ts.
 */
import * as C from '../ball/complex.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import type { Exact } from '../exact.js';
import { ballField } from '../field.js';
import type { Rational } from '../rational.js';
import { gcdMod, modWord, wordPrime } from './modular.js';
import { padeNormal, type NormalEntry } from './pade-ball.js';
import { checkOrders, padeExact } from './pade-exact.js';
import { padeField } from './pade-field.js';
import { minorsModulo } from './pade-minors.js';
import { recurrenceRatio } from './pade-ratio.js';
import type { MissingEntry, PadeFraction, UndecidedEntry } from './pade-types.js';
import type { PartialFractions } from './partial-fractions.js';
import { sharpFractions, type Shortage } from './sharp-fractions.js';
import { divmodPoly, toIntegers } from './rational-poly.js';
import { rationalRoots, refinableRoots } from './roots.js';
import { usefulBits } from './scaled-polynomial.js';

export interface PadePoles extends PartialFractions {
  readonly exists: true;
  readonly entry: PadeFraction<Rational> | PadeFraction<Ball>;
}

/**
 * Heuristics: highest order L+M done exactly from the start, bits lost per order M at first guess (more beyond HIGH_ORDER), guard,
 * most bits.
 */
const EXACT_ORDER = 16;
const LOSS_PER_ORDER = 14;
const HIGH_ORDER = 100;
const HIGH_LOSS = 2;
const GUARD_BITS = 16;
const MAX_BITS = 50_000;
const ATTEMPTS = 10;
/**
 * Heuristic: where added bits leave half of the want or more (a doublet weaker than what is known), the next addition is so many
 * times longer.
 */
const STRIDE = 4;
/** Heuristic: a series that is not exact is given up when this multiple of the first guess decides nothing. */
const PATIENCE = 8;

/**
 * Partial fractions of [L/M] of Σ b_n t^n with at least `prec` certain bits in every pole, and in every amplitude relative
 * to the strongest one.
 * `exists: false` with the reason when the entry is missing; undefined when the series, known by enclosures only, leaves
 * open whether a determinant vanishes or poles coincide. Throws RangeError as padeExact does.
 */
export function padePoles(
  b: readonly Exact[],
  L: number,
  M: number,
  prec: number,
): PadePoles | MissingEntry | UndecidedEntry {
  checkOrders(b.length, L, M);
  const rational = b.every((c) => c.rational !== undefined) ? b.map((c) => c.rational!) : undefined;
  if (rational !== undefined && L + M <= EXACT_ORDER) return exactPoles(rational, L, M, prec);
  const used = b.slice(0, L + M + 1);
  const guess = prec + LOSS_PER_ORDER * M + HIGH_LOSS * Math.max(0, M - HIGH_ORDER) + 2 * GUARD_BITS;
  let proved = false;
  let reason = '';
  let work = guess;
  let rootBits = prec + GUARD_BITS;
  let last = Infinity;
  let stride = 1;
  for (let attempt = 0; attempt < ATTEMPTS && work <= MAX_BITS; attempt++) {
    const balls = used.map((c) => c.ball(work));
    const found = ballPoles(balls, L, M, prec, work, rootBits);
    if ('exists' in found) return found;
    reason = found.reason;
    if (found.missing !== undefined) {
      stride = found.missing > last / 2 ? STRIDE * stride : 1;
      last = found.missing;
      work += Math.ceil(found.missing) * stride + GUARD_BITS;
      rootBits = Math.max(rootBits, Math.ceil(found.poleBits ?? 0) + GUARD_BITS);
      continue;
    }
    if (rational !== undefined && !proved) {
      proved = provedSimple(rational, L, M);
      if (!proved) return exactPoles(rational, L, M, prec);
    }
    work *= 2;
    if (rational === undefined && work > PATIENCE * guess) break;
  }
  return rational === undefined ? { exists: undefined, reason } : exactPoles(rational, L, M, prec);
}

function ballPoles(
  b: readonly Ball[],
  L: number,
  M: number,
  prec: number,
  work: number,
  rootBits: number,
): PadePoles | Shortage {
  const found = padeNormal(b, L, M, work) ?? pivoted(b, L, M, work);
  if (found === undefined) return { reason: `a determinant of [${L}/${M}] cannot be told from zero` };
  const { entry, jacobi } = found;
  // Roots lose a bit or two per order against the coefficients: no search where these are too coarse already.
  const missing = prec + GUARD_BITS + M - usefulBits(entry.denominator, meanSize(entry.denominator));
  if (missing > 0) return { reason: `the coefficients of [${L}/${M}] need more bits`, missing };
  const rootsTo = refinableRoots(entry.denominator, jacobi === undefined ? undefined : recurrenceRatio(jacobi));
  let shortage: Shortage | undefined;
  for (let bits = rootBits, stride = 1, reached = -Infinity; ;) {
    const result = rootsTo(bits);
    if ('failed' in result) return { reason: `poles of [${L}/${M}]: ${result.failed}` };
    const accuracy = Math.min(...result.roots.map((root) => C.accuracyBits(root.value)));
    // Poles that more bits do not sharpen: the coefficients hold them up.
    if (shortage !== undefined && accuracy < reached + 1) return shortage;
    const sharp = sharpFractions(entry.numerator, entry.denominator, result.roots, prec, work);
    if (!('reason' in sharp)) return { exists: true, entry, ...sharp };
    if (sharp.missing === undefined || sharp.poleBits === undefined) return sharp;
    if (shortage?.missing !== undefined) stride = sharp.missing > shortage.missing / 2 ? STRIDE * stride : 1;
    bits = Math.max(bits, Math.ceil(sharp.poleBits + (stride - 1) * sharp.missing)) + GUARD_BITS;
    if (bits > 2 * work) return sharp;
    [shortage, reached] = [sharp, accuracy];
  }
}

/** Nearest integer to the mean of log2|z| over the roots; 0 where the leading coefficient does not tell. */
function meanSize(q: readonly Ball[]): number {
  const last = q[q.length - 1]!;
  return last.mid === 0n ? 0 : Math.round(-R.upperBits(R.exactMid(last)) / Math.max(1, q.length - 1));
}

function pivoted(b: readonly Ball[], L: number, M: number, work: number): NormalEntry | undefined {
  const entry = padeField(ballField(work), b, L, M);
  return entry.exists === true ? { entry } : undefined;
}

/** True when one prime shows that [L/M] exists, is reduced and has simple poles. */
function provedSimple(b: readonly Rational[], L: number, M: number): boolean {
  const { integers } = toIntegers(b.slice(0, L + M + 1));
  const p = wordPrime(0);
  const q = minorsModulo(integers, L, M, p);
  if (q === undefined || q[M] === 0) return false;
  const slope = new Float64Array(M);
  for (let j = 1; j <= M; j++) slope[j - 1] = modWord(q[j]! * j, p, 1 / p);
  return gcdMod(q, slope, p).length === 1;
}

/** By exact arithmetic: always decides. */
function exactPoles(
  b: readonly Rational[],
  L: number,
  M: number,
  prec: number,
): PadePoles | MissingEntry | UndecidedEntry {
  const entry = padeExact(b, L, M);
  if (!entry.exists) return entry;
  const { quotient } = divmodPoly(entry.numerator, entry.denominator);
  const { integers } = toIntegers(entry.denominator);
  let reason = '';
  for (let extra = GUARD_BITS; extra <= MAX_BITS;) {
    const work = 2 * (prec + extra) + LOSS_PER_ORDER * M;
    const result = rationalRoots(integers, prec + extra);
    if ('failed' in result) return { exists: undefined, reason: `poles of [${L}/${M}]: ${result.failed}` };
    const balls = (a: readonly Rational[]): Ball[] => a.map((c) => R.fromRational(c, work));
    const sharp = sharpFractions(balls(entry.numerator), balls(entry.denominator), result.roots, prec, work);
    if (!('reason' in sharp)) return { exists: true, entry, ...sharp, polynomial: balls(quotient) };
    reason = sharp.reason;
    extra = Math.max(extra + Math.ceil(sharp.missing ?? extra), Math.ceil(sharp.poleBits ?? 0) - prec) + GUARD_BITS;
  }
  return { exists: undefined, reason };
}
