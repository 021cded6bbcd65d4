/** @module Public face of the contour room: quantities on a circle |s| = s_0, by every prescription that has a name. */
export { contourSum } from './double.js';
export type { ContourExpansion, FastContour } from './double.js';
