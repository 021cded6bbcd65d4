/** @module The question and the plain result of `mass`. Numbers of the result are decimal strings, masses in GeV. */
import type { Status, Threshold } from '../qcd/index.js';
import type { Uncertain } from '../series/index.js';
import type { DefinitionName, MassPlace } from './definition.js';

export interface MassQuestion {
  /** GeV. */
  readonly mass: Uncertain;
  readonly from: MassPlace;
  readonly to: readonly MassPlace[];
  readonly alpha: { readonly value: Uncertain; readonly scale: number; readonly flavours: number };
  readonly light: number;
  /** Flavours of the theory with the quark active. */
  readonly flavours: number;
  readonly loops?: number;
  readonly order?: number;
  /** In place of the estimate. */
  readonly strength?: Uncertain;
  readonly scale?: { readonly ratio: number } | { readonly GeV: number };
  readonly thresholds?: readonly Threshold[];
  readonly digits: number;
}

export interface Refused {
  readonly reason: string;
  readonly remedy: string;
}

export interface MassError {
  readonly label: string;
  readonly plus: string;
  readonly minus: string;
  /** The shift in the other direction has no conversion: this side stands for both. */
  readonly oneSided?: boolean;
}

/** One power of α_s at the scale μ, in GeV. */
export interface MassTerm {
  readonly order: number;
  /** Of the pole mass. */
  readonly pole: string;
  /** What the leading renormalon alone would give: N μ a_n α_s^(n+1). */
  readonly renormalon: string;
  /** Taken out by the definition, re-expanded at μ. */
  readonly removed: string;
  readonly left: string;
  /** Ratios to the term before, of the pole mass and of what is left. */
  readonly poleRatio?: string;
  readonly leftRatio?: string;
}

export interface MassByOrder {
  readonly order: number;
  readonly value: string;
  readonly change?: string;
}

export interface ScalePoint {
  /** Of the scale used. */
  readonly factor: string;
  readonly scale?: string;
  readonly alpha?: string;
  readonly value?: string;
  readonly refused?: Refused;
}

export interface Evolution {
  /** R, α_s(R), the mass there. */
  readonly path: readonly { readonly scale: string; readonly alpha: string; readonly mass: string }[];
  /** Mass at the end from one-loop running and γ_0, closed form. */
  readonly leadingLog: string;
  /** The same relation at fixed order at μ, not evolved. */
  readonly fixedOrder: string;
  readonly doubt: string;
}

export interface MassValue {
  readonly definition: DefinitionName;
  readonly title: string;
  /** With its scale: m_RS(2 GeV). */
  readonly symbol: string;
  readonly scale?: string;
  readonly renormalonFree: boolean;
  readonly value: string;
  readonly digits: 'certified' | 'converged';
  readonly order: number;
  readonly byOrder: readonly MassByOrder[];
  /** Absent for MSbar masses. */
  readonly terms?: readonly MassTerm[];
  /** Put in at once by the summed masses. */
  readonly closed?: string;
  readonly evolution?: Evolution;
  /** From the inputs. */
  readonly errors: readonly MassError[];
  readonly lastTerm?: string;
  readonly scaleVariation?: { readonly plus: string; readonly minus: string; readonly points: readonly ScalePoint[] };
  /** The larger of the last two. */
  readonly perturbative?: string;
  /** |Im|/π, when a pole mass stands at either end. */
  readonly ambiguity?: string;
  readonly printed: string;
  readonly source: string;
  readonly status: Status;
  readonly notes: readonly string[];
}

export type MassEntry =
  MassValue | { readonly definition: DefinitionName; readonly title: string; readonly refused: Refused };

export interface StrengthUsed {
  readonly value: string;
  readonly error?: string;
  readonly method: string;
  readonly others: readonly { readonly method: string; readonly reference: string; readonly value: string }[];
}

export interface MassResult {
  /** As given, with its unit. */
  readonly mass: string;
  readonly from: {
    readonly definition: DefinitionName;
    readonly title: string;
    readonly symbol: string;
    readonly scale?: string;
  };
  readonly light: number;
  readonly flavours: number;
  readonly loops: number;
  readonly alphaS: {
    readonly given: string;
    readonly scale: string;
    readonly flavours: number;
    /** With n_l flavours at m(m). */
    readonly atMass: string;
  };
  readonly lambda: string;
  readonly msbar: string;
  /** μ of the expansions. */
  readonly scale: string;
  /** The relation between m(m) and the definition given, when it is no MSbar mass. */
  readonly sourceTerms?: readonly MassTerm[];
  readonly strength: StrengthUsed;
  readonly values: readonly MassEntry[];
  readonly poleAmbiguity: {
    readonly conventions: readonly {
      readonly name: string;
      readonly GeV: string;
      readonly error?: string;
      readonly inLambda: string;
      readonly about: string;
    }[];
    readonly knownOrders: number;
  };
  readonly cautions: readonly string[];
}
