/**
 * @module Singularity model: the stated branch points with fitted strengths plus a polynomial, summed in closed form.
 * Truncation error: the change against the fit without the highest coefficient.
 * Reference: M. Beneke, M. Jamin, arXiv:0806.3156 (method). The choice of singularities is a model, not a theorem.
 */
import { R } from '../numerics/index.js';
import type { ModelSingularity, ModelSum } from '../borel/index.js';
import { modelSum } from '../borel/index.js';
import type { Expansion } from '../series/index.js';
import type { Outcome, Prescription } from './prescription.js';
import { dressed, refusal, scaled, toDigits } from './prescription.js';

/** Contributions whose sizes add up to more than this multiple of the last coefficient cancel: say so. Heuristic. */
const SUSPICIOUS_SHARE = 5;

/** Stated singularities that enter the model: those with an exponent. */
function modelOf(e: Expansion): ModelSingularity[] {
  return e.stated.flatMap((s) =>
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
}

/** The singularities that the model of this expansion keeps: each needs one coefficient, one is left over. */
export function modelUsed(e: Expansion): readonly ModelSingularity[] {
  const all = modelOf(e);
  return all.slice(0, Math.max(1, Math.min(all.length, e.coefficients.length - 2)));
}

export const singularityModel: Prescription = {
  name: 'singularity-model',
  title: 'singularity model',
  summary: 'stated singularities with fitted strengths plus a polynomial, principal value in closed form',
  family: 'model',
  apply(e, growth, request): readonly Outcome[] {
    const all = modelOf(e);
    const variant =
      all.length === 0 ? 'stated singularities' : `${all.length} singularit${all.length === 1 ? 'y' : 'ies'}`;
    if (all.length === 0)
      return [
        refusal(
          variant,
          'no singularity with position and exponent is stated',
          'state them in the series file, or the operator dimension and flavours',
        ),
      ];
    if (['superfactorial', 'terminating', 'convergent', 'geometric'].includes(growth.verdict))
      return [refusal(variant, `the growth is ${growth.verdict}, not factorial`, 'use the fixed-order sum')];
    // With few coefficients the farthest singularities are dropped first: each needs one coefficient, one is left over.
    const N = e.coefficients.length;
    const model = modelUsed(e);
    const x = e.x;
    const run = (count: number, singularities: readonly ModelSingularity[], digits: number): ModelSum | undefined =>
      toDigits(
        digits,
        (prec) => modelSum(e.coefficients.slice(0, count), singularities, x.ball(prec), prec),
        (m) => m?.pv ?? R.ZERO,
      );
    const best = run(N, model, request.digits);
    if (best === undefined)
      return [
        refusal(
          variant,
          `${N} coefficient${N === 1 ? '' : 's'} cannot fix ${model.length} strength${model.length === 1 ? '' : 's'} and a polynomial`,
          'give more coefficients or state fewer singularities',
        ),
      ];
    const prec = Math.max(96, request.digits * 4);
    const notes: string[] = [];
    let truncation: number | undefined;
    if (request.only === undefined) {
      const before = run(N - 1, model.slice(0, Math.max(1, Math.min(model.length, N - 3))), 12);
      if (before !== undefined) truncation = Math.abs(R.toNumber(scaled(e, R.sub(best.pv, before.pv, 96), 96)));
      model.forEach((s, i) => {
        const t = R.toNumber(s.t.ball(64));
        notes.push(
          `singularity at t = ${t.toPrecision(5)}: strength ${R.toNumber(best.fit.strengths[i]!).toPrecision(4)}, ` +
            `${(100 * best.fit.shares[i]!).toFixed(0)} % of the last coefficient`,
        );
      });
      if (best.fit.shares.reduce((sum, s) => sum + Math.abs(s), 0) > SUSPICIOUS_SHARE)
        notes.push('large contributions cancel: the strengths are not to be trusted one by one');
      const silent = e.stated.filter((s) => s.exponent === undefined);
      if (silent.length > 0)
        notes.push(
          `left out, since no exponent is known: t = ${silent.map((s) => R.toNumber(s.t.ball(64)).toPrecision(4)).join(', ')}`,
        );
      if (model.length < all.length)
        notes.push(
          `only the nearest ${model.length} of ${all.length} stated singularities: too few coefficients for more`,
        );
    }
    return [
      {
        kind: 'sum',
        variant: `${model.length} singularit${model.length === 1 ? 'y' : 'ies'}, polynomial of degree ${best.fit.polynomial.length - 1}`,
        value: dressed(e, best.pv, prec),
        imaginary: scaled(e, best.im, prec),
        ...(truncation === undefined ? {} : { truncation }),
        termsUsed: N,
        trust: 'indicative',
        notes,
        central: true,
      },
    ];
  },
};

/** Imaginary part of the model's own piece of each stated singularity (for condensate shifts); empty when the model fails. */
export function imaginaryPieces(e: Expansion): { t: number; im: number }[] {
  const model = modelOf(e).slice(0, Math.max(1, e.coefficients.length - 2));
  if (model.length === 0) return [];
  const sum = modelSum(e.coefficients, model, e.x.ball(128), 128);
  if (sum === undefined) return [];
  return model.map((s, i) => ({ t: R.toNumber(s.t.ball(64)), im: R.toNumber(scaled(e, sum.imaginaryParts[i]!, 128)) }));
}
