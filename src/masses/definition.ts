/**
 * @module What a mass definition is: its name, its parameters, and what stands between it and the pole or the MSbar mass.
 *
 * Every subtracted mass is m = M − Σ (piece), M the pole mass, each piece a power of its cutoff R times a series in the
 * coupling at a multiple of R. Pole mass and pieces are expanded in α_s at one scale before they are subtracted: the
 * factorial growth cancels only between terms of one expansion.
 */
import type { Exact } from '../numerics/index.js';
import type { Status } from '../qcd/index.js';

export const DEFINITION_NAMES = [
  'pole',
  'msbar',
  'running',
  'rs',
  'rs-prime',
  'msr',
  'msr-practical',
  'ps',
  'mrs',
  'pv',
  'kinetic',
] as const;
export type DefinitionName = (typeof DEFINITION_NAMES)[number];

export const isDefinitionName = (text: string): text is DefinitionName => DEFINITION_NAMES.some((n) => n === text);

/** Σ_{n≥1} c_n a^n, a = α_s/(4π) with n_l flavours, at the scale where the series has no logarithm. */
export interface SeriesInA {
  /** Distinguishes the tables that are kept of it. */
  readonly key: string;
  /** c_1, c_2, … for n_l massless flavours. */
  coefficients(light: number): readonly Exact[];
  /** One standard deviation of the last coefficient where it is known numerically; absent where it is exact. */
  error?(light: number): number;
}

/** One piece of what is subtracted from the pole mass. */
export interface Piece {
  readonly series: SeriesInA;
  /** The series is in the coupling at this multiple of R. */
  readonly couplingAt: 1 | 2;
  /** R · series, or R²/(2M) · series. */
  readonly form: 'R' | 'R^2/2M';
  /** Is the series to be multiplied by the strength N of the renormalon? */
  readonly timesStrength: boolean;
}

interface Words {
  readonly name: DefinitionName;
  readonly title: string;
  /** With the parameter in its place: m_RS(ν_f). */
  readonly symbol: string;
  /** The scale that the definition needs. */
  readonly parameter?: { readonly symbol: string; readonly meaning: string };
  readonly relativeTo: 'pole' | 'msbar';
  /** Free of the singularity at u = 1/2. */
  readonly renormalonFree: boolean;
  /** Powers of α_s to which the relation is held here. */
  readonly orders: number;
  readonly needsStrength: boolean;
  readonly source: string;
  readonly status: Status;
  readonly notes: readonly string[];
}

/** m(m), and m(μ) by the renormalisation group. */
export interface MsbarDefinition extends Words {
  readonly kind: 'msbar';
}

/** M − Σ pieces at fixed order; no piece at all for the pole mass itself. */
export interface SubtractedDefinition extends Words {
  readonly kind: 'subtracted';
  readonly pieces: readonly Piece[];
  /** The dependence on R is summed by its own evolution equation. */
  readonly evolution?: SeriesInA;
}

/** The renormalon's series is taken out of the pole mass and its Borel integral put in. */
export interface SummedDefinition extends Words {
  readonly kind: 'summed';
  /** Coupling of the expansion: MSbar, or the one whose beta function is −b_0 α²/(1 − (b_1/b_0) α). */
  readonly coupling: 'msbar' | 'geometric';
  /** Up to the branch point, or the principal value over the whole axis. */
  readonly integral: 'to the branch point' | 'principal value';
}

export type MassDefinition = MsbarDefinition | SubtractedDefinition | SummedDefinition;

/** A definition with its scale in GeV where it needs one. */
export interface MassPlace {
  readonly definition: DefinitionName;
  readonly scale?: number;
}
