/**
 * @module An algorithm of field arithmetic applied to exact numbers: in rationals when all of them are, else by enclosures
 * that all results share.
 */
import { ballField, exact, exactReal, rationalField } from '../numerics/index.js';
import type { Ball, Exact, Field, Rational } from '../numerics/index.js';

/** Spare bits of the shared enclosures, for each number of the list. Heuristic; callers raise the precision as they need. */
const SPARE_PER_NUMBER = 4;

/** Results of `algorithm` on the inputs; `count` is the number of results. */
export function onExact(
  inputs: readonly Exact[],
  count: number,
  algorithm: <T>(field: Field<T>, inputs: readonly T[]) => readonly T[],
): Exact[] {
  const rationals = inputs.map((c) => c.rational).filter((q): q is Rational => q !== undefined);
  if (rationals.length === inputs.length) return algorithm(rationalField, rationals).map(exact);
  let latest: { readonly prec: number; readonly values: readonly Ball[] } | undefined;
  const at = (prec: number): readonly Ball[] => {
    if (latest === undefined || latest.prec !== prec) {
      const work = prec + SPARE_PER_NUMBER * inputs.length;
      latest = {
        prec,
        values: algorithm(
          ballField(work),
          inputs.map((c) => c.ball(work)),
        ),
      };
    }
    return latest.values;
  };
  return Array.from({ length: count }, (_, k) => exactReal((prec) => at(prec)[k]!));
}
