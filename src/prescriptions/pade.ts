/**
 * @module Padé approximants of the series in the coupling itself.
 *
 * [L/M](x) of F, evaluated exactly. A series with a same-sign factorial divergence has its cut on the positive axis, where
 * real approximants only wander: such a value is given with that caution and without an ambiguity.
 * Truncation error: the range over the neighbouring entries of the same order and the step from the order before, in
 * quadrature. Reference: G. A. Baker, P. Graves-Morris, Padé Approximants (1996) (from memory).
 */
import { R } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';
import { nearDiagonal, padeOf } from '../borel/index.js';
import type { Expansion } from '../series/index.js';
import type { Outcome, Prescription } from './prescription.js';
import { dressed, refusal, toDigits } from './prescription.js';
import { combineErrors, countBefore } from './neighbours.js';

/** Largest number of coefficients used: beyond, rational approximants of the coupling series gain nothing. Heuristic. */
const MOST = 60;
/** Digits of the values that only serve an error. */
const ERROR_DIGITS = 12;

function valueAt(e: Expansion, L: number, M: number, digits: number): Ball | undefined {
  let failed = false;
  const v = toDigits(
    digits,
    (prec): Ball => {
      const p = padeOf(e.coefficients, L, M, prec);
      if (p.exists !== true) {
        failed = true;
        return R.ZERO;
      }
      const x = e.x.ball(prec);
      const q = horner(p.denominator, x, prec);
      return R.div(horner(p.numerator, x, prec), q, prec);
    },
    (b) => b,
  );
  return failed || !(v.rad < Infinity) ? undefined : v;
}

function horner(c: readonly Ball[], x: Ball, prec: number): Ball {
  return c.reduceRight<Ball>((acc, a) => R.add(R.mul(acc, x, prec), a, prec), R.ZERO);
}

export const pade: Prescription = {
  name: 'pade',
  title: 'Padé in the coupling',
  summary: 'rational approximants of the series itself',
  family: 'coupling',
  apply(e, growth, request): readonly Outcome[] {
    if (growth.verdict === 'terminating')
      return [refusal('near-diagonal', 'the series terminates', 'use the fixed-order sum')];
    const usable = Math.min(e.coefficients.length, growth.usableCoefficients ?? MOST, MOST);
    if (usable < 3)
      return [
        refusal(
          'near-diagonal',
          `${usable} usable coefficients: a rational approximant needs three`,
          'give more coefficients',
        ),
      ];
    if (growth.flags.some((f) => f.code === 'errors-exceed-values'))
      return [
        refusal(
          'near-diagonal',
          'coefficient errors exceed the coefficients',
          'give coefficients with smaller errors, or fewer of them (--order)',
        ),
      ];
    const short: Expansion = { ...e, coefficients: e.coefficients.slice(0, usable) };
    const evaluate = (L: number, M: number, digits: number): Ball | undefined => valueAt(short, L, M, digits);
    const notes =
      growth.signPattern === 'same' && growth.verdict !== 'geometric'
        ? ['same-sign series: the coupling lies on the cut, real approximants wander']
        : [];
    const outcomes: Outcome[] = [];
    const order = nearDiagonal(usable - 1, 2);
    const lower = nearDiagonal(countBefore(short.coefficients) - 1, 1);
    const label = (L: number, M: number): string => `[${L}/${M}]`;
    if (request.only !== undefined) {
      const wanted = order.find(([L, M]) => label(L, M) === request.only);
      const v = wanted && evaluate(wanted[0], wanted[1], request.digits);
      return v === undefined
        ? [refusal(request.only, 'the entry does not exist', 'choose another')]
        : [sumOf(short, request.only, v, usable, notes)];
    }
    let chosen = false;
    const values = order.map(([L, M]) => {
      // Beside the family's own choice the others serve its error alone.
      const aside = request.central === true && chosen;
      const value = evaluate(L, M, aside ? ERROR_DIGITS : request.digits);
      chosen ||= value !== undefined;
      return { label: label(L, M), value, aside };
    });
    const before = lower.map(([L, M]) => evaluate(L, M, ERROR_DIGITS)).find((v) => v !== undefined);
    const errors = combineErrors(
      short,
      values.map((v) => v.value),
      before,
    );
    values.forEach((v, i) => {
      if (v.aside) return;
      if (v.value === undefined)
        outcomes.push(
          refusal(v.label, 'the entry does not exist, or has a pole at this coupling', 'read the neighbouring entries'),
        );
      else outcomes.push({ ...sumOf(short, v.label, v.value, usable, notes), ...errors(i) });
    });
    return outcomes;
  },
};

function sumOf(
  e: Expansion,
  variant: string,
  f: Ball,
  termsUsed: number,
  notes: readonly string[],
): Outcome & { kind: 'sum' } {
  const prec = 64 + Math.max(64, R.accuracyBits(f) < Infinity ? Math.ceil(R.accuracyBits(f)) : 64);
  return { kind: 'sum', variant, value: dressed(e, f, prec), termsUsed, trust: 'indicative', notes };
}
