/** @module The plain result of a fit to several measurements. Numbers are decimal strings. */
import type { Assessment, Caution, Refused } from '../../studies/index.js';
import type { ReplicaResult } from '../replicas/result.js';
import type { BudgetEntry, DatumSummary, ExtractSummary, QuotedEntry, UnknownSummary } from '../result.js';

export interface PullEntry {
  readonly series: string;
  readonly measured: string;
  readonly theory: string;
  readonly residual: string;
  /** Residual over the error of the measurement. */
  readonly pull: string;
  /** Residual over its own standard deviation, the fit's share taken off; absent where the datum fixes a parameter. */
  readonly standardised?: string;
  /** The parameter from this datum alone; for one parameter. */
  readonly alone?: string;
}

export interface ProfileEntry {
  readonly parameter: string;
  /** χ² minimised over the other parameters, above its minimum. */
  readonly points: readonly { readonly value: string; readonly deltaChiSquare: string }[];
  /** Where it reaches 1. */
  readonly interval?: { readonly low: string; readonly high: string };
}

export interface FitRow {
  readonly prescription: string;
  readonly variants?: readonly string[];
  /** One for each parameter. */
  readonly values?: readonly ({ readonly value: string } & BudgetEntry)[];
  readonly chiSquare?: string;
  readonly degreesOfFreedom?: number;
  readonly pValue?: string;
  readonly cautions: readonly Caution[];
  readonly refused?: Refused;
}

export interface FitSummary {
  readonly prescription: string;
  readonly rule: string;
  readonly values: readonly (QuotedEntry & Pick<ExtractSummary, 'spread' | 'evolved'>)[];
  readonly pulls: readonly PullEntry[];
  /** Of the parameters, from the weights of the fit. */
  readonly covariance: readonly (readonly string[])[];
  readonly correlation: readonly (readonly string[])[];
  readonly profiles: readonly ProfileEntry[];
  /** How the predictions of the data move together under each component. */
  readonly correlations: readonly { readonly component: string; readonly matrix: readonly (readonly string[])[] }[];
}

export interface FitResult {
  readonly leastterm: string;
  readonly request: Assessment['request'];
  readonly kind: 'fit';
  readonly parameters: readonly UnknownSummary[];
  readonly data: readonly DatumSummary[];
  /** What the weights hold. */
  readonly weights: string;
  readonly rows: readonly FitRow[];
  readonly summary?: FitSummary;
  /** A Monte Carlo of the same question. */
  readonly replicas?: ReplicaResult;
  readonly cautions: readonly Caution[];
}
