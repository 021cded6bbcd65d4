/** @module Public face of the QCD room: coupling, masses, scales, schemes, expected singularities. */
export {
  MAX_FLAVOURS,
  MAX_LOOPS,
  betaCoefficients,
  betaNumbers,
  massDimensionCoefficients,
  massDimensionNumbers,
  type Loops,
} from './beta-function.js';
export { divisorSize, overFourPi, overFourPiNumber, type CouplingDivisor } from './divisor.js';
export {
  anomalousTerm,
  expectedSingularity,
  uPerT,
  type ExpectedSingularity,
  type ExpectedSingularityInput,
  type WilsonCoefficient,
} from './expected.js';
export { isRefusal, refuse, type Refusal } from './refusal.js';
export { evolveAlpha, evolveLog, type Evolution } from './running/evolve.js';
export { flowOf, logOverLambda, type Flow } from './running/flow.js';
export { LAMBDA_DEFINITIONS, alphaOfLambda, lambdaOf, type LambdaDefinition } from './lambda.js';
