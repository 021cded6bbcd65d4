/** @module The question and the plain result of `evolve`. Numbers of the result are decimal strings. */
import type { Threshold } from '../qcd/index.js';
import type { Uncertain } from '../series/index.js';
import type { Refused, Standing } from './assessment.js';

export interface EvolveRequest {
  readonly quantity: 'alpha_s' | 'mass';
  /** α_s(from), or the MSbar mass m(from) in GeV. */
  readonly value: Uncertain;
  /** GeV; n_f from the thresholds when absent. */
  readonly from: { readonly scale: number; readonly flavours?: number };
  /** GeV, or 'own' for the scale-invariant mass m(m). */
  readonly to: { readonly scale: number | 'own'; readonly flavours?: number };
  /** Loops of the running, 1 to 5 (default); decoupling with one loop less. */
  readonly loops?: number;
  /** The coupling behind a mass; default: the world average at M_Z. */
  readonly alphaS?: { readonly value: Uncertain; readonly scale: number; readonly flavours: number };
  /** Default: c, b, t with their published masses, crossed at μ = m(m). */
  readonly thresholds?: readonly Threshold[];
}

export interface EvolveError {
  readonly label: string;
  readonly plus: string;
  readonly minus: string;
}

export interface EvolveStep {
  readonly action: 'start' | 'run' | 'match';
  /** GeV. */
  readonly scale: string;
  readonly flavours: number;
  readonly alpha: string;
  /** GeV. */
  readonly mass?: string;
  readonly text: string;
}

export interface EvolveResult {
  readonly quantity: 'alpha_s' | 'mass';
  readonly loops: number;
  readonly from: { readonly scale: string; readonly flavours: number; readonly value: string };
  readonly to: { readonly scale: string; readonly flavours: number };
  readonly value: string;
  readonly unit?: 'GeV';
  /** The value came back to the start when evolved the other way. */
  readonly digits: Standing;
  /** Why the value has fewer digits than were asked for. */
  readonly digitsNote?: string;
  /** From the errors of the input: the value itself, α_s behind a mass, the masses at the thresholds. */
  readonly errors: readonly EvolveError[];
  readonly oneLoopLess?: { readonly loops: number; readonly value: string; readonly shift: string };
  /**
   * Largest shift when the thresholds are crossed at half and at twice their scale, each in turn, in quadrature. No threshold
   * is crossed below 1 GeV, where the coupling's truncated running means little.
   */
  readonly matching?: {
    readonly spread: string;
    /** The threshold that makes the largest part. */
    readonly dominant: string;
    readonly parts: readonly { readonly threshold: string; readonly spread: string }[];
    readonly crossings: readonly {
      readonly threshold: string;
      /** Crossing scale over the chosen one. */
      readonly factor: string;
      /** The factor would have been 1/2, but for the floor of 1 GeV. */
      readonly limited?: boolean;
      readonly value?: string;
      readonly refused?: Refused;
    }[];
  };
  /** Λ_MSbar at both ends, exact definition. */
  readonly lambda: readonly {
    readonly flavours: number;
    readonly GeV: string;
    readonly error?: string;
    readonly definition: string;
  }[];
  readonly path: readonly EvolveStep[];
  /** For a mass: the way of the given α_s to the scale where the mass is given. */
  readonly couplingPath?: readonly EvolveStep[];
  /** Value with its errors, rounded together. */
  readonly printed: string;
}
