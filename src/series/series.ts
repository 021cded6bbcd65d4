/**
 * @module The Series: what a series file says, exactly, and nothing more.
 *
 * R = additive + factor · Σ_{n>=0} c_n x^(n + firstPower),  x = coupling / divisor.
 */
import type { Exact, Rational } from '../numerics/index.js';

/** A number with an (asymmetric) one-standard-deviation error; `text` is what the file says. */
export interface Uncertain {
  readonly value: Exact;
  /** Both non-negative. Absent: no error was quoted. */
  readonly error?: { readonly plus: Rational; readonly minus: Rational };
  readonly text: string;
}

export interface Coefficient extends Uncertain {
  readonly status: 'computed' | 'estimated';
  /** Significant digits of a plain decimal as written ("1.000" has 4); absent for fractions, integers and expressions. */
  readonly significantDigits?: number;
}

/** Divisor of the coupling: the series is in α/divisor. */
export type Divisor = '1' | 'pi' | '2*pi' | '4*pi';

export interface Coupling {
  readonly name: string;
  readonly divisor: Divisor;
  /** True when the variable is just a variable x: no α_s, no u plane, no Λ. */
  readonly plain: boolean;
}

export type SingularityKind = 'infrared' | 'ultraviolet' | 'other';

/** A Borel singularity (1 − t/t*)^(−exponent) that the file states. One of u, t, dimension is present. */
export interface KnownSingularity {
  readonly u?: Exact;
  /** Position in the Borel variable conjugate to the file's own expansion variable x. */
  readonly t?: Exact;
  /** Operator dimension d: position u = d/2. */
  readonly dimension?: Rational;
  /** γ of (1 − t/t*)^(−γ); growth c_n ~ Γ(n + γ). */
  readonly exponent?: Exact;
  /** One-loop anomalous dimension term subtracted from the exponent that follows from the dimension. */
  readonly anomalousDimension?: Exact;
  /** C_1, C_2, … of the operator's coefficient function C_0 (1 + C_1 x + C_2 x² + …), x the series' own variable. */
  readonly wilsonCorrections?: readonly Exact[];
  readonly strength?: Uncertain;
  readonly kind: SingularityKind;
}

export interface Condensate {
  readonly dimension: Rational;
  readonly name: string;
  /** C_d of R ∋ C_d ⟨O_d⟩ / Q^d. */
  readonly wilson?: Exact;
  readonly value?: Uncertain;
  readonly unit?: string;
  readonly source?: string;
  /** The sum that the value belongs to, as the file says: principal value, truncated sum, or cut-off with its scale. */
  readonly definedBy?: string;
}

export interface Scale {
  readonly value: Exact;
  readonly unit: 'GeV' | 'MeV';
  readonly text: string;
}

/** The weight w(x) of a contour quantity: a polynomial in x = s/s_0, w_0 first, the last one not zero. */
export interface ContourWeight {
  readonly name?: string;
  readonly coefficients: readonly Rational[];
}

/** The sum of the terms (without factor and additive part) behaves as x^power [1 + O(x^−spacing)] at strong coupling: known of model problems. */
export interface StrongCoupling {
  readonly power: Rational;
  readonly spacing: Rational;
}

export interface Series {
  /** Catalogue id or file name, for messages. */
  readonly id: string;
  readonly title: string;
  readonly quantity?: string;
  readonly sources: readonly string[];
  readonly notes: readonly string[];
  readonly invented: boolean;
  readonly coupling: Coupling;
  readonly firstPower: number;
  readonly scheme?: string;
  readonly flavours?: number;
  /** μ/Q. */
  readonly scaleRatio?: Exact;
  readonly hardScale?: Scale;
  /** What R is in units of: "GeV", "pb", or "Q", "Q^p" for a power of the hard scale. Absent: a pure number. */
  readonly unit?: string;
  readonly factor: Exact;
  readonly additive: Exact;
  readonly coefficients: readonly Coefficient[];
  /** Correlation matrix of the coefficient errors. */
  readonly correlation?: readonly (readonly Rational[])[];
  readonly singularities: readonly KnownSingularity[];
  readonly condensates: readonly Condensate[];
  readonly strongCoupling?: StrongCoupling;
  /** Name of the quantity whose large-β0 limit continues the series to all orders. */
  readonly bubbleChain?: string;
  readonly measurement?: Uncertain & { readonly unit?: string; readonly source?: string };
  /**
   * The coefficients are those of D = Σ c_n x^(n + firstPower), x at the scale −s, and the quantity is
   * R = additive + factor · (1/2πi) ∮_{|s| = s_0} ds/s W(s/s_0) D(s),  W(x) = 2 ∫_x^1 w(x′) dx′.
   */
  readonly contour?: ContourWeight;
  /** Of a contour quantity as one power series in the coupling at s_0: the series as its file has it. */
  readonly expandedFrom?: Series;
  /** Named constants that the expressions of the file use. */
  readonly constants?: readonly { readonly name: string; readonly text: string }[];
  /** True when nf enters a coefficient: the same file then serves other numbers of flavours. */
  readonly anyFlavours?: boolean;
  /** Flavour numbers the series is meant for, when the file limits them. */
  readonly flavourChoices?: readonly number[];
  /** Published values that the coefficients must reproduce, first coefficient first. */
  readonly checks?: readonly SeriesCheck[];
}

/** Decimal values of the first coefficients at a number of flavours, right to half a unit of their last digit. */
export interface SeriesCheck {
  readonly flavours?: number;
  readonly values: readonly string[];
  readonly source?: string;
}
