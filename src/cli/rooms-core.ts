/**
 * @module What `assess`, `growth` and `plane` need of the rooms below, by name, in a piece of its own: they load a fifth less than
 * with everything that the other commands use (rooms.ts).
 */
export {
  asciiOf,
  assessmentText,
  growthText,
  inAscii,
  painter,
  planeLines,
  planeText,
  resultJson,
} from '../report/index.js';
export { isNumberProblem, loadSeries, parseStrongCoupling, parseUncertain } from '../series/index.js';
export { assess, growthStudy, planeStudy } from '../studies/index.js';
