/**
 * @module Everything about a contour quantity, order by order, as plain data: the weight, the circle, both expansions, their
 * Borel sums, and both again without the gluon condensate's renormalon. Numbers are decimal strings of known digits.
 */
import { C, exact, pi, R, toDecimal, toNumberExact } from '../numerics/index.js';
import type { Ball, Exact, Rational } from '../numerics/index.js';
import { circleMoments, exactInPiSquared, inPiSquaredText } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import { decimalText, weightText } from '../series/index.js';
import { bitsFor, CONTESTED, lastSize } from './answers.js';
import type { ContourAnswer, ContourQuantity } from './answers.js';
import { modelAnswers, padeAnswers } from './answer-borel.js';
import { subtractedTerms, subtractionObjection, USUAL_RATIO } from './answer-subtracted.js';
import { couplingsOnCircle } from './circle.js';
import { contourIntegrals, improvedTerms } from './improved.js';
import { modelNorm, PUBLISHED_NORM } from './normalisation.js';
import type { Norm } from './normalisation.js';
import type { BorelRow, ContourReport, OrderRow, PowerRow, SubtractedReport, SummedTerm } from './report-types.js';

export interface ReportOptions {
  readonly digits: number;
  /** N_g; 'model' takes it from the singularity model of the series. */
  readonly norm?: Norm | 'model';
  /** R/√s_0 of the subtraction. */
  readonly ratio?: Rational;
}

/** J_l shown at least, where there are so many orders. */
const FEWEST_MOMENTS = 4;
/** Digits of numbers that come from an error recipe. */
const ROUGH_DIGITS = 3;
/** Longest exact form of a moment that is written out. */
const LONGEST_FORM = 60;

const text = (b: Ball, digits: number): string => toDecimal(b, digits).text;
const rough = (x: number): string => String(Number(x.toPrecision(ROUGH_DIGITS)));

/** Terms of the undressed moment into terms and partial sums of R. */
function summed(e: ContourQuantity, terms: readonly Ball[], digits: number, start: Ball = R.ZERO): SummedTerm[] {
  const prec = bitsFor(digits);
  const factor = e.factor.ball(prec);
  let total = R.add(e.additive.ball(prec), R.mul(factor, start, prec), prec);
  return terms.map((t) => {
    const term = R.mul(factor, t, prec);
    total = R.add(total, term, prec);
    return { term: text(term, digits), sum: text(total, digits) };
  });
}

/** K_n x^(n + p): the terms of the fixed-order expansion, leading zeros included. */
function fixedOrderTerms(e: ContourQuantity, prec: number): { readonly coefficients: Exact[]; readonly terms: Ball[] } {
  const { contour: origin } = e;
  const zeros = e.power - origin.power;
  const coefficients = origin.coefficients.map((_, n) =>
    n < zeros ? exact(0) : (e.coefficients[n - zeros] ?? exact(0)),
  );
  const x = e.x.ball(prec);
  const terms = coefficients.map((c, n) => R.mul(c.ball(prec), R.powInt(x, n + origin.power, prec), prec));
  return { coefficients, terms };
}

function exactText(c: Exact, digits: number): string {
  if (c.rational?.isInteger() === true) return c.rational.toString();
  return text(c.ball(bitsFor(digits)), digits);
}

/** What an operator of dimension 2k finds in the weight, (1/2πi) ∮ dx/x W (−x)^(−k) = (−1)^k W_k: w_{k−1} alone makes it. */
function sensitivities(origin: ContourQuantity['contour']): PowerRow[] {
  const last = Math.max(4, origin.integral.length - 1);
  return Array.from({ length: last - 1 }, (_, i): PowerRow => {
    const k = i + 2;
    const W = origin.integral[k];
    const absent = W === undefined || W.isZero();
    const share = absent ? '0' : (k % 2 === 0 ? W : W.neg()).toString();
    return {
      dimension: 2 * k,
      coefficient: share,
      statement: absent
        ? `suppressed, w has no x${k === 2 ? '' : `^${k - 1}`}: only through the running of its own coefficient`
        : `enters with ${share} times its term of D`,
    };
  });
}

function circleOf(e: ContourQuantity, digits: number): ContourReport['circle'] {
  const { contour: origin } = e;
  const prec = bitsFor(digits);
  const found = couplingsOnCircle(origin, e.x, [pi(prec)], prec);
  if ('reason' in found) return { loops: origin.loops, refused: found };
  const [end = C.INDETERMINATE] = found;
  const { re, im } = C.toNumbers(end);
  return {
    loops: origin.loops,
    end: {
      re: text(end.re, digits),
      im: text(end.im, digits),
      modulus: text(C.abs(end, prec), digits),
      degrees: rough((Math.atan2(im, re) * 180) / Math.PI),
    },
  };
}

function borelRow(e: ContourQuantity, method: string, answer: ContourAnswer, digits: number): BorelRow {
  if (answer.kind === 'refusal')
    return { method, variant: answer.variant, refused: { reason: answer.reason, remedy: answer.remedy } };
  const prec = bitsFor(digits);
  const front = Math.abs(toNumberExact(e.factor));
  const { imaginary: im, improvedLimit: limit } = answer;
  return {
    method,
    variant: answer.variant,
    value: text(dressed(e, answer.value, prec), digits),
    ...(im === undefined
      ? {}
      : {
          imaginary: text(R.mul(e.factor.ball(prec), im, prec), digits),
          ambiguity: rough((Math.abs(R.toNumber(im)) * front) / Math.PI),
        }),
    ...(limit === undefined
      ? {}
      : {
          improvedLimit: text(dressed(e, limit, prec), digits),
          separation: text(R.mul(e.factor.ball(prec), R.sub(answer.value, limit, prec), prec), digits),
        }),
    ...(answer.truncation === undefined ? {} : { truncation: rough(answer.truncation * front) }),
    ...(answer.central === true ? { central: true } : {}),
    notes: answer.notes,
  };
}

/** additive + factor · value. */
const dressed = (e: ContourQuantity, value: Ball, prec: number): Ball =>
  R.add(e.additive.ball(prec), R.mul(e.factor.ball(prec), value, prec), prec);

const borelRows = (e: ContourQuantity, digits: number): BorelRow[] => [
  ...modelAnswers(e, { digits }).map((a) => borelRow(e, 'Singularity model', a, digits)),
  ...padeAnswers(e, { digits }).map((a) => borelRow(e, 'Borel–Padé', a, digits)),
];

/** A norm as it was given, or to a few digits. */
const normText = (value: Exact, digits: number): string =>
  (value.rational && decimalText(value.rational)) ?? text(value.ball(bitsFor(digits)), Math.min(digits, 8));

function normOf(e: ContourQuantity, options: ReportOptions): Norm | Refusal {
  if (options.norm !== 'model') return options.norm ?? PUBLISHED_NORM;
  return (
    modelNorm(e.contour, 2 * bitsFor(options.digits)) ?? {
      reason:
        'the singularity model of this series gives no N_g: it holds no singularity of dimension 4, or cannot be fitted',
      remedy: "give a value: --norm '0.57(23)'",
    }
  );
}

function subtractedReport(
  e: ContourQuantity,
  options: ReportOptions,
  integrals: readonly Ball[] | undefined,
): SubtractedReport | { readonly refused: Refusal } {
  const { digits } = options;
  const objection = subtractionObjection(e);
  if (objection !== undefined) return { refused: objection };
  const norm = normOf(e, options);
  if ('reason' in norm) return { refused: norm };
  const ratio = options.ratio ?? USUAL_RATIO;
  const found = subtractedTerms(e, norm, ratio, digits, integrals);
  if ('reason' in found) return { refused: found };
  const { fixedOrder, improved, parts } = found;
  const prec = bitsFor(digits);
  const fixed = summed(e, fixedOrder, digits, parts.addedBack);
  const ci = summed(e, improved, digits, parts.addedBack);
  // What a norm larger by one sigma changes: everything taken out, and what is added back.
  const share = (norm.error / toNumberExact(norm.value)) * Math.abs(toNumberExact(e.factor));
  const moved = (taken: readonly Ball[]): string =>
    rough(Math.abs(R.toNumber(taken.reduce((sum, t) => R.sub(sum, t, prec), parts.addedBack))) * share);
  return {
    norm: {
      value: normText(norm.value, digits),
      ...(norm.error > 0 ? { error: rough(norm.error) } : {}),
      origin: norm.origin,
    },
    ratio: ratio.toString(),
    addedBack: text(R.mul(e.factor.ball(prec), parts.addedBack, prec), digits),
    orders: fixed.map((f, n) => ({ order: n + e.contour.power, fixedOrder: f, improved: ci[n]! })),
    difference: text(difference(e, fixedOrder, improved, prec), Math.min(digits, 6)),
    ...(norm.error > 0 ? { normMoves: { fixedOrder: moved(parts.fixedOrder), improved: moved(parts.improved) } } : {}),
  };
}

const difference = (e: ContourQuantity, a: readonly Ball[], b: readonly Ball[], prec: number): Ball =>
  R.mul(
    e.factor.ball(prec),
    a.reduce<Ball>((sum, t, n) => R.add(sum, R.sub(t, b[n]!, prec), prec), R.ZERO),
    prec,
  );

/** The report on a contour quantity at its coupling. */
export function contourReport(e: ContourQuantity, options: ReportOptions): ContourReport {
  const { digits } = options;
  const { contour: origin } = e;
  const prec = bitsFor(digits);
  const { coefficients, terms } = fixedOrderTerms(e, prec);
  const fixed = summed(e, terms, digits);
  const integrals = contourIntegrals(origin, e.x, digits);
  const refusedCircle = 'reason' in integrals ? integrals : undefined;
  const ci = 'reason' in integrals ? undefined : improvedTerms(origin, integrals, prec);
  const improved = ci === undefined ? undefined : summed(e, ci, digits);
  const orders = coefficients.map((c, n): OrderRow => ({
    order: n + origin.power,
    coefficient: exactText(origin.coefficients[n]!, digits),
    ...(origin.errors[n]! > 0 ? { coefficientError: rough(origin.errors[n]!) } : {}),
    momentCoefficient: exactText(c, digits),
    fixedOrder: fixed[n]!,
    ...('reason' in integrals ? {} : { integral: text(integrals[n]!, digits) }),
    ...(improved === undefined ? {} : { improved: improved[n]! }),
  }));
  const front = Math.abs(toNumberExact(e.factor));
  const last = { fixed: lastSize(terms) * front, improved: ci === undefined ? undefined : lastSize(ci) * front };
  const gap = ci === undefined ? undefined : difference(e, terms, ci, prec);
  const larger = Math.max(last.fixed, last.improved ?? 0);
  return {
    weight: {
      text: weightText({ coefficients: origin.weight }),
      coefficients: origin.weight.map(String),
      integral: origin.integral.map(String),
    },
    moments: circleMoments(origin.integral, Math.max(FEWEST_MOMENTS, coefficients.length)).map((q, l) => {
      const form = inPiSquaredText(q);
      return {
        power: l,
        value: exactText(exactInPiSquared(q), digits),
        ...(form.length <= LONGEST_FORM ? { exact: form } : {}),
      };
    }),
    powerCorrections: sensitivities(origin),
    circle: circleOf(e, digits),
    orders,
    fixedOrder: { value: fixed.at(-1)?.sum ?? '0', truncation: rough(last.fixed) },
    ...(improved === undefined || last.improved === undefined
      ? {}
      : { contourImproved: { value: improved.at(-1)?.sum ?? '0', truncation: rough(last.improved) } }),
    ...(gap === undefined
      ? {}
      : {
          difference: {
            value: text(gap, Math.min(digits, 6)),
            ...(larger > 0 ? { overTruncation: rough(Math.abs(R.toNumber(gap)) / larger) } : {}),
            statement: CONTESTED,
          },
        }),
    ...(refusedCircle === undefined ? {} : { refused: refusedCircle }),
    borel: borelRows(e, digits),
    subtracted: subtractedReport(e, options, 'reason' in integrals ? undefined : integrals),
  };
}
