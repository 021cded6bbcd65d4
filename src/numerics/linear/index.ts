/** @module The public face of linear algebra. */
export type { Factorisation, LuResult, Matrix } from './lu.js';
export { determinantField, lu, solveFactored, solveField } from './lu.js';
export { determinantExact } from './bareiss.js';
export { cholesky } from './cholesky.js';
export type { NotSemidefinite } from './cholesky.js';
export { solveBall } from './solve-ball.js';
export { conditionEstimate } from './condition.js';
