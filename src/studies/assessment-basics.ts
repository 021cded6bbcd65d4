/** @module What every result speaks of: how far a number is to be trusted, why there is none, what to beware of. */

/** Trust in a number: proved by enclosure; two independent evaluations agree; a model or heuristic. */
export type Standing = 'certified' | 'converged' | 'indicative';

/** A number and what stands behind it. `digits` says how the shown digits are known, `standing` how far the number itself is to be trusted. */
export interface Figure {
  readonly value: string;
  readonly error?: string;
  readonly standing: Standing;
  readonly digits?: Standing;
}

export interface Caution {
  readonly code: string;
  readonly text: string;
}

export interface Refused {
  readonly reason: string;
  readonly remedy: string;
}
