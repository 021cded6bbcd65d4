/**
 * @module Gevrey order: the power s of n! in |c_n|.
 *
 * Purpose    geometric (0), factorial (1), (2n)! or (n!)² (2), slower (½), decreasing faster than any power (< 0), or
 *            beyond all (2^(n²)).
 * Method     regular signs: least squares of ln|c_k| on {1, k, ln k!, ln(k+1), 1/(k+1), 1/(k+1)²}, the later part of the
 *            points, with as many terms as lower the total error. Irregular signs: the first three, with dips
 *            (accidental cancellations) weighted down. Growth beyond all is seen in coarse second differences of ln|c_k|,
 *            k Δ²/h², which tend to s for every finite order and grow with k otherwise.
 * Bound      heuristic: statistical error and change against the next simpler fit, in quadrature.
 * Reference  M. Gevrey, Ann. Sci. Éc. Norm. Sup. 35 (1918) 129 (the classes).
 */
import type { Estimate } from './growth.js';
import { leastSquares } from './least-squares.js';
import { logGammaDouble } from '../numerics/index.js';
import type { Point } from './reading.js';
import { weightedFit } from './weighted-fit.js';

/** Points below this number allow no correction terms. */
const LONG = 8;
/** Parts of the points that may be left out at the start of a long regular series. */
const STARTS = [0, 0.15, 0.33, 0.5];
/** Spread of γ about 1 that a short fit must allow for: shifts the fitted order by γ−1 times the leakage of ln k. */
const EXPONENT_SPREAD = 1.5;
/** Local order larger than this and growing by at least this factor over the middle of the series: beyond any (kn)!. */
const BEYOND_ORDER = 1.5;
const BEYOND_GROWTH = 1.35;
/** A dip farther than this many robust deviations below the line is weighted down. */
const DIP = 1.5;
/** Rounds of reweighting, and standard errors that the envelope fit is stated with. */
const PASSES = 5;
const ENVELOPE_ERRORS = 2;

export interface OrderFit {
  /** Order per power of x. */
  readonly order: Estimate;
  readonly beyond: boolean;
}

const columnsOf = (points: readonly Point[], terms: number): number[][] =>
  [
    points.map(() => 1),
    points.map((p) => p.k),
    points.map((p) => logGammaDouble(p.k + 1)),
    points.map((p) => Math.log(p.k + 1)),
    points.map((p) => 1 / (p.k + 1)),
    points.map((p) => 1 / (p.k + 1) ** 2),
  ].slice(0, terms);

function fit(points: readonly Point[], terms: number): Estimate | undefined {
  const f = weightedFit(
    columnsOf(points, terms),
    points.map((p) => p.y),
    points.map((p) => p.sigma),
  );
  return f && { value: f.coefficients[2]!, error: f.standardErrors[2]! };
}

/** Long regular series: the fit whose statistical error and change against the next simpler one are smallest together. */
function regularOrder(points: readonly Point[]): Estimate | undefined {
  const found: Estimate[] = [];
  for (const share of STARTS) {
    const tail = points.slice(Math.floor(share * points.length));
    let simpler: Estimate | undefined;
    for (let terms = 3; terms <= 6; terms++) {
      const f = tail.length >= terms + 2 ? fit(tail, terms) : undefined;
      if (f !== undefined && simpler !== undefined) {
        found.push({ value: f.value, error: Math.hypot(f.error, f.value - simpler.value) });
      }
      simpler = f;
    }
    const plain = tail.length >= LONG ? shortOrder(tail) : undefined;
    if (plain !== undefined) found.push(plain);
  }
  found.sort((a, b) => a.error - b.error);
  const [best, next] = found;
  // The smallest of many errors is small by accident: it must cover the runner-up.
  return (
    best && {
      value: best.value,
      error: Math.max(best.error, next === undefined ? 0 : Math.abs(best.value - next.value)),
    }
  );
}

/** Shift of the fitted order by an exponent γ that the three-term fit cannot see. */
function exponentBias(points: readonly Point[]): number {
  const leak = leastSquares(columnsOf(points, 3), columnsOf(points, 4)[3]!);
  return leak === undefined ? 0 : Math.abs(leak.coefficients[2]!) * EXPONENT_SPREAD;
}

/** Three-term fit, for short and for noisy series; the error allows for an exponent γ that it cannot see. */
function shortOrder(points: readonly Point[]): Estimate | undefined {
  const f = fit(points, 3);
  if (f === undefined) return undefined;
  return { value: f.value, error: Math.hypot(f.error, exponentBias(points)) };
}

/** Irregular signs: an envelope fit, points far below the line weighted down. */
function envelopeOrder(points: readonly Point[]): Estimate | undefined {
  const y = points.map((p) => p.y);
  const columns = columnsOf(points, 3);
  if (points.length < 5) return undefined;
  let weights = points.map(() => 1);
  let best: Estimate | undefined;
  for (let pass = 0; pass < PASSES; pass++) {
    const f = leastSquares(columns, y, weights);
    if (f === undefined) break;
    const se = Math.sqrt((f.unitVariances[2]! * f.rss) / (points.length - 3));
    best = { value: f.coefficients[2]!, error: Math.hypot(ENVELOPE_ERRORS * se, exponentBias(points)) };
    const size = f.residuals.map(Math.abs).sort((a, b) => a - b)[Math.floor(points.length / 2)]!;
    weights = f.residuals.map((r) => (r < -DIP * size ? (DIP * size) / -r : 1) ** 2);
  }
  return best;
}

/** k Δ²_h y/h² at the centre k of three points h apart. */
function coarseOrder(byK: ReadonlyMap<number, number>, centre: number, h: number): number | undefined {
  const a = byK.get(centre - h);
  const b = byK.get(centre);
  const c = byK.get(centre + h);
  return a === undefined || b === undefined || c === undefined ? undefined : (centre * (a - 2 * b + c)) / (h * h);
}

function beyondAll(points: readonly Point[]): boolean {
  const last = points[points.length - 1]!.k;
  const h = Math.max(1, Math.floor(last / 4));
  const byK = new Map(points.map((p) => [p.k, p.y]));
  const early = coarseOrder(byK, h, h);
  const middle = coarseOrder(byK, 2 * h, h);
  const late = coarseOrder(byK, 3 * h, h);
  if (early === undefined || middle === undefined || late === undefined) return false;
  return late > BEYOND_ORDER && middle > BEYOND_GROWTH * early && late > BEYOND_GROWTH * middle && early > 0;
}

/** Order of the non-zero points; `regular`: signs same or alternating throughout. Undefined below 4 points. */
export function growthOrder(points: readonly Point[], stride: number, regular: boolean): OrderFit | undefined {
  if (points.length < 4) return undefined;
  const perStep =
    points.length < LONG
      ? shortOrder(points)
      : regular
        ? (regularOrder(points) ?? shortOrder(points))
        : envelopeOrder(points);
  if (perStep === undefined) return undefined;
  return {
    order: { value: perStep.value / stride, error: perStep.error / stride },
    beyond: regular && points.length >= LONG && beyondAll(points),
  };
}
