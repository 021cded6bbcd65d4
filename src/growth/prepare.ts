/**
 * @module Everything measured before the verdict: pattern, outliers, noise, growth order, model comparison.
 */
import type { Exact } from '../numerics/index.js';
import { errorModel } from './errors.js';
import { compareModels } from './evidence.js';
import { growthOrder, type OrderFit } from './growth-order.js';
import type { GrowthInput, GrowthModelComparison } from './growth.js';
import { localOrder, type LocalOrder } from './local-order.js';
import { findOutliers, type Outlier } from './outliers.js';
import { nonZero, type Point, type Sequence } from './reading.js';
import { signPattern, type SignPattern } from './sign-pattern.js';

/** Error of the order beyond which the tail of a late pattern is not trusted alone. */
const WAVY = 0.2;

export interface Prepared {
  readonly sequence: Sequence;
  /** The coefficients themselves, from the first non-zero one on. */
  readonly exact?: readonly Exact[];
  /** Computed coefficients after repair of outliers, with the errors that apply; zeros included. */
  readonly points: readonly Point[];
  /** The non-zero ones. */
  readonly nonZero: readonly Point[];
  readonly pattern: SignPattern;
  /** Longest run of consecutive non-zero points at the end, from where the sign pattern is regular. */
  readonly tail: readonly Point[];
  readonly outliers: readonly Outlier[];
  /** Scatter seen in the coefficients beyond their quoted errors. */
  readonly noise?: number;
  /** Relative error of T per step from errors common to neighbouring coefficients. */
  readonly drift?: number;
  /** Estimated coefficients, left out of everything above. */
  readonly estimated: readonly Point[];
  readonly order?: OrderFit;
  readonly local?: LocalOrder;
  /** Over computed coefficients. */
  readonly comparison?: GrowthModelComparison;
  /** Over all coefficients, estimated ones included. */
  readonly comparisonAll?: GrowthModelComparison;
}

function regularTail(points: readonly Point[], pattern: SignPattern): readonly Point[] {
  let from = pattern.kind === 'irregular' ? 0 : pattern.from;
  for (let i = points.length - 1; i > from; i--) {
    if (points[i]!.k !== points[i - 1]!.k + 1) {
      from = i;
      break;
    }
  }
  return points.slice(from);
}

/** b of the factorial model: exponent − 1 of the nearest expected singularity when the signs seen are those it would give. */
export function modelShift(expected: GrowthInput['expected'], pattern: SignPattern): number {
  const nearest = [...expected].sort((a, b) => Math.abs(a.t) - Math.abs(b.t))[0];
  if (nearest?.exponent === undefined || !(nearest.exponent > 0)) return 0;
  const fits = pattern.kind === 'same' ? nearest.t > 0 : pattern.kind === 'alternating' && nearest.t < 0;
  return fits ? nearest.exponent - 1 : 0;
}

/** A tail too short or too wavy for a good order falls back on the envelope of all coefficients, if that is known better. */
function orderOf(
  all: readonly Point[],
  tail: readonly Point[],
  stride: number,
  regular: boolean,
): OrderFit | undefined {
  const envelope = (): OrderFit | undefined => growthOrder(all, stride, false);
  const fit = regular ? growthOrder(tail, stride, true) : envelope();
  if (!regular || tail.length === all.length || fit === undefined || fit.beyond || fit.order.error < WAVY) return fit;
  const other = envelope();
  return other !== undefined && other.order.error < fit.order.error ? other : fit;
}

export function prepare(sequence: Sequence, input: GrowthInput): Prepared {
  const computed = sequence.points.filter((p) => !p.estimated);
  const estimated = sequence.points.filter((p) => p.estimated && p.sign !== 0);
  const raw = nonZero(computed);
  const repaired = findOutliers(raw, signPattern(raw));
  const pattern = signPattern(repaired.points);
  const regular = pattern.kind !== 'irregular';
  const tail0 = regularTail(repaired.points, pattern);
  const errors = errorModel(tail0, regular);
  const used = repaired.points.map(errors.apply);
  const byK = new Map(used.map((p) => [p.k, p]));
  const tail = tail0.map(errors.apply);
  const order = orderOf(used, tail, sequence.stride, regular);
  const local = regular ? localOrder(tail, sequence.stride) : undefined;
  const shift = modelShift(input.expected, pattern);
  const comparison = compareModels(used, sequence.stride, shift);
  const comparisonAll =
    estimated.length === 0 ? comparison : compareModels([...used, ...estimated], sequence.stride, shift);
  return {
    sequence,
    ...(input.exact === undefined ? {} : { exact: input.exact.slice(sequence.cut) }),
    points: computed.map((p) => byK.get(p.k) ?? p),
    nonZero: used,
    pattern,
    tail,
    outliers: repaired.outliers,
    ...(errors.noise === undefined ? {} : { noise: errors.noise }),
    ...(errors.drift === undefined ? {} : { drift: errors.drift }),
    estimated,
    ...(order === undefined ? {} : { order }),
    ...(local === undefined ? {} : { local }),
    ...(comparison === undefined ? {} : { comparison }),
    ...(comparisonAll === undefined ? {} : { comparisonAll }),
  };
}
