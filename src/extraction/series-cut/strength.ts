/**
 * @module How much of the low-momentum model a series contains: λ, and what says so.
 *
 * Method     three sources: the strength N that the file states; the last known coefficient over the model's own, its error the
 *            step from the one before; the strength N of the growth diagnosis. A stated one is taken as it is; of the other two
 *            the one with the smaller relative error. N is turned into λ by the model's own N. Where an ultraviolet singularity
 *            is nearer the last coefficient does not converge: its error is then not below its distance to N.
 * Bound      indicative: the errors are heuristics.
 */
import { divExact, exact, isZeroExact, toNumberExact, Rational } from '../../numerics/index.js';
import type { Exact } from '../../numerics/index.js';
import { isRefusal } from '../../qcd/index.js';
import type { Series, StatedSingularity } from '../../series/index.js';
import { leadingStrength } from '../../studies/index.js';
import type { Expanded } from '../../studies/index.js';

export type StrengthSource = 'the file' | 'the last coefficient' | 'the strength N of growth';

export interface CutStrength {
  readonly value: Exact;
  readonly error: number;
  readonly source: StrengthSource;
}

const fromDouble = (x: number): Exact => exact(Rational.fromNumber(x));
const relative = (s: CutStrength): number => s.error / Math.abs(toNumberExact(s.value));

/** From the last coefficient: the model reproduces it with μ_f = Q. */
function lastCoefficient(c: readonly Exact[], model: readonly Exact[]): CutStrength | undefined {
  const last = c.length - 1;
  const [own, before] = [model[last], model[last - 1]];
  if (own === undefined || isZeroExact(own) || isZeroExact(c[last]!)) return undefined;
  const value = divExact(c[last]!, own);
  const size = toNumberExact(value);
  if (before === undefined || isZeroExact(before))
    return { value, error: Math.abs(size), source: 'the last coefficient' };
  const error = Math.abs(size - toNumberExact(divExact(c[last - 1]!, before)));
  return { value, error, source: 'the last coefficient' };
}

/** All that is known about λ, the one to take first. Empty when nothing says how strong the singularity is. */
export function cutStrengths(
  series: Series,
  expanded: Expanded,
  singularity: StatedSingularity,
  model: readonly Exact[],
  perUnit: number,
  nearer: boolean,
): CutStrength[] {
  const { coefficients } = expanded.expansion;
  const fromN = (n: number, error: number, source: StrengthSource): CutStrength[] => {
    const value = n / perUnit;
    return Number.isFinite(value) && value !== 0
      ? [{ value: fromDouble(value), error: Math.abs(error / perUnit), source }]
      : [];
  };
  const grown = leadingStrength(series, expanded);
  const found =
    grown === undefined || grown.singularity !== singularity || isRefusal(grown.found) ? undefined : grown.found;
  const last = lastCoefficient(coefficients, model);
  const diagnosed = found === undefined ? [] : fromN(found.value, found.error, 'the strength N of growth');
  const apart = (s: CutStrength): number =>
    nearer ? Math.max(0, ...diagnosed.map((n) => Math.abs(toNumberExact(s.value) - toNumberExact(n.value)))) : 0;
  const measured = [
    ...(last === undefined ? [] : [{ ...last, error: Math.max(last.error, apart(last)) }]),
    ...diagnosed,
  ].toSorted((a, b) => relative(a) - relative(b));
  const stated = singularity.strength === undefined ? [] : fromN(toNumberExact(singularity.strength), 0, 'the file');
  return [...stated, ...measured];
}
