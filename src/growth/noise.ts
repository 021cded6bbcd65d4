/**
 * @module Noise that nobody quoted.
 *
 * Purpose    coefficients with 1e-6, four digits or 30 % of scatter betray themselves: ln|c_n| of a true series is smooth.
 * Method     a smooth trend is fitted and removed; differences of the remainder of order j over steps of two (a decaying
 *            (−1)^n admixture is smooth in steps of two), divided by √binomial(2j, j), fall quickly with j for a smooth
 *            sequence and stay level at the relative error for independent noise. Level must also be the same in both
 *            halves: an admixture dies out.
 * Bound      heuristic constants below; levels below the rounding of the logarithm are not seen.
 * Reference  the difference table as error detector: L. Collatz, "Numerische Behandlung von Differentialgleichungen", 1951
 *            (from memory).
 */
import { leastSquares } from './least-squares.js';
import { logGammaDouble } from '../numerics/index.js';
import type { Point } from './reading.js';

/** Fewest consecutive points. */
const MIN_POINTS = 16;
/** Level of order j against that of order j − 1 (and its square against order j − 2) that counts as a plateau. */
const PLATEAU = 0.5;
/** Largest ratio of the levels of the two halves. */
const STATIONARY = 6;
/** A level must exceed the rounding of the logarithms by this factor. */
const ABOVE_ROUNDING = 30;
const HIGHEST = 6;

function median(values: readonly number[]): number {
  const s = [...values].sort((a, b) => a - b);
  return s.length === 0 ? 0 : s[Math.floor(s.length / 2)]!;
}

/** Standard deviation of normal numbers from the median of their absolute values. */
const robustDeviation = (values: readonly number[]): number => median(values.map(Math.abs)) / 0.6745;

function detrended(points: readonly Point[]): number[] {
  const y = points.map((p) => p.y - logGammaDouble(p.k + 1));
  const columns = [
    points.map(() => 1),
    points.map((p) => p.k),
    points.map((p) => logGammaDouble(p.k + 1)),
    points.map((p) => Math.log(p.k + 1)),
    points.map((p) => 1 / (p.k + 1)),
  ];
  return [...(leastSquares(columns, y)?.residuals ?? y)];
}

export interface Roughness {
  /** Upper bound of the independent relative scatter. */
  readonly level: number;
  /** The level is that of independent noise, not of a law that the differences have not yet removed. */
  readonly noise: boolean;
}

/** Of consecutive points with regular signs; undefined with too few of them. */
export function roughness(points: readonly Point[]): Roughness | undefined {
  if (points.length < MIN_POINTS) return undefined;
  let d = detrended(points);
  let binomial = 1;
  const top = Math.min(HIGHEST, Math.floor((points.length - 6) / 2));
  const levels = [Infinity, Infinity];
  for (let j = 1; j <= top; j++) {
    d = d.slice(2).map((v, i) => v - d[i]!);
    binomial *= (2 * j * (2 * j - 1)) / (j * j);
    levels.push(robustDeviation(d) / Math.sqrt(binomial));
  }
  const level = levels.at(-1)!;
  const half = Math.floor(d.length / 2);
  const early = robustDeviation(d.slice(0, half));
  const late = robustDeviation(d.slice(half));
  const rounding = Math.max(2 ** -52, ...points.map((p) => Math.abs(p.y) * 2 ** -53));
  const plateau = level >= PLATEAU * levels.at(-2)! && level >= PLATEAU ** 2 * levels.at(-3)!;
  const stationary = early <= STATIONARY * late && late <= STATIONARY * early;
  return { level, noise: level > ABOVE_ROUNDING * rounding && plateau && stationary };
}

/** How much a rational approximant from n coefficients amplifies their relative errors: (1+√2)^(2n) for a cut on a half-line. */
const AMPLIFICATION = 2 * Math.log(1 + Math.SQRT2);

/**
 * Number of leading coefficients that a rational approximant may use: the error of c_n must stay below (1+√2)^(−2n), the
 * inverse condition of the Hankel matrices of a cut (a Hilbert-type matrix).
 */
export function usableCoefficients(relativeErrors: readonly number[]): number {
  const bad = relativeErrors.findIndex((e, n) => !(e <= Math.exp(-AMPLIFICATION * n)));
  return Math.max(1, bad < 0 ? relativeErrors.length : bad);
}
