/** @module Prescriptions in doubles: prepared once for a coefficient list, evaluated at many couplings. */
export type { Kernel } from './kernel.js';
export { makeKernel, readsCircle } from './make.js';
export type { FastSetting } from './make.js';
export { fastSetting } from './settings.js';
