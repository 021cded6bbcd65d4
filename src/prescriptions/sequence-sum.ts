/**
 * @module A sequence transformation as a prescription: signs checked, precision raised, error from the last two steps.
 *
 * Truncation error: the larger of the last two differences of the sequence of estimates (the usual recipe, Weniger 1989).
 */
import { addExact, ballField, exact, R } from '../numerics/index.js';
import type { Ball, Exact, Field } from '../numerics/index.js';
import type { Growth } from '../growth/index.js';
import type { Expansion } from '../series/index.js';
import { bareTerms, cleanPart, inputObjection, termsBeforeAlternation, trustOf } from './eligibility.js';
import type { Outcome, Request } from './prescription.js';
import { dressed, refusal, scaled, toDigits } from './prescription.js';

type Estimates = readonly (Ball | undefined)[];

export interface Transformation {
  readonly variant: string;
  /** Fewest alternating terms that give an estimate and its two last steps. */
  readonly fewest: number;
  /** Most terms used. */
  readonly most: number;
  /** Estimates in rising order; the last one is the result. */
  readonly estimates: (field: Field<Ball>, terms: readonly Ball[]) => Estimates;
  /** Decides what balls cannot (equal elements), when every term is rational. */
  readonly exactly?: (terms: readonly Exact[]) => Estimates | undefined;
  /** A first term before the alternation still belongs to the sequence. */
  readonly keepsLead?: boolean;
  readonly caution?: string;
}

const last = (list: Estimates): Ball => list[list.length - 1] ?? R.INDETERMINATE;

/** The one outcome of a sequence transformation. */
export function sequenceSum(full: Expansion, growth: Growth, request: Request, t: Transformation): Outcome {
  const e = cleanPart(full, growth, t.most);
  if (growth.verdict === 'terminating') return refusal(t.variant, 'the series terminates', 'use the fixed-order sum');
  const input = inputObjection(e, growth, t.variant, t.fewest);
  if (input !== undefined) return input;
  const before = termsBeforeAlternation(e);
  if (before === undefined)
    return refusal(
      t.variant,
      'the signs do not alternate strictly: on the cut, real sequences only wander',
      'use a Borel prescription, which gives a principal value and its ambiguity',
    );
  const all = bareTerms(e);
  const skipped = t.keepsLead === true ? 0 : before;
  const terms = all.slice(skipped);
  if (terms.length < t.fewest) return inputObjection({ ...e, coefficients: terms }, growth, t.variant, t.fewest)!;
  const lead = all.slice(0, skipped).reduce(addExact, exact(0));
  const estimates = evaluate(terms, request.digits, t);
  if (estimates === undefined)
    return refusal(
      t.variant,
      'a denominator vanishes: the transformation has no value here',
      'use one term fewer (--order), or another transformation',
    );
  const prec = Math.max(128, request.digits * 4 + 64);
  const value = dressed(e, R.add(lead.ball(prec), last(estimates), prec), prec);
  const notes = [
    ...(skipped > 0 ? ['the first term stands apart: the signs alternate from the second on'] : []),
    ...(t.caution === undefined ? [] : [t.caution]),
  ];
  const sum = { kind: 'sum', variant: t.variant, value, termsUsed: e.coefficients.length, notes } as const;
  if (request.only !== undefined) return { ...sum, trust: 'indicative' };
  const truncation = lastSteps(e, estimates, prec);
  return { ...sum, ...(truncation === undefined ? {} : { truncation }), trust: trustOf(value, truncation) };
}

/** Estimates whose last one has the digits wanted; undefined when it has no value. */
function evaluate(terms: readonly Exact[], digits: number, t: Transformation): Estimates | undefined {
  const at = (prec: number): Estimates =>
    t.estimates(
      ballField(prec),
      terms.map((a) => a.ball(prec)),
    );
  const found = toDigits(digits, at, last);
  if (last(found).rad < Infinity) return found;
  const exactly = t.exactly?.(terms);
  return exactly !== undefined && last(exactly).rad < Infinity ? exactly : undefined;
}

/** The larger of the last two differences, radii included, in units of R. */
function lastSteps(e: Expansion, estimates: Estimates, prec: number): number | undefined {
  const [a, b, c] = [...estimates].reverse();
  if (a === undefined || b === undefined) return undefined;
  const step = (p: Ball, q: Ball): number => {
    const d = scaled(e, R.sub(p, q, prec), prec);
    return Math.abs(R.toNumber(d)) + R.radiusToNumber(d);
  };
  const found = c === undefined ? step(a, b) : Math.max(step(a, b), step(b, c));
  return Number.isFinite(found) ? found : undefined;
}
