/** @module The plain results of `backtest`. Sizes are in units of the target unless said otherwise; numbers are decimal strings. */
import type { Caution, CouplingSummary, Refused, SeriesSummary, ValueRecord } from '../assessment.js';
import type { EstimateTrial } from './estimates.js';

export interface BacktestTrial {
  readonly hidden: number;
  /** Highest order that was seen. */
  readonly through: number;
  readonly variant?: string;
  /** The predicted value and its stated error, absolute. */
  readonly value?: string;
  readonly error?: string;
  /** (predicted − target)/|target| for each target. */
  readonly misses: readonly {
    readonly against: ValueRecord['against'];
    readonly miss: string;
    readonly inside: boolean;
  }[];
  /** The next coefficient that the method implies, against the known one. */
  readonly next?: {
    readonly order: number;
    readonly predicted: string;
    readonly actual: string;
    readonly miss?: string;
  };
  readonly refused?: Refused;
}

export interface BacktestMethod {
  readonly prescription: string;
  readonly family: string;
  /** One for each target; the first one decides the order and the verdict. */
  readonly records: readonly ValueRecord[];
  readonly trials: readonly BacktestTrial[];
}

export interface EstimateRecord {
  readonly against: EstimateTrial['against'];
  readonly tested: number;
  readonly inside68: number;
  readonly inside95: number;
  readonly bias: string;
  readonly sharpness: string;
  readonly score68: string;
  readonly score95: string;
}

export interface BacktestEstimate {
  readonly model: string;
  readonly title: string;
  readonly nature: 'credible' | 'conventional';
  readonly about: 'next term' | 'remainder';
  readonly records: readonly EstimateRecord[];
  readonly trials: readonly {
    readonly hidden: number;
    readonly against: EstimateTrial['against'];
    readonly fell: EstimateTrial['fell'];
  }[];
  readonly refusals: readonly { readonly hidden: number; readonly reason: string }[];
}

export interface BacktestResult {
  readonly leastterm: string;
  readonly request: CouplingRequest;
  readonly series: SeriesSummary;
  readonly coupling: CouplingSummary;
  /** Computed coefficients; estimated ones are no test. */
  readonly known: number;
  readonly hidden: readonly number[];
  /** What the first records are held against. */
  readonly target: { readonly against: ValueRecord['against']; readonly value?: string; readonly statement: string };
  readonly prescriptions: readonly BacktestMethod[];
  readonly estimates: readonly BacktestEstimate[];
  readonly cautions: readonly Caution[];
}

type CouplingRequest = { readonly [key: string]: string | number | boolean | readonly string[] };

/** One method over many series. */
export interface PooledMethod {
  readonly method: string;
  readonly kind: 'prescription' | 'truncation error';
  readonly about?: 'next term' | 'remainder';
  readonly series: number;
  readonly tested: number;
  readonly inside68: number;
  readonly inside95?: number;
  /** Shares of tested, and one standard error of the first one if the tests were independent (they are not quite). */
  readonly coverage68: string;
  readonly coverage95?: string;
  readonly coverageError: string;
  /** Medians over the series. */
  readonly bias: string;
  readonly sharpness?: string;
  readonly score: string;
}

export interface BacktestSummary {
  readonly leastterm: string;
  readonly request: CouplingRequest;
  readonly results: readonly BacktestResult[];
  readonly skipped: readonly { readonly series: string; readonly reason: string }[];
  readonly summary: readonly PooledMethod[];
}
