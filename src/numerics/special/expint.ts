/** @module Exponential integrals, scaled: e^w E₁(w) on the cut plane and e^−x Ei(x) on the positive axis. */
export { scaledE1 } from './branch-cut.js';
export { eiScaled } from './branch-same.js';
