/** @module Studies: one question the user asks, one plain result. */
export { assess, prescriptionsNamed, sumUp } from './assess.js';
export type { AssessOptions } from './assess.js';
export type * from './assessment.js';
export { growthStudy, planeStudy, sumStudy } from './parts.js';
export type { GrowthResult, PlaneResult, SumResult } from './parts.js';
export { VERSION } from './version.js';
export { contourStudy } from './contour/study.js';
export type { ContourResult, ContourStudyOptions } from './contour/study.js';
export type { ContourSum } from './contour/sums.js';
export { truncationStudy } from './truncation.js';
export type { TruncationEstimate, TruncationOptions, TruncationResult } from './truncation.js';
export type { BandText } from './truncation-answer.js';
export type { Fell, TruncationOrder, TruncationRecord } from './truncation-by-order.js';
export { evolveStudy } from './evolve.js';
export type { EvolveError, EvolveRequest, EvolveResult, EvolveStep } from './evolve-types.js';
export { evolveToDigits } from './evolve-digits.js';
export { couplingFromMZ } from './coupling-path.js';
export type { CouplingOptions, EvolvedCoupling } from './coupling-path.js';
export { rewriteStudy } from './rewrite.js';
export type { RewriteRequest } from './rewrite.js';
export { combineStudy } from './combine.js';
export type { CombineRequest, Operand } from './combine.js';
export { couplingScheme, hardScaleOf, schemeText } from './scheme.js';
export type { CouplingScheme } from './scheme.js';
export { backtest } from './backtest.js';
export type { BacktestOptions } from './backtest.js';
export { pool } from './backtesting/pool.js';
export type {
  BacktestEstimate,
  BacktestMethod,
  BacktestResult,
  BacktestSummary,
  BacktestTrial,
  EstimateRecord,
  PooledMethod,
} from './backtesting/result.js';
export { compare, compareScales, SORTS } from './compare.js';
export type { CompareOptions, ComparePoint, CompareResult, CompareRow, Sort, Spread } from './compare.js';
export { isGridProblem, readGrid } from './grid.js';
export type { Grid, GridProblem } from './grid.js';
export { verdictRule, verdictRules } from './verdict-rule.js';
export type { VerdictRule } from './verdict-rule.js';
export { unclearQuark } from './flavours-in-use.js';
export { catalogueCheck } from './catalogue-check.js';
export type { CheckedSeries } from './catalogue-check.js';
export { scaleDependence } from './scale-dependence.js';
export type { ScaleDependence, ScaleDependenceOptions, ScalePointReport } from './scale-dependence.js';
export { laplaceIntegrand } from './laplace-integrand.js';
export type { IntegrandSample, LaplaceIntegrand } from './laplace-integrand.js';
export { CORE } from './assess.js';
export { expand } from './expand.js';
export type { Expanded } from './expand.js';
export { knownLoops } from './scheme.js';
export { ambiguityReport } from './ambiguity-report.js';
export { termTable } from './terms.js';
export { leadingStrength } from './strength-report.js';
export { couplingSummary } from './summary.js';
export { ballText, estimateText, exactText, indicative } from './figures.js';
export { writeVerdict } from './rounding.js';
export { seriesSummary } from './summary.js';
export { valueCautions } from './comparing-cautions.js';
export { verdict } from './verdict.js';
export type { Evaluated } from './values.js';
export { fixedOrderOf, fixedOrderSeries } from './contour/moment.js';
