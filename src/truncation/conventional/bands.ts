/** @module The bands of a conventional estimate: its size at 68 %, a multiple of it at 95 %. */
import { symmetric, type Estimate, type Question } from '../model.js';

export function conventionalBands(size: number, { priors }: Pick<Question, 'priors'>): Estimate['bands'] {
  const half = Math.abs(size);
  return { 68: symmetric(half), 95: symmetric(half * priors['conventional.double']) };
}
