/**
 * @module Fastest apparent convergence.
 *
 * Members: the effective charge, summed by its own renormalisation group (all corrections vanish in its scheme), and the
 * truncated series at the scale where the next-to-leading coefficient vanishes. The notes give the predicted next coefficient.
 * Truncation error: the step from one coefficient fewer; of the effective charge one fewer of those that enter, since a beta
 * function of L loops lets no coefficient beyond the L-th in (the second always enters, through the Λ of the charge).
 * Reference: G. Grunberg, Phys. Lett. B 95 (1980) 70, Phys. Rev. D 29 (1984) 2315; A. L. Kataev, V. V. Starshenko (1995).
 */
import { divExact, exact, mulExact, R, toNumberExact } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import type { Expansion, Running } from '../series/index.js';
import { inputObjection, trustOf } from './eligibility.js';
import { chargeCoefficients, effectiveCharge, predictedCoefficient } from './effective-charge.js';
import type { Outcome, Prescription, Request } from './prescription.js';
import { dressed, refusal, toDigits } from './prescription.js';
import { atScale, negative, ratioAt, scaleObjection } from './scale-choice.js';
import type { AtScale } from './scale-choice.js';

/** Digits of the evaluations that only serve the error. */
const ERROR_DIGITS = 12;
/** Couplings beyond this α-like size make the truncated series meaningless; the notes say so. Heuristic, in units of 1/b_0. */
const STRONG = 0.5;

/** R = additive + factor c_0 D^p. */
function ofCharge(e: Expansion, D: Ball, prec: number): Ball {
  const inX: Expansion = { ...e, x: { ball: () => D } };
  return dressed(inX, e.coefficients[0]!.ball(prec), prec);
}

function charge(e: Expansion, running: Running, digits: number): Ball | undefined {
  const r = chargeCoefficients(e);
  const loops = Math.min(r.length, running.beta.length);
  const found = toDigits(
    digits,
    (prec) => {
      const D = effectiveCharge(running.beta, r, e.x, loops, prec);
      return D === undefined ? undefined : ofCharge(e, D, prec + 16);
    },
    (v) => v ?? R.ZERO,
  );
  return found;
}

const size = (a: Ball, b: Ball): number => Math.abs(R.toNumber(R.sub(a, b, 160)));

function chargeMember(e: Expansion, running: Running, request: Request): Outcome {
  const N = e.coefficients.length;
  const variant = `effective charge, ${N} terms`;
  const value = charge(e, running, request.digits);
  if (value === undefined)
    return refusal(
      variant,
      'the effective charge has a Landau pole or a fixed point in the way',
      'take a smaller coupling (a higher scale), or fewer terms',
    );
  const known = running.beta.length;
  const used = Math.min(N, Math.max(2, known));
  const before =
    request.only === undefined && used > 1
      ? charge({ ...e, coefficients: e.coefficients.slice(0, used - 1) }, running, ERROR_DIGITS)
      : undefined;
  const truncation = before === undefined ? undefined : size(value, before);
  return {
    kind: 'sum',
    variant,
    value,
    ...(truncation === undefined ? {} : { truncation }),
    termsUsed: used,
    trust: trustOf(value, truncation),
    notes: [
      ...prediction(e, running),
      ...(N > used
        ? [`the beta function is known to ${known} loop${known === 1 ? '' : 's'}: later coefficients do not enter`]
        : []),
    ],
    central: true,
  };
}

function prediction(e: Expansion, running: Running): string[] {
  if (e.power !== 1) return [];
  const next = predictedCoefficient(running.beta, chargeCoefficients(e));
  if (next === undefined) return [];
  const c = toNumberExact(mulExact(next, e.coefficients[0]!));
  return [`predicts the next coefficient as ${c.toPrecision(5)}`];
}

/** L = −r_1/(p b_0), r_1 = c_1/c_0: the scale at which the next-to-leading coefficient vanishes. */
export function facShift(e: Expansion, running: Running): Exact {
  const r1 = divExact(e.coefficients[1]!, e.coefficients[0]!);
  return negative(divExact(r1, mulExact(exact(e.power), running.beta[0]!)));
}

function scaleMember(e: Expansion, running: Running, request: Request): Outcome {
  const N = e.coefficients.length;
  const variant = `scale of vanishing c₁, ${N} terms`;
  const shift = facShift(e, running);
  const found = toDigits(
    request.digits,
    (prec): AtScale | undefined => atScale(e, running, shift, prec),
    (v) => v?.value ?? R.ZERO,
  );
  const ratio = ratioAt(running, shift);
  if (found === undefined)
    return refusal(
      variant,
      `the scale μ/Q = ${ratio.toPrecision(3)} lies below the Landau pole`,
      'use the effective charge, or another scale',
    );
  const truncation = request.only === undefined ? size(found.value, found.shorter) : undefined;
  const strength = R.toNumber(found.x) * toNumberExact(running.beta[0]!);
  return {
    kind: 'sum',
    variant,
    value: found.value,
    ...(truncation === undefined ? {} : { truncation }),
    termsUsed: N,
    trust: trustOf(found.value, truncation),
    notes: [`μ/Q = ${ratio.toPrecision(6)}`, ...(strength > STRONG ? ['the coupling at that scale is strong'] : [])],
  };
}

export const fac: Prescription = {
  name: 'fac',
  title: 'fastest apparent convergence',
  summary: 'effective charge, and the series at the scale where its next-to-leading coefficient vanishes',
  family: 'scale',
  apply(e, growth, request): readonly Outcome[] {
    const variant = 'effective charge';
    const no = scaleObjection(e, variant, 2) ?? inputObjection(e, growth, variant, 2);
    if (no !== undefined) return [no];
    const running = e.running!;
    const members = [chargeMember, scaleMember];
    if (request.only !== undefined)
      return members.map((m) => m(e, running, request)).filter((o) => o.variant === request.only);
    return members.map((m) => m(e, running, request));
  },
};
