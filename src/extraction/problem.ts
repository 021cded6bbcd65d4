/**
 * @module The question, as plain data: numbers, decimal texts and names, nothing that a worker could not be sent. The series
 * are named here and handed over beside it.
 */
import type { Threshold } from '../qcd/index.js';

/** What is extracted. pole-mass is the way back: a prediction from an MSbar mass, with its budget. */
export const UNKNOWNS = ['alpha_s', 'mass', 'pole-mass', 'condensate'] as const;
export type Unknown = (typeof UNKNOWNS)[number];

/** A number with its one-sigma errors. `value` is a decimal or p/q, exactly as given. */
export interface Quantity {
  readonly text: string;
  readonly value: string;
  readonly plus: number;
  readonly minus: number;
  /** Power of GeV, errors and value already in GeV; absent for a pure number. */
  readonly dimension?: number;
}

/** Which definition a condensate's value belongs to. */
export type CondensateDefinition =
  | { readonly kind: 'pv' }
  | { readonly kind: 'truncated' }
  /** Momenta above μ in GeV are perturbative, below it condensate. */
  | { readonly kind: 'cutoff'; readonly mu: number }
  /** Whatever the prescription: mixed, and told so. */
  | { readonly kind: 'any' };

export interface CondensateChoice {
  /** As in the file. */
  readonly name: string;
  /** In GeV^d; absent: the file's own value. */
  readonly value?: Quantity;
}

/** One measurement and the series that predicts it. */
export interface Datum {
  /** Catalogue id or file. */
  readonly series: string;
  /** Absent for a prediction. */
  readonly measured?: Quantity;
  /** Hard scale in GeV in place of the file's. */
  readonly scale?: number;
  /** The measured quantity is norm · m^massPower · R with R at the scale m; 0: R itself, at its own scale. */
  readonly massPower?: number;
  readonly norm?: Quantity;
  /** The measured mass is of this definition; the series is its relation to m(m), made at the reference mass in GeV. */
  readonly threshold?: {
    readonly definition: string;
    readonly scale?: number;
    readonly light: number;
    readonly reference: number;
  };
}

export interface Problem {
  readonly for: Unknown;
  /** A fit of masses leaves α_s(M_Z) free as well. */
  readonly freeAlphaS?: boolean;
  readonly data: readonly Datum[];
  /** Only the first so many coefficients of each series. */
  readonly order?: number;
  /** Names, in the order of the table; absent: the usual ones. */
  readonly prescriptions?: readonly string[];
  /** The prescription whose value is quoted; absent: the verdict's ladder decides. */
  readonly central?: string;
  /** 'own' or the name of a truncation-error model. */
  readonly truncationBy: string;
  readonly ambiguityBy: AmbiguityName;
  /** α_s(M_Z), five flavours: an input of all but alpha_s. */
  readonly alphaS?: Quantity;
  /** The coupling of the series itself, in place of α_s(M_Z). */
  readonly coupling?: Quantity;
  /** m(m) in GeV behind a pole mass. */
  readonly mass?: Quantity;
  readonly condensates: readonly CondensateChoice[];
  readonly condensateBy?: CondensateDefinition;
  /** false: not even those condensates of which the file says to what their value belongs. */
  readonly fileCondensates?: boolean;
  /** Name of the condensate that is extracted; absent: the only one of the file. */
  readonly condensate?: string;
  readonly loops: number;
  readonly thresholds: readonly Threshold[];
  /** Where α_s is wanted besides its own scale; absent: nowhere else. */
  readonly to?: { readonly scale: number; readonly flavours: number };
  /** Correlation of the measurements. */
  readonly correlation?: readonly (readonly number[])[];
  /** Do coefficient and truncation errors enter the weights of a fit? */
  readonly theoryInWeights?: boolean;
  /** Values of the unknown that are searched. */
  readonly search?: { readonly from: number; readonly to: number };
  readonly digits: number;
}

export const AMBIGUITY_NAMES = ['im/pi', 'im', 'least-term', 'near-least', 'none'] as const;
export type AmbiguityName = (typeof AMBIGUITY_NAMES)[number];
