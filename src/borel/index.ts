/** @module Borel transforms, Padé tables of them, Laplace sums in closed form, singularity models. */
export { approximate, approximateTransformed } from './approximant.js';
export type { Approximant, RatedPole } from './approximant.js';
export { branchCoefficients, branchImaginary, branchSum } from './branch.js';
export type { Branch } from './branch.js';
export { inverseMapSeries, mapTo, remap, remappedValues } from './conformal.js';
export type { CutEnd, Cuts, Remapped, Softening } from './conformal.js';
export { crossingJump, laplace, residueWeight } from './laplace.js';
export type { LaplaceSum, PolePart } from './laplace.js';
export { fitModel, modelSum } from './model.js';
export type { ModelFit, ModelSingularity, ModelSum } from './model.js';
export { NEAR_AXIS_ANGLE, nearAxisPoles, rationalSum } from './rational-sum.js';
export type { RationalSum } from './rational-sum.js';
export { lateralSums, rayBelow, rayIntegral } from './ray.js';
export type { Landscape, RayIntegrand } from './ray.js';
export { nearDiagonal, padeOf } from './table.js';
export { borelTransform, borelTransformOrder2 } from './transform.js';
