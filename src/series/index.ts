/** @module The public face of the series room: file, catalogue, exact coefficients, expansions. */
export type {
  Coefficient,
  Condensate,
  ContourWeight,
  Coupling,
  Divisor,
  KnownSingularity,
  Scale,
  Series,
  SeriesCheck,
  SingularityKind,
  Uncertain,
} from './series.js';
export type { ContourOrigin, Expansion, Running, StatedSingularity } from './expansion.js';
export { InputError, describeProblem } from './input-error.js';
export type { Problem } from './input-error.js';
export { nearest, suggestion } from './nearest.js';
export { NUMBER_FORMS, parseUncertain } from './uncertain.js';
export { parseStrongCoupling } from './read-strong-coupling.js';
export type { ReadNumber } from './uncertain.js';
export { isNumberProblem } from './number-text.js';
export type { NumberProblem } from './number-text.js';
export { decimalText, textOf, written } from './written.js';
export type { Written } from './written.js';
export { parseTree } from './expression/tree.js';
export type { SyntaxTree } from './expression/syntax.js';
export { loadSeries, parseSeries } from './load.js';
export { coefficientsAt } from './other-flavours.js';
export type { LoadOptions, ParseOptions, SeriesForm } from './load.js';
export { writeSeries } from './write.js';
export { checkSeries } from './check.js';
export { catalogueFolder, catalogueIds, catalogueText, listCatalogue, nearestCatalogueId } from './catalogue.js';
export type { CatalogueEntry } from './catalogue.js';
export { LIMITS } from './limits.js';
export { parseWeight, weightText } from './weights.js';
export { loadPlainTree } from './plain-tree.js';
export type { PlainTree } from './plain-tree.js';
export { readTextFile } from './bytes.js';
