/**
 * @module Where the nearest singularity of the Borel transform of order q per step lies, and what competes with it.
 *
 * Purpose    one entry for the three cases: one axis dominates; a complex pair; two real ones in competition.
 * Method     regular signs: ratio test (axis-fit), essential growth, alternating admixture, second singularity behind the
 *            first. Irregular signs: three-term recurrence, complex pair or two real roots.
 */
import { axisFit, SHORT_TAIL } from './axis-fit.js';
import { scaledBorel } from './borel-coefficients.js';
import { alternation, alternationText } from './alternation.js';
import { essentialGrowth, type EssentialGrowth } from './essential.js';
import type { FoundSingularity } from './growth.js';
import type { Prepared } from './prepare.js';
import type { Point } from './reading.js';
import { secondSingularity } from './second.js';
import { singularityOfAxis, singularityOfPair } from './singularity.js';
import { complexPair, realPositions, recurrence } from './two-root.js';
import { place } from './words.js';

export interface Located {
  readonly nearest?: FoundSingularity;
  readonly second?: FoundSingularity;
  readonly competition: readonly string[];
  readonly essential?: EssentialGrowth;
  readonly quasiPeriodic: boolean;
  /** A second singularity makes the position uncertain, or hides the nearer one. */
  readonly competing: boolean;
}

/** Fewest coefficients for a complex pair. */
const PAIR_POINTS = 8;
/** A pair is accepted when its modulus and cosine are known this well, and the cosine stands off ±1 by OFF_AXIS errors. */
const PAIR_MODULUS = 0.3;
const PAIR_COSINE = 0.2;
const OFF_AXIS = 1;
/** Two real roots are believed when the nearer and the farther move less than this over the last three rows. */
const STEADY_ROOTS = [0.15, 0.5] as const;
/** A second singularity within this factor of the first counts as competition. */
const COMPETING = 2.5;
/** A pattern that sets in at this coefficient or later speaks of a second singularity. */
const LATE = 2;
/** A position on one axis known worse than this gives way to two steady real roots. */
const LOOSE = 0.3;
/** A pair close to the axis is looked for in regular tails of this length, when it turns by this many radians over them. */
const LONG_TAIL = 16;
const MIN_PHASE = 1.5;
/** A regular tail whose position is known worse than this may still be a pair close to the axis. */
const UNSETTLED = 0.05;

function pairOf(points: readonly Point[], q: number): FoundSingularity | undefined {
  if (points.length < PAIR_POINTS) return undefined;
  const { beta, scale } = scaledBorel(points, q);
  const pair = complexPair(recurrence(beta));
  if (pair === undefined) return undefined;
  const sure =
    pair.modulus.error < PAIR_MODULUS * pair.modulus.value &&
    pair.cosine.error < PAIR_COSINE &&
    1 - Math.abs(pair.cosine.value) > OFF_AXIS * pair.cosine.error;
  return sure ? singularityOfPair(pair, scale, q) : undefined;
}

function realOf(t: number, error: number, scale: number, q: number): FoundSingularity {
  const logAbs = (Math.log(Math.abs(t)) - scale) / q;
  const value = Math.sign(t) * Math.exp(logAbs);
  return {
    t: { value, error: Math.abs(value) * error },
    logAbs,
    kind: t > 0 ? 'positive axis' : 'negative axis',
    standing: 'indicative',
  };
}

/** Two steady real roots of the recurrence, nearer first; only for q = 1, where T = t. */
function steadyRoots(points: readonly Point[], q: number): readonly [FoundSingularity, FoundSingularity] | undefined {
  const { beta, scale } = scaledBorel(points, q);
  const rows = recurrence(beta).slice(-3);
  const found = rows.map(realPositions);
  if (q !== 1 || rows.length < 3 || found.some((f) => f === undefined)) return undefined;
  const last = found[2]!;
  const spread = (i: 0 | 1): number => Math.max(...found.map((f) => Math.abs(f![i] / last[i] - 1)));
  if (spread(0) > STEADY_ROOTS[0] || spread(1) > STEADY_ROOTS[1]) return undefined;
  // A branch point shifts the roots by O(1/k) beyond what the rows show.
  const bias = 2 / rows[2]!.k;
  return [
    realOf(last[0], Math.hypot(2 * spread(0), bias), scale, q),
    realOf(last[1], Math.hypot(2 * spread(1), 2 * bias), scale, q),
  ];
}

function compete(roots: readonly [FoundSingularity, FoundSingularity]): Located {
  const text = `two real singularities in competition: ${place(roots[0])}, and ${place(roots[1])}`;
  return { nearest: roots[0], second: roots[1], competition: [text], quasiPeriodic: false, competing: true };
}

function locateRegular(p: Prepared, q: number): Located {
  const pattern = p.pattern.kind === 'alternating' ? 'alternating' : 'same';
  const lastOutlier = Math.max(-1, ...p.outliers.map((o) => o.k));
  const clean = p.tail.filter((x) => x.k > lastOutlier);
  const tail = clean.length >= SHORT_TAIL ? clean : p.tail;
  const essential = p.noise === undefined ? essentialGrowth(tail, q) : undefined;
  if (essential !== undefined) {
    const logAbs = essential.logT.value / q;
    const modulus = Math.exp(logAbs);
    const nearest: FoundSingularity = {
      t: { value: pattern === 'alternating' ? -modulus : modulus, error: modulus * essential.logT.error },
      logAbs,
      kind: pattern === 'alternating' ? 'negative axis' : 'positive axis',
      standing: 'indicative',
    };
    return { nearest, competition: [], essential, quasiPeriodic: false, competing: false };
  }
  const plain = axisFit(tail, p.sequence.stride, q, p.pattern.sign, p.exact);
  const fit = plain && { ...plain, relativeError: Math.hypot(plain.relativeError, p.drift ?? 0) };
  if (fit === undefined || fit.relativeError > UNSETTLED) {
    const pair = tail.length >= LONG_TAIL && p.noise === undefined ? pairOf(p.points, q) : undefined;
    // Signs that stay regular for much longer than the phase allows are no pair.
    const phase = (pair?.angle?.value ?? 0) * q * tail.length;
    if (pair !== undefined && phase > MIN_PHASE)
      return { nearest: pair, competition: [], quasiPeriodic: true, competing: false };
  }
  const nearest = fit === undefined ? undefined : singularityOfAxis(fit, pattern, q);
  const mixed = p.pattern.from >= LATE || p.nonZero.length >= SHORT_TAIL;
  if (mixed && (fit === undefined || fit.relativeError > LOOSE)) {
    const roots = p.noise === undefined ? steadyRoots(p.points, q) : undefined;
    if (roots !== undefined && roots[0].kind === (pattern === 'same' ? 'positive axis' : 'negative axis'))
      return compete(roots);
  }
  const competition: string[] = [];
  let competing = false;
  const alternating = p.noise === undefined ? alternation(tail, q) : undefined;
  if (alternating !== undefined) {
    competition.push(alternationText(alternating, pattern));
    competing = true;
  }
  if (p.pattern.from >= LATE) {
    competition.push(
      `the signs are regular only from n = ${p.tail[0]?.n ?? 0} on: another singularity contributes at low order`,
    );
  }
  const signT = pattern === 'alternating' ? -1 : 1;
  const found =
    q === 1 && nearest !== undefined && p.noise === undefined && p.outliers.length === 0
      ? secondSingularity(p.nonZero, q, fit?.logT ?? NaN, signT)
      : undefined;
  let second: FoundSingularity | undefined;
  if (found !== undefined && nearest !== undefined) {
    const value = nearest.t.value * found.ratio;
    second = {
      t: { value, error: Math.abs(nearest.t.value) * found.error },
      logAbs: nearest.logAbs + Math.log(Math.abs(found.ratio)),
      kind: value > 0 ? 'positive axis' : 'negative axis',
      standing: 'indicative',
    };
    competition.push(`with the leading singularity weakened, the next one shows at ${place(second)}`);
    if (Math.abs(found.ratio) < COMPETING) competing = true;
  }
  return {
    ...(nearest === undefined ? {} : { nearest }),
    ...(second === undefined ? {} : { second }),
    competition,
    quasiPeriodic: false,
    competing,
  };
}

function locateIrregular(p: Prepared, q: number): Located {
  const pair = pairOf(p.points, q);
  if (pair !== undefined) return { nearest: pair, competition: [], quasiPeriodic: true, competing: false };
  const roots = steadyRoots(p.points, q);
  if (roots !== undefined) return compete(roots);
  const text =
    'the signs follow no pattern yet: singularities on both axes, or a complex pair, contribute at these orders';
  return { competition: [text], quasiPeriodic: false, competing: true };
}

/** q: growth order per step of the sequence. */
export function locate(p: Prepared, q: number): Located {
  return p.pattern.kind === 'irregular' ? locateIrregular(p, q) : locateRegular(p, q);
}
