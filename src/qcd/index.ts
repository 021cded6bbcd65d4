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
  ultravioletPartner,
  uPerT,
  type ExpectedSingularity,
  type ExpectedSingularityInput,
  type WilsonCoefficient,
} from './expected.js';
export { currentUltraviolet, fourQuarkShifts } from './four-quark.js';
export { isRefusal, refuse, type Refusal } from './refusal.js';
export { evolveAlpha, evolveLog, type Evolution } from './running/evolve.js';
export { flowOf, logOverLambda, type Flow } from './running/flow.js';
export { LAMBDA_DEFINITIONS, alphaOfLambda, lambdaOf, type LambdaDefinition } from './lambda.js';
export { evolveAlongPath, evolveComplex, pathBlocked } from './running/evolve-complex.js';
export type { ComplexNumber } from './running/complex-number.js';
export { expandedAlpha } from './running/expanded.js';
export {
  evolveMass,
  invariantMass,
  massAtItself,
  type MassAtScale,
  type MassEvolution,
} from './running/evolve-mass.js';
export {
  evolvePath,
  type PathOptions,
  type PathQuestion,
  type PathResult,
  type PathStep,
  type ScalePoint,
} from './matching/path.js';
export { massRatio, matchDown, matchUp, type Matching } from './matching/match.js';
export { MATCHING_ORDER, type HeavyMass, type MatchingTable } from './matching/logs.js';
export { exactTable, doubleTable, formalTableAt, type MatchedQuantity } from './matching/tables.js';
export {
  DEFAULT_THRESHOLDS,
  crossingScale,
  flavoursAt,
  scaledThresholds,
  type Threshold,
} from './matching/thresholds.js';
export * from './constants/index.js';
export * from './rewrite/index.js';
export { exactAlpha, exactLambda, exactMassRatio, type ExactEvolution } from './running/exact-alpha.js';
export { complexAlpha, type ComplexEvolution } from './running/complex-ball.js';
export { ballFlow, ballLogOfInverse, complexBracket, realBracket, type BallFlow } from './running/flow-ball.js';
export {
  MAX_POLE_LOOPS,
  msbarMass,
  poleMass,
  poleMassCoefficientError,
  poleMassCoefficients,
  type MsbarMass,
  type MsbarMassQuestion,
  type PoleMass,
  type PoleMassQuestion,
} from './pole-mass.js';
export {
  leadingNormalisation,
  type Normalisation,
  type NormalisationEstimate,
  type NormalisationMethod,
  type NormalisationQuestion,
} from './normalisation/normalisation.js';
export { asymptoticRatio, borelFactor, sumRule } from './normalisation/estimates.js';
export { exactPath, type ExactPathQuestion, type ExactPathResult } from './matching/exact-path.js';
export { liftExact, type Ring, type RingFormula } from './algebra/ring.js';
export * from './algebra/truncated.js';
export { shiftCoupling } from './algebra/renormalisation.js';
export { polynomialRing } from './algebra/polynomial-ring.js';
