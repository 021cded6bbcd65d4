/** @module Λ_MSbar over μ from the coupling at μ. */
import { isRefusal, lambdaOf } from '../qcd/index.js';

/** Loops of the β function behind the Λ that the reports print. */
export const LAMBDA_LOOPS = 4;

/** Λ/μ by the exact four-loop definition; undefined where the coupling has none. */
export function lambdaRatio(alpha: number, flavours: number): number | undefined {
  const found = lambdaOf(alpha, 1, { flavours, loops: LAMBDA_LOOPS });
  return isRefusal(found) ? undefined : found;
}
