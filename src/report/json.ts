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

export type AssessmentKey = (typeof KEYS)[number];

const write = (value: object): string => `${JSON.stringify(value, null, 2)}\n`;

/** The whole assessment, or the named sections of it, always with version, request and series. */
export function assessmentJson(assessment: Assessment, sections?: readonly AssessmentKey[]): string {
  const wanted = sections === undefined ? KEYS : KEYS.filter((key, i) => i < 3 || sections.includes(key));
  return write(Object.fromEntries(wanted.map((key) => [key, assessment[key]])));
}

/** Any other plain object, such as the list of the catalogue. */
export const plainJson = write;
