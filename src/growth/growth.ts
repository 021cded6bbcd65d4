/** @module Plain input and result of the growth diagnosis. Numbers are doubles here; the studies print them with their errors. */
import type { Exact } from '../numerics/index.js';

/**
 * What the terms say about the growth of c_n:
 * factorial (order-1 Gevrey, a Borel singularity at finite distance), geometric (finite radius of convergence),
 * convergent (faster decrease than any geometric: entire), terminating (a polynomial, a constant, zero),
 * superfactorial (order-1 Borel transform has zero radius), subfactorial (divergent but slower than n!: entire Borel
 * transform), undecided (too short, too noisy, or contradictory).
 */
export type GrowthVerdict =
  'factorial' | 'geometric' | 'convergent' | 'terminating' | 'superfactorial' | 'subfactorial' | 'undecided';

export interface GrowthInput {
  /** c_n of x^(n + firstPower), from the first non-zero one on, as log|c_n| and sign: any size is in range. */
  readonly terms: readonly GrowthTerm[];
  /** Positions known beforehand, in t; used to state competition, never to bias the fit. */
  readonly expected: readonly { readonly t: number; readonly exponent?: number; readonly kind: string }[];
  /** The same coefficients exactly, one for each term: the ratio test then runs on enclosures and loses no digit. */
  readonly exact?: readonly Exact[];
  /** Zeros that stood before the first term and were cut off. */
  readonly leadingZeros?: number;
}

export interface GrowthTerm {
  /** ln|c_n|; -Infinity for an exact zero. */
  readonly logAbs: number;
  readonly sign: -1 | 0 | 1;
  /** Relative one-sigma error quoted for (or implied by the digits of) the coefficient; 0 when exact. */
  readonly relativeError: number;
  readonly estimated: boolean;
}

/** A number with the error of the method that found it. */
export interface Estimate {
  readonly value: number;
  readonly error: number;
}

export interface FoundSingularity {
  /** Position: real, or the upper member of a complex pair as modulus and argument. In t. */
  readonly t: Estimate;
  /** Argument in radians, for a complex pair. */
  readonly angle?: Estimate;
  /** γ of (1 − t/t*)^(−γ), for the series counted from its first non-zero coefficient. */
  readonly exponent?: Estimate;
  /** A of A (1 − t/t*)^(−γ); absent where γ is 0, −1, −2, … (a logarithm) within its error. */
  readonly strength?: Estimate;
  /** S of c_n → S Γ(n + γ) t*^(−n): finite for a logarithm too; A = S Γ(γ) otherwise. */
  readonly stokes?: Estimate;
  /** γ is 0, −1, −2, … within its error: the singular part is (1 − t/t*)^(−γ) ln(1 − t/t*). */
  readonly logarithmic?: boolean;
  /** ln|t*|: in range where the double t overflows or underflows. */
  readonly logAbs: number;
  readonly kind: 'positive axis' | 'negative axis' | 'complex pair' | 'both axes';
  /** converged: two different methods agree within their errors; indicative otherwise. */
  readonly standing: 'converged' | 'indicative';
}

export interface GrowthFlag {
  readonly code:
    | 'too-short'
    | 'terminating'
    | 'all-zero'
    | 'lacunary'
    | 'complex-pair'
    | 'competing-singularities'
    | 'noisy'
    | 'few-digits'
    | 'errors-exceed-values'
    | 'outlier'
    | 'superfactorial'
    | 'subfactorial'
    | 'faster-than-any-factorial'
    | 'essential-singularity'
    | 'convergent'
    | 'geometric'
    | 'pre-asymptotic'
    | 'estimated-input'
    | 'leading-zeros';
  readonly text: string;
}

export interface RatioRow {
  readonly n: number;
  /** D_n = c_n / (n c_{n−1}) → 1/t*; for stride p: c_n / (n(n−1)…(n−p+1) c_{n−p}) → t*^(−p). */
  readonly ratio: number;
  /** λ_n = n D_n − (n−1) D_{n−1} (n counted in strides). */
  readonly linear?: number;
  /** Propagated coefficient errors and the method error |λ_n − λ_{n−1}|/2, in quadrature. */
  readonly linearError?: number;
}

export interface GrowthModelComparison {
  readonly points: number;
  readonly rssGeometric: number;
  readonly rssFactorial: number;
  /** K_F:G = (RSS_G/RSS_F)^((n−2)/2), flat priors. */
  readonly bayesFactor: number;
  /** n ln(RSS_G/RSS_F); only from 5 points on. */
  readonly deltaAICc?: number;
  /** e^a of the factorial fit: an estimate of 1/|t*|. */
  readonly inversePosition: number;
  /** Power s of n! preferred by the terms: 0 geometric, 1 factorial, 2 (2n)!. */
  readonly growthOrder?: Estimate;
  /** Kass–Raftery wording. */
  readonly wording: string;
  /** b of the Γ(n + 1 + b) in the factorial model: γ − 1 of the expected singularity, or 0. */
  readonly shift: number;
}

export interface Prediction {
  /** Index of the hidden coefficient. */
  readonly n: number;
  readonly method: string;
  /** (predicted − known)/known. */
  readonly relativeMiss: number;
}

export interface Growth {
  readonly verdict: GrowthVerdict;
  /** Gevrey order when it is established (1 for n!, 2 for (2n)! or (n!)^2, Infinity beyond all). */
  readonly order?: number;
  /** One sentence for people. */
  readonly statement: string;
  readonly standing: 'certified' | 'converged' | 'indicative';
  readonly signPattern: 'same' | 'alternating' | 'quasi-periodic' | 'irregular' | 'lacunary' | 'none';
  /** Nearest singularity of the plain Borel transform Σ c_n t^n/n!; only with factorial growth. */
  readonly nearest?: FoundSingularity;
  /** A second one that the terms resolve. */
  readonly second?: FoundSingularity;
  /** For order 2: the singularity of Σ c_n t^(2n)/(2n)!, the Borel plane of √x. */
  readonly rootPlane?: FoundSingularity;
  /** Radius of convergence in x, for geometric growth. */
  readonly radius?: Estimate;
  /** Step between powers with a non-zero coefficient; 1 unless lacunary. */
  readonly stride?: number;
  readonly ratios: readonly RatioRow[];
  readonly comparison?: GrowthModelComparison;
  readonly predictions: readonly Prediction[];
  /** Competing-singularity diagnostics, in words with numbers. */
  readonly competition: readonly string[];
  /** How many leading coefficients a rational approximant may trust, when noise limits it. */
  readonly usableCoefficients?: number;
  readonly flags: readonly GrowthFlag[];
}
