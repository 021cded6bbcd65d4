/**
 * @module An Expansion: a series at a chosen value of its expansion variable, ready for any prescription.
 *
 *   R = additive + factor · x^power · F(x),   F(x) = Σ_{n=0}^{N−1} c_n x^n,   c_0 ≠ 0.
 *
 * Borel conventions: B(t) = Σ c_n t^n/n!,  F(x) = (1/x) ∫_0^∞ dt e^{−t/x} B(t); the upper lateral sum passes above the
 * positive t axis. With power = 1 and x = α this is the usual R = ∫ dt e^{−t/α} B(t) of a QCD correction.
 */
import type { Exact, Rational } from '../numerics/index.js';
import type { Divisor, StrongCoupling } from './series.js';

/** A Borel singularity N (1 − t/t*)^(−γ) [1 + c₁(1 − t/t*) + c₂(1 − t/t*)² + …] taken as given. */
export interface StatedSingularity {
  readonly t: Exact;
  /** Position in u, when the series has a β function. */
  readonly u?: Exact;
  readonly exponent?: Exact;
  /** c₁, c₂, …; empty when unknown. */
  readonly corrections: readonly Exact[];
  readonly strength?: Exact;
  /** C_1, C_2, … of the operator's coefficient function 1 + C_1 x + C_2 x² + …, where the file has them. */
  readonly wilson?: readonly Exact[];
  readonly dimension?: Exact;
  /** The exponent follows from the dimension alone, and the operators may well have an anomalous dimension. */
  readonly dimensionAlone?: true;
  readonly kind: 'infrared' | 'ultraviolet' | 'other';
  /** The series file, the operator product expansion, or the terms themselves. */
  readonly origin: 'file' | 'operator product expansion' | 'terms';
}

/** How the expansion variable runs, and where it stands: what scale setting needs. */
export interface Running {
  /** b_k of dx/d ln μ² = −Σ b_k x^(k+2), as many as are known. */
  readonly beta: readonly Exact[];
  /** μ/Q of x and of the coefficients. */
  readonly scaleRatio: Exact;
  readonly flavours?: number;
  /**
   * Entry [n][k] multiplies n_f^k in the coefficient c_n; present when the series is known for any n_f, worked out when it
   * is asked for. Undefined when the coefficients turn out to be no polynomials of degree n.
   */
  readonly flavourPolynomials?: () => readonly (readonly Exact[])[] | undefined;
}

/**
 * The quantity on a circle whose fixed-order expansion an Expansion is:
 * R = additive + factor (1/2πi) ∮ ds/s W(s/s_0) D(s),  D = Σ c_n x(−s)^(n + power),  x(s_0) the expansion's own x.
 */
export interface ContourOrigin {
  /** w_0, w_1, … of the weight w(x). */
  readonly weight: readonly Rational[];
  /** W_0, W_1, … of W(x) = 2 ∫_x^1 w(x′) dx′. */
  readonly integral: readonly Rational[];
  /** c_n of D, and the power of the first. */
  readonly coefficients: readonly Exact[];
  readonly power: number;
  /** One-sigma errors of the c_n. */
  readonly errors: readonly number[];
  /** Borel singularities of D, nearest first. */
  readonly stated: readonly StatedSingularity[];
  readonly flavours: number;
  /** Loops of the beta function on the circle. */
  readonly loops: number;
  readonly divisor: Divisor;
}

export interface Expansion {
  readonly x: Exact;
  readonly power: number;
  readonly factor: Exact;
  readonly additive: Exact;
  readonly coefficients: readonly Exact[];
  /** Relative one-sigma error of each coefficient, quoted or implied by its digits; 0 when exact. */
  readonly relativeErrors: readonly number[];
  /** Known beforehand, nearest first. */
  readonly stated: readonly StatedSingularity[];
  /** Absent for a variable that does not run. */
  readonly running?: Running;
  /** Present for the fixed-order expansion of a contour quantity. */
  readonly contour?: ContourOrigin;
  /** Exponents of F at strong coupling, F ~ x^power [1 + O(x^−spacing)], where they are known. */
  readonly strongCoupling?: StrongCoupling;
  /** Name of the large-β0 quantity that continues the series, see the prescription bubble-chain. */
  readonly bubbleChain?: string;
}
