/** @module The truncation-error room: how far a truncated sum may lie from the truth, by every model that has a name. */
export { remainderFactor } from './conventional/remainder.js';
export { TRUNCATION_MODELS } from './models.js';
export { LEVELS } from './model.js';
export type {
  Band,
  Estimate,
  Fact,
  Leading,
  Level,
  Nature,
  Question,
  TruncationModel,
  TruncationRefusal,
} from './model.js';
export { competingBracket, type Bracket, type Rival } from './bracket.js';
export { nextOrder, type Known } from './known.js';
export { PRIORS, USUAL_PRIORS, isPriorProblem, priorNames, readPriors } from './priors.js';
export type { PriorName, PriorProblem, Priors } from './priors.js';
export { questionOf, restricted, type Setting } from './question.js';
export { logRows, logTable } from './scale/log-table.js';
