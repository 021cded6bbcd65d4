/**
 * @module The library: read a series, study it, print the result.
 *
 *     const series = await loadSeries('adler');
 *     const at = parseUncertain('0.3156(30)');
 *     if (!isNumberProblem(at)) console.log(assess(series, at, { digits: 15, request: {} }).verdict.printed);
 */
export * from './series/index.js';
export * from './studies/index.js';
export { assessmentText, growthText, planeText, resultJson, sumText } from './report/index.js';
export type { TerminalOptions } from './report/index.js';
export { roundPdg, writeParentheses, writePlusMinus } from './numerics/index.js';
export type { ErrorText, RoundedValue } from './numerics/index.js';
export { PRESCRIPTIONS } from './prescriptions/index.js';
export type { Prescription } from './prescriptions/index.js';
