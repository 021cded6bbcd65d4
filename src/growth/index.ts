/** @module Diagnosis of growth: the public face of this room. */
export * from './growth.js';
export { diagnoseGrowth } from './diagnose.js';
