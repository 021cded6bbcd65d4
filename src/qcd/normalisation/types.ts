/** @module The question for the strength of an infrared singularity, and the answer. */
import type { Exact } from '../../numerics/index.js';
import type { CouplingDivisor } from '../divisor.js';

export interface NormalisationQuestion {
  /** Coefficients of x^(n + firstPower) at μ = Q, x = α_s/divisor. */
  readonly coefficients: readonly Exact[];
  /** ≥ 1. */
  readonly firstPower: number;
  /** One standard deviation of each coefficient. */
  readonly errors?: readonly number[];
  readonly divisor: CouplingDivisor;
  readonly flavours: number;
  /** d > 0 of the leading power correction Λ^d/Q^d. */
  readonly dimension: number;
  /** C_1, C_2, … of the correction's coefficient function 1 + C_1 x + C_2 x² + …. */
  readonly wilson?: readonly Exact[];
  /** γ of (1 − t/t_s)^(−γ) for n counted from x^1, where it is not the one of d alone: anomalous dimension, statement of a file. */
  readonly exponent?: Exact;
  /** Loops of the coupling's beta function: 5 (MSbar, default), 2 for another coupling. */
  readonly loops?: number;
  /** The beta function ends after `loops`: a world of its own, in which the sum rule takes every coefficient. */
  readonly ends?: boolean;
  /** |u| of the nearest ultraviolet singularity, u of the next infrared one. */
  readonly ultraviolet?: number;
  readonly nextInfrared?: number;
}

export type NormalisationMethod =
  'sum rule' | 'sum rule in the conformal variable' | 'ratio to the asymptotic form' | 'expansion of the Borel factor';

export interface NormalisationEstimate {
  readonly method: NormalisationMethod;
  readonly reference: string;
  /** One value for each number of coefficients used. */
  readonly steps: readonly number[];
  /** From all coefficients that the method takes, at μ = Q. */
  readonly value: number;
  /** The larger of the last step and half the spread under the change of scale, with the coefficients' errors in quadrature. */
  readonly error: number;
  /** From the errors of the coefficients alone. */
  readonly input: number;
  /** The method stops before the last coefficient. */
  readonly limited: boolean;
  /** The same from coefficients at μ = Q/2 and 2Q, where the coupling runs by a known beta function. */
  readonly scaleVariation?: readonly [half: number, double: number];
}

export interface Normalisation {
  /** The leading method at μ = Q, for the series in x. */
  readonly value: number;
  readonly error: number;
  /** The same for the series in α_s itself: N/divisor, the normalisation of the literature. */
  readonly inAlpha: { readonly value: number; readonly error: number };
  readonly estimates: readonly NormalisationEstimate[];
  readonly errorParts: {
    readonly lastStep: number;
    readonly methods: number;
    readonly scale: number;
    readonly input: number;
  };
  readonly notes: readonly string[];
}
