/**
 * @module Fixed-order and contour-improved sums with the gluon condensate's renormalon subtracted. Truncation error: the last
 * subtracted term and the error of N_g, in quadrature.
 */
import { exact, exactReal, log, R, Rational, toNumberExact } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import type { Refusal } from '../qcd/index.js';
import { refuse } from '../qcd/index.js';
import { bitsFor, lastSize, refused, size, sum } from './answers.js';
import type { ContourAnswer, ContourQuantity, ContourRequest } from './answers.js';
import { contourIntegrals, improvedTerms } from './improved.js';
import { gluonSingularity, PUBLISHED_NORM, strengthOf } from './normalisation.js';
import type { Norm } from './normalisation.js';
import { subtractedSeries } from './subtracted.js';
import type { SubtractedSeries } from './subtracted.js';

/** R/√s_0 of the subtraction unless another one is asked for; within the range where its logarithm is of order one. */
export const USUAL_RATIO = Rational.of(4, 5);

/** Beyond so many coefficients the re-expansions take long, and the published norm says nothing about them. */
export const MOST_SUBTRACTED = 24;

export interface SubtractedTerms {
  readonly fixedOrder: readonly Ball[];
  readonly improved: readonly Ball[];
  readonly parts: SubtractedSeries;
}

/** Why the scheme does not apply to a quantity, if so. */
export function subtractionObjection(e: ContourQuantity): Refusal | undefined {
  const { contour: origin } = e;
  if (gluonSingularity(origin) === undefined)
    return refuse(
      'no singularity of dimension 4 with a known exponent is stated for D',
      'state it in the series file: { dimension: 4, kind: infrared }',
    );
  if (origin.power !== 1)
    return refuse(
      `D starts at the power ${origin.power} of the coupling, the subtraction at the first`,
      'use it for a D of first power 1',
    );
  if (origin.coefficients.length > MOST_SUBTRACTED)
    return refuse(
      `${origin.coefficients.length} coefficients: the subtraction is made for at most ${MOST_SUBTRACTED}`,
      'use fewer (--order)',
    );
  return undefined;
}

/** Terms of both series, subtracted; the same factor and power as the terms of the plain ones. `known` are the A_n. */
export function subtractedTerms(
  e: ContourQuantity,
  norm: Norm,
  ratio: Rational,
  digits: number,
  known?: readonly Ball[],
): SubtractedTerms | Refusal {
  const { contour: origin, x } = e;
  const mu = e.running?.scaleRatio ?? exact(1);
  const ratioSquared = ratio.mul(ratio);
  const logR: Exact = exactReal((prec) =>
    R.mul2exp(log(R.div(R.fromRational(ratio, prec + 8), mu.ball(prec + 8), prec + 8), prec + 8), 1),
  );
  const parts = subtractedSeries(
    origin,
    x,
    { strength: strengthOf(norm), ratioSquared, log: logR, wilson: gluonSingularity(origin)?.wilson ?? [] },
    digits,
  );
  if ('reason' in parts) return parts;
  const integrals = known ?? contourIntegrals(origin, x, digits);
  if ('reason' in integrals) return integrals;
  const prec = bitsFor(digits);
  const improved = improvedTerms(origin, integrals, prec);
  // Leading zeros of the moment were taken off the front of the expansion.
  const zeros = e.power - origin.power;
  const base = x.ball(prec);
  const own = origin.coefficients.map((_, n) => {
    const c = n < zeros ? undefined : e.coefficients[n - zeros];
    return c === undefined ? R.ZERO : R.mul(c.ball(prec), R.powInt(base, n + origin.power, prec), prec);
  });
  return {
    fixedOrder: own.map((t, n) => R.sub(t, parts.fixedOrder[n]!, prec)),
    improved: improved.map((t, n) => R.sub(t, parts.improved[n]!, prec)),
    parts,
  };
}

const NAMES = ['fixed order', 'contour improved'] as const;

export function subtractedAnswers(e: ContourQuantity, request: ContourRequest): readonly ContourAnswer[] {
  const objection = subtractionObjection(e);
  const wanted = NAMES.filter((name) => request.only === undefined || request.only === name);
  if (objection !== undefined) return wanted.map((name) => refused(name, objection));
  const norm = PUBLISHED_NORM;
  const found = subtractedTerms(e, norm, USUAL_RATIO, request.digits);
  if ('reason' in found) return wanted.map((name) => refused(name, found));
  const prec = bitsFor(request.digits);
  const share = norm.error / toNumberExact(norm.value);
  return wanted.map((name): ContourAnswer => {
    const terms = name === 'fixed order' ? found.fixedOrder : found.improved;
    const taken = name === 'fixed order' ? found.parts.fixedOrder : found.parts.improved;
    // What the norm multiplies: everything taken out, and what is added back.
    const moved = size(R.sub(found.parts.addedBack, sum(taken, prec), prec)) * share;
    return {
      kind: 'sum',
      variant: name,
      value: R.add(sum(terms, prec), found.parts.addedBack, prec),
      truncation: Math.hypot(lastSize(terms), moved),
      termsUsed: terms.length,
      notes: [
        `${norm.origin}, subtracted at R = ${USUAL_RATIO.toNumber()} √s_0 and added back as a principal value`,
        `the error of N_g alone moves this sum by ${moved.toPrecision(2)}`,
      ],
      ...(name === 'fixed order' || request.only !== undefined ? { central: true } : {}),
    };
  });
}
