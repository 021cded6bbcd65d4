/** @module The kinds of chart, and which results each is drawn from. */
import type {
  Assessment,
  BacktestResult,
  BacktestSummary,
  CompareResult,
  LaplaceIntegrand,
  GrowthResult,
  PlaneResult,
  ScaleDependence,
  SumResult,
} from '../studies/index.js';
import type { ExtractResult, FitResult } from '../extraction/index.js';
import type { Chart } from './chart.js';
import { budgetChart } from './kinds/budget.js';
import { coverageChart } from './kinds/coverage.js';
import { integrandChart } from './kinds/integrand.js';
import { planeChart } from './kinds/plane.js';
import { replicasChart } from './kinds/replicas.js';
import type { DrawnReplicas } from './kinds/replicas.js';
import { ratiosChart } from './kinds/ratios.js';
import { scaleChart } from './kinds/scale.js';
import { termsChart } from './kinds/terms.js';
import { valuesChart } from './kinds/values.js';

/** A result as --json writes it: what it is stands in its request. */
export interface SavedResult {
  readonly request: { readonly command: string; readonly [key: string]: unknown };
}

export interface ChartKind {
  readonly name: string;
  readonly summary: string;
  /** Commands whose results it draws, the one that is run for a series first. */
  readonly from: readonly string[];
  /** What the result must hold, where not every result of these commands does. */
  readonly wants?: string;
  draw(result: SavedResult): Chart;
}

/** What a result holds, its command has said. */
export const CHART_KINDS: readonly ChartKind[] = [
  {
    name: 'terms',
    summary: 'terms and partial sums against the order',
    from: ['assess'],
    draw: (result) => termsChart(result as SavedResult & Assessment),
  },
  {
    name: 'ratios',
    summary: 'ratios of coefficients against 1/n, with extrapolants',
    from: ['assess', 'growth'],
    draw: (result) => ratiosChart(result as SavedResult & GrowthResult),
  },
  {
    name: 'plane',
    summary: 'the Borel plane: poles, expected singularities',
    from: ['assess', 'plane'],
    draw: (result) => planeChart(result as SavedResult & PlaneResult),
  },
  {
    name: 'values',
    summary: 'values by prescription with their errors',
    from: ['compare', 'assess', 'sum'],
    draw: (result) => valuesChart(result as SavedResult & (Assessment | SumResult | CompareResult)),
  },
  {
    name: 'scale',
    summary: 'sums against the renormalisation scale, order by order',
    from: ['scale'],
    draw: (result) => scaleChart(result as SavedResult & ScaleDependence),
  },
  {
    name: 'integrand',
    summary: 'the Borel integrand along its contour',
    from: ['integrand'],
    draw: (result) => integrandChart(result as SavedResult & LaplaceIntegrand),
  },
  {
    name: 'coverage',
    summary: 'coverage of stated errors in back-tests',
    from: ['backtest'],
    draw: (result) => coverageChart(result as SavedResult & (BacktestResult | BacktestSummary)),
  },
  {
    name: 'budget',
    summary: 'the error budget of an extraction',
    from: ['extract'],
    wants: 'an extraction in which a prescription has a value',
    draw: (result) => budgetChart(result as SavedResult & (ExtractResult | FitResult)),
  },
  {
    name: 'replicas',
    summary: 'the histogram of an extraction with replicas',
    from: ['extract'],
    wants: 'the result of extract with --replicas 10000 --json',
    draw: (result) => replicasChart(result as SavedResult & { readonly replicas?: DrawnReplicas }),
  },
];

export const chartKind = (name: string): ChartKind | undefined => CHART_KINDS.find((entry) => entry.name === name);

/** Is a value that was read from a file a saved result? */
export function isSavedResult(value: unknown): value is SavedResult {
  if (typeof value !== 'object' || value === null || !('leastterm' in value) || !('request' in value)) return false;
  const { request } = value;
  return typeof request === 'object' && request !== null && 'command' in request && typeof request.command === 'string';
}
