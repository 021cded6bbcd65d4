/**
 * @module The sums of a contour quantity side by side, with what the errors of the input do to each.
 *
 * Method     the sums again with the coupling, then each coefficient of D, moved up and down by one standard deviation; half the
 *            difference is the error from that source. Coefficients are added in quadrature, as independent.
 * Bound      none: an error is indicative. Where a moved input is refused, the sum has no error from it.
 */
import type { ContourReport } from '../../contour/index.js';
import { addExact, exact, subExact } from '../../numerics/index.js';
import type { Exact } from '../../numerics/index.js';
import type { Coefficient, Series, Uncertain } from '../../series/index.js';
import { indicative } from '../figures.js';

export interface ContourSum {
  readonly name: string;
  readonly value: string;
  readonly truncation?: string;
  /** |Im|/π of the lateral sums. */
  readonly ambiguity?: string;
  /** What one standard deviation of the coupling moves; "unknown" where the moved coupling is refused. */
  readonly coupling?: string;
  /** The same of the coefficients' errors, in quadrature. */
  readonly coefficients?: string;
}

/** The report for moved input, to a few digits; undefined for input that is refused. */
export type Rerun = (series: Series, coupling: Exact) => ContourReport | undefined;

type Moved = ReadonlyMap<string, number> | undefined;

const INPUT_DIGITS = 3;

/** Every sum of a report, refused ones left out. */
function sumsOf({ fixedOrder, contourImproved, borel, subtracted }: ContourReport): ContourSum[] {
  const last = 'refused' in subtracted ? undefined : subtracted.orders.at(-1);
  return [
    { name: 'Fixed order', ...fixedOrder },
    ...(contourImproved === undefined ? [] : [{ name: 'Contour improved', ...contourImproved }]),
    ...borel.flatMap(({ method, variant, value, truncation, ambiguity }) =>
      value === undefined
        ? []
        : [
            {
              name: `${method}, ${variant}`,
              value,
              ...(truncation === undefined ? {} : { truncation }),
              ...(ambiguity === undefined ? {} : { ambiguity }),
            },
          ],
    ),
    ...(last === undefined
      ? []
      : [
          { name: 'Fixed order, subtracted', value: last.fixedOrder.sum },
          { name: 'Contour improved, subtracted', value: last.improved.sum },
        ]),
  ];
}

/** Half the difference of each sum between two sides; undefined without one of them. */
function halfDifference(name: string, up: Moved, down: Moved): number | undefined {
  const [above, below] = [up?.get(name), down?.get(name)];
  return above === undefined || below === undefined ? undefined : Math.abs(above - below) / 2;
}

export function contourSums(report: ContourReport, series: Series, at: Uncertain, rerun: Rerun): ContourSum[] {
  const moved = (own: Series, coupling: Exact): Moved => {
    const found = rerun(own, coupling);
    return found && new Map(sumsOf(found).map(({ name, value }) => [name, Number(value)]));
  };
  const bothSides = (
    value: Exact,
    { plus, minus }: NonNullable<Uncertain['error']>,
    run: (value: Exact) => Moved,
  ): [Moved, Moved] => [run(addExact(value, exact(plus))), run(subExact(value, exact(minus)))];
  const coupling = at.error && bothSides(at.value, at.error, (alpha) => moved(series, alpha));
  const coefficients = series.coefficients.flatMap((c, k) => {
    if (c.error === undefined) return [];
    const withValue = (value: Exact): Series => ({
      ...series,
      coefficients: series.coefficients.map((old, j): Coefficient => (j === k ? { ...old, value } : old)),
    });
    return [bothSides(c.value, c.error, (value) => moved(withValue(value), at.value))];
  });
  const text = (x: number | undefined): string => (x === undefined ? 'unknown' : indicative(x, INPUT_DIGITS));
  return sumsOf(report).map((sum) => {
    const parts = coefficients.map(([up, down]) => halfDifference(sum.name, up, down));
    return {
      ...sum,
      ...(coupling === undefined ? {} : { coupling: text(halfDifference(sum.name, ...coupling)) }),
      ...(parts.length === 0
        ? {}
        : { coefficients: text(parts.some((p) => p === undefined) ? undefined : Math.hypot(...parts.map((p) => p!))) }),
    };
  });
}
