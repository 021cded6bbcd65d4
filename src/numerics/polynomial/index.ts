/** @module The public face of polynomials, Padé approximants and roots. */
export type { RationalPoly } from './rational-poly.js';
export {
  addPoly,
  degreePoly,
  derivativePoly,
  divideExactPoly,
  divmodPoly,
  equalPoly,
  evaluatePoly,
  gcdPoly,
  mulPoly,
  scalePoly,
  subPoly,
  trimPoly,
} from './rational-poly.js';
export type { SquarefreeFactor } from './squarefree.js';
export { squarefree } from './squarefree.js';
export { countNegativeRealRoots, countPositiveRealRoots, countRealRoots, countRealRootsIn } from './real-root-count.js';
export type { MissingEntry, PadeEntry, PadeFraction, UndecidedEntry } from './pade-types.js';
export { padeExact } from './pade-exact.js';
export { padeBall } from './pade-ball.js';
export { padeField } from './pade-field.js';
export type { TableEntry, TableRange } from './pade-table.js';
export { padeTable } from './pade-table.js';
export type { JacobiCoefficients } from './pade-moments.js';
export { jacobiFromMoments, reversedOrthogonal } from './pade-moments.js';
export type { PadePoles } from './pade-poles.js';
export { padePoles } from './pade-poles.js';
export type { PartialFractions, Pole } from './partial-fractions.js';
export { partialFractions } from './partial-fractions.js';
export type { CertifiedRoot, RootsResult } from './roots.js';
export { certifiedRoots } from './roots.js';
export { DoubleRoots, rootsDouble } from './double-roots.js';
export { PadeDouble, padeDouble } from './pade-double.js';
