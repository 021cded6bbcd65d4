/**
 * @module Thresholds of the verdict, all heuristic, in one place; docs/methods/growth.md explains them.
 */
import type { Estimate, GrowthVerdict } from './growth.js';

/** Fewest known coefficients for any statement. */
export const MIN_COEFFICIENTS = 4;
/** When quoted errors hide coefficients, this many must remain. */
export const MIN_AFTER_LOSS = 6;
/** Up to this many coefficients count as a short series. */
export const SHORT = 7;
/** Up to this many, the rule for short series may decide for factorial growth when the fitted order does not. */
export const MIDDLE = 12;

export const SHORT_RULE = {
  /** Grades of the Bayes factor (Kass–Raftery): positive from 3 on, strong from 20 on, very strong from 150 on. */
  positive: 3,
  strong: 20,
  veryStrong: 150,
  /** From six coefficients on a regular sign pattern supports factorial growth, and this factor is enough. */
  sixPoints: 10,
  /** |λ_n − λ_{n−1}|/|λ_n| below this: the ratio test has settled … */
  settled: 0.25,
  /** … provided that λ_n is known to this part of itself. */
  linearError: 0.5,
  /** Orders of the last ratios that may belong to n!. */
  factorial: { low: 0.4, high: 1.7 },
  /** Orders of the last ratios that may belong to a geometric series; below `flat` they need not fall. */
  geometric: 0.35,
  flat: 0.1,
  /** … and to a convergent one. */
  convergent: -0.6,
  /** Fewest coefficients for "geometric" and "convergent": four or five terms of an asymptotic series often look so. */
  tameCoefficients: 6,
  /** Up to this many coefficients an open question is one of length. */
  few: 5,
  /** Superfactorial: fewest coefficients, and steadiness of the local order. */
  superCoefficients: 7,
  superSteady: 0.2,
} as const;

export interface Region {
  readonly verdict: GrowthVerdict;
  readonly low: number;
  readonly high: number;
}

/** Regions of the order s; what lies between belongs to neither. */
export const REGIONS: readonly Region[] = [
  { verdict: 'convergent', low: -Infinity, high: -0.22 },
  { verdict: 'geometric', low: -0.12, high: 0.12 },
  { verdict: 'subfactorial', low: 0.3, high: 0.75 },
  { verdict: 'factorial', low: 0.9, high: 1.15 },
  { verdict: 'superfactorial', low: 1.35, high: Infinity },
];
/** An order known worse than COARSE is compared with the familiar laws only, and must not contradict the Bayes factor. */
export const COARSE = 0.06;
export const COARSE_REGIONS: readonly Region[] = [
  { verdict: 'convergent', low: -Infinity, high: -0.5 },
  { verdict: 'geometric', low: -0.1, high: 0.1 },
  { verdict: 'factorial', low: 0.9, high: 1.1 },
  { verdict: 'superfactorial', low: 1.8, high: Infinity },
];

export const LONG_RULE = {
  /** Smallest error that the order is given credit for. */
  orderError: 0.04,
  /** The order must lie within this many errors of its region … */
  within: 2,
  /** … and the region be this much likelier than any other. */
  likelier: 3,
  /** Subfactorial growth lies between two familiar laws, and a large exponent γ imitates it: order known this well, from
   * this many coefficients, the last ratios agreeing. */
  subfactorial: { error: 0.06, coefficients: 16, local: 0.08 },
  /** Superfactorial or convergent behaviour in fewer coefficients than this needs a steady order of the last ratios. */
  steady: { coefficients: 16, change: 0.2 },
} as const;

export interface Classified {
  readonly verdict: GrowthVerdict;
  /** Measured order per power of x, where one was fitted. */
  readonly order?: Estimate;
  /** Why not more: completes "undecided: …". */
  readonly reason: string;
  /** The order itself grows: faster than any (kn)!. */
  readonly beyond: boolean;
}

export const undecided = (reason: string, order?: Estimate): Classified => ({
  verdict: 'undecided',
  reason,
  beyond: false,
  ...(order === undefined ? {} : { order }),
});
