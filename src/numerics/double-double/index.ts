/** @module Double-double arithmetic: real operations, elementary functions, complex numbers. */
export * from './real.js';
export { atan2, exp, log, sinCos } from './elementary.js';
export * as complex from './complex.js';
