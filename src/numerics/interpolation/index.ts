/** @module The public face of interpolation. */
export { chebyshevMap, MapReader } from './chebyshev-map.js';
export type { ChebyshevMap, ManyVariables } from './chebyshev-map.js';
