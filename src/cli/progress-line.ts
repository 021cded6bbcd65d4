/** @module What the program and its clock share: a few cells of memory, and the words of the line. */

/** Places in the shared memory. */
export const CELL = { state: 0, gone: 1, done: 2, of: 3 } as const;
export const CELLS = 4;

/** quiet: nothing drawn yet; drawing: there is a line; over: the command has something to write, or is at its end. */
export const STATE = { quiet: 0, drawing: 1, over: 2 } as const;

export interface ProgressOrder {
  readonly shared: SharedArrayBuffer;
  readonly descriptor: number;
  readonly name: string;
  readonly columns: number;
  /** Milliseconds of the clock when the command began. */
  readonly since: number;
}

/** "backtest: 12 s, 3 of 14"; the count where the command knows its steps. */
export const progressLine = (name: string, seconds: number, done: number, of: number): string =>
  `${name}: ${Math.floor(seconds)} s${of > 0 ? `, ${done} of ${of}` : ''}`;
