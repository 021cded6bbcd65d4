/** @module The machine's form: one stable object, keys in the documented order, numbers as decimal strings. */
import type { Assessment } from '../studies/index.js';

/** Top-level keys in the order in which they are written. */
const KEYS = [
  'leastterm',
  'request',
  'series',
  'coupling',
  'terms',
  'growth',
  'borelPlane',
  'values',
  'ambiguity',
  'powerCorrection',
  'optimalTruncation',
  'verdict',
  'cautions',
] as const satisfies readonly (keyof Assessment)[];

/** Any plain object, such as the list of the catalogue. */
export const plainJson = (value: object): string => `${JSON.stringify(value, null, 2)}\n`;

/** An assessment, or the part of one that a study returns. */
export function resultJson(result: Partial<Assessment>): string {
  return plainJson(Object.fromEntries(KEYS.filter((key) => key in result).map((key) => [key, result[key]])));
}
