/** @module The public face of quadrature. */
export type { CertifiedOptions } from './certified.js';
export { awayFromCut, integrateAnalytic } from './certified.js';
export type { EndIntegrand } from './double-exponential.js';
export { expRay, tanhSinh } from './double-exponential.js';
export type { Rule } from './legendre.js';
export { legendreRule } from './legendre.js';
export { gaussPanels, rayPoints } from './panels.js';
export type { Integral, Integrand } from './types.js';
