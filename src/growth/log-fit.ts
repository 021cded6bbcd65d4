/**
 * @module Position and exponent from a least-squares fit of ln|c_n|.
 *
 * Purpose    the estimate for noisy coefficients, and the independent check of the ratio test for exact ones.
 * Method     ln|c_k| − ln Γ(qk+1) = ln S − k ln T + (γ−1) ln(qk + ½) + h₁/(k+1) + h₂/(k+1)² + …: Stirling's form of
 *            Γ(qk+γ)/T^k with 1/k corrections. The number of terms and the first point are those with the smallest stated
 *            error; the change against the next simpler fit, beyond its noise, is the method error.
 * Bound      heuristic: errors as in measured.ts, never below the distance to the runner-up.
 * Reference  G. Darboux, J. Math. Pures Appl. 4 (1878) 5; R. B. Dingle, "Asymptotic Expansions", 1973, chapter VII.
 */
import { logGammaDouble } from '../numerics/index.js';
import { statedError, type Measured } from './measured.js';
import type { Point } from './reading.js';
import { weightedFit } from './weighted-fit.js';

/** Fractions of the points, counted from the start, that a fit may leave out. */
const STARTS = [0, 0.3, 0.5];
const TERMS = { least: 3, most: 6 };

export interface LogFit {
  /** −ln T. */
  readonly slope: Measured;
  /** γ. */
  readonly exponent: Measured;
}

interface Candidate {
  readonly slope: { readonly value: number; readonly se: number };
  readonly exponent: { readonly value: number; readonly se: number };
}

function fitOne(points: readonly Point[], q: number, terms: number): Candidate | undefined {
  const columns = [
    points.map(() => 1),
    points.map((p) => p.k),
    points.map((p) => Math.log(Math.max(q, 1) * p.k + 0.5)),
    points.map((p) => 1 / (p.k + 1)),
    points.map((p) => 1 / (p.k + 1) ** 2),
    points.map((p) => 1 / (p.k + 1) ** 3),
  ].slice(0, terms);
  const fit = weightedFit(
    columns,
    points.map((p) => p.y - logGammaDouble(q * p.k + 1)),
    points.map((p) => p.sigma),
  );
  if (fit === undefined) return undefined;
  return {
    slope: { value: fit.coefficients[1]!, se: fit.standardErrors[1]! },
    exponent: { value: 1 + fit.coefficients[2]!, se: fit.standardErrors[2]! },
  };
}

/** The change from the simpler fit, as far as it exceeds the noise, is the error of the method. */
function measured(now: Candidate['slope'], simpler: Candidate['slope']): Measured {
  const change = now.value - simpler.value;
  return { value: now.value, noise: now.se, method: Math.sqrt(Math.max(0, change * change - now.se * now.se)) };
}

/** Points: non-zero ones of one regular tail. Undefined below 6 of them. */
export function logFit(points: readonly Point[], q: number): LogFit | undefined {
  const found: LogFit[] = [];
  for (const share of STARTS) {
    const tail = points.slice(Math.floor(share * points.length));
    let simpler: Candidate | undefined;
    for (let terms = TERMS.least; terms <= TERMS.most && tail.length >= terms + 2; terms++) {
      const fit = fitOne(tail, q, terms);
      if (fit !== undefined && simpler !== undefined) {
        found.push({ slope: measured(fit.slope, simpler.slope), exponent: measured(fit.exponent, simpler.exponent) });
      }
      simpler = fit;
    }
  }
  found.sort((a, b) => statedError(a.slope) - statedError(b.slope));
  const [best, next] = found;
  if (best === undefined || next === undefined) return best;
  // The smallest of many errors is small by accident: it must reach the runner-up.
  const widened = (a: Measured, b: Measured): Measured => {
    const beyond = Math.abs(a.value - b.value) - a.noise;
    return beyond > a.method ? { ...a, method: beyond } : a;
  };
  return { slope: widened(best.slope, next.slope), exponent: widened(best.exponent, next.exponent) };
}
