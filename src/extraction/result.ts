/** @module The plain result of an extraction. Numbers are decimal strings with the digits that are known. */
import type { Assessment, Caution, EvolveStep, Refused, SeriesSummary, Standing } from '../studies/index.js';
import type { ComponentName, TotalName } from './budget.js';
import type { Unknown } from './problem.js';
import type { ReplicaResult } from './replicas/result.js';

/** Signed change of the unknown by one cause; `slope` of R or a new solution. */
export interface ShiftEntry {
  readonly cause: string;
  readonly shift: string;
  readonly how: 'slope' | 'refit';
}

export interface ComponentEntry {
  readonly name: ComponentName;
  /** Sizes upwards and downwards; absent when there is no number. */
  readonly plus?: string;
  readonly minus?: string;
  /** stochastic adds in quadrature in the mixed total, a range adds linearly. */
  readonly nature: 'stochastic' | 'range';
  readonly counted: boolean;
  readonly note?: string;
  /** Why there is no number. */
  readonly missing?: string;
  readonly sources: readonly { readonly label: string; readonly shifts: readonly ShiftEntry[] }[];
}

export interface SidesEntry {
  readonly plus: string;
  readonly minus: string;
}

export type TotalsEntry = Readonly<Record<TotalName, SidesEntry>>;

export interface BudgetEntry {
  readonly components: readonly ComponentEntry[];
  readonly totals: TotalsEntry;
}

/** The ambiguity in R, in the unknown, and as a power of GeV. */
export interface AmbiguityEntry {
  readonly convention: string;
  readonly origin: string;
  readonly value: string;
  readonly dimension?: string;
  readonly GeV?: string;
}

export interface ExtractRow extends Partial<BudgetEntry> {
  readonly prescription: string;
  readonly variant: string;
  readonly value?: string;
  /** How the digits of the value are known, and trust in the prescription's number. */
  readonly digits?: Standing;
  readonly trust?: Standing;
  /** dX/dp: the measured quantity by the unknown. */
  readonly slope?: string;
  readonly otherRoots?: readonly string[];
  readonly ambiguity?: AmbiguityEntry;
  /** At the scale where it is wanted. */
  readonly evolved?: { readonly value: string; readonly totals: TotalsEntry };
  /** What the condensate of this row belongs to. */
  readonly belongsTo?: string;
  readonly cautions: readonly Caution[];
  readonly refused?: Refused;
}

export interface UnknownSummary {
  readonly name: Unknown;
  readonly symbol: string;
  readonly unit?: string;
  /** Renormalisation scale in GeV and flavours that the value belongs to. */
  readonly scale?: string;
  readonly flavours?: number;
}

export interface MeasuredSummary {
  readonly text: string;
  readonly value: string;
  readonly plus: string;
  readonly minus: string;
  readonly unit?: string;
}

export interface DatumSummary {
  readonly series: SeriesSummary;
  readonly measured?: MeasuredSummary;
  /** Hard scale in GeV. */
  readonly scale?: string;
}

export interface PowerTermEntry {
  readonly name: string;
  readonly dimension: string;
  readonly value: string;
  readonly origin: string;
  /** The sum that the value belongs to. */
  readonly belongsTo: string;
  /** What it adds to R at the solution. */
  readonly adds: string;
}

/** The quoted value with its budget. */
export interface QuotedEntry extends BudgetEntry {
  readonly value: string;
  readonly printed: string;
}

export interface ExtractSummary extends QuotedEntry {
  readonly prescription: string;
  readonly rule: string;
  /** The values of the accepted prescriptions. */
  readonly spread?: {
    readonly accepted: readonly string[];
    readonly low: string;
    readonly high: string;
    readonly half: string;
    readonly rectangular: string;
  };
  readonly evolved?: QuotedEntry & {
    readonly scale: string;
    readonly flavours: number;
    readonly path: readonly EvolveStep[];
  };
}

export interface ExtractResult {
  readonly leastterm: string;
  readonly request: Assessment['request'];
  readonly kind: 'single';
  readonly unknown: UnknownSummary;
  readonly datum: DatumSummary;
  readonly searched?: { readonly from: string; readonly to: string };
  readonly rows: readonly ExtractRow[];
  readonly summary?: ExtractSummary;
  readonly condensates?: readonly PowerTermEntry[];
  /** A Monte Carlo of the same question. */
  readonly replicas?: ReplicaResult;
  readonly cautions: readonly Caution[];
}
