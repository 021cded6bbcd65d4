/** @module The public face of random numbers. */
export { LARGEST_SEED, Philox } from './philox.js';
export { Substreams } from './substream.js';
