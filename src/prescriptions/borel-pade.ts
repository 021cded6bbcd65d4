/**
 * @module Borel–Padé and Borel–Leroy–Padé: principal value and lateral sums of rational approximants, in closed form.
 *
 * Plain: [L/M] of B(t) = Σ c_n t^n/n!. Leroy: of B_b(t) = Σ c_n t^n/(1+b)_n with b = γ − 1 of the leading singularity, which
 * turns its branch point into a pole. Truncation error: see neighbours.ts.
 * An approximant is set aside when a pole–zero doublet lies inside the circle of the nearest singularity, or when a pole
 * lies where none may be; near-axis pairs that the terms do not confirm are lifted over (rational-sum.ts).
 * References: G. A. Baker, P. Graves-Morris (1996) (memory); Leroy weight: see M. Beneke,
 * Phys. Rept. 317 (1999) 1 (memory).
 */
import { R, Rational, toNumberExact } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';
import type { Approximant, RationalSum } from '../borel/index.js';
import { approximate, nearDiagonal, rationalSum } from '../borel/index.js';
import type { Growth } from '../growth/index.js';
import type { Expansion } from '../series/index.js';
import { climb, placeOf } from './climb.js';
import { pairConfirmed } from './eligibility.js';
import { combineErrors, countBefore, withTrust } from './neighbours.js';
import type { Outcome, Prescription, Request, Sum } from './prescription.js';
import { dressed, refusal, scaled, toDigits } from './prescription.js';

/** A pole closer to the origin than this fraction of the nearest stated singularity is where none may be. Heuristic. */
const INSIDE = 0.7;
/** A position found in the terms says where poles may not be only when its relative error is below this. Heuristic. */
const SHARP = 0.2;
/** Most coefficients used at ordinary digits; more cost time and bring digits nobody asked for. Heuristic. */
const MOST = 120;
/** Above this many coefficients only the entries next to the diagonal are evaluated. */
const LONG = 20;

interface Entry {
  readonly label: string;
  readonly approximant: Approximant;
  readonly sum: RationalSum;
  readonly lift: boolean;
  readonly pv: Ball;
  readonly im: Ball;
  readonly suspicion?: string;
}

/** Leroy parameter of the leading singularity: stated, or found with a small error; undefined when neither. */
export function leroyParameter(e: Expansion, growth: Growth): Rational | undefined {
  const stated = e.stated[0]?.exponent;
  if (stated !== undefined)
    return stated.rational?.sub(Rational.ONE) ?? Rational.of(Math.round((toNumberExact(stated) - 1) * 1e6), 1_000_000);
  const found = growth.nearest?.exponent;
  if (found === undefined || !(found.error < 0.1)) return undefined;
  // A found exponent is a decimal with an error: a short fraction inside the error serves as well.
  for (let q = 1; q <= 12; q++) {
    const p = Math.round((found.value - 1) * q);
    if (Math.abs(p / q - (found.value - 1)) <= Math.max(found.error, 1e-9)) return Rational.of(p, q);
  }
  return Rational.of(Math.round((found.value - 1) * 1e4), 10_000);
}

/** Why no Borel–Padé sum may be given, if so. */
function objection(e: Expansion, growth: Growth): { reason: string; remedy: string } | undefined {
  const N = e.coefficients.length;
  const code = (c: string): boolean => growth.flags.some((f) => f.code === c);
  if (growth.verdict === 'terminating' || growth.verdict === 'convergent' || growth.verdict === 'geometric')
    return { reason: `the growth is ${growth.verdict}: nothing to resum`, remedy: 'use the fixed-order sum' };
  if (growth.verdict === 'superfactorial')
    return {
      reason:
        growth.order === 2
          ? 'growth like (2n)!: the order-1 Borel transform has zero radius of convergence'
          : 'growth faster than any (kn)!: no Borel method of finite order applies',
      remedy:
        growth.order === 2
          ? 'use the order-2 transform (borel-pade-2)'
          : 'none of the methods here sums it; the sum may not be unique',
    };
  if (code('errors-exceed-values'))
    return {
      reason: 'coefficient errors exceed the coefficients',
      remedy: 'give coefficients with smaller errors, or fewer of them (--order)',
    };
  if (N < 3)
    return {
      reason: `${N} coefficient${N === 1 ? '' : 's'}: a rational approximant needs three`,
      remedy: 'give more coefficients',
    };
  return undefined;
}

function evaluateEntry(
  e: Expansion,
  growth: Growth,
  b: Rational,
  L: number,
  M: number,
  digits: number,
): Entry | string {
  let failure: string | undefined;
  const result = toDigits(
    digits,
    (prec): { approximant: Approximant; sum: RationalSum } | undefined => {
      const approximant = approximate(e.coefficients, b, L, M, prec, noiseOf(e));
      if (approximant.exists !== true) {
        failure = approximant.reason ?? 'the entry does not exist';
        return undefined;
      }
      return { approximant, sum: rationalSum(approximant, e.x.ball(prec), b, prec) };
    },
    (r) => r?.sum.straight.pv ?? R.ZERO,
  );
  if (result === undefined) return failure ?? 'the entry does not exist';
  const { approximant, sum } = result;
  if (!(sum.straight.pv.rad < Infinity)) return 'the closed-form sum could not be enclosed';
  const lifted = pairConfirmed(growth) || approximant.deficiency > 0 ? undefined : sum.lifted;
  const lift = lifted !== undefined;
  const used = lifted ?? sum.straight;
  const reason = suspicion(e, growth, approximant);
  return {
    label: `[${L}/${M}]`,
    approximant,
    sum,
    lift,
    pv: used.pv,
    im: used.im,
    ...(reason === undefined ? {} : { suspicion: reason }),
  };
}

/** Relative noise of the coefficients: the largest quoted or implied error. */
export const noiseOf = (e: Expansion): number => Math.max(0, ...e.relativeErrors);

/** Poles nearer to the origin than this are where none may be; undefined when no position is known well enough. */
export function innermostPole(e: Expansion, growth: Growth): number | undefined {
  const found = growth.nearest;
  const sharp = found !== undefined && found.t.error < SHARP * Math.abs(found.t.value);
  const nearest =
    e.stated[0] !== undefined ? Math.abs(toNumberExact(e.stated[0].t)) : sharp ? Math.abs(found.t.value) : undefined;
  return nearest === undefined ? undefined : INSIDE * nearest;
}

function suspicion(e: Expansion, growth: Growth, a: Approximant): string | undefined {
  const innermost = innermostPole(e, growth);
  if (innermost === undefined) return undefined;
  for (const p of a.poles) {
    if (p.role === 'noise doublet') continue;
    if (p.modulus < innermost)
      return p.role === 'doublet'
        ? `a pole–zero doublet at |t| = ${p.modulus.toPrecision(3)} lies inside the circle of the nearest singularity`
        : `a pole at |t| = ${p.modulus.toPrecision(3)} lies where no singularity is expected`;
  }
  return undefined;
}

function toSum(e: Expansion, entry: Entry, b: Rational, digits: number, termsUsed: number): Sum {
  const prec = Math.max(128, digits * 4 + 64);
  const notes: string[] = [];
  if (entry.sum.lifted !== undefined) {
    const other = entry.lift ? entry.sum.straight : entry.sum.lifted;
    const otherValue = R.toNumber(dressed(e, other.pv, prec)).toPrecision(6);
    notes.push(
      entry.lift
        ? `a complex pair near the positive axis is lifted over; straight contour: ${otherValue}`
        : `a complex pair near the positive axis is confirmed by the terms; lifted over it the value would be ${otherValue}`,
    );
  }
  if (entry.approximant.deficiency > 0)
    notes.push(`degenerate block: the transform is rational as far as the ${termsUsed} coefficients used show`);
  if (entry.approximant.poles.some((p) => p.role === 'noise doublet'))
    notes.push('pole–zero doublets at the level of the coefficient noise are left out');
  if (entry.suspicion !== undefined) notes.push(entry.suspicion);
  return {
    kind: 'sum',
    variant: b.isZero() ? entry.label : `${entry.label}, b = ${b.toString()}`,
    value: dressed(e, entry.pv, prec),
    imaginary: scaled(e, entry.im, prec),
    termsUsed,
    trust: 'indicative',
    notes,
  };
}

/** The family's outcomes from as many coefficients as the digits asked need. */
function table(e: Expansion, growth: Growth, b: Rational, request: Request): readonly Outcome[] {
  const usable = Math.min(e.coefficients.length, growth.usableCoefficients ?? MOST, MOST);
  if (usable < 3)
    return [
      refusal('near-diagonal', `only ${usable} coefficients are above the noise`, 'give more precise coefficients'),
    ];
  if (request.only !== undefined) {
    const place = placeOf(request.only);
    const entry =
      place === undefined
        ? 'not an entry of the table'
        : evaluateEntry(e, growth, b, place[0], place[1], request.digits);
    if (typeof entry === 'string') return [refusal(request.only, entry, 'choose another entry')];
    return [toSum(e, entry, b, request.digits, place![0] + place![1] + 1)];
  }
  return climb(usable, request.digits, (count) =>
    tableOf({ ...e, coefficients: e.coefficients.slice(0, count) }, growth, b, request.digits),
  );
}

/** All near-diagonal entries from the coefficients of e. */
function tableOf(e: Expansion, growth: Growth, b: Rational, digits: number): Outcome[] {
  const count = e.coefficients.length;
  const name = (label: string): string => (b.isZero() ? label : `${label}, b = ${b.toString()}`);
  const evaluate = ([L, M]: [number, number]): { label: string; entry: Entry | string } => ({
    label: `[${L}/${M}]`,
    entry: evaluateEntry(e, growth, b, L, M, digits),
  });
  // Trusted entries first, so that the central one is trusted when any is.
  const ranked = nearDiagonal(count - 1, count > LONG ? 1 : 2)
    .map(evaluate)
    .sort((p, q) => rank(p.entry) - rank(q.entry));
  const before = nearDiagonal(countBefore(e.coefficients) - 1, 1)
    .map((place) => evaluate(place).entry)
    .sort((p, q) => rank(p) - rank(q))
    .find((p): p is Entry => typeof p !== 'string');
  const errors = combineErrors(
    e,
    ranked.map(({ entry }) => (typeof entry === 'string' || entry.suspicion !== undefined ? undefined : entry.pv)),
    before?.pv,
  );
  return ranked.map(({ label, entry }, i): Outcome => {
    if (typeof entry === 'string') return refusal(name(label), entry, 'read the neighbouring entries');
    if (entry.suspicion !== undefined) return refusal(name(label), entry.suspicion, 'read the neighbouring entries');
    return withTrust({ ...toSum(e, entry, b, digits, count), ...errors(i) });
  });
}

const rank = (entry: Entry | string): number => (typeof entry === 'string' ? 2 : entry.suspicion !== undefined ? 1 : 0);

export const borelPade: Prescription = {
  name: 'borel-pade',
  title: 'Borel–Padé',
  summary: 'rational approximants of the Borel transform, principal value and lateral sums in closed form',
  family: 'borel',
  apply(e, growth, request) {
    const no = objection(e, growth);
    return no === undefined
      ? table(e, growth, Rational.ZERO, request)
      : [refusal('near-diagonal', no.reason, no.remedy)];
  },
};

export const borelLeroyPade: Prescription = {
  name: 'borel-leroy-pade',
  title: 'Borel–Leroy–Padé',
  summary: 'the same with the Leroy weight that turns the leading branch point into a pole',
  family: 'borel',
  apply(e, growth, request) {
    const no = objection(e, growth);
    if (no !== undefined) return [refusal('near-diagonal', no.reason, no.remedy)];
    const b = leroyParameter(e, growth);
    if (b === undefined)
      return [
        refusal(
          'near-diagonal',
          'the exponent of the leading singularity is not known',
          'state it in the series file (singularities: exponent)',
        ),
      ];
    if (b.cmp(Rational.of(-1)) <= 0)
      return [
        refusal(
          'near-diagonal',
          `the exponent asks for b = ${b.toString()}, and the weight t^b needs b > -1`,
          'use the plain transform',
        ),
      ];
    if (b.isZero())
      return [refusal('near-diagonal', 'the leading exponent is 1: b = 0 is the plain transform', 'see Borel–Padé')];
    return table(e, growth, b, request);
  },
};
