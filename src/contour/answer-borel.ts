/**
 * @module Borel sums of the fixed-order series of a contour quantity: the Borel transform of D by the singularity model or by
 * Padé approximants, summed at the couplings of the circle.
 * Truncation errors: the step from one coefficient less, and for the approximants the range of the neighbours.
 */
import { fitModel, approximate, nearDiagonal } from '../borel/index.js';
import type { Approximant, ModelFit, ModelSingularity } from '../borel/index.js';
import { R, Rational, toNumberExact } from '../numerics/index.js';
import type { ContourOrigin } from '../series/index.js';
import { bitsFor, refused, size } from './answers.js';
import type { ContourAnswer, ContourQuantity, ContourRequest, ContourSum } from './answers.js';
import { contourBorel } from './borel.js';
import type { ContourBorel } from './borel.js';
import { modelAt } from './model.js';
import { rationalAt } from './rational.js';

/** Digits of a value that only serves an error. */
const ERROR_DIGITS = 10;
/** Contributions whose sizes add up to more than this multiple of the last coefficient cancel: say so. Heuristic. */
const SUSPICIOUS_SHARE = 5;
/** A pole closer to the origin than this fraction of the nearest stated singularity is where none may be. Heuristic. */
const INSIDE = 0.7;

/** The singularities of D with an exponent that `count` coefficients can carry: each needs one, one is left over. */
export function modelSingularities(origin: ContourOrigin, count: number): readonly ModelSingularity[] {
  const all = origin.stated.flatMap((s): ModelSingularity[] =>
    s.exponent === undefined
      ? []
      : [
          {
            t: s.t,
            exponent: s.exponent,
            corrections: s.corrections,
            ...(s.strength === undefined ? {} : { strength: s.strength }),
          },
        ],
  );
  return all.slice(0, Math.max(1, Math.min(all.length, count - 2)));
}

export interface FittedModel {
  readonly fit: ModelFit;
  readonly singularities: readonly ModelSingularity[];
}

/** The model through the first `count` coefficients of D. */
export function fittedModel(origin: ContourOrigin, count: number, prec: number): FittedModel | undefined {
  const singularities = modelSingularities(origin, count);
  if (singularities.length === 0) return undefined;
  const fit = fitModel(origin.coefficients.slice(0, count), singularities, prec);
  return fit && { fit, singularities };
}

function modelSum(e: ContourQuantity, count: number, digits: number): (ContourBorel & FittedModel) | undefined {
  // The fit cancels: twice the bits are cheap there.
  const model = fittedModel(e.contour, count, 2 * bitsFor(digits));
  if (model === undefined) return undefined;
  const found = contourBorel(e.contour, e.x, modelAt(model.fit, model.singularities), digits);
  return 'reason' in found ? undefined : { ...found, ...model };
}

function modelNotes(e: ContourQuantity, { fit, singularities, pv, improved }: ContourBorel & FittedModel): string[] {
  const notes = singularities.map(
    (s, i) =>
      `singularity of D at t = ${toNumberExact(s.t).toPrecision(5)}: strength ${R.toNumber(fit.strengths[i]!).toPrecision(4)}, ` +
      `${(100 * fit.shares[i]!).toFixed(0)} % of the last coefficient`,
  );
  if (fit.shares.reduce((total, s) => total + Math.abs(s), 0) > SUSPICIOUS_SHARE)
    notes.push('large contributions cancel: the strengths are not to be trusted one by one');
  const factor = toNumberExact(e.factor);
  const gap = R.toNumber(R.sub(pv, improved, 100)) * factor;
  notes.push(
    `the contour-improved series of this model tends to another number, lower by ${gap.toPrecision(4)} (asymptotic separation)`,
  );
  return notes;
}

export function modelAnswers(e: ContourQuantity, request: ContourRequest): readonly ContourAnswer[] {
  const { contour: origin } = e;
  const count = origin.coefficients.length;
  const used = modelSingularities(origin, count);
  const variant = `${used.length} singularit${used.length === 1 ? 'y' : 'ies'} of D`;
  if (used.length === 0)
    return [
      refused(variant, {
        reason: 'no singularity of D with position and exponent is stated',
        remedy: 'state them in the series file, or the operator dimension',
      }),
    ];
  const best = modelSum(e, count, request.digits);
  if (best === undefined)
    return [
      refused(variant, {
        reason: `${count} coefficient${count === 1 ? '' : 's'} cannot fix ${used.length} strength${used.length === 1 ? '' : 's'}, or the circle meets the Landau singularity`,
        remedy: 'give more coefficients, state fewer singularities, or use a smaller coupling',
      }),
    ];
  const base: ContourSum = {
    kind: 'sum',
    variant,
    value: best.pv,
    imaginary: best.imaginary,
    improvedLimit: best.improved,
    termsUsed: count,
    notes: [],
    central: true,
  };
  if (request.only !== undefined) return [base];
  const before = count > 2 ? modelSum(e, count - 1, ERROR_DIGITS) : undefined;
  return [
    {
      ...base,
      ...(before === undefined ? {} : { truncation: size(R.sub(best.pv, before.pv, 100)) }),
      notes: modelNotes(e, best),
    },
  ];
}

interface Entry {
  readonly label: string;
  readonly approximant: Approximant;
  readonly sum?: ContourBorel;
  readonly objection?: string;
}

function entryOf(e: ContourQuantity, L: number, M: number, digits: number): Entry {
  const { contour: origin } = e;
  const approximant = approximate(origin.coefficients, Rational.ZERO, L, M, 2 * bitsFor(digits), 0);
  const label = `[${L}/${M}]`;
  if (approximant.exists !== true)
    return { label, approximant, objection: approximant.reason ?? 'the entry does not exist' };
  const nearest = origin.stated[0];
  const inside =
    nearest === undefined
      ? undefined
      : approximant.poles.find((p) => p.modulus < INSIDE * Math.abs(toNumberExact(nearest.t)));
  if (inside !== undefined)
    return {
      label,
      approximant,
      objection: `a pole at |t| = ${inside.modulus.toPrecision(3)} lies where no singularity is expected`,
    };
  const found = contourBorel(origin, e.x, rationalAt(approximant), digits);
  return 'reason' in found ? { label, approximant, objection: found.reason } : { label, approximant, sum: found };
}

export function padeAnswers(e: ContourQuantity, request: ContourRequest): readonly ContourAnswer[] {
  const count = e.contour.coefficients.length;
  if (count < 3)
    return [
      refused('near-diagonal', {
        reason: `${count} coefficient${count === 1 ? '' : 's'}: a rational approximant needs three`,
        remedy: 'give more coefficients',
      }),
    ];
  const toSum = ({ label, sum }: Entry & { readonly sum: ContourBorel }): ContourSum => ({
    kind: 'sum',
    variant: label,
    value: sum.pv,
    imaginary: sum.imaginary,
    termsUsed: count,
    notes: [],
  });
  const places = nearDiagonal(count - 1, 2);
  const wanted = places.filter(([L, M]) => request.only === undefined || request.only === `[${L}/${M}]`);
  const entries = wanted.map(([L, M]) => entryOf(e, L, M, request.digits));
  const standing = entries.filter((entry): entry is Entry & { sum: ContourBorel } => entry.sum !== undefined);
  const before =
    request.only === undefined
      ? nearDiagonal(count - 2, 1)
          .map(([L, M]) => entryOf(e, L, M, ERROR_DIGITS))
          .find((entry) => entry.sum !== undefined)
      : undefined;
  const centre = standing[0];
  return entries.map((entry): ContourAnswer => {
    if (entry.sum === undefined)
      return refused(entry.label, {
        reason: entry.objection ?? 'no value',
        remedy: 'read the neighbouring entries, or the singularity model',
      });
    const own = { ...entry, sum: entry.sum };
    const distance = (other: ContourBorel): number => size(R.sub(own.sum.pv, other.pv, 100));
    const range = Math.max(0, ...standing.map((other) => distance(other.sum)));
    const step = before?.sum === undefined ? 0 : distance(before.sum);
    return {
      ...toSum(own),
      ...(request.only !== undefined || range + step === 0 ? {} : { truncation: Math.hypot(range, step) }),
      ...(entry === centre || request.only !== undefined ? { central: true } : {}),
    };
  });
}
