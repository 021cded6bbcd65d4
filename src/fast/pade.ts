/**
 * @module Padé approximants of the coupling series in doubles: [L/M](x) of Σ c_n x^n.
 * Refuses a singular block of the table (in doubles: a vanishing pivot). Reference: pade-double.ts.
 */
import { PadeDouble } from '../numerics/index.js';
import type { Kernel } from './kernel.js';

export interface PadeSetting {
  readonly kind: 'pade';
  readonly L: number;
  readonly M: number;
}

/** A pivot smaller than this fraction of the largest entry is a singular block in doubles. Heuristic. */
export const LEAST_PIVOT = 1e-14;

export function padeKernel({ L, M }: PadeSetting): Kernel {
  const work = new PadeDouble(L, M);
  return {
    prepare: (c) => c.length > L + M && work.fit(c) && work.pivotRatio > LEAST_PIVOT,
    value: (x) => work.evaluate(x),
  };
}
