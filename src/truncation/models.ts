/** @module All truncation-error models, in the order in which they are shown. */
import { abc } from './bayesian/abc.js';
import { cacciariHoudeau } from './bayesian/cacciari-houdeau.js';
import { geometric } from './bayesian/geometric.js';
import { modifiedCacciariHoudeau } from './bayesian/modified-ch.js';
import { renormalonCacciariHoudeau } from './bayesian/renormalon-ch.js';
import { facNext } from './conventional/fac-next.js';
import { geometricTail } from './conventional/geometric-tail.js';
import { lastRatio } from './conventional/last-ratio.js';
import { lastTerm } from './conventional/last-term.js';
import { leastTerm } from './conventional/least-term.js';
import { remainder } from './conventional/remainder.js';
import { padeNext } from './conventional/pade-next.js';
import { guarded } from './guard.js';
import type { TruncationModel } from './model.js';
import { scaleAveraged, scaleMarginalised } from './scale/average.js';
import { scaleEnvelope } from './scale/envelope.js';

export const TRUNCATION_MODELS: readonly TruncationModel[] = [
  lastTerm,
  lastRatio,
  geometricTail,
  leastTerm,
  remainder,
  padeNext,
  facNext,
  scaleEnvelope,
  cacciariHoudeau,
  modifiedCacciariHoudeau,
  renormalonCacciariHoudeau,
  geometric,
  abc,
  scaleMarginalised,
  scaleAveraged,
].map(guarded);
