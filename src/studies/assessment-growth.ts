/** @module The growth and the Borel plane in the result of `assess`. */
import type { Caution, Refused, Standing } from './assessment-basics.js';

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
  /** The exponent is that of the dimension: an anomalous dimension of the operators is not in it. */
  readonly dimensionAlone?: boolean;
  /** c_1, c_2, … of N (1 − t/t*)^(−γ) [1 + c_1 (1 − t/t*) + …]: as many as the beta function fixes. */
  readonly corrections?: readonly string[];
  /** e_1, e_2, … of c(n) ∝ t*^(−n) Γ(n+γ) [1 + e_1/(n+p) + e_2/((n+p)(n+p−1)) + …], p = γ − 1. */
  readonly overN?: readonly string[];
  readonly kind: string;
  /** Where the expectation comes from: the file, or the operator product expansion with the beta function. */
  readonly origin: string;
}

/** The first ultraviolet singularity with the anomalous dimensions of the four-quark operators. */
export interface UltravioletReport {
  readonly u: string;
  /** lambda_i = gamma_i/(2 beta_0) of the four operators, the largest first. */
  readonly shifts: readonly string[];
  /** Exponent that the series file leads to; prescriptions use it. */
  readonly inFile?: string;
  /** Exponent with the largest shift; absent where it is not known how the operators enter. */
  readonly exponent?: string;
  readonly statement: string;
  readonly reference: string;
  readonly standing: Standing;
}

/** One side of competing growth. */
export interface CompetingSide {
  readonly t: string;
  readonly u?: string;
  readonly exponent?: string;
  /** Power of the least term that this singularity alone would have. */
  readonly leastAt: number;
  readonly origin: string;
}

/** Ultraviolet against infrared growth at the coupling asked for. */
export interface CompetingReport {
  readonly ultraviolet: CompetingSide;
  readonly infrared: CompetingSide;
  /** Powers of the last term of the partial sums in the bracket. */
  readonly orders: readonly [from: number, to: number];
  /** Range of the partial sums in it, through the last known order; absent where fewer than two are known. */
  readonly sums?: { readonly low: string; readonly high: string; readonly through: number };
  /** The smallest |term| and whether it lies in the bracket; absent where it is not reached. */
  readonly least?: { readonly order: number; readonly inside: boolean };
  readonly statement: string;
}

export interface StrengthMethod {
  readonly method: string;
  readonly reference: string;
  readonly value: string;
  readonly error: string;
  /** With one, two, … coefficients. */
  readonly steps: readonly string[];
  /** The method does not take every coefficient. */
  readonly limited?: boolean;
  /** From the coefficients at μ = Q/2 and 2Q. */
  readonly scaleVariation?: readonly [half: string, double: string];
}

/** The strength N of the leading infrared singularity N (1 − t/t*)^(−γ), for the series in the coupling itself. */
export interface StrengthReport {
  readonly dimension: string;
  readonly u: string;
  readonly value?: string;
  readonly error?: string;
  readonly methods: readonly StrengthMethod[];
  readonly notes: readonly string[];
  readonly standing: Standing;
  readonly refused?: Refused;
}

export interface GrowthReport {
  readonly verdict: string;
  readonly order?: string;
  readonly statement: string;
  readonly standing: Standing;
  readonly signPattern: string;
  readonly nearest?: SingularityReport;
  readonly expected: readonly ExpectedSingularity[];
  readonly strength?: StrengthReport;
  /** u = −1 beyond the large-β_0 limit. */
  readonly ultraviolet?: UltravioletReport;
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
  /** One standard deviation in t from the quoted errors of the coefficients, to first order. */
  readonly error?: { readonly re: string; readonly im?: string };
  readonly multiplicity: number;
  /** Amplitude A of A/(1 − t/z) (of the highest-order part for a multiple pole). */
  readonly amplitude?: { readonly re: string; readonly im?: string };
  readonly note?: 'doublet' | 'near-axis';
}

/** A place in the Borel plane, in t and, where a u plane exists, in u. */
export interface PlaceReport {
  readonly re: string;
  readonly im?: string;
  readonly u?: { readonly re: string; readonly im?: string };
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
  /** Zeros of the numerator: real ones once, of each conjugate pair the member with Im > 0. */
  readonly zeros?: readonly PlaceReport[];
}

export interface BorelPlaneReport {
  readonly variable: string;
  readonly entries: readonly PadeEntry[];
  readonly doublets: number;
  readonly notes: readonly string[];
  /** certified: for these coefficients; the errors of the poles say what the coefficients' own errors do. */
  readonly standing: Standing;
  /** The coefficients have errors: the digits hold for the central ones. */
  readonly central?: boolean;
}
