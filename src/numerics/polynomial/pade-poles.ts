/**
 * @module From a series to the partial fractions of its [L/M] with a stated number of certain bits.
 *
 * Purpose    the one call behind Borel–Padé: entry, poles, residues, each as sharp as asked.
 * Method     exact series of low order: padeExact and exact multiplicities. Otherwise balls, the working precision raised
 *            by what poles or residues fall short of. Where balls decide nothing (a singular block, a multiple pole) one
 *            prime is asked: it proves that an exact series has the entry and simple poles, and more bits will do; or
 *            the series goes to padeExact.
 * Bound      enclosures. Poles have relative accuracy 2^-prec, amplitudes 2^-prec of the strongest amplitude and 64 bits of
 *            their own (doublets may be as weak as 2^-200).
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
import { partialFractions, type PartialFractions, type Pole } from './partial-fractions.js';
import { divmodPoly, toIntegers } from './rational-poly.js';
import { ballRoots, rationalRoots, type CertifiedRoot } from './roots.js';

export interface PadePoles extends PartialFractions {
  readonly exists: true;
  readonly entry: PadeFraction<Rational> | PadeFraction<Ball>;
}

/** Heuristics: highest order L+M done exactly from the start, bits lost per order M at first guess, guard, most bits. */
const EXACT_ORDER = 16;
const LOSS_PER_ORDER = 13;
const GUARD_BITS = 16;
const MAX_BITS = 50_000;
/** Certain bits of an amplitude however weak its pole is. */
const WEAK_BITS = 64;
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
  const guess = prec + LOSS_PER_ORDER * M + 2 * GUARD_BITS;
  let proved = false;
  let reason = '';
  for (let work = guess, roots = prec + GUARD_BITS; work <= MAX_BITS;) {
    const balls = used.map((c) => c.ball(work));
    const attempt = ballPoles(balls, L, M, prec, work, roots);
    if ('exists' in attempt) return attempt;
    reason = attempt.reason;
    if (attempt.missing !== undefined) {
      const more = Math.ceil(attempt.missing) + GUARD_BITS;
      work += more;
      roots += more;
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

/** What kept balls from an answer: bits missing, or (missing undefined) nothing decided. */
interface Shortage {
  readonly reason: string;
  readonly missing?: number;
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
  const result = ballRoots(entry.denominator, rootBits, jacobi === undefined ? undefined : recurrenceRatio(jacobi));
  if ('failed' in result) return { reason: `poles of [${L}/${M}]: ${result.failed}` };
  return sharpFractions(entry, entry.numerator, entry.denominator, result.roots, prec, work);
}

function pivoted(b: readonly Ball[], L: number, M: number, work: number): NormalEntry | undefined {
  const entry = padeField(ballField(work), b, L, M);
  return entry.exists === true ? { entry } : undefined;
}

/** Partial fractions evaluated with as many bits as the accuracy needs, `most` at the utmost. */
function sharpFractions(
  entry: PadePoles['entry'],
  p: readonly Ball[],
  q: readonly Ball[],
  roots: readonly CertifiedRoot[],
  prec: number,
  most: number,
): PadePoles | Shortage {
  let bits = Math.min(most, prec + 2 * GUARD_BITS + q.length);
  for (;;) {
    const fractions = partialFractions(p, q, roots, bits);
    const strongest = Math.max(...fractions.poles.map((pole) => C.upperBits(pole.amplitude)));
    const missing = Math.max(0, ...fractions.poles.map((pole) => missingBits(pole, prec, strongest)));
    if (missing === 0) return { exists: true, entry, ...fractions };
    if (bits >= most) return { reason: 'residues need more bits', missing: Math.min(missing, most) };
    bits = Math.min(most, bits + Math.ceil(Math.min(missing, most)) + GUARD_BITS);
  }
}

/**
 * Bits that a pole falls short of: `prec` for its position; for its amplitude A `prec` relative to the strongest amplitude
 * 2^strongest and WEAK_BITS relative to |A|; for other terms of a principal part `prec` relative to A. 0 when none.
 */
function missingBits({ position, amplitude, principal }: Pole, prec: number, strongest: number): number {
  const size = C.upperBits(position);
  const weakness = Math.max(0, strongest - C.upperBits(amplitude));
  const wanted = Math.max(prec - weakness, Math.min(prec, WEAK_BITS));
  let missing = Math.max(prec - C.accuracyBits(position), wanted - C.accuracyBits(amplitude));
  const scale = C.upperBits(principal[principal.length - 1]!) - principal.length * size;
  for (let j = 0; j < principal.length - 1; j++) {
    const radius = Math.max(R.radiusBits(principal[j]!.re), R.radiusBits(principal[j]!.im)) - (j + 1) * size;
    missing = Math.max(missing, radius - scale + wanted);
  }
  return missing > 0 ? missing : 0;
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
    const attempt = sharpFractions(entry, balls(entry.numerator), balls(entry.denominator), result.roots, prec, work);
    if ('exists' in attempt) return { ...attempt, polynomial: balls(quotient) };
    reason = attempt.reason;
    extra += Math.ceil(attempt.missing ?? extra) + GUARD_BITS;
  }
  return { exists: undefined, reason };
}
