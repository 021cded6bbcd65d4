/** @module Sequence transformations: from terms or partial sums to an estimate of the limit, over any number field. */
export { aitkenColumns } from './aitken.js';
export { epsilonColumns, epsilonStaircase } from './epsilon.js';
export type { Element } from './epsilon.js';
export { eulerSums } from './euler.js';
export { levinDiagonal, wenigerDiagonal } from './levin.js';
export type { LevinVariant } from './levin.js';
export { mapScale, orderDependentSum } from './order-mapping.js';
export type { MappedSum, StrongCoupling } from './order-mapping.js';
export { differences, sumsOf } from './sums.js';
export { thetaColumns } from './theta.js';
