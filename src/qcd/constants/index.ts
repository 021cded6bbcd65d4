/** @module Public face of the constants: each stands once, exact, with its source. */
export { BETA } from './beta.js';
export { BETA_GROUP } from './beta-group.js';
export { QED, colourOfSU, forGroup, type ColourFactors } from './colour.js';
export { formalAt, formalOf, type PublishedConstant, type Status } from './constant.js';
export { DECOUPLING_ALPHA, DECOUPLING_MASS } from './decoupling.js';
export * from './formal.js';
export { exactOfFormal, numberOfFormal } from './formal-value.js';
export { INPUTS, type Input, type InputName } from './inputs.js';
export { MASS_DIMENSION } from './mass-dimension.js';
export { MASS_DIMENSION_GROUP } from './mass-dimension-group.js';
export { MINIMOM } from './minimom.js';
export { POLE_OVER_MSBAR } from './pole-mass.js';
export { POTENTIAL, POTENTIAL_ULTRASOFT } from './potential.js';
