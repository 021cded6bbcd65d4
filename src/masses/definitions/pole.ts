/** @module The pole mass. */
import type { SubtractedDefinition } from '../definition.js';

export const POLE: SubtractedDefinition = {
  kind: 'subtracted',
  name: 'pole',
  title: 'Pole mass',
  symbol: 'M',
  relativeTo: 'msbar',
  renormalonFree: false,
  orders: 4,
  needsStrength: false,
  pieces: [],
  source: 'Melnikov, van Ritbergen hep-ph/9912391; Marquard et al. arXiv:1606.06754 (four loops, numerical)',
  status: 'rederived',
  notes: ['its series diverges: an ambiguity of order Λ is left whatever is done'],
};
