/** @module Papers: results as tables for papers and repositories, and as one page to read. */
export { PAPER_FORMS, paperText } from './forms.js';
export type { PaperForm } from './forms.js';
export { TABLED, tablesOf } from './of-result.js';
export type { CommandResult } from './of-result.js';
export type { Cell, Column, Measured, NamedError, PaperTable } from './table.js';
export { reportPage } from './page/page.js';
export type { ReportInput } from './page/page.js';
export { compareResults } from './replay.js';
export type { Difference, Replay } from './replay.js';
