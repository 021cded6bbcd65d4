/**
 * @module Colours that stay apart for every reader: the inks differ in lightness, so that they are told apart in grey and
 * with any colour vision, and every one of them stands out from white paper. A test measures both.
 */

/** Curves and markers, the most important one first: CIE lightness about 24, 43, 51, 33, 60. */
export const INKS = ['#14376b', '#ac4129', '#2f887a', '#683988', '#b98a1f'] as const;

export const TEXT = '#1c1c1c';
export const FRAME = '#444444';
export const FAINT = '#8a8a8a';
/** Bands behind curves. */
export const BAND = '#c9d4e6';
export const BAND_SECOND = '#eed9cf';
export const PAPER = '#ffffff';

export const ink = (index: number): string => INKS[index % INKS.length]!;
