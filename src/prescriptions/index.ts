/** @module All prescriptions, in the order in which they are shown. */
import { borelLeroyPade, borelPade } from './borel-pade.js';
import { borelPade2 } from './borel-pade-2.js';
import { fixedOrder } from './fixed-order.js';
import { leastTermSum } from './least-term.js';
import { pade } from './pade.js';
import type { Prescription } from './prescription.js';
import { singularityModel } from './singularity-model.js';
import { terminantSum } from './terminant.js';

export const PRESCRIPTIONS: readonly Prescription[] = [
  fixedOrder,
  leastTermSum,
  terminantSum,
  pade,
  borelPade,
  borelLeroyPade,
  borelPade2,
  singularityModel,
];

export type { Outcome, Prescription, Refusal, Request, Sum, Trust } from './prescription.js';
export { leastTerm, partialSums, prefactor, terms } from './prescription.js';
export { leroyParameter } from './borel-pade.js';
export { imaginaryPieces } from './singularity-model.js';
export { nextCoefficient } from './next-coefficient.js';
