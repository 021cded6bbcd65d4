/**
 * @module The result of `assess`: plain, serialisable, the very object that --json prints.
 * Every number is a decimal string with as many digits as are known.
 */

/** Trust in a number: proved by enclosure; two independent evaluations agree; a model or heuristic. */
export type Standing = 'certified' | 'converged' | 'indicative';

/** A number and what stands behind it. `digits` says how the shown digits are known, `standing` how far the number itself is to be trusted. */
export interface Figure {
  readonly value: string;
  readonly error?: string;
  readonly standing: Standing;
  readonly digits?: Standing;
}

export interface Caution {
  readonly code: string;
  readonly text: string;
}

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
  readonly estimated?: boolean;
  readonly term: string;
  readonly partialSum: string;
  /** This term over the one before it. */
  readonly ratio?: string;
  /** Marks the term of smallest size. */
  readonly least?: boolean;
}

export interface SingularityReport {
  readonly t: string;
  readonly tError?: string;
  readonly u?: string;
  readonly uError?: string;
  /** Degrees, for a complex pair. */
  readonly angle?: string;
  readonly exponent?: string;
  readonly exponentError?: string;
  readonly strength?: string;
  readonly strengthError?: string;
  readonly kind: string;
  readonly standing: Standing;
}

export interface ExpectedSingularity {
  readonly t: string;
  readonly u?: string;
  readonly dimension?: string;
  readonly exponent?: string;
  readonly strength?: string;
  readonly kind: string;
  /** Where the expectation comes from: the file, or the operator product expansion with the beta function. */
  readonly origin: string;
}

export interface GrowthReport {
  readonly verdict: string;
  readonly order?: string;
  readonly statement: string;
  readonly standing: Standing;
  readonly signPattern: string;
  readonly nearest?: SingularityReport;
  readonly expected: readonly ExpectedSingularity[];
  /** How observation and expectation compare, in words. */
  readonly agreement?: string;
  readonly evidence: {
    readonly ratios: readonly {
      readonly n: number;
      readonly ratio: string;
      readonly linear?: string;
      readonly linearError?: string;
    }[];
    readonly comparison?: {
      readonly points: number;
      readonly bayesFactor: string;
      readonly deltaAICc?: string;
      readonly growthOrder?: string;
      readonly growthOrderError?: string;
      readonly inversePosition: string;
      readonly wording: string;
    };
    readonly predictions: readonly { readonly n: number; readonly method: string; readonly relativeMiss: string }[];
    readonly competition: readonly string[];
  };
  readonly usableCoefficients?: number;
  readonly flags: readonly Caution[];
}

export interface PoleReport {
  /** In the Borel variable t conjugate to x; "im" absent for a real pole. */
  readonly re: string;
  readonly im?: string;
  /** The same in u, for a QCD series. */
  readonly u?: { readonly re: string; readonly im?: string };
  readonly multiplicity: number;
  /** Amplitude A of A/(1 − t/z) (of the highest-order part for a multiple pole). */
  readonly amplitude?: { readonly re: string; readonly im?: string };
  readonly note?: 'doublet' | 'near-axis';
}

export interface PadeEntry {
  readonly label: string;
  /** Leroy parameter of the transform, 0 for the plain one. */
  readonly leroy: string;
  readonly exists: boolean;
  /** Deficiency > 0: the entry sits in a degenerate block and equals a smaller one. */
  readonly deficiency?: number;
  readonly reason?: string;
  readonly positiveRealPoles?: number;
  readonly poles: readonly PoleReport[];
}

export interface BorelPlaneReport {
  readonly variable: string;
  readonly entries: readonly PadeEntry[];
  readonly doublets: number;
  readonly notes: readonly string[];
  readonly standing: Standing;
}

export interface Refused {
  readonly reason: string;
  readonly remedy: string;
}

/** How a prescription did on this series with its last coefficients hidden; sizes in units of the target. */
export interface ValueRecord {
  /** What the predictions were held against. */
  readonly against: 'exact' | 'measurement' | 'known sum' | 'own value';
  readonly tested: number;
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
  /** The predictions saw the first so many coefficients; absent: all but the last ones. */
  readonly seen?: number;
    readonly name: string;
    readonly value: string;
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
  readonly statement: string;
  readonly standing: Standing;
}

export interface VerdictReport {
  readonly value?: string;
  readonly truncation?: string;
  readonly ambiguity?: string;
  readonly input?: string;
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
