/**
 * @module What a quantity of the large-β0 limit is: its Borel transform taken apart, its words, its sources.
 *
 *   R = norm·α Σ_n c_n a^n = (norm/β0) ∫_0^∞ du e^(−u/a) B(u),  a = β0 α,  c_n = n! [u^n] B(u),
 *   B(u) = e^(5u/3) (μ²/Q²)^u b(u) + subtraction · G_0(u)/u,  b = Σ components.
 * β0 = (11 − 2n_f/3)/(4π), dα/d ln μ² = −β0 α², α the MSbar coupling at μ. Exact to leading order in 1/β0 (naive
 * non-abelianisation: the leading powers of n_f with n_f → −6πβ0).
 */
import type { Rational } from '../numerics/index.js';
import type { Formal } from '../qcd/index.js';
import type { ConstantRing } from './gamma-series.js';
import type { Component, Factor } from './tower.js';

export type QuantityName =
  | 'adler'
  | 'r-ratio'
  | 'tau-width'
  | 'pole-mass'
  | 'static-potential'
  | 'bjorken'
  | 'gross-llewellyn-smith'
  | 'b-to-u-pole'
  | 'b-to-u-msbar';

export interface Quantity {
  readonly name: QuantityName;
  readonly title: string;
  /** What R is, in a line. */
  readonly meaning: string;
  /** b(u) for people. */
  readonly formula: string;
  readonly sources: readonly string[];
  /** How far formula and numbers have been checked. */
  readonly status: string;
  /** What stands in front of α, in words and as a number. */
  readonly norm: { readonly text: string; readonly factor: Factor };
  /** The hard scale by its symbol. */
  readonly hard: string;
  /** Flavours where none are given. */
  readonly flavours: number;
  readonly components: readonly Component[];
  /** Weight of G_0(u)/u, where a mass is subtracted. */
  readonly subtraction?: Rational;
  /** The first `length` Taylor coefficients of B with e^(exponent·u); absent where only the poles give them. */
  series?<T>(ring: ConstantRing<T>, exponent: T, length: number): T[];
  /** c_0, c_1, … in closed form at μ = Q where they were matched to enclosures, not derived. */
  matched?(length: number): readonly Formal[];
  /** All coefficients are rational. */
  readonly rational?: boolean;
  /** b is an integral over the Euclidean virtuality of the gluon, times this kernel for contours. */
  readonly euclidean: boolean;
}
