/** @module What the digits of a coefficient say about its error. */

/** Digits fewer than this are taken as "written short" (0.5, 1.25), not as rounded; heuristic. */
export const ROUNDED_DIGITS = 3;
