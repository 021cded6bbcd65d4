/** @module The plain result about a contour quantity: numbers as decimal strings, in the order in which they are shown. */

export interface SummedTerm {
  readonly term: string;
  /** Partial sum of R, additive part included. */
  readonly sum: string;
}

export interface OrderRow {
  readonly order: number;
  /** c_n of D. */
  readonly coefficient: string;
  readonly coefficientError?: string;
  /** Coefficient of the fixed-order expansion. */
  readonly momentCoefficient: string;
  readonly fixedOrder: SummedTerm;
  /** A_n = (1/2πi) ∮ dx/x W x(−s)^n. */
  readonly integral?: string;
  readonly improved?: SummedTerm;
}

export interface PowerRow {
  readonly dimension: number;
  /** (−1)^k W_k = (−1)^(k+1) (2/k) w_{k−1}, k = dimension/2. */
  readonly coefficient: string;
  readonly statement: string;
}

export interface RefusedPart {
  readonly reason: string;
  readonly remedy: string;
}

export interface BorelRow {
  readonly method: string;
  readonly variant: string;
  readonly value?: string;
  /** Of the lateral sum above the axis. */
  readonly imaginary?: string;
  /** |Im|/π. */
  readonly ambiguity?: string;
  readonly truncation?: string;
  /** What the contour-improved series of the same transform tends to. */
  readonly improvedLimit?: string;
  readonly separation?: string;
  readonly central?: boolean;
  readonly notes?: readonly string[];
  readonly refused?: RefusedPart;
}

export interface SubtractedReport {
  readonly norm: { readonly value: string; readonly error?: string; readonly origin: string };
  /** R/√s_0. */
  readonly ratio: string;
  /** The principal value, part of every sum below. */
  readonly addedBack: string;
  readonly orders: readonly {
    readonly order: number;
    readonly fixedOrder: SummedTerm;
    readonly improved: SummedTerm;
  }[];
  /** Fixed order minus contour improved. */
  readonly difference: string;
  /** What one standard deviation of N_g moves. */
  readonly normMoves?: { readonly fixedOrder: string; readonly improved: string };
}

export interface ContourReport {
  readonly weight: {
    /** "1 - 3*x^2 + 2*x^3". */
    readonly text: string;
    /** w_0, w_1, …, and W_0, W_1, … of W(x) = 2 ∫_x^1 w. */
    readonly coefficients: readonly string[];
    readonly integral: readonly string[];
  };
  /** J_l = (1/2πi) ∮ dx/x W ln^l(−x). */
  readonly moments: readonly { readonly power: number; readonly value: string; readonly exact?: string }[];
  readonly powerCorrections: readonly PowerRow[];
  readonly circle: {
    readonly loops: number;
    /** The coupling x at φ = π. */
    readonly end?: { readonly re: string; readonly im: string; readonly modulus: string; readonly degrees: string };
    readonly refused?: RefusedPart;
  };
  readonly orders: readonly OrderRow[];
  readonly fixedOrder: { readonly value: string; readonly truncation: string };
  readonly contourImproved?: { readonly value: string; readonly truncation: string };
  readonly difference?: { readonly value: string; readonly overTruncation?: string; readonly statement: string };
  /** Why there is no contour-improved sum. */
  readonly refused?: RefusedPart;
  readonly borel: readonly BorelRow[];
  readonly subtracted: SubtractedReport | { readonly refused: RefusedPart };
}
