/** @module Exact re-expansion of series: other scales, couplings, numbers of flavours, masses. */
export { multiplyCoefficients, powerOfCoefficients } from './algebra.js';
export {
  circleMoments,
  exactInPiSquared,
  expandOnCircle,
  inPiSquaredText,
  onCircle,
  weightIntegral,
  type InPiSquared,
} from './circle.js';
export { decouplingMassFactor, decouplingRelation, inverseDecouplingRelation, type Decoupling } from './flavours.js';
export { massRatioFormal, massRatioSeries, type MassDefinition, type MassRatioQuestion } from './mass.js';
export {
  chainRelations,
  invertRelation,
  mapMatrix,
  substituteCoupling,
  substituteOver,
  type CoefficientSeries,
  type CouplingRelation,
} from './relation.js';
export { positionPotential } from './potential.js';
export { changeScale, massFactor, scaleLogTable, scaleRelation } from './scale.js';
export {
  betaInCoupling,
  cSchemeBeta,
  cSchemeRelation,
  lambdaRatioExponent,
  minimomRelation,
  potentialRelation,
  relationOfBetas,
} from './schemes.js';
