/** @module The sizes of a picture, and what follows from them. */

export interface Format {
  readonly name: 'column' | 'page' | 'slide';
  readonly width: number;
  readonly height: number;
  /** Size of ordinary text in points. */
  readonly text: number;
  /** Width of a curve in points. */
  readonly line: number;
  readonly marker: number;
}

/**
 * column: 86 mm, one column of a two-column journal; page: 178 mm, across both; slide: 10 by 5.6 inches.
 * The widths are common practice, no source.
 */
export const FORMATS: readonly Format[] = [
  { name: 'column', width: 243.8, height: 172, text: 7.5, line: 0.9, marker: 2.1 },
  { name: 'page', width: 504.6, height: 300, text: 9, line: 1.1, marker: 2.8 },
  { name: 'slide', width: 720, height: 405, text: 15, line: 2, marker: 4.6 },
];

export const formatNamed = (name: string): Format | undefined => FORMATS.find((format) => format.name === name);
