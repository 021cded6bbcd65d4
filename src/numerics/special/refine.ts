/**
 * @module Raising the working precision of a kernel until its result is as sharp as was asked for.
 *
 * Purpose    next to a zero, where the absolute accuracy planned for does not suffice.
 * Method     the bits that were lost are added; while nothing at all is known, the bits double.
 */

/** Largest number of attempts, and the working precision at which to stop: 6·prec + 1000 bits (heuristic). */
const ROUNDS = 10;
const CAP = { factor: 6, bits: 1000 } as const;

/** Evaluates with `start` bits or more until accuracy(value) reaches prec; the last value otherwise. */
export function refine<T>(
  prec: number,
  start: number,
  evaluate: (bits: number) => T,
  accuracy: (value: T) => number,
): T {
  let bits = start;
  for (let round = 1; ; round++) {
    const value = evaluate(bits);
    const known = accuracy(value);
    const lack = Math.ceil(prec + 2 - known);
    if (!(lack > 0) || round === ROUNDS || bits > CAP.factor * prec + CAP.bits) return value;
    bits += known > 0 ? lack + 4 : bits;
  }
}
