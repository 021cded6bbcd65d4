/** @module Public face of the contour room: quantities on a circle |s| = s_0, by every prescription that has a name. */
export { contourSum } from './double.js';
export type { ContourExpansion, FastContour } from './double.js';
export type { ContourAnswer, ContourQuantity, ContourRequest } from './answers.js';
export { CONTESTED } from './answers.js';
export { improvedAnswers } from './answer-improved.js';
export { modelAnswers, padeAnswers } from './answer-borel.js';
export { subtractedAnswers } from './answer-subtracted.js';
export { contourReport } from './report.js';
export type { ReportOptions } from './report.js';
export type { BorelRow, ContourReport, OrderRow, PowerRow, SubtractedReport, SummedTerm } from './report-types.js';
export type { Norm } from './normalisation.js';
