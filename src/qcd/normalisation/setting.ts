/** @module What the estimators of the strength need: position, exponent, corrections, beta functions, neighbours; and their runs. */
import { doubleField, toNumberExact } from '../../numerics/index.js';
import { mulSeries, reciprocal } from '../algebra/truncated.js';
import { betaCoefficients } from '../beta-function.js';
import { expectedSingularity } from '../expected.js';
import { relationOfBetas } from '../rewrite/schemes.js';
import { substituteOver } from '../rewrite/relation.js';
import { conformalSums, type Cuts } from './conformal.js';
import { asymptoticRatio, borelFactor, sumRule, sumRuleTerms } from './estimates.js';
import type { NormalisationMethod, NormalisationQuestion } from './types.js';

/** Highest n of the plain methods when another singularity lies inside. Heuristic: beyond, its growth takes over. */
export const LIMIT_INSIDE = 3;
/** Corrections of the asymptotic form that the ratio takes, c_1 and c_2, as in its source. */
const CORRECTIONS = 2;
/** Loops of the QCD beta function. */
const KNOWN_LOOPS = 5;
/** From three loops on the corrections and the geometric coupling have a meaning beyond the exponent. */
const LEAST_LOOPS = 3;
/** Coefficients beyond these change the sum rule no more, but cost; longer series show their convergence by their steps. */
const LONGEST = 16;
/** Distances in u that are told apart. */
const SAME = 1e-9;
/** Operators of dimension six in the Lagrangian. */
const FIRST_ULTRAVIOLET = 1;
/** The next infrared singularity where none is named: one operator dimension of 2 further. */
const NEXT = 1;

export interface Setting {
  readonly t: number;
  /** p = γ − 1. */
  readonly p: number;
  readonly corrections: readonly number[];
  readonly beta: readonly number[];
  readonly dimension: number;
  /** 1 + C_1 x + …, divided out of the series. */
  readonly wilson: readonly number[];
  /** Only ratio and Borel factor. */
  readonly plain: boolean;
  /** Coefficients that the sum rule may take. */
  readonly sumRuleTerms: number;
  /** Can the scale be varied? */
  readonly scales: boolean;
  /** Is there an ultraviolet singularity inside or at the distance of this one? */
  readonly nearby?: 'inside' | 'beside';
  readonly cuts?: Cuts;
}

/** |u| of the nearest ultraviolet singularity: the stated one; in QCD every short-distance quantity has one at u = −1. */
export const nearestUltraviolet = ({
  ultraviolet,
  loops = KNOWN_LOOPS,
  ends = false,
}: NormalisationQuestion): number | undefined =>
  ultraviolet ?? (loops === KNOWN_LOOPS && !ends ? FIRST_ULTRAVIOLET : undefined);

export function settingOf(question: NormalisationQuestion): Setting {
  const { flavours, dimension, divisor, wilson = [], exponent, ends = false } = question;
  const loops = question.loops ?? KNOWN_LOOPS;
  const ultraviolet = nearestUltraviolet(question);
  const bare = expectedSingularity({ flavours, dimension, divisor });
  const runs = loops >= LEAST_LOOPS || ends;
  const plain = exponent !== undefined || !runs;
  const u = dimension / 2;
  const nearby =
    ultraviolet === undefined || ultraviolet > u + SAME ? undefined : ultraviolet < u - SAME ? 'inside' : 'beside';
  const beta = betaCoefficients(flavours, divisor).slice(0, loops).map(toNumberExact);
  const [b0 = NaN, b1 = 0] = beta;
  return {
    t: toNumberExact(bare.t),
    p: exponent === undefined ? (dimension * b1) / (2 * b0 * b0) : toNumberExact(exponent) - 1,
    corrections: plain ? [] : bare.corrections.slice(0, Math.min(CORRECTIONS, loops - 2)).map(toNumberExact),
    beta,
    dimension,
    wilson: [1, ...wilson.map(toNumberExact)],
    plain,
    sumRuleTerms: ends ? LONGEST : loops,
    scales: runs && question.coefficients.length <= LONGEST,
    ...(nearby === undefined
      ? {}
      : { nearby, cuts: { a: (ultraviolet ?? u) / u, b: (question.nextInfrared ?? u + NEXT) / u } }),
  };
}

export interface MethodSteps {
  readonly method: NormalisationMethod;
  readonly steps: readonly number[];
  readonly limited: boolean;
}

/** r_n in the coupling with β = −b_0 X²/(1 − q X). */
function inGeometric(r: readonly number[], { beta }: Setting): number[] {
  const n = r.length;
  const [b0 = NaN, b1 = 0] = beta;
  const b = Array.from({ length: n }, (_, k) => beta[k] ?? 0);
  const geometric = b.map((_, k) => b0 * (b1 / b0) ** k);
  return substituteOver(doubleField, r, 1, relationOfBetas(doubleField, b, geometric, 0, n), n);
}

/** All methods that apply, the leading one first, for r_0, r_1, … of x^(n+1). */
export function stepsOf(r: readonly number[], s: Setting): MethodSteps[] {
  const bare = mulSeries(doubleField, r, reciprocal(doubleField, s.wilson, r.length), r.length);
  const few = s.nearby === 'inside' ? bare.slice(0, LIMIT_INSIDE + 1) : bare;
  const limited = few.length < bare.length;
  const others: MethodSteps[] = [
    { method: 'ratio to the asymptotic form', steps: asymptoticRatio(few, s.t, s.p, s.corrections), limited },
    { method: 'expansion of the Borel factor', steps: borelFactor(few, s.t, s.p), limited },
  ];
  if (s.plain) return others;
  const [b0 = NaN, b1 = 0] = s.beta;
  const geometric = inGeometric(bare.slice(0, s.sumRuleTerms), s);
  const ruled = geometric.slice(0, few.length);
  const rule: MethodSteps = {
    method: 'sum rule',
    steps: sumRule(ruled, b0, b1 / b0, s.dimension),
    limited: ruled.length < bare.length,
  };
  if (s.cuts === undefined) return [rule, ...others];
  // The convergent sum leads.
  const conformal: MethodSteps = {
    method: 'sum rule in the conformal variable',
    steps: conformalSums(sumRuleTerms(geometric, b0, b1 / b0, s.dimension), s.cuts),
    limited: geometric.length < bare.length,
  };
  return [conformal, rule, ...others];
}
