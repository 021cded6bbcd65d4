/**
 * @module What each prescription of a contour quantity answers: value, truncation error, notes; or a refusal.
 * Values are of (1/2πi) ∮ ds/s W D: factor and additive part are put on by the caller.
 */
import { R } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';
import type { Refusal } from '../qcd/index.js';
import type { ContourOrigin, Expansion } from '../series/index.js';

/** The expansion of a contour quantity, with the coupling. */
export type ContourQuantity = Expansion & { readonly contour: ContourOrigin };

export interface ContourSum {
  readonly kind: 'sum';
  readonly variant: string;
  readonly value: Ball;
  readonly imaginary?: Ball;
  readonly truncation?: number;
  /** What the contour-improved series of the same transform tends to. */
  readonly improvedLimit?: Ball;
  readonly termsUsed: number;
  readonly notes: readonly string[];
  readonly central?: boolean;
}

export interface ContourRefusal {
  readonly kind: 'refusal';
  readonly variant: string;
  readonly reason: string;
  readonly remedy: string;
}

export type ContourAnswer = ContourSum | ContourRefusal;

export interface ContourRequest {
  readonly digits: number;
  /** Only this member, without its error: inputs are being varied. */
  readonly only?: string;
}

export const refused = (variant: string, { reason, remedy }: Refusal): ContourRefusal => ({
  kind: 'refusal',
  variant,
  reason,
  remedy,
});

/** Why the two expansions differ, for every place that shows both. */
export const CONTESTED =
  'fixed-order and contour-improved series have different Borel sums (A. H. Hoang, C. Regner, arXiv:2008.00578, 2105.11222), ' +
  'and the contour-improved one conflicts with the standard operator product expansion (M. Golterman, K. Maltman, S. Peris, ' +
  'arXiv:2305.10386); which one to use is contested: take one, do not average';

export const sum = (list: readonly Ball[], prec: number): Ball =>
  list.reduce<Ball>((total, b) => R.add(total, b, prec), R.ZERO);

export const size = (b: Ball): number => Math.abs(R.toNumber(b));

/** Size of the last term that is not zero. */
export function lastSize(terms: readonly Ball[]): number {
  return size(terms.findLast((t) => !R.isExactZero(t)) ?? R.ZERO);
}

/** Bits for sums to so many digits. */
export const bitsFor = (digits: number): number => Math.ceil(digits * 3.33) + 64;
