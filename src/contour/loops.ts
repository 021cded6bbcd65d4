/** @module The number of loops as the QCD room wants it. */
import type { Loops } from '../qcd/index.js';

const KNOWN: readonly Loops[] = [1, 2, 3, 4, 5];

/** 1 to 5; any other number counts as all that are known. */
export const loopsOf = (n: number): Loops => KNOWN.find((loops) => loops === n) ?? 5;
