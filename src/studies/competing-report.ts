/** @module Competing growth as the result states it: where each side alone would have its least term, and the sums in between. */
import type { FoundSingularity, Growth } from '../growth/index.js';
import { toNumberExact } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import type { Expansion } from '../series/index.js';
import { competingBracket } from '../truncation/index.js';
import type { Bracket, Leading, Question, Rival } from '../truncation/index.js';
import type { CompetingReport, CompetingSide } from './assessment-growth.js';
import { indicative } from './figures.js';

/** Digits of a sum in doubles. */
const DIGITS = 8;
/** Beyond these binary exponents sums leave the range of doubles. */
const DOUBLE_RANGE = 900;

/** What the terms themselves show, for series whose file states nothing. */
export function foundLeading({ nearest, second }: Growth): readonly Leading[] {
  const real = (s: FoundSingularity | undefined): s is FoundSingularity =>
    s !== undefined && (s.kind === 'positive axis' || s.kind === 'negative axis');
  return [nearest, second].filter(real).map((s) => ({
    t: s.t.value,
    ...(s.exponent === undefined ? {} : { exponent: s.exponent.value }),
    origin: 'the terms',
  }));
}

/** Six digits without zeros behind. */
const plain = (x: number): string => String(Number(x.toPrecision(6)));

function sideOf(rival: Rival, first: number, uPerT: Exact | undefined): CompetingSide {
  return {
    t: plain(rival.t),
    ...(uPerT === undefined ? {} : { u: plain(rival.t * toNumberExact(uPerT)) }),
    ...(rival.exponent === undefined ? {} : { exponent: plain(rival.exponent) }),
    leastAt: Math.floor(rival.leastAt) + first,
    origin: rival.origin,
  };
}

const words = (least: CompetingReport['least']): string =>
  least === undefined || least.inside
    ? ''
    : `; the smallest |term|, order ${least.order}, lies outside: it is small because the two kinds of growth cancel in it`;

function report(b: Bracket, { known }: Question, e: Expansion, uPerT: Exact | undefined): CompetingReport {
  const first = known.orders[0] ?? e.power;
  const unit = 2 ** known.unit;
  const additive = toNumberExact(e.additive);
  const orders = [b.from + first, b.to + first] as const;
  const least =
    b.least === undefined ? undefined : { order: b.least + first, inside: b.least >= b.from && b.least <= b.to };
  const [uv, ir] = [sideOf(b.ultraviolet, first, uPerT), sideOf(b.infrared, first, uPerT)];
  const sums =
    b.sums === undefined || Math.abs(known.unit) > DOUBLE_RANGE
      ? undefined
      : {
          low: indicative(additive + b.sums.low * unit, DIGITS),
          high: indicative(additive + b.sums.high * unit, DIGITS),
          through: b.sums.through + first,
        };
  const reached =
    sums === undefined
      ? `, of which ${known.values.length} known terms reach fewer than two`
      : sums.through < orders[1]
        ? `, known through order ${sums.through} only`
        : '';
  return {
    ultraviolet: uv,
    infrared: ir,
    orders,
    ...(sums === undefined ? {} : { sums }),
    ...(least === undefined ? {} : { least }),
    statement: `ultraviolet and infrared growth compete, with least terms at orders ${uv.leastAt} and ${ir.leastAt} if they were alone: the smallest |term| alone is not trusted, and the bracket is the sums through orders ${orders[0]} to ${orders[1]}${reached}${words(least)}`,
  };
}

/** The bracket in plain words and numbers; undefined where nothing competes. */
export function competingReport(
  question: Question | undefined,
  e: Expansion,
  uPerT: Exact | undefined,
): CompetingReport | undefined {
  const bracket = question === undefined ? undefined : competingBracket(question);
  if (question === undefined || bracket === undefined) return undefined;
  return report(bracket, question, e, uPerT);
}
