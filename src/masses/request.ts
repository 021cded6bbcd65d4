/** @module One conversion as plain data: numbers and names only, nothing that a worker could not be sent. */
import type { Threshold } from '../qcd/index.js';
import type { MassPlace } from './definition.js';

/** α_s as it is given. */
export interface GivenCoupling {
  readonly value: number;
  /** GeV. */
  readonly scale: number;
  readonly flavours: number;
}

export interface MassRequest {
  /** GeV, in the definition of `from`. */
  readonly mass: number;
  readonly from: MassPlace;
  readonly to: MassPlace;
  readonly alpha: GivenCoupling;
  /** Massless flavours n_l beside the heavy quark: the flavours of the coupling of every expansion. */
  readonly light: number;
  /** Flavours of the theory with the quark active, > n_l. Default n_l + 1; more when lighter massive quarks are decoupled too. */
  readonly flavours?: number;
  /** Loops of the running, 1 to 5 (default); decoupling with one loop less. */
  readonly loops?: number;
  /** Powers of α_s kept, from 0. Default: as many as both definitions have. */
  readonly order?: number;
  /** Strength N of the leading renormalon (MSbar coupling α_s). Default: estimated from the pole mass series. */
  readonly strength?: number;
  /** μ of the expansions: a multiple of m(m), or GeV. Default { ratio: 1 }. For MSR masses the ratio multiplies R. */
  readonly scale?: { readonly ratio: number } | { readonly GeV: number };
  /** Thresholds of the quarks other than this one. Default: the published masses. */
  readonly thresholds?: readonly Threshold[];
  /** Shift of the numerically known last coefficients, in standard deviations: of the pole mass, of the potential. */
  readonly shifts?: { readonly pole?: number; readonly potential?: number };
}

export interface MassConversion {
  /** GeV. */
  readonly value: number;
  /** m(m) in GeV, through which every conversion goes. */
  readonly msbar: number;
  /** α_s with n_l flavours at μ = m(m). */
  readonly alpha: number;
  /** μ of the expansions in GeV, and α_s with n_l flavours there. */
  readonly scale: number;
  readonly alphaAtScale: number;
  readonly order: number;
}
