/** @module The public face of the report room: plain results in, text out. */
export { catalogueText, plainSeries, seriesText } from './catalogue.js';
export { catalogueCheckText, catalogueProblems } from './catalogue-check.js';
export { contourLines, contourText } from './contour.js';
export { evolveText } from './evolve.js';
export { plainJson, resultJson } from './json.js';
export { rough } from './layout/figures.js';
export { Page, type Fact } from './layout/page.js';
export type { TableNote, TableRow } from './layout/table.js';
export type { Paint, Tone } from './layout/paint.js';
export { inAscii, painter, unpainted } from './layout/paint.js';
export { asciiOf } from './layout/letters.js';
export type { TerminalOptions } from './terminal.js';
export { truncationLines, truncationObject, truncationText } from './truncation.js';
export { assessmentText, bareValues, growthText, planeLines, planeText, sumText } from './terminal.js';
export { backtestCsv, backtestLines, backtestText } from './backtest.js';
export { backtestSummaryLines, backtestSummaryText } from './backtest-summary.js';
export { compareCsv, compareLines, compareText } from './compare.js';
