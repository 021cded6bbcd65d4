/** @module Bubble chains: quantities whose large-β0 limit is known exactly, with their Borel transforms, sums and momenta. */
export { QUANTITIES, QUANTITY_NAMES, quantityNamed } from './quantities.js';
export type { Quantity, QuantityName } from './quantity.js';
export { chainCoefficients, exactForms } from './coefficients.js';
export { chainSum } from './borel-sum.js';
export type { ChainSum } from './borel-sum.js';
export { borelPoles, imaginaryShare, leadingStrength } from './singularities.js';
export type { BorelPole } from './singularities.js';
export { betaNought, lambdaOverQ, landauOverQ, rangeObjection } from './point.js';
export type { ChainPoint } from './point.js';
export { formText } from './exact-text.js';
export { couplingA, logLength } from './point.js';
export { cutCoefficients, cutObjection, cutSum, couplingAtCut, lowPart } from './cut.js';
export type { CutCoefficients, CutSum } from './cut.js';
export { distribution, orderScales } from './momentum.js';
export type { OrderScale } from './momentum.js';
export { massiveGluon } from './dispersive.js';
export type { MassiveGluon } from './dispersive.js';
export { factorBall } from './tower.js';
