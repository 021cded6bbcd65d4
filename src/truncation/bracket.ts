/**
 * @module Ultraviolet and infrared growth against each other: the orders between the least terms that each would have alone.
 *
 * Purpose    where an ultraviolet singularity is nearer than the infrared one, the terms are a sum of an alternating and a
 *            same-sign growth, and the smallest |term| may be small because the two cancel. It is then no sign of the best cut.
 * Method     a singularity (1 − t/t*)^(−1−b) alone has its least term after floor(ω − b) terms, ω = |t*|/x. The sums that end one
 *            term before the least one of the nearer singularity, through to the least one of the farther, are the bracket. An
 *            unknown exponent counts as b = 0.
 * Bound      heuristic: the bracket is a range of orders and of sums, not an error with a meaning.
 * Reference  ratio of neighbouring terms of the asymptotic form; the rule not to trust min |term| alone is common practice.
 */
import { toNumberExact } from '../numerics/index.js';
import { leastIndex } from './known.js';
import type { Leading, Question } from './model.js';

/** Beyond this ratio of distances the farther one does not show before the nearer one has run away. A heuristic. */
const FARTHEST = 4.001;
const NEAREST = 0.999;

export interface Rival extends Leading {
  /** ω − b: the number of terms before its least one, were it alone. */
  readonly leastAt: number;
}

export interface Bracket {
  readonly ultraviolet: Rival;
  readonly infrared: Rival;
  /** Partial sums through these terms, counted from 0 in the known ones; `to` may lie beyond them. */
  readonly from: number;
  readonly to: number;
  /** Index of the smallest known term, where the terms behind it grow. */
  readonly least?: number;
  /** Smallest and largest of the known sums in the bracket, in the unit of the terms, without an additive constant. */
  readonly sums?: { readonly low: number; readonly high: number; readonly through: number };
}

const distance = (t: number): number => Math.abs(t);
const nearest = (list: readonly Leading[]): Leading | undefined =>
  list.reduce<Leading | undefined>(
    (best, s) => (best === undefined || distance(s.t) < distance(best.t) ? s : best),
    undefined,
  );

/** The singularities stated beforehand or, where those do not lie on both sides, the ones that the terms show. */
function leadingOf({ expansion, found = [] }: Question): readonly Leading[] {
  const stated = expansion.stated.map((s): Leading => ({
    t: toNumberExact(s.t),
    ...(s.exponent === undefined ? {} : { exponent: toNumberExact(s.exponent) }),
    origin: s.origin,
  }));
  const both = (list: readonly Leading[]): boolean => list.some((s) => s.t < 0) && list.some((s) => s.t > 0);
  return both(stated) ? stated : both(found) ? found : [];
}

/** The bracket; undefined where the two kinds of growth do not compete. */
export function competingBracket(question: Question): Bracket | undefined {
  const { known, expansion } = question;
  const list = leadingOf(question);
  const ultraviolet = nearest(list.filter((s) => s.t < 0));
  const infrared = nearest(list.filter((s) => s.t > 0));
  const x = toNumberExact(expansion.x);
  if (ultraviolet === undefined || infrared === undefined || known.stride !== 1 || !(x > 0)) return undefined;
  const ratio = distance(infrared.t) / distance(ultraviolet.t);
  if (ratio < NEAREST || ratio > FARTHEST) return undefined;
  // Orders are counted from the first term of the series, leading zeros included.
  const ahead = (known.orders[0] ?? expansion.power) - expansion.power;
  const rival = (s: Leading): Rival => ({ ...s, leastAt: distance(s.t) / x - ((s.exponent ?? 1) - 1) - ahead });
  const sides = { ultraviolet: rival(ultraviolet), infrared: rival(infrared) };
  const ends = [sides.ultraviolet.leastAt, sides.infrared.leastAt].map(Math.floor).toSorted((a, b) => a - b);
  const [first = 0, last = 0] = ends;
  const from = Math.max(0, first - 1);
  const to = Math.max(from + 1, last);
  const end = known.values.length - 1;
  const least = leastIndex(known);
  // Neither reached nor next: the smallest term is not read yet.
  if (least === end && from > end + 1) return undefined;
  let sum = 0;
  const sums = known.values.map((v) => (sum += v));
  const within = sums.slice(from, Math.min(to, end) + 1);
  return {
    ...sides,
    from,
    to,
    ...(least < end ? { least } : {}),
    ...(within.length < 2 || !within.every(Number.isFinite)
      ? {}
      : { sums: { low: Math.min(...within), high: Math.max(...within), through: Math.min(to, end) } }),
  };
}
