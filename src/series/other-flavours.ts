/**
 * @module The coefficients of a series at other numbers of flavours than the one it was read for.
 *
 * What the reader found is kept beside the coefficients, so that a file is read again only when somebody asks. Series whose
 * coefficients hold no nf, or were computed, know nothing of other flavours.
 */
import type { Exact } from '../numerics/index.js';
import type { Coefficient, Series } from './series.js';

export type AtFlavours = (flavours: number) => readonly Exact[] | undefined;

const known = new WeakMap<readonly Coefficient[], AtFlavours>();

export function rememberFlavours(coefficients: readonly Coefficient[], at: AtFlavours): void {
  known.set(coefficients, at);
}

/** Values of the coefficients for `flavours`; undefined when the series has nothing to say on them. */
export const coefficientsAt = (series: Series, flavours: number): readonly Exact[] | undefined =>
  known.get(series.coefficients)?.(flavours);
