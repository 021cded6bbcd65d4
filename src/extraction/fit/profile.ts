/** @module Pulls, and χ² along each parameter with the others following. */
import { numberText } from '../entries.js';
import type { PullEntry, ProfileEntry } from './fit-result.js';
import type { Fitted } from './fit-budget.js';
import type { Matrix } from './matrix.js';
import { refineRoot } from '../root.js';
import { minimise } from './minimise.js';

/** Distances in standard deviations at which the profile is shown. */
const DISTANCES = [-3, -2, -1, -0.5, 0, 0.5, 1, 2, 3] as const;
/** Relative precision of the ends of an interval, in standard deviations. */
const PRECISION = 1e-7;
/** Standard deviations within which Δχ² = 1 is looked for. */
const FAR = 8;

const sigmaOf = (covariance: Matrix, k: number): number => Math.sqrt(covariance[k]?.[k] ?? NaN);

/** Residuals of the data, and how much they say. */
export function pullsOf(
  { model, minimum, data, measured }: Fitted,
  alone: readonly (string | undefined)[],
): readonly PullEntry[] {
  const { jacobian, covariance, theory } = minimum;
  return data.map((x, i): PullEntry => {
    const residual = x - (theory[i] ?? NaN);
    const variance = measured[i]?.[i] ?? NaN;
    const row = jacobian[i] ?? [];
    const fitted = row.reduce(
      (sum, a, k) => sum + row.reduce((s, b, l) => s + a * b * (covariance[k]?.[l] ?? 0), 0),
      0,
    );
    const left = variance - fitted;
    const own = alone[i];
    return {
      series: model.settings[i]?.stages.series.id ?? '',
      measured: numberText(x),
      theory: numberText(theory[i] ?? NaN),
      residual: numberText(residual),
      pull: numberText(residual / Math.sqrt(variance)),
      ...(left > 1e-9 * variance ? { standardised: numberText(residual / Math.sqrt(left)) } : {}),
      ...(own === undefined ? {} : { alone: own }),
    };
  });
}

/** Δχ² at a value of parameter k, the others free; undefined where the theory has no value. */
function deltaAt({ model, minimum, data, factor }: Fitted, k: number, value: number): number | undefined {
  const start = minimum.parameters.map((p, i) => (i === k ? value : p));
  const others = start.flatMap((_, i) => (i === k ? [] : [i]));
  const found = minimise(model.vector(), data, factor, start, others);
  return found === undefined ? undefined : found.chiSquare - minimum.chiSquare;
}

/** Where Δχ² reaches 1 on the side of `sigma`. */
function crossing(fitted: Fitted, k: number, sigma: number): number | undefined {
  const centre = fitted.minimum.parameters[k] ?? NaN;
  const above = (distance: number): number | undefined => {
    const delta = deltaAt(fitted, k, centre + distance * sigma);
    return delta === undefined ? undefined : delta - 1;
  };
  let [from, fFrom] = [0, -1];
  for (let to = 1; to <= FAR; to *= 1.5) {
    const fTo = above(to);
    if (fTo === undefined) return undefined;
    if (fTo >= 0) {
      const found = refineRoot(above, { from, to, fFrom, fTo }, PRECISION);
      return found?.kind === 'root' ? centre + found.p * sigma : undefined;
    }
    [from, fFrom] = [to, fTo];
  }
  return undefined;
}

export function profileOf(fitted: Fitted, k: number, parameter: string): ProfileEntry {
  const centre = fitted.minimum.parameters[k] ?? NaN;
  const sigma = sigmaOf(fitted.minimum.covariance, k);
  const points = DISTANCES.flatMap((d) => {
    const value = centre + d * sigma;
    const delta = d === 0 ? 0 : deltaAt(fitted, k, value);
    return delta === undefined ? [] : [{ value: numberText(value, 10), deltaChiSquare: numberText(delta) }];
  });
  const [low, high] = [crossing(fitted, k, -sigma), crossing(fitted, k, sigma)];
  return {
    parameter,
    points,
    ...(low === undefined || high === undefined
      ? {}
      : { interval: { low: numberText(low, 10), high: numberText(high, 10) } }),
  };
}
