/**
 * @module A picture as plain data, which every writer (SVG, PDF, PNG) draws the same way.
 *
 * Lengths are points (1/72 inch), y grows downward, colours are "#rrggbb". Text is in the small notation of `typeset.ts`.
 */

export interface Stroke {
  readonly colour: string;
  readonly width: number;
  /** Lengths of dashes and gaps; a full line without. */
  readonly dash?: readonly number[];
}

export interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

export interface PathMark {
  readonly kind: 'path';
  /** Path data of the SVG standard with absolute M, L, C, Q, Z only. */
  readonly d: string;
  readonly stroke?: Stroke;
  readonly fill?: string;
  /** Of the whole mark, 1 when absent. */
  readonly opacity?: number;
  /** Nothing is drawn outside. */
  readonly clip?: Box;
}

export interface TextMark {
  readonly kind: 'text';
  /** Where the base line starts, has its middle, or ends, as `anchor` says. */
  readonly x: number;
  readonly y: number;
  readonly text: string;
  readonly size: number;
  readonly anchor: 'start' | 'middle' | 'end';
  readonly colour: string;
  /** Degrees counter-clockwise about (x, y). */
  readonly turn?: number;
}

export type Mark = PathMark | TextMark;

export interface Picture {
  readonly width: number;
  readonly height: number;
  readonly title: string;
  readonly description: string;
  readonly marks: readonly Mark[];
}

/** A number of points to a hundredth: finer than any printer, and the same text on every machine. */
export const pt = (value: number): string => {
  const text = value.toFixed(2);
  return text.includes('.') ? text.replace(/\.?0+$/, '').replace(/^-0$/, '0') : text;
};
