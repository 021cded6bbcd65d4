/** @module The special functions in double precision: for replicas and plots, to stated tolerances, not certified. */
export { gammaDouble, rgammaDouble, logGammaDouble, digammaDouble } from './gamma-double.js';
export { branchSameDouble, branchAlternatingDouble } from './branch-double.js';
export type { BranchDouble } from './branch-double.js';
export { branchCutDouble } from './branch-cut-double.js';
export { scaledE1Double } from './expint-double.js';
export type { ComplexDouble } from './expint-double.js';
