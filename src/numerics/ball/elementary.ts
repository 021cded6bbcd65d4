/** @module Real elementary functions on balls: one face for exp, log, trigonometric and power functions. */
export { exp, expm1, sinh, cosh, tanh } from './exp.js';
export { log, log1p } from './log.js';
export { sinCos, sinCosPi, atan, atan2 } from './trig.js';
export type { SinCos } from './trig.js';
export { pow } from './pow.js';
