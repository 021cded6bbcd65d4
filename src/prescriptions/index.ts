/** @module All prescriptions, in the order in which they are shown. */
import { blm } from './blm.js';
import { borelDlog } from './borel-dlog.js';
import { borelHypergeometric } from './borel-hypergeometric.js';
import { borelPade2 } from './borel-pade-2.js';
import { borelLeroyPade, borelPade } from './borel-pade.js';
import { borelPartialPade } from './borel-partial-pade.js';
import { borelQuadratic } from './borel-quadratic.js';
import { conformalBorel } from './conformal.js';
import { euler } from './euler.js';
import { fac } from './fac.js';
import { fixedOrder } from './fixed-order.js';
import { hyperasymptotic } from './hyperasymptotic.js';
import { leastTermSum } from './least-term.js';
import { levin } from './levin.js';
import { orderDependentMap } from './order-dependent-map.js';
import { pade } from './pade.js';
import { pms } from './pms.js';
import type { Prescription } from './prescription.js';
import { scaleVariation } from './scale-variation.js';
import { singularityModel } from './singularity-model.js';
import { terminantSum } from './terminant.js';
import { wenigerDelta } from './weniger-delta.js';
import { wynnEpsilon } from './wynn-epsilon.js';

export const PRESCRIPTIONS: readonly Prescription[] = [
  fixedOrder,
  leastTermSum,
  terminantSum,
  hyperasymptotic,
  scaleVariation,
  fac,
  pms,
  blm,
  pade,
  wynnEpsilon,
  levin,
  wenigerDelta,
  euler,
  orderDependentMap,
  borelPade,
  borelLeroyPade,
  borelDlog,
  borelPartialPade,
  borelQuadratic,
  conformalBorel,
  borelHypergeometric,
  borelPade2,
  singularityModel,
];

export type { Outcome, Prescription, Refusal, Request, Sum, Trust } from './prescription.js';
export { leastTerm, partialSums, prefactor, terms } from './prescription.js';
export { BUBBLE_CHAIN, bubbleChain } from './bubble-chain.js';
export type { BubbleEngine } from './bubble-chain.js';
export { CONTOUR_NAMES } from './contour-names.js';
export { contourPrescriptions } from './contour-quantities.js';
export type { ContourEngine } from './contour-quantities.js';
export { innermostPole, leroyParameter, noiseOf } from './borel-pade.js';
export { innermostRest, knownFactors } from './borel-partial-pade.js';
export { placeOf } from './climb.js';
export { cutsOf, memberLabel } from './conformal.js';
export { cleanPart, pairConfirmed, termsBeforeAlternation } from './eligibility.js';
export { flavourPolynomials } from './flavour-polynomials.js';
export { imaginaryPieces, modelUsed } from './singularity-model.js';
export { nextCoefficient } from './next-coefficient.js';
