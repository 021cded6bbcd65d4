/**
 * @module Principle of minimal sensitivity.
 *
 * Members: the optimum at next-to-leading order (scale) and at next-to-next-to-leading order (scale and c_2), each with the
 * beta function to the same order, and every stationary point in the scale alone of the whole truncated series for
 * μ/Q in [1/e, e]. Where there is none, none is invented.
 * Truncation error: optimum: the step from the order before; scale alone: the last term there.
 * Reference: P. M. Stevenson, Phys. Rev. D 23 (1981) 2916 (from memory, re-derived).
 */
import { R, toNumberExact } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';
import type { Expansion, Running } from '../series/index.js';
import { inputObjection, trustOf } from './eligibility.js';
import { chargeCoefficients, effectiveCharge } from './effective-charge.js';
import { nloOptimum, nnloOptimum } from './pms-optimum.js';
import type { Charge, Optimum } from './pms-optimum.js';
import { stationaryPoints } from './pms-scale.js';
import type { Outcome, Prescription, Request } from './prescription.js';
import { dressed, refusal, toDigits } from './prescription.js';
import { atScale, currentLog, scaleObjection } from './scale-choice.js';

/** Digits of the evaluations that only serve the error. */
const ERROR_DIGITS = 12;
/** Start of the search for c_2: this multiple of the invariant ρ_2 (Stevenson's own approximation). */
const C2_START = 1.5;

/** The charge's data at a precision, with r_1 … r_{terms−1} and as many c_k. */
function chargeAt(e: Expansion, running: Running, terms: number, prec: number): Charge {
  const b = running.beta.slice(0, terms).map((x) => x.ball(prec));
  const r = chargeCoefficients(e)
    .slice(1, terms)
    .map((x) => x.ball(prec));
  return { b0: b[0]!, c: b.slice(1).map((x) => R.div(x, b[0]!, prec)), r, x: e.x.ball(prec) };
}

function optimum(e: Expansion, running: Running, terms: 2 | 3, digits: number): Optimum | undefined {
  const rough = chargeAt(e, running, terms, 160);
  const charge = effectiveCharge(running.beta, chargeCoefficients(e).slice(0, terms), e.x, terms, 80);
  const start = charge === undefined ? toNumberExact(e.x) : R.toNumber(charge);
  const [c1, r1, r2] = [rough.c[0], rough.r[0], rough.r[1]].map((b) => (b === undefined ? 0 : R.toNumber(b)));
  const c2 = rough.c[1] === undefined ? 0 : R.toNumber(rough.c[1]);
  const rho2 = r2! + c2 - c1! * r1! - r1! * r1!;
  return toDigits(
    digits,
    (prec) => {
      const q = chargeAt(e, running, terms, prec + 40);
      return terms === 2 ? nloOptimum(q, start, prec + 40) : nnloOptimum(q, [start, C2_START * rho2], prec + 40);
    },
    (o) => o?.value ?? R.ZERO,
  );
}

/** Value of R at an optimum. */
function ofCharge(e: Expansion, D: Ball, prec: number): Ball {
  return dressed({ ...e, x: { ball: () => D } }, e.coefficients[0]!.ball(prec), prec);
}

const distance = (a: Ball, b: Ball): number => Math.abs(R.toNumber(R.sub(a, b, 160)));

function optimumMember(e: Expansion, running: Running, terms: 2 | 3, request: Request): Outcome {
  const variant = terms === 2 ? 'optimum, next-to-leading order' : 'optimum, next-to-next-to-leading order';
  if (running.beta.length < terms)
    return refusal(
      variant,
      `the beta function is known to ${running.beta.length} loops only`,
      'use fewer terms (--order)',
    );
  const found = optimum(e, running, terms, request.digits);
  if (found === undefined) return refusal(variant, 'no stationary point is found', 'use the effective charge (fac)');
  const prec = Math.max(128, request.digits * 4 + 64);
  const value = ofCharge(e, found.value, prec);
  const before =
    request.only !== undefined ? undefined : terms === 2 ? ofCharge(e, e.x.ball(prec), prec) : optimumValue(e, running);
  const truncation = before === undefined ? undefined : distance(value, before);
  return {
    kind: 'sum',
    variant,
    value,
    ...(truncation === undefined ? {} : { truncation }),
    termsUsed: terms,
    trust: trustOf(value, truncation),
    digitsTrust: 'converged',
    notes: [`optimised coupling ${R.toNumber(found.a).toPrecision(6)}, r₁ = ${R.toNumber(found.r[0]!).toPrecision(4)}`],
  };
}

function optimumValue(e: Expansion, running: Running): Ball | undefined {
  const found = optimum(e, running, 2, ERROR_DIGITS);
  return found === undefined ? undefined : ofCharge(e, found.value, 160);
}

/** Stationary points in the scale alone, all terms. */
function scaleMembers(e: Expansion, running: Running, request: Request): Outcome[] {
  const N = e.coefficients.length;
  const centre = R.toNumber(currentLog(running, 80));
  const prec = Math.ceil(request.digits * 3.33) + 40;
  const points = stationaryPoints(e, running, centre, N, prec);
  if (points.length === 0) {
    return [
      refusal(
        `scale alone, ${N} terms`,
        'no stationary point for μ/Q between 1/e and e',
        'read the optimum over scale and scheme, or the effective charge (fac)',
      ),
    ];
  }
  return points.map((p, i): Outcome => {
    const variant = `scale alone, ${N} terms${points.length > 1 ? `, point ${i + 1}` : ''}`;
    const ratio = Math.exp((R.toNumber(p.shift) + centre) / 2);
    const value = R.add(e.additive.ball(prec), R.mul(e.factor.ball(prec), p.value, prec), prec);
    const truncation = request.only === undefined ? lastTermAt(e, running, p.shift) : undefined;
    return {
      kind: 'sum',
      variant,
      value,
      ...(truncation === undefined ? {} : { truncation }),
      termsUsed: N,
      trust: trustOf(value, truncation),
      digitsTrust: 'converged',
      notes: [`μ/Q = ${ratio.toPrecision(6)}`],
    };
  });
}

function lastTermAt(e: Expansion, running: Running, shift: Ball): number | undefined {
  const found = atScale(e, running, { ball: () => shift }, 128);
  return found === undefined ? undefined : distance(found.value, found.shorter);
}

export const pms: Prescription = {
  name: 'pms',
  title: 'principle of minimal sensitivity',
  summary: "Stevenson's optimum at NLO and NNLO, and stationary points in the scale alone",
  family: 'scale',
  apply(e, growth, request): readonly Outcome[] {
    const variant = 'optimum';
    const no = scaleObjection(e, variant, 2) ?? inputObjection(e, growth, variant, 2);
    if (no !== undefined) return [no];
    const running = e.running!;
    const N = e.coefficients.length;
    const orders: readonly (2 | 3)[] = N >= 3 ? [3, 2] : [2];
    const optima =
      e.power === 1
        ? orders.map((terms) => optimumMember(e, running, terms, request))
        : [
            refusal(
              variant,
              `the series starts at power ${e.power}: its root and itself have different optima`,
              'use fac, or the scale alone',
            ),
          ];
    const all = [...optima, ...scaleMembers(e, running, request)];
    if (request.only !== undefined) return all.filter((o) => o.variant === request.only);
    const best = all.find((o) => o.kind === 'sum');
    return all.map((o) => (o === best ? { ...o, central: true } : o));
  },
};
