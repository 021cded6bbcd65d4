/**
 * @module Position and exponent from a least-squares fit of ln|c_n|.
 *
 * Purpose    the estimate for noisy coefficients, and the independent check of the ratio test for exact ones.
 * Method     ln|c_k| − ln Γ(qk+1) = ln S − k ln T + (γ−1) ln(qk + ½) + h₁/(k+1) + h₂/(k+1)²: Stirling's form of
 *            Γ(qk+γ)/T^k with 1/k corrections. The number of terms and the first point are those with the smallest total
 *            of statistical error and change against the next simpler fit.
 * Bound      heuristic: that total, inflated by the caller.
 * Reference  G. Darboux, J. Math. Pures Appl. 4 (1878) 5; R. B. Dingle, "Asymptotic Expansions", 1973, chapter VII.
 */
import type { Estimate } from './growth.js';
import { leastSquares } from './least-squares.js';
import { logGamma } from './log-gamma.js';
import type { Point } from './reading.js';

/** Fractions of the points, counted from the start, that a fit may leave out. */
const STARTS = [0, 0.3, 0.5];

export interface LogFit {
  /** −ln T. */
  readonly slope: Estimate;
  /** γ. */
  readonly exponent: Estimate;
}

interface Candidate extends LogFit {
  readonly slopeSe: number;
  readonly exponentSe: number;
}

function fitOne(points: readonly Point[], q: number, terms: number): Candidate | undefined {
  const y = points.map((p) => p.y - logGamma(q * p.k + 1));
  const columns = [
    points.map(() => 1),
    points.map((p) => p.k),
    points.map((p) => Math.log(Math.max(q, 1) * p.k + 0.5)),
    points.map((p) => 1 / (p.k + 1)),
    points.map((p) => 1 / (p.k + 1) ** 2),
    points.map((p) => 1 / (p.k + 1) ** 3),
  ].slice(0, terms);
  const smallest = Math.min(...points.map((p) => p.sigma));
  const w = points.map((p) => (smallest / p.sigma) ** 2);
  const fit = leastSquares(columns, y, w);
  if (fit === undefined) return undefined;
  const spread = Math.sqrt(Math.max(fit.rss / (points.length - terms), smallest ** 2));
  const se = (j: number): number => spread * Math.sqrt(fit.unitVariances[j]!);
  const slope = fit.coefficients[1]!;
  const exponent = 1 + fit.coefficients[2]!;
  return {
    slope: { value: slope, error: 0 },
    exponent: { value: exponent, error: 0 },
    slopeSe: se(1),
    exponentSe: se(2),
  };
}

/** Points: non-zero ones of one regular tail. Undefined below 6 of them. */
export function logFit(points: readonly Point[], q: number): LogFit | undefined {
  const found: LogFit[] = [];
  for (const share of STARTS) {
    const tail = points.slice(Math.floor(share * points.length));
    let simpler: Candidate | undefined;
    for (let terms = 3; terms <= 6 && tail.length >= terms + 2; terms++) {
      const fit = fitOne(tail, q, terms);
      if (fit !== undefined && simpler !== undefined) {
        const slope = Math.hypot(fit.slopeSe, fit.slope.value - simpler.slope.value);
        const exponent = Math.hypot(fit.exponentSe, fit.exponent.value - simpler.exponent.value);
        found.push({
          slope: { value: fit.slope.value, error: slope },
          exponent: { value: fit.exponent.value, error: exponent },
        });
      }
      simpler = fit;
    }
  }
  found.sort((a, b) => a.slope.error - b.slope.error);
  const [best, next] = found;
  if (best === undefined) return undefined;
  // The smallest of many errors is small by accident: it must cover the runner-up.
  const widened = (a: Estimate, b: Estimate | undefined): Estimate => ({
    value: a.value,
    error: Math.max(a.error, b === undefined ? 0 : Math.abs(a.value - b.value)),
  });
  return { slope: widened(best.slope, next?.slope), exponent: widened(best.exponent, next?.exponent) };
}
