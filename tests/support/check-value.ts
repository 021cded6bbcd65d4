/** @module Comparisons of balls with decimal check values by absolute distance, without a detour through doubles. */
import { expect } from 'vitest';
import { R, Rational } from '../../src/numerics/index.js';
import type { Ball } from '../../src/numerics/index.js';

/** The rational that a check value's text says. */
export function rational(text: string): Rational {
  const q = Rational.parse(text);
  if (q === undefined) throw new Error(`not a number: ${text}`);
  return q;
}

/** |b − text| as a double, radius included. */
export function distanceTo(b: Ball, text: string): number {
  const d = R.sub(b, R.fromRational(rational(text), 2000), 2000);
  return Math.abs(R.toNumber(d)) + R.radiusToNumber(d);
}

/** Expects b within the absolute distance `within` of the check value, all of its radius included. */
export function expectNear(b: Ball, text: string, within: number): void {
  expect(distanceTo(b, text), `${R.toNumber(b)} against ${text}`).toBeLessThanOrEqual(within);
}
