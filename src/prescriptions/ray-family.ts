/**
 * @module A family of Borel-plane approximants summed along a rotated ray: what d-log, partial and quadratic share.
 *
 * Each candidate gives its value at t = x s and says where it is singular. The ray passes above the positive axis and below
 * the complex singularities; where a pair next to the axis leaves no room for that, the ray passes above the pair (which then
 * mimics a singularity on the axis), unless the terms themselves show a complex pair. Where no ray keeps clear of all
 * singularities the candidate is refused, not guessed at.
 * Truncation error: neighbours and the step from the order before (neighbours.ts).
 */
import { C, R } from '../numerics/index.js';
import type { Ball, Complex } from '../numerics/index.js';
import { chooseRay, lateralSums, NEAR_AXIS_ANGLE, STRAIGHT } from '../borel/index.js';
import type { Contour, LaplaceSum, Lossy, QuickComplex } from '../borel/index.js';
import type { Growth } from '../growth/index.js';
import type { Expansion } from '../series/index.js';
import { pairConfirmed, trustOf } from './eligibility.js';
import { combineErrors, countBefore } from './neighbours.js';
import type { Outcome, Request } from './prescription.js';
import { dressed, refusal, scaled } from './prescription.js';

/** One approximant, ready to be integrated. */
export interface Candidate {
  readonly label: string;
  /** Singular points in t: real ones, and the upper members of pairs. */
  readonly singular: readonly Complex[];
  /** Value of the approximated Borel transform at t = x s. */
  readonly value: (s: Complex, prec: number) => Complex;
  /** The same in double-double arithmetic, where its parts are known well enough. */
  readonly quick?: (s: QuickComplex) => Lossy;
  readonly notes: readonly string[];
  /** Why the approximant may not be believed. */
  readonly suspicion?: string;
}

export type Attempt = Candidate | { readonly label: string; readonly reason: string };

/** A member by its label, made only when it is wanted. */
export interface Offer {
  readonly label: string;
  readonly make: () => Attempt;
}

/** Candidates of an expansion, known to `bits` bits, best first. */
export type Build = (e: Expansion, bits: number) => readonly Offer[];

/** Digits of the evaluations that only serve an error estimate. */
const ERROR_DIGITS = 12;
const LIFTED = 'a complex pair near the positive axis is lifted over';
const REMEDY = 'read the neighbouring approximants';

/** Bits with which a family should know its approximants for sums of `digits` digits; few are too few for the quick sums. */
export const familyBits = (digits: number): number => Math.max(150, Math.ceil(digits * 3.33) + 80);

interface Placed {
  readonly contour: Contour;
  readonly lifted: number;
}

/** Where the contour runs for these singularities; a string when there is no room for it. */
function place(e: Expansion, growth: Growth, singular: readonly Complex[]): Placed | string {
  const x = R.toNumber(e.x.ball(64));
  const points = singular.map((z) => ({ ...C.toNumbers(z), real: R.isExactZero(z.im) }));
  const args = points.filter((z) => !z.real && z.re > 0).map((z) => Math.abs(Math.atan2(z.im, z.re)));
  const onAxis = points.filter((z) => z.real && z.re > 0).map((z) => z.re / x);
  if (onAxis.length === 0 && args.length === 0) return { contour: STRAIGHT, lifted: 0 };
  const choice = chooseRay(args, pairConfirmed(growth) ? 0 : NEAR_AXIS_ANGLE);
  if (choice === undefined) {
    const degrees = ((Math.min(...args) * 180) / Math.PI).toFixed(1);
    return `a complex singularity at ${degrees}° from the positive axis leaves no room for the contour`;
  }
  const under = points.filter((z) => !z.real && z.re > 0 && Math.abs(Math.atan2(z.im, z.re)) < choice.ray.angle);
  const first = Math.min(...onAxis, ...under.map((z) => z.re / x));
  return { contour: { ray: choice.ray, ...(first < Infinity ? { first } : {}) }, lifted: under.length };
}

interface Summed extends LaplaceSum {
  readonly lifted: number;
}

function sumOf(e: Expansion, growth: Growth, c: Candidate, digits: number): Summed | string {
  const placed = place(e, growth, c.singular);
  if (typeof placed === 'string') return placed;
  const { quick } = c;
  const integrand = {
    balls: (s: Complex, prec: number) => [c.value(s, prec)],
    ...(quick === undefined ? {} : { quick: (s: QuickComplex) => [quick(s)] }),
  };
  const found = lateralSums(integrand, placed.contour, digits)?.[0];
  return found === undefined
    ? 'the integral along the ray does not settle: the approximant grows too fast, or a singularity is too near'
    : { ...found, lifted: placed.lifted };
}

/**
 * Outcomes of a family. `build` makes the candidates of an expansion, best first; it is called again with one coefficient
 * fewer for the error.
 */
export function rayFamily(e: Expansion, growth: Growth, request: Request, build: Build): readonly Outcome[] {
  const offers = build(e, familyBits(request.digits));
  const wanted = request.only === undefined ? offers : offers.filter((a) => a.label === request.only);
  if (wanted.length === 0)
    return [refusal(request.only ?? 'approximants', 'not a member of the family', 'choose another')];
  let chosen = false;
  const found = wanted.map(({ make }) => {
    const attempt = make();
    // Beside the family's own choice the others serve its error alone.
    const digits = request.central === true && chosen ? Math.min(ERROR_DIGITS, request.digits) : request.digits;
    const result = standing(e, growth, attempt, digits, request.only !== undefined);
    const aside = chosen;
    chosen ||= typeof result !== 'string';
    return { attempt, result, aside };
  });
  const values = found.map(({ result }) => (typeof result === 'string' ? undefined : result.pv));
  const centre = values.find((v) => v !== undefined);
  const earlier = request.only === undefined && centre !== undefined ? before(e, growth, build, centre) : undefined;
  const errors = combineErrors(e, values, earlier?.value);
  const prec = Math.max(128, request.digits * 4 + 64);
  const outcomes = found.map(({ attempt, result }, i): Outcome => {
    if (typeof result === 'string' || 'reason' in attempt)
      return refusal(attempt.label, typeof result === 'string' ? result : '', REMEDY);
    const value = dressed(e, result.pv, prec);
    const error = request.only === undefined ? errors(i) : {};
    return {
      kind: 'sum',
      variant: attempt.label,
      value,
      imaginary: scaled(e, result.im, prec),
      ...error,
      termsUsed: e.coefficients.length,
      trust: earlier?.confirmed === false ? 'indicative' : trustOf(value, error.truncation),
      digitsTrust: 'converged',
      notes: result.lifted > 0 ? [...attempt.notes, LIFTED] : attempt.notes,
    };
  });
  return request.central === true ? outcomes.filter((_, i) => !found[i]!.aside) : outcomes;
}

/** `trusting`: the member was asked for by name, its doubts are known. */
function standing(e: Expansion, growth: Growth, a: Attempt, digits: number, trusting = false): Summed | string {
  if ('reason' in a) return a.reason;
  return (trusting ? undefined : a.suspicion) ?? sumOf(e, growth, a, digits);
}

/** Relative steps below this are looked at twice: a vanishing coefficient makes two orders agree by accident. */
const SUSPICIOUSLY_SMALL = 1e-12;

interface Before {
  readonly value: Ball;
  /** The order before that agrees as well, or there was no need to ask. */
  readonly confirmed: boolean;
}

/** Principal value of the order before, or of the one before that where it differs more. */
function before(e: Expansion, growth: Growth, build: Build, value: Ball): Before | undefined {
  const fewer = e.coefficients.length - countBefore(e.coefficients);
  const one = valueOf(e, growth, build, fewer);
  if (one === undefined || size(value, one) > SUSPICIOUSLY_SMALL * size(value, R.ZERO))
    return one && { value: one, confirmed: true };
  const two = valueOf(e, growth, build, fewer + 1);
  if (two === undefined) return { value: one, confirmed: false };
  return { value: size(value, two) > size(value, one) ? two : one, confirmed: true };
}

const size = (a: Ball, b: Ball): number => Math.abs(R.toNumber(R.sub(a, b, 128)));

/** Principal value of the first standing candidate with `fewer` coefficients less. */
function valueOf(e: Expansion, growth: Growth, build: Build, fewer: number): Ball | undefined {
  if (e.coefficients.length <= fewer) return undefined;
  const shorter: Expansion = { ...e, coefficients: e.coefficients.slice(0, -fewer) };
  for (const { make } of build(shorter, familyBits(ERROR_DIGITS))) {
    const result = standing(shorter, growth, make(), ERROR_DIGITS);
    if (typeof result !== 'string') return result.pv;
  }
  return undefined;
}

/** Distance of the nearest singularity, stated or found; undefined when neither. */
export function nearestDistance(
  e: Expansion,
  found: { readonly t: { readonly value: number } } | undefined,
): number | undefined {
  const stated = e.stated[0];
  if (stated !== undefined) return Math.abs(R.toNumber(stated.t.ball(64)));
  return found === undefined ? undefined : Math.abs(found.t.value);
}
