/**
 * @module Partial Borel–Padé: stated singularities factored out, the rest by rational approximants.
 *
 * P = B Π (1 − t/t_i)^{γ_i} over the nearest stated singularity on each axis side and every stated pole; [L/M] of P near the
 * diagonal; B = Π (1 − t/t_i)^{−γ_i} [L/M]_P along a rotated ray. Truncation error: neighbours and order before.
 * Reference: D. Boito, P. Masjuan, F. Oliani, arXiv:1807.01567 (memory).
 */
import { C, DoubleDouble, signExact, toNumberExact } from '../numerics/index.js';
import type { Complex } from '../numerics/index.js';
import {
  approximateTransformed,
  borelTransform,
  factorQuick,
  factorValue,
  nearDiagonal,
  padeOf,
  rationalQuick,
  rationalValue,
  withoutFactors,
} from '../borel/index.js';
import type { KnownFactor, Lossy, QuickComplex, RatedPole } from '../borel/index.js';
import type { Growth } from '../growth/index.js';
import type { Expansion } from '../series/index.js';
import { cleanPart, growthObjection, inputObjection } from './eligibility.js';
import type { Outcome, Prescription } from './prescription.js';
import { refusal } from './prescription.js';
import type { Attempt, Offer } from './ray-family.js';
import { nearestDistance, rayFamily } from './ray-family.js';

/** Most coefficients used. Heuristic: cost. */
const MOST = 60;
/** From this many coefficients on only the entries next to the diagonal are evaluated. */
const LONG = 30;
/** A pole nearer than this fraction of the nearest known singularity is where none may be. Heuristic. */
const INSIDE = 0.7;
/** Bits with which poles are located: they only steer the contour. */
const POLE_BITS = 64;

/** Stated singularities to factor out: nearest on each side, and every pole. */
export function knownFactors(e: Expansion): readonly KnownFactor[] {
  const seen = new Set<number>();
  return e.stated.flatMap((s) => {
    if (s.exponent === undefined) return [];
    const side = signExact(s.t);
    const isPole = s.exponent.rational?.isInteger() === true && signExact(s.exponent) > 0;
    const first = !seen.has(side);
    seen.add(side);
    return first || isPole ? [{ t: s.t, exponent: s.exponent }] : [];
  });
}

/** Poles of the rest nearer to the origin than this are where none may be; undefined when no position is known. */
export function innermostRest(e: Expansion, growth: Growth): number | undefined {
  const nearest = nearestDistance(e, growth.nearest);
  return nearest === undefined ? undefined : INSIDE * nearest;
}

function suspicion(e: Expansion, growth: Growth, poles: readonly RatedPole[]): string | undefined {
  const innermost = innermostRest(e, growth);
  const inside =
    innermost === undefined ? undefined : poles.find((p) => p.role !== 'noise doublet' && p.modulus < innermost);
  return inside === undefined
    ? undefined
    : `a pole at |t| = ${inside.modulus.toPrecision(3)} lies where no singularity is expected`;
}

/** f with its last values by argument kept: every entry has the same factor, and the ray hands out the same points. */
function remembered<S extends object, T>(f: (s: S) => T): (s: S) => T {
  const memory = new WeakMap<S, T>();
  return (s) => {
    const known = memory.get(s);
    if (known !== undefined) return known;
    const value = f(s);
    memory.set(s, value);
    return value;
  };
}

const Z = DoubleDouble.complex;

/** Product of two values, with what both have lost. */
const product = (a: Lossy, b: Lossy): Lossy => ({ value: Z.mul(a.value, b.value), lost: a.lost + b.lost });

function build(e: Expansion, growth: Growth, factors: readonly KnownFactor[], bits: number): readonly Offer[] {
  const rest = withoutFactors(borelTransform(e.coefficients), factors);
  const x = e.x.ball(bits);
  const factorAt = new Map<number, (s: Complex) => Complex>();
  const factor = (prec: number): ((s: Complex) => Complex) => {
    const made =
      factorAt.get(prec) ?? remembered((s: Complex) => factorValue(factors, C.mulReal(s, e.x.ball(prec), prec), prec));
    factorAt.set(prec, made);
    return made;
  };
  const quickFactor = factorQuick(factors, x, bits);
  const quickAt = quickFactor && remembered((s: QuickComplex) => quickFactor(s));
  const N = rest.length;
  return nearDiagonal(N - 1, N > LONG ? 1 : 2).map(([L, M]): Offer => {
    const label = `[${L}/${M}]`;
    const make = (): Attempt => {
      const poles = approximateTransformed(rest, L, M, POLE_BITS, Math.max(0, ...e.relativeErrors));
      if (poles.exists !== true) return { label, reason: poles.reason ?? 'the entry does not exist' };
      const entry = padeOf(rest, L, M, bits + PADE_LOSS * M);
      if (entry.exists !== true) return { label, reason: entry.reason };
      const doubt = suspicion(e, growth, poles.poles);
      const quickRest = rationalQuick(entry.numerator, entry.denominator, x, bits);
      return {
        label,
        singular: [...poles.poles.map((p) => p.z), ...factors.map((f) => C.fromReal(f.t.ball(POLE_BITS)))],
        value: (s, prec) => {
          const t = C.mulReal(s, e.x.ball(prec), prec);
          return C.mul(factor(prec)(s), rationalValue(entry.numerator, entry.denominator, t, prec), prec);
        },
        ...(quickAt === undefined || quickRest === undefined
          ? {}
          : { quick: (s: QuickComplex) => product(quickAt(s), quickRest(s)) }),
        notes: poles.deficiency > 0 ? ['degenerate block: exact as far as the coefficients show'] : [],
        ...(doubt === undefined ? {} : { suspicion: doubt }),
      };
    };
    return { label, make };
  });
}

/** Bits that a ball-valued Padé denominator of order M may lose. Heuristic. */
const PADE_LOSS = 13;

export const borelPartialPade: Prescription = {
  name: 'borel-partial-pade',
  title: 'partial Borel–Padé',
  summary: 'stated singularities factored out of the Borel transform, the rest by Padé; summed along a rotated ray',
  family: 'borel',
  apply(full, growth, request): readonly Outcome[] {
    const e = cleanPart(full, growth, MOST);
    const factors = knownFactors(e);
    const no = growthObjection(growth, 'near-diagonal') ?? inputObjection(e, growth, 'near-diagonal', 2);
    if (no !== undefined) return [no];
    if (factors.length === 0)
      return [
        refusal(
          'near-diagonal',
          'no singularity with position and exponent is stated',
          'state it in the series file (singularities), or use borel-dlog',
        ),
      ];
    const places = factors.map((f) => toNumberExact(f.t).toPrecision(4)).join(', ');
    const outcomes = rayFamily(e, growth, request, (short, bits) => build(short, growth, factors, bits));
    return outcomes.map((o) => (o.kind === 'sum' ? { ...o, notes: [`factored out: t = ${places}`, ...o.notes] } : o));
  },
};
