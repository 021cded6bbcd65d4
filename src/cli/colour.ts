/**
 * @module Whether to colour. One decision for one stream, in this order: the flag, NO_COLOR, FORCE_COLOR, TERM, and
 * whether the stream is a terminal. The colour library's own guess ignores NO_COLOR and is not asked.
 * Reference: no-color.org for NO_COLOR (counts when set and not empty).
 */

export type ColourLevel = 0 | 1 | 2 | 3;

export interface ColourQuestion {
  /** --no-color was given. */
  readonly refused: boolean;
  readonly isTerminal: boolean;
  readonly environment: Readonly<Record<string, string | undefined>>;
}

const isSet = (value: string | undefined): value is string => value !== undefined && value !== '';

/** FORCE_COLOR: 0 and false forbid, 1 to 3 choose, anything else (empty too) means yes. */
function forced(value: string): ColourLevel {
  if (value === '0' || value === 'false') return 0;
  if (value === '2') return 2;
  return value === '3' ? 3 : 1;
}

export function colourLevel({ refused, isTerminal, environment }: ColourQuestion): ColourLevel {
  if (refused || isSet(environment['NO_COLOR'])) return 0;
  const force = environment['FORCE_COLOR'];
  if (force !== undefined) return forced(force);
  if (environment['TERM'] === 'dumb' || !isTerminal) return 0;
  return 1;
}
