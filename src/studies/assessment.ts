/**
 * @module The result of `assess`: plain, serialisable, the very object that --json prints.
 * Every number is a decimal string with as many digits as are known.
 */

import type { Caution, Refused, Standing } from './assessment-basics.js';
import type { BorelPlaneReport, CompetingReport, GrowthReport } from './assessment-growth.js';

export type * from './assessment-basics.js';
export type * from './assessment-growth.js';

export interface SeriesSummary {
  readonly id: string;
  readonly title: string;
  readonly quantity?: string;
  readonly order: number;
  readonly coefficientsUsed: number;
  readonly coefficientsInFile: number;
  readonly coupling: { readonly name: string; readonly divisor: string; readonly plain: boolean };
  readonly firstPower: number;
  readonly scheme?: string;
  readonly flavours?: number;
  readonly scaleRatio?: string;
  readonly hardScale?: { readonly value: string; readonly unit: string };
  /** What R is in units of, as the file says: GeV, pb, or Q, Q^p for powers of the hard scale. */
  readonly unit?: string;
  readonly factor: string;
  readonly additive: string;
  readonly sources: readonly string[];
  readonly notes: readonly string[];
  readonly invented: boolean;
}

export interface CouplingSummary {
  readonly name: string;
  readonly value: string;
  readonly error?: string;
  readonly divisor: string;
  /** The expansion variable x = coupling/divisor. */
  readonly x: string;
  /** u per unit of t: β₀·divisor/(4π); absent for a plain variable. */
  readonly uPerT?: string;
  /** Λ_MSbar in units of the scale μ (and in GeV when Q is known), with its definition. */
  readonly lambda?: { readonly overMu: string; readonly GeV?: string; readonly definition: string };
  /** How the value was reached, e.g. the evolution path from M_Z. */
  readonly path?: readonly string[];
}

export interface TermRow {
  /** Power of the expansion variable. */
  readonly order: number;
  readonly coefficient: string;
  readonly coefficientError?: string;
  /** A coefficient with an error as the file writes it. */
  readonly written?: string;
  readonly estimated?: boolean;
  readonly term: string;
  readonly partialSum: string;
  /** This term over the one before it. */
  readonly ratio?: string;
  /** Marks the term of smallest size. */
  readonly least?: boolean;
}

/** How a prescription did on this series with its last coefficients hidden; sizes in units of the target. */
export interface ValueRecord {
  /** What the predictions were held against. */
  readonly against: 'exact' | 'measurement' | 'known sum' | 'own value';
  readonly tested: number;
  /** The predictions saw the first so many coefficients; absent: all but the last ones. */
  readonly seen?: number;
  /** How many lay within the stated error, the target's own error allowed for. */
  readonly inside: number;
  /** Mean of (predicted − target)/|target|. */
  readonly bias: string;
  /** Mean stated error over |target|. */
  readonly sharpness?: string;
  /** Interval score at 68 %: small is good, 0 is perfect. */
  readonly score: string;
  /** good: all inside; bad: a miss beyond three times the errors, stated and of the target; fair: in between. */
  readonly verdict: 'good' | 'fair' | 'bad' | 'no error stated';
}

export interface ValueEntry {
  readonly prescription: string;
  /** Which member of the family: "[2/2]", "b=128/81", "through order 5". */
  readonly variant: string;
  readonly value?: string;
  readonly truncationError?: string;
  /** |Im|/π of the lateral sums where the prescription has one. */
  readonly ambiguity?: string;
  /** Im of the lateral sum above the positive axis, signed. The lateral sums are value ± i·imaginary. */
  readonly imaginary?: string;
  /** Error of the ambiguity from the coefficients' and the coupling's errors. */
  readonly ambiguityError?: string;
  /** From the coefficients' and the coupling's errors. */
  readonly inputError?: string;
  readonly termsUsed?: number;
  /** Trust in the number. */
  readonly standing?: Standing;
  /** How the shown digits are known. */
  readonly digits?: Standing;
  readonly notes?: readonly string[];
  /** The family's own best member. */
  readonly central?: boolean;
  /** Of the family's own best member: one step back, or for a long series from its first coefficients; none below six. */
  readonly record?: ValueRecord;
  readonly refused?: Refused;
}

export interface AmbiguityReport {
  readonly conventions: readonly {
    readonly name: string;
    readonly value: string;
    /** From the errors of coefficients and coupling, or that of N. */
    readonly error?: string;
    readonly relative?: string;
    readonly GeV?: string;
    readonly standing: Standing;
    readonly origin: string;
  }[];
  readonly statement: string;
  /** The default among the conventions, used in the verdict. */
  readonly chosen?: string;
}

export interface PowerCorrectionReport {
  readonly dimension?: string;
  /** (Λ/Q)^d. */
  readonly power?: string;
  readonly lambdaOverQ?: string;
  /** The ambiguity in units of (Λ/Q)^d: a pure number. */
  readonly inPowerUnits?: string;
  readonly GeV?: { readonly value: string; readonly power: string };
  /** |Im|/π from the strength N and Λ: A = κ Λ^d. */
  readonly fromStrength?: {
    readonly overPower: string;
    readonly overPowerError: string;
    readonly value: string;
    readonly error: string;
    readonly GeV?: { readonly value: string; readonly error: string; readonly power: string };
    /** d-th root in GeV, for d > 1. */
    readonly root?: string;
    /** The Λ that it rests on. */
    readonly lambda: string;
  };
  readonly condensates: readonly {
    readonly name: string;
    readonly dimension: string;
    readonly wilson?: string;
    readonly fileValue?: string;
    readonly unit?: string;
    /** Shift of the condensate that absorbs the ambiguity (|Im|/π) and the one for |Im|. */
    readonly shift?: string;
    readonly shiftIm?: string;
    readonly shiftOverValue?: string;
    /** Why a number of this row is missing. */
    readonly missing?: string;
  }[];
  readonly statement: string;
}

export interface OptimalTruncationReport {
  /** Power of the least term, seen; absent when not reached. */
  readonly observed?: {
    readonly power: number;
    readonly tiedWith?: number;
    readonly term: string;
    readonly sumThrough: string;
    readonly sumBefore: string;
  };
  readonly status: 'reached' | 'not reached' | 'not applicable';
  /** Number of terms x − b (least term) and x − b − 1/3 (principal value), from a known or found position and exponent. */
  readonly predicted?: {
    readonly leastTermAt: string;
    readonly principalValueAt?: string;
    readonly x: string;
    readonly b: string;
    readonly origin: string;
  };
  readonly errorOfStopping?: string;
  /** Where ultraviolet and infrared growth compete: the bracket of orders and sums, in place of min |term|. */
  readonly competing?: CompetingReport;
  /** The sum of all known terms at other renormalisation scales: coefficients re-expanded, coupling run. */
  readonly scales?: {
    readonly points: readonly { readonly ratio: string; readonly coupling: string; readonly value: string }[];
    /** Largest distance from the value at the scale of the series. */
    readonly spread?: string;
    readonly refused?: Refused;
  };
  /** What other models say is missing beyond the last known term. */
  readonly models?: readonly {
    readonly model: string;
    readonly title: string;
    readonly nature: 'credible' | 'conventional';
    readonly about: 'next term' | 'remainder';
    readonly low: string;
    readonly high: string;
  }[];
  readonly statement: string;
  readonly standing: Standing;
}

export interface VerdictReport {
  readonly value?: string;
  readonly truncation?: string;
  readonly ambiguity?: string;
  /** Whose lateral sums or least term the ambiguity is. */
  readonly ambiguityOf?: string;
  readonly input?: string;
  /** What the value rests on beyond its stated errors. */
  readonly assumption?: string;
  /** The same in the unit of the quantity. */
  readonly inUnit?: { readonly unit: string; readonly value: string; readonly printed: string };
  /** The line as a paper would print it, PDG-rounded. */
  readonly printed: string;
  readonly prescription?: string;
  readonly rule: string;
  readonly standing: Standing;
}

export interface Assessment {
  readonly leastterm: string;
  readonly request: { readonly [key: string]: string | number | boolean | readonly string[] };
  readonly series: SeriesSummary;
  readonly coupling: CouplingSummary;
  readonly terms: readonly TermRow[];
  readonly growth: GrowthReport;
  readonly borelPlane: BorelPlaneReport;
  readonly values: readonly ValueEntry[];
  readonly ambiguity: AmbiguityReport;
  readonly powerCorrection: PowerCorrectionReport;
  readonly optimalTruncation: OptimalTruncationReport;
  readonly verdict: VerdictReport;
  readonly cautions: readonly Caution[];
}
