/** @module Contour quantities for tests: from the catalogue with another weight or number of loops, or from plain parts. */
import { exact, Rational } from '../../src/numerics/index.js';
import { weightIntegral } from '../../src/qcd/index.js';
import { loadSeries } from '../../src/series/index.js';
import type { ContourOrigin, Expansion, Series } from '../../src/series/index.js';
import type { ContourQuantity } from '../../src/contour/index.js';
import { expand } from '../../src/studies/expand.js';
import { rational } from './check-value.js';

export interface Change {
  readonly weight?: readonly string[];
  readonly loops?: 'one' | 'two' | 'three' | 'four';
  readonly order?: number;
}

/** A catalogue series at α_s, as the contour room takes it. */
export async function contourOf(id: string, alpha: string, change: Change = {}): Promise<ContourQuantity> {
  return quantityOf(await loadSeries(id), alpha, change);
}

export function quantityOf(series: Series, alpha: string, { weight, loops, order }: Change = {}): ContourQuantity {
  const own: Series = {
    ...series,
    ...(weight === undefined ? {} : { contour: { coefficients: weight.map(rational) } }),
    ...(loops === undefined ? {} : { scheme: `MSbar, ${loops}-loop running only` }),
  };
  const { expansion } = expand(own, exact(rational(alpha)), order);
  if (expansion.contour === undefined) throw new Error(`${series.id} is no contour quantity`);
  return { ...expansion, contour: expansion.contour };
}

/** A quantity from plain parts; the fixed-order coefficients are left out. */
export function originOf(
  coefficients: readonly string[],
  weight: readonly string[],
  more: Partial<ContourOrigin> = {},
): ContourOrigin {
  const w = weight.map(rational);
  return {
    weight: w,
    integral: weightIntegral(w),
    coefficients: coefficients.map((c) => exact(rational(c))),
    power: 1,
    errors: coefficients.map(() => 0),
    stated: [],
    flavours: 3,
    loops: 5,
    divisor: 'pi',
    ...more,
  };
}

/** The expansion's frame around an origin. */
export const frame = (contour: ContourOrigin): Pick<Expansion, 'factor' | 'additive'> & { contour: ContourOrigin } => ({
  factor: exact(Rational.ONE),
  additive: exact(Rational.ZERO),
  contour,
});

/** The value, when it is none of the refusals. */
export function standing<T extends object>(result: T): Exclude<T, { readonly reason: string }> {
  if ('reason' in result) throw new Error(String(result.reason));
  return result as Exclude<T, { readonly reason: string }>;
}
