/**
 * @module The normalisation of the gluon condensate's renormalon.
 *
 *   D ∋ (2π²/3) N_g C(x) ∫_0^∞ du e^{−u/ā} (2 − u)^{−1−4b}.
 *
 * N_g = 0.57(23) is the published value with its error of 40 per cent (M. Benitez-Rathgeb, D. Boito, A. H. Hoang, M. Jamin,
 * arXiv:2207.01116; the error is in the abstract, the value from memory). The strength S of a fitted branch point
 * S (1 − t/t*)^(−1−4b) gives N_g = (3/2π²) S 2^(1+4b)/(u per t): 0.670 for the model of arXiv:0806.3156.
 */
import {
  addExact,
  divExact,
  exact,
  exactReal,
  mulExact,
  pi,
  pow,
  R,
  Rational,
  toNumberExact,
} from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import { uPerT } from '../qcd/index.js';
import type { ContourOrigin, StatedSingularity } from '../series/index.js';
import { fittedModel } from './answer-borel.js';
import { fourB } from './condensate.js';

export interface Norm {
  readonly value: Exact;
  /** One sigma. */
  readonly error: number;
  readonly origin: string;
}

export const PUBLISHED_NORM: Norm = {
  value: exact(Rational.of(57, 100)),
  error: 0.23,
  origin: 'N_g = 0.57(23), arXiv:2207.01116 (error of 40 % from the abstract, value from memory)',
};

const TWO_PI_SQUARED_OVER_3: Exact = exactReal((prec) =>
  R.div(R.mul2exp(R.sqr(pi(prec + 8), prec + 8), 1), R.fromNumber(3), prec + 8),
);

/** K of D from N_g. */
export const strengthOf = (norm: Norm): Exact => mulExact(norm.value, TWO_PI_SQUARED_OVER_3);

/** The gluon condensate's singularity of D: dimension 4, on the positive axis, in a coupling of QCD. */
export const gluonSingularity = (origin: ContourOrigin): StatedSingularity | undefined =>
  origin.stated.find((s) => s.dimension !== undefined && toNumberExact(s.dimension) === 4 && s.exponent !== undefined);

/** N_g of the singularity model through all known coefficients; undefined without such a model. */
export function modelNorm(origin: ContourOrigin, prec: number): Norm | undefined {
  const model = fittedModel(origin, origin.coefficients.length, prec);
  const gluon = gluonSingularity(origin);
  const place = model?.singularities.findIndex((s) => s.t === gluon?.t) ?? -1;
  const S = model?.fit.strengths[place];
  if (S === undefined) return undefined;
  const gamma = addExact(exact(1), fourB(origin));
  const power: Exact = exactReal((bits) => pow(R.fromNumber(2), gamma.ball(bits + 8), bits + 8));
  const K = divExact(mulExact({ ball: () => S }, power), uPerT(origin.flavours, origin.divisor));
  return {
    value: divExact(K, TWO_PI_SQUARED_OVER_3),
    error: 0,
    origin: 'N_g of the singularity model of these coefficients',
  };
}
