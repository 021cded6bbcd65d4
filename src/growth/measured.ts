/**
 * @module A number with its two kinds of error: of the method, and from the coefficients.
 *
 * The method error is a last difference or a change between fits and says little more than an order of magnitude: it is
 * inflated by METHOD. The error propagated from the coefficients is statistical: it is stated as NOISE standard deviations.
 */
import type { Estimate } from './growth.js';

export interface Measured {
  readonly value: number;
  readonly method: number;
  readonly noise: number;
}

const METHOD = 5;
const NOISE = 2.5;

/** What is stated. */
export const statedError = (m: Measured): number => Math.hypot(METHOD * m.method, NOISE * m.noise);
/** One standard deviation, if there were such a thing for the method. */
export const plainError = (m: Measured): number => Math.hypot(m.method, m.noise);
export const stated = (m: Measured): Estimate => ({ value: m.value, error: statedError(m) });
