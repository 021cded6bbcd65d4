/** @module Studies: one question the user asks, one plain result. */
export { assess, prescriptionsNamed, sumUp } from './assess.js';
export type { AssessOptions } from './assess.js';
export type * from './assessment.js';
export { growthStudy, planeStudy, sumStudy } from './parts.js';
export type { GrowthResult, PlaneResult, SumResult } from './parts.js';
export { VERSION } from './version.js';
export { truncationStudy } from './truncation.js';
export type { TruncationEstimate, TruncationOptions, TruncationResult } from './truncation.js';
export type { BandText } from './truncation-answer.js';
export type { Fell, TruncationOrder, TruncationRecord } from './truncation-by-order.js';
export { evolveStudy } from './evolve.js';
export type { EvolveError, EvolveRequest, EvolveResult, EvolveStep } from './evolve-types.js';
