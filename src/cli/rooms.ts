/**
 * @module The rooms below, in one piece. Commands load it with import() when they start to work, so that --help costs
 * nothing of it; in one piece, because one file of half a megabyte loads faster than six that share it.
 */
export * as numerics from '../numerics/index.js';
export * as prescriptions from '../prescriptions/index.js';
export * as qcd from '../qcd/index.js';
export * as report from '../report/index.js';
export * as series from '../series/index.js';
export * as studies from '../studies/index.js';
export * as truncation from '../truncation/index.js';
