/**
 * @module Pictures and papers, in a third piece: fonts, PDF and formulas are heavy, and only what draws or typesets pays.
 */
export * as papers from '../papers/index.js';
export * as pictures from '../pictures/index.js';
