/**
 * @module Rooms that only some commands need, in a second piece: what `assess` and its like do not use must not be in the
 * first one, since they would pay for loading it.
 */
export * as bubbles from '../bubbles/index.js';
export * as contour from '../contour/index.js';
export * as extraction from '../extraction/index.js';
export * as masses from '../masses/index.js';
export * as sheets from '../sheets/index.js';
