/** @module From measured numbers to couplings, masses and condensates: values by prescription, with their budgets. */
export { extract } from './extract.js';
export { fit } from './fit/study.js';
export { inUnitOfSeries } from './unit-of-series.js';
export { USUAL } from './setting.js';
export { AMBIGUITY_NAMES, UNKNOWNS } from './problem.js';
export type {
  AmbiguityName,
  CondensateChoice,
  CondensateDefinition,
  Datum,
  Problem,
  Quantity,
  Unknown,
} from './problem.js';
export type * from './result.js';
export type * from './fit/fit-result.js';
export { bubbleLaboratory, bubbleValue } from './bubble-laboratory.js';
export { bubbleCut } from './bubble-cut.js';
export { BUBBLE_VIEWS, bubbleView } from './bubble-views.js';
export { chainSeries } from './bubble-series.js';
export type { BubbleQuestion } from './bubble-words.js';
export type * from './bubble-result.js';
export { thresholdObjection, thresholdSeries } from './threshold-mass.js';
export type { ThresholdMass } from './threshold-mass.js';
export { REPLICA_LIMITS, replicate } from './replicas/study.js';
export type { RunOptions as ReplicaOptions } from './replicas/run.js';
export type * from './replicas/result.js';
export { seriesCut } from './series-cut/study.js';
export { lowMomentumSeries, lowMomentumStrength, lowMomentumSum } from './series-cut/low-momenta.js';
export type { LowMomentumSum } from './series-cut/low-momenta.js';
export type { SeriesCutQuestion } from './series-cut/setting.js';
export type { SeriesCutResult, SeriesCutRow, SeriesCutValues } from './series-cut/result.js';
