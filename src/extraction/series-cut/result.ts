/** @module The result of a cut through a user's own series: plain, serialisable, every number a decimal string. */
import type { Assessment, Caution, GrowthReport, Standing } from '../../studies/index.js';

type Words = Pick<GrowthReport, 'verdict' | 'statement' | 'signPattern'>;

export interface SeriesCutRow {
  /** mu_f/Q. */
  readonly cut: string;
  /** Fixed-order sum of the part k > mu_f, with the additive constant, and its last term. */
  readonly high: string;
  readonly lastTerm: string;
  /** Principal value of the part k < mu_f of the model, and the sum of both. */
  readonly low?: string;
  readonly sum?: string;
}

export interface SeriesCutValues {
  /** Fixed-order sum of the series as it stands. */
  readonly whole: string;
  /** The series cut at the cut asked for. */
  readonly high: string;
  readonly low?: string;
  readonly sum?: string;
  /** |Im|/pi of the part k < mu_f: all of the ambiguity. */
  readonly ambiguity?: string;
  /** The part k < mu_f times Q^d. */
  readonly inGeV?: { readonly value: string; readonly unit: string };
  /** Distance of the largest from the smallest sum among the cuts, and the largest last term of k > mu_f. */
  readonly spread?: string;
  readonly truncation: string;
  /** How the sum moves with the strength within its error; absent where the file states it. */
  readonly strengthError?: string;
  /** From the error of the coupling. */
  readonly inputError?: string;
  /** Why there is no part k < mu_f as a number. */
  readonly refused?: { readonly reason: string; readonly remedy: string };
  readonly rows: readonly SeriesCutRow[];
}

export interface SeriesCutResult {
  readonly leastterm: string;
  readonly request: Assessment['request'];
  readonly series: Assessment['series'];
  readonly coupling?: Assessment['coupling'];
  readonly cut: {
    /** mu_f/Q. */
    readonly overHard: string;
    readonly GeV?: string;
    readonly singularity: {
      readonly u: string;
      readonly dimension: string;
      readonly exponent: string;
      readonly origin: string;
    };
    /** lambda of lambda times the integral over the low momenta; the first one is used. */
    readonly strengths: readonly { readonly value: string; readonly error: string; readonly source: string }[];
    readonly terms: readonly {
      /** Power of the variable. */
      readonly n: number;
      readonly whole: string;
      readonly low: string;
      readonly high: string;
    }[];
    readonly growth: { readonly whole: Words; readonly high: Words };
    readonly values?: SeriesCutValues;
    readonly standing: Standing;
  };
  readonly cautions: readonly Caution[];
}
