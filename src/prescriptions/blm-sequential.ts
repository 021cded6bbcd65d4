/**
 * @module The scale of BLM one order further: every n_f of c_1 and c_2 taken as part of the running.
 *
 * With c_0 = 1, b_k of dx/d ln μ² = −Σ b_k x^{k+2} and everything a polynomial in b_0,
 *   c_1 = r_20 + b_0 r_21,    c_2 = r_30 + b_1 r_21 + 2 b_0 r_31 + b_0² r_32,
 * the scale ln(μ*²/μ²) = T_0 + T_1 x*,  T_0 = −r_21,  T_1 = b_0 (r_21² − r_32) + 2 (r_20 r_21 − r_31), leaves x* + r_20 x*² + r_30 x*³.
 * Assumption: n_f enters through the running alone. Light-quark loops that do not belong to it (light by light) break it, and
 *             a decomposition that is known otherwise may differ: n_f alone does not tell.
 * Reference: S. V. Mikhailov, hep-ph/0411397; S. J. Brodsky, X.-G. Wu, Phys. Rev. D 85 (2012) 034038, arXiv:1111.6175 (memory); T_0 and
 * T_1 re-derived.
 */
import {
  addExact,
  divExact,
  exact,
  isZeroExact,
  mulExact,
  R,
  Rational,
  subExact,
  toNumberExact,
} from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import type { Expansion, Running } from '../series/index.js';
import { trustOf } from './eligibility.js';
import { betaUnit } from './flavour-polynomials.js';
import type { Outcome, Request, Sum } from './prescription.js';
import { dressed, refusal } from './prescription.js';
import { betaFunction, runner } from './running-coupling.js';
import { ratioAt } from './scale-choice.js';

const q = (n: number, d = 1): Exact => exact(Rational.of(n, d));
const times = (...list: readonly Exact[]): Exact => list.reduce((a, b) => mulExact(a, b));

export interface BetaParts {
  readonly r20: Exact;
  readonly r21: Exact;
  readonly r30: Exact;
  readonly r31: Exact;
  readonly r32: Exact;
}

/** r_ij from c_1/c_0 and c_2/c_0 as polynomials in n_f, ascending; `unit` is b_0/(11 − 2n_f/3). */
export function betaParts(first: readonly Exact[], second: readonly Exact[], unit: Exact): BetaParts {
  const [A = q(0), B = q(0)] = first;
  const [a = q(0), b = q(0), c = q(0)] = second;
  // n_f = 33/2 − 3β_0/2 and β_1 = 102 − 38 n_f/3 = −107 + 19 β_0.
  const r21 = divExact(times(q(-3, 2), B), unit);
  const e0 = addExact(a, addExact(times(q(33, 2), b), times(q(1089, 4), c)));
  const e1 = addExact(times(q(-3, 2), b), times(q(-99, 2), c));
  const e2 = times(q(9, 4), c);
  const square = mulExact(unit, unit);
  return {
    r20: addExact(A, times(q(33, 2), B)),
    r21,
    r30: addExact(e0, times(q(107), square, r21)),
    r31: divExact(subExact(e1, times(q(19), square, r21)), times(q(2), unit)),
    r32: divExact(e2, square),
  };
}

/** T_0 and T_1. */
export function scaleTerms(r: BetaParts, b0: Exact): readonly [Exact, Exact] {
  const first = mulExact(b0, subExact(mulExact(r.r21, r.r21), r.r32));
  const second = times(q(2), subExact(mulExact(r.r20, r.r21), r.r31));
  return [times(q(-1), r.r21), addExact(first, second)];
}

const MOST_STEPS = 200;

/** x* with x* = x(μ²e^{T_0 + T_1 x*}); undefined at the Landau pole, or where the iteration does not settle. */
function ownScale(e: Expansion, running: Running, T: readonly [Exact, Exact], prec: number): Ball | undefined {
  const work = prec + 32;
  const beta = betaFunction(
    running.beta.map((b) => b.ball(work)),
    work,
  );
  const run = runner(beta, e.x.ball(work), work);
  const [T0, T1] = [T[0].ball(work), T[1].ball(work)];
  let x: Ball = R.exactMid(e.x.ball(work));
  for (let step = 0; step < MOST_STEPS; step++) {
    const next = run(R.add(T0, R.mul(T1, x, work), work));
    if (next === undefined) return undefined;
    const moved = R.upperBits(R.exactMid(R.sub(next, x, work)));
    if (moved < R.upperBits(next) - prec) return R.addError(next, 1, moved + 8);
    x = R.exactMid(next);
  }
  return undefined;
}

/** The member; nothing where c_2 is missing or the power is not one. */
export function sequentialMember(e: Expansion, running: Running, request: Request): Outcome | undefined {
  const polynomials = running.flavourPolynomials?.();
  const [zeroth, first, second] = polynomials ?? [];
  const unit = betaUnit(running);
  const c0 = e.coefficients[0]!;
  const b0 = running.beta[0];
  if (e.power !== 1 || e.coefficients.length < 3 || unit === undefined || b0 === undefined) return undefined;
  if (zeroth === undefined || first === undefined || second === undefined) return undefined;
  if (running.beta.length < 2 || zeroth.slice(1).some((c) => !isZeroExact(c))) return undefined;
  const variant = 'scale of all n_f through the next order, 3 terms';
  const over = (list: readonly Exact[]): Exact[] => list.map((c) => divExact(c, c0));
  const r = betaParts(over(first), over(second), unit);
  const T = scaleTerms(r, b0);
  const prec = Math.max(128, request.digits * 4 + 64);
  const x = ownScale(e, running, T, prec);
  if (x === undefined)
    return refusal(variant, 'the scale lies below the Landau pole, or does not settle', 'use fac, or the first order');
  const at = { ...e, x: { ball: () => x } };
  const terms = [c0, mulExact(c0, r.r20), mulExact(c0, r.r30)].map((c, n) =>
    R.mul(c.ball(prec), R.powInt(x, n, prec), prec),
  );
  const value = dressed(
    at,
    terms.reduce((sum, t) => R.add(sum, t, prec), R.ZERO),
    prec,
  );
  const shorter = dressed(
    at,
    terms.slice(0, -1).reduce((sum, t) => R.add(sum, t, prec), R.ZERO),
    prec,
  );
  const truncation = request.only === undefined ? Math.abs(R.toNumber(R.sub(value, shorter, 160))) : undefined;
  const shift = { ball: (p: number) => R.add(T[0].ball(p), R.mul(T[1].ball(p), x, p), p) };
  const result: Sum = {
    kind: 'sum',
    variant,
    value,
    ...(truncation === undefined ? {} : { truncation }),
    termsUsed: 3,
    trust: trustOf(value, truncation),
    digitsTrust: 'converged',
    notes: [
      'all n_f of the coefficients taken as running: n_f alone does not tell',
      `μ/Q = ${ratioAt(running, shift).toPrecision(6)}; coefficients there over the first: ${[r.r20, r.r30].map((c) => toNumberExact(c).toPrecision(5)).join(', ')}`,
    ],
  };
  return result;
}
