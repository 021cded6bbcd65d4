/**
 * @module Hyperasymptotic level one: partial sum plus terminants of the leading singularity, strengths from the late terms.
 *
 * The sum is cut at ℓ = min(N, 2ω) terms, or where the next stated singularity takes over (ℓ = |t₂|/x); the remainder is
 * re-expanded in terminants. With stated corrections c₁, c₂, … their pieces are tied to one strength (stated, or fitted to the
 * last coefficient); without, J free strengths from the last J coefficients, J where the value moves least.
 * Truncation error: the largest of that last move, the change when the highest coefficient is left out, and the first term left
 * out that the terminants do not account for (the next singularity's share).
 * References: M. V. Berry, C. J. Howls (1990, 1991); C. Ayala, X. Lobregat, A. Pineda, arXiv:1902.07736, 1909.01370
 * (abstracts seen); DLMF 10.40(iv).
 */
import { addExact, exact, mulExact, R, rgamma, signExact, toNumberExact } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import { fitStrengths, hyperasymptoticSum, lateCoefficient } from '../borel/index.js';
import type { LaplaceSum } from '../borel/index.js';
import type { Expansion, StatedSingularity } from '../series/index.js';
import { cleanPart, growthObjection, inputObjection, trustOf } from './eligibility.js';
import type { Outcome, Prescription, Request } from './prescription.js';
import { dressed, refusal, scaled, toDigits } from './prescription.js';

/** Most coefficients used. Heuristic: cost. */
const MOST = 120;
/** Most free strengths. Heuristic: the system of the late terms becomes useless beyond. */
const MOST_PIECES = 20;
/** Bits for the remainder of one late term, before those that its index costs. */
const PROBE_BITS = 160;
/** Level one gains until twice the number of terms of the least term. */
const REACH = 2;

type Leading = StatedSingularity & { readonly exponent: Exact };

interface Plan {
  readonly cut: number;
  /** Free strengths, or 1 with tied corrections. */
  readonly pieces: number;
}

/** S_j/S_0 = c_j (γ−1)(γ−2)…(γ−j) for the stated corrections. */
function ties(s: Leading): Exact[] {
  let product: Exact = exact(1);
  return s.corrections.map((c, i) => {
    product = mulExact(product, addExact(s.exponent, exact(-(i + 1))));
    return mulExact(c, product);
  });
}

/** Strengths at a precision: stated, tied, or free. */
function strengthsOf(c: readonly Exact[], s: Leading, pieces: number, prec: number): Ball[] | undefined {
  const tied = ties(s);
  if (s.strength === undefined) return fitStrengths(c, s, pieces, prec, tied);
  const lead = R.mul(s.strength.ball(prec), rgamma(s.exponent.ball(prec), prec), prec);
  return [lead, ...tied.map((t) => R.mul(t.ball(prec), lead, prec))];
}

function evaluate(e: Expansion, s: Leading, plan: Plan, digits: number): LaplaceSum | undefined {
  const found = toDigits(
    digits,
    (prec): LaplaceSum | undefined => {
      const strengths = strengthsOf(e.coefficients, s, plan.pieces, prec + 4 * plan.pieces);
      return strengths && hyperasymptoticSum(e.coefficients, s, strengths, plan.cut, e.x.ball(prec), prec);
    },
    (v) => v?.pv ?? R.ZERO,
  );
  return found !== undefined && found.pv.rad < Infinity ? found : undefined;
}

/** Where to cut N terms with `pieces` terminants. */
function cutFor(e: Expansion, s: Leading, pieces: number): number {
  const x = toNumberExact(e.x);
  const w = Math.abs(toNumberExact(s.t)) / x;
  const second = e.stated[1];
  const reach = second === undefined ? REACH * w : Math.abs(toNumberExact(second.t)) / x;
  const fewest = Math.floor(pieces - 1 - toNumberExact(s.exponent)) + 1;
  return Math.min(e.coefficients.length, Math.max(1, fewest, Math.round(reach)));
}

/** Digits of the evaluations that only choose the number of pieces and serve the error. */
const TRIAL_DIGITS = 15;

interface Chosen {
  readonly plan: Plan;
  /** Last move of the value with the number of pieces; undefined when there was no choice. */
  readonly move?: number;
}

function choose(e: Expansion, s: Leading): Chosen {
  const plan = (pieces: number): Plan => ({ pieces, cut: cutFor(e, s, pieces) });
  const most =
    s.corrections.length > 0 || s.strength !== undefined
      ? 1
      : Math.min(MOST_PIECES, Math.floor(e.coefficients.length / 2));
  let best: Chosen = { plan: plan(1) };
  let before = evaluate(e, s, best.plan, TRIAL_DIGITS);
  for (let pieces = 2; pieces <= most; pieces++) {
    const value = evaluate(e, s, plan(pieces), TRIAL_DIGITS);
    if (value === undefined || before === undefined) break;
    const move = difference(e, value.pv, before.pv);
    if (best.move === undefined || move < best.move) best = { plan: plan(pieces), move };
    before = value;
  }
  return best;
}

function difference(e: Expansion, a: Ball, b: Ball): number {
  const d = scaled(e, R.sub(a, b, 128), 128);
  return Math.abs(R.toNumber(d)) + R.radiusToNumber(d);
}

const label = ({ cut, pieces }: Plan, tied: boolean): string =>
  `${cut} terms, ${tied ? 'one strength' : `${pieces} strength${pieces === 1 ? '' : 's'}`}`;

function planOf(text: string): Plan | undefined {
  const m = /^(\d+) terms, (one|\d+) strengths?$/.exec(text);
  return m === null ? undefined : { cut: Number(m[1]), pieces: m[2] === 'one' ? 1 : Number(m[2]) };
}

function sum(e: Expansion, s: Leading, request: Request): Outcome {
  const asked = request.only === undefined ? undefined : planOf(request.only);
  if (request.only !== undefined && asked === undefined)
    return refusal(request.only, 'not a member of the family', 'choose another');
  const chosen: Chosen = asked === undefined ? choose(e, s) : { plan: asked };
  const tied = s.corrections.length > 0 || s.strength !== undefined;
  const variant = label(chosen.plan, tied);
  const best = evaluate(e, s, chosen.plan, request.digits);
  if (best === undefined)
    return refusal(
      variant,
      'the strengths cannot be read off the late terms',
      'give more coefficients, or use terminant',
    );
  const prec = Math.max(128, request.digits * 4 + 64);
  const value = dressed(e, best.pv, prec);
  const truncation = asked === undefined ? errorOf(e, s, chosen, best.pv) : undefined;
  return {
    kind: 'sum',
    variant,
    value,
    // An ultraviolet leader says nothing of the singularities on the positive axis.
    ...(signExact(s.t) > 0 || e.stated.length === 1 ? { imaginary: scaled(e, best.im, prec) } : {}),
    ...(truncation === undefined ? {} : { truncation }),
    termsUsed: e.coefficients.length,
    trust: trustOf(value, truncation),
    notes: e.stated.length > 1 ? ['only the nearest singularity is re-expanded: the next one sets what remains'] : [],
    central: true,
  };
}

/** The largest of the last move, the change without the highest coefficient, and what the terminants leave of a late term. */
function errorOf(e: Expansion, s: Leading, chosen: Chosen, best: Ball): number | undefined {
  const shorter: Expansion = { ...e, coefficients: e.coefficients.slice(0, -1) };
  const pieces = Math.min(chosen.plan.pieces, Math.max(1, Math.floor(shorter.coefficients.length / 2)));
  const before = evaluate(shorter, s, { pieces, cut: cutFor(shorter, s, pieces) }, TRIAL_DIGITS);
  const found = [
    chosen.move,
    before === undefined ? undefined : difference(e, best, before.pv),
    unexplained(e, s, chosen.plan),
  ].filter((x): x is number => x !== undefined);
  return found.length === 0 ? undefined : Math.max(...found);
}

/** |c_n − late-term form| x^n at the first omitted n, where the strengths were not fitted to it. */
function unexplained(e: Expansion, s: Leading, { cut, pieces }: Plan): number | undefined {
  const fittedFrom = e.coefficients.length - (s.strength === undefined ? pieces : 0);
  if (cut >= fittedFrom) return undefined;
  const n = cut;
  const prec = PROBE_BITS + 8 * n;
  const strengths = strengthsOf(e.coefficients, s, pieces, prec);
  if (strengths === undefined) return undefined;
  const rest = R.sub(e.coefficients[n]!.ball(prec), lateCoefficient(s, strengths, n, prec), prec);
  const size = Math.abs(R.toNumber(scaled(e, R.mul(rest, R.powInt(e.x.ball(prec), n, prec), prec), prec)));
  return Number.isFinite(size) ? size : undefined;
}

export const hyperasymptotic: Prescription = {
  name: 'hyperasymptotic',
  title: 'hyperasymptotic level one',
  summary:
    'partial sum completed by terminants whose strengths are read off the late terms; needs position and exponent',
  family: 'truncation',
  apply(full, growth, request): readonly Outcome[] {
    const e = cleanPart(full, growth, MOST);
    const variant = 'leading singularity';
    const no = growthObjection(growth, variant) ?? inputObjection(e, growth, variant, 3);
    if (no !== undefined) return [no];
    const s = e.stated[0];
    if (s?.exponent === undefined)
      return [
        refusal(
          variant,
          s === undefined
            ? 'no position of a leading singularity is known'
            : 'the leading singularity has no known exponent',
          'state it in the series file (singularities: u or dimension, with exponent)',
        ),
      ];
    const leading: Leading = { ...s, exponent: s.exponent };
    const w = Math.abs(toNumberExact(s.t)) / toNumberExact(e.x);
    if (signExact(s.t) > 0 && w - (toNumberExact(s.exponent) - 1) - 1 / 3 < 0.5)
      return [
        refusal(
          variant,
          'the optimal cut lies before the first term: the coupling is too large',
          'take a smaller coupling (a higher scale)',
        ),
      ];
    return [sum(e, leading, request)];
  },
};
